import { explain } from "../../src/pane/explain";
import { numbersFor } from "../../src/pane/numbers";
import { workedLine } from "../../src/pane/worked";
import { memorySheet, selecting } from "./memorySheet";

async function worked(formula: string, value: number | null, locale = "en") {
  const explanation = await explain(memorySheet({}), selecting(formula, value));
  return workedLine(explanation!, numbersFor(locale))?.map(({ text }) => text);
}

test("helper quantities come first, then the relation with the numbers put in", async () => {
  expect(await worked("PLINTH.ABSTRANS(25,8,0.1)", 0.134190254545645)).toEqual([
    "r = f/fn = 25/8 = 3.125",
    "T = √((1 + (2·ζ·r)²)/((1 − r²)² + (2·ζ·r)²)) = √((1 + (2·0.1·3.125)²)/((1 − 3.125²)² + (2·0.1·3.125)²)) = 0.1342",
  ]);
});

test("numbers carry their units", async () => {
  expect(await worked('PLINTH.NATFREQ(40,12,"mm")', 9.189)).toEqual([
    "fn = √(k/m)/(2·π) = √(40 N/mm/12 kg)/(2·π) = 9.189 Hz",
  ]);
});

test("hysteretic damping has its own relation", async () => {
  const lines = await worked('PLINTH.ABSTRANS(25,8,0.1,"hysteretic")', 0.116);
  expect(lines!.at(-1)).toContain("0.2²");
});

test("an unknown input leaves the relation without numbers", async () => {
  const lines = await worked("PLINTH.NATFREQ(A1,12)", null);
  expect(lines).toEqual(["fn = √(k/m)/(2·π)"]);
});

test("decimal commas follow the locale", async () => {
  expect((await worked("PLINTH.NATFREQ(40000.5,12)", 9.189, "de"))![0]).toContain("= 9,189 Hz");
});

test("a function without a closed form has no worked line", async () => {
  expect(await worked("PLINTH.SRS(A1:A9,0.001,20,0.05)", null)).toBeUndefined();
});

test("several steps lead from the arguments to a requirement", async () => {
  const lines = await worked("PLINTH.REQSTATICDEFL(0.9,25,0)", 0.004372);
  expect(lines!.map((line) => line.split(" = ")[0])).toEqual(["T", "fn", "δ"]);
  // 1/|1 - r^2| = 0.1 gives r = sqrt 11: fn = 25/sqrt 11 = 7.538
  expect(lines![1]).toMatch(/ = 7\.538$/);
  expect(lines![2]).toContain("9.80665 m/s²");
});

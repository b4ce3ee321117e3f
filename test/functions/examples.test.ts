import { readFunctionDocs } from "../../src/build/functionDocs";
import { valueOf } from "../support/exampleValues";

const examples = readFunctionDocs().flatMap(({ id, examples }) =>
  examples.map(({ formula, gives }) => [formula, gives, id] as const),
);

/** Half a unit in the 15th significant digit, which is what spreadsheets show: a printed 25 promises 25.0000000000000. */
function shownTolerance(printed: number): number {
  return printed === 0 ? 0 : 0.5000001 * 10 ** (Math.floor(Math.log10(Math.abs(printed))) - 14);
}

test.each(examples)("%s gives %s", async (formula, gives) => {
  const result = await valueOf(formula);
  const printed = await valueOf(`=${gives}`);
  expect(result.map((row) => row.length)).toEqual(printed.map((row) => row.length));
  printed.flat().forEach((wanted, i) => {
    const given = result.flat()[i];
    if (typeof wanted === "number") {
      expect(typeof given).toBe("number");
      expect(Math.abs((given as number) - wanted)).toBeLessThanOrEqual(shownTolerance(wanted));
    } else {
      expect(given).toBe(wanted);
    }
  });
});

test("every function has an example, and most of them show a number", () => {
  for (const { id, examples } of readFunctionDocs()) expect([id, examples.length > 0]).toEqual([id, true]);
});

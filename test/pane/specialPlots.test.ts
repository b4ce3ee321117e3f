import { explain } from "../../src/pane/explain";
import { numbersFor } from "../../src/pane/numbers";
import { specialPicture } from "../../src/pane/specialPlots";
import { type Cells, memorySheet, selecting } from "./memorySheet";

async function drawn(formula: string, cells: Cells = {}, value: number | null = null) {
  const explanation = await explain(memorySheet(cells), selecting(formula, value));
  return specialPicture(explanation!, numbersFor("en"));
}
const largest = (points: readonly { y: number }[]): number =>
  points.reduce((most, { y }) => Math.max(most, Math.abs(y)), 0);

test("a random response is the base's density times T squared", async () => {
  const cells = { A1: 10, A2: 1000, B1: 0.04, B2: 0.04 };
  const picture = await drawn("PLINTH.RANDRMS(A1:A2,B1:B2,100,0.05)", cells);
  const [base, response] = picture!.content.lines;
  expect(base!.points).toEqual([
    { x: 10, y: 0.04 },
    { x: 1000, y: 0.04 },
  ]);
  // at resonance T^2 = (1 + 4 zeta^2)/(4 zeta^2) = 101 for zeta = 0.05
  expect(response!.points.find(({ x }) => x === 100)!.y).toBeCloseTo(0.04 * 101, 10);
});

test("the undamped answer to a long rectangle reaches twice its height", async () => {
  // the classic step response; 40 samples to a cycle miss the very top by at most 1 - cos(pi/40)
  const picture = await drawn('PLINTH.PULSE("rectangle",100,1,5,0)');
  const response = picture!.content.lines.find(({ look }) => look === "main")!;
  expect(largest(response.points)).toBeGreaterThan(199);
  expect(largest(response.points)).toBeLessThanOrEqual(200 * (1 + 1e-9));
});

test.each([
  "half-sine",
  "initial-peak sawtooth",
  "terminal-peak sawtooth",
  "triangle",
  "rectangle",
  "haversine",
  "trapezoid",
])("a %s is drawn from zero time to its full height", async (shape) => {
  const picture = await drawn(`PLINTH.PULSEVELOCITY("${shape}",100,0.011)`);
  const [base] = picture!.content.lines;
  expect(base!.points[0]!.x).toBe(0);
  expect(largest(base!.points)).toBeCloseTo(100, 6);
});

test("thinning a long record loses no peak", async () => {
  const cells: Cells = {};
  for (let i = 1; i <= 9000; i++) cells[`A${i}`] = i === 4321 ? 7 : Math.sin(i);
  const picture = await drawn("PLINTH.HISTORY(A1:A9000,0.001,20,0.05)", cells);
  const [base] = picture!.content.lines;
  expect(base!.points.length).toBeLessThanOrEqual(1600);
  expect(largest(base!.points)).toBe(7);
});

test("a two-stage chain is drawn in the units of its cells", async () => {
  const si = await drawn("PLINTH.TWOSTAGE(20,50,200000,100,10,40000,20)");
  const mm = await drawn('PLINTH.TWOSTAGE(20,50,200,0.1,10,40,0.02,"mm")');
  si!.content.lines[0]!.points.forEach(({ x, y }, i) => {
    expect(mm!.content.lines[0]!.points[i]!.x).toBeCloseTo(x, 9);
    expect(mm!.content.lines[0]!.points[i]!.y / y).toBeCloseTo(1, 9);
  });
});

test.each([
  ["PLINTH.RANDRMS(A1:A2,B1:B2,100,0.05)", { A1: 10, A2: "x", B1: 1, B2: 1 }],
  ["PLINTH.RANDRMS(A1:A2,B1:B2,100,0.05)", { A1: 100, A2: 10, B1: 1, B2: 1 }],
  ["PLINTH.SRS(A1:A3,0,20,0.05)", { A1: 0, A2: 1, A3: 0 }],
  ['PLINTH.PULSE("square",1,1,1,0)', {}],
  ["PLINTH.ABSTRANS(25,8,0.1)", {}],
])("%s gives no picture where its cells give none", async (formula, cells) => {
  expect(await drawn(formula, cells as Cells)).toBeNull();
});

/** Tables, errors in their place and units of the random, shock and system functions. */
import * as plinth from "../../src/functions";
import { CellFailure } from "../../src/functions/failure";

const column = (...values: unknown[]) => values.map((value) => [value]);

test("SRS keeps a bad frequency's error in its own place and the shape of the others", () => {
  const record = column(0, 1, -0.5, 0);
  const rows = plinth.SRS(
    record,
    [[0.01]],
    [
      [5, 0, 50],
      ["x", 20, ""],
    ],
    [[0.05]],
  );
  const kinds = rows.map((row) => row.map((cell) => (cell instanceof CellFailure ? cell.kind : typeof cell)));
  expect(kinds).toEqual([
    ["number", "outside-domain", "number"],
    ["wrong-type", "number", "missing"],
  ]);
  expect(rows[0][2]).toBe(plinth.SRS(record, [[0.01]], [[50]], [[0.05]])[0][0]);
});

test("SRS of one frequency that overflows does not take the others with it", () => {
  const rows = plinth.SRS(column(0, 1, 0), [[10]], column(5, 1e308), [[0.05]]);
  expect(typeof rows[0][0]).toBe("number");
  expect(rows[1][0]).toMatchObject({ kind: "overflow" });
});

test("HISTORY spills in the record's own orientation", () => {
  expect(plinth.HISTORY(column(0, 1, 0), [[0.01]], [[10]], [[0.05]]).map((row) => row.length)).toEqual([1, 1, 1]);
  expect(plinth.HISTORY([[0, 1, 0]], [[0.01]], [[10]], [[0.05]])[0]).toHaveLength(3);
});

test.each([
  [() => plinth.PSDAT(column(20, 80, 80), column(1, 1, 1), [[20]]), "row 3 (80) is not above row 2 (80)"],
  [() => plinth.PSDRMS(column(20, 80), column(1, 2, 3)), "equally long, got 2 and 3"],
  [() => plinth.PSDRMS(column(20, 80), column(1, "")), "densities row 2 is blank"],
  [() => plinth.RANDRMS(column(20, 80), column(1, -2), [[50]], [[0.1]]), "density must be above 0: row 2 is -2"],
  [
    () => plinth.SRS(column(1, "?", 2), [[0.1]], [[5]], [[0.05]]),
    'accelerations row 2 must be a number, got the text "?"',
  ],
  [() => plinth.RIGIDMODES([[1]], [[1, 0], [0, 1]], [[0, 0, 0]], [[1, 1, 1]]), "inertia must have 3 columns, got 2"], // prettier-ignore
  [() => plinth.MOUNTLOADS(column(0, 1), column(0, 1), column(1, 1), [[5]], [[2]], [[0]]), "the frame would tip"],
  [() => plinth.PULSE("square", [[1]], [[1]], [[1]], [[0]]), 'got "square"'],
])("a bad table or word is named: %#", (call, message) => {
  expect(call).toThrow(message);
});

test("units change the numbers, not the physics", () => {
  const g = 9.80665;
  const [f, S] = [column(20, 2000), column(0.01, 0.01)];
  const si = plinth.RANDRMS(f, column(0.01 * g * g, 0.01 * g * g), [[100]], [[0.05]], "deflection")[0][0];
  const mm = plinth.RANDRMS(f, S, [[100]], [[0.05]], "deflection", "viscous", "mm")[0][0];
  const inch = plinth.RANDRMS(f, S, [[100]], [[0.05]], "deflection", "viscous", "inch")[0][0];
  expect(mm / 1000 / si).toBeCloseTo(1, 13);
  expect((inch * 0.0254) / si).toBeCloseTo(1, 13);
  const drop = plinth.PULSEVELOCITY("half-sine", [[40]], [[0.011]], "inch")[0][0];
  expect(drop * 0.0254).toBeCloseTo((2 / Math.PI) * 40 * g * 0.011, 13);
});

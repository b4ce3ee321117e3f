import { auditWorkbook } from "../../src/audit/audit";
import { tableCells, workbookOf } from "../support/sheets";

type Cells = Record<string, string | number>;

const T = (row: number): string =>
  `=SQRT((1+(2*C${row}*A${row}/B${row})^2)/((1-(A${row}/B${row})^2)^2+(2*C${row}*A${row}/B${row})^2))`;
const table = (): Cells => tableCells("f (Hz) | fn (Hz) | zeta | T", `25 | 6 | 0.1 | ${T(2)}`, 6);
const flagged = (cells: Cells): string[] =>
  auditWorkbook(workbookOf(cells))
    .filter(({ verdict }) => verdict === "differs")
    .map(({ cell, mistake }) => `${cell} ${mistake}`);

test("an even column raises nothing", () => {
  expect(flagged(table())).toEqual([]);
});

test("a number typed over one formula of a column is found", () => {
  expect(flagged({ ...table(), D4: 0.7 })).toEqual(["D4 value-typed-over"]);
});

test("a formula that departs from its column is found", () => {
  expect(flagged({ ...table(), D5: T(5).replace("(2*C5*A5/B5)^2)/", "2*C5*A5/B5)/") })).toEqual(["D5 fill-break"]);
});

test("another way to write the same relation in one row is no departure", () => {
  const twin = "=SQRT(1+(2*C5*A5/B5)^2)/SQRT((1-(A5/B5)^2)^2+(2*C5*A5/B5)^2)";
  expect(flagged({ ...table(), D5: twin })).toEqual([]);
});

test("a reference without $ that runs into blank cells is found", () => {
  const cells = tableCells("m (kg) | load each (N) | | mounts", "100 | =A2*9.81/D2", 4);
  expect(flagged({ ...cells, D2: 4 })).toEqual(["B2:B5 reference-slip"]);
});

test("a reference to the neighbouring row is found", () => {
  const cells = tableCells("f (Hz) | fn (Hz) | r", "25 | 6 | =A3/B2", 4);
  expect(flagged({ ...cells, A6: 31 })).toEqual(["C2:C5 reference-slip"]);
});

const own: readonly (readonly [title: string, cells: Cells, found: string[]])[] = [
  [
    "in one unit",
    { A1: "f (Hz)", B1: "fn (Hz)", C1: "zeta", D1: "T", A2: 25, B2: 6, C2: 0.1, D2: "=PLINTH.ABSTRANS(A2,B2,C2)" },
    [],
  ],
  [
    "with rpm against Hz",
    {
      A1: "Speed (rpm)",
      B1: "fn (Hz)",
      C1: "zeta",
      D1: "T",
      A2: 1450,
      B2: 6,
      C2: 0.1,
      D2: "=_xldudf_PLINTH_ABSTRANS(A2,B2,C2)",
    },
    ["D2 speed-unit"],
  ],
  [
    "with percent for a fraction",
    {
      A1: "f (Hz)",
      B1: "fn (Hz)",
      C1: "damping (%)",
      D1: "T",
      A2: 25,
      B2: 6,
      C2: 10,
      D2: "=PLINTH.ABSTRANS(A2,B2,C2)",
    },
    ["D2 percent-as-ratio"],
  ],
  [
    "without its units word",
    { A1: "k (N/mm)", B1: "m (kg)", C1: "fn (Hz)", A2: 80, B2: 120, C2: "=PLINTH.NATFREQ(A2,B2)" },
    ["C2 length-unit"],
  ],
  [
    "with its units word",
    { A1: "k (N/mm)", B1: "m (kg)", C1: "fn (Hz)", A2: 80, B2: 120, C2: '=PLINTH.NATFREQ(A2,B2,"mm")' },
    [],
  ],
  [
    "with a blank input",
    { A1: "k (N/m)", B1: "m (kg)", C1: "fn (Hz)", A2: 80000, C2: "=PLINTH.NATFREQ(A2,B2)" },
    ["C2 reference-slip"],
  ],
];

test.each(own)("a cell that calls our function %s is judged by its inputs' labels", (_, cells, found) => {
  expect(flagged(cells)).toEqual(found);
});

import { narrowed, worksOnRanges } from "../../src/trial/intersect";

// What a plain formula means for a range where one value is wanted: the cell in the formula's own row or column
// (ECMA-376 part 1, 18.17.2.6, implicit intersection).
const around = {
  takesRange: (name: string) => ["SUM", "MAX", "INDEX"].includes(name),
  cellsOfName: (name: string) => (name === "freq" ? "Data!$B$2:$B$9" : undefined),
};
const place = { sheet: "Sheet1", row: 4, column: 5 };

const narrowing = [
  ["B2:B9*2", "B5*2"],
  ["$B$2:$B$9/A5", "$B5/A5"],
  ["freq*2", "Data!$B5*2"],
  ["SQRT(B2:B9)", "SQRT(B5)"],
  ["A1:H1+1", "F1+1"],
  ["B:B+1", "B5+1"],
  ["-B2:B9%", "-B5%"],
  ["SUM(B2:B9)", "SUM(B2:B9)"],
  ["SUM(B2:B9*2)", "SUM(B5*2)"],
  ["SUMPRODUCT(B2:B9*C2:C9)", "SUMPRODUCT(B2:B9*C2:C9)"],
  ["SUMPRODUCT(ABS(B2:B9))", "SUMPRODUCT(ABS(B2:B9))"],
  ["PLINTH.ABSTRANS(B2:B9,8,0.1)", "PLINTH.ABSTRANS(B2:B9,8,0.1)"],
  ["B7:B9*2", "B7:B9*2"],
  ["A1:C9*2", "A1:C9*2"],
  ["SUM(B2:INDEX(B:B,9))", "SUM(B2:INDEX(B:B,9))"],
  ['"B2:B9*2"', '"B2:B9*2"'],
] as const;

test.each(narrowing)("%s in F5 means %s", (formula, meaning) => {
  expect(narrowed(formula, place, around)).toBe(meaning);
});

const marked = [
  ["=SUM(B2:B9)", false],
  ["=B2*C2", false],
  ["=SUM(B2:B9*2)", true],
  ["=SUM({1,2}*2)", true],
  ["=SUMPRODUCT(B2:B9*2)", false],
  ["=SUM(PLINTH.ABSTRANS(B2:B9,8,0.1)*2)", true],
  ["=PLINTH.ABSTRANS(B2,8,0.1)*2", false],
  ["=2*freq", true],
] as const;

test.each(marked)("%s works on ranges: %p", (formula, expected) => {
  expect(worksOnRanges(formula, around)).toBe(expected);
});

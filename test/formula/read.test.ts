import fc from "fast-check";
import { readFormula } from "../../src/formula/read";
import { printTree } from "../../src/formula/print";

const trees = [
  ["-2^2", "(^ (neg 2) 2)"],
  ["2^3^2", "(^ (^ 2 3) 2)"],
  ["50%*A1", "(* (pct 50) A1)"],
  ["=1+2*3", "(+ 1 (* 2 3))"],
  ["2--3", "(- 2 (neg 3))"],
  ["-A1%^2", "(^ (neg (pct A1)) 2)"],
  ["'Eingabe Werte'!$E$4/B3", "(/ 'Eingabe Werte'!$E$4 B3)"],
  ["'it''s'!A1", "'it's'!A1"],
  ["SUM(B5:A1)", "(SUM A1:B5)"],
  ["SUM(A:A,3:3)", "(SUM A:A 3:3)"],
  ["Table1[[#This Row],[f (Hz)]]*[@x]", "(* Table1[this row|f (Hz)] [this row|x])"],
  ["[1]Foo!A1*2", "(* <[1]Foo!A1> 2)"],
  ["Sheet1:Sheet3!A1", "<Sheet1:Sheet3!A1>"],
  ['IF(A1<>"a""b",#N/A,TRUE)', '(IF (<> A1 "a\\"b") #N/A TRUE)'],
  ["_xlfn.LET(_xlpm.a,1,_xlpm.a)", "(LET _xlpm.a 1 _xlpm.a)"],
  ["_xldudf_PLINTH_ABSTRANS(A1,2)", "(PLINTH.ABSTRANS A1 2)"],
  ["{1,2;3,4}", "{1 2; 3 4}"],
  ["c/cc", "(/ c cc)"],
  ["IF(,1,)", "(IF ? 1 ?)"],
] as const;

test.each(trees)("%s reads as %s without a problem", (text, printed) => {
  const { tree, problems } = readFormula(text);
  expect(printTree(tree)).toBe(printed);
  expect(problems).toEqual([]);
});

const broken = [
  ["SUM(A1,", "(SUM A1 ?)", 7, 7],
  ["1+*2", "(+ 1 (* ? 2))", 2, 2],
  ["(1+2", "(+ 1 2)", 0, 1],
  ["A1 B1", "A1", 3, 5],
  ["", "?", 0, 0],
] as const;

test.each(broken)("%p reads as far as it goes, %p, and tells where the problem is", (text, printed, start, end) => {
  const { tree, problems } = readFormula(text);
  expect(printTree(tree)).toBe(printed);
  expect(problems[0]).toMatchObject({ start, end });
});

test("positions count from the first character of the formula, = included", () => {
  expect(readFormula("=1+A12").tree).toMatchObject({ start: 1, end: 6, right: { start: 3, end: 6 } });
});

test("no text makes the reader throw", () => {
  const fragments = fc.constantFrom(
    "(",
    ")",
    "{",
    "}",
    ",",
    ";",
    "A1",
    "$B$2",
    "'x'!",
    "SUM(",
    '"',
    "%",
    "^",
    "-",
    "+",
    "#REF!",
    "[",
    "]",
    "@",
    "1E",
    ":",
    "LET(",
    "&",
    " ",
    "ζ",
  );
  const text = fc.oneof(
    fc.string(),
    fc.array(fragments, { maxLength: 40 }).map((parts) => parts.join("")),
  );
  fc.assert(
    fc.property(text, (formula) => {
      const { tree, problems } = readFormula(formula);
      expect(typeof printTree(tree)).toBe("string");
      expect(Array.isArray(problems)).toBe(true);
    }),
    { numRuns: 500, seed: 7 },
  );
});

test("nesting without end is a problem, not a stack overflow", () => {
  expect(readFormula("(".repeat(5000) + "1").problems).not.toEqual([]);
  expect(readFormula("-".repeat(5000) + "1").problems).not.toEqual([]);
});

test("an operand's place takes in its brackets", () => {
  const text = "F((A1+B1)*2,(C1))";
  const { tree } = readFormula(text);
  if (tree.kind !== "call") throw new Error("not a call");
  expect(tree.arguments.map(({ start, end }) => text.slice(start, end))).toEqual(["(A1+B1)*2", "(C1)"]);
});

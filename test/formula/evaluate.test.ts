import { evaluate } from "../../src/formula/evaluate";
import { readFormula } from "../../src/formula/read";
import type { Scalar, Value } from "../../src/formula/values";

const sheet: Record<string, Scalar> = {
  "0,0": 2,
  "1,0": 3,
  "2,0": 4,
  "0,1": "two",
  "1,1": "three",
  "2,1": null,
  "0,2": 10,
  "1,2": 20,
  "2,2": 30,
};
const around = {
  cell: (_: string | null, row: number, column: number): Scalar => sheet[`${row},${column}`] ?? null,
  extent: () => ({ rows: 3, columns: 3 }),
};
const value = (formula: string): Value => evaluate(readFormula(formula).tree, around);

const known = [
  // formula, value, where the value comes from
  ["-2^2", 4, "a spreadsheet's precedence: the sign binds tighter"],
  ["2^3^2", 64, "a spreadsheet groups powers from the left"],
  ["50%", 0.5, "definition"],
  ["A1+A2*A3", 14, "2 + 3·4"],
  ["SUM(A1:A3)", 9, "2 + 3 + 4"],
  ["SUM(A:A)", 9, "2 + 3 + 4"],
  ["SUMSQ(A1:A3)", 29, "4 + 9 + 16"],
  ["SUMPRODUCT(A1:A3,C1:C3)", 200, "20 + 60 + 120"],
  ["SUMPRODUCT((A1:A2+A2:A3)/2,C2:C3-C1:C2)", 60, "2.5·10 + 3.5·10"],
  ["AVERAGE(A1:A3)", 3, "(2 + 3 + 4)/3"],
  ["ROUND(2.5,0)", 3, "half away from zero"],
  ["ROUND(-2.5,0)", -3, "half away from zero"],
  ["ATAN2(0,1)", Math.PI / 2, "x first, then y"],
  ["LOG(100)", 2, "base 10 if left out"],
  ["LN(EXP(1))", 1, "definition"],
  ["DEGREES(PI())", 180, "definition"],
  ["IMABS(COMPLEX(3,4))", 5, "3-4-5 triangle"],
  ["IMABS(IMDIV(COMPLEX(3,4),COMPLEX(0,5)))", 1, "quotient of two numbers of size 5"],
  ['IMREAL(IMPRODUCT("1+2i","3-i"))', 5, "(1+2i)(3−i) = 5+5i"],
  ["IFERROR(1/0,7)", 7, "definition"],
  ["IF(A1>1,A2,1/0)", 3, "the other branch is not evaluated"],
  ["INDEX(A1:C3,2,3)", 20, "second row, third column"],
  ["MATCH(3,A1:A3,0)", 2, "second of the list"],
  ["VLOOKUP(3,A1:C3,3,FALSE)", 20, "row of 3, third column"],
  ["LOOKUP(3.5,A1:A3,C1:C3)", 20, "last not above 3.5"],
  ["LET(a,A1,b,a*2,a+b)", 6, "2 + 4"],
  ['"a"&1', "a1", "joined as text"],
  ["B3+1", 1, "a blank counts as 0"],
  ["TRUE+1", 2, "TRUE counts as 1"],
] as const;

test.each(known)("%s is %p: %s", (formula, expected) => {
  const result = value(formula);
  if (typeof expected === "number") expect(result).toBeCloseTo(expected, 14);
  else expect(result).toBe(expected);
});

test.each([
  ["1/0", "#DIV/0!"],
  ["SQRT(-1)", "#NUM!"],
  ["B1+1", "#VALUE!"],
  ["NOSUCH(1)", "#NAME?"],
  ["WEBSERVICE(A1)", "#NAME?"],
  ["[1]Foo!A1", "#REF!"],
  ["unknown_name", "#NAME?"],
])("%s is the error %s", (formula, error) => {
  expect(value(formula)).toEqual({ error });
});

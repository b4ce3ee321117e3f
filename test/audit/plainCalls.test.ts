import { plainFormula } from "../../src/audit/plain";
import { hasOwnCall, isOneCall, plainText } from "../../src/audit/plain-calls";

const formulaOf = (...args: Parameters<typeof plainFormula>) => {
  const plain = plainFormula(...args);
  return "formula" in plain ? plain.formula : plain.none;
};

const written = [
  // call                                                what a spreadsheet must see
  ["SURGE", ["A1", "B1"], "SQRT(A1/B1)/2"],
  ["SURGE", ["A1+A2", "B1"], "SQRT((A1+A2)/B1)/2"],
  ["SURGE", ["$A$1", "Mounts!B1"], "SQRT($A$1/Mounts!B1)/2"],
  ["SURGE", ["(A1+A2)", "'a (b) c'!B1"], "SQRT((A1+A2)/'a (b) c'!B1)/2"],
  ["SURGE", ["(A1)+(A2)", "B1"], "SQRT(((A1)+(A2))/B1)/2"],
  ["REQDAMPING", ["-A1", '"hysteretic"'], "1/(2*SQRT(((-A1)-1)*((-A1)+1)))"],
  ["UNITS", ["A1+1", '"rpm"', '"Hz"'], "(A1+1)/60"],
  ["UNITS", ["A1", '"in"', '"mm"'], "A1*25.4"],
  ["UNITS", ["A1", '"Hz"', '"rad/s"'], "A1*(2*PI())"],
] as const;

test.each(written)("%s(%j) becomes %s", (id, texts, formula) => {
  expect(formulaOf(id, texts)).toBe(formula);
});

const refused = [
  ["SRS", ["A1:A9", "0.001", "8", "0.05"], "SRS has no closed form: it follows the record in time"],
  ["ABSTRANS", ["A1", "B1"], "ABSTRANS: damping ratio is missing"],
  ["ABSTRANS", ["A1", "B1", "C1", '"dry"'], 'ABSTRANS: damping model cannot be "dry"'],
  ["UNITS", ["A1", '"Hz"', '"mm"'], "UNITS: Hz and mm measure different things"],
  ["UNITS", ["A1", "B1", '"mm"'], 'UNITS: the unit "from" is not written in the formula itself'],
  ["SURGE", ["A1", "B1", '"si"', "C1"], "SURGE: it has too many arguments"],
  ["SURGE", ["A1+", "B1"], "SURGE: stiffness cannot be read"],
  ["constructor", [], "constructor is not known"],
] as const;

test.each(refused)("%s(%j) has no plain formula: %s", (id, texts, reason) => {
  expect(plainFormula(id, texts)).toEqual({ none: reason });
});

test("a place of a spilled result takes its own cell of each range and repeats a single row or column", () => {
  const place = { row: 2, column: 1 };
  expect(formulaOf("SURGE", ["A2:A9", "$C$1:$E$1"], place)).toBe("SQRT(A4/$D$1)/2");
  expect(formulaOf("SURGE", ["2*Mounts!A2:A9", "{1,2,3}"], place)).toBe("SQRT((2*Mounts!A4)/2)/2");
  expect(formulaOf("SURGE", ["SUM(A2:A9)", "B1"], place)).toBe("SURGE: stiffness is no range of cells or numbers");
  expect(formulaOf("SURGE", ["A2:A3", "B1"], place)).toBe("SURGE: stiffness is no range of cells or numbers");
});

test("calls are replaced wherever they stand, inside each other too", () => {
  const { formula, replaced } = plainText(
    'IF(A1>0,-PLINTH.SURGE((A1+B1)*2,_xldudf_PLINTH_UNITS(C1,"g","kg"))^2,"SURGE(a,b")',
  );
  expect(formula).toBe('IF(A1>0,-(SQRT(((A1+B1)*2)/(C1/1000))/2)^2,"SURGE(a,b")');
  expect(replaced).toEqual(["UNITS", "SURGE"]);
});

test("a formula with one call that has no plain formula stays whole", () => {
  const text = "PLINTH.SURGE(A1,B1)+PLINTH.RUNUP(1,2,3,4,5)";
  const { formula, kept } = plainText(text);
  expect(formula).toBe(text);
  expect(kept.map(({ id }) => id)).toEqual(["RUNUP"]);
});

test("only calls of our functions count", () => {
  expect(hasOwnCall('"PLINTH.SURGE(A1,B1)"')).toBe(false);
  expect(hasOwnCall("SUM(A1)+plinth.surge(A1,B1)")).toBe(true);
  expect(isOneCall("PLINTH.SURGE(A1,B1)")).toBe(true);
  expect(isOneCall("PLINTH.SURGE(A1,B1)+1")).toBe(false);
  expect(hasOwnCall("PLINTH.SURGE(A1,")).toBe(false);
});

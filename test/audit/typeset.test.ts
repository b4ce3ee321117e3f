import { latexOf, textOf } from "../../src/audit/typeset";

const quantities: Record<string, { value: string; unit?: string }> = {
  f: { value: "25", unit: "Hz" },
  fn: { value: "8", unit: "Hz" },
  zeta: { value: "0,1" },
};
const putIn = (name: string) => quantities[name] ?? {};

test.each([
  ["SQRT(k/m)/(2*PI())", "√(k/m)/(2·π)"],
  ["a-(b-d)", "a − (b − d)"],
  ["a/(b*d)", "a/(b·d)"],
  ["(a/b)^2", "(a/b)²"],
  ["ABS(1-r^2)", "|1 − r²|"],
  ["zeta+omegan", "ζ + ωn"],
  ["m^0.5", "√(m)"],
])("%s reads as %s", (formula, text) => {
  expect(textOf(formula)).toBe(text);
});

test.each([
  ["f/fn", "\\frac{f}{f_{\\mathrm{n}}}"],
  ["2*zeta*r", "2\\,\\zeta\\,r"],
  ["SQRT(1+eta^2)", "\\sqrt{1 + \\eta^{2}}"],
  ["(1-r^2)^2", "\\left(1 − r^{2}\\right)^{2}"],
])("%s is typeset as %s", (formula, latex) => {
  expect(latexOf(formula)).toBe(latex);
});

test("numbers go in with their units and the user's decimal mark", () => {
  expect(textOf("2*zeta*f/fn", putIn)).toBe("2·0,1·25 Hz/8 Hz");
  expect(latexOf("2*zeta*f/fn", putIn)).toBe("\\frac{2 \\cdot 0{,}1 \\cdot 25\\,\\mathrm{Hz}}{8\\,\\mathrm{Hz}}");
});

test("what cannot be read gives nothing instead of something wrong", () => {
  expect(textOf("1+")).toBeNull();
  expect(latexOf("SQRT(")).toBeNull();
});

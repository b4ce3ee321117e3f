/** Binary operators of a spreadsheet, loosest first; all of them group from the left, even `^`. */
export const binaryOperators: Readonly<Record<string, number>> = {
  "=": 1,
  "<": 1,
  ">": 1,
  "<=": 1,
  ">=": 1,
  "<>": 1,
  "&": 2,
  "+": 3,
  "-": 3,
  "*": 4,
  "/": 4,
  "^": 5,
  ":": 8,
};

/** A sign before an operand binds tighter than `^`: -2^2 is 4. The percent sign binds tighter still. */
export const prefixPower = 6;

export const prefixOperators: Readonly<Record<string, "neg" | "plus" | "single">> = {
  "-": "neg",
  "+": "plus",
  "@": "single",
};

export const postfixOperators: Readonly<Record<string, "pct" | "spill">> = { "%": "pct", "#": "spill" };

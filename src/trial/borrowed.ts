/** Spreadsheet functions that legacy sheets use and the trial sheet's library lacks, from a general formula library. */
import * as formulas from "@formulajs/formulajs";
import { addFunction, registries } from "@odoo/o-spreadsheet";
import type { Cell, SheetArgument } from "./values";

type Library = Record<string, unknown>;

/** name → arguments; "…" after a name repeats it, "?" leaves it out, "[]" takes ranges. */
const lacking: Record<string, string> = {
  RADIANS: "degrees",
  SIGN: "number",
  SQRTPI: "number",
  SUMSQ: "number[]…",
  GEOMEAN: "number[]…",
  HARMEAN: "number[]…",
  GCD: "number[]…",
  LCM: "number[]…",
  QUOTIENT: "numerator, denominator",
  MROUND: "number, multiple",
  FACT: "number",
  COMBIN: "number, chosen",
  STANDARDIZE: "x, mean, standardDeviation",
  ERF: "x",
  ERFC: "x",
  GAMMA: "x",
  GAMMALN: "x",
  N: "value",
  T: "value",
  REPT: "text, times",
  CODE: "text",
  COMPLEX: "real, imaginary, suffix?",
  IMABS: "complex",
  IMAGINARY: "complex",
  IMREAL: "complex",
  IMARGUMENT: "complex",
  IMCONJUGATE: "complex",
  IMCOS: "complex",
  IMCOSH: "complex",
  IMDIV: "complex, divisor",
  IMEXP: "complex",
  IMLN: "complex",
  IMLOG10: "complex",
  IMLOG2: "complex",
  IMPOWER: "complex, power",
  IMPRODUCT: "complex[]…",
  IMSIN: "complex",
  IMSINH: "complex",
  IMSQRT: "complex",
  IMSUB: "complex, subtrahend",
  IMSUM: "complex[]…",
  IMTAN: "complex",
  BIN2DEC: "binary",
  DEC2BIN: "number, places?",
  DEC2HEX: "number, places?",
  HEX2DEC: "hexadecimal",
  NORMDIST: "x, mean, standardDeviation, cumulative",
  NORMSDIST: "z",
  NORMINV: "probability, mean, standardDeviation",
  NORMSINV: "probability",
  "NORM.DIST": "x, mean, standardDeviation, cumulative",
  "NORM.S.DIST": "z, cumulative",
  "NORM.INV": "probability, mean, standardDeviation",
  "NORM.S.INV": "probability",
};

export function registerBorrowed(): void {
  for (const [name, signature] of Object.entries(lacking)) {
    if (registries.functionRegistry.contains(name)) continue;
    const compute = name.split(".").reduce<unknown>((at, part) => (at as Library)?.[part], formulas);
    if (typeof compute !== "function") throw new Error(`the formula library offers no ${name}`);
    const parameters = signature.split(", ");
    addFunction(name, {
      description: `${name} as spreadsheets define it.`,
      category: "Math",
      isExported: true,
      args: parameters.map((parameter) => ({
        name: parameter.replace(/[[\]?…]/g, ""),
        description: "",
        type: parameter.includes("[]") ? ["ANY", "RANGE"] : ["ANY"],
        ...(parameter.includes("[]") && { acceptMatrix: true }),
        ...(parameter.includes("?") && { optional: true }),
        ...(parameter.includes("…") && { repeating: true }),
      })),
      compute: ((...args: SheetArgument[]) => answer(compute as (...args: unknown[]) => unknown, args, name)) as never,
    });
  }
}

const yieldsNumber = /^IM(ABS|REAL|AGINARY|ARGUMENT)$/;

function answer(compute: (...args: unknown[]) => unknown, args: SheetArgument[], name: string): Cell {
  const plain: unknown[] = [];
  for (const arg of args) {
    const values = Array.isArray(arg) ? arg.flat().map((cell) => cell?.value ?? null) : [arg?.value ?? null];
    const error = values.find((value) => typeof value === "string" && registries.errorTypes.has(value));
    if (error) return { value: error };
    const filled = values.filter((value) => value !== null && value !== "");
    // The complex functions of the library want their numbers one by one, the others take a list.
    if (Array.isArray(arg)) plain.push(...(name.startsWith("IM") ? filled : [filled]));
    else plain.push(arg === undefined ? undefined : (values[0] ?? 0));
  }
  const result = compute(...plain);
  if (result instanceof Error) return { value: registries.errorTypes.has(result.message) ? result.message : "#VALUE!" };
  if (typeof result === "number" && !Number.isFinite(result)) return { value: "#NUM!" };
  // Parts of complex numbers come as text from numbers written as text.
  return { value: typeof result === "string" && yieldsNumber.test(name) ? Number(result) : result };
}

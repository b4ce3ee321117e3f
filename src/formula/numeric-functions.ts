import { failure, finiteOr, isError, type Scalar, toNumber } from "./values";

const degrees = 180 / Math.PI;

function rounded(value: number, digits: number, how: (scaled: number) => number): number {
  const scale = Math.pow(10, Math.trunc(digits));
  const shifted = Math.abs(value) * scale;
  return (Math.sign(value) * how(Number(shifted.toPrecision(15)))) / scale;
}

/** Functions of one to three plain numbers. A result that is not finite becomes #NUM!. */
const table: Record<string, (...numbers: number[]) => number> = {
  ABS: Math.abs,
  SIGN: Math.sign,
  SQRT: Math.sqrt,
  SQRTPI: (x) => Math.sqrt(x * Math.PI),
  EXP: Math.exp,
  LN: Math.log,
  LOG10: Math.log10,
  LOG: (x, base = 10) => Math.log(x) / Math.log(base),
  POWER: (x, y) => Math.pow(x, y),
  PI: () => Math.PI,
  SIN: Math.sin,
  COS: Math.cos,
  TAN: Math.tan,
  COT: (x) => 1 / Math.tan(x),
  ASIN: Math.asin,
  ACOS: Math.acos,
  ATAN: Math.atan,
  ATAN2: (x, y) => (x === 0 && y === 0 ? NaN : Math.atan2(y, x)),
  SINH: Math.sinh,
  COSH: Math.cosh,
  TANH: Math.tanh,
  ASINH: Math.asinh,
  ACOSH: Math.acosh,
  ATANH: Math.atanh,
  DEGREES: (x) => x * degrees,
  RADIANS: (x) => x / degrees,
  MOD: (x, y) => x - y * Math.floor(x / y),
  QUOTIENT: (x, y) => Math.trunc(x / y),
  INT: Math.floor,
  ROUND: (x, digits = 0) => rounded(x, digits, Math.round),
  ROUNDUP: (x, digits = 0) => rounded(x, digits, Math.ceil),
  ROUNDDOWN: (x, digits = 0) => rounded(x, digits, Math.floor),
  TRUNC: (x, digits = 0) => rounded(x, digits, Math.floor),
  CEILING: (x, step = 1) => Math.ceil(x / step) * step,
  FLOOR: (x, step = 1) => Math.floor(x / step) * step,
  MROUND: (x, step) => Math.round(x / step!) * step!,
  EVEN: (x) => Math.sign(x) * 2 * Math.ceil(Math.abs(x) / 2),
};

export const roundingFunctions = new Set(["ROUND", "ROUNDUP", "ROUNDDOWN", "TRUNC", "MROUND"]);
export const isNumericFunction = (name: string): boolean => Object.hasOwn(table, name);

/** Calls a numeric function; the first error among the arguments passes through. */
export function callNumeric(name: string, values: readonly Scalar[]): Scalar {
  const numbers: number[] = [];
  for (const value of values) {
    const converted = toNumber(value);
    if (isError(converted as Scalar)) return converted as Scalar;
    numbers.push(converted as number);
  }
  const operation = table[name];
  return operation ? finiteOr(operation(...numbers)) : failure("#NAME?");
}

import { add, argument, divide, modulus, multiply, power, subtract, toComplex } from "./complex";
import {
  asMatrix,
  type Complex,
  failure,
  isComplex,
  isError,
  isMatrix,
  type Scalar,
  single,
  toNumber,
  type Value,
} from "./values";

type RangeFunction = (values: readonly Value[]) => Scalar;

/** The numbers that an aggregate counts: all numbers of ranges, and arguments written as numbers. */
function numbersIn(values: readonly Value[]): number[] | Scalar {
  const found: number[] = [];
  for (const value of values) {
    for (const element of asMatrix(value).values) {
      if (isError(element)) return element;
      if (typeof element === "number") found.push(element);
      else if (!isMatrix(value) && element !== null && !isComplex(element)) {
        const number = toNumber(element);
        if (typeof number !== "number") return number;
        found.push(number);
      }
    }
  }
  return found;
}

const aggregate =
  (operation: (numbers: number[]) => number): RangeFunction =>
  (values) => {
    const numbers = numbersIn(values);
    if (!Array.isArray(numbers)) return numbers;
    const result = operation(numbers);
    return result - result === 0 ? result : failure("#DIV/0!");
  };

const sum = (numbers: readonly number[]): number => numbers.reduce((total, x) => total + x, 0);
const mean = (numbers: readonly number[]): number => sum(numbers) / numbers.length;
const squares = (numbers: readonly number[]): number => sum(numbers.map((x) => x * x));
const variance = (numbers: readonly number[], less: number): number => {
  const middle = mean(numbers);
  return squares(numbers.map((x) => x - middle)) / (numbers.length - less);
};
const median = (numbers: number[]): number => {
  const sorted = [...numbers].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  return sorted.length % 2 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
};
const largest = (numbers: readonly number[]): number => numbers.reduce((a, b) => (b > a ? b : a), -Infinity);
const smallest = (numbers: readonly number[]): number => numbers.reduce((a, b) => (b < a ? b : a), Infinity);

function pairwise(values: readonly Value[], operation: (numbers: number[]) => number): Scalar {
  const matrices = values.map(asMatrix);
  const first = matrices[0];
  if (!first) return failure("#VALUE!");
  if (matrices.some((m) => m.rows !== first.rows || m.columns !== first.columns)) return failure("#VALUE!");
  let total = 0;
  for (let i = 0; i < first.values.length; i++) {
    const numbers: number[] = [];
    for (const matrix of matrices) {
      const value = matrix.values[i]!;
      if (isError(value)) return value;
      numbers.push(typeof value === "number" ? value : 0);
    }
    total += operation(numbers);
  }
  return total;
}

const complexPair =
  (operation: (a: Complex, b: Complex) => Complex): RangeFunction =>
  (values) => {
    let result: Complex | null = null;
    for (const value of values) {
      for (const element of asMatrix(value).values) {
        const next = toComplex(element);
        if (isError(next)) return next;
        result = result === null ? next : operation(result, next as Complex);
      }
    }
    return result ?? failure("#VALUE!");
  };

const complexOne =
  (operation: (a: Complex) => Scalar): RangeFunction =>
  (values) => {
    const value = toComplex(single(values[0] ?? null));
    return isError(value) ? value : operation(value as Complex);
  };

/** Functions that take whole ranges, and the complex ones. */
export const rangeFunctions: Record<string, RangeFunction> = {
  SUM: aggregate(sum),
  SUMSQ: aggregate(squares),
  AVERAGE: aggregate(mean),
  PRODUCT: aggregate((numbers) => numbers.reduce((total, x) => total * x, 1)),
  MIN: aggregate((numbers) => (numbers.length ? smallest(numbers) : 0)),
  MAX: aggregate((numbers) => (numbers.length ? largest(numbers) : 0)),
  MEDIAN: aggregate(median),
  GEOMEAN: aggregate((numbers) => Math.exp(mean(numbers.map(Math.log)))),
  STDEV: aggregate((numbers) => Math.sqrt(variance(numbers, 1))),
  "STDEV.S": aggregate((numbers) => Math.sqrt(variance(numbers, 1))),
  STDEVP: aggregate((numbers) => Math.sqrt(variance(numbers, 0))),
  "STDEV.P": aggregate((numbers) => Math.sqrt(variance(numbers, 0))),
  VAR: aggregate((numbers) => variance(numbers, 1)),
  VARP: aggregate((numbers) => variance(numbers, 0)),
  COUNT: (values) => {
    const numbers = numbersIn(
      values.map((value) => ({
        ...asMatrix(value),
        values: asMatrix(value).values.filter((x) => typeof x === "number"),
      })),
    );
    return Array.isArray(numbers) ? numbers.length : numbers;
  },
  COUNTA: (values) =>
    values.reduce<number>((count, value) => count + asMatrix(value).values.filter((x) => x !== null).length, 0),
  SUMPRODUCT: (values) => pairwise(values, (numbers) => numbers.reduce((total, x) => total * x, 1)),
  SUMXMY2: (values) => pairwise(values, ([a, b]) => (a! - b!) ** 2),
  SUMX2PY2: (values) => pairwise(values, ([a, b]) => a! * a! + b! * b!),
  SUMX2MY2: (values) => pairwise(values, ([a, b]) => a! * a! - b! * b!),
  COMPLEX: (values) => {
    const re = toNumber(single(values[0] ?? null));
    const im = toNumber(single(values[1] ?? null));
    if (typeof re !== "number") return re;
    return typeof im === "number" ? { re, im } : im;
  },
  IMSUM: complexPair(add),
  IMSUB: complexPair(subtract),
  IMPRODUCT: complexPair(multiply),
  IMDIV: complexPair(divide),
  IMABS: complexOne(modulus),
  IMREAL: complexOne((z) => z.re),
  IMAGINARY: complexOne((z) => z.im),
  IMARGUMENT: complexOne(argument),
  IMCONJUGATE: complexOne((z) => ({ re: z.re, im: -z.im })),
  IMSQRT: complexOne((z) => power(z, 0.5)),
  IMEXP: complexOne((z) => ({ re: Math.exp(z.re) * Math.cos(z.im), im: Math.exp(z.re) * Math.sin(z.im) })),
  IMPOWER: (values) => {
    const base = toComplex(single(values[0] ?? null));
    const exponent = toNumber(single(values[1] ?? null));
    if (isError(base)) return base;
    return typeof exponent === "number" ? power(base as Complex, exponent) : exponent;
  },
};

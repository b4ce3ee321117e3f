import { type Complex, failure, type FormulaError, isComplex, isError, type Scalar } from "./values";

const number = "(?:\\d+\\.?\\d*|\\.\\d+)(?:[eE][+-]?\\d+)?";
const both = new RegExp(`^([+-]?${number})?(?:([+-]?)(${number})?([ij]))?$`);

/** A number, a complex value or text such as "3-4i" as a complex number. */
export function toComplex(value: Scalar): Complex | FormulaError {
  if (typeof value === "number") return { re: value, im: 0 };
  if (value === null) return { re: 0, im: 0 };
  if (isError(value) || isComplex(value)) return value;
  if (typeof value !== "string") return failure("#VALUE!");
  const text = value.trim();
  const onlyImaginary = new RegExp(`^([+-]?)(${number})?[ij]$`).exec(text);
  if (onlyImaginary) return { re: 0, im: part(onlyImaginary[1], onlyImaginary[2]) };
  const found = text === "" ? null : both.exec(text);
  if (!found) return failure("#NUM!");
  return { re: Number(found[1] ?? 0), im: found[4] ? part(found[2], found[3]) : 0 };
}

const part = (sign: string | undefined, digits: string | undefined): number =>
  (sign === "-" ? -1 : 1) * (digits === undefined ? 1 : Number(digits));

export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
export const subtract = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
export const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
export function divide(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}
export const modulus = (a: Complex): number => Math.sqrt(a.re * a.re + a.im * a.im);
export const argument = (a: Complex): number => Math.atan2(a.im, a.re);
export function power(a: Complex, exponent: number): Complex {
  const size = Math.pow(modulus(a), exponent);
  const angle = argument(a) * exponent;
  return { re: size * Math.cos(angle), im: size * Math.sin(angle) };
}

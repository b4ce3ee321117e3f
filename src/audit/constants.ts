import { gravity } from "./units";

const pi = Math.PI;

/** Exact values of the constants that sizing sheets type in rounded. */
const exactValues: readonly number[] = [
  pi,
  2 * pi,
  4 * pi,
  4 * pi * pi,
  pi * pi,
  pi / 2,
  1 / (2 * pi),
  1 / pi,
  180 / pi,
  pi / 180,
  pi / 30,
  30 / pi,
  Math.SQRT2,
  Math.SQRT1_2,
  2 * Math.SQRT2,
  gravity,
  gravity * 1000,
  gravity * 100,
  gravity / 0.0254,
  gravity / 0.3048,
  0.45359237,
  1 / 0.45359237,
  0.45359237 * gravity,
  1 / (0.45359237 * gravity),
  (0.45359237 * gravity) / 0.0254,
  (0.45359237 * gravity) / 25.4,
  25.4 / (0.45359237 * gravity),
  0.0254 / (0.45359237 * gravity),
  1 / 25.4,
  1 / 0.0254,
  1 / 0.3048,
  1 / 9.80665,
];

/** Customary roundings that are not the exact value rounded: 386.4 = 12 × 32.2, 386.22 = 9.81/0.0254, 9.8 for g. */
const customary = new Map<number, number>([
  [386.4, gravity / 0.0254],
  [386.22, gravity / 0.0254],
  [386.2, gravity / 0.0254],
  [386, gravity / 0.0254],
  [9810, gravity * 1000],
  [9800, gravity * 1000],
  [981, gravity * 100],
  [980, gravity * 100],
  [3.14, pi],
  [6.28, 2 * pi],
  [22 / 7, pi],
]);

/** Whether `typed`, written as `text`, is `exact` rounded to the digits shown; zeros at the end need not count. */
export function isRoundingOf(text: string, typed: number, exact: number): boolean {
  if (typed === exact) return true;
  if (Math.abs(typed / exact - 1) < 5e-4) return true;
  if (Math.abs(typed / exact - 1) > 0.025) return false;
  const digits = text
    .replace(/[eE].*$/, "")
    .replace(/[^\d]/g, "")
    .replace(/^0+/, "");
  const least = text.includes(".") ? digits.length : digits.replace(/0+$/, "").length;
  for (let count = Math.max(least, 1); count <= Math.max(digits.length, 1); count++) {
    if (Number(exact.toPrecision(count)) === typed) return true;
  }
  return false;
}

/** The exact constant behind a number typed with three or more digits, else the number itself. */
export function exactConstant(text: string, typed: number): number {
  const known = customary.get(typed);
  if (known !== undefined) return known;
  const digits = text
    .replace(/[eE].*$/, "")
    .replace(/[^\d]/g, "")
    .replace(/^0+/, "");
  if (digits.length < (typed === 9.8 ? 2 : 3)) return typed;
  return exactValues.find((exact) => Math.abs(typed / exact - 1) < 2e-3 && isRoundingOf(text, typed, exact)) ?? typed;
}

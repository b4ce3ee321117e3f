/**
 * Products and quotients of doubles to within about one unit in the last place, over the whole double range.
 *
 * Each factor is taken apart into mantissa and exponent, so nothing overflows on the way; mantissas multiply as
 * unevaluated sums of two doubles (Dekker 1971), so rounding does not add up.
 */

const word = new Float64Array(1);
const half = new Uint32Array(word.buffer); // little-endian on every engine that runs spreadsheets
const SPLITTER = 134217729; // 2^27 + 1
const SMALLEST_NORMAL = 2 ** -1022;

/** A positive value as (high + low) * 2^exponent; the mantissa may have drifted a little from [1, 2). */
export interface Scaled {
  high: number;
  low: number;
  exponent: number;
}

/** Base-2 exponent of a positive finite number: 2^e <= x < 2^(e+1), subnormal numbers too. */
export function exponentOf(x: number): number {
  word[0] = x;
  const bits = (half[1] >>> 20) & 0x7ff;
  if (bits > 0) return bits - 1023;
  word[0] = x * 2 ** 54;
  return ((half[1] >>> 20) & 0x7ff) - 1023 - 54;
}

/** 2^n, -1022 <= n <= 1023; `2 ** n` takes many times as long. */
function powerOf2(n: number): number {
  half[0] = 0;
  half[1] = (n + 1023) << 20;
  return word[0];
}

/** x * 2^n, rounded once where it ends among the subnormal numbers; n may take any double to any other. */
export function timesPowerOf2(x: number, n: number): number {
  if (n >= -1022 && n <= 1023) return x * powerOf2(n);
  if (n > 0) return n > 3000 ? x * Infinity : timesPowerOf2(x * 2 ** 1000, n - 1000);
  if (x === 0 || n < -2200) return x * 0;
  const exponent = exponentOf(Math.abs(x));
  if (exponent + n >= -1022) return timesPowerOf2(x * 2 ** -1000, n + 1000); // exact: no subnormal number on the way
  const near = timesPowerOf2(x, -1000 - exponent); // exact, about 2^-1000
  const rest = n + 1000 + exponent;
  return rest < -1022 ? x * 0 : near * powerOf2(rest);
}

/** The rounding error of the product p = a * b. */
export function productError(a: number, b: number, p: number): number {
  const ca = SPLITTER * a;
  const ah = ca - (ca - a);
  const al = a - ah;
  const cb = SPLITTER * b;
  const bh = cb - (cb - b);
  const bl = b - bh;
  return al * bl - (p - ah * bh - al * bh - ah * bl);
}

/** The mantissa in [1, 2) of a positive number. */
function mantissaOf(x: number): number {
  word[0] = x >= SMALLEST_NORMAL ? x : x * 2 ** 54;
  half[1] = (half[1] & 0x000fffff) | 0x3ff00000;
  return word[0];
}

function multiply(into: Scaled, factor: number): void {
  const m = mantissaOf(factor);
  const p = into.high * m;
  into.low = productError(into.high, m, p) + into.low * m;
  into.high = p;
  into.exponent += exponentOf(factor);
  rescale(into);
}

function divide(into: Scaled, factor: number): void {
  const m = mantissaOf(factor);
  const q = into.high / m;
  const p = q * m;
  into.low = (into.high - p - productError(q, m, p) + into.low) / m;
  into.high = q;
  into.exponent -= exponentOf(factor);
  rescale(into);
}

/** Brings the mantissa back into [1, 2) after one product or quotient. */
function rescale(value: Scaled): void {
  if (value.high >= 2) {
    value.high /= 2;
    value.low /= 2;
    value.exponent++;
  } else if (value.high < 1) {
    value.high *= 2;
    value.low *= 2;
    value.exponent--;
  }
}

/** Product of the numerators over the product of the denominators, all positive and finite. */
export function scaledQuotient(numerators: readonly number[], denominators: readonly number[] = []): Scaled {
  const result: Scaled = { high: 1, low: 0, exponent: 0 };
  for (const factor of numerators) multiply(result, factor);
  for (const factor of denominators) divide(result, factor);
  return result;
}

/** The same as a double; 0 if a numerator is 0; Infinity when too large. Signs are not handled: all factors >= 0. */
export function quotient(numerators: readonly number[], denominators: readonly number[] = []): number {
  if (numerators.includes(0)) return 0;
  const { high, low, exponent } = scaledQuotient(numerators, denominators);
  return timesPowerOf2(high + low, exponent);
}

/** Square root of that quotient. */
export function quotientRoot(numerators: readonly number[], denominators: readonly number[] = []): number {
  if (numerators.includes(0)) return 0;
  const { high, low, exponent } = scaledQuotient(numerators, denominators);
  const odd = exponent & 1;
  return timesPowerOf2(Math.sqrt((high + low) * (odd ? 2 : 1)), (exponent - odd) / 2);
}

/** sqrt(x^2 + y^2) without overflow; `Math.hypot` is many times slower and its last bits are the engine's choice. */
export function magnitude(x: number, y: number): number {
  const a = Math.abs(x);
  const b = Math.abs(y);
  const most = a > b ? a : b;
  const least = a > b ? b : a;
  if (most < 1e150 && least > 1e-140) return Math.sqrt(a * a + b * b);
  if (least === 0 || least < most * 1e-17) return most;
  const scale = -exponentOf(most);
  const p = timesPowerOf2(most, scale);
  const q = timesPowerOf2(least, scale);
  return timesPowerOf2(Math.sqrt(p * p + q * q), -scale);
}

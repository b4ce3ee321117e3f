/** Distances between a double and an exact value, counted in units in the last place. */
import { all, type BigNumber, create } from "mathjs";

/** mathjs with 90 digits: the outside judge of every ulp budget. */
export const math = create(all, { number: "BigNumber", precision: 90 });
export type Big = BigNumber;

/** A number of any kind at 90 digits; a double is taken as the binary fraction that it is, a text as its decimal digits. */
export function big(value: number | string | Big): Big {
  if (typeof value !== "number") return math.bignumber(value);
  if (!Number.isFinite(value) || value === 0) return math.bignumber(String(value));
  const { mantissa, exponent } = parts(value);
  return math.bignumber(mantissa.toString()).times(math.bignumber(2).pow(exponent));
}

function parts(value: number): { mantissa: bigint; exponent: number } {
  const bits = new BigUint64Array(new Float64Array([value]).buffer)[0];
  const biased = Number((bits >> 52n) & 0x7ffn);
  const fraction = bits & 0xfffffffffffffn;
  const mantissa = biased === 0 ? fraction : fraction | 0x10000000000000n;
  return { mantissa: value < 0 ? -mantissa : mantissa, exponent: Math.max(biased, 1) - 1075 };
}

/** Size of the last place of the double nearest to `exact`; 2^-1074 in the subnormal range. */
export function lastPlace(exact: Big): Big {
  if (exact.isZero()) return math.bignumber(2).pow(-1074);
  const near = Math.abs(Number(exact.toPrecision(30)));
  const exponent = near === Infinity ? 971 : parts(near || Number.MIN_VALUE).exponent;
  return math.bignumber(2).pow(exponent);
}

/** |actual - exact| in units in the last place of the exact value; a fraction of a place counts as such. */
export function ulpsApart(actual: number, exact: number | string | Big): number {
  const target = big(exact);
  if (!Number.isFinite(actual)) return Infinity;
  return big(actual).minus(target).abs().div(lastPlace(target)).toNumber();
}

/** |actual - exact| / |exact|; 0 if both are 0. */
export function relativeError(actual: number, exact: number | string | Big): number {
  const target = big(exact);
  if (!Number.isFinite(actual)) return Infinity;
  const difference = big(actual).minus(target).abs();
  return difference.isZero() ? 0 : difference.div(target.abs()).toNumber();
}

/** Half of the last printed digit: printedTolerance("0.145") is 0.0005, printedTolerance("1.2e3") is 50. */
export function printedTolerance(printed: string): number {
  const [, decimals = "", exponent = "0"] = /^[-+]?\d*\.?(\d*)(?:e([-+]?\d+))?$/i.exec(printed) ?? [];
  return 0.5 * Number(`1e${Number(exponent) - decimals.length}`);
}

const word = new Float64Array(1);
const bits = new BigInt64Array(word.buffer);

/** The next double away from 0 (steps > 0) or towards it (steps < 0), for positive x. */
export function stepped(x: number, steps: number): number {
  word[0] = x;
  bits[0] += BigInt(steps);
  return word[0];
}

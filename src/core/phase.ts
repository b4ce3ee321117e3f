import { NumericError } from "./errors";
import { exponentOf, timesPowerOf2 } from "./exact";
import { type DampingModel, requireMount } from "./transmissibility";

const DEGREES = 180 / Math.PI;

/**
 * Phase lag of the item behind the base, degrees, continuous, 0 to 180.
 *
 * viscous: atan2(b r^2, q + b^2), hysteretic: atan2(eta r^2, q + eta^2), with q = 1 - r^2, b = 2 zeta r. As the
 * difference of two arctangents the small lags would be lost.
 *
 * @throws outside-domain as `absoluteTransmissibility`; pole when undamped at resonance
 */
export function absolutePhase(f: number, fn: number, zeta: number, model: DampingModel): number {
  const { r, x, q } = ratios(f, fn, zeta);
  if (zeta === 0) return undamped(q);
  if (model === "hysteretic") {
    const eta = 2 * zeta;
    if (r <= 1) return eta > 1 ? lag(r * r, q / eta + eta) : lag(eta * r * r, q + eta * eta);
    return eta > 1 ? lag(1, q / eta + eta * x * x) : lag(eta, q + eta * x * (eta * x));
  }
  if (r <= 1) {
    const b = 2 * zeta * r;
    return b > 1 ? lag(r * r, q / b + b) : lag(b * r * r, q + b * b);
  }
  // Both terms divided by r^3: q is (x^2 - 1) there
  return zeta > 1 ? lag(2, x * (q / zeta) + 4 * (x * zeta)) : lag(2 * zeta, x * (q + 4 * zeta * zeta));
}

/** Phase lag of the relative motion (item minus base) behind the base, degrees, 0 to 180: atan2(b, q). */
export function relativePhase(f: number, fn: number, zeta: number, model: DampingModel): number {
  const { r, x, q } = ratios(f, fn, zeta);
  if (zeta === 0) return undamped(q);
  if (model === "hysteretic") return r <= 1 ? lag(2 * zeta, q) : lag(2 * zeta * x * x, q);
  return r <= 1 ? lag(2 * zeta * r, q) : lag(2 * zeta * x, q);
}

/** r, its inverse x, and q = 1 - r^2 (divided by r^2 when r > 1). */
function ratios(f: number, fn: number, zeta: number) {
  requireMount(f, fn, zeta);
  const scale = -exponentOf(f > fn ? f : fn);
  const F = timesPowerOf2(f, scale);
  const N = timesPowerOf2(fn, scale);
  const unit = f <= fn ? N : F;
  return { r: f / fn, x: fn / f, q: ((N - F) * (N + F)) / (unit * unit) };
}

function undamped(q: number): number {
  if (q === 0) throw new NumericError("pole", "an undamped mount has no phase at resonance");
  return q > 0 ? 0 : 180;
}

function lag(opposite: number, adjacent: number): number {
  return Math.atan2(opposite, adjacent) * DEGREES;
}

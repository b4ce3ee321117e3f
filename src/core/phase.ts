import { NumericError } from "./errors";
import { exponentOf, quotient, timesPowerOf2 } from "./exact";
import { type DampingModel, halfDamping, requireMount } from "./transmissibility";

const DEGREES = 180 / Math.PI;

/**
 * Phase lag of the item behind the base, degrees, continuous, 0 to 180.
 *
 * viscous: atan2(b r^2, q + b^2), hysteretic: atan2(eta r^2, q + eta^2), with q = 1 - r^2, b = 2 zeta r. As the
 * difference of two arctangents the small lags would be lost. Both terms are divided by r^2 where r > 1, and by b^2
 * where damping governs, so that neither overflows.
 *
 * @throws outside-domain as `absoluteTransmissibility`; pole when undamped at resonance
 */
export function absolutePhase(f: number, fn: number, zeta: number, model: DampingModel): number {
  const q = detuning(f, fn, zeta);
  if (zeta === 0) return undamped(q);
  const viscous = model === "viscous";
  if (f <= fn) {
    const h = halfDamping(f, fn, zeta, model);
    if (h > 0.5) return lag([0.5, f, f], [fn, fn, h], q / h / h / 4 + 1);
    return viscous
      ? lag([2, zeta, f, f, f], [fn, fn, fn], q + 4 * h * h)
      : lag([2, zeta, f, f], [fn, fn], q + 4 * h * h);
  }
  const h = viscous ? zeta : quotient([zeta, fn], [f]); // half of b/r
  if (h > 0.5) return lag(viscous ? [0.5, f] : [0.5, f, f], viscous ? [fn, zeta] : [fn, fn, zeta], q / h / h / 4 + 1);
  return lag(viscous ? [2, zeta, f] : [2, zeta], viscous ? [fn] : [], q + 4 * h * h);
}

/** Phase lag of the relative motion (item minus base) behind the base, degrees, 0 to 180: atan2(b, q). */
export function relativePhase(f: number, fn: number, zeta: number, model: DampingModel): number {
  const q = detuning(f, fn, zeta);
  if (zeta === 0) return undamped(q);
  if (model === "hysteretic") return f <= fn ? lag([2, zeta], [], q) : lag([2, zeta, fn, fn], [f, f], q);
  return f <= fn ? lag([2, zeta, f], [fn], q) : lag([2, zeta, fn], [f], q);
}

/** 1 - r^2, divided by r^2 where r > 1. */
function detuning(f: number, fn: number, zeta: number): number {
  requireMount(f, fn, zeta);
  const scale = -exponentOf(f > fn ? f : fn);
  const F = timesPowerOf2(f, scale);
  const N = timesPowerOf2(fn, scale);
  const unit = f <= fn ? N : F;
  return ((N - F) * (N + F)) / (unit * unit);
}

function undamped(q: number): number {
  if (q === 0) throw new NumericError("pole", "an undamped mount has no phase at resonance");
  return q > 0 ? 0 : 180;
}

/** Angle of a point above the axis; its height is a quotient of products, so that the least lag keeps its digits. */
function lag(numerators: number[], denominators: number[], adjacent: number): number {
  const opposite = quotient(numerators, denominators);
  if (opposite > 1e-9 * adjacent) return Math.atan2(opposite, adjacent) * DEGREES;
  return quotient([DEGREES, ...numerators], [...denominators, adjacent]); // the angle is its tangent
}

import { finite, NumericError, reject, requireAbove, requireAtLeast } from "./errors";
import { productError, quotient } from "./exact";
import { peakTransmissibility, relativePeak, squaredPeakOffset } from "./peak";
import { absoluteFactors, type DampingModel, relativeFactors } from "./transmissibility";

/** Which end of the range of responses. */
export type Bound = "max" | "min";

/** A box of operating conditions: f in [lowest, highest], fn (1 -+ a), zeta (1 -+ b). */
export interface Box {
  lowest: number;
  highest: number;
  fn: number;
  zeta: number;
  /** a, tolerance on the natural frequency as a fraction, 0 <= a < 1 */
  fnTolerance: number;
  /** b, tolerance on the damping ratio as a fraction, 0 <= b <= 1 */
  zetaTolerance: number;
}

/** A frequency against a natural frequency that is known as the sum of two doubles. */
interface Corner {
  f: number;
  fn: number;
  fnLow: number;
}

/**
 * Exact worst (or best) absolute transmissibility over the box.
 *
 * T falls with damping below sqrt 2 fn and rises above it, and over frequency it has one peak, so the answer lies at a
 * corner or, when the peak of the least damping is inside, there. No sampling.
 *
 * @throws outside-domain for a bad box; pole when undamped resonance lies inside and `max` is asked
 */
export function transmissibilityBound(box: Box, bound: Bound, model: DampingModel): number {
  const { left, right, least, most } = corners(box);
  const at = (corner: Corner, zeta: number) => {
    const { numerators, denominators } = absoluteFactors(corner.f, corner.fn, zeta, model, corner.fnLow);
    return finite("transmissibility", quotient(numerators, denominators));
  };
  if (bound === "min") {
    return lesser(left, right, most, (corner) => at(corner, isolates(corner) ? least : most));
  }
  const peak = squaredPeakOffset(least, model);
  if (squaredOffset(left) > peak) return at(left, isolates(left) ? most : least);
  if (squaredOffset(right) < peak) return at(right, least);
  return peakTransmissibility(least, model);
}

/**
 * The same for the relative transmissibility, the room that the mount needs. R falls with damping everywhere; its peak
 * over frequency lies at 1/sqrt(1 - 2 zeta^2) viscous (none from zeta = 1/sqrt 2 on), sqrt(1 + eta^2) hysteretic.
 */
export function relativeBound(box: Box, bound: Bound, model: DampingModel): number {
  const { left, right, least, most } = corners(box);
  const at = (corner: Corner, zeta: number) => {
    const { numerators, denominators } = relativeFactors(corner.f, corner.fn, zeta, model, corner.fnLow);
    return finite("relative transmissibility", quotient(numerators, denominators));
  };
  if (bound === "min") return lesser(left, right, most, (corner) => at(corner, most));
  const peak = relativePeak(least, model);
  if (peak === undefined || squaredOffset(right) < peak.squaredOffset) return at(right, least);
  if (squaredOffset(left) > peak.squaredOffset) return at(left, least);
  if (peak.value === Infinity) {
    throw new NumericError(
      "pole",
      "the range holds the resonance of an undamped mount, where nothing bounds the motion",
    );
  }
  return peak.value;
}

/** The smaller value of the two ends; an end at the resonance of an undamped mount bounds nothing unless both are. */
function lesser(left: Corner, right: Corner, most: number, at: (corner: Corner) => number): number {
  const ends = [left, right].filter((corner) => most > 0 || squaredOffset(corner) !== 0);
  return ends.length === 0 ? at(left) : Math.min(...ends.map(at));
}

function corners(box: Box) {
  requireAtLeast("lowest frequency", box.lowest, 0);
  requireAtLeast("highest frequency", box.highest, 0);
  requireAbove("natural frequency", box.fn, 0);
  requireAtLeast("damping ratio", box.zeta, 0);
  if (!(box.fnTolerance >= 0 && box.fnTolerance < 1)) {
    reject("natural frequency tolerance", box.fnTolerance, "0 or more and below 1");
  }
  if (!(box.zetaTolerance >= 0 && box.zetaTolerance <= 1)) {
    reject("damping tolerance", box.zetaTolerance, "from 0 to 1");
  }
  if (box.lowest > box.highest) {
    throw new NumericError(
      "outside-domain",
      `lowest frequency ${box.lowest} is above highest frequency ${box.highest}`,
    );
  }
  return {
    left: { f: box.lowest, ...scaleExactly(box.fn, box.fnTolerance) },
    right: { f: box.highest, ...scaleExactly(box.fn, -box.fnTolerance) },
    least: box.zeta * (1 - box.zetaTolerance),
    most: finite("damping ratio", box.zeta * (1 + box.zetaTolerance)),
  };
}

/** fn (1 + tolerance) as a sum of two doubles: one rounding beside an undamped resonance could cost every digit. */
function scaleExactly(fn: number, tolerance: number): { fn: number; fnLow: number } {
  const factor = 1 + tolerance;
  const factorLow = tolerance - (factor - 1);
  const high = fn * factor;
  requireAbove("natural frequency", finite("natural frequency", high), 0);
  const safe = high > 1e-280 && high < 1e290;
  const low = (safe ? productError(fn, factor, high) : 0) + fn * factorLow;
  const sum = high + low;
  return { fn: sum, fnLow: low - (sum - high) };
}

/** r^2 - 1 at a corner, to its own last digits however close to resonance. */
function squaredOffset({ f, fn, fnLow }: Corner): number {
  return ((f - fn - fnLow) / fn) * (f / fn + 1);
}

/** Whether f is at or above sqrt 2 fn, where damping starts to hurt. */
function isolates(corner: Corner): boolean {
  return squaredOffset(corner) >= 1;
}

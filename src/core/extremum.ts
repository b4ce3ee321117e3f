/** A smooth curve read one place at a time; `moveTo` sets the three numbers. */
export interface Curve {
  value: number;
  slope: number;
  bend: number;
  moveTo(t: number): void;
}

const CLOSE = 1e-7; // Newton squares this distance, and the value sees the square of that again

/**
 * Largest |value| on a..b, both ends counted, where the slope turns at most once or its bend does (so a..b must be
 * short against the curve's periods: one radian of the fastest part is).
 */
export function largestOn(curve: Curve, a: number, b: number): number {
  curve.moveTo(a);
  const slopeA = curve.slope;
  const bendA = curve.bend;
  let best = Math.abs(curve.value);
  curve.moveTo(b);
  const slopeB = curve.slope;
  best = Math.max(best, Math.abs(curve.value));
  if (slopeA * slopeB < 0) return Math.max(best, stationaryValue(curve, a, b, slopeA));
  if (bendA * curve.bend >= 0) return best;
  const turn = inflection(curve, a, b, bendA);
  const slopeTurn = curve.slope;
  if (slopeA * slopeTurn >= 0) return best;
  best = Math.max(best, stationaryValue(curve, a, turn, slopeA));
  return Math.max(best, stationaryValue(curve, turn, b, slopeTurn));
}

/** |value| where the slope, of opposite signs at the ends, vanishes: Newton's method kept inside the bracket. */
function stationaryValue(curve: Curve, a: number, b: number, slopeA: number): number {
  let low = a;
  let high = b;
  let t = (a + b) / 2;
  for (let round = 0; round < 60; round++) {
    curve.moveTo(t);
    if (curve.slope === 0) break;
    if (curve.slope > 0 === slopeA > 0) low = t;
    else high = t;
    let next = t - curve.slope / curve.bend;
    if (!(next > low && next < high)) next = (low + high) / 2;
    const done = Math.abs(next - t) <= CLOSE * (b - a);
    t = next;
    if (done) {
      curve.moveTo(t);
      break;
    }
  }
  return Math.abs(curve.value);
}

/** Place where the bend changes sign, by bisection; the curve is left there. */
function inflection(curve: Curve, a: number, b: number, bendA: number): number {
  let low = a;
  let high = b;
  let t = (a + b) / 2;
  for (let round = 0; round < 30; round++) {
    curve.moveTo(t);
    if (curve.bend > 0 === bendA > 0) low = t;
    else high = t;
    t = (low + high) / 2;
  }
  curve.moveTo(t);
  return t;
}

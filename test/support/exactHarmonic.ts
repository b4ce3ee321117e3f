/** The harmonic response of a mass on a moving base at 90 digits, each quantity as textbooks define it. */
import { type Big, big, math } from "./ulps";

export type Model = "viscous" | "hysteretic";

const one = big(1);
const two = big(2);

/** 1 - r^2, 2 - r^2 (exact in fn and f before they are divided) and the damping term b of X/U = (1 + ib)/(1 - r^2 + ib). */
function terms(f: number | Big, fn: number | Big, zeta: number | Big, model: Model) {
  const F = big(f);
  const N = big(fn);
  const r = F.div(N);
  const detuning = N.minus(F).times(N.plus(F)).div(N.times(N));
  const fromRoot2 = F.times(F).minus(two.times(N).times(N)).div(N.times(N));
  const b = two.times(big(zeta)).times(model === "viscous" ? r : one);
  return { r, detuning, fromRoot2, b };
}

const length = (x: Big, y: Big): Big => x.times(x).plus(y.times(y)).sqrt();

export function exactAbsolute(f: number | Big, fn: number | Big, zeta: number | Big, model: Model): Big {
  const { detuning, b } = terms(f, fn, zeta, model);
  return length(one, b).div(length(detuning, b));
}

export function exactRelative(f: number | Big, fn: number | Big, zeta: number | Big, model: Model): Big {
  const { r, detuning, b } = terms(f, fn, zeta, model);
  return r.times(r).div(length(detuning, b));
}

/** 1 - T = r^2 (r^2 - 2)/(D (D + N)): 1 minus a T rounded to 90 digits would lose what r = 1e-100 leaves of it. */
export function exactEfficiency(f: number, fn: number, zeta: number, model: Model): Big {
  const { r, detuning, fromRoot2, b } = terms(f, fn, zeta, model);
  const D = length(detuning, b);
  return r
    .times(r)
    .times(fromRoot2)
    .div(D.times(D.plus(length(one, b))));
}

const degrees = big(180).div(math.bignumber(math.pi));

const atan2 = math.atan2 as unknown as (y: Big, x: Big) => Big; // the library's types know plain numbers only

/** Angle of the point (x, y), degrees, y >= 0; small angles by their series, which keeps every digit of y/x = 1e-300. */
function angle(y: Big, x: Big): Big {
  if (y.isZero()) return x.isNegative() ? big(180) : big(0);
  const ratio = y.div(x);
  if (ratio.abs().lt("1e-30")) return ratio.times(degrees).plus(x.isNegative() ? 180 : 0); // next term: ratio^2/3
  return big(atan2(y, x)).times(degrees);
}

/** Lag of X behind U: argument of (q + ib)(1 - ib), with q = 1 - r^2. */
export function exactAbsolutePhase(f: number, fn: number, zeta: number, model: Model): Big {
  const { r, detuning, b } = terms(f, fn, zeta, model);
  return angle(b.times(r).times(r), detuning.plus(b.times(b)));
}

export function exactRelativePhase(f: number, fn: number, zeta: number, model: Model): Big {
  const { detuning, b } = terms(f, fn, zeta, model);
  return angle(b, detuning);
}

/** sqrt(1 + 8 zeta^2) - 1 without cancellation, and that plus 1. */
function peakRoot(zeta: number | Big): Big {
  const z = big(zeta);
  return one.plus(z.times(z).times(8)).sqrt();
}

export function exactPeakRatio(zeta: number | Big, model: Model): Big {
  return model === "viscous" ? two.div(one.plus(peakRoot(zeta))).sqrt() : one;
}

export function exactPeak(zeta: number | Big, model: Model): Big {
  const z = big(zeta);
  if (model === "hysteretic") return length(one, two.times(z)).div(two.times(z));
  const s = peakRoot(zeta);
  // (s + 1)/sqrt((s - 1)(s + 3)) with s - 1 = 8 zeta^2/(s + 1)
  return s
    .plus(1)
    .times(s.plus(1).sqrt())
    .div(z.times(8).sqrt().times(z.sqrt()).times(s.plus(3).sqrt()));
}

const decibels = big(20).div(math.log(big(10)) as Big);

/** 20 log10 T = 20 log10(1 - E); for small E by its series. */
export function exactLevel(f: number, fn: number, zeta: number, model: Model): Big {
  const E = exactEfficiency(f, fn, zeta, model);
  if (E.abs().lt("1e-30")) return E.plus(E.times(E).div(2)).neg().times(decibels); // next term: E^3/3
  return big(math.log(exactAbsolute(f, fn, zeta, model)) as Big).times(decibels);
}

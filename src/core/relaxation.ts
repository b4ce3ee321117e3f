import { finite, NumericError, requireAbove } from "./errors";
import { exponentOf, magnitude, productError, timesPowerOf2 } from "./exact";
import { requireMount } from "./transmissibility";

/**
 * Absolute transmissibility of a mount whose damper stands on a spring (elastically supported damper, relaxation mount).
 *
 *   k* = k (1 + N i d/(N + i d)),  d = 2 zeta r,  T = |k*| / |k* - m w^2|
 *      = |N + i d (1 + N)| / |N (1 - r^2) + i d (1 + N - r^2)|
 *
 * @param f     frequency, any unit, 0 or more
 * @param fn    natural frequency of the main spring alone, same unit, above 0
 * @param zeta  c/(2 sqrt(k m)), 0 or more
 * @param N     stiffness of the damper's spring over that of the main spring, above 0
 * @returns     dimensionless
 * @throws      outside-domain; pole if zeta = 0 and f = fn
 * @source      series and parallel combination of the complex stiffnesses; the mount of J. E. Ruzicka and others
 */
export function relaxationTransmissibility(f: number, fn: number, zeta: number, N: number): number {
  requireMount(f, fn, zeta);
  requireAbove("series stiffness ratio", N, 0);
  const isolated = f > fn; // then everything is divided by r^2
  const ratio = isolated ? fn / f : f / fn;
  const top = Math.max(1, N);
  const main = 1 / top;
  const series = N / top;
  const d = 2 * zeta * (isolated ? f / fn : ratio);
  finite("damping", d);
  const spring = series / Math.max(1, d);
  const damper = d / Math.max(1, d);
  const soft = detuning(f, fn, 0);
  const stiff = detuning(f, fn, N) / top;
  const dynamic = magnitude(spring * soft, damper * stiff);
  if (dynamic === 0) throw new NumericError("pole", "an undamped mount has no steady response at resonance");
  const T = magnitude(spring, damper * (main + series)) / dynamic;
  return finite("transmissibility", isolated ? T * ratio * ratio : T);
}

/** 1 + N - r^2, above resonance divided by r^2, without cancelling where r^2 is near 1 + N. */
function detuning(f: number, fn: number, N: number): number {
  const unit = Math.max(f, fn);
  if (N > 1e60) return f > fn ? N * (fn / f) * (fn / f) : N;
  const F = timesPowerOf2(f, -exponentOf(unit));
  const G = timesPowerOf2(fn, -exponentOf(unit));
  const U = timesPowerOf2(unit, -exponentOf(unit));
  const stiffness = (G - F) * (G + F); // N = 0
  if (N === 0) return stiffness / (U * U);
  // N G^2 + G^2 - F^2, each square and product with its rounding error
  const gg = G * G;
  const ff = F * F;
  const extra = N * gg;
  const difference = gg - ff;
  const sum = extra + difference;
  const lost = sumError(gg, -ff, difference) + sumError(extra, difference, sum);
  const gError = productError(G, G, gg);
  const errors = gError + N * gError + productError(N, gg, extra) - productError(F, F, ff) + lost;
  return (sum + errors) / (U * U);
}

/** The rounding error of the sum s = a + b. */
function sumError(a: number, b: number, s: number): number {
  const part = s - a;
  return a - (s - part) + (b - part);
}

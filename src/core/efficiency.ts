import { exponentOf, magnitude, productError, timesPowerOf2 } from "./exact";
import { finite } from "./errors";
import { absoluteTransmissibility, type DampingModel, hystereticTransmissibility, requireMount } from "./transmissibility";

/**
 * Isolation efficiency 1 - T as a fraction, negative where the mount amplifies.
 *
 * 1 - T = (D^2 - N^2) / (D (D + N)) with N, D the numerator and denominator of T, and D^2 - N^2 = r^2 (r^2 - 2):
 * the difference 1 - T itself loses every digit near sqrt 2 fn and for small r.
 *
 * @param f, fn, zeta as in `absoluteTransmissibility`
 * @throws  outside-domain, pole as there
 */
export function isolationEfficiency(f: number, fn: number, zeta: number, model: DampingModel): number {
  requireMount(f, fn, zeta);
  const T = model === "viscous" ? absoluteTransmissibility(f, fn, zeta) : hystereticTransmissibility(f, fn, zeta);
  if (T < 0.5 || T > 2) return 1 - T; // no cancellation, and a T beyond 2 is known to its own last bits
  return finite("isolation efficiency", byDifference(f, fn, zeta, model));
}

/** Transmissibility level 20 log10 T, dB; -infinity never arises because T > 0 wherever it is representable. */
export function transmissibilityLevel(f: number, fn: number, zeta: number, model: DampingModel): number {
  const E = isolationEfficiency(f, fn, zeta, model);
  if (E < 0.5 && E > -1) return (20 / Math.LN10) * Math.log1p(-E);
  const T = model === "viscous" ? absoluteTransmissibility(f, fn, zeta) : hystereticTransmissibility(f, fn, zeta);
  return finite("transmissibility level", 20 * Math.log10(T));
}

function byDifference(f: number, fn: number, zeta: number, model: DampingModel): number {
  const scale = -exponentOf(f > fn ? f : fn);
  const F = timesPowerOf2(f, scale);
  const N = timesPowerOf2(fn, scale);
  const ratio = F / N; // T is within a factor of 2 of 1 only if r is small or of order 1, or zeta is large
  const F2 = F * F;
  const N2 = 2 * N * N;
  const fromRoot2 = F2 - N2 + (productError(F, F, F2) - 2 * productError(N, N, N2 / 2)); // f^2 - 2 fn^2
  const detuning = (N - F) * (N + F);
  if (model === "hysteretic") {
    const eta = Math.min(2 * zeta, Number.MAX_VALUE);
    const D = magnitude(detuning / (N * N), eta);
    return (((ratio * ratio) / D) * (fromRoot2 / (N * N))) / (D + magnitude(1, eta));
  }
  if (ratio <= 1) {
    const b = Math.min(2 * zeta * ratio, Number.MAX_VALUE);
    const D = magnitude(detuning / (N * N), b);
    return (((ratio * ratio) / D) * (fromRoot2 / (N * N))) / (D + magnitude(1, b));
  }
  const x = N / F;
  const b = Math.min(2 * zeta * x, Number.MAX_VALUE);
  const D = magnitude(detuning / F2, b);
  return fromRoot2 / F2 / D / (D + magnitude(x * x, b));
}

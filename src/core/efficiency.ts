import { exponentOf, magnitude, productError, quotient, scaledQuotient, timesPowerOf2 } from "./exact";
import {
  absoluteFactors,
  absoluteTransmissibility,
  type DampingModel,
  dynamicHalf,
  hystereticTransmissibility,
  requireMount,
} from "./transmissibility";

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
  return byDifference(f, fn, zeta, model);
}

/** Transmissibility level 20 log10 T, dB, also where T itself is too large or small for a double. */
export function transmissibilityLevel(f: number, fn: number, zeta: number, model: DampingModel): number {
  const { numerators, denominators } = absoluteFactors(f, fn, zeta, model);
  const { high, exponent } = scaledQuotient(numerators, denominators); // T = high * 2^exponent
  if (exponent < -2 || exponent > 1) return 20 * Math.LN2 * Math.LOG10E * (Math.log2(high) + exponent);
  return (20 / Math.LN10) * Math.log1p(-isolationEfficiency(f, fn, zeta, model));
}

/** -(numerator difference)/(...) with every part halved, and divided by r^2 where r > 1, so that none overflows. */
function byDifference(f: number, fn: number, zeta: number, model: DampingModel): number {
  const scale = -exponentOf(f > fn ? f : fn);
  const F = timesPowerOf2(f, scale);
  const N = timesPowerOf2(fn, scale);
  const F2 = F * F;
  const N2 = N * N;
  const fromRoot2 = F2 - 2 * N2 + (productError(F, F, F2) - 2 * productError(N, N, N2)); // f^2 - 2 fn^2
  const { dynamic, dampingHalf } = dynamicHalf(f, fn, zeta, model);
  const still = magnitude(f <= fn ? 0.5 : N2 / F2 / 2, dampingHalf);
  const numerators = [Math.abs(fromRoot2)];
  const denominators = [dynamic, dynamic / 2 + still / 2, 8];
  if (f <= fn) {
    numerators.push(F, F);
    denominators.push(N, N, N, N);
  } else {
    denominators.push(F, F);
  }
  const size = quotient(numerators, denominators);
  return fromRoot2 < 0 ? 0 - size : size;
}

import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { exponentOf, magnitude, quotient, timesPowerOf2 } from "./exact";

/** How the mount loses energy: a damper (force proportional to velocity) or a complex stiffness k(1 + i eta), eta = 2 zeta. */
export type DampingModel = "viscous" | "hysteretic";

/** Throws unless frequency >= 0, natural frequency > 0 and damping ratio >= 0, all finite. */
export function requireMount(f: number, fn: number, zeta: number): void {
  requireAtLeast("frequency", f, 0);
  requireAbove("natural frequency", fn, 0);
  requireAtLeast("damping ratio", zeta, 0);
}

/**
 * Absolute transmissibility of a mass on a spring and viscous damper whose base moves.
 *
 *   T = |1 + 2 i zeta r| / |1 - r^2 + 2 i zeta r|,  r = f / fn
 *
 * @param f     excitation frequency, any unit, f >= 0
 * @param fn    undamped natural frequency, same unit, fn > 0
 * @param zeta  damping / critical damping, dimensionless, zeta >= 0
 * @returns     T, dimensionless; 1 at f = 0; 1 at f = sqrt 2 fn for every zeta
 * @throws      outside-domain if an argument leaves its range; pole if zeta = 0 and f = fn
 * @source      derived from m x'' + c (x' - u') + k (x - u) = 0 with u = U exp(i w t)
 */
export function absoluteTransmissibility(f: number, fn: number, zeta: number): number {
  if (fn > 1e-60 && fn < 1e60 && f >= 0 && f < 1e60 && zeta >= 0 && zeta < 1e30) {
    const detuning = (fn - f) * (fn + f); // fn^2 - f^2 cancels beside resonance: off by 48 % at worst
    const damping = 2 * zeta * f * fn;
    const damping2 = damping * damping;
    const stiffness = fn * fn;
    const T = Math.sqrt((stiffness * stiffness + damping2) / (detuning * detuning + damping2));
    if (T > 1e-140 && T < 1e20) return T;
  }
  return transmissibility(f, fn, zeta, "viscous");
}

/**
 * The same for a hysteretic (structural) damper: T = sqrt(1 + eta^2) / |1 - r^2 + i eta|, eta = 2 zeta.
 * Arguments, domain and errors as {@link absoluteTransmissibility}.
 * @source derived from m x'' + k (1 + i eta) (x - u) = 0
 */
export function hystereticTransmissibility(f: number, fn: number, zeta: number): number {
  return transmissibility(f, fn, zeta, "hysteretic");
}

/**
 * Relative transmissibility |Z/U|, Z = X - U the stretch of the mount: r^2 / |1 - r^2 + 2 i zeta r|.
 * Arguments, domain and errors as {@link absoluteTransmissibility}; 0 at f = 0, tends to 1 far above resonance.
 */
export function relativeTransmissibility(f: number, fn: number, zeta: number): number {
  if (fn > 1e-60 && fn < 1e60 && f > 1e-60 && f < 1e60 && zeta >= 0 && zeta < 1e30) {
    const detuning = (fn - f) * (fn + f);
    const damping = 2 * zeta * f * fn;
    const R = (f * f) / Math.sqrt(detuning * detuning + damping * damping);
    if (R < 1e20) return R;
  }
  return relativeByModel(f, fn, zeta, "viscous");
}

/** The same for a hysteretic damper: r^2 / |1 - r^2 + i eta|. */
export function hystereticRelativeTransmissibility(f: number, fn: number, zeta: number): number {
  return relativeByModel(f, fn, zeta, "hysteretic");
}

/**
 * Absolute transmissibility for whole columns: out[i] = T(f[i], fn[i], zeta[i]); the columns have one length.
 * @throws as {@link absoluteTransmissibility} at the first row that has no answer
 */
export function absoluteTransmissibilities(
  f: Float64Array,
  fn: Float64Array,
  zeta: Float64Array,
  out: Float64Array,
): void {
  for (let i = 0; i < out.length; i++) out[i] = absoluteTransmissibility(f[i], fn[i], zeta[i]);
}

function transmissibility(f: number, fn: number, zeta: number, model: DampingModel): number {
  const { numerators, denominators } = absoluteFactors(f, fn, zeta, model);
  return finite("transmissibility", quotient(numerators, denominators));
}

function relativeByModel(f: number, fn: number, zeta: number, model: DampingModel): number {
  const { numerators, denominators } = relativeFactors(f, fn, zeta, model);
  return finite("relative transmissibility", quotient(numerators, denominators));
}

/** A quantity as a quotient of products, so that a caller can multiply further without overflow. All factors are >= 0. */
export interface Factors {
  numerators: number[];
  denominators: number[];
}

/** Absolute transmissibility as factors, for every valid input; `fnLow` is the part of fn below its last bit, if known. */
export function absoluteFactors(f: number, fn: number, zeta: number, model: DampingModel, fnLow = 0): Factors {
  requireMount(f, fn, zeta);
  const { dynamic, dampingHalf } = dynamicHalf(f, fn, zeta, model, fnLow);
  if (f <= fn) return { numerators: [magnitude(0.5, dampingHalf)], denominators: [dynamic] };
  // divided by r^2: viscous x |x + 2 i zeta|, hysteretic x^2 |1 + i eta|, with x = 1/r
  if (model === "hysteretic") {
    return { numerators: [fn, fn, magnitude(0.5, zeta)], denominators: [f, f, dynamic] };
  }
  if (zeta === 0) return { numerators: [fn, fn, 0.5], denominators: [f, f, dynamic] };
  const up = zeta < 1 ? 2 ** 500 : 1; // keeps |x + 2 i zeta| clear of the subnormal numbers
  return { numerators: [fn, magnitude(quotient([fn, up / 2], [f]), zeta * up)], denominators: [f, dynamic, up] };
}

/** Relative transmissibility as factors, for every valid input. */
export function relativeFactors(f: number, fn: number, zeta: number, model: DampingModel, fnLow = 0): Factors {
  requireMount(f, fn, zeta);
  const { dynamic } = dynamicHalf(f, fn, zeta, model, fnLow);
  if (f <= fn) return { numerators: [0.5, f, f], denominators: [fn, fn, dynamic] };
  return { numerators: [0.5], denominators: [dynamic] };
}

/** Half of |1 - r^2 + i b|, divided by r^2 where r > 1; and half of b on the same scale. Halves keep b below overflow. */
export function dynamicHalf(f: number, fn: number, zeta: number, model: DampingModel, fnLow = 0) {
  const top = f > fn ? f : fn;
  const scale = -exponentOf(top);
  const F = timesPowerOf2(f, scale);
  const N = timesPowerOf2(fn, scale);
  const low = timesPowerOf2(fnLow, scale);
  const unit = f <= fn ? N : F;
  const detuningHalf = quotient([Math.abs(N - F + low), N + F + low], [2, unit, unit]);
  const dampingHalf = halfDamping(f, fn, zeta, model);
  const dynamic = magnitude(detuningHalf, dampingHalf);
  if (dynamic === 0) {
    throw new NumericError("pole", "an undamped mount has no steady response at resonance");
  }
  return { dynamic, dampingHalf };
}

/** Half of the damping term b, divided by r^2 where r > 1: zeta r or zeta/r viscous, zeta or zeta/r^2 hysteretic. */
export function halfDamping(f: number, fn: number, zeta: number, model: DampingModel): number {
  if (model === "viscous") return f <= fn ? quotient([zeta, f], [fn]) : quotient([zeta, fn], [f]);
  return f <= fn ? zeta : quotient([zeta, fn, fn], [f, f]);
}

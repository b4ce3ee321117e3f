import { finite, reject, requireAbove, requireAtLeast } from "./errors";
import { magnitude, quotient } from "./exact";
import { staticDeflection, stiffness } from "./mount";
import type { DampingModel } from "./transmissibility";

/**
 * Frequency ratio f/fn from which the efficiency is reached; it exists for every damping.
 *
 * With A = E (2 - E)/(1 - E)^2: viscous r^2 = b + sqrt(b^2 + A), b = 1 + 2 zeta^2 A; hysteretic
 * r^2 = 1 + sqrt(1 + A (1 + 4 zeta^2)). Both solve T(r) = 1 - E for r > sqrt 2.
 *
 * @param efficiency 1 - T as a fraction, 0 < E < 1
 * @param zeta       damping ratio, >= 0
 */
export function requiredFrequencyRatio(efficiency: number, zeta: number, model: DampingModel): number {
  if (!(efficiency > 0 && efficiency < 1)) reject("isolation efficiency", efficiency, "above 0 and below 1");
  requireAtLeast("damping ratio", zeta, 0);
  const rootA = Math.sqrt(efficiency * (2 - efficiency)) / (1 - efficiency);
  if (model === "hysteretic") {
    const w = magnitude(1, magnitude(1, 2 * zeta) * rootA);
    return finite("frequency ratio", Math.sqrt(1 + w));
  }
  const w = zeta * rootA;
  if (w > 1e70) return finite("frequency ratio", 2 * w);
  const b = 1 + 2 * w * w;
  return Math.sqrt(b + magnitude(b, rootA));
}

/** Greatest natural frequency that reaches the efficiency at f, unit of f (> 0). */
export function requiredNaturalFrequency(efficiency: number, f: number, zeta: number, model: DampingModel): number {
  requireAbove("frequency", f, 0);
  return f / requiredFrequencyRatio(efficiency, zeta, model);
}

/** Least static deflection that reaches the efficiency at f (Hz), m; kappa is the dynamic over the static stiffness. */
export function requiredStaticDeflection(
  efficiency: number,
  f: number,
  zeta: number,
  kappa: number,
  model: DampingModel,
): number {
  return staticDeflection(requiredNaturalFrequency(efficiency, f, zeta, model), kappa);
}

/** Greatest total dynamic stiffness that reaches the efficiency at f (Hz) under the mass m (kg), N/m. */
export function requiredStiffness(efficiency: number, f: number, zeta: number, m: number, model: DampingModel): number {
  requireAbove("frequency", f, 0);
  requireAbove("mass", m, 0);
  const r = requiredFrequencyRatio(efficiency, zeta, model);
  if (f / r > 1e-300) return stiffness(f / r, m);
  return finite("stiffness", quotient([m, 2 * Math.PI, f, 2 * Math.PI, f], [r, r]));
}

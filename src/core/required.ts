import { finite, reject, requireAbove, requireAtLeast } from "./errors";
import { quotient, quotientRoot } from "./exact";
import { STANDARD_GRAVITY } from "./mount";
import type { DampingModel } from "./transmissibility";

const TWO_PI = 2 * Math.PI;

/**
 * Square of the frequency ratio f/fn from which the efficiency is reached, as factors; it exists for every damping.
 *
 * With A = E (2 - E)/(1 - E)^2: viscous r^2 = b + sqrt(b^2 + A), b = 1 + 2 zeta^2 A; hysteretic
 * r^2 = 1 + sqrt(1 + A (1 + 4 zeta^2)). Both solve T(r) = 1 - E for r > sqrt 2.
 *
 * @param efficiency 1 - T as a fraction, 0 < E < 1
 * @param zeta       damping ratio, >= 0
 */
function ratioSquared(efficiency: number, zeta: number, model: DampingModel): number[] {
  if (!(efficiency > 0 && efficiency < 1)) reject("isolation efficiency", efficiency, "above 0 and below 1");
  requireAtLeast("damping ratio", zeta, 0);
  const numerators = [efficiency, 2 - efficiency];
  const denominators = [1 - efficiency, 1 - efficiency];
  const A = quotient(numerators, denominators);
  if (zeta * Math.sqrt(A) > 1e70) return model === "viscous" ? [4, A, zeta, zeta] : [2, Math.sqrt(A), zeta];
  const dampedA = quotient([...numerators, zeta, zeta], denominators); // zeta^2 A without overflow of zeta^2
  if (model === "hysteretic") return [1 + Math.sqrt(1 + A + 4 * dampedA)];
  const b = 1 + 2 * dampedA;
  return [b + Math.sqrt(b * b + A)];
}

/** Frequency ratio f/fn from which the efficiency is reached. 0 < efficiency < 1, zeta >= 0. */
export function requiredFrequencyRatio(efficiency: number, zeta: number, model: DampingModel): number {
  return finite("frequency ratio", quotientRoot(ratioSquared(efficiency, zeta, model)));
}

/** Greatest natural frequency that reaches the efficiency at f, unit of f (> 0). */
export function requiredNaturalFrequency(efficiency: number, f: number, zeta: number, model: DampingModel): number {
  requireAbove("frequency", f, 0);
  return quotientRoot([f, f], ratioSquared(efficiency, zeta, model));
}

/** Least static deflection that reaches the efficiency at f (Hz), m; kappa is the dynamic over the static stiffness. */
export function requiredStaticDeflection(
  efficiency: number,
  f: number,
  zeta: number,
  kappa: number,
  model: DampingModel,
): number {
  requireAbove("frequency", f, 0);
  requireAbove("stiffness ratio", kappa, 0);
  const numerators = [kappa, STANDARD_GRAVITY, ...ratioSquared(efficiency, zeta, model)];
  return finite("static deflection", quotient(numerators, [TWO_PI, f, TWO_PI, f]));
}

/** Greatest total dynamic stiffness that reaches the efficiency at f (Hz) under the mass m (kg), N/m. */
export function requiredStiffness(efficiency: number, f: number, zeta: number, m: number, model: DampingModel): number {
  requireAbove("frequency", f, 0);
  requireAbove("mass", m, 0);
  const denominators = ratioSquared(efficiency, zeta, model);
  return finite("stiffness", quotient([m, TWO_PI, f, TWO_PI, f], denominators));
}

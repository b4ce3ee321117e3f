import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { magnitude, quotient } from "./exact";
import type { DampingModel } from "./transmissibility";

/** sqrt(1 + 8 zeta^2), the number on which the viscous peak depends. */
function root(zeta: number): number {
  return magnitude(1, Math.SQRT2 * 2 * zeta);
}

/**
 * Largest absolute transmissibility over frequency.
 *
 * Viscous: with s = sqrt(1 + 8 zeta^2) the peak lies at r^2 = 2/(1 + s) and is (1 + s)/(2 zeta) sqrt((1 + s)/(2 (3 + s)));
 * hysteretic: at r = 1, sqrt(1 + 1/eta^2).
 *
 * @param zeta damping ratio, zeta > 0
 * @throws outside-domain below 0; pole at 0
 */
export function peakTransmissibility(zeta: number, model: DampingModel): number {
  requireAtLeast("damping ratio", zeta, 0);
  if (zeta === 0) throw new NumericError("pole", "an undamped mount has no bound at resonance");
  if (zeta > 1e100) return 1;
  if (model === "hysteretic") return finite("peak transmissibility", magnitude(0.5, zeta) / zeta);
  const s = root(zeta);
  return finite("peak transmissibility", (((1 + s) / 2) * Math.sqrt((1 + s) / (2 * (3 + s)))) / zeta);
}

/** Frequency of the largest absolute transmissibility over the natural frequency: sqrt(2/(1 + s)) viscous, 1 hysteretic. */
export function peakFrequencyRatio(zeta: number, model: DampingModel): number {
  requireAtLeast("damping ratio", zeta, 0);
  if (model === "hysteretic") return 1;
  const s = root(zeta);
  return s < Infinity ? Math.sqrt(2 / (1 + s)) : Math.sqrt(Math.SQRT1_2) / Math.sqrt(zeta);
}

/** Frequency of the peak, in the unit of fn. fn > 0, zeta >= 0. */
export function peakFrequency(fn: number, zeta: number, model: DampingModel): number {
  requireAbove("natural frequency", fn, 0);
  return fn * peakFrequencyRatio(zeta, model);
}

/**
 * Damping ratio whose peak transmissibility is T.
 *
 * Viscous: zeta^2 = T / (2 w^2 (T + w)), w^2 = T^2 - 1; hysteretic: zeta = 1/(2 w).
 * @param T peak transmissibility, T > 1
 */
export function dampingForPeak(T: number, model: DampingModel): number {
  requireAbove("peak transmissibility", T, 1);
  const w = Math.sqrt(T - 1) * Math.sqrt(T + 1);
  if (model === "hysteretic") return 0.5 / w;
  return Math.sqrt(0.5 / (1 + w / T)) / w;
}

/** r^2 - 1 at the peak of the absolute transmissibility: (1 - s)/(1 + s) viscous, whose difference would cancel. */
export function squaredPeakOffset(zeta: number, model: DampingModel): number {
  if (model === "hysteretic") return 0;
  const w = 2 * Math.SQRT2 * zeta;
  return w < 1e20 ? -((w / (1 + root(zeta))) ** 2) : -1;
}

/**
 * Largest relative transmissibility over frequency, and r^2 - 1 there; none (it tends to 1) from zeta = 1/sqrt 2 on.
 * Viscous 1/(2 zeta sqrt(1 - zeta^2)) at r^2 = 1/(1 - 2 zeta^2); hysteretic sqrt(1 + eta^2)/eta at r^2 = 1 + eta^2.
 */
export function relativePeak(zeta: number, model: DampingModel): { squaredOffset: number; value: number } | undefined {
  requireAtLeast("damping ratio", zeta, 0);
  if (model === "hysteretic") {
    return { squaredOffset: 2 * zeta * (2 * zeta), value: zeta === 0 ? Infinity : magnitude(0.5, zeta) / zeta };
  }
  const room = (1 - Math.SQRT2 * zeta) * (1 + Math.SQRT2 * zeta);
  if (room <= 0) return undefined;
  const value = zeta === 0 ? Infinity : quotient([0.5], [zeta, Math.sqrt((1 - zeta) * (1 + zeta))]);
  return { squaredOffset: (2 * zeta * zeta) / room, value };
}

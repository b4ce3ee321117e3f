import { finite, requireAbove, requireAtLeast } from "./errors";
import { quotient, quotientRoot } from "./exact";

export const MOTION_QUANTITIES = ["displacement", "velocity", "acceleration"] as const;
export const MOTION_MEASURES = ["peak", "rms", "peak-to-peak"] as const;
export type MotionQuantity = (typeof MOTION_QUANTITIES)[number];
export type MotionMeasure = (typeof MOTION_MEASURES)[number];

/** A way to state a sinusoidal motion. */
export interface MotionForm {
  quantity: MotionQuantity;
  measure: MotionMeasure;
}

const TWO_PI = 2 * Math.PI;

/**
 * A sinusoidal motion stated another way: each time derivative multiplies the amplitude by 2 pi f; peak = sqrt 2 rms,
 * peak-to-peak = 2 peak.
 *
 * @param value     0 or more, SI unit of `from`
 * @param frequency Hz, above 0
 */
export function convertMotion(value: number, frequency: number, from: MotionForm, to: MotionForm): number {
  requireAtLeast(`${from.quantity} ${from.measure}`, value, 0);
  requireAbove("frequency", frequency, 0);
  const numerators = [value];
  const denominators: number[] = [];
  for (const [form, up, down] of [
    [from, numerators, denominators],
    [to, denominators, numerators],
  ] as const) {
    if (form.measure === "rms" && from.measure !== to.measure) up.push(Math.SQRT2);
    if (form.measure === "peak-to-peak") down.push(2);
    for (let order = MOTION_QUANTITIES.indexOf(form.quantity); order > 0; order--) down.push(TWO_PI, frequency);
  }
  return finite(`${to.quantity} ${to.measure}`, quotient(numerators, denominators));
}

/** Frequency (Hz) where a constant peak displacement (m, > 0) meets a constant peak acceleration (m/s^2, > 0): sqrt(a/d)/(2 pi). */
export function crossoverFrequency(displacement: number, acceleration: number): number {
  requireAbove("displacement", displacement, 0);
  requireAbove("acceleration", acceleration, 0);
  return finite("crossover frequency", quotientRoot([acceleration], [displacement]) / TWO_PI);
}

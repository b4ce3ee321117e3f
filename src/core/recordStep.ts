import type { Curve } from "./extremum";
import { stepOf } from "./oscillator";

/**
 * What one sample interval of theta radians does to a response g with slope g', base acceleration p0 -> p1 along a line:
 *
 *   g1  = g + sine g' - step (g - p0) + ramp (p1 - p0)
 *   g1' = (1 - drop) g' - sine (g - p0) + rampSlope (p1 - p0)
 *
 * exact for any zeta. `ramp` holds the law: absolute acceleration adds 2 zeta times its slope to the deflection's.
 */
export interface Interval {
  theta: number;
  zeta: number;
  absolute: boolean;
  sine: number;
  step: number;
  drop: number;
  ramp: number;
  rampSlope: number;
}

export function intervalOf(theta: number, zeta: number, absolute: boolean): Interval {
  const { sine, step, ramp } = stepOf(theta, zeta);
  const share = absolute ? 2 * zeta : 0;
  return {
    theta,
    zeta,
    absolute,
    sine,
    step,
    drop: step + 2 * zeta * sine,
    ramp: (ramp + share * step) / theta,
    rampSlope: (step + share * sine) / theta,
  };
}

/**
 * The same interval as a recursion on the samples alone, in differences d = g1 - g, which keep their precision where
 * theta is small (a recursion on g itself loses it: its coefficients are rounded against 1):
 *
 *   d1 = decay d + b0 p1 + b1 p + b2 p_before - pull g,  g1 = g + d1
 *
 * b0 + b1 + b2 = pull, so a steady acceleration is followed exactly.
 *
 * @source ramp-invariant filter of D. O. Smallwood, An improved recursive formula for calculating shock response
 *         spectra (1981), and ISO 18431-4, in difference form; derived by eliminating g' from {@link Interval}
 */
export interface Recursion {
  decay: number;
  pull: number;
  b0: number;
  b1: number;
  b2: number;
}

export function recursionOf({ theta, zeta, sine, step, drop, ramp, rampSlope }: Interval): Recursion {
  const decay = Math.exp(-2 * zeta * theta);
  const pull = step * drop + sine * sine;
  const b2 = sine * (sine - rampSlope) - (1 - drop) * (step - ramp);
  return { decay, pull, b0: ramp, b1: pull - ramp - b2, b2 };
}

/** Slope g' at the start of an interval that moved g by d. */
export function slopeBefore({ sine, step, ramp }: Interval, g: number, d: number, p0: number, p1: number): number {
  return (d + step * (g - p0) - ramp * (p1 - p0)) / sine;
}

export function slopeAfter(
  { sine, drop, rampSlope }: Interval,
  g: number,
  slope: number,
  p0: number,
  p1: number,
): number {
  return slope - drop * slope - sine * (g - p0) + rampSlope * (p1 - p0);
}

/** The response inside one interval, for the search of its extreme. */
export class InsideInterval implements Curve {
  value = 0;
  slope = 0;
  bend = 0;
  private g = 0;
  private start = 0;
  private p0 = 0;
  private rise = 0;

  constructor(private readonly interval: Interval) {}

  set(g: number, slope: number, p0: number, p1: number): void {
    this.g = g;
    this.start = slope;
    this.p0 = p0;
    this.rise = (p1 - p0) / this.interval.theta;
  }

  moveTo(t: number): void {
    const { zeta, absolute } = this.interval;
    const { sine, step, ramp } = stepOf(t, zeta);
    const share = absolute ? 2 * zeta : 0;
    const lag = this.g - this.p0;
    this.value = this.g + sine * this.start - step * lag + this.rise * (ramp + share * step);
    this.slope = this.start * (1 - step - 2 * zeta * sine) - sine * lag + this.rise * (step + share * sine);
    this.bend = this.p0 + this.rise * t + share * this.rise - 2 * zeta * this.slope - this.value;
  }
}

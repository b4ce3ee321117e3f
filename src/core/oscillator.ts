import { magnitude } from "./exact";

/**
 * Free and forced steps of g'' + 2 zeta g' + g = p, the single mass in dimensionless time t = 2 pi fn x time.
 * The forced parts are written so that they keep their relative precision as t tends to 0.
 */
export interface Step {
  /** displacement after t from g = 1, g' = 0 */
  cosine: number;
  /** displacement after t from g = 0, g' = 1 */
  sine: number;
  /** displacement after t from rest under p = 1 */
  step: number;
  /** displacement after t from rest under p = t */
  ramp: number;
}

const SERIES_TERMS = 24;

/** Solution of the free and forced oscillator at t >= 0, any zeta >= 0. */
export function stepOf(t: number, zeta: number): Step {
  if (t * Math.max(1, 2 * zeta) < 1) return stepBySeries(t, zeta);
  const sine = freeSine(t, zeta);
  if (zeta > 1) return overdampedStep(t, zeta, sine);
  const step = 1 - freeCosine(t, zeta, sine);
  return { cosine: 1 - step, sine, step, ramp: t - 2 * zeta * step - sine };
}

/** From the slow decay rate s: g' + g/s decays at that rate alone, so step = 1 - exp(-s t) - s sine without cancelling. */
function overdampedStep(t: number, zeta: number, sine: number): Step {
  const { slow } = overdamped(zeta);
  const step = -Math.expm1(-slow * t) - slow * sine;
  return { cosine: 1 - step, sine, step, ramp: bentRamp(slow * t) / slow - slow * step };
}

/** x + exp(-x) - 1. */
function bentRamp(x: number): number {
  if (x > 0.5) return x + Math.expm1(-x);
  let term = (x * x) / 2;
  let sum = term;
  for (let k = 3; k < 18; k++) {
    term *= -x / k;
    sum += term;
  }
  return sum;
}

/** Taylor series of the sine-like solution, integrated twice: the closed forms cancel for small t. */
function stepBySeries(t: number, zeta: number): Step {
  let before = 0; // s_k t^k of sine = sum of s_k t^k, s_0 = 0, s_1 = 1
  let term = t;
  let sine = t;
  let step = (t * t) / 2;
  let ramp = (t * t * t) / 6;
  for (let k = 2; k < SERIES_TERMS; k++) {
    const next = -(2 * zeta * t * term) / k - (t * t * before) / (k * (k - 1));
    before = term;
    term = next;
    sine += term;
    step += (term * t) / (k + 1);
    ramp += (term * t * t) / ((k + 1) * (k + 2));
  }
  return { cosine: 1 - step, sine, step, ramp };
}

/** Displacement after t from g = 0, g' = 1. */
export function freeSine(t: number, zeta: number): number {
  if (zeta <= 1) {
    const omega = Math.sqrt((1 - zeta) * (1 + zeta));
    return Math.exp(-zeta * t) * (omega === 0 ? t : Math.sin(omega * t) / omega);
  }
  const { slow, gamma } = overdamped(zeta);
  return (-Math.exp(-slow * t) * Math.expm1(-2 * gamma * t)) / (2 * gamma);
}

/** Displacement after t from g = 1, g' = 0, given the sine-like solution at t. */
export function freeCosine(t: number, zeta: number, sine: number): number {
  if (zeta <= 1) return Math.exp(-zeta * t) * Math.cos(Math.sqrt((1 - zeta) * (1 + zeta)) * t) + zeta * sine;
  const { slow } = overdamped(zeta);
  return Math.exp(-slow * t) + slow * sine; // (g' + g/slow decays at rate slow)
}

/** Decay rates of an overdamped mount: slow = zeta - gamma and 1/slow. */
function overdamped(zeta: number): { slow: number; gamma: number } {
  const gamma = Math.sqrt((zeta - 1) * (zeta + 1));
  return { slow: 1 / (zeta + gamma), gamma };
}

/**
 * Largest magnitude that a free vibration reaches after its start, the start itself not counted.
 *
 * A free vibration decays from one stationary point to the next, so the first one decides. There
 * g^2 = exp(-2 zeta t) (g0^2 + 2 zeta g0 v0 + v0^2), because that quadratic form decays exactly so.
 */
export function freePeak(g0: number, v0: number, zeta: number): number {
  if (v0 === 0) return 0;
  if (zeta > 1) return overdampedPeak(g0, v0, zeta);
  const omega = Math.sqrt((1 - zeta) * (1 + zeta));
  const lean = g0 + zeta * v0;
  const drive = v0 + zeta * g0;
  const t = firstStationary(omega, v0, lean);
  const peak = Math.exp(-zeta * t) * magnitude(drive, omega * g0);
  return peak > 0 ? peak : 0;
}

/** First t > 0 with tan(omega t)/omega = v/lean, Infinity if there is none. */
function firstStationary(omega: number, v: number, lean: number): number {
  const sign = v < 0 ? -1 : 1;
  if (omega === 0) return v * lean > 0 ? v / lean : Infinity;
  return Math.atan2(omega * v * sign, lean * sign) / omega;
}

function overdampedPeak(g0: number, v0: number, zeta: number): number {
  const { gamma } = overdamped(zeta);
  const ratio = (gamma * v0) / (g0 + zeta * v0);
  if (!(ratio > 0 && ratio < 1)) return 0;
  const { cosine, sine } = stepOf(Math.atanh(ratio) / gamma, zeta);
  return Math.abs(g0 * cosine + v0 * sine);
}

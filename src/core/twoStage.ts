import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { magnitude, quotient } from "./exact";

/** One stage: the mass and the spring and damper below it. SI: kg, N/m, N s/m. */
export interface Stage {
  mass: number;
  stiffness: number;
  damping: number;
}

/**
 * Absolute transmissibility from the base to the upper of two masses, each on its own spring and viscous damper.
 *
 *   T = 1 / |(1 - s1)(1 - s2) - s12|,  s1 = m1 w^2/k1*, s2 = m2 w^2/k2*, s12 = m2 w^2/k1*,  k* = k + i w c
 *
 * @param f      frequency, Hz, 0 or more
 * @param lower  stage between base and lower mass; mass and stiffness above 0, damping 0 or more
 * @param upper  stage between lower and upper mass
 * @returns      dimensionless; 1 at f = 0
 * @throws       outside-domain; pole at an undamped resonance; overflow
 * @source       equations of motion of the two masses, divided by the complex stiffnesses; nothing else left out
 */
export function twoStageTransmissibility(f: number, lower: Stage, upper: Stage): number {
  requireAtLeast("frequency", f, 0);
  requireStage("lower", lower);
  requireStage("upper", upper);
  const omega = 2 * Math.PI * f;
  const s1 = inertiaOverStiffness(lower.mass, omega, lower);
  const s2 = inertiaOverStiffness(upper.mass, omega, upper);
  const s12 = inertiaOverStiffness(upper.mass, omega, lower);
  // each factor is scaled so that their product cannot overflow
  const scale1 = Math.max(1, magnitude(s1.re, s1.im), magnitude(s12.re, s12.im));
  const scale2 = Math.max(1, magnitude(s2.re, s2.im));
  finite("frequency ratio", scale1);
  finite("frequency ratio", scale2);
  const a = { re: (1 - s1.re) / scale1, im: -s1.im / scale1 };
  const b = { re: (1 - s2.re) / scale2, im: -s2.im / scale2 };
  const re = a.re * b.re - a.im * b.im - s12.re / scale1 / scale2;
  const im = a.re * b.im + a.im * b.re - s12.im / scale1 / scale2;
  const dynamic = magnitude(re, im);
  if (dynamic === 0) throw new NumericError("pole", "an undamped two-stage mount has no steady response at resonance");
  return finite("transmissibility", 1 / dynamic / scale1 / scale2);
}

interface Complex {
  re: number;
  im: number;
}

/** m w^2/(k + i w c) = (m w^2/k)/(1 + i d), d = w c/k. */
function inertiaOverStiffness(mass: number, omega: number, { stiffness, damping }: Stage): Complex {
  if (omega === 0) return { re: 0, im: 0 };
  const size = quotient([mass, omega, omega], [stiffness]);
  const d = quotient([omega, damping], [stiffness]);
  const share = d < 1e150 ? 1 / (1 + d * d) : 0;
  return { re: size * share, im: share > 0 ? -size * d * share : -size / d };
}

/**
 * The two undamped natural frequencies, rising, Hz: w^2 are the roots of x^2 - (a + b + c) x + a b = 0 with
 * a = k1/m1, b = k2/m2, c = k2/m1. The discriminant is a sum of positive terms and the lower root a quotient.
 */
export function twoStageFrequencies(lower: Stage, upper: Stage): [number, number] {
  requireStage("lower", lower);
  requireStage("upper", upper);
  const a = quotient([lower.stiffness], [lower.mass]);
  const b = quotient([upper.stiffness], [upper.mass]);
  const c = quotient([upper.stiffness], [lower.mass]);
  const most = Math.max(a, b, c);
  finite("stiffness over mass", most);
  const [A, B, C] = [a / most, b / most, c / most];
  const root = Math.sqrt((A - B) * (A - B) + C * (C + 2 * (A + B)));
  const high = (A + B + C + root) / 2;
  const low = (A / high) * B;
  return [Math.sqrt(low) * hertz(most), Math.sqrt(high) * hertz(most)];
}

function hertz(stiffnessOverMass: number): number {
  return Math.sqrt(stiffnessOverMass) / (2 * Math.PI);
}

function requireStage(which: string, { mass, stiffness, damping }: Stage): void {
  requireAbove(`${which} mass`, mass, 0);
  requireAbove(`${which} stiffness`, stiffness, 0);
  requireAtLeast(`${which} damping`, damping, 0);
}

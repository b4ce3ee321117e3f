import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { quotientRoot } from "./exact";

const EULER_GAMMA = 0.5772156649015329;

/**
 * Expected largest peak of a narrow-band Gaussian response over its rms: c + gamma/c, c = sqrt(2 ln(fn t)).
 *
 * @param fn        natural frequency, Hz, above 0
 * @param duration  t, s, above 0; fn t, the number of cycles, 2 or more
 * @returns         dimensionless
 * @throws          outside-domain if there are fewer than two cycles
 * @source          A. G. Davenport, Note on the distribution of the largest value of a random function, Proc. ICE 28 (1964)
 */
export function peakFactor(fn: number, duration: number): number {
  requireAbove("natural frequency", fn, 0);
  requireAbove("duration", duration, 0);
  const cycles = fn * duration;
  requireCycles(cycles);
  const c = Math.sqrt(2 * (cycles < Infinity ? Math.log(cycles) : Math.log(fn) + Math.log(duration)));
  return c + EULER_GAMMA / c;
}

function requireCycles(cycles: number): void {
  if (cycles >= 2) return;
  const message = `natural frequency x duration must be 2 cycles or more, got ${cycles}`;
  throw new NumericError("outside-domain", message);
}

/**
 * Root mean square absolute acceleration under a flat spectrum of every frequency.
 *
 *   exact: sqrt(pi/2 fn Q S (1 + 4 zeta^2)),  short: sqrt(pi/2 fn Q S),  Q = 1/(2 zeta)
 *
 * @param fn       natural frequency, Hz, above 0
 * @param zeta     viscous damping ratio, 0 or more
 * @param density  S, one-sided acceleration density, unit^2/Hz, above 0
 * @returns        unit of the acceleration whose square the density carries
 * @throws         pole if zeta = 0
 * @source         J. W. Miles, On structural fatigue under random loading, J. Aeronautical Sciences 21 (1954), the short
 *                 form; the exact one is the integral of |T|^2 over all frequencies
 */
export function milesRms(fn: number, zeta: number, density: number, form: "exact" | "short"): number {
  requireAbove("natural frequency", fn, 0);
  requireAtLeast("damping ratio", zeta, 0);
  requireAbove("density", density, 0);
  if (zeta === 0) throw new NumericError("pole", "an undamped mount rings without limit under a flat spectrum");
  const short = [Math.PI, fn, density];
  if (form === "short") return finite("rms acceleration", quotientRoot(short, [4, zeta]));
  if (zeta <= 1) return finite("rms acceleration", quotientRoot([...short, 1 + 4 * zeta * zeta], [4, zeta]));
  return finite("rms acceleration", quotientRoot([...short, zeta, 4 + 1 / zeta / zeta], [4]));
}

import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { magnitude } from "./exact";
import { logRatio, type Profile } from "./psd";
import { GAUSS_NODES, GAUSS_WEIGHTS } from "./quadrature";
import type { DampingModel } from "./transmissibility";

/** What is asked of the mounted item: its absolute acceleration or the deflection of its mount. */
export type Response = "acceleration" | "deflection";

const WIDEST_LOG = 170; // |ln(f/fn)| up to here: squares and fourth powers of f/fn stay doubles
const NEAREST = 1.4; // a panel's half length times this is at most its centre's distance from a pole
const STEEPEST = 10; // a panel's half length times the steepest log slope of the integrand
const EXTREME = 1e100; // damping ratios beyond it, or below its inverse, square out of the double range

/**
 * Root mean square response of a single mass on its mount to a random base acceleration, over the profile's band.
 *
 *   rms^2 = integral of S(f) |H(f)|^2 df,  H = T for acceleration, 1/((2 pi fn)^2 (1 - r^2 + i b)) for deflection
 *
 * Quadrature by construction: with v = ln(f/fn) the integrand is exp(linear in v) times a function whose only poles have
 * known places, so the panels are cut to keep a 20-point Gauss rule at rounding error: each panel stays clear of the
 * poles by a fixed factor and spans a bounded exponent. The number of panels grows with ln(1/zeta), not with 1/zeta.
 *
 * @param fn    natural frequency, Hz, above 0
 * @param zeta  damping ratio, 0 or more
 * @returns     acceleration in the profile's unit; deflection in that unit times s^2
 * @throws      pole if zeta = 0 and fn lies in the band; no-convergence for a damping ratio, overflow for frequencies,
 *              out of all proportion
 * @accuracy    2e-15 relative over the reference rows, 1e-12 at worst over slopes of -200 and damping ratios 1e-6 to 10
 * @source      response of a linear system to a stationary random input; poles where 1 - r^2 + i b = 0, b = 2 zeta r
 *              (viscous) or 2 zeta (hysteretic)
 */
export function randomResponseRms(
  profile: Profile,
  fn: number,
  zeta: number,
  response: Response,
  model: DampingModel,
): number {
  requireAbove("natural frequency", fn, 0);
  const { frequencies, densities } = profile;
  const last = frequencies.length - 1;
  const first = logRatio(fn, frequencies[0]);
  const gain = gainOf(zeta, response, model);
  requireRegular(gain, first, logRatio(fn, frequencies[last]));
  const loudest = loudestPoint(profile);
  const S0 = densities[loudest];
  const f0 = frequencies[loudest];
  let sum = 0;
  let v1 = first;
  for (let i = 0; i < last; i++) {
    const length = logRatio(frequencies[i], frequencies[i + 1]);
    const slope = logRatio(densities[i], densities[i + 1]) / length + 1;
    const rise = logRatio(S0, densities[i]) + logRatio(f0, frequencies[i]);
    const v2 = logRatio(fn, frequencies[i + 1]);
    sum += powerOver(gain, v1, v2, length, slope, rise);
    v1 = v2;
  }
  const rms = Math.sqrt(sum) * Math.sqrt(S0) * Math.sqrt(f0);
  if (response === "acceleration") return finite("rms acceleration", rms);
  const omega = 2 * Math.PI * fn;
  return finite("rms deflection", rms / omega / omega);
}

/** S f is piecewise a power of f, so it is largest at a break-point: everything is taken relative to that one. */
function loudestPoint({ frequencies, densities }: Profile): number {
  let at = 0;
  for (let i = 1; i < frequencies.length; i++) {
    if (logRatio(densities[at], densities[i]) + logRatio(frequencies[at], frequencies[i]) > 0) at = i;
  }
  return at;
}

/** A mount as the quadrature sees it: its law and the places of the poles nearest to real v = ln(f/fn). */
export interface Gain {
  zeta: number;
  response: Response;
  model: DampingModel;
  real: number;
  imaginary: number;
}

/** The mount with its poles: at v = +-real +- i imaginary and v = +-real +- i (pi - imaginary). */
export function gainOf(zeta: number, response: Response, model: DampingModel): Gain {
  requireAtLeast("damping ratio", zeta, 0);
  if (zeta > EXTREME || (zeta > 0 && zeta < 1 / EXTREME)) {
    throw new NumericError("no-convergence", `a damping ratio of ${zeta} is out of all proportion`);
  }
  const law = { zeta, response, model };
  if (model === "hysteretic") {
    const eta = 2 * zeta;
    return { ...law, real: Math.log(magnitude(1, eta)) / 2, imaginary: Math.atan(eta) / 2 };
  }
  if (zeta < 1) return { ...law, real: 0, imaginary: Math.asin(zeta) };
  return { ...law, real: Math.acosh(zeta), imaginary: Math.PI / 2 };
}

/** Throws where the mean square is infinite, or where frequencies are so unlike that squares leave the double range. */
export function requireRegular({ zeta }: Gain, v1: number, v2: number): void {
  if (zeta === 0 && v1 <= 0 && v2 >= 0) {
    throw new NumericError("pole", "an undamped mount rings without limit when its natural frequency is in the band");
  }
  if (v1 < -WIDEST_LOG || v2 > WIDEST_LOG) {
    throw new NumericError("overflow", "the band and the natural frequency are out of all proportion");
  }
}

/**
 * Integral of exp(rise + slope (v - v1)) |H(v)|^2 over v1..v2, H without its 1/(2 pi fn)^2.
 * @param length  v2 - v1, known better than by that difference
 */
export function powerOver(gain: Gain, v1: number, v2: number, length: number, slope: number, rise: number): number {
  // a short stretch far from resonance is measured from its own start, any other one from resonance: no cancellation
  const short = length < Math.abs(v1) / 2;
  const origin = short ? v1 : 0;
  const start = short ? 0 : v1;
  const end = short ? length : v2;
  const widest = Math.min(1, STEEPEST / (Math.abs(slope) + 4));
  let sum = 0;
  for (let a = start; a < end;) {
    const half = Math.min(widest, clearanceFromPoles(origin + a, gain));
    let b = a + 2 * half;
    if (!(b < end - 0.1 * half)) b = end;
    if (b <= a) throw new NumericError("no-convergence", "the response is too sharp for double precision");
    sum += panel(gain, origin, start, a, b, slope, rise);
    a = b;
  }
  return sum;
}

function clearanceFromPoles(v: number, { real, imaginary }: Gain): number {
  const near = clearance(v - real, imaginary);
  return real === 0 ? near : Math.min(near, clearance(v + real, imaginary));
}

/** Largest half length h of a panel that starts a distance d past a pole: |centre - pole| = NEAREST h. */
function clearance(d: number, imaginary: number): number {
  const k = NEAREST * NEAREST - 1;
  const square = d * d + imaginary * imaginary;
  const root = Math.sqrt(d * d + k * square);
  return d >= 0 ? (d + root) / k : square / (root - d);
}

function panel(
  { zeta, response, model }: Gain,
  origin: number,
  start: number,
  a: number,
  b: number,
  slope: number,
  rise: number,
): number {
  const half = (b - a) / 2;
  const middle = a + half;
  const viscous = model === "viscous";
  const absolute = response === "acceleration";
  const b2 = 4 * zeta * zeta;
  let sum = 0;
  for (let i = 0; i < 2 * GAUSS_NODES.length; i++) {
    const k = i >> 1;
    const s = middle + (i & 1 ? half : -half) * GAUSS_NODES[k];
    const v = origin + s;
    const w = -2 * Math.abs(v);
    // below resonance x = r^2, above x = 1/r^2; detuning = x - 1, never a difference of near numbers
    let x: number;
    let detuning: number;
    if (w < -0.6) {
      x = Math.exp(w);
      detuning = x - 1;
    } else {
      detuning = Math.expm1(w);
      x = 1 + detuning;
    }
    const above = v > 0;
    const damping = viscous ? b2 * x : above ? b2 * x * x : b2;
    const dynamic = detuning * detuning + damping;
    let top = above ? x * x : 1;
    if (absolute) top += viscous ? (above ? b2 * x : damping) : damping;
    sum += (GAUSS_WEIGHTS[k] * Math.exp(rise + slope * (s - start)) * top) / dynamic;
  }
  return half * sum;
}

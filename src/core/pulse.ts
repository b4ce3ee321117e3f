import { finite, reject, requireAbove, requireFinite } from "./errors";
import { freePeak } from "./oscillator";
import { areaOf, piecesOf, type PulseShape } from "./pulseShapes";
import { absolutePiece, endOfLongPiece, largestInLongPiece, longPiece } from "./pulseLong";
import { largestInShortPiece } from "./pulseShort";
import type { Response } from "./randomResponse";

/** Where the mass is, relative to the base, as -z (2 pi fn)^2 over the peak acceleration, with its slope in radians. */
export interface State {
  w: number;
  u: number;
}

const LONG = 12; // radians of natural motion in the pulse; from here on the closed form of each piece loses nothing
const IMPULSE = 1e-14; // a pulse this short is an impulse to double precision

/**
 * Largest response, over all time, of a single mass on its mount to one base shock pulse, starting at rest.
 *
 * Positive and negative extremes, during the pulse and in the free vibration after it (the maximax). Short pulses are
 * solved by Taylor series of the whole equation, which is exact to rounding and has no singular natural frequency; long
 * ones by the closed form, whose extremes are found by branch and bound, so that a million cycles cost no more than one.
 *
 * @param peak      peak base acceleration, m/s^2, any sign
 * @param duration  s, above 0
 * @param fn        natural frequency, Hz, above 0
 * @param zeta      viscous damping ratio, 0 to 1
 * @returns         acceleration: absolute, m/s^2; deflection: of the mount, m; both 0 or more
 * @throws          outside-domain; overflow
 * @source          z'' + 2 zeta wn z' + wn^2 z = -u'', z = x - u; pulse shapes of IEC 60068-2-27 and handbooks
 */
export function pulseResponse(
  shape: PulseShape,
  peak: number,
  duration: number,
  fn: number,
  zeta: number,
  response: Response,
): number {
  requireFinite("peak acceleration", peak);
  requireAbove("duration", duration, 0);
  requireAbove("natural frequency", fn, 0);
  if (!(zeta >= 0 && zeta <= 1)) reject("damping ratio", zeta, "from 0 to 1");
  const omega = 2 * Math.PI * fn;
  const ratio = amplification(shape, finite("natural frequency x duration", omega * duration), zeta, response);
  if (response === "acceleration") return finite("largest acceleration", Math.abs(peak) * ratio);
  return finite("largest deflection", ((Math.abs(peak) / omega) * ratio) / omega);
}

/** Largest |response| to the pulse of unit peak that lasts T radians of natural motion; deflection times (2 pi fn)^2. */
function amplification(shape: PulseShape, T: number, zeta: number, response: Response): number {
  const law = response === "acceleration" ? 2 * zeta : 0; // the response is w + law u
  const { largest, end } = T < LONG ? shortPulse(shape, T, zeta, law) : longPulse(shape, T, zeta, law);
  const value = end.w + law * end.u;
  const slope = end.u - law * (end.w + 2 * zeta * end.u);
  return Math.max(largest, Math.abs(value), freePeak(value, slope, zeta));
}

interface During {
  largest: number;
  end: State;
}

function shortPulse(shape: PulseShape, T: number, zeta: number, law: number): During {
  const end: State = { w: 0, u: 0 };
  let largest = 0;
  if (T < IMPULSE) {
    end.u = areaOf(shape) * T;
    return { largest, end };
  }
  for (const piece of piecesOf(shape)) {
    largest = Math.max(largest, largestInShortPiece(piece, T, end, zeta, law));
  }
  return { largest, end };
}

function longPulse(shape: PulseShape, T: number, zeta: number, law: number): During {
  let end: State = { w: 0, u: 0 };
  let largest = 0;
  for (const piece of piecesOf(shape)) {
    const motion = longPiece(piece, T, zeta);
    const force = piece.form === "line" ? piece.from : 0;
    const start = { w: end.w + law * end.u, u: end.u + law * (force - end.w - 2 * zeta * end.u) };
    largest = largestInLongPiece(law === 0 ? motion : absolutePiece(motion), start, largest);
    end = endOfLongPiece(motion, end);
  }
  return { largest, end };
}

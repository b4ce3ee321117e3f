import { type Curve, largestOn } from "./extremum";
import { magnitude } from "./exact";
import type { State } from "./pulse";
import type { PulsePiece } from "./pulseShapes";
import type { Response } from "./randomResponse";

/** Forced motion level + slope t + sine sin(alpha t) + cosine cos(alpha t) over 0..length, in radians of natural motion. */
export interface LongPiece {
  zeta: number;
  length: number;
  level: number;
  slope: number;
  alpha: number;
  sine: number;
  cosine: number;
}

const LEAF = 1; // radians
const TIE = 1e-13; // a stretch that can win by no more than this is left out

/** The particular solution of w'' + 2 zeta w' + w = p on a piece of a pulse of T radians. */
export function longPiece(piece: PulsePiece, T: number, zeta: number): LongPiece {
  const length = piece.length * T;
  if (piece.form === "line") {
    const slope = (piece.to - piece.from) / length;
    return { zeta, length, level: piece.from - 2 * zeta * slope, slope, alpha: 0, sine: 0, cosine: 0 };
  }
  const alpha = (piece.form === "sine" ? Math.PI : 2 * Math.PI) / T;
  const stiffness = (1 - alpha) * (1 + alpha);
  const damping = 2 * zeta * alpha;
  const square = stiffness * stiffness + damping * damping;
  const inPhase = stiffness / square;
  const lagging = damping / square;
  if (piece.form === "sine") {
    return { zeta, length, level: 0, slope: 0, alpha, sine: inPhase, cosine: -lagging };
  }
  return { zeta, length, level: 0.5, slope: 0, alpha, sine: -lagging / 2, cosine: -inPhase / 2 };
}

/**
 * Largest |response| on the piece, or `best` if that is larger; moves the state to the piece's end.
 * Branch and bound: on any stretch the forced motion has known extremes and the free part only loses energy.
 */
export function largestInLongPiece(piece: LongPiece, state: State, response: Response, best: number): number {
  const motion = new Motion(piece, state);
  const curve = response === "deflection" ? motion : motion.absolute();
  const found = searched(curve, piece.length, best);
  motion.moveTo(piece.length);
  state.w = motion.value;
  state.u = motion.slope;
  return found;
}

function searched(curve: Motion, length: number, start: number): number {
  let best = start;
  const explore = (a: number, b: number): void => {
    if (!(b > a) || curve.bound(a, b) <= best * (1 + TIE)) return;
    const middle = a + (b - a) / 2;
    if (b - a <= LEAF || middle === a || middle === b) {
      best = Math.max(best, largestOn(curve, a, b));
      return;
    }
    explore(a, middle);
    explore(middle, b);
  };
  // likely places first, so that the rest is cut off early
  const about = (t: number) => explore(Math.max(0, t - Math.PI), Math.min(length, t + Math.PI));
  about(0);
  about(length);
  for (const t of curve.forcedExtremes) about(t);
  explore(0, length);
  return best;
}

/** The places in 0..end where alpha t is `phase` or differs from it by half turns. */
function stationary(phase: number, alpha: number, end: number): number[] {
  const places: number[] = [];
  for (let k = -1; ; k++) {
    const t = (phase + k * Math.PI) / alpha;
    if (t > end) return places;
    if (t >= 0) places.push(t);
  }
}

/** Forced plus free motion on a long piece; the curve is the displacement, or what its coefficients were turned into. */
class Motion implements Curve {
  value = 0;
  slope = 0;
  bend = 0;
  private free = 0;
  private freeSlope = 0;
  private readonly omega: number;
  /** places where the forced motion is stationary */
  readonly forcedExtremes: readonly number[];
  private readonly startFree: number;
  private readonly startFreeSlope: number;

  constructor(
    private readonly forced: LongPiece,
    { w, u }: State,
  ) {
    const { zeta, level, slope, alpha, sine, cosine } = forced;
    this.omega = Math.sqrt((1 - zeta) * (1 + zeta));
    this.forcedExtremes = alpha === 0 ? [] : stationary(Math.atan2(sine, cosine), alpha, forced.length);
    this.startFree = w - (level + cosine);
    this.startFreeSlope = u - (slope + alpha * sine);
  }

  /** The absolute acceleration g + 2 zeta g' of this displacement g, as a motion of the same kind. */
  absolute(): Motion {
    const { forced, startFree, startFreeSlope } = this;
    const { zeta, level, slope, alpha, sine, cosine } = forced;
    const turned: LongPiece = {
      ...forced,
      level: level + 2 * zeta * slope,
      sine: sine - 2 * zeta * alpha * cosine,
      cosine: cosine + 2 * zeta * alpha * sine,
    };
    const free = startFree + 2 * zeta * startFreeSlope;
    const freeSlope = startFreeSlope - 2 * zeta * (startFree + 2 * zeta * startFreeSlope);
    const w = free + (turned.level + turned.cosine);
    const u = freeSlope + (turned.slope + alpha * turned.sine);
    return new Motion(turned, { w, u });
  }

  moveTo(t: number): void {
    const { forced, startFree, startFreeSlope } = this;
    const { zeta, alpha } = forced;
    const decay = Math.exp(-zeta * t);
    const sine = this.omega === 0 ? decay * t : (decay * Math.sin(this.omega * t)) / this.omega;
    const cosine = decay * Math.cos(this.omega * t) + zeta * sine;
    this.free = startFree * cosine + startFreeSlope * sine;
    this.freeSlope = startFreeSlope * (cosine - 2 * zeta * sine) - startFree * sine;
    const s = forced.alpha === 0 ? 0 : Math.sin(alpha * t);
    const c = forced.alpha === 0 ? 1 : Math.cos(alpha * t);
    const swing = forced.sine * s + forced.cosine * c;
    this.value = forced.level + forced.slope * t + swing + this.free;
    this.slope = forced.slope + alpha * (forced.sine * c - forced.cosine * s) + this.freeSlope;
    this.bend = -alpha * alpha * swing - this.free - 2 * zeta * this.freeSlope;
  }

  /** Upper bound of |value| on a..b. */
  bound(a: number, b: number): number {
    this.moveTo(a);
    const energy = magnitude(this.free, this.freeSlope); // never grows
    let forced = Math.max(Math.abs(this.value - this.free), Math.abs(this.forcedAt(b)));
    for (const t of this.forcedExtremes) {
      if (t > a && t < b) forced = Math.max(forced, Math.abs(this.forcedAt(t)));
    }
    return forced + energy;
  }

  private forcedAt(t: number): number {
    const { level, slope, alpha, sine, cosine } = this.forced;
    if (alpha === 0) return level + slope * t + cosine;
    return level + sine * Math.sin(alpha * t) + cosine * Math.cos(alpha * t);
  }
}

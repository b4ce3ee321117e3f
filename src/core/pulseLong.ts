import { type Curve, largestOn } from "./extremum";
import { magnitude } from "./exact";
import { freeCosine, freeSine } from "./oscillator";
import type { State } from "./pulse";
import type { PulsePiece } from "./pulseShapes";

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

/** A straight stretch of base acceleration, from..to over `length` radians; the forced motion lags it by `lag` slopes. */
export function straightPiece(from: number, to: number, length: number, zeta: number, lag: number): LongPiece {
  const slope = (to - from) / length;
  return { zeta, length, level: from - lag * slope, slope, alpha: 0, sine: 0, cosine: 0 };
}

/** The particular solution of w'' + 2 zeta w' + w = p on a piece of a pulse of T radians. */
export function longPiece(piece: PulsePiece, T: number, zeta: number): LongPiece {
  const length = piece.length * T;
  if (piece.form === "line") return straightPiece(piece.from, piece.to, length, zeta, 2 * zeta);
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
 * Largest magnitude of the piece's motion that starts in the state, or `best` if that is larger.
 * Branch and bound: on any stretch the forced motion has known extremes and the free part only loses energy.
 */
export function largestInLongPiece(piece: LongPiece, state: State, best: number): number {
  return searched(new Motion(piece, state), piece.length, best);
}

/** The state at the piece's end. */
export function endOfLongPiece(piece: LongPiece, state: State): State {
  const motion = new Motion(piece, state);
  motion.moveTo(piece.length);
  return { w: motion.value, u: motion.slope };
}

/** The absolute acceleration g + 2 zeta g' of a displacement g is a motion of the same kind. */
export function absolutePiece(piece: LongPiece): LongPiece {
  const { zeta, level, slope, alpha, sine, cosine } = piece;
  const share = 2 * zeta;
  return {
    ...piece,
    level: level + share * slope,
    sine: sine - share * alpha * cosine,
    cosine: cosine + share * alpha * sine,
  };
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
  /** places where the forced motion is stationary */
  readonly forcedExtremes: readonly number[];
  private readonly startFree: number;
  private readonly startFreeSlope: number;

  constructor(
    private readonly forced: LongPiece,
    { w, u }: State,
  ) {
    const { level, slope, alpha, sine, cosine } = forced;
    this.forcedExtremes = alpha === 0 ? [] : stationary(Math.atan2(sine, cosine), alpha, forced.length);
    this.startFree = w - (level + cosine);
    this.startFreeSlope = u - (slope + alpha * sine);
  }

  moveTo(t: number): void {
    const { forced, startFree, startFreeSlope } = this;
    const { zeta, alpha } = forced;
    const sine = freeSine(t, zeta);
    const cosine = freeCosine(t, zeta, sine);
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

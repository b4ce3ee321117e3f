import { type Curve, largestOn } from "./extremum";
import type { State } from "./pulse";
import type { PulsePiece } from "./pulseShapes";

const ORDER = 20; // terms for one radian of everything: 1/21! is below rounding

/**
 * Largest response within one piece of a pulse of T radians; moves the state to the piece's end.
 * Steps of at most one radian, each a Taylor series of w'' + 2 zeta w' + w = p.
 */
export function largestInShortPiece(piece: PulsePiece, T: number, state: State, zeta: number, law: number): number {
  const span = piece.length * T;
  const phase = piece.form === "line" ? 0 : piece.form === "sine" ? Math.PI : 2 * Math.PI;
  const steps = Math.ceil(Math.max(span, phase));
  const taylor = new TaylorStep(span / steps, zeta, law);
  let best = 0;
  for (let j = 0; j < steps; j++) {
    expand(piece, j / steps, 1 / steps, taylor.force);
    taylor.solve(state);
    best = Math.max(best, largestOn(taylor, 0, taylor.h));
    taylor.advance(state);
  }
  return best;
}

/** Taylor coefficients of the pulse about the fraction `at` of the piece, in units of the fraction `step`. */
function expand(piece: PulsePiece, at: number, step: number, into: Float64Array): void {
  into.fill(0);
  if (piece.form === "line") {
    const rise = piece.to - piece.from;
    into[0] = piece.from + rise * at;
    into[1] = rise * step;
    return;
  }
  const half = piece.form === "haversine";
  const angle = Math.PI * (half ? 2 : 1);
  // (1 - cos 2a)/2 = sin^2 a, and its slope is that of sin(2a - pi/2)/2
  const sine = half ? -Math.cos(angle * at) / 2 : Math.sin(angle * at);
  const cosine = half ? Math.sin(angle * at) / 2 : Math.cos(angle * at);
  let power = 1;
  for (let k = 0; k <= ORDER; k++) {
    const turn = k & 3;
    into[k] = power * (turn === 0 ? sine : turn === 1 ? cosine : turn === 2 ? -sine : -cosine);
    power *= (angle * step) / (k + 1);
  }
  if (half) into[0] = Math.sin((angle * at) / 2) ** 2;
}

/** One step of length h: w = h times a polynomial in x = t/h, so that tiny steps do not underflow. */
class TaylorStep implements Curve {
  value = 0;
  slope = 0;
  bend = 0;
  readonly force = new Float64Array(ORDER + 1);
  private readonly motion = new Float64Array(ORDER + 1);

  constructor(
    readonly h: number,
    private readonly zeta: number,
    /** the response is w + law u */
    private readonly law: number,
  ) {}

  solve({ w, u }: State): void {
    const { h, zeta, force, motion } = this;
    motion[0] = w / h;
    motion[1] = u;
    for (let k = 0; k + 2 <= ORDER; k++) {
      const pull = h * force[k] - 2 * zeta * h * (k + 1) * motion[k + 1] - h * h * motion[k];
      motion[k + 2] = pull / ((k + 2) * (k + 1));
    }
  }

  moveTo(t: number): void {
    const { h, zeta, law, force, motion } = this;
    const x = t / h;
    let w = 0;
    let u = 0;
    let p = 0;
    let pSlope = 0;
    for (let k = ORDER; k >= 0; k--) {
      u = u * x + w;
      w = w * x + motion[k];
      pSlope = pSlope * x + p;
      p = p * x + force[k];
    }
    const second = p - 2 * zeta * u - h * w;
    const third = pSlope / h - 2 * zeta * second - u;
    this.value = h * w + law * u;
    this.slope = u + law * second;
    this.bend = second + law * third;
  }

  advance(state: State): void {
    let w = 0;
    let u = 0;
    for (let k = ORDER; k >= 0; k--) {
      u = u + w;
      w = w + this.motion[k];
    }
    state.w = this.h * w;
    state.u = u;
  }
}

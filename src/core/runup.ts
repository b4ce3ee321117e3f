import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { type Curve, largestOn } from "./extremum";

const ORDER = 16; // terms: 0.8^17/17! is below rounding
const RADIANS = 0.8; // of the fastest part, per step
const CHIRP = 2.6; // a quadratic phase has slower series: (change h^2/2)^8/8! must be below rounding too
const MOST_STEPS = 5e5;
const INVERSE = Float64Array.from({ length: ORDER + 3 }, (_, k) => 1 / k);

/**
 * Largest absolute displacement of the mounted item over the amplitude of its base while the frequency runs through.
 *
 * Base u = sin(phi), phi' = 2 pi f(t), phi(0) = 0, f linear in time; the item rests at the start; the search ends when
 * `to` is reached. Each step is a Taylor series of the whole equation, exact to rounding, and the extreme inside each
 * step counts; the cost grows with the number of cycles and is bounded.
 *
 * @param fn    natural frequency, Hz, above 0
 * @param zeta  viscous damping ratio, 0 or more
 * @param rate  sweep rate, Hz/s, above 0; its direction is that from `from` to `to`
 * @param from  start frequency, Hz, 0 or more
 * @param to    end frequency, Hz, 0 or more, not `from`
 * @returns     max |x| / U, dimensionless
 * @throws      outside-domain; no-convergence if the sweep has more cycles than can be followed
 * @source      x'' + 2 zeta wn (x' - u') + wn^2 (x - u) = 0; the problem of F. M. Lewis, Vibration during acceleration
 *              through a critical speed (1932)
 */
export function runupPeak(fn: number, zeta: number, rate: number, from: number, to: number): number {
  requireAbove("natural frequency", fn, 0);
  requireAtLeast("damping ratio", zeta, 0);
  requireAbove("sweep rate", rate, 0);
  requireAtLeast("start frequency", from, 0);
  requireAtLeast("end frequency", to, 0);
  if (from === to) throw new NumericError("outside-domain", `the sweep must end elsewhere than it starts (${from} Hz)`);
  const start = from / fn;
  const change = (to < from ? -rate : rate) / fn / fn / (2 * Math.PI); // of f/fn per radian of natural motion
  const length = (Math.abs(to - from) / rate) * 2 * Math.PI * fn;
  const slowest = Math.max(1, 2 * zeta, CHIRP * Math.sqrt(Math.abs(change)));
  const cycles = ((from + to) / 2) * (Math.abs(to - from) / rate);
  const steps = (length * slowest + 2 * Math.PI * cycles) / RADIANS;
  if (!(steps < MOST_STEPS)) {
    const message = "the sweep is too long to follow at this natural frequency and damping: make it faster or narrower";
    throw new NumericError("no-convergence", message);
  }
  const sweep = new SweepStep(zeta, start, change);
  let best = 0;
  for (let t = 0; t < length;) {
    const ratio = start + change * t;
    const h = Math.min(RADIANS / Math.max(slowest, ratio), length - t);
    sweep.solve(t, h);
    if (sweep.bound() > best) best = Math.max(best, largestOn(sweep, 0, h));
    sweep.advance();
    if (t + h === t) break;
    t += h;
  }
  return finite("run-up response", best);
}

/** One step of x'' + 2 zeta x' + x = u + 2 zeta u', u = sin(phi), as Taylor polynomials in s = (time in step)/h. */
class SweepStep implements Curve {
  value = 0;
  slope = 0;
  bend = 0;
  private h = 1;
  private x = 0;
  private v = 0;
  private readonly sine = new Float64Array(ORDER + 1);
  private readonly cosine = new Float64Array(ORDER + 1);
  private readonly motion = new Float64Array(ORDER + 1);

  constructor(
    private readonly zeta: number,
    private readonly start: number,
    private readonly change: number,
  ) {}

  solve(t: number, h: number): void {
    const { zeta, sine, cosine, motion } = this;
    const phase = this.start * t + (this.change * t * t) / 2;
    const rate = (this.start + this.change * t) * h; // of the phase, per step
    const bend = this.change * h * h;
    this.h = h;
    sine[0] = Math.sin(phase);
    cosine[0] = Math.cos(phase);
    sine[1] = rate * cosine[0];
    cosine[1] = -rate * sine[0];
    for (let k = 1; k < ORDER; k++) {
      sine[k + 1] = (rate * cosine[k] + bend * cosine[k - 1]) * INVERSE[k + 1];
      cosine[k + 1] = -(rate * sine[k] + bend * sine[k - 1]) * INVERSE[k + 1];
    }
    motion[0] = this.x;
    motion[1] = h * this.v;
    const drag = 2 * zeta * h;
    const spring = h * h;
    for (let k = 0; k + 2 <= ORDER; k++) {
      const pull = spring * INVERSE[k + 1] * (sine[k] - motion[k]) + drag * (sine[k + 1] - motion[k + 1]);
      motion[k + 2] = pull * INVERSE[k + 2];
    }
  }

  /** Upper bound of |x| in the step. */
  bound(): number {
    let sum = 0;
    for (let k = 0; k <= ORDER; k++) sum += Math.abs(this.motion[k]);
    return sum;
  }

  moveTo(t: number): void {
    const s = t / this.h;
    let x = 0;
    let v = 0;
    let half = 0;
    for (let k = ORDER; k >= 0; k--) {
      half = half * s + v;
      v = v * s + x;
      x = x * s + this.motion[k];
    }
    this.value = x;
    this.slope = v / this.h;
    this.bend = (2 * half) / this.h / this.h;
  }

  advance(): void {
    let x = this.motion[0];
    let v = 0;
    for (let k = 1; k <= ORDER; k++) {
      x += this.motion[k];
      v += k * this.motion[k];
    }
    this.x = x;
    this.v = v / this.h;
  }
}

import { largestOn } from "./extremum";
import type { State } from "./pulse";
import { largestInLongPiece, straightPiece } from "./pulseLong";
import { InsideInterval, intervalOf } from "./recordStep";
import { afterDrop, type Filtered } from "./srsFilter";

const TIE = 1e-12;

/**
 * Largest magnitude during the record for a natural frequency that may turn many times within one sample interval, and
 * the free vibration after it. Two bounds skip the intervals that cannot win: the straight forced motion plus the energy
 * of the free motion (which never grows), and the chords between the samples
 * (then also the middle) plus what that energy can bend above them.
 */
export function largestByInterval(
  p: Float64Array,
  theta: number,
  zeta: number,
  absolute: boolean,
): Pick<Filtered, "largest" | "value" | "slope"> {
  const interval = intervalOf(theta, zeta, absolute);
  const { sine, step, drop, ramp, rampSlope } = interval;
  const search = theta < 1 ? shortSearch(new InsideInterval(interval), theta) : longSearch(theta, zeta, absolute);
  const half = intervalOf(theta / 2, zeta, absolute);
  const lag = absolute ? 0 : 2 * zeta;
  const bulge = (theta * theta * theta * theta * (1 + 4 * zeta * zeta)) / 64; // squared, per energy
  let best = 0;
  let g = 0;
  let slope = absolute ? 2 * zeta * p[0] : 0;
  for (let i = 1; i < p.length; i++) {
    const p0 = p[i - 1];
    const p1 = p[i];
    const rise = p1 - p0;
    const behind = g - p0;
    const next = g + sine * slope - step * behind + ramp * rise;
    const start = lag * (rise / theta); // forced motion: p - start
    const e = behind + start;
    const v = slope - rise / theta;
    const energy = e * e + v * v;
    const size = Math.max(Math.abs(g), Math.abs(next));
    if (size > best) best = size;
    const top = best * (1 + TIE);
    const overForced = top - Math.max(Math.abs(p0 - start), Math.abs(p1 - start));
    const overChord = top - size;
    const safe = (overForced > 0 && energy <= overForced * overForced) || bulge * energy <= overChord * overChord;
    if (!safe) {
      const middle = Math.abs(g + half.sine * slope - half.step * behind + half.ramp * (rise / 2));
      if (middle > best) best = middle;
      const overHalves = best * (1 + TIE) - Math.max(size, middle);
      if ((bulge / 16) * energy > overHalves * overHalves) best = search(g, slope, p0, p1, best);
    }
    slope = slope - drop * slope - sine * behind + rampSlope * rise;
    g = next;
  }
  return { largest: best, value: g, slope: afterDrop(slope, p[p.length - 1], zeta, absolute) };
}

type Search = (g: number, slope: number, p0: number, p1: number, best: number) => number;

function shortSearch(inside: InsideInterval, theta: number): Search {
  return (g, slope, p0, p1, best) => {
    inside.set(g, slope, p0, p1);
    return Math.max(best, largestOn(inside, 0, theta));
  };
}

function longSearch(theta: number, zeta: number, absolute: boolean): Search {
  const state: State = { w: 0, u: 0 };
  const lag = absolute ? 0 : 2 * zeta;
  return (g, slope, p0, p1, best) => {
    state.w = g;
    state.u = slope;
    return largestInLongPiece(straightPiece(p0, p1, theta, zeta, lag), state, best);
  };
}

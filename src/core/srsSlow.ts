import { largestOn } from "./extremum";
import { InsideInterval, type Interval, recursionOf, slopeBefore } from "./recordStep";
import { BLOCK, type Filtered } from "./srsFilter";

/** Whether a natural frequency is low enough for {@link largestBetweenSamples}: under one radian per sample interval. */
export function slowEnough(theta: number, zeta: number): boolean {
  return theta < 1 && zeta * theta < 0.25;
}

/** Largest sample of a record and largest rise between two of them. */
export interface Extent {
  top: number;
  steepest: number;
}

/**
 * Largest magnitude during the record, extremes between samples counted, from the largest at the samples.
 *
 * An extreme between samples lies above its nearest sample by at most theta^2/8 times the largest bend, and the equation
 * of motion bounds the bend. So only blocks that come that close to the largest sample are gone through again.
 */
export function largestBetweenSamples(
  p: Float64Array,
  interval: Interval,
  { blocks, largest }: Filtered,
  { top, steepest }: Extent,
): number {
  const over = overshoot(interval, largest, top, steepest);
  const inside = new InsideInterval(interval);
  let best = largest;
  for (let turn = -1; turn < blocks.largest.length; turn++) {
    const block = turn < 0 ? blocks.largest.indexOf(largest) : turn; // the likeliest first: it spares others
    const threshold = best - over;
    if (blocks.largest[block] < threshold) continue;
    const start = 1 + block * BLOCK;
    const through = Math.min(p.length - 1, start + BLOCK); // the first interval after the block too
    best = rescan(p, interval, inside, start, through, blocks.value[block], blocks.step[block], threshold, best);
  }
  return best;
}

/** |bend| <= top + |g| + 2 zeta (steepest/theta + |slope|), and near an extreme |slope| <= |bend| theta/2. */
function overshoot({ theta, zeta }: Interval, largest: number, top: number, steepest: number): number {
  const eighth = (theta * theta) / 8;
  return (eighth * (top + largest + (2 * zeta * steepest) / theta)) / (1 - zeta * theta - eighth);
}

function rescan(
  p: Float64Array,
  interval: Interval,
  inside: InsideInterval,
  start: number,
  through: number,
  value: number,
  step: number,
  threshold: number,
  sofar: number,
): number {
  const { decay, pull, b0, b1, b2 } = recursionOf(interval);
  const { theta, zeta, absolute } = interval;
  const lag = absolute ? 0 : 2 * zeta;
  const bulge = ((theta * theta) / 8) * Math.sqrt(1 + 4 * zeta * zeta); // above the chord, per root of energy
  let best = sofar;
  let g = value;
  let d = step;
  for (let i = start; i <= through; i++) {
    const p0 = p[i - 1];
    const p1 = p[i];
    d = decay * d + (b0 * p1 + b1 * p0 + b2 * p[i > 1 ? i - 2 : 0]) - pull * g;
    const next = g + d;
    if (Math.abs(g) >= threshold || Math.abs(next) >= threshold) {
      const slope = slopeBefore(interval, g, d, p0, p1);
      const e = g - p0 + (lag * (p1 - p0)) / theta; // free motion, whose energy never grows
      const v = slope - (p1 - p0) / theta;
      const size = Math.max(Math.abs(g), Math.abs(next));
      if (size + bulge * Math.sqrt(e * e + v * v) > best) {
        inside.set(g, slope, p0, p1);
        best = Math.max(best, largestOn(inside, 0, theta));
      }
    }
    g = next;
  }
  return best;
}

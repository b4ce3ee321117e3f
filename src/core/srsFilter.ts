import { type Interval, type Recursion, recursionOf, slopeAfter, slopeBefore } from "./recordStep";

/** Natural frequencies filtered in one pass over the record: one recursion alone waits for its own last result. */
export const BATCH = 4;

/** Samples per block of the record; for each block the filter keeps its largest magnitude and the state before it. */
export const BLOCK = 128;

/** Room for the blocks of one batch, made once for a whole spectrum. */
export interface FilterMemory {
  lanes: Blocks[];
}

export interface Blocks {
  largest: Float64Array;
  /** response at the sample before the block, and its step to there */
  value: Float64Array;
  step: Float64Array;
}

/** What one lane knows after the pass: its blocks, and the free vibration it starts after the last sample. */
export interface Filtered {
  blocks: Blocks;
  largest: number;
  value: number;
  slope: number;
}

export function filterMemory(samples: number): FilterMemory {
  const count = Math.ceil((samples - 1) / BLOCK);
  const room = () => new Float64Array(count);
  return { lanes: Array.from({ length: BATCH }, () => ({ largest: room(), value: room(), step: room() })) };
}

/**
 * Runs up to four recursions over the record at once. Blocks start at samples 1, 1 + BLOCK, ...; the first interval is
 * solved by itself because the item starts at rest while the base may already accelerate.
 */
export function filterBatch(p: Float64Array, intervals: readonly Interval[], { lanes }: FilterMemory): Filtered[] {
  const lane = (k: number) => intervals[Math.min(k, intervals.length - 1)];
  const a = recursionOf(lane(0));
  const b = recursionOf(lane(1));
  const c = recursionOf(lane(2));
  const d = recursionOf(lane(3));
  const { decay: ka, pull: pa, b0: a0, b1: a1, b2: a2 } = a;
  const { decay: kb, pull: pb, b0: b0, b1: b1, b2: b2 } = b;
  const { decay: kc, pull: pc, b0: c0, b1: c1, b2: c2 } = c;
  const { decay: kd, pull: pd, b0: d0, b1: d1, b2: d2 } = d;
  // rest at sample 0; a virtual sample before it makes the recursion take the first interval right
  let ya = 0;
  let yb = 0;
  let yc = 0;
  let yd = 0;
  let da = firstCarry(lane(0), a, p);
  let db = firstCarry(lane(1), b, p);
  let dc = firstCarry(lane(2), c, p);
  let dd = firstCarry(lane(3), d, p);
  let before = p[0];
  let now = p[0];
  const [A, B, C, D] = lanes;
  let i = 1;
  for (let block = 0; i < p.length; block++) {
    const end = Math.min(p.length, i + BLOCK);
    let ma = 0;
    let mb = 0;
    let mc = 0;
    let md = 0;
    A.value[block] = ya;
    A.step[block] = da;
    B.value[block] = yb;
    B.step[block] = db;
    C.value[block] = yc;
    C.step[block] = dc;
    D.value[block] = yd;
    D.step[block] = dd;
    for (; i < end; i++) {
      const next = p[i];
      da = ka * da + (a0 * next + a1 * now + a2 * before) - pa * ya;
      ya += da;
      db = kb * db + (b0 * next + b1 * now + b2 * before) - pb * yb;
      yb += db;
      dc = kc * dc + (c0 * next + c1 * now + c2 * before) - pc * yc;
      yc += dc;
      dd = kd * dd + (d0 * next + d1 * now + d2 * before) - pd * yd;
      yd += dd;
      before = now;
      now = next;
      const sa = Math.abs(ya);
      const sb = Math.abs(yb);
      const sc = Math.abs(yc);
      const sd = Math.abs(yd);
      if (sa > ma) ma = sa;
      if (sb > mb) mb = sb;
      if (sc > mc) mc = sc;
      if (sd > md) md = sd;
    }
    A.largest[block] = ma;
    B.largest[block] = mb;
    C.largest[block] = mc;
    D.largest[block] = md;
  }
  const values = [ya, yb, yc, yd];
  const steps = [da, db, dc, dd];
  return intervals.map((interval, k) => finish(p, interval, lanes[k], values[k], steps[k]));
}

/** The step into sample 0 that makes the recursion, with a sample before it equal to the first, take interval 1 right. */
function firstCarry({ zeta, absolute, sine, step }: Interval, { decay, pull }: Recursion, p: Float64Array): number {
  const slope = absolute ? 2 * zeta * p[0] : 0;
  return (sine * slope + (step - pull) * p[0]) / decay;
}

function finish(p: Float64Array, interval: Interval, blocks: Blocks, value: number, step: number): Filtered {
  const last = p.length - 1;
  let largest = 0;
  for (const size of blocks.largest) if (size > largest) largest = size;
  const before = slopeBefore(interval, value - step, step, p[last - 1], p[last]);
  const during = slopeAfter(interval, value - step, before, p[last - 1], p[last]);
  return { blocks, largest, value, slope: afterDrop(during, p[last], interval.zeta, interval.absolute) };
}

/** Slope of the response just after the base acceleration drops from p to 0. */
export function afterDrop(slope: number, p: number, zeta: number, absolute: boolean): number {
  return absolute ? slope - 2 * zeta * p : slope;
}

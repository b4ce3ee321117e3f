/** Every lifting function of harmonic design on 100,000 rows of cells. */
import * as plinth from "../../src/functions";
import { type Figure, median, timesOf } from "./measure";

const ROWS = 100000;
const column = (of: (i: number) => number): any[][] => Array.from({ length: ROWS }, (_, i) => [of(i)]);
const f = column((i) => 1 + (i % 9973) * 0.01);
const fn = column((i) => 5 + (i % 4999) * 0.002);
const zeta = column((i) => 0.01 + (i % 997) * 0.001);
const E = column((i) => 0.05 + (i % 9) / 10);
const more = column((i) => 200 + (i % 9973) * 0.01);

const calls: [id: string, ...args: unknown[]][] = [
  ["RELTRANS", f, fn, zeta],
  ["ABSPHASE", f, fn, zeta],
  ["RELPHASE", f, fn, zeta],
  ["EFFICIENCY", f, fn, zeta],
  ["PEAKTRANS", zeta],
  ["PEAKFREQ", fn, zeta],
  ["NATFREQ", more, fn],
  ["STIFFNESS", fn, more],
  ["STATICDEFL", fn],
  ["DEFLFREQ", zeta],
  ["MOUNTDEFL", zeta, f, fn, zeta],
  ["MOUNTFORCE", zeta, f, more, fn, zeta],
  ["DAMPING", zeta, "ratio", "log decrement"],
  ["DAMPCOEFF", zeta, more, fn],
  ["DAMPRATIO", f, more, fn],
  ["REQNATFREQ", E, f, zeta],
  ["REQSTATICDEFL", E, f, zeta],
  ["REQSTIFFNESS", E, f, zeta, more],
  ["REQDAMPING", fn],
  ["TRANSBOUND", f, more, fn, zeta, 0.1, 0.2],
  ["RELBOUND", f, more, fn, zeta, 0.1, 0.2],
  ["MOTION", zeta, f, "displacement peak", "acceleration rms"],
  ["CROSSOVER", zeta, f],
  ["UNITS", f, "lbf/in", "N/mm"],
  ["SWEEP", 1, 2000, ROWS, "log"],
  ["WHY", f, fn, zeta],
];

export default function bench(): Figure[] {
  return calls.map(([id, ...args]) => {
    const compute = (plinth as unknown as Record<string, (...args: unknown[]) => unknown>)[id];
    return { what: `${id} on ${ROWS} rows`, median: median(timesOf(() => compute(...args), 5)) };
  });
}

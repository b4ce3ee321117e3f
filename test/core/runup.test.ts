import { peakTransmissibility } from "../../src/core/peak";
import { runupPeak } from "../../src/core/runup";
import { solveOde } from "../support/ode";
import { referenceRows } from "../support/referenceRows";
import { relativeError } from "../support/ulps";

type Sweep = { fn: number; zeta: number; rate: number; from: number; to: number };
const rows = referenceRows<Sweep, string>("runup").map(
  ({ in: i, out }) => [i.fn, i.zeta, i.rate, i.from, i.to, out] as const,
);

test.each(rows)(
  "run-up of fn %p, zeta %p at %p Hz/s from %p to %p Hz agrees with error functions to 1e-12",
  (...row) => {
    const [fn, zeta, rate, from, to, out] = row;
    expect(relativeError(runupPeak(fn, zeta, rate, from, to), out)).toBeLessThan(1e-12);
  },
);

test("an ODE library agrees to 1e-8", () => {
  const [fn, zeta, rate, from, to] = [8, 0.05, 5, 1, 16];
  const w = 2 * Math.PI * fn;
  let top = 0;
  const phase = (t: number) => 2 * Math.PI * (from * t + (rate * t * t) / 2);
  const speed = (t: number) => 2 * Math.PI * (from + rate * t);
  const f = (t: number, [x, v]: number[]) => {
    const u = Math.sin(phase(t));
    const du = speed(t) * Math.cos(phase(t));
    return [v, -2 * zeta * w * (v - du) - w * w * (x - u)];
  };
  let at = 0;
  solveOde(f, 0, [0, 0], (to - from) / rate, 20000, (t, [x]) => {
    if (Math.abs(x) > top) [top, at] = [Math.abs(x), t];
  });
  // the library's end values are sharper than its values on the way: close in on the turning point with them
  const end = (t: number) => solveOde(f, 0, [0, 0], t, 1, () => {});
  let [low, high] = [at - 0.002, at + 0.002];
  const before = end(low)[1];
  for (let round = 0; round < 14; round++) {
    const middle = (low + high) / 2;
    if (end(middle)[1] * before > 0) low = middle;
    else high = middle;
  }
  expect(Math.abs(runupPeak(fn, zeta, rate, from, to) / Math.abs(end(low)[0]) - 1)).toBeLessThan(1e-8);
});

test("a slow run-up reaches the steady peak, a fast one stays below it, slower is higher", () => {
  const steady = peakTransmissibility(0.05, "viscous");
  const peaks = [25, 5, 1, 0.1].map((rate) => runupPeak(8, 0.05, rate, 0, 16));
  for (let k = 1; k < peaks.length; k++) expect(peaks[k]).toBeGreaterThan(peaks[k - 1]);
  expect(peaks[3]).toBeLessThan(steady);
  expect(Math.abs(peaks[3] / steady - 1)).toBeLessThan(0.01);
});

test("only ratios of rate to fn squared and of frequencies to fn count", () => {
  expect(Math.abs(runupPeak(16, 0.05, 20, 2, 32) / runupPeak(8, 0.05, 5, 1, 16) - 1)).toBeLessThan(1e-12);
});

test("a sweep that stays far below resonance follows the base", () => {
  expect(Math.abs(runupPeak(1000, 0.1, 1, 1, 3) - 1)).toBeLessThan(2e-5);
});

test.each([
  [8, 0.05, 0, 0, 30, "outside-domain"],
  [8, 0.05, 5, 10, 10, "outside-domain"],
  [8, 0.05, 5, -1, 10, "outside-domain"],
  [0, 0.05, 5, 0, 10, "outside-domain"],
  [8, -0.05, 5, 0, 10, "outside-domain"],
  [8, 0.05, 1e-9, 0, 10, "no-convergence"],
  [8, 1e9, 5, 0, 10, "no-convergence"],
  [1e-300, 0.1, 5, 0, 10, "no-convergence"],
  [8, 0.05, 5, 0, 1e300, "no-convergence"],
])("fn %p, zeta %p, rate %p, %p to %p Hz is refused at once: %s", (fn, zeta, rate, from, to, kind) => {
  expect(() => runupPeak(fn, zeta, rate, from, to)).toThrow(expect.objectContaining({ kind }));
});

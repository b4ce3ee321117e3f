import { curvesOf, worstCase } from "../../src/pane/curves";
import type { OperatingPoint } from "../../src/pane/explain";

const point: OperatingPoint = { f: 25, fn: 8, zeta: 0.1, model: "viscous" };
const exact = { naturalFrequency: 0, damping: 0 };

test("the curve starts near 1, ends below the cell's point, and is 1 at the onset of isolation", () => {
  const { absolute, onset } = curvesOf(point, exact);
  expect(absolute[0]!.y).toBeCloseTo(1, 1);
  expect(onset).toBeCloseTo(8 * Math.SQRT2, 12);
  const before = absolute.filter(({ x }) => x < onset).at(-1)!;
  const after = absolute.find(({ x }) => x >= onset)!;
  expect(before.y).toBeGreaterThan(1);
  expect(after.y).toBeLessThanOrEqual(1);
});

test("the cell's point has both responses", () => {
  const { here } = curvesOf(point, exact);
  // from the definitions at r = 3.125, zeta = 0.1, by hand: T = sqrt(1.390625/77.223...), R = r^2/sqrt(...)
  const detuning = (1 - 3.125 ** 2) ** 2 + 0.625 ** 2;
  expect(here!.absolute.y).toBeCloseTo(Math.sqrt((1 + 0.625 ** 2) / detuning), 12);
  expect(here!.relative.y).toBeCloseTo(3.125 ** 2 / Math.sqrt(detuning), 12);
});

test("the highest drawn point is the peak", () => {
  const { absolute, peak } = curvesOf(point, exact);
  const highest = Math.max(...absolute.map(({ y }) => y));
  expect(highest).toBeLessThanOrEqual(peak!.y);
  expect(highest).toBeGreaterThan(peak!.y * 0.999);
});

test("an undamped resonance leaves a gap instead of a number, and has no peak", () => {
  const { absolute, peak, here } = curvesOf({ ...point, f: 8, zeta: 0 }, exact);
  expect(absolute.some(({ y }) => Number.isNaN(y))).toBe(true);
  expect(absolute.every(({ y }) => Number.isNaN(y) || y <= 1000)).toBe(true);
  expect(peak).toBeNull();
  expect(here).toBeNull();
});

test("the band holds the curve and the curves of its corners", () => {
  const tolerances = { naturalFrequency: 0.1, damping: 0.3 };
  const { absolute, worst, best } = curvesOf(point, tolerances);
  for (const fn of [7.2, 8, 8.8]) {
    for (const zeta of [0.07, 0.1, 0.13]) {
      worst.forEach(({ x, y }, i) => {
        const r = x / fn;
        const damping = (2 * zeta * r) ** 2;
        const T = Math.sqrt((1 + damping) / ((1 - r * r) ** 2 + damping));
        expect(T).toBeLessThanOrEqual(y * (1 + 1e-12));
        expect(T).toBeGreaterThanOrEqual(best[i]!.y * (1 - 1e-12));
      });
    }
  }
  expect(worst).toHaveLength(absolute.length);
});

test("without tolerances there is no band", () => {
  expect(curvesOf(point, exact).worst).toEqual([]);
});

test("the worst case at the cell's own frequency", () => {
  // T at the stiffest, most damped corner: fn = 8.8, zeta = 0.12, r = 25/8.8
  const r = 25 / 8.8;
  const damping = (2 * 0.12 * r) ** 2;
  const T = Math.sqrt((1 + damping) / ((1 - r * r) ** 2 + damping));
  expect(worstCase(point, { naturalFrequency: 0.1, damping: 0.2 })!.absolute).toBeCloseTo(T, 12);
});

test.each([
  [0, 8],
  [1e-3, 8],
  [8, 8],
  [1e5, 8],
])("f = %p beside fn = %p lies inside the picture", (f, fn) => {
  const { from, to } = curvesOf({ ...point, f, fn }, exact);
  expect(from).toBeGreaterThan(0);
  expect(Math.max(f, fn)).toBeLessThan(to);
  if (f > 0) expect(Math.min(f, fn)).toBeGreaterThan(from);
});

import { type Bound, type Box, relativeBound, transmissibilityBound } from "../../src/core/bounds";
import { exactAbsolute, exactPeakRatio, exactRelative, type Model } from "../support/exactHarmonic";
import { referenceRows } from "../support/referenceRows";
import { repeatable } from "../support/spreadDoubles";
import { type Big, big, relativeError, stepped, ulpsApart } from "../support/ulps";

test.each(referenceRows("worst-case", "box"))("bounds over the box $in within 1e-12 of mpmath", ({ in: x, out }) => {
  const box = { lowest: x.f1, highest: x.f2, fn: x.fn, zeta: x.zeta, fnTolerance: x.a, zetaTolerance: x.b };
  expect(relativeError(transmissibilityBound(box, "max", "viscous"), out.T_max)).toBeLessThanOrEqual(1e-12);
  expect(relativeError(transmissibilityBound(box, "min", "viscous"), out.T_min)).toBeLessThanOrEqual(1e-12);
});

type Response = "absolute" | "relative";

/** Bounds in 90 digits: corners of the box and, for the largest, the peak of the least damping where it lies inside. */
function exactBound(box: Box, bound: Bound, model: Model, response: Response): Big {
  const one = big(1);
  const a = big(box.fnTolerance);
  const b = big(box.zetaTolerance);
  const least = big(box.zeta).times(one.minus(b));
  const most = big(box.zeta).times(one.plus(b));
  const left = big(box.lowest).div(big(box.fn).times(one.plus(a)));
  const right = big(box.highest).div(big(box.fn).times(one.minus(a)));
  const at = (r: Big, zeta: Big) => {
    if (zeta.isZero() && r.eq(1)) return big(Infinity);
    return response === "absolute" ? exactAbsolute(r, 1, zeta, model) : exactRelative(r, 1, zeta, model);
  };
  const values = [left, right].flatMap((r) => [at(r, least), at(r, most)]);
  if (bound === "min") return values.reduce((x, y) => (y.lt(x) ? y : x));
  const peak = response === "absolute" ? exactPeakRatio(least, model) : relativePeakRatio(least, model);
  if (peak?.gte(left) && peak.lte(right)) values.push(at(peak, least));
  return values.reduce((x, y) => (y.gt(x) ? y : x));
}

function relativePeakRatio(zeta: Big, model: Model): Big | undefined {
  const eight = zeta.times(zeta).times(2);
  if (model === "hysteretic") return eight.times(2).plus(1).sqrt();
  return eight.lt(1) ? big(1).div(big(1).minus(eight)).sqrt() : undefined;
}

/** Boxes about everything that matters: resonance and sqrt 2 fn at an end within three places, no damping, full tolerance. */
function boxes(count: number): Box[] {
  const random = repeatable(99);
  const places = () => Math.floor(random() * 7) - 3;
  const all: Box[] = [];
  while (all.length < count) {
    const fn = 10 ** (random() * 6 - 2);
    const fnTolerance = random() < 0.3 ? 0 : random() < 0.1 ? 1 - 1e-16 : random() / 2;
    const zetaTolerance = random() < 0.3 ? 0 : random() < 0.2 ? 1 : random();
    const zeta = random() < 0.15 ? 0 : 10 ** (random() * 12 - 10);
    let lowest = fn * 10 ** (random() * 3 - 1.5);
    let highest = lowest * (1 + (random() < 0.3 ? 0 : random() * 3));
    const kind = random();
    if (kind < 0.05) lowest = highest = fn;
    else if (kind < 0.1) highest = (lowest = fn) * (1 + random());
    else if (kind < 0.15) lowest = (highest = fn) * random();
    else if (kind < 0.25) highest = (lowest = stepped(fn * (1 + fnTolerance), places())) * (1 + random());
    else if (kind < 0.35) lowest = (highest = stepped(fn * (1 - fnTolerance), places())) * random();
    else if (kind < 0.4) highest = (lowest = stepped(fn * (1 + fnTolerance) * Math.SQRT2, places())) * (1 + random());
    else if (kind < 0.42) lowest = 0;
    if (random() < 0.02) [lowest, highest] = [lowest * 1e-300, highest * 1e-300];
    if (lowest <= highest) all.push({ lowest, highest, fn, zeta, fnTolerance, zetaTolerance });
  }
  return all;
}

const sample = boxes(600);
const kinds = (["absolute", "relative"] as const).flatMap((response) =>
  (["viscous", "hysteretic"] as const).flatMap((model) =>
    (["max", "min"] as const).map((bound) => [response, model, bound] as const),
  ),
);

test.each(kinds)(
  "%s %s %s over 600 boxes is exact to 1e-12, a pole exactly where resonance is undamped",
  (response, model, bound) => {
    const ours = response === "absolute" ? transmissibilityBound : relativeBound;
    const misses: unknown[] = [];
    for (const box of sample) {
      const exact = exactBound(box, bound, model, response);
      try {
        const result = ours(box, bound, model);
        if (!(relativeError(result, exact) <= 1e-12 || ulpsApart(result, exact) <= 4)) misses.push([box, result]);
      } catch (thrown) {
        if ((thrown as { kind?: string }).kind !== "pole" || exact.isFinite()) misses.push([box, thrown]);
      }
    }
    expect(misses).toEqual([]);
  },
);

test("corners alone miss the resonance inside a box; ours does not", () => {
  const box = { lowest: 5, highest: 30, fn: 8, zeta: 0.05, fnTolerance: 0, zetaTolerance: 0 };
  const corners = Math.max(...[5, 30].map((f) => exactAbsolute(f, 8, 0.05, "viscous").toNumber()));
  expect(corners).toBeLessThan(2);
  expect(
    ulpsApart(transmissibilityBound(box, "max", "viscous"), exactBound(box, "max", "viscous", "absolute")),
  ).toBeLessThanOrEqual(4);
});

const good: Box = { lowest: 5, highest: 30, fn: 8, zeta: 0.05, fnTolerance: 0.1, zetaTolerance: 0.2 };

test.each([
  [{ lowest: 31 }, "lowest frequency 31 is above highest frequency 30"],
  [{ lowest: -1 }, "lowest frequency must be 0 or more, got -1"],
  [{ fn: 0 }, "natural frequency must be above 0, got 0"],
  [{ zeta: -0.1 }, "damping ratio must be 0 or more, got -0.1"],
  [{ fnTolerance: 1 }, "natural frequency tolerance must be 0 or more and below 1, got 1"],
  [{ fnTolerance: -0.1 }, "natural frequency tolerance must be 0 or more and below 1, got -0.1"],
  [{ zetaTolerance: 1.1 }, "damping tolerance must be from 0 to 1, got 1.1"],
])("a box with %p is refused: %s", (change, message) => {
  expect(() => transmissibilityBound({ ...good, ...change }, "max", "viscous")).toThrow(message);
  expect(() => relativeBound({ ...good, ...change }, "min", "hysteretic")).toThrow(message);
});

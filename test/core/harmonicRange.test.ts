import { NumericError } from "../../src/core/errors";
import { isolationEfficiency, transmissibilityLevel } from "../../src/core/efficiency";
import { absolutePhase, relativePhase } from "../../src/core/phase";
import {
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../../src/core/transmissibility";
import {
  exactAbsolute,
  exactAbsolutePhase,
  exactEfficiency,
  exactLevel,
  exactRelative,
  exactRelativePhase,
} from "../support/exactHarmonic";
import { CORNERS, repeatable } from "../support/spreadDoubles";
import { type Big, big, stepped, ulpsApart } from "../support/ulps";

type Point = readonly [f: number, fn: number, zeta: number];

/** Every combination of corners, and around each kind of trouble many repeatable points. */
function points(many: number, corners: readonly number[]): Point[] {
  const random = repeatable(12345);
  const everyday = () => 10 ** (random() * 8 - 4);
  const anywhere = () => 10 ** (random() * 616 - 308);
  const places = () => Math.floor(random() * 9) - 4;
  const all: Point[] = [];
  for (const f of [0, ...corners])
    for (const fn of corners) for (const zeta of [0, ...corners]) all.push([f, fn, zeta]);
  for (let i = 0; i < many; i++) {
    const fn = everyday();
    const far = anywhere();
    all.push([everyday(), fn, everyday() / 10]);
    all.push([stepped(fn, places()), fn, 10 ** (-20 * random())]); // a few places beside resonance
    all.push([stepped(fn * Math.SQRT2, places()), fn, 10 ** (10 * random() - 9)]); // beside sqrt 2 fn
    all.push([anywhere(), far, anywhere()]);
    all.push([far * everyday(), far, everyday()]);
    all.push([far * everyday(), far, anywhere()]);
    all.push([stepped(far, places()), far, anywhere()]);
  }
  return all.filter(([f, fn]) => f < Infinity && fn < Infinity);
}

const few = CORNERS.filter((_, i) => i % 2 === 0);
const atAll = points(150, CORNERS);
const atSome = points(60, few); // arctangents of 90 digits take their time
const largest = big(Number.MAX_VALUE);

type Ours = (f: number, fn: number, zeta: number) => number;
type Exact = (f: number, fn: number, zeta: number) => Big;
const quantities: [name: string, budget: number, at: Point[], ours: Ours, exact: Exact][] = [];
for (const model of ["viscous", "hysteretic"] as const) {
  const viscous = model === "viscous";
  const T = viscous ? absoluteTransmissibility : hystereticTransmissibility;
  const R = viscous ? relativeTransmissibility : hystereticRelativeTransmissibility;
  quantities.push(
    [`${model} T`, 4, atAll, T, (...p) => exactAbsolute(...p, model)],
    [`${model} R`, 4, atAll, R, (...p) => exactRelative(...p, model)],
    [`${model} 1 - T`, 8, atAll, (...p) => isolationEfficiency(...p, model), (...p) => exactEfficiency(...p, model)],
    [`${model} dB`, 8, atSome, (...p) => transmissibilityLevel(...p, model), (...p) => exactLevel(...p, model)],
    [
      `${model} phase of X/U`,
      4,
      atSome,
      (...p) => absolutePhase(...p, model),
      (...p) => exactAbsolutePhase(...p, model),
    ],
    [
      `${model} phase of Z/U`,
      4,
      atSome,
      (...p) => relativePhase(...p, model),
      (...p) => exactRelativePhase(...p, model),
    ],
  );
}

test.each(quantities)(
  "%s stays within %p ulp of 90-digit arithmetic over the whole range of doubles",
  (_name, budget, at, ours, exact) => {
    const misses: unknown[] = [];
    for (const point of at) {
      const [f, fn, zeta] = point;
      try {
        const result = ours(f, fn, zeta);
        if (!(ulpsApart(result, exact(f, fn, zeta)) <= budget)) misses.push([point, result]);
      } catch (thrown) {
        const { kind } = thrown as NumericError;
        const pole = zeta === 0 && f === fn;
        const overflow = !pole && exact(f, fn, zeta).abs().gt(largest);
        if (kind !== (pole ? "pole" : overflow ? "overflow" : undefined)) misses.push([point, thrown]);
      }
    }
    expect(misses).toEqual([]);
  },
  60_000,
);

const naive = {
  T: (f: number, fn: number, zeta: number) => {
    const r = f / fn;
    return Math.sqrt((1 + (2 * zeta * r) ** 2) / ((1 - r * r) ** 2 + (2 * zeta * r) ** 2));
  },
  phase: (f: number, fn: number, zeta: number) => {
    const r = f / fn;
    return ((Math.atan2(2 * zeta * r, 1 - r * r) - Math.atan(2 * zeta * r)) * 180) / Math.PI;
  },
};

const traps: [what: string, point: Point, plain: Ours, ours: Ours, exact: Exact, atLeast: number, atMost: number][] = [
  [
    "T one place beside an undamped resonance, from a rounded r",
    [stepped(49.7, 1), 49.7, 0],
    naive.T,
    absoluteTransmissibility,
    (...p) => exactAbsolute(...p, "viscous"),
    1e12,
    4,
  ],
  [
    "1 - T beside sqrt 2 fn, as the difference that it is",
    [stepped(Math.SQRT2, 1), 1, 0.05],
    (...p) => 1 - naive.T(...p),
    (...p) => isolationEfficiency(...p, "viscous"),
    (...p) => exactEfficiency(...p, "viscous"),
    1e12,
    8,
  ],
  [
    "1 - T far below resonance",
    [1e-7, 1, 0.05],
    (...p) => 1 - naive.T(...p),
    (...p) => isolationEfficiency(...p, "viscous"),
    (...p) => exactEfficiency(...p, "viscous"),
    1e12,
    8,
  ],
  [
    "phase of X/U far below resonance, as the difference of two arctangents",
    [1e-6, 1, 0.05],
    naive.phase,
    (...p) => absolutePhase(...p, "viscous"),
    (...p) => exactAbsolutePhase(...p, "viscous"),
    1e6,
    4,
  ],
];

test.each(traps)("the plain formula fails, ours does not: %s", (_what, point, plain, ours, exact, atLeast, atMost) => {
  expect(ulpsApart(plain(...point), exact(...point))).toBeGreaterThan(atLeast);
  expect(ulpsApart(ours(...point), exact(...point))).toBeLessThanOrEqual(atMost);
});

test("T of an infinite frequency ratio in the plain formula is no number; ours is the nearest double", () => {
  expect(naive.T(1e200, 1e-3, 0.1)).toBeNaN();
  expect(
    ulpsApart(absoluteTransmissibility(1e200, 1e-3, 0.1), exactAbsolute(1e200, 1e-3, 0.1, "viscous")),
  ).toBeLessThanOrEqual(4);
});

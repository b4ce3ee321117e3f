import fc from "fast-check";
import { absoluteTransmissibility } from "../../src/core/transmissibility";
import { type Stage, twoStageFrequencies, twoStageTransmissibility } from "../../src/core/twoStage";
import { referenceRows } from "../support/referenceRows";
import { relativeError, ulpsApart } from "../support/ulps";

const stage = ([mass, stiffness, damping]: number[]): Stage => ({ mass, stiffness, damping });

/** 1e-12 of T, and of T again where a resonance magnifies the rounding of the inputs. */
function expectT(f: number, lower: Stage, upper: Stage, T: string): void {
  const budget = 1e-12 * Math.max(1, Number(T));
  expect(relativeError(twoStageTransmissibility(f, lower, upper), T)).toBeLessThan(budget);
}

const plain = referenceRows("systems", "two_stage").map(({ in: i, out }) => [i.f, i, out.T_upper] as const);
test.each(plain)("transmissibility at %p Hz", (f, { m1, k1, c1, m2, k2, c2 }, T) => {
  expectT(f, stage([m1, k1, c1]), stage([m2, k2, c2]), T);
});

const floors = referenceRows("systems", "flexible_floor").map(({ in: i, out }) => [i.f, i, out] as const);
test.each(floors)("a machine on a flexible floor at %p Hz", (f, i, out) => {
  const floor = stage([i.m_floor, i.k_floor, i.c_floor]);
  expectT(f, floor, stage([i.m, i.k, i.c]), out.T_abs_machine_from_ground_motion);
});

const more = referenceRows<[number, number[], number[]], string>("systems_more", "two stage");
test.each(more.map((row) => [row.in, row.out] as const))("unlike stages %p", ([f, lower, upper], T) => {
  expectT(f, stage(lower), stage(upper), T);
});

const natural = referenceRows("systems", "two_stage_natural").map(({ in: i, out }) => [i, out] as const);
test.each(natural)("natural frequencies of %p", ({ m1, k1, m2, k2 }, { f1, f2 }) => {
  const found = twoStageFrequencies(stage([m1, k1, 0]), stage([m2, k2, 0]));
  expect(ulpsApart(found[0], f1)).toBeLessThanOrEqual(4);
  expect(ulpsApart(found[1], f2)).toBeLessThanOrEqual(4);
});

const moreNatural = referenceRows<number[][], string[]>("systems_more", "two stage frequencies");
test.each(moreNatural.map((row) => [row.in, row.out] as const))(
  "natural frequencies of unlike stages %p",
  (stages, out) => {
    const found = twoStageFrequencies(stage(stages[0]), stage(stages[1]));
    found.forEach((f, k) => expect(ulpsApart(f, out[k])).toBeLessThanOrEqual(4));
  },
);

test("a lower stage without mass makes springs in series", () => {
  const T = twoStageTransmissibility(2, stage([1e-12, 3000, 0]), stage([10, 1500, 0]));
  expect(Math.abs(T / absoluteTransmissibility(2, Math.sqrt(1000 / 10) / (2 * Math.PI), 0) - 1)).toBeLessThan(1e-11);
});

test("is 1 at rest, and reciprocal frequencies multiply to that of the separate stages", () => {
  const positive = fc.double({ min: 1e-9, max: 1e9, noNaN: true });
  fc.assert(
    fc.property(positive, positive, positive, positive, (m1, k1, m2, k2) => {
      const [lower, upper] = [stage([m1, k1, 1]), stage([m2, k2, 1])];
      expect(twoStageTransmissibility(0, lower, upper)).toBe(1);
      const [low, high] = twoStageFrequencies(lower, upper);
      const product = (Math.sqrt(k1 / m1) * Math.sqrt(k2 / m2)) / (2 * Math.PI) ** 2;
      expect(Math.abs((low * high) / product - 1)).toBeLessThan(1e-14);
      expect(low).toBeLessThanOrEqual(high);
    }),
  );
});

test("extreme inputs give a number or an error, never NaN", () => {
  for (const f of [0, 1e-300, 1, 1e150, 1e300]) {
    for (const m of [1e-300, 1, 1e300]) {
      for (const k of [1e-300, 1, 1e300]) {
        for (const c of [0, 1e-300, 1e300]) {
          try {
            expect(Number.isFinite(twoStageTransmissibility(f, stage([m, k, c]), stage([1, k, c])))).toBe(true);
          } catch (error) {
            expect(["overflow", "pole"]).toContain((error as { kind: string }).kind);
          }
        }
      }
    }
  }
});

test.each([
  [-1, [1, 1, 1], [1, 1, 1], "frequency must be 0 or more"],
  [1, [0, 1, 1], [1, 1, 1], "lower mass must be above 0"],
  [1, [1, 1, 1], [1, 0, 1], "upper stiffness must be above 0"],
  [1, [1, 1, 1], [1, 1, -1], "upper damping must be 0 or more"],
])("f %p with stages %p and %p: %s", (f, lower, upper, message) => {
  expect(() => twoStageTransmissibility(f, stage(lower), stage(upper))).toThrow(message);
});

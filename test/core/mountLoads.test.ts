import fc from "fast-check";
import { type Mount, mountLoads } from "../../src/core/mountLoads";
import { referenceRows } from "../support/referenceRows";
import { relativeError } from "../support/ulps";

const mounts = (rows: number[][]): Mount[] => rows.map(([x, y, stiffness]) => ({ x, y, stiffness }));

const rows = referenceRows<[number[][], number, [number, number]], string[]>("systems_more", "loads");
test.each(rows.map((row, k) => [k + 1, row.in, row.out] as const))(
  "layout %p is shared exactly",
  (_, [layout, weight, cg], out) => {
    const loads = mountLoads(mounts(layout), weight, ...cg);
    loads.forEach((load, k) => expect(relativeError(load, out[k])).toBeLessThan(1e-14));
  },
);

type SixDof = { m: number; cg: number[]; mounts: { pos: number[]; k: number[] }[]; layout: string };
const flat = referenceRows<SixDof, { mount_vertical_load_N: string[] }>("systems", "six_dof").filter(({ in: i }) =>
  i.layout.includes("symmetric_4"),
);
test.each(flat.map((row) => [row.in.layout, row] as const))(
  "%s carries its weight as in six degrees of freedom",
  (_, row) => {
    const layout = row.in.mounts.map(({ pos, k }) => [pos[0], pos[1], k[2]]);
    const loads = mountLoads(mounts(layout), row.in.m * 9.80665, row.in.cg[0], row.in.cg[1]);
    loads.forEach((load, k) => expect(relativeError(load, row.out.mount_vertical_load_N[k])).toBeLessThan(1e-14));
  },
);

test.each([
  [[[0, 0, 1], [2, 0, 1], [0, 2, 1]], 900, 0.5, 0.5, [450, 225, 225], "three mounts: balance alone"], // prettier-ignore
  [[[0, 0, 5], [2, 0, 7]], 100, 0.5, 0, [75, 25], "two mounts, the weight between them"], // prettier-ignore
  [[[0, 0, 5], [3, 3, 7]], 100, 4, 4, [-100 / 3, 400 / 3], "two mounts, the weight beyond one: uplift"], // prettier-ignore
  [[[3, 5, 2]], 10, 3, 5, [10], "one mount under the weight"],
  [[[3, 5, 2], [3, 5, 6]], 8, 3, 5, [2, 6], "two mounts at one place"], // prettier-ignore
])("%p under %p at (%p, %p) gives %p: %s", (layout, weight, x, y, expected) => {
  const loads = mountLoads(mounts(layout), weight, x, y);
  loads.forEach((load, k) => expect(Math.abs(load - expected[k])).toBeLessThan(1e-13 * weight));
});

test("loads balance the weight and its moments for any layout", () => {
  const place = fc.integer({ min: -50, max: 50 });
  const mount = fc.tuple(place, place, fc.double({ min: 1e3, max: 1e7, noNaN: true }));
  fc.assert(
    fc.property(fc.array(mount, { minLength: 3, maxLength: 12 }), place, place, (layout, x, y) => {
      const [a, b, c] = layout;
      fc.pre(Math.abs((b[0] - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (b[1] - a[1])) > 100);
      const loads = mountLoads(mounts(layout), 1000, x, y);
      const scale = loads.reduce((sum, load) => sum + Math.abs(load), 0);
      const total = (arm: (k: number) => number) => loads.reduce((sum, load, k) => sum + load * arm(k), 0);
      expect(Math.abs(total(() => 1) - 1000)).toBeLessThan(1e-11 * scale);
      expect(Math.abs(total((k) => layout[k][0] - x))).toBeLessThan(1e-9 * scale);
      expect(Math.abs(total((k) => layout[k][1] - y))).toBeLessThan(1e-9 * scale);
    }),
  );
});

test.each([
  [[], 10, 0, 0, "a frame needs one mount or more"],
  [[[0, 0, 0]], 10, 0, 0, "stiffness of mount 1 must be above 0, got 0"],
  [[[0, 0, 1], [NaN, 0, 1]], 10, 0, 0, "x of mount 2"], // prettier-ignore
  [[[0, 0, 1]], 0, 0, 0, "weight must be above 0, got 0"],
  [[[0, 0, 1], [1, 1, 1]], 10, 0.5, 0.6, "the frame would tip"], // prettier-ignore
  [[[0, 0, 1]], 10, 0.1, 0, "the frame would tip"],
])("%p under %p at (%p, %p): %s", (layout, weight, x, y, message) => {
  expect(() => mountLoads(mounts(layout), weight, x, y)).toThrow(message);
});

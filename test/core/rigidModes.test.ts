import { rigidBodyFrequencies, type Vector } from "../../src/core/rigidModes";
import { referenceRows } from "../support/referenceRows";
import { relativeError } from "../support/ulps";

type SixDof = { layout: string; m: number; inertia: Vector[]; cg: number[]; mounts: { pos: number[]; k: Vector }[] };
const plain = referenceRows<SixDof, { natural_frequencies_hz: string[] }>("systems", "six_dof");
test.each(plain.map((row) => [row.in.layout, row] as const))("%s has its six frequencies", (_, { in: i, out }) => {
  const positions = i.mounts.map(({ pos }) => pos.map((value, axis) => value - i.cg[axis]) as unknown as Vector);
  const found = rigidBodyFrequencies(i.m, i.inertia, positions, i.mounts.map(({ k }) => k)); // prettier-ignore
  found.forEach((f, k) => expect(relativeError(f, out.natural_frequencies_hz[k])).toBeLessThan(1e-14));
});

type Body = { mass: number; inertia: Vector[]; positions: Vector[]; stiffnesses: Vector[] };
const more = referenceRows<Body, string[]>("systems_more", "modes");
test.each(more.map((row, k) => [k + 1, row] as const))("body %p, its soft modes to all digits", (_, { in: i, out }) => {
  const found = rigidBodyFrequencies(i.mass, i.inertia, i.positions, i.stiffnesses);
  found.forEach((f, k) => expect(relativeError(f, out[k])).toBeLessThan(1e-14));
});

const unit: Vector[] = [[1, 0, 0], [0, 1, 0], [0, 0, 1]]; // prettier-ignore
const corner = (x: number, y: number, z: number): Vector => [x, y, z];

test("four mounts in the plane of the centre of gravity: three uncoupled translations, rotations by hand", () => {
  const [m, a, b] = [200, 0.5, 0.3];
  const inertia: Vector[] = [[6, 0, 0], [0, 12, 0], [0, 0, 16]]; // prettier-ignore
  const k: Vector = [1e5, 1e5, 3e5];
  const positions = [corner(a, b, 0), corner(-a, b, 0), corner(a, -b, 0), corner(-a, -b, 0)];
  const found = rigidBodyFrequencies(m, inertia, positions, [k, k, k, k]);
  const byHand = [
    4 * k[0] / m, 4 * k[1] / m, 4 * k[2] / m,
    4 * k[2] * b * b / 6, 4 * k[2] * a * a / 12, 4 * (k[0] * b * b + k[1] * a * a) / 16,
  ]; // prettier-ignore
  const expected = byHand.map((w2) => Math.sqrt(w2) / (2 * Math.PI)).sort((p, q) => p - q);
  found.forEach((f, i) => expect(Math.abs(f / expected[i] - 1)).toBeLessThan(1e-14));
});

test("a plane of symmetry gives the quadratic of two coupled modes (m 500, I 61.25, kx 240e3, kz 400e3, a 0.40, b 0.45)", () => {
  const quarter: Vector = [60e3, 60e3, 100e3];
  const positions = [
    corner(0.45, 0.3, -0.4),
    corner(-0.45, 0.3, -0.4),
    corner(0.45, -0.3, -0.4),
    corner(-0.45, -0.3, -0.4),
  ];
  const inertia: Vector[] = [[50, 0, 0], [0, 61.25, 0], [0, 0, 70]]; // prettier-ignore
  const found = rigidBodyFrequencies(500, inertia, positions, [quarter, quarter, quarter, quarter]);
  const [m, I, kx, kt, a] = [500, 61.25, 240e3, 240e3 * 0.16 + 400e3 * 0.2025, 0.4];
  const sum = kx / m + kt / I;
  const root = Math.sqrt(sum * sum - (4 * (kx * kt - kx * kx * a * a)) / (m * I));
  for (const w2 of [(sum - root) / 2, (sum + root) / 2]) {
    const f = Math.sqrt(w2) / (2 * Math.PI);
    expect(Math.min(...found.map((each) => Math.abs(each / f - 1)))).toBeLessThan(1e-13);
  }
});

test("equal modes come out equal, unresisted ones as a clean 0", () => {
  const spring: Vector = [100, 100, 100];
  expect([...rigidBodyFrequencies(10, unit, [corner(0, 0, 0)], [spring])].slice(0, 3)).toEqual([0, 0, 0]);
  const octahedron = [
    corner(1, 0, 0),
    corner(-1, 0, 0),
    corner(0, 1, 0),
    corner(0, -1, 0),
    corner(0, 0, 1),
    corner(0, 0, -1),
  ];
  const found = rigidBodyFrequencies(10, unit, octahedron, octahedron.map(() => spring)); // prettier-ignore
  const translation = Math.sqrt(600 / 10) / (2 * Math.PI);
  const rotation = Math.sqrt(400 / 1) / (2 * Math.PI);
  [translation, translation, translation, rotation, rotation, rotation].forEach((f, k) =>
    expect(Math.abs(found[k] / f - 1)).toBeLessThan(1e-14),
  );
  const unstiff: Vector = [0, 0, 0];
  expect([...rigidBodyFrequencies(10, unit, [corner(1, 2, 3)], [unstiff])]).toEqual([0, 0, 0, 0, 0, 0]);
});

test("does not depend on the order of mounts, the axes or splitting a mount in two", () => {
  const positions = [corner(0.4, 0.3, -0.2), corner(0.45, -0.3, -0.2), corner(-0.4, 0.35, -0.25)];
  const stiffnesses: Vector[] = [[6e4, 5e4, 1e5], [6e4, 7e4, 1.4e5], [8e4, 6e4, 9e4]]; // prettier-ignore
  const inertia: Vector[] = [[9.5, -0.7, 0.4], [-0.7, 13.2, -1.1], [0.4, -1.1, 15.9]]; // prettier-ignore
  const found = rigidBodyFrequencies(180, inertia, positions, stiffnesses);
  const turn = ([x, y, z]: Vector): Vector => [y, z, x];
  const turned = turn(inertia.map(turn) as unknown as Vector) as unknown as Vector[];
  const others = [
    rigidBodyFrequencies(180, inertia, [...positions].reverse(), [...stiffnesses].reverse()),
    rigidBodyFrequencies(180, turned, positions.map(turn), stiffnesses.map(turn)),
    rigidBodyFrequencies(
      180,
      inertia,
      [...positions, positions[0]],
      [
        stiffnesses[0].map((k) => k / 4) as unknown as Vector,
        ...stiffnesses.slice(1),
        stiffnesses[0].map((k) => (3 * k) / 4) as unknown as Vector,
      ],
    ),
  ];
  for (const other of others) other.forEach((f, k) => expect(Math.abs(f / found[k] - 1)).toBeLessThan(1e-14));
});

const one: Vector[] = [[1, 1, 1]];
test.each([
  [0, unit, one, one, "mass must be above 0"],
  [1, [[1, 0, 0], [0, 0, 0], [0, 0, 1]], one, one, "moment of inertia yy must be above 0"], // prettier-ignore
  [1, [[1, 0.1, 0], [0.2, 1, 0], [0, 0, 1]], one, one, "row 1 column 2 is 0.1, row 2 column 1 is 0.2"], // prettier-ignore
  [1, [[1, 1, 0], [1, 1, 0], [0, 0, 1]], one, one, "too large for the moments of inertia"], // prettier-ignore
  [1, [[3, 0, 0], [0, 1, 0], [0, 0, 1]], one, one, "which no body has"], // prettier-ignore
  [1, unit, one, [[1, -1, 1]], "stiffness y of mount 1 must be 0 or more, got -1"],
  [1, unit, [[1, NaN, 1]], one, "position y of mount 1"],
  [1, unit, [], [], "there are 0 positions"],
] as [number, Vector[], Vector[], Vector[], string][])(
  "mass %p, inertia %p, at %p, springs %p: %s",
  (mass, inertia, positions, springs, message) => {
    expect(() => rigidBodyFrequencies(mass, inertia, positions, springs)).toThrow(message);
  },
);

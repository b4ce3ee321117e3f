import { relaxationTransmissibility } from "../../src/core/relaxation";
import { surgeFrequency } from "../../src/core/surge";
import { absoluteTransmissibility } from "../../src/core/transmissibility";
import { referenceRows } from "../support/referenceRows";
import { ulpsApart } from "../support/ulps";

const plain = referenceRows("systems", "elastic_damper").map(
  ({ in: i, out }) => [i.r, i.zeta, i.N, out.T_abs] as const,
);
test.each(plain)("relaxation mount at r %p, zeta %p, N %p is within 4 ulp", (r, zeta, N, T) => {
  expect(ulpsApart(relaxationTransmissibility(r, 1, zeta, N), T)).toBeLessThanOrEqual(4);
});

const more = referenceRows<number[], string>("systems_more", "relaxation").map((row) => [...row.in, row.out] as const);
test.each(more)("relaxation mount at f %p, fn %p, zeta %p, N %p is within 4 ulp", (f, fn, zeta, N, T) => {
  expect(
    ulpsApart(relaxationTransmissibility(f as number, fn as number, zeta as number, N as number), T),
  ).toBeLessThanOrEqual(4);
});

test("beside the stiff resonance r^2 = 1 + N the plain form loses half of its digits", () => {
  const [r, N, zeta] = [3.3166247904, 10, 1e14]; // a damper as good as rigid
  const d = 2 * zeta * r;
  const naive = Math.hypot(N, d * (1 + N)) / Math.hypot(N * (1 - r * r), d * (1 + N - r * r));
  const ours = relaxationTransmissibility(r, 1, zeta, N);
  expect(Math.abs(naive / ours - 1)).toBeGreaterThan(1e-7);
});

test("fixed point: at r^2 = 2(N + 1)/(N + 2) the transmissibility is 1 + 2/N for every damping", () => {
  for (const N of [1, 5, 20]) {
    const r = Math.sqrt((2 * (N + 1)) / (N + 2));
    for (const zeta of [0, 0.2, 3]) {
      expect(Math.abs(relaxationTransmissibility(r, 1, zeta, N) / (1 + 2 / N) - 1)).toBeLessThan(1e-13);
    }
  }
});

test("a very stiff damper spring makes the ordinary mount", () => {
  for (const [f, zeta] of [
    [3, 0.2],
    [0.7, 1],
    [50, 0.05],
  ]) {
    // prettier-ignore
    expect(Math.abs(relaxationTransmissibility(f, 1, zeta, 1e18) / absoluteTransmissibility(f, 1, zeta) - 1)).toBeLessThan(1e-14);
  }
});

test.each([
  [1, 1, 0, 3, "pole"],
  [1, 1, 0.1, 0, "outside-domain"],
  [1, 0, 0.1, 3, "outside-domain"],
  [-1, 1, 0.1, 3, "outside-domain"],
])("f %p, fn %p, zeta %p, N %p is refused: %s", (f, fn, zeta, N, kind) => {
  expect(() => relaxationTransmissibility(f, fn, zeta, N)).toThrow(expect.objectContaining({ kind }));
});

test.each([
  [50000, 2, "79.0569415042094832999723386108179633", 1],
  [4e300, 1e-300, "1e300", 1],
])("surge frequency of k %p, ms %p is %s within %p ulp", (k, ms, expected, ulps) => {
  expect(ulpsApart(surgeFrequency(k, ms), expected)).toBeLessThanOrEqual(ulps);
});

test("surge needs a spring with mass and stiffness", () => {
  expect(() => surgeFrequency(0, 1)).toThrow("stiffness must be above 0");
  expect(() => surgeFrequency(1, 0)).toThrow("spring mass must be above 0");
});

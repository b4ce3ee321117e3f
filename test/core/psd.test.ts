import fc from "fast-check";
import { densityAt, profileRms, readProfile } from "../../src/core/psd";
import { publishedEntries } from "../support/published";
import { referenceRows } from "../support/referenceRows";
import { relativeError } from "../support/ulps";

const profileOf = (points: [number, number][]) =>
  readProfile(
    points.map(([f]) => f),
    points.map(([, S]) => S),
  );

describe("overall level", () => {
  type Band = { profile: string; breakpoints: [number, number][]; f1?: number; f2?: number };
  const cases = [...referenceRows<Band>("random", "overall"), ...referenceRows<Band>("random", "band")];
  test.each(cases.map((row) => [row.in.profile, row] as const))("of %s is exact to 1e-13", (_, row) => {
    const { breakpoints, f1, f2 } = row.in;
    expect(relativeError(profileRms(profileOf(breakpoints), f1, f2), row.out.a_rms_g)).toBeLessThan(1e-13);
  });

  // printed levels of published profiles, profiles and levels from memory of the named documents
  const published = [
    "GSFC-STD-7000",
    "NAVMAT",
    "NASA-STD-7001",
    "MIL-STD-1540",
    "US highway truck",
    "ASTM D4169",
  ].flatMap(publishedEntries);
  test.each(published.map((entry) => [entry.source, entry] as const))("of %s is as printed", (source, entry) => {
    const points = JSON.parse(/\[\(.*\)\]/.exec(source)![0].replace(/\(/g, "[").replace(/\)/g, "]"));
    const rms = profileRms(profileOf(points));
    expect(Math.abs(rms - parseFloat(entry.printed))).toBeLessThanOrEqual(Number(entry.tolerance));
    expect(relativeError(rms, entry.computed)).toBeLessThan(1e-13);
  });

  test("a slope that evaluates to -0.9999999999999998 ruins the power form and not ours", () => {
    const [f1, f2] = [20, 2000];
    const [S1, S2] = [0.07, 0.0007000000000000001];
    const n = Math.log(S2 / S1) / Math.log(f2 / f1);
    const naive = Math.sqrt(((S1 * f1) / (n + 1)) * ((f2 / f1) ** (n + 1) - 1));
    const exact = Math.sqrt(S1 * f1 * Math.log(100)); // slope -1 to within the rounding of 0.0007
    const ours = profileRms(profileOf([[f1, S1], [f2, S2]])); // prettier-ignore
    expect(Math.abs(ours / exact - 1)).toBeLessThan(1e-13);
    expect(n).toBe(-0.9999999999999998);
    expect(Math.abs(naive / exact - 1)).toBeGreaterThan(0.04);
  });

  test("adds up over adjoining bands whatever the profile", () => {
    const step = fc.tuple(fc.double({ min: 1e-3, max: 5, noNaN: true }), fc.double({ min: -30, max: 30, noNaN: true }));
    fc.assert(
      fc.property(
        fc.array(step, { minLength: 2, maxLength: 8 }),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (steps, at) => {
          let f = 1;
          const points = steps.map(([rise, level]) => [(f *= 1 + rise), Math.exp(level)] as [number, number]);
          const profile = profileOf(points);
          const [low, high] = [points[0][0], f];
          const middle = low + (high - low) * at;
          const parts = Math.hypot(profileRms(profile, low, middle), profileRms(profile, middle, high));
          expect(Math.abs(parts / profileRms(profile) - 1)).toBeLessThan(1e-12);
        },
      ),
    );
  });

  test("survives densities at the ends of the double range", () => {
    expect(relativeError(profileRms(profileOf([[1, 1e308], [3, 1e308]])), "1.4142135623730950488e154")).toBeLessThan(1e-15); // prettier-ignore
    expect(profileRms(profileOf([[1e-300, 5e-324], [1e300, 1e308]]))).toBeGreaterThan(1e300); // prettier-ignore
  });
});

describe("density at a frequency", () => {
  const profile = profileOf([[20, 0.01], [80, 0.04], [500, 0.04], [2000, 0.01]]); // prettier-ignore

  test.each([
    [20, 0.01, "break-point"],
    [80, 0.04, "break-point"],
    [2000, 0.01, "break-point"],
    [40, 0.02, "slope of +1, twice the frequency"],
    [123.4, 0.04, "level part"],
    [1000, 0.02, "slope of -1"],
  ])("at %p Hz is %p: %s", (f, S) => {
    expect(Math.abs(densityAt(profile, f) / S - 1)).toBeLessThan(1e-15);
  });

  test("keeps 1e-13 on a wall of 400 decades", () => {
    const wall = profileOf([[50, 1e-200], [51, 1e200]]); // prettier-ignore
    const middle = Math.sqrt(50) * Math.sqrt(51);
    expect(Math.abs(densityAt(wall, middle) - 1)).toBeLessThan(1e-11); // the place itself is only known to an ulp x 46,000
  });

  test("is not covered outside the break-points, to the last bit", () => {
    expect(() => densityAt(profile, 19.999999999999996)).toThrow("the profile covers 20 to 2000 Hz");
    expect(() => densityAt(profile, 2000.0000000000002)).toThrow(expect.objectContaining({ kind: "not-covered" }));
  });
});

describe("a bad table names its row", () => {
  test.each([
    [[20, 100, 80], [1, 1, 1], "frequencies must rise: row 3 (80) is not above row 2 (100)"],
    [[20, 20], [1, 1], "frequencies must rise: row 2 (20) is not above row 1 (20)"],
    [[0, 20], [1, 1], "frequency must be above 0: row 1 is 0"],
    [[10, 20], [1, 0], "density must be above 0: row 2 is 0"],
    [[10, 20], [1, -2], "density must be above 0: row 2 is -2"],
    [[10, 20], [1, NaN], "density in row 2 is not a number"],
    [[10, Infinity], [1, 1], "frequency must be above 0: row 2 is Infinity"],
    [[10], [1], "a profile needs two points or more, got 1"],
    [[10, 20], [1], "there are 2 frequencies but 1 densities"],
  ])("%p with %p: %s", (frequencies, densities, message) => {
    expect(() => readProfile(frequencies, densities)).toThrow(message);
  });

  test("a band that does not rise is refused", () => {
    const profile = profileOf([[10, 1], [20, 1]]); // prettier-ignore
    expect(() => profileRms(profile, 15, 15)).toThrow("the band must rise: it runs from 15 to 15 Hz");
    expect(() => profileRms(profile, 5, 15)).toThrow("covers 10 to 20 Hz, not 5 Hz");
  });
});

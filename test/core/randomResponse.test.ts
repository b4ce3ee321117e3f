import fc from "fast-check";
import { bandTransmissibility } from "../../src/core/bandTransmissibility";
import { milesRms, peakFactor } from "../../src/core/peakFactor";
import { profileRms, readProfile } from "../../src/core/psd";
import { responseHistory } from "../../src/core/history";
import { readRecord } from "../../src/core/record";
import { randomResponseRms, type Response } from "../../src/core/randomResponse";
import { absoluteTransmissibility, type DampingModel } from "../../src/core/transmissibility";
import { seededNormal } from "../support/noise";
import { referenceRows } from "../support/referenceRows";
import { relativeError, ulpsApart } from "../support/ulps";

const profileOf = (points: [number, number][]) =>
  readProfile(
    points.map(([f]) => f),
    points.map(([, S]) => S),
  );
const flat = profileOf([[20, 0.01], [2000, 0.01]]); // prettier-ignore

describe("rms response", () => {
  const STANDARD_GRAVITY = 9.80665;
  const rows = referenceRows<{ profile: string; breakpoints: [number, number][]; fn: number; zeta: number }>(
    "random",
    "response",
  );
  test.each(rows.map((row) => [row.in.profile, row.in.fn, row.in.zeta, row] as const))(
    "of %s at fn %p, zeta %p agrees with high-precision quadrature to 1e-13",
    (_, fn, zeta, row) => {
      const profile = profileOf(row.in.breakpoints);
      const of = (response: Response) => randomResponseRms(profile, fn, zeta, response, "viscous");
      expect(relativeError(of("acceleration"), row.out.abs_accel_rms_g)).toBeLessThan(1e-13);
      expect(relativeError(of("deflection") * STANDARD_GRAVITY, row.out.rel_disp_rms_m)).toBeLessThan(1e-13);
    },
  );

  interface Case {
    profile: string;
    points: [number, number][];
    fn: number;
    zeta: number;
    model: DampingModel;
    response: Response;
  }
  const extremes = referenceRows<Case, string>("random_more", "response");
  test.each(extremes.map(({ in: i, out }) => [i.profile, i.fn, i.zeta, i.model, i.response, i.points, out] as const))(
    "of the %s profile at fn %p, zeta %p, %s, %s agrees to 1e-13",
    (_, fn, zeta, model, response, points, out) => {
      expect(relativeError(randomResponseRms(profileOf(points), fn, zeta, response, model), out)).toBeLessThan(1e-13);
    },
  );

  test("a trapezoid rule on 200 points misses the resonance that ours keeps", () => {
    const zeta = 0.0001;
    const exact = randomResponseRms(flat, 100, zeta, "acceleration", "viscous");
    let sum = 0;
    let before = { f: 20, y: 0.01 * absoluteTransmissibility(20, 100, zeta) ** 2 };
    for (let k = 1; k <= 200; k++) {
      const f = 20 * 100 ** (k / 200);
      const y = 0.01 * absoluteTransmissibility(f, 100, zeta) ** 2;
      sum += ((y + before.y) / 2) * (f - before.f);
      before = { f, y };
    }
    expect(Math.abs(Math.sqrt(sum) / exact - 1)).toBeGreaterThan(0.2);
    expect(Math.abs(exact / milesRms(100, zeta, 0.01, "exact") - 1)).toBeLessThan(2e-3); // band from 20 Hz on
  });

  test("a stiff mount follows the base and a very soft one leaves its deflection to the base", () => {
    const base = profileRms(flat);
    expect(Math.abs(randomResponseRms(flat, 1e9, 0.1, "acceleration", "viscous") / base - 1)).toBeLessThan(1e-11);
    const displacement = Math.sqrt((0.01 * (20 ** -3 - 2000 ** -3)) / 3) / (2 * Math.PI) ** 2;
    const soft = randomResponseRms(flat, 1e-6, 0, "deflection", "viscous");
    expect(Math.abs(soft / displacement - 1)).toBeLessThan(1e-12);
  });

  test("does not depend on break-points put on a straight line of the profile", () => {
    const cut = fc.double({ min: 20.001, max: 1999, noNaN: true });
    const zeta = fc.double({ min: 1e-6, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.uniqueArray(cut, { maxLength: 5 }), zeta, fc.boolean(), (cuts, z, viscous) => {
        const points = [20, ...cuts.sort((a, b) => a - b), 2000].map((f) => [f, 0.01] as [number, number]);
        const model = viscous ? "viscous" : "hysteretic";
        for (const response of ["acceleration", "deflection"] as const) {
          const whole = randomResponseRms(flat, 300, z, response, model);
          expect(Math.abs(randomResponseRms(profileOf(points), 300, z, response, model) / whole - 1)).toBeLessThan(
            1e-12,
          );
        }
      }),
    );
  });

  // White samples joined by straight lines have the one-sided density 2 dt sinc(f dt)^4; the time domain, solved exactly
  // over each interval, must then show the mean square of the frequency domain. 100 blocks of 67 correlation times each.
  test.each(["acceleration", "deflection"] as const)(
    "of %s lies within 4 standard errors of a fixed-seed Monte-Carlo run in the time domain",
    (response) => {
      const [dt, fn, zeta, blocks, length] = [0.001, 60, 0.1, 100, 4000];
      const normal = seededNormal(20240229);
      const record = readRecord(Float64Array.from({ length: (blocks + 1) * length }, normal), dt);
      const motion = responseHistory(record, fn, zeta, response);
      const means: number[] = [];
      for (let k = 1; k <= blocks; k++) {
        const block = motion.subarray(k * length, (k + 1) * length);
        means.push(block.reduce((sum, x) => sum + x * x, 0) / length);
      }
      const mean = means.reduce((sum, x) => sum + x, 0) / blocks;
      const error = Math.sqrt(means.reduce((sum, x) => sum + (x - mean) ** 2, 0) / (blocks - 1) / blocks);

      const sinc = (x: number) => Math.sin(x) / x;
      const points = Array.from({ length: 2000 }, (_, k) => 0.01 * (990 / 0.01) ** (k / 1999)).map(
        (f) => [f, 2 * dt * sinc(Math.PI * f * dt) ** 4] as [number, number],
      );
      const exact = randomResponseRms(profileOf(points), fn, zeta, response, "viscous") ** 2;
      expect(Math.abs(mean - exact)).toBeLessThan(4 * error);
      expect(error).toBeLessThan(0.02 * exact); // so that the interval says something
    },
  );

  test.each([
    [0, 100, "pole"],
    [0, 20, "pole"],
    [0, 2000, "pole"],
    [-0.1, 100, "outside-domain"],
    [0.1, 0, "outside-domain"],
    [NaN, 100, "not-a-number"],
    [0.1, 1e-200, "overflow"],
    [1e-200, 100, "no-convergence"],
    [1e200, 100, "no-convergence"],
  ])("zeta %p at fn %p is refused: %s", (zeta, fn, kind) => {
    expect(() => randomResponseRms(flat, fn, zeta, "acceleration", "viscous")).toThrow(
      expect.objectContaining({ kind }),
    );
  });

  test("undamped, the natural frequency one bit outside the band gives a number", () => {
    expect(randomResponseRms(flat, 19.999999999999996, 0, "acceleration", "viscous")).toBeGreaterThan(1e6);
  });
});

describe("band transmissibility", () => {
  const rows = referenceRows<Record<string, number>, string>("random_more", "band").map(
    ({ in: i, out }) => [i.fc, i.fn, i.zeta, i.b, out] as const,
  );
  test.each(rows)("of %p about fn %p, zeta %p, 1/%p octave agrees to 1e-13", (fc, fn, zeta, b, out) => {
    expect(relativeError(bandTransmissibility(fc, fn, zeta, b), out)).toBeLessThan(1e-13);
  });

  test("of a very narrow band is the transmissibility at its centre", () => {
    const narrow = bandTransmissibility(30, 10, 0.2, 1e7);
    expect(Math.abs(narrow / absoluteTransmissibility(30, 10, 0.2) - 1)).toBeLessThan(1e-12);
  });

  test.each([
    [5, 5, 0, 3, "pole"],
    [5, 5, 0.1, 2.5, "outside-domain"],
    [5, 5, 0.1, 0, "outside-domain"],
    [0, 5, 0.1, 3, "outside-domain"],
    [5, 0, 0.1, 3, "outside-domain"],
  ])("fc %p, fn %p, zeta %p, b %p is refused: %s", (fc, fn, zeta, b, kind) => {
    expect(() => bandTransmissibility(fc, fn, zeta, b)).toThrow(expect.objectContaining({ kind }));
  });
});

describe("Miles' equation", () => {
  test.each([
    // fn, zeta, density, form, rms, ulps
    [100, 0.05, 0.04, "short", "7.9266545952120218891845194075", 4],
    [100, 0.05, 0.04, "exact", "7.96618927734671775699672241992", 4],
    [2, 0.5, 2 / Math.PI, "exact", "2.00000000000000006182238607512", 4],
    [1e300, 1e-8, 1e300, "short", "8.86226925452758050909147615733e303", 4],
    [1e-300, 1e150, 1e300, "exact", "1.77245385090551607905333096546e75", 4],
  ] as const)("at fn %p, zeta %p, density %p, %s gives %s", (fn, zeta, density, form, rms, ulps) => {
    expect(ulpsApart(milesRms(fn, zeta, density, form), rms)).toBeLessThanOrEqual(ulps);
  });

  test("without damping is a pole", () => {
    expect(() => milesRms(100, 0, 1, "exact")).toThrow(expect.objectContaining({ kind: "pole" }));
  });
});

describe("peak factor", () => {
  test.each([
    [200, 60, "4.46738080567656166847814857751", "mpmath: c + gamma/c, c = sqrt(2 ln 12000)"],
    [1, 2, "1.66765187018409050618983652349", "mpmath: two cycles"],
  ])("of fn %p over %p s is %s: %s", (fn, duration, expected) => {
    expect(relativeError(peakFactor(fn, duration), expected)).toBeLessThan(1e-15);
  });

  test("needs two cycles", () => {
    expect(() => peakFactor(1, 1.9999999999999998)).toThrow("must be 2 cycles or more");
    expect(peakFactor(1e300, 1e300)).toBeGreaterThan(52);
  });
});

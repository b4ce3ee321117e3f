import fc from "fast-check";
import { responseHistory } from "../../src/core/history";
import { pulseResponse } from "../../src/core/pulse";
import type { Response } from "../../src/core/randomResponse";
import { readRecord } from "../../src/core/record";
import { intervalOf, recursionOf } from "../../src/core/recordStep";
import { shockSpectrum } from "../../src/core/srs";
import { largestByInterval } from "../../src/core/srsFast";
import { seededNormal } from "../support/noise";
import { solveOde } from "../support/ode";
import { referenceRows } from "../support/referenceRows";
import { relativeError } from "../support/ulps";

const RESPONSES = ["acceleration", "deflection"] as const;

function recordOf(table: string) {
  const [row] = referenceRows<{ dt: number }>(table, "record");
  return readRecord((row as unknown as { samples: number[] }).samples, row.in.dt);
}

describe("shock response spectrum", () => {
  const halfSine = recordOf("history");
  const plain = referenceRows<{ fn: number; zeta: number }>("history", "srs").map(
    ({ in: i, out }) => [i.fn, i.zeta, out] as const,
  );
  test.each(plain)("of a sampled half-sine at %p Hz, zeta %p agrees to 1e-14", (fn, zeta, out) => {
    const [acceleration] = shockSpectrum(halfSine, [fn], zeta, "acceleration");
    const [deflection] = shockSpectrum(halfSine, [fn], zeta, "deflection");
    expect(relativeError(acceleration, out.srs_maximax_continuous)).toBeLessThan(1e-14);
    const expected = Math.max(Number(out.rel_disp_max_continuous), Number(out.rel_disp_residual));
    expect(Math.abs(deflection / expected - 1)).toBeLessThan(1e-14);
  });

  const made = recordOf("history_more");
  const more = referenceRows<{ fn: number; zeta: number; response: Response }, string>("history_more", "srs");
  test.each(more.map((row) => [row.in.fn, row.in.zeta, row.in.response, row] as const))(
    "and history of a made record at %p Hz, zeta %p, %s agree to 1e-12",
    (fn, zeta, response, row) => {
      expect(relativeError(shockSpectrum(made, [fn], zeta, response)[0], row.out)).toBeLessThan(1e-12);
      const history = responseHistory(made, fn, zeta, response);
      const largest = Math.max(...history.map(Math.abs));
      const places = (row as unknown as { history: Record<string, string> }).history;
      for (const [i, value] of Object.entries(places)) {
        expect(Math.abs(history[Number(i)] - Number(value))).toBeLessThan(1e-12 * largest);
      }
    },
  );

  test("is the same for a natural frequency alone, in any company and in any order", () => {
    const frequencies = [700, 3, 55, 140, 0.2, 160, 20, 4000, 900];
    for (const response of RESPONSES) {
      const together = shockSpectrum(made, frequencies, 0.05, response);
      frequencies.forEach((fn, k) => expect(shockSpectrum(made, [fn], 0.05, response)[0]).toBe(together[k]));
    }
  });

  test("is the same by the filter and by single intervals", () => {
    const normal = seededNormal(7);
    const record = readRecord(
      Float64Array.from({ length: 3000 }, (_, i) => normal() * Math.exp(-i / 500)),
      0.001,
    );
    for (const fn of [20, 80, 140, 158, 250, 700]) {
      for (const zeta of [0, 0.01, 0.05, 0.5]) {
        const [whole] = shockSpectrum(record, [fn], zeta, "acceleration");
        const { largest } = largestByInterval(record.samples, 2 * Math.PI * fn * 0.001, zeta, true);
        expect(Math.abs(whole / (largest * record.scale) - 1)).toBeLessThan(2e-12);
      }
    }
  });

  test("does not change when samples are put on the straight lines of the record, or zeros after it", () => {
    const sample = fc.double({ min: -100, max: 100, noNaN: true });
    const record = fc.array(sample, { minLength: 3, maxLength: 12 }).filter((p) => p.some((x) => Math.abs(x) > 1e-3));
    const fn = fc.double({ min: 0.1, max: 300, noNaN: true });
    fc.assert(
      fc.property(
        record,
        fn,
        fc.constantFrom(0, 0.02, 0.3, 1, 3),
        fc.constantFrom(...RESPONSES),
        (p, f, zeta, response) => {
          const finer = p.flatMap((x, i) => (i + 1 < p.length ? [x, (x + p[i + 1]) / 2] : [x]));
          const [coarse] = shockSpectrum(readRecord([...p, 0], 0.01), [f], zeta, response);
          const [fine] = shockSpectrum(readRecord([...finer, p[p.length - 1] / 2, 0], 0.005), [f], zeta, response);
          const [longer] = shockSpectrum(readRecord([...p, 0, 0, 0, 0, 0, 0, 0], 0.01), [f], zeta, response);
          expect(Math.abs(fine / coarse - 1)).toBeLessThan(1e-10);
          expect(Math.abs(longer / coarse - 1)).toBeLessThan(1e-10);
        },
      ),
    );
  });

  test("of a sampled triangle is that of the pulse", () => {
    const record = readRecord([0, 0.5, 1, 0.5, 0], 0.25);
    for (const fn of [0.01, 0.3, 1, 2.7, 40]) {
      for (const response of RESPONSES) {
        const [sampled] = shockSpectrum(record, [fn], 0.1, response);
        expect(Math.abs(sampled / pulseResponse("triangle", 1, 1, fn, 0.1, response) - 1)).toBeLessThan(1e-12);
      }
    }
  });

  test("counts what lies between samples: up to 16 % more than the samples show", () => {
    const history = responseHistory(made, 480, 0, "acceleration").map(Math.abs);
    const [spectrum] = shockSpectrum(made, [480], 0, "acceleration");
    expect(spectrum / Math.max(...history)).toBeGreaterThan(1.16);
  });

  test("a recursion on the samples loses a low natural frequency that the difference form keeps", () => {
    const [fn, zeta, dt] = [0.001, 0.05, 1e-4];
    const theta = 2 * Math.PI * fn * dt;
    const omega = Math.sqrt(1 - zeta * zeta);
    const E = Math.exp(-zeta * theta);
    const C = E * Math.cos(omega * theta);
    const S = (E * Math.sin(omega * theta)) / (omega * theta);
    let [y, y1, y2] = [0, 0, 0];
    const p = Array.from({ length: 20000 }, (_, i) => Math.sin(i / 50) ** 2);
    p[0] = 0;
    let naive = 0;
    p.forEach((x, i) => {
      y = (1 - S) * x + 2 * (S - C) * (p[i - 1] ?? 0) + (E * E - S) * (p[i - 2] ?? 0) + 2 * C * y1 - E * E * y2;
      [y2, y1] = [y1, y];
      naive = Math.max(naive, Math.abs(y));
    });
    const ours = Math.max(...responseHistory(readRecord(p, dt), fn, zeta, "acceleration").map(Math.abs));
    // the base moves off at once here: x'' = 2 zeta wn u' + wn^2 u with u the double integral of 1/2, to leading order
    const t = 20000 * dt;
    const wn = 2 * Math.PI * fn;
    expect(Math.abs(ours / (wn * zeta * t + (wn * wn * t * t) / 4) - 1)).toBeLessThan(0.01);
    expect(Math.abs(naive / ours - 1)).toBeGreaterThan(1e-8);
  });
});

describe("the ramp-invariant filter", () => {
  // D. O. Smallwood's filter, coefficients for fn 100 Hz, zeta 0.05, 10 kHz as computed from its closed form
  test("has the coefficients of the closed form", () => {
    const { decay, pull, b0, b1, b2 } = recursionOf(intervalOf((2 * Math.PI * 100) / 10000, 0.05, true));
    expect(b0).toBeCloseTo(0.003790804213, 11);
    expect(b1).toBeCloseTo(0.002616049589, 11);
    expect(b2).toBeCloseTo(-0.002472683162, 11);
    expect(decay).toBeCloseTo(0.993736513, 9);
    expect(1 + decay - pull).toBeCloseTo(1.989802342, 9);
  });

  test("follows a steady acceleration: the sum of b is that of a", () => {
    for (const theta of [1e-9, 1e-3, 0.5, 3, 40]) {
      for (const zeta of [0, 0.05, 1, 7]) {
        for (const absolute of [true, false]) {
          const { pull, b0, b1, b2 } = recursionOf(intervalOf(theta, zeta, absolute));
          expect(Math.abs(b0 + b1 + b2 - pull)).toBeLessThanOrEqual(
            4e-16 * (Math.abs(b0) + Math.abs(b1) + Math.abs(b2)),
          );
        }
      }
    }
  });
});

describe("response history", () => {
  test("agrees with an ODE library to 1e-9", () => {
    const p = Array.from({ length: 40 }, (_, i) => Math.sin(i / 3) * Math.exp(-i / 15));
    const [fn, zeta, dt] = [12, 0.07, 0.004];
    const omega = 2 * Math.PI * fn;
    const history = responseHistory(readRecord(p, dt), fn, zeta, "deflection");
    let state = [0, 0];
    for (let i = 1; i < p.length; i++) {
      const line = (t: number) => p[i - 1] + ((p[i] - p[i - 1]) * t) / dt;
      state = solveOde(
        (t, [z, v]) => [v, -line(t) - 2 * zeta * omega * v - omega * omega * z],
        0,
        state,
        dt,
        1,
        () => {},
      );
      expect(Math.abs(history[i] - state[0])).toBeLessThan(1e-9 * 1e-4);
    }
  });

  test("dissipates what the base puts in: the energy balance closes", () => {
    // after a record that ends at 0 the energy can only fall, and undamped it stays
    const p = [0, 3, -2, 5, 1, 0, ...new Array(400).fill(0)];
    const kept = responseHistory(readRecord(p, 0.003), 20, 0, "deflection");
    const damped = responseHistory(readRecord(p, 0.003), 20, 0.02, "deflection");
    const peak = (motion: Float64Array, from: number, to: number) => Math.max(...motion.slice(from, to).map(Math.abs));
    expect(Math.abs(peak(kept, 300, 400) / peak(kept, 10, 110) - 1)).toBeLessThan(1e-12 + 0.01);
    expect(peak(damped, 300, 400) / peak(damped, 10, 110)).toBeCloseTo(
      Math.exp(-0.02 * 2 * Math.PI * 20 * 290 * 0.003),
      2,
    );
  });

  test("starts at rest and keeps the record's length", () => {
    const history = responseHistory(readRecord([5, 5, 5], 0.1), 1, 0.1, "acceleration");
    expect(history.length).toBe(3);
    expect(history[0]).toBe(0);
  });
});

describe("a bad record is refused", () => {
  test.each([
    [[1], 0.1, "a record needs two samples or more, got 1"],
    [[1, NaN], 0.1, "acceleration in row 2 is not a number"],
    [[1, 2, -Infinity], 0.1, "acceleration must be finite: row 3 is -Infinity"],
    [[1, 2], 0, "time step must be above 0, got 0"],
  ])("%p with time step %p: %s", (samples, step, message) => {
    expect(() => readRecord(samples, step)).toThrow(message);
  });

  test.each([
    [[0], 0.1, "outside-domain"],
    [[10], -0.1, "outside-domain"],
    [[NaN], 0.1, "not-a-number"],
    [[1e308], 0.1, "overflow"],
  ])("frequencies %p, zeta %p: %s", (frequencies, zeta, kind) => {
    const record = readRecord([0, 1, 0], 10);
    expect(() => shockSpectrum(record, frequencies, zeta, "acceleration")).toThrow(expect.objectContaining({ kind }));
  });

  test("records at the ends of the double range keep their shape", () => {
    const [unit] = shockSpectrum(readRecord([0, 1, -0.5, 0], 0.01), [30], 0.05, "acceleration");
    for (const size of [2 ** -1000, 2 ** 1000]) {
      const [scaled] = shockSpectrum(readRecord([0, size, -0.5 * size, 0], 0.01), [30], 0.05, "acceleration");
      expect(scaled / size).toBe(unit);
    }
    expect(shockSpectrum(readRecord([0, 0, 0], 0.01), [30], 0.05, "acceleration")[0]).toBe(0);
    const top = readRecord([0, 1.7e308, 0], 0.01);
    expect(() => shockSpectrum(top, [30], 0, "acceleration")).toThrow(expect.objectContaining({ kind: "overflow" }));
  });
});

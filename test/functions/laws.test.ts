/** Laws that hold for every input, whatever the formulas look like. */
import fc from "fast-check";
import * as plinth from "../../src/functions";

type CellFunction = (...args: any[]) => any[][];
const all = plinth as unknown as Record<string, CellFunction>;
const call = (id: string, ...args: unknown[]): number => all[id](...args)[0][0];

const frequency = fc.double({ min: 1e-3, max: 1e5, noNaN: true });
const damping = fc.double({ min: 1e-6, max: 10, noNaN: true });
const positive = fc.double({ min: 1e-6, max: 1e6, noNaN: true });
const model = fc.constantFrom("viscous", "hysteretic");
const near = (actual: number, expected: number, relative: number) =>
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(relative * Math.abs(expected));

const law = (title: string, property: fc.IRawProperty<any>) =>
  test(title, async () => {
    await fc.assert(property, { seed: 2041, numRuns: 300 });
  });

law(
  "T is 1 at sqrt 2 fn, whatever the damping and its model",
  fc.property(frequency, damping, model, (fn, zeta, m) => {
    near(call("ABSTRANS", Math.SQRT2 * fn, fn, zeta, m), 1, 2e-15); // f is a rounded sqrt 2 fn, and r T' is at most 4 there
  }),
);

law(
  "T tends to 1 and R to 0 as f tends to 0; T is exactly 1 and all else 0 at f = 0",
  fc.property(frequency, damping, model, (fn, zeta, m) => {
    near(call("ABSTRANS", 1e-9 * fn, fn, zeta, m), 1, 1e-15);
    expect(call("RELTRANS", 1e-9 * fn, fn, zeta, m)).toBeLessThan(1.1e-18);
    expect(call("ABSTRANS", 0, fn, zeta, m)).toBe(1);
    for (const id of ["RELTRANS", "EFFICIENCY", "ABSPHASE"]) expect(call(id, 0, fn, zeta, m)).toBe(0);
  }),
);

law(
  "R tends to 1 far above resonance",
  fc.property(frequency, damping, model, (fn, zeta, m) => {
    near(call("RELTRANS", 1e9 * fn, fn, zeta, m), 1, 1e-15);
  }),
);

law(
  "T, R, phases and efficiency depend on the ratio of the frequencies only",
  fc.property(frequency, frequency, damping, model, fc.integer({ min: -200, max: 200 }), (f, fn, zeta, m, power) => {
    const scale = 2 ** power;
    for (const id of ["ABSTRANS", "RELTRANS", "ABSPHASE", "RELPHASE", "EFFICIENCY"]) {
      near(call(id, f * scale, fn * scale, zeta, m), call(id, f, fn, zeta, m), 2e-15);
    }
  }),
);

law(
  "T falls with damping below sqrt 2 fn and rises above, R falls everywhere",
  fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), damping, model, (r, zeta, m) => {
    fc.pre(Math.abs(r / Math.SQRT2 - 1) > 1e-6);
    const [T, more] = [call("ABSTRANS", r, 1, zeta, m), call("ABSTRANS", r, 1, 1.5 * zeta, m)];
    if (r < Math.SQRT2) expect(more).toBeLessThanOrEqual(T * (1 + 1e-15));
    else expect(more).toBeGreaterThanOrEqual(T * (1 - 1e-15));
    expect(call("RELTRANS", r, 1, 1.5 * zeta, m)).toBeLessThanOrEqual(call("RELTRANS", r, 1, zeta, m) * (1 + 1e-15));
  }),
);

law(
  "no frequency exceeds the peak, and T reaches it at PEAKFREQ",
  fc.property(frequency, frequency, damping, model, (f, fn, zeta, m) => {
    const peak = call("PEAKTRANS", zeta, m);
    expect(call("ABSTRANS", f, fn, zeta, m)).toBeLessThanOrEqual(peak * (1 + 1e-15));
    near(call("ABSTRANS", call("PEAKFREQ", fn, zeta, m), fn, zeta, m), peak, 1e-8);
  }),
);

law(
  "the phase of X behind U is that of Z behind U less the angle of the mount's force",
  fc.property(frequency, frequency, damping, (f, fn, zeta) => {
    const force = (Math.atan((2 * zeta * f) / fn) * 180) / Math.PI;
    expect(Math.abs(call("RELPHASE", f, fn, zeta) - force - call("ABSPHASE", f, fn, zeta))).toBeLessThan(1e-12);
  }),
);

const share = fc.double({ min: 0, max: 1, noNaN: true });
law(
  "bounds contain every sample of their box",
  fc.property(
    frequency,
    fc.double({ min: 1, max: 5, noNaN: true }),
    frequency,
    fc.double({ min: 1e-3, max: 2, noNaN: true }),
    fc.double({ min: 0, max: 0.6, noNaN: true }),
    fc.double({ min: 0, max: 0.9, noNaN: true }),
    model,
    share,
    share,
    share,
    (lowest, span, fn, zeta, a, b, m, s, t, u) => {
      const highest = lowest * span;
      const point = [lowest + (highest - lowest) * s, fn * (1 - a + 2 * a * t), zeta * (1 - b + 2 * b * u)];
      for (const [id, bound] of [
        ["ABSTRANS", "TRANSBOUND"],
        ["RELTRANS", "RELBOUND"],
      ]) {
        const sample = call(id, ...point, m);
        expect(sample).toBeLessThanOrEqual(call(bound, lowest, highest, fn, zeta, a, b, "max", m) * (1 + 1e-12));
        expect(sample).toBeGreaterThanOrEqual(call(bound, lowest, highest, fn, zeta, a, b, "min", m) * (1 - 1e-12));
      }
    },
  ),
);

law(
  "a box of one point has one bound, the response itself",
  fc.property(frequency, frequency, damping, model, (f, fn, zeta, m) => {
    for (const bound of ["max", "min"]) {
      near(call("TRANSBOUND", f, f, fn, zeta, 0, 0, bound, m), call("ABSTRANS", f, fn, zeta, m), 1e-15);
      near(call("RELBOUND", f, f, fn, zeta, 0, 0, bound, m), call("RELTRANS", f, fn, zeta, m), 1e-15);
    }
  }),
);

law(
  "the inverse of an inverse is the value",
  fc.property(
    positive,
    positive,
    fc.double({ min: 1e-6, max: 0.999, noNaN: true }),
    model,
    fc.constantFrom("si", "mm", "inch"),
    (x, y, zeta, m, units) => {
      near(call("NATFREQ", call("STIFFNESS", x, y, units), y, units), x, 3e-15);
      near(call("DEFLFREQ", call("STATICDEFL", x, y, units), y, units), x, 3e-15);
      near(call("DAMPRATIO", call("DAMPCOEFF", zeta, x, y, units), x, y, units), zeta, 3e-15);
      near(call("REQDAMPING", call("PEAKTRANS", zeta, m), m), zeta, 1e-9); // the peak is flat in zeta near 1
      near(1 - call("EFFICIENCY", x, call("REQNATFREQ", zeta, x, y, m), y, m), 1 - zeta, 1e-9);
      for (const form of ["percent", "loss factor", "q", "log decrement"]) {
        near(call("DAMPING", call("DAMPING", zeta, "ratio", form), form, "ratio"), zeta, 1e-15);
      }
      const acceleration = call("MOTION", x, y, "displacement peak-to-peak", "acceleration rms", units);
      near(call("MOTION", acceleration, y, "acceleration rms", "displacement peak-to-peak", units), x, 3e-15);
      near(
        call("CROSSOVER", x, call("MOTION", x, y, "displacement peak", "acceleration peak", units), units),
        y,
        3e-15,
      );
    },
  ),
);

law(
  "unit systems agree: the same mount in si, mm and inch",
  fc.property(positive, positive, damping, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (fn, m, zeta, E) => {
    const inch = { m: 0.0254, kg: 0.45359237, N: 0.45359237 * 9.80665 };
    const f = 2 * fn;
    const same = (id: string, si: unknown[], mm: unknown[], inches: unknown[], perMm: number, perInch: number) => {
      const value = call(id, ...si, "si");
      near(call(id, ...mm, "mm") * perMm, value, 3e-15);
      near(call(id, ...inches, "inch") * perInch, value, 3e-15);
      expect(call(id, ...si)).toBe(value);
    };
    const lb = m / inch.kg;
    same("STIFFNESS", [fn, m], [fn, m], [fn, lb], 1000, inch.N / inch.m);
    same("STATICDEFL", [fn, 1.2], [fn, 1.2], [fn, 1.2], 1e-3, inch.m);
    same("NATFREQ", [fn, m], [fn / 1000, m], [(fn / inch.N) * inch.m, lb], 1, 1);
    same("DEFLFREQ", [m, 1.2], [m * 1000, 1.2], [m / inch.m, 1.2], 1, 1);
    same(
      "MOUNTFORCE",
      [0.01, f, m, fn, zeta, "viscous"],
      [10, f, m, fn, zeta, "viscous"],
      [0.01 / inch.m, f, lb, fn, zeta, "viscous"],
      1,
      inch.N,
    );
    same("DAMPCOEFF", [zeta, fn, m], [zeta, fn / 1000, m], [zeta, (fn / inch.N) * inch.m, lb], 1000, inch.N / inch.m);
    same(
      "DAMPRATIO",
      [zeta, fn, m],
      [zeta / 1000, fn / 1000, m],
      [(zeta / inch.N) * inch.m, (fn / inch.N) * inch.m, lb],
      1,
      1,
    );
    same(
      "REQSTATICDEFL",
      [E, f, zeta, 1, "viscous"],
      [E, f, zeta, 1, "viscous"],
      [E, f, zeta, 1, "viscous"],
      1e-3,
      inch.m,
    );
    same(
      "REQSTIFFNESS",
      [E, f, zeta, m, "viscous"],
      [E, f, zeta, m, "viscous"],
      [E, f, zeta, lb, "viscous"],
      1000,
      inch.N / inch.m,
    );
    same(
      "MOTION",
      [m, f, "displacement peak", "acceleration rms"],
      [m * 1000, f, "displacement peak", "acceleration rms"],
      [m / inch.m, f, "displacement peak", "acceleration rms"],
      9.80665,
      9.80665,
    );
    same("CROSSOVER", [m, fn], [m * 1000, fn / 9.80665], [m / inch.m, fn / 9.80665], 1, 1);
  }),
);

law(
  "MOUNTDEFL and MOUNTFORCE are R U and m (2 pi f)^2 T U",
  fc.property(positive, frequency, positive, frequency, damping, model, (U, f, m, fn, zeta, law) => {
    near(call("MOUNTDEFL", U, f, fn, zeta, law), U * call("RELTRANS", f, fn, zeta, law), 2e-15);
    near(
      call("MOUNTFORCE", U, f, m, fn, zeta, law),
      m * (2 * Math.PI * f) ** 2 * U * call("ABSTRANS", f, fn, zeta, law),
      3e-15,
    );
  }),
);

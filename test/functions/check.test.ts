import { CHECK } from "../../src/functions";

/** f = 25 Hz, fn = 8 Hz, zeta = 0.1; each value worked out apart, from the wrong formula that the title names. */
const r = 25 / 8;
const b = 0.2 * r;
const T = Math.hypot(1, b) / Math.hypot(1 - r * r, b);
const slips = [
  ["numerator damping dropped", 1 / Math.hypot(1 - r * r, b), "numerator-damping-missing"],
  ["damping dropped", 1 / (r * r - 1), "undamped-form"],
  ["sign kept", 1 / (1 - r * r), "absolute-value-missing"],
  ["root dropped", T * T, "square-root-missing"],
  ["-r^2+1 typed", Math.hypot(1, b) / Math.hypot(1 + r * r, b), "sign-precedence"],
  ["1 - r for 1 - r^2", Math.hypot(1, b) / Math.hypot(1 - r, b), "ratio-not-squared"],
  ["(1 - r^2) not squared", Math.sqrt((1 + b * b) / Math.abs(1 - r * r + b * b)), "ratio-not-squared"],
  ["2 (zeta r)^2", Math.sqrt((1 + (b * b) / 2) / ((1 - r * r) ** 2 + (b * b) / 2)), "damping-not-squared"],
  ["loss factor as ratio", Math.hypot(1, 2 * b) / Math.hypot(1 - r * r, 2 * b), "loss-factor-as-damping-ratio"],
  ["percent as fraction", Math.hypot(1, 100 * b) / Math.hypot(1 - r * r, 100 * b), "percent-as-ratio"],
  ["relative motion", (r * r) / Math.hypot(1 - r * r, b), "relative-used-for-absolute"],
  ["ratio upside down", Math.hypot(1, 0.2 / r) / Math.hypot(1 - 1 / r ** 2, 0.2 / r), "ratio-inverted"],
  ["rpm as Hz", Math.hypot(1, 60 * b) / Math.hypot(1 - 3600 * r * r, 60 * b), "speed-unit"],
  ["1 - T", 1 - T, "efficiency-not-of-motion"],
  ["10 log10 T", 10 * Math.log10(T), "decibel-factor"],
] as const;

test.each(slips)("a transmissibility with %s, %f, is called by its name", async (_, value, mistake) => {
  const [[verdict]] = await CHECK([[value]], "absolute-transmissibility", [[1e-9]], [[[25]], [[8]], [[0.1]]]);
  expect(verdict).toContain(mistake);
  expect(verdict).toContain("expected 0.13419");
});

const verdicts = [
  [T, "absolute-transmissibility", [25, 8, 0.1], /^agrees$/],
  [
    Math.sqrt((1 + 0.04) / ((1 - r * r) ** 2 + 0.04)),
    "absolute-transmissibility",
    [25, 8, 0.1],
    /^differs.*hysteretic/,
  ],
  [0.5, "absolute-transmissibility", [25, 8, 0.1], /^differs: expected 0\.13419$/],
  [Math.sqrt(50000 / 100) / (2 * Math.PI), "natural-frequency", [200000, 100], /^mount-count-missing.*4 mounts/],
  [Math.sqrt(2000), "natural-frequency", [200000, 100], /^angular-cyclic-mixup/],
  [9.81 / (10 * Math.PI) ** 2, "static-deflection", [5], /^agrees, with g taken as 9\.81$/],
  [(15.76 / 5) ** 2 / 1000, "static-deflection", [5], /^agrees, with the constant 15\.76$/],
  [25 * 9.80665, "mount-load", [100, 4], /^agrees$/],
  [100 * 9.80665, "mount-load", [100, 4], /^total-for-per-mount/],
  [Math.sqrt((Math.PI / 2) * 100 * 10 * 0.04), "random-response-rms", [100, 0.05, 0.04], /^agrees, in the short form/],
  [Math.sqrt(100 * 10 * 0.04), "random-response-rms", [100, 0.05, 0.04], /^half-pi-missing/],
  [-45, "absolute-phase", [1, 1, 0.5], /^agrees, with the opposite sign/],
  [Math.PI / 4, "absolute-phase", [1, 1, 0.5], /^differs.*radians/],
] as const;

test.each(verdicts)("%f as %s of %p reads %p", async (value, quantity, inputs, text) => {
  const [[verdict]] = await CHECK(
    [[value]],
    quantity,
    [[1e-7]],
    inputs.map((input) => [[input]]),
  );
  expect(verdict).toMatch(text);
});

test("a column of hand values is judged row by row, with a bad cell in its own place", async () => {
  const rows = await CHECK([[T], ["x"], [0.5]], "absolute-transmissibility", null as never, [[[25]], [[8]], [[0.1]]]);
  expect(rows[0]).toEqual(["agrees"]);
  expect(rows[1]![0]).toMatchObject({ kind: "wrong-type", message: 'hand value must be a number, got the text "x"' });
  expect(rows[2]![0]).toMatch(/^differs/);
});

test("a wrong number of inputs names them", async () => {
  await expect(CHECK([[1]], "natural-frequency", [[0]], [[[1]]])).rejects.toMatchObject({
    kind: "wrong-shape",
    message: "natural-frequency takes the inputs stiffness, mass; got 1",
  });
});

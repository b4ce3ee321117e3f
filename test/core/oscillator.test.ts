import { freePeak, stepOf } from "../../src/core/oscillator";

describe("one step of the free oscillator", () => {
  const zetas = [0, 1e-9, 0.05, 0.7, 0.9999999, 1, 1.0000001, 1.5, 30, 1e4];

  test.each(zetas)("joins series and closed form without a jump at zeta %p", (zeta) => {
    const t = 1 / Math.max(1, 2 * zeta);
    const below = stepOf(t * (1 - 1e-15), zeta);
    const above = stepOf(t, zeta);
    for (const part of ["cosine", "sine", "step", "ramp"] as const) {
      expect(Math.abs(below[part] / above[part] - 1)).toBeLessThan(3e-14);
    }
  });

  test.each(zetas)("two steps make one at zeta %p", (zeta) => {
    for (const t of [1e-6, 0.3, 2, 9]) {
      const { cosine, sine, step } = stepOf(t, zeta);
      const twice = stepOf(2 * t, zeta);
      const slope = cosine - 2 * zeta * sine; // of the sine-like solution
      expect(Math.abs(cosine * sine + sine * slope - twice.sine)).toBeLessThan(1e-14);
      expect(Math.abs(step + cosine * step + sine * sine - twice.step)).toBeLessThan(1e-14);
    }
  });

  test("keeps its relative precision for a tiny step, where 1 - cosine has none left", () => {
    const t = 1e-9;
    const { step, ramp } = stepOf(t, 0.05);
    expect(Math.abs(step / ((t * t) / 2) - 1)).toBeLessThan(1e-9);
    expect(Math.abs(ramp / ((t * t * t) / 6) - 1)).toBeLessThan(1e-9);
    expect(1 - Math.cos(t)).toBe(0);
  });
});

describe("largest free vibration after its start", () => {
  test.each([
    // g0, v0, zeta, peak
    [0, 1, 0, 1, "undamped from a push"],
    [3, 4, 0, 5, "undamped"],
    [0, 1, 1, Math.exp(-1), "critically damped from a push: t exp(-t) at t = 1"],
    [1, 0, 0.1, 0, "from standstill: the start was the largest"],
    [1, -0.5, 1, 0, "critically damped, never turns"],
    [0, 1, 0.5, Math.exp(-Math.PI / (3 * Math.sqrt(3))), "at angle pi/3 with omega = sqrt(3)/2"],
    [0, 1e-300, 0, 1e-300, "squares underflow"],
    [0, 1, 1.25, (4 ** (-1 / 3) - 4 ** (-4 / 3)) / 1.5, "overdamped, rates 1/2 and 2: turns at t = ln 4/1.5"],
  ])("from %p with slope %p at zeta %p is %p: %s", (g0, v0, zeta, peak) => {
    expect(Math.abs(freePeak(g0, v0, zeta) - peak)).toBeLessThanOrEqual(1e-15 * peak);
  });
});

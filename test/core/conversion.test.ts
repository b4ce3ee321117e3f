import { convertMotion, crossoverFrequency, MOTION_MEASURES, MOTION_QUANTITIES } from "../../src/core/motion";
import { MOST_ROWS, sweep } from "../../src/core/sweep";
import { unitConversion, readUnit, UNIT_WORDS } from "../../src/core/units";
import { referenceRows } from "../support/referenceRows";
import { anyDouble, repeatable } from "../support/spreadDoubles";
import { type Big, big, math, relativeError, ulpsApart } from "../support/ulps";

const tau = big(2).times(math.bignumber(math.pi));

describe("sinusoidal motion", () => {
  test.each(referenceRows("motion", "crossover_d_a"))("crossover of $in within 4 ulp of mpmath", ({ in: x, out }) => {
    const f = crossoverFrequency(x.d_peak_m, x.a_peak_m_s2);
    expect(ulpsApart(f, out.f_crossover)).toBeLessThanOrEqual(4);
    const [d, v] = [
      { quantity: "displacement", measure: "peak" },
      { quantity: "velocity", measure: "peak" },
    ] as const;
    expect(relativeError(convertMotion(x.d_peak_m, f, d, v), out.v_at_crossover)).toBeLessThanOrEqual(1e-15);
  });

  test.each(referenceRows("motion", "crossover_d_v_a"))(
    "the three forms of $in meet where mpmath says",
    ({ in: x, out }) => {
      const form = (quantity: (typeof MOTION_QUANTITIES)[number]) => ({ quantity, measure: "peak" }) as const;
      const [d, v, a] = MOTION_QUANTITIES.map(form);
      expect(relativeError(convertMotion(x.v_peak, Number(out.f_dv), v, d), big(x.d_peak_m))).toBeLessThanOrEqual(
        1e-15,
      );
      expect(relativeError(convertMotion(x.v_peak, Number(out.f_va), v, a), big(x.a_peak))).toBeLessThanOrEqual(1e-15);
    },
  );

  const forms = MOTION_QUANTITIES.flatMap((quantity) => MOTION_MEASURES.map((measure) => ({ quantity, measure })));
  const overPeak: Record<(typeof MOTION_MEASURES)[number], Big> = {
    peak: big(1),
    rms: big(1).div(big(2).sqrt()),
    "peak-to-peak": big(2),
  };

  test.each(forms)("$quantity $measure in every other form stays within 4 ulp over the range of doubles", (from) => {
    const random = repeatable(11);
    const misses: unknown[] = [];
    for (const to of forms) {
      const orders = MOTION_QUANTITIES.indexOf(to.quantity) - MOTION_QUANTITIES.indexOf(from.quantity);
      for (let i = 0; i < 60; i++) {
        const [value, f] = [anyDouble(random), anyDouble(random)].map((x) => Math.min(x, Number.MAX_VALUE));
        const exact = big(value)
          .times(overPeak[to.measure])
          .div(overPeak[from.measure])
          .times(tau.times(big(f)).pow(orders));
        try {
          const result = convertMotion(value, f, from, to);
          if (!(ulpsApart(result, exact) <= 4)) misses.push([to, value, f, result]);
        } catch (thrown) {
          if (exact.lte(big(Number.MAX_VALUE))) misses.push([to, value, f, thrown]);
        }
      }
    }
    expect(misses).toEqual([]);
  });
});

describe("units", () => {
  const known = [
    //  value, from, to, result, where it comes from
    [1500, "rpm", "Hz", 25, "exact: 60 s to the minute"],
    [1, "gn", "m/s2", 9.80665, "exact by definition"],
    [1, "gn2/Hz", "(m/s2)2/Hz", "96.1703842225", "exact: 9.80665 squared"],
    [1, "in", "mm", 25.4, "exact by definition"],
    [1, "mil", "um", 25.4, "exact: a thousandth of an inch"],
    [1, "ft", "in", 12, "exact by definition"],
    [1, "lbf", "N", "4.4482216152605", "exact: 0.45359237 x 9.80665"],
    [1, "lbf/in", "N/mm", "0.17512683524647636482939632545931758530184", "exact: 4.4482216152605/25.4"],
    [1, "lbf.s/in", "N.s/m", "175.12683524647636482939632545931758530184", "exact: 4.4482216152605/0.0254"],
    [1, "kgf", "N", 9.80665, "exact by definition"],
    [1, "kg.m/s2", "N", 1, "definition of the newton"],
    [1, "t", "kg", 1000, "definition"],
    [1, "lbm", "g", "453.59237", "exact by definition"],
    [2 * Math.PI, "rad/s", "Hz", 1, "2 pi radians are one cycle"],
    [-3, "mm/s", "in/s", "-0.11811023622047244094488188976377952755906", "exact: -3/25.4"],
    [1e306, "kN", "MN", 1e303, "exact, though 1e309 N is no double"],
    [1, "1/s", "Hz", 1, "definition of the hertz"],
    [1, "s-1", "Hz", 1, "negative exponent"],
    [1, "m^2", "mm2", 1e6, "square of a thousand"],
    [0, "gn", "m/s2", 0, "nothing is nothing"],
  ] as const;

  test.each(known)("%p %s in %s is %p within 2 ulp (%s)", (value, from, to, result) => {
    expect(ulpsApart(unitConversion(from, to)(value), result)).toBeLessThanOrEqual(2);
  });

  test("every unit word converts to itself unchanged and to its own kind back and forth", () => {
    for (const from of Object.keys(UNIT_WORDS)) {
      expect(unitConversion(from, from)(0.1)).toBe(0.1);
      for (const to of Object.keys(UNIT_WORDS)) {
        if (readUnit(from).dimensions.join() !== readUnit(to).dimensions.join()) continue;
        expect(ulpsApart(unitConversion(to, from)(unitConversion(from, to)(0.1)), big(0.1))).toBeLessThanOrEqual(3);
      }
    }
  });

  test.each([
    ["g", "m/s2", "g and m/s2 measure different things (g is the gram, gn standard gravity)"],
    ["mm", "N", "mm and N measure different things"],
    ["hz", "rpm", '"hz" is not a unit: "hz" is unknown; case matters: Hz'],
    ["m/s²", "gn", '"m/s²" is not a unit: "²" is out of place; write m/s2, N.s/m'],
    ["", "m", '"" is not a unit: it is blank'],
    ["m/", "m", '"m/" is not a unit: it ends too early'],
    ["(m", "m", '"(m" is not a unit: a bracket is left open'],
    ["m)", "m", '"m)" is not a unit: ")" is out of place'],
    ["m10", "m", '"m10" is not a unit: an exponent is a whole number up to 9'],
    ["m0", "m", '"m0" is not a unit: an exponent is a whole number up to 9'],
    ["constructor", "m", '"constructor" is not a unit: "constructor" is unknown'],
    ["(um9)9", "m", '"(um9)9" is not a unit: its exponents are out of reach'],
    ["(".repeat(30000), "m", "it is too long"],
  ])("%.20s to %s is refused: %s", (from, to, message) => {
    expect(() => unitConversion(from, to)(1)).toThrow(
      expect.objectContaining({ kind: "not-covered", message: expect.stringContaining(message) }),
    );
  });
});

describe("sweeps", () => {
  const ends = [5e-324, 1e-310, 1e-8, 0.1, 1, 3, 10, 2000, 1e6, 1e300, Number.MAX_VALUE];

  test("log sweeps stay within 4 ulp of 90-digit arithmetic, from any end to any other", () => {
    const random = repeatable(5);
    const misses: unknown[] = [];
    for (const from of ends) {
      for (const to of ends) {
        const count = [3, 7, 61, 1000][Math.floor(random() * 4)];
        const values = sweep(from, to, count, "log");
        const i = Math.floor(random() * count);
        const exact = big(
          math.exp(
            logOf(from).plus(
              logOf(to)
                .minus(logOf(from))
                .times(i)
                .div(count - 1),
            ),
          ) as Big,
        );
        if (!(ulpsApart(values[i], exact) <= 4)) misses.push([from, to, count, i, values[i]]);
      }
    }
    expect(misses).toEqual([]);
  });

  test("log sweeps over octaves land where mpmath counts them", () => {
    for (const { in: x, out } of referenceRows("motion", "octaves")) {
      const middle = big(x.f1).times(math.pow(big(2), big(out.octaves).div(2)) as Big);
      expect(ulpsApart(sweep(x.f1, x.f2, 3, "log")[1], middle)).toBeLessThanOrEqual(4);
    }
  });

  test("linear sweeps stay within 2 ulp of their larger end", () => {
    for (const [from, to] of [
      [0, 1],
      [5, 30],
      [-1, 1],
      [100, -3],
      [0.1, 0.3],
      [-1.7e308, 1.7e308],
    ]) {
      const count = 101;
      const values = sweep(from, to, count, "linear");
      const last = big(Math.max(Math.abs(from), Math.abs(to))).times(2 ** -52);
      values.forEach((value, i) => {
        const exact = big(from)
          .times(count - 1 - i)
          .plus(big(to).times(i))
          .div(count - 1);
        expect(big(value).minus(exact).abs().lte(last.times(2))).toBe(true);
      });
    }
  });

  test.each(["linear", "log"] as const)("%s sweeps keep both ends and never step back", (spacing) => {
    for (const [from, to] of [
      [1, 2000],
      [2000, 1],
      [-1, -7],
      [0.1, 0.1000000000000001],
      [3, 3],
      [1e-300, 1e300],
    ]) {
      const values = sweep(from, to, 1001, spacing);
      expect([values[0], values[1000]]).toEqual([from, to]);
      for (let i = 1; i <= 1000; i++)
        expect((values[i] - values[i - 1]) * Math.sign(to - from)).toBeGreaterThanOrEqual(0);
    }
  });

  test("a sweep may fill a whole column", () => {
    expect(sweep(1, 2, MOST_ROWS, "linear")).toHaveLength(MOST_ROWS);
  });

  test.each([
    [1, 2, 1, "linear", "count must be a whole number from 2 to 1048576, got 1"],
    [1, 2, 2.5, "linear", "count must be a whole number from 2 to 1048576, got 2.5"],
    [1, 2, MOST_ROWS + 1, "linear", "count must be a whole number from 2 to 1048576, got 1048577"],
    [1, 2, NaN, "linear", "count is not a number"],
    [0, 2, 5, "log", "a log sweep needs two ends of one sign, got 0 and 2"],
    [-1, 2, 5, "log", "a log sweep needs two ends of one sign, got -1 and 2"],
    [Infinity, 2, 5, "linear", "from must be a finite number, got Infinity"],
  ] as const)("from %p to %p in %p %s steps is refused: %s", (from, to, count, spacing, message) => {
    expect(() => sweep(from, to, count, spacing)).toThrow(message);
  });

  function logOf(x: number): Big {
    return math.log(big(x)) as Big;
  }
});

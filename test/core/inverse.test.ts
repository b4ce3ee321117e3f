import {
  convertDamping,
  DAMPING_FORMS,
  type DampingForm,
  dampingCoefficient,
  dampingRatio,
  frequencyFromDeflection,
  mountDeflection,
  mountForce,
  naturalFrequency,
  staticDeflection,
  stiffness,
} from "../../src/core/mount";
import { dampingForPeak, peakFrequency, peakTransmissibility, relativePeak } from "../../src/core/peak";
import {
  requiredFrequencyRatio,
  requiredNaturalFrequency,
  requiredStaticDeflection,
  requiredStiffness,
} from "../../src/core/required";
import { absoluteTransmissibility, relativeTransmissibility } from "../../src/core/transmissibility";
import { exactAbsolute, exactPeak, exactPeakRatio, exactRelative } from "../support/exactHarmonic";
import { referenceRows } from "../support/referenceRows";
import { anyDouble, repeatable } from "../support/spreadDoubles";
import { type Big, big, math, relativeError, ulpsApart } from "../support/ulps";

const tau = big(2).times(math.bignumber(math.pi));
const g = big("9.80665");
const square = (x: Big) => x.times(x);

describe("mpmath tables of inverse problems", () => {
  test.each(referenceRows("inverse", "required_fn"))("viscous mount required at $in within 4 ulp", ({ in: x, out }) => {
    expect(ulpsApart(requiredFrequencyRatio(x.E, x.zeta, "viscous"), out.r_required)).toBeLessThanOrEqual(4);
    expect(ulpsApart(requiredNaturalFrequency(x.E, x.f, x.zeta, "viscous"), out.fn_required)).toBeLessThanOrEqual(4);
    const sag = requiredStaticDeflection(x.E, x.f, x.zeta, 1, "viscous");
    expect(ulpsApart(sag, out.static_deflection_m)).toBeLessThanOrEqual(4);
    const k = requiredStiffness(x.E, x.f, x.zeta, x.m, "viscous");
    expect(ulpsApart(k, out.stiffness_N_per_m)).toBeLessThanOrEqual(4);
  });

  test.each(referenceRows("inverse", "required_fn_hysteretic"))(
    "hysteretic mount required at $in within 4 ulp",
    ({ in: { E, f, eta }, out }) => {
      const r = requiredFrequencyRatio(E, eta / 2, "hysteretic");
      expect(ulpsApart(r, out.r_required)).toBeLessThanOrEqual(4);
      const fn = requiredNaturalFrequency(E, f, eta / 2, "hysteretic");
      expect(ulpsApart(fn, out.fn_required)).toBeLessThanOrEqual(4);
      const sag = requiredStaticDeflection(E, f, eta / 2, 1, "hysteretic");
      expect(ulpsApart(sag, out.static_deflection_m)).toBeLessThanOrEqual(4);
    },
  );

  test.each(referenceRows("inverse", "fn_from_static_deflection"))("fn from sag $in within 4 ulp", ({ in: x, out }) => {
    expect(ulpsApart(frequencyFromDeflection(x.delta_m, 1), out.fn)).toBeLessThanOrEqual(4);
  });

  test.each(referenceRows("inverse", "fn_zeta_from_kmc"))("fn, zeta, c from $in within 4 ulp", ({ in: x, out }) => {
    const fn = naturalFrequency(x.k, x.m);
    expect(ulpsApart(fn, out.fn)).toBeLessThanOrEqual(4);
    expect(ulpsApart(dampingRatio(x.c, x.k, x.m), out.zeta)).toBeLessThanOrEqual(4);
    expect(ulpsApart(dampingCoefficient(1, x.k, x.m), out.critical_damping)).toBeLessThanOrEqual(4);
    // through a rounded fn, which enters squared
    expect(ulpsApart(staticDeflection(fn, 1), out.static_deflection_m)).toBeLessThanOrEqual(8);
  });

  test.each(referenceRows("inverse", "zeta_from_peak"))(
    "zeta from peak $in within 8 ulp",
    ({ in: { T_peak }, out }) => {
      expect(ulpsApart(dampingForPeak(T_peak, "viscous"), out.zeta_for_T_peak)).toBeLessThanOrEqual(8);
      expect(ulpsApart(dampingForPeak(T_peak, "hysteretic"), out.zeta_for_T_at_r1)).toBeLessThanOrEqual(8);
      expect(ulpsApart(convertDamping(T_peak, "q", "ratio"), out.zeta_for_Q_half_inverse)).toBeLessThanOrEqual(4);
      const zeta = Number(out.zeta_for_receptance_or_relative_peak);
      expect(relativeError(relativePeak(zeta, "viscous")!.value, big(T_peak))).toBeLessThanOrEqual(1e-12); // ill-posed at 1
      expect(ulpsApart(absoluteTransmissibility(1, 1, Number(out.zeta_for_T_at_r1)), big(T_peak))).toBeLessThanOrEqual(
        4,
      );
    },
  );

  test.each(referenceRows("inverse", "damping_from_zeta"))(
    "damping forms of $in within 4 ulp",
    ({ in: { zeta }, out }) => {
      expect(ulpsApart(convertDamping(zeta, "ratio", "loss factor"), out.loss_factor)).toBeLessThanOrEqual(4);
      expect(ulpsApart(convertDamping(zeta, "ratio", "q"), out.Q_definition)).toBeLessThanOrEqual(4);
      expect(ulpsApart(convertDamping(zeta, "ratio", "log decrement"), out.log_decrement)).toBeLessThanOrEqual(4);
      expect(ulpsApart(convertDamping(zeta, "ratio", "percent"), out.percent_critical)).toBeLessThanOrEqual(4);
      if (out.Q_peak_receptance !== undefined) {
        expect(ulpsApart(relativePeak(zeta, "viscous")!.value, out.Q_peak_receptance)).toBeLessThanOrEqual(4);
      }
    },
  );

  test.each([
    ["zeta_from_log_decrement", "delta", "log decrement", "zeta"],
    ["zeta_from_Q", "Q", "q", "zeta_definition"],
    ["zeta_from_loss_factor", "eta", "loss factor", "zeta"],
  ] as const)("%s within 4 ulp", (table, given, form, wanted) => {
    for (const row of referenceRows("inverse", table)) {
      expect(ulpsApart(convertDamping(row.in[given], form, "ratio"), row.out[wanted])).toBeLessThanOrEqual(4);
    }
  });

  test.each(referenceRows("inverse", "zeta_from_decay"))(
    "zeta from decay $in within 1e-15",
    ({ in: { x0, xn, n }, out }) => {
      const decrement = Math.log(x0 / xn) / n;
      expect(relativeError(convertDamping(decrement, "log decrement", "ratio"), out.zeta)).toBeLessThanOrEqual(1e-15);
    },
  );

  test.each(referenceRows("inverse", "half_power_from_zeta"))(
    "half-power points of $in lie on our curves",
    ({ in: { zeta }, out }) => {
      const half = 1e-12 / Math.min(zeta, 0.1); // the printed r is rounded to a double; the curve is as steep as 1/zeta
      for (const r of [out.T_abs_r1, out.T_abs_r2].filter((r) => r)) {
        const level = absoluteTransmissibility(Number(r), 1, zeta) / peakTransmissibility(zeta, "viscous");
        expect(Math.abs(level - Math.SQRT1_2)).toBeLessThanOrEqual(half);
      }
      for (const r of [out.relative_r1, out.relative_r2].filter((r) => r)) {
        const level = relativeTransmissibility(Number(r), 1, zeta) / relativePeak(zeta, "viscous")!.value;
        expect(Math.abs(level - Math.SQRT1_2)).toBeLessThanOrEqual(half);
      }
      expect(ulpsApart(convertDamping(zeta, "ratio", "loss factor"), out.mobility_bandwidth)).toBeLessThanOrEqual(4);
    },
  );

  test.each(referenceRows("inverse", "zeta_from_half_power"))(
    "zeta from half-power frequencies $in gives them back",
    ({ in: x, out }) => {
      const zeta = Number(out.zeta_T_abs);
      for (const f of [x.f1, x.f2]) {
        const level = absoluteTransmissibility(f, Number(out.fn_T_abs), zeta) / peakTransmissibility(zeta, "viscous");
        expect(Math.abs(level - Math.SQRT1_2)).toBeLessThanOrEqual(1e-12 / zeta);
      }
    },
  );
});

const random = repeatable(777);
const any = () => anyDouble(random);
const efficiency = () => {
  const kind = random();
  if (kind < 0.4) return random();
  return kind < 0.7 ? 1 - 10 ** (-15 * random() - 0.1) : 10 ** (-300 * random() - 0.1);
};
const peak = () => 1 + 10 ** (random() * 30 - 15.5);

function ratioSquared(E: number, zeta: number, model: "viscous" | "hysteretic"): Big {
  const T = big(1).minus(big(E));
  const A = big(E)
    .times(big(2).minus(big(E)))
    .div(square(T));
  const dampedA = square(big(zeta)).times(A);
  if (model === "hysteretic") return big(1).plus(big(1).plus(A).plus(dampedA.times(4)).sqrt());
  const b = big(1).plus(dampedA.times(2));
  return b.plus(square(b).plus(A).sqrt());
}

type Case = [
  name: string,
  budget: number,
  inputs: (() => number)[],
  ours: (...x: number[]) => number,
  exact: (...x: number[]) => Big,
];
const cases: Case[] = [
  ["natural frequency", 4, [any, any], naturalFrequency, (k, m) => big(k).div(big(m)).sqrt().div(tau)],
  ["stiffness", 4, [any, any], stiffness, (fn, m) => square(tau.times(big(fn))).times(big(m))],
  [
    "static deflection",
    4,
    [any, any],
    staticDeflection,
    (fn, q) =>
      big(q)
        .times(g)
        .div(square(tau.times(big(fn)))),
  ],
  ["fn of a deflection", 4, [any, any], frequencyFromDeflection, (d, q) => big(q).times(g).div(big(d)).sqrt().div(tau)],
  [
    "damping coefficient",
    4,
    [any, any, any],
    dampingCoefficient,
    (z, k, m) => big(k).times(big(m)).sqrt().times(2).times(big(z)),
  ],
  ["damping ratio", 4, [any, any, any], dampingRatio, (c, k, m) => big(c).div(big(k).times(big(m)).sqrt().times(2))],
];
for (const model of ["viscous", "hysteretic"] as const) {
  const r2 = (E: number, zeta: number) => ratioSquared(E, zeta, model);
  const omega2 = (f: number) => square(tau.times(big(f)));
  cases.push(
    [
      `${model} mount deflection`,
      4,
      [any, any, any, any],
      (u, ...p) => mountDeflection(u, p[0], p[1], p[2], model),
      (u, ...p) => big(u).times(exactRelative(p[0], p[1], p[2], model)),
    ],
    [
      `${model} mount force`,
      4,
      [any, any, any, any, any],
      (u, f, m, ...p) => mountForce(u, f, m, p[0], p[1], model),
      (u, f, m, ...p) =>
        big(u)
          .times(big(m))
          .times(omega2(f))
          .times(exactAbsolute(f, p[0], p[1], model)),
    ],
    [`${model} peak`, 4, [any], (z) => peakTransmissibility(z, model), (z) => exactPeak(z, model)],
    [
      `${model} frequency of the peak`,
      4,
      [any, any],
      (fn, z) => peakFrequency(fn, z, model),
      (fn, z) => big(fn).times(exactPeakRatio(z, model)),
    ],
    [
      `${model} required fn`,
      4,
      [efficiency, any, any],
      (E, f, z) => requiredNaturalFrequency(E, f, z, model),
      (E, f, z) => big(f).div(r2(E, z).sqrt()),
    ],
    [
      `${model} required static deflection`,
      4,
      [efficiency, any, any, any],
      (E, f, z, q) => requiredStaticDeflection(E, f, z, q, model),
      (E, f, z, q) => big(q).times(g).times(r2(E, z)).div(omega2(f)),
    ],
    [
      `${model} required stiffness`,
      4,
      [efficiency, any, any, any],
      (E, f, z, m) => requiredStiffness(E, f, z, m, model),
      (E, f, z, m) => big(m).times(omega2(f)).div(r2(E, z)),
    ],
    [
      `${model} zeta of a peak`,
      8,
      [peak],
      (T) => dampingForPeak(T, model),
      (T) => {
        const w = square(big(T)).minus(1).sqrt();
        return model === "hysteretic" ? big(0.5).div(w) : big(T).div(big(T).plus(w).times(2)).sqrt().div(w);
      },
    ],
  );
}
const critical: Record<DampingForm, number> = { ratio: 1, percent: 100, "loss factor": 2, q: 0.5, "log decrement": 50 };
for (const from of DAMPING_FORMS) {
  const near = () => critical[from] * (from === "q" ? 1 + 10 ** (-15 * random()) : 1 - 10 ** (-15 * random() - 0.01));
  const exactRatio = (v: number): Big => {
    if (from === "q") return big(0.5).div(big(v));
    if (from === "log decrement")
      return big(v).div(
        square(tau)
          .plus(square(big(v)))
          .sqrt(),
      );
    return big(v).div(critical[from]);
  };
  for (const to of DAMPING_FORMS.filter((form) => form !== from)) {
    cases.push([
      `damping ${from} as ${to}`,
      4,
      [to === "log decrement" ? near : () => (random() < 0.5 ? near() : any())],
      (v) => convertDamping(v, from, to),
      (v) => {
        const zeta = exactRatio(v);
        if (to === "q") return big(0.5).div(zeta);
        if (to === "log decrement") return tau.times(zeta).div(big(1).minus(zeta).times(big(1).plus(zeta)).sqrt());
        return zeta.times(critical[to]);
      },
    ]);
  }
}

const largest = big(Number.MAX_VALUE);

test.each(cases)(
  "%s stays within %p ulp of 90-digit arithmetic over the whole range of doubles",
  (_name, budget, inputs, ours, exact) => {
    const misses: unknown[] = [];
    for (let i = 0; i < 300; i++) {
      const x = inputs.map((draw) => Math.min(draw(), Number.MAX_VALUE));
      try {
        const result = ours(...x);
        if (!(ulpsApart(result, exact(...x)) <= budget)) misses.push([x, result]);
      } catch (thrown) {
        if ((thrown as { kind?: string }).kind !== "overflow" || exact(...x).lte(largest)) misses.push([x, thrown]);
      }
    }
    expect(misses).toEqual([]);
  },
);

test("the plain log decrement of 99.99999999999 % of critical is off where ours is not", () => {
  const percent = 99.99999999999;
  const zeta = big(percent).div(100);
  const exact = tau.times(zeta).div(big(1).minus(square(zeta)).sqrt());
  const rounded = percent / 100;
  expect(relativeError((2 * Math.PI * rounded) / Math.sqrt(1 - rounded * rounded), exact)).toBeGreaterThan(1e-5);
  expect(ulpsApart(convertDamping(percent, "percent", "log decrement"), exact)).toBeLessThanOrEqual(4);
});

test("the plain damping for a large peak is off where ours is not", () => {
  const T = 1e9;
  const root = Math.sqrt(T * T - 1);
  const plain = Math.sqrt((T * (T - root)) / 2 / (T * T - 1)); // T - root cancels
  const w = square(big(T)).minus(1).sqrt();
  const exact = big(T).div(big(T).plus(w).times(2)).sqrt().div(w);
  expect(relativeError(plain, exact)).toBeGreaterThan(0.5);
  expect(ulpsApart(dampingForPeak(T, "viscous"), exact)).toBeLessThanOrEqual(8);
});

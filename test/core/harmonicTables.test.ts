import { isolationEfficiency, transmissibilityLevel } from "../../src/core/efficiency";
import { peakFrequency, peakTransmissibility, relativePeak } from "../../src/core/peak";
import { absolutePhase, relativePhase } from "../../src/core/phase";
import {
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../../src/core/transmissibility";
import { referenceRows } from "../support/referenceRows";
import { type Big, big, math, ulpsApart } from "../support/ulps";

const degrees = big(180).div(math.bignumber(math.pi));
const inDegrees = (radians: string): Big => big(radians).times(degrees);

const tables = [
  ["viscous_r", "viscous"],
  ["viscous_f_fn", "viscous"],
  ["viscous_extreme_range", "viscous"],
  ["hysteretic_r", "hysteretic"],
] as const;

describe.each(tables)("harmonic response, mpmath table %s", (table, model) => {
  const rows = referenceRows("harmonic", table).map((row) => {
    const { f = row.in.r, fn = 1, zeta = row.in.eta / 2 } = row.in;
    return [f, fn, zeta, row.out] as const;
  });
  const [T, R] =
    model === "viscous"
      ? [absoluteTransmissibility, relativeTransmissibility]
      : [hystereticTransmissibility, hystereticRelativeTransmissibility];

  test.each(rows)(
    "f %p, fn %p, zeta %p: T and R within 4 ulp, 1 - T and dB within 8, phases within 4",
    (f, fn, zeta, out) => {
      expect(ulpsApart(T(f, fn, zeta), out.T_abs)).toBeLessThanOrEqual(4);
      expect(ulpsApart(R(f, fn, zeta), out.T_rel)).toBeLessThanOrEqual(4);
      expect(ulpsApart(isolationEfficiency(f, fn, zeta, model), out.efficiency)).toBeLessThanOrEqual(8);
      expect(ulpsApart(transmissibilityLevel(f, fn, zeta, model), out.T_abs_dB)).toBeLessThanOrEqual(8);
      expect(ulpsApart(absolutePhase(f, fn, zeta, model), inDegrees(out.T_abs_phase_lag))).toBeLessThanOrEqual(4);
      expect(ulpsApart(relativePhase(f, fn, zeta, model), inDegrees(out.T_rel_phase_lag))).toBeLessThanOrEqual(4);
    },
  );
});

test.each(referenceRows("harmonic", "viscous_peak"))(
  "viscous peak at $in within 4 ulp of mpmath",
  ({ in: { zeta }, out }) => {
    expect(ulpsApart(peakTransmissibility(zeta, "viscous"), out.T_peak)).toBeLessThanOrEqual(4);
    expect(ulpsApart(peakFrequency(1, zeta, "viscous"), out.r_peak)).toBeLessThanOrEqual(4);
    expect(ulpsApart(absoluteTransmissibility(1, 1, zeta), out.T_at_r1)).toBeLessThanOrEqual(4);
    const peak = relativePeak(zeta, "viscous");
    if (out.r_peak_rel === "Infinity") {
      expect(peak).toBeUndefined();
    } else {
      expect(ulpsApart(peak!.value, out.T_rel_peak)).toBeLessThanOrEqual(4);
      const offset = big(out.r_peak_rel).pow(2).minus(1);
      expect(big(peak!.squaredOffset).minus(offset).abs().toNumber()).toBeLessThanOrEqual(1e-17); // 24 printed digits
    }
  },
);

test.each(referenceRows("harmonic", "hysteretic_peak"))(
  "hysteretic peak at $in within 4 ulp of mpmath",
  ({ in: { eta }, out }) => {
    expect(ulpsApart(peakTransmissibility(eta / 2, "hysteretic"), out.T_peak)).toBeLessThanOrEqual(4);
    expect(ulpsApart(peakFrequency(1, eta / 2, "hysteretic"), out.r_peak)).toBe(0);
    const { squaredOffset, value } = relativePeak(eta / 2, "hysteretic")!;
    expect(ulpsApart(value, out.T_rel_peak)).toBeLessThanOrEqual(4);
    expect(ulpsApart(Math.sqrt(1 + squaredOffset), out.r_peak_rel)).toBeLessThanOrEqual(4);
  },
);

import { isolationEfficiency } from "../core/efficiency";
import { peakFrequency, peakTransmissibility } from "../core/peak";
import { absolutePhase, relativePhase } from "../core/phase";
import {
  absoluteTransmissibilities,
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../core/transmissibility";
import { lift } from "./cell";
import { dampingModelOf } from "./dampingModel";

/**
 * Amplitude of the mounted item divided by the amplitude of its moving base.
 * @customfunction ABSTRANS
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic (loss factor twice the ratio). Left out: viscous.
 * @returns Absolute transmissibility; no unit; shape of the arguments together.
 * @example =ABSTRANS(2, 1, 0) gives 0.333333333333333
 * @example =ABSTRANS({1;3}, 1, 0.5) gives {1.4142135623731;0.370116605098803}
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Equation of motion m x'' + c (x' - u') + k (x - u) = 0 for a harmonic base; Den Hartog, Mechanical Vibrations
 * @leavesOut One mass, one axis, linear mount, rigid base, steady vibration; no surge of the spring, no flexible floor.
 */
export function ABSTRANS(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const required = { frequency, naturalFrequency, dampingRatio };
  if (model === "hysteretic") return lift(hystereticTransmissibility, required);
  return lift(absoluteTransmissibility, required, {}, ([f, fn, zeta], out) =>
    absoluteTransmissibilities(f, fn, zeta, out),
  );
}

/**
 * Amplitude of the motion across the mount divided by the amplitude of the moving base.
 * @customfunction RELTRANS
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic (loss factor twice the ratio). Left out: viscous.
 * @returns Relative transmissibility; no unit; shape of the arguments together.
 * @example =RELTRANS(2, 1, 0) gives 1.33333333333333
 * @example =RELTRANS(0, 1, 0.1) gives 0
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Equation of motion of the stretch z = x - u: m z'' + c z' + k z = -m u''; Den Hartog, Mechanical Vibrations
 * @leavesOut One mass, one axis, linear mount, rigid base, steady vibration; static sag comes on top.
 */
export function RELTRANS(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const transmissibility = model === "viscous" ? relativeTransmissibility : hystereticRelativeTransmissibility;
  return lift(transmissibility, { frequency, naturalFrequency, dampingRatio });
}

/**
 * Phase angle by which the mounted item lags behind its moving base.
 * @customfunction ABSPHASE
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Phase lag; degrees, 0 to 180, without jumps; shape of the arguments together.
 * @example =ABSPHASE(1, 1, 0.5) gives 45
 * @example =ABSPHASE({0.5;2}, 1, 0) gives {0;180}
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Argument of (1 + i b)/(1 - r^2 + i b), b = 2 zeta r viscous, 2 zeta hysteretic
 * @leavesOut One mass, one axis, linear mount, rigid base, steady vibration.
 */
export function ABSPHASE(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((f, fn, zeta) => absolutePhase(f, fn, zeta, model), { frequency, naturalFrequency, dampingRatio });
}

/**
 * Phase angle by which the motion across the mount lags behind the moving base.
 * @customfunction RELPHASE
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Phase lag; degrees, 0 to 180, without jumps; shape of the arguments together.
 * @example =RELPHASE(1, 1, 0.05) gives 90
 * @example =RELPHASE({0.5;2}, 1, 0) gives {0;180}
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Argument of r^2/(1 - r^2 + i b), b = 2 zeta r viscous, 2 zeta hysteretic
 * @leavesOut One mass, one axis, linear mount, rigid base, steady vibration.
 */
export function RELPHASE(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((f, fn, zeta) => relativePhase(f, fn, zeta, model), { frequency, naturalFrequency, dampingRatio });
}

/**
 * Share of the base motion that the mount keeps away, 1 minus transmissibility; negative where it amplifies.
 * @customfunction EFFICIENCY
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Isolation efficiency; fraction (format the cell as percent); shape of the arguments together.
 * @example =EFFICIENCY(2, 1, 0) gives 0.666666666666667
 * @example =EFFICIENCY(0.5, 1, 0) gives -0.333333333333333
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Definition 1 - T with the absolute transmissibility
 * @leavesOut One mass, one axis, linear mount, rigid base, steady vibration.
 */
export function EFFICIENCY(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((f, fn, zeta) => isolationEfficiency(f, fn, zeta, model), { frequency, naturalFrequency, dampingRatio });
}

/**
 * Largest absolute transmissibility over all frequencies, as met on a slow run-up through resonance.
 * @customfunction PEAKTRANS
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; above 0. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Peak transmissibility; no unit; shape of the argument.
 * @example =PEAKTRANS(0.05) gives 10.0622137253413
 * @example =PEAKTRANS(0.5, "hysteretic") gives 1.4142135623731
 * @failure pole when dampingRatio is 0
 * @source Maximum of the absolute transmissibility over r, in closed form
 * @leavesOut A fast run-up stays below this peak; see RUNUP.
 */
export function PEAKTRANS(dampingRatio: any[][], dampingModel?: string): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((zeta) => peakTransmissibility(zeta, model), { dampingRatio });
}

/**
 * Frequency at which the absolute transmissibility is largest.
 * @customfunction PEAKFREQ
 * @param naturalFrequency Undamped natural frequency; any unit; above 0. Number or range.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Frequency of the peak; unit of naturalFrequency; shape of the arguments together.
 * @example =PEAKFREQ(10, 0) gives 10
 * @example =PEAKFREQ(10, 1) gives 7.07106781186548
 * @failure outside-domain when naturalFrequency is not above 0
 * @source Maximum of the absolute transmissibility over r: r^2 = 2/(1 + sqrt(1 + 8 zeta^2)) viscous, 1 hysteretic
 * @leavesOut The peak of the relative motion lies elsewhere.
 */
export function PEAKFREQ(naturalFrequency: any[][], dampingRatio: any[][], dampingModel?: string): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((fn, zeta) => peakFrequency(fn, zeta, model), { naturalFrequency, dampingRatio });
}

import { type Box, relativeBound, transmissibilityBound } from "../core/bounds";
import { dampingForPeak } from "../core/peak";
import { requiredNaturalFrequency, requiredStaticDeflection, requiredStiffness } from "../core/required";
import { why } from "../core/why";
import { type Argument, lift, word } from "./cell";
import { dampingModelOf } from "./dampingModel";
import { fromSI, toSI, unitSystem } from "./unitSystems";

/**
 * Greatest natural frequency with which a mount reaches the isolation efficiency.
 * @customfunction REQNATFREQ
 * @param efficiency Isolation efficiency wanted, 1 minus transmissibility; fraction; above 0 and below 1. Number or range.
 * @param frequency Lowest excitation frequency; any unit; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Greatest undamped natural frequency; unit of frequency; shape of the arguments together.
 * @example =REQNATFREQ(0.9, 25, 0) gives 7.53778361444409
 * @example =EFFICIENCY(25, REQNATFREQ(0.9, 25, 0.1), 0.1) gives 0.9
 * @failure outside-domain when efficiency is not between 0 and 1 or frequency not above 0
 * @source T(r) = 1 - E solved for r in closed form
 * @leavesOut Tolerances of the mount; check the result with TRANSBOUND.
 */
export function REQNATFREQ(
  efficiency: any[][],
  frequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((E, f, zeta) => requiredNaturalFrequency(E, f, zeta, model), { efficiency, frequency, dampingRatio });
}

/**
 * Least static deflection with which a mount reaches the isolation efficiency.
 * @customfunction REQSTATICDEFL
 * @param efficiency Isolation efficiency wanted, 1 minus transmissibility; fraction; above 0 and below 1. Number or range.
 * @param frequency Lowest excitation frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [stiffnessRatio] Dynamic over static stiffness; no unit; above 0, about 1 for steel. Number or range. Left out: 1.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Least static deflection; m, mm or in; shape of the arguments together.
 * @example =REQSTATICDEFL(0.9, 25, 0, 1, "viscous", "mm") gives 4.37193409649098
 * @failure outside-domain when efficiency is not between 0 and 1 or frequency not above 0
 * @source Static deflection of the greatest natural frequency that reaches the efficiency, g = 9.80665 m/s2
 * @leavesOut Linear mounts only; air mounts and stiffening rubber sag less.
 */
export function REQSTATICDEFL(
  efficiency: any[][],
  frequency: any[][],
  dampingRatio: any[][],
  stiffnessRatio?: any[][],
  dampingModel?: string,
  units?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const system = unitSystem(units);
  return lift(
    (E, f, zeta, kappa) => fromSI(requiredStaticDeflection(E, f, zeta, kappa, model), system.displacement),
    { efficiency, frequency, dampingRatio },
    { stiffnessRatio: [stiffnessRatio, 1] },
  );
}

/**
 * Greatest total dynamic stiffness with which the mounts of a mass reach the isolation efficiency.
 * @customfunction REQSTIFFNESS
 * @param efficiency Isolation efficiency wanted, 1 minus transmissibility; fraction; above 0 and below 1. Number or range.
 * @param frequency Lowest excitation frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Greatest total dynamic stiffness; N/m, N/mm or lbf/in; shape of the arguments together.
 * @example =REQSTIFFNESS(0.9, 25, 0, 100) gives 224309.190933849
 * @failure outside-domain when efficiency is not between 0 and 1, frequency or mass not above 0
 * @source Stiffness of the greatest natural frequency that reaches the efficiency
 * @leavesOut The total over all mounts; divide by their number for one mount.
 */
export function REQSTIFFNESS(
  efficiency: any[][],
  frequency: any[][],
  dampingRatio: any[][],
  mass: any[][],
  dampingModel?: string,
  units?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const system = unitSystem(units);
  return lift((E, f, zeta, m) => fromSI(requiredStiffness(E, f, zeta, toSI(m, system.mass), model), system.stiffness), {
    efficiency,
    frequency,
    dampingRatio,
    mass,
  });
}

/**
 * Damping ratio that keeps the peak at resonance to this transmissibility.
 * @customfunction REQDAMPING
 * @param peakTransmissibility Largest transmissibility allowed at resonance; no unit; above 1. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Least damping ratio; fraction of critical; shape of the argument.
 * @example =REQDAMPING(PEAKTRANS(0.12)) gives 0.12
 * @failure outside-domain when peakTransmissibility is not above 1
 * @source The peak transmissibility solved for the damping ratio in closed form
 * @leavesOut More damping lets more through above resonance.
 */
export function REQDAMPING(peakTransmissibility: any[][], dampingModel?: string): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((T) => dampingForPeak(T, model), { peakTransmissibility });
}

/**
 * Worst (or best) absolute transmissibility over a frequency range and tolerances of the mount.
 * @customfunction TRANSBOUND
 * @param lowestFrequency Lowest excitation frequency; any unit; 0 or more. Number or range.
 * @param highestFrequency Highest excitation frequency; same unit; lowestFrequency or more. Number or range.
 * @param naturalFrequency Nominal natural frequency; same unit; above 0. Number or range.
 * @param dampingRatio Nominal damping over critical damping; fraction; 0 or more. Number or range.
 * @param [naturalFrequencyTolerance] Tolerance, plus or minus; fraction; 0 or more and below 1. Number or range. Left out: 0.
 * @param [dampingTolerance] Tolerance, plus or minus; fraction; 0 to 1. Number or range. Left out: 0.
 * @param [bound] End wanted; word; max or min. Left out: max.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Exact bound of the absolute transmissibility; no unit; shape of the arguments together.
 * @example =TRANSBOUND(25, 25, 8, 0.1) gives 0.1341902548992
 * @example =TRANSBOUND(5, 30, 8, 0.05) gives 10.0622137253413
 * @failure pole when the range holds the resonance of a mount that may be undamped
 * @source T falls with damping below sqrt 2 fn, rises above it, and has one peak over frequency
 * @leavesOut Tolerances of stiffness and mass: the natural frequency shifts by half of each.
 */
export function TRANSBOUND(
  lowestFrequency: any[][],
  highestFrequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  naturalFrequencyTolerance?: any[][],
  dampingTolerance?: any[][],
  bound?: string,
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const end = boundOf(bound);
  return liftBox(
    (box) => transmissibilityBound(box, end, model),
    { lowestFrequency, highestFrequency, naturalFrequency, dampingRatio },
    { naturalFrequencyTolerance: [naturalFrequencyTolerance, 0], dampingTolerance: [dampingTolerance, 0] },
  );
}

/**
 * Worst (or best) relative transmissibility over a frequency range and tolerances: the room the mount needs.
 * @customfunction RELBOUND
 * @param lowestFrequency Lowest excitation frequency; any unit; 0 or more. Number or range.
 * @param highestFrequency Highest excitation frequency; same unit; lowestFrequency or more. Number or range.
 * @param naturalFrequency Nominal natural frequency; same unit; above 0. Number or range.
 * @param dampingRatio Nominal damping over critical damping; fraction; 0 or more. Number or range.
 * @param [naturalFrequencyTolerance] Tolerance, plus or minus; fraction; 0 or more and below 1. Number or range. Left out: 0.
 * @param [dampingTolerance] Tolerance, plus or minus; fraction; 0 to 1. Number or range. Left out: 0.
 * @param [bound] End wanted; word; max or min. Left out: max.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Exact bound of the relative transmissibility; no unit; shape of the arguments together.
 * @example =RELBOUND(30, 60, 10, 0) gives 1.125
 * @example =RELBOUND(0, 0, 10, 0.1) gives 0
 * @failure pole when the range holds the resonance of a mount that may be undamped
 * @source R falls with damping everywhere and has at most one peak over frequency
 * @leavesOut Times one displacement amplitude of the base; where the base moves less at some frequencies, sweep instead.
 */
export function RELBOUND(
  lowestFrequency: any[][],
  highestFrequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  naturalFrequencyTolerance?: any[][],
  dampingTolerance?: any[][],
  bound?: string,
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const end = boundOf(bound);
  return liftBox(
    (box) => relativeBound(box, end, model),
    { lowestFrequency, highestFrequency, naturalFrequency, dampingRatio },
    { naturalFrequencyTolerance: [naturalFrequencyTolerance, 0], dampingTolerance: [dampingTolerance, 0] },
  );
}

/**
 * One sentence on an operating point: what the mount does there, why, and what would help most.
 * @customfunction WHY
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Text; no unit, frequencies in the unit of the arguments; shape of the arguments together.
 * @example =LEFT(WHY(25, 8, 0.1), 8) gives "Isolates"
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Absolute transmissibility, its peak and its crossing of 1 at sqrt 2 fn
 * @leavesOut It weighs this one operating point, not start-up time, room or load.
 */
export function WHY(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((f, fn, zeta) => why(f, fn, zeta, model), { frequency, naturalFrequency, dampingRatio });
}

function boundOf(argument: Argument) {
  return word("bound", argument, ["max", "min"], "max");
}

function liftBox(
  compute: (box: Box) => number,
  required: Record<string, Argument>,
  optional: Record<string, [Argument, number]>,
): any[][] {
  return lift(
    (lowest, highest, fn, zeta, fnTolerance, zetaTolerance) =>
      compute({ lowest, highest, fn, zeta, fnTolerance, zetaTolerance }),
    required,
    optional,
  );
}

import {
  convertDamping,
  DAMPING_FORMS,
  dampingCoefficient,
  dampingRatio as dampingRatioOf,
  frequencyFromDeflection,
  mountDeflection,
  mountForce,
  naturalFrequency as naturalFrequencyOf,
  staticDeflection as staticDeflectionOf,
  stiffness as stiffnessOf,
} from "../core/mount";
import { lift, word } from "./cell";
import { dampingModelOf } from "./dampingModel";
import { fromSI, toSI, unitSystem } from "./unitSystems";

/**
 * Undamped natural frequency of a mass on a spring.
 * @customfunction NATFREQ
 * @param stiffness Total dynamic stiffness of all mounts (not static); N/m, N/mm or lbf/in; above 0. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Undamped natural frequency; Hz; shape of the arguments together.
 * @example =NATFREQ(200000, 100) gives 7.11762543417177
 * @example =NATFREQ(200, 100, "mm") gives 7.11762543417177
 * @failure outside-domain when stiffness or mass is not above 0
 * @source Definition, angular frequency squared = k/m
 * @leavesOut One mass, one axis; rubber is stiffer in motion than at rest, use its dynamic stiffness.
 */
export function NATFREQ(stiffness: any[][], mass: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift((k, m) => naturalFrequencyOf(toSI(k, system.stiffness), toSI(m, system.mass)), { stiffness, mass });
}

/**
 * Dynamic stiffness that gives a mass this natural frequency.
 * @customfunction STIFFNESS
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Total dynamic stiffness; N/m, N/mm or lbf/in; shape of the arguments together.
 * @example =STIFFNESS(5, 100) gives 98696.0440108936
 * @example =STIFFNESS(5, 100, "mm") gives 98.6960440108936
 * @failure outside-domain when naturalFrequency or mass is not above 0
 * @source Definition, angular frequency squared = k/m
 * @leavesOut The total over all mounts; divide by their number for one mount.
 */
export function STIFFNESS(naturalFrequency: any[][], mass: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift((fn, m) => fromSI(stiffnessOf(fn, toSI(m, system.mass)), system.stiffness), { naturalFrequency, mass });
}

/**
 * Static deflection of a mount under the load that gives it this natural frequency.
 * @customfunction STATICDEFL
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param [stiffnessRatio] Dynamic over static stiffness; no unit; above 0, about 1 for steel. Number or range. Left out: 1.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Static deflection; m, mm or in; shape of the arguments together.
 * @example =STATICDEFL(5) gives 0.00993621385566132
 * @example =STATICDEFL(5, 1.4, "mm") gives 13.9106993979258
 * @failure outside-domain when naturalFrequency or stiffnessRatio is not above 0
 * @source k_static d = m g and k_dynamic = m (2 pi fn)^2, with g = 9.80665 m/s2
 * @leavesOut Linear mounts only: not for air mounts, nor for rubber that stiffens under load.
 */
export function STATICDEFL(naturalFrequency: any[][], stiffnessRatio?: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift(
    (fn, kappa) => fromSI(staticDeflectionOf(fn, kappa), system.displacement),
    { naturalFrequency },
    { stiffnessRatio: [stiffnessRatio, 1] },
  );
}

/**
 * Natural frequency of a mount from its static deflection under the load.
 * @customfunction DEFLFREQ
 * @param staticDeflection Deflection under the weight at rest; m, mm or in; above 0. Number or range.
 * @param [stiffnessRatio] Dynamic over static stiffness; no unit; above 0, about 1 for steel. Number or range. Left out: 1.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Undamped natural frequency; Hz; shape of the arguments together.
 * @example =DEFLFREQ(0.025) gives 3.15217605086729
 * @example =DEFLFREQ(1, 1, "inch") gives 3.12725727226123
 * @failure outside-domain when staticDeflection or stiffnessRatio is not above 0
 * @source k_static d = m g and k_dynamic = m (2 pi fn)^2, with g = 9.80665 m/s2
 * @leavesOut Linear mounts only: not for air mounts, nor for rubber that stiffens under load.
 */
export function DEFLFREQ(staticDeflection: any[][], stiffnessRatio?: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift(
    (deflection, kappa) => frequencyFromDeflection(toSI(deflection, system.displacement), kappa),
    { staticDeflection },
    { stiffnessRatio: [stiffnessRatio, 1] },
  );
}

/**
 * Amplitude by which the mount stretches and shortens while its base vibrates.
 * @customfunction MOUNTDEFL
 * @param baseAmplitude Displacement amplitude of the base; any length unit; 0 or more. Number or range.
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit as frequency; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @returns Dynamic deflection amplitude; unit and kind (peak or rms) of baseAmplitude; shape of the arguments together.
 * @example =MOUNTDEFL(3, 2, 1, 0) gives 4
 * @example =MOUNTDEFL(0.5, 20, 20, 0.05) gives 5
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Relative transmissibility times the base amplitude
 * @leavesOut Static sag, tilt and shock need room beside it.
 */
export function MOUNTDEFL(
  baseAmplitude: any[][],
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  return lift((amplitude, f, fn, zeta) => mountDeflection(amplitude, f, fn, zeta, model), {
    baseAmplitude,
    frequency,
    naturalFrequency,
    dampingRatio,
  });
}

/**
 * Amplitude of the force that spring and damper together pass on while the base vibrates.
 * @customfunction MOUNTFORCE
 * @param baseAmplitude Displacement amplitude of the base; m, mm or in; 0 or more. Number or range.
 * @param frequency Excitation frequency; Hz; 0 or more. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Dynamic force amplitude of all mounts together; N or lbf; shape of the arguments together.
 * @example =MOUNTFORCE(0.001, 10, 50, 5, 0) gives 65.7973626739291
 * @example =MOUNTFORCE(1, 10, 50, 5, 0, , "mm") gives 65.7973626739291
 * @failure pole when frequency equals naturalFrequency and dampingRatio is 0
 * @source Newton: force = m times the absolute acceleration (2 pi f)^2 T U
 * @leavesOut The weight at rest comes on top; the share of each mount is another question, see MOUNTLOADS.
 */
export function MOUNTFORCE(
  baseAmplitude: any[][],
  frequency: any[][],
  mass: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  dampingModel?: string,
  units?: string,
): any[][] {
  const model = dampingModelOf(dampingModel);
  const system = unitSystem(units);
  return lift(
    (amplitude, f, m, fn, zeta) => {
      const force = mountForce(toSI(amplitude, system.displacement), f, toSI(m, system.mass), fn, zeta, model);
      return fromSI(force, system.force);
    },
    { baseAmplitude, frequency, mass, naturalFrequency, dampingRatio },
  );
}

/**
 * Damping restated from one usual form to another.
 * @customfunction DAMPING
 * @param value Damping in the form named next; unit of that form; 0 or more. Number or range.
 * @param from Form of value; word; ratio, percent, loss factor, q or log decrement.
 * @param to Form wanted; word; ratio, percent, loss factor, q or log decrement.
 * @returns Damping in the form wanted; no unit (percent of critical for percent); shape of value.
 * @example =DAMPING(0.2, "loss factor", "ratio") gives 0.1
 * @example =DAMPING(10, "Q", "percent") gives 5
 * @failure outside-domain when the motion has no such form: q of undamped, log decrement from critical damping on
 * @source loss factor = 2 zeta and Q = 1/(2 zeta) at resonance; log decrement = 2 pi zeta/sqrt(1 - zeta^2)
 * @leavesOut A loss factor equals twice the damping ratio at resonance only.
 */
export function DAMPING(value: any[][], from: string, to: string): any[][] {
  const given = word("from", from, DAMPING_FORMS);
  const wanted = word("to", to, DAMPING_FORMS);
  return lift((damping) => convertDamping(damping, given, wanted), { value });
}

/**
 * Coefficient of the damper that gives a mounted mass this damping ratio.
 * @customfunction DAMPCOEFF
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param stiffness Total dynamic stiffness; N/m, N/mm or lbf/in; above 0. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Damping coefficient; N.s/m, N.s/mm or lbf.s/in; shape of the arguments together.
 * @example =DAMPCOEFF(0.1, 40000, 100) gives 400
 * @failure outside-domain when dampingRatio is negative, stiffness or mass not above 0
 * @source Definition, c = 2 zeta sqrt(k m)
 * @leavesOut Viscous damping only.
 */
export function DAMPCOEFF(dampingRatio: any[][], stiffness: any[][], mass: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift(
    (zeta, k, m) => fromSI(dampingCoefficient(zeta, toSI(k, system.stiffness), toSI(m, system.mass)), system.damping),
    { dampingRatio, stiffness, mass },
  );
}

/**
 * Damping ratio of a mounted mass from the coefficient of its damper.
 * @customfunction DAMPRATIO
 * @param dampingCoefficient Damper force per velocity; N.s/m, N.s/mm or lbf.s/in; 0 or more. Number or range.
 * @param stiffness Total dynamic stiffness; N/m, N/mm or lbf/in; above 0. Number or range.
 * @param mass Supported mass (not weight); kg or lb; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Damping ratio; fraction of critical; shape of the arguments together.
 * @example =DAMPRATIO(400, 40000, 100) gives 0.1
 * @failure outside-domain when dampingCoefficient is negative, stiffness or mass not above 0
 * @source Definition, zeta = c/(2 sqrt(k m))
 * @leavesOut Viscous damping only.
 */
export function DAMPRATIO(dampingCoefficient: any[][], stiffness: any[][], mass: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift((c, k, m) => dampingRatioOf(toSI(c, system.damping), toSI(k, system.stiffness), toSI(m, system.mass)), {
    dampingCoefficient,
    stiffness,
    mass,
  });
}

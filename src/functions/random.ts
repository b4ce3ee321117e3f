import { bandTransmissibility } from "../core/bandTransmissibility";
import { milesRms, peakFactor } from "../core/peakFactor";
import { densityAt, type Profile, profileRms, readProfile } from "../core/psd";
import { randomResponseRms } from "../core/randomResponse";
import { type Argument, lift, one, requireSameLength, vector, word } from "./cell";
import { dampingModelOf } from "./dampingModel";
import { responseInSheet, responseOf } from "./response";
import { unitSystem } from "./unitSystems";

/**
 * Density of a random vibration profile at a frequency, on straight lines between break-points on log-log axes.
 * @customfunction PSDAT
 * @param frequencies Break-point frequencies, rising; Hz; above 0, two or more. Whole range.
 * @param densities One-sided acceleration densities at them; unit2/Hz; above 0, as many. Whole range.
 * @param frequency Frequency asked for; Hz; within the break-points. Number or range.
 * @returns Acceleration density; unit of densities; shape of frequency.
 * @example =PSDAT({20;80;500}, {0.01;0.04;0.04}, 40) gives 0.02
 * @example =PSDAT({20;80;500}, {0.01;0.04;0.04}, {80;200}) gives {0.04;0.04}
 * @failure not-covered when frequency lies outside the break-points
 * @source Power law between break-points, the customary reading of test specifications (IEC 60068-2-64 draws them so)
 * @leavesOut Nothing is assumed outside the break-points; slopes in dB per octave must be turned into break-points first.
 */
export function PSDAT(frequencies: any[][], densities: any[][], frequency: any[][]): any[][] {
  const profile = profileOf(frequencies, densities);
  return lift((f) => densityAt(profile, f), { frequency });
}

/**
 * Overall rms acceleration of a random vibration profile, over its whole band or a part of it.
 * @customfunction PSDRMS
 * @param frequencies Break-point frequencies, rising; Hz; above 0, two or more. Whole range.
 * @param densities One-sided acceleration densities at them; unit2/Hz; above 0, as many. Whole range.
 * @param [from] Lower end of the band; Hz; within the break-points. One number. Left out: the first break-point.
 * @param [to] Upper end of the band; Hz; within the break-points, above from. One number. Left out: the last break-point.
 * @returns Rms acceleration; unit whose square densities carries; one number.
 * @example =PSDRMS({20;80;500;2000}, {0.01;0.04;0.04;0.01}) gives 6.78423814605574
 * @example =PSDRMS({10;100}, {2;2}, 20, 70) gives 10
 * @failure not-covered when from or to lies outside the break-points
 * @source Closed integral of the power law between break-points, with its logarithmic case at a slope of -1
 * @leavesOut Zero outside the band; no peaks: PEAKFACTOR estimates them.
 */
export function PSDRMS(frequencies: any[][], densities: any[][], from?: any[][], to?: any[][]): any[][] {
  const profile = profileOf(frequencies, densities);
  const low = one("from", from, profile.frequencies[0]);
  const high = one("to", to, profile.frequencies[profile.frequencies.length - 1]);
  return [[profileRms(profile, low, high)]];
}

/**
 * Rms acceleration or mount deflection of an item on mounts whose base moves with a random vibration profile.
 * @customfunction RANDRMS
 * @param frequencies Break-point frequencies, rising; Hz; above 0, two or more. Whole range.
 * @param densities One-sided acceleration densities at them; (m/s2)2/Hz, or gn2/Hz for mm and inch; above 0. Whole range.
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 or more. Number or range.
 * @param [response] What is asked; word; acceleration or deflection. Left out: acceleration.
 * @param [dampingModel] Damping law; word; viscous or hysteretic. Left out: viscous.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Rms response over the band; m/s2 or gn, deflection in m, mm or in; shape of naturalFrequency and dampingRatio.
 * @example =RANDRMS({20;2000}, {0.01;0.01}, 100, 0.05) gives 3.95714148746281
 * @example =RANDRMS({20;2000}, {0.01;0.01}, 100, 0.05, "deflection", "viscous", "mm") gives 0.0978049103945799
 * @failure pole when dampingRatio is 0 and naturalFrequency lies within the break-points
 * @source Integral of density times squared transmissibility over the band, to 1e-11
 * @leavesOut One mass, one axis, linear mount, stationary Gaussian motion, nothing outside the band; rms is not the peak.
 */
export function RANDRMS(
  frequencies: any[][],
  densities: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  response?: string,
  dampingModel?: string,
  units?: string,
): any[][] {
  const profile = profileOf(frequencies, densities);
  const wanted = responseOf(response);
  const model = dampingModelOf(dampingModel);
  const system = unitSystem(units);
  return lift((fn, zeta) => responseInSheet(randomResponseRms(profile, fn, zeta, wanted, model), wanted, system), {
    naturalFrequency,
    dampingRatio,
  });
}

/**
 * Rms acceleration of an item on mounts under a flat random spectrum, by Miles' equation.
 * @customfunction MILES
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not Q); fraction; above 0. Number or range.
 * @param density One-sided acceleration density at the natural frequency; unit2/Hz; above 0. Number or range.
 * @param [form] Exact for a moving base, or as handbooks print it; word; exact or short. Left out: exact.
 * @returns Rms absolute acceleration; unit whose square density carries; shape of the arguments together.
 * @example =MILES(100, 0.05, 0.04) gives 7.96618927734672
 * @example =MILES(100, 0.05, 0.04, "short") gives 7.92665459521202
 * @failure pole when dampingRatio is 0
 * @source J. W. Miles, On structural fatigue under random loading (1954), and the same integral with the damper's force
 * @leavesOut Flat spectrum without end: where it slopes or stops near naturalFrequency use RANDRMS.
 */
export function MILES(naturalFrequency: any[][], dampingRatio: any[][], density: any[][], form?: string): any[][] {
  const kind = word("form", form, ["exact", "short"], "exact");
  return lift((fn, zeta, S) => milesRms(fn, zeta, S, kind), { naturalFrequency, dampingRatio, density });
}

/**
 * Expected largest peak of a random response, as a multiple of its rms.
 * @customfunction PEAKFACTOR
 * @param naturalFrequency Frequency about which the response swings; Hz; above 0. Number or range.
 * @param duration Time of exposure; s; two cycles or more. Number or range.
 * @returns Peak over rms; no unit; shape of the arguments together.
 * @example =PEAKFACTOR(200, 60) gives 4.46738080567656
 * @failure outside-domain when naturalFrequency times duration is below 2
 * @source A. G. Davenport (1964): c + 0.5772/c with c = sqrt(2 ln(fn t))
 * @leavesOut Narrow-band Gaussian response; an expected value, so about half of all exposures go higher.
 */
export function PEAKFACTOR(naturalFrequency: any[][], duration: any[][]): any[][] {
  return lift(peakFactor, { naturalFrequency, duration });
}

/**
 * Rms transmissibility over a one-third-octave or other fractional-octave band.
 * @customfunction BANDTRANS
 * @param centreFrequency Centre of the band; any unit; above 0. Number or range.
 * @param naturalFrequency Undamped natural frequency; same unit; above 0. Number or range.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param [bandsPerOctave] Bands in an octave; count; whole number from 1. One number. Left out: 3.
 * @returns Root of the mean squared transmissibility; no unit; shape of the arguments together.
 * @example =BANDTRANS(20, 5, 0.05) gives 0.0724910238446356
 * @example =BANDTRANS(5, 5, 0.05, 1) gives 4.52721728364415
 * @failure pole when dampingRatio is 0 and naturalFrequency lies in the band
 * @source Integral of the squared absolute transmissibility; band edges of IEC 61260-1, base ten
 * @leavesOut Even density within the band, viscous damping; the centre frequency is taken as given, not rounded to a band.
 */
export function BANDTRANS(
  centreFrequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  bandsPerOctave?: any[][],
): any[][] {
  const bands = one("bandsPerOctave", bandsPerOctave, 3);
  return lift((fc, fn, zeta) => bandTransmissibility(fc, fn, zeta, bands), {
    centreFrequency,
    naturalFrequency,
    dampingRatio,
  });
}

function profileOf(frequencies: Argument, densities: Argument): Profile {
  const f = vector("frequencies", frequencies);
  const S = vector("densities", densities);
  requireSameLength(f, S);
  return readProfile(f.values, S.values);
}

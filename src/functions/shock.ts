import { NumericError, requireAbove } from "../core/errors";
import { responseHistory } from "../core/history";
import { pulseResponse } from "../core/pulse";
import { PULSE_SHAPES, pulseVelocity } from "../core/pulseShapes";
import { readRecord } from "../core/record";
import { runupPeak } from "../core/runup";
import { shockSpectrum } from "../core/srs";
import { lift, one, spill, vector, word } from "./cell";
import { responseInSheet, responseOf } from "./response";
import { fromSI, toSI, unitSystem } from "./unitSystems";

/**
 * Largest acceleration or mount deflection of an item on mounts whose base makes one shock pulse.
 * @customfunction PULSE
 * @param shape Pulse shape; word; half-sine, initial-peak sawtooth, terminal-peak sawtooth, triangle, rectangle, haversine or trapezoid.
 * @param peak Peak base acceleration; m/s2, or gn for mm and inch; any number. Number or range.
 * @param duration Duration of the pulse; s; above 0. Number or range.
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping (not percent, not loss factor); fraction; 0 to 1. Number or range.
 * @param [response] What is asked; word; acceleration or deflection. Left out: acceleration.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Largest magnitude over all time; m/s2 or gn, deflection in m, mm or in; shape of the arguments together.
 * @example =PULSE("rectangle", 1, 1, 10, 0) gives 2
 * @example =PULSE("half-sine", 40, 0.011, 10, 0.05, "acceleration", "mm") gives 16.2070295584086
 * @failure outside-domain when duration or naturalFrequency is not above 0, or dampingRatio outside 0 to 1
 * @source Exact solution of z'' + 2 zeta wn z' + wn2 z = -u'' for pulses of IEC 60068-2-27 and handbooks
 * @leavesOut One mass, one axis, linear mount from rest; no stops, no second impact, no static sag.
 */
export function PULSE(
  shape: string,
  peak: any[][],
  duration: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  response?: string,
  units?: string,
): any[][] {
  const form = word("shape", shape, PULSE_SHAPES);
  const wanted = responseOf(response);
  const system = unitSystem(units);
  return lift((A, D, fn, zeta) => responseInSheet(pulseResponse(form, A, D, fn, zeta, wanted), wanted, system), {
    peak,
    duration,
    naturalFrequency,
    dampingRatio,
  });
}

/**
 * Velocity change of a shock pulse, the area under its acceleration.
 * @customfunction PULSEVELOCITY
 * @param shape Pulse shape; word; half-sine, initial-peak sawtooth, terminal-peak sawtooth, triangle, rectangle, haversine or trapezoid.
 * @param peak Peak base acceleration; m/s2, or gn for mm and inch; any number. Number or range.
 * @param duration Duration of the pulse; s; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Velocity change; m/s, mm/s or in/s; shape of peak and duration.
 * @example =PULSEVELOCITY("triangle", 100, 0.01) gives 0.5
 * @example =PULSEVELOCITY("half-sine", 40, 0.011, "mm") gives 2746.96720790296
 * @failure outside-domain when duration is not above 0
 * @source Integral of the shape; trapezoid with rise and fall of a tenth of the duration each, as IEC 60068-2-27
 * @leavesOut Nominal pulse only: a test machine's pre- and post-pulse change the total.
 */
export function PULSEVELOCITY(shape: string, peak: any[][], duration: any[][], units?: string): any[][] {
  const form = word("shape", shape, PULSE_SHAPES);
  const system = unitSystem(units);
  return lift((A, D) => fromSI(pulseVelocity(form, toSI(A, system.acceleration), D), system.velocity), {
    peak,
    duration,
  });
}

/**
 * Shock response spectrum of a recorded base acceleration: the largest response for each natural frequency.
 * @customfunction SRS
 * @param accelerations Recorded base acceleration at equal time steps; m/s2, or gn for mm and inch; two or more. Whole range.
 * @param timeStep Time between samples; s; above 0. One number.
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping, 0.05 by custom; fraction; 0 or more. One number.
 * @param [response] What is asked; word; acceleration or deflection. Left out: acceleration.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Largest magnitude during and after the record; m/s2 or gn, deflection in m, mm or in; shape of naturalFrequency.
 * @example =SRS({0;1;0}, 0.01, {5;50}, 0.05) gives {0.29019207862339;1.41706435725476}
 * @failure outside-domain when timeStep or naturalFrequency is not above 0, or an acceleration is missing
 * @source Exact response for straight lines between samples (ramp-invariant, as D. O. Smallwood 1981, ISO 18431-4)
 * @leavesOut Item at rest at the first sample; the base's acceleration is zero after the last one; the record is not filtered.
 */
export function SRS(
  accelerations: any[][],
  timeStep: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  response?: string,
  units?: string,
): any[][] {
  const wanted = responseOf(response);
  const system = unitSystem(units);
  const zeta = one("dampingRatio", dampingRatio);
  const record = readRecord(vector("accelerations", accelerations).values, one("timeStep", timeStep));
  // all sound frequencies go through the record together; a bad one keeps its error in its own place
  const sound: number[] = [];
  const places = lift(
    (fn) => {
      requireAbove("natural frequency", fn, 0);
      return sound.push(fn) - 1;
    },
    { naturalFrequency },
  );
  try {
    const spectrum = shockSpectrum(record, sound, zeta, wanted);
    return places.map((row) =>
      row.map((k) => (typeof k === "number" ? responseInSheet(spectrum[k], wanted, system) : k)),
    );
  } catch (thrown) {
    if (!(thrown instanceof NumericError)) throw thrown;
    const alone = (fn: number) => responseInSheet(shockSpectrum(record, [fn], zeta, wanted)[0], wanted, system);
    return lift(alone, { naturalFrequency });
  }
}

/**
 * Response of an item on mounts to a recorded base acceleration, at every sample.
 * @customfunction HISTORY
 * @param accelerations Recorded base acceleration at equal time steps; m/s2, or gn for mm and inch; two or more. Whole range.
 * @param timeStep Time between samples; s; above 0. One number.
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. One number.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. One number.
 * @param [response] What is asked; word; acceleration or deflection. Left out: acceleration.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Response at each sample, deflection as item minus base; m/s2 or gn, m, mm or in; the record's own orientation.
 * @example =HISTORY({0;1;0}, 0.01, 10, 0.05) gives {0;0.0932899213191928;0.390894561364727}
 * @failure outside-domain when timeStep or naturalFrequency is not above 0
 * @source Exact response for straight lines between samples
 * @leavesOut Item at rest at the first sample; one mass, one axis, linear mount.
 */
export function HISTORY(
  accelerations: any[][],
  timeStep: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  response?: string,
  units?: string,
): any[][] {
  const wanted = responseOf(response);
  const system = unitSystem(units);
  const samples = vector("accelerations", accelerations);
  const record = readRecord(samples.values, one("timeStep", timeStep));
  const fn = one("naturalFrequency", naturalFrequency);
  const motion = responseHistory(record, fn, one("dampingRatio", dampingRatio), wanted);
  return spill(
    motion.map((value) => responseInSheet(value, wanted, system)),
    samples,
  );
}

/**
 * Largest motion of an item on mounts, over its base's amplitude, while a machine runs up or down through resonance.
 * @customfunction RUNUP
 * @param naturalFrequency Undamped natural frequency; Hz; above 0. Number or range.
 * @param dampingRatio Damping over critical damping; fraction; 0 or more. Number or range.
 * @param sweepRate Change of frequency per time (the two ends give its direction); Hz/s; above 0. Number or range.
 * @param from Frequency at the start; Hz; 0 or more. One number.
 * @param to Frequency at the end; Hz; 0 or more, not from. One number.
 * @returns Largest absolute displacement over base amplitude; no unit; shape of the lifted arguments together.
 * @example =RUNUP(8, 0.05, 5, 0, 30) gives 6.70264729935826
 * @failure no-convergence when the sweep has so many cycles (some 50,000) that it is as good as steady: use PEAKTRANS
 * @source Equation of motion followed in time by Taylor steps; the problem of F. M. Lewis (1932)
 * @leavesOut Constant base amplitude, linear sweep, item at rest at the start; coast-down is slower, so check both.
 */
export function RUNUP(
  naturalFrequency: any[][],
  dampingRatio: any[][],
  sweepRate: any[][],
  from: any[][],
  to: any[][],
): any[][] {
  const start = one("from", from);
  const end = one("to", to);
  return lift((fn, zeta, rate) => runupPeak(fn, zeta, rate, start, end), {
    naturalFrequency,
    dampingRatio,
    sweepRate,
  });
}

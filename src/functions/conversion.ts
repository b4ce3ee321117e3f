import {
  convertMotion,
  crossoverFrequency,
  MOTION_MEASURES,
  MOTION_QUANTITIES,
  type MotionForm,
  type MotionMeasure,
  type MotionQuantity,
} from "../core/motion";
import { sweep } from "../core/sweep";
import { unitConversion } from "../core/units";
import { type Argument, lift, one, spill, text, word } from "./cell";
import { fromSI, toSI, unitSystem } from "./unitSystems";

/**
 * A sinusoidal motion restated: displacement, velocity or acceleration, as peak, rms or peak-to-peak.
 * @customfunction MOTION
 * @param value Size of the motion in the form named by from; unit of that form; 0 or more. Number or range.
 * @param frequency Frequency of the motion; Hz; above 0. Number or range.
 * @param from Form of value; words; displacement, velocity or acceleration, then peak, rms or peak-to-peak.
 * @param to Form wanted; words; displacement, velocity or acceleration, then peak, rms or peak-to-peak.
 * @param [units] Unit system; word; si, mm or inch (acceleration in gn for mm and inch). Left out: si.
 * @returns Size of the motion in the form wanted; m, m/s, m/s2, or mm, mm/s, gn, or in, in/s, gn; shape of the arguments.
 * @example =MOTION(1, 10, "displacement peak", "displacement peak-to-peak") gives 2
 * @example =MOTION(1, 10, "acceleration peak", "velocity peak") gives 0.0159154943091895
 * @failure outside-domain when value is negative or frequency not above 0
 * @source Each time derivative of a sine multiplies its amplitude by 2 pi f; rms = peak/sqrt 2
 * @leavesOut One frequency only: a random or mixed motion has no such conversion.
 */
export function MOTION(value: any[][], frequency: any[][], from: string, to: string, units?: string): any[][] {
  const given = motionForm("from", from);
  const wanted = motionForm("to", to);
  const system = unitSystem(units);
  return lift(
    (size, f) => fromSI(convertMotion(toSI(size, system[given.quantity]), f, given, wanted), system[wanted.quantity]),
    { value, frequency },
  );
}

/**
 * Frequency at which a constant displacement and a constant acceleration of a sine test meet.
 * @customfunction CROSSOVER
 * @param displacement Peak displacement; m, mm or in; above 0. Number or range.
 * @param acceleration Peak acceleration; m/s2, or gn for mm and inch; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Crossover frequency; Hz; shape of the arguments together.
 * @example =CROSSOVER(0.00035, 49) gives 59.5503268461376
 * @failure outside-domain when displacement or acceleration is not above 0
 * @source a = (2 pi f)^2 d, both peak
 * @leavesOut Displacement as peak, not peak-to-peak.
 */
export function CROSSOVER(displacement: any[][], acceleration: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift((d, a) => crossoverFrequency(toSI(d, system.displacement), toSI(a, system.acceleration)), {
    displacement,
    acceleration,
  });
}

/**
 * A value in another unit, for the units that the spreadsheet's own converter lacks.
 * @customfunction UNITS
 * @param value Number in the unit from; that unit; any number. Number or range.
 * @param from Unit of value; words such as rpm, mm/s, gn, lbf/in, (m/s2)2/Hz, case matters; compounds with . / digits ( ).
 * @param to Unit wanted; words as for from, of the same kind of quantity, case matters; g is the gram, gn free fall.
 * @returns The value in the unit to; that unit; shape of value.
 * @example =UNITS(1500, "rpm", "Hz") gives 25
 * @example =UNITS(1, "gn2/Hz", "(m/s2)2/Hz") gives 96.1703842225
 * @failure not-covered when a unit is unknown or the two are unlike
 * @source Inch of 25.4 mm and pound of 0.45359237 kg (international agreement of 1959), gn = 9.80665 m/s2
 * @leavesOut Temperatures, levels in decibels.
 */
export function UNITS(value: any[][], from: string, to: string): any[][] {
  const given = text("from", from);
  const wanted = text("to", to);
  let convert: ((number: number) => number) | undefined; // read once, but an unknown unit is an error in every place
  return lift((number) => (convert ??= unitConversion(given, wanted))(number), { value });
}

/**
 * A column of values from one end to the other, to spill beside the formulas of a sweep.
 * @customfunction SWEEP
 * @param from First value; any unit; any number, not 0 with log spacing. One number.
 * @param to Last value; same unit; any number, of the sign of from with log spacing. One number.
 * @param count How many values; count; whole number from 2 to 1048576. One number.
 * @param [spacing] Equal steps or equal ratios; word; linear or log. Left out: linear.
 * @returns Values with both ends exact; unit of from; a column.
 * @example =SWEEP(0, 1, 3) gives {0;0.5;1}
 * @example =SWEEP(100, 1, 3, "log") gives {100;10;1}
 * @failure outside-domain when count is not a whole number from 2 on, or a log sweep reaches or crosses 0
 * @source Arithmetic or geometric sequence
 * @leavesOut A frequency beside a sharp resonance may fall between two values; PEAKFREQ gives the peak.
 */
export function SWEEP(from: any[][], to: any[][], count: any[][], spacing?: string): any[][] {
  const kind = word("spacing", spacing, ["linear", "log"], "linear");
  return spill(sweep(one("from", from), one("to", to), one("count", count), kind));
}

const MOTION_FORMS = MOTION_QUANTITIES.flatMap((quantity) =>
  MOTION_MEASURES.map((measure) => `${quantity} ${measure}`),
);

function motionForm(name: string, argument: Argument): MotionForm {
  const [quantity, measure] = word(name, argument, MOTION_FORMS).split(" ");
  return { quantity: quantity as MotionQuantity, measure: measure as MotionMeasure };
}

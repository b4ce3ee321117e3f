import type { Fault } from "./fault";
import type { Interpretation } from "./interpret";
import type { Mistake } from "./quantities";
import { motionRoles, type Role, roles } from "./roles";
import { type Dimension, gravity } from "./units";

/** A factor by which a unit slip changes a number. */
export interface FactorSlip extends Fault {
  readonly factor: number;
}

const turn = 2 * Math.PI;

function both(mistake: Mistake | null, factors: readonly number[], why: string, cost: number): FactorSlip[] {
  return factors.flatMap((factor) => [
    { mistake, factor, why, cost },
    { mistake, factor: 1 / factor, why, cost },
  ]);
}

const angular = both(
  "angular-cyclic-mixup",
  [turn],
  "A frequency in Hz is taken as rad/s, or the reverse: 2π is missing or doubled.",
  1,
);
const angularSquared = both("angular-cyclic-mixup", [turn * turn], "2π, squared, is missing or doubled.", 1.5);
const speed = [
  ...both("speed-unit", [60], "Revolutions per minute are taken as Hz, or the reverse: 60 is missing or doubled.", 1),
  ...both("speed-unit", [60 / turn], "Revolutions per minute are taken as rad/s, or the reverse.", 1.3),
];
const speedSquared = both(
  "speed-unit",
  [3600],
  "It is divided by 60 where it should be multiplied, or the reverse.",
  1.3,
);
const lengthWhy = "A length is taken in another unit than the label says.";
const lengths = [
  ...both("length-unit", [1e3, 1e6, 25.4, 39.37007874015748], lengthWhy, 1.2),
  ...both("length-unit", [10, 100, 12, 2.54, 1e9], lengthWhy, 1.7),
];
const tens = both(
  "length-unit",
  [10, 100],
  "A unit is taken for another that is ten or a hundred times as large.",
  1.4,
);
const weights = both(
  "mass-weight-mixup",
  [
    gravity,
    gravity / 0.0254,
    gravity / 0.3048,
    gravity * 1000,
    gravity / 1000,
    gravity * 100,
    gravity / 10,
    gravity ** 2,
    gravity ** 2 / 1000,
  ],
  "Weight and mass are mixed up: g is missing or doubled.",
  1.1,
);
const weightInPounds = both(
  "mass-weight-mixup",
  [0.45359237 * gravity, 0.45359237],
  "Pounds are taken as newtons or kilograms.",
  1.6,
);
const percent = both("percent-as-ratio", [100], "A percentage is used as a fraction, or the reverse.", 1);
const lossFactor = both("loss-factor-as-damping-ratio", [2], "The loss factor is twice the damping ratio.", 1.2);
const amplitude = both(
  "amplitude-kind",
  [Math.SQRT2, 2, 2 * Math.SQRT2],
  "Peak, rms and peak-to-peak values are mixed up.",
  1.1,
);
const sigmas = both("amplitude-kind", [3], "The rms value and its threefold are mixed up.", 1.2);
const isRandom = /^(grms|zrms|F|Fs|FEach|FsEach)$/;
const level = both("decibel-factor", [2], "The level of an amplitude ratio has 20 log10, not 10.", 1);
const angle = both(null, [180 / Math.PI], "Radians stand under a label that says degrees, or the reverse.", 1);

const byDimension: Readonly<Record<Dimension, readonly FactorSlip[]>> = {
  number: percent,
  frequency: [...angular, ...speed],
  length: lengths,
  velocity: [...lengths],
  acceleration: [...weights.slice(0, 8), ...lengths],
  mass: [...weights, ...lengths.slice(0, 2), ...weightInPounds],
  force: [...weights, ...lengths.slice(0, 2), ...tens, ...weightInPounds],
  stiffness: [...lengths, ...weights.slice(0, 2)],
  damping: [...lengths, ...weights.slice(0, 2)],
  angle,
  level,
  density: [
    ...weights.slice(0, 2).map((slip) => ({ ...slip, factor: slip.factor ** 2 })),
    ...both("mass-weight-mixup", [gravity], "g enters a spectral density squared.", 1.2),
    ...lengths.slice(0, 4),
  ],
  pressure: lengths,
  area: lengths,
  time: [],
  other: [],
};

const oscillating = new Set<Role>([...motionRoles, "grms", "zrms"]);
const percentages = new Set<Role>(["zeta", "T", "R", "E", "eta"]);

/** Factors by which a number of this role may be wrong, with the mistake that each would be. */
export function factorSlips(role: Role, isResult: boolean): readonly FactorSlip[] {
  const { dimension } = roles[role];
  const found: FactorSlip[] = [];
  if (dimension === "number") {
    if (percentages.has(role)) found.push(...percent);
    if (role === "zeta" || role === "eta" || role === "Q" || role === "logdec") found.push(...lossFactor);
    if (role === "logdec" || (isResult && role === "zeta")) found.push(...angular);
    if (isResult && role === "r") found.push(...angular, ...speed);
  } else found.push(...byDimension[dimension]);
  if (oscillating.has(role)) found.push(...amplitude);
  if (isResult && isRandom.test(role)) found.push(...sigmas);
  if (isResult && oscillating.has(role)) found.push(...angular, ...angularSquared, ...speed);
  if (isResult && dimension === "frequency") found.push(...angularSquared, ...speedSquared);
  if (isResult && (dimension === "damping" || dimension === "stiffness")) found.push(...angular, ...angularSquared);
  if (isResult && (dimension === "stiffness" || dimension === "damping")) found.push(...weights.slice(2));
  if (isResult && role === "grms")
    found.push(...both(null, [Math.sqrt(gravity)], "g stands under the root once.", 1.3));
  if (isResult && role === "delta") found.push(...weights, ...angularSquared);
  if (isResult && dimension === "stiffness")
    found.push(...speed.slice(0, 2).map((slip) => ({ ...slip, factor: slip.factor ** 2 })));
  return found;
}

const mechanical = new Set<Dimension>([
  "stiffness",
  "length",
  "velocity",
  "acceleration",
  "damping",
  "pressure",
  "area",
]);

/** A number in a written unit that is used as if it were in SI units. */
export function takenAsBase({ role, factor, unitKnown }: Interpretation): FactorSlip | null {
  if (!unitKnown || factor === 1 || !mechanical.has(roles[role].dimension)) return null;
  return { mistake: "length-unit", factor: 1 / factor, why: lengthWhy, cost: 1.3 };
}

interface Confusion {
  /** what the label says it is */
  readonly is: Role;
  /** as what it is used */
  readonly used: Role;
  /** cost of the supposition for an input */
  readonly cost: number;
  readonly mistake: Mistake;
  readonly why: string;
}

const absolute = "The absolute motion stands where the relative one belongs.";
const relative = "The relative motion stands where the absolute one belongs.";
const oneMount = "The value of one mount is taken for all, or the reverse.";

const pairs: readonly (readonly [Role, Role, Mistake, string])[] = [
  ["kEach", "k", "mount-count-missing", oneMount],
  ["cEach", "c", "mount-count-missing", oneMount],
  ["mEach", "m", "mount-count-missing", oneMount],
  ["WEach", "W", "mount-count-missing", oneMount],
  ["k", "kEach", "total-for-per-mount", oneMount],
  ["c", "cEach", "total-for-per-mount", oneMount],
  ["m", "mEach", "total-for-per-mount", oneMount],
  ["W", "WEach", "total-for-per-mount", oneMount],
  ["eta", "zeta", "loss-factor-as-damping-ratio", "The loss factor is twice the damping ratio."],
  ["zeta", "eta", "loss-factor-as-damping-ratio", "The loss factor is twice the damping ratio."],
  ["F", "FEach", "total-for-per-mount", oneMount],
  ["Fs", "FsEach", "total-for-per-mount", oneMount],
  ["Fd", "FdEach", "total-for-per-mount", oneMount],
  ["FEach", "F", "mount-count-missing", oneMount],
  ["FsEach", "Fs", "mount-count-missing", oneMount],
  ["FdEach", "Fd", "mount-count-missing", oneMount],
  ["LT", "T", "efficiency-not-of-motion", "A level in decibels stands where the transmissibility belongs."],
  ["E", "T", "efficiency-not-of-motion", "The efficiency stands where the transmissibility belongs."],
  ["T", "E", "efficiency-not-of-motion", "The transmissibility stands where the efficiency belongs."],
  ["R", "T", "relative-used-for-absolute", relative],
  ["T", "R", "absolute-used-for-relative", absolute],
  ["Z", "X", "relative-used-for-absolute", relative],
  ["Zv", "Xv", "relative-used-for-absolute", relative],
  ["Za", "Xa", "relative-used-for-absolute", relative],
  ["X", "Z", "absolute-used-for-relative", absolute],
  ["Xv", "Zv", "absolute-used-for-relative", absolute],
  ["Xa", "Za", "absolute-used-for-relative", absolute],
  ["phiR", "phiA", "relative-used-for-absolute", relative],
  ["phiA", "phiR", "absolute-used-for-relative", absolute],
  [
    "quasi",
    "T",
    "numerator-damping-missing",
    "This is the magnification of a driven mass: (2ζr)² is missing in the numerator.",
  ],
  ["quasi", "R", "absolute-used-for-relative", "The numerator of the relative motion is r²."],
];

/** Roles that are mistaken for one another. */
export const confusions: readonly Confusion[] = pairs.map(([is, used, mistake, why]) => ({
  is,
  used,
  mistake,
  why,
  cost: is === "m" || is === "W" ? 1.4 : 1,
}));

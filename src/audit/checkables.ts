/** What a single hand value can be checked as: the right value, customary roundings, and ways to get it wrong. */
import { isolationEfficiency, transmissibilityLevel } from "../core/efficiency";
import { finite, requireAbove, requireAtLeast } from "../core/errors";
import {
  dampingCoefficient,
  dampingRatio,
  mountDeflection,
  mountForce,
  naturalFrequency,
  STANDARD_GRAVITY,
  staticDeflection,
} from "../core/mount";
import { peakTransmissibility } from "../core/peak";
import { milesRms } from "../core/peakFactor";
import { absolutePhase, relativePhase } from "../core/phase";
import { requiredNaturalFrequency, requiredStaticDeflection, requiredStiffness } from "../core/required";
import {
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../core/transmissibility";
import type { Mistake, Quantity } from "./quantities";
import { type Role, roles } from "./roles";

export interface Checkable {
  out: Role;
  inputs: readonly Role[];
  /** value of the last input where it may be left out */
  fallback?: number;
  right: (...inputs: number[]) => number;
  /** powers of g and of pi in the result, for customary roundings of the two */
  powers?: readonly [g: number, pi: number];
  customary?: readonly { says: string; value: (...inputs: number[]) => number }[];
  /** ways to the value that the catalogue's relations do not have; without a mistake's id the text alone says it */
  others?: readonly Other[];
  /** whether the sign is a matter of convention */
  eitherSign?: boolean;
}

export interface Other {
  mistake: Mistake | null;
  says: string;
  value: (...inputs: number[]) => number;
}

const MOUNT = ["f", "fn", "zeta"] as const;

const rounded = (
  says: string,
  typed: number,
  exact: number,
  power: number,
  quantity: (...inputs: number[]) => number,
) => ({
  says,
  value: (...inputs: number[]) => quantity(...inputs) * (typed / exact) ** power,
});

const perRootMillimetre = Math.sqrt(STANDARD_GRAVITY * 1000) / (2 * Math.PI);
const deflectionOf = (fn: number, kappa: number) => staticDeflection(fn, kappa);
const deflectionFor = (E: number, f: number, zeta: number) => requiredStaticDeflection(E, f, zeta, 1, "viscous");
const deflectionConstants = (quantity: (...inputs: number[]) => number) => [
  rounded("with the constant 15.76", 15.76, perRootMillimetre, 2, quantity),
  rounded("with the constant 15.8", 15.8, perRootMillimetre, 2, quantity),
  rounded("with the constant 5 for centimetres", 5, perRootMillimetre / Math.sqrt(10), 2, quantity),
  rounded("with the constant 3.13 for inches", 3.13, perRootMillimetre / Math.sqrt(25.4), 2, quantity),
];

const hysteretic = (value: (...inputs: number[]) => number): Other => ({
  mistake: null,
  says: "it is the value for hysteretic damping, η = 2ζ",
  value,
});

/** What else an angle may be: radians, or the arctangent of a quotient, which loses the quadrant. */
const angles = (right: (...inputs: number[]) => number, structural: (...inputs: number[]) => number): Other[] => [
  hysteretic(structural),
  { mistake: null, says: "it is in radians", value: (...inputs) => (right(...inputs) * Math.PI) / 180 },
  {
    mistake: "sign-precedence",
    says: "ATAN of a quotient loses the quadrant; ATAN2 keeps it",
    value: (...inputs) => right(...inputs) - 180,
  },
  {
    mistake: "sign-precedence",
    says: "ATAN of a quotient loses the quadrant, and the angle is in radians",
    value: (...inputs) => ((right(...inputs) - 180) * Math.PI) / 180,
  },
];

/** What CHECK can check, with the inputs in SI units, in their order. */
export const checkables = {
  "absolute-transmissibility": {
    out: "T",
    inputs: MOUNT,
    right: absoluteTransmissibility,
    others: [
      hysteretic(hystereticTransmissibility),
      {
        mistake: "ratio-not-squared",
        says: "1 − r² stands for (1 − r²)²",
        value: (f, fn, z) => {
          const b2 = (2 * z * (f / fn)) ** 2;
          return Math.sqrt((1 + b2) / Math.abs(1 - (f / fn) ** 2 + b2));
        },
      },
      {
        mistake: "damping-not-squared",
        says: "2(ζr)² stands for (2ζr)²",
        value: (f, fn, z) => absoluteTransmissibility(f, fn, z / Math.SQRT2),
      },
      {
        mistake: "decibel-factor",
        says: "it is a level in dB, and with 10 log for 20 log",
        value: (f, fn, z) => transmissibilityLevel(f, fn, z, "viscous") / 2,
      },
      {
        mistake: null,
        says: "it is the level in dB",
        value: (f, fn, z) => transmissibilityLevel(f, fn, z, "viscous"),
      },
    ],
  },
  "relative-transmissibility": {
    out: "R",
    inputs: MOUNT,
    right: relativeTransmissibility,
    others: [hysteretic(hystereticRelativeTransmissibility)],
  },
  "isolation-efficiency": { out: "E", inputs: MOUNT, right: (f, fn, z) => isolationEfficiency(f, fn, z, "viscous") },
  "transmissibility-db": { out: "LT", inputs: MOUNT, right: (f, fn, z) => transmissibilityLevel(f, fn, z, "viscous") },
  "absolute-phase": {
    out: "phiA",
    inputs: MOUNT,
    right: (f, fn, z) => absolutePhase(f, fn, z, "viscous"),
    others: angles(
      (f, fn, z) => absolutePhase(f, fn, z, "viscous"),
      (f, fn, z) => absolutePhase(f, fn, z, "hysteretic"),
    ),
    eitherSign: true,
  },
  "relative-phase": {
    out: "phiR",
    inputs: MOUNT,
    right: (f, fn, z) => relativePhase(f, fn, z, "viscous"),
    others: angles(
      (f, fn, z) => relativePhase(f, fn, z, "viscous"),
      (f, fn, z) => relativePhase(f, fn, z, "hysteretic"),
    ),
    eitherSign: true,
  },
  "frequency-ratio": { out: "r", inputs: ["f", "fn"], right: frequencyRatio },
  "natural-frequency": { out: "fn", inputs: ["k", "m"], right: naturalFrequency, powers: [0, -1] },
  "static-deflection": {
    out: "delta",
    inputs: ["fn", "kappa"],
    fallback: 1,
    right: deflectionOf,
    powers: [1, -2],
    customary: deflectionConstants(deflectionOf),
  },
  "mount-load": { out: "WEach", inputs: ["m", "n"], fallback: 1, right: mountLoad, powers: [1, 0] },
  "mount-stiffness": {
    out: "k",
    inputs: ["E", "f", "zeta", "m"],
    right: (E, f, z, m) => requiredStiffness(E, f, z, m, "viscous"),
    powers: [0, 2],
  },
  "required-stiffness": {
    out: "k",
    inputs: ["E", "f", "zeta", "m"],
    right: (E, f, z, m) => requiredStiffness(E, f, z, m, "viscous"),
    powers: [0, 2],
  },
  "required-natural-frequency": {
    out: "fn",
    inputs: ["E", "f", "zeta"],
    right: (E, f, z) => requiredNaturalFrequency(E, f, z, "viscous"),
  },
  "required-static-deflection": {
    out: "delta",
    inputs: ["E", "f", "zeta"],
    right: deflectionFor,
    powers: [1, -2],
    customary: deflectionConstants(deflectionFor),
  },
  "peak-transmissibility": {
    out: "Tpk",
    inputs: ["zeta"],
    right: (z) => peakTransmissibility(z, "viscous"),
    customary: [
      { says: "as the value at f = fn, √(1 + 1/(2ζ)²)", value: (z) => Math.sqrt(1 + 1 / (4 * z * z)) },
      { says: "as the approximation 1/(2ζ)", value: (z) => 1 / (2 * z) },
    ],
  },
  "damping-ratio": { out: "zeta", inputs: ["c", "k", "m"], right: dampingRatio },
  "damping-coefficient": { out: "c", inputs: ["zeta", "k", "m"], right: dampingCoefficient },
  "critical-damping": { out: "cc", inputs: ["k", "m"], right: (k, m) => dampingCoefficient(1, k, m) },
  "payload-motion": { out: "X", inputs: ["U", ...MOUNT], right: payloadMotion },
  "relative-displacement": {
    out: "Z",
    inputs: ["U", ...MOUNT],
    right: (U, f, fn, z) => mountDeflection(U, f, fn, z, "viscous"),
  },
  "mount-force": {
    out: "F",
    inputs: ["U", "f", "m", "fn", "zeta"],
    right: (U, f, m, fn, z) => mountForce(U, f, m, fn, z, "viscous"),
    powers: [0, 2],
  },
  "random-response-rms": {
    out: "grms",
    inputs: ["fn", "zeta", "S"],
    right: (fn, z, S) => milesRms(fn, z, S, "exact"),
    powers: [0, 0.5],
    customary: [
      { says: "in the short form √(π/2·fn·Q·S) of handbooks", value: (fn, z, S) => milesRms(fn, z, S, "short") },
    ],
    others: [
      {
        mistake: "ratio-inverted",
        says: "ζ stands for Q = 1/(2ζ)",
        value: (fn, z, S) => Math.sqrt((Math.PI / 2) * fn * z * S),
      },
      ...["exact", "short"].map((form) => ({
        mistake: "mass-weight-mixup" as const,
        says: "a density in gn²/Hz is scaled by g instead of g²",
        value: (fn: number, z: number, S: number) =>
          milesRms(fn, z, S, form as "exact" | "short") / Math.sqrt(STANDARD_GRAVITY),
      })),
      ...["exact", "short"].map((form) => ({
        mistake: "mass-weight-mixup" as const,
        says: "a density in gn²/Hz is scaled by g instead of g²",
        value: (fn: number, z: number, S: number) =>
          milesRms(fn, z, S, form as "exact" | "short") * Math.sqrt(STANDARD_GRAVITY),
      })),
    ],
  },
} satisfies Partial<Record<Quantity, Checkable>>;

export type CheckableQuantity = keyof typeof checkables;

/** The inputs of a quantity: their roles, what to call them, and how many must be given. */
export function inputsOf(quantity: CheckableQuantity): { names: readonly Role[]; labels: string[]; least: number } {
  const { inputs, fallback }: Checkable = checkables[quantity];
  const labels = inputs.map((role) =>
    role === "E" ? "isolation efficiency" : role === "m" ? "mass" : roles[role].says,
  );
  return { names: inputs, labels, least: inputs.length - (fallback === undefined ? 0 : 1) };
}

function frequencyRatio(f: number, fn: number): number {
  requireAtLeast("frequency", f, 0);
  requireAbove("natural frequency", fn, 0);
  return finite("frequency ratio", f / fn);
}

function mountLoad(m: number, n: number): number {
  requireAbove("mass", m, 0);
  requireAbove("number of mounts", n, 0);
  return finite("mount load", (m / n) * STANDARD_GRAVITY);
}

function payloadMotion(U: number, f: number, fn: number, zeta: number): number {
  requireAtLeast("base amplitude", U, 0);
  return finite("payload motion", U * absoluteTransmissibility(f, fn, zeta));
}

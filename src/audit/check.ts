/** Judges a single hand value: which quantity should it be, is it, and if not, which known mistake gives it. */
import { isolationEfficiency, transmissibilityLevel } from "../core/efficiency";
import {
  dampingCoefficient,
  dampingRatio,
  mountDeflection,
  mountForce,
  naturalFrequency,
  STANDARD_GRAVITY,
  staticDeflection,
} from "../core/mount";
import { finite, NumericError, requireAbove, requireAtLeast } from "../core/errors";
import { milesRms } from "../core/peakFactor";
import { peakTransmissibility } from "../core/peak";
import { absolutePhase, relativePhase } from "../core/phase";
import { requiredNaturalFrequency, requiredStaticDeflection, requiredStiffness } from "../core/required";
import { absoluteTransmissibility, relativeTransmissibility } from "../core/transmissibility";
import { derive, entry, type Fault } from "./derive";
import { confusions, factorSlips } from "./faults";
import type { Mistake, Quantity } from "./quantities";
import { type Role, roles } from "./roles";

interface Checkable {
  out: Role;
  inputs: readonly Role[];
  /** value of the last input where it may be left out */
  fallback?: number;
  right: (...inputs: number[]) => number;
  /** powers of g and of pi in the result, for customary roundings of the two */
  powers?: readonly [g: number, pi: number];
  customary?: readonly { says: string; value: (...inputs: number[]) => number }[];
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

/** What CHECK can check, with the inputs in SI units, in their order. */
export const checkables = {
  "absolute-transmissibility": { out: "T", inputs: MOUNT, right: absoluteTransmissibility },
  "relative-transmissibility": { out: "R", inputs: MOUNT, right: relativeTransmissibility },
  "isolation-efficiency": { out: "E", inputs: MOUNT, right: (f, fn, z) => isolationEfficiency(f, fn, z, "viscous") },
  "transmissibility-db": { out: "LT", inputs: MOUNT, right: (f, fn, z) => transmissibilityLevel(f, fn, z, "viscous") },
  "absolute-phase": { out: "phiA", inputs: MOUNT, right: (f, fn, z) => absolutePhase(f, fn, z, "viscous") },
  "relative-phase": { out: "phiR", inputs: MOUNT, right: (f, fn, z) => relativePhase(f, fn, z, "viscous") },
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

/** Roundings of g and pi that sheets type, with what to say of them. */
const GRAVITIES = [9.81, 9.8, 9.807, 10];
const PIS = [3.14, 3.1416, 22 / 7];

/**
 * A verdict on a hand value in one text: "agrees", with the customary constant that explains it if one does; the known
 * mistakes that reproduce it, each with its factor; or "differs: expected ...".
 *
 * @param tolerance relative, above 0
 * @param inputs    in SI units, as many as `inputsOf` says
 * @throws as the core function of the quantity
 */
export function checkValue(hand: number, quantity: CheckableQuantity, tolerance: number, inputs: number[]): string {
  const entryOf: Checkable = checkables[quantity];
  const all = inputs.length < entryOf.inputs.length ? [...inputs, entryOf.fallback!] : inputs;
  const right = entryOf.right(...all);
  const near = (value: number, within = tolerance) => Math.abs(hand - value) <= within * Math.abs(value);
  if (near(right) || hand === right) return "agrees";
  const custom = customarySaying(entryOf, all, right, near);
  if (custom !== undefined) return `agrees, ${custom}`;
  const found = mistakesGiving(entryOf, all, near);
  if (found.length === 0) return `differs: expected ${digits(right)}`;
  const times = right === 0 ? "" : `, ${digits(hand / right)} times the expected value`;
  const named = found.map(({ mistake, why }) => `${mistake} (${why})`).join(" or ");
  return `${named}${times}: expected ${digits(right)}`;
}

function customarySaying(
  { powers, customary = [] }: Checkable,
  inputs: number[],
  right: number,
  near: (value: number, within?: number) => boolean,
): string | undefined {
  const closely = (value: number) => near(value, 1e-9) || near(value);
  if (powers) {
    const [g, pi] = powers;
    for (const G of g === 0 ? [STANDARD_GRAVITY] : [STANDARD_GRAVITY, ...GRAVITIES]) {
      for (const P of pi === 0 ? [Math.PI] : [Math.PI, ...PIS]) {
        if (!closely(right * (G / STANDARD_GRAVITY) ** g * (P / Math.PI) ** pi)) continue;
        const parts = [
          G === STANDARD_GRAVITY ? "" : `g taken as ${G}`,
          P === Math.PI ? "" : `π taken as ${P === 22 / 7 ? "22/7" : P}`,
        ];
        return `with ${parts.filter(Boolean).join(" and ")}`;
      }
    }
  }
  return customary.find(({ value }) => closely(value(...inputs)))?.says;
}

interface Explanation {
  mistake: Mistake;
  why: string;
  cost: number;
}

function mistakesGiving(
  { out, inputs, right }: Checkable,
  values: number[],
  near: (value: number, within?: number) => boolean,
): Explanation[] {
  const candidates: (Explanation & { value: number })[] = [];
  const add = (value: number, { mistake, why, cost }: Fault, extra = 0) => {
    if (mistake !== null && value - value === 0 && value !== 0)
      candidates.push({ value, mistake, why, cost: cost + extra });
  };
  inputs.forEach((role, i) => {
    for (const fault of factorSlips(role, false)) {
      const changed = values.with(i, values[i] * fault.factor);
      add(valueOrNaN(right, changed), fault, 1);
    }
  });
  const mistakenFor = confusions.filter(({ used }) => used === out);
  const given = inputs.map((role, i) => entry(role, 1 << i, Float64Array.of(values[i])));
  const derivation = derive(given, [out, ...mistakenFor.map(({ is }) => is)], 1, true);
  for (const { values: found, fault, undamped, cost } of derivation.entries(out)) {
    if (fault) add(found[0], fault, cost);
    else if (undamped) add(found[0], { mistake: "undamped-form", why: "The damping is left out.", cost });
  }
  const expected = valueOrNaN(right, values);
  for (const factor of factorSlips(out, true)) add(expected * factor.factor, factor, 1);
  add(-expected, { mistake: "absolute-value-missing", why: "The sign is lost.", cost: 2 });
  for (const { is, mistake, why } of mistakenFor) {
    for (const { values: found, fault, cost } of derivation.entries(is)) {
      if (!fault) add(found[0], { mistake, why, cost }, 1);
    }
  }
  return best(candidates, near);
}

/** A changed input may leave the domain; then the mistake cannot have given the value. */
function valueOrNaN(right: (...inputs: number[]) => number, inputs: number[]): number {
  try {
    return right(...inputs);
  } catch (error) {
    if (error instanceof NumericError) return NaN;
    throw error;
  }
}

/** The cheapest explanations, one per mistake; exact reproductions drive out those within the tolerance only. */
function best(
  candidates: (Explanation & { value: number })[],
  near: (value: number, within?: number) => boolean,
): Explanation[] {
  const exact = candidates.filter(({ value }) => near(value, 1e-9));
  const fitting = exact.length > 0 ? exact : candidates.filter(({ value }) => near(value));
  fitting.sort((a, b) => a.cost - b.cost);
  const kept = new Map<Mistake, Explanation>();
  for (const each of fitting) {
    if (each.cost <= fitting[0].cost + 1 && !kept.has(each.mistake)) kept.set(each.mistake, each);
  }
  return [...kept.values()].slice(0, 3);
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

function digits(value: number): string {
  return String(Number(value.toPrecision(6)));
}

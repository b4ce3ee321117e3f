/** Judges a single hand value: is it what it should be, and if not, which known mistake gives it. */
import { NumericError } from "../core/errors";
import { STANDARD_GRAVITY } from "../core/mount";
import { type Checkable, type CheckableQuantity, checkables } from "./checkables";
import { derive, entry, type Fault } from "./derive";
import { confusions, factorSlips } from "./faults";
import type { Mistake } from "./quantities";

/** Roundings of g and pi that sheets type, with what to say of them. */
const GRAVITIES = [9.81, 9.8, 9.807];
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
  if (entryOf.eitherSign && near(-right)) return "agrees, with the opposite sign for a lag";
  const custom = customarySaying(entryOf, all, right, near);
  if (custom !== undefined) return `agrees, ${custom}`;
  const found = mistakesGiving(entryOf, all, near);
  const names = found.flatMap(({ mistake }) => mistake ?? []);
  const reasons = found.map(({ why }) => why.replace(/\.$/, "")).join("; or ");
  if (names.length === 0) return `differs: expected ${digits(right)}${reasons && `; ${reasons}`}`;
  const times = right === 0 ? "expected 0" : `${digits(hand / right)} times the expected ${digits(right)}`;
  return `${names.join(" or ")}: ${times}; ${reasons}`;
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
  /** null where no id fits and the reason alone says it */
  mistake: Mistake | null;
  why: string;
  cost: number;
}

function mistakesGiving(
  { out, inputs, right, others = [] }: Checkable,
  values: number[],
  near: (value: number, within?: number) => boolean,
): Explanation[] {
  const candidates: (Explanation & { value: number })[] = [];
  const add = (value: number, { mistake, why, cost }: Fault, extra = 0) => {
    if (value - value === 0 && value !== 0) candidates.push({ value, mistake, why, cost: cost + extra });
  };
  for (const { mistake, says, value } of others) add(valueOrNaN(value, values), { mistake, why: says, cost: 0 });
  inputs.forEach((role, i) => {
    for (const fault of factorSlips(role, false)) {
      const changed = values.with(i, values[i] * fault.factor);
      if (fault.mistake !== null) add(valueOrNaN(right, changed), fault, 1);
    }
    if (role !== "k" && role !== "m") return;
    for (const n of MOUNT_COUNTS) {
      for (const factor of [n, 1 / n]) add(valueOrNaN(right, values.with(i, values[i] * factor)), oneOf(n), 2);
    }
  });
  const mistakenFor = confusions.filter(({ used }) => used === out);
  const given = inputs.map((role, i) => entry(role, 1 << i, Float64Array.of(values[i])));
  const derivation = derive(given, [out, ...mistakenFor.map(({ is }) => is)], 1, true);
  for (const { values: found, fault, undamped, cost } of derivation.entries(out)) {
    if (fault?.mistake) add(found[0], fault, cost);
    else if (undamped && !fault) add(found[0], { mistake: "undamped-form", why: "the damping is left out", cost: 1 });
  }
  const expected = valueOrNaN(right, values);
  for (const factor of factorSlips(out, true)) {
    if (factor.mistake !== null) add(expected * factor.factor, factor, 1);
  }
  add(-expected, { mistake: "absolute-value-missing", why: "the sign is lost", cost: 2 });
  for (const { is, mistake, why } of mistakenFor) {
    for (const { values: found, fault, cost } of derivation.entries(is)) {
      if (!fault) add(found[0], { mistake, why, cost }, 1);
    }
  }
  return best(candidates, near);
}

/** How many mounts machines usually stand on. */
const MOUNT_COUNTS = [2, 3, 4, 5, 6, 8];

const oneOf = (n: number): Fault => ({ mistake: "mount-count-missing", why: `as with one of ${n} mounts`, cost: 2 });

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
  const kept = new Map<Mistake | null, Explanation>();
  for (const each of fitting) {
    if (each.cost <= fitting[0].cost + 1 && !kept.has(each.mistake)) kept.set(each.mistake, each);
  }
  return [...kept.values()].slice(0, 3);
}

function digits(value: number): string {
  return String(Number(value.toPrecision(6)));
}

import { catalogue, type Relation } from "./catalogue";
import type { CompiledSlip } from "./catalogue/relation";
import type { Mistake } from "./quantities";
import { type Role, roles } from "./roles";
import { gravity } from "./units";

/** The one thing that is supposed to be wrong in a derivation. */
export interface Fault {
  readonly mistake: Mistake | null;
  readonly why: string;
  /** how unusual it is; the most usual explanation wins */
  readonly cost: number;
}

/** A value of a role at every sample point, and how it comes from the inputs. */
export interface Entry {
  readonly role: Role;
  /** bit i is set if input i was used */
  readonly mask: number;
  readonly values: Float64Array;
  readonly fault: Fault | null;
  readonly cost: number;
  readonly relation: Relation | null;
  readonly from: readonly Entry[];
  readonly undamped: boolean;
  readonly level: number;
  /** roles on the way to this one, as bits: a derivation does not run in a circle */
  readonly past: readonly [number, number];
}

export interface Derivation {
  entries(role: Role): readonly Entry[];
}

const byInput = new Map<Role, Relation[]>();
for (const relation of catalogue) {
  for (const input of relation.inputs) byInput.set(input, [...(byInput.get(input) ?? []), relation]);
}

/** For a target: the number of relations that lead from each role to it. */
const distances = new Map<Role, Map<Role, number>>();

function distancesTo(target: Role): Map<Role, number> {
  const known = distances.get(target);
  if (known) return known;
  const found = new Map<Role, number>([[target, 0]]);
  for (let level = 1; level <= deepest; level++) {
    for (const relation of catalogue) {
      if (found.get(relation.out) !== level - 1) continue;
      for (const input of relation.inputs) if (!found.has(input)) found.set(input, level);
    }
  }
  distances.set(target, found);
  return found;
}

const numbers = new Map((Object.keys(roles) as Role[]).map((role, number) => [role, number]));

function bitOf(role: Role): readonly [number, number] {
  const number = numbers.get(role)!;
  return number < 32 ? [1 << number, 0] : [0, 1 << (number - 32)];
}

const deepest = 5;
const mostSound = 40; // entries of one role without fault
const mostFaulty = 160;

export function entry(role: Role, mask: number, values: Float64Array, fault: Fault | null, cost = 0): Entry {
  return { role, mask, values, fault, cost, relation: null, from: [], undamped: false, level: 0, past: bitOf(role) };
}

/**
 * Everything that follows from the given entries on the way to the targets, by chaining the catalogue's relations. With
 * `slips` each derivation may contain one of a relation's slips, but never more than one fault in all.
 */
export function derive(given: readonly Entry[], targets: readonly Role[], samples: number, slips: boolean): Derivation {
  const table = new Map<Role, Entry[]>();
  const seen = new Set<string>();
  const counts = new Map<Role, [number, number]>();
  const reach = new Map<Role, number>();
  for (const target of targets) {
    for (const [role, distance] of distancesTo(target)) reach.set(role, Math.min(distance, reach.get(role) ?? 99));
  }

  const add = (candidate: Entry): boolean => {
    const { role, values, mask, fault } = candidate;
    if (!(values[0]! - values[0]! === 0)) return false;
    let sum = 0;
    for (let s = 0; s < samples; s++) sum += values[s]! * (1 + 0.37 * s);
    const signature = `${numbers.get(role)!},${mask},${rounded(values[0]!)},${rounded(sum)}`;
    if (seen.has(signature)) return false;
    const count = counts.get(role) ?? [0, 0];
    if (fault ? count[1] >= mostFaulty : count[0] >= mostSound) return false;
    count[fault ? 1 : 0]++;
    counts.set(role, count);
    seen.add(signature);
    const list = table.get(role);
    if (list) list.push(candidate);
    else table.set(role, [candidate]);
    return true;
  };

  for (const item of given) if (!item.fault) add(item);
  for (const item of given) if (item.fault) add(item);
  if (!table.has("g")) add(entry("g", 0, new Float64Array(samples).fill(gravity), null));

  // what is given is not derived again from the rest
  const leafRoles = new Set(given.filter(({ fault, mask }) => !fault && mask !== 0).map(({ role }) => role));
  let fresh = new Set<Role>(table.keys());
  for (let level = 1; level <= deepest && fresh.size > 0; level++) {
    const next = new Set<Role>();
    const due = new Set<Relation>();
    for (const role of fresh) for (const relation of byInput.get(role) ?? []) due.add(relation);
    for (const relation of due) {
      if (leafRoles.has(relation.out) && !targets.includes(relation.out)) continue;
      const distance = reach.get(relation.out);
      if (distance === undefined || distance > deepest - level) continue;
      if (apply(relation, table, level, samples, slips, add)) next.add(relation.out);
    }
    fresh = next;
  }
  return { entries: (role) => table.get(role) ?? [] };
}

/** A whole number that is the same for values that agree to nine digits. */
function rounded(value: number): number {
  const size = Math.round(Math.log(Math.abs(value)) * 2e8);
  return value < 0 ? -size - 0.5 : size;
}

function apply(
  relation: Relation,
  table: ReadonlyMap<Role, Entry[]>,
  level: number,
  samples: number,
  slips: boolean,
  add: (candidate: Entry) => boolean,
): boolean {
  const lists = relation.inputs.map((role) => table.get(role));
  if (lists.some((list) => list === undefined)) return false;
  let added = false;
  const chosen: Entry[] = [];
  const choose = (index: number, hasFault: boolean, isFresh: boolean): void => {
    if (index === lists.length) {
      if (isFresh && use(relation, chosen, level, samples, slips && !hasFault, add)) added = true;
      return;
    }
    const list = lists[index]!;
    const length = list.length; // entries added meanwhile wait for the next level
    for (let i = 0; i < length; i++) {
      const item = list[i]!;
      if (item.level >= level || (hasFault && item.fault)) continue;
      chosen[index] = item;
      choose(index + 1, hasFault || item.fault !== null, isFresh || item.level === level - 1);
    }
  };
  choose(0, false, false);
  return added;
}

function use(
  relation: Relation,
  chosen: readonly Entry[],
  level: number,
  samples: number,
  slips: boolean,
  add: (candidate: Entry) => boolean,
): boolean {
  let mask = 0;
  let fault: Fault | null = null;
  let cost = 1;
  let undamped = relation.undamped === true;
  const [low, high] = bitOf(relation.out);
  let pastLow = low;
  let pastHigh = high;
  const circular = relation.inputs.includes(relation.out);
  for (const item of chosen) {
    if (!circular && (item.past[0] & low || item.past[1] & high)) return false;
    pastLow |= item.past[0];
    pastHigh |= item.past[1];
    mask |= item.mask;
    fault ??= item.fault;
    cost += item.cost;
    undamped ||= item.undamped;
  }
  const from = chosen.slice();
  const common = { role: relation.out, mask, relation, from, undamped, level, past: [pastLow, pastHigh] as const };
  let added = add({ ...common, values: evaluate(relation, chosen, samples), fault, cost });
  if (!slips) return added;
  for (const slip of relation.allSlips) {
    const values = evaluate(slip, chosen, samples);
    const wrong: Fault = { mistake: slip.mistake, why: slip.why, cost: 1 };
    if (add({ ...common, values, fault: wrong, cost: cost + 1 })) added = true;
  }
  return added;
}

const arguments_: number[] = [];

function evaluate({ compute }: Relation | CompiledSlip, chosen: readonly Entry[], samples: number): Float64Array {
  const values = new Float64Array(samples);
  for (let s = 0; s < samples; s++) {
    for (let i = 0; i < chosen.length; i++) arguments_[i] = chosen[i]!.values[s]!;
    values[s] = compute(arguments_);
  }
  return values;
}

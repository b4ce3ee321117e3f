import { catalogue, type Relation } from "./catalogue";
import type { Compiled } from "../formula/compile";
import type { Fault } from "./fault";
import { probeValues, probes } from "./probes";
import { type Role, roles } from "./roles";

/** A role at the start of a derivation: an input, an input with a supposed fault, or a stated number. */
export interface Given {
  readonly role: Role;
  /** the input's bit; 0 for a stated number */
  readonly mask: number;
  readonly values: Float64Array;
  readonly fault: Fault | null;
  /** factor on the sound input, by which the faults of one input differ */
  readonly scale: number;
  readonly cost: number;
}

/** One step of a plan: how a role follows from earlier steps. */
export interface Step {
  readonly role: Role;
  readonly mask: number;
  readonly fault: Fault | null;
  readonly cost: number;
  readonly relation: Relation | null;
  readonly compute: Compiled | null;
  readonly from: readonly Step[];
  readonly undamped: boolean;
  /** right only where the label says that it is coarse */
  readonly coarse: boolean;
  /** index among what is given; -1 for a derived step, -2 for gravity */
  readonly given: number;
}

interface Draft extends Step {
  readonly level: number;
  readonly probe: Float64Array;
  readonly past: readonly [number, number, number];
}

/** All steps that lead to a role. */
export type Plan = ReadonlyMap<Role, readonly Step[]>;

const deepest = 5;
const deepestWithSlips = 4; // a slip deep inside a long chain is not looked for
const mostSound = 40; // steps without fault to one role
const mostFaulty = 160;
const numbers = new Map((Object.keys(roles) as Role[]).map((role, number) => [role, number]));
const plans = new Map<string, Plan>();
const mostTries = 6000; // combinations tried for one plan
const mostPlans = 4000;

const byInput = new Map<Role, Relation[]>();
for (const relation of catalogue) {
  for (const input of relation.inputs) byInput.set(input, [...(byInput.get(input) ?? []), relation]);
}

/** The plan for what is given; the same kinds of inputs share one plan, whatever their values. */
export function planFor(given: readonly Given[], targets: readonly Role[], slips: boolean): Plan {
  const start = given.map(
    ({ role, mask, fault, scale }) => `${role}.${mask}.${fault ? `${fault.mistake}*${scale.toPrecision(4)}` : ""}`,
  );
  const key = `${slips ? "slips" : "sound"} ${targets.join(",")} ${start.join(" ")}`;
  let plan = plans.get(key);
  if (!plan) {
    plan = makePlan(given, targets, slips);
    if (plans.size >= mostPlans) plans.clear();
    plans.set(key, plan);
  }
  return plan;
}

function bitOf(role: Role): readonly [number, number, number] {
  const number = numbers.get(role)!;
  const bit = 1 << (number % 32);
  return number < 32 ? [bit, 0, 0] : number < 64 ? [0, bit, 0] : [0, 0, bit];
}

function distancesTo(targets: readonly Role[]): Map<Role, number> {
  const found = new Map<Role, number>(targets.map((target) => [target, 0]));
  for (let level = 1; level <= deepest; level++) {
    for (const relation of catalogue) {
      if (found.get(relation.out) !== level - 1) continue;
      for (const input of relation.inputs) if (!found.has(input)) found.set(input, level);
    }
  }
  return found;
}

function makePlan(given: readonly Given[], targets: readonly Role[], slips: boolean): Plan {
  const reach = distancesTo(targets);
  const table = new Map<Role, Draft[]>();
  const counts = new Map<Role, [number, number]>();
  const seen = new Set<string>();

  const effort: Effort = {
    left: mostTries,
    full: (role, faulty) => (counts.get(role)?.[faulty ? 1 : 0] ?? 0) >= (faulty ? mostFaulty : mostSound),
  };

  const add = (step: Draft): boolean => {
    const { role, probe, mask, fault } = step;
    let sum = 0;
    for (let s = 0; s < probes; s++) sum += probe[s]! * (1 + 0.37 * s);
    const count = counts.get(role) ?? [0, 0];
    if (effort.full(role, fault !== null)) return false;
    const signature = `${numbers.get(role)!},${mask},${rounded(probe[0]!)},${rounded(sum)}`;
    if (seen.has(signature)) return false;
    count[fault ? 1 : 0]++;
    counts.set(role, count);
    seen.add(signature);
    const list = table.get(role);
    if (list) list.push(step);
    else table.set(role, [step]);
    return true;
  };

  const begin = (one: Given, index: number): void => {
    const { role, mask, fault, cost, scale } = one;
    const probe = probeValues(role, mask).map((value) => value * scale);
    add({
      role,
      mask,
      fault,
      cost,
      relation: null,
      compute: null,
      from: [],
      undamped: false,
      coarse: false,
      given: index,
      level: 0,
      probe,
      past: bitOf(role),
    });
  };
  given.forEach((one, i) => one.fault || begin(one, i));
  given.forEach((one, i) => one.fault && begin(one, i));
  if (!table.has("g")) begin({ role: "g", mask: 0, values: new Float64Array(), fault: null, scale: 1, cost: 0 }, -2);

  // what is given is not derived again from the rest
  const known = new Set(given.filter(({ fault, mask }) => !fault && mask !== 0).map(({ role }) => role));
  let fresh = new Set<Role>(table.keys());
  const last = slips ? deepestWithSlips : deepest;
  for (let level = 1; level <= last && fresh.size > 0; level++) {
    const next = new Set<Role>();
    const due = new Set<Relation>();
    for (const role of fresh) for (const relation of byInput.get(role) ?? []) due.add(relation);
    for (const relation of due) {
      const again = !slips && relation.inputs.includes(relation.out); // dynamic stiffness from static, a harmonic of a frequency
      if (known.has(relation.out) && !again && !targets.includes(relation.out)) continue;
      const distance = reach.get(relation.out);
      if (distance === undefined || distance > last - level) continue;
      if (apply(relation, table, level, slips, effort, add)) next.add(relation.out);
    }
    fresh = next;
  }
  return new Map(targets.map((target) => [target, table.get(target) ?? []]));
}

/** A whole number that is the same for values that agree to nine digits. */
function rounded(value: number): number {
  if (!(value - value === 0)) return 0;
  const size = Math.round(Math.log(Math.abs(value)) * 2e8);
  return value < 0 ? -size - 0.5 : size;
}

/** Bounds the search: the tries that are left, and whether enough ways to a role are known. */
interface Effort {
  left: number;
  full(role: Role, faulty: boolean): boolean;
}

function apply(
  relation: Relation,
  table: ReadonlyMap<Role, Draft[]>,
  level: number,
  slips: boolean,
  effort: Effort,
  add: (step: Draft) => boolean,
): boolean {
  const lists = relation.inputs.map((role) => table.get(role));
  if (lists.some((list) => list === undefined)) return false;
  const hasFresh = lists.map((list) => list!.some((item) => item.level === level - 1));
  const freshFrom = lists.map((_, i) => hasFresh.slice(i).includes(true));
  const circular = relation.inputs.includes(relation.out);
  const [low, high, top] = bitOf(relation.out);
  let added = false;
  const chosen: Draft[] = [];
  const choose = (index: number, hasFault: boolean, isFresh: boolean): void => {
    if (index === lists.length) {
      effort.left--;
      if (isFresh && use(relation, chosen, level, slips && !hasFault, effort, add)) added = true;
      return;
    }
    if (effort.left <= 0 || (!slips && effort.full(relation.out, false)) || (!isFresh && !freshFrom[index])) return;
    const list = lists[index]!;
    const { length } = list; // steps added meanwhile wait for the next level
    for (let i = 0; i < length; i++) {
      const item = list[i]!;
      if (item.level >= level || (hasFault && item.fault)) continue;
      // a derivation does not run in a circle
      if (!circular && (item.past[0] & low || item.past[1] & high || item.past[2] & top)) continue;
      if (relation.between && item.given < 0) continue;
      chosen[index] = item;
      choose(index + 1, hasFault || item.fault !== null, isFresh || item.level === level - 1);
    }
  };
  choose(0, false, false);
  return added;
}

function use(
  relation: Relation,
  chosen: readonly Draft[],
  level: number,
  slips: boolean,
  effort: Effort,
  add: (step: Draft) => boolean,
): boolean {
  const faulty = chosen.some((item) => item.fault !== null);
  const slipsFit = slips && !effort.full(relation.out, true);
  if (effort.full(relation.out, faulty) && !slipsFit) return false;
  const [low, high, top] = bitOf(relation.out);
  let past: readonly [number, number, number] = [low, high, top];
  let mask = 0;
  let fault: Fault | null = null;
  let cost = 1;
  let undamped = relation.undamped === true;
  let coarse = relation.labelled === true;
  for (const item of chosen) {
    past = [past[0] | item.past[0], past[1] | item.past[1], past[2] | item.past[2]];
    mask |= item.mask;
    fault ??= item.fault;
    cost += item.cost;
    undamped ||= item.undamped;
    coarse ||= item.coarse;
  }
  const common = { role: relation.out, mask, relation, from: chosen.slice(), undamped, coarse, given: -1, level, past };
  let added = add({ ...common, compute: relation.compute, probe: evaluate(relation.compute, chosen), fault, cost });
  if (!slipsFit) return added;
  for (const slip of relation.allSlips) {
    const wrong: Fault = { mistake: slip.mistake, why: slip.why, cost: 1 };
    if (add({ ...common, compute: slip.compute, probe: evaluate(slip.compute, chosen), fault: wrong, cost: cost + 1 }))
      added = true;
  }
  return added;
}

const inputs: number[] = [];

function evaluate(compute: Compiled, chosen: readonly Draft[]): Float64Array {
  const values = new Float64Array(probes);
  for (let s = 0; s < probes; s++) {
    for (let i = 0; i < chosen.length; i++) inputs[i] = chosen[i]!.probe[s]!;
    values[s] = compute(inputs);
  }
  return values;
}

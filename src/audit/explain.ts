import { combinations } from "./combinations";
import { type Cut } from "./cut";
import { derive, type Entry, type Fault, type Given } from "./derive";
import { confusions, factorSlips, takenAsBase } from "./faults";
import { factorsOf, type Interpretation, isMotion } from "./interpret";
import { close, constantBehind, type ConstantFinding, ratioOf } from "./match";
import type { Meaning } from "./meaning";
import type { Mistake } from "./quantities";
import { type Role, roles } from "./roles";
import type { Samples } from "./samples";
import { ofRandomMotion, sigmasIn } from "./stated";
import { peakOf } from "./words";

/** What the result of a formula is meant to be. */
export interface Target {
  readonly role: Role;
  /** SI value of 1 in the result's cell */
  readonly factor: number;
  readonly cost: number;
  /** the unit is not written on the sheet */
  readonly unitGuessed?: boolean;
}

/** What a formula was found to compute. */
export interface Explanation {
  readonly target: Target;
  readonly entry: Entry;
  readonly readings: readonly Interpretation[];
  readonly cut: Cut;
  readonly fault: Fault | null;
  readonly constant: ConstantFinding | null;
  readonly cost: number;
}

export interface Stated {
  readonly role: Role;
  readonly value: number;
  readonly cost: number;
}

export interface Question {
  readonly cut: Cut;
  readonly samples: Samples;
  /** the formula at other inputs */
  evaluate(inputs: ArrayLike<number>): number;
  /** for every leaf, the ways to take it */
  readonly readings: readonly (readonly Interpretation[])[];
  readonly targets: readonly Target[];
  /** numbers that the labels or the formula itself state, with the role that they can have */
  readonly stated: readonly Stated[];
  /** a number of mounts is on the sheet */
  readonly mountsCounted: boolean;
  /** the label says that the result is an approximation */
  readonly coarse: boolean;
}

/** The targets that the labels of a result allow. */
export function targetsOf(meaning: Meaning, withKinds: boolean, mountsCounted = false): Target[] {
  const best = meaning.candidates[0]?.weight ?? 0;
  const found: Target[] = [];
  const ofOne = mountsCounted && best >= 5.5 && meaning.candidates[0]!.role.endsWith("Each");
  for (const { role, weight } of meaning.candidates) {
    if (weight < best - 3.6 || weight < 1) continue;
    // what is said to be of one mount is not of all, where there are several
    if (ofOne && meaning.candidates[0]!.role === `${role}Each`) continue;
    const kind = withKinds && meaning.kind && isMotion(role) ? peakOf[meaning.kind] : 1;
    const mixed = meaning.unit?.dimension === "force" && roles[role].dimension === "mass";
    const mixedBack = meaning.unit?.dimension === "mass" && roles[role].dimension === "force";
    const target = mixed
      ? role === "m"
        ? "W"
        : "WEach"
      : mixedBack
        ? role === "W"
          ? "m"
          : role === "WEach"
            ? "mEach"
            : role
        : role;
    const { factors, known } = factorsOf(target, meaning.unit);
    const unitGuessed = !known && factors.length > 1 && roles[target].dimension !== "number";
    factors.forEach((factor, i) => {
      const cost = (best - weight) * 0.5 + i * 0.25;
      found.push({ role: target, factor: factor * kind, cost, unitGuessed });
      const stated = ofRandomMotion(target) ? sigmasIn(meaning) : null;
      if (stated !== null) found[found.length - 1] = { role: target, factor: (factor * kind) / stated, cost };
      else if (random.has(target) && peakText.test(meaning.text))
        found.push({ role: target, factor: factor / customarySigmas, cost: cost - 0.1 });
    });
  }
  // a load that nobody calls the total one can be of one mount
  const load = found.find(({ role }) => role === "W" || role === "m");
  if (load && loadWords.test(meaning.label) && !found.some(({ role }) => role === `${load.role}Each`))
    found.push({ ...load, role: load.role === "W" ? "WEach" : "mEach", cost: load.cost + 1 });
  // a phase of nothing in particular can be either
  const phase = found.find(({ role }) => role === "phiA");
  if (phase && !ofTheItem.test(meaning.text)) found.push({ ...phase, role: "phiR", cost: phase.cost + 0.2 });
  return found;
}

const loadWords = /^(?!.*\b(total|all|ges\w*|tot)\b).*\b(load|last|belastung|charge)\b/i;
const ofTheItem =
  /\b(bench|stand|crate|box|cabin\w*|kabine|motor|moteur|tisch|payload|item|abs\w*|x|machine|equipment|camera|table|mass|output|response|gerat\w*|nutzlast|masse|antwort|maschine|reponse|charge|plateau|cab|case|block|platform|unit|instrument)\b/;
const random = new Set<Role>(["grms", "zrms", "X", "Xa", "Z", "Ua"]);
const customarySigmas = 3; // peaks of random motion are customarily taken at 3σ
const peakText = /\bsigma\b|\bpeak\b|\bmax\b|\bspitze\b|\bcrete\b/;

export const allRoles = (Object.keys(roles) as Role[]).filter((role) => role !== "g" && role !== "vref");

/** Any role as a target, in customary units: for results whose labels say nothing. */
export function anyTarget(meaning: Meaning): Target[] {
  return allRoles
    .filter((role) => !meaning.unit || meaning.unit.dimension === roles[role].dimension)
    .flatMap((role) =>
      factorsOf(role, meaning.unit).factors.map((factor, i) => ({ role, factor, cost: 3 + i * 0.25 })),
    );
}

/** The most likely derivation of one of the targets that the formula agrees with, without any fault. */
export function explainSound(question: Question): Explanation | null {
  const kept: Explanation[] = [];
  for (const readings of combinations(question.readings, question.samples.mask, 40)) {
    const derivation = derive(
      leafEntries(question, readings),
      rolesOf(question.targets),
      question.samples.count,
      false,
    );
    for (const target of question.targets) {
      for (const found of derivation.entries(target.role)) {
        const cost = costOf(readings) + target.cost + found.cost * 0.05;
        if ((found.coarse && !question.coarse) || (kept[0] && cost >= kept[0].cost)) continue;
        const constant = compare(question, found, target.factor, 1);
        if (constant === null || (constant !== "exact" && !constant.rounded)) continue;
        kept[0] = {
          ...common(question, readings, target, found, cost),
          fault: null,
          constant: constant === "exact" ? null : constant,
        };
      }
    }
    if (kept[0] && kept[0].cost < 0.5) break;
  }
  return kept[0] ?? null;
}

/** The most likely single fault that turns the right value into what the formula gives. */
export function explainFault(question: Question): Explanation | null {
  const all: Explanation[] = [];
  const take = (candidate: Explanation): void => {
    if (all.length === 0 || candidate.cost < all[0]!.cost) all[0] = candidate;
  };
  const confused = confusions.filter(({ used }) => question.targets.some(({ role }) => role === used));
  const wanted = [...rolesOf(question.targets), ...confused.map(({ is }) => is)];
  for (const readings of combinations(question.readings, question.samples.mask, 8)) {
    const base = costOf(readings);
    if (all[0] && base > all[0].cost) break;
    const given = [...leafEntries(question, readings), ...faultyEntries(question, readings)];
    const derivation = derive(given, wanted, question.samples.count, true);
    const sound =
      confused.length > 0 ? derive(leafEntries(question, readings), wanted, question.samples.count, false) : null;
    for (const target of question.targets) {
      const sounds = derivation
        .entries(target.role)
        .filter(({ fault, mask }) => !fault && mask === question.samples.mask);
      for (const found of derivation.entries(target.role)) {
        if (found.coarse) continue;
        const cost = base + target.cost + found.cost * 0.05;
        if (found.fault) {
          const extra = faultyAgreement(question, found, target, sounds);
          if (extra !== null) {
            take({
              ...common(question, readings, target, found, cost + found.fault.cost + extra),
              fault: found.fault,
              constant: null,
            });
          }
          continue;
        }
        const wrong = wrongResult(question, target, found);
        if (wrong) take({ ...common(question, readings, target, found, cost + wrong.fault.cost), ...wrong });
      }
      for (const { is, used, mistake, why } of confused) {
        if (used !== target.role || (mistake === "mount-count-missing" && !question.mountsCounted)) continue;
        for (const found of [...derivation.entries(is), ...(sound?.entries(is) ?? [])]) {
          if (found.fault || compare(question, found, target.factor, 1) !== "exact") continue;
          const fault: Fault = { mistake, why, cost: 0.9 };
          take({
            ...common(question, readings, target, found, base + target.cost + found.cost * 0.05 + fault.cost),
            fault,
            constant: null,
          });
        }
      }
    }
  }
  return all[0] ?? null;
}

const powerMistakes = new Set<Mistake | null>([
  "square-root-missing",
  "ratio-not-squared",
  "damping-not-squared",
  "sign-precedence",
  "ratio-inverted",
]);
/** Mistakes of a unit that cannot be told where the unit of the result is not written. */
const unitSlips = new Set<Mistake | null>(["length-unit", "mass-weight-mixup", "speed-unit"]);
const percentMistakes = new Set<Mistake | null>(["percent-as-ratio", "efficiency-not-of-motion"]);

/**
 * Whether a faulty derivation gives what the formula gives, and how much less likely that makes it. A slip that changes
 * powers also changes units, so that in other than SI units a constant factor remains.
 */
function faultyAgreement(question: Question, found: Entry, target: Target, sounds: readonly Entry[]): number | null {
  const constant = compare(question, found, target.factor, 1);
  if (constant === "exact" || constant?.rounded) return 0;
  if (found.mask !== question.samples.mask) return null;
  const { mistake } = found.fault!;
  const ratio = ratioOf(scaled(question, target.factor), found.values, question.samples.usable);
  if (ratio === null || ratio < 0) return null;
  if (percentMistakes.has(mistake))
    return [100, 0.01].some((factor) => Math.abs(ratio / factor - 1) < close) ? 0.3 : null;
  // what is proportional to the right value has no power wrong
  if (sounds.some(({ values }) => ratioOf(found.values, values, question.samples.usable) !== null)) return null;
  const isPower = powerMistakes.has(mistake) && question.cut.literals.length > 0 && !scaleless.has(target.role);
  return isPower && found.relation !== null && found.relation.inputs.length <= 3 ? 0.8 : null;
}

/** Results without a unit: a slip in them leaves no factor behind. */
const scaleless = new Set<Role>(allRolesOfDimension("number"));

function allRolesOfDimension(dimension: string): Role[] {
  return (Object.keys(roles) as Role[]).filter((role) => roles[role].dimension === dimension);
}

function wrongResult(
  question: Question,
  target: Target,
  found: Entry,
): { fault: Fault; constant: ConstantFinding | null } | null {
  if (found.mask !== question.samples.mask) return null;
  const ratio = ratioOf(scaled(question, target.factor), found.values, question.samples.usable);
  if (ratio === null) return null;
  for (const slip of factorSlips(target.role, true)) {
    if (target.unitGuessed && unitSlips.has(slip.mistake)) continue;
    const rest = Math.abs(ratio) / slip.factor;
    if (Math.abs(rest - 1) < close) return { fault: { ...slip, cost: slip.cost + 0.25 }, constant: null };
    if (Math.abs(rest - 1) > 0.02) continue;
    const constant = compare(question, found, target.factor, slip.factor);
    if (constant !== null && constant !== "exact" && constant.rounded) return { fault: slip, constant: null };
  }
  if (Math.abs(ratio + 1) < close) {
    return { fault: { mistake: "absolute-value-missing", why: "The sign is reversed.", cost: 1.2 }, constant: null };
  }
  if (Math.abs(Math.log(Math.abs(ratio))) > 0.8) return null;
  const constant = compare(question, found, target.factor, 1);
  if (constant === null || constant === "exact" || constant.rounded) return null;
  const why = `The constant ${constant.typed} should be ${Number(constant.exact.toPrecision(5))}.`;
  return { fault: { mistake: "constant-wrong" as Mistake, why, cost: 1.3 }, constant };
}

function common(question: Question, readings: readonly Interpretation[], target: Target, found: Entry, cost: number) {
  return { target, entry: found, readings, cut: question.cut, cost };
}

const rolesOf = (targets: readonly Target[]): Role[] => [...new Set(targets.map(({ role }) => role))];

const costOf = (readings: readonly Interpretation[]): number =>
  readings.reduce((sum, reading: Interpretation | undefined) => sum + (reading?.cost ?? 0), 0);

const scaled = (question: Question, factor: number): Float64Array =>
  question.samples.hand.map((value) => value * factor);

const signless = new Set<Role>(["LT", "phiA", "phiR"]);

/** "exact", a constant of the formula that explains a small fixed departure, or null. */
function compare(question: Question, found: Entry, factor: number, slip: number): "exact" | ConstantFinding | null {
  const { samples, cut } = question;
  if (found.mask !== samples.mask) return null;
  const hand = scaled(question, factor / slip);
  if (found.role === "phiA" || found.role === "phiR")
    return samePhase(hand, found.values, samples.usable) ? "exact" : null;
  const ratio = ratioOf(hand, found.values, samples.usable);
  if (ratio === null) {
    if (!mayHoldConstant(hand, found.values, samples.usable)) return null;
  } else {
    if (Math.abs(ratio - 1) < close || (signless.has(found.role) && Math.abs(ratio + 1) < close)) return "exact";
    if (Math.abs(Math.log(Math.abs(ratio))) > 0.8 || ratio < 0) return null;
  }
  const right = found.values.map((value) => (value / factor) * slip);
  return constantBehind(cut, samples.inputs, right, samples.usable);
}

/** Near enough, at every sample, that one rounded or mistyped constant inside the formula can be the cause. */
function mayHoldConstant(hand: ArrayLike<number>, right: ArrayLike<number>, usable: readonly boolean[]): boolean {
  for (let s = 0; s < hand.length; s++) {
    if (usable[s] && !(Math.abs(hand[s]! / right[s]! - 1) < 0.25)) return false;
  }
  return true;
}

/** Phases agree up to whole turns; either sign is right. */
function samePhase(hand: ArrayLike<number>, right: ArrayLike<number>, usable: readonly boolean[]): boolean {
  const turn = 2 * Math.PI;
  return [1, -1].some((sign) => {
    for (let s = 0; s < hand.length; s++) {
      if (!usable[s]) continue;
      const difference = (sign * hand[s]! - right[s]!) / turn;
      if (!(Math.abs(difference - Math.round(difference)) < 1e-7)) return false;
    }
    return usable.includes(true);
  });
}

/** What the inputs are, taken in one way. */
export function leafEntries(question: Question, readings: readonly Interpretation[]): Given[] {
  const { count } = question.samples;
  const found: Given[] = question.stated.map(({ role, value, cost }) => ({
    role,
    mask: 0,
    values: new Float64Array(count).fill(value),
    fault: null,
    scale: value,
    cost: cost * 20,
  }));
  readings.forEach((reading: Interpretation | undefined, i) => {
    if (reading && question.samples.mask & (1 << i))
      found.push(leafEntry(question, i, reading.role, reading.factor, 1, null));
  });
  return found;
}

function leafEntry(
  question: Question,
  leaf: number,
  role: Role,
  factor: number,
  scale: number,
  fault: Fault | null,
): Given {
  const values = Float64Array.from(question.samples.inputs, (inputs) => inputs[leaf]! * factor * scale);
  return { role, mask: 1 << leaf, values, fault, scale, cost: fault?.cost ?? 0 };
}

function faultyEntries(question: Question, readings: readonly Interpretation[]): Given[] {
  const found: Given[] = [];
  readings.forEach((reading: Interpretation | undefined, i) => {
    if (!reading || !(question.samples.mask & (1 << i))) return;
    if (reading.unitKnown || roles[reading.role].dimension === "number") {
      for (const slip of factorSlips(reading.role, false)) {
        found.push(leafEntry(question, i, reading.role, reading.factor, slip.factor, slip));
      }
      const slip = takenAsBase(reading);
      if (slip) found.push(leafEntry(question, i, reading.role, reading.factor, slip.factor, slip));
    }
    for (const { is, used, mistake, why, cost } of confusions) {
      if (is !== reading.role || (mistake === "mount-count-missing" && !question.mountsCounted)) continue;
      found.push(leafEntry(question, i, used, reading.factor, 1, { mistake, why, cost }));
    }
  });
  return found;
}

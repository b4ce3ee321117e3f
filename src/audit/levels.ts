import type { Analysis } from "./analyse";
import type { Question } from "./explain";
import { isMotion } from "./interpret";
import type { Meaning } from "./meaning";
import { roles } from "./roles";
import { parseUnit } from "./units";

/** Recognises the level of a motion against a reference: a straight line over the logarithm of the motion. */
export function levelFinding(
  question: Question,
  meaning: Meaning,
): Pick<Analysis, "verdict" | "quantity" | "mistake" | "why"> | null {
  const { samples, readings, cut } = question;
  const fromLevel = motionFromLevel(question, meaning) ?? sumOfLevels(question, meaning);
  if (fromLevel) return fromLevel;
  if (meaning.unit?.dimension !== "level" && !/\bdb\b|\bvdb\b/.test(meaning.text)) return null;
  const moving = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
  const best = moving.map((i) => readings[i]![0]);
  if (best.some((reading) => !reading)) return null;
  const motions = moving.filter(
    (i) => isMotion(readings[i]![0]!.role) || readings[i]![0]!.role === "grms" || readings[i]![0]!.role === "vref",
  );
  const powers = moving.filter((i) => roles[readings[i]![0]!.role].dimension === "density");
  if (motions.length + powers.length !== moving.length || moving.length === 0 || moving.length > 2) return null;
  const slopes = moving.map((leaf) => slopeOf(question, leaf));
  if (slopes.some((slope) => slope === null)) return null;
  const [first] = slopes;
  const right = powers.length > 0 ? 10 : 20;
  // two motions make a transmissibility, one against a reference makes a level
  const isRatio = motions.filter((i) => isMotion(readings[i]![0]!.role)).length === 2;
  const quantity = isRatio ? "transmissibility-db" : "motion-conversion";
  const like = (slope: number): boolean => Math.abs(Math.abs(first!) / slope - 1) < 1e-5;
  if (like(right) && motions.length === 1 && moving.length === 1) {
    const off = offReference(question, meaning, moving[0]!);
    // rms and peak values differ by 3 dB, which a level may leave open
    const steps = off === null ? [] : kindSteps.map((step) => (off + step) / 20);
    if (off !== null && Math.abs(off) > 15 && steps.some((step) => Math.abs(step - Math.round(step)) < 0.002)) {
      const unit = "The reference and the motion are in different units.";
      return { verdict: "differs", quantity, mistake: "length-unit", why: unit };
    }
  }
  if (like(right)) return { verdict: "agrees", quantity, mistake: null, why: "" };
  const why = `The level of ${powers.length ? "a power" : "an amplitude"} has ${right} log10.`;
  const wrong = [right / 2, right * 2, 20 * Math.LN10, 10 * Math.LN10, 1];
  return wrong.some(like) ? { verdict: "differs", quantity, mistake: "decibel-factor", why } : null;
}

/** Change of the result per decade of one input, if it is the same at every sample. */
function slopeOf({ samples, evaluate }: Question, leaf: number): number | null {
  let slope: number | null = null;
  for (let s = 0; s < samples.count; s++) {
    if (!samples.usable[s]) continue;
    const changed = samples.inputs[s]!.slice();
    changed[leaf]! *= 1.3;
    const here = (evaluate(changed) - samples.hand[s]!) / Math.log10(1.3);
    if (!(here - here === 0) || (slope !== null && Math.abs(here / slope - 1) > 1e-6)) return null;
    slope = here;
  }
  return slope;
}

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;

/** A motion from its level: a power of ten of one input in decibels. */
function motionFromLevel({ samples, readings, cut }: Question, meaning: Meaning): Found | null {
  const target = meaning.candidates[0];
  if (!target || !(isMotion(target.role) || target.role === "grms")) return null;
  const moving = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
  const [leaf] = moving;
  if (moving.length !== 1 || leaf === undefined || readings[leaf]?.[0]?.role !== "LT") return null;
  const points = samples.inputs.flatMap((inputs, s) =>
    samples.usable[s] && samples.hand[s]! > 0 ? [[inputs[leaf]!, Math.log10(samples.hand[s]!)] as const] : [],
  );
  const [first, ...others] = points;
  if (!first || others.length < 2) return null;
  const per = (decibels: number): boolean =>
    others.every(([level, log]) => Math.abs((log - first[1]) * decibels - (level - first[0])) < 1e-6);
  const quantity = "motion-conversion" as const;
  if (per(20)) return { verdict: "agrees", quantity, mistake: null, why: "" };
  const why = "The level of an amplitude has 20 log10: the amplitude is 10^(L/20) times the reference.";
  return per(10) || per(20 / Math.LN10) ? { verdict: "differs", quantity, mistake: "decibel-factor", why } : null;
}

/** The level of a motion plus or less a level of transmissibility. */
function sumOfLevels({ samples, readings, cut }: Question, meaning: Meaning): Found | null {
  if (meaning.unit?.dimension !== "level" || !/\bre\b|level|pegel|niveau/.test(meaning.text)) return null;
  const moving = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
  if (moving.length !== 2 || moving.some((i) => readings[i]?.[0]?.role !== "LT")) return null;
  const [a, b] = moving as [number, number];
  const agrees = [1, -1].some((sign) =>
    samples.inputs.every(
      (inputs, s) => !samples.usable[s] || Math.abs(inputs[a]! + sign * inputs[b]! - samples.hand[s]!) < 1e-9,
    ),
  );
  return agrees ? { verdict: "agrees", quantity: "motion-conversion", mistake: null, why: "" } : null;
}

const kindSteps = [0, 1, -1, 3, -3].map((halves) => halves * 10 * Math.log10(2));

/** Decibels by which a level lies above the one that its label's reference gives; null where the label names none. */
function offReference({ samples, readings }: Question, meaning: Meaning, leaf: number): number | null {
  const named = /\bre\.?\s*:?\s*(\d+(?:[.,]\d+)?(?:e[-+]?\d+)?|10\^?[-−]\d+)\s*([a-zµμ]+(?:\/s[²2]?)?)/i.exec(
    meaning.label,
  );
  const unit = named && parseUnit(named[2]!);
  const reading = readings[leaf]![0]!;
  const s = samples.usable.indexOf(true);
  if (!named || !unit || !reading.unitKnown || s < 0 || unit.dimension !== roles[reading.role].dimension) return null;
  const digits = named[1]!.replace(",", ".");
  const power = /^10\^?[-−](\d+)$/.exec(digits);
  const reference = (power ? 10 ** -Number(power[1]) : Number(digits)) * unit.factor;
  return samples.hand[s]! - 20 * Math.log10((samples.inputs[s]![leaf]! * reading.factor) / reference);
}

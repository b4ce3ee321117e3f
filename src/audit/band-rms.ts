import type { Analysis } from "./analyse";
import type { Question } from "./explain";
import type { Meaning } from "./meaning";
import { roles } from "./roles";
import { gravity } from "./units";

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;

const overall = /\b(rms|overall|total|gesamt\w*|effektiv\w*|global\w*|efficace|band)\b/;

/** Recognises the rms value of one band of a flat spectral density: the root of density times width. */
export function bandRms(question: Question, meaning: Meaning): Found | null {
  const { samples, readings, cut } = question;
  const unit = meaning.unit;
  if (!overall.test(meaning.text) || (unit && unit.dimension !== "acceleration")) return null;
  const moving = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
  const densities = moving.filter((i) => has(question, i, "density"));
  const frequencies = moving.filter((i) => !densities.includes(i) && has(question, i, "frequency"));
  if (densities.length !== 1 || frequencies.length === 0 || frequencies.length > 2) return null;
  if (frequencies.length + 1 !== moving.length) return null;
  const density = readings[densities[0]!]!.find(({ role }) => roles[role].dimension === "density")!;
  const areas = samples.inputs.map((inputs) => {
    const [first, second] = frequencies.map((i) => inputs[i]!);
    return inputs[densities[0]!]! * density.factor * Math.abs(second === undefined ? first! : second - first!);
  });
  const factors = unit ? [unit.factor] : [1, gravity];
  const gives = (right: (area: number) => number): boolean =>
    factors.some((factor) =>
      areas.every((area, s) => !samples.usable[s] || Math.abs((samples.hand[s]! * factor) / right(area) - 1) < 1e-3),
    );
  const quantity = "overall-rms" as const;
  if (gives(Math.sqrt)) return { verdict: "agrees", quantity, mistake: null, why: "" };
  const proportional = factors.some((factor) =>
    [1, factor].some((unitless) =>
      areas.every(
        (area, s) => !samples.usable[s] || Math.abs((samples.hand[s]! * factor * unitless) / area - 1) < 1e-3,
      ),
    ),
  );
  const why = "Density times width is the mean square: take its square root.";
  return proportional ? { verdict: "differs", quantity, mistake: "square-root-missing", why } : null;
}

const has = ({ readings }: Question, leaf: number, dimension: string): boolean =>
  (readings[leaf] ?? []).some(({ role }) => roles[role].dimension === dimension);

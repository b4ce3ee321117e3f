import type { Analysis } from "./analyse";
import { combinations } from "./combinations";
import { derive, entry } from "./derive";
import type { Question } from "./explain";
import type { Meaning } from "./meaning";
import { quantityMeant } from "./naming";
import { type Role, roles } from "./roles";

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;

const judged = new Set<Role>(["T", "R"]);
const plain = new Set<Role>(["f", "fn", "r", "zeta", "eta", "k", "m", "c"]);
const certain = 5;
const apart = 0.03; // relative, at every usable point

/**
 * A transmissibility whose labels and inputs are all certain and complete, but whose value is another one, for no known
 * reason. Nothing else is judged without a known slip.
 */
export function contradicted(questions: readonly Question[], meaning: Meaning): Found | null {
  const best = meaning.candidates[0];
  if (!best || best.weight < certain || !judged.has(best.role)) return null;
  for (const question of questions) {
    const { samples, readings, targets, cut } = question;
    const target = targets.find(({ role }) => role === best.role);
    if (!target || samples.complex) continue;
    const [first] = [...combinations(readings, samples.mask, 1)];
    if (!first) continue;
    const used = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
    const sure = (i: number): boolean => {
      const reading = first[i]!;
      return (
        reading.cost < 0.3 &&
        plain.has(reading.role) &&
        (reading.unitKnown || roles[reading.role].dimension === "number")
      );
    };
    if (used.length < 2 || !used.every(sure)) continue;
    const start = used.map((i) =>
      entry(
        first[i]!.role,
        1 << i,
        Float64Array.from(samples.inputs, (inputs) => inputs[i]! * first[i]!.factor),
      ),
    );
    const right = derive(start, [best.role], samples.count, false)
      .entries(best.role)
      .filter(({ mask }) => mask === samples.mask)
      .sort((a, b) => a.cost - b.cost)[0];
    if (!right) continue;
    const differs = samples.usable.every(
      (ok, s) => !ok || Math.abs((samples.hand[s]! * target.factor) / right.values[s]! - 1) > apart,
    );
    if (differs) {
      return {
        verdict: "differs",
        quantity: quantityMeant(best.role),
        mistake: null,
        why: `It departs from ${right.relation?.formula ?? "the published relation"} for the same inputs.`,
      };
    }
  }
  return null;
}

import type { Analysis } from "./analyse";
import type { Question } from "./explain";
import { close } from "./match";
import type { Meaning } from "./meaning";
import { roles } from "./roles";

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;

/** Recognises stiffnesses put together: side by side they add, one behind the other their inverses do. */
export function combinedStiffness(question: Question, meaning: Meaning): Found | null {
  const { samples, readings, cut } = question;
  const meant = meaning.candidates[0];
  if (!meant || roles[meant.role].dimension !== "stiffness") return null;
  const moving = cut.leaves.map((_, i) => i).filter((i) => samples.mask & (1 << i));
  const count = Number(/\b([2-9])\b/.exec(meaning.label)?.[1] ?? 1);
  const saysSeries = /\b(series|serie|reihe\w*|hintereinander)\b/.test(meaning.text);
  const saysParallel = /\b(parallel\w*|nebeneinander|side by side)\b/.test(meaning.text);
  // several of the same kind: "2 in series"
  const equal = moving.length === 1 && count > 1 && saysSeries !== saysParallel ? count : 1;
  if (moving.length * equal < 2) return null;
  const factors = moving.map((i) => readings[i]!.find(({ role }) => roles[role].dimension === "stiffness")?.factor);
  if (factors.some((factor) => factor === undefined || factor !== factors[0])) return null;
  const agrees = (combine: (values: number[]) => number): boolean =>
    samples.inputs.every((inputs, s) => {
      const right = combine(moving.flatMap((i) => Array.from({ length: equal }, () => inputs[i]!)));
      return !samples.usable[s] || Math.abs(samples.hand[s]! / right - 1) < close;
    });
  const parallel = agrees((values) => values.reduce((sum, k) => sum + k, 0));
  const series = agrees((values) => 1 / values.reduce((sum, k) => sum + 1 / k, 0));
  if (!parallel && !series) return null;
  const quantity = "mount-stiffness" as const;
  if ((parallel && saysSeries && !saysParallel) || (series && saysParallel && !saysSeries)) {
    return {
      verdict: "differs",
      quantity,
      mistake: null,
      why: "Springs side by side add; one behind the other their inverses add.",
    };
  }
  return { verdict: "agrees", quantity, mistake: null, why: "" };
}

import { cellName } from "../formula/references";
import { type Explanation, explainSound, type Question } from "./explain";
import { leafColumn, leafRow } from "./cut";
import type { Run } from "./runs";
import { columnOf, rowOf } from "./workbook";

/**
 * A formula that is right if one of its references is replaced by another that it has already: the next row's damping in
 * the numerator, a column locked in one place and not in the other.
 */
export function slippedReference(question: Question, run: Run): { explanation: Explanation; why: string } | null {
  const { cut, samples } = question;
  for (let wrong = 0; wrong < cut.leaves.length; wrong++) {
    for (let right = 0; right < cut.leaves.length; right++) {
      if (wrong === right || !(samples.mask & (1 << wrong))) continue;
      const a = cut.leaves[wrong]!;
      const b = cut.leaves[right]!;
      const near = a.sheet === b.sheet && (a.row === b.row || a.column === b.column);
      if (!near || question.readings[wrong]?.[0]?.role !== question.readings[right]?.[0]?.role) continue;
      const joined = join(question, wrong, right);
      const explanation = joined && explainSound(joined);
      if (!explanation) continue;
      const name = (leaf: typeof a): string => cellName(leafRow(leaf, 0), leafColumn(leaf, 0));
      const at = cellName(rowOf(run.anchor), columnOf(run.anchor));
      return {
        explanation,
        why: `In ${at} the reference ${name(a)} should be ${name(b)}, as elsewhere in the formula.`,
      };
    }
  }
  return null;
}

/** The question with one leaf read from the place of another. */
function join(question: Question, wrong: number, right: number): Question | null {
  const { samples } = question;
  const inputs = samples.inputs.map((values) => {
    const changed = values.slice();
    changed[wrong] = changed[right]!;
    return changed;
  });
  const hand = Float64Array.from(inputs, (values) => question.evaluate(values));
  const usable = Array.from(hand, (value) => value - value === 0 && value !== 0);
  if (usable.filter(Boolean).length < 2) return null;
  return {
    ...question,
    samples: { ...samples, inputs, hand, usable, mask: (samples.mask | (1 << right)) & ~(1 << wrong) },
  };
}

/** The worked line: the relation, the numbers put in with their units, the result; helper quantities such as r first. */
import type { Relation } from "../audit/catalogue";
import { relationOfFunction } from "../audit/functionRelation";
import { latexOf, type Quantities, type Quantity, textOf } from "../audit/typeset";
import { STANDARD_GRAVITY } from "../core/mount";
import { dampingModelOf, type Explanation, numberOf, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import { resultUnit, unitIn } from "./units";

export interface WorkedStep {
  /** LaTeX of the relation, of the numbers put in, and of the result; the last two may be missing */
  readonly latex: readonly string[];
  readonly text: string;
}

export interface Worked {
  readonly says: string;
  readonly source: string;
  readonly steps: readonly WorkedStep[];
}

interface Known extends Quantity {
  readonly number: number;
}

/** The calculation as an engineer writes it by hand; null where the function has no closed form in the catalogue. */
export function workedLine(explanation: Explanation, numbers: Numbers): Worked | null {
  const { doc, rows, result } = explanation;
  const count = rows.filter(({ leftOut, parameter }) => !leftOut && parameter.giving === "range").length;
  const found = relationOfFunction(doc.id, count, dampingModelOf(explanation) === "hysteretic");
  if (!found) return null;
  const { relation } = found;
  const system = wordOf(explanation, "units") ?? "si";
  const known = new Map<string, Known>();
  found.arguments.forEach((role, i) => {
    const parameter = doc.parameters[i]!;
    const number = numberOf(explanation, parameter.name);
    if (number !== undefined)
      known.set(role, { number, value: numbers.short(number), unit: unitIn(parameter.unit, system) });
  });
  known.set("g", { number: STANDARD_GRAVITY, value: numbers.exact(STANDARD_GRAVITY), unit: "m/s²" });
  const zeta = known.get("zeta")?.number;
  if (zeta !== undefined) known.set("eta", { number: 2 * zeta, value: numbers.short(2 * zeta) });
  const steps = found.helpers.map((helper) => {
    const number = helper.compute(helper.inputs.map((input) => known.get(input)?.number ?? Number.NaN));
    const value = Number.isFinite(number) ? { number, value: numbers.short(number) } : null;
    const written = step(helper, known, value);
    if (value) known.set(helper.out, value);
    return written;
  });
  const shown =
    typeof result === "number" ? { value: numbers.short(result), unit: resultUnit(doc.returns, system) } : null;
  return { says: relation.says, source: relation.source, steps: [...steps, step(relation, known, shown)] };
}

function step(relation: Relation, known: ReadonlyMap<string, Known>, result: Quantity | null): WorkedStep {
  const complete = relation.inputs.every((input) => known.has(input));
  const putIn: Quantities = (name) => known.get(name) ?? {};
  const latex = [`${latexOf(relation.out)} = ${latexOf(relation.formula)}`];
  let text = `${textOf(relation.out)} = ${textOf(relation.formula)}`;
  if (complete) {
    latex.push(`= ${latexOf(relation.formula, putIn)}`);
    text += ` = ${textOf(relation.formula, putIn)}`;
  }
  if (result) {
    latex.push(`= ${latexOf("x", () => result)}`);
    text += ` = ${textOf("x", () => result)}`;
  }
  return { latex, text };
}

/** The worked line: the relation, the numbers put in with their units, the result; helper quantities such as r first. */
import { type ClosedFormStep, closedForm } from "../audit/closedForm";
import { latexOf, type Quantities, type Quantity, textOf } from "../audit/typeset";
import { type Explanation, numberOf, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import { strings } from "./strings";
import { resultUnit, unitIn } from "./units";

export interface WorkedStep {
  /** LaTeX of the relation, of the numbers put in, and of the result; the last two may be missing */
  readonly latex: readonly string[];
  readonly text: string;
}

/** The calculation as an engineer writes it by hand; null where the function has no closed form. */
export function workedLine(explanation: Explanation, numbers: Numbers): readonly WorkedStep[] | null {
  const { doc, rows, result } = explanation;
  const symbol = strings.symbols[doc.id];
  const given = rows.map(({ parameter: { name, giving }, leftOut }) => {
    if (leftOut) return null;
    return giving === "words" ? wordOf(explanation, name) : numberOf(explanation, name);
  });
  const form = symbol === undefined ? undefined : closedForm(doc.id, given);
  if (!form) return null;
  const system = wordOf(explanation, "units") ?? "si";
  const putIn: Quantities = (name) => {
    const number = form.values.get(name);
    if (number === undefined) return {};
    const at = form.argumentOf.get(name);
    const unit = at === undefined ? (name === "g" ? "m/s²" : "") : unitIn(doc.parameters[at]!.unit, system);
    return { value: name === "g" ? numbers.exact(number) : numbers.short(number), unit };
  };
  const shown = typeof result === "number" ? result : undefined;
  return form.steps.map((step) => {
    const own = step.name === "";
    const value = own ? shown : step.value;
    const unit = own ? resultUnit(doc.returns, system) : "";
    const complete = step.inputs.every((input) => form.values.has(input));
    return written(
      step,
      own ? symbol! : step.name,
      complete ? putIn : null,
      value === undefined ? null : { value: numbers.short(value), unit },
    );
  });
}

function written(
  { formula }: ClosedFormStep,
  symbol: string,
  putIn: Quantities | null,
  result: Quantity | null,
): WorkedStep {
  const latex = [`${latexOf(symbol)} = ${latexOf(formula)}`];
  let text = `${textOf(symbol)} = ${textOf(formula)}`;
  if (putIn) {
    latex.push(`= ${latexOf(formula, putIn)}`);
    text += ` = ${textOf(formula, putIn)}`;
  }
  if (result) {
    latex.push(`= ${latexOf("x", () => result)}`);
    text += ` = ${textOf("x", () => result)}`;
  }
  return { latex, text };
}

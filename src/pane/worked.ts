/** The worked line: the relation, the numbers put in with their units, the result; helper quantities such as r first. */
import type { Relation } from "../audit/catalogue";
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

const DEEPEST = 4;

export function workedLine(explanation: Explanation, catalogue: readonly Relation[], numbers: Numbers): Worked | null {
  const relation = relationOf(explanation, catalogue);
  if (!relation) return null;
  const { doc, result } = explanation;
  const system = wordOf(explanation, "units") ?? "si";
  const known = new Map<string, Known>();
  relation.arguments!.forEach((role, i) => {
    const parameter = doc.parameters[i];
    const number = parameter && numberOf(explanation, parameter.name);
    if (number === undefined) return;
    known.set(role, { number, value: numbers.short(number), unit: unitIn(parameter!.unit, system) });
  });
  known.set("g", { number: STANDARD_GRAVITY, value: numbers.exact(STANDARD_GRAVITY), unit: "m/s²" });
  if (dampingModelOf(explanation) === "hysteretic" && known.has("zeta")) {
    const eta = 2 * known.get("zeta")!.number;
    known.set("eta", { number: eta, value: numbers.short(eta) });
  }
  const steps: WorkedStep[] = [];
  for (const role of relation.inputs) derive(role, relation, known, catalogue, numbers, steps, 0);
  const shown =
    typeof result === "number" ? { value: numbers.short(result), unit: resultUnit(doc.returns, system) } : null;
  steps.push(step(relation, known, shown));
  return { says: relation.says, source: relation.source, steps };
}

/** The relation that the function computes with the arguments and the damping law of this call. */
function relationOf(explanation: Explanation, catalogue: readonly Relation[]): Relation | undefined {
  const own = catalogue.filter(
    (relation) => relation.cellFunction === explanation.doc.id && relation.arguments && !relation.approximate,
  );
  const viscous = own.filter(({ inputs }) => !inputs.includes("eta"));
  const given = (relation: Relation): number =>
    relation.arguments!.filter((_, i) => {
      const row = explanation.rows.find(({ parameter }) => parameter === explanation.doc.parameters[i]);
      return row !== undefined && !row.leftOut;
    }).length;
  const fullest = [...viscous].sort((a, b) => given(b) - given(a) || a.arguments!.length - b.arguments!.length)[0];
  if (dampingModelOf(explanation) === "viscous" || !fullest?.arguments!.includes("zeta")) return fullest;
  const hysteretic = catalogue.find(({ out, inputs }) => out === fullest.out && inputs.includes("eta"));
  return hysteretic && { ...hysteretic, arguments: fullest.arguments };
}

/** Works out a quantity that the arguments do not give, from the simplest relation whose inputs are known. */
function derive(
  role: string,
  goal: Relation,
  known: Map<string, Known>,
  catalogue: readonly Relation[],
  numbers: Numbers,
  steps: WorkedStep[],
  depth: number,
): boolean {
  if (known.has(role)) return true;
  if (depth > DEEPEST) return false;
  const candidates = catalogue
    .filter((each) => each.out === role && each !== goal && !each.approximate && !each.undamped && !each.required)
    .filter(
      (each) => each.inputs.includes("eta") === known.has("eta") || !each.inputs.some((name) => /eta$/.test(name)),
    )
    .sort((a, b) => missing(a, known) - missing(b, known) || a.inputs.length - b.inputs.length);
  for (const relation of candidates) {
    const trial = new Map(known);
    const added: WorkedStep[] = [];
    if (!relation.inputs.every((input) => derive(input, relation, trial, catalogue, numbers, added, depth + 1)))
      continue;
    const number = relation.compute(relation.inputs.map((input) => trial.get(input)!.number));
    if (!Number.isFinite(number)) continue;
    trial.forEach((value, name) => known.set(name, value));
    const value = { number, value: numbers.short(number) };
    steps.push(...added, step(relation, known, value));
    known.set(role, value);
    return true;
  }
  return false;
}

const missing = (relation: Relation, known: ReadonlyMap<string, Known>): number =>
  relation.inputs.filter((input) => !known.has(input)).length;

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

/** A function's closed form as a calculation: its steps, helper quantities first, and their values. */
import { compile } from "../formula/compile";
import { type Node, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { plainEntry } from "./plain";
import { common } from "./plain-entry";

export interface ClosedFormStep {
  /** name of what the step gives; empty for the function's own result */
  readonly name: string;
  readonly formula: string;
  readonly inputs: readonly string[];
  /** undefined where an input is not known or the step gives no number */
  readonly value: number | undefined;
}

export interface ClosedForm {
  readonly steps: readonly ClosedFormStep[];
  /** every name with a known value, helper quantities and constants too */
  readonly values: ReadonlyMap<string, number>;
  /** place of the argument that a name stands for */
  readonly argumentOf: ReadonlyMap<string, number>;
}

/**
 * The calculation behind a call of `id`, in the units in which the arguments stand; undefined where the function has no
 * closed form, or one that is no single line (looking up, taking cases).
 *
 * @param given for each argument its number or word; null where it is left out, undefined where it is not known here
 */
export function closedForm(id: string, given: readonly (number | string | null | undefined)[]): ClosedForm | undefined {
  const entry = plainEntry(id);
  if (!entry || entry.fills) return undefined;
  const words: Record<string, string> = {};
  const present = new Set<string>();
  const values = new Map<string, number>();
  const argumentOf = new Map<string, number>();
  for (const [i, argument] of entry.arguments.entries()) {
    const value = given[i];
    if (argument.table || argument.unit) return undefined;
    if (value !== null) present.add(argument.name);
    if (argument.words) {
      const word = value === null ? argument.fallback : value;
      if (typeof word !== "string" || !argument.words.includes(word)) return undefined;
      words[argument.name] = word;
      continue;
    }
    argumentOf.set(argument.name, i);
    if (typeof value === "number") values.set(argument.name, value);
  }
  const { formula, where = {}, factor } = entry.text(words, present, 0);
  if (factor) return undefined;
  const steps: ClosedFormStep[] = [];
  const done = new Set<string>();

  function work(name: string, text: string): boolean {
    const { tree } = readFormula(text);
    if (takesCases(tree)) return false;
    const inputs = namesIn(tree);
    for (const input of inputs) {
      const helper = where[input] ?? (argumentOf.has(input) ? undefined : common[input]);
      if (helper === undefined || done.has(input)) continue;
      done.add(input);
      const constant = Number(helper);
      if (!Number.isNaN(constant)) values.set(input, constant);
      else if (!work(input, helper)) return false;
    }
    const known = inputs.map((input) => values.get(input) ?? Number.NaN);
    const result = compile(tree, inputs)?.(known) ?? Number.NaN;
    const value = Number.isFinite(result) ? result : undefined;
    if (name !== "" && value !== undefined) values.set(name, value);
    steps.push({ name, formula: text, inputs, value });
    return true;
  }
  return work("", formula) ? { steps, values, argumentOf } : undefined;
}

function namesIn(tree: Node): string[] {
  const found = new Set<string>();
  walk(tree, (node) => node.kind === "name" && found.add(node.name));
  return [...found];
}

function takesCases(tree: Node): boolean {
  let found = false;
  walk(tree, (node) => {
    if (node.kind === "call" && ["IF", "INDEX", "MATCH", "MIN", "MAX", "DEGREES"].includes(node.name)) found = true;
  });
  return found;
}

/** Plain formulas: our functions in a cell's formula replaced by ordinary arithmetic that needs no add-in. */
import { type CallNode, type Node, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { relationOfFunction } from "./functionRelation";
import { ownFunction } from "./ownCalls";
import { type Role, roles } from "./roles";

export interface PlainFormula {
  /** formula text without "=" */
  readonly formula: string;
  readonly replaced: readonly string[];
  /** functions that stay, since no closed form of theirs is known */
  readonly kept: readonly string[];
}

const STANDARD_GRAVITY = "9.80665";

/** SI value of one unit of each dimension in the unit systems other than SI. */
const UNITS: Record<string, Partial<Record<string, string>>> = {
  mm: { length: "0.001", acceleration: STANDARD_GRAVITY, stiffness: "1000", damping: "1000" },
  inch: {
    length: "0.0254",
    acceleration: STANDARD_GRAVITY,
    mass: "0.45359237",
    force: "4.4482216152605",
    stiffness: "(4.4482216152605/0.0254)",
    damping: "(4.4482216152605/0.0254)",
  },
};

/** The formula with each of our functions replaced that has a closed form; nested calls from the inside out. */
export function plainFormula(formula: string): PlainFormula {
  const replaced: string[] = [];
  const kept: string[] = [];
  const plain = rewrite(readFormula(formula).tree, formula, replaced, kept);
  return { formula: plain, replaced, kept };
}

function rewrite(tree: Node, formula: string, replaced: string[], kept: string[]): string {
  let text = formula.slice(tree.start, tree.end);
  for (const call of outermostCalls(tree).reverse()) {
    const id = ownFunction(call.name)!;
    const given = call.arguments.map((argument) => rewrite(argument, formula, replaced, kept));
    const closed = closedForm(id, call, given);
    (closed === null ? kept : replaced).push(id);
    const put = closed ?? `${call.name}(${given.join(",")})`;
    text = text.slice(0, call.start - tree.start) + put + text.slice(call.end - tree.start);
  }
  return text;
}

function outermostCalls(tree: Node): CallNode[] {
  const found: CallNode[] = [];
  walk(tree, (node) => {
    if (node.kind !== "call" || ownFunction(node.name) === undefined) return;
    if (!found.some(({ start, end }) => start <= node.start && node.end <= end)) found.push(node);
  });
  return found;
}

function closedForm(id: string, call: CallNode, given: readonly string[]): string | null {
  const words: string[] = [];
  let count = 0;
  for (const [i, argument] of call.arguments.entries()) {
    if (argument.kind === "text") words.push(argument.value.trim().toLowerCase());
    else if (argument.kind !== "missing" && words.length === 0) count = i + 1;
    else if (argument.kind !== "missing") return null;
  }
  const system = words.find((word) => word in UNITS);
  const known = ["si", "mm", "inch", "viscous", "hysteretic"];
  if (words.some((word) => !known.includes(word))) return null;
  const hysteretic = words.includes("hysteretic");
  const found = relationOfFunction(id, count, hysteretic);
  if (!found || found.arguments.length < count) return null;
  const texts = new Map<string, string>([["g", STANDARD_GRAVITY]]);
  found.arguments.forEach((role, i) => texts.set(role, inSI(role, given[i]!, system)));
  if (hysteretic && texts.has("zeta")) texts.set("eta", `(2*${texts.get("zeta")!})`);
  for (const helper of found.helpers) texts.set(helper.out, `(${put(helper.formula, texts)})`);
  const result = put(found.relation.formula, texts);
  const factor = system && UNITS[system]![roles[found.relation.out].dimension];
  return factor ? `((${result})/${factor})` : `(${result})`;
}

function inSI(role: Role, text: string, system: string | undefined): string {
  const factor = system && UNITS[system]![roles[role].dimension];
  return factor ? `(${bracketed(text)}*${factor})` : bracketed(text);
}

const bracketed = (text: string): string => (/^[\w.$!']+$/.test(text) ? text : `(${text})`);

/** A relation's formula with texts in place of its names. */
function put(formula: string, texts: ReadonlyMap<string, string>): string {
  const names: { start: number; end: number; text: string }[] = [];
  walk(readFormula(formula).tree, (node) => {
    if (node.kind === "name") names.push({ start: node.start, end: node.end, text: texts.get(node.name)! });
  });
  return names
    .sort((a, b) => b.start - a.start)
    .reduce((text, { start, end, text: by }) => text.slice(0, start) + by + text.slice(end), formula);
}

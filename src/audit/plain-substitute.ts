/** Names in our own formula texts replaced by what stands for them, with brackets where the place needs them. */
import { type Node, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";

/** The formula with every name replaced. `textOf` answers what stands for a name; its own brackets are not its concern. */
export function substitute(formula: string, textOf: (name: string) => string): string {
  const { tree, problems } = readFormula(formula);
  if (problems.length > 0) throw new Error(`plain formula: cannot read ${formula}`);
  const bare = new Set<Node>(); // an argument of a call stands between commas and needs no brackets
  const names: { start: number; end: number; text: string }[] = [];
  walk(tree, (node) => {
    if (node.kind === "call") for (const argument of node.arguments) bare.add(argument);
    if (node.kind !== "name") return;
    const text = textOf(node.name);
    const whole = bare.has(node) || node === tree;
    names.push({ start: node.start, end: node.end, text: whole ? text : bracketed(text) });
  });
  return replaceAt(formula, names);
}

/** A text with some of its stretches replaced. */
export function replaceAt(text: string, parts: readonly { start: number; end: number; text: string }[]): string {
  let result = text;
  for (const part of [...parts].sort((a, b) => b.start - a.start)) {
    result = result.slice(0, part.start) + part.text + result.slice(part.end);
  }
  return result;
}

/** In brackets unless it holds together by itself: -2^2 is 4 to a spreadsheet, so even a sign needs them. */
export function bracketed(text: string): string {
  return isAtom(text) ? text : `(${text})`;
}

const atoms = ["number", "text", "boolean", "reference", "structured", "external", "name", "call", "array"];

function isAtom(text: string): boolean {
  const { tree, problems } = readFormula(text);
  if (problems.length > 0) return false;
  return (atoms.includes(tree.kind) && tree.start === 0 && tree.end === text.length) || standsInBrackets(text);
}

/** Whether the first bracket closes at the last character. */
function standsInBrackets(text: string): boolean {
  let depth = 0;
  let quote = "";
  for (let i = 0; i < text.length; i++) {
    const c = text[i]!;
    if (quote) quote = c === quote ? "" : quote;
    else if (c === '"' || c === "'") quote = c;
    else if (c === "(") depth++;
    else if (c === ")") depth--;
    if (depth === 0) return i > 0 && i === text.length - 1;
  }
  return false;
}

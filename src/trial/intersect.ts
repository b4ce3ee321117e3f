/**
 * A plain formula in a workbook file takes one value where it names a whole column: the cell in its own row. The trial
 * sheet would spill instead, so such references are narrowed when a workbook is opened.
 */
import type { Node, ReferenceNode } from "../formula/nodes";
import { children } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { columnLetters } from "./book";
import { type Place, quoteSheet } from "./dialect";
import { namespace } from "./metadata";

export interface Surroundings {
  /** Does this argument of this function take a range as it is? */
  takesRange: (name: string, index: number) => boolean;
  /** The cells behind a defined name, as text such as `Sheet1!$B$2:$B$9`. */
  cellsOfName: (name: string) => string | undefined;
}

/** Functions whose arguments a spreadsheet has always worked out element by element. */
const wholeArrays =
  /^(SUMPRODUCT|MMULT|MDETERM|MINVERSE|LOOKUP|FREQUENCY|LINEST|LOGEST|TREND|GROWTH|FORECAST|CORREL|SLOPE|INTERCEPT|RSQ|STEYX|PEARSON|COVAR|SUMXMY2|SUMX2MY2|SUMX2PY2|PROB|PERCENTILE|QUARTILE|MEDIAN|MODE|LARGE|SMALL)$/;

type Edit = { start: number; end: number; text: string };

export function narrowed(formula: string, place: Place, around: Surroundings): string {
  if (!/[:A-Za-z]/.test(formula)) return formula;
  const { tree, problems } = readFormula(formula);
  if (problems.length > 0) return formula;
  const edits: Edit[] = [];
  visit(tree, "single", around, (node) => {
    const text = crossing(node, place, around);
    if (text) edits.push({ start: node.start, end: node.end, text });
  });
  edits.sort((a, b) => b.start - a.start);
  return edits.reduce((text, edit) => text.slice(0, edit.start) + edit.text + text.slice(edit.end), formula);
}

/** Functions that make arrays of single values. */
const makesArrays =
  /^(SEQUENCE|RANDARRAY|FILTER|UNIQUE|SORT|SORTBY|TRANSPOSE|MMULT|PLINTH\.(SWEEP|TWOSTAGEFREQ|RIGIDMODES))$/;

/** Whether a formula with one result works on whole ranges inside, so that written plainly it would mean another thing. */
export function worksOnRanges(formula: string, around: Surroundings): boolean {
  let found = false;
  visit(readFormula(formula).tree, "single", around, (node) => {
    if (node.kind === "array") found = true;
    else if (node.kind === "call") found ||= makesArrays.test(node.name.toUpperCase()) || liftsRange(node, around);
    else found ||= isRange(node, around) !== undefined;
  });
  return found;
}

function liftsRange(call: Node, around: Surroundings): boolean {
  if (call.kind !== "call" || !call.name.toUpperCase().startsWith(`${namespace}.`)) return false;
  return call.arguments.some((argument) => isRange(argument, around) !== undefined);
}

/** single: a range here means one of its cells; whole: a range stays, operations on it do not; array: all stays. */
type Mode = "single" | "whole" | "array";

/** Calls `onSingle` for every node that a plain formula takes as one value, except the formula's own outermost call. */
function visit(node: Node, mode: Mode, around: Surroundings, onSingle: (node: Node) => void, outermost = true): void {
  switch (node.kind) {
    case "reference":
    case "name":
    case "array":
      if (mode === "single") onSingle(node);
      return;
    case "unary":
    case "binary": {
      const joinsReferences = node.kind === "binary" && node.operator === ":";
      const inside = mode === "array" ? "array" : joinsReferences ? "whole" : "single";
      for (const child of children(node)) visit(child, inside, around, onSingle, false);
      return;
    }
    case "call": {
      if (mode === "single" && !outermost) onSingle(node);
      const name = node.name.toUpperCase();
      const elementwise = mode === "array" || wholeArrays.test(name) || name.startsWith(`${namespace}.`);
      node.arguments.forEach((argument, i) => {
        const inside = elementwise ? "array" : around.takesRange(name, i) ? "whole" : "single";
        visit(argument, inside, around, onSingle, false);
      });
      return;
    }
  }
}

type RangeNode = ReferenceNode & { to: NonNullable<ReferenceNode["to"]> };

function isRange(node: Node, around: Surroundings): RangeNode | undefined {
  let range: Node = node;
  if (node.kind === "name") {
    const cells = around.cellsOfName(node.name);
    if (!cells) return undefined;
    range = readFormula(cells).tree;
  }
  return range.kind === "reference" && range.to ? (range as RangeNode) : undefined;
}

/** The one cell of a range that stands in the formula's own row or column. */
function crossing(node: Node, place: Place, around: Surroundings): string | undefined {
  const range = isRange(node, around);
  if (!range) return undefined;
  const { from, to, sheet } = range;
  const oneColumn = from.column !== null && from.column === to.column;
  const oneRow = from.row !== null && from.row === to.row;
  if (oneColumn === oneRow) return undefined;
  const within = (at: number, low: number | null, high: number | null): boolean =>
    at >= (low ?? 0) && at <= (high ?? Infinity);
  const prefix = sheet === null ? "" : `${quoteSheet(sheet)}!`;
  if (oneColumn && within(place.row, from.row, to.row))
    return `${prefix}${from.columnFixed ? "$" : ""}${columnLetters(from.column!)}${place.row + 1}`;
  if (oneRow && within(place.column, from.column, to.column))
    return `${prefix}${columnLetters(place.column)}${from.rowFixed ? "$" : ""}${from.row! + 1}`;
  return undefined;
}

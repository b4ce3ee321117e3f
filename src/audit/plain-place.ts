/** One place of a spilled result: the cell of each range that belongs to it. */
import { type Node, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { cellName } from "../formula/references";
import { bracketed, replaceAt } from "./plain-substitute";

/** Row and column within the result, from 0. */
export interface Placed {
  readonly row: number;
  readonly column: number;
}

/** Whether a text can be seen to have more than one value. */
export function isRange(text: string): boolean {
  let found = false;
  walk(readFormula(text).tree, (node) => {
    if (node.kind === "array" || (node.kind === "reference" && node.to !== null)) found = true;
  });
  return found;
}

/**
 * The text for one place: ranges and lists replaced by their cell there, a single row or column repeated.
 * Null where that cannot be seen from the text: a name or a table may be a range, and a function may take one whole.
 */
export function at(text: string, place: Placed): string | null {
  const { tree, problems } = readFormula(text);
  if (problems.length > 0) return null;
  const parts: { start: number; end: number; text: string }[] = [];
  const known = visit(tree, false);
  return known ? replaceAt(text, parts) : null;

  function visit(node: Node, inCall: boolean): boolean {
    switch (node.kind) {
      case "number":
      case "boolean":
      case "missing":
      case "text":
      case "error":
        return true;
      case "unary":
        return node.operator !== "spill" && visit(node.argument, inCall);
      case "binary":
        return "+-*/^&=<>".includes(node.operator[0]!) && visit(node.left, inCall) && visit(node.right, inCall);
      case "call":
        return node.arguments.every((argument) => visit(argument, true));
      case "structured":
        return node.section === "this row";
      case "reference": {
        if (node.to === null) return true;
        if (inCall) return false;
        const cell = cellAt(node, place);
        if (cell === null) return false;
        const sheet = /^.*!/s.exec(text.slice(node.start, node.end))?.[0] ?? "";
        parts.push({ start: node.start, end: node.end, text: sheet + cell });
        return true;
      }
      case "array": {
        if (inCall) return false;
        const row = node.rows[node.rows.length === 1 ? 0 : place.row];
        const element = row?.[row.length === 1 ? 0 : place.column];
        if (!element) return false;
        parts.push({ start: node.start, end: node.end, text: bracketed(text.slice(element.start, element.end)) });
        return true;
      }
      case "name":
      case "external":
        return false;
      default:
        return node satisfies never;
    }
  }
}

function cellAt({ from, to }: Extract<Node, { kind: "reference" }>, place: Placed): string | null {
  if (from.row === null || from.column === null || to === null || to.row === null || to.column === null) return null;
  const row = from.row + (to.row === from.row ? 0 : place.row);
  const column = from.column + (to.column === from.column ? 0 : place.column);
  if (row > to.row || column > to.column) return null;
  const name = cellName(row, column);
  const letters = name.replace(/\d+/, "");
  return `${from.columnFixed ? "$" : ""}${letters}${from.rowFixed ? "$" : ""}${row + 1}`;
}

import type { CellPoint, Node } from "./nodes";
import { cellName } from "./references";

/** Printed form of a tree for tests and messages: "(* (pct 50) A1)"; what is missing prints as "?". */
export function printTree(node: Node): string {
  switch (node.kind) {
    case "number":
      return String(node.value);
    case "text":
      return JSON.stringify(node.value);
    case "boolean":
      return node.value ? "TRUE" : "FALSE";
    case "error":
      return node.value;
    case "reference":
      return (node.sheet === null ? "" : `'${node.sheet}'!`) + range(node.from, node.to);
    case "external":
      return `<${node.text}>`;
    case "structured":
      return `${node.table}[${node.section}|${node.columns.join("|")}]`;
    case "name":
      return node.name;
    case "unary":
      return `(${node.operator} ${printTree(node.argument)})`;
    case "binary":
      return `(${node.operator} ${printTree(node.left)} ${printTree(node.right)})`;
    case "call":
      return `(${[node.name, ...node.arguments.map(printTree)].join(" ")})`;
    case "array":
      return `{${node.rows.map((row) => row.map(printTree).join(" ")).join("; ")}}`;
    case "missing":
      return "?";
    default:
      return node satisfies never;
  }
}

function range(from: CellPoint, to: CellPoint | null): string {
  return to ? `${point(from)}:${point(to)}` : point(from);
}

function point(end: CellPoint): string {
  const name = cellName(end.row ?? 0, end.column ?? 0);
  const letters = (end.columnFixed ? "$" : "") + name.replace(/\d+/, "");
  const digits = (end.rowFixed ? "$" : "") + name.replace(/\D+/, "");
  return (end.column === null ? "" : letters) + (end.row === null ? "" : digits);
}

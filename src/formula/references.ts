import { parseA1Ref, parseStructRef, toCol, fromCol } from "@borgar/fx";
import type { CellPoint, ExternalNode, ReferenceNode, StructuredNode } from "./nodes";

const oneCell =
  /^(?:('(?:[^']|'')*'|[^'!]+)!)?(\$?)([A-Za-z]{1,3})(\$?)(\d{1,7})(?::(\$?)([A-Za-z]{1,3})(\$?)(\d{1,7}))?$/;

/** Reads a cell, range, whole column or whole row; anything in another workbook or across sheets is `external`. */
export function readReference(text: string, start: number, end: number): ReferenceNode | ExternalNode {
  const outside: ExternalNode = { kind: "external", text, start, end };
  if (/[[\]]/.test(text)) return outside;
  const simple = oneCell.exec(text);
  if (simple) {
    const sheet = simple[1] ? unquote(simple[1]) : null;
    if (sheet !== null && /^[^']*:[^']*$/.test(simple[1]!)) return outside;
    const from = point(simple[3]!, simple[5]!, simple[2] === "$", simple[4] === "$");
    const to = simple[7] ? point(simple[7], simple[9]!, simple[6] === "$", simple[8] === "$") : null;
    return to
      ? { kind: "reference", sheet, ...ordered(from, to), start, end }
      : { kind: "reference", sheet, from, to, start, end };
  }
  const parsed = parseA1Ref(text, { allowNamed: false, allowTernary: true });
  const range = parsed && "range" in parsed ? parsed.range : null;
  const context = parsed && "context" in parsed ? (parsed.context as string[]) : [];
  if (!range || context.length > 1 || context.some((part) => part.includes(":"))) return outside;
  const from = {
    row: range.top ?? null,
    column: range.left ?? null,
    rowFixed: !!range.$top,
    columnFixed: !!range.$left,
  };
  const to = {
    row: range.bottom ?? null,
    column: range.right ?? null,
    rowFixed: !!range.$bottom,
    columnFixed: !!range.$right,
  };
  return { kind: "reference", sheet: context[0] ?? null, from, to, start, end };
}

/** Reads `Table[[#This Row],[f (Hz)]]`, `[@m]` and their like. */
export function readStructured(text: string, start: number, end: number): StructuredNode | ExternalNode {
  const parsed = parseStructRef(text);
  if (!parsed) return { kind: "external", text, start, end };
  const sections = (parsed.sections ?? []).map((section: string) => section.toLowerCase());
  const section = sections.includes("this row")
    ? "this row"
    : sections.includes("headers")
      ? "headers"
      : sections.includes("totals")
        ? "totals"
        : sections.includes("all")
          ? "all"
          : "data";
  return { kind: "structured", table: parsed.table ?? "", columns: parsed.columns ?? [], section, start, end };
}

/** Column letters to an index from 0. */
export function columnIndex(letters: string): number {
  return fromCol(letters.toUpperCase());
}

/** "B7" for row 6, column 1. */
export function cellName(row: number, column: number): string {
  return toCol(column) + String(row + 1);
}

function point(letters: string, digits: string, columnFixed: boolean, rowFixed: boolean): CellPoint {
  return { row: Number(digits) - 1, column: columnIndex(letters), rowFixed, columnFixed };
}

function ordered(a: CellPoint, b: CellPoint): { from: CellPoint; to: CellPoint } {
  const rowsSwapped = a.row! > b.row!;
  const columnsSwapped = a.column! > b.column!;
  const pick = (first: boolean): CellPoint => {
    const rowOf = first !== rowsSwapped ? a : b;
    const columnOf = first !== columnsSwapped ? a : b;
    return { row: rowOf.row, rowFixed: rowOf.rowFixed, column: columnOf.column, columnFixed: columnOf.columnFixed };
  };
  return { from: pick(true), to: pick(false) };
}

function unquote(sheet: string): string {
  return sheet.startsWith("'") ? sheet.slice(1, -1).replaceAll("''", "'") : sheet;
}

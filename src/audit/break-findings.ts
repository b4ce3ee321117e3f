import { evaluate } from "../formula/evaluate";
import { walk } from "../formula/nodes";
import { cellName } from "../formula/references";
import { single } from "../formula/values";
import type { Analyser } from "./analyse";
import type { Book } from "./book";
import type { Finding } from "./finding";
import type { Break } from "./runs";
import { cellKey, columnOf, rowOf } from "./workbook";

/** Findings for the cells that depart from their columns. */
export function breakFindings(book: Book, breaks: readonly Break[], analyse: Analyser): Finding[] {
  return breaks.flatMap((one) => {
    const found = breakFinding(book, one, analyse);
    return found ? [found] : [];
  });
}

function breakFinding(book: Book, { sheet, cell, form, run }: Break, analyse: Analyser): Finding | null {
  const around = analyse.analysis(run);
  const row = rowOf(cell);
  const column = columnOf(cell);
  const base = {
    sheet: book.sheets[sheet]!.name,
    cell: cellName(row, column),
    relation: around.explanation?.entry.relation?.id ?? null,
    suggestion: null,
    formula: book.sheets[sheet]!.sheet.cells.get(cell)?.formula ?? "",
    comparison: [],
    role: around.explanation?.target.role ?? null,
    worstCell: cellName(row, column),
  };
  if (form && hasRange(form.tree)) return null;
  const alone = form ? analyse.alone({ sheet, form, cells: [cell], anchor: cell, direction: run.direction }) : null;
  const expected = single(evaluate(run.form.tree, book.around(sheet, run.form, row, column)));
  const hand = book.value(sheet, row, column);
  const unrelated = around.verdict === "unrecognised";
  if (typeof expected !== "number" || typeof hand !== "number" || unrelated) {
    if (!alone || alone.verdict === "unrecognised") return null;
    return {
      ...base,
      quantity: alone.quantity,
      verdict: alone.verdict,
      mistake: alone.mistake,
      evidence: "",
      maxRelativeError: alone.verdict === "agrees" ? 0 : null,
      message: alone.why || "agrees",
    };
  }
  const error = Math.abs(hand / expected - 1);
  // a list in which every line has a name of its own
  const otherName = alone !== null && alone.meaning.label !== around.meaning.label;
  if (otherName && alone.verdict === "agrees") {
    const evidence = "right by its own label";
    return {
      ...base,
      quantity: alone.quantity,
      verdict: "agrees",
      mistake: null,
      evidence,
      maxRelativeError: 0,
      message: "agrees",
    };
  }
  const quantity = around.quantity;
  if (error < 1e-6 || (alone?.verdict === "agrees" && around.verdict === "differs")) {
    return {
      ...base,
      quantity,
      verdict: "agrees",
      mistake: null,
      evidence: "gives what the column's formula gives",
      maxRelativeError: 0,
      message: "agrees",
    };
  }
  if (
    alone?.verdict === "agrees" &&
    alone.explanation?.target.role === around.explanation?.target.role &&
    sameInputs(alone, around, run, cell)
  ) {
    return {
      ...base,
      quantity,
      verdict: "agrees",
      mistake: null,
      evidence: "another form of the column's relation",
      maxRelativeError: 0,
      message: "agrees",
    };
  }
  if (!form && reads(book, run, column)) return null;
  const name = cellName(rowOf(run.cells[0]!), column);
  const message = form
    ? `The formula departs from the one in the rest of its column (as in ${name}).`
    : `A number is typed over the formula that the rest of the column has (as in ${name}).`;
  return {
    ...base,
    quantity,
    verdict: "differs",
    mistake: form ? "fill-break" : "value-typed-over",
    evidence: `the column's formula gives ${expected} here`,
    maxRelativeError: error,
    message,
  };
}

function sameInputs(
  alone: ReturnType<Analyser["analysis"]>,
  around: ReturnType<Analyser["analysis"]>,
  run: Break["run"],
  cell: number,
): boolean {
  const place = ({ explanation }: typeof alone, down: number): string =>
    (explanation?.cut.leaves ?? [])
      .map((leaf) => `${leaf.sheet}:${leaf.row + (leaf.rowMoves ? down : 0)}:${leaf.column}`)
      .sort()
      .join(" ");
  return place(alone, 0) === place(around, rowOf(cell) - rowOf(run.anchor));
}

/** The run refers to its own column: a typed number may be a start value. */
function reads(book: Book, run: Break["run"], column: number): boolean {
  let found = false;
  walk(run.form.tree, (node) => {
    if (node.kind !== "reference" || node.sheet !== null || node.to) return;
    const own = run.direction === "across" ? node.from.row === run.form.row : node.from.column === run.form.column;
    if (own && !node.from.columnFixed && !node.from.rowFixed) found = true;
  });
  return found && book.sheets[run.sheet]!.sheet.cells.has(cellKey(rowOf(run.cells[0]!), column));
}

function hasRange(tree: Break["run"]["form"]["tree"]): boolean {
  let found = false;
  walk(tree, (node) => {
    if (node.kind === "reference" && node.to) found = true;
  });
  return found;
}

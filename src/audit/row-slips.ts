import { cellName } from "../formula/references";
import type { Book } from "./book";
import type { Explanation } from "./explain";
import { leafColumn, leafRow } from "./cut";
import type { Run } from "./runs";
import { columnOf, rowOf } from "./workbook";

const least = 3; // cells of a column from which its references can be compared

/**
 * A column that is right in form but reads beside its rows: a reference that runs into blank cells because a $ is missing,
 * or one that looks at a neighbouring row. null if every reference is where it belongs.
 */
export function slippedRow(book: Book, run: Run, { cut }: Explanation): string | null {
  if (run.direction !== "down" || run.cells.length < least) return null;
  const anchor = rowOf(run.anchor);
  const moving = cut.leaves.filter(({ rowMoves, lookup, sheet }) => rowMoves && !lookup && sheet === run.sheet);
  for (const leaf of moving) {
    const values = run.cells.map((cell) => {
      const down = rowOf(cell) - anchor;
      return book.value(leaf.sheet, leafRow(leaf, down), leafColumn(leaf, columnOf(cell) - columnOf(run.anchor)));
    });
    const name = cellName(leaf.row, leaf.column);
    if (typeof values[0] === "number" && values.slice(1).every((value) => value === null)) {
      return `The reference ${name} moves down into blank cells: a $ is missing.`;
    }
    const aside = leaf.row !== anchor && moving.some((other) => other.row === anchor);
    if (aside && Math.abs(leaf.row - anchor) === 1 && typeof book.value(leaf.sheet, anchor, leaf.column) === "number") {
      return `The reference ${name} reads a neighbouring row; the others read their own.`;
    }
  }
  return null;
}

import { cellName } from "../formula/references";
import type { Analysis } from "./analyse";
import type { Book } from "./book";
import { leafValue } from "./cut";
import { derive, entry } from "./derive";
import type { Run } from "./runs";
import { columnOf, rowOf } from "./workbook";

export interface Effect {
  readonly largest: number;
  readonly worst: string;
  readonly comparison: readonly { cell: string; hand: number; right: number }[];
}

const mostRows = 400;

/** How far a wrong formula is off on the sheet's own rows. null where the right value cannot be computed. */
export function effectOf(book: Book, run: Run, { explanation }: Analysis): Effect | null {
  if (!explanation) return null;
  const { cut, readings, target } = explanation;
  const step = Math.ceil(run.cells.length / mostRows);
  const cells = run.cells.filter((_, i) => i % step === 0);
  const first = run.anchor;
  const start = readings.flatMap((reading, i) => {
    if (!reading) return [];
    const values = Float64Array.from(cells, (cell) => {
      const value = leafValue(book, cut.leaves[i]!, rowOf(cell) - rowOf(first), columnOf(cell) - columnOf(first));
      return (typeof value === "number" ? value : NaN) * reading.factor;
    });
    return [entry(reading.role, 1 << i, values)];
  });
  const mask = explanation.entry.mask;
  const right = derive(start, [target.role], cells.length, false)
    .entries(target.role)
    .filter((found) => found.mask === mask || explanation.entry.role !== target.role)
    .sort((a, b) => a.cost - b.cost)[0];
  if (!right) return null;
  const comparison: { cell: string; hand: number; right: number }[] = [];
  let largest = 0;
  let worst = "";
  cells.forEach((cell, i) => {
    const hand = book.value(run.sheet, rowOf(cell), columnOf(cell));
    const value = right.values[i]! / target.factor;
    if (typeof hand !== "number" || !(value - value === 0)) return;
    const name = cellName(rowOf(cell), columnOf(cell));
    if (comparison.length < 200) comparison.push({ cell: name, hand, right: value });
    const error = Math.abs(hand - value) / Math.abs(value);
    if (error > largest && error < Infinity) {
      largest = error;
      worst = name;
    }
  });
  return worst === "" ? null : { largest, worst, comparison };
}

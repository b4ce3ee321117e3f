import type { Form, SheetIndex } from "./book";
import { cellKey, columnOf, rowOf } from "./workbook";

/** Cells that hold the same formula in relative form, down a column or along a row. */
export interface Run {
  readonly sheet: number;
  readonly form: Form;
  /** cell keys in order */
  readonly cells: readonly number[];
  /** the cell that stands for all: not the first, where a reference and its locked twin can coincide */
  readonly anchor: number;
  readonly direction: "down" | "across" | "single";
}

/** A cell that departs from the run around it. */
export interface Break {
  readonly sheet: number;
  readonly cell: number;
  /** null where a number stands instead of a formula */
  readonly form: Form | null;
  readonly run: Run;
}

export interface Structure {
  readonly runs: readonly Run[];
  readonly breaks: readonly Break[];
}

/** Finds the runs of a sheet, and the cells that interrupt them. */
export function structureOf(sheet: SheetIndex): Structure {
  const taken = new Set<number>();
  const runs: Run[] = [];
  const breaks: Break[] = [];
  const byColumn = new Map<number, number[]>();
  for (const key of sheet.sheet.cells.keys()) {
    const column = columnOf(key);
    const list = byColumn.get(column);
    if (list) list.push(key);
    else byColumn.set(column, [key]);
  }
  for (const keys of byColumn.values()) {
    keys.sort((a, b) => a - b);
    for (const segment of segments(keys, sheet, (a, b) => rowOf(b) - rowOf(a) === 1)) {
      takeRuns(segment, sheet, "down", 3, taken, runs, breaks);
    }
  }
  const left = [...sheet.forms.keys()].filter((key) => !taken.has(key));
  const byRow = new Map<number, number[]>();
  for (const key of left) {
    const row = rowOf(key);
    const list = byRow.get(row);
    if (list) list.push(key);
    else byRow.set(row, [key]);
  }
  for (const [row, keys] of byRow) {
    const first = Math.min(...keys.map(columnOf));
    const last = Math.max(...keys.map(columnOf));
    const whole: number[] = [];
    for (let column = first; column <= last && last - first < 2000; column++) {
      const key = cellKey(row, column);
      if (sheet.sheet.cells.has(key) && !taken.has(key)) whole.push(key);
    }
    for (const segment of segments(whole, sheet, (a, b) => columnOf(b) - columnOf(a) === 1)) {
      takeRuns(segment, sheet, "across", 3, taken, runs, breaks);
    }
  }
  for (const keys of byColumn.values()) {
    for (const segment of segments(
      keys.filter((key) => !taken.has(key)),
      sheet,
      (a, b) => rowOf(b) - rowOf(a) === 1,
    )) {
      takeRuns(segment, sheet, "down", 2, taken, runs, breaks);
    }
  }
  for (const key of left) {
    if (taken.has(key)) continue;
    const form = sheet.forms.get(key)!;
    const mate = cellKey(rowOf(key), columnOf(key) + 1);
    const pair = !taken.has(mate) && sheet.forms.get(mate)?.key === form.key;
    const cells = pair ? [key, mate] : [key];
    for (const cell of cells) taken.add(cell);
    runs.push({
      sheet: sheet.number,
      form,
      cells,
      anchor: cells[cells.length - 1]!,
      direction: pair ? "across" : "single",
    });
  }
  return { runs, breaks };
}

/** Neighbouring cells that hold numbers or formulas. */
function* segments(
  keys: readonly number[],
  sheet: SheetIndex,
  follows: (a: number, b: number) => boolean,
): Generator<number[]> {
  let current: number[] = [];
  for (const key of keys) {
    const cell = sheet.sheet.cells.get(key)!;
    const holds = cell.formula !== undefined || typeof cell.value === "number";
    if (current.length > 0 && (!holds || !follows(current[current.length - 1]!, key))) {
      yield current;
      current = [];
    }
    if (holds) current.push(key);
  }
  if (current.length > 0) yield current;
}

/** Takes the forms that hold a segment, or a stretch of it, together. */
function takeRuns(
  segment: readonly number[],
  sheet: SheetIndex,
  direction: "down" | "across",
  least: number,
  taken: Set<number>,
  runs: Run[],
  breaks: Break[],
): void {
  const counts = new Map<string, number[]>();
  for (const key of segment) {
    const form = sheet.forms.get(key);
    if (!form || taken.has(key)) continue;
    const list = counts.get(form.key);
    if (list) list.push(key);
    else counts.set(form.key, [key]);
  }
  for (const cells of counts.values()) {
    // in a row of three the middle or one end can depart from the other two
    const twoOfThree = direction === "across" && cells.length === 2 && segment.length >= 3 && gapOfOne(cells);
    if (cells.length < least && !twoOfThree) continue;
    const form = sheet.forms.get(cells[0]!)!;
    const before = segment[segment.indexOf(cells[0]!) - 1];
    const run: Run = { sheet: sheet.number, form, cells, anchor: cells[1]!, direction };
    runs.push(run);
    for (const cell of cells) taken.add(cell);
    if (before !== undefined && startsTyped(sheet, before, cells[0]!, direction))
      breaks.push({ sheet: sheet.number, cell: before, form: null, run });
    const from = segment.indexOf(cells[0]!);
    const to = segment.indexOf(cells[cells.length - 1]!);
    for (let i = from - 1; i <= to + 1; i++) {
      const key = segment[i];
      if (key === undefined || taken.has(key)) continue;
      const other = sheet.forms.get(key) ?? null;
      const inside = i > from && i < to;
      // at an end only a formula of its own kind can be a departure; between, few cells must face many
      if (!inside && (!other || cells.length < 3)) continue;
      const same = other ? (counts.get(other.key)?.length ?? 0) : 1;
      if (same * 3 > cells.length && !(same === 1 && cells.length >= 2 && inside)) continue;
      breaks.push({ sheet: sheet.number, cell: key, form: other, run });
      if (other) taken.add(key);
    }
  }
}

/** Whether a typed number stands where a run should begin: beside it two other runs begin one cell earlier. */
function startsTyped(sheet: SheetIndex, before: number, first: number, direction: "down" | "across"): boolean {
  if (direction !== "down" || sheet.forms.has(before) || rowOf(first) - rowOf(before) !== 1) return false;
  const above = sheet.sheet.cells.get(cellKey(rowOf(before) - 1, columnOf(before)));
  if (above && (above.formula !== undefined || typeof above.value === "number")) return false;
  let others = 0;
  for (let column = columnOf(before) - 12; column <= columnOf(before) + 12; column++) {
    if (column < 0 || column === columnOf(before)) continue;
    const form = sheet.forms.get(cellKey(rowOf(before), column));
    if (form && sheet.forms.get(cellKey(rowOf(first), column)) === form) others++;
  }
  return others >= 2;
}

const gapOfOne = ([a, b]: readonly number[]): boolean => columnOf(b!) - columnOf(a!) === 2;

import type { Book } from "./book";
import { isUnitOnly } from "./words";
import { cellKey } from "./workbook";

/** The texts that stand around a cell, nearest first. */
export interface Labels {
  /** above, up to the header of the column */
  readonly above: readonly string[];
  /** to the left in the same row */
  readonly left: readonly string[];
  /** directly to the right: a unit, or a remark */
  readonly right: string | null;
  /** what stands to the right is the name: nothing does to the left, and the column's other numbers have one too */
  readonly namedRight: boolean;
  /** formulas around are filled along rows: names stand at the left, cases on top */
  readonly alongRows: boolean;
  /** formulas around are filled down columns: names stand on top */
  readonly downColumns: boolean;
  /** of a chart with one input along the top and one down the side, the two names in its corner */
  readonly corner: string | null;
  /** where the cell stands in such a chart */
  readonly axis: "top" | "side" | "inside";
  /** text above a chart's corner or a block's header */
  readonly title: string | null;
  readonly name: string | null;
  /** a blank row lies between the cell's numbers and the text above */
  readonly aboveApart: boolean;
  /** blank columns lie between the cell and the text at the left, or another block of numbers and a blank column */
  readonly leftApart: "no" | "blank" | "block";
  /** a unit at the right end of the numbers in the row */
  readonly unitAtEnd: string | null;
}

const furthest = 2000; // rows above which a header is looked for

type Text = string | null | undefined;

/** What stands in a cell as a label: text typed in, not the result of a formula. undefined for a blank cell. */
function textAt(book: Book, sheet: number, row: number, column: number): Text {
  if (row < 0 || column < 0) return undefined;
  const cell = book.sheets[sheet]!.sheet.cells.get(cellKey(row, column));
  if (!cell) return undefined;
  if (cell.formula !== undefined || typeof cell.value !== "string") return cell.value === "" ? undefined : null;
  const text = cell.value.trim();
  if (text === "") return undefined;
  return /^[-+]?\d+([.,]\d+)?$/.test(text) ? null : text;
}

/** Finds the labels of one cell. */
export function labelsOf(book: Book, sheet: number, row: number, column: number): Labels {
  const above = scan((step) => textAt(book, sheet, row - step, column), row);
  const left = scan((step) => textAt(book, sheet, row, column - step), column, 5);
  const right = textAt(book, sheet, row, column + 1) ?? null;
  const axis = cornerOf(book, sheet, row, column);
  const isHeadedTwice = above.texts.length > 0 && left.texts.length > 0;
  const filled = isHeadedTwice ? filledDirection(book, sheet, row, column) : null;
  const headerRow = row - above.reach;
  return {
    above: above.texts,
    left: left.texts,
    right,
    namedRight: left.texts.length === 0 && isNameRight(book, sheet, row, column),
    alongRows: isHeadedTwice && filled === "along",
    downColumns: isHeadedTwice && filled === "down",
    corner: axis?.text ?? null,
    axis: axis?.axis ?? "inside",
    title: axis ? axis.title : above.texts.length ? titleOver(book, sheet, headerRow, column) : null,
    name: book.nameOf.get(`${sheet}:${cellKey(row, column)}`) ?? null,
    aboveApart: above.gap > 0 && emptyRowBetween(book, sheet, row, headerRow, column),
    leftApart: left.gap === 0 ? "no" : left.block ? "block" : "blank",
    unitAtEnd: textAfterNumbers(book, sheet, row, column),
  };
}

/** Whether a row without any cell near a column lies between a cell and its header. */
function emptyRowBetween(book: Book, sheet: number, row: number, headerRow: number, column: number): boolean {
  const { cells } = book.sheets[sheet]!.sheet;
  for (let r = row; r > headerRow; r--) {
    if (cells.has(cellKey(r, column))) continue;
    let empty = true;
    for (let c = Math.max(0, column - 40); c <= column + 40 && empty; c++) empty = !cells.has(cellKey(r, c));
    if (empty) return true;
  }
  return false;
}

const longestRow = 60;

/** The first text behind the numbers to the right of a cell; null where a blank comes first. */
function textAfterNumbers(book: Book, sheet: number, row: number, column: number): string | null {
  for (let step = 1; step <= longestRow; step++) {
    const text = textAt(book, sheet, row, column + step);
    if (text === undefined) return null;
    if (text !== null) return text;
  }
  return null;
}

/**
 * Walks over numbers to the first texts; one blank on the way is passed over, `most` where no number was met yet, and one
 * between texts. `gap` is the number of blanks before the first text.
 */
function scan(
  look: (step: number) => Text,
  limit: number,
  most = 1,
): { texts: string[]; reach: number; gap: number; block: boolean } {
  const texts: string[] = [];
  let blanks = 0;
  let reach = 0;
  let gap = 0;
  let numbers = false;
  let block = false; // numbers behind a blank: a block of its own
  for (let step = 1; step <= Math.min(limit, furthest); step++) {
    const text = look(step);
    if (text === undefined) {
      blanks++;
      if (blanks > (numbers || texts.length > 0 ? 1 : most)) break;
      continue;
    }
    if (text === null) {
      if (texts.length > 0 || blanks > 1) break;
      numbers = true;
      block ||= blanks > 0;
      continue;
    }
    if (texts.length > 0 && blanks > 0) {
      // after a gap only a header over its unit row still belongs to the cell
      if (texts.length > 1 || texts[0]!.length > 10 || !isUnitOnly(texts[0]!)) break;
    }
    if (texts.length === 0) gap = blanks;
    texts.push(text);
    reach = step;
    blanks = 0;
    if (texts.length === 3) break;
  }
  return { texts, reach, gap, block };
}

function isNameRight(book: Book, sheet: number, row: number, column: number): boolean {
  const hasOne = (r: number): boolean =>
    typeof textAt(book, sheet, r, column) !== "string" &&
    typeof textAt(book, sheet, r, column + 1) === "string" &&
    textAt(book, sheet, r, column + 2) !== null;
  return hasOne(row) && (hasOne(row - 1) || hasOne(row + 1));
}

/** How the formulas around a cell are filled: those of its column, or, where it holds none, those of its row. */
function filledDirection(book: Book, sheet: number, row: number, column: number): "along" | "down" | null {
  const { forms } = book.sheets[sheet]!;
  let along = 0;
  let down = 0;
  const look = (r: number, c: number): void => {
    const form = forms.get(cellKey(r, c));
    if (!form) return;
    if (forms.get(cellKey(r, c + 1)) === form || (c > 0 && forms.get(cellKey(r, c - 1)) === form)) along++;
    if (forms.get(cellKey(r + 1, c)) === form || (r > 0 && forms.get(cellKey(r - 1, c)) === form)) down++;
  };
  // a text in the column begins another block
  for (let r = row; r >= 0 && r > row - 30 && typeof textAt(book, sheet, r, column) !== "string"; r--) look(r, column);
  for (let r = row + 1; r < row + 30 && typeof textAt(book, sheet, r, column) !== "string"; r++) look(r, column);
  if (along + down === 0) for (let c = Math.max(0, column - 30); c <= column + 30; c++) look(row, c);
  if (along > 1 && along > down * 2) return "along";
  return down > 1 && down > along * 2 ? "down" : null;
}

/** The corner of a two-way chart: text where the numbers along the top and the numbers down the side meet. */
function cornerOf(
  book: Book,
  sheet: number,
  row: number,
  column: number,
): { text: string; title: string | null; axis: Labels["axis"] } | null {
  const cells = book.sheets[sheet]!.sheet.cells;
  const number = (r: number, c: number): boolean => {
    const cell = r < 0 || c < 0 ? undefined : cells.get(cellKey(r, c));
    return !!cell && typeof cell.value === "number";
  };
  const typed = (r: number, c: number): boolean => number(r, c) && cells.get(cellKey(r, c))!.formula === undefined;
  let top = row;
  while (row - top < furthest && number(top - 1, column)) top--;
  let left = column;
  while (number(row, left - 1)) left--;
  // inside the chart the corner is at the crossing; on the side axis right above it; on the top axis right before it
  for (const [r, c] of [
    [top, left],
    [top - 1, column],
    [row, left - 1],
  ] as const) {
    const text = textAt(book, sheet, r, c);
    if (text === null || (text && !isCorner(text))) continue;
    if (typed(r, c + 1) && typed(r, c + 2) && typed(r + 1, c) && number(r + 1, c + 1)) {
      const axis = r === row ? "top" : c === column ? "side" : "inside";
      if (text === undefined) {
        const described = describedOver(book, sheet, r, c);
        if (described) return { ...described, axis };
        continue;
      }
      return { text, title: titleOver(book, sheet, r, c) ?? titleOver(book, sheet, r, column), axis };
    }
  }
  return null;
}

/** The line over a chart with an empty corner: "Natural frequency, Hz: mass in kg across, stiffness in N/mm down". */
function describedOver(
  book: Book,
  sheet: number,
  corner: number,
  left: number,
): { text: string; title: string | null } | null {
  const line = lineOver(book, sheet, corner, left);
  if (line === null) return null;
  const clauses = line.split(/(?<=[,;:]|\)|\band\b|\bund\b|\bet\b)\s+|\s+(?=(?:from|for)\b)/i);
  const first = clauses.findIndex((clause) => direction.test(clause));
  const title = clauses
    .slice(0, first)
    .join(" ")
    .replace(/[\s,;:]+$/, "");
  const axes = clauses
    .slice(first)
    .map((clause) => clause.replace(/^(from|for|and|und|et)\s+|[\s,;:]+$|\s+(and|und|et)$/gi, ""));
  return { text: axes.join(" | "), title: title === "" ? null : title };
}

/** The text in one of the three rows over a chart that names both its axes: above its corner, else all of the next row. */
function lineOver(book: Book, sheet: number, corner: number, left: number): string | null {
  const namesBoth = (line: string): boolean =>
    /\b(across|along|waagere?cht|quer|horizontal\w*)\b/i.test(line) && /\b(down|senkrecht|vertical\w*)\b/i.test(line);
  for (let row = corner - 1; row >= Math.max(0, corner - 3); row--) {
    const text = textAt(book, sheet, row, left);
    if (typeof text === "string" && namesBoth(text)) return text;
  }
  const texts: string[] = [];
  for (let column = 0; column < 12; column++) {
    const text = textAt(book, sheet, corner - 1, column);
    if (typeof text === "string") texts.push(text);
  }
  const line = texts.join(": ");
  return namesBoth(line) ? line : null;
}

const direction = /\b(across|along|down|waagere?cht|quer|senkrecht|horizontal\w*|vertical\w*)\b/i;

const isCorner = (text: string): boolean =>
  text.length > 2 && /\\|↓|→|\bvs\.?\b|\bdown\b.*\bacross\b|\s[|/]\s|\p{L}\s*[|]\s*\p{L}/iu.test(text);

/** The nearest text in the rows above a header: in its own column, else at the left end of the row. */
function titleOver(book: Book, sheet: number, headerRow: number, column: number): string | null {
  for (let row = headerRow - 1; row >= 0 && headerRow - row <= 3; row--) {
    for (let c = column; c >= 0; c--) {
      const text = textAt(book, sheet, row, c);
      if (typeof text === "string") return text;
      if (text === null) return null;
    }
  }
  return null;
}

/** Texts that hold for a whole sheet: its name and what stands in its first rows before any number. */
export function sheetTitle(book: Book, sheet: number): string {
  const index = book.sheets[sheet]!;
  const texts = [index.name];
  for (let row = 0; row < Math.min(4, index.rows); row++) {
    const text = textAt(book, sheet, row, 0);
    if (typeof text === "string" && text.length > 12) texts.push(text);
  }
  return texts.join(" | ");
}

import { type Book, referencesIn } from "./book";
import { sheetTitle } from "./labels";
import type { Meaning } from "./meaning";
import type { Role } from "./roles";
import type { Run } from "./runs";
import { cellKey, columnOf, rowOf } from "./workbook";
import { plainText } from "./words";

const undampedWords =
  /\b(undamped|no damp\w*|zero damp\w*|without damp\w*|damping (is )?(neglected|ignored|zero)|neglect\w* damp\w*|ignor\w* damp\w*|damp\w* neglected|un-damped|ungedampft\w*|ohne dampf\w*|dampfungsfrei\w*|dampfung vernachlass\w*|ohne d\b|non amorti\w*|sans amort\w*|amortissement (nul|neglige)\w*|approx\w*|quick|rough|simplified|simple|naherung\w*|uberschlag\w*|approch\w*|approximati\w*|estimate|schatz\w*|faustformel|d ?= ?0|zeta ?= ?0|xi ?= ?0|1\/\(r ?\^? ?2 ?- ?1\)|1\/\|?\(?1 ?- ?r)/;

/** Whether the labels of a result say that damping is left out on purpose. */
export function saysUndamped(book: Book, run: Run, meaning: Meaning): boolean {
  if (undampedWords.test(meaning.text)) return true;
  const title = plainText(sheetTitle(book, run.sheet));
  return undampedWords.test(title) && !/\b(except|unless|sauf|ausser)\b/.test(title);
}

const dampingRoles = new Set<Role>(["zeta", "eta", "c", "cEach", "Q", "logdec"]);

/**
 * Whether the block of a formula has a damping that is not zero and that another formula of the block uses. The block is
 * the table (formulas of the same row, or of the same column where the table runs across), else the sheet.
 */
export function blockHasDamping(
  book: Book,
  run: Run,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
): boolean {
  return blockInputs(book, run).some(([sheet, row, column]) => {
    const value = book.value(sheet, row, column);
    if (typeof value !== "number" || value === 0) return false;
    const best = meaningAt(sheet, row, column).candidates[0];
    return best !== undefined && best.weight >= 3 && dampingRoles.has(best.role);
  });
}

/** The cells that the formulas of a run's block depend on, helper cells included. */
export function blockInputs(book: Book, run: Run): [sheet: number, row: number, column: number][] {
  const index = book.sheets[run.sheet]!;
  const first = run.anchor;
  const own = new Set(run.cells);
  const start: number[] = [];
  const [top, bottom] = run.direction === "across" ? rowsAround(index.sheet.cells, first) : [0, Infinity];
  for (const key of index.forms.keys()) {
    if (own.has(key)) continue;
    if (run.direction === "down" && rowOf(key) !== rowOf(first)) continue;
    if (run.direction === "across" && columnOf(key) !== columnOf(first)) continue;
    if (rowOf(key) < top || rowOf(key) > bottom) continue;
    start.push(key);
    if (start.length > 60) break;
  }
  return precedents(
    book,
    start.map((key) => [run.sheet, rowOf(key), columnOf(key)]),
  );
}

/** First and last row of the stretch of filled cells above and below a cell; one blank cell does not end it. */
function rowsAround(cells: ReadonlyMap<number, unknown>, key: number): [top: number, bottom: number] {
  const column = columnOf(key);
  const filled = (row: number): boolean => row >= 0 && cells.has(cellKey(row, column));
  let top = rowOf(key);
  let bottom = top;
  while (filled(top - 1) || filled(top - 2)) top--;
  while (filled(bottom + 1) || filled(bottom + 2)) bottom++;
  return [top, bottom];
}

/** Whether a run's formula depends on its own result. */
export function isCircular(book: Book, run: Run): boolean {
  const own = `${run.sheet}:${rowOf(run.anchor)}:${columnOf(run.anchor)}`;
  return precedents(book, [[run.sheet, rowOf(run.anchor), columnOf(run.anchor)]]).some(
    (place) => place.join(":") === own,
  );
}

/** The single cells that formulas depend on, directly and through other formulas; the first 300 formulas are followed. */
function precedents(
  book: Book,
  start: readonly [sheet: number, row: number, column: number][],
): [sheet: number, row: number, column: number][] {
  const found: [number, number, number][] = [];
  const seen = new Set<string>();
  const queue = [...start];
  for (let i = 0; i < queue.length && i < 300; i++) {
    const [sheet, row, column] = queue[i]!;
    const form = book.sheets[sheet]?.forms.get(cellKey(row, column));
    if (!form) continue;
    for (const { sheet: name, from, to } of referencesIn(form.tree)) {
      if (to || from.row === null || from.column === null) continue;
      const place: [number, number, number] = [
        name === null ? sheet : book.sheetNumber(name),
        from.row + (from.rowFixed ? 0 : row - form.row),
        from.column + (from.columnFixed ? 0 : column - form.column),
      ];
      const key = place.join(":");
      if (seen.has(key)) continue;
      seen.add(key);
      found.push(place);
      queue.push(place);
    }
  }
  return found;
}

/** The numbers in a run's own row, column or, for a single formula, near it on the sheet. */
export function neighbours(book: Book, run: Run): [sheet: number, row: number, column: number][] {
  const { cells } = book.sheets[run.sheet]!.sheet;
  const row = rowOf(run.anchor);
  const column = columnOf(run.anchor);
  const found: [number, number, number][] = [];
  const add = (r: number, c: number): void => {
    const cell = r < 0 || c < 0 ? undefined : cells.get(cellKey(r, c));
    if (typeof cell?.value === "number") found.push([run.sheet, r, c]);
  };
  for (let c = 0; c < 60; c++) if (run.direction !== "across") add(row, c);
  for (let r = row - 40; r < row + 40; r++) if (run.direction !== "down") add(r, column);
  return found;
}

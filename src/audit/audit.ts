import { cellName } from "../formula/references";
import { type Book, indexBook } from "./book";
import { analyser } from "./analyse";
import { breakFindings } from "./break-findings";
import type { Finding } from "./finding";
import { structureOf } from "./runs";
import { columnOf, rowOf, type Workbook } from "./workbook";

export interface AuditOptions {
  /** called with the number of formula cells done and their total */
  readonly progress?: (done: number, total: number) => void;
}

/** Audits every formula of a workbook. Reads only; the workbook is not changed. */
export function auditWorkbook(workbook: Workbook, options: AuditOptions = {}): Finding[] {
  const book: Book = indexBook(workbook);
  const structures = book.sheets.map((sheet) => structureOf(sheet));
  const total = book.sheets.reduce((sum, sheet) => sum + sheet.forms.size, 0);
  const analyse = analyser(
    book,
    structures.flatMap(({ runs }) => runs),
  );
  const findings: Finding[] = [];
  let done = 0;
  for (const { runs, breaks } of structures) {
    for (const run of runs) {
      findings.push(...analyse.findings(run));
      done += run.cells.length;
      options.progress?.(done, total);
    }
    findings.push(...breakFindings(book, breaks, analyse));
  }
  const order = new Map(book.sheets.map(({ name }, number) => [name, number]));
  return findings.sort((a, b) => order.get(a.sheet)! - order.get(b.sheet)!);
}

/** "E5:E24" for neighbouring cells down a column or along a row, one entry for each stretch without a gap. */
export function ranges(cells: readonly number[]): { text: string; cells: number[] }[] {
  const found: { text: string; cells: number[] }[] = [];
  let current: number[] = [];
  const close = (): void => {
    if (current.length === 0) return;
    const first = nameOf(current[0]!);
    const last = nameOf(current[current.length - 1]!);
    found.push({ text: first === last ? first : `${first}:${last}`, cells: current });
    current = [];
  };
  for (const cell of cells) {
    const before = current[current.length - 1];
    const down = before !== undefined && columnOf(before) === columnOf(cell) && rowOf(cell) === rowOf(before) + 1;
    const across = before !== undefined && rowOf(before) === rowOf(cell) && columnOf(cell) === columnOf(before) + 1;
    const turns = current.length > 1 && (rowOf(current[0]!) === rowOf(current[1]!) ? !across : !down);
    if (before !== undefined && (turns || (!down && !across))) close();
    current.push(cell);
  }
  close();
  return found;
}

const nameOf = (key: number): string => cellName(rowOf(key), columnOf(key));

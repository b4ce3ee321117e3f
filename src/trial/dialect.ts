/** Formulas between the workbook file's writing and the trial sheet's: both ways. */
import { parseStructRef, stringifyTokens, tokenize } from "@borgar/fx";
import { type Book, type Table, columnLetters } from "./book";

export interface Place {
  sheet: string;
  row: number;
  column: number;
}

/** How Excel writes a function of an add-in into a file: `_xldudf_PLINTH_ABSTRANS` is `PLINTH.ABSTRANS`. */
const addInPrefix = "_xldudf_";
const newerFunction = /^(?:_xlfn\.|_xlws\.|_xlpm\.)+/i;

export function functionFromFile(name: string): string {
  const short = name.replace(newerFunction, "");
  if (short.toUpperCase() === "LOG10") return "LOG";
  if (!short.toLowerCase().startsWith(addInPrefix)) return short;
  return short.slice(addInPrefix.length).replace("_", ".");
}

/** A formula's functions as the file wants them; a namespace of ours becomes the add-in prefix. */
export function formulaToFile(formula: string, namespace: string): string {
  const ours = `${namespace}.`;
  const tokens = safeTokens(formula.replace(/\\"/g, '""'));
  if (!tokens) return formula;
  for (const token of tokens) {
    if (token.type === "func" && token.value.toUpperCase().startsWith(ours))
      token.value = `${addInPrefix}${namespace}_${token.value.slice(ours.length).toUpperCase()}`;
  }
  return stringifyTokens(tokens)
    .replace(/^=/, "")
    .replace(/#REF(?!!)/g, "#REF!");
}

/** A typed formula with LOG for LOG10, outside of texts. */
export function withoutLog10(formula: string): string {
  const tokens = safeTokens(formula);
  if (!tokens) return formula;
  for (const token of tokens) if (token.type === "func" && token.value.toUpperCase() === "LOG10") token.value = "LOG";
  return stringifyTokens(tokens);
}

/** The names that the trial sheet cannot hold itself: constants, formulas, and names of one sheet. */
export type NameTexts = (name: string, sheet: string) => string | undefined;

const deepest = 16;

/** A formula of the file as the trial sheet understands it: table references as cells, other names filled in. */
export function formulaFromFile(formula: string, place: Place, book: Book, nameText: NameTexts, depth = 0): string {
  const tokens = safeTokens(formula);
  if (!tokens) return formula;
  for (const token of tokens) {
    if (token.type === "func") token.value = functionFromFile(token.value);
    // The library marks a quotation mark inside a text by a backslash, a file by doubling it.
    else if (token.type === "string") token.value = token.value.replace(/(?<=.)""(?=.)/g, '\\"');
    else if (token.type === "structured") token.value = cellsOf(token.value, place, book) ?? "#REF";
    else if (token.type === "error" && token.value === "#REF!") token.value = "#REF";
    else if (token.type === "range_named") {
      const text = nameText(token.value, place.sheet);
      if (text === undefined || depth > deepest) continue;
      const inner = formulaFromFile(text, place, book, nameText, depth + 1);
      token.value = /^(?:(?:'[^']+'|[\w.]+)!)?[\w.$]+$/.test(inner) ? inner : `(${inner})`;
    }
  }
  return stringifyTokens(tokens);
}

export function safeTokens(formula: string): ReturnType<typeof tokenize> | undefined {
  try {
    return tokenize(formula, { withLocation: false, negativeNumbers: false });
  } catch {
    return undefined;
  }
}

/** A reference into a table as a reference to cells. */
function cellsOf(reference: string, place: Place, book: Book): string | undefined {
  const parsed = parseStructRef(reference);
  if (!parsed) return undefined;
  const table = parsed.table
    ? book.tables.find(({ name }) => name.toLowerCase() === parsed.table!.toLowerCase())
    : book.tables.find((each) => each.sheet === place.sheet && holds(each, place));
  const columns = table && columnsOf(table, parsed.columns ?? []);
  const rows = table && rowsOf(table, parsed.sections ?? [], place);
  if (!columns || !rows) return undefined;
  // "this row" moves with its row when copied down; everything else stays where the table is.
  const [top, bottom] = [rows.top, rows.bottom].map((row) => (rows.moves ? "" : "$") + (row + 1));
  const [left, right] = columns.map((column) => "$" + columnLetters(column));
  const cells = left === right && top === bottom ? `${left}${top}` : `${left}${top}:${right}${bottom}`;
  return table.sheet === place.sheet ? cells : `${quoteSheet(table.sheet)}!${cells}`;
}

const holds = (table: Table, { row, column }: Place): boolean =>
  row >= table.top && row <= table.bottom && column >= table.left && column <= table.right;

function columnsOf(table: Table, names: readonly string[]): [number, number] | undefined {
  if (names.length === 0) return [table.left, table.right];
  const found = names.map((name) => table.columns.findIndex((each) => each.toLowerCase() === name.toLowerCase()));
  if (found.includes(-1)) return undefined;
  return [table.left + Math.min(...found), table.left + Math.max(...found)];
}

type Rows = { top: number; bottom: number; moves?: boolean };

function rowsOf(table: Table, sections: readonly string[], place: Place): Rows | undefined {
  const data = { top: table.top + table.headerRows, bottom: table.bottom - table.totalRows };
  if (sections.length === 0) return data;
  const words = sections.map((section) => section.toLowerCase());
  if (words.includes("this row")) return { top: place.row, bottom: place.row, moves: true };
  if (words.includes("all")) return { top: table.top, bottom: table.bottom };
  const parts: Rows[] = [];
  if (words.includes("headers") && table.headerRows) parts.push({ top: table.top, bottom: data.top - 1 });
  if (words.includes("data")) parts.push(data);
  if (words.includes("totals") && table.totalRows) parts.push({ top: data.bottom + 1, bottom: table.bottom });
  if (parts.length < words.length) return undefined;
  return { top: Math.min(...parts.map(({ top }) => top)), bottom: Math.max(...parts.map(({ bottom }) => bottom)) };
}

export function quoteSheet(name: string): string {
  return /^[A-Za-z_][\w.]*$/.test(name) && !/^[A-Za-z]{1,3}\d+$/.test(name) ? name : `'${name.replaceAll("'", "''")}'`;
}

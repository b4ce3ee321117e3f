/** An .xlsx file as workbook data for the spreadsheet, with what is needed to write it back as it was. */
import { load, registries } from "@odoo/o-spreadsheet";
import { translateFormulaToA1, translateFormulaToR1C1 } from "@borgar/fx";
import {
  type Book,
  type DefinedName,
  type StoredCell,
  readBook,
  sharedTexts,
  storedCells,
  withRelativeRelations,
} from "./book";
import { type NameTexts, type Place, formulaFromFile, safeTokens } from "./dialect";
import { type Surroundings, narrowed } from "./intersect";
import { mendFormats } from "./formats";
import { lossesOf } from "./losses";
import { notesIn } from "./notes";
import { asText } from "./texts";
import { NotAWorkbook, type Parts, readParts } from "./zip";

/** A formula as the file had it; `shown` is what the trial sheet made of it, filled in once the sheet stands. */
export interface Origin {
  formula: string;
  kind: string;
  dynamic: boolean;
  shown?: string;
}

export interface Opened {
  data: unknown;
  book: Book;
  /** sheet name → cell → formula as it was */
  origins: Map<string, Map<string, Origin>>;
  /** defined names that the trial sheet cannot hold and hands back on saving */
  otherNames: DefinedName[];
  losses: string[];
  /** what the pane keeps in the workbook */
  notes: string | null;
}

const mostCells = 500_000;

interface SheetData {
  name: string;
  rowNumber: number;
  styles: Record<string, number>;
  cells: Record<string, string | undefined>;
}
interface WorkbookData {
  sheets: SheetData[];
  formats?: Record<string, string>;
  namedRanges?: Record<string, string>;
}

export function openWorkbook(bytes: Uint8Array): Opened {
  const parts = readParts(bytes);
  refuseTooLarge(parts);
  const book = readBook(parts);
  if (book.sheets.length === 0) throw new NotAWorkbook("There is no worksheet inside.");
  const data = convert(parts, book);
  const { ranges, otherNames, nameText } = sortNames(book);
  data.namedRanges = ranges;
  const around: Surroundings = { takesRange, cellsOfName: (name) => lookUp(ranges, name) };
  const texts = sharedTexts(parts);
  const origins = new Map<string, Map<string, Origin>>();
  for (const sheet of data.sheets) {
    const part = book.sheets.find(({ name }) => name === sheet.name)?.part;
    const cells = [...storedCells(parts[part ?? ""] ?? "", texts)];
    keepTyped(sheet, cells);
    origins.set(sheet.name, fillFormulas(sheet, cells, book, nameText, around));
  }
  const losses = lossesOf(parts);
  const dropped = mendFormats(parts, (data.formats ??= {}));
  if (dropped.length > 0) losses.push(`number formats ${dropped.map((code) => `“${code}”`).join(", ")}`);
  if (book.startsIn1904) losses.push("dates counted from 1904 (they show four years and a day early)");
  return { data, book, origins, otherNames, losses, notes: notesIn(parts) };
}

function refuseTooLarge(parts: Parts): void {
  let cells = 0;
  for (const [name, xml] of Object.entries(parts))
    if (name.startsWith("xl/worksheets/")) cells += xml.split("</c>").length - 1;
  if (cells > mostCells)
    throw new NotAWorkbook(`It has ${cells.toLocaleString("en")} filled cells; the trial sheet takes up to 500,000.`);
}

/** The library's own reading, in the workbook's order of sheets. */
function convert(parts: Parts, book: Book): WorkbookData {
  const all = Object.entries(withRelativeRelations(parts));
  const readable = Object.fromEntries(all.filter(([name]) => /\.(xml|rels)$/.test(name)));
  let data: WorkbookData;
  try {
    data = load(readable) as unknown as WorkbookData;
  } catch (error) {
    throw new NotAWorkbook("Its contents could not be read.", { cause: error });
  }
  const order = (name: string): number => book.sheets.findIndex((sheet) => sheet.name === name);
  data.sheets.sort((a, b) => order(a.name) - order(b.name));
  return data;
}

const oneArea = /^(?:'(?:[^']|'')+'|[^'!,()]+)!\$?[A-Z]{1,3}\$?\d{1,7}(?::\$?[A-Z]{1,3}\$?\d{1,7})?$/i;
const goodName = /^[\p{L}_][\p{L}\p{N}_.]*$/u;

/** Names of one area go to the sheet as they are; the others are filled into formulas and handed back on saving. */
function sortNames(book: Book): { ranges: Record<string, string>; otherNames: DefinedName[]; nameText: NameTexts } {
  const ranges: Record<string, string> = {};
  const otherNames: DefinedName[] = [];
  for (const each of book.names) {
    const native = each.localTo === undefined && oneArea.test(each.refersTo) && goodName.test(each.name);
    if (native && !/hidden="1"/.test(each.attributes))
      ranges[each.name] = each.refersTo.replace(/\$(?=[A-Z]{0,3}\$?\d+(?::|$))/gi, "");
    else otherNames.push(each);
  }
  const nameText: NameTexts = (name, sheet) => {
    const same = otherNames.filter((each) => each.name.toLowerCase() === name.toLowerCase());
    const local = same.find(({ localTo }) => localTo !== undefined && book.sheets[localTo]?.name === sheet);
    return (local ?? same.find(({ localTo }) => localTo === undefined))?.refersTo;
  };
  return { ranges, otherNames, nameText };
}

function lookUp(ranges: Record<string, string>, name: string): string | undefined {
  const key = Object.keys(ranges).find((each) => each.toLowerCase() === name.toLowerCase());
  return key && ranges[key];
}

/** Whether the trial sheet's function takes a range as it is; of an unknown one that is supposed. */
export function takesRange(name: string, index: number): boolean {
  const known = (registries.functionRegistry as unknown as { content: Record<string, KnownFunction> }).content[name];
  if (!known) return true;
  const argument = known.args[Math.min(index, known.args.length - 1)];
  return argument?.acceptMatrix ?? false;
}
type KnownFunction = { args: { acceptMatrix?: boolean }[] };

/** Text that would read as a number, a date or a formula stays text; numbers are written as the library reads them. */
function keepTyped(sheet: SheetData, cells: StoredCell[]): void {
  for (const { address, text, number } of cells) {
    // The library leaves out the file's first style, which is the one of every plain cell.
    sheet.styles[address] ??= 1;
    if (number !== undefined && Number.isFinite(number) && /e/i.test(sheet.cells[address] ?? ""))
      sheet.cells[address] = String(number);
    if (text === undefined || text === "") continue;
    const current = sheet.cells[address];
    if (current !== undefined && current !== text) continue; // a link, or a cell that an array fills
    sheet.cells[address] = asText(text);
  }
}

function fillFormulas(
  sheet: SheetData,
  cells: StoredCell[],
  book: Book,
  nameText: NameTexts,
  around: Surroundings,
): Map<string, Origin> {
  const origins = new Map<string, Origin>();
  const shared = new Map<string, { formula: string; address: string }>();
  for (const cell of cells) {
    if (cell.formula === undefined) continue;
    const formula = ownFormula(cell, shared);
    if (!formula || sheet.cells[cell.address] === undefined || /t="dataTable"/.test(cell.kind)) continue;
    const place: Place = { sheet: sheet.name, row: cell.row, column: cell.column };
    const array = /\bt="array"/.test(cell.kind);
    const kind = array ? cell.kind : "";
    origins.set(cell.address, { formula, kind, dynamic: cell.dynamic });
    const last = Number(/\bref="[^"]*?(\d+)"/.exec(kind)?.[1] ?? 0);
    sheet.rowNumber = Math.max(sheet.rowNumber, last + 20);
    if (pointsOutside(formula)) continue; // the library puts the last values in place of links
    const plain = formulaFromFile(formula, place, book, nameText);
    sheet.cells[cell.address] = `=${array ? plain : narrowed(plain, place, around)}`;
  }
  return origins;
}

/** A shared formula is written once; the other cells get it moved to their own place. */
function ownFormula(cell: StoredCell, shared: Map<string, { formula: string; address: string }>): string | undefined {
  const index = /\bt="shared"/.test(cell.kind) ? /\bsi="(\d+)"/.exec(cell.kind)?.[1] : undefined;
  if (index === undefined) return cell.formula;
  if (cell.formula) {
    shared.set(index, { formula: cell.formula, address: cell.address });
    return cell.formula;
  }
  const master = shared.get(index);
  if (!master) return undefined;
  try {
    return translateFormulaToA1(translateFormulaToR1C1(master.formula, master.address), cell.address);
  } catch {
    return undefined;
  }
}

const pointsOutside = (formula: string): boolean =>
  formula.includes("[") &&
  (safeTokens(formula)?.some(({ type, value }) => type === "range" && /^'?\[\d+\]/.test(value)) ?? false);

import { readFileSync } from "node:fs";
import * as xlsx from "@e965/xlsx";
import { type Cell, cellKey, type DefinedName, type Sheet, type Workbook } from "../audit/workbook";
import { readTables } from "./tables";
import { checkArchive, UnreadableError } from "./zip";

/** Reads an .xlsx file into the audit's model. Throws UnreadableError with one line of reason; never writes. */
export function readBook(path: string): Workbook {
  let bytes: Buffer;
  try {
    bytes = readFileSync(path);
  } catch (error) {
    throw new UnreadableError(
      (error as NodeJS.ErrnoException).code === "ENOENT" ? "no such file" : "the file cannot be opened",
    );
  }
  checkArchive(bytes);
  return toWorkbook(parse(bytes));
}

function parse(bytes: Buffer): xlsx.WorkBook {
  try {
    return xlsx.read(bytes, {
      cellFormula: true,
      cellNF: true,
      cellText: false,
      cellHTML: false,
      bookFiles: true,
      dense: true,
    });
  } catch (error) {
    const message = error instanceof Error ? error.message : "";
    throw new UnreadableError(
      /password|encrypt/i.test(message) ? "the file is encrypted" : "the workbook inside the file is damaged",
    );
  }
}

function toWorkbook(book: xlsx.WorkBook): Workbook {
  const sheets = book.SheetNames.map((name) => toSheet(name, book.Sheets[name]));
  const names: DefinedName[] = (book.Workbook?.Names ?? []).map(({ Name, Ref, Sheet: index }) => {
    const sheet = index === undefined ? undefined : book.SheetNames[index];
    return sheet === undefined ? { name: Name, formula: Ref } : { name: Name, formula: Ref, sheet };
  });
  return { sheets, names, tables: readTables(book) };
}

function toSheet(name: string, sheet: xlsx.WorkSheet | undefined): Sheet {
  const cells = new Map<number, Cell>();
  const rows = (sheet?.["!data"] ?? []) as (xlsx.CellObject[] | undefined)[];
  rows.forEach((row, r) => {
    row?.forEach((cell, c) => {
      if (cell) addCell(cells, cellKey(r, c), cell);
    });
  });
  return { name, cells };
}

function addCell(cells: Map<number, Cell>, key: number, cell: xlsx.CellObject): void {
  const value = valueOf(cell);
  if (cell.f === undefined && (value === null || value === "")) return;
  const format = typeof cell.z === "string" && cell.z !== "General" ? cell.z : undefined;
  cells.set(key, {
    ...(cell.f === undefined ? {} : { formula: cell.f }),
    value,
    ...(format === undefined ? {} : { format }),
  });
}

function valueOf(cell: xlsx.CellObject): Cell["value"] {
  if (cell.t === "e") return { error: xlsx.utils.format_cell(cell) || "#VALUE!" };
  if (cell.t === "z" || cell.v === undefined) return null;
  if (cell.v instanceof Date) return cell.v.getTime() / 86_400_000 + 25_569;
  return cell.v;
}

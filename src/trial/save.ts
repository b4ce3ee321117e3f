/** The open workbook as an .xlsx file: the library writes the parts, this mends formulas, names and tables in them. */
import { registries } from "@odoo/o-spreadsheet";
import { strToU8, zipSync } from "fflate";
import { type Book, columnIndex, columnLetters } from "./book";
import { formulaToFile, quoteSheet } from "./dialect";
import { formatsToFile } from "./formats";
import type { WorkbookModel } from "./grid";
import { namespace } from "./metadata";
import { worksOnRanges } from "./intersect";
import { addNotes } from "./notes";
import { type Opened, type Origin, takesRange } from "./open";
import { attribute, decode, elements, encode, firstElement } from "./xml";

export interface Saved {
  bytes: Uint8Array;
  /** what this file does not keep */
  notes: string[];
}

type Source = Omit<Opened, "data" | "notes">;
type Files = Map<string, string>;

export async function saveWorkbook(
  model: WorkbookModel,
  source: Source | undefined,
  kept: string | null,
): Promise<Saved> {
  const exported = await model.exportXLSX();
  const files: Files = new Map();
  for (const file of exported.files) if ("content" in file) files.set(file.path, String(file.content));
  const notes = source ? [...source.losses] : [];
  const tablesKept = source ? restoreTableNames(files, model, source.book) : () => false;
  model.getters.getSheetIds().forEach((sheetId, index) => {
    const path = `xl/worksheets/sheet${index}.xml`;
    const origins = source?.origins.get(sheetId);
    files.set(path, mendCells(files.get(path) ?? "", model, sheetId, origins, tablesKept));
  });
  files.set("xl/styles.xml", formatsToFile(files.get("xl/styles.xml") ?? ""));
  files.set("xl/workbook.xml", mendWorkbook(files.get("xl/workbook.xml") ?? "", model, source, notes));
  addNotes(files, kept);
  const bytes = zipSync(Object.fromEntries([...files].map(([path, text]) => [path, strToU8(text)])));
  return { bytes, notes };
}

/** Every formula cell is written anew: unchanged formulas as the file had them, the others as plain as they can be. */
function mendCells(
  xml: string,
  model: WorkbookModel,
  sheetId: string,
  origins: Map<string, Origin> | undefined,
  tablesKept: (formula: string) => boolean,
): string {
  const { getters } = model;
  const cellsOfName = (name: string): string | undefined => {
    const range = getters.getNamedRange(name)?.range;
    return range && zoneText(range.zone);
  };
  return xml.replace(/<c\b([^>]*?)(?:\/>|>([\s\S]*?)<\/c>)/g, (whole, attributes: string, content = "") => {
    const address = attribute(attributes, "r") ?? "";
    const place = /^([A-Z]+)(\d+)$/.exec(address);
    if (!place) return whole;
    const position = { sheetId, col: columnIndex(place[1]!), row: Number(place[2]) - 1 };
    const cell = getters.getCell(position);
    const { value } = getters.getEvaluatedCell(position);
    const style = attribute(attributes, "s");
    const write = (marks: string, formula: string): string =>
      `<c r="${address}"${style ? ` s="${style}"` : ""}${marks}${typeOf(value)}>${formula}${valueOf(value)}</c>`;
    if (cell && !cell.isFormula && cell.content.startsWith("'")) {
      const text = `<is><t xml:space="preserve">${encode(cell.content.slice(1))}</t></is>`;
      return `<c r="${address}"${style ? ` s="${style}"` : ""} t="inlineStr">${text}</c>`;
    }
    if (!cell?.isFormula) {
      // A cell that a spilled formula fills has a value and no content of its own.
      return cell?.content || !getters.getArrayFormulaSpreadingOn(position) ? whole : write("", "");
    }
    const shown = getters.getCellText(position, { showFormula: true });
    const origin = origins?.get(address);
    if (origin && origin.shown === shown && (!origin.formula.includes("[") || tablesKept(origin.formula))) {
      const kind = origin.kind && ` ${origin.kind}`;
      return write(origin.dynamic ? ` cm="1"` : "", `<f${kind}>${encode(origin.formula)}</f>`);
    }
    // The library's text knows which functions need a prefix; where it wrote none, the cell's own text serves.
    const written = firstElement(content, "f");
    const text = written ? `=${decode(written.content)}` : shown;
    const spill = getters.getSpreadZone(position);
    const spilled = spill && (spill.left !== spill.right || spill.top !== spill.bottom);
    const array = spilled || value === "#SPILL!" || worksOnRanges(text, { takesRange, cellsOfName });
    const kind = array ? ` t="array" ref="${spill ? zoneText(spill) : address}"` : "";
    return write(array ? ` cm="1"` : "", `<f${kind}>${encode(formulaToFile(text, namespace))}</f>`);
  });
}

const fileErrors = ["#NULL!", "#DIV/0!", "#VALUE!", "#REF!", "#NAME?", "#NUM!", "#N/A"];
const otherErrors: Record<string, string> = { "#REF": "#REF!", "#BAD_EXPR": "#NAME?", "#BUSY!": "#N/A" };

const isError = (value: unknown): value is string => typeof value === "string" && registries.errorTypes.has(value);

function typeOf(value: unknown): string {
  if (isError(value)) return ` t="e"`;
  return typeof value === "string" ? ` t="str"` : typeof value === "boolean" ? ` t="b"` : "";
}

/** The last value of a formula cell, for readers that do not work it out themselves. */
function valueOf(value: unknown): string {
  if (value === null || value === undefined) return "";
  if (!isError(value)) return `<v>${encode(String(typeof value === "boolean" ? Number(value) : value))}</v>`;
  const code = otherErrors[value] ?? value;
  return `<v>${fileErrors.includes(code) ? code : "#VALUE!"}</v>`;
}

interface Zone {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

const zoneText = ({ left, right, top, bottom }: Zone, fixed = ""): string => {
  const cell = (column: number, row: number): string => `${fixed}${columnLetters(column)}${fixed}${row + 1}`;
  return left === right && top === bottom ? cell(left, top) : `${cell(left, top)}:${cell(right, bottom)}`;
};

/** Gives tables their names back; answers whether every table that a formula names still stands. */
function restoreTableNames(files: Files, model: WorkbookModel, book: Book): (formula: string) => boolean {
  const kept = new Set<string>();
  const sheetIds = model.getters.getSheetIds();
  for (const [path, xml] of files) {
    if (!/^xl\/tables\//.test(path)) continue;
    const sheet = sheetIds.find((_, i) =>
      files.get(`xl/worksheets/_rels/sheet${i}.xml.rels`)?.includes(path.replace("xl/", "../")),
    );
    const head = firstElement(xml, "table");
    const columns = [...elements(xml, "tableColumn")].map(({ attributes }) => attribute(attributes, "name"));
    const start = /^[A-Z]+\d+/.exec(attribute(head?.attributes ?? "", "ref") ?? "")?.[0];
    const table = book.tables.find(
      (each) => each.sheet === sheet && zoneText({ ...each, right: each.left, bottom: each.top }) === start,
    );
    if (!table || table.columns.join("\n") !== columns.join("\n")) continue;
    kept.add(table.name.toLowerCase());
    const name = encode(table.name);
    files.set(
      path,
      xml.replace(/\sname="[^"]*"/, ` name="${name}"`).replace(/\sdisplayName="[^"]*"/, ` displayName="${name}"`),
    );
  }
  const all = kept.size === book.tables.length;
  return (formula) => all || [...formula.matchAll(/([\w.\\]+)\[/g)].every(([, name]) => kept.has(name!.toLowerCase()));
}

function mendWorkbook(xml: string, model: WorkbookModel, source: Source | undefined, notes: string[]): string {
  const { getters } = model;
  const names = getters.getNamedRanges().map(({ name, range }) => {
    const area = `${quoteSheet(getters.getSheetName(range.sheetId))}!${zoneText(range.zone, "$")}`;
    return `<definedName name="${encode(name)}">${encode(area)}</definedName>`;
  });
  const sheetIds = getters.getSheetIds();
  const unmoved = source?.book.sheets.every(({ name }) => getters.tryGetSheetName(name) === name) ?? true;
  for (const each of source?.otherNames ?? []) {
    const home =
      each.localTo === undefined ? undefined : sheetIds.indexOf(source!.book.sheets[each.localTo]?.name ?? "");
    if (!unmoved || home === -1) {
      notes.push(`the name ${each.name}, because a sheet was renamed or removed`);
      continue;
    }
    const attributes = each.attributes.replace(/\s*localSheetId="\d+"/, "");
    const local = home === undefined ? "" : ` localSheetId="${home}"`;
    names.push(`<definedName ${attributes}${local}>${encode(each.refersTo)}</definedName>`);
  }
  // The names stand after the sheets; the application works everything out anew when it opens the file.
  const block = names.length > 0 ? `<definedNames>${names.join("")}</definedNames>` : "";
  return xml.replace(/<\/sheets>/, `</sheets>${block}<calcPr calcId="0" fullCalcOnLoad="1"/>`);
}

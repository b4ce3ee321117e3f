/** What the spreadsheet library passes over in a workbook: order of sheets, defined names, tables, cells as stored. */
import type { Parts } from "./zip";
import { attribute, decode, elements, firstElement } from "./xml";

export interface DefinedName {
  name: string;
  refersTo: string;
  /** index of the sheet to which the name belongs; undefined for the whole workbook */
  localTo: number | undefined;
  attributes: string;
}
export interface Table {
  sheet: string;
  name: string;
  columns: string[];
  /** rows and columns from 0, both ends included */
  top: number;
  left: number;
  bottom: number;
  right: number;
  headerRows: number;
  totalRows: number;
}
export interface Book {
  sheets: { name: string; part: string }[];
  names: DefinedName[];
  tables: Table[];
  startsIn1904: boolean;
}

export function readBook(parts: Parts): Book {
  const workbook = parts["xl/workbook.xml"] ?? "";
  const targets = relations(parts, "xl/workbook.xml");
  const sheets = [...elements(workbook, "sheet")].map(({ attributes }) => ({
    name: attribute(attributes, "name") ?? "",
    part: targets.get(attribute(attributes, "r:id") ?? "") ?? "",
  }));
  const names = [...elements(workbook, "definedName")].map(({ attributes, content }) => {
    const local = attribute(attributes, "localSheetId");
    return {
      name: attribute(attributes, "name") ?? "",
      refersTo: decode(content).replace(/^=/, ""),
      localTo: local === undefined ? undefined : Number(local),
      attributes: attributes.trim(),
    };
  });
  const worksheets = sheets.filter(({ part }) => part in parts && /worksheets\//.test(part));
  const startsIn1904 = /date1904="(1|true)"/.test(firstElement(workbook, "workbookPr")?.attributes ?? "");
  return { sheets: worksheets, names, tables: worksheets.flatMap((sheet) => tablesOf(parts, sheet)), startsIn1904 };
}

/** Relation id → path of the part it points to. */
function relations(parts: Parts, path: string): Map<string, string> {
  const folder = path.slice(0, path.lastIndexOf("/") + 1);
  const xml = parts[`${folder}_rels/${path.slice(folder.length)}.rels`] ?? "";
  return new Map(
    [...elements(xml, "Relationship")].map(({ attributes }) => {
      const target = attribute(attributes, "Target") ?? "";
      const full = target.startsWith("/") ? target.slice(1) : folder + target;
      const steps: string[] = [];
      for (const step of full.split("/")) {
        if (step === "..") steps.pop();
        else steps.push(step);
      }
      return [attribute(attributes, "Id") ?? "", steps.join("/")];
    }),
  );
}

/** Relations written from the root of the file, as the library wants them: from the folder of their own part. */
export function withRelativeRelations(parts: Parts): Parts {
  const changed = { ...parts };
  for (const [path, xml] of Object.entries(parts)) {
    if (!path.endsWith(".rels") || !/Target="\//.test(xml)) continue;
    const folder = path
      .replace(/_rels\/[^/]*$/, "")
      .split("/")
      .slice(0, -1);
    changed[path] = xml.replace(/Target="\/([^"]*)"/g, (_, target: string) => {
      const steps = target.split("/");
      let common = 0;
      while (common < folder.length && folder[common] === steps[common]) common++;
      return `Target="${"../".repeat(folder.length - common)}${steps.slice(common).join("/")}"`;
    });
  }
  return changed;
}

function tablesOf(parts: Parts, sheet: Book["sheets"][number]): Table[] {
  const found = [...relations(parts, sheet.part).values()].filter((path) => /tables\/[^/]+\.xml$/.test(path));
  return found.flatMap((path) => {
    const table = firstElement(parts[path] ?? "", "table");
    const range = /^([A-Z]+)(\d+):([A-Z]+)(\d+)$/.exec(attribute(table?.attributes ?? "", "ref") ?? "");
    if (!table || !range) return [];
    return {
      sheet: sheet.name,
      name: attribute(table.attributes, "displayName") ?? attribute(table.attributes, "name") ?? "",
      columns: [...elements(table.content, "tableColumn")].map(({ attributes }) => attribute(attributes, "name") ?? ""),
      left: columnIndex(range[1]!),
      top: Number(range[2]) - 1,
      right: columnIndex(range[3]!),
      bottom: Number(range[4]) - 1,
      headerRows: Number(attribute(table.attributes, "headerRowCount") ?? 1),
      totalRows: Number(attribute(table.attributes, "totalsRowCount") ?? 0),
    };
  });
}

/** "A" is 0. */
export function columnIndex(letters: string): number {
  let index = 0;
  for (const letter of letters) index = index * 26 + letter.charCodeAt(0) - 64;
  return index - 1;
}

export function columnLetters(index: number): string {
  let letters = "";
  for (let n = index + 1; n > 0; n = Math.floor((n - 1) / 26))
    letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  return letters;
}

export interface StoredCell {
  address: string;
  row: number;
  column: number;
  /** text typed into the cell, or undefined where it holds a number, an error or a formula */
  text: string | undefined;
  /** number typed into the cell */
  number: number | undefined;
  /** formula as written in the file, without "=", shared formulas still to be filled in */
  formula: string | undefined;
  /** attributes of the formula element: t, ref, si */
  kind: string;
  dynamic: boolean;
}

export function sharedTexts(parts: Parts): string[] {
  const items = elements(parts["xl/sharedStrings.xml"] ?? "", "si");
  return [...items].map(({ content }) => textOf(content));
}

/** Rich text in one piece, without the reading aids of East Asian text. */
function textOf(xml: string): string {
  const plain = xml.replace(/<(?:\w+:)?rPh[\s>][\s\S]*?<\/(?:\w+:)?rPh>/g, "");
  return [...elements(plain, "t")].map(({ content }) => decode(content)).join("");
}

export function* storedCells(xml: string, texts: readonly string[]): Generator<StoredCell> {
  for (const { attributes, content } of elements(xml, "c")) {
    const address = attribute(attributes, "r") ?? "";
    const place = /^([A-Z]{1,3})(\d{1,7})$/.exec(address);
    if (!place) continue;
    const formula = firstElement(content, "f");
    const type = attribute(attributes, "t");
    const value = firstElement(content, "v");
    const typed = formula ? undefined : value;
    yield {
      address,
      row: Number(place[2]) - 1,
      column: columnIndex(place[1]!),
      text: formula ? undefined : storedText(type, content, texts),
      number: typed?.content && (type === undefined || type === "n") ? Number(typed.content) : undefined,
      formula: formula && decode(formula.content).trim(),
      kind: formula?.attributes.trim() ?? "",
      dynamic: attribute(attributes, "cm") !== undefined,
    };
  }
}

function storedText(type: string | undefined, content: string, texts: readonly string[]): string | undefined {
  if (type === "inlineStr") return textOf(content);
  const value = firstElement(content, "v");
  if (!value) return undefined;
  if (type === "s") return texts[Number(value.content)];
  return type === "str" ? decode(value.content) : undefined;
}

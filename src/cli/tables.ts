import * as xlsx from "@e965/xlsx";
import type { Table } from "../audit/workbook";

/** The tables of a workbook, which the library keeps only as raw parts. */
export function readTables(book: xlsx.WorkBook): Table[] {
  const parts = (book as { files?: Record<string, { content?: Uint8Array | string }> }).files ?? {};
  const text = (path: string): string => {
    const content = parts[path]?.content ?? parts[`/${path}`]?.content;
    return content === undefined ? "" : typeof content === "string" ? content : Buffer.from(content).toString("utf8");
  };
  const tables: Table[] = [];
  for (const [sheet, path] of sheetParts(text)) {
    const folder = path.replace(/[^/]*$/, "");
    for (const target of related(text(`${folder}_rels/${path.slice(folder.length)}.rels`), "/table").values()) {
      const table = readTable(text(resolve(folder, target)), sheet);
      if (table) tables.push(table);
    }
  }
  return tables;
}

function sheetParts(text: (path: string) => string): [string, string][] {
  const targets = related(text("xl/_rels/workbook.xml.rels"), "/worksheet");
  const found: [string, string][] = [];
  for (const [element] of text("xl/workbook.xml").matchAll(/<(?:\w+:)?sheet\s[^>]*>/g)) {
    const target = targets.get(attribute(element, "r:id") ?? "");
    if (target) found.push([attribute(element, "name") ?? "", resolve("xl/", target)]);
  }
  return found;
}

function related(xml: string, type: string): Map<string, string> {
  const found = new Map<string, string>();
  for (const [element] of xml.matchAll(/<Relationship\s[^>]*>/g)) {
    if (attribute(element, "Type")?.endsWith(type))
      found.set(attribute(element, "Id") ?? "", attribute(element, "Target") ?? "");
  }
  return found;
}

function readTable(xml: string, sheet: string): Table | null {
  const head = /<(?:\w+:)?table\s[^>]*>/.exec(xml)?.[0];
  const ref = head && attribute(head, "ref");
  if (!head || !ref) return null;
  const { s, e } = xlsx.utils.decode_range(ref);
  const columns = [...xml.matchAll(/<(?:\w+:)?tableColumn\s[^>]*>/g)].map(
    ([element]) => attribute(element, "name") ?? "",
  );
  return {
    name: attribute(head, "displayName") ?? attribute(head, "name") ?? "",
    sheet,
    columns: columns.map((name) => name.replace(/_x000[aAdD]_/g, "\n")),
    top: s.r,
    left: s.c,
    bottom: e.r,
    right: e.c,
    headerRows: Number(attribute(head, "headerRowCount") ?? 1),
    totalsRows: Number(attribute(head, "totalsRowCount") ?? 0),
  };
}

function attribute(element: string, name: string): string | undefined {
  const found = new RegExp(`\\s${name}="([^"]*)"`).exec(element)?.[1];
  return found
    ?.replace(/&#(\d+);/g, (_, code: string) => String.fromCodePoint(Number(code)))
    .replace(/&#x([0-9a-f]+);/gi, (_, code: string) => String.fromCodePoint(parseInt(code, 16)))
    .replaceAll("&lt;", "<")
    .replaceAll("&gt;", ">")
    .replaceAll("&quot;", '"')
    .replaceAll("&apos;", "'")
    .replaceAll("&amp;", "&");
}

function resolve(folder: string, target: string): string {
  if (target.startsWith("/")) return target.slice(1);
  const parts = folder.split("/").filter(Boolean);
  for (const step of target.split("/")) {
    if (step === "..") parts.pop();
    else parts.push(step);
  }
  return parts.join("/");
}

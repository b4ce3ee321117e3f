/** Writes the example workbooks as .xlsx files. */
import { strToU8, zipSync } from "fflate";
import { columnIndex, columnLetters } from "../trial/book";
import { formulaToFile } from "../trial/dialect";
import type { ExampleBook, ExampleCell, ExampleSheet, Style } from "../trial/examples/cells";
import { namespace } from "../trial/metadata";
import { encode } from "../trial/xml";
import { chartXml, drawingXml } from "./workbookChart";

const main = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const relation = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const declaration = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';

export function writeWorkbook(book: ExampleBook): Uint8Array {
  const parts: Record<string, string> = {};
  const types: string[] = [];
  const add = (path: string, contentType: string, xml: string): void => {
    parts[path] = declaration + xml;
    types.push(
      `<Override PartName="/${path}" ContentType="application/vnd.openxmlformats-officedocument.${contentType}+xml"/>`,
    );
  };
  let tables = 0;
  let charts = 0;
  book.sheets.forEach((sheet, i) => {
    const links: string[] = [];
    const link = (kind: string, target: string): string => {
      links.push(`<Relationship Id="rId${links.length + 1}" Type="${relation}/${kind}" Target="${target}"/>`);
      return `r:id="rId${links.length}"`;
    };
    let tail = "";
    if (sheet.chart) {
      const number = ++charts;
      tail += `<drawing ${link("drawing", `../drawings/drawing${number}.xml`)}/>`;
      add(`xl/drawings/drawing${number}.xml`, "drawing", drawingXml(sheet.chart));
      parts[`xl/drawings/_rels/drawing${number}.xml.rels`] = relationships(
        `<Relationship Id="rId1" Type="${relation}/chart" Target="../charts/chart${number}.xml"/>`,
      );
      add(`xl/charts/chart${number}.xml`, "drawingml.chart", chartXml(sheet.chart, sheet.name));
    }
    const own = sheet.tables ?? [];
    const tableParts = own.map((table) => {
      const number = ++tables;
      add(`xl/tables/table${number}.xml`, "spreadsheetml.table", tableXml(table, number));
      return `<tablePart ${link("table", `../tables/table${number}.xml`)}/>`;
    });
    if (own.length > 0) tail += `<tableParts count="${own.length}">${tableParts.join("")}</tableParts>`;
    add(`xl/worksheets/sheet${i + 1}.xml`, "spreadsheetml.worksheet", sheetXml(sheet, tail));
    if (links.length > 0) parts[`xl/worksheets/_rels/sheet${i + 1}.xml.rels`] = relationships(links.join(""));
  });
  add("xl/styles.xml", "spreadsheetml.styles", stylesXml());
  add("xl/metadata.xml", "spreadsheetml.sheetMetadata", metadataXml);
  add("xl/workbook.xml", "spreadsheetml.sheet.main", workbookXml(book));
  const last = book.sheets.length;
  parts["xl/_rels/workbook.xml.rels"] = relationships(
    book.sheets
      .map(
        (_, i) => `<Relationship Id="rId${i + 1}" Type="${relation}/worksheet" Target="worksheets/sheet${i + 1}.xml"/>`,
      )
      .join("") +
      `<Relationship Id="rId${last + 1}" Type="${relation}/styles" Target="styles.xml"/>` +
      `<Relationship Id="rId${last + 2}" Type="${relation}/sheetMetadata" Target="metadata.xml"/>`,
  );
  parts["_rels/.rels"] = relationships(
    `<Relationship Id="rId1" Type="${relation}/officeDocument" Target="xl/workbook.xml"/>`,
  );
  parts["[Content_Types].xml"] =
    `${declaration}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">` +
    '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>' +
    `<Default Extension="xml" ContentType="application/xml"/>${types.join("")}</Types>`;
  const files = Object.entries(parts).map(([path, xml]) => [path, strToU8(xml)]);
  return zipSync(Object.fromEntries(files), { mtime: "2020-01-01T00:00:00" });
}

const relationships = (inside: string): string =>
  `${declaration}<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">${inside}</Relationships>`;

function workbookXml(book: ExampleBook): string {
  const sheets = book.sheets.map(
    ({ name }, i) => `<sheet name="${encode(name)}" sheetId="${i + 1}" r:id="rId${i + 1}"/>`,
  );
  const names = Object.entries(book.names).map(
    ([name, refersTo]) => `<definedName name="${name}">${encode(refersTo)}</definedName>`,
  );
  return (
    `<workbook xmlns="${main}" xmlns:r="${relation}"><sheets>${sheets.join("")}</sheets>` +
    `<definedNames>${names.join("")}</definedNames><calcPr calcId="0" fullCalcOnLoad="1"/></workbook>`
  );
}

function sheetXml(sheet: ExampleSheet, tail: string): string {
  const columns = sheet.columns.map(
    (width, i) => `<col min="${i + 1}" max="${i + 1}" width="${width}" customWidth="1"/>`,
  );
  const rows = sheet.rows.map((row, r) => {
    const cells = row.map((cell, c) => (cell ? cellXml(cell, `${columnLetters(c)}${r + 1}`) : ""));
    const height = row[0]?.style === "title" ? 27 : 18;
    return `<row r="${r + 1}" ht="${height}" customHeight="1">${cells.join("")}</row>`;
  });
  return (
    `<worksheet xmlns="${main}" xmlns:r="${relation}"><sheetViews><sheetView showGridLines="0" workbookViewId="0"/></sheetViews>` +
    `<cols>${columns.join("")}</cols><sheetData>${rows.join("")}</sheetData>${tail}</worksheet>`
  );
}

function cellXml(cell: ExampleCell, address: string): string {
  const open = `<c r="${address}" s="${styles.indexOf(cell.style) + 1}"`;
  if (cell.text !== undefined) return `${open} t="inlineStr"><is><t>${encode(cell.text)}</t></is></c>`;
  if (cell.number !== undefined) return `${open}><v>${cell.number}</v></c>`;
  if (cell.formula === undefined) return `${open}/>`;
  const kind = cell.spill ? ` t="array" ref="${cell.spill}"` : "";
  const formula = encode(formulaToFile(cell.formula, namespace));
  return `${open}${cell.spill ? ' cm="1"' : ""}><f${kind}>${formula}</f></c>`;
}

type ExampleTable = NonNullable<ExampleSheet["tables"]>[number];

function tableXml({ name, range, columns }: ExampleTable, number: number): string {
  const [start = "A1"] = range.split(":");
  const left = columnIndex(start.replace(/\d/g, ""));
  const inside = columns.map((column, i) => `<tableColumn id="${left + i + 1}" name="${encode(column)}"/>`);
  return (
    `<table xmlns="${main}" id="${number}" name="${name}" displayName="${name}" ref="${range}" totalsRowShown="0">` +
    `<tableColumns count="${columns.length}">${inside.join("")}</tableColumns>` +
    '<tableStyleInfo name="TableStyleLight1" showFirstColumn="0" showLastColumn="0" showRowStripes="1" showColumnStripes="0"/></table>'
  );
}

const styles: Style[] = [
  "title",
  "note",
  "head",
  "label",
  "unit",
  "sentence",
  "input",
  "result",
  "fraction",
  "small",
  "whole",
];

/** font, fill, number format and alignment of each style, by position in the lists of stylesXml */
const looks: Record<Style, [font: number, fill: number, format: number, more?: string]> = {
  title: [1, 0, 0],
  note: [2, 0, 0],
  head: [3, 2, 0],
  label: [0, 0, 0],
  unit: [2, 0, 0],
  sentence: [0, 0, 0],
  input: [0, 3, 0],
  result: [0, 0, 164],
  fraction: [0, 0, 10],
  small: [0, 0, 165],
  whole: [0, 0, 3],
};

function stylesXml(): string {
  const font = (more: string, colour = "FF2C2A27", size = 11): string =>
    `<font>${more}<sz val="${size}"/><color rgb="${colour}"/><name val="Calibri"/></font>`;
  const fill = (colour: string): string =>
    `<fill><patternFill patternType="solid"><fgColor rgb="${colour}"/></patternFill></fill>`;
  const cells = styles.map((style) => {
    const [fontId, fillId, format] = looks[style];
    return `<xf numFmtId="${format}" fontId="${fontId}" fillId="${fillId}" borderId="0" xfId="0" applyFont="1" applyFill="1" applyNumberFormat="1"/>`;
  });
  return (
    `<styleSheet xmlns="${main}"><numFmts count="2"><numFmt numFmtId="164" formatCode="0.000"/><numFmt numFmtId="165" formatCode="0.00000"/></numFmts>` +
    `<fonts count="4">${font("")}${font("<b/>", "FF9C4221", 15)}${font("<i/>", "FF625D54", 10)}${font("<b/>")}</fonts>` +
    `<fills count="4"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill>${fill("FFE4DFD5")}${fill("FFF6E6DE")}</fills>` +
    '<borders count="1"><border><left/><right/><top/><bottom/><diagonal/></border></borders>' +
    '<cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs>' +
    `<cellXfs count="${cells.length + 1}"><xf numFmtId="0" fontId="0" fillId="0" borderId="0" xfId="0"/>${cells.join("")}</cellXfs></styleSheet>`
  );
}

/** Marks a formula as one that spills. */
const metadataXml =
  `<metadata xmlns="${main}" xmlns:xda="http://schemas.microsoft.com/office/spreadsheetml/2017/dynamicarray">` +
  '<metadataTypes count="1"><metadataType name="XLDAPR" minSupportedVersion="120000" copy="1" pasteAll="1" pasteValues="1" merge="1" splitFirst="1" rowColShift="1" clearFormats="1" clearComments="1" assign="1" coerce="1" cellMeta="1"/></metadataTypes>' +
  '<futureMetadata name="XLDAPR" count="1"><bk><extLst><ext uri="{bdbb8cdc-fa1e-496e-a857-3c3f30c029c3}"><xda:dynamicArrayProperties fDynamic="1" fCollapsed="0"/></ext></extLst></bk></futureMetadata>' +
  '<cellMetadata count="1"><bk><rc t="1" v="0"/></bk></cellMetadata></metadata>';

/** A workbook made part by part, as spreadsheets save it where the add-in is at work, and its copy without the add-in. */
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { plainCopy } from "../../src/cli/plain-book";
import { ABSTRANS, NATFREQ, SWEEP } from "../../src/functions/index";
import { read, recalculateFile } from "../support/libreOffice";

const main = 'xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"';
const relations = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";

const stiffnesses = [40000, 52000, 61000];
const row = (r: number, ...cells: string[]): string => `<row r="${r}" ht="22" customHeight="1">${cells.join("")}</row>`;
const num = (r: string, v: number): string => `<c r="${r}" s="1"><v>${v}</v></c>`;

const sheet = `<worksheet ${main}><cols><col min="1" max="3" width="17"/></cols><sheetData>${[
  row(
    1,
    num("A1", stiffnesses[0]!),
    num("B1", 12),
    `<c r="C1" s="1"><f t="shared" ref="C1:C3" si="0">_xldudf_PLINTH_NATFREQ(A1,$B$1)</f><v>9.19</v></c>`,
    `<c r="D1" cm="1"><f t="array" ref="D1:D3">_xldudf_PLINTH_SWEEP(5,25,3)</f><v>5</v></c>`,
    `<c r="E1" cm="1"><f t="array" ref="E1:E3">_xldudf_PLINTH_ABSTRANS(_xlfn.ANCHORARRAY(D1),C1,0.1)</f><v>1.4</v></c>`,
    `<c r="F1"><f>IF(A1&gt;0,-PLINTH.UNITS(A1,"N/m","N/mm")^2,"a &amp; b")</f><v>1600</v></c>`,
    `<c r="G1" t="e"><f>_xldudf_PLINTH_NATFREQ(A1,B9)</f><v>#NUM!</v></c>`,
  ),
  row(
    2,
    num("A2", stiffnesses[1]!),
    `<c r="C2" s="1"><f t="shared" si="0"/><v>10.48</v></c>`,
    `<c r="D2"><v>15</v></c>`,
    `<c r="E2" s="1"><v>0.7</v></c>`,
    `<c r="F2" t="e"><f>_xldudf_PLINTH_NATFREQ(A2,B1,"si")</f><v>#NAME?</v></c>`,
    `<c r="G2"><f>_xldudf_PLINTH_RUNUP(8,0.05,5,0,30)+_xldudf_PLINTH_NATFREQ(A1,B1)</f><v>15.9</v></c>`,
  ),
  row(
    3,
    num("A3", stiffnesses[2]!),
    `<c r="C3" s="1"><f t="shared" si="0"/><v>11.35</v></c>`,
    `<c r="D3"><v>25</v></c>`,
    `<c r="E3"><v>0.2</v></c>`,
    `<c r="F3"><f>SUM(_xldudf_PLINTH_NATFREQ(A1:A3,B1))</f><v>31.02</v></c>`,
    `<c r="G3"><f>SUM(_xlfn.ANCHORARRAY($D$1))</f><v>45</v></c>`,
  ),
].join(
  "",
)}</sheetData><conditionalFormatting sqref="C1:C3"><cfRule type="expression" dxfId="0" priority="1"><formula>C1&gt;_xldudf_PLINTH_NATFREQ(50000,12)</formula></cfRule></conditionalFormatting></worksheet>`;

const files: Record<string, string> = {
  "[Content_Types].xml": `<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/><Override PartName="/xl/workbook.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.sheet.main+xml"/><Override PartName="/xl/worksheets/sheet1.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"/><Override PartName="/xl/styles.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"/><Override PartName="/xl/calcChain.xml" ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.calcChain+xml"/></Types>`,
  "_rels/.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="${relations}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
  "xl/_rels/workbook.xml.rels": `<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="${relations}/worksheet" Target="worksheets/sheet1.xml"/><Relationship Id="rId2" Type="${relations}/styles" Target="styles.xml"/><Relationship Id="rId3" Type="${relations}/calcChain" Target="calcChain.xml"/></Relationships>`,
  "xl/workbook.xml": `<workbook ${main} xmlns:r="${relations}"><sheets><sheet name="Mounts &amp; more" sheetId="1" r:id="rId1"/></sheets><definedNames><definedName name="hardest">_xldudf_PLINTH_RUNUP(8,0.05,5,0,30)</definedName></definedNames><calcPr calcId="191029"/></workbook>`,
  "xl/worksheets/sheet1.xml": sheet,
  "xl/styles.xml": `<styleSheet ${main}><fonts count="2"><font><sz val="11"/><name val="Calibri"/></font><font><b/><sz val="14"/><name val="Calibri"/></font></fonts><fills count="2"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill></fills><borders count="1"><border><left/><right/><top/><bottom/><diagonal/></border></borders><cellStyleXfs count="1"><xf/></cellStyleXfs><cellXfs count="2"><xf/><xf fontId="1" applyFont="1"/></cellXfs><dxfs count="1"><dxf><font><b/></font></dxf></dxfs></styleSheet>`,
  "xl/calcChain.xml": `<calcChain ${main}><c r="C1" i="1"/></calcChain>`,
  "customXml/item1.xml": "<kept>as it is</kept>",
};
const original = Buffer.from(
  zipSync(Object.fromEntries(Object.entries(files).map(([path, text]) => [path, strToU8(text)]))),
);
const copy = plainCopy(original);
const parts = Object.fromEntries(Object.entries(unzipSync(copy.bytes)).map(([path, part]) => [path, strFromU8(part)]));
const cell = (address: string): string =>
  new RegExp(`<c r="${address}"[^>]*?(?:/>|>.*?</c>)`).exec(parts["xl/worksheets/sheet1.xml"]!)![0];

test("every call with a closed form is replaced, cell for cell", () => {
  expect(cell("C2")).toBe('<c r="C2" s="1"><f>SQRT(A2/$B$1)/(2*PI())</f><v>10.48</v></c>');
  expect(cell("D2")).toBe('<c r="D2"><f>5+(25-5)*1/(3-1)</f><v>15</v></c>');
  expect(cell("E1")).toMatch(/^<c r="E1"><f>SQRT\(\(1\+\(2\*0\.1\*\(D1\/C1\)\)/);
  expect(cell("E2")).toMatch(/^<c r="E2" s="1"><f>SQRT.*D2\/C1/);
  expect(cell("F1")).toContain('<f>IF(A1&gt;0,-(A1/1000)^2,"a &amp; b")</f>');
  expect(cell("F2")).toBe('<c r="F2"><f>SQRT(A2/B1)/(2*PI())</f></c>'); // #NAME? was no value
  expect(cell("F3")).toContain('<f t="array" ref="F3">SUM((SQRT(A1:A3/B1)/(2*PI())))</f>');
  expect(cell("G3")).toContain("<f>SUM($D$1:$D$3)</f>");
  expect(copy.replaced).toBe(12);
});

test("cells that cannot be replaced keep their formula and are listed with the reason", () => {
  expect(cell("G1")).toContain("<f>_xldudf_PLINTH_NATFREQ(A1,B9)</f><v>#NUM!</v>");
  expect(cell("G2")).toContain("<f>_xldudf_PLINTH_RUNUP(8,0.05,5,0,30)+_xldudf_PLINTH_NATFREQ(A1,B1)</f>");
  expect(copy.left).toEqual([
    { place: "Mounts & more!G1", reason: "it shows #NUM!, which a plain formula might hide behind a number" },
    { place: "Mounts & more!G2", reason: "RUNUP has no closed form: it follows the run-up in time" },
    { place: "xl/workbook.xml (a defined name)", reason: "RUNUP has no closed form: it follows the run-up in time" },
  ]);
});

test("formats, widths and other parts stay as they were", () => {
  for (const path of ["xl/styles.xml", "customXml/item1.xml", "_rels/.rels"]) expect(parts[path]).toBe(files[path]);
  expect(parts["xl/worksheets/sheet1.xml"]).toContain('<cols><col min="1" max="3" width="17"/></cols>');
  expect(parts["xl/worksheets/sheet1.xml"]).toContain("<formula>C1&gt;(SQRT(50000/12)/(2*PI()))</formula>");
});

test("the list of dependencies goes, and the book is worked out anew when it is opened", () => {
  expect(Object.keys(parts)).not.toContain("xl/calcChain.xml");
  expect(parts["[Content_Types].xml"]! + parts["xl/_rels/workbook.xml.rels"]!).not.toContain("calcChain");
  expect(parts["xl/workbook.xml"]).toContain('<calcPr fullCalcOnLoad="1" calcId="191029"/>');
});

test("an independent spreadsheet program gets our functions' values from the copy", () => {
  // without the kept values, so that every one is worked out
  const bare = parts["xl/worksheets/sheet1.xml"]!.replace(/<\/f><v>[^<]*<\/v>/g, "</f>");
  const bytes = zipSync({ ...unzipSync(copy.bytes), "xl/worksheets/sheet1.xml": strToU8(bare) });
  const [rows] = Object.values(read(recalculateFile(bytes)));
  const frequencies = SWEEP([[5]], [[25]], [[3]]).flat();
  const natural = NATFREQ(
    stiffnesses.map((k) => [k]),
    [[12]],
  ).flat() as number[];
  const transmissibilities = ABSTRANS(
    frequencies.map((f) => [f]),
    [[natural[0]]],
    [[0.1]],
  ).flat();
  const close = (found: unknown, expected: unknown): void =>
    expect(Math.abs((found as number) / (expected as number) - 1)).toBeLessThan(1e-12);
  for (let i = 0; i < 3; i++) {
    close(rows![i]![2], natural[i]);
    close(rows![i]![3], frequencies[i]);
    close(rows![i]![4], transmissibilities[i]);
  }
  close(rows![0]![5], 1600); // -40^2 is 1600 to a spreadsheet
  close(rows![1]![5], natural[1]);
  close(
    rows![2]![5],
    natural.reduce((sum, f) => sum + f),
  );
}, 600_000);

import { cellKey } from "../../src/audit/workbook";
import { CELLS_PER_BATCH } from "../../src/office/excelReading";
import { createExcelSheet, isDark } from "../../src/office/excelSheet";
import { type FakeBook, installFakeExcel } from "../support/fakeExcel";

const book = (): FakeBook => ({
  sheets: [
    {
      name: "Sizing",
      cells: {
        A1: { value: "f (Hz)" },
        B1: { value: 25 },
        B2: { value: 8 },
        B3: { formula: "PLINTH.ABSTRANS(B1,B2,0.1)", value: 0.134190254545645 },
        B4: { formula: "1/0", value: "#DIV/0!", type: "Error" },
        D1: { formula: "PLINTH.SWEEP(1,3,3)", value: 1 },
        D2: { value: 2 },
        D3: { value: 3 },
      },
    },
    { name: "Empty", cells: {} },
  ],
  names: [{ name: "speed", formula: "Sizing!$B$1" }],
  tables: [{ name: "Mounts", sheet: "Sizing", area: [0, 0, 3, 2], columns: ["f (Hz)", "fn (Hz)"], totals: true }],
  spills: { D2: "D1", D3: "D1" },
});

test("the selected cell comes with its formula, value and area", async () => {
  const fake = installFakeExcel(book());
  fake.select("Sizing", 2, 1);
  expect(await createExcelSheet().selected()).toEqual({
    area: { sheet: "Sizing", top: 2, left: 1, bottom: 2, right: 1 },
    cell: { sheet: "Sizing", row: 2, column: 1 },
    content: { formula: "PLINTH.ABSTRANS(B1,B2,0.1)", value: 0.134190254545645 },
    home: { sheet: "Sizing", row: 2, column: 1 },
  });
});

test("a spilled cell shows its own value and the formula that fills it", async () => {
  const fake = installFakeExcel(book());
  fake.select("Sizing", 2, 3);
  const { content, home } = await createExcelSheet().selected();
  expect(content).toEqual({ formula: "PLINTH.SWEEP(1,3,3)", value: 3 });
  expect(home).toEqual({ sheet: "Sizing", row: 0, column: 3 });
});

test("several areas at once, which Excel refuses to give as one, count as the active cell", async () => {
  const fake = installFakeExcel(book());
  fake.select("Sizing", 2, 1, -1);
  expect((await createExcelSheet().selected()).area).toEqual({ sheet: "Sizing", top: 2, left: 1, bottom: 2, right: 1 });
});

test("errors are errors, blanks are blanks, and text stays text", async () => {
  installFakeExcel(book());
  const [rows] = await createExcelSheet().read([{ sheet: "Sizing", top: 0, left: 0, bottom: 3, right: 1 }]);
  expect(rows!.map((row) => row.map(({ value }) => value))).toEqual([
    ["f (Hz)", 25],
    [null, 8],
    [null, 0.134190254545645],
    [null, { error: "#DIV/0!" }],
  ]);
});

test("the workbook is read whole: formulas, values, names and tables", async () => {
  installFakeExcel(book());
  const { sheets, names, tables } = await createExcelSheet().workbook({});
  expect(sheets.map(({ name, cells }) => [name, cells.size])).toEqual([
    ["Sizing", 8],
    ["Empty", 0],
  ]);
  expect(sheets[0]!.cells.get(cellKey(2, 1))).toMatchObject({ formula: "PLINTH.ABSTRANS(B1,B2,0.1)" });
  expect(names).toEqual([{ name: "speed", formula: "Sizing!$B$1" }]);
  expect(tables).toEqual([
    {
      name: "Mounts",
      sheet: "Sizing",
      columns: ["f (Hz)", "fn (Hz)"],
      top: 0,
      left: 0,
      bottom: 2,
      right: 1,
      headerRows: 1,
      totalsRows: 1,
    },
  ]);
});

describe("a large sheet", () => {
  const large = (): FakeBook => ({
    sheets: [{ name: "Large", cells: { A1: { value: 1 }, J10000: { value: 2 } } }],
  });

  test("is read in batches within the platform's limits, with progress to the end", async () => {
    const fake = installFakeExcel(large());
    const done: number[] = [];
    await createExcelSheet().workbook({ progress: (share) => done.push(share) });
    expect(Math.max(...fake.syncs)).toBeLessThanOrEqual(CELLS_PER_BATCH);
    expect(done).toHaveLength(5);
    expect(done.at(-1)).toBe(1);
  });

  test("stops when asked to", async () => {
    const fake = installFakeExcel(large());
    const stopping = new AbortController();
    const reading = createExcelSheet().workbook({ progress: () => stopping.abort(), signal: stopping.signal });
    await expect(reading).rejects.toMatchObject({ name: "AbortError" });
    expect(fake.syncs.filter((cells) => cells > 0)).toHaveLength(1);
  });
});

test("selecting goes to the sheet and the area", async () => {
  installFakeExcel(book());
  const sheet = createExcelSheet();
  await sheet.select({ sheet: "Sizing", top: 0, left: 0, bottom: 1, right: 1 });
  expect((await sheet.selected()).area).toEqual({ sheet: "Sizing", top: 0, left: 0, bottom: 1, right: 1 });
});

test("writing puts the formula in and nothing else", async () => {
  const fake = installFakeExcel(book());
  await createExcelSheet().write({ sheet: "Sizing", row: 4, column: 1 }, "=PLINTH.PEAKTRANS(0.1)");
  expect(fake.book.sheets[0]!.cells["B5"]).toMatchObject({ formula: "PLINTH.PEAKTRANS(0.1)" });
  expect(Object.keys(fake.book.sheets[0]!.cells)).toHaveLength(9);
});

test("a sheet of findings gets a free name, and text that looks like a formula stays text", async () => {
  const fake = installFakeExcel({ sheets: [{ name: "Plinth findings", cells: {} }] });
  const name = await createExcelSheet().addSheet("Plinth findings", [
    ["Cell", "Suggestion"],
    ["B4", "=1+1"],
    [null, 3],
  ]);
  expect(name).toBe("Plinth findings (2)");
  expect(fake.book.sheets[1]!.cells).toEqual({
    A1: { value: "Cell" },
    B1: { value: "Suggestion" },
    A2: { value: "B4" },
    B2: { value: "=1+1" },
    B3: { value: 3 },
  });
});

test("a copy is changed, its original is not, and the notes say what was replaced", async () => {
  const fake = installFakeExcel(book());
  const before = structuredClone(fake.book.sheets[0]);
  const name = await createExcelSheet().copySheet("Sizing", "Sizing plain", [
    { row: 2, column: 1, formula: "=1/2", note: "Was =PLINTH.ABSTRANS(B1,B2,0.1)." },
  ]);
  expect(name).toBe("Sizing plain");
  expect(fake.book.sheets[0]).toEqual(before);
  expect(fake.book.sheets.find((sheet) => sheet.name === name)!.cells["B3"]).toMatchObject({ formula: "1/2" });
  expect(fake.book.sheets.at(-1)).toMatchObject({
    name: "Sizing plain notes",
    cells: { D2: { value: "Was =PLINTH.ABSTRANS(B1,B2,0.1)." } },
  });
});

test("notes are kept in the workbook in place of the earlier ones", async () => {
  const fake = installFakeExcel(book());
  const sheet = createExcelSheet();
  expect(await sheet.notes()).toBeNull();
  await sheet.keepNotes('{"reason":"a < b & c"}');
  await sheet.keepNotes('{"reason":"b > a"}');
  expect(fake.book.notes).toBe('<plinthNotes xmlns="urn:plinth:notes">{"reason":"b &gt; a"}</plinthNotes>');
});

test("a burst of events counts once, and none after it is stopped", async () => {
  const fake = installFakeExcel(book());
  let seen = 0;
  const stop = createExcelSheet().onSelect(() => seen++);
  const settle = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 5));
  await settle();
  for (let i = 0; i < 5; i++) fake.select("Sizing", i, 0);
  await settle();
  expect(seen).toBe(1);
  stop();
  await settle();
  fake.select("Sizing", 0, 0);
  await settle();
  expect(seen).toBe(1);
});

test.each([
  ["#ffffff", false],
  ["#f3f2f1", false],
  ["#262626", true],
  ["000000", true],
])("a host whose background is %s is dark: %p", (colour, dark) => {
  expect(isDark(colour)).toBe(dark);
});

import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import type { Server } from "node:http";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { strFromU8, unzipSync } from "fflate";
import type { Browser, Page } from "playwright-core";
import { dist, launchBrowser, serveDist, watch } from "../support/browser";

jest.setTimeout(120_000);

let browser: Browser;
let server: Server;
let address: string;
let page: Page;
let seen: ReturnType<typeof watch>;
const folder = mkdtempSync(join(tmpdir(), "trial-"));

beforeAll(async () => {
  browser = await launchBrowser();
  ({ server, address } = await serveDist());
});
afterAll(async () => {
  await browser?.close();
  await new Promise((done) => (server ? server.close(done) : done(undefined)));
  rmSync(folder, { recursive: true, force: true });
});
beforeEach(async () => {
  page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
  seen = watch(page);
  await page.goto(`${address}/trial/`);
  await page.waitForSelector("html[data-ready]");
});
afterEach(async () => {
  await page.close();
  expect(seen).toEqual({ requests: [], errors: [] });
});

interface ShownCell {
  value: unknown;
  message: string | undefined;
  text: string;
}

/** A cell of the active sheet, or of the sheet with that name. */
const cell = (at: string, sheet?: string): Promise<ShownCell> =>
  page.evaluate(
    ([at, sheet]) => {
      const { getters } = (globalThis as any).plinthTrial.model();
      const sheetId = sheet ? getters.getSheetIdByName(sheet) : getters.getActiveSheetId();
      const { left: col, top: row } = getters.getRangeFromSheetXC(sheetId, at).zone;
      const { value, message } = getters.getEvaluatedCell({ sheetId, col, row });
      const text = getters.getCellText({ sheetId, col, row }, { showFormula: true });
      return { value, message: message && String(message), text };
    },
    [at, sheet] as const,
  );

/** Clicks into the grid, then moves the selection. */
async function goTo(at: string): Promise<void> {
  const box = (await page.locator("#grid .o-grid").boundingBox())!;
  await page.mouse.click(box.x + 80, box.y + 40);
  await page.evaluate((at) => {
    const model = (globalThis as any).plinthTrial.model();
    const { zone } = model.getters.getRangeFromSheetXC(model.getters.getActiveSheetId(), at);
    model.selection.selectCell(zone.left, zone.top);
  }, at);
}

async function type(at: string, text: string): Promise<void> {
  await goTo(at);
  await page.keyboard.type(text);
  await page.keyboard.press("Enter");
}

async function waitForFile(name: string): Promise<void> {
  await page.waitForFunction((name) => document.querySelector("#file-name")?.textContent === name, name);
}

async function openExample(index: number, name: string): Promise<void> {
  await page.click("#examples");
  await page.click(`#example-list li:nth-child(${index + 1}) button`);
  await waitForFile(name);
}

async function saveCopy(name: string): Promise<string> {
  await page.click("#save");
  await page.fill("#save-name", name);
  const download = page.waitForEvent("download");
  await page.click("#save-form .primary");
  const path = join(folder, name);
  await (await download).saveAs(path);
  return path;
}

const partsOf = (path: string): Record<string, string> =>
  Object.fromEntries(Object.entries(unzipSync(readFileSync(path))).map(([name, bytes]) => [name, strFromU8(bytes)]));

/** Formula of a cell as the file has it. */
function storedFormula(xml: string, at: string): { attributes: string; formula: string } | undefined {
  const found = new RegExp(`<c r="${at}"[^>]*><f([^>]*)>([^<]*)</f>`).exec(xml);
  return found ? { attributes: found[1]!.trim(), formula: found[2]! } : undefined;
}

const message = (): Promise<string> => page.locator("#notice").innerText();

test("a function completes from our metadata, shows its arguments and answers", async () => {
  await goTo("A1");
  await page.keyboard.type("=PLINTH.ABST");
  await page.waitForSelector(".o-autocomplete-value");
  expect(await page.locator(".o-autocomplete-dropdown").innerText()).toContain("PLINTH.ABSTRANS");
  await page.keyboard.press("Tab", { delay: 150 });
  await page.waitForFunction(() => document.querySelector(".o-grid-composer .o-composer")?.textContent?.endsWith("("));
  await page.keyboard.type("25, 8, ");
  const help = page.locator(".o-formula-assistant");
  await help.waitFor();
  expect(await help.innerText()).toMatch(/frequency[\s\S]*naturalFrequency[\s\S]*dampingRatio/);
  await page.keyboard.type("0.1)");
  await page.keyboard.press("Enter");
  // |1 + 2 i zeta r| / |1 - r^2 + 2 i zeta r| at r = 25/8, zeta = 0.1
  const r = 25 / 8;
  const expected = Math.hypot(1, 0.2 * r) / Math.hypot(1 - r * r, 0.2 * r);
  expect((await cell("A1")).value).toBeCloseTo(expected, 14);
});

test("a column is filled down, and undone", async () => {
  for (let row = 1; row <= 5; row++) await type(`A${row}`, String(8 * Math.SQRT2));
  await type("B1", "=PLINTH.ABSTRANS(A1,8,0.1)");
  await page.evaluate(() => {
    const { model, sheet } = (globalThis as any).plinthTrial;
    const { name } = model().getters.getActiveSheet();
    void sheet.select({ sheet: name, top: 0, left: 1, bottom: 4, right: 1 });
  });
  await page.keyboard.press("Control+D");
  expect((await cell("B5")).text).toBe("=PLINTH.ABSTRANS(A5,8,0.1)");
  expect((await cell("B5")).value).toBeCloseTo(1, 14); // T is 1 at the square root of 2, whatever the damping
  await page.keyboard.press("Control+Z");
  expect((await cell("B5")).value).toBeNull();
});

test("one formula spills a sweep, beyond the last row of the sheet if need be", async () => {
  await type("A1", "=PLINTH.SWEEP(2,60,2000)");
  await type("B1", "=PLINTH.ABSTRANS(A1:A2000,8,0.1)");
  await page.waitForFunction(() => {
    const { getters } = (globalThis as any).plinthTrial.model();
    return getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 1, row: 1999 }).value > 0;
  });
  expect((await cell("A1")).value).toBe(2);
  expect((await cell("A2000")).value).toBe(60);
  expect((await cell("B1")).value).toBeGreaterThan(1);
});

test("an error says what is wrong when the pointer rests on it", async () => {
  await type("A1", "=PLINTH.ABSTRANS(25,8,-0.1)");
  expect(await cell("A1")).toMatchObject({ value: "#NUM!" });
  expect((await cell("A1")).message).toMatch(/damping ratio.*-0\.1/);
  const box = (await page.locator("#grid .o-grid canvas").first().boundingBox())!;
  await page.mouse.move(box.x + 90, box.y + 38);
  await page.waitForSelector(".o-error-tooltip");
  expect(await page.locator(".o-error-tooltip").innerText()).toMatch(/damping ratio/);
});

test("a function that loads a library first shows busy, then its result", async () => {
  await type("A1", '=PLINTH.UNITS(1452,"rpm","Hz")');
  await page.waitForFunction(() => {
    const { getters } = (globalThis as any).plinthTrial.model();
    return typeof getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 0, row: 0 }).value === "number";
  });
  expect((await cell("A1")).value).toBeCloseTo(24.2, 12); // 1452/60
});

test("functions that legacy sheets use are there", async () => {
  const known = [
    ["=LOG10(1000)", 3],
    ["=RADIANS(180)", Math.PI],
    ["=SUMSQ(3,4)", 25],
    ["=IMABS(COMPLEX(3,4))", 5],
    ["=IMREAL(IMDIV(COMPLEX(0,2),COMPLEX(0,1)))", 2],
    ["=SIGN(-2)", -1],
    ["=ERF(1)", 0.8427007929497149], // Abramowitz and Stegun, table 7.1
  ] as const;
  for (const [i, [formula]] of known.entries()) await type(`A${i + 1}`, formula);
  for (const [i, [, value]] of known.entries()) expect((await cell(`A${i + 1}`)).value).toBeCloseTo(value, 12);
});

/** A cell that shows the example's last result, and the value that a hand calculation gives for it. */
const results = [
  // van: density rises 5 to 10 Hz, flat to 40, then falls; overall rms by segments S1 f1/(n+1) ((f2/f1)^(n+1) - 1)
  [3, "van-random.xlsx", "B20", overallOf([5, 10, 40, 80, 200, 500], [0.002, 0.015, 0.015, 0.004, 0.001, 0.0002])],
  // velocity change of a half-sine 2 A D / pi, mm/s
  [4, "trolley-shock.xlsx", "B16", (2 * 12 * 9806.65 * 0.02) / Math.PI],
  // a quarter of the weight, less the share of the offsets x/(sum x^2) and y/(sum y^2) of four equal mounts
  [5, "freezer-mounts.xlsx", "H14", 310 * 9.80665 * (1 / 4 - 0.05 / (4 * 0.42) - 0.03 / (4 * 0.31))],
] as const;

test.each(results)("example %i, %s, stands without an error and %s is %f", async (index, name, at, value) => {
  await openExample(index, name);
  await page.waitForFunction((at) => {
    const { getters } = (globalThis as any).plinthTrial.model();
    const sheetId = getters.getActiveSheetId();
    const { left: col, top: row } = getters.getRangeFromSheetXC(sheetId, at).zone;
    return typeof getters.getEvaluatedCell({ sheetId, col, row }).value === "number";
  }, at);
  const whole = await page.evaluate(async () => {
    const { sheets } = await (globalThis as any).plinthTrial.sheet.workbook({});
    return sheets.flatMap((sheet: any) => [...sheet.cells.values()].filter((each: any) => each.value?.error));
  });
  expect(whole).toEqual([]);
  const shown = (await cell(at)).value as number;
  expect(Math.abs(shown / value - 1)).toBeLessThan(1e-12);
});

function overallOf(f: number[], S: number[]): number {
  const area = f.slice(1).map((f2, i) => {
    const n = Math.log(S[i + 1]! / S[i]!) / Math.log(f2 / f[i]!);
    return ((S[i]! * f[i]!) / (n + 1)) * ((f2 / f[i]!) ** (n + 1) - 1);
  });
  return Math.sqrt(area.reduce((sum, part) => sum + part, 0));
}

test("the sizing example stands without an error and keeps its names and formulas when saved and opened again", async () => {
  await openExample(0, "balance-sizing.xlsx");
  await page.waitForFunction(() => {
    const { getters } = (globalThis as any).plinthTrial.model();
    return getters.getEvaluatedCell({ sheetId: getters.getActiveSheetId(), col: 1, row: 12 }).value > 24;
  });
  const whole = await page.evaluate(async () => {
    const { sheets } = await (globalThis as any).plinthTrial.sheet.workbook({});
    return sheets.flatMap((sheet: any) => [...sheet.cells.values()].filter((each: any) => each.value?.error));
  });
  expect(whole).toEqual([]);
  const path = await saveCopy("sizing copy.xlsx");
  const before = partsOf(join(dist, "trial/examples/balance-sizing.xlsx"));
  const after = partsOf(path);
  const sheetBefore = before["xl/worksheets/sheet1.xml"]!;
  const sheetAfter = after["xl/worksheets/sheet0.xml"]!;
  const formulas = [...sheetBefore.matchAll(/<c r="([A-Z]+\d+)"[^>]*><f/g)].map(([, at]) => at!);
  expect(formulas.length).toBeGreaterThan(10);
  for (const at of formulas) expect([at, storedFormula(sheetAfter, at)]).toEqual([at, storedFormula(sheetBefore, at)]);
  expect(storedFormula(sheetAfter, "B20")).toEqual({
    attributes: "",
    formula: "_xldudf_PLINTH_NATFREQ(mounts*mountStiffness,slabMass)",
  });
  expect(after["xl/workbook.xml"]).toMatch(/<definedName name="slabMass">Microbalance!\$B\$7<\/definedName>/);
  await page.setInputFiles("#file", path);
  await waitForFile("sizing copy.xlsx");
  expect((await cell("B20")).text).toBe("=PLINTH.NATFREQ(mounts*mountStiffness,slabMass)");
  // sqrt(k/m)/(2 pi) for four mounts of 88,000 N/m under 186 kg
  expect((await cell("B20")).value).toBeCloseTo(Math.sqrt((4 * 88000) / 186) / (2 * Math.PI), 12);
});

test("a legacy sheet keeps table references, constants and LOG10; edited cells are written plainly", async () => {
  await openExample(2, "seedbank-legacy.xlsx");
  expect((await cell("I6", "Plant")).value).toBeGreaterThan(0);
  expect((await cell("B17", "Balance room")).text).toBe("=20*LOG(B13)");
  await page.evaluate(() =>
    (globalThis as any).plinthTrial.sheet.write(
      { sheet: "Balance room", row: 19, column: 1 },
      "=LOG10(B11)+SUM(B5:B6)",
    ),
  );
  const after = partsOf(await saveCopy("legacy copy.xlsx"));
  const plant = after["xl/worksheets/sheet0.xml"]!;
  const room = after["xl/worksheets/sheet1.xml"]!;
  expect(storedFormula(plant, "F6")?.formula).toBe("Plant[[#This Row],[Speed, rpm]]/60");
  expect(after["xl/tables/table1.xml"]).toMatch(/displayName="Plant"/);
  expect(storedFormula(room, "B15")?.formula).toBe("gn/B10^2*1000");
  expect(storedFormula(room, "B17")?.formula).toBe("20*LOG10(B13)");
  expect(storedFormula(room, "B20")).toEqual({ attributes: "", formula: "LOG(B11)+SUM(B5:B6)" });
  expect(after["xl/workbook.xml"]).toMatch(/<definedName name="gn">9.80665<\/definedName>/);
});

test("formulas follow when a row is put in, and spilled ones are written as such", async () => {
  await openExample(1, "condenser-sweep.xlsx");
  await page.evaluate(() => {
    const model = (globalThis as any).plinthTrial.model();
    const sheetId = model.getters.getActiveSheetId();
    const sheetName = model.getters.getSheetName(sheetId);
    model.dispatch("ADD_COLUMNS_ROWS", {
      sheetId,
      sheetName,
      dimension: "ROW",
      base: 3,
      quantity: 1,
      position: "before",
    });
  });
  const after = partsOf(await saveCopy("sweep copy.xlsx"));
  expect(storedFormula(after["xl/worksheets/sheet0.xml"]!, "A12")).toEqual({
    attributes: 't="array" ref="A12:A128"',
    formula: "_xldudf_PLINTH_SWEEP(B7,B8,117,&quot;log&quot;)",
  });
  expect(after["xl/workbook.xml"]).toMatch(/<definedName name="fnCondenser">Sweep!\$B\$6<\/definedName>/);
  expect(Object.keys(after)).toContain("xl/charts/chart1.xml");
});

test("a file that is no workbook is refused and the sheet stays", async () => {
  await type("A1", "kept");
  const path = join(folder, "notes.xlsx");
  writeFileSync(path, "fn,zeta\n8,0.1\n");
  await page.setInputFiles("#file", path);
  await page.waitForSelector("#notice:not([hidden])");
  expect(await message()).toContain("notes.xlsx was not opened. It is not an .xlsx workbook.");
  expect((await cell("A1")).value).toBe("kept");
});

test("a dropped file is opened", async () => {
  const bytes = [...readFileSync(join(dist, "trial/examples/balance-sizing.xlsx"))];
  await page.evaluate((bytes) => {
    const dataTransfer = new DataTransfer();
    dataTransfer.items.add(new File([new Uint8Array(bytes)], "dropped.xlsx"));
    for (const kind of ["dragover", "drop"])
      document.body.dispatchEvent(new DragEvent(kind, { dataTransfer, bubbles: true, cancelable: true }));
  }, bytes);
  await waitForFile("dropped.xlsx");
  expect((await cell("A1")).value).toMatch(/microbalance/);
});

test("a copy never takes the original's name", async () => {
  await openExample(0, "balance-sizing.xlsx");
  await page.click("#save");
  expect(await page.inputValue("#save-name")).toBe("balance-sizing copy.xlsx");
  await page.fill("#save-name", "Balance-Sizing");
  await page.click("#save-form .primary");
  expect(await page.locator("#save-name").evaluate((field: HTMLInputElement) => field.validationMessage)).toMatch(
    /never overwritten/,
  );
  await page.keyboard.press("Escape");
});

test("text that looks like a number or a formula is still text after saving and opening", async () => {
  await type("A1", "'0012");
  await type("A2", "'=B1");
  await type("A3", "1e-9");
  const path = await saveCopy("texts.xlsx");
  await page.setInputFiles("#file", path);
  await waitForFile("texts.xlsx");
  expect([(await cell("A1")).value, (await cell("A2")).value, (await cell("A3")).value]).toEqual(["0012", "=B1", 1e-9]);
});

import type { Server } from "node:http";
import type { Browser, Page } from "playwright-core";
import { launchBrowser, serveDist, watch } from "../support/browser";
import { axe } from "../support/panePage";

jest.setTimeout(120_000);

let browser: Browser;
let server: Server;
let page: Page;
let seen: ReturnType<typeof watch>;

beforeAll(async () => {
  browser = await launchBrowser();
  const served = await serveDist();
  server = served.server;
  page = await browser.newPage({ viewport: { width: 1280, height: 900 } });
  seen = watch(page);
  await page.goto(`${served.address}/trial/`);
  await page.waitForSelector("#pane[data-ready]", { timeout: 60_000 });
});
afterAll(async () => {
  await browser?.close();
  await new Promise((done) => (server ? server.close(done) : done(undefined)));
  expect(seen).toEqual({ requests: [], errors: [] });
});

const put = (cells: Record<string, string>): Promise<void> =>
  page.evaluate((given) => {
    const model = (globalThis as any).plinthTrial.model();
    const sheetId = model.getters.getActiveSheetId();
    for (const [at, content] of Object.entries(given)) {
      const { left: col, top: row } = model.getters.getRangeFromSheetXC(sheetId, at).zone;
      model.dispatch("UPDATE_CELL", { sheetId, col, row, content });
    }
  }, cells);

async function select(col: number, row: number): Promise<void> {
  await page.evaluate(([c, r]) => (globalThis as any).plinthTrial.model().selection.selectCell(c, r), [
    col,
    row,
  ] as const);
  await page.waitForTimeout(150);
}

const pane = () => page.locator("#plinth-cell");

test("the pane follows the sheet: selecting, changing a value, undoing the change", async () => {
  await put({ B1: "25", B2: "8", B3: "0.1", B4: "=PLINTH.ABSTRANS(B1,B2,B3)" });
  await select(1, 3);
  await pane().locator(".result strong", { hasText: "0.1342" }).waitFor();
  await put({ B1: "50" });
  await pane().locator(".arguments tbody tr", { hasText: "50" }).first().waitFor();
  await page.evaluate(() => (globalThis as any).plinthTrial.model().dispatch("REQUEST_UNDO"));
  await pane().locator(".result strong", { hasText: "0.1342" }).waitFor();
});

test("a spilled cell is explained by its own element of the range", async () => {
  await put({ D1: "=PLINTH.SWEEP(10,30,3)", E1: "=PLINTH.ABSTRANS(D1:D3,8,0.1)" });
  await select(4, 2);
  await pane().locator(".arguments tbody tr", { hasText: "30" }).first().waitFor();
  await pane().getByRole("button", { name: "Select D3" }).waitFor();
});

test("an error shows what the function said", async () => {
  await put({ B6: "=PLINTH.ABSTRANS(B1,0,B3)" });
  await select(1, 5);
  expect(await pane().locator(".flag").last().innerText()).toMatch(/#NUM!.*above 0, got 0/i);
});

test("an inserted function can be undone", async () => {
  await select(7, 9);
  await pane().getByRole("button", { name: "How bad is resonance?" }).click();
  await pane().locator("fluent-text-input input").first().fill("0.1");
  await pane().locator("fluent-button", { hasText: "Insert" }).click();
  await pane().locator(".head h2", { hasText: "PEAKTRANS" }).waitFor();
  await page.evaluate(() => (globalThis as any).plinthTrial.model().dispatch("REQUEST_UNDO"));
  await pane().locator(".start h2").waitFor();
});

test("a misspelt function shows what the spreadsheet says of it", async () => {
  await put({ B7: "=PLINTH.ABSTRAN(25,8,0.1)" });
  await select(1, 6);
  await pane().locator(".flag", { hasText: "#NAME?" }).waitFor();
  expect(await pane().locator(".flag").innerText()).toMatch(/unknown function.*ABSTRAN/i);
});

test("F6 leads from the grid to the pane and on to the header, and back", async () => {
  const part = () => page.evaluate(() => document.activeElement?.closest("header, #grid, #pane")?.id ?? "nowhere");
  await page.locator("#open").focus();
  const parts: string[] = [];
  for (const key of ["F6", "F6", "F6", "Shift+F6"]) {
    await page.keyboard.press(key);
    parts.push(await part());
  }
  expect(parts).toEqual(["grid", "pane", "", "pane"]);
});

test("the legacy example is audited in place, and its sheet stays as it was", async () => {
  await page.getByRole("button", { name: "Examples" }).click();
  await page.locator("#example-list button", { hasText: "Legacy sheet" }).click();
  await page.waitForTimeout(1500);
  const formulas = () =>
    page.evaluate(() => {
      const { getters } = (globalThis as any).plinthTrial.model();
      return getters
        .getSheetIds()
        .flatMap((id: string) => Object.values(getters.getCells(id)).map((cell: any) => cell.content));
    });
  const before = await formulas();
  await page.getByRole("tab", { name: "Audit" }).click();
  await page.locator("#plinth-audit fluent-button[appearance=primary]").click();
  await page.locator(".results .group").first().waitFor({ timeout: 60_000 });
  expect(await formulas()).toEqual(before);
  expect(await axe(page)).toEqual([]);
});

test("an accepted finding is there when the copy is opened, and gone with another workbook", async () => {
  const entry = page.locator("#plinth-audit .entry").first();
  await entry.locator("summary").click();
  await entry.locator("input").fill("measured on site");
  await entry.locator("fluent-button", { hasText: "Keep" }).click();
  await page.locator("#plinth-audit .fold", { hasText: "Accepted" }).waitFor();
  await page.locator("#save").click();
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.locator("#save-form [type=submit]").click(),
  ]);
  await page.getByRole("button", { name: "Examples" }).click();
  await page.locator("#example-list button", { hasText: "Sizing sheet" }).click();
  await page.waitForFunction(() => document.querySelector("#plinth-audit .results")?.childElementCount === 0);
  expect(await page.evaluate(() => (globalThis as any).plinthTrial.sheet.notes())).toBeNull();
  await page.locator("#file").setInputFiles(await download.path());
  await page.waitForTimeout(1500);
  await page.locator("#plinth-audit fluent-button[appearance=primary]").click();
  const accepted = page.locator("#plinth-audit .fold", { hasText: "Accepted" });
  await accepted.waitFor({ timeout: 60_000 });
  expect(await accepted.innerText()).toMatch(/Accepted/);
  await accepted.locator("summary").first().click();
  await accepted.locator(".group summary").first().click();
  expect(await accepted.innerText()).toMatch(/measured on site/);
});

test("the pane's own rows and bars keep out of the way of the library's style sheet", async () => {
  const { left, right } = await page.locator("#plinth-audit").evaluate((panel) => {
    const inside = (element: Element) => element.getBoundingClientRect();
    const run = inside(panel.querySelector("fluent-button[appearance=primary]")!);
    const lead = inside(panel.querySelector("h2")!);
    return { left: run.left - lead.left, right: lead.right - run.right };
  });
  expect(left).toBe(0);
  expect(right).toBeGreaterThan(0);
});

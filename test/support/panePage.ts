/** The add-in's own pane page in a headless browser, with a stand-in for Excel behind it. */
import { readFileSync } from "node:fs";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { columnOf, rowOf, type Workbook } from "../../src/audit/workbook";
import { cellName } from "../../src/formula/references";
import { type FakeBook, type FakeExcel, installFakeExcel } from "./fakeExcel";

const OFFICE = "https://appsforoffice.microsoft.com/**";

export interface PanePage {
  readonly page: Page;
  /** requests to anywhere but this machine, and errors on the console */
  readonly seen: { requests: string[]; errors: string[] };
}

export async function openPane(
  browser: Browser,
  address: string,
  book: FakeBook,
  { width = 360, colorScheme = "light" as "light" | "dark", forced = false } = {},
): Promise<PanePage> {
  const page = await browser.newPage({ viewport: { width, height: 800 }, colorScheme, reducedMotion: "reduce" });
  if (forced) await page.emulateMedia({ forcedColors: "active" });
  const seen = { requests: [] as string[], errors: [] as string[] };
  page.on("request", (request) => {
    const { hostname, protocol } = new URL(request.url());
    const own = hostname === "localhost" || protocol === "data:" || protocol === "blob:";
    if (!own && !request.url().startsWith(OFFICE.slice(0, -2))) seen.requests.push(request.url());
  });
  page.on("console", (message) => message.type() === "error" && seen.errors.push(message.text()));
  page.on("pageerror", (error) => seen.errors.push(error.stack ?? error.message));
  await page.route(OFFICE, (route) => route.fulfill({ contentType: "text/javascript", body: "" }));
  await page.addInitScript(() => {
    // functions.js registers itself with the runtime that Excel's script brings along.
    Object.assign(globalThis, { CustomFunctions: { associate() {} } });
  });
  await page.addInitScript(installFakeExcel, book);
  await page.goto(`${address}/taskpane.html`);
  await page.waitForSelector("#pane[data-ready]");
  return { page, seen };
}

/** Selects a cell in the stand-in and waits until the pane has followed. */
export async function select(page: Page, sheet: string, row: number, column: number, rows = 1): Promise<void> {
  await page.evaluate(
    ([name, r, c, n]) => (globalThis as unknown as { fakeExcel: FakeExcel }).fakeExcel.select(name, r, c, n),
    [sheet, row, column, rows] as const,
  );
  await page.waitForTimeout(60);
}

/** What the stand-in's workbook now holds. */
export const bookOf = (page: Page): Promise<FakeBook> =>
  page.evaluate(() => (globalThis as unknown as { fakeExcel: FakeExcel }).fakeExcel.book);

/** A workbook of the audit's model as the stand-in's. */
export function asFake(workbook: Workbook): FakeBook {
  return {
    sheets: workbook.sheets.map(({ name, cells }) => ({
      name,
      cells: Object.fromEntries(
        [...cells].map(([key, { formula, value, format }]) => [
          cellName(rowOf(key), columnOf(key)),
          {
            ...(formula !== undefined && { formula }),
            ...(format !== undefined && { format }),
            ...(value !== null && typeof value === "object"
              ? { value: value.error, type: "Error" as const }
              : { value: value ?? "" }),
          },
        ]),
      ),
    })),
    names: workbook.names.filter(({ sheet }) => sheet === undefined).map(({ name, formula }) => ({ name, formula })),
    tables: workbook.tables.map(({ name, sheet, top, left, bottom, right, columns, totalsRows }) => ({
      name,
      sheet,
      area: [top, left, bottom - top + 1, right - left + 1],
      columns: [...columns],
      totals: totalsRows > 0,
    })),
  };
}

export const axeSource = readFileSync(join(__dirname, "../../node_modules/axe-core/axe.min.js"), "utf8");

/** What axe-core finds wrong inside the pane, each as "rule: element". */
export async function axe(page: Page, within = "#pane"): Promise<string[]> {
  await page.evaluate(axeSource);
  return page.evaluate(async (selector) => {
    const { violations } = await (globalThis as any).axe.run(selector, {
      runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
    });
    return violations.flatMap((violation: any) =>
      violation.nodes.map((node: any) => `${violation.id}: ${node.html.slice(0, 160)} ${node.failureSummary}`),
    );
  }, within);
}

import type { Server } from "node:http";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { auditWorkbook } from "../../src/audit/audit";
import { readBook } from "../../src/cli/read-book";
import { launchBrowser, serveDist } from "../support/browser";
import type { FakeBook } from "../support/fakeExcel";
import { asFake, axe, bookOf, openPane, type PanePage, select } from "../support/panePage";

jest.setTimeout(120_000);

let browser: Browser;
let server: Server;
let address: string;
let opened: PanePage | undefined;

beforeAll(async () => {
  browser = await launchBrowser();
  ({ server, address } = await serveDist());
});
afterAll(async () => {
  await browser?.close();
  await new Promise((done) => (server ? server.close(done) : done(undefined)));
});
afterEach(async () => {
  const seen = opened?.seen;
  await opened?.page.close();
  opened = undefined;
  expect(seen).toEqual({ requests: [], errors: [] });
});

/** A rack on mounts in a ferry's wheelhouse; invented. */
const sizing = (): FakeBook => ({
  sheets: [
    {
      name: "Rack",
      cells: {
        A1: { value: "f (Hz)" },
        B1: { value: 25 },
        A2: { value: "fn (Hz)" },
        B2: { value: 8 },
        A3: { value: "damping ratio" },
        B3: { value: 0.1 },
        A4: { value: "transmissibility" },
        B4: { formula: "PLINTH.ABSTRANS(B1,B2,B3)", value: 0.134190254545645 },
        A5: { value: "isolation efficiency" },
        B5: { formula: "PLINTH.EFFICIENCY(B1,B2,B9)", value: "#VALUE!", type: "Error" },
        A6: { value: "transmissibility by hand" },
        B6: { formula: "1/SQRT((1-(B1/B2)^2)^2+(2*B3*B1/B2)^2)", value: 0.113793109 },
        A7: { value: "worst case" },
        B7: { formula: "PLINTH.TRANSBOUND(B1,B1,B2,B3,0.1,0.2)", value: 0.170382227 },
      },
    },
  ],
});

async function open(book: FakeBook, options = {}): Promise<Page> {
  opened = await openPane(browser, address, book, options);
  return opened.page;
}

const panel = (page: Page) => page.locator("#plinth-cell");

describe("a cell with one of our functions", () => {
  test("shows arguments with value, unit and source, result, reason, worked line and curve", async () => {
    const page = await open(sizing());
    await select(page, "Rack", 3, 1);
    await expect(panel(page).locator(".head h2").innerText()).resolves.toMatch(/Cell B4\s*ABSTRANS/);
    expect(await panel(page).locator(".result strong").innerText()).toBe("0.1342");
    expect(await panel(page).locator(".arguments tbody tr").count()).toBe(4);
    const rows = await panel(page).locator(".arguments tbody").innerText();
    expect(rows).toMatch(/Excitation frequency[\s\S]*25[\s\S]*B1/);
    expect(rows).toMatch(/not percent, not loss factor[\s\S]*0\.1[\s\S]*B3/);
    expect(await panel(page).locator(".why").innerText()).toMatch(/^Isolates: at r = 3\.13 /);
    await panel(page).locator("math").first().waitFor();
    // r = 25/8 and the printed T, from the definition of T at r = 3.125, zeta = 0.1
    const worked = (await panel(page).locator(".worked-lines").textContent())!;
    expect(worked).toContain("3.125");
    expect(worked).toContain("0.1342");
    const label = await panel(page).locator("canvas").getAttribute("aria-label");
    expect(label).toMatch(/At 25 the item moves 0\.1342 times the base, the mount 1\.111 times/);
  });

  test("flags a blank cell behind an argument and explains the error", async () => {
    const page = await open(sizing());
    await select(page, "Rack", 4, 1);
    const flags = await panel(page).locator(".flag").allInnerTexts();
    expect(flags[0]).toMatch(/^B9 is blank/);
    expect(flags[1]).toMatch(/#VALUE!/);
  });

  test("an argument's source selects its cell in the sheet", async () => {
    const page = await open(sizing());
    await select(page, "Rack", 3, 1);
    await panel(page).getByRole("button", { name: "Select B2" }).click();
    await page.waitForTimeout(50);
    expect(await page.evaluate(() => (globalThis as any).fakeExcel.selected())).toEqual({
      sheet: "Rack",
      area: [1, 1, 1, 1],
    });
  });

  test("tolerances among the arguments give a worst case beside the curve", async () => {
    const page = await open(sizing());
    await select(page, "Rack", 6, 1);
    // the cell itself holds the exact bound
    await expect(panel(page).locator("figcaption").innerText()).resolves.toMatch(/item 0\.1704 times/);
  });

  test("tolerances typed in the pane are kept in the workbook", async () => {
    const page = await open(sizing());
    await select(page, "Rack", 3, 1);
    const field = panel(page).locator("fluent-text-input").first().locator("input");
    await field.fill("10");
    await field.press("Enter");
    await field.blur();
    await page.waitForTimeout(100);
    expect(await panel(page).locator("figcaption").innerText()).toMatch(/Worst case within the tolerances/);
    expect((await bookOf(page)).notes).toContain('"naturalFrequency":0.1');
  });
});

test("an empty cell offers questions; choosing one writes its function with picked arguments", async () => {
  const page = await open(sizing());
  await select(page, "Rack", 9, 1);
  await panel(page).getByRole("button", { name: "How much of the base motion arrives?" }).click();
  for (const [i, row] of [0, 1, 2].entries()) {
    await panel(page).locator("fluent-button[aria-pressed]").nth(i).click();
    await select(page, "Rack", row, 1);
  }
  await panel(page).locator("fluent-button", { hasText: "Insert" }).click();
  await page.waitForTimeout(100);
  expect((await bookOf(page)).sheets[0]!.cells["B10"]).toMatchObject({ formula: "PLINTH.ABSTRANS(B1,B2,B3)" });
});

test("inserting without a needed argument says which one and writes nothing", async () => {
  const page = await open(sizing());
  await select(page, "Rack", 9, 1);
  await panel(page).getByRole("button", { name: "How bad is resonance?" }).click();
  await panel(page).locator("fluent-button", { hasText: "Insert" }).click();
  expect(await page.locator(".said").innerText()).toMatch(/^Damping.* is missing\.$/);
  expect((await bookOf(page)).sheets[0]!.cells["B10"]).toBeUndefined();
});

test("a hand formula is named, with its slip and effect", async () => {
  const page = await open(sizing());
  await select(page, "Rack", 5, 1);
  await panel(page).locator(".finding").waitFor();
  expect(await panel(page).locator(".finding").innerText()).toMatch(/Differs[\s\S]*numerator[\s\S]*15\.2%, in B6/);
});

describe("the audit", () => {
  const path = join(__dirname, "../audit/blind/workbooks/chiller_and_pump_calc.xlsx");

  async function audited(): Promise<Page> {
    const page = await open(asFake(readBook(path)));
    await page.getByRole("tab", { name: "Audit" }).click();
    await page.locator("#plinth-audit fluent-button[appearance=primary]").click();
    await page.locator(".results p").first().waitFor();
    return page;
  }

  test("finds what the command line finds", async () => {
    const wrong = auditWorkbook(readBook(path)).filter(({ verdict }) => verdict === "differs");
    const page = await audited();
    await page
      .locator("#plinth-audit details.group")
      .evaluateAll((groups) => groups.forEach((each) => ((each as HTMLDetailsElement).open = true)));
    const entries = await page.locator("#plinth-audit .results > .group .entry").allTextContents();
    expect(wrong.length).toBeGreaterThan(0);
    expect(entries).toHaveLength(wrong.length);
    for (const { message } of wrong) expect(entries.some((entry) => entry.includes(message))).toBe(true);
  });

  test("changes no audited cell, keeps an acceptance with its reason, and shows it next time", async () => {
    const page = await audited();
    const before = (await bookOf(page)).sheets;
    const entries = page.locator("#plinth-audit .results > .group .entry");
    const count = await entries.count();
    await entries.first().locator("details.accept summary").click();
    await entries.first().locator("details.accept input").fill("measured on site, see report 12");
    await entries.first().locator("fluent-button", { hasText: "Keep" }).click();
    await page.waitForFunction(
      (n) => document.querySelectorAll("#plinth-audit .results > .group .entry").length < n,
      count,
    );
    const after = await bookOf(page);
    expect(after.sheets).toEqual(before);
    expect(after.notes).toContain("measured on site, see report 12");
    await page.close();
    const again = await open(after);
    await again.getByRole("tab", { name: "Audit" }).click();
    await again.locator("#plinth-audit fluent-button[appearance=primary]").click();
    await again.locator(".results details.fold summary").first().waitFor();
    expect(await again.locator("#plinth-audit .accepted").first().textContent()).toContain("measured on site");
  });

  test("writes a findings sheet with the cautions and what was not checked", async () => {
    const page = await audited();
    await page.locator("#plinth-audit fluent-button", { hasText: "Write a findings sheet" }).click();
    await page.waitForFunction(() =>
      (globalThis as any).fakeExcel.book.sheets.some(
        (sheet: any) => sheet.name === "Plinth findings" && sheet.cells.A20,
      ),
    );
    const texts = Object.values((await bookOf(page)).sheets.at(-1)!.cells).map(({ value }) => String(value));
    expect(texts.some((text) => text.startsWith("Numbers come from the inputs"))).toBe(true);
    expect(texts).toContain("Not checked");
    expect(texts).toContain("Differs");
  });
});

test("the copy with plain formulas leaves the sheet as it was", async () => {
  const page = await open(sizing());
  await select(page, "Rack", 3, 1);
  const before = (await bookOf(page)).sheets[0];
  await page.getByRole("tab", { name: "Audit" }).click();
  await page.locator("#plinth-audit fluent-button", { hasText: "Plain-formula copy" }).click();
  await page.waitForFunction(() => (globalThis as any).fakeExcel.book.sheets.length === 3);
  await page.waitForTimeout(100);
  const { sheets } = await bookOf(page);
  expect(sheets[0]).toEqual(before);
  const copy = sheets.find(({ name }) => name === "Rack plain")!;
  expect(copy.cells["B4"]!.formula).toMatch(/SQRT\(\(1\+\(2\*B3\*\(B1\/B2\)\)\^2\)/);
  expect(await page.locator(".said").innerText()).toMatch(/“Rack plain”; 3 formulas replaced/);
});

test("the views are reached by keyboard alone", async () => {
  const page = await open(sizing());
  await select(page, "Rack", 3, 1);
  await page.keyboard.press("Tab");
  await page.keyboard.press("ArrowRight");
  expect(await page.locator("#plinth-audit").isVisible()).toBe(true);
  await page.keyboard.press("ArrowRight");
  expect(await page.locator("#plinth-cautions").isVisible()).toBe(true);
  expect(await page.locator("#plinth-cautions h4").count()).toBeGreaterThanOrEqual(12);
  expect(await page.locator(".standing").innerText()).toMatch(/qualified engineer/);
});

describe.each([
  ["light", {}],
  ["dark", { theme: "#262626" }],
] as const)("in the %s theme", (_name, host) => {
  test.each(["This cell", "Audit", "Cautions"])("axe-core finds nothing in the view %s", async (view) => {
    const page = await open({ ...sizing(), ...host });
    await select(page, "Rack", 3, 1);
    await panel(page).locator("math").first().waitFor();
    await page.getByRole("tab", { name: view }).click();
    await page.waitForTimeout(150);
    expect(await axe(page)).toEqual([]);
  });
});

test.each([320, 600])("nothing is wider than the pane at %i px", async (width) => {
  const page = await open(sizing(), { width });
  await select(page, "Rack", 3, 1);
  await panel(page).locator("math").first().waitFor();
  const overflow = await page.evaluate(() => {
    const panels = document.querySelector("#plinth-cell")!;
    return panels.scrollWidth - panels.clientWidth;
  });
  expect(overflow).toBe(0);
});

test("numbers follow the locale", async () => {
  const page = await open({ ...sizing(), locale: "de-DE" });
  await select(page, "Rack", 3, 1);
  expect(await panel(page).locator(".result strong").innerText()).toBe("0,1342");
});

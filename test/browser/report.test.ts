/** The report's page in a real browser: on a wide and a narrow screen, light and dark, and on paper. */
import { readFileSync } from "node:fs";
import type { AxeResults } from "axe-core";
import type { Browser } from "playwright-core";
import type { Finding } from "../../src/audit/finding";
import { htmlReport } from "../../src/cli/report-html";
import { launchBrowser, watch } from "../support/browser";

const PATIENCE = 600_000; // milliseconds: for machines that must first install a browser, or are slow
const axe = readFileSync(require.resolve("axe-core/axe.min.js"), "utf8");

const finding = (cell: string, rows: number): Finding => ({
  sheet: "Weaving shed, upper floor",
  cell,
  quantity: "absolute-transmissibility",
  verdict: "differs",
  mistake: "numerator-damping-missing",
  relation: "T = SQRT((1+(2*zeta*r)^2)/((1-r^2)^2+(2*zeta*r)^2))",
  evidence:
    "absolute transmissibility by the relation above; A5 = frequency ratio; agrees with the slip at 6 of 6 points",
  maxRelativeError: 0.486,
  worstCell: "E24",
  suggestion: "PLINTH.ABSTRANS(excitation frequency, natural frequency, damping ratio)",
  message: "Without (2ζr)² in the numerator this is the magnification of a driven mass.",
  formula: `1/SQRT((1-(A5/B5)^2)^2+(2*C5*A5/B5)^2)+${"0*A5+".repeat(40)}0`,
  comparison: Array.from({ length: rows }, (_, i) => ({
    cell: `E${5 + i}`,
    hand: 1 / (1 + i * i),
    right: 1 / (1 + i),
  })),
  role: "T",
});
const agrees: Finding = { ...finding("F5:F24", 0), verdict: "agrees", mistake: null, maxRelativeError: 0 };
const open: Finding = { ...agrees, cell: "G5:G24", verdict: "unrecognised", quantity: null, relation: null };
const page = htmlReport({
  books: {
    "a name as long as engineers give to their files, revision 12, final.xlsx": [finding("E5:E24", 20), agrees, open],
  },
  date: new Date("2031-05-06T12:00:00Z"),
  version: "9.8.7",
});

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
}, PATIENCE);
afterAll(() => browser?.close());

const views = [
  ["wide and light", 1200, "light"],
  ["wide and dark", 1200, "dark"],
  ["320 pixels wide", 320, "light"],
] as const;

test.each(views)(
  "the page %s shows everything, asks nothing of the network, and can be read by everyone",
  async (_, width, colorScheme) => {
    const context = await browser.newContext({ viewport: { width, height: 900 }, colorScheme, bypassCSP: true });
    const tab = await context.newPage();
    const seen = watch(tab);
    await tab.setContent(page);
    expect(await tab.evaluate("document.documentElement.scrollWidth")).toBeLessThanOrEqual(width);
    expect(await tab.evaluate("document.querySelector('math').getBoundingClientRect().height")).toBeGreaterThan(20);
    await tab.evaluate(axe);
    const { violations } = (await tab.evaluate("axe.run()")) as AxeResults;
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]!.html.slice(0, 90)}`)).toEqual([]);
    expect(seen).toEqual({ requests: [], errors: [] });
    await context.close();
  },
  PATIENCE,
);

test(
  "on paper the page is dark on white whatever the screen prefers",
  async () => {
    const context = await browser.newContext({ colorScheme: "dark" });
    const tab = await context.newPage();
    await tab.setContent(page);
    await tab.emulateMedia({ media: "print" });
    expect(await tab.evaluate("getComputedStyle(document.body).backgroundColor")).toBe("rgb(255, 255, 255)");
    expect(await tab.evaluate("getComputedStyle(document.body).color")).toBe("rgb(0, 0, 0)");
    expect((await tab.pdf({ format: "A4" })).subarray(0, 5).toString()).toBe("%PDF-");
    await context.close();
  },
  PATIENCE,
);

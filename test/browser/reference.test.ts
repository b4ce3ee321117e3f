import { readFileSync } from "node:fs";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import type { Browser, Page } from "playwright-core";
import { launchBrowser } from "../support/browser";

const file = join(__dirname, "../../dist/reference.html");
const axe = readFileSync(require.resolve("axe-core/axe.min.js"), "utf8");
const PATIENCE = 600_000; // milliseconds; the browser may first have to be installed

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
}, PATIENCE);
afterAll(() => browser?.close());

async function open(colorScheme: "light" | "dark", width: number): Promise<Page> {
  const page = await browser.newPage({ viewport: { width, height: 900 }, colorScheme });
  await page.goto(pathToFileURL(file).href);
  return page;
}

test("the page is well-formed: every element closes where it should", async () => {
  const page = await open("light", 1280);
  const complaint = await page.evaluate(
    (html) => new DOMParser().parseFromString(html, "application/xhtml+xml").querySelector("parsererror")?.textContent,
    readFileSync(file, "utf8").replace('<html lang="en">', '<html lang="en" xmlns="http://www.w3.org/1999/xhtml">'),
  );
  expect(complaint).toBeUndefined();
  await page.close();
});

test("the page asks for no other file and complains of nothing", async () => {
  const page = await browser.newPage();
  const seen: string[] = [];
  page.on("request", (request) => seen.push(request.url()));
  page.on("console", (message) => seen.push(message.text()));
  await page.goto(pathToFileURL(file).href);
  expect(seen.filter((url) => !url.startsWith("data:"))).toEqual([pathToFileURL(file).href]);
  await page.close();
});

/** Both palettes and both layouts; the two others would look at the same rules again. */
const looks = [
  ["light", 1280],
  ["dark", 320],
] as const;

test.each(looks)(
  "axe finds no fault in %s at %i px",
  async (scheme, width) => {
    const page = await open(scheme, width);
    await page.evaluate(axe);
    const faults = await page.evaluate(async () => {
      const { violations } = await (globalThis as any).axe.run();
      return violations.map(
        ({ id, nodes }: any) => `${id}: ${nodes.map(({ html }: any) => html.slice(0, 120)).join(" | ")}`,
      );
    });
    expect(faults).toEqual([]);
    await page.close();
  },
  120_000,
);

test.each([320, 500, 800, 1280])("nothing sticks out sideways at %i px", async (width) => {
  const page = await open("light", width);
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
  await page.close();
});

test("the keyboard alone reaches the contents and a function's section", async () => {
  const page = await open("light", 1280);
  await page.keyboard.press("Tab");
  expect(await page.evaluate(() => document.activeElement?.textContent)).toBe("Skip to the functions");
  await page.focus('nav a[href="#ABSTRANS"]');
  await page.keyboard.press("Enter");
  const top = await page.evaluate(() => document.getElementById("ABSTRANS")!.getBoundingClientRect().top);
  expect(Math.abs(top)).toBeLessThan(100);
  await page.close();
});

test("on paper the sections stand without the contents", async () => {
  const page = await open("dark", 1280);
  await page.emulateMedia({ media: "print", colorScheme: "dark" });
  expect(await page.isVisible("nav")).toBe(false);
  expect(await page.isVisible("#ABSTRANS .signature")).toBe(true);
  const pdf = await page.pdf({ format: "A4" });
  expect(pdf.length).toBeGreaterThan(10_000);
  await page.close();
});

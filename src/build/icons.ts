/** Draws assets/icon-*.png from the SVG sources. Run by hand after a change: `npx tsx src/build/icons.ts`. */
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { chromium } from "playwright-core";

const assets = join(import.meta.dirname, "../../assets");

/** The small drawing sits on the grid of 16 pixels, where the other would blur. */
const DRAWINGS = { 16: "icon-small.svg", 32: "icon.svg", 64: "icon.svg", 80: "icon.svg" };

const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM_PATH ?? "/usr/bin/chromium",
  args: ["--no-sandbox", "--disable-gpu", "--disable-background-networking"],
});
try {
  for (const [size, drawing] of Object.entries(DRAWINGS)) {
    const page = await browser.newPage({ viewport: { width: Number(size), height: Number(size) } });
    const svg = readFileSync(join(assets, drawing), "utf8");
    await page.setContent(`<style>body{margin:0}svg{display:block;width:100vw;height:100vh}</style>${svg}`);
    await page.screenshot({ path: join(assets, `icon-${size}.png`), omitBackground: true });
    await page.close();
  }
} finally {
  await browser.close();
}

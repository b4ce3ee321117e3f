/** A headless Chromium for the browser tests: the machine's own, or one that tools.ts has installed. */
import { existsSync } from "node:fs";
import type { Server } from "node:http";
import { join } from "node:path";
import { type Browser, type Page, chromium } from "playwright-core";
import { serve } from "../../src/build/start";

const flags = [
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

const usual = [
  "/usr/bin/chromium",
  "/usr/bin/chromium-browser",
  "/usr/bin/google-chrome",
  "/usr/bin/google-chrome-stable",
  "/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
  "C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe",
];

/** Never undefined and never a skipped test: without a browser it fails and says what to do. */
export function findChromium(): string {
  const given = process.env["CHROMIUM_PATH"];
  if (given) {
    if (!existsSync(given)) throw new Error(`CHROMIUM_PATH names ${given}, where there is no file`);
    return given;
  }
  const found = [...usual, chromium.executablePath()].find((path) => existsSync(path));
  if (found) return found;
  throw new Error(
    "The browser tests need Chromium. Install it (for example: sudo apt-get install chromium) or set CHROMIUM_PATH.",
  );
}

export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: findChromium(), args: flags });
}

export const dist = join(__dirname, "../../dist");

export async function serveDist(): Promise<{ server: Server; address: string }> {
  if (!existsSync(join(dist, "trial/page.js"))) throw new Error("dist/ is not built: run npm run build first");
  const server = await serve(dist, 0);
  const bound = server.address();
  if (bound === null || typeof bound === "string") throw new Error("the server has no port");
  return { server, address: `http://localhost:${bound.port}` };
}

/** What a page must not do: ask other machines, or write errors to its console. */
export function watch(page: Page): { requests: string[]; errors: string[] } {
  const seen = { requests: [] as string[], errors: [] as string[] };
  page.on("request", (request) => {
    const url = new URL(request.url());
    if (!["localhost", "127.0.0.1"].includes(url.hostname) && !["data:", "blob:"].includes(url.protocol))
      seen.requests.push(request.url());
  });
  page.on("console", (message) => {
    if (message.type() === "error") seen.errors.push(`${message.text()} ${message.location().url}`);
  });
  page.on("pageerror", (error) => seen.errors.push(error.stack ?? error.message));
  return seen;
}

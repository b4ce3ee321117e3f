/** Microsoft's own custom-functions runtime with the built functions.js in a headless browser; no Excel, no network. */
import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import type { Browser, Page, Route } from "playwright-core";
import { launchBrowser } from "./browser";

const root = join(__dirname, "../..");
const FOLDERS = [join(root, "dist"), join(root, "node_modules/@microsoft/office-js/dist")];
const ADDRESS = "https://add-in.test/";

/** The flag with which Excel announces that errors among the arguments reach the function (allowErrorForDataTypeAny). */
const ALLOW_ERRORS = 4;

/** The numbers by which the runtime tells the host which error was thrown. */
const THROWN: Record<number, string> = { 1: "#N/A", 5: "#DIV/0!", 6: "#NUM!", 7: "#VALUE!", 8: "#NULL!" };

export type Call = [id: string, args: unknown[]];
export type Cell = number | string | boolean | null | { error: string; message: string };

/** An error among the arguments, as the host hands it over. */
export const hostError = (code: string) => ({ type: "CustomFunctionError", code });

export class CustomFunctionsRuntime {
  private number = 0;
  /** What the page complained about while it loaded and ran. */
  readonly complaints: string[] = [];

  private constructor(
    private readonly browser: Browser,
    private readonly page: Page,
  ) {
    page.on("pageerror", (error) => this.complaints.push(error.message));
    page.on("console", (message) => {
      if (message.type() === "error") this.complaints.push(message.text());
    });
  }

  static async start(): Promise<CustomFunctionsRuntime> {
    const browser = await launchBrowser();
    const page = await browser.newPage();
    const runtime = new CustomFunctionsRuntime(browser, page);
    await page.route("**/*", answer);
    await page.goto(ADDRESS);
    await page.evaluate(standInForHost);
    await page.addScriptTag({ url: `${ADDRESS}custom-functions-runtime.js` });
    await page.addScriptTag({ url: `${ADDRESS}functions.js` });
    return runtime;
  }

  /** Calls the functions as Excel does, all in one message, and gives the cells of each result. */
  async call(calls: Call[]): Promise<Cell[][][]> {
    const entries = calls.map(([id, args]) => {
      const number = ++this.number;
      return [1, 1000, "", JSON.stringify([number, id, args, "Sheet1!A1", ALLOW_ERRORS]), number];
    });
    const first = this.number - calls.length + 1;
    const results = await this.page.evaluate(ask, { entries, first, last: this.number });
    return results.map(cellsOf);
  }

  close(): Promise<void> {
    return this.browser.close();
  }
}

async function answer(route: Route): Promise<void> {
  const { href, pathname } = new URL(route.request().url());
  if (href === ADDRESS)
    return route.fulfill({ contentType: "text/html; charset=utf-8", body: "<!doctype html><title>host</title>" });
  const file = FOLDERS.map((folder) => join(folder, pathname)).find(existsSync);
  if (file === undefined || !href.startsWith(ADDRESS)) return route.abort();
  return route.fulfill({ contentType: "text/javascript; charset=utf-8", body: readFileSync(file) });
}

/** Runs in the page: the channel through which the runtime talks to Excel, which says yes to everything. */
function standInForHost(): void {
  const page = globalThis as any;
  page.results = new Map();
  page._richApiNativeBridge = {
    sendMessageToHost(text: string) {
      const message = JSON.parse(text);
      if (message.type !== 1) return;
      for (const { ArgumentInfo } of JSON.parse(JSON.stringify(message.message.body.Actions))) {
        for (const result of ArgumentInfo?.Arguments?.[0] ?? []) page.results.set(result[0] ?? result.id, result);
      }
      const body = JSON.stringify({ Results: [] });
      const reply = { id: message.id, type: 2, message: { statusCode: 200, headers: {}, body } };
      setTimeout(() => page._richApiNativeBridge.onMessageFromHost(JSON.stringify(reply)), 0);
    },
  };
}

/** Runs in the page: sends the calls and waits until each has an answer. */
async function ask({ entries, first, last }: { entries: unknown[]; first: number; last: number }): Promise<unknown[]> {
  const page = globalThis as any;
  page._richApiNativeBridge.onMessageFromHost(JSON.stringify({ type: 3, message: { entries } }));
  const answers: unknown[] = [];
  for (let number = first; number <= last; number++) {
    while (!page.results.has(number)) await new Promise((resolve) => setTimeout(resolve, 5));
    answers.push(page.results.get(number));
  }
  return answers;
}

/** `[number, true, value, …]` or `[number, false, message, code, …]`. */
function cellsOf(result: any): Cell[][] {
  const [, succeeded, value, code] = result;
  if (!succeeded) return [[{ error: THROWN[code] ?? `unexpected exception, code ${code}`, message: value }]];
  const rows = Array.isArray(value) ? value : [[value]];
  return rows.map((row: any[]) => row.map(cellOf));
}

function cellOf(value: any): Cell {
  if (typeof value !== "object" || value === null) return value;
  return { error: value.code, message: value.message ?? "" };
}

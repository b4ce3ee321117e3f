import { readFileSync, statSync } from "node:fs";
import { join } from "node:path";
import { createContext, runInContext } from "node:vm";
import { gzipSync } from "node:zlib";

const dist = join(__dirname, "../../dist");
const functionsFile = readFileSync(join(dist, "functions.js"), "utf8");
const metadata = JSON.parse(readFileSync(join(dist, "functions.json"), "utf8"));

/** Runs functions.js as a classic script whose page offers these globals, and gives what it associates. */
function associated(globals: object = {}): Map<string, unknown> {
  const found = new Map<string, unknown>();
  const CustomFunctions = { associate: (id: string, compute: unknown) => found.set(id, compute) };
  const page: Record<string, unknown> = { CustomFunctions, ...globals };
  page.self = page.window = page;
  page.document = { currentScript: { tagName: "SCRIPT", src: "https://host.test/functions.js" } };
  runInContext(functionsFile, createContext(page));
  return found;
}

test("functions.js is at most 30 kB, compressed", () => {
  expect(gzipSync(functionsFile).length).toBeLessThanOrEqual(30_000);
});

test("functions.js is a classic script that needs CustomFunctions alone and associates every id once", () => {
  const ids = metadata.functions.map(({ id }: { id: string }) => id);
  expect([...associated().keys()].sort()).toEqual([...ids].sort());
  expect(functionsFile).not.toMatch(/^\s*(import|export)\b/m);
});

test("functions.js builds no host error while it loads, since the host's class does not exist yet", () => {
  expect(() => associated()).not.toThrow();
});

test("functions.js asks no machine for anything and evaluates no text", () => {
  expect(functionsFile).not.toMatch(/\bfetch\(|XMLHttpRequest|sendBeacon|WebSocket|\beval\(|new Function\(/);
});

test.each(["functions.js", "functions.json", "manifest.xml", "taskpane.html", "taskpane.js", "reference.html"])(
  "the build holds %s",
  (file) => {
    expect(statSync(join(dist, file)).size).toBeGreaterThan(200);
  },
);

test.each([16, 32, 64, 80])("the build holds icon-%i.png", (size) => {
  expect(statSync(join(dist, `assets/icon-${size}.png`)).size).toBeGreaterThan(100);
});

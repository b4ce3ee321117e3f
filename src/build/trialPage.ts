/** Puts the trial page beside its bundle: our own files, the spreadsheet library and what it needs, each replaceable. */
import { cpSync, mkdirSync, writeFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { balanceSizing } from "../trial/examples/balanceSizing";
import { condenserSweep } from "../trial/examples/condenserSweep";
import { freezerMounts } from "../trial/examples/freezerMounts";
import { seedbankLegacy } from "../trial/examples/seedbankLegacy";
import { trolleyShock } from "../trial/examples/trolleyShock";
import { vanRandom } from "../trial/examples/vanRandom";
import { writeWorkbook } from "./workbook";

/** file or folder in a package → its place in the page's library folder */
const borrowed: [string, string, string][] = [
  ["@odoo/o-spreadsheet", "dist/o_spreadsheet.min.iife.js", "o_spreadsheet.min.iife.js"],
  ["@odoo/o-spreadsheet", "dist/o_spreadsheet.css", "o_spreadsheet.css"],
  ["@odoo/o-spreadsheet", "dist/o_spreadsheet.xml", "o_spreadsheet.xml"],
  ["@odoo/o-spreadsheet", "LICENSE", "LICENSE-o-spreadsheet.txt"],
  ["@odoo/owl", "dist/owl.iife.min.js", "owl.iife.min.js"],
  ["@odoo/owl", "LICENSE", "LICENSE-owl.txt"],
  ["chart.js", "dist/chart.umd.min.js", "chart.umd.min.js"],
  ["chart.js", "LICENSE.md", "LICENSE-chart.js.txt"],
  ["bootstrap", "dist/css/bootstrap.min.css", "bootstrap.min.css"],
  ["bootstrap", "LICENSE", "LICENSE-bootstrap.txt"],
  ["font-awesome", "css/font-awesome.min.css", "font-awesome/css/font-awesome.min.css"],
  ["font-awesome", "fonts", "font-awesome/fonts"],
];

/** file names as in src/trial/examples/list.ts */
export const exampleBooks = {
  "balance-sizing.xlsx": balanceSizing,
  "condenser-sweep.xlsx": condenserSweep,
  "seedbank-legacy.xlsx": seedbankLegacy,
  "van-random.xlsx": vanRandom,
  "trolley-shock.xlsx": trolleyShock,
  "freezer-mounts.xlsx": freezerMounts,
};

export function copyTrialPage(root: string, dist: string): void {
  const page = join(dist, "trial");
  mkdirSync(page, { recursive: true });
  for (const file of ["index.html", "page.css"]) cpSync(join(root, "src/trial", file), join(page, file));
  cpSync(join(root, "src/trial/library.txt"), join(page, "library/README.txt"));
  mkdirSync(join(page, "examples"), { recursive: true });
  for (const [file, book] of Object.entries(exampleBooks))
    writeFileSync(join(page, "examples", file), writeWorkbook(book));
  for (const [name, from, to] of borrowed) {
    const target = join(page, "library", to);
    mkdirSync(dirname(target), { recursive: true });
    cpSync(join(root, "node_modules", name, from), target, { recursive: true });
  }
}

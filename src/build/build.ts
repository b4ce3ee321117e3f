/** `npm run build`: everything in dist/, for the host at ADDIN_URL (https://localhost:3000 if not set). */
import { cpSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import webpack from "webpack";
import configurations from "../../webpack.config.js";
import { generate } from "./generate";
import { manifestFor } from "./manifest";
import { functionsMetadata } from "./metadata";
import { copyTrialPage } from "./trialPage";

const root = join(import.meta.dirname, "../..");
const dist = join(root, "dist");
const url = (process.env.ADDIN_URL ?? "https://localhost:3000").replace(/\/+$/, "");

async function build(): Promise<void> {
  const manifest = manifestFor(url, readFileSync(join(root, "manifest/manifest.xml"), "utf8"));
  rmSync(dist, { recursive: true, force: true });
  mkdirSync(dist);
  generate();
  await bundle();
  writeFileSync(join(dist, "functions.json"), JSON.stringify(await functionsMetadata(url), null, 1));
  writeFileSync(join(dist, "manifest.xml"), manifest);
  const { referencePage } = await import("./reference"); // reads what generate() has written
  writeFileSync(join(dist, "reference.html"), referencePage());
  for (const file of ["taskpane.html", "taskpane.css"]) cpSync(join(root, "src/office", file), join(dist, file));
  cpSync(join(root, "assets"), join(dist, "assets"), { recursive: true, filter: (file) => !/screenshot/.test(file) });
  copyTrialPage(root, dist);
  console.log(`built dist/ for ${url}`);
}

function bundle(): Promise<void> {
  return new Promise((resolve, reject) => {
    webpack(configurations as webpack.Configuration[]).run((error, stats) => {
      if (error || !stats || stats.hasErrors()) {
        reject(error ?? new Error(stats?.toString({ preset: "errors-warnings", colors: false })));
      } else resolve();
    });
  });
}

build().catch((error: Error) => {
  console.error(error.message);
  process.exitCode = 1;
});

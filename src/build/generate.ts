/** Writes the catalogue of functions that the pane and the trial sheet import. Run by `npm run generate`. */
import { writeFileSync } from "node:fs";
import { join } from "node:path";
import { readFunctionDocs } from "./functionDocs";

export function generate(): void {
  const file = join(import.meta.dirname, "../pane/functions.generated.json");
  writeFileSync(file, `${JSON.stringify(readFunctionDocs(), null, 1)}\n`);
}

if (process.argv[1] === import.meta.filename) generate();

/** Entry of `npm run bench`: runs every test/bench/*.bench.ts in one process and prints one table. */
import { readdirSync } from "node:fs";
import { cpus } from "node:os";
import type { Bench, Figure } from "./measure";

const wanted = process.argv[2] ?? "";
const files = readdirSync(import.meta.dirname).filter((name) => name.endsWith(".bench.ts") && name.includes(wanted));

console.log(`Node ${process.version}, ${cpus().length} × ${cpus()[0].model}; medians\n`);
console.log(`${"ms".padStart(10)}  ${"target".padEnd(22)}  what`);
for (const file of files.sort()) {
  const { default: bench } = (await import(`./${file}`)) as { default: Bench };
  for (const figure of await bench()) console.log(line(figure));
}

function line({ what, median, target = "", met, beside }: Figure): string {
  const verdict = met === undefined ? target : `${target} ${met ? "met" : "MISSED"}`;
  return `${median.toFixed(2).padStart(10)}  ${verdict.padEnd(22)}  ${what}${beside ? ` (${beside})` : ""}`;
}

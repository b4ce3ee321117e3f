/** Writes the table of functions into README.md. Run by hand after a change of a function: `npx tsx src/build/readme.ts`. */
import { readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { FAMILIES, type FunctionDoc, readFunctionDocs } from "./functionDocs";

const file = join(import.meta.dirname, "../../README.md");
const BEGIN = "<!-- functions: written by src/build/readme.ts -->";
const END = "<!-- end of functions -->";

/** The README with its table of functions as the functions' comments have it now. */
export function withFunctionTable(readme: string, docs: FunctionDoc[] = readFunctionDocs()): string {
  const begin = readme.indexOf(BEGIN);
  const end = readme.indexOf(END);
  if (begin < 0 || end < begin) throw new Error("README.md lacks the marks around its table of functions");
  return `${readme.slice(0, begin + BEGIN.length)}\n\n${functionTable(docs)}\n\n${readme.slice(end)}`;
}

function functionTable(docs: FunctionDoc[]): string {
  const rows = Object.entries(FAMILIES).flatMap(([family, name]) => {
    const own = docs.filter((doc) => doc.family === family);
    return own.length === 0 ? [] : [`| **${name}** | |`, ...own.map(row)];
  });
  return ["| function | what it gives |", "|---|---|", ...rows].join("\n");
}

function row({ id, parameters, sentence }: FunctionDoc): string {
  const names = parameters.map(({ name, optional, repeating }) => {
    const shown = repeating ? `${name}…` : name;
    return optional ? `[${shown}]` : shown;
  });
  return `| \`${id}(${names.join(", ")})\` | ${sentence.replace(/\|/g, "\\|")} |`;
}

if (process.argv[1] === import.meta.filename) writeFileSync(file, withFunctionTable(readFileSync(file, "utf8")));

import { reportWriter } from "./report";
import { sameFile } from "./safe-file";

export interface Options {
  readonly books: readonly string[];
  readonly json: boolean;
  /** file for the report */
  readonly report?: string;
  /** file for the copy without the add-in's functions */
  readonly plain?: string;
}

const usage =
  "usage: audit BOOK.xlsx … [--json] [--report FILE.html|.xlsx|.csv]\n       audit BOOK.xlsx --plain OUT.xlsx";

/** Reads the command line; a text is what is wrong with it. */
export function readOptions(args: readonly string[]): Options | string {
  const books: string[] = [];
  const files: { report?: string; plain?: string } = {};
  let json = false;
  for (let i = 0; i < args.length; i++) {
    const [name, value] = split(args[i]!);
    if (name === "--json" && value === undefined) json = true;
    else if (name === "--report" || name === "--plain") {
      const file = value ?? args[++i];
      if (!file || file.startsWith("--")) return `${name} needs the name of a file`;
      files[name === "--report" ? "report" : "plain"] = file;
    } else if (name.startsWith("--")) return `unknown option ${args[i]!}`;
    else books.push(args[i]!);
  }
  if (books.length === 0) return usage;
  return problemOf({ books, json, ...files }) ?? { books, json, ...files };
}

function split(argument: string): [name: string, value?: string] {
  const at = argument.startsWith("--") ? argument.indexOf("=") : -1;
  return at < 0 ? [argument] : [argument.slice(0, at), argument.slice(at + 1)];
}

function problemOf({ books, json, report, plain }: Options): string | undefined {
  const input = (file: string): boolean => books.some((book) => sameFile(book, file));
  if (report !== undefined) {
    if (!reportWriter(report)) return `a report is an .html, .xlsx or .csv file, not ${report}`;
    if (input(report)) return "the report cannot be written over a book that is read";
  }
  if (plain !== undefined) {
    if (json || report !== undefined) return "--plain writes a copy and nothing else: leave out --json and --report";
    if (books.length !== 1) return "--plain copies one book at a time";
    if (!/\.xlsx$/i.test(plain)) return `the copy is an .xlsx file, not ${plain}`;
    if (input(plain)) return "the copy cannot be written over the book itself";
  }
  return undefined;
}

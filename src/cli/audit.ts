import { basename } from "node:path";
import { auditWorkbook } from "../audit/audit";
import type { Finding } from "../audit/finding";
import { readBook } from "./read-book";
import { textReport } from "./text-report";
import { UnreadableError } from "./zip";

/** `audit BOOK.xlsx … [--json]`: exit status 0 no differences, 1 differences found, 2 could not read. */
function main(args: readonly string[]): number {
  const books = args.filter((argument) => !argument.startsWith("--"));
  const asJson = args.includes("--json");
  const unknown = args.find((argument) => argument.startsWith("--") && argument !== "--json");
  if (unknown || books.length === 0) {
    process.stderr.write(unknown ? `unknown option ${unknown}\n` : "usage: audit BOOK.xlsx … [--json]\n");
    return 2;
  }
  const results: Record<string, Finding[]> = {};
  for (const path of books) {
    try {
      results[basename(path)] = auditWorkbook(readBook(path), { progress: progressOf(basename(path)) });
    } catch (error) {
      if (!(error instanceof UnreadableError)) throw error;
      process.stderr.write(`${basename(path)}: ${error.message}\n`);
      return 2;
    }
  }
  process.stdout.write(asJson ? `${JSON.stringify(toJson(results))}\n` : textReport(results));
  return Object.values(results).some((list) => list.some(({ verdict }) => verdict === "differs")) ? 1 : 0;
}

function toJson(results: Record<string, Finding[]>): Record<string, unknown[]> {
  const pick = ({
    sheet,
    cell,
    quantity,
    verdict,
    mistake,
    relation,
    evidence,
    maxRelativeError,
    worstCell,
    suggestion,
    message,
  }: Finding) => ({
    sheet,
    cell,
    quantity,
    verdict,
    mistake,
    relation,
    evidence,
    maxRelativeError,
    worstCell,
    suggestion,
    message,
  });
  return Object.fromEntries(Object.entries(results).map(([book, list]) => [book, list.map(pick)]));
}

const largeBook = 20_000;

function progressOf(book: string): (done: number, total: number) => void {
  let next = largeBook;
  return (done, total) => {
    if (total < largeBook || done < next) return;
    next = done + largeBook;
    process.stderr.write(`${book}: ${done} of ${total} formula cells\n`);
  };
}

process.exitCode = main(process.argv.slice(2));

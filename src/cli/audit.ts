import { basename } from "node:path";
import { auditWorkbook } from "../audit/audit";
import type { Finding } from "../audit/finding";
import about from "../../package.json";
import { readOptions } from "./options";
import { plainBook } from "./plain-book";
import { readBook } from "./read-book";
import { reportWriter } from "./report";
import { UnwritableError, writeWhole } from "./safe-file";
import { textReport } from "./text-report";
import { UnreadableError } from "./zip";

/**
 * `audit BOOK.xlsx … [--json] [--report FILE]`: exit status 0 no differences, 1 differences found, 2 could not read.
 * `audit BOOK.xlsx --plain OUT.xlsx`: 0 every cell of ours replaced, 1 some left, 2 could not read.
 */
function main(args: readonly string[]): number {
  const options = readOptions(args);
  if (typeof options === "string") return fail(options);
  const { books, json, report, plain } = options;
  let book = books[0]!;
  try {
    if (plain !== undefined) return plainBook(book, plain);
    const results: Record<string, Finding[]> = {};
    for (book of books) {
      results[basename(book)] = auditWorkbook(readBook(book), { progress: progressOf(basename(book)) });
    }
    if (report !== undefined) {
      writeWhole(report, reportWriter(report)!({ books: results, date: new Date(), version: about.version }));
    }
    process.stdout.write(json ? `${JSON.stringify(toJson(results))}\n` : textReport(results));
    return Object.values(results).some((list) => list.some(({ verdict }) => verdict === "differs")) ? 1 : 0;
  } catch (error) {
    if (error instanceof UnreadableError) return fail(`${basename(book)}: ${error.message}`);
    if (error instanceof UnwritableError) return fail(error.message);
    throw error;
  }
}

function fail(line: string): number {
  process.stderr.write(`${line}\n`);
  return 2;
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

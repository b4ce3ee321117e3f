/** Findings as a flat table, one row each: as text with commas, or as a workbook. */
import * as xlsx from "@e965/xlsx";
import { caution, type Report } from "./report";
import { worstFirst } from "./report-order";
import { effectOf, unsafeSideOf } from "./report-effect";
import type { Finding } from "../audit/finding";

type Cell = string | number | null;

const columns: readonly { readonly head: string; readonly width: number; readonly of: (finding: Finding) => Cell }[] = [
  { head: "Sheet", width: 16, of: ({ sheet }) => sheet },
  { head: "Cells", width: 12, of: ({ cell }) => cell },
  { head: "Verdict", width: 13, of: ({ verdict }) => verdict },
  { head: "Quantity", width: 26, of: ({ quantity }) => quantity },
  { head: "Mistake", width: 26, of: ({ mistake }) => mistake },
  { head: "Largest relative error", width: 12, of: ({ maxRelativeError }) => finite(maxRelativeError) },
  { head: "Worst cell", width: 11, of: ({ worstCell }) => worstCell },
  { head: "Effect", width: 34, of: effectOf },
  { head: "Caution", width: 40, of: unsafeSideOf },
  { head: "What was found", width: 70, of: ({ message }) => message },
  { head: "Relation", width: 40, of: ({ relation }) => relation },
  { head: "Formula in the sheet", width: 40, of: ({ formula }) => formula },
  { head: "Instead", width: 40, of: ({ suggestion }) => suggestion },
  { head: "Evidence", width: 60, of: ({ evidence }) => evidence },
];

const finite = (value: number | null): number | null => (value !== null && Number.isFinite(value) ? value : null);

function rows({ books }: Report): Cell[][] {
  const heads = ["Book", ...columns.map(({ head }) => head)];
  const body = Object.entries(books).flatMap(([book, findings]) =>
    worstFirst(findings).map((finding) => [book, ...columns.map(({ of }) => of(finding))]),
  );
  return [heads, ...body];
}

/** RFC 4180, with the mark by which spreadsheets know that it is UTF-8. */
export function csvReport(report: Report): string {
  return (
    "\ufeff" +
    rows(report)
      .map((row) => row.map(field).join(","))
      .join("\r\n") +
    "\r\n"
  );
}

/** A text from the book that a spreadsheet would take for a formula is marked as text. */
function field(value: Cell): string {
  if (value === null) return "";
  if (typeof value === "number") return String(value);
  const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

export function xlsxReport(report: Report): Uint8Array {
  const book = xlsx.utils.book_new();
  const table = rows(report);
  // every text is written as text, never as a formula
  const sheet = xlsx.utils.aoa_to_sheet(
    table.map((row) => row.map((value) => value?.toString().slice(0, 32_767) ?? null)),
  );
  table.forEach((row, r) =>
    row.forEach((value, c) => {
      const error = typeof value === "number";
      if (error) sheet[xlsx.utils.encode_cell({ r, c })] = { t: "n", v: value, z: "0.0%" };
    }),
  );
  sheet["!cols"] = [{ wch: 28 }, ...columns.map(({ width }) => ({ wch: width }))];
  sheet["!autofilter"] = { ref: sheet["!ref"]! };
  xlsx.utils.book_append_sheet(book, sheet, "Findings");
  const about = [
    ["Audit of hand formulas"],
    [`Plinth ${report.version}`],
    [report.date.toISOString().slice(0, 10)],
    ...Object.keys(report.books).map((name) => [name]),
    [caution],
  ];
  xlsx.utils.book_append_sheet(book, xlsx.utils.aoa_to_sheet(about), "About");
  return xlsx.write(book, { type: "buffer", bookType: "xlsx", compression: true }) as Uint8Array;
}

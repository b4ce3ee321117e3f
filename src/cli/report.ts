/** The audit's report as a file. Its ending says which kind. */
import type { Finding } from "../audit/finding";
import { htmlReport } from "./report-html";
import { csvReport, xlsxReport } from "./report-table";

export interface Report {
  /** findings by name of the book */
  readonly books: Readonly<Record<string, readonly Finding[]>>;
  readonly date: Date;
  /** of this program */
  readonly version: string;
}

/** Recognition says what a formula computes, never whether an installation is sound. */
export const caution =
  "Recognition is by value and label: a formula that agrees computes what it is said to compute; it is not thereby right " +
  "for its purpose. Inputs, units outside the sheet, the choice of mounts and anything on which safety hangs are for a " +
  "qualified engineer to check against maker's data, local codes and the standards that apply.";

const writers: Readonly<Record<string, (report: Report) => Uint8Array>> = {
  html: (report) => Buffer.from(htmlReport(report), "utf8"),
  csv: (report) => Buffer.from(csvReport(report), "utf8"),
  xlsx: xlsxReport,
};

/** Writes the report in the kind that a file's name asks for; undefined where its ending names none. */
export function reportWriter(path: string): ((report: Report) => Uint8Array) | undefined {
  const ending = /\.([^.\\/]+)$/.exec(path)?.[1]?.toLowerCase() ?? "";
  return Object.hasOwn(writers, ending) ? writers[ending] : undefined;
}

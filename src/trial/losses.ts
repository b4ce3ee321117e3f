/** What a workbook holds that the trial sheet does not keep, in words for the user. */
import type { Parts } from "./zip";

const byPart: [RegExp, string][] = [
  [/vbaProject\.bin$/i, "macros"],
  [/(^|\/)(comments|threadedComments)[^/]*\/?.*\.xml$/i, "comments and notes"],
  [/xl\/media\//i, "pictures"],
  [/pivotTables\//i, "pivot tables (their cells stay)"],
  [/externalLinks\//i, "links to other workbooks (the last values stay)"],
  [/(ctrlProps|activeX)\//i, "form controls"],
  [/(slicers|timelines)\//i, "slicers"],
  [/chartsheets\//i, "chart sheets"],
  [/connections\.xml$/i, "data connections"],
];

/** In nearly every file and seldom missed: told on saving alone. */
export const pageSetUp = "page set-up for printing";

const inSheet: [RegExp, string][] = [
  [/<(?:\w+:)?(pageSetup|headerFooter|rowBreaks|colBreaks)[\s>/]/, pageSetUp],
  [/<(?:\w+:)?f[^>]*\st="dataTable"/, "what-if data tables (their values stay)"],
  [/<(?:\w+:)?sparklineGroups[\s>]/, "sparklines"],
];

export function lossesOf(parts: Parts): string[] {
  const names = Object.keys(parts);
  const found = byPart.filter(([pattern]) => names.some((name) => pattern.test(name))).map(([, words]) => words);
  for (const [pattern, words] of inSheet)
    if (names.some((name) => name.startsWith("xl/worksheets/sheet") && pattern.test(parts[name]!))) found.push(words);
  if (/<(?:\w+:)?rPr>/.test(parts["xl/sharedStrings.xml"] ?? "")) found.push("mixed lettering within one cell");
  return found;
}

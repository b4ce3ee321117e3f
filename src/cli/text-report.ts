import type { Finding } from "../audit/finding";

/** A report to read in a terminal: what differs first, worst first, then what agrees, then what was not checked. */
export function textReport(results: Record<string, readonly Finding[]>): string {
  return Object.entries(results)
    .map(([book, findings]) => bookReport(book, findings))
    .join("\n");
}

function bookReport(book: string, findings: readonly Finding[]): string {
  const differs = findings
    .filter(({ verdict }) => verdict === "differs")
    .sort((a, b) => (b.maxRelativeError ?? -1) - (a.maxRelativeError ?? -1));
  const agrees = findings.filter(({ verdict }) => verdict === "agrees");
  const open = findings.filter(({ verdict }) => verdict === "unrecognised");
  const lines = [book, "=".repeat(book.length), ""];
  lines.push(differs.length === 0 ? "No differences found." : `${differs.length} formulas differ:`);
  for (const finding of differs) {
    lines.push(`  ${place(finding)}  ${finding.quantity ?? ""}: ${finding.mistake ?? "differs"}${off(finding)}`);
    lines.push(`      =${finding.formula}`, `      ${finding.message}`);
    if (finding.suggestion) lines.push(`      instead: ${finding.suggestion}`);
  }
  lines.push("", `${agrees.length} formulas agree:`);
  for (const finding of agrees) lines.push(`  ${place(finding)}  ${finding.quantity ?? ""}`);
  lines.push("", `Not checked (not recognised), ${open.length}:`);
  for (const finding of open) lines.push(`  ${place(finding)}  =${finding.formula.slice(0, 80)}`);
  lines.push(
    "",
    "Recognition is by value and label; a formula that agrees is not thereby approved for its purpose.",
    "",
  );
  return lines.join("\n");
}

const place = ({ sheet, cell }: Finding): string => `${sheet}!${cell}`.padEnd(28);

function off({ maxRelativeError, worstCell }: Finding): string {
  if (maxRelativeError === null) return "";
  const percent = maxRelativeError * 100;
  return `, up to ${percent.toPrecision(3)} % off at ${worstCell ?? "?"}`;
}

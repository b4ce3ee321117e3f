import { auditWorkbook } from "../../src/audit/audit";
import type { Finding } from "../../src/audit/finding";
import { tableCells, workbookOf } from "../support/sheets";
import { cases, unrelated } from "./cases";
import { layoutCells, layouts } from "./layouts";

const columnLetter = (headers: string): string => String.fromCharCode(64 + headers.split("|").length);

function judged(findings: readonly Finding[], cell: string): string {
  const found = findings.find((finding) => finding.cell === cell || finding.cell.startsWith(`${cell}:`));
  if (!found || found.verdict === "unrecognised") return "-";
  return found.verdict === "differs" ? `${found.quantity} ${found.mistake}` : `${found.quantity}`;
}

test.each(cases)("under '%s' the formula of '%s' is %s %s", (headers, row, quantity, mistake) => {
  const findings = auditWorkbook(workbookOf(tableCells(headers, row)));
  expect(judged(findings, `${columnLetter(headers)}2`)).toBe(`${quantity} ${mistake}`.trim());
});

test.each(cases)("'%s' with '%s' stays as it is when the table is moved", (headers, row, quantity, mistake) => {
  const shifted = tableCells(`|${headers}`, `|${shiftColumns(row)}`);
  const findings = auditWorkbook(workbookOf(shifted, "Renamed"));
  expect(judged(findings, `${String.fromCharCode(65 + headers.split("|").length)}2`)).toBe(
    `${quantity} ${mistake}`.trim(),
  );
});

test.each(unrelated)("'%s' with '%s' raises no alarm", (headers, row) => {
  const findings = auditWorkbook(workbookOf(tableCells(headers, row)));
  expect(findings.filter(({ verdict }) => verdict === "differs")).toEqual([]);
});

/** References one column further to the right. */
function shiftColumns(row: string): string {
  return row.replace(
    /(?<![A-Z])([A-Y])(\d+)(?![\d(])/g,
    (_, letter: string, digits: string) => String.fromCharCode(letter.charCodeAt(0) + 1) + digits,
  );
}

describe.each(layouts)("in $title", (layout) => {
  const findings = auditWorkbook(workbookOf(layoutCells(layout)));

  test.each(Object.entries(layout.expected))("%s is %s", (cell, expected) => {
    expect(judged(findings, cell)).toBe(expected);
  });

  test("nothing else is flagged", () => {
    const expected = Object.keys(layout.expected);
    const extra = findings.filter(
      ({ verdict, cell }) =>
        verdict === "differs" && !expected.some((name) => cell === name || cell.startsWith(`${name}:`)),
    );
    expect(extra.map(({ cell, mistake }) => `${cell} ${mistake}`)).toEqual([]);
  });
});

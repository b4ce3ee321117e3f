/** Findings of the audit as the pane orders and writes them. */
import type { Finding } from "../audit/finding";
import { mistakes, quantities } from "../audit/quantities";
import { cautions } from "./cautions";
import type { Notes } from "./notes";
import type { Numbers } from "./numbers";
import type { Area } from "./sheet";
import { strings } from "./strings";

export interface FindingGroup {
  readonly key: string;
  readonly title: string;
  readonly findings: readonly Finding[];
  readonly cells: number;
  /** largest relative error in the group; null where none could be told */
  readonly worst: number | null;
}

/** By cause, worst first: a group is one mistake in one quantity. */
export function groupsOf(findings: readonly Finding[]): FindingGroup[] {
  const groups = new Map<string, Finding[]>();
  for (const finding of findings) {
    const key = `${finding.mistake ?? ""}|${finding.quantity ?? ""}`;
    groups.set(key, [...(groups.get(key) ?? []), finding]);
  }
  return [...groups]
    .map(([key, members]) => ({
      key,
      title: titleOf(members[0]!),
      findings: [...members].sort((a, b) => weight(b) - weight(a)),
      cells: members.reduce((sum, { cell }) => sum + cellCount(cell), 0),
      worst: members.reduce<number | null>((most, { maxRelativeError }) => larger(most, maxRelativeError), null),
    }))
    .sort((a, b) => (b.worst ?? 0) - (a.worst ?? 0) || b.cells - a.cells);
}

const weight = ({ maxRelativeError }: Finding): number => Math.abs(maxRelativeError ?? 0);

function larger(most: number | null, next: number | null): number | null {
  if (next === null) return most;
  return most === null ? Math.abs(next) : Math.max(most, Math.abs(next));
}

function titleOf({ mistake, quantity }: Finding): string {
  const cause = mistake ? sentence(mistakes[mistake]) : "";
  const what = quantity ? quantities[quantity] : strings.audit.unrecognised;
  return cause ? `${what}: ${cause}` : what;
}

const sentence = (text: string): string => text[0]!.toLowerCase() + text.slice(1);

/** "B4" or "B4:B20" as an area. */
export function areaOfFinding({ sheet, cell }: { sheet: string; cell: string }): Area {
  const [from, to = from] = cell.replaceAll("$", "").split(":") as [string, string?];
  const a = point(from);
  const b = point(to);
  return { sheet, top: a.row, left: a.column, bottom: b.row, right: b.column };
}

function point(address: string): { row: number; column: number } {
  const [, letters = "A", digits = "1"] = /^([A-Z]+)(\d+)$/i.exec(address) ?? [];
  let column = 0;
  for (const letter of letters.toUpperCase()) column = column * 26 + letter.charCodeAt(0) - 64;
  return { row: Number(digits) - 1, column: column - 1 };
}

export function cellCount(cell: string): number {
  const { top, left, bottom, right } = areaOfFinding({ sheet: "", cell });
  return (bottom - top + 1) * (right - left + 1);
}

export const touches = (a: Area, b: Area): boolean =>
  a.sheet === b.sheet && a.top <= b.bottom && b.top <= a.bottom && a.left <= b.right && b.left <= a.right;

/** What acceptance hangs on: the same cell with the same finding. */
export const acceptanceKey = ({ sheet, cell, quantity, mistake }: Finding): string =>
  [sheet, cell, quantity ?? "", mistake ?? ""].join("|");

type Row = readonly (string | number | null)[];

/** The findings sheet: what was found, what was accepted and why, what was not checked, the cautions. */
export function findingRows(findings: readonly Finding[], notes: Notes, numbers: Numbers, scope: string): Row[] {
  const words = strings.audit;
  const rank = { differs: 0, unrecognised: 2, agrees: 1 } as const;
  const sorted = [...findings].sort((a, b) => rank[a.verdict] - rank[b.verdict] || weight(b) - weight(a));
  return [
    [words.sheetName, scope],
    [strings.standing],
    [],
    [...words.columns],
    ...sorted.map((finding) => [
      finding.sheet,
      finding.cell,
      words.verdicts[finding.verdict],
      finding.quantity ? quantities[finding.quantity] : null,
      finding.message,
      finding.maxRelativeError === null ? null : numbers.percent(Math.abs(finding.maxRelativeError)),
      finding.worstCell,
      finding.suggestion,
      notes.accepted[acceptanceKey(finding)] ?? null,
    ]),
    [],
    [words.notChecked],
    ...words.notCheckedList.map((text) => [text]),
    [],
    [strings.views.cautions],
    ...cautions.map(({ title, text, defer }) => [title, text, `${strings.cautions.defer}: ${defer}`]),
  ];
}

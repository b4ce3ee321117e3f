/** The order in which findings are read: what differs first, worst first, then what agrees, then what was not checked. */
import type { Finding } from "../audit/finding";

const ranks = { differs: 0, agrees: 1, unrecognised: 2 } as const;
const weight = ({ maxRelativeError }: Finding): number => maxRelativeError ?? -1;

export const worstFirst = (findings: readonly Finding[]): Finding[] =>
  [...findings].sort((a, b) => ranks[a.verdict] - ranks[b.verdict] || weight(b) - weight(a));

/** Findings by sheet, the sheet with the worst finding first. */
export function bySheet(findings: readonly Finding[]): [sheet: string, findings: Finding[]][] {
  const sheets = new Map<string, Finding[]>();
  for (const finding of worstFirst(findings)) {
    const list = sheets.get(finding.sheet);
    if (list) list.push(finding);
    else sheets.set(finding.sheet, [finding]);
  }
  return [...sheets];
}

/** How many cells "E5:E24" stands for. */
export function cellCount(cell: string): number {
  const [from, to = from] = cell.split(":").map((end) => /^([A-Z]+)(\d+)$/.exec(end));
  if (!from || !to) return 1;
  return (column(to[1]!) - column(from[1]!) + 1) * (Number(to[2]) - Number(from[2]) + 1);
}

const column = (letters: string): number =>
  [...letters].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0);

export const cellsIn = (findings: readonly Finding[]): number =>
  findings.reduce((sum, { cell }) => sum + cellCount(cell), 0);

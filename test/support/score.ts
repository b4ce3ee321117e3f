import { columnIndex } from "../../src/formula/references";
import type { Finding } from "../../src/audit/finding";

/** What is known of a sample workbook: groups of cells, and cells that are no business of the audit. */
export interface Truth {
  readonly groups: readonly TruthGroup[];
  readonly ignore: readonly { readonly sheet: string; readonly cells: string }[];
}

interface TruthGroup {
  readonly sheet: string;
  readonly cells: string;
  readonly quantity: string;
  readonly correct: boolean;
  readonly mistake: string | null;
  readonly alsoAcceptQuantity?: readonly string[];
  readonly alsoAcceptMistake?: readonly string[];
  readonly inheritsFrom?: string;
}

export interface Score {
  groups: number;
  recognised: number;
  wrong: number;
  detected: number;
  nameable: number;
  named: number;
  falseAlarms: string[];
  missed: string[];
}

/** The single cells of "B5:C7,D9". */
export function expand(cells: string): string[] {
  return cells.split(",").flatMap((part) => {
    const [, c1, r1, c2, r2] = /^([A-Z]+)(\d+)(?::([A-Z]+)(\d+))?$/.exec(part.replaceAll("$", "").trim())!;
    const found: string[] = [];
    for (let row = Number(r1); row <= Number(r2 ?? r1); row++) {
      for (let column = columnIndex(c1!); column <= columnIndex(c2 ?? c1!); column++) found.push(`${column}:${row}`);
    }
    return found;
  });
}

/** Recall and precision of findings, counted by groups of the truth. */
export function scoreBooks(books: readonly { findings: readonly Finding[]; truth: Truth }[]): Score {
  const score: Score = {
    groups: 0,
    recognised: 0,
    wrong: 0,
    detected: 0,
    nameable: 0,
    named: 0,
    falseAlarms: [],
    missed: [],
  };
  for (const { findings, truth } of books) scoreBook(findings, truth, score);
  return score;
}

function scoreBook(findings: readonly Finding[], truth: Truth, score: Score): void {
  const at = new Map<string, Finding>();
  for (const finding of findings) for (const cell of expand(finding.cell)) at.set(`${finding.sheet}!${cell}`, finding);
  const found = ({ sheet, cells }: { sheet: string; cells: string }) =>
    expand(cells).map((cell) => at.get(`${sheet}!${cell}`));
  const differing = (group: TruthGroup) => found(group).filter((finding) => finding?.verdict === "differs");
  for (const group of truth.groups) {
    const cells = found(group);
    const accepted = [group.quantity, ...(group.alsoAcceptQuantity ?? [])];
    if (group.quantity !== "helper") {
      score.groups++;
      const hits = cells.filter(
        (finding) => finding && finding.verdict !== "unrecognised" && accepted.includes(finding.quantity ?? ""),
      );
      if (hits.length * 2 > cells.length) score.recognised++;
    }
    if (group.inheritsFrom !== undefined) continue;
    const own = differing(group);
    const name = `${group.sheet}!${group.cells} ${group.quantity} ${group.mistake ?? ""}`;
    if (group.correct) {
      if (own.length > 0) score.falseAlarms.push(`${name}: ${own[0]!.mistake}`);
      continue;
    }
    score.wrong++;
    const heirs = truth.groups.filter(({ inheritsFrom }) =>
      inheritsFrom?.split(";").includes(`${group.sheet}!${group.cells}`),
    );
    const flagged = own.length > 0 ? own : heirs.flatMap(differing);
    if (flagged.length === 0) {
      score.missed.push(name);
      continue;
    }
    score.detected++;
    const names = [group.mistake, ...(group.alsoAcceptMistake ?? [])].filter((id) => id !== null);
    if (names.length === 0) continue;
    score.nameable++;
    if (names.includes(flagged[0]!.mistake!)) score.named++;
  }
  for (const range of truth.ignore) {
    const flagged = found(range).find((finding) => finding?.verdict === "differs");
    if (flagged) score.falseAlarms.push(`${range.sheet}!${range.cells}: ${flagged.mistake}`);
  }
}

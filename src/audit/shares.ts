import type { Analysis } from "./analyse";
import type { Leaf } from "./cut";
import type { Role } from "./roles";
import type { Run } from "./runs";

/** Values of all mounts together, and the same of one mount. */
const oneOf: Partial<Record<Role, Role>> = { k: "kEach", c: "cEach", m: "mEach", W: "WEach" };
const ones = new Set<Role>(Object.values(oneOf));

interface Votes {
  one: number;
  all: number;
}

/** How the right formulas of a book take its stiffnesses, dampings and loads: as of one mount, or as of all. */
export function sharesTaken(analyses: readonly Analysis[]): ReadonlyMap<string, Votes> {
  const found = new Map<string, Votes>();
  for (const { run, verdict, explanation } of analyses) {
    if (verdict !== "agrees" || !explanation) continue;
    explanation.cut.leaves.forEach((leaf, i) => {
      const role = explanation.readings[i]?.role;
      if (!role || leaf.lookup || (!ones.has(role) && !oneOf[role])) return;
      const place = placeOf(leaf, run);
      const votes = found.get(place) ?? { one: 0, all: 0 };
      if (ones.has(role)) votes.one++;
      else votes.all++;
      found.set(place, votes);
    });
  }
  return found;
}

/** Inputs that a formula takes as of all mounts although the others take them as of one, by cell. */
export function takenAlone({ run, explanation }: Analysis, votes: ReadonlyMap<string, Votes>): Map<string, Role> {
  const found = new Map<string, Role>();
  explanation?.cut.leaves.forEach((leaf, i) => {
    const role = explanation.readings[i]?.role;
    const one = role && oneOf[role];
    const taken = votes.get(placeOf(leaf, run));
    if (one && taken && taken.one >= 1 && taken.one >= taken.all - 1) found.set(cellOf(leaf), one);
  });
  return found;
}

export const cellOf = ({ sheet, row, column }: Leaf): string => `${sheet}:${row}:${column}`;

/** The cell, or the column or row that a filled formula runs along. */
const placeOf = ({ sheet, row, column, rowMoves, columnMoves }: Leaf, { direction }: Run): string =>
  `${sheet}:${rowMoves && direction === "down" ? "*" : row}:${columnMoves && direction === "across" ? "*" : column}`;

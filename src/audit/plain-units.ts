/** Unit factors as formula text. The numbers are those of the unit table in core. */
import { type NumericError } from "../core/errors";
import { readUnit } from "../core/units";

export type UnitSystemWord = "si" | "mm" | "inch";
export type PlainDimension = "displacement" | "velocity" | "acceleration" | "mass" | "force" | "stiffness" | "damping";

const systems: Record<UnitSystemWord, Record<PlainDimension, string>> = {
  si: {
    displacement: "m",
    velocity: "m/s",
    acceleration: "m/s2",
    mass: "kg",
    force: "N",
    stiffness: "N/m",
    damping: "N.s/m",
  },
  mm: {
    displacement: "mm",
    velocity: "mm/s",
    acceleration: "gn",
    mass: "kg",
    force: "N",
    stiffness: "N/mm",
    damping: "N.s/mm",
  },
  inch: {
    displacement: "in",
    velocity: "in/s",
    acceleration: "gn",
    mass: "lb",
    force: "lbf",
    stiffness: "lbf/in",
    damping: "lbf.s/in",
  },
};

/** A value of the sheet in SI units: "*1000", "/1000", or nothing. */
export const toSI = (system: UnitSystemWord, dimension: PlainDimension): string =>
  unitFactor(systems[system][dimension], systems.si[dimension]);

/** An SI value in the units of the sheet. */
export const fromSI = (system: UnitSystemWord, dimension: PlainDimension): string =>
  unitFactor(systems.si[dimension], systems[system][dimension]);

/**
 * What to put behind a value in the unit `from` to have it in `to`: "/60", "*25.4", "" …
 * @throws NumericError not-covered for an unknown unit or two of unlike dimensions
 */
export function unitFactor(from: string, to: string): string {
  const a = readUnit(from);
  const b = readUnit(to);
  if (a.dimensions.some((exponent, i) => exponent !== b.dimensions[i])) {
    throw new UnlikeUnits(`${from.trim()} and ${to.trim()} measure different things`);
  }
  const turns = turnsOf(a.numerator) + turnsOf(b.denominator) - turnsOf(a.denominator) - turnsOf(b.numerator);
  const above = withoutTurns(a.numerator) * withoutTurns(b.denominator);
  const below = withoutTurns(a.denominator) * withoutTurns(b.numerator);
  return quotientText(above, below) + turnText(turns);
}

/** Two units that no factor joins. */
export class UnlikeUnits extends Error {
  readonly kind: NumericError["kind"] = "not-covered";
}

function quotientText(above: number, below: number): string {
  const share = above / below;
  if (share === 1) return "";
  if (share > 1 && shows(share)) return `*${digits(share)}`;
  if (shows(below / above)) return `/${digits(below / above)}`;
  if (shows(share)) return `*${digits(share)}`;
  return (above === 1 ? "" : `*${digits(above)}`) + (below === 1 ? "" : `/${digits(below)}`);
}

/** Whether a factor is short enough to be read as what it is: 25.4 or 0.45359237, but not 0.0166666666666667. */
const shows = (value: number): boolean => Number(value.toPrecision(9)) === value && value >= 0.001;

/** A spreadsheet keeps 15 digits of a number that is typed. */
const digits = (value: number): string => String(Number(value.toPrecision(15))).replace("e", "E");

const TURN = 2 * Math.PI;

/** How many factors 2 pi a unit's number holds: radians, and powers of them. */
function turnsOf(value: number): number {
  for (let power = 1; power <= 4; power++) if (Math.abs(value / TURN ** power - 1) < 1e-9) return power;
  return 0;
}
const withoutTurns = (value: number): number => (turnsOf(value) > 0 ? 1 : value);

function turnText(turns: number): string {
  if (turns === 0) return "";
  const factor = Math.abs(turns) === 1 ? "(2*PI())" : `(2*PI())^${Math.abs(turns)}`;
  return (turns > 0 ? "*" : "/") + factor;
}

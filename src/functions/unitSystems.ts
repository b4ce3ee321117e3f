import { finite, NumericError } from "../core/errors";
import { STANDARD_GRAVITY } from "../core/mount";
import { type Argument, word } from "./cell";

/** What one unit of each quantity is in SI units, as numerator over denominator (1/1000 is not a double, 1000 is). */
export interface UnitSystem {
  displacement: Scale;
  velocity: Scale;
  acceleration: Scale;
  mass: Scale;
  force: Scale;
  stiffness: Scale;
  damping: Scale;
  inertia: Scale;
}

type Scale = readonly [numerator: number, denominator: number];

const POUND = 0.45359237; // kg, exact by definition; the inch is 25.4 mm
const POUND_FORCE = 4.4482216152605; // N = POUND * STANDARD_GRAVITY, every digit
const POUND_FORCE_10000 = 44482.216152605; // the product of doubles would be rounded once more
const SI: Scale = [1, 1];
const INCH: Scale = [254, 10000];

const SYSTEMS = {
  si: {
    displacement: SI,
    velocity: SI,
    acceleration: SI,
    mass: SI,
    force: SI,
    stiffness: SI,
    damping: SI,
    inertia: SI,
  },
  mm: {
    displacement: [1, 1000],
    velocity: [1, 1000],
    acceleration: [STANDARD_GRAVITY, 1],
    mass: SI,
    force: SI,
    stiffness: [1000, 1],
    damping: [1000, 1],
    inertia: [1, 1e6],
  },
  inch: {
    displacement: INCH,
    velocity: INCH,
    acceleration: [STANDARD_GRAVITY, 1],
    mass: [POUND, 1],
    force: [POUND_FORCE, 1],
    stiffness: [POUND_FORCE_10000, 254],
    damping: [POUND_FORCE_10000, 254],
    inertia: [POUND * 254 * 254, 1e8],
  },
} as const satisfies Record<string, UnitSystem>;

/** The unit system that an argument names: si when left out. */
export function unitSystem(argument: Argument): UnitSystem {
  return SYSTEMS[word("units", argument, ["si", "mm", "inch"], "si")];
}

const SMALLEST_NORMAL = 2 ** -1022; // below it doubles lose digits

/** A value of the sheet in SI units. Throws where the SI value would lose digits, or is too large for a double. */
export function toSI(value: number, [numerator, denominator]: Scale): number {
  if (numerator === denominator) return value;
  const si = denominator === 1 ? value * numerator : (value * numerator) / denominator;
  if (Math.abs(si) < SMALLEST_NORMAL && value !== 0) throw unscalable(value, "small");
  if (Math.abs(si) === Infinity && Number.isFinite(value)) throw unscalable(value, "large");
  return si;
}

/** An SI value in the units of the sheet. Throws where the SI value has lost digits, or the result is too large. */
export function fromSI(value: number, [numerator, denominator]: Scale): number {
  if (numerator === denominator) return value;
  if (Math.abs(value) < SMALLEST_NORMAL && value !== 0) throw unscalable(value, "small");
  return finite("the result", denominator === 1 ? value / numerator : (value * denominator) / numerator);
}

function unscalable(value: number, size: "small" | "large"): NumericError {
  return new NumericError("overflow", `${value} is too ${size} to convert between unit systems`);
}

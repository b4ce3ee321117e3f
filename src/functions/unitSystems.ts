import { finite } from "../core/errors";
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
    stiffness: [POUND_FORCE * 10000, 254],
    damping: [POUND_FORCE * 10000, 254],
    inertia: [POUND * 254 * 254, 1e8],
  },
} as const satisfies Record<string, UnitSystem>;

/** The unit system that an argument names: si when left out. */
export function unitSystem(argument: Argument): UnitSystem {
  return SYSTEMS[word("units", argument, ["si", "mm", "inch"], "si")];
}

/** A value of the sheet in SI units. */
export function toSI(value: number, [numerator, denominator]: Scale): number {
  return denominator === 1 ? value * numerator : (value * numerator) / denominator;
}

/** An SI value in the units of the sheet; too large for a double is an overflow. */
export function fromSI(value: number, [numerator, denominator]: Scale): number {
  return finite("the result", denominator === 1 ? value / numerator : (value * denominator) / numerator);
}

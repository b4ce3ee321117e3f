import { finite, NumericError, requireFinite } from "./errors";
import { quotient } from "./exact";
import { STANDARD_GRAVITY } from "./mount";

/** Exponents of metre, kilogram and second. */
type Dimensions = readonly [number, number, number];

interface Unit {
  /** value in SI units = numerator / denominator * value; kept apart because 60 is exact and 1/60 is not */
  numerator: number;
  denominator: number;
  dimensions: Dimensions;
}

const unit = (dimensions: Dimensions, numerator = 1, denominator = 1): Unit => ({ numerator, denominator, dimensions });

const LENGTH: Dimensions = [1, 0, 0];
const MASS: Dimensions = [0, 1, 0];
const TIME: Dimensions = [0, 0, 1];
const FORCE: Dimensions = [1, 1, -2];
const FREQUENCY: Dimensions = [0, 0, -1];
const ACCELERATION: Dimensions = [1, 0, -2];

const POUND = 0.45359237; // international avoirdupois pound, exact by definition, as is the inch of 25.4 mm
const POUND_FORCE = 4.4482216152605; // = POUND * STANDARD_GRAVITY, every digit

/** Words for single units; case matters. `g` is the gram, `gn` the standard acceleration of free fall. */
export const UNIT_WORDS: Readonly<Record<string, Unit>> = {
  m: unit(LENGTH),
  mm: unit(LENGTH, 1, 1000),
  um: unit(LENGTH, 1, 1e6),
  cm: unit(LENGTH, 1, 100),
  km: unit(LENGTH, 1000),
  in: unit(LENGTH, 254, 10000),
  mil: unit(LENGTH, 254, 1e7),
  ft: unit(LENGTH, 3048, 10000),
  kg: unit(MASS),
  g: unit(MASS, 1, 1000),
  t: unit(MASS, 1000),
  lbm: unit(MASS, POUND),
  lb: unit(MASS, POUND),
  s: unit(TIME),
  ms: unit(TIME, 1, 1000),
  us: unit(TIME, 1, 1e6),
  min: unit(TIME, 60),
  h: unit(TIME, 3600),
  N: unit(FORCE),
  kN: unit(FORCE, 1000),
  MN: unit(FORCE, 1e6),
  mN: unit(FORCE, 1, 1000),
  lbf: unit(FORCE, POUND_FORCE),
  kgf: unit(FORCE, STANDARD_GRAVITY),
  gn: unit(ACCELERATION, STANDARD_GRAVITY),
  Hz: unit(FREQUENCY),
  kHz: unit(FREQUENCY, 1000),
  rpm: unit(FREQUENCY, 1, 60),
  cpm: unit(FREQUENCY, 1, 60),
  rad: unit([0, 0, 0], 1, 2 * Math.PI), // so that rad/s is a frequency and 2 pi rad/s are 1 Hz
};

/** Longest unit that is read; nobody writes longer ones, and brackets nest no deeper. */
const LONGEST = 100;

/**
 * The conversion of values from one unit to another, which throws for a value that is not finite.
 * Units are the words above and compounds written with `.`, `/`, whole exponents and brackets: `kg.m/s2`, `(m/s2)2/Hz`.
 * @throws not-covered for an unknown unit, a badly written one, or units of unlike dimensions
 */
export function unitConversion(from: string, to: string): (value: number) => number {
  const a = readUnit(from);
  const b = readUnit(to);
  if (a.dimensions.some((exponent, i) => exponent !== b.dimensions[i])) {
    const gram = [from, to].some((each) => each.trim() === "g") ? " (g is the gram, gn standard gravity)" : "";
    throw new NumericError("not-covered", `${from.trim()} and ${to.trim()} measure different things${gram}`);
  }
  const same = from.trim() === to.trim();
  const denominators = [a.denominator, b.numerator];
  return (value) => {
    requireFinite("value", value);
    if (same) return value;
    const size = quotient([Math.abs(value), a.numerator, b.denominator], denominators);
    return finite("converted value", value < 0 ? -size : size);
  };
}

/** Reads a unit expression from left to right; `a/b.c` is a/b times c, as in a product of factors. */
export function readUnit(text: string): Unit {
  const tokens = text.replace(/\s+/g, "").match(/[A-Za-z]+|-?\d+|[./()^]|./g) ?? [];
  let at = 0;
  const fail = (why: string): never => {
    throw new NumericError("not-covered", `"${text.slice(0, LONGEST)}" is not a unit: ${why}`);
  };
  if (text.length > LONGEST) fail("it is too long");

  function product(): Unit {
    let result = power();
    while (tokens[at] === "." || tokens[at] === "/") {
      const divide = tokens[at++] === "/";
      result = multiply(result, power(), divide ? -1 : 1);
    }
    return result;
  }

  function power(): Unit {
    const base = factor();
    if (tokens[at] === "^") at++;
    else if (!/^-?\d+$/.test(tokens[at] ?? "")) return base;
    const exponent = Number(tokens[at++]);
    if (!(Number.isInteger(exponent) && exponent !== 0 && Math.abs(exponent) <= 9)) {
      return fail("an exponent is a whole number up to 9");
    }
    return multiply(unit([0, 0, 0]), base, exponent);
  }

  function factor(): Unit {
    const token = tokens[at++];
    if (token === "1" && tokens[at] === "/") return unit([0, 0, 0]);
    if (token === "(") {
      const inner = product();
      if (tokens[at++] !== ")") fail("a bracket is left open");
      return inner;
    }
    if (token === undefined) return fail(text.trim() === "" ? "it is blank" : "it ends too early");
    if (Object.hasOwn(UNIT_WORDS, token)) return UNIT_WORDS[token];
    const meant = Object.keys(UNIT_WORDS).find((word) => word.toLowerCase() === token.toLowerCase());
    return fail(`"${token}" is unknown${meant === undefined ? "" : `; case matters: ${meant}`}`);
  }

  const result = product();
  if (at < tokens.length)
    fail(`"${tokens[at]}" is out of place${/[²³·*]/.test(tokens[at]) ? "; write m/s2, N.s/m" : ""}`);
  const size = result.numerator / result.denominator;
  if (!(size > 0 && size < Infinity)) fail("its exponents are out of reach");
  return result;
}

function multiply(a: Unit, b: Unit, exponent: number): Unit {
  const size = Math.abs(exponent);
  const [numerator, denominator] = exponent > 0 ? [b.numerator, b.denominator] : [b.denominator, b.numerator];
  return {
    numerator: a.numerator * numerator ** size,
    denominator: a.denominator * denominator ** size,
    dimensions: a.dimensions.map((d, i) => d + exponent * b.dimensions[i]) as unknown as Dimensions,
  };
}

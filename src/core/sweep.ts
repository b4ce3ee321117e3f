import { NumericError, reject, requireFinite } from "./errors";
import { exponentOf, timesPowerOf2 } from "./exact";

export type Spacing = "linear" | "log";

/** The most values that fit one spreadsheet column. */
export const MOST_ROWS = 1048576;

/**
 * `count` values from one end to the other, both ends exact, rising or falling without a step back.
 * @param count whole number, 2 to 1,048,576
 * @throws outside-domain for a bad count or, with log spacing, ends of unlike sign or 0
 */
export function sweep(from: number, to: number, count: number, spacing: Spacing): Float64Array {
  requireFinite("from", from);
  requireFinite("to", to);
  if (!(Number.isInteger(count) && count >= 2 && count <= MOST_ROWS)) {
    reject("count", count, `a whole number from 2 to ${MOST_ROWS}`);
  }
  if (spacing === "log" && Math.sign(from) * Math.sign(to) !== 1) {
    throw new NumericError("outside-domain", `a log sweep needs two ends of one sign, got ${from} and ${to}`);
  }
  const steps = count - 1;
  const at = spacing === "log" ? geometric(from, to, steps) : arithmetic(from, to, steps);
  const low = Math.min(from, to);
  const high = Math.max(from, to);
  const values = new Float64Array(count);
  for (let i = 0; i < count; i++) values[i] = Math.min(high, Math.max(low, at(i))); // rounding may step past an end
  values[0] = from;
  values[steps] = to;
  return values;
}

function arithmetic(from: number, to: number, steps: number): (i: number) => number {
  if (Number.isFinite(to - from)) return (i) => from + (to - from) * (i / steps);
  return (i) => from * (1 - i / steps) + to * (i / steps);
}

/** from (to/from)^(i/steps), the powers of 2 apart: a logarithm of the whole ratio would lose digits in wide sweeps. */
function geometric(from: number, to: number, steps: number): (i: number) => number {
  const exponent = exponentOf(Math.abs(from));
  const rise = exponentOf(Math.abs(to)) - exponent;
  const start = timesPowerOf2(from, -exponent);
  const ratio = timesPowerOf2(to, -exponent - rise) / start;
  return (i) => {
    const whole = Math.floor((rise * i) / steps);
    const part = 2 ** ((rise * i - whole * steps) / steps);
    return timesPowerOf2(start * ratio ** (i / steps) * part, exponent + whole);
  };
}

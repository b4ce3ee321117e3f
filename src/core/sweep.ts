import { NumericError, reject, requireFinite } from "./errors";

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
  if (spacing === "log" && !(from * to > 0 || (from > 0 && to > 0) || (from < 0 && to < 0))) {
    throw new NumericError("outside-domain", `a log sweep needs two ends of one sign, got ${from} and ${to}`);
  }
  const values = new Float64Array(count);
  const steps = count - 1;
  const logStart = Math.log(Math.abs(from));
  const logRange = Math.log(Math.abs(to)) - logStart;
  const low = Math.min(from, to);
  const high = Math.max(from, to);
  for (let i = 0; i < count; i++) {
    const t = i / steps;
    const value =
      spacing === "log"
        ? Math.sign(from) * Math.exp(logStart + logRange * t)
        : Number.isFinite(to - from)
          ? from + (to - from) * t
          : from * (1 - t) + to * t;
    values[i] = value < low ? low : value > high ? high : value; // rounding may step past an end
  }
  values[0] = from;
  values[steps] = to;
  return values;
}

/** Why a number cannot be given. The cell layer adds its own kinds; each host maps them to its error codes in one table. */
export type NumericKind = "not-a-number" | "outside-domain" | "pole" | "not-covered" | "overflow" | "no-convergence";

/** A failure of the mathematics. The message names the quantity, the limit and the value. */
export class NumericError extends Error {
  override readonly name = "NumericError";

  constructor(
    readonly kind: NumericKind,
    message: string,
  ) {
    super(message);
  }
}

/** Throws unless `value` is a number, finite and at least `limit`. */
export function requireAtLeast(quantity: string, value: number, limit: number): void {
  if (value >= limit && value < Infinity) return;
  reject(quantity, value, `${limit} or more`);
}

/** Throws unless `value` is a number, finite and above `limit`. */
export function requireAbove(quantity: string, value: number, limit: number): void {
  if (value > limit && value < Infinity) return;
  reject(quantity, value, `above ${limit}`);
}

/** Throws unless `value` is a finite number. */
export function requireFinite(quantity: string, value: number): void {
  if (value - value === 0) return;
  reject(quantity, value, "a finite number");
}

/** Throws `outside-domain` (or `not-a-number`): "damping ratio must be 0 or more, got -0.1". */
export function reject(quantity: string, value: number, limit: string): never {
  if (Number.isNaN(value)) throw new NumericError("not-a-number", `${quantity} is not a number`);
  throw new NumericError("outside-domain", `${quantity} must be ${limit}, got ${value}`);
}

/** Returns a finite result as it is; a result too large for a double is an `overflow`. */
export function finite(quantity: string, value: number): number {
  if (value - value === 0) return value;
  throw new NumericError("overflow", `${quantity} is too large to show`);
}

import { NumericError, type NumericKind } from "../core/errors";

/** Why a cell shows an error. A host maps the kinds to its own error codes in one table. */
export type FailureKind = NumericKind | "missing" | "wrong-type" | "wrong-shape" | "unknown-word";

/** An error that stands in a result in place of a number, or is thrown when the whole call fails. */
export class CellFailure extends Error {
  override readonly name = "CellFailure";

  constructor(
    readonly kind: FailureKind,
    message: string,
  ) {
    super(message);
  }
}

/** An error that came in with an argument; it leaves unchanged. Hosts have classes of their own for it. */
export class PassedError extends Error {
  override readonly name = "PassedError";

  constructor(readonly cellError: object) {
    super("an argument holds an error");
  }
}

/** What belongs in the cell for this exception. Anything unexpected is a bug and goes through. */
export function cellOf(thrown: unknown): object {
  if (thrown instanceof PassedError) return thrown.cellError;
  if (thrown instanceof CellFailure) return thrown;
  if (thrown instanceof NumericError) return new CellFailure(thrown.kind, thrown.message);
  throw thrown;
}

import type { FailureKind } from "../functions/failure";

/** The error that a cell shows for each kind of failure. */
export const ERROR_CODES: Readonly<Record<FailureKind, string>> = {
  missing: "#VALUE!",
  "wrong-type": "#VALUE!",
  "wrong-shape": "#VALUE!",
  "unknown-word": "#VALUE!",
  "not-a-number": "#NUM!",
  "outside-domain": "#NUM!",
  overflow: "#NUM!",
  "no-convergence": "#NUM!",
  pole: "#DIV/0!",
  "not-covered": "#N/A",
};

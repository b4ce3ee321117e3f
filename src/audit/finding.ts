import type { Mistake, Quantity } from "./quantities";
import type { Role } from "./roles";

export type Verdict = "agrees" | "differs" | "unrecognised";

/** What the audit says about a cell, or about a run of cells that hold the same formula. */
export interface Finding {
  readonly sheet: string;
  /** "E5" or "E5:E24" */
  readonly cell: string;
  readonly quantity: Quantity | null;
  readonly verdict: Verdict;
  readonly mistake: Mistake | null;
  /** the published relation, as spreadsheet text over role names */
  readonly relation: string | null;
  readonly evidence: string;
  /** largest relative error on the sheet's own rows; null where it cannot be said */
  readonly maxRelativeError: number | null;
  readonly worstCell: string | null;
  /** the cell function that would replace the formula */
  readonly suggestion: string | null;
  readonly message: string;
  readonly formula: string;
  /** hand values beside right values at the sheet's rows, for a plot; at most 200 */
  readonly comparison: readonly { readonly cell: string; readonly hand: number; readonly right: number }[];
  /** role of the result and of every input, for explanations */
  readonly role: Role | null;
}

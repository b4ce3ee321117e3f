import type { Mistake } from "./quantities";

/** The one thing that is supposed to be wrong in a derivation. */
export interface Fault {
  readonly mistake: Mistake | null;
  readonly why: string;
  /** how unusual it is; the most usual explanation wins */
  readonly cost: number;
}

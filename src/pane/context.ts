/** What every view shares. */
import type { Notebook } from "./notes";
import type { Numbers } from "./numbers";
import type { Explanation } from "./explain";
import type { Selected, Sheet } from "./sheet";

export type ViewName = "cell" | "audit" | "cautions";

/** What is selected, and what it says if it holds one of our functions. */
export interface Current {
  readonly selected: Selected;
  readonly explanation: Explanation | null;
}

export interface Context {
  readonly sheet: Sheet;
  readonly numbers: Numbers;
  readonly notebook: Notebook;
  /** where the reference page is */
  readonly referenceUrl: string;
  readonly version: string;
  /** tells what happened, to eyes and screen readers */
  say(text: string): void;
  /** runs an action of the user's and tells of a failure instead of losing it */
  attempt(action: () => Promise<void>): void;
}

export interface View {
  readonly element: HTMLElement;
  show(current: Current): void | Promise<void>;
}

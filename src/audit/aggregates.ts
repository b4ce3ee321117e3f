import type { Analysis } from "./analyse";
import type { Book } from "./book";
import type { Meaning } from "./meaning";
import type { Run } from "./runs";

/** Recognises sums over ranges: overall rms values. */
export function aggregateFinding(
  _book: Book,
  _run: Run,
  _meaning: Meaning,
  _meaningAt: (sheet: number, row: number, column: number) => Meaning,
): Pick<Analysis, "verdict" | "quantity" | "mistake" | "why"> | null {
  return null;
}

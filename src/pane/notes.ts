/** What the pane keeps in the workbook: how the plot is shown, tolerances, findings that someone accepted and why. */
import type { Tolerances } from "./curves";
import type { Sheet } from "./sheet";

export interface Notes {
  readonly decibels: boolean;
  readonly tolerances: Tolerances;
  /** reason by finding key */
  readonly accepted: Readonly<Record<string, string>>;
}

const EMPTY: Notes = { decibels: false, tolerances: { naturalFrequency: 0, damping: 0 }, accepted: {} };

/** Reads notes in any state; what does not fit is left out. */
export function readNotes(text: string | null): Notes {
  try {
    const { decibels, tolerances, accepted } = JSON.parse(text ?? "{}");
    return {
      decibels: decibels === true,
      tolerances: { naturalFrequency: share(tolerances?.naturalFrequency), damping: share(tolerances?.damping) },
      accepted: Object.fromEntries(
        Object.entries(accepted ?? {}).filter((entry): entry is [string, string] => typeof entry[1] === "string"),
      ),
    };
  } catch {
    return EMPTY;
  }
}

const share = (value: unknown): number => (typeof value === "number" && value >= 0 && value < 1 ? value : 0);

export interface Notebook {
  readonly notes: Notes;
  /** Reads what the open workbook holds. */
  open(): Promise<void>;
  change(part: Partial<Notes>): Promise<void>;
}

export function notebook(sheet: Sheet): Notebook {
  let notes = EMPTY;
  return {
    get notes() {
      return notes;
    },
    async open() {
      notes = readNotes(await sheet.notes());
    },
    async change(part) {
      notes = { ...notes, ...part };
      await sheet.keepNotes(JSON.stringify(notes));
    },
  };
}

/** What the pane asks of a spreadsheet. Each host has an adapter; rows and columns count from 0. */
import type { DefinedName, Table, Workbook } from "../audit/workbook";

export interface Place {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
}

/** Both ends included. */
export interface Area {
  readonly sheet: string;
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

export interface CellError {
  /** code such as #NUM! */
  readonly error: string;
  /** what the function said, where the host tells */
  readonly message?: string;
}
/** null is a blank cell */
export type CellValue = number | string | boolean | null | CellError;

export interface SheetCell {
  /** formula text without the leading "=" */
  readonly formula?: string;
  readonly value: CellValue;
}

export interface Selected {
  readonly area: Area;
  /** the active cell */
  readonly cell: Place;
  /** of a spilled cell, its own value with the formula that fills it */
  readonly content: SheetCell;
  /** the cell whose spilled formula fills the active cell; the active cell itself otherwise */
  readonly home: Place;
}

export interface Reading {
  /** called with the share done, 0 to 1 */
  readonly progress?: (done: number) => void;
  readonly signal?: AbortSignal;
}

export type Theme = "light" | "dark" | "contrast";

/** A cell of a new or copied sheet, with a note on where its content came from. */
export interface Replacement {
  readonly row: number;
  readonly column: number;
  /** with the leading "=" */
  readonly formula: string;
  readonly note: string;
}

/** Stops what it was returned for. */
export type Stop = () => void;

export interface Sheet {
  /** for number formats, such as "de-DE" */
  readonly locale: string;
  /** of the host, which the pane follows */
  theme(): Theme;
  selected(): Promise<Selected>;
  /** The cells of each area as rows. */
  read(areas: readonly Area[]): Promise<SheetCell[][][]>;
  /** Names and tables of the open workbook. */
  names(): Promise<{ names: readonly DefinedName[]; tables: readonly Table[] }>;
  /** Everything in the open workbook, in batches that leave the page responsive. Rejects with an AbortError when stopped. */
  workbook(reading: Reading): Promise<Workbook>;
  select(area: Area): Promise<void>;
  /** Writes a formula (with "=") into a cell. */
  write(place: Place, formula: string): Promise<void>;
  /** Adds a sheet with these rows under this name or one like it; returns the name. */
  addSheet(name: string, rows: readonly (readonly (string | number | null)[])[]): Promise<string>;
  /** Copies a sheet, replaces cells of the copy, and returns its name. The original stays as it is. */
  copySheet(sheet: string, name: string, replacements: readonly Replacement[]): Promise<string>;
  /** What the pane keeps in this workbook. */
  notes(): Promise<string | null>;
  keepNotes(text: string): Promise<void>;
  onSelect(listener: () => void): Stop;
  /** Values or formulas changed, or another workbook was opened. */
  onChange(listener: () => void): Stop;
  /** Another workbook took the place of this one. */
  onOpen(listener: () => void): Stop;
  onTheme(listener: () => void): Stop;
}

/** An abort in the form that the platform's own functions use. */
export function throwIfStopped(signal: AbortSignal | undefined): void {
  if (signal?.aborted) throw new DOMException("stopped", "AbortError");
}

export const areaOf = ({ sheet, row, column }: Place): Area => ({
  sheet,
  top: row,
  left: column,
  bottom: row,
  right: column,
});

export const isError = (value: CellValue): value is CellError => typeof value === "object" && value !== null;

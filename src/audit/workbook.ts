/** A workbook as the audit sees it, whatever host it came from. Plain data; rows and columns count from 0. */
export interface Workbook {
  readonly sheets: readonly Sheet[];
  readonly names: readonly DefinedName[];
  readonly tables: readonly Table[];
}

export interface Sheet {
  readonly name: string;
  /** by `cellKey`; blank cells are left out */
  readonly cells: ReadonlyMap<number, Cell>;
}

export interface Cell {
  /** formula text without the leading "=" */
  readonly formula?: string;
  /** last calculated value; an error is its code in an object; null where the file holds none */
  readonly value: number | string | boolean | null | { readonly error: string };
  /** number format, where the host gives one */
  readonly format?: string;
}

export interface DefinedName {
  readonly name: string;
  /** what it refers to, as formula text without "=" */
  readonly formula: string;
  /** sheet to which the name is limited */
  readonly sheet?: string;
}

export interface Table {
  readonly name: string;
  readonly sheet: string;
  readonly columns: readonly string[];
  /** whole table with headers and totals, both ends included */
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
  readonly headerRows: number;
  readonly totalsRows: number;
}

const columnsOfASheet = 16_384;

/** The key of a cell in a sheet's map. */
export const cellKey = (row: number, column: number): number => row * columnsOfASheet + column;
export const rowOf = (key: number): number => Math.floor(key / columnsOfASheet);
export const columnOf = (key: number): number => key % columnsOfASheet;

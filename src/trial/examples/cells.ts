/** A small vocabulary for writing example sheets as data. */

export type Style =
  "title" | "note" | "head" | "label" | "unit" | "sentence" | "input" | "result" | "fraction" | "small" | "whole";

export interface ExampleCell {
  text?: string;
  number?: number;
  /** without "=" */
  formula?: string;
  /** cells that the formula fills, itself included */
  spill?: string;
  style: Style;
}

export type ExampleRow = (ExampleCell | undefined)[];

export interface ExampleSheet {
  name: string;
  /** widths in characters */
  columns: number[];
  rows: ExampleRow[];
  tables?: { name: string; range: string; columns: string[] }[];
  chart?: ExampleChart;
}

export interface ExampleChart {
  title: string;
  horizontal: string;
  vertical: string;
  /** horizontal values, as a range of this sheet */
  along: string;
  series: { name: string; values: string }[];
  /** cell at the top left and at the bottom right, both from 0 */
  from: { row: number; column: number };
  to: { row: number; column: number };
}

export interface ExampleBook {
  sheets: ExampleSheet[];
  names: Record<string, string>;
}

const text =
  (style: Style) =>
  (words: string): ExampleCell => ({ text: words, style });

export const title = text("title");
export const note = text("note");
export const head = text("head");
export const label = text("label");
export const unit = text("unit");
export const input = (value: number): ExampleCell => ({ number: value, style: "input" });
export const calc = (formula: string, style: Style = "result"): ExampleCell => ({ formula, style });
export const spilled = (formula: string, spill: string, style: Style = "result"): ExampleCell => ({
  formula,
  spill,
  style,
});

/** A cell that another one's formula fills, in this style. */
export const filled = (style: Style): ExampleCell => ({ style });

/** A line of a sizing sheet: what, value, unit, remark. */
export const line = (what: string, value: ExampleCell, of: string, remark = ""): ExampleRow => [
  label(what),
  value,
  unit(of),
  remark ? note(remark) : undefined,
];

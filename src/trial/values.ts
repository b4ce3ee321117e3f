/**
 * Cell values between the spreadsheet and the add-in's functions. The spreadsheet's ranges are column by column,
 * its cells `{ value, message }`; the add-in's are rows of plain values with errors as objects.
 */
import { CellError } from "./host";

export type Cell = { value: unknown; message?: string | { toString(): string } };
export type SheetArgument = Cell | Cell[][] | undefined;

const errorText = /^#(N\/A|REF!?|BAD_EXPR|CYCLE|NAME\?|DIV\/0!|NUM!|SPILL!|ERROR|NULL!|VALUE!|BUSY!)$/;

/** How the add-in's own host writes the errors for which the spreadsheet has words of its own. */
const hostErrors: Record<string, string> = {
  "#REF": "#REF!",
  "#BAD_EXPR": "#NAME?",
  "#CYCLE": "#REF!",
  "#ERROR": "#VALUE!",
  "#SPILL!": "#VALUE!",
  "#BUSY!": "#N/A",
};

/** The error in a cell, in the add-in host's words. */
export function errorOf({ value, message }: Cell): CellError | undefined {
  if (typeof value !== "string" || value[0] !== "#" || !errorText.test(value)) return undefined;
  return new CellError(hostErrors[value] ?? value, message ? String(message) : "");
}

function toHost(cell: Cell | undefined): unknown {
  return cell ? (errorOf(cell) ?? cell.value ?? null) : null;
}

/** An argument as Excel would pass it: omitted is null, a matrix parameter gets rows even of one cell. */
export function toHostArgument(arg: SheetArgument, matrix: boolean): unknown {
  if (arg === undefined) return null;
  if (!Array.isArray(arg)) return matrix ? [[toHost(arg)]] : toHost(arg);
  const rows = arg[0]?.length ?? 0;
  const out: unknown[][] = [];
  for (let r = 0; r < rows; r++) out.push(arg.map((column) => toHost(column[r] as Cell)));
  return matrix ? out : out[0]?.[0];
}

function toCell(value: unknown): Cell {
  switch (typeof value) {
    case "number":
      if (Number.isFinite(value)) return { value };
      return { value: "#NUM!", message: "The function returned no finite number." };
    case "string":
    case "boolean":
      return { value };
    default:
      if (value instanceof CellError) return { value: value.code, message: value.message };
      return { value: "#VALUE!", message: "The function returned no value." };
  }
}

/** A function's result as the spreadsheet wants it: one cell, or columns of cells of equal length. */
export function fromHostResult(result: unknown): Cell | Cell[][] {
  if (!Array.isArray(result)) return toCell(result);
  const rows = result as unknown[][];
  const width = rows.reduce((most, row) => Math.max(most, row.length), 0);
  if (rows.length === 0 || width === 0) return toCell(undefined);
  if (rows.length === 1 && width === 1) return toCell(rows[0]![0]);
  return Array.from({ length: width }, (_, c) => rows.map((row) => toCell(row[c])));
}

import { fillByKernel, type Kernel, stretchEnd } from "./columns";
import { CellFailure, cellOf, PassedError } from "./failure";

/** One argument as the host hands it over: usually rows of cells, for a single value possibly the bare value. */
export type Argument = unknown;

interface Grid {
  name: string;
  rows: unknown[][];
  height: number;
  width: number;
  /** what a blank cell stands for; undefined where a value must be given */
  blank?: number;
}

/**
 * Applies a function of numbers to every place of the common shape of its arguments.
 *
 * Each dimension of a range must be equal to the others or 1, as in spreadsheet array arithmetic. A place whose
 * cells are bad holds a CellFailure (or the error that came in); a single result that is bad is thrown.
 *
 * @param required argument name -> value; the name, spaced out, is the one in messages ("dampingRatio": "damping ratio")
 * @param optional argument name -> [value, default]
 * @param kernel   the same computation over columns, where there is one: columns of numbers go through it
 * @returns rows of results
 * @throws CellFailure when the shapes do not fit
 */
export function lift(
  compute: (...numbers: number[]) => number | string,
  required: Record<string, Argument>,
  optional: Record<string, [Argument, number]> = {},
  kernel?: Kernel,
): any[][] {
  const grids: Grid[] = [];
  for (const name in required) grids.push(grid(name, required[name]));
  for (const name in optional) {
    const [value, fallback] = optional[name];
    grids.push(isBlank(value) ? { ...NOTHING, rows: [[fallback]] } : { ...grid(name, value), blank: fallback });
  }
  const [height, width] = commonShape(grids);
  const result: any[][] = new Array(height);
  const place = placer(compute, grids);
  if (height === 1 && width === 1) {
    try {
      return [[place(0, 0)]];
    } catch (thrown) {
      throw asThrown(cellOf(thrown));
    }
  }
  const at = (i: number, j: number) => {
    try {
      return place(i, j);
    } catch (thrown) {
      return cellOf(thrown);
    }
  };
  let i = 0;
  while (i < height) {
    if (kernel !== undefined && width === 1) {
      const next = fillByKernel(kernel, grids, result, i);
      if (next > i) {
        i = next;
        continue;
      }
    }
    for (const end = stretchEnd(i, height); i < end; i++) {
      const row: any[] = [at(i, 0)]; // a literal keeps one number unboxed: columns are the usual case
      for (let j = 1; j < width; j++) row.push(at(i, j));
      result[i] = row;
    }
  }
  return result;
}

const NOTHING: Grid = { name: "", rows: [[0]], height: 1, width: 1 };
const MOST_ARGUMENTS = 7;

/** A function that reads the numbers of one place and computes; unused arguments of `compute` are 0. */
function placer(compute: (...numbers: number[]) => number | string, grids: Grid[]) {
  if (grids.length > MOST_ARGUMENTS) throw new Error("too many arguments to lift");
  const all = [...grids];
  while (all.length < MOST_ARGUMENTS) all.push(NOTHING);
  const [A, B, C, D, E, F, G] = all;
  return (i: number, j: number): number | string => {
    const a = A.rows[A.height === 1 ? 0 : i][A.width === 1 ? 0 : j];
    const b = B.rows[B.height === 1 ? 0 : i][B.width === 1 ? 0 : j];
    const c = C.rows[C.height === 1 ? 0 : i][C.width === 1 ? 0 : j];
    const d = D.rows[D.height === 1 ? 0 : i][D.width === 1 ? 0 : j];
    const e = E.rows[E.height === 1 ? 0 : i][E.width === 1 ? 0 : j];
    const f = F.rows[F.height === 1 ? 0 : i][F.width === 1 ? 0 : j];
    const g = G.rows[G.height === 1 ? 0 : i][G.width === 1 ? 0 : j];
    if (
      typeof a === "number" &&
      typeof b === "number" &&
      typeof c === "number" &&
      typeof d === "number" &&
      typeof e === "number" &&
      typeof f === "number" &&
      typeof g === "number"
    ) {
      return compute(a, b, c, d, e, f, g);
    }
    const cells = [a, b, c, d, e, f, g].slice(0, grids.length);
    const error = cells.find(isError); // an error that came in goes before a complaint of ours
    if (error) throw new PassedError(error);
    const numbers = cells.map((cell, k) => number(cell, grids[k].name, grids[k].blank));
    return compute(...numbers, ...new Array(MOST_ARGUMENTS - numbers.length).fill(0));
  };
}

/** The number in one cell. Throws for a blank, text or boolean, naming the argument. */
function number(cell: unknown, name: string, blank?: number): number {
  if (typeof cell === "number") return cell;
  if (isError(cell)) throw new PassedError(cell);
  if (isBlank(cell)) {
    if (blank !== undefined) return blank;
    throw new CellFailure("missing", `${spaced(name)} is blank`);
  }
  const shown = typeof cell === "string" ? `the text "${cell.slice(0, 40)}"` : String(cell);
  throw new CellFailure("wrong-type", `${spaced(name)} must be a number, got ${shown}`);
}

/** One value, given as such or as a single cell; `fallback` where it may be left out. */
export function one(name: string, argument: Argument, fallback?: number): number {
  return number(single(name, argument), name, fallback);
}

/** One option word, in any case, blanks around it ignored; `fallback` where it may be left out. */
export function word<Choice extends string>(
  name: string,
  argument: Argument,
  choices: readonly Choice[],
  fallback?: Choice,
): Choice {
  const cell = single(name, argument);
  if (isError(cell)) throw new PassedError(cell);
  if (isBlank(cell)) {
    if (fallback !== undefined) return fallback;
    throw new CellFailure("missing", `${spaced(name)} is blank: choose ${list(choices)}`);
  }
  const given = String(cell).trim().replace(/\s+/g, " ").toLowerCase();
  const found = choices.find((choice) => choice === given);
  if (found !== undefined) return found;
  throw new CellFailure("unknown-word", `${spaced(name)} must be ${list(choices)}, got "${String(cell).slice(0, 40)}"`);
}

/** One piece of text as it stands, such as a unit, whose case matters. */
export function text(name: string, argument: Argument): string {
  const cell = single(name, argument);
  if (isError(cell)) throw new PassedError(cell);
  if (isBlank(cell)) throw new CellFailure("missing", `${spaced(name)} is blank`);
  if (typeof cell === "string") return cell;
  throw new CellFailure("wrong-type", `${spaced(name)} must be a text, got ${String(cell)}`);
}

/** A range taken as a whole, every cell a number. */
export interface Table {
  name: string;
  values: Float64Array;
  height: number;
  width: number;
}

/** A table argument of one column or one row. Throws for blank or text cells, naming the row or column. */
export function vector(name: string, argument: Argument): Table {
  const found = table(name, argument);
  if (found.height === 1 || found.width === 1) return found;
  throw new CellFailure("wrong-shape", `${spaced(name)} must be one column or one row, got ${shape(found)}`);
}

/** A table argument of any shape; the values row by row. */
export function table(name: string, argument: Argument): Table {
  const { rows, height, width } = grid(name, argument);
  const values = new Float64Array(height * width);
  let at = 0;
  for (let i = 0; i < height; i++) {
    for (let j = 0; j < width; j++) {
      const cell = rows[i][j];
      values[at++] = typeof cell === "number" ? cell : number(cell, height === 1 && width === 1 ? name : where(i, j));
    }
  }
  return { name, values, height, width };

  function where(i: number, j: number): string {
    if (width === 1) return `${name} row ${i + 1}`;
    return height === 1 ? `${name} column ${j + 1}` : `${name} row ${i + 1} column ${j + 1}`;
  }
}

/** Throws unless two vectors pair up one to one. */
export function requireSameLength(a: Table, b: Table): void {
  if (a.values.length === b.values.length) return;
  throw new CellFailure(
    "wrong-shape",
    `${spaced(a.name)} and ${spaced(b.name)} must be equally long, got ${a.values.length} and ${b.values.length}`,
  );
}

/** A list as rows of one cell, to spill down; with `like` a row, to spill across as that table does. */
export function spill(values: ArrayLike<number>, like?: Table): any[][] {
  if (like !== undefined && like.height === 1 && like.width > 1) return [Array.from(values)];
  const rows: any[][] = new Array(values.length);
  for (let i = 0; i < values.length; i++) rows[i] = [values[i]];
  return rows;
}

/** "dampingRatio" as in a message: "damping ratio". */
export function spaced(name: string): string {
  return name.replace(/[A-Z]/g, (capital) => ` ${capital.toLowerCase()}`).trim();
}

function list(choices: readonly string[]): string {
  return choices.length === 1 ? choices[0] : `${choices.slice(0, -1).join(", ")} or ${choices[choices.length - 1]}`;
}

function single(name: string, argument: Argument): unknown {
  if (!Array.isArray(argument)) return argument;
  if (isBlank(argument)) return undefined;
  const { rows, height, width } = grid(name, argument);
  if (height === 1 && width === 1) return rows[0][0];
  throw new CellFailure("wrong-shape", `${spaced(name)} takes one value, got a range of ${height}×${width}`);
}

function grid(name: string, argument: Argument): Grid {
  if (!Array.isArray(argument)) return { name, rows: [[argument]], height: 1, width: 1 };
  const rows: unknown[][] = argument.length > 0 && !Array.isArray(argument[0]) ? [argument] : argument;
  let width = 0;
  for (const row of rows) if (row.length > width) width = row.length;
  if (width === 0) throw new CellFailure("wrong-shape", `${spaced(name)} is an empty range`);
  return { name, rows, height: rows.length, width };
}

function commonShape(grids: Grid[]): [number, number] {
  let tall = grids[0];
  let wide = grids[0];
  for (const each of grids) {
    if (tall.height === 1) tall = each;
    if (wide.width === 1) wide = each;
    if (each.height !== 1 && each.height !== tall.height) throw unlike(tall, each);
    if (each.width !== 1 && each.width !== wide.width) throw unlike(wide, each);
  }
  return [tall.height, wide.width];
}

function unlike(a: Grid, b: Grid): CellFailure {
  return new CellFailure("wrong-shape", `ranges of different size: ${shape(a)} and ${shape(b)}`);
}

function shape({ height, width }: { height: number; width: number }): string {
  return `${height}×${width}`;
}

function asThrown(cell: object): Error {
  return cell instanceof CellFailure ? cell : new PassedError(cell);
}

function isBlank(cell: unknown): boolean {
  return cell === undefined || cell === null || cell === "" || (isCell(cell) && isBlank(cell[0][0]));
}

function isCell(value: unknown): value is unknown[][] {
  return Array.isArray(value) && value.length === 1 && Array.isArray(value[0]) && value[0].length <= 1;
}

function isError(cell: unknown): cell is object {
  return typeof cell === "object" && cell !== null;
}

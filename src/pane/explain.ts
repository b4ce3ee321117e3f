/** What a cell says: the function in it, each argument with its value and source, and the point on the curve it stands for. */
import type { DampingModel } from "../core/transmissibility";
import {
  addressOf,
  argumentValue,
  type CallArgument,
  hasNames,
  type OwnCall,
  ownCalls,
  withNames,
} from "../audit/ownCalls";
import { docOf, type FunctionDoc, type ParameterDoc, parameterAt } from "./catalogue";
import { type Area, type CellValue, isError, type Selected, type Sheet, type SheetCell } from "./sheet";

export interface ArgumentRow {
  readonly parameter: ParameterDoc;
  /** its text in the formula; empty where it is left out */
  readonly text: string;
  /** the value that counts for the selected cell; undefined where it is not known here */
  readonly value: CellValue | undefined;
  /** the whole table, row by row, of an argument that is taken together */
  readonly table?: readonly (readonly CellValue[])[];
  /** the cells it comes from, where it is one reference */
  readonly source: Area | null;
  /** cells behind it that are empty */
  readonly blanks: readonly Area[];
  readonly leftOut: boolean;
}

export interface Explanation {
  readonly doc: FunctionDoc;
  readonly call: OwnCall;
  readonly rows: readonly ArgumentRow[];
  readonly result: CellValue;
  /** further calls of our functions in the same formula */
  readonly others: readonly string[];
}

/** An operating point of one mass on a mount. */
export interface OperatingPoint {
  readonly f: number;
  readonly fn: number;
  readonly zeta: number;
  readonly model: DampingModel;
}

/** Tables longer than this are not read into the pane. */
const LONGEST_TABLE = 20_000;

/** Explains the selected cell; null where its formula calls none of our functions. */
export async function explain(sheet: Sheet, selected: Selected): Promise<Explanation | null> {
  const formula = selected.content.formula;
  if (formula === undefined) return null;
  const calls = ownCalls(formula);
  const doc = calls[0] && docOf(calls[0].id);
  if (!doc) return null;
  const { home } = selected;
  const call = hasNames(calls[0]!) ? withNames(calls[0]!, await sheet.names(), home.sheet, home.row) : calls[0]!;
  const offset = { row: selected.cell.row - home.row, column: selected.cell.column - home.column };
  const wanted = call.arguments.map((argument, i) => areasOf(argument, parameterAt(doc, i), home.sheet, offset));
  const areas = wanted.flat();
  const blocks = areas.length > 0 ? await sheet.read(areas.map(({ read }) => read)) : [];
  const cells = new Cells();
  areas.forEach(({ read }, i) => cells.put(read, blocks[i]!));
  const given = call.arguments.map((argument, i) => row(argument, parameterAt(doc, i), wanted[i]!, cells, home.sheet));
  return {
    doc,
    call,
    rows: [...given.filter((each) => each !== null), ...leftOut(doc, call.arguments.length)],
    result: selected.content.value,
    others: calls.slice(1).map(({ id }) => id),
  };
}

interface WantedArea {
  /** as the formula has it */
  readonly whole: Area;
  /** the part that counts */
  readonly read: Area;
}

function areasOf(
  argument: CallArgument,
  parameter: ParameterDoc | undefined,
  home: string,
  offset: { row: number; column: number },
): WantedArea[] {
  return argument.references.flatMap(({ sheet, from, to }) => {
    const end = to ?? from;
    if (from.row === null || from.column === null || end.row === null || end.column === null) return [];
    const whole: Area = {
      sheet: sheet ?? home,
      top: from.row,
      left: from.column,
      bottom: end.row,
      right: end.column,
    };
    const size = (whole.bottom - whole.top + 1) * (whole.right - whole.left + 1);
    if (parameter?.giving === "table") return size <= LONGEST_TABLE ? [{ whole, read: whole }] : [];
    const top = whole.bottom > whole.top ? Math.min(whole.top + offset.row, whole.bottom) : whole.top;
    const left = whole.right > whole.left ? Math.min(whole.left + offset.column, whole.right) : whole.left;
    return [{ whole, read: { sheet: whole.sheet, top, left, bottom: top, right: left } }];
  });
}

function row(
  argument: CallArgument,
  parameter: ParameterDoc | undefined,
  areas: readonly WantedArea[],
  cells: Cells,
  home: string,
): ArgumentRow | null {
  if (!parameter) return null;
  const { tree } = argument;
  const table = parameter.giving === "table";
  const alone = tree.kind === "reference" && areas.length === 1;
  let value: CellValue | undefined;
  let rows: CellValue[][] | undefined;
  if (alone) {
    rows = cells.rows(areas[0]!.read);
    value = rows[0]?.[0] ?? null;
  } else if (areas.length === argument.references.length && !argument.missing) {
    rows = argumentValue(argument, {
      cell: (sheet, r, c) => asScalar(cells.at(sheet ?? home, r, c)),
      extent: () => ({ rows: 0, columns: 0 }),
    }) as CellValue[][];
    value = rows[0]?.[0] ?? null;
    // An error here means that the pane cannot work it out (a function it does not know), not that the cell has one.
    if (value !== null && isError(value)) value = rows = undefined;
  }
  return {
    parameter,
    text: argument.text,
    value: table ? undefined : value,
    ...(table && rows && { table: rows }),
    source: alone ? (table ? areas[0]!.whole : areas[0]!.read) : null,
    blanks: areas.filter(({ read }) => cells.hasBlank(read)).map(({ read }) => read),
    leftOut: argument.missing,
  };
}

function leftOut(doc: FunctionDoc, given: number): ArgumentRow[] {
  return doc.parameters
    .slice(given)
    .filter(({ repeating }) => !repeating)
    .map((parameter) => ({ parameter, text: "", value: undefined, source: null, blanks: [], leftOut: true }));
}

/** Cells read from the sheet, by place. */
class Cells {
  private readonly values = new Map<string, CellValue>();

  put(area: Area, rows: readonly (readonly SheetCell[])[]): void {
    rows.forEach((cells, r) =>
      cells.forEach(({ value }, c) => this.values.set(`${area.sheet}!${area.top + r},${area.left + c}`, value)),
    );
  }
  at(sheet: string, r: number, c: number): CellValue {
    return this.values.get(`${sheet}!${r},${c}`) ?? null;
  }
  rows({ sheet, top, left, bottom, right }: Area): CellValue[][] {
    return Array.from({ length: bottom - top + 1 }, (_, r) =>
      Array.from({ length: right - left + 1 }, (_, c) => this.at(sheet, top + r, left + c)),
    );
  }
  hasBlank(area: Area): boolean {
    return this.rows(area).some((cells) => cells.some((value) => value === null || value === ""));
  }
}

const asScalar = (value: CellValue) => (value !== null && isError(value) ? { error: value.error } : value);

/** The number that an argument gives, or what is taken where it is left out. */
export function numberOf(explanation: Explanation, name: string): number | undefined {
  const found = explanation.rows.find(({ parameter }) => parameter.name === name);
  if (!found) return undefined;
  if (typeof found.value === "number") return found.value;
  const blank = found.leftOut || ((found.value === null || found.value === "") && found.parameter.optional);
  const taken = blank ? Number.parseFloat(found.parameter.leftOut) : Number.NaN;
  return Number.isNaN(taken) ? undefined : taken;
}

/** The word that an argument gives, in lower case, or what is taken where it is left out. */
export function wordOf(explanation: Explanation, name: string): string | undefined {
  const found = explanation.rows.find(({ parameter }) => parameter.name === name);
  if (typeof found?.value === "string" && found.value.trim() !== "") return found.value.trim().toLowerCase();
  return found?.parameter.leftOut.toLowerCase() || undefined;
}

export const dampingModelOf = (explanation: Explanation): DampingModel =>
  wordOf(explanation, "dampingModel") === "hysteretic" ? "hysteretic" : "viscous";

/** The point on the curves of one mass on one mount that the cell stands for, where its arguments give one. */
export function operatingPoint(explanation: Explanation): OperatingPoint | null {
  const { doc, result } = explanation;
  const model = dampingModelOf(explanation);
  const zeta = numberOf(explanation, "dampingRatio");
  let fn = numberOf(explanation, "naturalFrequency");
  let f = firstNumber(explanation, "frequency", "highestFrequency", "centreFrequency", "to");
  if (doc.id === "REQNATFREQ" && typeof result === "number") fn = result;
  if (doc.id === "PEAKTRANS") fn = f = 1;
  if (doc.id === "PEAKFREQ" && typeof result === "number") f = result;
  if (zeta === undefined || fn === undefined || f === undefined) return null;
  return fn > 0 && f >= 0 && zeta >= 0 ? { f, fn, zeta, model } : null;
}

function firstNumber(explanation: Explanation, ...names: string[]): number | undefined {
  return names.map((name) => numberOf(explanation, name)).find((number) => number !== undefined);
}

/** Where an argument comes from, as the user would write it: "B7" here, "Inputs!B7" elsewhere. */
export function sourceText(area: Area, here: string): string {
  const address = addressOf(area);
  if (area.sheet === here) return address;
  return /^[\p{L}_][\p{L}\p{N}_]*$/u.test(area.sheet)
    ? `${area.sheet}!${address}`
    : `'${area.sheet.replaceAll("'", "''")}'!${address}`;
}

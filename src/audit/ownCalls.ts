/** Calls of our own functions inside a cell's formula: which function, which arguments, where their values come from. */
import { evaluate, type Surroundings } from "../formula/evaluate";
import { type CallNode, type Node, type ReferenceNode, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { cellName } from "../formula/references";
import { isMatrix, type Scalar, type Value } from "../formula/values";
import { resolver } from "./names";
import type { DefinedName, Table } from "./workbook";

export interface CallArgument {
  /** as it stands in the formula */
  readonly text: string;
  readonly tree: Node;
  readonly references: readonly ReferenceNode[];
  /** left out, as in F(1,,2) */
  readonly missing: boolean;
}

export interface OwnCall {
  readonly id: string;
  readonly arguments: readonly CallArgument[];
  /** whether the cell's formula is this call and nothing else */
  readonly whole: boolean;
}

const ownName = /^(?:_XLDUDF_)?PLINTH[._](.+)$/i;

/** The id of our function that a call's name means, in any of the spellings that files have. */
export const ownFunction = (name: string): string | undefined => ownName.exec(name)?.[1]?.toUpperCase();

/** Our functions in a formula (text without "="), the outermost first. */
export function ownCalls(formula: string): OwnCall[] {
  const { tree } = readFormula(formula);
  const found: OwnCall[] = [];
  walk(tree, (node) => {
    const id = node.kind === "call" ? ownFunction(node.name) : undefined;
    if (id === undefined) return;
    found.push({
      id,
      arguments: (node as CallNode).arguments.map((argument) => describe(argument, formula)),
      whole: node === tree,
    });
  });
  return found;
}

/** The same call with defined names and table columns replaced by the cells they stand for. */
export function withNames(
  call: OwnCall,
  { names, tables }: { names: readonly DefinedName[]; tables: readonly Table[] },
  sheet: string,
  row: number,
): OwnCall {
  const { resolve } = resolver({ sheets: [], names, tables });
  return {
    ...call,
    arguments: call.arguments.map((argument) => {
      const tree = resolve(argument.tree, sheet, row);
      return { ...argument, tree, references: referencesIn(tree) };
    }),
  };
}

/** Whether an argument speaks of a defined name or a table. */
export function hasNames(call: OwnCall): boolean {
  let found = false;
  for (const { tree } of call.arguments) {
    walk(tree, ({ kind }) => {
      if (kind === "name" || kind === "structured") found = true;
    });
  }
  return found;
}

/** An argument's value as rows of cells; null in a place is a blank. Our own functions inside it are not known here. */
export function argumentValue(argument: CallArgument, around: Surroundings): Scalar[][] {
  const value: Value = evaluate(argument.tree, around);
  if (!isMatrix(value)) return [[value]];
  const rows: Scalar[][] = [];
  for (let row = 0; row < value.rows; row++) {
    rows.push(value.values.slice(row * value.columns, (row + 1) * value.columns));
  }
  return rows;
}

export const isCellError = (value: unknown): value is { error: string } =>
  typeof value === "object" && value !== null && "error" in value;

/** "B7" for row 6, column 1; "B7:C9" for an area. */
export function addressOf(area: { top: number; left: number; bottom: number; right: number }): string {
  const from = cellName(area.top, area.left);
  const to = cellName(area.bottom, area.right);
  return from === to ? from : `${from}:${to}`;
}

function describe(tree: Node, formula: string): CallArgument {
  return {
    text: formula.slice(tree.start, tree.end),
    tree,
    references: referencesIn(tree),
    missing: tree.kind === "missing",
  };
}

function referencesIn(tree: Node): ReferenceNode[] {
  const found: ReferenceNode[] = [];
  walk(tree, (node) => {
    if (node.kind === "reference") found.push(node);
  });
  return found;
}

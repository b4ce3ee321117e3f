import { evaluate, type Surroundings } from "../formula/evaluate";
import {
  type CellPoint,
  children,
  type Node,
  type NumberNode,
  type ReferenceNode,
  withChildren,
} from "../formula/nodes";
import { isComplex, isMatrix, type Scalar, single } from "../formula/values";
import type { Book, Form } from "./book";
import { exactConstant } from "./constants";
import { cellKey } from "./workbook";

/** An input of a cut: a cell, which for other rows of the column moves unless it is fixed; or a look-up taken as a whole. */
export interface Leaf {
  readonly sheet: number;
  readonly row: number;
  readonly column: number;
  readonly rowMoves: boolean;
  readonly columnMoves: boolean;
  /** a look-up call, evaluated on the sheet */
  readonly lookup: { readonly tree: Node; readonly form: Form; readonly row: number; readonly column: number } | null;
}

/** A formula seen as a function of some of its precedents: helper cells inside it are written out. */
export interface Cut {
  readonly tree: Node;
  readonly leaves: readonly Leaf[];
  readonly literals: readonly NumberNode[];
  /** a whole range is among the inputs */
  readonly hasRange: boolean;
}

const lookups = new Set(["VLOOKUP", "HLOOKUP", "LOOKUP", "XLOOKUP", "INDEX"]);
const largestTree = 3000;

/** Writes out the helper cells of a formula for which `opens` says so. null if the formula is too large or circular. */
export function cutFormula(
  book: Book,
  sheet: number,
  row: number,
  column: number,
  form: Form,
  opens: (sheet: number, row: number, column: number, depth: number) => boolean,
  constantAt: (sheet: number, row: number, column: number) => number | null = () => null,
): Cut | null {
  const leaves: Leaf[] = [];
  const index = new Map<string, number>();
  const literals: NumberNode[] = [];
  const open = new Set<string>();
  let size = 0;
  let hasRange = false;
  let failed = false;

  const leafNode = (leaf: Leaf, key: string): Node => {
    let at = index.get(key);
    if (at === undefined) {
      at = leaves.length;
      index.set(key, at);
      leaves.push(leaf);
    }
    const from: CellPoint = { row: at, column: 0, rowFixed: true, columnFixed: true };
    return { kind: "reference", sheet: null, from, to: null, start: 0, end: 0 };
  };

  const build = (
    node: Node,
    inForm: Form,
    at: { sheet: number; row: number; column: number; rowMoves: boolean; columnMoves: boolean },
    depth: number,
  ): Node => {
    if (++size > largestTree) failed = true;
    if (failed) return node;
    if (node.kind === "number") {
      const exact: NumberNode = { ...node, value: exactConstant(node.text, node.value) };
      literals.push(exact);
      return exact;
    }
    if (node.kind === "call" && lookups.has(node.name)) {
      const key = `lookup:${at.sheet}:${at.row}:${at.column}:${node.start}`;
      const lookup = { tree: node, form: inForm, row: at.row, column: at.column };
      return leafNode({ ...at, lookup }, key);
    }
    if (node.kind === "call" && (node.name === "MAX" || node.name === "MIN") && node.arguments.length === 2) {
      // a guard such as MAX(0, x) is no part of the relation
      const guarded = node.arguments.filter((argument) => !isLiteral(argument));
      if (guarded.length === 1) return build(guarded[0]!, inForm, at, depth);
    }
    if (node.kind === "reference") return reference(node, inForm, at, depth);
    const inside = children(node);
    if (inside.length === 0) return node;
    return withChildren(
      node,
      inside.map((child) => build(child, inForm, at, depth)),
    );
  };

  const reference = (
    node: ReferenceNode,
    inForm: Form,
    at: { sheet: number; row: number; column: number; rowMoves: boolean; columnMoves: boolean },
    depth: number,
  ): Node => {
    if (node.to) {
      hasRange = true;
      return node;
    }
    const target = {
      sheet: node.sheet === null ? at.sheet : book.sheetNumber(node.sheet),
      row: node.from.row! + (node.from.rowFixed ? 0 : at.row - inForm.row),
      column: node.from.column! + (node.from.columnFixed ? 0 : at.column - inForm.column),
      rowMoves: at.rowMoves && !node.from.rowFixed,
      columnMoves: at.columnMoves && !node.from.columnFixed,
    };
    const key = `${target.sheet}:${target.row}:${target.column}`;
    const next = book.sheets[target.sheet]?.forms.get(cellKey(target.row, target.column));
    const constant = next ? null : constantAt(target.sheet, target.row, target.column);
    if (constant !== null) {
      const { start, end } = node;
      const typed: NumberNode = { kind: "number", value: constant, text: String(constant), start, end };
      literals.push(typed);
      return typed;
    }
    if (open.has(key)) failed = true; // circular: no statement
    if (next && !failed && opens(target.sheet, target.row, target.column, depth)) {
      open.add(key);
      const inner = build(next.tree, next, target, depth + 1);
      open.delete(key);
      return inner;
    }
    return leafNode({ ...target, lookup: null }, key);
  };

  open.add(`${sheet}:${row}:${column}`);
  const tree = build(form.tree, form, { sheet, row, column, rowMoves: true, columnMoves: true }, 0);
  return failed || leaves.length > 12 ? null : { tree, leaves, literals, hasRange };
}

const isLiteral = (node: Node): boolean =>
  node.kind === "number" || (node.kind === "unary" && isLiteral(node.argument));

/** The cell of a leaf for a formula copied `down` rows and `across` columns from where the cut was made. */
export const leafRow = (leaf: Leaf, down: number): number => leaf.row + (leaf.rowMoves ? down : 0);
export const leafColumn = (leaf: Leaf, across: number): number => leaf.column + (leaf.columnMoves ? across : 0);

/** Value of a leaf on the sheet. */
export function leafValue(book: Book, leaf: Leaf, down: number, across: number): Scalar {
  if (leaf.lookup) {
    const { tree, form, row, column } = leaf.lookup;
    const around = book.around(
      leaf.sheet,
      form,
      row + (leaf.rowMoves ? down : 0),
      column + (leaf.columnMoves ? across : 0),
    );
    return single(evaluate(tree, around));
  }
  return book.value(leaf.sheet, leafRow(leaf, down), leafColumn(leaf, across));
}

/** Evaluates a cut for given values of its leaves; a complex result is given by its size. */
export function evaluateCut(
  cut: Cut,
  values: ArrayLike<number>,
  tree: Node = cut.tree,
  texts: readonly (Scalar | undefined)[] = [],
): { value: number; complex: boolean } {
  const around: Surroundings = {
    cell: (_, row) => texts[row] ?? values[row] ?? null,
    extent: () => ({ rows: 0, columns: 0 }),
    exact: true,
  };
  const result = evaluate(tree, around);
  const scalar = isMatrix(result) ? null : result;
  if (typeof scalar === "number") return { value: scalar, complex: false };
  if (scalar !== null && isComplex(scalar)) return { value: Math.hypot(scalar.re, scalar.im), complex: true };
  return { value: NaN, complex: false };
}

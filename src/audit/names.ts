import { children, type Node, type ReferenceNode, type StructuredNode, withChildren } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { cellKey, type Table, type Workbook } from "./workbook";

export interface Resolver {
  /** The tree with names and structured references replaced by what they refer to. */
  resolve(tree: Node, sheet: string, row: number): Node;
  /** Names that stand for one cell, by "sheet number:cell key". */
  nameOf(sheetNumber: (name: string) => number): Map<string, string>;
}

/** Resolves defined names and tables of a workbook. What cannot be resolved stays as it is. */
export function resolver(workbook: Workbook): Resolver {
  const trees = new Map<string, Node>();
  for (const { name, formula, sheet } of workbook.names) {
    const { tree, problems } = readFormula(formula);
    if (problems.length === 0) trees.set(`${sheet?.toLowerCase() ?? ""}!${name.toLowerCase()}`, tree);
  }
  const tables = new Map(workbook.tables.map((table) => [table.name.toLowerCase(), table]));

  function resolve(tree: Node, sheet: string, row: number, depth = 0, local: ReadonlySet<string> = new Set()): Node {
    if (depth > 8) return tree;
    if (tree.kind === "name") {
      const plain = tree.name.replace(/^.*!/, "").toLowerCase();
      if (local.has(plain)) return tree;
      const found = trees.get(`${sheet.toLowerCase()}!${plain}`) ?? trees.get(`!${plain}`);
      return found ? resolve(found, sheet, row, depth + 1, local) : tree;
    }
    if (tree.kind === "structured") return structured(tree, sheet, row);
    const inside = children(tree);
    if (inside.length === 0) return tree;
    const known = tree.kind === "call" && tree.name === "LET" ? withLocals(local, inside) : local;
    return withChildren(
      tree,
      inside.map((child) => resolve(child, sheet, row, depth, known)),
    );
  }

  function structured(node: StructuredNode, sheet: string, row: number): Node {
    const table = node.table === "" ? tableAt(workbook.tables, sheet, row) : tables.get(node.table.toLowerCase());
    return table ? (columnsOf(table, node, row) ?? node) : node;
  }

  return {
    resolve: (tree, sheet, row) => resolve(tree, sheet, row),
    nameOf: (sheetNumber) => {
      const found = new Map<string, string>();
      for (const { name, formula } of workbook.names) {
        const { tree } = readFormula(formula);
        if (tree.kind !== "reference" || tree.to || tree.sheet === null) continue;
        found.set(`${sheetNumber(tree.sheet)}:${cellKey(tree.from.row!, tree.from.column!)}`, name);
      }
      return found;
    },
  };
}

function withLocals(local: ReadonlySet<string>, parts: readonly Node[]): ReadonlySet<string> {
  const known = new Set(local);
  parts.forEach((part, i) => {
    if (i % 2 === 0 && i < parts.length - 1 && part.kind === "name") known.add(part.name.toLowerCase());
  });
  return known;
}

function tableAt(tables: readonly Table[], sheet: string, row: number): Table | undefined {
  return tables.find((table) => table.sheet === sheet && row >= table.top && row <= table.bottom);
}

function columnsOf(table: Table, node: StructuredNode, row: number): ReferenceNode | null {
  const clean = (name: string): string => name.trim().replace(/\s+/g, " ").toLowerCase();
  const indices = node.columns.map((name) => table.columns.findIndex((column) => clean(column) === clean(name)));
  if (indices.includes(-1)) return null;
  const left = table.left + Math.min(...(indices.length ? indices : [0]));
  const right = table.left + Math.max(...(indices.length ? indices : [table.columns.length - 1]));
  const { start, end } = node;
  const sheet = table.sheet;
  const point = (r: number, column: number, rowFixed: boolean) => ({ row: r, column, rowFixed, columnFixed: true });
  if (node.section === "this row") {
    const from = point(row, left, false);
    return { kind: "reference", sheet, from, to: right === left ? null : point(row, right, false), start, end };
  }
  const top = node.section === "data" ? table.top + table.headerRows : table.top;
  const bottom =
    node.section === "headers" ? table.top : table.bottom - (node.section === "data" ? table.totalsRows : 0);
  return { kind: "reference", sheet, from: point(top, left, true), to: point(bottom, right, true), start, end };
}

/** Documented examples computed: our functions inside, an independent reader and evaluator of formulas around them. */
import { LEFT } from "@formulajs/formulajs";
import { evaluate } from "../../src/formula/evaluate";
import { children, type Node, withChildren } from "../../src/formula/nodes";
import { readFormula } from "../../src/formula/read";
import { isMatrix, type Scalar } from "../../src/formula/values";
import * as functions from "../../src/functions";

const nothing = { cell: () => null, extent: () => ({ rows: 0, columns: 0 }) };

/** The rows that a formula of literals, our functions and ordinary spreadsheet functions gives. */
export async function valueOf(formula: string): Promise<Scalar[][]> {
  const { tree, problems } = readFormula(formula);
  if (problems.length > 0) throw new Error(`${formula}: ${problems[0].message}`);
  return rowsOf(await withoutOurs(tree));
}

function rowsOf(node: Node): Scalar[][] {
  const value = evaluate(node, nothing);
  if (!isMatrix(value)) return [[value]];
  return Array.from({ length: value.rows }, (_, i) =>
    value.values.slice(i * value.columns, (i + 1) * value.columns).map((cell) => cell),
  );
}

/** The tree with every call of ours replaced by its result. */
async function withoutOurs(node: Node): Promise<Node> {
  const inside: Node[] = [];
  for (const child of children(node)) inside.push(await withoutOurs(child));
  const whole = withChildren(node, inside);
  if (whole.kind === "call" && whole.name === "LEFT") {
    const [text, length] = whole.arguments.map((argument) => rowsOf(argument)[0][0]);
    return literal(LEFT(text, length) as string, { start: node.start, end: node.end });
  }
  if (whole.kind !== "call" || !(whole.name in functions)) return whole;
  const compute = (functions as Record<string, (...args: any[]) => any>)[whole.name];
  const given = whole.arguments.map((argument) => (argument.kind === "missing" ? null : rowsOf(argument)));
  const repeated = whole.name === "CHECK" ? [...given.slice(0, 3), given.slice(3)] : given;
  const rows: Scalar[][] = await compute(...repeated);
  const place = { start: node.start, end: node.end };
  return { ...place, kind: "array", rows: rows.map((row) => row.map((cell) => literal(cell, place))) };
}

function literal(cell: Scalar, place: { start: number; end: number }): Node {
  if (typeof cell === "number") return { ...place, kind: "number", value: cell, text: String(cell) };
  if (typeof cell === "string") return { ...place, kind: "text", value: cell };
  throw new Error(`an example gives ${JSON.stringify(cell)}`);
}

/** The documented examples of a cell function as calls that a host makes. */
import { type FunctionDoc, readFunctionDocs } from "../../src/build/functionDocs";
import { type CallNode, type Node, walk } from "../../src/formula/nodes";
import { readFormula } from "../../src/formula/read";
import * as functions from "../../src/functions";

export const functionDocs = readFunctionDocs();

export interface ExampleCall {
  /** one value per parameter as Excel passes it: rows of cells, a word, or null where it is left out */
  args: unknown[];
  /** the documented result; undefined where the call stands inside another one or works on its result */
  gives: unknown[][] | undefined;
}

/** The calls of the function in its examples. Arguments that are calls themselves are computed. */
export function exampleCalls(doc: FunctionDoc): ExampleCall[] {
  return doc.examples.flatMap(({ formula, gives }) => {
    const { tree } = readFormula(formula);
    const calls: CallNode[] = [];
    walk(tree, (node) => {
      if (node.kind === "call" && node.name === doc.id) calls.push(node);
    });
    return calls
      .filter((call) => call.arguments.every((argument) => literal(argument) !== undefined))
      .map((call) => ({
        args: hostArguments(doc, call.arguments),
        gives: call === tree ? (literal(readFormula(`=${gives}`).tree) ?? undefined) : undefined,
      }));
  });
}

function hostArguments({ parameters }: FunctionDoc, given: readonly Node[]): unknown[] {
  return parameters.map(({ giving, repeating }, i) => {
    if (repeating) return given.slice(i).map(literal);
    const rows = given[i] === undefined ? null : literal(given[i])!;
    return rows !== null && (giving === "words" || giving === "text") ? rows[0][0] : rows;
  });
}

/** The rows that a constant or a call of ours stands for; null for an argument left out, undefined for anything else. */
function literal(node: Node): unknown[][] | null | undefined {
  switch (node.kind) {
    case "number":
    case "text":
    case "boolean":
      return [[node.value]];
    case "unary": {
      const inside = literal(node.argument);
      return inside && node.operator === "neg" ? [[-(inside[0][0] as number)]] : undefined;
    }
    case "array":
      return node.rows.map((row) => row.map((cell) => literal(cell)?.[0][0]));
    case "call": {
      const compute = (functions as Record<string, (...args: any[]) => any>)[node.name];
      return compute === undefined ? undefined : compute(...node.arguments.map(literal));
    }
    case "missing":
      return null;
    default:
      return undefined;
  }
}

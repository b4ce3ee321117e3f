import type { Node } from "./nodes";
import { callNumeric, isNumericFunction } from "./numeric-functions";

export type Compiled = (values: ArrayLike<number>) => number;

/**
 * Turns a formula of plain arithmetic and numeric functions over names into a function of their values, in the order of
 * `names`. Returns null if the formula holds anything else. A value that cannot be computed is NaN.
 */
export function compile(tree: Node, names: readonly string[]): Compiled | null {
  switch (tree.kind) {
    case "number": {
      const { value } = tree;
      return () => value;
    }
    case "name": {
      const index = names.indexOf(tree.name);
      return index < 0 ? null : (values) => values[index]!;
    }
    case "unary": {
      const inner = compile(tree.argument, names);
      if (!inner) return null;
      if (tree.operator === "neg") return (values) => -inner(values);
      return tree.operator === "pct" ? (values) => inner(values) / 100 : inner;
    }
    case "binary": {
      const left = compile(tree.left, names);
      const right = compile(tree.right, names);
      return left && right && arithmetic(tree.operator, left, right);
    }
    case "call": {
      const parts = tree.arguments.map((argument) => compile(argument, names));
      if (!isNumericFunction(tree.name) || parts.includes(null)) return null;
      return numericCall(tree.name, parts as Compiled[]);
    }
    case "text":
    case "boolean":
    case "error":
    case "reference":
    case "external":
    case "structured":
    case "array":
    case "missing":
      return null;
    default:
      return tree satisfies never;
  }
}

function arithmetic(operator: string, left: Compiled, right: Compiled): Compiled | null {
  switch (operator) {
    case "+":
      return (values) => left(values) + right(values);
    case "-":
      return (values) => left(values) - right(values);
    case "*":
      return (values) => left(values) * right(values);
    case "/":
      return (values) => left(values) / right(values);
    case "^":
      return (values) => Math.pow(left(values), right(values));
    default:
      return null;
  }
}

function numericCall(name: string, parts: Compiled[]): Compiled {
  const [first, second] = parts;
  if (name === "SQRT" && first) return (values) => Math.sqrt(first(values));
  if (name === "ABS" && first) return (values) => Math.abs(first(values));
  if (name === "LOG10" && first) return (values) => Math.log10(first(values));
  if (name === "ATAN2" && first && second) return (values) => Math.atan2(second(values), first(values));
  if (name === "PI") return () => Math.PI;
  return (values) => {
    const result = callNumeric(
      name,
      parts.map((part) => part(values)),
    );
    return typeof result === "number" ? result : NaN;
  };
}

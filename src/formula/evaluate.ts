import { lookupFunctions } from "./lookup-functions";
import type { CallNode, CellPoint, Node, ReferenceNode } from "./nodes";
import { callNumeric, isNumericFunction, roundingFunctions } from "./numeric-functions";
import { rangeFunctions } from "./range-functions";
import {
  asMatrix,
  broadcast,
  failure,
  finiteOr,
  isComplex,
  isError,
  isMatrix,
  type Scalar,
  single,
  toNumber,
  type Value,
} from "./values";

/** What a formula can see of its workbook. */
export interface Surroundings {
  /** Value of one cell; sheet null is the formula's own. */
  cell(sheet: string | null, row: number, column: number): Scalar;
  /** Used size of a sheet, which bounds whole columns and rows. */
  extent(sheet: string | null): { rows: number; columns: number };
  /** Leave ROUND and its like out, so that a formula can be compared with its exact form. */
  readonly exact?: boolean;
  readonly row?: number;
  readonly column?: number;
  /** How far the formula was copied from where its tree was read; moves every reference that is not fixed. */
  readonly shift?: { readonly rows: number; readonly columns: number };
}

type Locals = ReadonlyMap<string, Value>;

const noLocals: Locals = new Map();
const largestRange = 200_000;

/** Evaluates a tree with the whitelisted operators and functions. Anything else is #NAME?; nothing is executed. */
export function evaluate(tree: Node, around: Surroundings): Value {
  return evaluateIn(tree, around, noLocals);
}

function evaluateIn(node: Node, around: Surroundings, locals: Locals): Value {
  switch (node.kind) {
    case "number":
    case "text":
    case "boolean":
      return node.value;
    case "error":
      return failure(node.value);
    case "missing":
      return null;
    case "reference":
      return referenced(node, around);
    case "external":
    case "structured":
      return failure("#REF!");
    case "name":
      return locals.get(node.name.toLowerCase()) ?? failure("#NAME?");
    case "unary":
      return unary(node.operator, evaluateIn(node.argument, around, locals));
    case "binary":
      if (node.operator === ":") return failure("#REF!");
      return binary(node.operator, evaluateIn(node.left, around, locals), evaluateIn(node.right, around, locals));
    case "array":
      return arrayOf(node.rows.map((row) => row.map((item) => single(evaluateIn(item, around, locals)))));
    case "call":
      return call(node, around, locals);
    default:
      return node satisfies never;
  }
}

function referenced(node: ReferenceNode, around: Surroundings): Value {
  const { sheet } = node;
  const from = node.from;
  const shift = around.shift;
  const rowBy = (point: CellPoint): number => (shift && !point.rowFixed ? shift.rows : 0);
  const columnBy = (point: CellPoint): number => (shift && !point.columnFixed ? shift.columns : 0);
  if (!node.to) return around.cell(sheet, from.row! + rowBy(from), from.column! + columnBy(from));
  const to = node.to;
  const extent =
    from.row === null || to.row === null || from.column === null || to.column === null ? around.extent(sheet) : null;
  const top = from.row === null ? 0 : from.row + rowBy(from);
  const left = from.column === null ? 0 : from.column + columnBy(from);
  const bottom = to.row === null ? extent!.rows - 1 : to.row + rowBy(to);
  const right = to.column === null ? extent!.columns - 1 : to.column + columnBy(to);
  const rows = bottom - top + 1;
  const columns = right - left + 1;
  if (rows * columns > largestRange) return failure("#VALUE!");
  const values: Scalar[] = [];
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) values.push(around.cell(sheet, row, column));
  }
  return { rows: Math.max(rows, 0), columns: Math.max(columns, 0), values };
}

function arrayOf(rows: Scalar[][]): Value {
  return { rows: rows.length, columns: rows[0]?.length ?? 0, values: rows.flat() };
}

function unary(operator: "neg" | "plus" | "pct" | "single" | "spill", value: Value): Value {
  if (operator === "plus" || operator === "single" || operator === "spill") return value;
  return broadcast(value, null, (x) => {
    if (isComplex(x)) return operator === "neg" ? { re: -x.re, im: -x.im } : failure("#VALUE!");
    const number = toNumber(x);
    if (typeof number !== "number") return number;
    return operator === "neg" ? -number : number / 100;
  });
}

const arithmetic: Record<string, (a: number, b: number) => number> = {
  "+": (a, b) => a + b,
  "-": (a, b) => a - b,
  "*": (a, b) => a * b,
  "/": (a, b) => a / b,
  "^": (a, b) => Math.pow(a, b),
};

function binary(operator: string, left: Value, right: Value): Value {
  const calculate = arithmetic[operator];
  if (calculate) {
    return broadcast(left, right, (x, y) => {
      const a = toNumber(x);
      const b = toNumber(y);
      if (typeof a !== "number") return a;
      if (typeof b !== "number") return b;
      return operator === "/" && b === 0 ? failure("#DIV/0!") : finiteOr(calculate(a, b));
    });
  }
  return broadcast(left, right, (x, y) => {
    if (isError(x)) return x;
    if (isError(y)) return y;
    return operator === "&" ? textOf(x) + textOf(y) : compared(operator, x, y);
  });
}

/** The text that & joins. */
export function textOf(value: Scalar): string {
  if (value === null) return "";
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  if (isComplex(value)) return `${value.re}${value.im < 0 ? "" : "+"}${value.im}i`;
  return isError(value) ? value.error : String(value);
}

function compared(operator: string, x: Scalar, y: Scalar): boolean {
  const rank = (value: Scalar): number => (typeof value === "string" ? 1 : typeof value === "boolean" ? 2 : 0);
  const emptyAs = (value: Scalar, other: Scalar): Scalar =>
    value !== null ? value : typeof other === "string" ? "" : typeof other === "boolean" ? false : 0;
  const a = emptyAs(x, y);
  const b = emptyAs(y, x);
  let sign: number;
  if (rank(a) !== rank(b)) sign = rank(a) - rank(b);
  else if (typeof a === "string") sign = a.toLowerCase().localeCompare((b as string).toLowerCase());
  else sign = Number(a) - Number(b);
  switch (operator) {
    case "=":
      return sign === 0;
    case "<>":
      return sign !== 0;
    case "<":
      return sign < 0;
    case ">":
      return sign > 0;
    case "<=":
      return sign <= 0;
    default:
      return sign >= 0;
  }
}

function truth(value: Value): boolean | null {
  const number = toNumber(single(value));
  return typeof number === "number" ? number !== 0 : null;
}

/** Functions that evaluate only some of their arguments. */
const lazy: Record<string, (node: CallNode, around: Surroundings, locals: Locals) => Value> = {
  IF: ({ arguments: [condition, yes, no] }, around, locals) => {
    const test = condition ? evaluateIn(condition, around, locals) : null;
    if (isError(single(test))) return single(test);
    const holds = truth(test);
    if (holds === null) return failure("#VALUE!");
    const branch = holds ? yes : no;
    return branch ? evaluateIn(branch, around, locals) : holds;
  },
  IFS: ({ arguments: pairs }, around, locals) => {
    for (let i = 0; i + 1 < pairs.length; i += 2) {
      if (truth(evaluateIn(pairs[i]!, around, locals))) return evaluateIn(pairs[i + 1]!, around, locals);
    }
    return failure("#N/A");
  },
  IFERROR: ({ arguments: [first, second] }, around, locals) => {
    const value = first ? evaluateIn(first, around, locals) : null;
    return isError(single(value)) && second ? evaluateIn(second, around, locals) : value;
  },
  IFNA: ({ arguments: [first, second] }, around, locals) => {
    const value = first ? evaluateIn(first, around, locals) : null;
    return single(value) === failure("#N/A") && second ? evaluateIn(second, around, locals) : value;
  },
  CHOOSE: ({ arguments: [which, ...choices] }, around, locals) => {
    const number = which ? toNumber(single(evaluateIn(which, around, locals))) : 0;
    const chosen = typeof number === "number" ? choices[Math.trunc(number) - 1] : undefined;
    return chosen ? evaluateIn(chosen, around, locals) : failure("#VALUE!");
  },
  AND: ({ arguments: tests }, around, locals) =>
    tests.every((test) => truth(evaluateIn(test, around, locals)) === true),
  OR: ({ arguments: tests }, around, locals) => tests.some((test) => truth(evaluateIn(test, around, locals)) === true),
  NOT: ({ arguments: [test] }, around, locals) =>
    test ? truth(evaluateIn(test, around, locals)) === false : failure("#VALUE!"),
  LET: ({ arguments: parts }, around, locals) => {
    const known = new Map(locals);
    for (let i = 0; i + 1 < parts.length; i += 2) {
      const name = parts[i]!;
      if (name.kind !== "name") return failure("#NAME?");
      known.set(name.name.toLowerCase(), evaluateIn(parts[i + 1]!, around, known));
    }
    const last = parts[parts.length - 1];
    return last ? evaluateIn(last, around, known) : failure("#VALUE!");
  },
  ROW: ({ arguments: [where] }, around) =>
    where?.kind === "reference"
      ? (where.from.row ?? 0) + 1
      : around.row === undefined
        ? failure("#VALUE!")
        : around.row + 1,
  COLUMN: ({ arguments: [where] }, around) =>
    where?.kind === "reference"
      ? (where.from.column ?? 0) + 1
      : around.column === undefined
        ? failure("#VALUE!")
        : around.column + 1,
};

const tests: Record<string, (value: Scalar) => Scalar> = {
  ISNUMBER: (value) => typeof value === "number",
  ISBLANK: (value) => value === null || value === "",
  ISERROR: (value) => isError(value),
  ISTEXT: (value) => typeof value === "string",
  N: (value) => (typeof value === "number" ? value : value === true ? 1 : 0),
  NA: () => failure("#N/A"),
  TRUE: () => true,
  FALSE: () => false,
};

function call(node: CallNode, around: Surroundings, locals: Locals): Value {
  const { name } = node;
  const special = Object.hasOwn(lazy, name) ? lazy[name] : undefined;
  if (special) return special(node, around, locals);
  const values = node.arguments.map((argument) => evaluateIn(argument, around, locals));
  if (Object.hasOwn(tests, name)) return tests[name]!(single(values[0] ?? null));
  if (isNumericFunction(name)) return numeric(name, values, around);
  if (Object.hasOwn(rangeFunctions, name)) return rangeFunctions[name]!(values);
  if (Object.hasOwn(lookupFunctions, name)) return lookupFunctions[name]!(values);
  return failure("#NAME?");
}

function numeric(name: string, values: readonly Value[], around: Surroundings): Value {
  if (around.exact && roundingFunctions.has(name)) return values[0] ?? null;
  const wide = values.find(isMatrix);
  if (!wide) return callNumeric(name, values as Scalar[]);
  const first = asMatrix(values[0] ?? null);
  if (values.length === 1) return { ...first, values: first.values.map((value) => callNumeric(name, [value])) };
  return broadcast(values[0] ?? null, values[1] ?? null, (x, y) => callNumeric(name, [x, y]));
}

/** Names of all functions that can be evaluated. */
export function knowsFunction(name: string): boolean {
  return (
    [lazy, tests, rangeFunctions, lookupFunctions].some((table) => Object.hasOwn(table, name)) ||
    isNumericFunction(name)
  );
}

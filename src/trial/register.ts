/** Registers every function of functions.json with the spreadsheet. */
import { addFunction, registries } from "@odoo/o-spreadsheet";
import { type Origin, noteSize } from "./grow";
import type { CellFunction } from "./host";
import { CellError } from "./host";
import { type FunctionMetadata, type Parameter, namespace } from "./metadata";
import { busy, isWaiting, recall, waitFor } from "./later";
import { type Cell, type SheetArgument, fromHostResult, toHostArgument } from "./values";

export function registerErrors(): void {
  for (const code of ["#VALUE!", "#REF!", busy.value]) registries.errorTypes.add(code);
}

export function registerFunctions(metadata: FunctionMetadata[], functions: Map<string, CellFunction>): void {
  for (const entry of metadata) {
    const fn = functions.get(entry.id.toUpperCase());
    if (!fn) throw new Error(`functions.js offers no ${entry.id}, but functions.json does`);
    addFunction(`${namespace}.${entry.name}`, {
      description: entry.description,
      category: "Plinth",
      isExported: true,
      args: describe(entry.parameters),
      compute: compute(entry, fn),
    });
  }
}

const isMatrix = (parameter: Parameter | undefined): boolean => parameter?.dimensionality === "matrix";

type Arguments = Parameters<typeof addFunction>[1]["args"];

function describe(parameters: Parameter[]): Arguments {
  // The library takes no optional argument before repeated ones; it is then left empty between two commas.
  const repeats = parameters.some(({ repeating }) => repeating);
  return parameters.map((parameter) => ({
    name: parameter.name,
    description: parameter.description,
    type: isMatrix(parameter) ? ["ANY", "RANGE"] : ["ANY"],
    acceptErrors: true,
    ...(isMatrix(parameter) && { acceptMatrix: true }),
    ...(parameter.optional && !repeats && { optional: true }),
    ...(parameter.repeating && { repeating: true }),
  }));
}

type Compute = Parameters<typeof addFunction>[1]["compute"];

function compute(entry: FunctionMetadata, fn: CellFunction): Compute {
  const { parameters } = entry;
  const last = parameters.at(-1);
  return function (this: { __originCellPosition?: Origin }, ...args: SheetArgument[]) {
    const given = args.map((arg, i) => toHostArgument(arg, isMatrix(parameters[i] ?? last)));
    // Excel passes repeated arguments as one array and null for every argument left out.
    const fixed = last?.repeating ? parameters.length - 1 : parameters.length;
    const passed = Array.from({ length: fixed }, (_, i) => given[i] ?? null);
    if (last?.repeating) passed.push(given.slice(fixed));
    const result = run(entry.id, fn, passed);
    if (Array.isArray(result)) noteSize(this.__originCellPosition, result[0]?.length ?? 1, result.length);
    return result;
  } as Compute;
}

function run(id: string, fn: CellFunction, passed: unknown[]): Cell | Cell[][] {
  try {
    // Only functions that once returned a promise are looked up: the others need no key.
    if (asynchronous.has(id)) {
      const key = keyOf(id, passed);
      if (isWaiting(key)) return busy;
      const known = recall(key);
      if (known) return fromHostResult(failed(known.result));
    }
    const result = fn(...passed);
    if (!(result instanceof Promise)) return fromHostResult(result);
    asynchronous.add(id);
    waitFor(keyOf(id, passed), result);
    return busy;
  } catch (error) {
    return fromHostResult(failed(error));
  }
}

const asynchronous = new Set<string>();

const keyOf = (id: string, passed: unknown[]): string =>
  id + JSON.stringify(passed, (_, value) => (value instanceof CellError ? { error: value.code } : value));

function failed(error: unknown): unknown {
  if (!(error instanceof Error) || error instanceof CellError) return error;
  console.error(error);
  return new CellError("#VALUE!", `unexpected failure: ${error.message}`);
}

/** The cell functions as their own comments describe them. */
import generated from "./functions.generated.json";

export interface ParameterDoc {
  readonly name: string;
  readonly what: string;
  readonly unit: string;
  readonly limits: string;
  readonly giving: string;
  readonly optional: boolean;
  readonly leftOut: string;
  readonly repeating: boolean;
}

export interface FunctionDoc {
  readonly id: string;
  readonly family: string;
  readonly sentence: string;
  readonly parameters: readonly ParameterDoc[];
  readonly returns: string;
  readonly examples: readonly { readonly formula: string; readonly gives: string }[];
  readonly failures: readonly string[];
  readonly source: string;
  readonly leavesOut: string;
}

export const functionDocs: readonly FunctionDoc[] = generated;

const byId = new Map(functionDocs.map((doc) => [doc.id, doc]));

export const docOf = (id: string): FunctionDoc | undefined => byId.get(id);

/** The parameter that takes the argument in this place; the last one may repeat. */
export function parameterAt(doc: FunctionDoc, index: number): ParameterDoc | undefined {
  const last = doc.parameters.at(-1);
  return doc.parameters[index] ?? (last?.repeating ? last : undefined);
}

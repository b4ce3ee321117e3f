/** functions.json, as far as the trial sheet reads it. */
export interface Parameter {
  name: string;
  description: string;
  type?: string;
  dimensionality?: string;
  optional?: boolean;
  repeating?: boolean;
}
export interface FunctionMetadata {
  id: string;
  name: string;
  description: string;
  helpUrl?: string;
  parameters: Parameter[];
}

/** The prefix under which the manifest offers the functions. */
export const namespace = "PLINTH";

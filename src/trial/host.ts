/** Stands in for the host's `CustomFunctions` global, so that the built functions.js runs here unchanged. */

export type CellFunction = (...args: unknown[]) => unknown;

/** A cell error as Excel's runtime hands it to functions and takes it from them. */
export class CellError extends Error {
  constructor(
    readonly code: string,
    message = "",
  ) {
    super(message);
    this.name = "CustomFunctions.Error";
  }
}

export const errorCodes = {
  invalidValue: "#VALUE!",
  notAvailable: "#N/A",
  divisionByZero: "#DIV/0!",
  invalidNumber: "#NUM!",
  nullReference: "#NULL!",
  invalidName: "#NAME?",
  invalidReference: "#REF!",
} as const;

/** Puts the stand-in on the global object; returns the table that `associate` fills. */
export function installHost(target: object): Map<string, CellFunction> {
  const functions = new Map<string, CellFunction>();
  const associate = (id: string | Record<string, CellFunction>, fn?: CellFunction): void => {
    if (typeof id === "string") functions.set(id.toUpperCase(), fn as CellFunction);
    else for (const [key, value] of Object.entries(id)) functions.set(key.toUpperCase(), value);
  };
  Object.assign(target, { CustomFunctions: { associate, Error: CellError, ErrorCode: errorCodes } });
  return functions;
}

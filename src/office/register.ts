import { CellFailure, cellOf } from "../functions/failure";
import { ERROR_CODES } from "./errorCodes";

type CellFunction = (...args: any[]) => any;

/** Makes the cell functions known to the host, each under its id. */
export function register(functions: Record<string, CellFunction>): void {
  for (const [id, compute] of Object.entries(functions)) {
    CustomFunctions.associate(id, forHost(compute));
  }
}

/** The function as the host calls it: failures leave as the host's own errors, which exist only once it has loaded. */
function forHost(compute: CellFunction): CellFunction {
  return (...args) => {
    try {
      const result = compute(...args);
      return result instanceof Promise ? result.then(cells, fail) : cells(result);
    } catch (thrown) {
      return fail(thrown);
    }
  };
}

function cells(rows: any[][]): any[][] {
  for (const row of rows) {
    for (let j = 0; j < row.length; j++) {
      if (row[j] instanceof CellFailure) row[j] = hostError(row[j]);
    }
  }
  return rows;
}

/** A failure of ours is thrown. An error that came in is returned: thrown, the host would know only some codes. */
function fail(thrown: unknown): any[][] {
  const cell = cellOf(thrown);
  if (cell instanceof CellFailure) throw hostError(cell);
  return [[cell]];
}

function hostError({ kind, message }: CellFailure): CustomFunctions.Error {
  return new CustomFunctions.Error(ERROR_CODES[kind] as CustomFunctions.ErrorCode, message);
}

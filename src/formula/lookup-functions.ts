import { asMatrix, at, failure, isError, type Matrix, type Scalar, single, toNumber, type Value } from "./values";

type LookupFunction = (values: readonly Value[]) => Value;

function order(a: Scalar, b: Scalar): number | null {
  if (typeof a === "number" && typeof b === "number") return a - b;
  if (typeof a === "string" && typeof b === "string") return a.toLowerCase().localeCompare(b.toLowerCase());
  return a === b ? 0 : null;
}

/** Index of the wanted value: 0 exact, 1 last not greater (rising list), -1 last not less (falling list); -1 if none. */
function position(list: readonly Scalar[], wanted: Scalar, mode: number): number {
  if (mode === 0) return list.findIndex((item) => order(item, wanted) === 0);
  let found = -1;
  for (let i = 0; i < list.length; i++) {
    const difference = order(list[i]!, wanted);
    if (difference === null) continue;
    if (mode > 0 ? difference <= 0 : difference >= 0) found = i;
    else break;
  }
  return found;
}

const column = (matrix: Matrix, index: number): Scalar[] =>
  Array.from({ length: matrix.rows }, (_, row) => matrix.values[row * matrix.columns + index] ?? null);
const row = (matrix: Matrix, index: number): Scalar[] =>
  matrix.values.slice(index * matrix.columns, (index + 1) * matrix.columns);

function whole(value: Value | undefined, otherwise: number): number {
  if (value === undefined || value === null) return otherwise;
  const number = toNumber(single(value));
  return typeof number === "number" ? Math.trunc(number) : NaN;
}

function index(values: readonly Value[]): Value {
  const matrix = asMatrix(values[0] ?? null);
  let down = whole(values[1], 0);
  let across = whole(values[2], 0);
  if (values[2] === undefined && matrix.rows === 1) [down, across] = [1, down];
  if (!(down >= 0 && down <= matrix.rows && across >= 0 && across <= matrix.columns)) return failure("#REF!");
  if (down === 0 && across === 0) return matrix;
  if (down === 0) return { rows: matrix.rows, columns: 1, values: column(matrix, across - 1) };
  if (across === 0 && matrix.columns > 1) return { rows: 1, columns: matrix.columns, values: row(matrix, down - 1) };
  return at(matrix, down - 1, Math.max(across - 1, 0));
}

function table(values: readonly Value[], vertical: boolean): Scalar {
  const matrix = asMatrix(values[1] ?? null);
  const wanted = single(values[0] ?? null);
  const nth = whole(values[2], 1);
  const exact = values[3] !== undefined && toNumber(single(values[3])) === 0;
  const found = position(vertical ? column(matrix, 0) : row(matrix, 0), wanted, exact ? 0 : 1);
  if (isError(wanted)) return wanted;
  if (found < 0) return failure("#N/A");
  if (!(nth >= 1 && nth <= (vertical ? matrix.columns : matrix.rows))) return failure("#REF!");
  return vertical ? at(matrix, found, nth - 1) : at(matrix, nth - 1, found);
}

/** INDEX, MATCH and the look-ups. */
export const lookupFunctions: Record<string, LookupFunction> = {
  INDEX: index,
  MATCH: (values) => {
    const found = position(asMatrix(values[1] ?? null).values, single(values[0] ?? null), whole(values[2], 1));
    return found < 0 ? failure("#N/A") : found + 1;
  },
  VLOOKUP: (values) => table(values, true),
  HLOOKUP: (values) => table(values, false),
  LOOKUP: (values) => {
    const list = asMatrix(values[1] ?? null);
    const found = position(list.values, single(values[0] ?? null), 1);
    return found < 0 ? failure("#N/A") : (asMatrix(values[2] ?? list).values[found] ?? null);
  },
  XLOOKUP: (values) => {
    const found = position(asMatrix(values[1] ?? null).values, single(values[0] ?? null), 0);
    if (found < 0) return values[3] ?? failure("#N/A");
    return asMatrix(values[2] ?? null).values[found] ?? null;
  },
};

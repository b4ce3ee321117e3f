/** A complex number, as COMPLEX and the IM… functions carry it. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/** A cell's error such as #N/A. */
export interface FormulaError {
  readonly error: string;
}

/** What one cell can hold; null is a blank cell. */
export type Scalar = number | string | boolean | null | Complex | FormulaError;

export interface Matrix {
  readonly rows: number;
  readonly columns: number;
  /** row by row */
  readonly values: readonly Scalar[];
}

export type Value = Scalar | Matrix;

export const isError = (value: Value): value is FormulaError =>
  typeof value === "object" && value !== null && "error" in value;
export const isComplex = (value: Value): value is Complex =>
  typeof value === "object" && value !== null && "re" in value;
export const isMatrix = (value: Value): value is Matrix =>
  typeof value === "object" && value !== null && "rows" in value;

const errors = new Map<string, FormulaError>();

/** The one object for an error code. */
export function failure(code: string): FormulaError {
  let found = errors.get(code);
  if (!found) errors.set(code, (found = { error: code }));
  return found;
}

/** A finite number, else #NUM!. */
export const finiteOr = (value: number): Scalar => (value - value === 0 ? value : failure("#NUM!"));

/** The value as a number the way arithmetic takes it: blank is 0, TRUE is 1, numeric text is its number. */
export function toNumber(value: Scalar): number | FormulaError {
  if (typeof value === "number") return value;
  if (value === null) return 0;
  if (typeof value === "boolean") return value ? 1 : 0;
  if (typeof value === "string") {
    const text = value.trim();
    const number = text === "" ? NaN : Number(text.endsWith("%") ? text.slice(0, -1) : text);
    if (Number.isNaN(number)) return failure("#VALUE!");
    return text.endsWith("%") ? number / 100 : number;
  }
  if (isError(value)) return value;
  return value.im === 0 ? value.re : failure("#VALUE!");
}

/** First element of a matrix, or the scalar itself. */
export function single(value: Value): Scalar {
  return isMatrix(value) ? (value.values[0] ?? null) : value;
}

/** The value in matrix form. */
export function asMatrix(value: Value): Matrix {
  return isMatrix(value) ? value : { rows: 1, columns: 1, values: [value] };
}

/** Applies `operation` element by element; a dimension of 1 repeats. */
export function broadcast(a: Value, b: Value, operation: (a: Scalar, b: Scalar) => Scalar): Value {
  if (!isMatrix(a) && !isMatrix(b)) return operation(a, b);
  const left = asMatrix(a);
  const right = asMatrix(b);
  const rows = Math.max(left.rows, right.rows);
  const columns = Math.max(left.columns, right.columns);
  const values: Scalar[] = [];
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      values.push(operation(at(left, row, column), at(right, row, column)));
    }
  }
  return { rows, columns, values };
}

/** Element of a matrix; a single row or column repeats, anything else outside is #N/A. */
export function at(matrix: Matrix, row: number, column: number): Scalar {
  const r = matrix.rows === 1 ? 0 : row;
  const c = matrix.columns === 1 ? 0 : column;
  return r < matrix.rows && c < matrix.columns ? matrix.values[r * matrix.columns + c]! : failure("#N/A");
}

/** Whole stretches of a column at once: one call of an array kernel instead of one call per cell. */

/** Computes out[i] from the i-th number of every column; throws where any row has no answer. */
export type Kernel = (columns: Float64Array[], out: Float64Array) => void;

/** One argument as rows of cells; a single row stands for every row of the result. */
interface Column {
  rows: unknown[][];
  height: number;
}

const STRETCH = 1024; // few enough to stay in the processor's nearest cache

/**
 * Fills result[start] and the rows after it, and returns where to go on; returns `start` itself, with nothing
 * filled, where a cell is no number or a row has no answer, so that the caller can say what is wrong in which place.
 */
export function fillByKernel(kernel: Kernel, arguments_: readonly Column[], result: any[][], start: number): number {
  const count = Math.min(STRETCH, result.length - start);
  const columns: Float64Array[] = [];
  for (const { rows, height } of arguments_) {
    const column = new Float64Array(count);
    for (let i = 0; i < count; i++) {
      const cell = rows[height === 1 ? 0 : start + i][0];
      if (typeof cell !== "number") return start;
      column[i] = cell;
    }
    columns.push(column);
  }
  const out = new Float64Array(count);
  try {
    kernel(columns, out);
  } catch {
    return start; // it is thrown again, in its own place, when the cells are taken one by one
  }
  for (let i = 0; i < count; i++) result[start + i] = [out[i]];
  return start + count;
}

/** End of the stretch that starts here. */
export function stretchEnd(start: number, length: number): number {
  return Math.min(start + STRETCH, length);
}

/** One line of the table that `npm run bench` prints. */
export interface Figure {
  what: string;
  /** median, milliseconds */
  median: number;
  /** most that the project allows, milliseconds or times another figure, as text */
  target?: string;
  /** whether the target is met; left out where there is none */
  met?: boolean;
  /** comparison in the same run, such as "0.93 of C" */
  beside?: string;
}

/** A bench file exports one of these by default. */
export type Bench = () => Figure[] | Promise<Figure[]>;

export function median(times: readonly number[]): number {
  const sorted = [...times].sort((a, b) => a - b);
  return sorted[sorted.length >> 1];
}

/** Milliseconds of each of `rounds` runs, after two to warm up. */
export function timesOf(work: () => unknown, rounds = 9): number[] {
  work();
  work();
  return Array.from({ length: rounds }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  });
}

/** A figure with a limit in milliseconds. */
export function within(what: string, times: readonly number[], limit: number): Figure {
  const middle = median(times);
  return { what, median: middle, target: `${limit} ms`, met: middle <= limit };
}

/**
 * Promises in a spreadsheet that knows none: a pending call shows a busy cell, its result is kept, and the sheet is
 * evaluated once more when it arrives.
 */
export const busy = { value: "#BUSY!", message: "Working …" };

const mostKept = 5000;
const settled = new Map<string, unknown>();
const pending = new Set<string>();
let reevaluate = (): void => {};

/** Called once for each batch of results that arrived. */
export function onSettled(callback: () => void): void {
  reevaluate = callback;
}

export const isWaiting = (key: string): boolean => pending.has(key);
export const isAnyPending = (): boolean => pending.size > 0;

/** The settled result for this call, if it has been made before. */
export function recall(key: string): { result: unknown } | undefined {
  return settled.has(key) ? { result: settled.get(key) } : undefined;
}

export function waitFor(key: string, promise: Promise<unknown>): void {
  pending.add(key);
  const keep = (result: unknown): void => {
    if (settled.size >= mostKept) settled.clear();
    settled.set(key, result);
    pending.delete(key);
    if (pending.size === 0) reevaluate();
  };
  promise.then(keep, keep);
}

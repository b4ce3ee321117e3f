/** The audit in a worker of its own: one workbook in, its progress and its findings out. */
import { auditWorkbook } from "../audit/audit";
import type { Finding } from "../audit/finding";
import type { Workbook } from "../audit/workbook";

export type WorkerAnswer =
  | { readonly done: number; readonly total: number }
  | { readonly findings: readonly Finding[] }
  | { readonly failure: string };

declare function postMessage(answer: WorkerAnswer): void;

/** Time between two words on progress, ms. */
const PULSE = 100;

addEventListener("message", ({ data }: MessageEvent<Workbook>) => {
  let last = 0;
  const progress = (done: number, total: number): void => {
    const now = performance.now();
    if (now - last < PULSE) return;
    last = now;
    postMessage({ done, total });
  };
  try {
    postMessage({ findings: auditWorkbook(data, { progress }) });
  } catch (error) {
    postMessage({ failure: (error as Error).message });
  }
});

/** Runs the audit away from the page, in a worker, and keeps its findings until the workbook changes. */
import type { Finding } from "../audit/finding";
import type { Workbook } from "../audit/workbook";
import type { WorkerAnswer } from "./auditWorker";
import type { Reading, Sheet } from "./sheet";

export interface Auditor {
  /** Findings of the whole workbook. Rejects with an AbortError when stopped. */
  findings(reading: AuditReading): Promise<readonly Finding[]>;
  /** whether findings of the workbook as it is now are at hand */
  readonly ready: boolean;
  /** seconds that the last audit took; 0 before the first */
  readonly lastSeconds: number;
  forget(): void;
}

export interface AuditReading extends Reading {
  /** called with the share of formulas compared, 0 to 1 */
  readonly comparing?: (done: number) => void;
}

export function createAuditor(sheet: Sheet): Auditor {
  let kept: readonly Finding[] | null = null;
  let state = 0;
  let lastSeconds = 0;

  return {
    get ready() {
      return kept !== null;
    },
    get lastSeconds() {
      return lastSeconds;
    },
    async findings(reading) {
      if (kept) return kept;
      const started = performance.now();
      const before = state;
      const workbook = await sheet.workbook(reading);
      reading.comparing?.(0);
      const found = await inWorker(workbook, reading);
      lastSeconds = (performance.now() - started) / 1000;
      if (before === state) kept = found;
      return found;
    },
    forget() {
      state++;
      kept = null;
    },
  };
}

function inWorker(workbook: Workbook, { signal, comparing }: AuditReading): Promise<readonly Finding[]> {
  const worker = new Worker(new URL("./auditWorker.ts", import.meta.url), { name: "audit" });
  return new Promise<readonly Finding[]>((resolve, reject) => {
    signal?.addEventListener("abort", () => reject(new DOMException("stopped", "AbortError")));
    worker.onerror = (event) => reject(new Error(event.message || "the audit could not be loaded"));
    worker.onmessage = ({ data }: MessageEvent<WorkerAnswer>) => {
      if ("findings" in data) resolve(data.findings);
      else if ("failure" in data) reject(new Error(data.failure));
      else comparing?.(data.done / data.total);
    };
    worker.postMessage(workbook);
  }).finally(() => worker.terminate());
}

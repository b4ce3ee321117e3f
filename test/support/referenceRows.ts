import { readFileSync } from "node:fs";
import { join } from "node:path";

/** One row of a reference table: exact doubles in, decimal strings out. */
export interface ReferenceRow<In = Record<string, number>, Out = Record<string, string>> {
  table: string;
  in: In;
  out: Out;
  how: string;
}

/** The rows of one table of test/reference/tables/<file>.json; of all its tables if none is named. */
export function referenceRows<In = Record<string, number>, Out = Record<string, string>>(
  file: string,
  table?: string,
): ReferenceRow<In, Out>[] {
  const path = join(process.cwd(), "test/reference/tables", `${file}.json`);
  const rows = (JSON.parse(readFileSync(path, "utf8")) as { rows: ReferenceRow<In, Out>[] }).rows.filter(
    (row) => table === undefined || row.table === table,
  );
  if (rows.length === 0) throw new Error(`${file} has no table ${table}`);
  return rows;
}

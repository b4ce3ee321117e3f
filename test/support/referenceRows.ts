import { readFileSync } from "node:fs";
import { join } from "node:path";

/** One row of a reference table: exact doubles in, decimal strings out. */
export interface ReferenceRow {
  table: string;
  in: Record<string, number>;
  out: Record<string, string>;
  how: string;
}

/** The rows of one table of test/reference/tables/<file>.json. */
export function referenceRows(file: string, table: string): ReferenceRow[] {
  const path = join(process.cwd(), "test/reference/tables", `${file}.json`);
  const rows = (JSON.parse(readFileSync(path, "utf8")) as { rows: ReferenceRow[] }).rows.filter(
    (row) => row.table === table,
  );
  if (rows.length === 0) throw new Error(`${file} has no table ${table}`);
  return rows;
}

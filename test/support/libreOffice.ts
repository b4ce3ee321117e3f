/** An independent spreadsheet program that recalculates workbooks, started headless. */
import { spawnSync } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import * as xlsx from "@e965/xlsx";

const usual = [
  "/usr/bin/soffice",
  "/usr/bin/libreoffice",
  "/Applications/LibreOffice.app/Contents/MacOS/soffice",
  "C:\\Program Files\\LibreOffice\\program\\soffice.exe",
];

/** Never undefined and never a skipped test: without the program it fails and says what to do. */
export function findSoffice(): string {
  const found = [process.env["SOFFICE_PATH"] ?? "", ...usual].find((path) => path !== "" && existsSync(path));
  if (found) return found;
  throw new Error(
    "This test recalculates a workbook with LibreOffice. Install it (for example: sudo apt-get install libreoffice-calc) or set SOFFICE_PATH.",
  );
}

export type Sheets = Record<string, (string | number | null)[][]>;

/** Writes rows into sheets (texts that start with "=" are formulas), lets LibreOffice recalculate, and reads them back. */
export function recalculate(sheets: Sheets): Record<string, (string | number | undefined)[][]> {
  const book = xlsx.utils.book_new();
  for (const [name, rows] of Object.entries(sheets)) {
    const sheet: xlsx.WorkSheet = {};
    rows.forEach((row, r) =>
      row.forEach((value, c) => {
        if (value === null) return;
        const formula = typeof value === "string" && value.startsWith("=");
        sheet[xlsx.utils.encode_cell({ r, c })] = formula
          ? { t: "n", f: value.slice(1) }
          : { t: typeof value === "number" ? "n" : "s", v: value };
      }),
    );
    const width = Math.max(1, ...rows.map((row) => row.length));
    sheet["!ref"] = `A1:${xlsx.utils.encode_cell({ r: Math.max(0, rows.length - 1), c: width - 1 })}`;
    xlsx.utils.book_append_sheet(book, sheet, name);
  }
  return read(recalculateFile(xlsx.write(book, { type: "buffer", bookType: "xlsx" })));
}

/** The bytes of a workbook after LibreOffice has opened, recalculated and saved it. */
export function recalculateFile(bytes: Uint8Array): Buffer {
  const folder = mkdtempSync(join(tmpdir(), "plinth-"));
  try {
    writeFileSync(join(folder, "book.xlsx"), bytes);
    const { status, stderr, error } = spawnSync(
      findSoffice(),
      [
        `-env:UserInstallation=file://${folder}/profile`,
        "--headless",
        "--convert-to",
        "xlsx",
        "--outdir",
        join(folder, "out"),
        join(folder, "book.xlsx"),
      ],
      { encoding: "utf8", timeout: 300_000 },
    );
    const result = join(folder, "out/book.xlsx");
    if (error || !existsSync(result)) {
      throw new Error(`LibreOffice did not recalculate the workbook: ${error?.message ?? stderr} (status ${status})`);
    }
    return readFileSync(result);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Values of every sheet as rows; an error is its code. */
export function read(bytes: Uint8Array): Record<string, (string | number | undefined)[][]> {
  const book = xlsx.read(bytes, { dense: true });
  return Object.fromEntries(
    book.SheetNames.map((name) => {
      const rows = (book.Sheets[name]!["!data"] ?? []) as (xlsx.CellObject[] | undefined)[];
      return [
        name,
        rows.map((row) => (row ?? []).map((cell) => (cell?.t === "e" ? cell.w : (cell?.v as string | number)))),
      ];
    }),
  );
}

import { readFormula } from "../../src/formula/read";
import { columnIndex } from "../../src/formula/references";
import { cellKey, type Cell, type Workbook } from "../../src/audit/workbook";

/** A workbook of one sheet from cells such as { A1: "m (kg)", B2: "=A2*2" }; formulas have no stored values. */
export function workbookOf(cells: Record<string, string | number>, sheet = "Sheet1"): Workbook {
  return { sheets: [{ name: sheet, cells: cellMap(cells) }], names: [], tables: [] };
}

export function cellMap(cells: Record<string, string | number>): Map<number, Cell> {
  const map = new Map<number, Cell>();
  for (const [name, value] of Object.entries(cells)) {
    const [, letters, digits] = /^([A-Z]+)(\d+)$/.exec(name)!;
    const key = cellKey(Number(digits) - 1, columnIndex(letters!));
    map.set(
      key,
      typeof value === "string" && value.startsWith("=") ? { formula: value.slice(1), value: null } : { value },
    );
  }
  return map;
}

/** Cells of a table from "header | header" and "value | =formula"; the row is repeated with the numbers a little changed. */
export function tableCells(headers: string, row: string, rows = 3, top = 1): Record<string, string | number> {
  const cells: Record<string, string | number> = {};
  const letter = (i: number): string => String.fromCharCode(65 + i);
  headers.split("|").forEach((header, i) => {
    if (header.trim()) cells[letter(i) + top] = header.trim();
  });
  const parts = row.split("|").map((part) => part.trim());
  for (let r = 0; r < rows; r++) {
    parts.forEach((part, i) => {
      if (part === "") return;
      const at = letter(i) + (top + 1 + r);
      if (part.startsWith("=")) cells[at] = moved(part, r);
      else if (Number.isNaN(Number(part))) cells[at] = part;
      else
        cells[at] =
          Number.isInteger(Number(part)) && Number(part) < 20 && Number(part) > 1
            ? Number(part)
            : Number((Number(part) * (1 + 0.13 * r)).toPrecision(6));
    });
  }
  return cells;
}

/** A formula written for the first row of a table, as it is in a later one. */
function moved(formula: string, rows: number): string {
  if (readFormula(formula).problems.length > 0) throw new Error(`cannot read ${formula}`);
  return formula.replace(
    /(\$?[A-Z]{1,2})(\$?)(\d+)(?![\d(])/g,
    (_, column: string, fixed: string, digits: string) => column + fixed + (fixed ? digits : Number(digits) + rows),
  );
}

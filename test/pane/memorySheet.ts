/** Cells in memory, as much of a sheet as explaining one takes. */
import { cellName } from "../../src/formula/references";
import type { Area, CellValue, Selected, Sheet } from "../../src/pane/sheet";

export type Cells = Record<string, CellValue>;

export function memorySheet(cells: Cells, names: { name: string; formula: string }[] = []): Sheet {
  const read = async (areas: readonly Area[]) =>
    areas.map(({ top, left, bottom, right }) =>
      Array.from({ length: bottom - top + 1 }, (_, r) =>
        Array.from({ length: right - left + 1 }, (__, c) => ({ value: cells[cellName(top + r, left + c)] ?? null })),
      ),
    );
  return { read, names: async () => ({ names, tables: [] }) } as unknown as Sheet;
}

/** A selected cell in row 10, column K of the sheet "Sheet", `down` rows into the formula's spill. */
export function selecting(formula: string, value: CellValue = null, down = 0): Selected {
  const home = { sheet: "Sheet", row: 9, column: 10 };
  const cell = { ...home, row: home.row + down };
  return {
    area: { sheet: "Sheet", top: cell.row, left: cell.column, bottom: cell.row, right: cell.column },
    cell,
    home,
    content: { formula, value },
  };
}

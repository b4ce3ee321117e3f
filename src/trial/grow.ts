/** Gives the sheet more rows and columns when a function's result would run over its edge. */
import type { WorkbookModel } from "./grid";

export interface Origin {
  sheetId: string;
  col: number;
  row: number;
}

const wanted = new Map<string, { at: Origin; rows: number; columns: number }>();
let grow = (): void => {};

/** A few more than needed, so that the sheet does not end where the result does. */
const margin = 20;

export function growWith(model: () => WorkbookModel | undefined): void {
  grow = () => {
    const requests = [...wanted.values()];
    wanted.clear();
    for (const { at, rows, columns } of requests) {
      const current = model();
      if (!current || !current.getters.tryGetSheet(at.sheetId)) continue;
      if (current.getters.getEvaluatedCell(at).value !== "#SPILL!") continue;
      addLines(current, at.sheetId, "ROW", current.getters.getNumberRows(at.sheetId), at.row + rows);
      addLines(current, at.sheetId, "COL", current.getters.getNumberCols(at.sheetId), at.col + columns);
    }
  };
}

/** Noted while formulas are evaluated; the sheet grows once they are. */
export function noteSize(at: Origin | undefined, rows: number, columns: number): void {
  if (!at || (rows === 1 && columns === 1)) return;
  if (wanted.size === 0) setTimeout(() => grow());
  wanted.set(`${at.sheetId}!${at.row}!${at.col}`, { at, rows, columns });
}

function addLines(model: WorkbookModel, sheetId: string, dimension: "ROW" | "COL", has: number, needs: number): void {
  if (needs <= has) return;
  const quantity = needs - has + margin;
  model.dispatch("ADD_COLUMNS_ROWS", {
    sheetId,
    sheetName: model.getters.getSheetName(sheetId),
    dimension,
    base: has - 1,
    quantity,
    position: "after",
  });
}

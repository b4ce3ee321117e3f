/** The tables of the open workbook; their names come from the file, since the library has none. */
import type { Table } from "../audit/workbook";
import type { Book } from "./book";
import type { WorkbookModel } from "./grid";

export function readTables(model: WorkbookModel, book: Book | undefined): Table[] {
  const { getters } = model;
  let unnamed = 0;
  return getters.getSheetIds().flatMap((sheetId) =>
    getters.getCoreTables(sheetId).map(({ range, config }) => {
      const { top, left, bottom, right } = range.zone;
      const known = book?.tables.find((each) => each.sheet === sheetId && each.top === top && each.left === left);
      const columns = Array.from({ length: right - left + 1 }, (_, i) => {
        const header = getters.getEvaluatedCell({ sheetId, row: top, col: left + i });
        return config.numberOfHeaders > 0 ? String(header.value ?? "") : `Column${i + 1}`;
      });
      return {
        name: known?.name ?? `Table${++unnamed}`,
        sheet: getters.getSheetName(sheetId),
        columns,
        top,
        left,
        bottom,
        right,
        headerRows: config.numberOfHeaders,
        totalsRows: config.totalRow ? 1 : 0,
      };
    }),
  );
}

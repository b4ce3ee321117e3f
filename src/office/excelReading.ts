/** Reading cells, names and tables of an Excel workbook in batches that stay within the platform's limits. */
import { cellKey, type DefinedName, type Table, type Workbook } from "../audit/workbook";
import { type Area, type CellValue, type Reading, type SheetCell, throwIfStopped } from "../pane/sheet";

/** Cells in one request; formulas, values and formats of these stay far below 5 MB. */
export const CELLS_PER_BATCH = 20_000;

type ReadCell = SheetCell & { readonly format?: string };

/** A range's cells after a sync, as rows. */
export function cellsOf(range: Excel.Range, withFormats = false): ReadCell[][] {
  const { formulas, values, valueTypes } = range;
  return values.map((row, r) =>
    row.map((raw, c) => {
      const text: unknown = formulas[r]![c];
      const formula = typeof text === "string" && text.startsWith("=") ? text.slice(1) : undefined;
      return {
        value: valueOf(raw, valueTypes[r]![c]!),
        ...(formula !== undefined && { formula }),
        ...(withFormats && { format: String(range.numberFormat[r]![c]) }),
      };
    }),
  );
}

function valueOf(raw: unknown, type: string): CellValue {
  if (type === "Error") return { error: String(raw) };
  if (type === "Empty") return null;
  return raw as CellValue;
}

export async function readAreas(areas: readonly Area[]): Promise<SheetCell[][][]> {
  return Excel.run(async (context) => {
    const blocks: SheetCell[][][] = [];
    for (const area of areas) {
      const rows: SheetCell[][] = [];
      for (const part of parts(area)) {
        const range = rangeOf(context, part).load("formulas,values,valueTypes");
        await context.sync();
        rows.push(...cellsOf(range));
      }
      blocks.push(rows);
    }
    return blocks;
  });
}

export const rangeOf = (context: Excel.RequestContext, { sheet, top, left, bottom, right }: Area): Excel.Range =>
  context.workbook.worksheets.getItem(sheet).getRangeByIndexes(top, left, bottom - top + 1, right - left + 1);

/** An area in strips of whole rows, each small enough for one request. */
function* parts(area: Area): Generator<Area> {
  const rows = Math.max(1, Math.floor(CELLS_PER_BATCH / (area.right - area.left + 1)));
  for (let top = area.top; top <= area.bottom; top += rows) {
    yield { ...area, top, bottom: Math.min(top + rows - 1, area.bottom) };
  }
}

/** Everything in the workbook. */
export async function readWorkbook({ progress, signal }: Reading): Promise<Workbook> {
  return Excel.run(async (context) => {
    const used = await usedAreas(context);
    const total = used.reduce((sum, { area }) => sum + (area ? sizeOf(area) : 0), 0);
    let done = 0;
    const sheets: Workbook["sheets"][number][] = [];
    for (const { name, area } of used) {
      const cells = new Map<number, ReadCell>();
      for (const part of area ? parts(area) : []) {
        throwIfStopped(signal);
        const range = rangeOf(context, part).load("formulas,values,valueTypes,numberFormat");
        await context.sync();
        cellsOf(range, true).forEach((row, r) =>
          row.forEach((cell, c) => {
            if (cell.value !== null || cell.formula !== undefined)
              cells.set(cellKey(part.top + r, part.left + c), cell);
          }),
        );
        done += sizeOf(part);
        progress?.(done / total);
      }
      sheets.push({ name, cells });
    }
    throwIfStopped(signal);
    return { sheets, ...(await namesAndTables(context)) };
  });
}

async function usedAreas(context: Excel.RequestContext): Promise<{ name: string; area: Area | null }[]> {
  const worksheets = context.workbook.worksheets.load("items/name");
  await context.sync();
  const ranges = worksheets.items.map((sheet) =>
    sheet.getUsedRangeOrNullObject(true).load("rowIndex,columnIndex,rowCount,columnCount"),
  );
  await context.sync();
  return worksheets.items.map(({ name }, i) => ({
    name,
    area: ranges[i]!.isNullObject ? null : areaOf(name, ranges[i]!),
  }));
}

export function areaOf(sheet: string, range: Excel.Range): Area {
  const { rowIndex, columnIndex, rowCount, columnCount } = range;
  return {
    sheet,
    top: rowIndex,
    left: columnIndex,
    bottom: rowIndex + rowCount - 1,
    right: columnIndex + columnCount - 1,
  };
}

const sizeOf = ({ top, left, bottom, right }: Area): number => (bottom - top + 1) * (right - left + 1);

export async function namesAndTables(
  context: Excel.RequestContext,
): Promise<{ names: readonly DefinedName[]; tables: readonly Table[] }> {
  const { workbook } = context;
  const global = workbook.names.load("items/name,items/formula");
  const worksheets = workbook.worksheets.load("items/name");
  const tables = workbook.tables.load("items/name,items/showHeaders,items/showTotals,items/worksheet/name");
  await context.sync();
  const local = worksheets.items.map((sheet) => sheet.names.load("items/name,items/formula"));
  const places = tables.items.map((table) => table.getRange().load("rowIndex,columnIndex,rowCount,columnCount"));
  const columns = tables.items.map((table) => table.columns.load("items/name"));
  await context.sync();
  const named = ({ name, formula }: Excel.NamedItem): DefinedName => ({
    name,
    formula: String(formula).replace(/^=/, ""),
  });
  return {
    names: [
      ...global.items.map(named),
      ...local.flatMap(({ items }, i) => items.map((item) => ({ ...named(item), sheet: worksheets.items[i]!.name }))),
    ],
    tables: tables.items.map((table, i) => ({
      name: table.name,
      ...areaOf(table.worksheet.name, places[i]!),
      columns: columns[i]!.items.map(({ name }) => name),
      headerRows: table.showHeaders ? 1 : 0,
      totalsRows: table.showTotals ? 1 : 0,
    })),
  };
}

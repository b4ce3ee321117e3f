/** The open Excel workbook as the pane sees it. */
import type { Area, Place, Replacement, Selected, Sheet, Stop, Theme } from "../pane/sheet";
import { keepExcelNotes, readExcelNotes } from "./excelNotes";
import { areaOf, cellsOf, namesAndTables, rangeOf, readAreas, readWorkbook } from "./excelReading";

const LONGEST_SHEET_NAME = 31;
const ROWS_PER_WRITE = 2000;

export function createExcelSheet(): Sheet {
  return {
    locale: Office.context.contentLanguage || navigator.language,
    theme: currentTheme,
    selected,
    read: readAreas,
    names: () => Excel.run(namesAndTables),
    workbook: readWorkbook,
    select: (area) =>
      Excel.run(async (context) => {
        context.workbook.worksheets.getItem(area.sheet).activate();
        rangeOf(context, area).select();
        await context.sync();
      }),
    write: (place, formula) =>
      Excel.run(async (context) => {
        rangeOf(context, areaAt(place)).formulas = [[formula]];
        await context.sync();
      }),
    addSheet,
    copySheet,
    notes: readExcelNotes,
    keepNotes: keepExcelNotes,
    onSelect: (listener) =>
      listen(listener, ({ workbook }, handler) => [
        workbook.onSelectionChanged.add(handler),
        workbook.worksheets.onActivated.add(handler),
      ]),
    onChange: (listener) =>
      listen(listener, ({ workbook: { worksheets } }, handler) => [
        worksheets.onChanged.add(handler),
        worksheets.onCalculated.add(handler),
      ]),
    onOpen: () => () => {}, // each workbook has a pane of its own
    onTheme(listener) {
      const queries = [matchMedia("(prefers-color-scheme: dark)"), matchMedia("(forced-colors: active)")];
      queries.forEach((query) => query.addEventListener("change", listener));
      return () => queries.forEach((query) => query.removeEventListener("change", listener));
    },
  };
}

async function selected(): Promise<Selected> {
  return Excel.run(async (context) => {
    const cell = context.workbook.getActiveCell();
    cell.load("formulas,values,valueTypes,rowIndex,columnIndex,rowCount,columnCount,worksheet/name");
    const parent = spills() ? cell.getSpillParentOrNullObject().load("rowIndex,columnIndex") : undefined;
    await context.sync();
    const sheet = cell.worksheet.name;
    const place: Place = { sheet, row: cell.rowIndex, column: cell.columnIndex };
    const home = parent && !parent.isNullObject ? { sheet, row: parent.rowIndex, column: parent.columnIndex } : place;
    const content = { ...cellsOf(cell)[0]![0]! };
    if (home !== place) {
      const spilling = rangeOf(context, areaAt(home)).load("formulas,values,valueTypes");
      await context.sync();
      const { formula } = cellsOf(spilling)[0]![0]!;
      if (formula !== undefined) Object.assign(content, { formula });
    }
    return { area: await selectedArea(context, cell), cell: place, content, home };
  });
}

/** The selected range; of several, which Excel refuses to give as one, the active cell. */
async function selectedArea(context: Excel.RequestContext, cell: Excel.Range): Promise<Area> {
  const range = context.workbook.getSelectedRange().load("rowIndex,columnIndex,rowCount,columnCount,worksheet/name");
  try {
    await context.sync();
    return areaOf(range.worksheet.name, range);
  } catch {
    return areaOf(cell.worksheet.name, cell);
  }
}

const spills = (): boolean => Office.context.requirements.isSetSupported("ExcelApi", "1.12");

const areaAt = ({ sheet, row, column }: Place): Area => ({
  sheet,
  top: row,
  left: column,
  bottom: row,
  right: column,
});

async function addSheet(name: string, rows: readonly (readonly (string | number | null)[])[]): Promise<string> {
  return Excel.run(async (context) => {
    const free = await freeName(context, name);
    const sheet = context.workbook.worksheets.add(free);
    const width = Math.max(1, ...rows.map((row) => row.length));
    for (let top = 0; top < rows.length; top += ROWS_PER_WRITE) {
      const block = rows.slice(top, top + ROWS_PER_WRITE);
      sheet.getRangeByIndexes(top, 0, block.length, width).values = block.map((row) =>
        Array.from({ length: width }, (_, i) => asContent(row[i] ?? null)),
      );
      await context.sync();
    }
    await context.sync();
    return free;
  });
}

/** Text stays text: what would read as a formula, a number or a date gets the mark that Excel knows for that. */
const asContent = (cell: string | number | null): string | number =>
  typeof cell === "string" && cell !== "" ? `'${cell}` : (cell ?? "");

async function copySheet(sheet: string, name: string, replacements: readonly Replacement[]): Promise<string> {
  const copied = await Excel.run(async (context) => {
    const free = await freeName(context, name);
    const original = context.workbook.worksheets.getItem(sheet);
    const copy = original.copy("After", original);
    copy.name = free;
    for (const { row, column, formula } of replacements) copy.getCell(row, column).formulas = [[formula]];
    await context.sync();
    return free;
  });
  if (replacements.length > 0) {
    await addSheet(`${copied.slice(0, 24)} notes`, [
      ["Row", "Column", "Formula", "Note"],
      ...replacements.map(({ row, column, formula, note }) => [row + 1, column + 1, formula, note]),
    ]);
  }
  return copied;
}

async function freeName(context: Excel.RequestContext, wanted: string): Promise<string> {
  const worksheets = context.workbook.worksheets.load("items/name");
  await context.sync();
  const taken = new Set(worksheets.items.map((sheet) => sheet.name.toLowerCase()));
  for (let i = 1; ; i++) {
    const end = i === 1 ? "" : ` (${i})`;
    const name = wanted.slice(0, LONGEST_SHEET_NAME - end.length) + end;
    if (!taken.has(name.toLowerCase())) return name;
  }
}

type Added = OfficeExtension.EventHandlerResult<unknown>;
type Handler = () => Promise<void>;

/** Listens to several events of the workbook; a burst of them counts once. */
function listen(listener: () => void, add: (context: Excel.RequestContext, handler: Handler) => Added[]): Stop {
  let waiting = false;
  const handler: Handler = async () => {
    if (waiting) return;
    waiting = true;
    setTimeout(() => {
      waiting = false;
      listener();
    });
  };
  const added = Excel.run(async (context) => {
    const results = add(context, handler);
    await context.sync();
    return results;
  });
  return () =>
    void added.then((results) =>
      Excel.run(results[0]!.context as Excel.RequestContext, async (context) => {
        results.forEach((result) => result.remove());
        await context.sync();
      }),
    );
}

function currentTheme(): Theme {
  if (matchMedia("(forced-colors: active)").matches) return "contrast";
  const background = Office.context.officeTheme?.bodyBackgroundColor;
  if (background) return isDark(background) ? "dark" : "light";
  return matchMedia("(prefers-color-scheme: dark)").matches ? "dark" : "light";
}

/** Whether "#rrggbb" is nearer to black than to white. */
export function isDark(colour: string): boolean {
  const [, r = "ff", g = "ff", b = "ff"] = /^#?(..)(..)(..)/.exec(colour) ?? [];
  return 0.2126 * parseInt(r, 16) + 0.7152 * parseInt(g, 16) + 0.0722 * parseInt(b, 16) < 128;
}

/** The trial sheet as the pane sees it. */
import { isCoreCommand } from "@odoo/o-spreadsheet";
import type { DefinedName, Workbook } from "../audit/workbook";
import { cellKey } from "../audit/workbook";
import type { Area, CellValue, Place, Selected, Sheet, SheetCell, Theme } from "../pane/sheet";
import { throwIfStopped } from "../pane/sheet";
import type { Files } from "./files";
import type { Grid, WorkbookModel } from "./grid";
import { readTables } from "./tables";
import { asText } from "./texts";
import { errorOf } from "./values";

const batch = 4000;
const nextTask = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

export function createSheet(grid: Grid, files: Files): Sheet {
  const getters = () => grid.model().getters;
  const idOf = (name: string): string => {
    const id = getters().getSheetIdByName(name);
    if (id === undefined) throw new Error(`there is no sheet “${name}”`);
    return id;
  };
  const nameOf = (sheetId: string): string => getters().getSheetName(sheetId);

  function cellAt(sheetId: string, row: number, col: number): SheetCell & { format?: string } {
    const position = { sheetId, row, col };
    const evaluated = getters().getEvaluatedCell(position);
    const error = errorOf(evaluated);
    const value: CellValue = error
      ? { error: error.code, ...(error.message && { message: error.message }) }
      : evaluated.value === "" && !getters().getCell(position)
        ? null
        : (evaluated.value ?? null);
    const formula = getters().getCell(position)?.isFormula
      ? getters().getCellText(position, { showFormula: true }).replace(/^=/, "")
      : undefined;
    return {
      value,
      ...(formula !== undefined && { formula }),
      ...(evaluated.format && { format: evaluated.format }),
    };
  }

  function run(type: string, payload: object): void {
    const dispatch = grid.model().dispatch as unknown as (type: string, payload: object) => { isSuccessful: boolean };
    if (!dispatch(type, payload).isSuccessful) throw new Error("the sheet does not allow this change");
  }

  function freeName(wanted: string): string {
    const taken = new Set(
      getters()
        .getSheetIds()
        .map((id) => nameOf(id).toLowerCase()),
    );
    for (let i = 1; ; i++) {
      const name = i === 1 ? wanted : `${wanted.slice(0, 26)} (${i})`;
      if (!taken.has(name.toLowerCase())) return name;
    }
  }

  async function addSheet(name: string, rows: readonly (readonly (string | number | null)[])[]): Promise<string> {
    const free = freeName(name);
    const sheetId = grid.model().uuidGenerator.smallUuid();
    run("CREATE_SHEET", {
      sheetId,
      name: free,
      position: getters().getSheetIds().length,
      rows: Math.max(100, rows.length + 20),
    });
    rows.forEach((cells, row) =>
      cells.forEach((cell, col) => {
        const content = typeof cell === "string" ? asText(cell) : String(cell ?? "");
        if (content !== "") run("UPDATE_CELL", { sheetId, row, col, content });
      }),
    );
    return free;
  }

  return {
    locale: navigator.language,
    theme: currentTheme,
    async selected(): Promise<Selected> {
      const { sheetId, col, row } = getters().getActivePosition();
      const zone = getters().getSelectedZone();
      const home = getters().getArrayFormulaSpreadingOn({ sheetId, col, row }) ?? { sheetId, col, row };
      const sheet = nameOf(sheetId);
      const { formula } = cellAt(home.sheetId, home.row, home.col); // of a spilled cell, the formula that fills it
      return {
        area: { sheet, ...pick(zone) },
        cell: { sheet, row, column: col },
        content: { ...cellAt(sheetId, row, col), ...(formula !== undefined && { formula }) },
        home: { sheet: nameOf(home.sheetId), row: home.row, column: home.col },
      };
    },
    async read(areas) {
      return areas.map(({ sheet, top, left, bottom, right }) => {
        const sheetId = idOf(sheet);
        const lastRow = Math.min(bottom, getters().getNumberRows(sheetId) - 1);
        const lastColumn = Math.min(right, getters().getNumberCols(sheetId) - 1);
        const rows: SheetCell[][] = [];
        for (let row = top; row <= lastRow; row++) {
          const cells: SheetCell[] = [];
          for (let column = left; column <= lastColumn; column++) cells.push(cellAt(sheetId, row, column));
          rows.push(cells);
        }
        return rows;
      });
    },
    async names() {
      return { names: namesOf(grid, files), tables: readTables(grid.model(), files.source()?.book) };
    },
    async workbook({ progress, signal }): Promise<Workbook> {
      const sheetIds = getters().getSheetIds();
      const places = sheetIds.map((id) => [...getters().getEvaluatedCellsPositions(id)]);
      const all = places.reduce((sum, each) => sum + each.length, 0);
      let done = 0;
      const sheets: Workbook["sheets"][number][] = [];
      for (const [i, sheetId] of sheetIds.entries()) {
        const cells = new Map<number, SheetCell>();
        for (const { row, col } of places[i]!) {
          const cell = cellAt(sheetId, row, col);
          if (cell.value !== null || cell.formula !== undefined) cells.set(cellKey(row, col), cell);
          if (++done % batch > 0) continue;
          progress?.(done / all);
          await nextTask();
          throwIfStopped(signal);
        }
        sheets.push({ name: nameOf(sheetId), cells });
      }
      throwIfStopped(signal);
      progress?.(1);
      return { sheets, names: namesOf(grid, files), tables: readTables(grid.model(), files.source()?.book) };
    },
    async select({ sheet, top, left, bottom, right }: Area) {
      const sheetIdTo = idOf(sheet);
      const sheetIdFrom = getters().getActiveSheetId();
      if (sheetIdTo !== sheetIdFrom) run("ACTIVATE_SHEET", { sheetIdFrom, sheetIdTo });
      grid.model().selection.selectZone({ cell: { col: left, row: top }, zone: { top, left, bottom, right } });
    },
    async write({ sheet, row, column }: Place, formula) {
      run("UPDATE_CELL", { sheetId: idOf(sheet), row, col: column, content: formula });
    },
    addSheet,
    async copySheet(sheet, name, replacements) {
      const sheetIdTo = grid.model().uuidGenerator.smallUuid();
      const free = freeName(name);
      run("DUPLICATE_SHEET", { sheetId: idOf(sheet), sheetIdTo, sheetNameTo: free });
      for (const { row, column, formula } of replacements)
        run("UPDATE_CELL", { sheetId: sheetIdTo, row, col: column, content: formula });
      // The library has no cell notes, so the notes stand on a sheet of their own.
      const rows = replacements.map(({ row, column, formula, note }) => [
        `${free}!${getters().zoneToXC(sheetIdTo, { top: row, bottom: row, left: column, right: column })}`,
        formula,
        note,
      ]);
      if (rows.length > 0) await addSheet(`${free.slice(0, 24)} notes`, [["Cell", "Formula", "Note"], ...rows]);
      return free;
    },
    notes: async () => files.notes(),
    keepNotes: async (text) => files.keepNotes(text),
    onSelect(listener) {
      return grid.follow((model) => {
        const owner = {};
        const soon = once(listener);
        model.selection.observe(owner, { handleEvent: soon });
        onCommand(model, owner, ({ type }) => type === "ACTIVATE_SHEET" && soon());
        return () => {
          model.selection.unobserve(owner);
          model.off("command-dispatched", owner);
        };
      });
    },
    onChange(listener) {
      let first = true;
      return grid.follow((model) => {
        const owner = {};
        const soon = once(listener);
        onCommand(model, owner, (command) => {
          if (isCoreCommand(command) || ["UNDO", "REDO", "EVALUATE_CELLS"].includes(command.type)) soon();
        });
        if (!first) soon();
        first = false;
        return () => model.off("command-dispatched", owner);
      });
    },
    onOpen(listener) {
      let first = true;
      return grid.follow(() => {
        if (!first) listener();
        first = false;
        return () => {};
      });
    },
    onTheme(listener) {
      const queries = [dark, contrast];
      queries.forEach((query) => query.addEventListener("change", listener));
      return () => queries.forEach((query) => query.removeEventListener("change", listener));
    },
  };
}

type Command = Parameters<typeof isCoreCommand>[0];

function onCommand(model: WorkbookModel, owner: object, listener: (command: Command) => unknown): void {
  model.on("command-dispatched", owner, listener as (event: object) => void);
}

const dark = matchMedia("(prefers-color-scheme: dark)");
const contrast = matchMedia("(forced-colors: active)");
const currentTheme = (): Theme => (contrast.matches ? "contrast" : dark.matches ? "dark" : "light");

/** Calls that come in one burst become one, after the sheet has settled. */
function once(listener: () => void): () => void {
  let waiting = false;
  return () => {
    if (waiting) return;
    waiting = true;
    setTimeout(() => {
      waiting = false;
      listener();
    });
  };
}

const pick = ({ top, left, bottom, right }: Omit<Area, "sheet">): Omit<Area, "sheet"> => ({ top, left, bottom, right });

/** Names of the sheet itself, and those from the file that were filled into formulas. */
function namesOf(grid: Grid, files: Files): DefinedName[] {
  const { getters } = grid.model();
  const own = getters.getNamedRanges().map(({ name, range }) => ({ name, formula: getters.getRangeString(range, "") }));
  const source = files.source();
  const others = (source?.otherNames ?? [])
    .filter(({ name }) => !name.startsWith("_xlnm."))
    .map(({ name, refersTo, localTo }) => {
      const sheet = localTo === undefined ? undefined : source!.book.sheets[localTo]?.name;
      return { name, formula: refersTo, ...(sheet !== undefined && { sheet }) };
    });
  return [...own, ...others];
}

/**
 * A stand-in for Excel's script interface over a few cells, for the adapter's tests and the pane's page. It keeps the
 * interface's discipline: a property that was not loaded and synchronised throws, as in Excel. It calculates nothing.
 * Self-contained, since a browser gets it as text.
 */
export interface FakeCell {
  formula?: string;
  value: string | number | boolean;
  /** Excel's value type where the value does not tell */
  type?: "Error";
  format?: string;
}

export interface FakeBook {
  sheets: { name: string; cells: Record<string, FakeCell> }[];
  names?: { name: string; formula: string }[];
  tables?: {
    name: string;
    sheet: string;
    area: [number, number, number, number];
    columns: string[];
    totals?: boolean;
  }[];
  selected?: { sheet: string; area: [top: number, left: number, rows: number, columns: number] };
  /** spilled cells: address of the cell → address of the formula */
  spills?: Record<string, string>;
  theme?: string;
  locale?: string;
  notes?: string;
}

export interface FakeExcel {
  book: FakeBook;
  /** requests sent, each with the number of cells read */
  syncs: number[];
  select(sheet: string, top: number, left: number, rows?: number, columns?: number): void;
  selected(): { sheet: string; area: [top: number, left: number, rows: number, columns: number] };
  fire(event: "selection" | "change"): void;
}

export function installFakeExcel(book: FakeBook): FakeExcel {
  const syncs: number[] = [];
  const listeners: Record<string, ((event: unknown) => Promise<void>)[]> = { selection: [], change: [] };
  let pending: (() => number)[] = [];
  let refused = false;
  let selection = book.selected ?? {
    sheet: book.sheets[0]!.name,
    area: [0, 0, 1, 1] as [number, number, number, number],
  };

  const letters = (column: number): string =>
    column < 26 ? String.fromCharCode(65 + column) : letters(Math.floor(column / 26) - 1) + letters(column % 26);
  const address = (row: number, column: number): string => letters(column) + String(row + 1);
  const position = (text: string): [row: number, column: number] => {
    const [, word = "A", digits = "1"] = /^([A-Z]+)(\d+)$/.exec(text)!;
    let column = 0;
    for (const letter of word) column = column * 26 + letter.charCodeAt(0) - 64;
    return [Number(digits) - 1, column - 1];
  };
  const sheetNamed = (name: string) => {
    const found = book.sheets.find((sheet) => sheet.name === name);
    if (!found) throw new Error(`ItemNotFound: ${name}`);
    return found;
  };

  /** An object whose named properties can be read only after load and sync. */
  const loadable = (read: Record<string, () => unknown>, rest: object, cells: () => number = () => 0) => {
    const loaded = new Map<string, unknown>();
    const object: Record<string, unknown> = {
      ...rest,
      load(names: string) {
        pending.push(() => {
          for (const each of names.split(",").map((name) => name.trim())) {
            const key = each.replace(/^items\/.*/, "items").replace(/\/.*/, "");
            if (read[key]) loaded.set(key, read[key]());
            else if (!(key in rest)) throw new Error(`InvalidArgument: no property ${key}`);
          }
          return /values|formulas/.test(names) ? cells() : 0;
        });
        return object;
      },
    };
    for (const key of Object.keys(read)) {
      Object.defineProperty(object, key, {
        configurable: true,
        get() {
          if (!loaded.has(key)) throw new Error(`PropertyNotLoaded: ${key}`);
          return loaded.get(key);
        },
      });
    }
    return object;
  };
  const nothing = () => {
    const object = { isNullObject: true, load: () => object };
    return object;
  };

  const makeRange = (sheet: string, area: [number, number, number, number]): any => {
    const [top, left, rows, columns] = area;
    const grid = <T>(of: (cell: FakeCell | undefined) => T): T[][] =>
      Array.from({ length: rows }, (_, r) =>
        Array.from({ length: columns }, (__, c) => of(sheetNamed(sheet).cells[address(top + r, left + c)])),
      );
    const range = loadable(
      {
        formulas: () => grid((cell) => (cell?.formula === undefined ? (cell?.value ?? "") : `=${cell.formula}`)),
        values: () => grid((cell) => cell?.value ?? ""),
        valueTypes: () =>
          grid((cell) => {
            if (!cell) return "Empty";
            return (
              cell.type ?? { string: "String", number: "Double", boolean: "Boolean" }[typeof cell.value as "string"]
            );
          }),
        numberFormat: () => grid((cell) => cell?.format ?? "General"),
        rowIndex: () => top,
        columnIndex: () => left,
        rowCount: () => rows,
        columnCount: () => columns,
      },
      {
        isNullObject: false,
        worksheet: { name: sheet },
        select: () => pending.push(() => ((selection = { sheet, area }), 0)),
        getSpillParentOrNullObject() {
          const parent = book.spills?.[address(top, left)];
          return parent ? makeRange(sheet, [...position(parent), 1, 1]) : nothing();
        },
      },
      () => rows * columns,
    );
    const write = (key: "formulas" | "values") => ({
      configurable: true,
      get: Object.getOwnPropertyDescriptor(range, key)!.get!,
      set(given: (string | number)[][]) {
        pending.push(() => {
          given.forEach((row, r) =>
            row.forEach((content, c) => {
              const cells = sheetNamed(sheet).cells;
              const at = address(top + r, left + c);
              const text = String(content);
              if (text === "") delete cells[at];
              else if (text.startsWith("=")) cells[at] = { formula: text.slice(1), value: 0 };
              else cells[at] = { value: typeof content === "string" ? text.replace(/^'/, "") : content };
            }),
          );
          return 0;
        });
      },
    });
    Object.defineProperty(range, "formulas", write("formulas"));
    Object.defineProperty(range, "values", write("values"));
    return range;
  };

  const makeSheet = (name: string): any => {
    const sheet = {
      get name() {
        return name;
      },
      set name(next: string) {
        const from = name;
        name = next;
        pending.push(() => ((sheetNamed(from).name = next), 0));
      },
      names: loadable({ items: () => [] }, {}),
      activate: () => pending.push(() => ((selection = { sheet: name, area: [0, 0, 1, 1] }), 0)),
      getRangeByIndexes: (top: number, left: number, rows: number, columns: number) => {
        if (rows < 1 || columns < 1) throw new Error("InvalidArgument");
        return makeRange(name, [top, left, rows, columns]);
      },
      getCell: (row: number, column: number) => makeRange(name, [row, column, 1, 1]),
      getUsedRangeOrNullObject() {
        const places = Object.keys(sheetNamed(name).cells).map(position);
        if (places.length === 0) return nothing();
        const rows = places.map(([row]) => row);
        const columns = places.map(([, column]) => column);
        const [top, left] = [Math.min(...rows), Math.min(...columns)];
        return makeRange(name, [top, left, Math.max(...rows) - top + 1, Math.max(...columns) - left + 1]);
      },
      copy() {
        const fresh = `${name} (2)`;
        const copied = makeSheet(fresh);
        pending.push(() => {
          book.sheets.push({ name: fresh, cells: structuredClone(sheetNamed(name).cells) });
          return 0;
        });
        return copied;
      },
    };
    return sheet;
  };

  const event = (name: string) => ({
    add(listener: (event: unknown) => Promise<void>) {
      listeners[name]!.push(listener);
      return {
        context,
        remove: () => void listeners[name]!.splice(listeners[name]!.indexOf(listener), 1),
      };
    },
  });

  const context: any = {
    workbook: {
      names: loadable(
        { items: () => (book.names ?? []).map((each) => ({ ...each, formula: `=${each.formula}` })) },
        {},
      ),
      tables: loadable(
        {
          items: () =>
            (book.tables ?? []).map((table) => ({
              name: table.name,
              showHeaders: true,
              showTotals: table.totals === true,
              worksheet: { name: table.sheet },
              getRange: () => makeRange(table.sheet, table.area),
              columns: loadable({ items: () => table.columns.map((name) => ({ name })) }, {}),
            })),
        },
        {},
      ),
      worksheets: loadable(
        { items: () => book.sheets.map(({ name }) => makeSheet(name)) },
        {
          getItem: (name: string) => (sheetNamed(name), makeSheet(name)),
          add(name: string) {
            pending.push(() => 0);
            book.sheets.push({ name, cells: {} });
            return makeSheet(name);
          },
          onActivated: event("selection"),
          onChanged: event("change"),
          onCalculated: event("change"),
        },
      ),
      onSelectionChanged: event("selection"),
      getActiveCell: () => makeRange(selection.sheet, [selection.area[0], selection.area[1], 1, 1]),
      getSelectedRange() {
        if (refused) {
          pending.push(() => {
            throw new Error("InvalidSelection");
          });
        }
        return makeRange(selection.sheet, selection.area);
      },
      customXmlParts: {
        add: (xml: string) => pending.push(() => ((book.notes = xml), 0)),
        getByNamespace: () => ({
          getOnlyItemOrNullObject: () =>
            book.notes === undefined
              ? nothing()
              : loadable(
                  { id: () => "1" },
                  {
                    isNullObject: false,
                    getXml: () => ({ value: book.notes }),
                    setXml: (xml: string) => pending.push(() => ((book.notes = xml), 0)),
                  },
                ),
        }),
      },
    },
    async sync() {
      await null;
      const jobs = pending;
      pending = [];
      syncs.push(jobs.reduce((sum, job) => sum + job(), 0));
    },
  };

  const fake: FakeExcel = {
    book,
    syncs,
    select(sheet, top, left, rows = 1, columns = 1) {
      refused = rows < 0;
      selection = { sheet, area: [top, left, Math.max(rows, 1), columns] };
      fake.fire("selection");
    },
    selected: () => selection,
    fire: (name) => listeners[name]!.forEach((listener) => void listener({})),
  };
  Object.assign(globalThis, {
    fakeExcel: fake,
    Excel: {
      run: async (first: unknown, second?: (context: unknown) => Promise<unknown>) => {
        const result = await (second ?? (first as (context: unknown) => Promise<unknown>))(context);
        await context.sync();
        return result;
      },
    },
    Office: {
      onReady: async () => ({ host: "Excel", platform: "OfficeOnline" }),
      context: {
        contentLanguage: book.locale ?? "en-US",
        officeTheme: book.theme ? { bodyBackgroundColor: book.theme } : undefined,
        requirements: { isSetSupported: () => true },
      },
    },
  });
  return fake;
}

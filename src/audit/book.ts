import { evaluate, type Surroundings } from "../formula/evaluate";
import { type Node, type ReferenceNode, walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { columnIndex } from "../formula/references";
import { failure, type Scalar, single } from "../formula/values";
import { resolver } from "./names";
import { type Cell, cellKey, columnOf, rowOf, type Sheet, type Workbook } from "./workbook";

/** A formula that many cells share: read once, at one of its cells. */
export interface Form {
  /** the formula with references written relative to the cell */
  readonly key: string;
  readonly tree: Node;
  /** where the tree was read */
  readonly row: number;
  readonly column: number;
  readonly readable: boolean;
}

export interface SheetIndex {
  readonly number: number;
  readonly name: string;
  readonly sheet: Sheet;
  readonly rows: number;
  readonly columns: number;
  /** forms of the formula cells, by cell key */
  readonly forms: ReadonlyMap<number, Form>;
}

export interface Book {
  readonly workbook: Workbook;
  readonly sheets: readonly SheetIndex[];
  /** names that point at one cell, by "sheet number:cell key" */
  readonly nameOf: ReadonlyMap<string, string>;
  sheetNumber(name: string): number;
  value(sheet: number, row: number, column: number): Scalar;
  around(sheet: number, form: Form, row: number, column: number): Surroundings;
}

/** Indexes a workbook: each distinct relative formula is read once, however many cells hold it. */
export function indexBook(workbook: Workbook): Book {
  const numbers = new Map(workbook.sheets.map((sheet, number) => [sheet.name.toLowerCase(), number]));
  const sheetNumber = (name: string): number => numbers.get(name.toLowerCase()) ?? -1;
  const names = resolver(workbook);
  const sheets = workbook.sheets.map((sheet, number) => indexSheet(sheet, number, names.resolve));
  const computed = new Map<string, Scalar>();
  let depth = 0;

  function value(sheet: number, row: number, column: number): Scalar {
    const key = cellKey(row, column);
    const cell = sheets[sheet]?.sheet.cells.get(key);
    if (!cell) return sheet < 0 ? failure("#REF!") : null;
    if (cell.formula === undefined || cell.value !== null) return cell.value;
    return compute(sheet, key);
  }

  /** Value of a formula cell for which the file holds none. A cycle or too long a chain is an error value. */
  function compute(sheet: number, key: number): Scalar {
    const place = `${sheet}:${key}`;
    const known = computed.get(place);
    if (known !== undefined) return known;
    const form = sheets[sheet]!.forms.get(key);
    if (!form || depth > 400) return failure("#VALUE!");
    computed.set(place, failure("#CYCLE!"));
    depth++;
    const result = single(evaluate(form.tree, around(sheet, form, rowOf(key), columnOf(key))));
    depth--;
    computed.set(place, result);
    return result;
  }

  function around(sheet: number, form: Form, row: number, column: number): Surroundings {
    return {
      cell: (name, r, c) => value(name === null ? sheet : sheetNumber(name), r, c),
      extent: (name) => sheets[name === null ? sheet : sheetNumber(name)] ?? { rows: 0, columns: 0 },
      row,
      column,
      shift: { rows: row - form.row, columns: column - form.column },
    };
  }

  return { workbook, sheets, nameOf: names.nameOf(sheetNumber), sheetNumber, value, around };
}

function indexSheet(
  sheet: Sheet,
  number: number,
  resolve: (tree: Node, sheet: string, row: number) => Node,
): SheetIndex {
  const byKey = new Map<string, Form>();
  const forms = new Map<number, Form>();
  let rows = 0;
  let columns = 0;
  for (const [key, cell] of sheet.cells) {
    const row = rowOf(key);
    const column = columnOf(key);
    if (row >= rows) rows = row + 1;
    if (column >= columns) columns = column + 1;
    if (cell.formula === undefined) continue;
    const relative = relativeForm(cell.formula, row, column);
    let form = byKey.get(relative);
    if (!form) {
      const { tree, problems } = readFormula(cell.formula);
      form = { key: relative, tree: resolve(tree, sheet.name, row), row, column, readable: problems.length === 0 };
      byKey.set(relative, form);
    }
    forms.set(key, form);
  }
  return { number, name: sheet.name, sheet, rows, columns, forms };
}

const reference =
  /"(?:[^"]|"")*"|'(?:[^']|'')*'|(?<![A-Za-z0-9_.$])(\$?)([A-Za-z]{1,3})(\$?)([1-9]\d{0,6})(?![A-Za-z0-9_.(![])/g;

/** The formula with its references relative to the cell, the same text for every cell that it was filled into. */
export function relativeForm(formula: string, row: number, column: number): string {
  return formula.replace(
    reference,
    (text: string, columnFixed: string, letters: string, rowFixed: string, digits: string) => {
      if (letters === undefined) return text;
      const down = Number(digits) - 1;
      const across = columnIndex(letters);
      return `R${rowFixed ? down : `[${down - row}]`}C${columnFixed ? across : `[${across - column}]`}`;
    },
  );
}

/** The single cells and ranges that a tree refers to, in reading order. */
export function referencesIn(tree: Node): ReferenceNode[] {
  const found: ReferenceNode[] = [];
  walk(tree, (node) => {
    if (node.kind === "reference") found.push(node);
  });
  return found;
}

export const cellAt = (book: Book, sheet: number, row: number, column: number): Cell | undefined =>
  book.sheets[sheet]?.sheet.cells.get(cellKey(row, column));

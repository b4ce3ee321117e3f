import { evaluate } from "../formula/evaluate";
import { type ReferenceNode, walk } from "../formula/nodes";
import { asMatrix, type Scalar } from "../formula/values";
import type { Analysis } from "./analyse";
import type { Book } from "./book";
import { labelsOf } from "./labels";
import type { Meaning } from "./meaning";
import type { Mistake } from "./quantities";
import { roles } from "./roles";
import type { Run } from "./runs";
import { cellKey, columnOf, rowOf } from "./workbook";
import { plainText } from "./words";

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;
type Nature = "amplitude" | "density" | "area" | "frequency" | "level" | "plain" | "unknown";

interface Column {
  readonly nature: Nature;
  readonly values: readonly number[];
}

const overall =
  /\b(overall|total|rms|sum|rss|gesamt\w*|summe\w*|effektiv\w*|global\w*|ensemble|efficace|somme|grms|sigma|check|resultant|combined|quadrat\w*|quadratique|area|mean square|band)\b/;
const rootMeant = /\b(rms|rss|overall|effektiv\w*|efficace|grms|sigma|gesamt\w*|global\w*|resultant|quadrat\w*)\b/;
const multiples = [1, 2, 3, 4, 5, 6];

/** Recognises sums over ranges: the overall rms value of lines, bands or a spectral density. */
export function aggregateFinding(
  book: Book,
  run: Run,
  meaning: Meaning,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
): Found | null {
  const { above, left } = labelsOf(book, run.sheet, rowOf(run.anchor), columnOf(run.anchor));
  const words = [...left, ...above, rowName(book, run)].join(" ");
  const text = `${meaning.text} ${plainText(words)}`;
  if (!overall.test(text) && !meaning.candidates.some(({ role }) => role === "grms")) return null;
  const samples = [1, 2, 3].map((turn) => sample(book, run, meaningAt, turn));
  if (samples.some((one) => one === null)) return null;
  const [first] = samples;
  const columns = first!.columns;
  if (columns.length === 0 || columns.every(({ nature }) => nature === "plain")) return null;
  const agrees = (right: (columns: readonly Column[]) => number | null, factors: readonly number[]): boolean =>
    factors.some((factor) =>
      samples.every((one) => {
        const value = right(one!.columns);
        return value !== null && Math.abs((one!.hand * factor) / value - 1) < 3e-4;
      }),
    );
  const saysMultiple = /sigma|\bpeak\b|\bmax|\bspitze|crete|\bpk\b|[2-6] ?x\b/.test(text) || !/\brms\b/.test(text);
  const scales = (saysMultiple ? multiples : [1]).flatMap((multiple) => [
    1 / multiple,
    1000 / multiple,
    1e-3 / multiple,
    Math.SQRT2 / multiple,
  ]);
  const ok: Found = { verdict: "agrees", quantity: "overall-rms", mistake: null, why: "" };
  if (rights.some((right) => agrees(right, scales))) return ok;
  const wrong = (mistake: Mistake, why: string): Found => ({
    verdict: "differs",
    quantity: "overall-rms",
    mistake,
    why,
  });
  if (!rootMeant.test(text) && !meaning.candidates.some(({ role, weight }) => role === "grms" && weight > 5))
    return null;
  for (const right of rights) {
    if (agrees((values) => square(right(values)), [1])) {
      return wrong("square-root-missing", "The sum of squares is the mean square: take its square root.");
    }
  }
  if (!saysMultiple && rights.some((right) => agrees(right, [1 / 2, 1 / 3, 1 / 4]))) {
    return wrong("amplitude-kind", "A multiple of the rms value stands under an rms label.");
  }
  const level = columns.length === 1 && columns[0]!.nature === "level";
  const levels = (inner: number, outer: number) => (all: readonly Column[]) =>
    outer * Math.log10(all[0]!.values.reduce((sum, x) => sum + 10 ** (x / inner), 0));
  if (level && (agrees(levels(20, 20), [1]) || agrees(levels(20, 10), [1]) || agrees(levels(10, 20), [1]))) {
    return wrong("decibel-factor", "Levels add as powers: 10 log10 of the sum of 10^(L/10).");
  }
  const amplitude = columns.find(({ nature }) => nature === "amplitude");
  if (amplitude && agrees((values) => total(values.find(({ nature }) => nature === "amplitude")), [1])) {
    return wrong("square-root-missing", "Rms values of lines or bands add as squares: SQRT(SUMSQ(…)), not SUM.");
  }
  if (
    amplitude &&
    agrees((values) => Math.sqrt(total(values.find(({ nature }) => nature === "amplitude")) ?? NaN), [1])
  ) {
    return wrong("ratio-not-squared", "The values must be squared before they are added.");
  }
  return null;
}

/** The text at the left end of a run's row: the name of a line of totals. */
function rowName(book: Book, run: Run): string {
  const row = rowOf(run.anchor);
  for (let column = 0; column < columnOf(run.anchor); column++) {
    const value = book.sheets[run.sheet]!.sheet.cells.get(cellKey(row, column))?.value;
    if (typeof value === "string") return value;
  }
  return "";
}

const square = (value: number | null): number | null => (value === null ? null : value * value);
const total = (column: Column | undefined): number | null =>
  column ? column.values.reduce((sum, x) => sum + x, 0) : null;

/** The right ways to an overall rms value from what the ranges hold. */
const rights: readonly ((columns: readonly Column[]) => number | null)[] = [
  (columns) => rootOf(only(columns, ["amplitude", "unknown"]), (x) => x * x),
  (columns) => rootOf(only(columns, ["area"]), (x) => x),
  (columns) => rootMean(only(columns, ["amplitude"])),
  (columns) =>
    columns.length === 1 && columns[0]!.nature === "level"
      ? 10 * Math.log10(columns[0]!.values.reduce((sum, x) => sum + 10 ** (x / 10), 0))
      : null,
  (columns) => integral(columns, (f1, f2, s1, s2) => ((s1 + s2) / 2) * (f2 - f1)),
  (columns) => integral(columns, (f1, f2, s1) => s1 * (f2 - f1)),
  (columns) => integral(columns, (f1, f2, _s1, s2) => s2 * (f2 - f1)),
  (columns) => products(columns, (density, width) => density * width),
  (columns) => products(columns, (amplitude, other) => amplitude * amplitude * other * other),
];

function only(columns: readonly Column[], natures: readonly Nature[]): Column | null {
  const distinct = columns.filter((column, i) => columns.findIndex((other) => other.values === column.values) === i);
  return distinct.length === 1 && natures.includes(distinct[0]!.nature) ? distinct[0]! : null;
}

function rootOf(column: Column | null, term: (x: number) => number): number | null {
  return column ? Math.sqrt(column.values.reduce((sum, x) => sum + term(x), 0)) : null;
}

function rootMean(column: Column | null): number | null {
  const root = rootOf(column, (x) => x * x);
  return root === null ? null : root / Math.sqrt(column!.values.length);
}

/** Root of the area under a density column over a frequency column. */
function integral(
  columns: readonly Column[],
  area: (f1: number, f2: number, s1: number, s2: number) => number,
): number | null {
  const f = longest(columns, "frequency");
  const s = longest(columns, "density");
  if (!f || !s) return null;
  const frequencies = merged(columns, "frequency");
  const densities = merged(columns, "density");
  if (frequencies.length !== densities.length) return null;
  let sum = 0;
  for (let i = 0; i + 1 < frequencies.length; i++)
    sum += area(frequencies[i]!, frequencies[i + 1]!, densities[i]!, densities[i + 1]!);
  return Math.sqrt(sum);
}

const longest = (columns: readonly Column[], nature: Nature): Column | undefined =>
  columns.find((column) => column.nature === nature);

/** The values of one kind, when ranges such as B5:B25 and B6:B26 overlap: the first range and the end of the shifted one. */
function merged(columns: readonly Column[], nature: Nature): readonly number[] {
  const own = columns.filter((column) => column.nature === nature);
  const [first, second] = own;
  if (!first) return [];
  const shifted = second && own.find((column) => column.values[0] === first.values[1]);
  const before = second && own.find((column) => column.values[1] === first.values[0]);
  if (shifted) return [...first.values, shifted.values[shifted.values.length - 1]!];
  return before ? [before.values[0]!, ...first.values] : first.values;
}

function products(columns: readonly Column[], term: (a: number, b: number) => number): number | null {
  const [a, b] = columns;
  if (!a || !b || columns.length !== 2 || a.values.length !== b.values.length) return null;
  return Math.sqrt(a.values.reduce((sum, x, i) => sum + term(x, b.values[i]!), 0));
}

/** The ranges' values, changed a little, and what the formula makes of them. */
function sample(
  book: Book,
  run: Run,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
  turn: number,
): { columns: Column[]; hand: number } | null {
  const key = run.anchor;
  const base = book.around(run.sheet, run.form, rowOf(key), columnOf(key));
  const change = (row: number, column: number): number => 1 + 0.013 * ((row * 7 + column * 3 + turn * 5) % 11) * turn;
  const around = {
    ...base,
    exact: true,
    cell: (sheet: string | null, row: number, column: number): Scalar => {
      const value = base.cell(sheet, row, column);
      return typeof value === "number" ? value * change(row, column) : value;
    },
  };
  const columns: Column[] = [];
  const nodes: ReferenceNode[] = [];
  walk(run.form.tree, (node) => {
    if (node.kind === "reference" && node.to) nodes.push(node);
  });
  for (const node of nodes) {
    if (node.from.row === null || node.from.column === null) return null;
    const values = asMatrix(evaluate(node, around)).values.filter(
      (value): value is number => typeof value === "number",
    );
    if (values.length < 2) return null;
    const sheet = node.sheet === null ? run.sheet : book.sheetNumber(node.sheet);
    const row = node.from.row + (node.from.rowFixed ? 0 : rowOf(key) - run.form.row);
    const column = node.from.column + (node.from.columnFixed ? 0 : columnOf(key) - run.form.column);
    const same = columns.find((other) => other.values.length === values.length && other.values[0] === values[0]);
    if (same) continue;
    columns.push({ nature: natureOf(book, sheet, row, column, meaningAt), values });
  }
  const hand = evaluate(run.form.tree, around);
  return typeof hand === "number" && columns.length > 0 ? { columns, hand } : null;
}

function natureOf(
  book: Book,
  sheet: number,
  row: number,
  column: number,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
): Nature {
  const meaning = meaningAt(sheet, row, column);
  const best = meaning.candidates[0];
  const form = book.sheets[sheet]?.forms.get(cellKey(row, column));
  if (form && !meaning.unit && usesDensity(book, sheet, row, column, meaningAt)) return "area";
  if (!best || best.weight < 3) {
    const dimension = meaning.unit?.dimension;
    if (dimension === "velocity" || dimension === "acceleration") return "amplitude";
    if (dimension === "density") return "density";
    return form && /\^2|area|df|flache|aire|\*/.test(meaning.text) ? "area" : "plain";
  }
  switch (roles[best.role].dimension) {
    case "velocity":
    case "acceleration":
    case "length":
      return best.role === "delta" || best.role === "thickness" ? "plain" : "amplitude";
    case "density":
      return /\*|df|area|flache|aire/.test(meaning.text) && !meaning.unit ? "area" : "density";
    case "frequency":
      return "frequency";
    case "level":
      return "level";
    case "force":
      return best.role === "F" ? "amplitude" : "plain";
    default:
      return "plain";
  }
}

/** A column computed from a density column is an area, or a contribution to the mean square. */
function usesDensity(
  book: Book,
  sheet: number,
  row: number,
  column: number,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
): boolean {
  const form = book.sheets[sheet]!.forms.get(cellKey(row, column))!;
  let found = false;
  walk(form.tree, (node) => {
    if (node.kind !== "reference" || node.to || node.from.row === null || node.from.column === null) return;
    const place = node.sheet === null ? sheet : book.sheetNumber(node.sheet);
    const r = node.from.row + (node.from.rowFixed ? 0 : row - form.row);
    const c = node.from.column + (node.from.columnFixed ? 0 : column - form.column);
    const meaning = meaningAt(place, r, c);
    const best = meaning.candidates[0];
    if (meaning.unit?.dimension === "density" || (best && best.weight >= 5 && roles[best.role].dimension === "density"))
      found = true;
  });
  return found;
}

/** Whatever a sheet holds, a function answers with finite numbers, its texts, or declared failures. */
import { readFunctionDocs } from "../../src/build/functionDocs";
import * as plinth from "../../src/functions";
import { CellFailure, PassedError } from "../../src/functions/failure";
import { NumericError } from "../../src/core/errors";
import { repeatable } from "../support/spreadDoubles";

const ROUNDS = 400;
const FEWER: Record<string, number> = { RUNUP: 25 }; // it follows every cycle of a run, up to seconds for one call
const host = { code: "#REF!" }; // an error of the host's own class
const cells: unknown[] = [
  0,
  -0,
  1,
  2,
  0.05,
  10,
  25,
  100,
  -1,
  0.5,
  5e-324,
  -5e-324,
  1e-320,
  1e-308,
  1e308,
  -1e308,
  1.7976931348623157e308,
  NaN,
  Infinity,
  -Infinity,
  "",
  " ",
  null,
  undefined,
  "text",
  "12",
  "=1+1",
  true,
  false,
  host,
  "0x10",
  "\u0000",
];
const words = [
  "viscous",
  "hysteretic",
  "si",
  "mm",
  "inch",
  "max",
  "min",
  "log",
  "linear",
  "ratio",
  "percent",
  "loss factor",
  "q",
  "log decrement",
  "acceleration peak",
  "displacement rms",
  "velocity peak-to-peak",
  "Hz",
  "rpm",
  "(m/s2)2/Hz",
  "gn2/Hz",
  "exact",
  "short",
  "deflection",
  "acceleration",
  "half-sine",
  "rectangle",
  "trapezoid",
  "absolute-transmissibility",
  "natural-frequency",
  "((((",
  "m//s",
  "toString",
];
const usual = [0.01, 0.05, 0.1, 0.5, 1, 2, 3, 5, 8, 10, 25, 50, 100];

const docs = readFunctionDocs();
type CellFunction = (...args: any[]) => any;

test("the documentation covers every function that is exported", () => {
  expect(docs.map(({ id }) => id).sort()).toEqual(Object.keys(plinth).sort());
});

test.each(docs.map((doc) => [doc.id, doc] as const))(
  "%s answers anything with numbers, texts or declared failures",
  async (id, doc) => {
    const compute = (plinth as unknown as Record<string, CellFunction>)[id];
    const random = repeatable(id.split("").reduce((sum, letter) => sum * 31 + letter.charCodeAt(0), 7));
    const pick = <Item>(items: readonly Item[]): Item => items[Math.floor(random() * items.length)];
    const number = () => (random() < 0.75 ? pick(usual) : pick(cells));
    const rows = (most: number): unknown[][] => {
      const [height, width] = [Math.floor(random() * most) + 1, random() < 0.6 ? 1 : Math.floor(random() * 3) + 1];
      return Array.from({ length: height }, () => Array.from({ length: random() < 0.95 ? width : width - 1 }, number));
    };
    const rising = () => Array.from({ length: 3 }, (_, i) => [(i + 1) * 10 + random()]);
    const argument = (giving: string): unknown => {
      const kind = random();
      if (kind < 0.04) return pick(cells);
      if (kind < 0.06) return pick([[], [[]], [[], []], [1, 2], [[1], [2, 3]]]);
      if (giving === "words" || giving === "text") return kind < 0.9 ? pick(words) : number();
      if (giving === "one") return kind < 0.9 ? [[number()]] : rows(2);
      if (giving === "table") return kind < 0.6 ? rising() : rows(5);
      return kind < 0.6 ? [[number()]] : kind < 0.8 ? number() : rows(3);
    };
    for (let round = 0; round < (FEWER[id] ?? ROUNDS); round++) {
      const args = doc.parameters.map(({ giving, repeating }) =>
        repeating ? Array.from({ length: Math.floor(random() * 5) }, () => argument(giving)) : argument(giving),
      );
      const given = args.slice(0, random() < 0.8 ? args.length : Math.floor(random() * (args.length + 1)));
      const shown = () =>
        `${id}(${JSON.stringify(given, (_key, value) => (typeof value === "number" && !Number.isFinite(value) ? String(value) : value))})`;
      try {
        requireTidy(await compute(...given), shown);
      } catch (thrown) {
        const declared =
          thrown instanceof CellFailure || thrown instanceof PassedError || thrown instanceof NumericError;
        if (!declared) throw new Error(`${shown()}: ${String(thrown)}`, { cause: thrown });
        if (!(thrown instanceof PassedError)) requireSentence(thrown.message, shown);
      }
    }
  },
);

function requireTidy(result: unknown, shown: () => string): void {
  const rows = result as unknown[][];
  if (!Array.isArray(rows) || rows.length === 0) throw new Error(`${shown()} gives no rows`);
  for (const row of rows) {
    const fits = Array.isArray(row) && row.length > 0 && row.length === rows[0].length;
    if (!fits) throw new Error(`${shown()} gives ragged rows`);
    for (const cell of row) {
      if (cell instanceof CellFailure) requireSentence(cell.message, shown);
      else if (typeof cell === "string" && !/NaN|Infinity/.test(cell)) requireSentence(cell, shown);
      else if (!Number.isFinite(cell) && cell !== host) throw new Error(`${shown()} gives ${String(cell)}`);
    }
  }
}

function requireSentence(text: string, shown: () => string): void {
  if (text === "" || /undefined|\[object/.test(text)) throw new Error(`${shown()} says "${text}"`);
}

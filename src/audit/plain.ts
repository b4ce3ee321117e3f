/** Plain formulas: what a call of our functions is in an ordinary spreadsheet without the add-in. */
import { readFormula } from "../formula/read";
import { NumericError } from "../core/errors";
import { design } from "./plain-design";
import { common, type PlainArgument, type PlainEntry, type PlainText } from "./plain-entry";
import { at, isRange, type Placed } from "./plain-place";
import { response } from "./plain-response";
import { bracketed, substitute } from "./plain-substitute";
import { systems } from "./plain-systems";
import { fromSI, toSI, type UnitSystemWord, UnlikeUnits } from "./plain-units";

export type Plain = { readonly formula: string } | { readonly none: string };

const entries: Readonly<Record<string, PlainEntry>> = { ...response, ...design, ...systems };

/** Functions without a closed form, and what they do instead. */
const open: Readonly<Record<string, string>> = {
  WHY: "it writes a sentence",
  CHECK: "it compares with the catalogue of known mistakes",
  PSDRMS: "it integrates the profile piece by piece",
  RANDRMS: "it integrates over the profile",
  BANDTRANS: "it integrates over the band",
  PULSE: "it looks for the largest value over all time",
  SRS: "it follows the record in time",
  HISTORY: "it follows the record in time",
  RUNUP: "it follows the run-up in time",
  RIGIDMODES: "it solves an eigenvalue problem",
};

const longest = 8192; // a spreadsheet's own limit for a formula

/** What a function's plain formula is made of. */
export const plainEntry = (id: string): PlainEntry | undefined =>
  Object.hasOwn(entries, id) ? entries[id] : undefined;

/** Functions that have a plain formula. */
export const plainFunctions: readonly string[] = Object.keys(entries);

/**
 * The ordinary spreadsheet formula for a call of one of our functions, without "=".
 * It gives the function's value wherever the function has one; it does not refuse a negative damping ratio or a blank cell.
 *
 * @param id             name of the function, such as ABSTRANS
 * @param argumentTexts  its arguments as they stand in the formula; null where one is left out
 * @param place          for one cell of a spilled result: its row and column there, from 0, so that each range of an
 *                       argument gives that place's own cell. Left out: ranges stay as they are, as in an array formula.
 * @returns              the formula, or why there is none
 */
export function plainFormula(id: string, argumentTexts: readonly (string | null)[], place?: Placed): Plain {
  const entry = Object.hasOwn(entries, id) ? entries[id]! : undefined;
  if (!entry) return none(Object.hasOwn(open, id) ? `${id} has no closed form: ${open[id]}` : `${id} is not known`);
  try {
    return { formula: write(entry, argumentTexts, place) };
  } catch (thrown) {
    if (thrown instanceof NoPlainFormula) return none(`${id}: ${thrown.message}`);
    if (thrown instanceof UnlikeUnits || thrown instanceof NumericError) return none(`${id}: ${thrown.message}`);
    throw thrown;
  }
}

class NoPlainFormula extends Error {}

const none = (reason: string): Plain => ({ none: reason });

function write(entry: PlainEntry, texts: readonly (string | null)[], place: Placed | undefined): string {
  if (texts.length > entry.arguments.length) throw new NoPlainFormula("it has too many arguments");
  if (entry.fills && !place) throw new NoPlainFormula("it fills several cells, each with a plain formula of its own");
  const numbers: Record<string, string> = entry.fills ? { place: String(place!.row) } : {};
  const words: Record<string, string> = {};
  const given = new Set<string>();
  const open: { argument: PlainArgument; text: string }[] = []; // words that stand in a cell
  entry.arguments.forEach((argument, i) => {
    const text = texts[i]?.trim() || null;
    if (text !== null) given.add(argument.name);
    if (argument.unit) words[argument.name] = unitOf(argument, text);
    else if (argument.words) {
      const word = wordOf(argument, text);
      if (word === null) open.push({ argument, text: text! });
      else words[argument.name] = word;
    } else numberOf(entry, argument, text, place, numbers);
  });
  const formula = choose(open, words, (chosen) => fill(entry.text(chosen, given, place?.row ?? 0), numbers, chosen));
  if (formula.length >= longest) throw new NoPlainFormula("the plain formula would be too long for a cell");
  return formula;
}

function numberOf(
  entry: PlainEntry,
  argument: PlainArgument,
  text: string | null,
  place: Placed | undefined,
  numbers: Record<string, string>,
): void {
  const value = text ?? argument.fallback;
  if (value === undefined) throw new NoPlainFormula(`${argument.says} is missing`);
  if (readFormula(value).problems.length > 0) throw new NoPlainFormula(`${argument.says} cannot be read`);
  const here = place && (!argument.table || argument.table.each) ? at(value, place) : value;
  if (here === null) throw new NoPlainFormula(`${argument.says} is no range of cells or numbers`);
  if (entry.oneAtATime && !place && !argument.table && isRange(value)) {
    throw new NoPlainFormula(`${argument.says} is a range: each place needs a formula of its own`);
  }
  // an argument that may be left out is left out where its cell is blank
  const blank = text !== null && argument.fallback === "1" && readFormula(here).tree.kind === "reference";
  const used = blank ? `IF(${here}="",${argument.fallback},${here})` : here;
  numbers[argument.name] = argument.table ? value : used;
  if (argument.table?.each) numbers[argument.table.each] = here;
}

function unitOf(argument: PlainArgument, text: string | null): string {
  const tree = text === null ? null : readFormula(text).tree;
  if (tree?.kind !== "text")
    throw new NoPlainFormula(`the unit "${argument.says}" is not written in the formula itself`);
  return tree.value;
}

/** The word that a text names; null where it stands in a cell. */
function wordOf({ says, words, fallback }: PlainArgument, text: string | null): string | null {
  if (text === null) {
    if (fallback === undefined) throw new NoPlainFormula(`${says} is missing`);
    return fallback;
  }
  const { tree } = readFormula(text);
  if (tree.kind !== "text") {
    if (words!.length <= 3) return null;
    throw new NoPlainFormula(`the word for "${says}" is not written in the formula itself`);
  }
  const word = tree.value.trim().replace(/\s+/g, " ").toLowerCase();
  if (word === "" && fallback !== undefined) return fallback;
  if (!words!.includes(word)) throw new NoPlainFormula(`${says} cannot be "${tree.value.slice(0, 40)}"`);
  return word;
}

/** Where a word stands in a cell, one formula for each word it can be. */
function choose(
  open: readonly { argument: PlainArgument; text: string }[],
  words: Readonly<Record<string, string>>,
  formulaFor: (words: Readonly<Record<string, string>>) => string,
): string {
  const [first, ...rest] = open;
  if (!first) return formulaFor(words);
  const { name, words: choices, fallback } = first.argument;
  return choices!.reduceRight((otherwise, word) => {
    const formula = choose(rest, { ...words, [name]: word }, formulaFor);
    const is = `TRIM(${first.text})="${word}"`;
    return `IF(${word === fallback ? `OR(${is},TRIM(${first.text})="")` : is},${formula},${otherwise})`;
  }, "NA()");
}

/** Puts arguments, units and intermediate results in their places. */
function fill(
  { formula, where = {}, units = {}, result, factor = "" }: PlainText,
  numbers: Readonly<Record<string, string>>,
  words: Readonly<Record<string, string>>,
): string {
  const system = (words["units"] ?? "si") as UnitSystemWord;
  const textOf = (name: string): string => {
    // an intermediate name goes before an argument: the required frequency before the one that is given
    const text = where[name] ?? (Object.hasOwn(numbers, name) ? undefined : common[name]);
    if (text !== undefined) return substitute(text, textOf);
    if (!Object.hasOwn(numbers, name)) throw new Error(`plain formula: nothing stands for ${name} in ${formula}`);
    const dimension = units[name];
    const scale = dimension ? toSI(system, dimension) : "";
    return scale === "" ? numbers[name]! : bracketed(numbers[name]!) + scale;
  };
  const whole = substitute(formula, textOf);
  const after = factor + (result ? fromSI(system, result) : "");
  return after === "" ? whole : product(whole) + after;
}

/** A text that can be multiplied from behind. */
function product(text: string): string {
  const { tree } = readFormula(text);
  const binds = tree.kind === "binary" && ["*", "/", "^"].includes(tree.operator);
  return binds ? text : bracketed(text);
}

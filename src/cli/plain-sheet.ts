/** The cells of one worksheet part with our functions replaced; formats, values and everything else stay. */
import { toCol, translateFormulaToA1, translateFormulaToR1C1 } from "@borgar/fx";
import { hasOwnCall, isOneCall, plainText } from "../audit/plain-calls";
import { columnIndex } from "../formula/references";
import { attribute, decode, encode } from "./parts";
import type { Left } from "./plain-book";

interface FormulaCell {
  readonly address: string;
  /** attributes of its <f> element */
  readonly attributes: string;
  readonly formula: string;
  /** error that it shows, as the file says */
  readonly error?: string;
}

/** What a cell's formula element becomes; undefined attributes stay as they are. */
interface NewFormula {
  readonly attributes: string;
  readonly formula: string;
  /** no longer the anchor of a formula that spills */
  readonly alone?: boolean;
}

const cellPattern = /<((?:\w+:)?)c(\s[^>]*?)(?:\/>|>([\s\S]*?)<\/\1c>)/g;
const formulaPattern = /<((?:\w+:)?)f(\s[^>]*?)?(?:\/>|>([\s\S]*?)<\/\1f>)/;

export function plainSheet(xml: string, sheet: string): { xml: string; replaced: number; left: Left[] } {
  const { cells, present, errors } = formulaCells(xml);
  const spills = new Map<string, string>();
  for (const { address, attributes, formula } of cells) {
    const ref = attribute(attributes, "ref");
    if (attribute(attributes, "t") === "array" && ref?.includes(":") && hasOwnCall(formula)) spills.set(address, ref);
  }
  const changes = new Map<string, NewFormula>();
  const left: Left[] = [];
  let replaced = 0;
  for (const cell of cells) {
    const formula = withoutSpillMarks(cell.formula, spills);
    if (!hasOwnCall(formula)) {
      if (formula !== cell.formula) changes.set(cell.address, { attributes: cell.attributes, formula });
      continue;
    }
    const spill = spills.get(cell.address);
    const split = spill && isOneCall(formula) ? splitSpill(formula, spill, present, errors) : null;
    if (split) {
      for (const [address, text] of split.formulas) {
        changes.set(address, { attributes: "", formula: text, alone: true });
        replaced++;
      }
      for (const address of split.refused)
        left.push({ place: `${sheet}!${address}`, reason: refusal(errors.get(address)!) });
      continue;
    }
    const { formula: plain, kept, ranges } = plainText(formula);
    const reason = cell.error ? refusal(cell.error) : kept.map((each) => each.reason).join("; ");
    if (reason) left.push({ place: `${sheet}!${spill ?? cell.address}`, reason });
    else replaced++;
    changes.set(cell.address, {
      attributes: attributesFor(cell, ranges && !reason),
      formula: reason ? formula : plain,
    });
  }
  return { xml: rewrite(xml, changes), replaced, left };
}

const refusal = (error: string): string => `it shows ${error}, which a plain formula might hide behind a number`;

/** Every formula cell, shared formulas written out; which cells the part holds; and which show an error of their inputs. */
function formulaCells(xml: string): { cells: FormulaCell[]; present: Set<string>; errors: Map<string, string> } {
  const cells: FormulaCell[] = [];
  const present = new Set<string>();
  const errors = new Map<string, string>();
  const shared = new Map<string, string>(); // relative form by index
  for (const [, , outer = "", content = ""] of xml.matchAll(cellPattern)) {
    const address = attribute(outer, "r");
    if (address === undefined) continue;
    present.add(address);
    const error = errorOf(outer, content);
    if (error) errors.set(address, error);
    const found = formulaPattern.exec(content);
    if (!found) continue;
    let attributes = found[2] ?? "";
    let formula = decode(found[3] ?? "");
    if (attribute(attributes, "t") === "shared") {
      const index = attribute(attributes, "si") ?? "";
      if (formula !== "" && hasOwnCall(formula)) shared.set(index, translateFormulaToR1C1(formula, address));
      const relative = shared.get(index);
      if (relative === undefined) continue; // not ours: it stays shared
      formula = translateFormulaToA1(relative, address);
      attributes = "";
    }
    cells.push({ address, attributes, formula, ...(error ? { error } : {}) });
  }
  return { cells, present, errors };
}

/** The error that a function of ours gave; #NAME? only says that the add-in was not there. */
function errorOf(attributes: string, content: string): string | undefined {
  if (attribute(attributes, "t") !== "e") return undefined;
  const code = decode(/<(?:\w+:)?v>([^<]*)</.exec(content)?.[1] ?? "");
  return code === "" || code === "#NAME?" ? undefined : code;
}

/** A reference to what spills from a cell of ours becomes the range that it fills. */
function withoutSpillMarks(formula: string, spills: ReadonlyMap<string, string>): string {
  return formula.replace(/_xlfn\.ANCHORARRAY\((\$?[A-Z]{1,3}\$?\d+)\)/gi, (whole, anchor: string) => {
    const ref = spills.get(anchor.replaceAll("$", "").toUpperCase());
    return ref ? ref.replace(/([A-Z]+)(\d+)/g, anchor.includes("$") ? "$$$1$$$2" : "$1$2") : whole;
  });
}

/** One plain formula for each cell of a spilled call; null where an argument does not say which cell belongs to which. */
function splitSpill(
  formula: string,
  ref: string,
  present: ReadonlySet<string>,
  errors: ReadonlyMap<string, string>,
): { formulas: [address: string, formula: string][]; refused: string[] } | null {
  const [, fromColumn, fromRow, toColumn, toRow] = /^([A-Z]+)(\d+):([A-Z]+)(\d+)$/.exec(ref) ?? [];
  if (!fromColumn || !toColumn) return null;
  const formulas: [string, string][] = [];
  const refused: string[] = [];
  const left = columnIndex(fromColumn);
  for (let row = Number(fromRow); row <= Number(toRow); row++) {
    for (let column = left; column <= columnIndex(toColumn); column++) {
      const address = `${toCol(column)}${row}`;
      if (!present.has(address)) return null;
      if (errors.has(address)) {
        refused.push(address);
        continue;
      }
      const { formula: plain, kept } = plainText(formula, { row: row - Number(fromRow), column: column - left });
      if (kept.length > 0) return null;
      formulas.push([address, plain]);
    }
  }
  // where the first cell is refused the call must stay there, and with it the whole spill
  return refused.includes(`${fromColumn}${fromRow}`) ? null : { formulas, refused };
}

/** A formula over whole ranges must be an array formula, or a spreadsheet takes one cell of each. */
function attributesFor({ address, attributes }: FormulaCell, ranges: boolean): string {
  const array = attribute(attributes, "t") === "array";
  return ranges && !array ? ` t="array" ref="${address}"` : attributes;
}

function rewrite(xml: string, changes: ReadonlyMap<string, NewFormula>): string {
  return xml.replace(cellPattern, (whole, prefix: string, outer: string, content: string | undefined) => {
    const change = changes.get(attribute(outer, "r") ?? "");
    if (!change) return whole;
    const element = `<${prefix}f${change.attributes}>${encode(change.formula)}</${prefix}f>`;
    const attributes = change.alone ? outer.replace(/\scm="\d+"/, "") : outer;
    return `<${prefix}c${withoutNameError(attributes, content)}>${element}${rest(content)}</${prefix}c>`;
  });
}

const shows = /<(?:\w+:)?v>#NAME\?<\/(?:\w+:)?v>/;

/** The content behind the formula; a #NAME? of the missing add-in is no value to keep. */
const rest = (content = ""): string => content.replace(formulaPattern, "").replace(shows, "");
const withoutNameError = (attributes: string, content = ""): string =>
  shows.test(content) ? attributes.replace(/\st="e"/, "") : attributes;

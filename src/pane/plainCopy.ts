/** A copy of a sheet in which our functions are ordinary formulas, for people without the add-in. */
import { ownCalls } from "../audit/ownCalls";
import { columnOf, rowOf } from "../audit/workbook";
import type { Context } from "./context";
import type { Replacement } from "./sheet";
import { strings } from "./strings";

/** Makes the copy and says what was done. */
export async function plainCopy(context: Context, sheet: string): Promise<string> {
  const words = strings.audit;
  const [{ sheets }, { plainText }] = await Promise.all([
    context.sheet.workbook({}),
    import(/* webpackChunkName: "worked" */ "../audit/plain-calls"),
  ]);
  const cells = sheets.find(({ name }) => name === sheet)?.cells ?? new Map();
  const replacements: Replacement[] = [];
  const kept = new Set<string>();
  for (const [key, { formula }] of cells) {
    if (formula === undefined || ownCalls(formula).length === 0) continue;
    const plain = plainText(formula);
    plain.kept.forEach(({ id }) => kept.add(id));
    if (plain.replaced.length === 0) continue;
    replacements.push({
      row: rowOf(key),
      column: columnOf(key),
      formula: `=${plain.formula}`,
      note: words.plainNote(`=${formula}`, context.version),
    });
  }
  const left = kept.size > 0 ? words.plainLeft([...kept].sort().join(", ")) : "";
  if (replacements.length === 0) return left || words.plainNone;
  const name = await context.sheet.copySheet(sheet, words.plainName(sheet), replacements);
  return `${words.plainDone(name, replacements.length)} ${left}`.trim();
}

/** A copy of a sheet in which our functions are ordinary formulas, for people without the add-in. */
import type { Context } from "./context";
import { strings } from "./strings";

export async function plainCopy(_context: Context, _sheet: string): Promise<string> {
  return strings.audit.plainNone;
}

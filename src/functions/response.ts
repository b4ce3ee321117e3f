import type { Response } from "../core/randomResponse";
import { type Argument, word } from "./cell";
import { fromSI, toSI, type UnitSystem } from "./unitSystems";

/** What is asked of the mounted item: its acceleration when left out. */
export function responseOf(argument: Argument): Response {
  return word("response", argument, ["acceleration", "deflection"], "acceleration");
}

/**
 * A response computed from accelerations in the sheet's own unit: an acceleration already is in it; a deflection, so far
 * acceleration times s^2, goes to the sheet's unit of length.
 */
export function responseInSheet(value: number, response: Response, system: UnitSystem): number {
  if (response === "acceleration") return value;
  return fromSI(toSI(value, system.acceleration), system.displacement);
}

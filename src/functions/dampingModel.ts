import type { DampingModel } from "../core/transmissibility";
import { type Argument, word } from "./cell";

/** The damping model that an argument names: viscous when left out. */
export function dampingModelOf(argument: Argument): DampingModel {
  return word("dampingModel", argument, ["viscous", "hysteretic"], "viscous");
}

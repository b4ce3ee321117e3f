/** What a plain formula is made of: one entry for each cell function that has one. */
import { catalogue } from "./catalogue/index";
import type { PlainDimension } from "./plain-units";
import type { Role } from "./roles";

/** An argument: a number, a whole table, or one of a few words. The first word is taken where none is given. */
export interface PlainArgument {
  readonly name: string;
  /** what to call it where something is wrong with it */
  readonly says: string;
  /** text of the value where it is left out; undefined where it must be given */
  readonly fallback?: string;
  readonly words?: readonly string[];
  /** a table is taken as a whole; `each` is the name of the cell of it that belongs to a place */
  readonly table?: { readonly each?: string };
  /** a unit's name, whose case matters */
  readonly unit?: boolean;
}

/** A formula over the names of arguments and of `where`, in SI units, and what its names measure. */
export interface PlainText {
  readonly formula: string;
  /** intermediate names, each a formula over arguments and other intermediate names */
  readonly where?: Readonly<Record<string, string>>;
  readonly units?: Readonly<Record<string, PlainDimension>>;
  readonly result?: PlainDimension;
  /** what to put behind the result, such as "/60" */
  readonly factor?: string;
}

export interface PlainEntry {
  readonly arguments: readonly PlainArgument[];
  /**
   * @param words every word by argument name
   * @param given names of the arguments that are not left out
   * @param row   of the place within a spilled result, from 0
   */
  text(words: Readonly<Record<string, string>>, given: ReadonlySet<string>, row: number): PlainText;
  /** the result fills several cells; the name `place` counts them from 0 */
  readonly fills?: boolean;
  /** it looks things up or compares, so it takes one value at a time */
  readonly oneAtATime?: boolean;
}

export const number = (name: string, says: string, fallback?: string): PlainArgument =>
  fallback === undefined ? { name, says } : { name, says, fallback };
export const word = (name: string, says: string, words: readonly string[], fallback?: string): PlainArgument => ({
  name,
  says,
  words,
  ...(fallback === undefined ? {} : { fallback }),
});
export const table = (name: string, says: string, each?: string): PlainArgument => ({
  name,
  says,
  table: each === undefined ? {} : { each },
});

export const frequency = number("f", "frequency");
export const naturalFrequency = number("fn", "natural frequency");
export const dampingRatio = number("zeta", "damping ratio");
export const dampingModel = word("model", "damping model", ["viscous", "hysteretic"], "viscous");
export const units = word("units", "units", ["si", "mm", "inch"], "si");

/** The formula of the catalogue's one exact relation between a role and others; `approximate` asks for the customary one. */
export function relationText(out: Role, inputs: readonly Role[], approximate = false): string {
  const wanted = [...inputs].sort().join();
  const found = catalogue.filter(
    (entry) =>
      entry.out === out &&
      !entry.undamped &&
      (entry.approximate ?? false) === approximate &&
      [...entry.inputs].sort().join() === wanted,
  );
  if (found.length !== 1) throw new Error(`plain formula: ${found.length} relations give ${out} from ${wanted}`);
  return found[0]!.plain ?? found[0]!.formula;
}

/** Whether the catalogue has an exact relation between two roles. */
export const hasRelation = (out: Role, input: Role): boolean =>
  catalogue.some((entry) => entry.out === out && !entry.approximate && entry.inputs.join() === input);

/** Standard acceleration of free fall and the names that follow from arguments wherever they are used. */
export const common: Readonly<Record<string, string>> = {
  g: "9.80665",
  r: "f/fn",
  eta: "2*zeta",
};

/** The transmissibility of a model, as text over r and zeta or eta. */
export const transmissibility = (model: string): string =>
  model === "viscous" ? relationText("T", ["r", "zeta"]) : relationText("T", ["r", "eta"]);
export const relative = (model: string): string =>
  model === "viscous" ? relationText("R", ["r", "zeta"]) : relationText("R", ["r", "eta"]);

/** The catalogue's relation behind a cell function, and the helper relations that lead from its arguments to it. */
import { catalogue, type Relation } from "./catalogue";
import type { Role } from "./roles";

export interface FunctionRelation {
  readonly relation: Relation;
  /** roles of the arguments, in the function's own order */
  readonly arguments: readonly Role[];
  /** relations for quantities that the arguments do not give, such as r, in the order in which they are needed */
  readonly helpers: readonly Relation[];
}

/** Roles that need no argument. */
const CONSTANTS: readonly string[] = ["g"];
const DEEPEST = 4;

/**
 * What `id` computes from its first `count` arguments; undefined where the catalogue has no closed form for it.
 * With hysteretic damping the loss factor eta = 2 zeta stands where the damping ratio was.
 */
export function relationOfFunction(id: string, count: number, hysteretic = false): FunctionRelation | undefined {
  const own = catalogue
    .filter((each) => each.cellFunction === id && each.arguments && each.arguments.length <= count && !each.approximate)
    .filter(({ inputs }) => !inputs.includes("eta"))
    .sort((a, b) => b.arguments!.length - a.arguments!.length)[0];
  if (!own) return undefined;
  const roles = own.arguments!;
  const other = hysteretic && roles.includes("zeta");
  const relation = other ? catalogue.find((each) => each.out === own.out && each.inputs.includes("eta")) : own;
  if (!relation) return undefined;
  const given = new Set<string>([...roles, ...CONSTANTS]);
  if (other) {
    given.delete("zeta");
    given.add("eta");
  }
  const helpers: Relation[] = [];
  return relation.inputs.every((input) => reach(input, [relation.out], given, helpers))
    ? { relation, arguments: roles, helpers }
    : undefined;
}

/**
 * Adds to `helpers` what it takes to know `role`, and to `given` what is then known. `path` holds the roles that are
 * being worked out, which must not come back as inputs.
 */
function reach(role: string, path: readonly string[], given: Set<string>, helpers: Relation[]): boolean {
  if (given.has(role)) return true;
  if (path.length > DEEPEST) return false;
  const missing = ({ inputs }: Relation): number => inputs.filter((input) => !given.has(input)).length;
  const inner = [...path, role];
  const candidates = catalogue
    .filter((each) => each.out === role && !each.approximate && !each.undamped && !each.required)
    .filter(({ inputs }) => inputs.length > 0 && !inputs.some((input) => inner.includes(input)))
    .sort(
      (a, b) =>
        missing(a) - missing(b) ||
        Number(!a.cellFunction) - Number(!b.cellFunction) ||
        a.inputs.length - b.inputs.length,
    );
  for (const relation of candidates) {
    const trial = new Set(given);
    const added: Relation[] = [];
    if (!relation.inputs.every((input) => reach(input, inner, trial, added))) continue;
    helpers.push(...added, relation);
    trial.forEach((each) => given.add(each));
    given.add(role);
    return true;
  }
  return false;
}

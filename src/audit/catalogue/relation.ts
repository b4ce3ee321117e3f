import { type Node, walk } from "../../formula/nodes";
import { compile, type Compiled } from "../../formula/compile";
import { readFormula } from "../../formula/read";
import { systematicSlips } from "../slips";
import type { Mistake, Quantity } from "../quantities";
import { type Role, roles } from "../roles";

/** A known way to get a relation wrong. */
export interface Slip {
  readonly mistake: Mistake | null;
  readonly formula: string;
  readonly why: string;
}

/** One published relation, as it is written: a spreadsheet formula over the names of roles. */
export interface RelationText {
  readonly quantity: Quantity;
  /** role that it gives */
  readonly out: Role;
  readonly formula: string;
  /** the same relation in a form that keeps its digits, where the published one cancels or divides by 0: the plain formula */
  readonly plain?: string;
  readonly says: string;
  readonly source: string;
  /** name of the cell function that computes it */
  readonly cellFunction?: string;
  /** roles in the order of the cell function's arguments */
  readonly arguments?: readonly Role[];
  readonly slips?: readonly Slip[];
  /** true where the damping is left out: right only where there is none */
  readonly undamped?: boolean;
  /** true for an approximation that is right where it is labelled so, or customary */
  readonly approximate?: boolean;
  /** true for a coarse approximation that is right only where its label says so */
  readonly labelled?: boolean;
  /** false where slips are not generated */
  readonly systematic?: boolean;
  /** true for a step between cells: its inputs stand in cells of their own, none is derived */
  readonly between?: boolean;
  /** true if a target isolation is among the inputs, so that the result is a requirement */
  readonly required?: boolean;
}

export interface CompiledSlip extends Slip {
  readonly compute: Compiled;
}

export interface Relation extends RelationText {
  readonly id: string;
  readonly inputs: readonly Role[];
  readonly tree: Node;
  readonly compute: Compiled;
  readonly allSlips: readonly CompiledSlip[];
}

/** Reads and compiles an entry of the catalogue. An entry that cannot be read is a defect of the catalogue and throws. */
export function relation(text: RelationText): Relation {
  const { tree, problems } = readFormula(text.formula);
  const inputs = namesIn(tree);
  const compute = compile(tree, inputs);
  if (problems.length > 0 || !compute) throw new Error(`catalogue: cannot read ${text.out} = ${text.formula}`);
  const written = (text.slips ?? []).map((slip) => ({ ...slip, tree: readFormula(slip.formula).tree }));
  const generated = text.systematic === false ? [] : systematicSlips(tree);
  const allSlips: CompiledSlip[] = [];
  for (const slip of [...written, ...generated]) {
    const computeSlip = compile(slip.tree, inputs);
    if (computeSlip)
      allSlips.push({ mistake: slip.mistake, formula: slip.formula, why: slip.why, compute: computeSlip });
    else if (written.includes(slip as (typeof written)[number]))
      throw new Error(`catalogue: cannot read slip ${slip.formula}`);
  }
  return { ...text, id: `${text.out} = ${text.formula}`, inputs, tree, compute, allSlips };
}

function namesIn(tree: Node): Role[] {
  const found = new Set<Role>();
  walk(tree, (node) => {
    if (node.kind !== "name") return;
    if (!Object.hasOwn(roles, node.name)) throw new Error(`catalogue: unknown role ${node.name}`);
    found.add(node.name as Role);
  });
  return [...found];
}

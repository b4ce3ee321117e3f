import type { CallNode, Node } from "../formula/nodes";
import type { Analysis } from "./analyse";
import type { Book } from "./book";
import type { Meaning } from "./meaning";
import type { Mistake, Quantity } from "./quantities";
import { type Role, roles } from "./roles";
import type { Run } from "./runs";
import { gravity, type Unit } from "./units";
import { columnOf, rowOf } from "./workbook";

interface OwnFunction {
  readonly quantity: Quantity;
  /** role of the result; null where its unit is that of the first input */
  readonly out: Role | null;
  readonly inputs: readonly (Role | null)[];
  /** index of the argument that names the units; without one frequencies must only agree among themselves */
  readonly units?: number;
}

/** Our functions that a sheet's formulas correspond to, with the roles of their arguments. */
const own: Readonly<Record<string, OwnFunction>> = {
  ABSTRANS: { quantity: "absolute-transmissibility", out: "T", inputs: ["f", "fn", "zeta"] },
  RELTRANS: { quantity: "relative-transmissibility", out: "R", inputs: ["f", "fn", "zeta"] },
  ABSPHASE: { quantity: "absolute-phase", out: "phiA", inputs: ["f", "fn", "zeta"] },
  RELPHASE: { quantity: "relative-phase", out: "phiR", inputs: ["f", "fn", "zeta"] },
  EFFICIENCY: { quantity: "isolation-efficiency", out: "E", inputs: ["f", "fn", "zeta"] },
  PEAKTRANS: { quantity: "peak-transmissibility", out: "Tpk", inputs: ["zeta"] },
  PEAKFREQ: { quantity: "peak-transmissibility", out: null, inputs: ["fn", "zeta"] },
  NATFREQ: { quantity: "natural-frequency", out: "fn", inputs: ["k", "m"], units: 2 },
  STIFFNESS: { quantity: "required-stiffness", out: "k", inputs: ["fn", "m"], units: 2 },
  STATICDEFL: { quantity: "static-deflection", out: "delta", inputs: ["fn", null], units: 2 },
  DEFLFREQ: { quantity: "natural-frequency", out: "fn", inputs: ["delta", null], units: 2 },
  MOUNTDEFL: { quantity: "relative-displacement", out: null, inputs: ["U", "f", "fn", "zeta"] },
  MOUNTFORCE: { quantity: "mount-force", out: "F", inputs: ["U", "f", "m", "fn", "zeta"], units: 6 },
  DAMPCOEFF: { quantity: "damping-coefficient", out: "c", inputs: ["zeta", "k", "m"], units: 3 },
  DAMPRATIO: { quantity: "damping-ratio", out: "zeta", inputs: ["c", "k", "m"], units: 3 },
  REQNATFREQ: { quantity: "required-natural-frequency", out: null, inputs: ["E", "f", "zeta"] },
  REQSTATICDEFL: { quantity: "required-static-deflection", out: "delta", inputs: ["E", "f", "zeta"], units: 5 },
  REQSTIFFNESS: { quantity: "required-stiffness", out: "k", inputs: ["E", "f", "zeta", "m"], units: 5 },
  MILES: { quantity: "random-response-rms", out: null, inputs: ["fn", "zeta", null] },
};

const pound = 0.45359237;

/** SI value of 1 in the unit systems that our functions take by a word. */
const systems: Readonly<Record<string, Partial<Record<string, number>>>> = {
  si: { length: 1, mass: 1, force: 1, stiffness: 1, damping: 1 },
  mm: { length: 1e-3, mass: 1, force: 1, stiffness: 1e3, damping: 1e3 },
  inch: {
    length: 0.0254,
    mass: pound,
    force: pound * gravity,
    stiffness: (pound * gravity) / 0.0254,
    damping: (pound * gravity) / 0.0254,
  },
};

type Found = Pick<Analysis, "verdict" | "quantity" | "mistake" | "why">;

/** Judges a cell that calls one of our functions: the quantity is the function's, its inputs are checked. */
export function ownFunctionFinding(
  book: Book,
  run: Run,
  meaning: Meaning,
  meaningAt: (sheet: number, row: number, column: number) => Meaning,
): Found | null {
  const call = ownCall(run.form.tree);
  const known = call && own[call.name.slice("PLINTH.".length)];
  if (!call || !known) return null;
  const { quantity } = known;
  const wrong = (mistake: Mistake, why: string): Found => ({ verdict: "differs", quantity, mistake, why });
  const word = known.units === undefined ? null : wordOf(call.arguments[known.units]);
  const system = systems[word ?? "si"];
  let frequency: Unit | null = null;
  for (const [i, role] of known.inputs.entries()) {
    const place = placeOf(book, run, call.arguments[i]);
    if (!place || !role) continue;
    const label = meaningAt(...place);
    const { unit } = label;
    const says = roles[role].says;
    if (run.cells.length <= 1 && book.value(...place) === null)
      return wrong("reference-slip", `The cell for the ${says} is blank.`);
    if (role === "zeta") {
      const best = label.candidates[0];
      if (best?.role === "eta" && best.weight >= 5)
        return wrong("loss-factor-as-damping-ratio", "The loss factor is twice the damping ratio.");
      if (unit?.dimension === "number" && unit.factor === 0.01)
        return wrong("percent-as-ratio", `The ${says} must be a fraction; its label says percent.`);
    }
    if (role === "E" && unit?.dimension === "number" && unit.factor === 0.01)
      return wrong("percent-as-ratio", `The ${says} must be a fraction; its label says percent.`);
    if (!unit) continue;
    if (unit.dimension === "frequency") {
      const fixed = known.units !== undefined ? 1 : frequency?.factor;
      if (fixed !== undefined && !near(unit.factor, fixed))
        return wrong(
          frequencyMistake(unit.factor / fixed),
          `The frequencies stand in different units: ${unit.text}${frequency ? ` and ${frequency.text}` : ""}.`,
        );
      frequency = unit;
    } else if (system && known.units !== undefined) {
      const wanted = system[unit.dimension];
      if (unit.dimension === "force" && role === "m" && word !== "inch")
        return wrong("mass-weight-mixup", "A weight stands where the mass belongs.");
      if (wanted !== undefined && unit.dimension !== "force" && !near(unit.factor, wanted))
        return wrong("length-unit", `The ${says} is in ${unit.text}, the units word says "${word ?? "si"}".`);
    }
  }
  const scale = scaleAround(run.form.tree, call);
  if (meaning.unit && known.out && scale !== null) {
    const { unit } = meaning;
    if (known.out === "E" || known.out === "T" || known.out === "R" || known.out === "zeta") {
      if (unit.dimension === "number" && !near(unit.factor * scale, 1))
        return wrong("percent-as-ratio", "The function gives a fraction, the label says percent.");
    }
    const wanted =
      unit.dimension === "frequency"
        ? 1
        : unit.dimension === "angle"
          ? Math.PI / 180
          : known.units !== undefined
            ? system?.[unit.dimension]
            : undefined;
    if (wanted !== undefined && unit.dimension === roles[known.out].dimension && !near(unit.factor * scale, wanted)) {
      return wrong(
        unit.dimension === "frequency" ? frequencyMistake(unit.factor * scale) : "length-unit",
        `The result is not in ${unit.text}.`,
      );
    }
  }
  return { verdict: "agrees", quantity, mistake: null, why: "" };
}

const near = (a: number, b: number): boolean => Math.abs(a / b - 1) < 1e-6;
const frequencyMistake = (ratio: number): Mistake =>
  [60, 1 / 60, 30 / Math.PI, Math.PI / 30].some((factor) => near(ratio, factor))
    ? "speed-unit"
    : "angular-cyclic-mixup";
const asOwn = (node: Node): CallNode | null => (node.kind === "call" && node.name.startsWith("PLINTH.") ? node : null);

/** Our call when it is the whole formula, or multiplied or divided by a number. */
function ownCall(tree: Node): CallNode | null {
  const own = asOwn(tree);
  if (own) return own;
  if (tree.kind === "binary" && (tree.operator === "*" || tree.operator === "/"))
    return ownCall(tree.left) ?? (tree.operator === "*" ? ownCall(tree.right) : null);
  if (tree.kind === "call" && (tree.name === "IFERROR" || tree.name === "ROUND") && tree.arguments[0])
    return ownCall(tree.arguments[0]);
  return null;
}

/** The number by which the call's result is multiplied; null if it is no plain number. */
function scaleAround(tree: Node, call: CallNode): number | null {
  if (tree === call) return 1;
  if (tree.kind === "call") return tree.arguments[0] ? scaleAround(tree.arguments[0], call) : null;
  if (tree.kind !== "binary") return null;
  const { operator, left, right } = tree;
  if (right.kind === "number") {
    const inner = scaleAround(left, call);
    return inner === null ? null : operator === "*" ? inner * right.value : inner / right.value;
  }
  const inner = left.kind === "number" ? scaleAround(right, call) : null;
  return inner === null || left.kind !== "number" ? null : inner * left.value;
}

const wordOf = (node: Node | undefined): string | null =>
  node?.kind === "text" ? node.value.trim().toLowerCase() : null;

function placeOf(book: Book, run: Run, node: Node | undefined): [sheet: number, row: number, column: number] | null {
  if (node?.kind !== "reference" || node.from.row === null || node.from.column === null) return null;
  return [
    node.sheet === null ? run.sheet : book.sheetNumber(node.sheet),
    node.from.row + (node.from.rowFixed ? 0 : rowOf(run.anchor) - run.form.row),
    node.from.column + (node.from.columnFixed ? 0 : columnOf(run.anchor) - run.form.column),
  ];
}

import { children, type Node, walk, withChildren } from "../formula/nodes";
import { combinations } from "./combinations";
import { evaluateCut } from "./cut";
import { derive, type Entry } from "./derive";
import type { Explanation, Question, Target } from "./explain";
import type { Fault } from "./fault";
import { leafEntries } from "./explain";
import { close } from "./match";
import type { Mistake } from "./quantities";
import { type Role, roles } from "./roles";
import { gravity } from "./units";

interface Right {
  readonly target: Target;
  readonly entry: Entry;
  readonly readings: Explanation["readings"];
  readonly values: Float64Array;
  readonly cost: number;
}

interface Edit {
  readonly tree: Node;
  readonly mistake: Mistake | null;
  readonly why: string;
}

const mostEdits = 400;
const mostRights = 60;

/**
 * The fault of a formula that one small change of its own text makes right: an operator, a root, a square, a pair of
 * brackets, a unit factor at one of the places where an input stands.
 */
export function repaired(question: Question): Explanation | null {
  const rights = rightsOf(question);
  if (rights.length === 0) return null;
  const { cut, samples } = question;
  const usable = samples.usable.flatMap((ok, s) => (ok ? [s] : []));
  if (usable.length < 3) return null;
  let tried = 0;
  for (const edit of editsOf(cut.tree, question)) {
    if (++tried > mostEdits) break;
    const first = evaluateCut(cut, samples.inputs[usable[0]!]!, edit.tree).value;
    const near = rights.filter(({ values }) => Math.abs(first / values[usable[0]!]! - 1) < close);
    if (near.length === 0) continue;
    const found = near.find(({ values }) =>
      usable.every((s) => Math.abs(evaluateCut(cut, samples.inputs[s]!, edit.tree).value / values[s]! - 1) < close),
    );
    if (!found) continue;
    const fault: Fault = { mistake: edit.mistake, why: edit.why, cost: 1 };
    const { target, entry, readings, cost } = found;
    return { target, entry, readings, cut, cost: cost + 1, fault, constant: null };
  }
  return null;
}

function rightsOf(question: Question): Right[] {
  const { samples, targets } = question;
  const found: Right[] = [];
  for (const readings of combinations(question.readings, samples.mask, 3)) {
    const base = readings.reduce((sum, reading) => sum + (reading?.cost ?? 0), 0);
    if (base > 0.7) break;
    const start = leafEntries(question, readings);
    const derivation = derive(start, [...new Set(targets.map(({ role }) => role))], samples.count, false);
    for (const target of targets) {
      if (target.cost > 0.7 || /detuning|^rr$|numerator|denominator/i.test(target.role)) continue;
      for (const entry of derivation.entries(target.role)) {
        if (entry.mask !== samples.mask || entry.coarse || found.length >= mostRights) continue;
        const values = entry.values.map((value) => value / target.factor);
        found.push({ target, entry, readings, values, cost: base + target.cost });
      }
    }
  }
  return found.sort((a, b) => a.cost - b.cost);
}

const at = { start: 0, end: 0 };
const number = (value: number): Node => ({ kind: "number", value, text: String(value), ...at });
const binary = (operator: string, left: Node, right: Node): Node =>
  ({ kind: "binary", operator, left, right, ...at }) as Node;
const root = (argument: Node): Node => ({ kind: "call", name: "SQRT", arguments: [argument], ...at }) as Node;

function* editsOf(tree: Node, question: Question): Generator<Edit> {
  const roleOf = (node: Node): Role | null =>
    node.kind === "reference" ? (question.readings[node.from.row!]?.[0]?.role ?? null) : null;
  const rolesIn = (node: Node): Set<Role> => {
    const found = new Set<Role>();
    walk(node, (inner) => {
      const role = roleOf(inner);
      if (role) found.add(role);
    });
    return found;
  };
  const counts = new Map<number, number>();
  walk(tree, (node) => {
    if (node.kind === "reference") counts.set(node.from.row!, (counts.get(node.from.row!) ?? 0) + 1);
  });
  yield {
    tree: root(tree),
    mistake: "square-root-missing",
    why: "The square root is left out.",
  };
  yield* visit(tree, (changed) => changed);

  function* visit(node: Node, rebuild: (changed: Node) => Node): Generator<Edit> {
    for (const { tree: changed, mistake, why } of changesOf(node)) yield { tree: rebuild(changed), mistake, why };
    const inside = children(node);
    for (let i = 0; i < inside.length; i++) {
      yield* visit(inside[i]!, (changed) =>
        rebuild(
          withChildren(
            node,
            inside.map((other, k) => (k === i ? changed : other)),
          ),
        ),
      );
    }
  }

  function* changesOf(node: Node): Generator<Edit> {
    if (node.kind === "reference") yield* scaled(node);
    if (node.kind === "call") {
      const [x, y] = node.arguments;
      if (node.name === "ATAN2" && x && y) {
        const why = "A spreadsheet's ATAN2 takes x first, then y.";
        yield { tree: { ...node, arguments: [y, x] }, mistake: "sign-precedence", why };
      }
      if (node.name === "SQRT" && x) yield { tree: x, mistake: null, why: "The square root does not belong here." };
    }
    if (node.kind !== "binary") return;
    const { operator, left, right } = node;
    if (operator === "*") {
      yield {
        tree: { ...node, operator: "/" },
        mistake: ofFactor(right),
        why: "It multiplies where it should divide.",
      };
      if (left.kind !== "binary")
        yield { tree: binary("/", right, left), mistake: ofFactor(left), why: "It multiplies where it should divide." };
    }
    if (operator === "/") {
      yield { tree: { ...node, operator: "*" }, mistake: ofFactor(right), why: "It divides where it should multiply." };
      yield {
        tree: { ...node, left: right, right: left },
        mistake: "ratio-inverted",
        why: "The quotient is upside down.",
      };
      yield {
        tree: { ...node, right: root(right) },
        mistake: "square-root-missing",
        why: "A square root is left out.",
      };
      yield { tree: { ...node, left: root(left) }, mistake: "square-root-missing", why: "A square root is left out." };
    }
    if (operator === "+" || operator === "-") {
      const other = operator === "+" ? "-" : "+";
      yield {
        tree: { ...node, operator: other } as Node,
        mistake: "sign-precedence",
        why: `It has ${operator} where ${other} belongs.`,
      };
    }
    if (operator === "*" && left.kind === "binary" && left.operator === "/") {
      const together = binary("/", left.left, binary("*", left.right, right));
      yield { tree: together, mistake: "sign-precedence", why: "The brackets around the divisor are missing." };
    }
    if ((operator === "+" || operator === "-") && left.kind === "binary" && left.operator === "/") {
      const together = binary("/", left.left, binary(operator, left.right, right));
      yield { tree: together, mistake: "sign-precedence", why: "The brackets around the divisor are missing." };
    }
    if ((operator === "+" || operator === "-") && right.kind === "binary" && right.operator === "/") {
      const together = binary("/", binary(operator, left, right.left), right.right);
      yield { tree: together, mistake: "sign-precedence", why: "The brackets around the dividend are missing." };
    }
    if (operator === "^" && right.kind === "number" && right.value === 2) {
      if (left.kind === "binary" && left.operator === "/") {
        const inner = binary("/", left.left, left.right);
        yield { tree: inner, mistake: null, why: "The square does not belong here." };
      } else yield { tree: left, mistake: null, why: "The square does not belong here." };
    } else {
      const of = rolesIn(node);
      const mistake = [...of].some((role) => damping.has(role)) ? "damping-not-squared" : "ratio-not-squared";
      if (of.size > 0) yield { tree: binary("^", node, number(2)), mistake, why: "A square is left out." };
    }
    if (operator === "/" && right.kind === "binary" && right.operator === "^") {
      const together = binary("^", binary("/", left, right.left), right.right);
      yield {
        tree: together,
        mistake: "sign-precedence",
        why: "The brackets around the squared quotient are missing.",
      };
    }
    if (operator === "-" || operator === "/") {
      const size = { kind: "call", name: "ABS", arguments: [node], ...at } as Node;
      yield { tree: size, mistake: "absolute-value-missing", why: "The sign changes at resonance: ABS is missing." };
    }
  }

  /** An input that stands at several places and is converted at some of them only, or not squared at one. */
  function* scaled(node: Node): Generator<Edit> {
    if (node.kind !== "reference") return;
    const role = roleOf(node);
    if (!role) return;
    const squared = binary("^", node, number(2));
    const mistake = damping.has(role) ? "damping-not-squared" : "ratio-not-squared";
    yield { tree: squared, mistake, why: "A square is left out." };
    if ((counts.get(node.from.row!) ?? 0) < 2) return;
    for (const [factor, slip] of slipsOf(role)) {
      for (const by of [factor, 1 / factor])
        yield { tree: binary("*", node, number(by)), mistake: slip, why: "The unit is converted at some places only." };
    }
  }

  function ofFactor(factor: Node): Mistake | null {
    const role = roleOf(factor);
    if (role === "n") return "total-for-per-mount";
    if (role === "g") return "mass-weight-mixup";
    if (factor.kind === "number") {
      if (factor.value === 60) return "speed-unit";
      if (factor.value === 100) return "percent-as-ratio";
      if (Math.abs(factor.value / gravity - 1) < 0.01) return "mass-weight-mixup";
      if (Math.abs(factor.value / (2 * Math.PI) - 1) < 0.01) return "angular-cyclic-mixup";
      if ([1000, 25.4, 12, 10].includes(factor.value)) return "length-unit";
    }
    if (factor.kind === "call" && factor.name === "PI") return "angular-cyclic-mixup";
    return factor.kind === "call" && factor.name === "SQRT" ? null : "ratio-inverted";
  }
}

const damping = new Set<Role>(["zeta", "eta", "c", "cEach", "cc", "b"]);

function slipsOf(role: Role): readonly (readonly [number, Mistake])[] {
  const { dimension } = roles[role];
  if (role === "zeta" || role === "eta") return [[100, "percent-as-ratio"]];
  if (role === "T" || role === "E" || role === "R") return [[100, "percent-as-ratio"]];
  if (dimension === "frequency")
    return [
      [2 * Math.PI, "angular-cyclic-mixup"],
      [60, "speed-unit"],
    ];
  return [];
}

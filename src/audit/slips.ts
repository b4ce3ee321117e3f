import { children, type Node, walk, withChildren } from "../formula/nodes";
import type { Mistake } from "./quantities";

export interface GeneratedSlip {
  readonly mistake: Mistake | null;
  readonly formula: string;
  readonly why: string;
  readonly tree: Node;
}

type Change = readonly [mistake: Mistake | null, changed: Node, why: string];

const damping = new Set(["zeta", "eta", "c", "cc", "b", "Q"]);
const ratio = new Set(["r", "f", "fn", "rr", "T", "R"]);

/** The systematic ways to get a formula wrong: each changes one place of its tree. */
export function systematicSlips(tree: Node): GeneratedSlip[] {
  const found: GeneratedSlip[] = [];
  const visit = (node: Node, rebuild: (changed: Node) => Node): void => {
    for (const [mistake, changed, why] of changesOf(node)) {
      const whole = rebuild(changed);
      found.push({ mistake, formula: formulaText(whole), why, tree: whole });
    }
    const inside = children(node);
    inside.forEach((child, i) => {
      visit(child, (changed) =>
        rebuild(
          withChildren(
            node,
            inside.map((other, k) => (k === i ? changed : other)),
          ),
        ),
      );
    });
  };
  visit(tree, (changed) => changed);
  const everywhere = withoutTurns(tree);
  if (everywhere)
    found.push({ mistake: "angular-cyclic-mixup", formula: formulaText(everywhere), why: turnsWhy, tree: everywhere });
  return found;
}

const turnsWhy = "Without 2π a frequency in Hz is taken as one in rad/s.";
const place = { start: 0, end: 0 };
const number = (value: number): Node => ({ kind: "number", value, text: String(value), ...place });

function changesOf(node: Node): Change[] {
  if (node.kind === "call") return changedCall(node);
  if (node.kind !== "binary") return [];
  const { operator, left, right } = node;
  const found: Change[] = [];
  if (operator === "^" && right.kind === "number" && right.value === 2) {
    found.push([notSquared(left), left, "The square is left out."]);
    if (left.kind === "binary" && left.operator === "*") {
      const last = { ...node, left: left.right };
      const why = "Without brackets only the last factor is squared.";
      found.push([mentions(left, damping) ? "damping-not-squared" : "sign-precedence", { ...left, right: last }, why]);
      const first: Node = { ...left, left: { ...node, left: left.left } };
      if (mentions(left.right, ratio)) found.push(["ratio-not-squared", first, "The last factor is not squared."]);
    }
    if (
      left.kind === "binary" &&
      left.operator === "-" &&
      left.right.kind === "binary" &&
      left.right.operator === "^"
    ) {
      // (1-r^2)^2 as 1-r^4 or (1-r)^2
      found.push(["ratio-not-squared", { ...node, left: { ...left, right: left.right.left } }, "r stands for r²."]);
    }
  }
  if (operator === "/" && right.kind === "binary" && right.operator === "*") {
    const lost: Node = { ...right, left: { ...node, right: right.left } };
    found.push(["sign-precedence", lost, "Without brackets only the first factor divides."]);
  }
  if (operator === "/") {
    found.push(["ratio-inverted", { ...node, left: right, right: left }, "The quotient is upside down."]);
  }
  if (operator === "-") {
    found.push([
      "sign-precedence",
      { ...node, operator: "+" },
      "A minus has become a plus, as in -x^2, which a spreadsheet reads as (-x)².",
    ]);
  }
  if (operator === "+" && left.kind === "number" && left.value === 1) {
    found.push(["sign-precedence", { ...node, operator: "-" }, "A plus has become a minus."]);
  }
  if (operator === "*" && left.kind === "number" && left.value === 2 && isPi(right)) {
    found.push(["angular-cyclic-mixup", number(1), turnsWhy]);
  } else if (operator === "*" && left.kind === "binary" && isTurn(left)) {
    found.push(["angular-cyclic-mixup", right, turnsWhy]);
  } else if (operator === "*" && left.kind === "number" && (left.value === 2 || left.value === 4)) {
    const half = mentions(right, new Set(["zeta", "eta"]));
    found.push([
      half ? "loss-factor-as-damping-ratio" : "constant-wrong",
      right,
      `The factor ${left.value} is missing.`,
    ]);
  }
  return found;
}

function changedCall(node: Node & { kind: "call" }): Change[] {
  const [first] = node.arguments;
  if (!first) return [];
  if (node.name === "SQRT") return [["square-root-missing", first, "The square root is left out."]];
  if (node.name === "ABS") {
    const negative: Node = { kind: "unary", operator: "neg", argument: first, ...place };
    const why = "Without the absolute value the result changes its sign at resonance.";
    return [
      ["absolute-value-missing", first, why],
      ["absolute-value-missing", negative, why],
    ];
  }
  return [];
}

function notSquared(inside: Node): Mistake {
  if (mentions(inside, damping)) return "damping-not-squared";
  return mentions(inside, ratio) ? "ratio-not-squared" : "square-root-missing";
}

const isPi = (node: Node): boolean => node.kind === "call" && node.name === "PI";
const isTurn = (node: Node): boolean =>
  node.kind === "binary" &&
  node.operator === "*" &&
  node.left.kind === "number" &&
  node.left.value === 2 &&
  isPi(node.right);

function mentions(node: Node, names: ReadonlySet<string>): boolean {
  let found = false;
  walk(node, (inner) => {
    if (inner.kind === "name" && names.has(inner.name)) found = true;
  });
  return found;
}

function withoutTurns(tree: Node): Node | null {
  let count = 0;
  const strip = (node: Node): Node => {
    if (isTurn(node)) {
      count++;
      return number(1);
    }
    const inside = children(node);
    return inside.length === 0 ? node : withChildren(node, inside.map(strip));
  };
  const stripped = strip(tree);
  return count > 1 ? stripped : null;
}

const strength: Readonly<Record<string, number>> = { "+": 1, "-": 1, "*": 2, "/": 2, "^": 3 };

/** The tree as spreadsheet text again, with the brackets that it needs. */
export function formulaText(node: Node, outer = 0): string {
  switch (node.kind) {
    case "number":
      return node.text;
    case "name":
      return node.name;
    case "unary":
      return node.operator === "pct" ? `${formulaText(node.argument, 4)}%` : `(-${formulaText(node.argument, 4)})`;
    case "call":
      return `${node.name}(${node.arguments.map((argument) => formulaText(argument)).join(",")})`;
    case "binary": {
      const own = strength[node.operator] ?? 0;
      const text = `${formulaText(node.left, own - 1)}${node.operator}${formulaText(node.right, own)}`;
      return own > outer ? text : `(${text})`;
    }
    default:
      return "?";
  }
}

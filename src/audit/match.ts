import type { NumberNode } from "../formula/nodes";
import { isRoundingOf } from "./constants";
import { type Cut, evaluateCut } from "./cut";
import { children, type Node, walk, withChildren } from "../formula/nodes";

export const close = 2e-6; // relative; cached values and text-borne complex numbers carry about 15 digits

/** Whether two sets of samples agree; samples without a value in `hand` are left out. */
export function ratioOf(hand: ArrayLike<number>, right: ArrayLike<number>, usable: readonly boolean[]): number | null {
  let ratio = NaN;
  for (let s = 0; s < hand.length; s++) {
    if (!usable[s]) continue;
    const here = hand[s]! / right[s]!;
    if (!(here - here === 0) || here === 0) return null;
    if (Number.isNaN(ratio)) ratio = here;
    else if (Math.abs(here / ratio - 1) > close * 2) return null;
  }
  return Number.isNaN(ratio) ? null : ratio;
}

export interface ConstantFinding {
  readonly typed: string;
  readonly exact: number;
  /** the typed digits are the exact constant rounded */
  readonly rounded: boolean;
}

/**
 * The number in the formula that has to be replaced to make it agree with the right values at every sample, if there is one,
 * and with what.
 */
export function constantBehind(
  cut: Cut,
  samples: readonly Float64Array[],
  right: ArrayLike<number>,
  usable: readonly boolean[],
): ConstantFinding | null {
  let best: ConstantFinding | null = null;
  const tried = exponentsOf(cut.tree);
  for (const literal of cut.literals) {
    if (tried.has(literal) || literal.value === 0 || (isStructural(literal) && literal.value !== 0.5)) continue;
    tried.add(literal);
    const exact = solve(cut, literal, samples, right, usable);
    if (exact === null) continue;
    const finding = { typed: literal.text, exact, rounded: isRoundingOf(literal.text, Number(literal.text), exact) };
    if (finding.rounded) return finding;
    if (isStructural(literal)) continue;
    const change = Math.abs(Math.log(exact / literal.value));
    if (change < 0.35 && (!best || change < Math.abs(Math.log(best.exact / Number(best.typed))))) best = finding;
  }
  return best;
}

/** Powers of ten, halves, exponents and exact conversions are part of a formula's structure, not constants of nature. */
const isStructural = ({ value }: NumberNode): boolean =>
  [1, 2, 0.5, 4, 10, 12, 60, 100, 180, 360, 1000, 3600, 1e6].includes(value);

/** The numbers in exponents; a root written as a power may stand for a rounded constant. */
function exponentsOf(tree: Node): Set<NumberNode> {
  const found = new Set<NumberNode>();
  walk(tree, (node) => {
    if (node.kind !== "binary" || node.operator !== "^") return;
    walk(node.right, (inner) => {
      if (inner.kind === "number" && inner.value !== 0.5) found.add(inner);
    });
  });
  return found;
}

function withLiteral(node: Node, literal: NumberNode, value: number): Node {
  if (node === literal) return { ...literal, value };
  const inside = children(node);
  return inside.length === 0
    ? node
    : withChildren(
        node,
        inside.map((child) => withLiteral(child, literal, value)),
      );
}

function solve(
  cut: Cut,
  literal: NumberNode,
  samples: readonly Float64Array[],
  right: ArrayLike<number>,
  usable: readonly boolean[],
): number | null {
  const first = usable.indexOf(true);
  if (first < 0) return null;
  const at = (value: number, s: number): number =>
    evaluateCut(cut, samples[s]!, withLiteral(cut.tree, literal, value)).value;
  let value = literal.value;
  for (let step = 0; step < 30; step++) {
    const here = at(value, first);
    const error = here - right[first]!;
    if (Math.abs(error) <= 1e-12 * Math.abs(right[first]!)) break;
    const slope = (at(value * (1 + 1e-6), first) - here) / (value * 1e-6);
    if (!(Math.abs(slope) > 0)) return null;
    const next = value - error / slope;
    if (!(next / literal.value > 0.4 && next / literal.value < 2.5)) return null;
    value = next;
  }
  for (let s = 0; s < samples.length; s++) {
    if (usable[s] && !(Math.abs(at(value, s) / right[s]! - 1) < close)) return null;
  }
  return value;
}

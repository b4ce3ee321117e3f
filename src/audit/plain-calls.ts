/** Calls of our functions inside a cell's formula, replaced by plain formulas. */
import { tokenize } from "@borgar/fx";
import { ownFunction } from "./ownCalls";
import { plainFormula } from "./plain";
import { isRange, type Placed } from "./plain-place";
import { bracketed } from "./plain-substitute";

export interface PlainText {
  /** the formula without "="; where nothing could be replaced, as it was */
  readonly formula: string;
  /** names of the functions that were replaced */
  readonly replaced: readonly string[];
  /** functions that have none here, and why; one is enough to leave the cell as it is */
  readonly kept: readonly { readonly id: string; readonly reason: string }[];
  /** whether an argument is a range, so that the formula must be an array formula */
  readonly ranges: boolean;
}

/**
 * A formula (without "=") with our functions replaced, those inside their arguments too.
 * @param place for one cell of a spilled call: its row and column there, from 0
 */
export function plainText(formula: string, place?: Placed): PlainText {
  const replaced: string[] = [];
  const kept: { id: string; reason: string }[] = [];
  let ranges = false;
  const text = rewrite(formula);
  return { formula: kept.length > 0 ? formula : text, replaced: kept.length > 0 ? [] : replaced, kept, ranges };

  function rewrite(part: string): string {
    let result = part;
    for (const call of callsIn(part).reverse()) {
      const texts = call.arguments.map((argument) => rewrite(argument).trim() || null);
      const plain = plainFormula(call.id, texts, place);
      if ("none" in plain) {
        kept.push({ id: call.id, reason: plain.none });
        continue;
      }
      replaced.push(call.id);
      if (!place) ranges ||= call.arguments.some(isRange);
      const whole = call.start === 0 && call.end === part.length;
      const written = whole ? plain.formula : bracketed(plain.formula);
      result = result.slice(0, call.start) + written + result.slice(call.end);
    }
    return result;
  }
}

/** Whether a formula is one call of one of our functions and nothing else. */
export function isOneCall(formula: string): boolean {
  const [first] = callsIn(formula.trim());
  return first !== undefined && first.start === 0 && first.end === formula.trim().length;
}

/** Whether a formula has a call of one of our functions. */
export const hasOwnCall = (formula: string): boolean => callsIn(formula).length > 0;

interface Call {
  readonly id: string;
  readonly start: number;
  readonly end: number;
  /** as they stand between the commas */
  readonly arguments: readonly string[];
}

interface Token {
  readonly type: string;
  readonly value: string;
  readonly loc?: readonly number[];
}

/** The outermost calls of our functions, from left to right. */
function callsIn(formula: string): Call[] {
  const tokens = tokensOf(formula);
  const found: Call[] = [];
  for (let i = 0; i < tokens.length; i++) {
    const id = tokens[i]!.type === "func" ? ownFunction(tokens[i]!.value) : undefined;
    if (id === undefined || tokens[i + 1]?.value !== "(") continue;
    const close = closing(tokens, i + 1);
    if (close === undefined) return found; // a formula that does not close is left alone
    found.push({
      id,
      start: tokens[i]!.loc![0]!,
      end: tokens[close.at]!.loc![1]!,
      arguments: close.arguments.map(([from, to]) => formula.slice(from, to)),
    });
    i = close.at;
  }
  return found;
}

function tokensOf(formula: string): Token[] {
  try {
    return tokenize(formula, { withLocation: true, mergeRefs: true, negativeNumbers: false }) as Token[];
  } catch {
    return [];
  }
}

/** The bracket that closes the one at `open`, and the stretches of text between its commas. */
function closing(tokens: readonly Token[], open: number): { at: number; arguments: [number, number][] } | undefined {
  const stretches: [number, number][] = [];
  let depth = 0;
  let from = tokens[open]!.loc![1]!;
  for (let at = open; at < tokens.length; at++) {
    const { type, value, loc } = tokens[at]!;
    if (type !== "operator") continue;
    if (value === "(" || value === "{") depth++;
    if (value === ")" || value === "}") depth--;
    if ((value === "," && depth === 1) || depth === 0) {
      stretches.push([from, loc![0]!]);
      from = loc![1]!;
    }
    if (depth === 0) return { at, arguments: stretches };
  }
  return undefined;
}

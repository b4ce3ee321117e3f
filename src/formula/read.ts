import { tokenize } from "@borgar/fx";
import type { Node, Problem } from "./nodes";
import { binaryOperators, postfixOperators, prefixOperators, prefixPower } from "./operators";
import { readReference, readStructured } from "./references";

interface Token {
  readonly type: string;
  readonly value: string;
  readonly start: number;
  readonly end: number;
}

export interface Formula {
  readonly tree: Node;
  readonly problems: readonly Problem[];
}

const longest = 8192; // a spreadsheet's own limit for a formula
const deepest = 200; // nesting beyond this is not read: a formula in a spreadsheet nests 64 deep at most

/** Reads a spreadsheet formula, with or without "=". Never throws: what cannot be read is `missing` and a problem. */
export function readFormula(text: string): Formula {
  const problems: Problem[] = [];
  const tokens = text.length > longest ? null : tokensOf(text);
  if (!tokens) {
    return { tree: missing(0, 0), problems: [{ start: 0, end: text.length, message: "cannot be read" }] };
  }
  const reader = new Reader(tokens, text.length, problems);
  const tree = reader.expression(0, 0);
  reader.expectEnd();
  return { tree, problems };
}

function tokensOf(text: string): Token[] | null {
  try {
    return tokenize(text, { withLocation: true, mergeRefs: true, negativeNumbers: false })
      .filter((token) => token.type !== "whitespace" && token.type !== "newline" && token.type !== "fx_prefix")
      .map((token) => ({ type: token.type, value: token.value, start: token.loc?.[0] ?? 0, end: token.loc?.[1] ?? 0 }));
  } catch {
    return null;
  }
}

const missing = (start: number, end: number): Node => ({ kind: "missing", start, end });

/** Operator precedence reading, one token ahead. */
class Reader {
  private at = 0;

  constructor(
    private readonly tokens: readonly Token[],
    private readonly length: number,
    private readonly problems: Problem[],
  ) {}

  expression(power: number, depth: number): Node {
    if (depth > deepest) return this.giveUp();
    let left = this.operand(depth);
    for (;;) {
      const token = this.tokens[this.at];
      if (!token || token.type !== "operator") return left;
      const postfix = postfixOperators[token.value];
      if (postfix) {
        this.at++;
        left = { kind: "unary", operator: postfix, argument: left, start: left.start, end: token.end };
        continue;
      }
      const strength = binaryOperators[token.value];
      if (strength === undefined || strength <= power) return left;
      this.at++;
      const right = this.expression(strength, depth + 1);
      left = { kind: "binary", operator: token.value, left, right, start: left.start, end: right.end };
    }
  }

  expectEnd(): void {
    const rest = this.tokens[this.at];
    if (rest) this.problem(rest.start, this.length, `unexpected "${rest.value.slice(0, 20)}"`);
  }

  private operand(depth: number): Node {
    const token = this.tokens[this.at];
    if (!token) return this.problem(this.length, this.length, "something is missing at the end");
    const { start, end, value } = token;
    switch (token.type) {
      case "number":
        this.at++;
        return { kind: "number", value: Number(value), text: value, start, end };
      case "string":
        this.at++;
        if (value.length < 2 || !value.endsWith('"')) this.problem(start, end, "text without a closing quote");
        return { kind: "text", value: value.replace(/^"|"$/g, "").replaceAll('""', '"'), start, end };
      case "bool":
        this.at++;
        return { kind: "boolean", value: value.toUpperCase() === "TRUE", start, end };
      case "error":
        this.at++;
        return { kind: "error", value, start, end };
      case "range":
      case "range_beam":
      case "range_ternary":
        this.at++;
        return readReference(value, start, end);
      case "range_named":
        this.at++;
        return /[![]/.test(value) && !/^[^[\]]*!/.test(value)
          ? { kind: "external", text: value, start, end }
          : { kind: "name", name: value, start, end };
      case "structured":
        this.at++;
        return readStructured(value, start, end);
      case "func":
        return this.call(token, depth);
      case "operator":
        return this.prefixed(token, depth);
      case "unknown":
        this.at++;
        // R and C are no names in Excel, but in other programs and in our own formulas they are
        if (/^[\p{L}_][\p{L}\d_.]*$/u.test(value)) return { kind: "name", name: value, start, end };
        return this.problem(start, end, `"${value.slice(0, 20)}" is not understood`);
      default:
        this.at++;
        return this.problem(start, end, `"${value.slice(0, 20)}" is not understood`);
    }
  }

  private prefixed(token: Token, depth: number): Node {
    const operator = prefixOperators[token.value];
    if (operator) {
      this.at++;
      const argument = this.expression(prefixPower, depth + 1);
      return { kind: "unary", operator, argument, start: token.start, end: argument.end };
    }
    if (token.value === "(") {
      this.at++;
      const inside = this.expression(0, depth + 1);
      return { ...inside, start: token.start, end: this.close(")", token) };
    }
    if (token.value === "{") return this.array(token, depth);
    return this.problem(token.start, token.start, `something is missing before "${token.value}"`);
  }

  private call(name: Token, depth: number): Node {
    this.at += 2; // the name and its bracket: the tokenizer calls a word a function only where a bracket follows
    const found: Node[] = [];
    let end = name.end;
    for (;;) {
      const token = this.tokens[this.at];
      if (token?.value === ")" && token.type === "operator") {
        if (found.length > 0) found.push(missing(token.start, token.start));
        this.at++;
        end = token.end;
        break;
      }
      if (token?.value === "," && token.type === "operator") {
        found.push(missing(token.start, token.start));
        this.at++;
        continue;
      }
      found.push(this.expression(0, depth + 1));
      const after = this.tokens[this.at];
      if (after?.value === "," && after.type === "operator") {
        this.at++;
        continue;
      }
      end = this.close(")", name);
      break;
    }
    return { kind: "call", name: functionName(name.value), arguments: found, start: name.start, end };
  }

  private array(open: Token, depth: number): Node {
    this.at++;
    const rows: Node[][] = [[]];
    for (;;) {
      rows[rows.length - 1]!.push(this.expression(0, depth + 1));
      const token = this.tokens[this.at];
      if (token?.value === ",") this.at++;
      else if (token?.value === ";") {
        this.at++;
        rows.push([]);
      } else break;
    }
    const end = this.close("}", open);
    return { kind: "array", rows, start: open.start, end };
  }

  private close(bracket: string, open: Token): number {
    const token = this.tokens[this.at];
    if (token?.value === bracket && token.type === "operator") {
      this.at++;
      return token.end;
    }
    if (this.problems.length === 0) this.problem(open.start, open.end, `the bracket "${bracket}" is missing`);
    return token?.start ?? this.length;
  }

  private giveUp(): Node {
    this.at = this.tokens.length;
    return this.problem(0, this.length, "nested too deeply");
  }

  private problem(start: number, end: number, message: string): Node {
    this.problems.push({ start, end, message });
    return missing(start, end);
  }
}

/** SUM for "_xlfn.sum"; PLINTH.ABSTRANS for "_xldudf_PLINTH_ABSTRANS". */
function functionName(text: string): string {
  const name = text.toUpperCase().replace(/^_XLFN\.(_XLWS\.)?/, "");
  return name.replace(/^_XLDUDF_([A-Z0-9]+)_/, "$1.");
}

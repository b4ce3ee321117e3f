/** A formula's tree as mathematics: one walk, two notations (LaTeX for typesetting, one line of text for pasting). */
import type { Node } from "../formula/nodes";
import { readFormula } from "../formula/read";

/** How a name or number is written; precedence decides where brackets go. */
interface Notation {
  name(name: string): string;
  number(text: string): string;
  fraction(above: string, below: string): string;
  product(left: string, right: string, rightIsNumber: boolean): string;
  power(base: string, exponent: string): string;
  root(inside: string): string;
  magnitude(inside: string): string;
  brackets(inside: string): string;
  call(name: string, inside: string[]): string;
  readonly pi: string;
  readonly percent: string;
  /** whether a fraction needs no brackets around what stands above and below */
  readonly stacked: boolean;
}

const SUM = 1;
const PRODUCT = 2;
const NEGATIVE = 3;
const POWER = 4;
const ATOM = 5;

type Written = readonly [text: string, precedence: number];

/** What stands for a name: text in the notation, or the number put in with its unit. */
export interface Quantity {
  readonly symbol?: string;
  readonly value?: string;
  readonly unit?: string;
}
export type Quantities = (name: string) => Quantity;

/** The formula in LaTeX, each name replaced by what `quantities` says of it; null if it cannot be read. */
export function latexOf(formula: string, quantities: Quantities = symbolOnly): string | null {
  return write(formula, latex(quantities));
}

/** The formula on one line of text. */
export function textOf(formula: string, quantities: Quantities = symbolOnly): string | null {
  return write(formula, plain(quantities));
}

const symbolOnly: Quantities = () => ({});

function write(formula: string, notation: Notation): string | null {
  const { tree, problems } = readFormula(formula);
  return problems.length > 0 ? null : walk(tree, notation)[0];
}

function walk(node: Node, notation: Notation): Written {
  switch (node.kind) {
    case "number":
      return [notation.number(node.text), ATOM];
    case "name":
      return [notation.name(node.name), ATOM];
    case "text":
      return [`"${node.value}"`, ATOM];
    case "unary": {
      const inside = walk(node.argument, notation);
      if (node.operator === "pct") return [bracketed(inside, ATOM, notation) + notation.percent, ATOM];
      return [`${node.operator === "neg" ? "−" : ""}${bracketed(inside, POWER, notation)}`, NEGATIVE];
    }
    case "binary":
      return binary(node.operator, node.left, node.right, notation);
    case "call":
      return call(node.name, node.arguments, notation);
    default:
      return ["?", ATOM];
  }
}

function binary(operator: string, leftNode: Node, rightNode: Node, notation: Notation): Written {
  const left = walk(leftNode, notation);
  const right = walk(rightNode, notation);
  switch (operator) {
    case "+":
      return [`${left[0]} + ${bracketed(right, SUM, notation)}`, SUM];
    case "-":
      return [`${left[0]} − ${bracketed(right, PRODUCT, notation)}`, SUM];
    case "*": {
      const number = /^[\d.]/.test(right[0]);
      return [
        notation.product(bracketed(left, PRODUCT, notation), bracketed(right, PRODUCT, notation), number),
        PRODUCT,
      ];
    }
    case "/":
      if (notation.stacked) return [notation.fraction(left[0], right[0]), PRODUCT];
      return [notation.fraction(bracketed(left, PRODUCT, notation), bracketed(right, NEGATIVE, notation)), PRODUCT];
    case "^":
      if (rightNode.kind === "number" && rightNode.value === 0.5) return [notation.root(left[0]), ATOM];
      return [notation.power(bracketed(left, ATOM, notation), right[0]), POWER];
    default:
      return [`${left[0]} ${operator} ${right[0]}`, 0];
  }
}

function call(name: string, inside: readonly Node[], notation: Notation): Written {
  const written = inside.map((argument) => walk(argument, notation)[0]);
  if (name === "PI") return [notation.pi, ATOM];
  if (name === "SQRT" && written.length === 1) return [notation.root(written[0]!), ATOM];
  if (name === "ABS" && written.length === 1) return [notation.magnitude(written[0]!), ATOM];
  return [notation.call(name.toLowerCase(), written), ATOM];
}

/** In brackets where the operator outside binds tighter. A stacked fraction counts as an atom only under a product. */
function bracketed([text, precedence]: Written, least: number, notation: Notation): string {
  return precedence >= least ? text : notation.brackets(text);
}

const GREEK =
  /^(alpha|beta|gamma|delta|epsilon|zeta|eta|theta|kappa|lambda|mu|nu|xi|pi|rho|sigma|tau|phi|chi|psi|omega|Delta|Lambda|Omega|Sigma|Phi)/;

/** "fn" as f with subscript n, "zeta" as the Greek letter, "peak" as a word. */
function symbolParts(name: string): [base: string, index: string] {
  const greek = GREEK.exec(name)?.[1];
  if (greek === undefined && /^[A-Za-z]{4,}$/.test(name)) return [name, ""];
  const base = greek ?? name[0]!;
  return [base, name.slice(base.length).replace(/^_/, "")];
}

const LETTERS: Record<string, string> = Object.fromEntries(
  [
    ..."alpha α beta β gamma γ delta δ epsilon ε zeta ζ eta η theta θ kappa κ lambda λ mu μ nu ν xi ξ pi π rho ρ".split(
      " ",
    ),
    ..."sigma σ tau τ phi φ chi χ psi ψ omega ω Delta Δ Lambda Λ Omega Ω Sigma Σ Phi Φ".split(" "),
  ].reduce<string[][]>((pairs, word, i, all) => (i % 2 ? pairs : [...pairs, [word, all[i + 1]!]]), []),
);

function latex(quantities: Quantities): Notation {
  return {
    name: (name) => {
      const { symbol = name, value, unit } = quantities(name);
      if (value !== undefined) return latexNumber(value) + (unit ? `\\,\\mathrm{${latexUnit(unit)}}` : "");
      const [base, index] = symbolParts(symbol);
      const letter = GREEK.test(base) ? `\\${base}` : base.length > 1 ? `\\mathrm{${base}}` : base;
      return index === "" ? letter : `${letter}_{\\mathrm{${index}}}`;
    },
    number: latexNumber,
    fraction: (above, below) => `\\frac{${above}}{${below}}`,
    product: (left, right, number) => `${left}${number ? " \\cdot " : "\\,"}${right}`,
    power: (base, exponent) => `${base}^{${exponent}}`,
    root: (inside) => `\\sqrt{${inside}}`,
    magnitude: (inside) => `\\left|${inside}\\right|`,
    brackets: (inside) => `\\left(${inside}\\right)`,
    call: (name, inside) => `\\operatorname{${name}}\\left(${inside.join(",\\;")}\\right)`,
    pi: "\\pi ",
    percent: "\\%",
    stacked: true,
  };
}

const latexNumber = (text: string): string =>
  text.replace(",", "{,}").replace(/[eE]([-+]?\d+)$/, (_, power: string) => ` \\cdot 10^{${Number(power)}}`);

const latexUnit = (unit: string): string => unit.replace(/%/g, "\\%").replace(/·/g, "\\cdot ").replace(/²/g, "^2");

function plain(quantities: Quantities): Notation {
  return {
    name: (name) => {
      const { symbol = name, value, unit } = quantities(name);
      if (value !== undefined) return unit ? `${value} ${unit}` : value;
      const [base, index] = symbolParts(symbol);
      return (LETTERS[base] ?? base) + (index.length > 2 ? `_${index}` : index);
    },
    number: (text) => text,
    fraction: (above, below) => `${above}/${below}`,
    product: (left, right) => `${left}·${right}`,
    power: (base, exponent) => base + ({ "2": "²", "3": "³" }[exponent] ?? `^${exponent}`),
    root: (inside) => `√(${inside})`,
    magnitude: (inside) => `|${inside}|`,
    brackets: (inside) => `(${inside})`,
    call: (name, inside) => `${name}(${inside.join("; ")})`,
    pi: "π",
    percent: "%",
    stacked: false,
  };
}

import type { Cut } from "./cut";
import type { Stated } from "./explain";
import { exactConstant } from "./constants";
import type { Meaning } from "./meaning";
import type { Role } from "./roles";
import { gravity } from "./units";
import { plainText } from "./words";

const randomRoles = /^(grms|zrms|[XUZ]|[XUZ]a|F|Fs|Fd|F[sd]?Each)$/;
export const ofRandomMotion = (role: Role): boolean => randomRoles.test(role);

/** The multiple of the rms value that a label names: 3 for "3σ". */
export function sigmasIn({ label, unit }: Meaning): number | null {
  const found = /(\d(?:\.\d+)?|\b(?:two|zwei|deux)|\b(?:three|drei|trois))\s*-?\s*(?:x\s*)?sigma/.exec(
    plainText(`${label} ${unit?.text ?? ""}`),
  );
  if (!found) return null;
  return /^\d/.test(found[1]!) ? Number(found[1]) : /^t?(wo|zwei|deux)/.test(found[1]!) ? 2 : 3;
}

const named: readonly (readonly [RegExp, Role, number])[] = [
  [/\b(?:n|mounts|no\.?|anzahl)\s*=\s*(\d{1,2})\b/g, "n", 1],
  [/\b(\d{1,2})\s*(?:x\s*)?(?:mounts|springs|isolators|pads|lager|federn|plots|ressorts|feet)\b/g, "n", 1],
  [/\b(?:zeta|xi|d|damping|dampfung|amortissement)\s*=?\s*(0?[.,]\d+)(?!\s*%)/g, "zeta", 1],
  [/\b(?:zeta|xi|d|damping|dampfung|amortissement)\s*=?\s*(\d+(?:[.,]\d+)?)\s*%/g, "zeta", 0.01],
  [/\b(?:eta|loss factor)\s*=?\s*(0?[.,]\d+)/g, "eta", 1],
  [/\bq\s*=\s*(\d+(?:[.,]\d+)?)/g, "Q", 1],
  [/\b(?:kappa|kdyn\/kstat|dyn\/stat)\s*=?\s*(\d(?:[.,]\d+)?)/g, "kappa", 1],
  [/\b(?:fn|f0)\s*=\s*(\d+(?:[.,]\d+)?)\s*(?:hz)?/g, "fn", 1],
  [/\b(\d{1,2})(?:st|nd|rd|th|\.|e|eme)?\s*(?:harmoni\w*|order|ordnung|ordre)\b/g, "blades", 1],
  [/\b(?:t|tr)\s*=\s*(0?[.,]\d+)/g, "T", 1],
  [/\b(?:t|tr)\s*=\s*(\d+)\s*%/g, "T", 0.01],
  [/(\d{2}(?:[.,]\d+)?)\s*%/g, "E", 0.01],
  [/\b(\d+(?:[.,]\d+)?)\s*hz\b/g, "f", 1],
  [/\b(\d+(?:[.,]\d+)?)\s*hz\b/g, "fn", 1],
  [/\b(\d+(?:[.,]\d+)?)\s*g2\/hz\b/g, "S", gravity * gravity],
  [/\b(?:for|fur|pour|at|@)\s*(\d+(?:[.,]\d+)?)\s*hz\b/g, "fn", 1],
  [/\b(\d+)\s*(?:\/\s?min|rpm|1\/min|u\/min|tr\/min)\b/g, "f", 1 / 60],
];

/** Numbers that a label states beside its words: "@ 90 %", "(n = 4)", "ζ = 0.05". */
export function statedIn(text: string): Stated[] {
  const found: Stated[] = [];
  for (const [pattern, role, factor] of named) {
    for (const match of text.matchAll(pattern)) {
      found.push({ role, value: Number(match[1]!.replace(",", ".")) * factor, cost: 0.02 });
    }
  }
  return found.slice(0, 6);
}

/** Numbers inside a formula that can be inputs rather than constants: a damping ratio, a number of mounts. */
export function statedBy(cut: Cut): Stated[] {
  const found: Stated[] = [];
  for (const { value, text } of cut.literals) {
    if (exactConstant(text, value) !== value || value <= 0) continue;
    const add = (role: Role, cost: number, size = value): void => {
      if (!found.some((other) => other.role === role && other.value === size)) found.push({ role, value: size, cost });
    };
    if (value < 0.7) {
      for (const role of ["zeta", "eta", "T"] as const) add(role, 0.05);
    }
    if (value < 0.7) add("S", 0.06, value * gravity * gravity);
    if (value > 0.5 && value < 1) add("E", 0.05);
    if (Number.isInteger(value) && value >= 3 && value <= 24 && value !== 10) add("n", 0.05);
    if (Number.isInteger(value) && value > 1 && value <= 50) add("cycles", 0.06);
    if (value > 1 && value < 3 && !Number.isInteger(value)) add("kappa", 0.06);
  }
  return found.slice(0, 8);
}

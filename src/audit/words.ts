import { parseUnit, type Unit } from "./units";

const greek: Readonly<Record<string, string>> = {
  "−": "-",
  "–": "-",
  α: "alpha",
  β: "beta",
  γ: "gamma",
  δ: "delta",
  Δ: "delta",
  ε: "epsilon",
  ζ: "zeta",
  η: "eta",
  θ: "theta",
  ϑ: "theta",
  κ: "kappa",
  λ: "lambda",
  Λ: "Lambda",
  μ: "mu",
  ν: "nu",
  ξ: "xi",
  π: "pi",
  ρ: "rho",
  σ: "sigma",
  τ: "tau",
  φ: "phi",
  ϕ: "phi",
  Φ: "phi",
  χ: "chi",
  ψ: "psi",
  ω: "omega",
  Ω: "Omega",
  "₀": "0",
  "₁": "1",
  "₂": "2",
  ₙ: "n",
  ₑ: "e",
  ₛ: "s",
  "²": "2",
  "³": "3",
};

const spelled = (text: string): string =>
  text.replace(/[^\x20-\x7e\u00c0-\u017f]/gu, (letter) => greek[letter] ?? letter);

/** Lower case, Greek spelled out, accents gone: what name patterns are written for. */
export function plainText(text: string): string {
  return spelled(text)
    .replace(/ß/g, "ss")
    .replace(/œ/g, "oe")
    .normalize("NFD")
    .replace(/[\u0300-\u036f]/g, "")
    .replace(/[’`´]/g, "'")
    .toLowerCase()
    .replace(/(\d)(?=sigma)/g, "$1 ")
    .replace(/_/g, " ")
    .replace(/\s+/g, " ")
    .trim();
}

/** A symbol without blanks, underscores and brackets, case kept: "f_n" and "f n" are fn. */
export const symbolText = (text: string): string => spelled(text.replace(/²/g, "2")).replace(/[\s_{}:=$*·]/g, "");

/** How an oscillating amplitude is stated; as a factor on the peak value. */
export type AmplitudeKind = "peak" | "rms" | "peak-to-peak";

export const peakOf: Readonly<Record<AmplitudeKind, number>> = { peak: 1, rms: Math.SQRT2, "peak-to-peak": 0.5 };

/** The amplitude kind that a text names. */
export function amplitudeKind(text: string): AmplitudeKind | null {
  const plain = plainText(text);
  if (
    /\bp-?p\b|\bpk\W*(-|to)?\W*pk\b|peak\W*(-|to)*\W*peak|crete\W*a\W*crete|\bc-c\b|spitze\W*(-|zu)?\W*spitze|\bss\b|\bptp\b|double ampl|\bd\.?a\b\.?|doppelamplitude|\bdouble\b/.test(
      plain,
    )
  ) {
    return "peak-to-peak";
  }
  if (/\brms\b|\beff\b|effektivwert|efficace|\br\.m\.s/.test(plain)) return "rms";
  if (
    /\bpk\b|\bpeak\b|\b0-?p\b|0-?pk|\bcrete\b|scheitel|spitze|\bs\.?a\.?\b|zero.to.peak|\bamplitude\b|\bampl\b|\bmax\b/.test(
      plain,
    )
  )
    return "peak";
  return null;
}

export interface Split {
  /** the label without its unit */
  readonly name: string;
  readonly unit: Unit | null;
  /** the unit stands in brackets or after a comma, so it is no word of the name */
  readonly explicit?: boolean;
}

const remarks =
  /^(pk|peak|pk-pk|p-p|pp|0-p|0-pk|rms|eff|eff\.|each|ea|ea\.|total|tot|tot\.|je|pro|par|per|of|de|du|crit\.?|critical|krit\.?|kritisch|critique|lager|mount|mounts|plot|spring|unit|isolator|feder|ressort|abs|abs\.|rel|rel\.|crête|efficace|à|re|lag|all|max|max\.|amplitude|static|dynamic|gesamt|p|stat\.?|dyn\.?|peak-to-peak|d\.a\.|da|s-s|ss|spitze|scheitel|0-s|c-c|nacheilend|retard|late|flat|avg|mean|nominal|dynamic)$/i;

const kindWords = /^(pk|peak|pk-pk|p-p|pp|0-p|0-pk|rms|eff\.?|efficace|d\.a\.|da|s-s|ss|peak-to-peak|each|ea\.?|\d+)$/i;

/** A unit that may be followed by remarks: "N/mm each", "% of critical", "µm p-p". */
export function unitPhrase(text: string): Unit | null {
  if (/^v?db\b/i.test(text.trim())) return parseUnit("dB");
  const words = text
    .trim()
    .replace(/\s+of an? \w+$/i, "")
    .replace(/\/\s*(mount|isolator|spring|pad|unit|foot|lager|feder|plot|ressort|each|ea)\b\.?/i, " per $1")
    .split(/\s+/);
  for (let count = Math.min(words.length, 3); count > 0; count--) {
    const rest = words.slice(count);
    if (!rest.every((word) => remarks.test(word.replace(/[,;]$/, "")) || /^[\d.]+$/.test(word))) continue;
    const start = words.slice(0, count).join(" ").replace(/[,;]$/, "");
    if (start === "in" && rest.some((word) => !kindWords.test(word))) continue; // "in mounts"
    const unit = parseUnit(start);
    if (unit) return rest.length === 0 ? unit : { ...unit, text: text.trim() };
  }
  return null;
}

const isSymbolLike = (text: string): boolean => /^(n|N|m|t|g|s|h|d|1|j|min|rev|to|G|-|–|—)$/.test(text);

/** The ways to read a label as a name and a unit, the most likely first. */
export function splitLabel(text: string): Split[] {
  const found = splitOnce(text);
  // a remark in brackets, or a condition such as "@ 90 %", may stand behind the unit
  const bare = text.replace(/\s*(\([^()]*\)|\[[^[\]]*\]|@.*$)/g, "").trim();
  if (bare !== "" && bare !== text) found.push(...splitOnce(bare).filter(({ unit }) => unit !== null));
  return found;
}

function splitOnce(text: string): Split[] {
  const found: Split[] = [];
  const isList = /\b[a-z]\s*,\s*[a-z]$/i.test(text); // "with c, k, m"
  const add = (name: string, unit: Unit | null, explicit = false): void => {
    if (unit && !isList) found.push({ name: name.replace(/[\s,;:/]+$/, "").trim(), unit, explicit });
  };
  for (const { 0: whole, 1: inside, index } of [
    ...text.matchAll(/[[(<{]([^[\](){}<>]*(?:\([^()]*\)[^[\](){}<>]*)*)[\])>}]/g),
  ].reverse()) {
    if (/[√*^/]\s*$/.test(text.slice(0, index))) continue; // a formula in the name, such as 5/√(cm)
    add(text.slice(0, index) + " " + text.slice(index + whole.length), unitPhrase(inside!), true);
  }
  const power = /\[(\([^\]]*\)[^\]]*)\]/.exec(text) ?? /(?:^|\s)(\([^()\s]+\)\^?[²2]\/\w+)/.exec(text);
  if (power) add(text.replace(power[0], " "), unitPhrase(power[1]!), true);
  for (const separator of [",", ";", " in ", " - ", " / ", ":", "|", "="]) {
    const at = text.lastIndexOf(separator);
    if (at > 0) add(text.slice(0, at), unitPhrase(text.slice(at + separator.length)), separator === ",");
  }
  const parts = text.split(/,\s+/);
  for (let i = 1; i < parts.length - 1; i++) {
    add([...parts.slice(0, i), ...parts.slice(i + 1)].join(", "), parseUnit(parts[i]!), true);
  }
  const slash = text.indexOf("/");
  if (slash > 0 && slash < 12 && !/\s/.test(text)) {
    const below = text.slice(slash + 1).replace(/^\((.*)\)$/, "$1");
    const unit = parseUnit(below);
    if (unit && !isSymbolLike(below)) add(text.slice(0, slash), unit);
  }
  const words = text.trim().split(/\s+/);
  for (let count = Math.min(4, words.length - 1); count > 0; count--) {
    const tail = words.slice(words.length - count).join(" ");
    const unit = unitPhrase(tail);
    if (unit) add(words.slice(0, words.length - count).join(" "), unit);
  }
  // a unit in the middle: "lid µm rms, floor mounted"
  words.forEach((word, i) => {
    if (i === 0 || i === words.length - 1 || word.length < 2 || /^in$|^to$|^min\.?$|^h$/i.test(word)) return;
    const unit = parseUnit(word.replace(/[,;]$/, ""));
    if (unit && unit.dimension !== "other" && unit.dimension !== "number")
      add([...words.slice(0, i), ...words.slice(i + 1)].join(" "), unit);
  });
  const inG =
    /^(.*?)(?:^|\s)g(?=\s+(?:rms|pk|peak)\b)(.*)$/i.exec(text.trim()) ??
    /^(.*\brms) g\b(.*)$/.exec(text.trim()) ??
    /^()g (?!in\/)([a-z]{2,}.*)$/.exec(text.trim());
  if (inG) add(`${inG[1]!} ${inG[2]!}`, parseUnit("gn"));
  if (/%/.test(text) && !/\d\s*%/.test(text)) add(text.replace(/%.*?(?=\s|$)/, ""), parseUnit("%"));
  if (/\bg?rms\b/i.test(text) && /^g\s?rms$/i.test(text.trim())) add("grms", parseUnit("gn"));
  const leading = /^(\S+)\s+(?:rms|pk|peak|p-p|pk-pk|0-p|eff\.?|efficace|crête)\s+(.+)$/i.exec(text.trim());
  if (leading) add(leading[2]!, parseUnit(leading[1]!));
  const alone = unitPhrase(text);
  if (alone && !isSymbolLike(text.trim()))
    found.unshift({ name: /rpm|min|hz|db|%/i.test(text) ? text : "", unit: alone });
  found.push({ name: text, unit: null });
  return found;
}

/** The text is a unit and nothing else: an entry of a unit row or column. */
export function isUnitOnly(text: string): Unit | null {
  const inner = text.trim().replace(/^[[(]([^\])]*)[\])](?=\s|$)/, "$1");
  return unitPhrase(inner);
}

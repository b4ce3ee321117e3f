import { cellAt, type Book } from "./book";
import { type Labels, labelsOf } from "./labels";
import { motionRoles } from "./motion-words";
import { type Role, type RoleEntry, roles } from "./roles";
import { type Dimension, parseUnit, type Unit } from "./units";
import { type AmplitudeKind, amplitudeKind, isUnitOnly, plainText, splitLabel, symbolText } from "./words";

export interface Candidate {
  readonly role: Role;
  /** strength of the words: 7 and more is explicit, 3 to 6 probable, below 3 only the unit speaks for it */
  readonly weight: number;
}

/** What the labels say that a cell means. */
export interface Meaning {
  readonly candidates: readonly Candidate[];
  readonly unit: Unit | null;
  readonly kind: AmplitudeKind | null;
  /** all words read, for flags */
  readonly text: string;
  /** the same without the title of the block */
  readonly words?: string;
  readonly label: string;
  /** what speaks against this reading of the labels */
  readonly penalty?: number;
}

const none: Meaning = { candidates: [], unit: null, kind: null, text: "", label: "" };
const percentFormat = /%/;

/** Reads the labels around a cell. */
export function meaningOf(book: Book, sheet: number, row: number, column: number): Meaning {
  const labels = labelsOf(book, sheet, row, column);
  const readings = readingsOf(labels);
  let best = none;
  let bestWeight = -1;
  for (const reading of readings) {
    const weight = (reading.candidates[0]?.weight ?? 0) + (reading.unit ? 0.5 : 0) - (reading.penalty ?? 0);
    if (weight > bestWeight) {
      best = reading;
      bestWeight = weight;
    }
  }
  const format = cellAt(book, sheet, row, column)?.format;
  if (format && percentFormat.test(format) && best.unit?.dimension === "number") {
    best = { ...best, unit: { ...best.unit, factor: 1 } };
  } else if (
    format &&
    percentFormat.test(format) &&
    !best.unit &&
    best.candidates.some(({ role }) => roles[role].dimension === "number")
  ) {
    best = { ...best, unit: { dimension: "number", factor: 1, text: "%" } };
  } else if (format && percentFormat.test(format) && !best.unit) best = { ...best, candidates: [] };
  if (labels.name && labels.name !== best.label) {
    const named = read(labels.name.replace(/_/g, " "), null, []);
    const first = named.candidates[0];
    // a unit beside the cell says more than a short name
    const contrary = first !== undefined && best.unit !== null && !named.unit && !fits(first.role, best.unit);
    if (!contrary && (first?.weight ?? 0) > (best.candidates[0]?.weight ?? 0) + 1) {
      const unit = named.unit ?? best.unit;
      best = {
        ...named,
        unit: unit && fits(named.candidates[0]!.role, unit) ? unit : null,
        kind: best.kind ?? named.kind,
      };
    }
  }
  return best;
}

function readingsOf(labels: Labels): Meaning[] {
  const found: Meaning[] = [];
  if (labels.corner !== null) {
    const axis = axisOf(labels.corner, labels.axis);
    if (axis) return [read(axis, null, [])];
    if (labels.title !== null) found.push(read(labels.title, null, []));
  }
  if (labels.above.length > 0) {
    const reading = readTexts(labels.above, null, labels.title);
    // text above a gap is the header of another block, if the row has a name of its own
    const elsewhere = labels.alongRows || labels.namedRight || (labels.aboveApart && labels.left.length > 0);
    found.push(elsewhere ? { ...reading, penalty: labels.aboveApart ? 8 : 5 } : reading);
  }
  if (labels.namedRight) found.push(read(...unitFirst(labels.right!), []));
  if (labels.left.length > 0) {
    const reading = readTexts(upToUnit(labels.left), labels.right, null, labels.unitAtEnd);
    // beside a headed column the text at the left is the row's name: "A", "M1"
    const inColumn = labels.downColumns && !labels.aboveApart;
    const isRowName =
      inColumn ||
      (labels.above.length > 0 &&
        !labels.alongRows &&
        ((reading.label.length <= 3 && labels.left.length === 1) || (found[0]?.candidates[0]?.weight ?? 0) >= 4));
    const headed = labels.above.length > 0 && !labels.aboveApart;
    const beside = headed ? { no: 0, blank: 2, block: 20 }[labels.leftApart] : 0;
    const penalty = isRowName ? (inColumn || reading.label.length <= 3 ? 9 : 1) : 0;
    found.push({ ...reading, penalty: penalty + beside });
  }
  return found;
}

/** A name behind its number may have the unit in front: "kN·s/m  total damping". */
function unitFirst(text: string): [name: string, unit: Unit | null] {
  const words = text.split(/\s+/);
  for (let count = Math.min(2, words.length - 1); count > 0; count--) {
    const start = words.slice(0, count).join(" ");
    const unit = parseUnit(start);
    if (unit && !/^[a-z]$/i.test(words[count]!)) return [text.slice(start.length).trim(), unit];
  }
  return [text, null];
}

/** For a number on an axis of a two-way chart: its part of the corner's text. null for a cell inside the chart. */
function axisOf(corner: string, axis: Labels["axis"]): string | null {
  if (axis === "inside") return null;
  const parts = corner
    .split(/\\|\||→|↓|\bvs\.?\b|\s\/\s|,\s*(?=\S+.*\bacross\b)/i)
    .map((part) => part.trim())
    .filter(Boolean);
  const down = parts.find((part) => downWords.test(part)) ?? parts[0];
  const across = parts.find((part) => acrossWords.test(part)) ?? parts[1];
  const chosen = axis === "top" ? across : down;
  return (
    chosen
      ?.replace(/\b(down|across|along|waagere?cht|quer|senkrecht|horizontal\w*|vertical\w*)\b/gi, "")
      .replace(/[()]/g, "")
      .trim() ?? null
  );
}

const downWords = /\bdown\b|↓|\bsenkrecht\b|\bvertical\w*/i;
const acrossWords = /\b(across|along|waagere?cht|quer|horizontal\w*)\b|→/i;

const gram: Unit = { dimension: "mass", factor: 1e-3, text: "g" };
const massWords = /\b(\w*mass(e|en)?|weight|gewicht|poids|m)\b/;

/** What a unit column says of a number of pieces. */
const countWords = /^(no\.?|nr\.?|stk\.?|stück|pcs\.?|off|st\.?|qty|ea\.?|n°|nb|pièces|#)$/i;

const oneLetter = /^[A-Za-z]$/;

/** Of the texts at the left, the nearest first, those before the unit of another number. */
function upToUnit(texts: readonly string[]): readonly string[] {
  const end = texts.findIndex((text, i) => i > 0 && isUnitOnly(text) !== null);
  return end > 0 && texts.slice(0, end).some((text) => !isUnitOnly(text)) ? texts.slice(0, end) : texts;
}

function readTexts(
  texts: readonly string[],
  right: string | null,
  title: string | null,
  atEnd: string | null = null,
): Meaning {
  // a single letter at the left is a symbol where a unit stands at the right
  const beside = right !== null && texts.some((text) => oneLetter.test(text)) ? isUnitOnly(right) : null;
  let unit: Unit | null = beside;
  const names: string[] = [];
  for (const text of texts) {
    if (names.length === 0 && texts.length > 1 && countWords.test(text)) continue;
    const alone = isUnitOnly(text);
    if (
      alone &&
      !unit &&
      (names.length === 0 || names.length === texts.length - 1) &&
      !(names.length === 0 && texts.length === 1)
    ) {
      unit = alone;
    } else names.push(text);
  }
  if (!unit && right !== null) unit = isUnitOnly(right);
  if (!unit && atEnd !== null && !oneLetter.test(atEnd) && !hasUnit(names[0] ?? "")) unit = isUnitOnly(atEnd);
  const [name = "", ...context] = names;
  let first = read(name, unit, context);
  // a name broken over two cells: "Load per" over "mount, kN"
  if (names.length > 1 && name.length + context[0]!.length < 60) {
    const joined = read(`${context[0]!} ${name}`, unit, context.slice(1));
    const weight = first.candidates[0]?.weight ?? 0;
    const other = joined.candidates[0];
    if (other && other.role !== first.candidates[0]?.role && other.weight >= weight) first = joined;
  }
  const kindText = texts.join(" ") + " " + (right ?? "");
  const kind = first.kind ?? amplitudeKind(kindText);
  const wider = title === null ? first.text : `${first.text} ${plainText(title)}`;
  return { ...first, kind, text: wider, words: first.text };
}

const hasUnit = (text: string): boolean => splitLabel(text).some(({ unit, explicit }) => unit !== null && explicit);

function read(text: string, unitBeside: Unit | null, context: readonly string[]): Meaning {
  let best = none;
  let bestScore = -1;
  const whole = plainText([text, ...context].join(" "));
  for (const { name, unit, explicit } of splitLabel(text)) {
    for (const stated of unitBeside ? [unitBeside, unit] : [unit]) {
      const chosen = stated?.text === "g" && massWords.test(plainText(name)) ? gram : stated;
      const candidates = candidatesFor(name, chosen, context, plainText(`${text} ${unitBeside?.text ?? ""}`));
      const score =
        (candidates[0]?.weight ?? 0) +
        (chosen ? 2.5 : 0) +
        (explicit && chosen && candidates.length > 0 ? 4 : 0) +
        (unitBeside && chosen === unitBeside && candidates.length > 0 ? 4 : 0);
      if (score > bestScore) {
        bestScore = score;
        best = { candidates, unit: chosen, kind: amplitudeKind(text), text: whole, label: text };
      }
    }
  }
  return best;
}

const entries = Object.entries(roles) as [Role, RoleEntry][];

/** Whether a number of this role can stand in this unit. Weight and mass may stand in each other's. */
export function fits(role: Role, unit: Unit): boolean {
  const { dimension } = roles[role];
  if (dimension === unit.dimension) return true;
  const weights: Dimension[] = ["mass", "force"];
  return weights.includes(dimension) && weights.includes(unit.dimension) && /^(W|WEach|m|mEach)$/.test(role);
}

function candidatesFor(name: string, unit: Unit | null, context: readonly string[], whole: string): Candidate[] {
  const plain = plainText(name);
  const symbol = symbolText(name);
  const heads = headsOf(name).map((head) => ({
    plain: plainText(head),
    symbol: symbolText(head),
    tokens: tokensOf(head),
  }));
  const isSymbol = symbol.length <= 4 && context.length > 0 && context[0]!.length > 5;
  if (isSymbol) whole = plainText(`${whole} ${context[0]!}`);
  const tokens = tokensOf(name);
  const wide = plainText(context.join(" "));
  const found: Candidate[] = [];
  const headed = entries.some(
    ([role, entry]) =>
      (!unit || fits(role, unit)) && heads.some((head) => weightOf(entry, head.plain, head.symbol, head.tokens) > 4),
  );
  for (const [role, entry] of entries) {
    if (unit && !fits(role, unit)) continue;
    const inHead = Math.max(0, ...heads.map((head) => weightOf(entry, head.plain, head.symbol, head.tokens)));
    const own = headed ? inHead : weightOf(entry, plain, symbol, tokens);
    // a symbol with its name beside it: the name decides between the symbol's meanings
    const spelled = isSymbol ? weightOf(entry, plainText(context[0]!), "", []) : 0;
    const weight = own > 0 && spelled > 0 ? Math.max(own, spelled) + 1 : Math.max(own, spelled - 1);
    const words = isSymbol ? `${plain} ${plainText(context[0]!)}` : headed ? heads[0]!.plain : plain;
    if (weight > 0) found.push({ role, weight: adjusted(role, weight, words, whole) });
  }
  if (each.test(whole) && !total.test(whole)) {
    for (const [all, one] of shares) {
      const weight = found.find(({ role }) => role === all)?.weight;
      const known = found.find(({ role }) => role === one);
      if (weight === undefined || (unit && !fits(one, unit)) || (known && known.weight > weight + 2)) continue;
      if (known) found.splice(found.indexOf(known), 1);
      found.push({ role: one, weight: weight + 3.5 });
    }
  }
  // x, v and a alone do not say what moves
  if (/^[xvasd]$/i.test(symbol) || /^[xvasd]$/i.test(tokens[0] ?? "")) {
    for (const family of families) {
      const known = found.filter(({ role }) => family.includes(role));
      const best = Math.max(...known.map(({ weight }) => weight));
      for (const role of known.length > 0 ? family : []) {
        const same = found.findIndex((other) => other.role === role);
        if (same >= 0 && found[same]!.weight >= best - 1.2) continue;
        if (same >= 0) found.splice(same, 1);
        found.push({ role, weight: best - 1.2 });
      }
    }
  }
  // a stiffness or damping of which nobody says whether it is of one mount or of all can be either
  for (const [all, one] of shares.filter(([all]) => all !== "m" && all !== "W")) {
    const known = found.find(({ role }) => role === all);
    if (!known || each.test(whole) || total.test(whole) || known.weight < 4) continue;
    const share = found.find(({ role }) => role === one);
    if (!share || share.weight < known.weight - 2) {
      if (share) found.splice(found.indexOf(share), 1);
      found.push({ role: one, weight: known.weight - 2 });
    }
  }
  for (const candidate of motionRoles(plain, wide, unit)) {
    const same = found.findIndex(({ role }) => role === candidate.role);
    if (same < 0) found.push(candidate);
    else if (found[same]!.weight < candidate.weight) found[same] = candidate;
  }
  // a multiple of a standard deviation is of a motion or its force, not of a weight at rest
  if (/\bsigma\b/.test(whole)) {
    const loads = found.filter(({ role }) => /^(W|m)(Each)?$/.test(role));
    for (const { role, weight } of loads) {
      found.splice(
        found.findIndex((other) => other.role === role),
        1,
      );
      const dynamic = role.startsWith("W") ? (role === "W" ? "F" : "FEach") : null;
      const same = found.findIndex((other) => other.role === dynamic);
      if (dynamic && same >= 0 && found[same]!.weight < weight) found[same] = { role: dynamic, weight };
    }
    const stretch = found.find(({ role }) => role === "Z");
    if (stretch && !found.some(({ role }) => role === "zrms"))
      found.push({ role: "zrms", weight: stretch.weight - 0.5 });
  }
  // an rms displacement of which nothing says that it is relative or random can be any
  const rms = found.findIndex(({ role }) => role === "zrms");
  if (
    rms >= 0 &&
    !/\brel\w*|stretch|stroke|sigma|random|zufall|aleat|mount|isol|spring|defl|travel|gap|miles|psd|asd/.test(
      `${whole} ${wide}`,
    )
  ) {
    const any = Math.max(0, ...found.filter(({ role }) => /^[UX]$/.test(role)).map(({ weight }) => weight));
    if (any > 0) found[rms] = { role: "zrms", weight: Math.min(found[rms]!.weight, any + 1) };
  }
  const [force] = found.filter(({ role }) => role === "F" || role === "FEach").sort((a, b) => b.weight - a.weight);
  if (force && /\b(spring|feder|ressort)\b(?! (mount|isol))/.test(whole) && !/damp|amort|dampf/.test(whole)) {
    const role = force.role === "F" ? "Fs" : "FsEach";
    const same = found.findIndex((other) => other.role === role);
    if (same >= 0) found.splice(same, 1);
    const damper = found.findIndex((other) => other.role === (force.role === "F" ? "Fd" : "FdEach"));
    if (damper >= 0) found.splice(damper, 1);
    found.push({ role, weight: force.weight + 0.5 });
  }
  if (found.length === 0 && wide !== "") {
    for (const [role, entry] of entries) {
      if (unit && !fits(role, unit)) continue;
      if (entry.names.some((pattern) => pattern.test(wide)))
        found.push({ role, weight: adjusted(role, 4.5, wide, `${whole} ${wide}`) });
    }
  }
  const only = unit && (unit.dimension === "stiffness" ? "k" : unit.dimension === "damping" ? "c" : null);
  if (only && found.length === 0) found.push({ role: only, weight: 3 });
  if (unit)
    for (const role of usual[unit.dimension] ?? []) {
      const ofOne = role.endsWith("Each") && each.test(whole) && !total.test(whole);
      if (!found.some((c) => c.role === role)) found.push({ role, weight: ofOne ? 2.6 : 1 });
    }
  // a force on one mount that nobody calls dynamic can be its load
  const onOne = found.find(({ role }) => role === "FEach");
  const load = found.find(({ role }) => role === "WEach");
  if (
    onOne &&
    load &&
    load.weight < onOne.weight - 1.5 &&
    !/dyn|\bpe?a?k\b|rms|through|spring|damp|schwing/.test(whole)
  )
    found.splice(found.indexOf(load), 1, { role: "WEach", weight: onOne.weight - 1.5 });
  found.sort((a, b) => b.weight - a.weight);
  // a term written out whole is no other term
  const [best] = found;
  return best && best.weight >= 7 && writtenTerms.has(best.role)
    ? found.filter(({ role, weight }) => role === best.role || !writtenTerms.has(role) || weight >= 7)
    : found;
}

const writtenTerms = new Set<Role>(["rr", "detuning", "detuning2", "b", "bb", "numerator", "denominator"]);

const tokensOf = (name: string): string[] =>
  name
    .split(/[\s,;:()=[\]_]+/)
    .filter(Boolean)
    .map(symbolText);

/** What a name is about, without what it is computed from or with: "Damping ratio from loss factor", "Old sheet: T". */
function headsOf(name: string): string[] {
  const [, behind] = /:\s*(\S.*)$/.exec(name) ?? [];
  const part = behind ?? name;
  const [, head] =
    /^(.*?\S)[\s,]+(?:from|aus|with(?! resp)|mit|avec|incl\.?|including|inkl\.?|without|ohne|sans|via)\s+\S/i.exec(
      part,
    ) ?? [];
  return head ? [head] : behind ? [behind] : [];
}

function weightOf(entry: RoleEntry, plain: string, symbol: string, tokens: readonly string[]): number {
  let weight = 0;
  for (const pattern of entry.names) {
    const match = pattern.exec(plain);
    if (match) weight = Math.max(weight, 4.5 + Math.min(4, (4 * match[0].length) / Math.max(plain.length, 8)));
  }
  const symbols = entry.symbols ?? [];
  if (symbols.includes(symbol)) weight = Math.max(weight, 7.5 - symbols.indexOf(symbol) * 0.05);
  else if (tokens[0] !== undefined && symbols.includes(tokens[0]))
    weight = Math.max(weight, 5.5 - symbols.indexOf(tokens[0]) * 0.05);
  else if (tokens.length > 1 && tokens.slice(1).some((token) => token.length > 1 && symbols.includes(token)))
    weight = Math.max(weight, 4);
  return weight;
}

const relative = /\brel\w*|\bstroke\b|\btravel\b|\bz\/|\bstretch\b/;
const peakWords = /\bpeak\b|\bmax\w*|\bresonan\w*|\bat fn\b|uberhohung|surtension|spitzen/;
const each =
  /\b((of|on|in) (one|each)|(of|on|in) an? (mount|spring|isolator|unit|pad|leg|foot)|one (mount|spring|isolator|unit|pad)|d'un (appui|plot|ressort|isolateur|support)|(mount|isolator|spring|leg|foot|corner|pad|buffer) (load|weight)|(leg|foot|corner|pad|buffer) (stiffness|rate|damping)|each|per|je|pro|par|unitaire|ea)\b|\/\s*(mount|unit|spring|isolator|lager|plot|feder|foot|pad|corner|m\.)/;
const total =
  /\b(total\w*|tous|toutes|alle[rn]?|samtliche\w*|combined|overall|result\w*|tot|all|gesamt|ges|four|summe|ensemble)\b/;

const densityWords = /psd|asd|dsp|psb|spectr|spektr|densit|dichte|\/hz/;
const randomWords =
  /\bgrms\b|\bg rms\b|miles|random|response|resp\b|sigma|psd|asd|antwort|reponse|zufall|aleatoire|rausch/;

const families: readonly (readonly Role[])[] = [
  ["U", "X"],
  ["Uv", "Xv"],
  ["Ua", "Xa"],
];

const shares: readonly (readonly [Role, Role])[] = [
  ["k", "kEach"],
  ["c", "cEach"],
  ["m", "mEach"],
  ["W", "WEach"],
  ["F", "FEach"],
  ["Fs", "FsEach"],
  ["Fd", "FdEach"],
];

/** Words that decide between neighbouring roles. */
function adjusted(role: Role, weight: number, plain: string, whole: string): number {
  const isRelative = relative.test(plain) && !/\brel\W+(to|zu|a)\b/.test(plain);
  if (role === "R" || role === "phiR") return isRelative ? weight + 2 : weight - 0.5;
  if (role === "T" || role === "phiA") return isRelative && !/\babs/.test(plain) ? weight - 3 : weight;
  if (role === "r" && /\bsquare/.test(plain)) return weight - 4;
  if (role === "g") return weight > 5.6 || /gravit|beschl|pesanteur/.test(plain) ? weight : weight - 4;
  if (role === "S" || role === "Sout") return densityWords.test(whole) || weight > 7 ? weight : weight - 4;
  if (role === "grms") return randomWords.test(whole) ? weight : weight - 2.5;
  if (role === "delta" && /\brms\b|sigma/.test(whole)) return weight - 4;
  if (role === "zrms") return /\brms\b|sigma|random|effektiv|efficace/.test(whole) ? weight - 0.5 : weight - 4;
  if (/\b(force|kraft|effort)\b|kraft\b/.test(plain) && /^(k|c|kEach|cEach|zeta)$/.test(role)) return weight - 4;
  if (role === "LT") return /\bdb\b|level|pegel|niveau/.test(whole) ? weight : weight - 4;
  if (role === "Tpk") return peakWords.test(plain) ? weight + 1.5 : weight - 1;
  if (/Each$/.test(role)) return each.test(whole) ? weight + 1.5 : weight - 2;
  if (/^(k|c|m|W|F|Fs|Fd)$/.test(role)) return each.test(whole) && !total.test(whole) ? weight - 3 : weight;
  if (role === "f" && /\b(natural|eigen|propre|resonan)/.test(plain)) return weight - 3;
  if (
    role === "zeta" &&
    /\b(coeff|const|koeff|critical damping|kritische|crit\b)/.test(plain) &&
    !/(of|%)\W*crit/.test(plain)
  )
    return weight - 3;
  return weight;
}

/** Roles that a bare unit suggests. */
const usual: Partial<Record<Dimension, readonly Role[]>> = {
  frequency: ["f", "fn"],
  length: ["U", "X", "Z", "delta", "zrms"],
  velocity: ["Uv", "Xv", "Zv"],
  acceleration: ["Ua", "Xa", "grms"],
  mass: ["m", "mEach"],
  force: ["F", "W", "WEach", "FEach"],
  stiffness: ["k", "kEach"],
  damping: ["c", "cEach", "cc"],
  angle: ["phiA", "phiR"],
  level: ["LT"],
  density: ["S"],
  pressure: ["Ey"],
  area: ["area"],
};

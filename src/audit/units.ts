/** What a unit measures. `number` covers ratios and percent. */
export type Dimension =
  | "number"
  | "frequency"
  | "length"
  | "velocity"
  | "acceleration"
  | "mass"
  | "force"
  | "stiffness"
  | "damping"
  | "angle"
  | "level"
  | "density"
  | "pressure"
  | "area"
  | "time"
  | "other";

export interface Unit {
  readonly dimension: Dimension;
  /** SI value of 1 unit; frequencies in Hz, angles in radians, a percent is 0.01, weight units in N, g as acceleration in m/s² */
  readonly factor: number;
  readonly text: string;
}

export const gravity = 9.80665;
const inch = 0.0254;
const poundMass = 0.45359237;
const poundForce = poundMass * gravity;
const turn = 1 / (2 * Math.PI); // rad/s to Hz

/** length, mass, time exponents and SI factor of one base word */
type Base = readonly [factor: number, length: number, mass: number, time: number];

const bases: Readonly<Record<string, Base>> = {
  m: [1, 1, 0, 0],
  mm: [1e-3, 1, 0, 0],
  cm: [1e-2, 1, 0, 0],
  dm: [0.1, 1, 0, 0],
  um: [1e-6, 1, 0, 0],
  micron: [1e-6, 1, 0, 0],
  microns: [1e-6, 1, 0, 0],
  nm: [1e-9, 1, 0, 0],
  in: [inch, 1, 0, 0],
  inch: [inch, 1, 0, 0],
  inches: [inch, 1, 0, 0],
  zoll: [inch, 1, 0, 0],
  '"': [inch, 1, 0, 0],
  mil: [inch / 1000, 1, 0, 0],
  mils: [inch / 1000, 1, 0, 0],
  thou: [inch / 1000, 1, 0, 0],
  ft: [inch * 12, 1, 0, 0],
  kg: [1, 0, 1, 0],
  t: [1000, 0, 1, 0],
  to: [1000, 0, 1, 0],
  tonne: [1000, 0, 1, 0],
  tonnes: [1000, 0, 1, 0],
  lbm: [poundMass, 0, 1, 0],
  slug: [poundForce / (12 * inch), 0, 1, 0],
  slugs: [poundForce / (12 * inch), 0, 1, 0],
  n: [1, 1, 1, -2],
  kn: [1e3, 1, 1, -2],
  mn: [1e6, 1, 1, -2],
  dan: [10, 1, 1, -2],
  lbf: [poundForce, 1, 1, -2],
  lb: [poundForce, 1, 1, -2],
  lbs: [poundForce, 1, 1, -2],
  pound: [poundForce, 1, 1, -2],
  pounds: [poundForce, 1, 1, -2],
  kip: [poundForce * 1000, 1, 1, -2],
  kips: [poundForce * 1000, 1, 1, -2],
  kgf: [gravity, 1, 1, -2],
  kp: [gravity, 1, 1, -2],
  s: [1, 0, 0, 1],
  sec: [1, 0, 0, 1],
  ms: [1e-3, 0, 0, 1],
  min: [60, 0, 0, 1],
  h: [3600, 0, 0, 1],
  hz: [1, 0, 0, -1],
  khz: [1e3, 0, 0, -1],
  cps: [1, 0, 0, -1],
  gn: [gravity, 1, 0, -2],
  g: [gravity, 1, 0, -2],
  "g's": [gravity, 1, 0, -2],
  mg: [gravity / 1000, 1, 0, -2],
  milli_g: [gravity / 1000, 1, 0, -2],
  ug: [gravity / 1e6, 1, 0, -2],
  gal: [0.01, 1, 0, -2],
  pa: [1, -1, 1, -2],
  kpa: [1e3, -1, 1, -2],
  mpa: [1e6, -1, 1, -2],
  gpa: [1e9, -1, 1, -2],
  bar: [1e5, -1, 1, -2],
  psi: [poundForce / inch ** 2, -1, 1, -2],
  ips: [inch, 1, 0, -1],
  j: [1, 2, 1, -2],
  ns: [1, 1, 1, -1],
  kns: [1e3, 1, 1, -1],
  1: [1, 0, 0, 0],
};

const dimensions: Readonly<Record<string, Dimension>> = {
  "0,0,0": "number",
  "0,0,-1": "frequency",
  "1,0,0": "length",
  "1,0,-1": "velocity",
  "1,0,-2": "acceleration",
  "0,1,0": "mass",
  "1,1,-2": "force",
  "0,1,-2": "stiffness",
  "0,1,-1": "damping",
  "2,0,-3": "density",
  "-1,1,-2": "pressure",
  "2,0,0": "area",
  "0,0,1": "time",
};

const whole: Readonly<Record<string, readonly [Dimension, number]>> = {
  "%": ["number", 0.01],
  percent: ["number", 0.01],
  prozent: ["number", 0.01],
  pct: ["number", 0.01],
  "‰": ["number", 0.001],
  "-": ["number", 1],
  "–": ["number", 1],
  "—": ["number", 1],
  "1": ["number", 1],
  "./.": ["number", 1],
  db: ["level", 1],
  vdb: ["level", 1],
  "°": ["angle", Math.PI / 180],
  deg: ["angle", Math.PI / 180],
  degrees: ["angle", Math.PI / 180],
  degree: ["angle", Math.PI / 180],
  grad: ["angle", Math.PI / 180],
  degrés: ["angle", Math.PI / 180],
  degres: ["angle", Math.PI / 180],
  rad: ["angle", 1],
  radians: ["angle", 1],
  rpm: ["frequency", 1 / 60],
  "r.p.m.": ["frequency", 1 / 60],
  "r.p.m": ["frequency", 1 / 60],
  cpm: ["frequency", 1 / 60],
  "cycles/min": ["frequency", 1 / 60],
  "cycle/min": ["frequency", 1 / 60],
  "rev/min": ["frequency", 1 / 60],
  "revs/min": ["frequency", 1 / 60],
  "r/min": ["frequency", 1 / 60],
  "u/min": ["frequency", 1 / 60],
  "umdr/min": ["frequency", 1 / 60],
  upm: ["frequency", 1 / 60],
  "tr/min": ["frequency", 1 / 60],
  "trs/min": ["frequency", 1 / 60],
  "tours/min": ["frequency", 1 / 60],
  "t/min": ["frequency", 1 / 60],
  "c/min": ["frequency", 1 / 60],
  "cyc/min": ["frequency", 1 / 60],
  "strokes/min": ["frequency", 1 / 60],
  spm: ["frequency", 1 / 60],
  "coups/min": ["frequency", 1 / 60],
  "hübe/min": ["frequency", 1 / 60],
  "strokes per minute": ["frequency", 1 / 60],
  "cycles per minute": ["frequency", 1 / 60],
  "revolutions per minute": ["frequency", 1 / 60],
  "revs per minute": ["frequency", 1 / 60],
  "umdrehungen pro minute": ["frequency", 1 / 60],
  "umdrehungen je minute": ["frequency", 1 / 60],
  "hübe pro minute": ["frequency", 1 / 60],
  "tours par minute": ["frequency", 1 / 60],
  "coups par minute": ["frequency", 1 / 60],
  "cycles per second": ["frequency", 1],
  "rev/s": ["frequency", 1],
  rps: ["frequency", 1],
  "c/s": ["frequency", 1],
  "cycles/s": ["frequency", 1],
  "tr/s": ["frequency", 1],
  "u/s": ["frequency", 1],
  "rad/s": ["frequency", turn],
  "rad/sec": ["frequency", turn],
  "r/s": ["frequency", turn],
};

const cache = new Map<string, Unit | null>();

/** Reads a unit as sheets write it: "N·s/m", "kN/mm", "min⁻¹", "g²/Hz", "lb-s/in", "(m/s²)²/Hz". null if it is none. */
export function parseUnit(text: string): Unit | null {
  const known = cache.get(text);
  if (known !== undefined) return known;
  const found = readUnit(text);
  if (cache.size < 10_000) cache.set(text, found);
  return found;
}

function readUnit(text: string): Unit | null {
  const plain = text
    .trim()
    .replace(/[µμ]/g, "u")
    .replace(/⁻/g, "-")
    .replace(/[⁰¹²³⁴]/g, (digit) => "⁰¹²³⁴".indexOf(digit).toString())
    .replace(/''|[”“″]/g, '"')
    .replace(/\s*([/*·⋅×])\s*/g, "$1")
    .replace(/[*·⋅×]/g, ".");
  const word = plain.toLowerCase();
  const special = whole[word] ?? whole[word.replace(/\.$/, "")];
  if (special) return { dimension: special[0], factor: special[1], text };
  if (plain.length > 24 || !/[a-zA-Z"]/.test(plain)) return null;
  // Case tells milligram-like words from mega ones, and a lone capital is a symbol, not a unit.
  if (/^(M|T|S|H|IN|Min|MIN|J|MS|Bar|G|C|[A-Z]\d+|n)$/.test(plain)) return null;
  const terms = readTerms(plain.replace(/\bm-g\b|\bmilli-?g\b/gi, "milli_g"));
  if (!terms) return null;
  const [factor, length, mass, time] = terms;
  const dimension = dimensions[`${length},${mass},${time}`] ?? "other";
  const perSecond = dimension === "frequency" && /^(1\/s|s\^?-1|1\/sec|s-1)$/.test(word);
  return { dimension, factor: perSecond ? turn : factor, text };
}

/** A product of powers; brackets around a group with an exponent are allowed once. */
function readTerms(text: string): Base | null {
  const group = /^\(([^()]+)\)\^?(-?\d)?(.*)$/.exec(text);
  if (group) {
    const inside = readTerms(group[1]!);
    const power = Number(group[2] ?? 1);
    if (!inside) return null;
    const first: Base = [inside[0] ** power, inside[1] * power, inside[2] * power, inside[3] * power];
    if (group[3] === "") return first;
    if (!/^[/.]/.test(group[3]!)) return null;
    const rest = readTerms(`1${group[3]}`);
    return rest && times(first, rest, 1);
  }
  let result: Base = [1, 0, 0, 0];
  let sign = 1;
  let pendingGroup = text;
  const nested = /^(.*?)\/\(([^()]+)\)$/.exec(text);
  if (nested) {
    const below = readTerms(nested[2]!);
    const above = readTerms(nested[1]!);
    return below && above && times(above, below, -1);
  }
  const pattern = /^([a-z_"']+|1)(?:\^?(-?\d))?([/. -]|$)/i;
  while (pendingGroup !== "") {
    const found = pattern.exec(pendingGroup);
    if (!found) return null;
    const base = baseOf(found[1]!);
    if (!base) return null;
    result = times(result, base, sign * Number(found[2] ?? 1));
    if (found[3] === "/") sign = -1;
    pendingGroup = pendingGroup.slice(found[0].length);
    if (pendingGroup === "" && found[3] !== "") return null;
  }
  return result;
}

function baseOf(word: string): Base | undefined {
  if (/^[SHTM]$/.test(word)) return undefined; // symbols
  if (word === "MN") return bases["mn"];
  if (word === "mN") return [1e-3, 1, 1, -2];
  if (word === "Mg") return [1000, 0, 1, 0];
  if (word === "MPa" || word === "mpa") return bases["mpa"];
  if (word === "G") return bases["g"];
  const lower = word.toLowerCase();
  return Object.hasOwn(bases, lower) ? bases[lower] : undefined;
}

const times = (a: Base, b: Base, power: number): Base => [
  a[0] * b[0] ** power,
  a[1] + b[1] * power,
  a[2] + b[2] * power,
  a[3] + b[3] * power,
];

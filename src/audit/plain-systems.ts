/** Plain formulas of conversion, sweeps, random motion, shock and systems, as far as they have a closed form. */
import {
  dampingRatio,
  frequency,
  naturalFrequency,
  number,
  type PlainEntry,
  type PlainText,
  relationText,
  table,
  units,
  word,
} from "./plain-entry";
import { type PlainDimension, unitFactor } from "./plain-units";
import type { Role } from "./roles";

const measures: Record<string, readonly [toPeak: string, fromPeak: string]> = {
  peak: ["", ""],
  rms: ["*SQRT(2)", "/SQRT(2)"],
  "peak-to-peak": ["/2", "*2"],
};
const kinds = { displacement: "U", velocity: "Uv", acceleration: "Ua" } as const satisfies Record<string, Role>;
const motionForms = Object.keys(kinds).flatMap((kind) => Object.keys(measures).map((measure) => `${kind} ${measure}`));

/** Area of the pulse of unit peak and duration. */
const pulseAreas: Record<string, string> = {
  "half-sine": "2/PI()*peak*t",
  "initial-peak sawtooth": "peak*t/2",
  "terminal-peak sawtooth": "peak*t/2",
  triangle: "peak*t/2",
  rectangle: "peak*t",
  haversine: "peak*t/2",
  trapezoid: "0.9*peak*t",
};

export const systems: Readonly<Record<string, PlainEntry>> = {
  MOTION: {
    arguments: [
      number("value", "value"),
      frequency,
      word("from", "from", motionForms),
      word("to", "to", motionForms),
      units,
    ],
    text: ({ from, to }) => motion(from!, to!),
  },
  // a = (2 pi f)^2 d solved for f
  CROSSOVER: {
    arguments: [number("d", "displacement"), number("a", "acceleration"), units],
    text: () => ({ formula: "SQRT(a/d)/(2*PI())", units: { d: "displacement", a: "acceleration" } }),
  },
  UNITS: {
    arguments: [
      number("value", "value"),
      { name: "from", says: "from", unit: true },
      { name: "to", says: "to", unit: true },
    ],
    text: ({ from, to }) => ({ formula: "value", factor: from!.trim() === to!.trim() ? "" : unitFactor(from!, to!) }),
  },
  SWEEP: {
    arguments: [
      number("first", "from"),
      number("last", "to"),
      number("count", "count"),
      word("spacing", "spacing", ["linear", "log"], "linear"),
    ],
    fills: true,
    text: ({ spacing }) => ({
      formula: spacing === "log" ? "first*(last/first)^(place/(count-1))" : "first+(last-first)*place/(count-1)",
    }),
  },
  PSDAT: {
    arguments: [table("fs", "frequencies"), table("Ss", "densities"), frequency],
    oneAtATime: true,
    text: () => ({
      formula: "IF(f>MAX(fs),NA(),Sl*(Su/Sl)^(LN(f/fl)/LN(fu/fl)))",
      where: {
        below: "IF(MATCH(f,fs,1)<COUNT(fs),MATCH(f,fs,1),COUNT(fs)-1)",
        fl: "INDEX(fs,below)",
        fu: "INDEX(fs,below+1)",
        Sl: "INDEX(Ss,below)",
        Su: "INDEX(Ss,below+1)",
      },
    }),
  },
  MILES: {
    arguments: [
      naturalFrequency,
      dampingRatio,
      number("S", "density"),
      word("form", "form", ["exact", "short"], "exact"),
    ],
    text: ({ form }) =>
      form === "short"
        ? { formula: relationText("grms", ["fn", "Q", "S"], true), where: { Q: relationText("Q", ["zeta"]) } }
        : { formula: relationText("grms", ["fn", "zeta", "S"]) },
  },
  // c + gamma/c, gamma = 0.5772... is Euler's constant
  PEAKFACTOR: {
    arguments: [naturalFrequency, number("t", "duration")],
    text: () => ({ formula: "c+0.577215664901533/c", where: { c: "SQRT(2*LN(fn*t))" } }),
  },
  PULSEVELOCITY: {
    arguments: [
      word("shape", "shape", Object.keys(pulseAreas)),
      number("peak", "peak"),
      number("t", "duration"),
      units,
    ],
    text: ({ shape }) => ({
      formula: pulseAreas[shape!]!,
      units: { peak: "acceleration" },
      result: "velocity",
    }),
  },
  // |(kl + iwcl)(ku + iwcu)| over the determinant of the two equations of motion, its parts multiplied out
  TWOSTAGE: {
    arguments: [frequency, ...stage("l", "lower"), ...stage("u", "upper"), units],
    text: () => ({
      formula: "SQRT((kl^2+(w*cl)^2)*(ku^2+(w*cu)^2)/(real^2+imaginary^2))",
      where: {
        w: "2*PI()*f",
        real: "(kl-ml*w^2)*(ku-mu*w^2)-cl*cu*w^2-ku*mu*w^2",
        imaginary: "w*((kl-ml*w^2)*cu+(ku-mu*w^2)*cl-cu*mu*w^2)",
      },
      units: { ...stageUnits("l"), ...stageUnits("u") },
    }),
  },
  // roots of x^2 - (A + B + C) x + A B = 0, x = (2 pi f)^2; the lower one by the product of the roots
  TWOSTAGEFREQ: {
    arguments: [...stage("l", "lower").slice(0, 2), ...stage("u", "upper").slice(0, 2), units],
    fills: true,
    text: (_words, _given, row) => ({
      formula: row === 0 ? "SQRT(A*B/high)/(2*PI())" : "SQRT(high)/(2*PI())",
      where: {
        A: "kl/ml",
        B: "ku/mu",
        C: "ku/ml",
        high: "(A+B+C+SQRT((A-B)^2+C*(C+2*(A+B))))/2",
      },
      units: { kl: "stiffness", ml: "mass", ku: "stiffness", mu: "mass" },
    }),
  },
  // |N + id (1 + N)| / |N (1 - r^2) + id (1 + N - r^2)|, d = 2 zeta r
  RELAXTRANS: {
    arguments: [frequency, naturalFrequency, dampingRatio, number("N", "series ratio")],
    text: () => ({
      formula: "SQRT((N^2+(d*(1+N))^2)/((N*(1-r^2))^2+(d*(1+N-r^2))^2))",
      where: { d: "2*zeta*r" },
    }),
  },
  // half a wave in the spring itself: twice as fast as pi times the relation's own frequency
  SURGE: {
    arguments: [number("k", "stiffness"), number("m", "spring mass"), units],
    text: () => ({ formula: "SQRT(k/m)/2", units: { k: "stiffness", m: "mass" } }),
  },
  // each mount carries its stiffness times a sag that is a plane; moments about the elastic centre give its tilt
  MOUNTLOADS: {
    arguments: [
      table("x", "x", "xHere"),
      table("y", "y", "yHere"),
      table("k", "stiffness", "kHere"),
      number("W", "weight"),
      number("cgX", "centre of gravity x"),
      number("cgY", "centre of gravity y"),
      units,
    ],
    text: () => ({
      formula:
        "IF(det<=1E-12*xx*yy,NA(),W*kHere*(1/SUM(k)+" +
        "((ex*yy-ey*xy)*(xHere-xMean)+(ey*xx-ex*xy)*(yHere-yMean))/det))",
      where: {
        xMean: "SUMPRODUCT(k,x)/SUM(k)",
        yMean: "SUMPRODUCT(k,y)/SUM(k)",
        ex: "cgX-xMean",
        ey: "cgY-yMean",
        xx: "SUMPRODUCT(k,(x-xMean)^2)",
        yy: "SUMPRODUCT(k,(y-yMean)^2)",
        xy: "SUMPRODUCT(k,(x-xMean)*(y-yMean))",
        det: "xx*yy-xy^2",
      },
    }),
  },
};

function stage(index: "l" | "u", says: string) {
  return [
    number(`m${index}`, `${says} mass`),
    number(`k${index}`, `${says} stiffness`),
    number(`c${index}`, `${says} damping`),
  ];
}

function stageUnits(index: "l" | "u"): Record<string, PlainDimension> {
  return { [`m${index}`]: "mass", [`k${index}`]: "stiffness", [`c${index}`]: "damping" };
}

function motion(from: string, to: string): PlainText {
  const [given, givenMeasure] = from.split(" ") as [keyof typeof kinds, string];
  const [wanted, wantedMeasure] = to.split(" ") as [keyof typeof kinds, string];
  const formula = given === wanted ? "value" : relationText(kinds[wanted], ["f", kinds[given]]);
  const measure = givenMeasure === wantedMeasure ? "" : measures[givenMeasure]![0] + measures[wantedMeasure]![1];
  return {
    formula: formula + measure,
    where: given === wanted ? {} : { [kinds[given]]: "value" },
    units: { value: given },
    result: wanted,
  };
}

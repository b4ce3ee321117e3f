/** Calls of every function that has a plain formula, over a grid of inputs. */

/** A number goes into a cell of its own; a text is a word and is written in the formula. */
export type Value = number | string | null;

export interface GridRow {
  readonly id: string;
  readonly values: readonly (readonly Value[])[];
  /** what a row may be off beside 1e-12 of its value, and why */
  readonly budget?: { readonly absolute: number; readonly because: string };
}

const frequencies = [0.4, 3, 7.3, 7.9, 8.1, 12, 25, 180];
const ratios = [0, 0.003, 0.05, 0.2, 0.5, 0.9, 2.4];
const damped = [0.003, 0.05, 0.2, 0.5, 0.65, 0.75, 0.9, 2.4];
const models = ["viscous", "hysteretic"];
const systems = ["si", "mm", "inch"];
const efficiencies = [0.02, 0.3, 0.8, 0.95, 0.999];
const mounts = [frequencies, [8], ratios, models] as const;

const dampingWords = ["ratio", "percent", "loss factor", "q", "log decrement"];
const motions = ["displacement", "velocity", "acceleration"].flatMap((kind) =>
  ["peak", "rms", "peak-to-peak"].map((measure) => `${kind} ${measure}`),
);
const shapes = [
  "half-sine",
  "initial-peak sawtooth",
  "terminal-peak sawtooth",
  "triangle",
  "rectangle",
  "haversine",
  "trapezoid",
];

const box = [
  [0.5, 4, 7.9, 13],
  [4.1, 8, 13, 90],
  [8],
  damped,
  [null, 0.08],
  [null, 0.3],
  ["max", "min"],
  models,
] as const;

export const grid: readonly GridRow[] = [
  { id: "ABSTRANS", values: mounts },
  { id: "RELTRANS", values: mounts },
  { id: "ABSPHASE", values: mounts },
  { id: "RELPHASE", values: mounts },
  {
    id: "EFFICIENCY",
    values: mounts,
    budget: { absolute: 2e-15, because: "1 - T keeps the digits of T, not those of a difference near 0" },
  },
  { id: "PEAKTRANS", values: [damped, models] },
  { id: "PEAKFREQ", values: [[0.7, 8, 300], ratios, models] },
  { id: "NATFREQ", values: [[2, 4e4, 7e6], [0.3, 12, 900], systems] },
  { id: "STIFFNESS", values: [[0.5, 8, 300], [0.3, 12, 900], systems] },
  { id: "STATICDEFL", values: [[0.5, 8, 300], [null, 0.7, 1.4], systems] },
  { id: "DEFLFREQ", values: [[0.0004, 0.02, 3], [null, 0.7, 1.4], systems] },
  { id: "MOUNTDEFL", values: [[0, 0.35], ...mounts] },
  { id: "MOUNTFORCE", values: [[0.35], [3, 7.9, 25], [12, 900], [8], [0, 0.05, 0.9], models, systems] },
  { id: "DAMPING", values: [[0.07, 0.3], dampingWords, dampingWords.filter((word) => word !== "log decrement")] },
  { id: "DAMPING", values: [[0.07, 0.3], dampingWords.filter((word) => word !== "q"), ["log decrement"]] },
  { id: "DAMPING", values: [[0.8, 5, 40], ["q"], dampingWords] },
  { id: "DAMPCOEFF", values: [ratios, [2, 4e4], [0.3, 900], systems] },
  { id: "DAMPRATIO", values: [[0, 3, 800], [2, 4e4], [0.3, 900], systems] },
  { id: "REQNATFREQ", values: [efficiencies, [0.7, 25], ratios, models] },
  { id: "REQSTATICDEFL", values: [efficiencies, [25], [0, 0.05, 0.9], [null, 1.4], models, systems] },
  { id: "REQSTIFFNESS", values: [efficiencies, [25], [0, 0.05, 0.9], [12, 900], models, systems] },
  { id: "REQDAMPING", values: [[1.001, 1.3, 4, 90], models] },
  { id: "TRANSBOUND", values: box },
  { id: "RELBOUND", values: box },
  { id: "MOTION", values: [[0.35], [17], motions, motions, systems] },
  { id: "CROSSOVER", values: [[0.0004, 0.35], [2, 49], systems] },
  { id: "UNITS", values: [[-3, 0, 1500], ["rpm"], ["Hz", "cpm", "rad/s", "kHz"]] },
  {
    id: "UNITS",
    values: [
      [-3, 0, 1500],
      ["mm", "um", "in", "mil", "ft"],
      ["m", "mm", "in", "mil"],
    ],
  },
  { id: "UNITS", values: [[7], ["lbf/in", "kN/m", "N/mm"], ["N/m", "lbf/in", "kg/s2"]] },
  { id: "UNITS", values: [[7], ["gn2/Hz", "(m/s2)2/Hz"], ["(m/s2)2/Hz", "gn2/Hz", "(in/s2)2/(rad/s)"]] },
  { id: "UNITS", values: [[7], ["lbf", "kgf", "kg.m/s2"], ["N", "kN", "lbf"]] },
  { id: "UNITS", values: [[7], ["lbm", "kg", "t"], ["g", "lb"]] },
  { id: "UNITS", values: [[7], ["gn", "in/s2"], ["m/s2", "mm/s2"]] },
  { id: "MILES", values: [[8, 300], damped, [0.0004, 0.04, 9], ["exact", "short"]] },
  {
    id: "PEAKFACTOR",
    values: [
      [8, 300],
      [0.25, 60, 3600],
    ],
  },
  { id: "PULSEVELOCITY", values: [shapes, [-40, 300], [0.011], systems] },
  { id: "TWOSTAGE", values: [[0, 3, 6, 9, 20, 70], [10], [1e5], [0, 50], [20], [5e4], [30, 4000], systems] },
  { id: "RELAXTRANS", values: [frequencies, [8], damped, [0.5, 3, 40]] },
  { id: "SURGE", values: [[2, 5e4], [0.1, 2], systems] },
];

/** Every combination of the values of each argument. */
export function combinations(values: readonly (readonly Value[])[]): Value[][] {
  return values.reduce<Value[][]>(
    (rows, choices) => rows.flatMap((row) => choices.map((value) => [...row, value])),
    [[]],
  );
}

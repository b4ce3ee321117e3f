import type { Scalar } from "../formula/values";
import type { Book } from "./book";
import { type Cut, evaluateCut, leafValue } from "./cut";

/** A formula evaluated near the sheet's own rows: what it gives, and which inputs it depends on. */
export interface Samples {
  readonly count: number;
  /** inputs by sample, then by leaf */
  readonly inputs: readonly Float64Array[];
  readonly hand: Float64Array;
  readonly usable: readonly boolean[];
  /** bit i is set if leaf i matters */
  readonly mask: number;
  readonly complex: boolean;
}

export interface Place {
  readonly down: number;
  readonly across: number;
}

const sampleCount = 6;

/** Fixed departures from the sheet's values, different for every leaf and sample, so that no symmetry survives. */
const departure = (sample: number, leaf: number): number =>
  1 + 0.0031 * (((sample * 7 + leaf * 5) % 13) - 6) + 0.00037 * leaf;

/** Samples a cut at up to six of the cells that share it. */
export function sampleCut(
  book: Book,
  cut: Cut,
  places: readonly Place[],
  scales: readonly number[] = [],
  sizes: readonly boolean[] = [],
): Samples {
  const inputs: Float64Array[] = [];
  const usable: boolean[] = [];
  const hand = new Float64Array(sampleCount);
  let complex = false;
  for (let s = 0; s < sampleCount; s++) {
    const { down, across } = places[spread(s, places.length)]!;
    const values = new Float64Array(cut.leaves.length);
    const fixed: (Scalar | undefined)[] = [];
    cut.leaves.forEach((leaf, i) => {
      const value = leafValue(book, leaf, down, across);
      if (typeof value === "string" || typeof value === "boolean") fixed[i] = value;
      const known = typeof value === "number" && value !== 0 ? value : 0.37 + 0.113 * i;
      const number = sizes[i] ? Math.abs(known) : known;
      values[i] = number * departure(s, i) * (scales[i] ?? 1);
    });
    const result = evaluateCut(cut, values, cut.tree, fixed);
    complex ||= result.complex;
    hand[s] = result.value;
    usable.push(result.value - result.value === 0 && result.value !== 0);
    inputs.push(values);
  }
  return { count: sampleCount, inputs, hand, usable, mask: mattering(cut, inputs, hand, usable), complex };
}

function spread(sample: number, cells: number): number {
  if (cells === 1) return 0;
  const order = [0, 1, 0.5, 0.25, 0.75, 0.125];
  return Math.round(order[sample]! * (cells - 1));
}

function mattering(cut: Cut, inputs: readonly Float64Array[], hand: Float64Array, usable: readonly boolean[]): number {
  let mask = 0;
  const probes = usable
    .map((ok, s) => (ok ? s : -1))
    .filter((s) => s >= 0)
    .slice(0, 3);
  for (let i = 0; i < cut.leaves.length; i++) {
    for (const s of probes) {
      const changed = inputs[s]!.slice();
      changed[i]! *= 1.0713;
      const { value } = evaluateCut(cut, changed);
      if (!(Math.abs(value / hand[s]! - 1) < 1e-9)) {
        mask |= 1 << i;
        break;
      }
    }
  }
  return mask;
}

/** The curves of one mass on one mount over frequency, ready to draw. */
import { relativeBound, transmissibilityBound } from "../core/bounds";
import { NumericError } from "../core/errors";
import { peakFrequency, peakTransmissibility } from "../core/peak";
import {
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../core/transmissibility";
import type { OperatingPoint } from "./explain";

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** Half-widths of the mount's tolerances as fractions. */
export interface Tolerances {
  readonly naturalFrequency: number;
  readonly damping: number;
}

export interface Curves {
  readonly absolute: Point[];
  readonly relative: Point[];
  /** worst and best absolute transmissibility at each frequency; empty without tolerances */
  readonly worst: Point[];
  readonly best: Point[];
  /** frequency of the cell, with both responses there; none where nothing bounds the motion */
  readonly here: { readonly absolute: Point; readonly relative: Point } | null;
  readonly peak: Point | null;
  /** frequency above which the mount isolates */
  readonly onset: number;
  readonly from: number;
  readonly to: number;
}

const POINTS = 241;
/** Beyond this an undamped curve leaves the picture. */
const HIGHEST = 1000;

export function curvesOf(point: OperatingPoint, tolerances: Tolerances): Curves {
  const { f, fn, zeta, model } = point;
  const from = Math.min(fn / 10, f > 0 ? f / 2 : fn / 10);
  const to = Math.max(fn * 10, f * 2);
  const absolute = model === "viscous" ? absoluteTransmissibility : hystereticTransmissibility;
  const relative = model === "viscous" ? relativeTransmissibility : hystereticRelativeTransmissibility;
  const frequencies = frequenciesOf(from, to, fn);
  const curve = (response: (frequency: number) => number): Point[] =>
    frequencies.map((x) => ({ x, y: drawable(() => response(x)) }));
  const uncertain = tolerances.naturalFrequency > 0 || (tolerances.damping > 0 && zeta > 0);
  const bound = (end: "max" | "min"): Point[] =>
    uncertain ? curve((x) => transmissibilityBound(boxAt(x, x, point, tolerances), end, model)) : [];
  const here = { absolute: drawable(() => absolute(f, fn, zeta)), relative: drawable(() => relative(f, fn, zeta)) };
  return {
    absolute: curve((x) => absolute(x, fn, zeta)),
    relative: curve((x) => relative(x, fn, zeta)),
    worst: bound("max"),
    best: bound("min"),
    here: Number.isNaN(here.absolute)
      ? null
      : { absolute: { x: f, y: here.absolute }, relative: { x: f, y: here.relative } },
    peak: zeta > 0 ? { x: peakFrequency(fn, zeta, model), y: peakTransmissibility(zeta, model) } : null,
    onset: Math.SQRT2 * fn,
    from,
    to,
  };
}

/** Worst absolute and relative transmissibility at the cell's own frequency within the tolerances; null at a pole. */
export function worstCase(
  point: OperatingPoint,
  tolerances: Tolerances,
): { readonly absolute: number; readonly relative: number } | null {
  const box = boxAt(point.f, point.f, point, tolerances);
  const absolute = drawable(() => transmissibilityBound(box, "max", point.model), Infinity);
  const relative = drawable(() => relativeBound(box, "max", point.model), Infinity);
  return Number.isNaN(absolute) || Number.isNaN(relative) ? null : { absolute, relative };
}

function boxAt(lowest: number, highest: number, { fn, zeta }: OperatingPoint, tolerances: Tolerances) {
  return { lowest, highest, fn, zeta, fnTolerance: tolerances.naturalFrequency, zetaTolerance: tolerances.damping };
}

/** Evenly spaced on a logarithmic axis, closer around the natural frequency, where the peak is. */
function frequenciesOf(from: number, to: number, fn: number): number[] {
  const step = Math.log(to / from) / (POINTS - 1);
  const even = Array.from({ length: POINTS }, (_, i) => from * Math.exp(i * step));
  const close = Array.from({ length: 81 }, (_, i) => fn * Math.exp(0.25 * ((i - 40) / 40) ** 3));
  return [...even, ...close].sort((a, b) => a - b);
}

/** The value, or NaN (a gap in the curve) where nothing bounds it. */
function drawable(compute: () => number, highest = HIGHEST): number {
  try {
    const value = compute();
    return value <= highest ? value : Number.NaN;
  } catch (error) {
    if (error instanceof NumericError) return Number.NaN;
    throw error;
  }
}

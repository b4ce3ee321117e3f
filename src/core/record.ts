import { NumericError, requireAbove } from "./errors";
import { exponentOf, timesPowerOf2 } from "./exact";

/** A sampled base acceleration, straight lines between samples, at a uniform time step; zero after the last sample. */
export interface AccelerationRecord {
  /** samples over `scale`: the largest is between 1 and 2, or all are 0 */
  samples: Float64Array;
  /** a power of two, so that scaling rounds nothing */
  scale: number;
  /** s */
  timeStep: number;
}

/**
 * Checks a record and scales it.
 * @throws outside-domain that names the bad row; fewer than two samples; a time step that is not above 0
 */
export function readRecord(accelerations: ArrayLike<number>, timeStep: number): AccelerationRecord {
  requireAbove("time step", timeStep, 0);
  const n = accelerations.length;
  if (n < 2) throw new NumericError("outside-domain", `a record needs two samples or more, got ${n}`);
  let largest = 0;
  for (let i = 0; i < n; i++) {
    const size = Math.abs(accelerations[i]);
    if (!(size < Infinity)) badSample(accelerations[i], i);
    if (size > largest) largest = size;
  }
  const exponent = largest > 0 ? exponentOf(largest) : 0;
  const samples = new Float64Array(n);
  const fits = exponent > -1000 && exponent < 1000;
  const factor = fits ? 2 ** -exponent : 1;
  for (let i = 0; i < n; i++) {
    samples[i] = fits ? accelerations[i] * factor : timesPowerOf2(accelerations[i], -exponent);
  }
  return { samples, scale: 2 ** exponent, timeStep };
}

function badSample(value: number, i: number): never {
  if (Number.isNaN(value)) throw new NumericError("not-a-number", `acceleration in row ${i + 1} is not a number`);
  throw new NumericError("outside-domain", `acceleration must be finite: row ${i + 1} is ${value}`);
}

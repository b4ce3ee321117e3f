import { finite, requireAbove, requireAtLeast } from "./errors";
import { freePeak } from "./oscillator";
import { type Extent, largestBetweenSamples, slowEnough } from "./srsSlow";
import { largestByInterval } from "./srsFast";
import type { Response } from "./randomResponse";
import type { AccelerationRecord } from "./record";
import { intervalOf } from "./recordStep";
import { BATCH, filterBatch, filterMemory, type Filtered } from "./srsFilter";

/**
 * Shock response spectrum: the largest magnitude of the response to a recorded base acceleration, for each natural
 * frequency; during the record and in the free vibration after it (maximax), from rest relative to the base at the
 * first sample, exact for straight lines between samples, and with the extremes between samples counted.
 *
 * @param frequencies natural frequencies, Hz, above 0
 * @param zeta        viscous damping ratio, 0 or more
 * @returns           acceleration: absolute, unit of the record; deflection: of the mount, that unit times s^2
 * @throws            outside-domain; overflow
 * @source            z'' + 2 zeta wn z' + wn^2 z = -u'' solved exactly over each interval; see recordStep.ts
 */
export function shockSpectrum(
  record: AccelerationRecord,
  frequencies: ArrayLike<number>,
  zeta: number,
  response: Response,
): Float64Array {
  requireAtLeast("damping ratio", zeta, 0);
  const absolute = response === "acceleration";
  const result = new Float64Array(frequencies.length);
  const groups = new Map<number, number[]>();
  for (let k = 0; k < frequencies.length; k++) {
    requireAbove("natural frequency", frequencies[k], 0);
    const theta = finite("natural frequency x time step", 2 * Math.PI * frequencies[k] * record.timeStep);
    const parts = partsFor(theta, zeta);
    const group = groups.get(parts);
    if (group) group.push(k);
    else groups.set(parts, [k]);
  }
  for (const [parts, places] of groups) {
    const thetas = places.map((k) => (2 * Math.PI * frequencies[k] * record.timeStep) / parts);
    const ratios =
      parts <= MOST_PARTS
        ? byFilter(subdivided(record.samples, parts), thetas, zeta, absolute)
        : thetas.map((theta) => byInterval(record.samples, theta * parts, zeta, absolute));
    places.forEach((k, j) => (result[k] = inUnits(ratios[j], record, frequencies[k], response)));
  }
  return result;
}

const MOST_PARTS = 8;

/** Into how many parts to cut each sample interval for the filter; more than MOST_PARTS: not worth it. */
function partsFor(theta: number, zeta: number): number {
  let parts = 1;
  while (parts <= MOST_PARTS && !slowEnough(theta / parts, zeta)) parts *= 2;
  return parts;
}

/** The same straight lines with more samples on them. */
function subdivided(samples: Float64Array, parts: number): Float64Array {
  if (parts === 1) return samples;
  const last = samples.length - 1;
  const result = new Float64Array(last * parts + 1);
  for (let i = 0; i < last; i++) {
    const rise = samples[i + 1] - samples[i];
    for (let j = 0; j < parts; j++) result[i * parts + j] = samples[i] + (rise * j) / parts;
  }
  result[last * parts] = samples[last];
  return result;
}

function byFilter(samples: Float64Array, thetas: number[], zeta: number, absolute: boolean): number[] {
  const memory = filterMemory(samples.length);
  const extent = extentOf(samples);
  const ratios: number[] = [];
  for (let first = 0; first < thetas.length; first += BATCH) {
    const intervals = thetas.slice(first, first + BATCH).map((theta) => intervalOf(theta, zeta, absolute));
    filterBatch(samples, intervals, memory).forEach((filtered, lane) => {
      const largest = largestBetweenSamples(samples, intervals[lane], filtered, extent);
      ratios.push(Math.max(largest, afterRecord(filtered, zeta)));
    });
  }
  return ratios;
}

function byInterval(samples: Float64Array, theta: number, zeta: number, absolute: boolean): number {
  const end = largestByInterval(samples, theta, zeta, absolute);
  return Math.max(end.largest, afterRecord(end, zeta));
}

/** Largest magnitude of the free vibration that follows the last sample. */
function afterRecord({ value, slope }: Pick<Filtered, "value" | "slope">, zeta: number): number {
  return Math.max(Math.abs(value), freePeak(value, slope, zeta));
}

function inUnits(ratio: number, { scale }: AccelerationRecord, fn: number, response: Response): number {
  if (response === "acceleration") return finite("largest acceleration", ratio * scale);
  const omega = 2 * Math.PI * fn;
  return finite("largest deflection", ((ratio / omega) * scale) / omega);
}

function extentOf(samples: Float64Array): Extent {
  let top = 0;
  let steepest = 0;
  for (let i = 0; i < samples.length; i++) {
    top = Math.max(top, Math.abs(samples[i]));
    if (i > 0) steepest = Math.max(steepest, Math.abs(samples[i] - samples[i - 1]));
  }
  return { top, steepest };
}

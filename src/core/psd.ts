import { finite, NumericError, requireFinite } from "./errors";
import { magnitude } from "./exact";

/** A one-sided acceleration spectral density given by break-points, straight lines between them on log-log axes. */
export interface Profile {
  /** Hz, strictly rising, above 0 */
  frequencies: Float64Array;
  /** acceleration squared per hertz, above 0 */
  densities: Float64Array;
}

/**
 * Checks the two columns of a profile and takes them together.
 * @throws outside-domain that names the bad row: fewer than two points, unequal lengths, frequencies that do not rise,
 *   a frequency or a density that is not above 0
 */
export function readProfile(frequencies: ArrayLike<number>, densities: ArrayLike<number>): Profile {
  const n = frequencies.length;
  if (densities.length !== n) {
    const lengths = `${n} frequencies but ${densities.length} densities`;
    throw new NumericError("outside-domain", `each frequency needs one density: there are ${lengths}`);
  }
  if (n < 2) throw new NumericError("outside-domain", `a profile needs two points or more, got ${n}`);
  for (let i = 0; i < n; i++) {
    requirePositive("frequency", frequencies[i], i);
    requirePositive("density", densities[i], i);
    if (i > 0 && frequencies[i] <= frequencies[i - 1]) {
      const here = `row ${i + 1} (${frequencies[i]}) is not above row ${i} (${frequencies[i - 1]})`;
      throw new NumericError("outside-domain", `frequencies must rise: ${here}`);
    }
  }
  return { frequencies: Float64Array.from(frequencies), densities: Float64Array.from(densities) };
}

function requirePositive(quantity: string, value: number, i: number): void {
  if (value > 0 && value < Infinity) return;
  if (Number.isNaN(value)) throw new NumericError("not-a-number", `${quantity} in row ${i + 1} is not a number`);
  throw new NumericError("outside-domain", `${quantity} must be above 0: row ${i + 1} is ${value}`);
}

/** ln(b/a) of two positive numbers, without the cancellation of b/a near 1. */
export function logRatio(a: number, b: number): number {
  const step = (b - a) / a;
  if (Math.abs(step) < 0.5) return Math.log1p(step);
  const ratio = b / a;
  return ratio > 0 && ratio < Infinity ? Math.log(ratio) : Math.log(b) - Math.log(a);
}

/**
 * Density at a frequency, interpolated on log-log axes; exact at the break-points.
 * @throws not-covered outside the profile's band
 */
export function densityAt({ frequencies, densities }: Profile, frequency: number): number {
  requireFinite("frequency", frequency);
  const last = frequencies.length - 1;
  requireInside(frequencies, frequency);
  let below = 0;
  let above = last;
  while (above - below > 1) {
    const middle = (below + above) >>> 1;
    if (frequencies[middle] <= frequency) below = middle;
    else above = middle;
  }
  if (frequency === frequencies[above]) return densities[above];
  const rise = logRatio(densities[below], densities[above]);
  const run = logRatio(frequencies[below], frequencies[above]);
  // from the nearer end, where the exponential loses least
  const fromBelow = logRatio(frequencies[below], frequency);
  const fromAbove = logRatio(frequencies[above], frequency);
  if (fromBelow <= -fromAbove) return densities[below] * Math.exp((rise * fromBelow) / run);
  return densities[above] * Math.exp((rise * fromAbove) / run);
}

function requireInside(frequencies: Float64Array, frequency: number): void {
  const first = frequencies[0];
  const last = frequencies[frequencies.length - 1];
  if (frequency >= first && frequency <= last) return;
  throw new NumericError("not-covered", `the profile covers ${first} to ${last} Hz, not ${frequency} Hz`);
}

/**
 * Root mean square of the acceleration in the band from..to, by the closed form of each log-log segment:
 *
 *   integral = S1 f1 L (exp(x) - 1)/x,  L = ln(f2/f1),  x = ln(S2/S1) + L
 *
 * which also holds at a slope of -1 (x = 0), where the power form divides zero by zero.
 *
 * @param from  lower end, Hz; left out: the first break-point
 * @param to    upper end, Hz; left out: the last break-point
 * @returns     unit of the acceleration whose square the density carries
 * @throws      not-covered if from or to lies outside the table; outside-domain if from is not below to
 * @source      integral of S1 (f/f1)^n, n = ln(S2/S1)/ln(f2/f1)
 */
export function profileRms(profile: Profile, from?: number, to?: number): number {
  const { frequencies, densities } = profile;
  const last = frequencies.length - 1;
  const low = from ?? frequencies[0];
  const high = to ?? frequencies[last];
  const lowDensity = densityAt(profile, low);
  const highDensity = densityAt(profile, high);
  if (low >= high) {
    throw new NumericError("outside-domain", `the band must rise: it runs from ${low} to ${high} Hz`);
  }
  let rms = 0;
  let f = low;
  let S = lowDensity;
  for (let i = 0; i <= last; i++) {
    if (frequencies[i] <= low) continue;
    const end = frequencies[i] >= high;
    const nextF = end ? high : frequencies[i];
    const nextS = end ? highDensity : densities[i];
    rms = magnitude(rms, segmentRms(f, S, nextF, nextS));
    if (end) break;
    f = nextF;
    S = nextS;
  }
  return finite("rms acceleration", rms);
}

function segmentRms(f1: number, S1: number, f2: number, S2: number): number {
  const L = logRatio(f1, f2);
  const x = logRatio(S1, S2) + L;
  // from the end with the larger S f, so that the exponential only falls
  const rising = x > 0;
  const shape = x === 0 ? 1 : -Math.expm1(-Math.abs(x)) / Math.abs(x);
  return Math.sqrt(rising ? S2 : S1) * Math.sqrt(rising ? f2 : f1) * Math.sqrt(L * shape);
}

/** Plots of the functions that stand for no single point on the response of one mass: spectra, pulses, records, chains. */
import { NumericError } from "../core/errors";
import { responseHistory } from "../core/history";
import { STANDARD_GRAVITY } from "../core/mount";
import { densityAt, type Profile, readProfile } from "../core/psd";
import { piecesOf, PULSE_SHAPES, type PulsePiece, type PulseShape } from "../core/pulseShapes";
import { type AccelerationRecord, readRecord } from "../core/record";
import { relaxationTransmissibility } from "../core/relaxation";
import { shockSpectrum } from "../core/srs";
import { twoStageTransmissibility } from "../core/twoStage";
import {
  absoluteTransmissibility,
  hystereticRelativeTransmissibility,
  hystereticTransmissibility,
  relativeTransmissibility,
} from "../core/transmissibility";
import type { Point } from "./curves";
import { dampingModelOf, type Explanation, numberOf, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import type { PlotLine } from "./plot";
import type { Picture } from "./responsePlot";
import { strings } from "./strings";

const words = strings.special;

/** The function's own picture; null where its arguments give none. */
export function specialPicture(explanation: Explanation, numbers: Numbers): Picture | null {
  try {
    return pictures[explanation.doc.id]?.(explanation, numbers) ?? null;
  } catch (error) {
    if (error instanceof NumericError) return null;
    throw error;
  }
}

type Draw = (explanation: Explanation, numbers: Numbers) => Picture | null;

const pictures: Record<string, Draw> = {
  PSDAT: spectrum,
  PSDRMS: spectrum,
  RANDRMS: spectrum,
  PULSE: pulse,
  PULSEVELOCITY: pulse,
  SRS: shock,
  HISTORY: record,
  TWOSTAGE: chain,
  RELAXTRANS: relaxation,
};

/** Numbers of a table argument, read row by row; null unless every cell is one. */
function column(explanation: Explanation, name: string): number[] | null {
  const cells = explanation.rows.find(({ parameter }) => parameter.name === name)?.table?.flat();
  return cells?.every((cell) => typeof cell === "number") ? (cells as number[]) : null;
}

function spectrum(explanation: Explanation, numbers: Numbers): Picture | null {
  const frequencies = column(explanation, "frequencies");
  const densities = column(explanation, "densities");
  if (!frequencies || !densities || frequencies.length !== densities.length) return null;
  const profile = readProfile(frequencies, densities);
  const lines: PlotLine[] = [
    { label: words.profile, points: frequencies.map((x, i) => ({ x, y: densities[i]! })), look: "second" },
  ];
  const fn = numberOf(explanation, "naturalFrequency");
  const zeta = numberOf(explanation, "dampingRatio");
  if (fn !== undefined && zeta !== undefined && fn > 0 && zeta >= 0) {
    lines.push({ label: words.responseDensity, points: responseDensity(explanation, profile, fn, zeta), look: "main" });
  }
  const f = numberOf(explanation, "frequency");
  const { result } = explanation;
  if (f !== undefined && typeof result === "number") {
    lines.push({ label: words.here, points: [{ x: f, y: result }], look: "point" });
  }
  const known = typeof result === "number" ? [words.tellsRms(numbers.short(result))] : [];
  return picture(lines, words.hertz, words.density, true, true, numbers, known);
}

function responseDensity(explanation: Explanation, profile: Profile, fn: number, zeta: number): Point[] {
  const hysteretic = dampingModelOf(explanation) === "hysteretic";
  const deflection = wordOf(explanation, "response") === "deflection";
  const absolute = hysteretic ? hystereticTransmissibility : absoluteTransmissibility;
  const relative = hysteretic ? hystereticRelativeTransmissibility : relativeTransmissibility;
  const scale = deflectionScale(explanation);
  const { frequencies } = profile;
  return spaced(frequencies[0]!, frequencies.at(-1)!, 300, fn).map((x) => {
    const gain = deflection ? (relative(x, fn, zeta) * scale) / (2 * Math.PI * x) ** 2 : absolute(x, fn, zeta);
    return { x, y: densityAt(profile, x) * gain * gain };
  });
}

/** Length in the sheet's unit of 1 s² of the sheet's acceleration. */
function deflectionScale(explanation: Explanation): number {
  const system = wordOf(explanation, "units");
  if (system === "mm") return STANDARD_GRAVITY * 1000;
  return system === "inch" ? STANDARD_GRAVITY / 0.0254 : 1;
}

function pulse(explanation: Explanation, numbers: Numbers): Picture | null {
  const shape = wordOf(explanation, "shape") as PulseShape | undefined;
  const peak = numberOf(explanation, "peak");
  const duration = numberOf(explanation, "duration");
  if (!shape || !PULSE_SHAPES.includes(shape) || peak === undefined || !duration || duration < 0) return null;
  const fn = numberOf(explanation, "naturalFrequency");
  const cycle = fn && fn > 0 ? 1 / fn : 0;
  const length = duration + Math.min(Math.max(2.5 * cycle, duration / 2), 20 * duration);
  const timeStep = Math.max(Math.min(duration / 100, cycle > 0 ? cycle / 40 : Infinity), length / 4000);
  const samples = Array.from(
    { length: Math.ceil(length / timeStep) + 1 },
    (_, i) => peak * heightAt(piecesOf(shape), (i * timeStep) / duration),
  );
  return history(explanation, readRecord(samples, timeStep), samples, numbers, words.pulse);
}

/** Height of a pulse of unit peak at a share of its duration. */
function heightAt(pieces: readonly PulsePiece[], t: number): number {
  if (t < 0 || t > 1) return 0;
  let start = 0;
  for (const piece of pieces) {
    if (piece.form === "sine") return Math.sin(Math.PI * t);
    if (piece.form === "haversine") return Math.sin(Math.PI * t) ** 2;
    if (t <= start + piece.length) return piece.from + ((piece.to - piece.from) * (t - start)) / piece.length;
    start += piece.length;
  }
  return 0;
}

function record(explanation: Explanation, numbers: Numbers): Picture | null {
  const samples = column(explanation, "accelerations");
  const timeStep = numberOf(explanation, "timeStep");
  if (!samples || timeStep === undefined) return null;
  return history(explanation, readRecord(samples, timeStep), samples, numbers, words.base);
}

function history(
  explanation: Explanation,
  base: AccelerationRecord,
  samples: readonly number[],
  numbers: Numbers,
  baseLabel: string,
): Picture {
  const at = (values: ArrayLike<number>, scale = 1): Point[] =>
    thinned(values).map(([i, y]) => ({ x: i * base.timeStep, y: y * scale }));
  const lines: PlotLine[] = [];
  const fn = numberOf(explanation, "naturalFrequency");
  const zeta = numberOf(explanation, "dampingRatio");
  const deflection = wordOf(explanation, "response") === "deflection";
  if (!deflection || fn === undefined) lines.push({ label: baseLabel, points: at(samples), look: "second" });
  if (fn !== undefined && zeta !== undefined) {
    const response = responseHistory(base, fn, zeta, deflection ? "deflection" : "acceleration");
    const label = deflection ? words.deflection : words.acceleration;
    lines.push({ label, points: at(response, deflection ? deflectionScale(explanation) : 1), look: "main" });
  }
  const { result } = explanation;
  const told =
    typeof result === "number" && explanation.doc.id === "PULSE" ? [words.tellsLargest(numbers.short(result))] : [];
  return picture(lines, words.seconds, "", false, false, numbers, told);
}

const MOST_POINTS = 1500;

/** Every value, or of long records the smallest and the largest of each stretch, so that no peak is lost. */
function thinned(values: ArrayLike<number>): [index: number, value: number][] {
  const all = Array.from(values, (value, i): [number, number] => [i, value]);
  if (all.length <= MOST_POINTS) return all;
  const stretch = Math.ceil((2 * all.length) / MOST_POINTS);
  const kept: [number, number][] = [];
  for (let start = 0; start < all.length; start += stretch) {
    const part = all.slice(start, start + stretch).sort((a, b) => a[1] - b[1]);
    const ends = [part[0]!, part.at(-1)!].sort((a, b) => a[0] - b[0]);
    kept.push(...(part.length > 1 ? ends : [part[0]!]));
  }
  return kept;
}

function shock(explanation: Explanation, numbers: Numbers): Picture | null {
  const samples = column(explanation, "accelerations");
  const timeStep = numberOf(explanation, "timeStep");
  const fn = numberOf(explanation, "naturalFrequency");
  const zeta = numberOf(explanation, "dampingRatio");
  if (!samples || timeStep === undefined || fn === undefined || zeta === undefined || !(fn > 0)) return null;
  const deflection = wordOf(explanation, "response") === "deflection";
  const frequencies = spaced(
    Math.min(fn / 10, 0.5 / (samples.length * timeStep)),
    Math.max(fn * 4, 0.1 / timeStep),
    60,
  );
  const found = shockSpectrum(
    readRecord(samples, timeStep),
    frequencies,
    zeta,
    deflection ? "deflection" : "acceleration",
  );
  const scale = deflection ? deflectionScale(explanation) : 1;
  const lines: PlotLine[] = [
    { label: words.spectrum, points: frequencies.map((x, i) => ({ x, y: found[i]! * scale })), look: "main" },
  ];
  const { result } = explanation;
  if (typeof result === "number") lines.push({ label: words.here, points: [{ x: fn, y: result }], look: "point" });
  const told = typeof result === "number" ? [words.tellsShock(numbers.short(fn), numbers.short(result))] : [];
  return picture(lines, words.naturalHertz, "", true, true, numbers, told);
}

function chain(explanation: Explanation, numbers: Numbers): Picture | null {
  const f = numberOf(explanation, "frequency");
  const part = (name: string, scale: number): number => (numberOf(explanation, name) ?? Number.NaN) * scale;
  const system = wordOf(explanation, "units");
  const mass = system === "inch" ? 0.45359237 : 1;
  const stiffness = system === "mm" ? 1000 : system === "inch" ? 4.4482216152605 / 0.0254 : 1;
  const stage = (which: string) => ({
    mass: part(`${which}Mass`, mass),
    stiffness: part(`${which}Stiffness`, stiffness),
    damping: part(`${which}Damping`, stiffness),
  });
  const lower = stage("lower");
  const upper = stage("upper");
  const fn = Math.sqrt(upper.stiffness / upper.mass) / (2 * Math.PI);
  return f === undefined
    ? null
    : response((x) => twoStageTransmissibility(x, lower, upper), f, fn, words.twoStage, explanation, numbers);
}

function relaxation(explanation: Explanation, numbers: Numbers): Picture | null {
  const [f, fn, zeta, N] = ["frequency", "naturalFrequency", "dampingRatio", "seriesRatio"].map((name) =>
    numberOf(explanation, name),
  );
  if (f === undefined || fn === undefined || zeta === undefined || N === undefined || !(fn > 0)) return null;
  const compute = (x: number): number => relaxationTransmissibility(x, fn, zeta, N);
  return response(compute, f, fn, words.relaxation, explanation, numbers);
}

function response(
  compute: (f: number) => number,
  f: number,
  fn: number,
  label: string,
  { result }: Explanation,
  numbers: Numbers,
): Picture {
  const points = spaced(Math.min(fn / 10, f > 0 ? f / 2 : fn), Math.max(fn * 10, f * 2), 300, fn).map((x) => ({
    x,
    y: compute(x),
  }));
  const lines: PlotLine[] = [{ label, points, look: "main" }];
  const known = typeof result === "number";
  if (known) lines.push({ label: words.here, points: [{ x: f, y: result }], look: "point" });
  const told = known ? [words.tellsResponse(numbers.short(f), numbers.short(result))] : [];
  return picture(lines, strings.plot.frequency, "", true, true, numbers, told);
}

/** Evenly spaced on a logarithmic axis, both ends in, with `through` among them when it lies between. */
function spaced(from: number, to: number, count: number, through?: number): number[] {
  const step = Math.log(to / from) / (count - 1);
  const found = Array.from({ length: count }, (_, i) => Math.min(from * Math.exp(i * step), to));
  if (through !== undefined && through > from && through < to) found.push(through);
  return found.sort((a, b) => a - b);
}

function picture(
  lines: readonly PlotLine[],
  xTitle: string,
  yTitle: string,
  xLog: boolean,
  yLog: boolean,
  numbers: Numbers,
  tells: readonly string[],
): Picture {
  const content = { lines, xTitle, yTitle, xRange: null, yRange: null, xLog, yLog, number: numbers.short };
  return {
    content,
    tells: [...tells, ...(tells.length === 0 ? lines.map(({ label }) => `${label}.`) : [])],
    response: false,
  };
}

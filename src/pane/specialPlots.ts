/** Plots of the functions that stand for no single point on the response of one mass: spectra, pulses, records, chains. */
import { NumericError } from "../core/errors";
import { densityAt, type Profile, readProfile } from "../core/psd";
import { readRecord } from "../core/record";
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
import { column, deflectionScale, picture, spaced } from "./pictures";
import type { PlotLine } from "./plot";
import { pulse, record } from "./recordPlots";
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

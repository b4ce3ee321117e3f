/** Plots over time: pulses and records with the response to them. */
import { responseHistory } from "../core/history";
import { piecesOf, PULSE_SHAPES, type PulsePiece, type PulseShape } from "../core/pulseShapes";
import { type AccelerationRecord, readRecord } from "../core/record";
import type { Point } from "./curves";
import { type Explanation, numberOf, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import { column, deflectionScale, picture } from "./pictures";
import type { PlotLine } from "./plot";
import type { Picture } from "./responsePlot";
import { strings } from "./strings";

const words = strings.special;

export function pulse(explanation: Explanation, numbers: Numbers): Picture | null {
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

export function record(explanation: Explanation, numbers: Numbers): Picture | null {
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

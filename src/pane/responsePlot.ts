/** What the plot of a cell shows and what it says in words, for those who do not see it. */
import { type Curves, curvesOf, type Tolerances, worstCase } from "./curves";
import { type Explanation, numberOf, operatingPoint, type OperatingPoint } from "./explain";
import type { Numbers } from "./numbers";
import type { PlotContent, PlotLine } from "./plot";
import { strings } from "./strings";

export interface Picture {
  readonly content: PlotContent;
  readonly tells: readonly string[];
  /** whether decibels and tolerances make sense here */
  readonly response: boolean;
}

/** The response of one mass on one mount with the cell's point on it; null where the cell stands for no such point. */
export function responsePicture(
  explanation: Explanation,
  typed: Tolerances,
  decibels: boolean,
  numbers: Numbers,
): Picture | null {
  const point = operatingPoint(explanation);
  if (!point) return null;
  const tolerances = tolerancesOf(explanation, typed);
  const curves = curvesOf(point, tolerances);
  const relativeAxis = explanation.doc.id === "PEAKTRANS";
  return {
    content: {
      lines: linesOf(curves, decibels),
      xTitle: relativeAxis ? strings.plot.ratio : strings.plot.frequency,
      yTitle: decibels ? "dB" : "",
      xRange: [curves.from, curves.to],
      yRange: rangeOf(curves, decibels),
      xLog: true,
      yLog: !decibels,
      number: numbers.short,
    },
    tells: tellsOf(curves, point, tolerances, numbers),
    response: true,
  };
}

/** Tolerances among the cell's arguments come before those typed in the pane. */
function tolerancesOf(explanation: Explanation, typed: Tolerances): Tolerances {
  const naturalFrequency = numberOf(explanation, "naturalFrequencyTolerance");
  const damping = numberOf(explanation, "dampingTolerance");
  const usable = (value: number | undefined): boolean => value !== undefined && value > 0 && value < 1;
  if (!usable(naturalFrequency) && !usable(damping)) return typed;
  return { naturalFrequency: naturalFrequency ?? 0, damping: Math.min(damping ?? 0, 1) };
}

/** The plot's ends up and down: whole decades or 20 dB around the curves, never less than 0.01 to 10. */
function rangeOf({ absolute, relative, worst, from }: Curves, decibels: boolean): [number, number] {
  let low = 0.1;
  let high = 2;
  for (const { x, y } of [...absolute, ...worst, ...relative.filter((each) => each.x > from * 3)]) {
    if (Number.isNaN(y) || x <= 0) continue;
    low = Math.min(low, y);
    high = Math.max(high, y);
  }
  const bottom = 10 ** Math.max(Math.floor(Math.log10(low)), -4);
  const top = high > 5 ? 10 ** Math.ceil(Math.log10(high * 1.1)) : 5;
  return decibels ? [20 * Math.log10(bottom), 20 * Math.log10(top)] : [bottom, top];
}

function linesOf(curves: Curves, decibels: boolean): PlotLine[] {
  const scaled = (points: readonly { x: number; y: number }[]) =>
    points.map(({ x, y }) => ({ x, y: decibels ? 20 * Math.log10(y) : y }));
  const [bottom, top] = rangeOf(curves, decibels);
  const words = strings.plot;
  const lines: PlotLine[] = [];
  if (curves.worst.length > 0) {
    lines.push({ label: words.worst, points: scaled(curves.worst), look: "edge" });
    lines.push({ label: words.band, points: scaled(curves.best), look: "fill" });
  }
  lines.push({ label: words.absolute, points: scaled(curves.absolute), look: "main" });
  lines.push({ label: words.relative, points: scaled(curves.relative), look: "second" });
  const onset = [
    { x: curves.onset, y: bottom },
    { x: curves.onset, y: top },
  ];
  lines.push({ label: words.onset, points: onset, look: "rule" });
  if (curves.peak) lines.push({ label: words.peak, points: scaled([curves.peak]), look: "hollow" });
  if (curves.here) {
    lines.push({ label: words.hereItem, points: scaled([curves.here.absolute]), look: "point" });
    lines.push({ label: words.hereMount, points: scaled([curves.here.relative]), look: "point2" });
  }
  return lines;
}

function tellsOf(curves: Curves, point: OperatingPoint, tolerances: Tolerances, numbers: Numbers): string[] {
  const words = strings.plot;
  const said: string[] = [];
  if (curves.here) {
    said.push(
      words.tells(numbers.short(point.f), numbers.short(curves.here.absolute.y), numbers.short(curves.here.relative.y)),
    );
  }
  said.push(curves.peak ? words.tellsPeak(numbers.short(curves.peak.x), numbers.short(curves.peak.y)) : words.undamped);
  const worst = curves.worst.length > 0 ? worstCase(point, tolerances) : null;
  if (worst) said.push(words.tellsWorst(numbers.short(worst.absolute), numbers.short(worst.relative)));
  return said;
}

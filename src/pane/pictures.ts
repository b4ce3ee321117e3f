/** What the special plots share. */
import { STANDARD_GRAVITY } from "../core/mount";
import { type Explanation, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import type { PlotLine } from "./plot";
import type { Picture } from "./responsePlot";

/** Numbers of a table argument, read row by row; null unless every cell is one. */
export function column(explanation: Explanation, name: string): number[] | null {
  const cells = explanation.rows.find(({ parameter }) => parameter.name === name)?.table?.flat();
  return cells?.every((cell) => typeof cell === "number") ? (cells as number[]) : null;
}

/** Length in the sheet's unit of 1 s² of the sheet's acceleration. */
export function deflectionScale(explanation: Explanation): number {
  const system = wordOf(explanation, "units");
  if (system === "mm") return STANDARD_GRAVITY * 1000;
  return system === "inch" ? STANDARD_GRAVITY / 0.0254 : 1;
}

/** Evenly spaced on a logarithmic axis, both ends in, with `through` among them when it lies between. */
export function spaced(from: number, to: number, count: number, through?: number): number[] {
  const step = Math.log(to / from) / (count - 1);
  const found = Array.from({ length: count }, (_, i) => Math.min(from * Math.exp(i * step), to));
  if (through !== undefined && through > from && through < to) found.push(through);
  return found.sort((a, b) => a - b);
}

export function picture(
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

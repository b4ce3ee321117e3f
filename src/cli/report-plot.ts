/** A small plot: what the sheet says against what is right, over the rows of a column. */
import type { Finding } from "../audit/finding";
import { shown } from "./report-effect";

const width = 520;
const height = 170;
const left = 64;
const right = 12;
const top = 12;
const bottom = 26;

/** An SVG element, or nothing where there are fewer than two rows to compare. */
export function comparisonPlot(comparison: Finding["comparison"]): string {
  const rows = comparison.filter(({ hand, right: value }) => Number.isFinite(hand) && Number.isFinite(value));
  if (rows.length < 2) return "";
  const values = rows.flatMap(({ hand, right: value }) => [hand, value]);
  const scale = scaleOf(values);
  const x = (i: number): number => left + (i * (width - left - right)) / (rows.length - 1);
  const y = (value: number): number => top + (1 - scale.share(value)) * (height - top - bottom);
  const path = (of: (row: (typeof rows)[number]) => number): string =>
    rows.map((row, i) => `${i === 0 ? "M" : "L"}${round(x(i))} ${round(y(of(row)))}`).join("");
  const ticks = scale.ticks
    .map(
      (tick) =>
        `<line class="grid" x1="${left}" x2="${width - right}" y1="${round(y(tick))}" y2="${round(y(tick))}"/>` +
        `<text x="${left - 6}" y="${round(y(tick) + 4)}" text-anchor="end">${shown(tick)}</text>`,
    )
    .join("");
  const marks = rows
    .map(
      (row, i) =>
        `<circle class="hand" cx="${round(x(i))}" cy="${round(y(row.hand))}" r="${rows.length > 60 ? 1.5 : 3}"/>`,
    )
    .join("");
  const first = rows[0]!.cell;
  const last = rows[rows.length - 1]!.cell;
  return (
    `<svg viewBox="0 0 ${width} ${height}" role="img" aria-label="Value in the sheet and right value from ${first} to ${last}">` +
    `${ticks}<path class="right" d="${path((row) => row.right)}"/><path class="hand" d="${path((row) => row.hand)}"/>${marks}` +
    `<text x="${left}" y="${height - 6}">${first}</text>` +
    `<text x="${width - right}" y="${height - 6}" text-anchor="end">${last}</text></svg>`
  );
}

const round = (value: number): number => Math.round(value * 10) / 10;

interface Scale {
  /** 0 at the bottom, 1 at the top */
  share(value: number): number;
  readonly ticks: readonly number[];
}

/** Logarithmic where all values are positive and far apart. */
function scaleOf(values: readonly number[]): Scale {
  const least = Math.min(...values);
  const most = Math.max(...values);
  if (least > 0 && most / least > 50) {
    const from = Math.floor(Math.log10(least));
    const to = Math.max(from + 1, Math.ceil(Math.log10(most)));
    const every = Math.ceil((to - from) / 5);
    const ticks: number[] = [];
    for (let power = from; power <= to; power += every) ticks.push(Number(`1e${power}`));
    return { share: (value) => (Math.log10(value) - from) / (to - from), ticks };
  }
  const step = niceStep((most - least || Math.abs(most) || 1) / 3);
  const from = Math.floor(least / step) * step;
  const to = Math.max(Math.ceil(most / step) * step, from + step);
  const ticks: number[] = [];
  for (let i = 0; from + i * step <= to + step / 2; i++) ticks.push(Number((from + i * step).toPrecision(12)));
  return { share: (value) => (value - from) / (to - from), ticks };
}

/** 1, 2 or 5 times a power of ten, not below the value. */
function niceStep(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  return ([1, 2, 5].find((factor) => factor * power >= value) ?? 10) * power;
}

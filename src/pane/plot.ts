/** Draws the curves. Loaded when the first plot is shown. */
import {
  Chart,
  type ChartDataset,
  Filler,
  LinearScale,
  LineController,
  LineElement,
  LogarithmicScale,
  PointElement,
  ScatterController,
} from "chart.js";

Chart.register(LineController, ScatterController, LineElement, PointElement, LogarithmicScale, LinearScale, Filler);

export interface PlotLine {
  readonly label: string;
  readonly points: readonly { readonly x: number; readonly y: number }[];
  readonly look: "main" | "second" | "edge" | "fill" | "rule" | "point" | "point2" | "hollow";
}

export interface PlotContent {
  readonly lines: readonly PlotLine[];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly xRange: readonly [number, number] | null;
  readonly yRange: readonly [number, number] | null;
  readonly xLog: boolean;
  readonly yLog: boolean;
  readonly number: (value: number) => string;
}

export interface Plot {
  draw(content: PlotContent): void;
  /** takes the colours anew */
  recolour(): void;
}

export function createPlot(canvas: HTMLCanvasElement): Plot {
  let chart: Chart<"scatter"> | undefined;
  let last: PlotContent | undefined;

  function draw(content: PlotContent): void {
    last = content;
    const colour = colours(canvas);
    const datasets = content.lines.map((line) => dataset(line, colour));
    const scales = {
      x: axis(content.xLog, content.xTitle, content.xRange, content.number, colour),
      y: axis(content.yLog, content.yTitle, content.yRange, content.number, colour),
    };
    if (chart) {
      chart.data.datasets = datasets;
      chart.options.scales = scales;
      chart.update("none");
      return;
    }
    chart = new Chart<"scatter">(canvas, {
      type: "scatter",
      data: { datasets },
      options: {
        animation: false,
        events: [],
        parsing: false,
        normalized: true,
        maintainAspectRatio: false,
        layout: { padding: { right: 8, top: 4 } },
        plugins: { legend: { display: false }, tooltip: { enabled: false } },
        scales,
      },
    });
  }

  return { draw, recolour: () => last && draw(last) };
}

type Colours = Record<"ink" | "soft" | "line" | "clay" | "slate" | "wash" | "paper", string>;

/** The palette as the canvas needs it: plain colours, read from an element that wears them. */
function colours(canvas: HTMLCanvasElement): Colours {
  const probe = document.createElement("span");
  canvas.parentElement!.append(probe);
  const read = (name: string): string => {
    probe.style.color = `var(--${name})`;
    return getComputedStyle(probe).color;
  };
  const found: Colours = {
    ink: read("ink"),
    soft: read("ink-soft"),
    line: read("line"),
    clay: read("clay"),
    slate: read("slate"),
    wash: read("clay-wash"),
    paper: read("paper"),
  };
  probe.remove();
  return found;
}

function dataset({ label, points, look }: PlotLine, colour: Colours): ChartDataset<"scatter"> {
  const base = { label, data: points as { x: number; y: number }[], showLine: true, pointRadius: 0, spanGaps: false };
  switch (look) {
    case "main":
      return { ...base, borderColor: colour.clay, borderWidth: 2.25, order: 2 };
    case "second":
      return { ...base, borderColor: colour.slate, borderWidth: 1.75, borderDash: [6, 3], order: 3 };
    case "edge":
      return { ...base, borderColor: colour.clay, borderWidth: 1, borderDash: [2, 3], order: 4 };
    case "fill":
      return {
        ...base,
        borderWidth: 1,
        borderColor: colour.clay,
        borderDash: [2, 3],
        backgroundColor: colour.wash,
        fill: "-1",
        order: 5,
      };
    case "rule":
      return { ...base, borderColor: colour.soft, borderWidth: 1, borderDash: [3, 3], order: 6 };
    case "point":
    case "point2":
      return {
        ...base,
        showLine: false,
        pointRadius: 5,
        backgroundColor: look === "point" ? colour.clay : colour.slate,
        borderColor: colour.paper,
        borderWidth: 1.5,
        order: 0,
      };
    case "hollow":
      return {
        ...base,
        showLine: false,
        pointRadius: 4.5,
        pointStyle: "rectRot",
        backgroundColor: colour.paper,
        borderColor: colour.ink,
        borderWidth: 1.5,
        order: 1,
      };
    default:
      return look satisfies never;
  }
}

function axis(
  log: boolean,
  title: string,
  range: readonly [number, number] | null,
  number: (value: number) => string,
  colour: Colours,
) {
  return {
    type: log ? ("logarithmic" as const) : ("linear" as const),
    ...(range && { min: range[0], max: range[1] }),
    title: { display: true, text: title, color: colour.soft, font: { size: 11 }, padding: 2 },
    border: { color: colour.line },
    grid: { color: colour.line, lineWidth: 0.5 },
    ticks: {
      color: colour.soft,
      font: { size: 11 },
      maxRotation: 0,
      autoSkip: !log,
      callback(value: string | number, _index: number, ticks: readonly { value: number }[]) {
        return log && !isLabelled(Number(value), ticks) ? "" : number(Number(value));
      },
    },
  };
}

/** 1, 2 and 5 in each decade carry a number, over more than three decades 1 alone, over more than six every other one. */
function isLabelled(value: number, ticks: readonly { value: number }[]): boolean {
  const decades = Math.log10(ticks.at(-1)!.value / ticks[0]!.value);
  const exponent = Math.floor(Math.log10(value) + 1e-9);
  const mantissa = value / 10 ** exponent;
  const labelled = decades > 3 ? [1] : [1, 2, 5];
  return labelled.some((round) => Math.abs(mantissa - round) < 1e-6) && (decades <= 6 || exponent % 2 === 0);
}

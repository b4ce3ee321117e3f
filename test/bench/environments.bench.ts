/** One cell of random response, shock pulse, run-up and six modes. */
import { pulseResponse } from "../../src/core/pulse";
import { PULSE_SHAPES } from "../../src/core/pulseShapes";
import { readProfile } from "../../src/core/psd";
import { randomResponseRms } from "../../src/core/randomResponse";
import { runupPeak } from "../../src/core/runup";
import { rigidBodyFrequencies, type Vector } from "../../src/core/rigidModes";
import { type Figure, median, timesOf } from "./measure";

const CALLS = 2000;

export default function bench(): Figure[] {
  const profile = readProfile([20, 50, 80, 300, 800, 2000], [0.01, 0.04, 0.04, 0.08, 0.04, 0.01]);
  const figures = [0.05, 1e-6, 1].map((zeta) =>
    perCall(`RANDRMS, 6 points, zeta ${zeta}`, 50, (i) =>
      randomResponseRms(profile, 100 + i * 0.01, zeta, "acceleration", "viscous"),
    ),
  );
  for (const [span, least, most] of [
    ["0.01 to 2", 0.01, 2],
    ["2 to 100", 2, 100],
    ["100 to 1e6", 100, 1e6],
  ] as const) {
    const step = (most / least) ** (1 / CALLS);
    figures.push(
      perCall(`PULSE, all shapes, fn D ${span}, zeta 0 to 0.5`, 20, (i) =>
        pulseResponse(PULSE_SHAPES[i % 7], 1, 1, least * step ** i, (i % 11) / 20, "acceleration"),
      ),
    );
  }
  const corners: Vector[] = [[0.4, 0.3, -0.2], [-0.4, 0.3, -0.2], [0.4, -0.3, -0.2], [-0.4, -0.3, -0.2]]; // prettier-ignore
  const inertia: Vector[] = [[9, 0.1, 0], [0.1, 12, 0.2], [0, 0.2, 16]]; // prettier-ignore
  const springs = corners.map((_, i): Vector => [6e4 + i * 1e3, 5e4, 1e5]);
  figures.push(perCall("RIGIDMODES, 4 mounts", 1000, () => rigidBodyFrequencies(180, inertia, corners, springs)));
  const sweep = timesOf(() => runupPeak(8, 0.05, 0.5, 0, 30), 7);
  figures.push({ what: "RUNUP of 900 cycles", median: median(sweep) });
  return figures;
}

/** Milliseconds for CALLS calls against a limit of `limit` microseconds each. */
function perCall(what: string, limit: number, call: (i: number) => unknown): Figure {
  const times = timesOf(() => {
    for (let i = 0; i < CALLS; i++) call(i);
  }, 7);
  const middle = median(times);
  const each = (middle * 1000) / CALLS;
  return {
    what: `${what}, ${CALLS} calls`,
    median: middle,
    target: `${limit} µs each`,
    met: each <= limit,
    beside: `${each.toFixed(1)} µs each`,
  };
}

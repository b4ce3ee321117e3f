/** T over columns: the core's array kernel beside C and numpy, and the cell function on rows of cells. */
import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { absoluteTransmissibilities } from "../../src/core/transmissibility";
import { ABSTRANS } from "../../src/functions";
import { type Figure, median, timesOf, within } from "./measure";

const MILLION = 1048576;
const frequency = (i: number) => 1 + (i % 9973) * 0.01;
const naturalFrequency = (i: number) => 5 + (i % 4999) * 0.002;
const dampingRatio = (i: number) => 0.01 + (i % 997) * 0.001;

export default function bench(): Figure[] {
  return [...kernel(), ...cellFunction()];
}

/** Ours and its peers take turns, so that a busy moment of the machine meets them all. */
function kernel(): Figure[] {
  const columns = [frequency, naturalFrequency, dampingRatio].map((of) =>
    Float64Array.from({ length: MILLION }, (_, i) => of(i)),
  );
  const [f, fn, zeta] = columns;
  const out = new Float64Array(MILLION);
  const folder = mkdtempSync(join(tmpdir(), "bench-"));
  const program = join(folder, "transmissibility");
  const source = (name: string) => join(import.meta.dirname, name);
  const peers: Record<string, string[]> = {};
  if (runs("cc", ["-O2", "-o", program, source("transmissibility.c"), "-lm"])) peers.C = [program];
  if (runs("python3", ["-c", "import numpy"])) peers.numpy = ["python3", source("transmissibility.py")];
  const times: Record<string, number[]> = { ours: [] };
  for (let turn = 0; turn < 5; turn++) {
    times.ours.push(...timesOf(() => absoluteTransmissibilities(f, fn, zeta, out), 7));
    for (const [name, [command, ...args]] of Object.entries(peers)) {
      const printed = execFileSync(command, [...args, String(MILLION), "7"], {
        encoding: "utf8",
        stdio: ["ignore", "pipe", "ignore"],
      });
      (times[name] ??= []).push(...printed.trim().split("\n").map(Number));
    }
  }
  rmSync(folder, { recursive: true });
  const ours = median(times.ours);
  const figures: Figure[] = [{ what: `T, core kernel, ${MILLION} rows`, median: ours }];
  for (const [name, most] of [
    ["C", 1.5],
    ["numpy", 0.8],
  ] as const) {
    if (times[name] === undefined) continue;
    const peer = median(times[name]);
    const ratio = ours / peer;
    figures.push({
      what: `the same in ${name}`,
      median: peer,
      target: `ours ≤ ${most} of it`,
      met: ratio <= most,
      beside: `ours takes ${ratio.toFixed(2)} of it`,
    });
  }
  return figures;
}

function cellFunction(): Figure[] {
  const rows = (of: (i: number) => number, n: number): any[][] => Array.from({ length: n }, (_, i) => [of(i)]);
  const columns = (n: number) =>
    [frequency, naturalFrequency, dampingRatio].map((of) => rows(of, n)) as [any[][], any[][], any[][]];
  const few = columns(100000);
  const many = columns(MILLION);
  const bare = () => rows((i) => i / 3, MILLION);
  const floor = median(timesOf(bare));
  const million = within(
    `ABSTRANS on ${MILLION} rows of cells`,
    timesOf(() => ABSTRANS(...many)),
    120,
  );
  return [
    within(
      "ABSTRANS on 100000 rows of cells",
      timesOf(() => ABSTRANS(...few), 15),
      15,
    ),
    { ...million, beside: `the result rows alone, unfilled by any formula, take ${floor.toFixed(0)} ms here` },
    within(
      "ABSTRANS, 100000 calls of one cell",
      timesOf(() => {
        for (let i = 0; i < 100000; i++) ABSTRANS([few[0][i]], [few[1][i]], [few[2][i]]);
      }),
      100,
    ),
  ];
}

function runs(command: string, args: string[]): boolean {
  try {
    execFileSync(command, args, { stdio: "ignore" });
    return true;
  } catch {
    return false;
  }
}

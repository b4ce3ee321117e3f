/** Shock response spectrum of 100,000 samples at 20 kHz, 200 natural frequencies, beside C and a compiled filter library. */
import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { readRecord } from "../../src/core/record";
import { shockSpectrum } from "../../src/core/srs";
import { type Figure, median, timesOf } from "./measure";

const SAMPLES = 100000;
const FREQUENCIES = 200;

export default function bench(): Figure[] {
  const folder = mkdtempSync(join(tmpdir(), "bench-"));
  try {
    return [...spectrum(2000, folder), ...spectrum(10000, folder), ...linearity()];
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Ours and its peers take turns, so that a busy moment of the machine meets them all. */
function spectrum(top: number, folder: string): Figure[] {
  const record = noise(SAMPLES);
  const frequencies = Array.from({ length: FREQUENCIES }, (_, k) => 10 * (top / 10) ** (k / (FREQUENCIES - 1)));
  const program = join(folder, "srs");
  const peers: [name: string, most: number, command: string[]][] = [];
  if (runs("cc", ["-O2", "-o", program, join(import.meta.dirname, "srs.c"), "-lm"])) peers.push(["C", 1.5, [program]]);
  if (runs("python3", ["-c", "import scipy.signal"])) {
    peers.push(["scipy.signal.lfilter", 1, ["python3", join(import.meta.dirname, "srs.py")]]);
  }
  const ours: number[] = [];
  const theirs = peers.map((): number[] => []);
  for (let turn = 0; turn < 3; turn++) {
    ours.push(...timesOf(() => shockSpectrum(record, frequencies, 0.05, "acceleration"), 5));
    peers.forEach(([, , [command, ...args]], k) => {
      const numbers = [SAMPLES, FREQUENCIES, 5, top].map(String);
      const printed = execFileSync(command, [...args, ...numbers], {
        encoding: "utf8",
        stdio: ["ignore", "pipe", "ignore"],
      });
      theirs[k].push(...printed.trim().split("\n").map(Number));
    });
  }
  const middle = median(ours);
  const what = `SRS to ${top} Hz, ${SAMPLES} samples × ${FREQUENCIES} frequencies, extremes between samples`;
  const figures: Figure[] = [{ what, median: middle }];
  peers.forEach(([name, most], k) => {
    const peer = median(theirs[k]);
    const ratio = middle / peer;
    const beside = `ours takes ${ratio.toFixed(2)} of it`;
    const target = `ours ≤ ${most} of it`;
    figures.push({ what: `the samples alone in ${name}`, median: peer, target, met: ratio <= most, beside });
  });
  return figures;
}

function linearity(): Figure[] {
  const frequencies = Array.from({ length: 40 }, (_, k) => 10 * 200 ** (k / 39));
  const short = median(timesOf(() => shockSpectrum(noise(50000), frequencies, 0.05, "acceleration"), 7));
  const long = median(timesOf(() => shockSpectrum(noise(400000), frequencies, 0.05, "acceleration"), 7));
  const beside = `8 times the samples take ${(long / short).toFixed(1)} times as long`;
  return [{ what: "SRS of 400000 samples × 40 frequencies", median: long, beside }];
}

function noise(length: number) {
  let state = 12345;
  const samples = Float64Array.from({ length }, () => (state = (state * 16807) % 2147483647) / 1073741823.5 - 1);
  return readRecord(samples, 1 / 20000);
}

function runs(command: string, args: string[]): boolean {
  try {
    execFileSync(command, args, { stdio: "ignore" });
    return true;
  } catch {
    return false;
  }
}

/** Printed values, all recalled from memory of the named source and confirmed by an independent computation. */
import { readFileSync } from "node:fs";
import { join } from "node:path";
import * as plinth from "../../src/functions";

interface Entry {
  source: string;
  item: string;
  printed: string;
  computed: string;
  tolerance: string;
}
const { entries } = JSON.parse(readFileSync(join(process.cwd(), "test/reference/published.json"), "utf8")) as {
  entries: Entry[];
};

function entry(source: string, item: string): Entry {
  const found = entries.filter((each) => each.source.includes(source) && each.item === item);
  if (found.length !== 1) throw new Error(`${found.length} entries for ${source}: ${item}`);
  return found[0];
}

type CellFunction = (...args: any[]) => any[][];
const call = (id: string, ...args: unknown[]): number =>
  (plinth as unknown as Record<string, CellFunction>)[id](...args)[0][0];

const SPEED = 1 / 3.6; // m/s per km/h

const roughRoad = () => {
  const f = (20 * SPEED) / 6; // wavelength 6 m
  const fn = call("NATFREQ", 400000, 1200);
  return { r: f / fn, T: call("ABSTRANS", f, fn, 0.5) };
};

const car = (mass: number, kmh: number) => {
  const f = (0.2909 * kmh) / (2 * Math.PI);
  const fn = call("NATFREQ", 40000, mass);
  const zeta = call("DAMPRATIO", 2000, 40000, mass);
  return { r: f / fn, X: call("ABSTRANS", f, fn, zeta) }; // cm: the road moves 1 cm
};

const cases: [source: string, item: string, ours: () => number][] = [
  ["rough road", "frequency ratio r", () => roughRoad().r],
  ["rough road", "X/Y", () => roughRoad().T],
  ["rough road", "X", () => 0.05 * roughRoad().T],
  ["exhaust fan 40 kg", "K per spring", () => call("REQSTIFFNESS", 0.9, 1000 / 60, 0, 40) / 4],
  ["undamped isolator, 50 kg", "k", () => call("REQSTIFFNESS", 0.95, 120 / (2 * Math.PI), 0, 50)],
  ...[1007, 1585].flatMap((mass) =>
    [20, 80, 150]
      .filter((kmh) => mass === 1585 || kmh < 150)
      .flatMap((kmh): [string, string, () => number][] => [
        [`${mass} kg, ${kmh} km/h`, "r", () => car(mass, kmh).r],
        [`${mass} kg, ${kmh} km/h`, "X", () => car(mass, kmh).X],
      ]),
  ),
  ["handbook rule", "fn=15.76/sqrt(delta mm)", () => call("DEFLFREQ", 1, 1, "mm")],
  ["handbook rule", "fn=3.13/sqrt(delta in)", () => call("DEFLFREQ", 1, 1, "inch")],
  ["handbook rule", "fn=4.98/sqrt(delta cm)", () => call("DEFLFREQ", 0.01)],
  ["handbook rule", "fn=0.498/sqrt(delta m)", () => call("DEFLFREQ", 1)],
  ["handbook rule", "fn (cpm)=188/sqrt(delta in)", () => call("UNITS", call("DEFLFREQ", 1, 1, "inch"), "Hz", "cpm")],
  ...["0.5", "0.8", "0.9", "0.95"].map((E): [string, string, () => number] => [
    "undamped isolation charts",
    `r for ${E} isolation, zeta=0`,
    () => 1 / call("REQNATFREQ", Number(E), 1, 0),
  ]),
  ["Den Hartog and others", "T(sqrt2) for any zeta", () => call("ABSTRANS", Math.SQRT2, 1, 0.37)],
  ["classical (from memory)", "isolation begins at r", () => 1 / call("REQNATFREQ", 1e-15, 1, 0.37)],
  ["IEC 60068-2-6", "crossover 3.5e-3 m / 9.8 m/s2", () => call("CROSSOVER", 3.5e-3, 9.8)],
  ["IEC 60068-2-6", "crossover 7.5e-3 m / 19.6 m/s2", () => call("CROSSOVER", 7.5e-3, 19.6)],
  ["IEC 60068-2-6", "crossover 10e-3 m / 29.4 m/s2", () => call("CROSSOVER", 10e-3, 29.4)],
  ["VC-A 2000 uin/s vs 50 um/s", "2000 uin/s", () => call("UNITS", 2000e-6, "in/s", "um/s")],
  [
    "shaker handbook",
    "G=0.0511 f^2 D(in pk-pk)",
    () => call("MOTION", 1, 1, "displacement peak-to-peak", "acceleration peak", "inch"),
  ],
  [
    "shaker handbook",
    "G=2.013 f^2 D(m pk-pk)",
    () => call("MOTION", 1000, 1, "displacement peak-to-peak", "acceleration peak", "mm"),
  ],
  [
    "shaker handbook",
    "V(in/s)=61.42 G/f (386 rounding)",
    () => call("MOTION", 1, 1, "acceleration peak", "velocity peak", "inch"),
  ],
  [
    "shaker handbook",
    "V(m/s)=1.561 G/f",
    () => call("MOTION", 1, 1, "acceleration peak", "velocity peak", "mm") / 1000,
  ],
  [
    "shaker handbook",
    "D(m pk-pk)=0.4968 G/f^2",
    () => call("MOTION", 1, 1, "acceleration peak", "displacement peak-to-peak", "mm") / 1000,
  ],
];

test.each(cases)("%s, %s: as printed (from memory) and as computed independently", (source, item, ours) => {
  const { printed, computed, tolerance } = entry(source, item);
  const result = ours();
  expect(Math.abs(result / Number(computed) - 1)).toBeLessThanOrEqual(1e-13);
  if (printed === "8 to 9") {
    expect(result).toBeGreaterThan(8);
    expect(result).toBeLessThan(9);
  } else {
    expect(Math.abs(result - Number(printed))).toBeLessThanOrEqual(Math.max(Number(tolerance), 1e-15));
  }
});

test("practice: a base rule of thumb holds, three times the natural frequency isolates about 7/8 without damping", () => {
  expect(call("EFFICIENCY", 3, 1, 0)).toBe(7 / 8); // exact: 1 - 1/(9 - 1)
});

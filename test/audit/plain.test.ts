/** Plain formulas against our functions: an independent spreadsheet program recalculates them. */
import { plainFormula, plainFunctions } from "../../src/audit/plain";
import * as functions from "../../src/functions/index";
import { recalculate, type Sheets } from "../support/libreOffice";
import { combinations, grid, type Value } from "./plainGrid";

const byName = functions as unknown as Record<string, (...values: unknown[]) => unknown[][]>;
const columns = "ABCDEFGH";
const PATIENCE = 600_000; // milliseconds: the spreadsheet program takes its time to start

interface Case {
  id: string;
  shown: string;
  values: Value[];
  expected: number;
  budget: number;
}

const call = (id: string, values: readonly unknown[]): unknown => {
  try {
    return byName[id]!(...values)[0]![0];
  } catch (failure) {
    return (failure as Error).message;
  }
};

/** Cases by function; those that our function refuses, such as an undamped resonance, have no number to compare. */
const cases: Record<string, Case[]> = {};
for (const { id, values, budget } of grid) {
  for (const row of combinations(values)) {
    const expected = call(id, row);
    if (typeof expected !== "number") continue;
    (cases[id] ??= []).push({
      id,
      shown: `${id}(${row.map((value) => value ?? "").join(", ")})`,
      values: row,
      expected,
      budget: budget?.absolute ?? 0,
    });
  }
}

/** Inputs in cells, words in the formula, the plain formula in column J. */
function sheetOf(list: readonly Case[]): (string | number | null)[][] {
  return list.map(({ id, values }, r) => {
    const texts = values.map((value, i) =>
      value === null ? null : typeof value === "string" ? `"${value}"` : `${columns[i]}${r + 1}`,
    );
    const plain = plainFormula(id, texts);
    if ("none" in plain) throw new Error(plain.none);
    const cells = [...columns].map((_, i) => (typeof values[i] === "number" ? (values[i] as number) : null));
    return [...cells, null, `=${plain.formula}`];
  });
}

let results: ReturnType<typeof recalculate>;
beforeAll(() => {
  const sheets: Sheets = Object.fromEntries(Object.entries(cases).map(([id, list]) => [id, sheetOf(list)]));
  results = recalculate({ ...sheets, ...spilled });
}, PATIENCE);

const allowance = ({ expected, budget }: Case): number => Math.max(1e-12 * Math.abs(expected), budget);

test.each(Object.keys(cases))("an independent spreadsheet program gets %s from its plain formula", (id) => {
  const rows = results[id]!;
  const off = cases[id]!.flatMap((each, r) => {
    const found = rows[r]?.[9];
    const wrong = typeof found !== "number" || !(Math.abs(found - each.expected) <= allowance(each));
    return wrong ? [`${each.shown}: ${String(found)} for ${String(each.expected)}`] : [];
  });
  expect(off.slice(0, 10)).toEqual([]);
  expect(rows.length).toBe(cases[id]!.length);
});

// Results that fill several cells, and tables.

const at = (id: string, texts: (string | null)[], row: number): string => {
  const plain = plainFormula(id, texts, { row, column: 0 });
  if ("none" in plain) throw new Error(plain.none);
  return `=${plain.formula}`;
};
const profile = [
  [20, 0.01],
  [80, 0.04],
  [500, 0.04],
  [2000, 0.003],
];
const asked = [20, 33, 80, 200, 500, 1234, 2000];
const mounts = [
  [0, 0, 80000],
  [1.9, 0.1, 90000],
  [0.2, 1.1, 70000],
  [2, 1, 120000],
  [1, 0.5, 60000],
];
const spilled: Sheets = {
  "sweep linear": Array.from({ length: 11 }, (_, i) => [
    i < 2 ? [-3, 8][i]! : null,
    at("SWEEP", ["$A$1", "$A$2", "11"], i),
  ]),
  "sweep log": Array.from({ length: 11 }, (_, i) => [
    i < 2 ? [0.5, 2000][i]! : null,
    at("SWEEP", ["$A$1", "$A$2", "11", '"log"'], i),
  ]),
  stages: [0, 1].map((row) => [
    ...(row === 0 ? [10, 1e5, 20, 5e4] : [null, null, null, null]),
    at("TWOSTAGEFREQ", ["A$1", "B$1", "C$1", "D$1"], row),
  ]),
  profile: asked.map((f, i) => [
    ...(profile[i] ?? [null, null]),
    f,
    `=${(plainFormula("PSDAT", ["$A$1:$A$4", "$B$1:$B$4", `C${i + 1}`]) as { formula: string }).formula}`,
  ]),
  mounts: mounts.map((mount, i) => [
    ...mount,
    at("MOUNTLOADS", ["$A$1:$A$5", "$B$1:$B$5", "$C$1:$C$5", "4200", "1.1", "0.45"], i),
  ]),
  outside: [
    ...profile.map((row, i) => [
      ...row,
      i === 0
        ? `=${(plainFormula("PSDAT", ["$A$1:$A$4", "$B$1:$B$4", "19"]) as { formula: string }).formula}`
        : i === 1
          ? `=${(plainFormula("PSDAT", ["$A$1:$A$4", "$B$1:$B$4", "2001"]) as { formula: string }).formula}`
          : null,
    ]),
  ],
  words: ["viscous", " Hysteretic", null, "dry friction"].map((word, i) => [
    word,
    `=${(plainFormula("ABSTRANS", ["3", "1", "0.2", `A${i + 1}`]) as { formula: string }).formula}`,
  ]),
};

const column = (sheet: string, index: number): (string | number | undefined)[] =>
  results[sheet]!.map((row) => row[index]);

function expectClose(found: unknown[], expected: unknown[]): void {
  expect(found).toHaveLength(expected.length);
  expected.forEach((value, i) => {
    expect(Math.abs((found[i] as number) - (value as number))).toBeLessThanOrEqual(1e-12 * Math.abs(value as number));
  });
}

test("a sweep is one plain formula for each of its cells", () => {
  expectClose(column("sweep linear", 1), byName["SWEEP"]!(-3, 8, 11).flat());
  expectClose(column("sweep log", 1), byName["SWEEP"]!(0.5, 2000, 11, "log").flat());
});

test("both natural frequencies of two stages have a plain formula", () => {
  expectClose(column("stages", 4), byName["TWOSTAGEFREQ"]!(10, 1e5, 20, 5e4).flat());
});

test("a density is interpolated on log-log axes by a plain formula, and refused outside the band", () => {
  const [f, S] = [profile.map(([x]) => [x]), profile.map(([, y]) => [y])];
  expectClose(
    column("profile", 3),
    byName["PSDAT"]!(
      f,
      S,
      asked.map((x) => [x]),
    ).flat(),
  );
  expect(column("outside", 2).slice(0, 2)).toEqual(["#N/A", "#N/A"]);
});

test("each mount's load has a plain formula", () => {
  const [x, y, k] = [0, 1, 2].map((i) => mounts.map((mount) => [mount[i]]));
  expectClose(column("mounts", 3), byName["MOUNTLOADS"]!(x, y, k, 4200, 1.1, 0.45).flat());
});

test("a word that stands in a cell is read there, and an unknown one is an error", () => {
  const found = column("words", 1);
  expectClose(found.slice(0, 3), [
    call("ABSTRANS", [3, 1, 0.2]),
    call("ABSTRANS", [3, 1, 0.2, "hysteretic"]),
    call("ABSTRANS", [3, 1, 0.2]),
  ]);
  expect(found[3]).toBe("#N/A");
});

test("every function with a plain formula is recalculated, and every other says why it has none", () => {
  const checked = [...Object.keys(cases), "SWEEP", "TWOSTAGEFREQ", "PSDAT", "MOUNTLOADS"];
  expect([...plainFunctions].sort()).toEqual(checked.sort());
  const others = Object.keys(functions).filter((id) => /^[A-Z]+$/.test(id) && !plainFunctions.includes(id));
  for (const id of others) expect(plainFormula(id, [])).toEqual({ none: expect.stringContaining("no closed form") });
});

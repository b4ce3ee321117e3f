import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { auditWorkbook } from "../../src/audit/audit";
import { readBook } from "../../src/cli/read-book";
import { scoreBooks, type Truth } from "../support/score";

/**
 * Workbooks with their truth, each folder by another author who had not seen the auditor. All four have since been
 * developed on: the README tells what each gave at its first, blind run.
 */
const sets = [
  // folder     wrong groups that are missed, where each has its reason
  ["samples", 1], // an undamped form headed "quick", a label that makes it right
  ["blind", 7],
  ["holdout", 9],
  ["fresh", 8],
] as const;

describe.each(sets)("the workbooks of the set %s", (set, missed) => {
  const folder = join(__dirname, set);
  const books = readdirSync(join(folder, "workbooks")).map((file) => ({
    findings: auditWorkbook(readBook(join(folder, "workbooks", file))),
    truth: JSON.parse(readFileSync(join(folder, "truth", file.replace(".xlsx", ".json")), "utf8")) as Truth,
  }));
  const score = scoreBooks(books);

  test("raise no false alarm, neither on right formulas nor on unrelated cells", () => {
    expect(score.falseAlarms).toEqual([]);
  });

  test("have at least 97 % of their formula groups recognised", () => {
    expect(score.recognised / score.groups).toBeGreaterThanOrEqual(0.97);
  });

  test("have at least 95 % of their wrong groups detected, and no more missed than are known", () => {
    expect(score.detected / score.wrong).toBeGreaterThanOrEqual(0.95);
    expect(score.missed.length).toBeLessThanOrEqual(missed);
  });

  test("have at least 92 % of the detected mistakes named rightly", () => {
    expect(score.named / score.nameable).toBeGreaterThanOrEqual(0.92);
  });
});

import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { auditWorkbook } from "../../src/audit/audit";
import { readBook } from "../../src/cli/read-book";
import { scoreBooks, type Truth } from "../support/score";

const folder = join(__dirname, "samples");
const books = readdirSync(join(folder, "workbooks")).map((file) => ({
  findings: auditWorkbook(readBook(join(folder, "workbooks", file))),
  truth: JSON.parse(readFileSync(join(folder, "truth", file.replace(".xlsx", ".json")), "utf8")) as Truth,
}));
const score = scoreBooks(books);

test("the sample workbooks raise no false alarm, neither on right formulas nor on unrelated cells", () => {
  expect(score.falseAlarms).toEqual([]);
});

test("at least 97 % of the samples' formula groups are recognised", () => {
  expect(score.recognised / score.groups).toBeGreaterThanOrEqual(0.97);
});

test("at least 95 % of the samples' wrong groups are detected; those missed are known", () => {
  expect(score.detected / score.wrong).toBeGreaterThanOrEqual(0.95);
  expect(score.missed).toEqual([
    "Run A!F3:F242 absolute-transmissibility undamped-form", // headed "quick": a label that makes the undamped form right
  ]);
});

test("at least 92 % of the mistakes detected are named rightly", () => {
  expect(score.named / score.nameable).toBeGreaterThanOrEqual(0.92);
});

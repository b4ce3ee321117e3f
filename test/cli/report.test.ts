/** The command's files and exit status, on workbooks written here. */
import { spawnSync } from "node:child_process";
import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import * as xlsx from "@e965/xlsx";
import type { Finding } from "../../src/audit/finding";
import { caution, type Report, reportWriter } from "../../src/cli/report";
import { effectOf, shown, unsafeSideOf } from "../../src/cli/report-effect";
import { bySheet, cellCount, worstFirst } from "../../src/cli/report-order";
import { comparisonPlot } from "../../src/cli/report-plot";

const PATIENCE = 120_000; // milliseconds: each command starts a program of its own
const root = join(__dirname, "../..");
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "plinth-"));
  writeFileSync(join(folder, "kiln fan.xlsx"), book());
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A kiln fan on springs: the static deflection lacks 2 pi. */
function book(): Buffer {
  const rows: (string | number)[][] = [["m (kg)", "k (N/m)", "fn (Hz)", "static deflection (m)"]];
  for (const k of [40000, 52000, 61000, 75000]) rows.push([12, k]);
  const sheet = xlsx.utils.aoa_to_sheet(rows);
  rows.slice(1).forEach(([m, k], i) => {
    const fn = Math.sqrt((k as number) / (m as number)) / (2 * Math.PI);
    sheet[`C${i + 2}`] = { t: "n", f: `SQRT(B${i + 2}/A${i + 2})/(2*PI())`, v: fn };
    sheet[`D${i + 2}`] = { t: "n", f: `9.80665/C${i + 2}^2`, v: 9.80665 / fn ** 2 };
  });
  sheet["!ref"] = "A1:D5";
  const made = xlsx.utils.book_new();
  xlsx.utils.book_append_sheet(made, sheet, "Kiln");
  return xlsx.write(made, { type: "buffer", bookType: "xlsx" }) as Buffer;
}

const run = (...args: string[]) => {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [join(root, "node_modules/tsx/dist/cli.mjs"), join(root, "src/cli/audit.ts"), ...args],
    { cwd: folder, encoding: "utf8" },
  );
  return { status, stdout, stderr };
};

test(
  "a report is written beside the findings, and the exit status stays theirs",
  () => {
    const { status, stdout } = run("kiln fan.xlsx", "--json", "--report", "kiln.html");
    expect(status).toBe(1);
    const findings = (JSON.parse(stdout) as Record<string, Finding[]>)["kiln fan.xlsx"]!;
    const page = readFileSync(join(folder, "kiln.html"), "utf8");
    for (const { cell } of findings) expect(page).toContain(cell);
    expect(page).toContain("<title>Audit of hand formulas: kiln fan.xlsx</title>");
    expect(readdirSync(folder).filter((name) => name.includes(".part"))).toEqual([]);
  },
  PATIENCE,
);

const refusedCommands = [
  [["kiln fan.xlsx", "--report", "kiln.pdf"], "a report is an .html, .xlsx or .csv file, not kiln.pdf"],
  [["kiln fan.xlsx", "--report"], "--report needs the name of a file"],
  [["kiln fan.xlsx", "--report", "./kiln fan.xlsx"], "the report cannot be written over a book that is read"],
  [["kiln fan.xlsx", "--plain", "KILN.txt"], "the copy is an .xlsx file, not KILN.txt"],
  [["kiln fan.xlsx", "--plain", "kiln fan.xlsx"], "the copy cannot be written over the book itself"],
  [["kiln fan.xlsx", "--report=none/kiln.csv"], "none/kiln.csv cannot be written: there is no such folder"],
  [["missing.xlsx", "--report", "never.csv"], "missing.xlsx: no such file"],
  [["missing.xlsx", "--plain", "never.xlsx"], "missing.xlsx: no such file"],
] as const;

test.each(refusedCommands)(
  "%j ends with 2 and one line, and writes nothing",
  (args, line) => {
    const before = readdirSync(folder);
    const original = readFileSync(join(folder, "kiln fan.xlsx"));
    const { status, stdout, stderr } = run(...args);
    expect({ status, stdout, stderr }).toEqual({ status: 2, stdout: "", stderr: `${line}\n` });
    expect(readdirSync(folder)).toEqual(before);
    expect(readFileSync(join(folder, "kiln fan.xlsx")).equals(original)).toBe(true);
  },
  PATIENCE,
);

test(
  "a report that cannot take its place leaves the old file and nothing half-written",
  () => {
    mkdirSync(join(folder, "taken.csv"));
    const { status, stderr } = run("kiln fan.xlsx", "--report", "taken.csv");
    expect(status).toBe(2);
    expect(stderr).toMatch(/^taken\.csv cannot be written: .+\n$/);
    expect(readdirSync(folder).filter((name) => name.includes(".part"))).toEqual([]);
    expect(existsSync(join(folder, "taken.csv"))).toBe(true);
  },
  PATIENCE,
);

const finding: Finding = {
  sheet: "=Kiln <1>",
  cell: "D2:D5",
  quantity: "isolation-efficiency",
  verdict: "differs",
  mistake: "efficiency-not-of-motion",
  relation: "E = 1-T",
  evidence: 'agrees with the slip at "all" points',
  maxRelativeError: 0.25,
  worstCell: "D3",
  suggestion: "PLINTH.EFFICIENCY(f, fn, damping ratio)",
  message: "1 − T² is of power,\nnot of motion",
  formula: "1-C2^2",
  comparison: [
    { cell: "D2", hand: 0.9, right: 0.8 },
    { cell: "D3", hand: 0.75, right: 0.6 },
  ],
  role: "E",
};
const open: Finding = {
  ...finding,
  cell: "G2",
  verdict: "unrecognised",
  quantity: null,
  mistake: null,
  relation: null,
  maxRelativeError: null,
  comparison: [],
  formula: 'IF(A1<2,"<script>","")',
};
const report: Report = {
  books: { "kiln & fan.xlsx": [open, finding] },
  date: new Date("2031-05-06T12:00:00Z"),
  version: "9.8.7",
};
const written = (name: string): Buffer => Buffer.from(reportWriter(name)!(report));

test("the page says what was checked, with what, when, and what was not", () => {
  const page = written("a.html").toString("utf8");
  for (const text of [
    "kiln &amp; fan.xlsx",
    "2031-05-06",
    "Plinth 9.8.7",
    "=Kiln &lt;1&gt;",
    "1 − T² is of power",
    "=1-C2^2",
    "Not checked",
  ])
    expect(page).toContain(text);
  expect(page).toContain(caution);
  expect(page).toContain("<math>");
  expect(page).toContain("Up to 25 % too high, at D3");
  expect(page).toContain("more isolation is promised than there is");
  expect(page).toContain("=IF(A1&lt;2,&quot;&lt;script&gt;&quot;,&quot;&quot;)");
  expect(page).not.toMatch(/<script|<link|<img|src=|href=|@import|url\(/);
});

test("the table with commas is RFC 4180 in UTF-8, and no text of the book becomes a formula", () => {
  const text = written("a.CSV").toString("utf8");
  expect(text.startsWith("\ufeffBook,Sheet,Cells,Verdict")).toBe(true);
  const rows = xlsx.utils.sheet_to_json<Record<string, string>>(
    xlsx.read(text.slice(1), { type: "string", raw: true }).Sheets["Sheet1"]!,
  );
  expect(rows).toHaveLength(2);
  expect(rows[0]).toMatchObject({
    Book: "kiln & fan.xlsx",
    Sheet: "'=Kiln <1>",
    "What was found": "1 − T² is of power,\nnot of motion",
    Evidence: 'agrees with the slip at "all" points',
    "Largest relative error": "0.25",
  });
});

test("the workbook holds the same table as text and numbers", () => {
  const made = xlsx.read(written("a.xlsx"));
  const rows = xlsx.utils.sheet_to_json<Record<string, unknown>>(made.Sheets["Findings"]!);
  expect(rows.map((each) => each["Verdict"])).toEqual(["differs", "unrecognised"]);
  expect(rows[0]).toMatchObject({
    Sheet: "=Kiln <1>",
    "Largest relative error": 0.25,
    Mistake: "efficiency-not-of-motion",
  });
  expect(Object.values(made.Sheets["Findings"]!).some((cell: xlsx.CellObject) => cell.f)).toBe(false);
  expect(xlsx.utils.sheet_to_csv(made.Sheets["About"]!)).toContain("Plinth 9.8.7");
});

test("the effect names the side and the size, as a factor where a percentage says little", () => {
  const compared = (hand: number, right: number): Finding => ({
    ...finding,
    maxRelativeError: Math.abs(hand / right - 1),
    comparison: [{ cell: "D3", hand, right }],
  });
  expect(effectOf(compared(0.75, 0.6))).toBe("up to 25 % too high, at D3");
  expect(effectOf(compared(0.3, 0.6))).toBe("up to 50 % too low, at D3");
  expect(effectOf(compared(-0.3, 0.6))).toBe("up to 150 % off, with the wrong sign, at D3");
  expect(effectOf(compared(2160, 0.6))).toBe("up to 3,600 times the right value, at D3");
  expect(effectOf(open)).toBe("");
});

test("an unsafe side is named only where it is known which side that is", () => {
  const low = { ...finding, comparison: [{ cell: "D3", hand: 0.5, right: 0.6 }] };
  expect(unsafeSideOf(finding)).toMatch(/^unsafe in every row/);
  expect(unsafeSideOf(low)).toBe("");
  expect(unsafeSideOf({ ...low, quantity: "mount-force" })).toMatch(/more force than the sheet says/);
  expect(unsafeSideOf({ ...low, quantity: "natural-frequency" })).toBe("");
});

test("findings are read worst first, sheet by sheet", () => {
  const small = { ...finding, sheet: "b", maxRelativeError: 0.1 };
  const agrees: Finding = { ...finding, sheet: "b", verdict: "agrees", maxRelativeError: 0 };
  expect(worstFirst([open, agrees, small, finding])).toEqual([finding, small, agrees, open]);
  expect(bySheet([open, small, finding]).map(([sheet]) => sheet)).toEqual([finding.sheet, "b"]);
  expect([cellCount("E5"), cellCount("E5:E24"), cellCount("Z1:AB2")]).toEqual([1, 20, 6]);
});

test("numbers are shown with three digits", () => {
  expect([0, 25, 0.0312, 3600.44, 2.5e6, 1e-7].map(shown)).toEqual(["0", "25", "0.0312", "3,600", "2.5·10⁶", "10⁻⁷"]);
});

test("a plot needs two rows, and takes any sizes without a broken number", () => {
  expect(comparisonPlot([])).toBe("");
  expect(comparisonPlot([{ cell: "A1", hand: 1, right: 2 }])).toBe("");
  for (const [a, b] of [
    [0, 0],
    [5, 5],
    [-3, 1e9],
    [1e-300, 1e300],
    [1e-9, 1e9],
  ] as const) {
    const plot = comparisonPlot([
      { cell: "A1", hand: a, right: b },
      { cell: "A2", hand: b, right: a },
    ]);
    expect(plot).toContain("<svg");
    expect(plot).not.toMatch(/NaN|Infinity|undefined/);
  }
});

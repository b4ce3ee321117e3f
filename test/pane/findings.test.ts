import type { Finding } from "../../src/audit/finding";
import { acceptanceKey, areaOfFinding, cellCount, findingRows, groupsOf, touches } from "../../src/pane/findings";
import { numbersFor } from "../../src/pane/numbers";

const finding = (part: Partial<Finding>): Finding => ({
  sheet: "Rack",
  cell: "B4",
  quantity: "absolute-transmissibility",
  verdict: "differs",
  mistake: "undamped-form",
  relation: null,
  evidence: "",
  maxRelativeError: 0.1,
  worstCell: "B4",
  suggestion: null,
  message: "damping is left out",
  formula: "",
  comparison: [],
  role: null,
  ...part,
});

test("findings of one cause stand together, the worst cause first", () => {
  const groups = groupsOf([
    finding({ cell: "B4", maxRelativeError: 0.1 }),
    finding({ cell: "C4:C9", mistake: "speed-unit", maxRelativeError: 59 }),
    finding({ cell: "B5", maxRelativeError: -0.4 }),
    finding({ cell: "B6", mistake: "fill-break", maxRelativeError: null }),
  ]);
  expect(groups.map(({ worst, cells }) => [worst, cells])).toEqual([
    [59, 6],
    [0.4, 2],
    [null, 1],
  ]);
  expect(groups[1]!.findings.map(({ cell }) => cell)).toEqual(["B5", "B4"]);
});

test.each([
  ["B4", [3, 1, 3, 1], 1],
  ["B4:C6", [3, 1, 5, 2], 6],
  ["$AA$10:$AA$12", [9, 26, 11, 26], 3],
])("%s is an area of the sheet", (cell, [top, left, bottom, right], count) => {
  expect(areaOfFinding({ sheet: "Rack", cell })).toEqual({ sheet: "Rack", top, left, bottom, right });
  expect(cellCount(cell)).toBe(count);
});

test("areas touch on the same sheet only", () => {
  const a = areaOfFinding({ sheet: "Rack", cell: "B4:B9" });
  expect(touches(a, areaOfFinding({ sheet: "Rack", cell: "B9" }))).toBe(true);
  expect(touches(a, areaOfFinding({ sheet: "Rack", cell: "B10" }))).toBe(false);
  expect(touches(a, areaOfFinding({ sheet: "Other", cell: "B4" }))).toBe(false);
});

test("the findings sheet puts differences first, keeps reasons, and ends with cautions", () => {
  const agreed = finding({ cell: "B2", verdict: "agrees", mistake: null, maxRelativeError: null });
  const wrong = finding({});
  const notes = {
    decibels: false,
    tolerances: { naturalFrequency: 0, damping: 0 },
    accepted: { [acceptanceKey(wrong)]: "measured" },
  };
  const rows = findingRows([agreed, wrong], notes, numbersFor("en"), "Workbook");
  const header = rows.findIndex((row) => row[0] === "Sheet");
  expect(rows[header + 1]).toEqual([
    "Rack",
    "B4",
    "Differs",
    expect.any(String),
    "damping is left out",
    "10%",
    "B4",
    null,
    "measured",
  ]);
  expect(rows[header + 2]![2]).toBe("Agrees");
  expect(rows.some((row) => row[0] === "Not checked")).toBe(true);
  expect(rows.at(-1)![2]).toMatch(/^Ask: /);
});

import { argumentText } from "../../src/pane/argumentText";
import { docOf, functionDocs } from "../../src/pane/catalogue";
import { cautions, cautionsFor } from "../../src/pane/cautions";
import { explain } from "../../src/pane/explain";
import { readNotes } from "../../src/pane/notes";
import { numbersFor } from "../../src/pane/numbers";
import { strings } from "../../src/pane/strings";
import { resultUnit, unitIn } from "../../src/pane/units";
import { memorySheet, selecting } from "./memorySheet";

test.each([
  ["N/m, N/mm or lbf/in", "si", "N/m"],
  ["N/m, N/mm or lbf/in", "mm", "N/mm"],
  ["N/m, N/mm or lbf/in", "inch", "lbf/in"],
  ["kg or lb", "mm", "kg"],
  ["kg or lb", "inch", "lb"],
  ["m/s2, or gn for mm and inch", "si", "m/s²"],
  ["N.s/m, N.s/mm or lbf.s/in", "mm", "N·s/mm"],
  ["m/s2, or gn for mm and inch", "mm", "gn"],
  ["Hz", "si", "Hz"],
  ["any unit", "si", ""],
  ["same unit as frequency", "si", ""],
  ["fraction", "si", ""],
  ["unit of that form", "si", ""],
])("the unit in %p under %s is %p", (text, system, unit) => {
  expect(unitIn(text, system)).toBe(unit);
});

test("every function's result has a unit of one word, or none", () => {
  for (const { id, returns } of functionDocs)
    expect([id, resultUnit(returns, "mm")]).toEqual([id, expect.stringMatching(/^\S*$/)]);
});

test.each([
  ["en-US", 0.134190254, "0.1342"],
  ["de-DE", 0.134190254, "0,1342"],
  ["en-US", 0, "0"],
  ["en-US", 40000, "40000"],
  ["en-US", 1.5e-9, "1.5E-9"],
  ["no such locale", 2.5, "2.5"],
])("in %s, %p is written %p", (locale, value, text) => {
  expect(numbersFor(locale).short(value)).toBe(text);
});

const damping = docOf("ABSTRANS")!.parameters[2]!;
const model = docOf("ABSTRANS")!.parameters[3]!;
const unit = docOf("UNITS")!.parameters[1]!;
test.each([
  [damping, " 0.1 ", "0.1"],
  [damping, "0,1", "0.1"],
  [damping, "=B3", "B3"],
  [damping, "", ""],
  [model, "hysteretic", '"hysteretic"'],
  [model, '"viscous"', '"viscous"'],
  [model, "$B$3", "$B$3"],
  [model, "'Fan room'!B3", "'Fan room'!B3"],
  [unit, 'N"m', '"N""m"'],
])("%#: %p typed as an argument becomes %p", (parameter, typed, written) => {
  expect(argumentText(parameter, typed)).toBe(written);
});

test.each([
  null,
  "",
  "not JSON",
  "[]",
  '{"tolerances":{"naturalFrequency":"wide","damping":7}}',
  '{"accepted":{"a":1}}',
])("notes %p are read as what they hold, without failing", (text) => {
  expect(readNotes(text)).toEqual({ decibels: false, tolerances: { naturalFrequency: 0, damping: 0 }, accepted: {} });
});

test("notes come back as they were kept", () => {
  const notes = {
    decibels: true,
    tolerances: { naturalFrequency: 0.1, damping: 0.2 },
    accepted: { "S|B4||": "measured" },
  };
  expect(readNotes(JSON.stringify(notes))).toEqual(notes);
});

test("every question leads to a function, and no function is asked for twice", () => {
  const ids = strings.questions.map(([id]) => id);
  expect(ids.filter((id) => !docOf(id))).toEqual([]);
  expect(new Set(ids).size).toBe(ids.length);
});

test("every family has a name", () => {
  expect(functionDocs.map(({ family }) => family).filter((family) => !(family in strings.families))).toEqual([]);
});

describe("cautions", () => {
  const fitting = async (formula: string, value: number | null = null): Promise<string[]> => {
    const explanation = await explain(memorySheet({}), selecting(formula, value));
    return cautionsFor(explanation).now.map(({ id }) => id);
  };
  test.each([
    ["PLINTH.ABSTRANS(9,8,0.1)", "near-resonance"],
    ["PLINTH.ABSTRANS(25,8,0.1)", "run-up"],
    ["PLINTH.MOUNTDEFL(0.001,25,8,0.1)", "gap"],
    ["PLINTH.MOUNTLOADS(A1:A4,B1:B4,C1:C4,1000,0,0)", "corner-load"],
    ["PLINTH.STATICDEFL(2)", "tipping"],
    ["PLINTH.RANDRMS(A1:A4,B1:B4,50,0.1)", "random"],
    ['PLINTH.PULSE("half-sine",100,0.011,20,0.1)', "testing"],
  ])("%s brings %s to mind", async (formula, id) => {
    expect(await fitting(formula)).toContain(id);
  });
  test("far below resonance nothing warns of resonance", async () => {
    expect(await fitting("PLINTH.ABSTRANS(1,8,0.1)")).toEqual([]);
  });
  test("all stay reachable, each with whom to ask", async () => {
    const { now, others } = cautionsFor(await explain(memorySheet({}), selecting("PLINTH.ABSTRANS(25,8,0.1)")));
    expect(now.length + others.length).toBe(cautions.length);
    for (const { defer, text } of cautions) expect(defer.length * text.length).toBeGreaterThan(0);
  });
});

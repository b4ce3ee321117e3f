import { explain, numberOf, operatingPoint, sourceText, wordOf } from "../../src/pane/explain";
import { memorySheet, selecting } from "./memorySheet";

const cells = { B1: 25, B2: 8, B3: 0.1, D1: 10, D2: 20, D3: 30, E1: "hysteretic" };

async function explained(formula: string, value: number | null = null, down = 0) {
  const found = await explain(
    memorySheet(cells, [{ name: "speed", formula: "Sheet!$B$1" }]),
    selecting(formula, value, down),
  );
  if (!found) throw new Error("not explained");
  return found;
}

test("references give value and source", async () => {
  const { rows } = await explained("PLINTH.ABSTRANS(B1,B2,B3)");
  expect(rows.map(({ value }) => value)).toEqual([25, 8, 0.1, undefined]);
  expect(rows[0]!.source).toEqual({ sheet: "Sheet", top: 0, left: 1, bottom: 0, right: 1 });
  expect(rows[3]).toMatchObject({ leftOut: true, source: null });
});

test("an expression is worked out from its cells", async () => {
  const { rows } = await explained("PLINTH.ABSTRANS(B1*60/60,B2,10%)");
  expect(rows.map(({ value }) => value).slice(0, 3)).toEqual([25, 8, 0.1]);
  expect(rows[0]!.source).toBeNull();
});

test("a defined name is the cell it stands for", async () => {
  const { rows } = await explained("PLINTH.ABSTRANS(speed,B2,B3)");
  expect(rows[0]).toMatchObject({ value: 25, source: { top: 0, left: 1 } });
});

test.each([
  [0, 10],
  [2, 30],
])("in row %i of a spill the range's own element counts", async (down, value) => {
  const { rows } = await explained("PLINTH.ABSTRANS(D1:D3,B2,B3)", 1, down);
  expect(rows[0]!.value).toBe(value);
  expect(rows[1]!.value).toBe(8);
});

test("a table argument is taken whole", async () => {
  const { rows } = await explained("PLINTH.PSDRMS(D1:D3,D1:D3)");
  expect(rows[0]!.table).toEqual([[10], [20], [30]]);
});

test.each([
  ["PLINTH.ABSTRANS(B1,B2,B9)", 2],
  ["PLINTH.ABSTRANS(B9*2,B2,B3)", 0],
])("a blank cell behind an argument of %s is flagged", async (formula, at) => {
  const { rows } = await explained(formula);
  expect(rows.map(({ blanks }) => blanks.length)).toEqual([0, 0, 0, 0].map((_, i) => Number(i === at)));
});

test("what the pane cannot work out stays unknown, not wrong", async () => {
  const { rows, others } = await explained("PLINTH.EFFICIENCY(25,PLINTH.REQNATFREQ(0.9,25,0.1),0.1)");
  expect(rows[1]!.value).toBeUndefined();
  expect(others).toEqual(["REQNATFREQ"]);
});

test("the function is found inside a larger formula and under its name in saved files", async () => {
  expect((await explained("IF(B1>0,1-PLINTH.ABSTRANS(B1,B2,B3),0)")).doc.id).toBe("ABSTRANS");
  expect((await explained("_xldudf_PLINTH_ABSTRANS(B1,B2,B3)")).doc.id).toBe("ABSTRANS");
});

test.each(["SUM(B1:B3)", "1+", "", "PLINTH.NOSUCH(1)", 'OTHER.ABSTRANS(1,"x")'])(
  "%p is none of ours",
  async (formula) => {
    expect(await explain(memorySheet(cells), selecting(formula))).toBeNull();
  },
);

test("an argument left out gives its default, one left blank too where it is optional", async () => {
  expect(wordOf(await explained("PLINTH.ABSTRANS(B1,B2,B3)"), "dampingModel")).toBe("viscous");
  expect(wordOf(await explained("PLINTH.ABSTRANS(B1,B2,B3,E1)"), "dampingModel")).toBe("hysteretic");
  expect(numberOf(await explained("PLINTH.STATICDEFL(5)"), "stiffnessRatio")).toBe(1);
  expect(numberOf(await explained("PLINTH.STATICDEFL(5,B9)"), "stiffnessRatio")).toBe(1);
  expect(numberOf(await explained("PLINTH.ABSTRANS(B9,B2,B3)"), "frequency")).toBeUndefined();
});

describe("the operating point", () => {
  test("comes from the arguments", async () => {
    const point = operatingPoint(await explained('PLINTH.ABSTRANS(B1,B2,B3,"hysteretic")'));
    expect(point).toEqual({ f: 25, fn: 8, zeta: 0.1, model: "hysteretic" });
  });
  test("of a required natural frequency lies at the result", async () => {
    expect(operatingPoint(await explained("PLINTH.REQNATFREQ(0.9,25,0.1)", 6.838))).toMatchObject({ f: 25, fn: 6.838 });
  });
  test.each(["PLINTH.ABSTRANS(B1,0,B3)", "PLINTH.ABSTRANS(B1,B2,-1)", "PLINTH.NATFREQ(40000,12)"])(
    "is none where %s gives none",
    async (formula) => {
      expect(operatingPoint(await explained(formula))).toBeNull();
    },
  );
});

test.each([
  ["Sheet", "B7:C9"],
  ["Inputs", "Inputs!B7:C9"],
  ["Fan room", "'Fan room'!B7:C9"],
  ["Kim's", "'Kim''s'!B7:C9"],
])("cells of the sheet %s read as %s", (sheet, text) => {
  expect(sourceText({ sheet, top: 6, left: 1, bottom: 8, right: 2 }, "Sheet")).toBe(text);
});

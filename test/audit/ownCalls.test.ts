import { addressOf, ownCalls, ownFunction } from "../../src/audit/ownCalls";

test.each([
  ["PLINTH.ABSTRANS", "ABSTRANS"],
  ["plinth.abstrans", "ABSTRANS"],
  ["_xldudf_PLINTH_ABSTRANS", "ABSTRANS"],
  ["ABSTRANS", undefined],
  ["OTHER.ABSTRANS", undefined],
])("the name %s means our %s", (name, id) => {
  expect(ownFunction(name)).toBe(id);
});

test("calls come outermost first, with the text of their arguments", () => {
  const calls = ownCalls('1-PLINTH.EFFICIENCY(B1,PLINTH.REQNATFREQ(0.9,B1,$C$3),,"hysteretic")');
  expect(calls.map(({ id, whole }) => [id, whole])).toEqual([
    ["EFFICIENCY", false],
    ["REQNATFREQ", false],
  ]);
  expect(calls[0]!.arguments.map(({ text, missing }) => [text, missing])).toEqual([
    ["B1", false],
    ["PLINTH.REQNATFREQ(0.9,B1,$C$3)", false],
    ["", true],
    ['"hysteretic"', false],
  ]);
  expect(calls[0]!.arguments[1]!.references).toHaveLength(2);
});

test.each(["", "1+", "SUM(A1:A3)", '"PLINTH.ABSTRANS(1,2,3)"'])("%p has none", (formula) => {
  expect(ownCalls(formula)).toEqual([]);
});

test("addresses", () => {
  expect(addressOf({ top: 6, left: 1, bottom: 6, right: 1 })).toBe("B7");
  expect(addressOf({ top: 6, left: 1, bottom: 8, right: 27 })).toBe("B7:AB9");
});

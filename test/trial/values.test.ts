import { CellError } from "../../src/trial/host";
import { errorOf, fromHostResult, toHostArgument } from "../../src/trial/values";

describe("arguments on their way to the add-in", () => {
  test("an omitted argument is null", () => {
    expect(toHostArgument(undefined, true)).toBeNull();
    expect(toHostArgument(undefined, false)).toBeNull();
  });

  test("a single cell given to a matrix parameter is one row of one value", () => {
    expect(toHostArgument({ value: 25 }, true)).toEqual([[25]]);
    expect(toHostArgument({ value: 25 }, false)).toBe(25);
  });

  test("a range arrives as rows although the sheet hands over columns", () => {
    const columns = [
      [{ value: 1 }, { value: 2 }, { value: 3 }],
      [{ value: 10 }, { value: 20 }, { value: 30 }],
    ];
    expect(toHostArgument(columns, true)).toEqual([
      [1, 10],
      [2, 20],
      [3, 30],
    ]);
  });

  test("blanks are null and errors are the host's errors, in their places", () => {
    const column = [[{ value: null }, { value: "#REF", message: "gone" }, { value: "#hashtag" }]];
    const [[blank], [error], [text]] = toHostArgument(column, true) as [[unknown], [CellError], [unknown]];
    expect(blank).toBeNull();
    expect(error).toBeInstanceOf(CellError);
    expect([error.code, error.message]).toEqual(["#REF!", "gone"]);
    expect(text).toBe("#hashtag");
  });

  test("words of the sheet's own for an error become the host's", () => {
    expect(errorOf({ value: "#CYCLE" })?.code).toBe("#REF!");
    expect(errorOf({ value: "#BAD_EXPR" })?.code).toBe("#NAME?");
    expect(errorOf({ value: 3 })).toBeUndefined();
  });
});

describe("results on their way to the sheet", () => {
  test("one value is unwrapped, rows become columns", () => {
    expect(fromHostResult([[0.5]])).toEqual({ value: 0.5 });
    const rows = [
      [1, "a"],
      [2, "b"],
    ];
    expect(fromHostResult(rows)).toEqual([
      [{ value: 1 }, { value: 2 }],
      [{ value: "a" }, { value: "b" }],
    ]);
  });

  test("an error keeps its code and its message in its place", () => {
    const error = new CellError("#NUM!", "damping ratio must be 0 or more, got -1");
    expect(fromHostResult([[1], [error]])).toEqual([[{ value: 1 }, { value: "#NUM!", message: error.message }]]);
  });

  test.each([[NaN], [Infinity], [-Infinity]])("%p never shows as a number", (value) => {
    expect(fromHostResult([[value]])).toMatchObject({ value: "#NUM!" });
  });

  test.each([[undefined], [null], [{}], [[]], [[[]]]])("%p is an error, not a blank or a zero", (value) => {
    expect(fromHostResult(value)).toMatchObject({ value: "#VALUE!" });
  });

  test("a ragged array is filled up with errors", () => {
    expect(fromHostResult([[1, 2], [3]])).toMatchObject([
      [{ value: 1 }, { value: 3 }],
      [{ value: 2 }, { value: "#VALUE!" }],
    ]);
  });
});

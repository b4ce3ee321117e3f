import { readFileSync } from "node:fs";
import { join } from "node:path";
import { type Call, type Cell, CustomFunctionsRuntime, hostError } from "../support/customFunctionsRuntime";
import type { ParameterDoc } from "../../src/build/functionDocs";
import { exampleCalls, functionDocs } from "../support/examples";

const metadata = JSON.parse(readFileSync(join(__dirname, "../../dist/functions.json"), "utf8"));
const ids: string[] = metadata.functions.map(({ id }: { id: string }) => id);

const PASSED = "#REF!"; // an error that no function of ours makes itself
const OURS = ["#VALUE!", "#NUM!", "#DIV/0!", "#N/A"];

/** For machines that must first install a browser, or are slow: milliseconds. */
const PATIENCE = 600_000;

let runtime: CustomFunctionsRuntime;
beforeAll(async () => {
  runtime = await CustomFunctionsRuntime.start();
}, PATIENCE);
afterAll(() => runtime?.close());

const docOf = (id: string) => functionDocs.find((doc) => doc.id === id)!;
const errorOf = (cell: Cell) => (typeof cell === "object" && cell !== null ? cell.error : "none");
const single = async (id: string, args: unknown[]) => (await runtime.call([[id, args]]))[0][0][0];

/** The first example's arguments, with some of them replaced. */
function changed(id: string, changes: Record<number, unknown>): Call {
  const [{ args }] = exampleCalls(docOf(id));
  return [id, args.map((arg, i) => (i in changes ? changes[i] : arg))];
}

/** The positions of the parameters that fit. */
function positions(id: string, fits: (parameter: ParameterDoc) => boolean): number[] {
  return docOf(id).parameters.flatMap((parameter, i) => (fits(parameter) && !parameter.repeating ? [i] : []));
}
const isNumeric = ({ giving }: ParameterDoc) => giving === "range" || giving === "one" || giving === "table";

/** Asks every function its questions in one message, since the runtime answers twice a second; then one test for each. */
function everyFunction(
  title: string,
  calls: (id: string) => Call[],
  check: (answers: Cell[][][], id: string) => void,
  asked = ids,
) {
  describe(title, () => {
    const answers = new Map<string, Cell[][][]>();
    beforeAll(async () => {
      const questions = asked.map(calls);
      const all = await runtime.call(questions.flat());
      asked.forEach((id, i) => answers.set(id, all.splice(0, questions[i].length)));
    }, PATIENCE);
    test.each(asked)("%s", (id) => check(answers.get(id)!, id));
  });
}

test("Microsoft's runtime loads functions.js without a complaint", () => {
  expect(runtime.complaints).toEqual([]);
});

everyFunction(
  "the documented examples are answered as documented",
  (id) => exampleCalls(docOf(id)).map(({ args }) => [id, args]),
  (answers, id) => {
    expect(answers.length).toBeGreaterThan(0);
    exampleCalls(docOf(id)).forEach(({ gives }, i) => {
      const cells = answers[i].flat();
      expect(cells.map(errorOf)).toEqual(cells.map(() => "none"));
      gives?.flat().forEach((value, j) => {
        if (typeof value !== "number") expect(cells[j]).toBe(value);
        else expect(Math.abs((cells[j] as number) - value)).toBeLessThanOrEqual(1e-14 * Math.abs(value)); // 15 digits are printed
      });
    });
  },
);

everyFunction(
  "an incoming error passes on in its place and the other places are computed",
  (id) => {
    const ranges = positions(id, ({ giving }) => giving === "range");
    const [, args] = changed(id, {});
    const oneRow = Object.fromEntries(ranges.map((i) => [i, (args[i] as unknown[][] | null)?.slice(0, 1) ?? null]));
    return ranges
      .filter((i) => oneRow[i] !== null)
      .map((i) => {
        const [row] = oneRow[i] as unknown[][];
        return changed(id, { ...oneRow, [i]: [row, row.map(() => hostError(PASSED)), row] });
      });
  },
  (answers) => {
    for (const [first, second, third] of answers) {
      expect(first.map(errorOf)).toEqual(first.map(() => "none"));
      expect(second.map(errorOf)).toEqual(first.map(() => PASSED));
      expect(third).toEqual(first);
    }
  },
  ids.filter((id) => positions(id, ({ giving }) => giving === "range").length > 0),
);

everyFunction(
  "an incoming error that is the whole argument is the whole result",
  (id) => positions(id, isNumeric).map((i) => changed(id, { [i]: [[hostError(PASSED)]] })),
  (answers) => {
    for (const rows of answers) expect(new Set(rows.flat().map(errorOf))).toEqual(new Set([PASSED]));
  },
);

everyFunction(
  "a blank required argument is named, whether the blank comes as null or as an empty text",
  (id) =>
    positions(id, (parameter) => isNumeric(parameter) && parameter.leftOut === "").flatMap((i) => [
      changed(id, { [i]: [[null]] }),
      changed(id, { [i]: [[""]] }),
    ]),
  (answers) => {
    for (const cell of answers.flat(2)) {
      expect(cell).toEqual({ error: "#VALUE!", message: expect.stringContaining("blank") });
    }
  },
);

everyFunction(
  "an optional argument that is null, a blank cell or an empty text takes its default",
  (id) => {
    const optional = positions(id, (parameter) => parameter.optional);
    const none = Object.fromEntries(optional.map((i) => [i, null]));
    const blanks = (i: number) => (isNumeric(docOf(id).parameters[i]) ? [[[null]], [[""]]] : ["", null]);
    return [
      changed(id, none),
      ...optional.flatMap((i) => blanks(i).map((blank) => changed(id, { ...none, [i]: blank }))),
    ];
  },
  ([expected, ...answers]) => {
    for (const answer of answers) expect(answer).toEqual(expected);
  },
);

everyFunction(
  "whatever comes in, finite numbers, texts where they are the result, or declared errors come out",
  (id) => {
    const hostile = [0, -0, -1, 5e-324, 1e-308, 1e308, -1e308, "text", "1", true, false, null, "", hostError("#NULL!")];
    const ranges = [...hostile.map((value) => [[value]]), [hostile], hostile.map((value) => [value]), [hostile, [1]]];
    return docOf(id).parameters.flatMap((parameter, i) =>
      isNumeric(parameter)
        ? ranges.map((rows) => changed(id, { [i]: parameter.repeating ? [rows] : rows }))
        : ["no such word", "1", "\u0000"].map((word) => changed(id, { [i]: word })),
    );
  },
  (answers, id) => {
    for (const cell of answers.flat(2)) {
      if (typeof cell === "object" && cell !== null) expect([...OURS, "#NULL!"]).toContain(cell.error);
      else if (typeof cell === "string") expect(docOf(id).returns).toMatch(/^Text/);
      else expect(Number.isFinite(cell)).toBe(true); // a NaN in an array would arrive as null
    }
  },
);

test("a column with a row spills a table, and only the bad place shows its error", async () => {
  const [rows] = await runtime.call([["ABSTRANS", [[[0], [2]], [[1, 0]], [[0]], null]]]);
  expect(rows).toEqual([
    [1, { error: "#NUM!", message: "" }],
    [1 / 3, { error: "#NUM!", message: "" }],
  ]);
});

test("ranges of different size are one error with both sizes in its message", async () => {
  expect(await single("ABSTRANS", [[[1], [2]], [[1], [2], [3]], [[0]], null])).toEqual({
    error: "#VALUE!",
    message: "ranges of different size: 2×1 and 3×1",
  });
});

test("a blank that the host delivers as 0 is an error where 0 means nothing and a number where it means something", async () => {
  expect(errorOf(await single("ABSTRANS", [[[2]], [[0]], [[0]], null]))).toBe("#NUM!");
  expect(await single("ABSTRANS", [[[2]], [[1]], [[0]], null])).toBe(1 / 3);
});

test("undamped resonance is a division by zero", async () => {
  expect(errorOf(await single("ABSTRANS", [[[1]], [[1]], [[0]], null]))).toBe("#DIV/0!");
});

test("unlike units are not available, and the message says why", async () => {
  const cell = await single("UNITS", [[[1]], "rpm", "m"]);
  expect(cell).toEqual({ error: "#N/A", message: expect.stringContaining("rpm") });
});

test("the message of an unknown word lists the choices", async () => {
  expect(await single("ABSTRANS", [[[2]], [[1]], [[0]], "friction"])).toEqual({
    error: "#VALUE!",
    message: 'damping model must be viscous or hysteretic, got "friction"',
  });
});

test("non-ASCII signs in texts arrive as they are", async () => {
  expect(await single("WHY", [[[25]], [[8]], [[0.1]], null])).toContain("√2·fn");
});

/** What every function does with ranges, blanks, texts, errors and option words. */
import fc from "fast-check";
import {
  ABSTRANS,
  DAMPING,
  EFFICIENCY,
  MOTION,
  NATFREQ,
  PEAKTRANS,
  STATICDEFL,
  SWEEP,
  TRANSBOUND,
  UNITS,
  WHY,
} from "../../src/functions";
import { CellFailure, PassedError } from "../../src/functions/failure";

const T = (f: number, fn: number, zeta: number) => ABSTRANS(f as any, fn as any, zeta as any)[0][0] as number;
const column = (...values: unknown[]) => values.map((value) => [value]);
const failure = (kind: string, message: string) => expect.objectContaining({ name: "CellFailure", kind, message });
const call = (compute: (...args: any[]) => any, ...args: unknown[]) => compute(...args) as any[][];

describe("shapes", () => {
  test("single values may come bare or as single cells, and give one cell", () => {
    expect(call(ABSTRANS, 25, [[8]], [[0.1]])).toEqual([[T(25, 8, 0.1)]]);
  });

  test("a column, a row and a single value give a table", () => {
    const result = call(ABSTRANS, column(5, 10, 20), [[4, 8]], 0.1);
    expect(result).toEqual([5, 10, 20].map((f) => [4, 8].map((fn) => T(f, fn, 0.1))));
  });

  test("a column repeats over the columns of a table, a row over its rows", () => {
    const table = [
      [1, 2, 3],
      [4, 5, 6],
    ];
    expect(call(ABSTRANS, table, column(4, 8), 0.1)).toEqual(
      table.map((row, i) => row.map((f) => T(f, [4, 8][i], 0.1))),
    );
    expect(call(ABSTRANS, table, [[4, 8, 9]], 0.1)).toEqual(
      table.map((row) => row.map((f, j) => T(f, [4, 8, 9][j], 0.1))),
    );
  });

  test("a flat list is a row", () => {
    expect(call(ABSTRANS, [5, 10], 8, 0.1)).toEqual([[T(5, 8, 0.1), T(10, 8, 0.1)]]);
  });

  test.each([
    [12, 1, 10, 1, "ranges of different size: 12×1 and 10×1"],
    [1, 3, 1, 4, "ranges of different size: 1×3 and 1×4"],
    [2, 3, 3, 2, "ranges of different size: 2×3 and 3×2"],
    [2, 3, 3, 1, "ranges of different size: 2×3 and 3×1"],
  ])("%p×%p with %p×%p is refused", (m, n, p, q, message) => {
    const range = (rows: number, columns: number) => Array.from({ length: rows }, () => new Array(columns).fill(5));
    expect(() => call(ABSTRANS, range(m, n), range(p, q), 0.1)).toThrow(failure("wrong-shape", message));
    expect(() => call(ABSTRANS, 5, range(p, q), range(m, n))).toThrow(
      failure("wrong-shape", `ranges of different size: ${p}×${q} and ${m}×${n}`),
    );
  });

  test("rows cut short count as ending in blanks", () => {
    const [first, second] = call(ABSTRANS, [[5, 10], [20]], 8, 0.1);
    expect(first).toEqual([T(5, 8, 0.1), T(10, 8, 0.1)]);
    expect(second).toEqual([T(20, 8, 0.1), failure("missing", "frequency is blank")]);
  });

  test.each([[[]], [[[]]]])("an empty range %j is refused", (empty) => {
    expect(() => call(ABSTRANS, empty, 8, 0.1)).toThrow(failure("wrong-shape", "frequency is an empty range"));
  });

  test("lifting equals one call per element", () => {
    const cell = fc.double({ min: 0.1, max: 100, noNaN: true });
    const size = fc.integer({ min: 1, max: 4 });
    fc.assert(
      fc.property(
        size,
        size,
        fc.array(fc.tuple(fc.boolean(), fc.boolean()), { minLength: 6, maxLength: 6 }),
        fc.infiniteStream(cell),
        (m, n, kept, stream) => {
          const ranges = kept.map(([tall, wide]) =>
            Array.from({ length: tall ? m : 1 }, () =>
              Array.from({ length: wide ? n : 1 }, () => stream.next().value as number),
            ),
          );
          const [lowest, span, fn, zeta, a, b] = ranges;
          const highest = span.map((row) => row.map((x) => x + 100));
          const [small, smaller] = [a, b].map((range) => range.map((row) => row.map((x) => x / 200)));
          const args = [lowest, highest, fn, zeta, small, smaller];
          const height = Math.max(...args.map((range) => range.length));
          const width = Math.max(...args.map((range) => range[0].length));
          const expected = Array.from({ length: height }, (_, i) =>
            Array.from(
              { length: width },
              (_, j) =>
                call(
                  TRANSBOUND,
                  ...args.map((range) => range[range.length === 1 ? 0 : i][range[0].length === 1 ? 0 : j]),
                )[0][0],
            ),
          );
          expect(call(TRANSBOUND, ...args)).toEqual(expected);
        },
      ),
      { seed: 7, numRuns: 100 },
    );
  });

  test("a function of many rows answers each", () => {
    const many = Array.from({ length: 5000 }, (_, i) => [i + 1]);
    const result = call(ABSTRANS, many, 8, 0.1);
    expect(result).toHaveLength(5000);
    expect(result[4999]).toEqual([T(5000, 8, 0.1)]);
  });
});

test.each([0, 1, 1023, 1024, 1500, 2999])(
  "a bad cell in row %p of 3000 leaves the others as single calls give them",
  (row) => {
    const many: unknown[][] = Array.from({ length: 3000 }, (_, i) => [1 + i / 100]);
    many[row] = ["n/a"];
    many[77] = [8]; // undamped resonance
    const result = call(ABSTRANS, many, 8, [[0]]);
    const single = many.map((cell) => {
      const thrown = caught(() => call(ABSTRANS, cell[0], 8, 0));
      return thrown ?? call(ABSTRANS, cell[0], 8, 0)[0][0];
    });
    expect(result.map(([cell]) => cell)).toEqual(single);
    expect(result[row][0]).toMatchObject({ kind: "wrong-type" });
    expect(result[77][0]).toMatchObject({ kind: "pole" });
  },
);

describe("a bad cell makes an error in its own place", () => {
  test.each([
    ["", "missing", "damping ratio is blank"],
    [null, "missing", "damping ratio is blank"],
    [undefined, "missing", "damping ratio is blank"],
    ["n/a", "wrong-type", 'damping ratio must be a number, got the text "n/a"'],
    ["0.1", "wrong-type", 'damping ratio must be a number, got the text "0.1"'],
    [true, "wrong-type", "damping ratio must be a number, got true"],
    [-0.1, "outside-domain", "damping ratio must be 0 or more, got -0.1"],
    [NaN, "not-a-number", "damping ratio is not a number"],
    [Infinity, "outside-domain", "damping ratio must be 0 or more, got Infinity"],
  ])("%p among good cells: %s, %s", (bad, kind, message) => {
    const result = call(ABSTRANS, 25, 8, column(0.1, bad, 0.2));
    expect(result).toEqual([[T(25, 8, 0.1)], [failure(kind, message)], [T(25, 8, 0.2)]]);
    expect(() => call(ABSTRANS, 25, 8, bad)).toThrow(failure(kind, message));
    expect(() => call(ABSTRANS, 25, 8, [[bad]])).toThrow(failure(kind, message));
  });

  test("a pole and an overflow stay in their places too", () => {
    expect(call(ABSTRANS, column(8, 16), 8, 0)).toEqual([
      [failure("pole", "an undamped mount has no steady response at resonance")],
      [1 / 3],
    ]);
    expect(call(NATFREQ, column(1e308, 4), column(1e-308, 1))[1][0]).toBeCloseTo(2 / (2 * Math.PI), 14);
    expect(call(PEAKTRANS, column(1e-320, 0))).toEqual([
      [failure("overflow", "peak transmissibility is too large to show")],
      [failure("pole", "an undamped mount has no bound at resonance")],
    ]);
  });

  test("an error that came in leaves unchanged, before any complaint of ours", () => {
    const host = { code: "#DIV/0!" };
    const result = call(ABSTRANS, column(5, host, 20), 8, column(0.1, "x", 0.2));
    expect(result[1][0]).toBe(host);
    const thrown = caught(() => call(ABSTRANS, host, 8, ""));
    expect(thrown).toBeInstanceOf(PassedError);
    expect((thrown as PassedError).cellError).toBe(host);
    for (const args of [[host], [[[host]]]])
      expect(caught(() => call(PEAKTRANS, 0.1, ...args))).toBeInstanceOf(PassedError);
  });
});

describe("arguments that may be left out", () => {
  const lone = call(STATICDEFL, 5)[0][0] as number;

  test.each([[undefined], [null], [""], [[[""]]], [[[null]]], [[[]]]])("%j takes the default", (blank) => {
    expect(call(STATICDEFL, 5, blank, blank)).toEqual([[lone]]);
    expect(call(ABSTRANS, 25, 8, 0.1, blank)).toEqual([[T(25, 8, 0.1)]]);
  });

  test("a blank inside a range of them takes the default in its place", () => {
    expect(call(STATICDEFL, 5, column(1, "", null))).toEqual([[lone], [lone], [lone]]);
  });

  test("a zero is no blank", () => {
    expect(() => call(STATICDEFL, 5, 0)).toThrow(failure("outside-domain", "stiffness ratio must be above 0, got 0"));
  });
});

describe("option words", () => {
  test("case and blanks around or doubled inside do not matter", () => {
    expect(call(ABSTRANS, 25, 8, 0.1, "  HYSTERETIC ")).toEqual(call(ABSTRANS, 25, 8, 0.1, "hysteretic"));
    expect(call(DAMPING, 0.2, "Loss  Factor", [["RATIO"]])).toEqual([[0.1]]);
    expect(call(MOTION, 1, 10, "Displacement Peak", "displacement  PEAK-to-peak", "SI")).toEqual([[2]]);
  });

  test.each([
    [() => call(ABSTRANS, 25, 8, 0.1, "structural"), 'damping model must be viscous or hysteretic, got "structural"'],
    [() => call(STATICDEFL, 5, 1, "metric"), 'units must be si, mm or inch, got "metric"'],
    [() => call(STATICDEFL, 5, 1, 1), 'units must be si, mm or inch, got "1"'],
    [() => call(ABSTRANS, 25, 8, 0.1, true), 'damping model must be viscous or hysteretic, got "true"'],
    [() => call(TRANSBOUND, 5, 9, 8, 0.1, 0, 0, "worst"), 'bound must be max or min, got "worst"'],
    [() => call(SWEEP, 1, 2, 3, "octave"), 'spacing must be linear or log, got "octave"'],
    [() => call(DAMPING, 1, "ratio", "zeta"), 'to must be ratio, percent, loss factor, q or log decrement, got "zeta"'],
  ])("an unknown word is refused with the choices (%#)", (attempt, message) => {
    expect(attempt).toThrow(failure("unknown-word", message));
  });

  test("a word that must be given is missed", () => {
    expect(() => call(DAMPING, 1, "", "ratio")).toThrow(
      /^from is blank: choose ratio, percent, loss factor, q or log decrement$/,
    );
    expect(() => call(UNITS, 1, null, "Hz")).toThrow(/^from is blank$/);
  });

  test("unit words keep their case", () => {
    expect(call(UNITS, 1, "MN", "mN")).toEqual([[1e9]]);
  });

  test("more than one cell for one value is refused", () => {
    expect(() => call(ABSTRANS, 25, 8, 0.1, [["viscous", "viscous"]])).toThrow(
      /^damping model takes one value, got a range of 1×2$/,
    );
    expect(() => call(SWEEP, column(1, 2), 5, 3)).toThrow(/^from takes one value, got a range of 2×1$/);
  });
});

test("texts lift like numbers", () => {
  const sentences = call(WHY, column(25, 2, ""), 8, 0.1);
  expect(sentences.map(([cell]) => (cell instanceof CellFailure ? cell.message : String(cell).split(":")[0]))).toEqual([
    "Isolates",
    "Follows the base",
    "frequency is blank",
  ]);
});

test("values that would lose digits between unit systems are refused, not computed", () => {
  expect(() => call(NATFREQ, 1, 5e-324, "inch")).toThrow(/5e-324 is too small to convert between unit systems/);
  expect(() => call(NATFREQ, 1e308, 1, "mm")).toThrow(/1e\+308 is too large to convert between unit systems/);
});

test("nothing and minus nothing give plain zeros", () => {
  expect(call(EFFICIENCY, column(0, -0), 8, 0.1)).toEqual([[0], [0]]);
});

function caught(attempt: () => unknown): unknown {
  try {
    attempt();
  } catch (thrown) {
    return thrown;
  }
  return undefined;
}

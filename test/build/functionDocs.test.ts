import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { FAMILIES, readFunctionDocs } from "../../src/build/functionDocs";

const comment = `/**
 * Double of a number.
 * @customfunction TWICE
 * @param value Number to double (not a text); any unit; 0 or more. Number or range.
 * @param [how] Way of doubling; word; add or shift. Left out: add.
 * @returns The double; unit of value; shape of value.
 * @example =TWICE(2) gives 4
 * @failure outside-domain when value is negative
 * @source Definition
 * @leavesOut Halves.
 */`;
const declaration = "export function TWICE(value: any[][], how?: string): any[][] { return [[value, how]]; }";

/** Reads one family's file of this text, the other families empty. */
function read(text: string) {
  const folder = mkdtempSync(join(tmpdir(), "plinth-docs-"));
  try {
    mkdirSync(folder, { recursive: true });
    for (const family of Object.keys(FAMILIES))
      writeFileSync(join(folder, `${family}.ts`), family === "ratios" ? text : "");
    return readFunctionDocs(folder);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

test("a comment becomes one plain object", () => {
  expect(read(`${comment}\n${declaration}`)).toEqual([
    {
      id: "TWICE",
      family: "ratios",
      sentence: "Double of a number.",
      parameters: [
        {
          name: "value",
          what: "Number to double (not a text)",
          unit: "any unit",
          limits: "0 or more",
          giving: "range",
          optional: false,
          leftOut: "",
          repeating: false,
        },
        {
          name: "how",
          what: "Way of doubling",
          unit: "word",
          limits: "add or shift",
          giving: "words",
          optional: true,
          leftOut: "add",
          repeating: false,
        },
      ],
      returns: "The double; unit of value; shape of value.",
      examples: [{ formula: "=TWICE(2)", gives: "4" }],
      failures: ["outside-domain when value is negative"],
      source: "Definition",
      leavesOut: "Halves.",
    },
  ]);
});

test("a function without the tag is a helper and stays out", () => {
  expect(read("/** Helps. */\nexport function help(): void {}")).toEqual([]);
});

test.each([
  ["a parameter without a unit", "; any unit; 0 or more. Number or range.", ".", "parameter value"],
  ["a number that does not say how it is given", " Number or range.", "", "parameter value"],
  ["an example without a result", " gives 4", "", 'without "gives"'],
  ["a missing source", " * @source Definition\n", "", "needs one @source"],
  ["two texts on what it leaves out", " * @leavesOut Halves.", " * @leavesOut Halves.\n * @leavesOut Thirds.", "has 2"],
])("%s stops the build and names the function", (_, part, replacement, message) => {
  const broken = comment.replace(part, replacement);
  expect(broken).not.toBe(comment);
  expect(() => read(`${broken}\n${declaration}`)).toThrow(message);
  expect(() => read(`${broken}\n${declaration}`)).toThrow("TWICE");
});

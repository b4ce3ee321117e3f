/** Reads the cell functions' own comments: the one text from which metadata, pane help, reference page and README derive. */
import { readFileSync } from "node:fs";
import { join } from "node:path";
import ts from "typescript";

/** The families, in the order in which people meet them; the file name is the family. */
export const FAMILIES = {
  ratios: "Ratios",
  mounts: "Mounts",
  design: "Design",
  conversion: "Conversion and sweeps",
  check: "Checking a hand value",
  random: "Random vibration",
  shock: "Shock and records",
  systems: "Systems",
} as const;
export type Family = keyof typeof FAMILIES;

/** How an argument is given: lifted over ranges, one number, a whole range, option words, or text such as a unit. */
export type Giving = "range" | "one" | "table" | "words" | "text";

export interface ParameterDoc {
  name: string;
  what: string;
  unit: string;
  limits: string;
  giving: Giving;
  optional: boolean;
  /** what is taken when it is left out; empty where it must be given */
  leftOut: string;
  repeating: boolean;
}

export interface FunctionDoc {
  id: string;
  family: Family;
  sentence: string;
  parameters: ParameterDoc[];
  returns: string;
  examples: { formula: string; gives: string }[];
  failures: string[];
  source: string;
  leavesOut: string;
}

const GIVINGS: Record<string, Giving> = {
  "Number or range": "range",
  "One number": "one",
  "Whole range": "table",
};

/** The functions of every family, in the order of their files. */
export function readFunctionDocs(folder = join(import.meta.dirname, "../functions")): FunctionDoc[] {
  return (Object.keys(FAMILIES) as Family[]).flatMap((family) => {
    const file = join(folder, `${family}.ts`);
    const source = ts.createSourceFile(file, readFileSync(file, "utf8"), ts.ScriptTarget.ES2022, true);
    return source.statements
      .filter(ts.isFunctionDeclaration)
      .filter((statement) => tagTexts(statement, "customfunction").length > 0)
      .map((statement) => functionDoc(statement, family));
  });
}

function functionDoc(declaration: ts.FunctionDeclaration, family: Family): FunctionDoc {
  const id = tagTexts(declaration, "customfunction")[0];
  const comment = ts.getJSDocCommentsAndTags(declaration).find(ts.isJSDoc);
  const only = (tag: string) => {
    const found = tagTexts(declaration, tag);
    if (found.length !== 1) throw new Error(`${id} needs one @${tag}, has ${found.length}`);
    return found[0];
  };
  return {
    id,
    family,
    sentence: oneLine(ts.getTextOfJSDocComment(comment?.comment) ?? ""),
    parameters: declaration.parameters.map((parameter) => parameterDoc(id, parameter)),
    returns: only("returns"),
    examples: tagTexts(declaration, "example").map((text) => {
      const [, formula, gives] = /^(=.*?) gives (.*)$/.exec(text) ?? [];
      if (!formula) throw new Error(`${id} has an example without "gives": ${text}`);
      return { formula, gives };
    }),
    failures: tagTexts(declaration, "failure"),
    source: only("source"),
    leavesOut: only("leavesOut"),
  };
}

function parameterDoc(id: string, parameter: ts.ParameterDeclaration): ParameterDoc {
  const name = parameter.name.getText();
  const tag = ts.getJSDocParameterTags(parameter)[0];
  const text = oneLine(ts.getTextOfJSDocComment(tag?.comment) ?? "");
  const [description, leftOut = ""] = text.replace(/\.$/, "").split(/\. Left out: /);
  const form = /^(.*?); (.*?)(?:; (.*?))?(?:\. ([^.]*))?$/.exec(description);
  if (!form) throw new Error(`${id}: parameter ${name} is not "what; unit; limits. Number or range."`);
  const [, what, unit, limits = "", ending = ""] = form;
  const giving = ending in GIVINGS ? GIVINGS[ending] : unit.startsWith("word") && limits !== "" ? "words" : "text";
  if (giving === "text" && parameter.type?.getText() !== "string") {
    throw new Error(`${id}: parameter ${name} does not say how it is given`);
  }
  return {
    name,
    what,
    unit,
    limits,
    giving,
    optional: tag?.isBracketed ?? false,
    leftOut,
    repeating: parameter.type?.getText() === "any[][][]",
  };
}

function tagTexts(node: ts.Node, name: string): string[] {
  return ts
    .getJSDocTags(node)
    .filter((tag) => tag.tagName.text === name)
    .map((tag) => oneLine(ts.getTextOfJSDocComment(tag.comment) ?? ""));
}

function oneLine(text: string): string {
  return text.replace(/\s+/g, " ").trim();
}

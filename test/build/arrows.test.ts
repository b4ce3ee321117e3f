/** The map of the sources: which folder may import which, and that nothing stands outside it. */
import { readdirSync, readFileSync, statSync } from "node:fs";
import { join, relative, resolve } from "node:path";
import ts from "typescript";

const root = process.cwd();

const ARROWS: Record<string, readonly string[]> = {
  core: [],
  formula: [],
  functions: ["core"],
  audit: ["core", "formula"],
  pane: ["audit", "core"],
  office: ["core", "functions", "formula", "audit", "pane"],
  trial: ["core", "functions", "formula", "audit", "pane"],
  cli: ["core", "functions", "formula", "audit", "pane"],
  build: [], // anything; see below
};

const TOP_LEVEL = [
  "src",
  "manifest",
  "test",
  "assets",
  "package.json",
  "package-lock.json",
  "tsconfig.json",
  "webpack.config.js",
  "README.md",
  "DEVELOPERS.md",
  "LICENSE",
  "CHANGELOG.md",
];
const MADE = ["node_modules", "dist"]; // by npm and by the build; not kept

interface Import {
  file: string;
  target: string;
  lazy: boolean;
}

function filesUnder(folder: string): string[] {
  return readdirSync(folder).flatMap((name) => {
    const path = join(folder, name);
    if (statSync(path).isDirectory()) return filesUnder(path);
    return /\.tsx?$/.test(name) ? [path] : [];
  });
}

/** Everything a file imports or re-exports, plainly or by import(). */
function importsOf(path: string): Import[] {
  const source = ts.createSourceFile(path, readFileSync(path, "utf8"), ts.ScriptTarget.ES2022, true);
  const found: Import[] = [];
  const visit = (node: ts.Node): void => {
    const plain = (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier;
    const lazy = ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword && node.arguments[0];
    const typed = ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument) && node.argument.literal;
    const target = plain || lazy || typed;
    if (target && ts.isStringLiteral(target)) {
      found.push({ file: relative(root, path), target: target.text, lazy: Boolean(lazy || typed) });
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}

/** The folder of src in which a relative import ends, or undefined for a package. */
function folderOf({ file, target }: Import): string | undefined {
  if (!target.startsWith(".")) return undefined;
  const inside = relative(join(root, "src"), resolve(root, file, "..", target));
  return inside.startsWith("..") ? "outside" : inside.split("/")[0];
}

/** Imports of a file that its folder does not allow. */
function forbidden(imports: readonly Import[]): string[] {
  return imports
    .filter((each) => {
      const from = each.file.split("/")[1];
      const to = folderOf(each);
      if (to === undefined || to === from || from === "build") return false; // build may import anything
      if (resolve(root, each.file, "..", each.target) === join(root, "package.json")) return false; // our version
      if (from === "functions" && to === "audit") return !each.lazy; // CHECK loads the catalogue when it is asked
      return !ARROWS[from]?.includes(to);
    })
    .map(({ file, target }) => `${file} imports ${target}`);
}

test("every folder of src is on the map, and no file lies beside the folders", () => {
  expect(readdirSync(join(root, "src")).filter((name) => !(name in ARROWS))).toEqual([]);
});

test("no other entries stand at the top level", () => {
  const unlisted = readdirSync(root).filter((name) => !name.startsWith(".") && ![...TOP_LEVEL, ...MADE].includes(name));
  expect(unlisted).toEqual([]);
});

test.each(Object.keys(ARROWS))("%s imports only what the map allows", (folder) => {
  expect(forbidden(filesUnder(join(root, "src", folder)).flatMap(importsOf))).toEqual([]);
});

test("only CHECK reaches the audit, and lazily", () => {
  const reaching = filesUnder(join(root, "src/functions"))
    .flatMap(importsOf)
    .filter((each) => folderOf(each) === "audit");
  expect([...new Set(reaching.map(({ file }) => file))]).toEqual(["src/functions/check.ts"]);
});

test("a forbidden arrow is found", () => {
  const wrong = { file: "src/core/phase.ts", target: "../functions/cell", lazy: false };
  expect(forbidden([wrong])).toEqual(["src/core/phase.ts imports ../functions/cell"]);
  expect(forbidden([{ ...wrong, file: "src/office/register.ts" }])).toEqual([]);
  expect(forbidden([{ file: "src/functions/ratios.ts", target: "../audit/words", lazy: false }])).toHaveLength(1);
  expect(forbidden([{ file: "src/pane/pane.ts", target: "../../test/support/ulps", lazy: false }])).toHaveLength(1);
});

test("core, functions, formula and audit name neither the page nor the host", () => {
  const names =
    /\b(document|window|navigator|localStorage|fetch|XMLHttpRequest|Office|Excel|CustomFunctions)\b\s*[.([]/;
  const naming = ["core", "functions", "formula", "audit"]
    .flatMap((folder) => filesUnder(join(root, "src", folder)))
    .filter((path) => names.test(readFileSync(path, "utf8").replace(/\/\*[\s\S]*?\*\/|\/\/.*/g, "")));
  expect(naming.map((path) => relative(root, path))).toEqual([]);
});

import { existsSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { withFunctionTable } from "../../src/build/readme";

const root = join(__dirname, "../..");
const read = (file: string) => readFileSync(join(root, file), "utf8");
const { scripts } = JSON.parse(read("package.json"));

test("the README's table of functions is the one that the functions' comments give", () => {
  const readme = read("README.md");
  expect(withFunctionTable(readme)).toBe(readme);
});

test("a README without the marks is refused", () => {
  expect(() => withFunctionTable("# Plinth")).toThrow("marks");
});

test("every command that the README names exists", () => {
  const commands = [...read("README.md").matchAll(/npm run ([a-z:]+)/g)].map(([, name]) => name);
  expect(commands.length).toBeGreaterThan(0);
  for (const name of commands) expect(Object.keys(scripts)).toContain(name);
});

test.each(["README.md", "DEVELOPERS.md", "CHANGELOG.md"])("every local link of %s leads to a file", (file) => {
  for (const [, target] of read(file).matchAll(/\]\((?!https?:|#)([^)#]+)/g))
    expect(existsSync(join(root, target))).toBe(true);
});

test("every package that the project depends on has its reason and licence in DEVELOPERS.md", () => {
  const developers = read("DEVELOPERS.md");
  const { devDependencies = {}, dependencies = {} } = JSON.parse(read("package.json"));
  for (const name of Object.keys({ ...devDependencies, ...dependencies })) expect(developers).toContain(`\`${name}\``);
});

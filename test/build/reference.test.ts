import { readFunctionDocs } from "../../src/build/functionDocs";
import { breakable, escape, printed } from "../../src/build/html";
import { referencePage } from "../../src/build/reference";
import { functionSection, withPrefix } from "../../src/build/referenceFunction";
import { relationsOf } from "../../src/build/relations";
import { catalogue } from "../../src/audit/catalogue/index";
import { ERROR_CODES } from "../../src/office/errorCodes";

const docs = readFunctionDocs();
const ids = new Set(docs.map(({ id }) => id));
const page = referencePage();
const section = (id: string) => new RegExp(`<article id="${id}".*?</article>`, "s").exec(page)?.[0] ?? "";

test("every function has one section under its id", () => {
  const found = [...page.matchAll(/<article id="([^"]*)"/g)].map(([, id]) => id);
  expect(found).toEqual(docs.map(({ id }) => id));
});

test("no id stands twice and every link leads to one", () => {
  const anchors = [...page.matchAll(/\sid="([^"]*)"/g)].map(([, id]) => id);
  expect(new Set(anchors).size).toBe(anchors.length);
  for (const [, target] of page.matchAll(/href="#([^"]*)"/g)) expect(anchors).toContain(target);
});

test("the page is one file: it loads nothing and runs nothing", () => {
  expect(page).not.toMatch(/<script|\ssrc=|@import|url\(/);
  for (const [, target] of page.matchAll(/href="([^"]*)"/g))
    expect(target).toMatch(/^(#|data:image\/svg\+xml;base64,)/);
});

describe.each(docs)("the section of $id", (doc) => {
  test("carries its sentence, its prefix, every argument and its examples", () => {
    const html = section(doc.id);
    expect(html).toContain(escape(doc.sentence));
    expect(html).toContain(`PLINTH.${doc.id}`);
    for (const { name, what } of doc.parameters) {
      expect(html).toContain(breakable(name));
      expect(html).toContain(escape(what));
    }
    for (const { formula, gives } of doc.examples) {
      expect(html).toContain(escape(withPrefix(formula, ids)));
      expect(html).toContain(escape(gives));
    }
  });

  test("shows each failure under the error that a cell shows", () => {
    for (const failure of doc.failures) {
      const [kind, ...condition] = failure.split(" ");
      const code = ERROR_CODES[kind as keyof typeof ERROR_CODES];
      expect(section(doc.id)).toContain(`<code>${code}</code> ${escape(condition.join(" "))}`);
    }
  });
});

test("every relation of the catalogue that a function computes is typeset in its section", () => {
  const computed = catalogue.flatMap(({ cellFunction }) => cellFunction ?? []);
  expect(computed.length).toBeGreaterThan(10);
  for (const id of computed) {
    expect(ids).toContain(id);
    expect(relationsOf(id).length).toBeGreaterThan(0);
    expect(section(id)).toContain("<math");
  }
});

test("the absolute transmissibility is typeset as a fraction under a root", () => {
  const [{ mathml }] = relationsOf("ABSTRANS");
  expect(mathml).toMatch(/<mi>T<\/mi>.*<mo>=<\/mo><msqrt><mfrac>/s);
  expect(mathml).toContain("<mi>ζ</mi>");
});

test("a function with a closed form shows it as an ordinary formula over its arguments' names", () => {
  expect(section("NATFREQ").replaceAll("<wbr />", "")).toContain("<code>=SQRT(stiffness/mass)/(2*PI())</code>");
  expect(section("SRS")).not.toContain("Plain formula");
});

test("a failure of unknown kind stops the build", () => {
  const doc = { ...docs[0], failures: ["bad-luck always"] };
  expect(() => functionSection(doc, [], ids)).toThrow("bad-luck");
});

test.each([
  ["m/s2", "m/s²"],
  ["N.s/m, N.s/mm or lbf.s/in", "N·s/m, N·s/mm or lbf·s/in"],
  ["a = (2 pi f)^2 d", "a = (2πf)² d"],
  ["r^2 = 2/(1 + sqrt(1 + 8 zeta^2))", "r² = 2/(1 + √(1 + 8 ζ²))"],
  ["sqrt 2 fn", "√2 fn"],
  ["1 - T < 1", "1 − T &lt; 1"],
])("%s is printed as %s", (text, expected) => {
  expect(printed(text)).toBe(expected);
});

test("nested calls get the prefix, spreadsheet functions do not", () => {
  expect(withPrefix("=LEFT(WHY(25, 8, 0.1), 8)", ids)).toBe("=LEFT(PLINTH.WHY(25, 8, 0.1), 8)");
});

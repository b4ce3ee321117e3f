import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { manifestFor, WRITTEN_FOR } from "../../src/build/manifest";

const root = join(__dirname, "../..");
const source = readFileSync(join(root, "manifest/manifest.xml"), "utf8");
const schema = join(root, "test/reference/manifest-schema/OfficeAppManifestV1_1.xsd");

/** Every `attribute="value"` of the named elements. */
const attributes = (xml: string, element: string, attribute: string) =>
  [...xml.matchAll(new RegExp(`<${element}\\b[^>]*?\\s${attribute}="([^"]*)"`, "g"))].map(([, value]) => value);
const urls = (xml: string) =>
  [...xml.matchAll(/(?:DefaultValue="|<AppDomain>)([a-z]+:\/\/[^"<]*)/g)].map(([, url]) => url);

/** The size of a PNG, from its header. */
const pngSize = (file: string) => {
  const bytes = readFileSync(file);
  expect(bytes.subarray(1, 4).toString("latin1")).toBe("PNG");
  return [bytes.readUInt32BE(16), bytes.readUInt32BE(20)];
};

/** Throws what xmllint complains of. */
function validate(xml: string): void {
  const folder = mkdtempSync(join(tmpdir(), "plinth-manifest-"));
  try {
    const file = join(folder, "manifest.xml");
    writeFileSync(file, xml);
    execFileSync("xmllint", ["--nonet", "--noout", "--schema", schema, file], { stdio: "pipe" });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== "ENOENT") throw error;
    throw new Error("this test needs xmllint: apt-get install libxml2-utils");
  } finally {
    rmSync(folder, { recursive: true });
  }
}

describe.each([
  ["as written", source],
  ["built for a host with a path", manifestFor("https://addins.example.org/plinth", source)],
])("the manifest %s", (_, manifest) => {
  test("is valid by Microsoft's published schema", () => {
    expect(() => validate(manifest)).not.toThrow();
  });

  test("names https addresses only", () => {
    expect(urls(manifest).length).toBeGreaterThan(8);
    for (const url of urls(manifest)) expect(new URL(url).protocol).toBe("https:");
  });

  test("defines each resource once and uses every one", () => {
    const used = [...attributes(manifest, "[\\w:]+", "resid")];
    const defined = attributes(manifest, "bt:(?:Image|Url|String)", "id");
    expect(new Set(defined).size).toBe(defined.length);
    expect(new Set(used)).toEqual(new Set(defined));
  });

  test("keeps resource ids and short strings within the 32 and 125 characters that Office allows", () => {
    for (const id of attributes(manifest, "bt:\\w+", "id")) expect(id.length).toBeLessThanOrEqual(32);
    const short = /<bt:ShortStrings>.*?<\/bt:ShortStrings>/s.exec(manifest)![0];
    for (const text of attributes(short, "bt:String", "DefaultValue")) expect(text.length).toBeLessThanOrEqual(125);
  });

  test("has icons of every size that Office asks for", () => {
    const sizes = [...manifest.matchAll(/<bt:Image size="(\d+)" resid="Icon\.(\d+)"/g)].map(([, size, name]) => [
      size,
      name,
    ]);
    expect(new Set(sizes.map(([size]) => size))).toEqual(new Set(["16", "32", "80"]));
    for (const [size, name] of sizes) expect(size).toBe(name);
    expect(attributes(manifest, "IconUrl", "DefaultValue")[0]).toMatch(/\/assets\/icon-32\.png$/);
    expect(attributes(manifest, "HighResolutionIconUrl", "DefaultValue")[0]).toMatch(/\/assets\/icon-64\.png$/);
  });

  test("has a namespace of letters, digits, dots and underscores that begins with a letter", () => {
    const namespace = /id="Functions\.Namespace" DefaultValue="([^"]*)"/.exec(manifest)![1];
    expect(namespace).toBe("PLINTH");
    expect(namespace).toMatch(/^[A-Za-z][A-Za-z0-9._]{0,31}$/);
  });

  test("points its support address at the reference page", () => {
    expect(attributes(manifest, "SupportUrl", "DefaultValue")[0]).toMatch(/\/reference\.html$/);
  });

  test("runs functions and pane in one page", () => {
    const page = 'resid="Page.Url"';
    for (const element of [`<Runtime ${page} lifetime="long"`, `<FunctionFile ${page}`, `<SourceLocation ${page}`]) {
      expect(manifest).toContain(element);
    }
  });
});

test.each([16, 32, 64, 80])("icon-%i.png has the size of its name", (size) => {
  expect(pngSize(join(root, `assets/icon-${size}.png`))).toEqual([size, size]);
});

test("every address of the manifest is a file of the build", () => {
  for (const url of urls(manifestFor(WRITTEN_FOR, source))) {
    const { pathname } = new URL(url);
    if (pathname !== "/") expect(() => readFileSync(join(root, "dist", pathname))).not.toThrow();
  }
});

test("a build for another host leaves no address of this machine", () => {
  const manifest = manifestFor("https://addins.example.org/plinth", source);
  expect(manifest).not.toContain("localhost");
  expect(manifest).toContain('"https://addins.example.org/plinth/functions.js"');
  expect(manifest).toContain("<AppDomain>https://addins.example.org</AppDomain>");
});

test("a host without https is refused, and so is what is no address", () => {
  expect(() => manifestFor("http://addins.example.org", source)).toThrow("ADDIN_URL must be https");
  expect(() => manifestFor("addins", source)).toThrow("ADDIN_URL");
});

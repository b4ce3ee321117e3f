import { readFunctionDocs } from "../../src/build/functionDocs";
import { functionsMetadata, type Metadata } from "../../src/build/metadata";

const docs = readFunctionDocs();
let metadata: Metadata;
beforeAll(async () => {
  metadata = await functionsMetadata("https://addins.example.org/plinth");
}, 60_000);

const only = (id: string) => metadata.functions.filter((each) => each.id === id);

test("errors among the arguments reach the functions", () => {
  expect(metadata.allowErrorForDataTypeAny).toBe(true);
});

test("every documented function stands in the metadata once, and none besides", () => {
  expect(metadata.functions.map(({ id }) => id)).toEqual(docs.map(({ id }) => id));
  expect(new Set(docs.map(({ id }) => id)).size).toBe(docs.length);
});

describe.each(docs)("$id", (doc) => {
  test("has an id of 3 to 64 capitals, digits or dots that is no cell address", () => {
    expect(doc.id).toMatch(/^[A-Z][A-Z0-9.]{2,63}$/);
    expect(doc.id).not.toMatch(/^[A-Z]{1,3}[0-9]+$/);
    expect(doc.id).not.toMatch(/^R[0-9]*C[0-9]*$/);
  });

  test("has one plain sentence as its tooltip, at most 128 characters long", () => {
    const [{ description }] = only(doc.id);
    expect(description).toBe(doc.sentence);
    expect(description.length).toBeLessThanOrEqual(128);
    expect(description).toMatch(/^[A-Z].*\.$/);
    expect(description).not.toMatch(/https?:|[<>{}]/);
  });

  test("says of every parameter what it is, its unit, its limits and how it is given", () => {
    const [{ parameters }] = only(doc.id);
    expect(parameters.map(({ name }) => name)).toEqual(doc.parameters.map(({ name }) => name));
    for (const parameter of doc.parameters) {
      expect(parameter.what).not.toBe("");
      expect(parameter.unit).not.toBe("");
      if (parameter.giving !== "text") expect(parameter.limits).not.toBe("");
    }
    for (const { description } of parameters) expect(description.length).toBeLessThanOrEqual(512);
  });

  test("takes its numbers as ranges, so that texts, blanks and errors reach it", () => {
    const [{ parameters }] = only(doc.id);
    doc.parameters.forEach(({ giving, repeating }, i) => {
      const { type, dimensionality } = parameters[i];
      if (giving === "words" || giving === "text") expect([type, dimensionality]).toEqual(["string", undefined]);
      else if (repeating) expect(type).toBe("any");
      else expect([type, dimensionality]).toEqual(["any", "matrix"]);
    });
  });

  test("marks as optional what has a default, and no single argument after it is required", () => {
    const [{ parameters }] = only(doc.id);
    const optional = parameters.map((parameter) => parameter.optional === true);
    expect(optional).toEqual(doc.parameters.map((parameter) => parameter.optional));
    const given = optional.filter((_, i) => !doc.parameters[i].repeating);
    expect([...given].sort()).toEqual(given);
    for (const parameter of doc.parameters) if (parameter.optional) expect(parameter.leftOut).not.toBe("");
  });

  test("points its help at its own section of the reference page", () => {
    expect(only(doc.id)[0].helpUrl).toBe(`https://addins.example.org/plinth/reference.html#${doc.id}`);
  });
});

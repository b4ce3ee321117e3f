/** The reference page: one section per function, made from the functions' own comments. */
import { readFunctionDocs } from "./functionDocs";

export function referencePage(): string {
  const sections = readFunctionDocs().map(
    ({ id, sentence }) => `<section id="${id}"><h2>${id}</h2><p>${sentence}</p></section>`,
  );
  return `<!doctype html><html lang="en"><title>Plinth functions</title>${sections.join("")}</html>`;
}

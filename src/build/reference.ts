/** The reference page: one file without scripts, made from the functions' own comments and the catalogue of relations. */
import { readFileSync } from "node:fs";
import { join } from "node:path";
import { cautions } from "../pane/cautions";
import { strings } from "../pane/strings";
import { FAMILIES, type FunctionDoc, readFunctionDocs } from "./functionDocs";
import { escape } from "./html";
import { functionSection } from "./referenceFunction";
import { rulesSection } from "./referenceRules";
import { relationsOf } from "./relations";

const root = join(import.meta.dirname, "../..");

export function referencePage(docs: FunctionDoc[] = readFunctionDocs()): string {
  const ids = new Set(docs.map(({ id }) => id));
  const families = Object.entries(FAMILIES)
    .map(([family, name]) => ({ family, name, docs: docs.filter((doc) => doc.family === family) }))
    .filter(({ docs }) => docs.length > 0);
  const icon = readFileSync(join(root, "assets/icon.svg"), "utf8");
  const style = readFileSync(join(import.meta.dirname, "reference.css"), "utf8");
  const summary = "Cell functions for base-excitation design: a mass on a spring and damper whose base moves.";
  return `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8" />
<meta name="viewport" content="width=device-width, initial-scale=1" />
<title>Plinth functions</title>
<meta name="description" content="${summary}" />
<link rel="icon" href="data:image/svg+xml;base64,${Buffer.from(icon).toString("base64")}" />
<style>
${style}</style>
</head>
<body>
<a class="skip" href="#content">Skip to the functions</a>
<header>
${icon
  .replace(/<title>.*?<\/title>/, "")
  .replace("<svg ", '<svg aria-hidden="true" class="mark" ')
  .trim()}
<div><h1>Plinth functions</h1>
<p>${summary}</p></div>
</header>
<div class="columns">
<nav aria-label="Contents">
<ul>
<li><a href="#rules">Rules for every function</a></li>
${families.map(({ family, name, docs }) => `<li><a href="#${family}">${name}</a>\n<ul>${docs.map(({ id }) => `<li><a href="#${id}">${id}</a></li>`).join(" ")}</ul></li>`).join("\n")}
<li><a href="#cautions">Cautions</a></li>
</ul>
</nav>
<main id="content">
<p class="standing">${escape(strings.standing)}</p>
${rulesSection()}
${families.map(({ family, name, docs }) => `<section id="${family}" aria-labelledby="${family}-name">\n<h2 id="${family}-name">${name}</h2>\n${docs.map((doc) => functionSection(doc, relationsOf(doc.id), ids)).join("\n")}\n</section>`).join("\n")}
<section id="cautions" aria-labelledby="cautions-name">
<h2 id="cautions-name">Cautions</h2>
<dl class="cautions">
${cautions.map(({ title, text, defer }) => `<dt>${escape(title)}</dt><dd>${escape(text)} <span class="defer">Decides: ${escape(defer)}.</span></dd>`).join("\n")}
</dl>
</section>
</main>
</div>
</body>
</html>
`;
}

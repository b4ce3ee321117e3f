/** One function's section of the reference page. */
import { plainFormula } from "../audit/plain";
import { ERROR_CODES } from "../office/errorCodes";
import type { FailureKind } from "../functions/failure";
import type { FunctionDoc, Giving, ParameterDoc } from "./functionDocs";
import { breakable, escape, printed, table } from "./html";
import { checkTable } from "./referenceCheck";
import type { RelationDoc } from "./relations";

const GIVEN_AS: Record<Giving, string> = {
  range: "number or range",
  one: "one number",
  table: "whole range",
  words: "word",
  text: "text",
};

/** The section of `doc`; `ids` are the functions that the page holds, so that a mention becomes a link. */
export function functionSection(doc: FunctionDoc, relations: RelationDoc[], ids: ReadonlySet<string>): string {
  const link = linkTo(ids, doc.id);
  return `<article id="${doc.id}" aria-labelledby="${doc.id}-name">
<h3 id="${doc.id}-name">${doc.id}<a class="anchor" href="#${doc.id}" aria-label="Link to ${doc.id}">#</a></h3>
<p class="sentence">${escape(doc.sentence)}</p>
<p class="signature"><code>${signature(doc)}</code></p>
${argumentTable(doc)}
<dl>
<dt>Gives</dt><dd>${link(printed(sentence(doc.returns)))}</dd>
${relations.length > 0 ? `<dt>Relation</dt><dd>${relations.map(relationBlock).join("\n")}</dd>` : ""}
${plain(doc)}
<dt>${doc.examples.length > 1 ? "Examples" : "Example"}</dt><dd>${examples(doc, ids)}</dd>
<dt>Errors</dt><dd>${errors(doc)}</dd>
${doc.id === "CHECK" ? `<dt>Quantities</dt><dd>${checkTable()}</dd>` : ""}
<dt>Source</dt><dd>${link(printed(sentence(doc.source)))}</dd>
<dt>Leaves out</dt><dd>${link(printed(sentence(doc.leavesOut)))}</dd>
</dl>
</article>`;
}

function signature({ id, parameters }: FunctionDoc): string {
  const args = parameters.map(({ name, optional, repeating }) => {
    const shown = escape(repeating ? `${name}…` : name);
    return `<span class="argument">${optional ? `[${shown}]` : shown}</span>`;
  });
  return `<b>PLINTH.${id}</b>(<wbr />${args.join(", <wbr />")})`;
}

function argumentTable({ id, parameters }: FunctionDoc): string {
  const someOptional = parameters.some(({ optional }) => optional);
  const headings = ["Argument", "Meaning", "Unit", "Limits", "Given as", ...(someOptional ? ["Left out"] : [])];
  const rows = parameters.map((parameter) => [
    `<code>${breakable(parameter.name)}</code>`,
    escape(parameter.what),
    unit(parameter),
    escape(parameter.limits),
    GIVEN_AS[parameter.giving] + (parameter.repeating ? ", any number of them" : ""),
    ...(someOptional ? [parameter.optional ? escape(parameter.leftOut) : "required"] : []),
  ]);
  return table(`Arguments of ${id}`, headings, rows);
}

/** Unit words stay as they are typed; units of numbers are printed. */
function unit({ unit, giving }: ParameterDoc): string {
  if (giving === "words" && /^words?$/.test(unit)) return "";
  return giving === "words" || giving === "text" ? escape(unit) : printed(unit);
}

function relationBlock({ says, mathml, symbols }: RelationDoc): string {
  const legend = symbols.map(({ symbol, meaning }) => `${symbol} ${escape(meaning)}`);
  if (mathml.includes("atan2")) legend.push("atan2 takes x before y, as spreadsheets do");
  return `<figure>
<figcaption>${escape(says)}</figcaption>
<div class="relation" role="group" tabindex="0" aria-label="${escape(says)}">${mathml}</div>
<p>${legend.join("; ")}.</p>
</figure>`;
}

/** The ordinary spreadsheet formula that does the same without the add-in; a long one is folded. */
function plain({ id, parameters }: FunctionDoc): string {
  const found = plainFormula(
    id,
    parameters.map(({ name, optional }) => (optional ? null : name)),
  );
  if ("none" in found) return "";
  const text = `<code>=${breakable(found.formula)}</code>`;
  const shown = found.formula.length <= 200 ? text : `<details><summary>Show it</summary>${text}</details>`;
  return `<dt>Plain formula</dt><dd>${shown}</dd>`;
}

function examples({ examples }: FunctionDoc, ids: ReadonlySet<string>): string {
  const rows = examples.map(
    ({ formula, gives }) =>
      `<li><code>${escape(withPrefix(formula, ids))}</code> gives <samp>${escape(gives)}</samp></li>`,
  );
  return `<ul>${rows.join("")}</ul>`;
}

function errors({ failures }: FunctionDoc): string {
  const rows = failures.map((failure) => {
    const [kind, ...condition] = failure.split(" ");
    const code = ERROR_CODES[kind as FailureKind];
    if (code === undefined) throw new Error(`"${failure}" does not begin with a kind of failure`);
    return `<li><code>${code}</code> ${escape(condition.join(" "))}</li>`;
  });
  return `<ul>${rows.join("")}</ul><p>Beside these the <a href="#errors">errors of every function</a>.</p>`;
}

/** A formula as it is typed into Excel, where the functions carry the add-in's prefix. */
export function withPrefix(formula: string, ids: ReadonlySet<string>): string {
  return formula.replace(/\b[A-Z][A-Z0-9.]+(?=\()/g, (name) => (ids.has(name) ? `PLINTH.${name}` : name));
}

function linkTo(ids: ReadonlySet<string>, own: string): (html: string) => string {
  return (html) =>
    html.replace(/\b[A-Z][A-Z0-9]{2,}\b/g, (name) =>
      ids.has(name) && name !== own ? `<a href="#${name}">${name}</a>` : name,
    );
}

/** A capital first and one full stop last. */
function sentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1).replace(/\.?$/, ".");
}

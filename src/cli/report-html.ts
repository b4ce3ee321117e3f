/** The report as one page that needs nothing else: no script, no other file, no network. */
import temml from "temml";
import { mistakes, quantities } from "../audit/quantities";
import type { Finding } from "../audit/finding";
import { type Role, roles } from "../audit/roles";
import { walk } from "../formula/nodes";
import { readFormula } from "../formula/read";
import { latexOf, textOf } from "../audit/typeset";
import { caution, type Report } from "./report";
import { effectOf, unsafeSideOf } from "./report-effect";
import { bySheet, cellsIn } from "./report-order";
import { comparisonPlot } from "./report-plot";
import { style } from "./report-style";

export function htmlReport(report: Report): string {
  const books = Object.entries(report.books);
  const names = books.map(([name]) => name).join(", ");
  const date = report.date.toISOString().slice(0, 10);
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'">
<title>Audit of hand formulas: ${escape(names)}</title>
<style>${style}</style>
</head>
<body>
<header>
<h1>Audit of hand formulas</h1>
<dl>
<div><dt>${books.length === 1 ? "File" : "Files"}</dt><dd>${escape(names)}</dd></div>
<div><dt>Date</dt><dd>${date}</dd></div>
<div><dt>Written by</dt><dd>Plinth ${escape(report.version)}</dd></div>
</dl>
</header>
<main>
${books.map(([name, findings]) => bookPart(name, findings, books.length > 1)).join("\n")}
</main>
<footer><p>${escape(caution)}</p></footer>
</body>
</html>
`;
}

const of = (findings: readonly Finding[], verdict: Finding["verdict"]): Finding[] =>
  findings.filter((finding) => finding.verdict === verdict);

function bookPart(name: string, findings: readonly Finding[], titled: boolean): string {
  const sheets = bySheet(findings);
  const differing = sheets.filter(([, list]) => of(list, "differs").length > 0);
  const agreeing = of(findings, "agrees");
  const open = of(findings, "unrecognised");
  return [
    titled ? `<h2 class="book">${escape(name)}</h2>` : "",
    summary(sheets, findings),
    section("Findings", differing.length === 0 ? `<p>No difference was found.</p>` : differing.map(sheetPart).join("")),
    agreeing.length > 0 ? section("Formulas that agree", agreement(agreeing)) : "",
    section("Not checked", notChecked(open)),
  ].join("\n");
}

const section = (title: string, content: string): string => `<section><h2>${title}</h2>${content}</section>`;

function summary(sheets: readonly (readonly [string, Finding[]])[], findings: readonly Finding[]): string {
  const counts = (list: readonly Finding[]): string =>
    (["differs", "agrees", "unrecognised"] as const)
      .map((verdict) => {
        const found = of(list, verdict);
        return `<td>${found.length === 0 ? "–" : `${found.length} <span class="soft">(${plural(cellsIn(found), "cell")})</span>`}</td>`;
      })
      .join("");
  const rows = sheets.map(([sheet, list]) => `<tr><th scope="row">${escape(sheet)}</th>${counts(list)}</tr>`);
  const total = `<tr class="total"><th scope="row">All</th>${counts(findings)}</tr>`;
  const differs = of(findings, "differs").length;
  const lead =
    differs === 0
      ? "Every formula that was recognised agrees with its published relation."
      : `${plural(differs, "formula")} ${differs === 1 ? "differs" : "differ"} from the published relation.`;
  return section(
    "Summary",
    `<p>${lead} Formulas that fill neighbouring cells alike count once.</p><div class="wide"><table><thead><tr><th scope="col">Sheet</th><th scope="col">Differ</th><th scope="col">Agree</th><th scope="col">Not recognised</th></tr></thead><tbody>${rows.join("")}${sheets.length > 1 ? total : ""}</tbody></table></div>`,
  );
}

function plural(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? "" : "s"}`;
}

function sheetPart([sheet, findings]: readonly [string, Finding[]]): string {
  return `<h3>Sheet ${escape(sheet)}</h3>${of(findings, "differs").map(findingPart).join("")}`;
}

function findingPart(finding: Finding): string {
  const { cell, quantity, mistake, message, relation, suggestion, formula, evidence, comparison } = finding;
  const plot = comparisonPlot(comparison);
  // the heading and the line under it have said these already
  const told = quantity && mistake ? `${quantities[quantity]}: ${mistakes[mistake]}.` : "";
  const why = message.startsWith(told) ? message.slice(told.length).trim() : message;
  const facts = [
    fact("Relation", relation ? typeset(relation) : ""),
    fact("In the sheet", formula ? `<code>=${escape(formula)}</code>` : ""),
    fact("Effect", escape(capital(effectOf(finding)))),
    fact("Caution", escape(capital(unsafeSideOf(finding)))),
    fact("Instead", suggestion ? `<code>=${escape(suggestion)}</code>` : ""),
    fact("Evidence", escape(capital(evidence))),
  ];
  const key = `<p class="key"><span class="hand">in the sheet</span> <span class="right">right</span></p>`;
  return `<article><h4><b>${escape(cell)}</b> ${escape(quantity ? quantities[quantity] : "Formula of a column")}</h4><p class="verdict">${escape(
    mistake ? capital(mistakes[mistake]) : "Differs from the published relation",
  )}</p>${why === "" ? "" : `<p>${escape(why)}</p>`}<dl>${facts.join("")}</dl>${plot ? `<figure>${plot}${key}</figure>` : ""}</article>`;
}

const fact = (name: string, content: string): string =>
  content === "" ? "" : `<div><dt>${name}</dt><dd>${content}</dd></div>`;

const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** "fn = SQRT(k/m)/(2*PI())" as mathematics; as text where it cannot be typeset. */
function typeset(relation: string): string {
  const [out, formula] = split(relation);
  const latex = [latexOf(out), latexOf(formula)];
  if (latex.includes(null)) return `<code>${escape(relation)}</code>`;
  const math = temml.renderToString(`\\displaystyle ${latex.join("=")}`, { throwOnError: false, annotate: false });
  return `<div class="relation">${math}</div><div class="soft">${escape(symbols(relation))}</div>`;
}

function split(relation: string): [string, string] {
  const at = relation.indexOf(" = ");
  return at < 0 ? ["x", relation] : [relation.slice(0, at), relation.slice(at + 3)];
}

/** What the names of a relation stand for. */
function symbols(relation: string): string {
  const names = new Set<string>();
  for (const part of split(relation)) {
    walk(readFormula(part).tree, (node) => {
      if (node.kind === "name" && Object.hasOwn(roles, node.name)) names.add(node.name);
    });
  }
  return [...names].map((name) => `${textOf(name) ?? name} ${roles[name as Role].says}`).join(", ");
}

function inLine(relation: string): string {
  const [out, formula] = split(relation);
  const [a, b] = [textOf(out), textOf(formula)];
  return escape(a === null || b === null ? relation : `${a} = ${b}`);
}

function agreement(findings: readonly Finding[]): string {
  const rows = bySheet(findings).flatMap(([sheet, list]) =>
    list.map(
      ({ cell, quantity, relation }) =>
        `<tr><th scope="row">${escape(sheet)} ${escape(cell)}</th><td>${escape(quantity ? quantities[quantity] : "")}</td><td>${relation ? inLine(relation) : ""}</td></tr>`,
    ),
  );
  return `<div class="wide"><table><thead><tr><th scope="col">Cells</th><th scope="col">Quantity</th><th scope="col">Relation</th></tr></thead><tbody>${rows.join("")}</tbody></table></div>`;
}

function notChecked(open: readonly Finding[]): string {
  const rows = bySheet(open).flatMap(([sheet, list]) =>
    list.map(
      ({ cell, formula }) =>
        `<tr><th scope="row">${escape(sheet)} ${escape(cell)}</th><td><code>=${escape(short(formula))}</code></td></tr>`,
    ),
  );
  const formulas =
    rows.length === 0
      ? "<p>Every formula was recognised.</p>"
      : `<p>These formulas were not recognised as a quantity of base excitation, and nothing is said about them:</p><div class="wide"><table><tbody>${rows.join("")}</tbody></table></div>`;
  return `${formulas}<p>Numbers that are typed in, look-up tables, charts, macros and hidden content were not judged.</p>`;
}

const short = (text: string): string => (text.length > 160 ? `${text.slice(0, 160)}…` : text);

const marks: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };
const escape = (text: string): string => text.replace(/[&<>"]/g, (mark) => marks[mark]!);

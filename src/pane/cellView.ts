/** The view "This cell". */
import { why } from "../core/why";
import { NumericError } from "../core/errors";
import { argumentsTable, cellText } from "./argumentsTable";
import type { Auditor } from "./auditor";
import { cautionsFor } from "./cautions";
import type { Context, Current, View } from "./context";
import { h } from "./dom";
import { type Explanation, operatingPoint, sourceText, wordOf } from "./explain";
import { handView } from "./handView";
import { plotView } from "./plotView";
import { areaOf, type CellValue, isError } from "./sheet";
import { startView } from "./startView";
import { strings } from "./strings";
import { resultUnit } from "./units";
import { workedView } from "./workedView";

export interface CellView extends View {
  recolour(): void;
}

export function cellView(context: Context, auditor: Auditor, showCautions: () => void): CellView {
  const head = h("div", { class: "head" });
  const facts = h("div");
  const plot = plotView(context);
  const inputs = h("div");
  const worked = workedView(context);
  const about = h("div");
  const hand = handView(context, auditor);
  const start = startView(context);
  const element = h("div", {}, start.element, head, facts, hand.element, plot.element, inputs, worked.element, about);

  function empty(): void {
    for (const part of [facts, inputs, about]) part.replaceChildren();
  }

  return {
    element,
    recolour: plot.recolour,
    async show(current: Current) {
      if (start.holds(current.selected)) return;
      const { explanation, selected } = current;
      const here = selected.cell.sheet;
      const formula = selected.content.formula;
      head.replaceChildren(...heading(selected.content.value, sourceText(areaOf(selected.cell), ""), explanation));
      start.show(current);
      head.hidden = !start.element.hidden;
      if (!explanation) {
        empty();
        facts.append(...errorFlag(selected.content.value));
      } else {
        facts.replaceChildren(...factsOf(explanation, here, showCautions));
        inputs.replaceChildren(argumentsTable(context, explanation, here));
        about.replaceChildren(aboutOf(explanation, context.referenceUrl));
      }
      plot.show(explanation);
      hand.show(formula !== undefined && !explanation ? selected : null);
      await worked.show(explanation);
    },
  };

  function heading(value: CellValue, address: string, explanation: Explanation | null): HTMLElement[] {
    const unit = explanation ? resultUnit(explanation.doc.returns, wordOf(explanation, "units") ?? "si") : "";
    const long = typeof value === "string" && value.length > 24;
    return [
      h("h2", {}, strings.cell.at(address.replace(/^.*!/, "")), explanation ? h("code", {}, explanation.doc.id) : null),
      explanation ? h("p", {}, explanation.doc.sentence) : h("span", {}),
      long
        ? h("p", {}, value)
        : h(
            "p",
            { class: "result" },
            h("span", { class: "soft" }, strings.cell.result),
            h("strong", {}, cellText(value, context.numbers)),
            typeof value === "number" && unit ? ` ${unit}` : null,
          ),
    ];
  }
}

function factsOf(explanation: Explanation, here: string, showCautions: () => void): HTMLElement[] {
  const words = strings.cell;
  const { doc, result, rows } = explanation;
  const parts: HTMLElement[] = [];
  for (const { blanks, parameter } of rows) {
    if (blanks.length === 0 || parameter.optional) continue;
    parts.push(h("p", { class: "flag" }, words.blankFlag(blanks.map((area) => sourceText(area, here)).join(", "))));
  }
  parts.push(...errorFlag(result, doc.failures));
  const reason = isError(result) ? null : reasonOf(explanation);
  if (reason) parts.push(h("section", {}, h("h3", {}, words.why), h("p", { class: "why" }, reason)));
  const { now } = cautionsFor(explanation);
  if (now.length > 0) {
    parts.push(
      h(
        "p",
        { class: "caution-line" },
        h("strong", {}, `${now[0]!.title}.`),
        " ",
        h("button", { type: "button", class: "link", click: showCautions }, strings.moreCautions),
      ),
    );
  }
  if (explanation.others.length > 0) parts.push(h("p", { class: "soft" }, words.others(explanation.others.join(", "))));
  return parts;
}

/** What the cell says of its error, or else what such errors are about. */
function errorFlag(value: CellValue, usual: readonly string[] = []): HTMLElement[] {
  if (!isError(value)) return [];
  const reasons = value.message ? [value.message] : usual;
  return [h("p", { class: "flag" }, [strings.cell.errorHelp(value.error), ...reasons.map(sentence)].join(" "))];
}

const sentence = (text: string): string => text[0]!.toUpperCase() + text.slice(1).replace(/\.?$/, ".");

function reasonOf(explanation: Explanation): string | null {
  const point = operatingPoint(explanation);
  if (!point || explanation.doc.id === "PEAKTRANS" || explanation.doc.id === "WHY") return null;
  try {
    return why(point.f, point.fn, point.zeta, point.model);
  } catch (error) {
    if (error instanceof NumericError) return sentence(error.message);
    throw error;
  }
}

function aboutOf({ doc }: Explanation, referenceUrl: string): HTMLElement {
  const words = strings.cell;
  return h(
    "dl",
    { class: "about" },
    h("dt", {}, words.leavesOut),
    h("dd", {}, doc.leavesOut),
    ...(doc.failures.length > 0 ? [h("dt", {}, words.fails), h("dd", {}, doc.failures.map(sentence).join(" "))] : []),
    h("dt", {}, words.source),
    h("dd", {}, doc.source),
    h("dd", {}, h("a", { href: `${referenceUrl}#${doc.id}`, target: "_blank", rel: "noopener" }, words.reference)),
  );
}

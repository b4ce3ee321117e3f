/** What goes into a function: each argument with its value, unit, limits, what it is not, and where it comes from. */
import type { Context } from "./context";
import { h } from "./dom";
import { type ArgumentRow, type Explanation, sourceText, wordOf } from "./explain";
import type { Numbers } from "./numbers";
import { type Area, type CellValue, isError } from "./sheet";
import { strings } from "./strings";
import { unitIn } from "./units";

export function argumentsTable(context: Context, explanation: Explanation, here: string): HTMLElement {
  const words = strings.cell;
  const system = wordOf(explanation, "units") ?? "si";
  return h(
    "table",
    { class: "arguments" },
    h("caption", {}, words.arguments),
    h(
      "thead",
      {},
      h(
        "tr",
        {},
        h("th", { scope: "col" }, words.argument),
        h("th", { scope: "col", class: "number" }, words.value),
        h("th", { scope: "col" }, words.from),
      ),
    ),
    h("tbody", {}, ...explanation.rows.map((row) => line(context, row, system, here))),
  );
}

function line(context: Context, row: ArgumentRow, system: string, here: string): HTMLElement {
  const { parameter } = row;
  const [what, isNot] = splitNot(parameter.what, parameter.name);
  const unit = unitIn(parameter.unit, system);
  return h(
    "tr",
    { class: row.blanks.length > 0 && !parameter.optional ? "flagged" : null },
    h(
      "th",
      { scope: "row" },
      what,
      h("small", {}, [unit || parameter.unit, parameter.limits].filter(Boolean).join("; ")),
      isNot ? h("small", { class: "not" }, isNot) : null,
    ),
    h("td", { class: "number" }, valueText(row, unit, context.numbers)),
    h("td", {}, ...origin(context, row, here)),
  );
}

/** "Damping over critical damping (not percent)" as the words and the warning. */
function splitNot(what: string, name: string): [what: string, isNot: string] {
  const found = /^(.*?)\s*\((not [^)]*)\)(.*)$/.exec(what);
  return found ? [found[1]! + found[3]!, found[2]!] : [what, strings.isNot[name] ?? ""];
}

function valueText(row: ArgumentRow, unit: string, numbers: Numbers): string {
  const words = strings.cell;
  if (row.leftOut) return row.parameter.leftOut ? words.leftOut(row.parameter.leftOut) : words.leftOutPlain;
  if (row.table) return words.tableOf(row.table.length * (row.table[0]?.length ?? 0));
  if (row.value === undefined) return "…";
  const text = cellText(row.value, numbers);
  return typeof row.value === "number" && unit ? `${text} ${unit}` : text;
}

export function cellText(value: CellValue, numbers: Numbers): string {
  if (value === null || value === "") return strings.cell.blank;
  if (isError(value)) return value.error;
  return typeof value === "number" ? numbers.short(value) : String(value);
}

function origin(context: Context, row: ArgumentRow, here: string): (HTMLElement | string)[] {
  const words = strings.cell;
  if (row.leftOut) return [""];
  if (row.source) return [selectButton(context, row.source, here)];
  if (row.blanks.length > 0) return row.blanks.map((area) => selectButton(context, area, here));
  return [h("small", {}, /[A-Za-z]/.test(row.text) && !row.text.startsWith('"') ? words.computed : words.inFormula)];
}

/** A button that looks like a link and selects cells. */
export function selectButton(context: Context, area: Area, here: string): HTMLElement {
  const text = sourceText(area, here);
  return h(
    "button",
    {
      type: "button",
      class: "link",
      "aria-label": strings.cell.select(text),
      click: () => context.attempt(() => context.sheet.select(area)),
    },
    text,
  );
}

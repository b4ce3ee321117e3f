/** Inserting a function by choosing a question, its arguments picked from the sheet. */
import { argumentText } from "./argumentText";
import { docOf, type FunctionDoc, functionDocs, type ParameterDoc } from "./catalogue";
import type { Context, Current } from "./context";
import { h } from "./dom";
import { sourceText } from "./explain";
import { button, type TextInput } from "./fluent";
import { areaOf, type Area, type Place, type Selected } from "./sheet";
import { strings } from "./strings";

export interface StartView {
  readonly element: HTMLElement;
  show(current: Current): void;
  /** True while a form is open: the selection then fills its field instead of changing the view. */
  holds(selected: Selected): boolean;
}

interface Field {
  readonly parameter: ParameterDoc;
  readonly input: TextInput;
  readonly pick: HTMLElement;
}

export function startView(context: Context): StartView {
  const words = strings.start;
  const element = h("section", { class: "start" });
  let target: Place | null = null;
  let targetFilled = false;
  let fields: Field[] | null = null;
  let picking: Field | null = null;

  function showQuestions(): void {
    fields = picking = null;
    const asked = strings.questions.flatMap(([id, question]) => {
      const doc = docOf(id);
      return doc ? [h("li", {}, choice(question, doc))] : [];
    });
    const families = [...new Set(functionDocs.map(({ family }) => family))];
    element.replaceChildren(
      h("h2", {}, words.title),
      h("p", { class: "soft" }, words.lead),
      h("ul", { class: "questions" }, ...asked),
      h(
        "details",
        {},
        h("summary", {}, words.all),
        ...families.flatMap((family) => [
          h("h3", {}, strings.families[family] ?? family),
          h(
            "ul",
            { class: "functions" },
            ...functionDocs
              .filter((doc) => doc.family === family)
              .map((doc) => h("li", {}, choice(doc.id, doc), h("small", {}, doc.sentence))),
          ),
        ]),
      ),
    );
  }

  const choice = (text: string, doc: FunctionDoc): HTMLElement =>
    h("button", { type: "button", class: "link", click: () => showForm(doc) }, text);

  function showForm(doc: FunctionDoc): void {
    const place = target!;
    const address = sourceText(areaOf(place), "").replace(/^.*!/, "");
    fields = doc.parameters.map(field);
    element.replaceChildren(
      h("h2", {}, words.into(address), h("code", {}, doc.id)),
      h("p", {}, doc.sentence),
      targetFilled ? h("p", { class: "flag" }, words.overwrites(address)) : "",
      h(
        "form",
        {
          submit: (event) => {
            event.preventDefault();
            insert(doc, place, address);
          },
        },
        ...fields.map(({ parameter, input, pick }) =>
          h("div", { class: "field" }, input, pick, h("small", {}, helpOf(parameter))),
        ),
        h(
          "div",
          { class: "buttons" },
          button(words.insert, () => insert(doc, place, address), { appearance: "primary", type: "button" }),
          button(words.back, showQuestions),
        ),
      ),
    );
    (fields[0]?.input ?? element).focus();
  }

  function field(parameter: ParameterDoc): Field {
    const name = parameter.optional ? `${parameter.what} (${words.optional})` : parameter.what;
    const input = h("fluent-text-input", { "control-size": "small", autocomplete: "off" }, name) as TextInput;
    const made: Field = {
      parameter,
      input,
      pick: button(
        words.pick,
        () => {
          setPicking(picking === made ? null : made);
        },
        { "aria-pressed": "false", "aria-label": words.pickFor(parameter.what) },
      ),
    };
    return made;
  }

  function setPicking(next: Field | null): void {
    picking = next;
    fields?.forEach((each) => each.pick.setAttribute("aria-pressed", String(each === next)));
    context.say(next ? words.picking : "");
  }

  function insert(doc: FunctionDoc, place: Place, address: string): void {
    const parts = fields!.map(({ parameter, input }) => argumentText(parameter, input.value ?? ""));
    const gap = fields!.find(({ parameter }, i) => !parameter.optional && !parameter.repeating && parts[i] === "");
    if (gap) {
      context.say(words.missing(gap.parameter.what));
      gap.input.focus();
      return;
    }
    while (parts.at(-1) === "") parts.pop();
    const formula = `=PLINTH.${doc.id}(${parts.join(",")})`;
    context.attempt(async () => {
      await context.sheet.write(place, formula);
      fields = picking = null;
      context.say(words.inserted(address));
      await context.sheet.select(areaOf(place));
    });
  }

  return {
    element,
    show({ explanation, selected }) {
      element.hidden = explanation !== null || selected.content.formula !== undefined;
      if (element.hidden) return;
      target = selected.cell;
      targetFilled = selected.content.value !== null && selected.content.value !== "";
      if (!element.hasChildNodes() || fields === null) showQuestions();
    },
    holds(selected) {
      if (!fields) return false;
      if (picking) fill(picking, selected.area);
      return true;
    },
  };

  function fill(into: Field, area: Area): void {
    const at = fields!.indexOf(into);
    into.input.value = sourceText(area, target!.sheet);
    setPicking(null);
    (fields![at + 1]?.input ?? into.input).focus();
  }
}

const helpOf = ({ unit, limits, leftOut }: ParameterDoc): string =>
  [unit, limits].filter(Boolean).join("; ") + (leftOut ? `. ${strings.start.leftOut(leftOut)}` : "");

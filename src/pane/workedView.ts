/** The worked line, typeset, ready to copy into a report. */
import type { Context } from "./context";
import { h } from "./dom";
import type { Explanation } from "./explain";
import { button } from "./fluent";
import { strings } from "./strings";
import type { WorkedStep } from "./worked";

export interface WorkedView {
  readonly element: HTMLElement;
  show(explanation: Explanation | null): Promise<void>;
}

export function workedView(context: Context): WorkedView {
  const words = strings.cell;
  const lines = h("div", { class: "worked-lines", tabindex: "0", role: "group", "aria-label": words.worked });
  const source = h("p", { class: "soft" });
  let worked: readonly WorkedStep[] | null = null;
  const element = h(
    "section",
    { hidden: true },
    h("h3", {}, words.worked),
    lines,
    source,
    h(
      "div",
      { class: "buttons" },
      button(words.copyText, () => copy(() => worked!.map(({ text }) => text).join("\n"))),
      button(words.copyMathML, () => copy(mathML)),
    ),
  );
  let shown: Explanation | null = null;

  function copy(text: () => string): void {
    context.attempt(async () => {
      await navigator.clipboard.writeText(text());
      context.say(words.copied);
    });
  }

  const mathML = (): string => [...lines.querySelectorAll("math")].map((math) => math.outerHTML).join("\n");

  return {
    element,
    async show(explanation) {
      shown = explanation;
      if (!explanation) {
        element.hidden = true;
        return;
      }
      await afterPaint(); // typesetting takes longer than the rest, which is shown first
      if (shown !== explanation) return;
      const [{ workedLine }, { default: temml }] = await typesetting();
      if (shown !== explanation) return;
      worked = workedLine(explanation, context.numbers);
      element.hidden = !worked;
      if (!worked) return;
      source.textContent = `${words.source}: ${explanation.doc.source}`;
      lines.replaceChildren(
        ...worked.flatMap(({ latex }) =>
          latex.map((part, i) => {
            const line = h("div", { class: i > 0 ? "worked-line further" : "worked-line" });
            temml.render(part, line, { displayMode: true, throwOnError: false, annotate: false });
            return line;
          }),
        ),
      );
    },
  };
}

const afterPaint = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

let loading: ReturnType<typeof load> | undefined;

/** Relations and typesetting come together and only when a cell is first explained. */
const typesetting = (): ReturnType<typeof load> => (loading ??= load());

function load() {
  return Promise.all([
    import(/* webpackChunkName: "worked" */ "./worked"),
    import(/* webpackChunkName: "worked" */ "temml"),
  ]);
}

/** The view "Cautions": those that fit the selected cell first. */
import { type Caution, cautionsFor } from "./cautions";
import type { View } from "./context";
import { h } from "./dom";
import { strings } from "./strings";

export function cautionsView(): View {
  const words = strings.cautions;
  const now = h("div");
  const others = h("div");
  const element = h("div", {}, h("h2", {}, strings.views.cautions), h("p", { class: "soft" }, words.lead), now, others);
  return {
    element,
    show({ explanation }) {
      const found = cautionsFor(explanation);
      now.replaceChildren(...(found.now.length > 0 ? [h("h3", {}, words.now), list(found.now, "cautions now")] : []));
      others.replaceChildren(h("h3", {}, words.others), list(found.others, "cautions"));
    },
  };
}

function list(cautions: readonly Caution[], looks: string): HTMLElement {
  return h(
    "ul",
    { class: looks },
    ...cautions.map(({ title, text, defer }) =>
      h(
        "li",
        {},
        h("h4", {}, title),
        h("p", {}, text),
        h("p", { class: "defer" }, h("span", { class: "soft" }, `${strings.cautions.defer}: `), defer),
      ),
    ),
  );
}

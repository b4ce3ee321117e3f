/** The plot with its legend, its words and its two settings. */
import type { Context } from "./context";
import { h } from "./dom";
import type { Explanation } from "./explain";
import type { Switch, TextInput } from "./fluent";
import type { Plot, PlotLine } from "./plot";
import { type Picture, responsePicture } from "./responsePlot";
import { strings } from "./strings";

export interface PlotView {
  readonly element: HTMLElement;
  show(explanation: Explanation | null): void;
  recolour(): void;
}

export function plotView(context: Context): PlotView {
  const words = strings.plot;
  const canvas = h("canvas", { role: "img" });
  const legend = h("ul", { class: "legend", "aria-hidden": "true" });
  const tells = h("p", { class: "soft" });
  const decibels = h("fluent-switch", { "aria-label": words.decibels }) as Switch;
  const fnTolerance = tolerance(words.ofNaturalFrequency);
  const dampingTolerance = tolerance(words.ofDamping);
  const settings = h(
    "div",
    { class: "plot-settings" },
    h("label", { class: "inline" }, decibels, words.decibels),
    h("fieldset", {}, h("legend", {}, words.tolerances), fnTolerance, dampingTolerance),
  );
  const element = h(
    "figure",
    { class: "plot", hidden: true },
    h("h3", {}, words.title),
    h("div", { class: "canvas" }, canvas),
    legend,
    h("figcaption", {}, tells),
    settings,
  );
  let plotting: Promise<Plot> | undefined;
  let shown: Explanation | null = null;

  const fraction = (input: TextInput): number => {
    const percent = Number(input.value.replace(",", ".").replace("%", ""));
    return percent >= 0 && percent <= 99 ? percent / 100 : 0;
  };
  const keep = (): void => {
    context.attempt(() =>
      context.notebook.change({
        decibels: decibels.checked,
        tolerances: { naturalFrequency: fraction(fnTolerance), damping: fraction(dampingTolerance) },
      }),
    );
    void redraw();
  };
  decibels.addEventListener("change", keep);
  fnTolerance.addEventListener("change", keep);
  dampingTolerance.addEventListener("change", keep);

  async function redraw(): Promise<void> {
    const wanted = shown;
    const picture = wanted && (await pictureOf(wanted));
    if (wanted !== shown) return;
    element.hidden = !picture;
    if (!picture) return;
    settings.hidden = !picture.response;
    tells.textContent = picture.tells.join(" ");
    canvas.setAttribute("aria-label", picture.tells.join(" "));
    legend.replaceChildren(...legendOf(picture.content.lines));
    plotting ??= import(/* webpackChunkName: "plot" */ "./plot").then(({ createPlot }) => createPlot(canvas));
    const plot = await plotting;
    if (wanted === shown) plot.draw(picture.content);
  }

  async function pictureOf(explanation: Explanation): Promise<Picture | null> {
    const { tolerances, decibels } = context.notebook.notes;
    if (["random", "shock", "systems"].includes(explanation.doc.family)) {
      const { specialPicture } = await import(/* webpackChunkName: "special" */ "./specialPlots");
      const special = specialPicture(explanation, context.numbers);
      if (special) return special;
    }
    return responsePicture(explanation, tolerances, decibels, context.numbers);
  }

  return {
    element,
    show(explanation) {
      shown = explanation;
      const { notes } = context.notebook;
      decibels.checked = notes.decibels;
      putTolerance(fnTolerance, notes.tolerances.naturalFrequency);
      putTolerance(dampingTolerance, notes.tolerances.damping);
      void redraw();
    },
    recolour: () => void plotting?.then((plot) => plot.recolour()),
  };

  function putTolerance(input: TextInput, share: number): void {
    if (document.activeElement !== input) input.value = share > 0 ? String(Number((share * 100).toPrecision(6))) : "";
  }
}

function tolerance(label: string): TextInput {
  return h(
    "fluent-text-input",
    { "control-size": "small", inputmode: "decimal", placeholder: strings.plot.toleranceLimits },
    label,
  ) as TextInput;
}

function legendOf(lines: readonly PlotLine[]): HTMLElement[] {
  return lines
    .filter(({ look }) => look !== "edge")
    .map(({ label, look }) => h("li", {}, h("span", { class: `key key-${look}` }), label));
}

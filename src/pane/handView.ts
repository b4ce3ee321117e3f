/** What the audit says of the selected hand formula. */
import type { Finding } from "../audit/finding";
import type { Auditor } from "./auditor";
import type { Context } from "./context";
import { h } from "./dom";
import { areaOfFinding, touches } from "./findings";
import { areaOf, type Selected } from "./sheet";
import { strings } from "./strings";

/** An audit that took longer than this is not run again unasked. */
const PATIENCE = 3;

export interface HandView {
  readonly element: HTMLElement;
  show(selected: Selected | null): void;
}

export function handView(context: Context, auditor: Auditor): HandView {
  const words = strings.hand;
  const element = h("section", { hidden: true });
  let shown: Selected | null = null;

  async function recognise(selected: Selected): Promise<void> {
    const findings = await auditor.findings({});
    if (shown !== selected) return;
    const here = areaOf(selected.cell);
    const found = findings.filter((finding) => touches(areaOfFinding(finding), here));
    element.replaceChildren(
      h("h3", {}, words.title),
      h("pre", { class: "formula" }, `=${selected.content.formula}`),
      ...(found.length > 0 ? found.map((finding) => findingCard(context, finding)) : [h("p", {}, words.unrecognised)]),
    );
  }

  return {
    element,
    show(selected) {
      shown = selected;
      element.hidden = !selected;
      if (!selected) return;
      element.replaceChildren(
        h("h3", {}, words.title),
        h("pre", { class: "formula" }, `=${selected.content.formula}`),
        h("p", { class: "soft" }, words.checking),
      );
      if (auditor.ready || auditor.lastSeconds < PATIENCE) context.attempt(() => recognise(selected));
    },
  };
}

/** One finding in full. */
export function findingCard(context: Context, finding: Finding): HTMLElement {
  const words = strings.hand;
  const { verdict, message, evidence, suggestion, maxRelativeError, worstCell } = finding;
  const effect =
    maxRelativeError !== null && worstCell && verdict === "differs"
      ? strings.audit.worst(context.numbers.percent(Math.abs(maxRelativeError)), worstCell)
      : null;
  return h(
    "div",
    { class: `finding ${verdict}` },
    verdict === "unrecognised"
      ? h("p", {}, words.unrecognised)
      : h("p", {}, h("strong", {}, strings.audit.verdicts[verdict]), ". ", message ?? ""),
    effect ? h("p", {}, `${words.effect}: ${effect}`) : null,
    suggestion ? h("p", {}, `${words.suggestion}: `, h("code", {}, suggestion)) : null,
    evidence ? h("p", { class: "soft" }, `${words.evidence}: ${evidence}`) : null,
  );
}

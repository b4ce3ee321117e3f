/** The view "Audit". */
import type { Finding } from "../audit/finding";
import type { Auditor } from "./auditor";
import type { Context, Current, View } from "./context";
import { h } from "./dom";
import { button, type TextInput } from "./fluent";
import { acceptanceKey, areaOfFinding, cellCount, findingRows, groupsOf, touches } from "./findings";
import { findingCard } from "./handView";
import { plainCopy } from "./plainCopy";
import { selectButton } from "./argumentsTable";
import { strings } from "./strings";

type Scope = "selection" | "sheet" | "workbook";
const SCOPES: readonly Scope[] = ["selection", "sheet", "workbook"];
/** Cells listed under one finding group before the rest is only counted. */
const MOST_SHOWN = 40;

export interface AuditView extends View {
  /** Forgets the results, which were those of another workbook. */
  clear(): void;
}

export function auditView(context: Context, auditor: Auditor): AuditView {
  const words = strings.audit;
  let current: Current | null = null;
  let scope: Scope = "workbook";
  let running: AbortController | null = null;
  let shown: { findings: readonly Finding[]; where: string } | null = null;

  const run = button(words.run, () => context.attempt(audit), { appearance: "primary" });
  const cancel = button(words.cancel, () => running?.abort(), { hidden: true });
  const bar = h("fluent-progress-bar", { "aria-label": words.reading, max: "100", value: "0" });
  const stage = h("p", { class: "soft stage", role: "status" });
  const progress = h("div", { class: "working" }, stage, bar);
  const results = h("div", { class: "results" });
  const element = h(
    "div",
    {},
    h("h2", {}, strings.views.audit),
    h("p", { class: "soft" }, words.lead),
    scopes(),
    h("div", { class: "buttons" }, run, cancel),
    progress,
    results,
    h("section", {}, h("h3", {}, words.plain), h("p", { class: "soft" }, words.plainLead), plainButton()),
  );
  idle();

  function scopes(): HTMLElement {
    return h(
      "fieldset",
      { class: "choice" },
      h("legend", {}, words.scope),
      ...SCOPES.map((each) =>
        h(
          "label",
          {},
          h("input", {
            type: "radio",
            name: "plinth-scope",
            value: each,
            checked: each === scope,
            change: () => (scope = each),
          }),
          words[each],
        ),
      ),
    );
  }

  function plainButton(): HTMLElement {
    return button(words.plain, () =>
      context.attempt(async () => {
        if (current) context.say(await plainCopy(context, current.selected.cell.sheet));
      }),
    );
  }

  function idle(): void {
    running = null;
    cancel.hidden = true;
    run.removeAttribute("disabled");
    progress.classList.remove("on");
    stage.textContent = "";
  }

  async function audit(): Promise<void> {
    if (!current) return;
    const { area } = current.selected;
    const wanted = scope;
    running = new AbortController();
    run.setAttribute("disabled", "");
    cancel.hidden = false;
    progress.classList.add("on");
    stage.textContent = words.reading;
    try {
      const all = await auditor.findings({
        signal: running.signal,
        progress: (done) => bar.setAttribute("value", String(Math.round(done * 100))),
        comparing: (done) => {
          stage.textContent = words.comparing;
          bar.setAttribute("value", String(Math.round(done * 100)));
        },
      });
      const findings = all.filter((finding) => {
        if (wanted === "workbook") return true;
        if (wanted === "sheet") return finding.sheet === area.sheet;
        return touches(areaOfFinding(finding), area);
      });
      shown = { findings, where: wanted === "workbook" ? words.workbook : area.sheet };
      showResults();
    } catch (error) {
      if (!(error instanceof DOMException && error.name === "AbortError")) throw error;
      context.say(words.cancelled);
    } finally {
      idle();
      run.textContent = words.again;
    }
  }

  function showResults(): void {
    if (!shown) return;
    const { findings } = shown;
    const { accepted } = context.notebook.notes;
    const isAccepted = (finding: Finding): boolean => acceptanceKey(finding) in accepted;
    const differ = findings.filter((finding) => finding.verdict === "differs" && !isAccepted(finding));
    const settled = findings.filter((finding) => finding.verdict === "differs" && isAccepted(finding));
    const agree = findings.filter(({ verdict }) => verdict === "agrees");
    const unknown = findings.filter(({ verdict }) => verdict === "unrecognised");
    const count = (list: readonly Finding[]): string =>
      context.numbers.exact(list.reduce((sum, { cell }) => sum + cellCount(cell), 0));
    results.replaceChildren(
      h("p", { role: "status" }, words.summary(count(findings), count(differ), count(agree), count(unknown))),
      ...(differ.length === 0 ? [h("p", {}, words.none)] : [h("h3", {}, words.differ)]),
      ...groupsOf(differ).map((group) => section(group.title, group.findings, group.cells, group.worst, true)),
      ...folded(words.accepted, settled),
      ...folded(words.agree, agree),
      ...folded(words.unrecognised, unknown),
      h("h3", {}, words.notChecked),
      h("ul", { class: "plain" }, ...words.notCheckedList.map((text) => h("li", {}, text))),
      h(
        "div",
        { class: "buttons" },
        button(words.write, () => context.attempt(writeSheet)),
      ),
    );
  }

  function section(
    title: string,
    findings: readonly Finding[],
    cells: number,
    worst: number | null,
    open: boolean,
  ): HTMLElement {
    return h(
      "details",
      { class: "group", open },
      h(
        "summary",
        {},
        title,
        h("small", {}, words.cells(cells) + (worst === null ? "" : `, ${words.upTo(context.numbers.percent(worst))}`)),
      ),
      ...findings.slice(0, MOST_SHOWN).map(entry),
      findings.length > MOST_SHOWN ? h("p", { class: "soft" }, words.more(findings.length - MOST_SHOWN)) : null,
    );
  }

  function folded(title: string, findings: readonly Finding[]): HTMLElement[] {
    if (findings.length === 0) return [];
    const groups = groupsOf(findings).map((group) =>
      section(group.title, group.findings, group.cells, group.worst, false),
    );
    return [h("details", { class: "fold" }, h("summary", {}, title), ...groups)];
  }

  function entry(finding: Finding): HTMLElement {
    return h(
      "div",
      { class: "entry" },
      selectButton(context, areaOfFinding(finding), current?.selected.cell.sheet ?? ""),
      findingCard(context, finding),
      finding.verdict === "differs" ? acceptance(finding) : null,
    );
  }

  function acceptance(finding: Finding): HTMLElement {
    const key = acceptanceKey(finding);
    const reason = context.notebook.notes.accepted[key];
    if (reason !== undefined) {
      return h(
        "p",
        { class: "accepted" },
        `${words.acceptBecause} ${reason} `,
        h("button", { type: "button", class: "link", click: () => keep(key, null) }, words.acceptUndo),
      );
    }
    const input = h(
      "fluent-text-input",
      { "control-size": "small", autocomplete: "off" },
      words.acceptReason,
    ) as TextInput;
    const form = h(
      "form",
      {
        class: "accept",
        submit: (event) => {
          event.preventDefault();
          accept();
        },
      },
      input,
      button(words.acceptKeep, accept, { type: "button" }),
    );
    function accept(): void {
      const text = input.value.trim();
      if (text === "") context.say(words.needsReason);
      else keep(key, text);
    }
    return h("details", { class: "accept" }, h("summary", {}, words.accept), form);
  }

  function keep(key: string, reason: string | null): void {
    context.attempt(async () => {
      const { [key]: _, ...rest } = context.notebook.notes.accepted;
      await context.notebook.change({ accepted: reason === null ? rest : { ...rest, [key]: reason } });
      showResults();
    });
  }

  async function writeSheet(): Promise<void> {
    if (!shown) return;
    const rows = findingRows(shown.findings, context.notebook.notes, context.numbers, shown.where);
    context.say(words.written(await context.sheet.addSheet(words.sheetName, rows)));
  }

  return {
    element,
    show(next) {
      current = next;
    },
    clear() {
      running?.abort();
      shown = null;
      results.replaceChildren();
      run.textContent = words.run;
    },
  };
}

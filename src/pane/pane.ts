/** The task pane: three views over one spreadsheet. Talks to a Sheet, never to a host. */
import { auditView } from "./auditView";
import { createAuditor } from "./auditor";
import { cautionsView } from "./cautionsView";
import { cellView } from "./cellView";
import type { Context, Current, View, ViewName } from "./context";
import { announcer, h } from "./dom";
import { explain } from "./explain";
import "./fluent";
import { notebook } from "./notes";
import { numbersFor } from "./numbers";
import paneCss from "./pane.css";
import type { Sheet } from "./sheet";
import { strings } from "./strings";
import tokensCss from "./tokens.css";

export interface PaneOptions {
  readonly referenceUrl: string;
  readonly version: string;
}

const VIEWS: readonly ViewName[] = ["cell", "audit", "cautions"];

/** Builds the pane inside `root` and keeps it in step with the sheet. */
export function startPane(root: HTMLElement, sheet: Sheet, { referenceUrl, version }: PaneOptions): void {
  adopt(tokensCss, paneCss);
  const status = announcer();
  const context: Context = {
    sheet,
    numbers: numbersFor(sheet.locale),
    notebook: notebook(sheet),
    referenceUrl,
    version,
    say: status.say,
    attempt: (action) => {
      status.say("");
      action().catch((error: Error) => {
        if (error.name !== "AbortError") status.say(strings.failed(error.message));
      });
    },
  };
  const auditor = createAuditor(sheet);
  const audit = auditView(context, auditor);
  const cell = cellView(context, auditor, () => activate("cautions"));
  const views: Record<ViewName, View> = { cell, audit, cautions: cautionsView() };
  const tabs = VIEWS.map((name) =>
    h("fluent-tab", { id: `plinth-tab-${name}`, slot: "tab", "aria-controls": `plinth-${name}` }, strings.views[name]),
  );
  const tablist = h(
    "fluent-tablist",
    { activeid: "plinth-tab-cell", "aria-label": strings.viewsLabel, size: "small" },
    ...tabs,
  ) as HTMLElement & { activeid: string };
  const panels = VIEWS.map((name, i) =>
    h(
      "div",
      {
        id: `plinth-${name}`,
        class: "panel",
        role: "tabpanel",
        tabindex: "0",
        "aria-labelledby": tabs[i]!.id,
        hidden: i > 0,
      },
      views[name].element,
    ),
  );
  root.classList.add("plinth");
  root.replaceChildren(tablist, ...panels, status.element, h("p", { class: "standing" }, strings.standing));

  let current: Current | null = null;
  tablist.addEventListener("change", () => render());

  function activate(name: ViewName): void {
    tablist.activeid = `plinth-tab-${name}`;
    tabs[VIEWS.indexOf(name)]!.focus();
    render();
  }

  /** Only the view in sight follows the selection; the others catch up when they are opened. */
  function render(): void {
    const name = VIEWS.find((each) => tablist.activeid === `plinth-tab-${each}`) ?? "cell";
    panels.forEach((panel, i) => (panel.hidden = VIEWS[i] !== name));
    if (current) context.attempt(async () => views[name].show(current!));
  }

  let latest = 0;
  async function follow(): Promise<void> {
    const turn = ++latest;
    const selected = await sheet.selected();
    const explanation = await explain(sheet, selected);
    if (turn !== latest) return;
    current = { selected, explanation };
    await views[VIEWS.find((each) => tablist.activeid === `plinth-tab-${each}`) ?? "cell"].show(current);
  }
  const update = (): void => void follow().catch((error: Error) => status.say(strings.failed(error.message)));

  function wearTheme(): void {
    root.dataset["theme"] = sheet.theme();
    cell.recolour();
  }
  sheet.onTheme(wearTheme);
  sheet.onSelect(update);
  sheet.onChange(() => {
    auditor.forget();
    update();
  });
  sheet.onOpen(() => {
    audit.clear();
    context.attempt(async () => {
      await context.notebook.open();
      await follow();
    });
  });
  wearTheme();
  context.attempt(async () => {
    await context.notebook.open().catch(() => {});
    await follow();
    root.dataset["ready"] = "true";
  });
}

/** Styles join the document without an inline sheet, which the add-in's content policy would refuse. */
function adopt(...texts: string[]): void {
  const sheets = texts.map((text) => {
    const sheet = new CSSStyleSheet();
    sheet.replaceSync(text);
    return sheet;
  });
  document.adoptedStyleSheets = [...document.adoptedStyleSheets, ...sheets];
}

/** The page's own frame: messages, busy state, file name, menu of examples, pane toggle. */

const byId = <T extends HTMLElement>(id: string): T => document.getElementById(id) as T;

export const element = byId;

/** Shows a message until it is closed or replaced; several lines become a list. */
export function tell(text: string, ...details: string[]): void {
  const paragraph = document.createElement("p");
  paragraph.textContent = text;
  const parts: HTMLElement[] = [paragraph];
  if (details.length > 0) {
    const list = document.createElement("ul");
    list.append(...details.map((detail) => Object.assign(document.createElement("li"), { textContent: detail })));
    parts.push(list);
  }
  byId("notice-text").replaceChildren(...parts);
  byId("notice").hidden = false;
}

export function hush(): void {
  byId("notice").hidden = true;
}

const untilPainted = (): Promise<void> => new Promise((resolve) => requestAnimationFrame(() => setTimeout(resolve, 0)));

/** Shows what is going on while the work runs, and holds the buttons that would start other work. */
export async function whileBusy<T>(text: string, work: () => T | Promise<T>): Promise<T> {
  const buttons = ["open", "save", "examples"].map((id) => byId<HTMLButtonElement>(id));
  byId("busy-text").textContent = text;
  byId("busy").hidden = false;
  buttons.forEach((button) => (button.disabled = true));
  await untilPainted();
  try {
    return await work();
  } finally {
    byId("busy").hidden = true;
    buttons.forEach((button) => (button.disabled = false));
  }
}

export function showFileName(name: string): void {
  byId("file-name").textContent = name;
  document.title = `${name} · Plinth trial sheet`;
}

export function setUpPaneToggle(): void {
  const button = byId("pane-toggle");
  button.addEventListener("click", () => {
    const shown = button.getAttribute("aria-pressed") !== "true";
    button.setAttribute("aria-pressed", String(shown));
    byId("pane").hidden = !shown;
    dispatchEvent(new Event("resize"));
  });
}

/** F6 goes on to the next part of the page, Shift+F6 back: the grid keeps Tab for moving between cells. */
export function setUpRegions(): void {
  const parts = [
    { root: "header", start: "#open" },
    { root: "#grid", start: "#grid .o-grid .o-composer" },
    { root: "#pane", start: "#pane [role=tab][aria-selected=true]" },
  ].map(({ root, start }) => ({ root: document.querySelector<HTMLElement>(root)!, start }));
  addEventListener(
    "keydown",
    (event) => {
      if (event.key !== "F6" || event.ctrlKey || event.altKey || event.metaKey) return;
      event.preventDefault();
      event.stopPropagation();
      const reachable = parts.filter(({ root }) => !root.hidden);
      const here = reachable.findIndex(({ root }) => root.contains(document.activeElement));
      const next = here + (event.shiftKey ? reachable.length - 1 : 1);
      document.querySelector<HTMLElement>(reachable[next % reachable.length]!.start)?.focus();
    },
    true,
  );
}

export interface MenuEntry {
  label: string;
  says: string;
  choose: () => void;
}

/** A button that opens a list: arrow keys move, Escape and a click elsewhere close. */
export function setUpMenu(button: HTMLElement, list: HTMLElement, entries: MenuEntry[]): void {
  const setOpen = (open: boolean): void => {
    list.hidden = !open;
    button.setAttribute("aria-expanded", String(open));
  };
  const items = entries.map((entry) => {
    const item = Object.assign(document.createElement("button"), { type: "button", textContent: entry.label });
    item.append(Object.assign(document.createElement("small"), { textContent: entry.says }));
    item.addEventListener("click", () => {
      setOpen(false);
      button.focus();
      entry.choose();
    });
    return item;
  });
  list.replaceChildren(
    ...items.map((item) => {
      const li = document.createElement("li");
      li.append(item);
      return li;
    }),
  );
  button.addEventListener("click", () => {
    setOpen(Boolean(list.hidden));
    if (!list.hidden) items[0]?.focus();
  });
  list.addEventListener("keydown", (event) => {
    const at = items.indexOf(document.activeElement as HTMLButtonElement);
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step) items[(at + step + items.length) % items.length]?.focus();
    else if (event.key === "Escape") {
      setOpen(false);
      button.focus();
    } else return;
    event.preventDefault();
  });
  document.addEventListener("pointerdown", (event) => {
    if (!(event.target instanceof Node) || (!list.contains(event.target) && !button.contains(event.target)))
      setOpen(false);
  });
}

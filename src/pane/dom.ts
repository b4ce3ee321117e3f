/** Elements in one line. */
type Child = Node | string | null | undefined | false;
type Attributes = Record<string, string | number | boolean | null | undefined | ((event: Event) => void)>;

/** An element; attributes that are functions listen to the event of their name, true sets, false and null leave out. */
export function h<K extends string>(
  tag: K,
  attributes: Attributes = {},
  ...children: Child[]
): K extends keyof HTMLElementTagNameMap ? HTMLElementTagNameMap[K] : HTMLElement {
  const element = document.createElement(tag);
  for (const [name, value] of Object.entries(attributes)) {
    if (typeof value === "function") element.addEventListener(name, value);
    else if (value === true) element.setAttribute(name, "");
    else if (value !== false && value !== null && value !== undefined) element.setAttribute(name, String(value));
  }
  element.append(
    ...children.filter((child): child is Node | string => typeof child === "string" || child instanceof Node),
  );
  return element as never;
}

/** A short word on what happened, for eyes and screen readers alike. */
export function announcer(): { element: HTMLElement; say: (text: string) => void } {
  const element = h("p", { class: "said", role: "status" });
  return { element, say: (text) => void (element.textContent = text) };
}

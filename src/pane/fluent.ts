/** The components of the host's look that the pane uses; they take their colours from tokens.css. */
import "@fluentui/web-components/button/define.js";
import "@fluentui/web-components/progress-bar/define.js";
import "@fluentui/web-components/switch/define.js";
import "@fluentui/web-components/tab/define.js";
import "@fluentui/web-components/tablist/define.js";
import "@fluentui/web-components/text-input/define.js";
import { h } from "./dom";

/** An input as the component offers it; read `value` to know what was typed. */
export type TextInput = HTMLElement & { value: string };
export type Switch = HTMLElement & { checked: boolean };

export function button(text: string, press: () => void, attributes: Parameters<typeof h>[1] = {}): HTMLElement {
  return h("fluent-button", { size: "small", ...attributes, click: press }, text);
}

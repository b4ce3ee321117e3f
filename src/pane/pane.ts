/** The pane's start. */
export function startPane(root: HTMLElement): void {
  root.textContent = "";
}

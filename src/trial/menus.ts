/** Takes out of the spreadsheet's menus what this job does not need. */
import { registries, tokenColors } from "@odoo/o-spreadsheet";

const unwanted = [
  "file",
  "settings",
  "insert_carousel",
  "insert_pivot",
  "insert_image",
  "insert_checkbox",
  "pivot_data_sources",
  "reinsert_dynamic_pivot",
  "reinsert_static_pivot",
  "view_irregularity_map",
  "toggle_pin_panel",
  "data_cleanup",
  "split_to_columns",
  "column_statistics",
];

type Item = { id?: string; children?: unknown[] };

export function trimMenus(): void {
  for (const registry of [registries.topbarMenuRegistry, registries.cellMenuRegistry]) {
    const content = (registry as unknown as { content: Record<string, Item> }).content;
    for (const [key, item] of Object.entries(content)) {
      if (unwanted.includes(key) || key.includes("pivot")) delete content[key];
      else prune(key, item);
    }
  }
}

function prune(key: string, item: Item): void {
  if (!Array.isArray(item.children)) return;
  item.children = item.children.filter((child) => {
    // A child that is a function builds its items on demand: the list of functions, or pivot tables under "data".
    if (typeof child === "function") return key !== "data";
    const id = (child as Item).id ?? "";
    return !unwanted.includes(id) && !id.includes("pivot");
  });
  for (const child of item.children) if (typeof child !== "function") prune((child as Item).id ?? "", child as Item);
}

/** Formulas in our colours, readable on light and dark paper. */
export function colourFormulas(): void {
  const clay = "light-dark(#9c4221, #e39a78)";
  const moss = "light-dark(#4b6b2f, #a9c88a)";
  const slate = "light-dark(#35596b, #8fbad0)";
  const ink = "light-dark(#2c2a27, #ece7de)";
  Object.assign(tokenColors, {
    FUNCTION: clay,
    LEFT_PAREN: ink,
    RIGHT_PAREN: ink,
    ARG_SEPARATOR: ink,
    OPERATOR: ink,
    NUMBER: slate,
    STRING: moss,
  });
}

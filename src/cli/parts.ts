/** The XML parts of a workbook as text: its sheets, and the few kinds of text that a formula is written in. */

/** The worksheets by name, in the book's order. */
export function sheetParts(text: (path: string) => string): { name: string; path: string }[] {
  const targets = new Map<string, string>();
  for (const [element] of text("xl/_rels/workbook.xml.rels").matchAll(/<(?:\w+:)?Relationship\s[^>]*>/g)) {
    if (attribute(element, "Type")?.endsWith("/worksheet")) {
      targets.set(attribute(element, "Id") ?? "", fromFolder(attribute(element, "Target") ?? ""));
    }
  }
  const found: { name: string; path: string }[] = [];
  for (const [element] of text("xl/workbook.xml").matchAll(/<(?:\w+:)?sheet\s[^>]*>/g)) {
    const path = targets.get(attribute(element, "r:id") ?? "");
    if (path !== undefined && text(path) !== "") found.push({ name: attribute(element, "name") ?? "", path });
  }
  return found;
}

const fromFolder = (target: string): string =>
  target.startsWith("/") ? target.slice(1) : `xl/${target.replace(/^\.\//, "")}`;

export function attribute(element: string, name: string): string | undefined {
  const found = new RegExp(`\\s${name}=(?:"([^"]*)"|'([^']*)')`).exec(element);
  const text = found?.[1] ?? found?.[2];
  return text === undefined ? undefined : decode(text);
}

const entities: Record<string, string> = { lt: "<", gt: ">", quot: '"', apos: "'", amp: "&" };

export const decode = (text: string): string =>
  text.replace(/&(?:#(\d+)|#x([0-9a-f]+)|(\w+));/gi, (whole, decimal?: string, hex?: string, name?: string) => {
    if (decimal) return String.fromCodePoint(Number(decimal));
    if (hex) return String.fromCodePoint(parseInt(hex, 16));
    return entities[name!] ?? whole;
  });

export const encode = (text: string): string =>
  text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");

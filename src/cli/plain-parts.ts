/** What a copy with plain formulas needs outside its cells. */
import { hasOwnCall, plainText } from "../audit/plain-calls";
import { decode, encode } from "./parts";
import type { Left } from "./plain-book";

const elsewhere =
  /<((?:\w+:)?(formula|formula1|formula2|calculatedColumnFormula|definedName|f))(\s[^>]*)?>([^<]*PLINTH[^<]*)<\/\1>/gi;

/** Formulas of formats, checks, tables and names with our functions replaced; those that cannot be are added to `left`. */
export function mendRest(xml: string, part: string, left: Left[]): string {
  return xml.replace(
    elsewhere,
    (whole, element: string, kind: string, attributes: string | undefined, content: string) => {
      const formula = decode(content);
      if (kind.toLowerCase() === "f" || !hasOwnCall(formula)) return whole; // cells have been seen to
      const { formula: plain, kept, ranges } = plainText(formula);
      if (kept.length > 0 || ranges) {
        const reason = kept.map((each) => each.reason).join("; ") || "it works on whole ranges";
        left.push({ place: `${part} (${places[kind] ?? "a rule"})`, reason });
        return whole;
      }
      return `<${element}${attributes ?? ""}>${encode(plain)}</${element}>`;
    },
  );
}

const places: Record<string, string> = {
  definedName: "a defined name",
  calculatedColumnFormula: "a table's column formula",
};

/** Lets the spreadsheet work everything out anew, and drops its own list of what depends on what. */
export function recalculateOnOpening(parts: Record<string, Uint8Array>): void {
  delete parts["xl/calcChain.xml"];
  edit(parts, "[Content_Types].xml", (xml) => xml.replace(/<Override\s[^>]*calcChain[^>]*\/>/g, ""));
  edit(parts, "xl/_rels/workbook.xml.rels", (xml) => xml.replace(/<Relationship\s[^>]*calcChain[^>]*\/>/g, ""));
  edit(parts, "xl/workbook.xml", (xml) => {
    if (/fullCalcOnLoad=/.test(xml)) return xml.replace(/fullCalcOnLoad="[^"]*"/, 'fullCalcOnLoad="1"');
    if (/<(\w+:)?calcPr\b/.test(xml)) return xml.replace(/<((?:\w+:)?calcPr)\b/, '<$1 fullCalcOnLoad="1"');
    const after = ["definedNames", "externalReferences", "functionGroups", "sheets"].find((name) =>
      new RegExp(`</(?:\\w+:)?${name}>`).test(xml),
    );
    return after
      ? xml.replace(
          new RegExp(`</((?:\\w+:)?)${after}>`),
          (end, prefix: string) => `${end}<${prefix}calcPr fullCalcOnLoad="1"/>`,
        )
      : xml;
  });
}

function edit(parts: Record<string, Uint8Array>, path: string, change: (xml: string) => string): void {
  const part = parts[path];
  if (part) parts[path] = Buffer.from(change(Buffer.from(part).toString("utf8")), "utf8");
}

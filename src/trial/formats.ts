/** Number formats that the spreadsheet library writes in its own way: scientific ones and the plain thousands. */
import type { Parts } from "./zip";
import { attribute, elements, firstElement } from "./xml";

const builtIn: Record<number, string> = { 3: "#,##0", 11: "0.00E+00", 12: "# ?/?", 13: "# ??/??", 48: "##0.0E+0" };

/** Completes the formats of opened data (kept there under the file's number plus one); returns those it has to drop. */
export function mendFormats(parts: Parts, formats: Record<string, string>): string[] {
  const styles = parts["xl/styles.xml"] ?? "";
  const codes = new Map(Object.entries(builtIn).map(([id, code]) => [Number(id), code]));
  for (const { attributes } of elements(firstElement(styles, "numFmts")?.content ?? "", "numFmt"))
    codes.set(Number(attribute(attributes, "numFmtId")), attribute(attributes, "formatCode") ?? "");
  const used = new Set(
    [...elements(firstElement(styles, "cellXfs")?.content ?? "", "xf")].map(({ attributes }) =>
      Number(attribute(attributes, "numFmtId") ?? 0),
    ),
  );
  const dropped: string[] = [];
  for (const id of used) {
    const code = codes.get(id);
    const scientific = /^([#0.,]+)E\+0+$/.exec(code ?? "");
    if (id === 3) formats[id + 1] = "#,##0";
    else if (scientific) formats[id + 1] = `${scientific[1]}e`;
    else if (code && code !== "General" && !formats[id + 1]) dropped.push(code);
  }
  return dropped;
}

/** The library's scientific formats as files have them. */
export const formatsToFile = (styles: string): string =>
  styles.replace(/formatCode="([#0.,]+)e"/g, 'formatCode="$1E+00"');

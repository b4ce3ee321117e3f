/** What the pane keeps in a workbook: a custom XML part, which spreadsheet programs carry along. */
import { decode, encode, firstElement } from "./xml";
import type { Parts } from "./zip";

const element = "plinthNotes";
const path = "customXml/plinthNotes.xml";
const type = "http://schemas.openxmlformats.org/officeDocument/2006/relationships/customXml";

export function notesIn(parts: Parts): string | null {
  for (const [name, xml] of Object.entries(parts)) {
    if (!name.startsWith("customXml/") || !xml.includes(element)) continue;
    const found = firstElement(xml, element);
    if (found) return decode(found.content);
  }
  return null;
}

export function addNotes(files: Map<string, string>, notes: string | null): void {
  if (notes === null) return;
  files.set(
    path,
    `<?xml version="1.0" encoding="UTF-8"?>\n<${element} xmlns="urn:plinth:notes">${encode(notes)}</${element}>`,
  );
  const relations = "xl/_rels/workbook.xml.rels";
  const link = `<Relationship Id="rIdPlinthNotes" Type="${type}" Target="../${path}"/>`;
  files.set(relations, (files.get(relations) ?? "").replace("</Relationships>", `${link}</Relationships>`));
}

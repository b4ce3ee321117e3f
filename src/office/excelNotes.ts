/** What the pane keeps in the workbook: a custom XML part, which every spreadsheet program carries along. */
const NAMESPACE = "urn:plinth:notes";
const ELEMENT = "plinthNotes";

export async function readExcelNotes(): Promise<string | null> {
  return Excel.run(async (context) => {
    const part = context.workbook.customXmlParts.getByNamespace(NAMESPACE).getOnlyItemOrNullObject().load("id");
    await context.sync();
    if (part.isNullObject) return null;
    const xml = part.getXml();
    await context.sync();
    return new DOMParser().parseFromString(xml.value, "application/xml").documentElement.textContent;
  });
}

export async function keepExcelNotes(text: string): Promise<void> {
  const xml = `<${ELEMENT} xmlns="${NAMESPACE}">${encode(text)}</${ELEMENT}>`;
  await Excel.run(async (context) => {
    const parts = context.workbook.customXmlParts;
    const part = parts.getByNamespace(NAMESPACE).getOnlyItemOrNullObject().load("id");
    await context.sync();
    if (part.isNullObject) parts.add(xml);
    else part.setXml(xml);
    await context.sync();
  });
}

const encode = (text: string): string => text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");

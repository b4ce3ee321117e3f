/** Small reading and writing of the machine-written XML inside a workbook. */

const entities: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };

export function decode(text: string): string {
  const plain = text.replace(/<!\[CDATA\[([\s\S]*?)\]\]>/g, (_, inside: string) => encode(inside));
  return plain.replace(/&(?:#x([0-9a-f]+)|#(\d+)|(\w+));/gi, (whole, hex?: string, decimal?: string, name?: string) => {
    if (name !== undefined) return entities[name] ?? whole;
    const code = hex !== undefined ? parseInt(hex, 16) : Number(decimal);
    return code <= 0x10ffff ? String.fromCodePoint(code) : whole;
  });
}

export function encode(text: string): string {
  return (
    text
      .replace(/&/g, "&amp;")
      .replace(/</g, "&lt;")
      .replace(/>/g, "&gt;")
      .replace(/"/g, "&quot;")
      // XML 1.0 forbids these characters
      .replace(/[\x00-\x08\x0b\x0c\x0e-\x1f]/g, "")
  );
}

export interface Element {
  attributes: string;
  content: string;
}

/** Every element of that name, in order; elements of one name do not nest in a workbook's parts. */
export function* elements(xml: string, name: string): Generator<Element> {
  const pattern = new RegExp(`<(?:\\w+:)?${name}(?=[\\s/>])([^>]*?)(?:/>|>([\\s\\S]*?)</(?:\\w+:)?${name}\\s*>)`, "g");
  for (const match of xml.matchAll(pattern)) yield { attributes: match[1] ?? "", content: match[2] ?? "" };
}

export function attribute(attributes: string, name: string): string | undefined {
  const match = new RegExp(`(?:^|\\s)${name}\\s*=\\s*(?:"([^"]*)"|'([^']*)')`).exec(attributes);
  return match ? decode(match[1] ?? match[2] ?? "") : undefined;
}

export function firstElement(xml: string, name: string): Element | undefined {
  return elements(xml, name).next().value ?? undefined;
}

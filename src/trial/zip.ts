/** A workbook file's parts, read with limits so that a hostile or broken file ends in a message. */
import { strFromU8, unzipSync } from "fflate";

/** Why a file cannot be opened, said to the user as it stands. */
export class NotAWorkbook extends Error {}

export type Parts = Record<string, string>;

const mostBytes = 100e6;
const mostUnpacked = 400e6;
const mostParts = 5000;

const isText = (path: string): boolean => /\.(xml|rels)$/i.test(path);

/** The XML parts as text; of every other part only its name, with empty text. */
export function readParts(bytes: Uint8Array): Parts {
  const reason = unreadable(bytes);
  if (reason) throw new NotAWorkbook(reason);
  let unpacked = 0;
  const others: string[] = [];
  let files: Record<string, Uint8Array>;
  try {
    files = unzipSync(bytes, {
      filter: ({ name, originalSize }) => {
        if (!isText(name)) return (others.push(name), false);
        unpacked += originalSize;
        if (unpacked > mostUnpacked || others.length > mostParts)
          throw new NotAWorkbook("It unpacks to more than the trial sheet can hold.");
        return true;
      },
    });
  } catch (error) {
    if (error instanceof NotAWorkbook) throw error;
    throw new NotAWorkbook("The file is damaged: its contents cannot be unpacked.");
  }
  const parts: Parts = Object.fromEntries(others.map((name) => [name, ""]));
  for (const [name, content] of Object.entries(files)) parts[name.replace(/^\//, "")] = strFromU8(content);
  if (!parts["[Content_Types].xml"] || !parts["xl/workbook.xml"])
    throw new NotAWorkbook("It is a packed file, but there is no workbook inside.");
  return parts;
}

function unreadable(bytes: Uint8Array): string | undefined {
  const starts = (...signature: number[]): boolean => signature.every((byte, i) => bytes[i] === byte);
  if (bytes.length === 0) return "The file is empty.";
  if (bytes.length > mostBytes) return "The file is larger than 100 MB.";
  if (starts(0xd0, 0xcf, 0x11, 0xe0))
    return "It is an old .xls workbook or one locked with a password. Save it as .xlsx without a password first.";
  if (!starts(0x50, 0x4b)) return "It is not an .xlsx workbook.";
  return undefined;
}

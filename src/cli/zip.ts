import { inflateRawSync } from "node:zlib";

/** A file that cannot be read as a workbook; the message is one line for the user. */
export class UnreadableError extends Error {
  override readonly name = "UnreadableError";
}

const largestBook = 400_000_000; // bytes, inflated
const largestRatio = 400; // a workbook of repeated text reaches about 100
const ratioMattersFrom = 20_000_000;

/** Refuses what is not a sound zip archive of reasonable size, by what it declares and by what it holds. */
export function checkArchive(bytes: Buffer): void {
  if (bytes.length === 0) throw new UnreadableError("the file is empty");
  if (bytes.readUInt32BE(0) === 0xd0cf11e0) {
    throw new UnreadableError("the file is encrypted or an old .xls file; save it as .xlsx without a password");
  }
  if (bytes.length < 22 || bytes.readUInt32LE(0) !== 0x04034b50) throw new UnreadableError("not an .xlsx file");
  const entries = directory(bytes);
  const declared = entries.reduce((sum, entry) => sum + entry.size, 0);
  checkSize(declared, bytes.length);
  let inflated = 0;
  for (const entry of entries) {
    inflated += inflatedSize(bytes, entry);
    checkSize(inflated, bytes.length);
  }
  if (!entries.some((entry) => entry.name === "[Content_Types].xml")) throw new UnreadableError("not an .xlsx file");
}

interface Entry {
  readonly name: string;
  readonly method: number;
  readonly packed: number;
  readonly size: number;
  readonly offset: number;
}

function checkSize(size: number, packed: number): void {
  if (size > largestBook || (size > ratioMattersFrom && size > packed * largestRatio)) {
    throw new UnreadableError(`the file would unpack to ${Math.round(size / 1e6)} MB or more; it is not read`);
  }
}

function directory(bytes: Buffer): Entry[] {
  const end = bytes.lastIndexOf("PK\x05\x06", undefined, "latin1");
  if (end < 0 || end + 22 > bytes.length) throw new UnreadableError("the file is cut off or damaged");
  const count = bytes.readUInt16LE(end + 10);
  let at = bytes.readUInt32LE(end + 16);
  const entries: Entry[] = [];
  for (let i = 0; i < count; i++) {
    if (at + 46 > bytes.length || bytes.readUInt32LE(at) !== 0x02014b50) {
      throw new UnreadableError("the file is cut off or damaged");
    }
    const nameLength = bytes.readUInt16LE(at + 28);
    if (bytes.readUInt16LE(at + 8) & 1) throw new UnreadableError("the file is encrypted");
    entries.push({
      name: bytes.toString("utf8", at + 46, at + 46 + nameLength),
      method: bytes.readUInt16LE(at + 10),
      packed: bytes.readUInt32LE(at + 20),
      size: bytes.readUInt32LE(at + 24),
      offset: bytes.readUInt32LE(at + 42),
    });
    at += 46 + nameLength + bytes.readUInt16LE(at + 30) + bytes.readUInt16LE(at + 32);
  }
  return entries;
}

function inflatedSize(bytes: Buffer, entry: Entry): number {
  const { offset, packed, size, method } = entry;
  if (offset + 30 > bytes.length) throw new UnreadableError("the file is cut off or damaged");
  const start = offset + 30 + bytes.readUInt16LE(offset + 26) + bytes.readUInt16LE(offset + 28);
  if (start + packed > bytes.length) throw new UnreadableError("the file is cut off or damaged");
  if (method === 0) {
    if (packed !== size) throw new UnreadableError("the file is damaged, or holds more than it declares");
    return packed;
  }
  try {
    return inflateRawSync(bytes.subarray(start, start + packed), { maxOutputLength: Math.max(size, 1) }).length;
  } catch {
    throw new UnreadableError("the file is damaged, or holds more than it declares");
  }
}

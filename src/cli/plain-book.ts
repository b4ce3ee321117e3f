/** A copy of a workbook that needs no add-in: our functions replaced by plain formulas, everything else as it was. */
import { readFileSync } from "node:fs";
import { basename } from "node:path";
import { unzipSync, zipSync } from "fflate";
import { plainSheet } from "./plain-sheet";
import { mendRest, recalculateOnOpening } from "./plain-parts";
import { sheetParts } from "./parts";
import { writeWhole } from "./safe-file";
import { checkArchive, UnreadableError } from "./zip";

export interface Left {
  readonly place: string;
  readonly reason: string;
}

/** Writes the copy and says what was done; 0 if no call of ours is left, otherwise 1. */
export function plainBook(book: string, out: string): number {
  const { bytes, replaced, left } = plainCopy(readBytes(book));
  writeWhole(out, bytes);
  const lines = [`${basename(out)}: ${replaced} ${replaced === 1 ? "cell has" : "cells have"} plain formulas now.`];
  if (left.length > 0) lines.push("", "Left as they were:");
  for (const { place, reason } of left) lines.push(`  ${place.padEnd(24)}  ${reason}`);
  process.stdout.write(`${lines.join("\n")}\n`);
  return left.length > 0 ? 1 : 0;
}

/** The copy's bytes, how many cells were replaced, and which were not and why. */
export function plainCopy(bytes: Buffer): { bytes: Uint8Array; replaced: number; left: Left[] } {
  checkArchive(bytes);
  const parts = unpack(bytes);
  const left: Left[] = [];
  let replaced = 0;
  const sheets = sheetParts((path) => textOf(parts, path));
  if (sheets.length === 0) throw new UnreadableError("the workbook inside the file is damaged");
  for (const { name, path } of sheets) {
    const xml = textOf(parts, path);
    if (!/PLINTH/i.test(xml)) continue;
    const result = plainSheet(xml, name);
    replaced += result.replaced;
    left.push(...result.left);
    parts[path] = Buffer.from(result.xml, "utf8");
  }
  for (const path of Object.keys(parts)) {
    if (!path.endsWith(".xml") || !path.startsWith("xl/")) continue;
    const xml = textOf(parts, path);
    if (!/PLINTH/i.test(xml)) continue;
    const sheet = sheets.find((each) => each.path === path)?.name;
    parts[path] = Buffer.from(mendRest(xml, sheet ?? path, left), "utf8");
  }
  if (replaced > 0) recalculateOnOpening(parts);
  return { bytes: zipSync(parts), replaced, left };
}

function readBytes(path: string): Buffer {
  try {
    return readFileSync(path);
  } catch (error) {
    const missing = (error as NodeJS.ErrnoException).code === "ENOENT";
    throw new UnreadableError(missing ? "no such file" : "the file cannot be opened");
  }
}

function unpack(bytes: Buffer): Record<string, Uint8Array> {
  try {
    return unzipSync(bytes);
  } catch {
    throw new UnreadableError("the file is cut off or damaged");
  }
}

const textOf = (parts: Readonly<Record<string, Uint8Array>>, path: string): string =>
  Buffer.from(parts[path] ?? []).toString("utf8");

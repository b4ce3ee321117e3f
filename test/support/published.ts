import { readFileSync } from "node:fs";
import { join } from "node:path";

export interface PublishedEntry {
  source: string;
  item: string;
  printed: string;
  computed: string;
  tolerance: string;
}

/** Values as printed, recalled from memory of the sources whose text contains `source`; confirmed by computing. */
export function publishedEntries(source: string): PublishedEntry[] {
  const path = join(process.cwd(), "test/reference/published.json");
  const { entries } = JSON.parse(readFileSync(path, "utf8")) as { entries: PublishedEntry[] };
  const wanted = entries.filter((entry) => entry.source.includes(source));
  if (wanted.length === 0) throw new Error(`nothing published by ${source}`);
  return wanted;
}

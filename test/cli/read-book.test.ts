import { mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import * as xlsx from "@e965/xlsx";
import { strToU8, zipSync } from "fflate";
import { auditWorkbook } from "../../src/audit/audit";
import { readBook } from "../../src/cli/read-book";
import { UnreadableError } from "../../src/cli/zip";

const folder = mkdtempSync(join(tmpdir(), "books-"));

/** Writes a file into the test's folder and returns its path. */
function file(name: string, bytes: Uint8Array | string): string {
  const path = join(folder, name);
  writeFileSync(path, bytes);
  return path;
}

/** An .xlsx file with one sheet; text that starts with "=" is a formula. */
function book(name: string, rows: (string | number)[][]): string {
  const sheet: xlsx.WorkSheet = { "!ref": `A1:Z${rows.length}` };
  rows.forEach((row, r) =>
    row.forEach((value, c) => {
      const at = xlsx.utils.encode_cell({ r, c });
      const formula = typeof value === "string" && value.startsWith("=");
      sheet[at] = formula
        ? { t: "n", f: value.slice(1), v: 0 }
        : { t: typeof value === "number" ? "n" : "s", v: value };
    }),
  );
  const all = xlsx.utils.book_new();
  xlsx.utils.book_append_sheet(all, sheet, "Sheet");
  return file(name, xlsx.write(all, { type: "buffer", bookType: "xlsx" }) as Uint8Array);
}

const sound = book("sound.xlsx", [
  ["f (Hz)", "fn (Hz)", "r"],
  [25, 6, "=A2/B2"],
]);

const unreadable: readonly (readonly [title: string, path: () => string, message: RegExp])[] = [
  ["a file that is not there", () => join(folder, "none.xlsx"), /no such file/],
  ["an empty file", () => file("empty.xlsx", ""), /empty/],
  ["a file that is no archive", () => file("text.xlsx", "hello, this is a text"), /not an .xlsx file/],
  ["half a file", () => file("half.xlsx", readFileSync(sound).subarray(0, 3000)), /cut off or damaged/],
  [
    "an encrypted file",
    () => file("locked.xlsx", Buffer.from("d0cf11e0a1b11ae1" + "00".repeat(512), "hex")),
    /encrypted/,
  ],
  ["an archive of something else", () => file("other.xlsx", zipSync({ "a.txt": strToU8("a") })), /not an .xlsx file/],
  [
    "an archive that unpacks to a hundred times its fair size",
    () => file("bomb.xlsx", zipSync({ "[Content_Types].xml": strToU8("<x/>"), big: new Uint8Array(60_000_000) })),
    /would unpack to/,
  ],
  ["an archive that holds more than it declares", () => file("liar.xlsx", understated()), /more than it declares/],
];

/** The sound book with the declared sizes in its directory set to one byte. */
function understated(): Uint8Array {
  const bytes = Buffer.from(readFileSync(sound));
  for (let at = bytes.indexOf("PK\x01\x02", 0, "latin1"); at >= 0; at = bytes.indexOf("PK\x01\x02", at + 4, "latin1")) {
    bytes.writeUInt32LE(1, at + 24);
  }
  return bytes;
}

test.each(unreadable)("%s is refused with one line that says why", (_, path, message) => {
  const read = () => readBook(path());
  expect(read).toThrow(UnreadableError);
  expect(read).toThrow(message);
});

test("a sound file is read with its formulas, values and headers", () => {
  const [sheet] = readBook(sound).sheets;
  expect([...sheet!.cells.values()].map(({ value, formula }) => formula ?? value)).toEqual([
    "f (Hz)",
    "fn (Hz)",
    "r",
    25,
    6,
    "A2/B2",
  ]);
});

test("circular references, foreign workbooks and broken formulas are not recognised, and nothing hangs", () => {
  const path = book("odd.xlsx", [
    ["f (Hz)", "fn (Hz)", "r"],
    [25, "=C2", "=B2"],
    [25, "=B3", "=A3/[1]Foo!B2"],
    [25, 6, "=A4/("],
  ]);
  const findings = auditWorkbook(readBook(path));
  expect(findings.map(({ verdict }) => verdict)).toEqual(findings.map(() => "unrecognised"));
});

test("reading and auditing leave the file as it was", () => {
  const before = readFileSync(sound);
  auditWorkbook(readBook(sound));
  expect(readFileSync(sound).equals(before)).toBe(true);
});

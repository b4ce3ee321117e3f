import { strToU8, zipSync } from "fflate";
import { readParts } from "../../src/trial/zip";

const bytes = (...values: number[]): Uint8Array => new Uint8Array(values);

const refused = [
  ["an empty file", new Uint8Array(), "empty"],
  ["a text file", strToU8("fn,zeta\n8,0.1\n"), "not an .xlsx"],
  ["an old or locked workbook", bytes(0xd0, 0xcf, 0x11, 0xe0, 0, 0), "password"],
  ["a damaged file", bytes(0x50, 0x4b, 3, 4, 1, 2, 3), "damaged"],
  ["a cut-off file", zipSync({ "xl/workbook.xml": strToU8("<workbook/>".repeat(99)) }).subarray(0, 90), "damaged"],
  ["a packed file of another kind", zipSync({ "readme.txt": strToU8("hello") }), "no workbook inside"],
] as const;

test.each(refused)("%s is refused with the reason", (_, content, reason) => {
  expect(() => readParts(content)).toThrow(reason);
});

test("a file that unpacks to far more than it is is refused before it is unpacked", () => {
  const bomb = zipSync({ "xl/workbook.xml": strToU8("<workbook/>") });
  // The directory entry (signature PK 01 02) states the unpacked size 24 bytes in: say 512 MB.
  const entry = bomb.findIndex((_, i) => bomb[i] === 0x50 && bomb[i + 1] === 0x4b && bomb[i + 2] === 1);
  new DataView(bomb.buffer, bomb.byteOffset).setUint32(entry + 24, 512e6, true);
  expect(() => readParts(bomb)).toThrow("more than the trial sheet can hold");
});

test("pictures and macros are named but not unpacked", () => {
  const parts = readParts(
    zipSync({
      "[Content_Types].xml": strToU8("<Types/>"),
      "xl/workbook.xml": strToU8("<workbook/>"),
      "xl/media/image1.png": bytes(1, 2, 3),
    }),
  );
  expect(parts["xl/media/image1.png"]).toBe("");
  expect(parts["xl/workbook.xml"]).toBe("<workbook/>");
});

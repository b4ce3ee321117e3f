import type { Book } from "../../src/trial/book";
import { formulaFromFile, formulaToFile, withoutLog10 } from "../../src/trial/dialect";

const book: Book = {
  sheets: [
    { name: "Mounts", part: "xl/worksheets/sheet1.xml" },
    { name: "Floor data", part: "xl/worksheets/sheet2.xml" },
  ],
  names: [],
  // A3:C9: headers in row 3, data in rows 4 to 8, totals in row 9
  tables: [
    {
      sheet: "Mounts",
      name: "Springs",
      columns: ["k, N/m", "m", "fn"],
      top: 2,
      left: 0,
      bottom: 8,
      right: 2,
      headerRows: 1,
      totalRows: 1,
    },
  ],
  startsIn1904: false,
};
const names: Record<string, string> = { gn: "9.80665", twice: "gn*2", loop: "loop+1", limit: "'Floor data'!$B$2" };
const read = (formula: string, sheet = "Mounts", row = 4, column = 2): string =>
  formulaFromFile(formula, { sheet, row, column }, book, (name) => names[name]);

const fromFile = [
  // in the file                                        in the trial sheet
  ["_xldudf_PLINTH_ABSTRANS(A1,8,0.1)", "PLINTH.ABSTRANS(A1,8,0.1)"],
  ["_xlfn.STDEV.S(A1:A3)+_xlfn._xlws.SORT(A1:A3)", "STDEV.S(A1:A3)+SORT(A1:A3)"],
  ["20*LOG10(B13)", "20*LOG(B13)"],
  ["Springs[[#This Row],[k, N/m]]/Springs[@m]", "$A5/$B5"],
  ["[@fn]*2", "$C5*2"],
  ["SUM(Springs[m])", "SUM($B$4:$B$8)"],
  ["SUM(Springs[[#All],[m]:[fn]])", "SUM($B$3:$C$9)"],
  ["Springs[[#Totals],[fn]]", "$C$9"],
  ["Springs[[#Headers],[fn]]", "$C$3"],
  ["SUM(Springs[nothing])", "SUM(#REF)"],
  ["m*gn", "m*9.80665"],
  ["m*twice", "m*(9.80665*2)"],
  ["limit+1", "'Floor data'!$B$2+1"],
  ['IF(A1="say ""fn""",1,2)', 'IF(A1="say \\"fn\\"",1,2)'],
  ['IF(A1="",1,2)', 'IF(A1="",1,2)'],
  ["A1+#REF!", "A1+#REF"],
  ["SUM(A1,", "SUM(A1,"],
] as const;

test.each(fromFile)("%s reads %s", (inFile, inSheet) => {
  expect(read(inFile)).toBe(inSheet);
});

test("a table on another sheet is named with its sheet", () => {
  expect(read("SUM(Springs[m])", "Floor data")).toBe("SUM(Mounts!$B$4:$B$8)");
});

test("a name that refers to itself comes to an end", () => {
  expect(read("loop").length).toBeLessThan(500);
});

const toFile = [
  ["=PLINTH.ABSTRANS(A1,8,0.1)", "_xldudf_PLINTH_ABSTRANS(A1,8,0.1)"],
  ["=plinth.sweep(1,2,3)", "_xldudf_PLINTH_SWEEP(1,2,3)"],
  ['="PLINTH.ABSTRANS("&A1', '"PLINTH.ABSTRANS("&A1'],
  ['=IF(A1="say \\"fn\\"",1,2)', 'IF(A1="say ""fn""",1,2)'],
  ["=A1+#REF", "A1+#REF!"],
  ["=SUM(A1:A3)", "SUM(A1:A3)"],
] as const;

test.each(toFile)("%s is written %s", (inSheet, inFile) => {
  expect(formulaToFile(inSheet, "PLINTH")).toBe(inFile);
});

test("LOG10 is the same as LOG, but not inside a text", () => {
  expect(withoutLog10('=LOG10(A1)&"LOG10("')).toBe('=LOG(A1)&"LOG10("');
});

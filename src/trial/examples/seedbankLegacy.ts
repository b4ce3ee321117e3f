/** Hand formulas handed down from an earlier project of the same seed bank. Some are mistaken on purpose. */
import { type ExampleBook, type ExampleRow, calc, head, input, label, line, note, title } from "./cells";

const machines: [string, number, number, number, number][] = [
  ["Compressor A", 1450, 420, 6, 310000],
  ["Compressor B", 1450, 395, 6, 310000],
  ["Condenser fan", 720, 260, 4, 95000],
  ["Glycol pump", 2900, 88, 4, 240000],
  ["Air dryer", 960, 140, 4, 52000],
];

const machineRow = ([name, speed, mass, mounts, stiffness]: (typeof machines)[number]): ExampleRow => [
  label(name),
  { number: speed, style: "whole" },
  input(mass),
  { number: mounts, style: "whole" },
  { number: stiffness, style: "whole" },
  calc("Plant[[#This Row],[Speed, rpm]]/60"),
  calc(
    "SQRT(Plant[[#This Row],[Mounts]]*Plant[[#This Row],[k of a mount, N/m]]/Plant[[#This Row],[Mass, kg]])/(2*PI())",
  ),
  calc("Plant[[#This Row],[f, Hz]]/Plant[[#This Row],[fn, Hz]]"),
  calc(
    "SQRT((1+(2*zeta*Plant[[#This Row],[r]])^2)/((1-Plant[[#This Row],[r]]^2)^2+(2*zeta*Plant[[#This Row],[r]])^2))",
  ),
];

const plantColumns = ["Machine", "Speed, rpm", "Mass, kg", "Mounts", "k of a mount, N/m", "f, Hz", "fn, Hz", "r", "T"];

export const seedbankLegacy: ExampleBook = {
  names: { zeta: "'Plant'!$B$3", gn: "9.80665" },
  sheets: [
    {
      name: "Plant",
      columns: [24, 14, 12, 10, 20, 11, 11, 11, 11],
      rows: [
        [title("Plant room: mounts as sized in the first project")],
        [note("Invented example of an inherited sheet; its formulas are right on this page.")],
        [label("Damping ratio"), input(0.08)],
        [],
        plantColumns.map(head),
        ...machines.map(machineRow),
      ],
      tables: [{ name: "Plant", range: `A5:I${5 + machines.length}`, columns: plantColumns }],
    },
    {
      name: "Balance room",
      columns: [38, 16, 12, 58],
      rows: [
        [title("Balance room: hand calculation, not checked")],
        [note("Invented example. Some of these formulas are mistaken on purpose; let the audit find them.")],
        [],
        [head("Item"), head("Value"), head("Unit"), head("Remark")],
        line("Fan speed", { number: 1452, style: "whole" }, "rpm"),
        line("Mass", input(186), "kg"),
        line("Stiffness, all mounts", { number: 352000, style: "whole" }, "N/m"),
        line("Damping", input(6), "%"),
        line("Forcing frequency", calc("B5/60"), "Hz"),
        line("Natural frequency", calc("SQRT(B7/B6)"), "Hz", "as in the old sheet"),
        line("Frequency ratio", calc("B9/B10"), ""),
        line("Transmissibility", calc("1/ABS(1-B11^2)"), "", "undamped form"),
        line("Transmissibility with damping", calc("SQRT((1+(2*B8*B11)^2)/((1-B11^2)^2+(2*B8*B11)^2))"), ""),
        line("Efficiency", calc("1-B13", "fraction"), ""),
        line("Static deflection", calc("gn/B10^2*1000"), "mm"),
        line("Static deflection, short cut", calc("(15.76/B10)^2"), "mm"),
        line("Level", calc("20*LOG10(B13)"), "dB"),
        line("Complex check", calc("IMABS(IMDIV(COMPLEX(1,2*B8/100*B11),COMPLEX(1-B11^2,2*B8/100*B11)))"), ""),
      ],
    },
  ],
};

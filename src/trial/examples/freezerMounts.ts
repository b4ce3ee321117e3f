/** The freezer compressor of the same invented seed bank: four mounts under an off-centre machine. */
import { type ExampleBook, calc, filled, head, input, label, line, note, spilled, title } from "./cells";

const mounts = [
  [0.42, 0.31, -0.28, 90, 90, 140],
  [0.42, -0.31, -0.28, 90, 90, 140],
  [-0.42, 0.31, -0.28, 90, 90, 140],
  [-0.42, -0.31, -0.28, 90, 90, 140],
];
const inertia = [
  [14, 0.6, 0],
  [0.6, 21, 0],
  [0, 0, 26],
];

export const freezerMounts: ExampleBook = {
  names: { compressorMass: "'Compressor'!$B$5" },
  sheets: [
    {
      name: "Compressor",
      columns: [34, 14, 17, 14, 14, 14, 14, 18],
      rows: [
        [title("Freezer compressor: load on each mount, and its six natural frequencies")],
        [note("Invented example. Positions from the centre of gravity; a negative load would lift the machine off.")],
        [],
        [head("Given"), head("Value"), head("Unit"), head("Remark")],
        line("Mass, with oil and base", input(310), "kg"),
        line("Centre of gravity, x", input(0.05), "m", "from the middle of the base"),
        line("Centre of gravity, y", input(-0.03), "m"),
        line("Speed", input(1450), "rpm"),
        line("Steepest start", input(25), "Hz/s", "run-up of the motor"),
        [],
        [
          head("Mounts"),
          head("x, m"),
          head("y, m"),
          head("z, m"),
          head("kx, N/m"),
          head("ky, N/m"),
          head("kz, N/m"),
          head("Static load, N"),
        ],
        ...mounts.map(([x, y, z, kx, ky, kz], i) => [
          label(`Mount ${i + 1}`),
          calc(`${x}-$B$6`),
          calc(`${y}-$B$7`),
          input(z),
          input(kx * 1000),
          input(ky * 1000),
          input(kz * 1000),
          i === 0
            ? spilled("PLINTH.MOUNTLOADS(B12:B15,C12:C15,G12:G15,compressorMass*9.80665,0,0)", "H12:H15", "whole")
            : filled("whole"),
        ]),
        line("Smallest load", calc("MIN(H12:H15)", "whole"), "N", "negative: uplift, hold the machine down"),
        [],
        [head("Inertia about it, kg·m²"), head("x"), head("y"), head("z")],
        ...inertia.map((row, i) => [label("xyz"[i]), ...row.map(input)]),
        [],
        [head("Natural frequencies"), head("Hz"), head("Share of speed")],
        ...Array.from({ length: 6 }, (_, i) => [
          label(`Mode ${i + 1}`),
          i === 0 ? spilled("PLINTH.RIGIDMODES(compressorMass,B19:D21,B12:D15,E12:G15)", "B24:B29") : filled("result"),
          calc(`B${24 + i}/(B$8/60)`, "fraction"),
        ]),
        line(
          "Stiffest mode, isolation at speed",
          calc("PLINTH.EFFICIENCY(B8/60,B29,0.06)", "fraction"),
          "",
          "one axis at a time; coupling left out",
        ),
        line(
          "Peak while it starts",
          calc("PLINTH.RUNUP(B29,0.06,B9,0,B8/60)"),
          "",
          "times the base motion, stiffest mode",
        ),
      ],
    },
  ],
};

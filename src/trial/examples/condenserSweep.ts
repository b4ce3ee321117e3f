/** The rooftop condenser of the same seed bank: one spilled sweep, three dampings, a chart. */
import { type ExampleBook, calc, filled, head, input, label, note, spilled, title, unit } from "./cells";

const first = 11;
const last = first + 117 - 1;
const column = (letter: string): string => `${letter}${first}:${letter}${last}`;
const fixed = (letter: string): string => `$${letter}$${first}:$${letter}$${last}`;

export const condenserSweep: ExampleBook = {
  names: { fnCondenser: "'Sweep'!$B$5" },
  sheets: [
    {
      name: "Sweep",
      columns: [20, 18, 14, 14, 4, 14],
      rows: [
        [title("Rooftop condenser: how much of the deck's motion reaches the coil block")],
        [note("Invented example. The first cell of each column is one formula that fills the column.")],
        [
          undefined,
          undefined,
          undefined,
          undefined,
          undefined,
          calc(`MAX(${column("B")})`),
          note("largest T, low damping"),
        ],
        [head("Given"), head("Value"), head("Unit")],
        [label("Natural frequency"), input(8), unit("Hz")],
        [label("Sweep from"), input(2), unit("Hz")],
        [label("Sweep to"), input(60), unit("Hz")],
        [],
        [label("Damping ratio"), input(0.05), input(0.15), input(0.35)],
        [head("Frequency, Hz"), head("T, low damping"), head("T, medium"), head("T, high")],
        [
          spilled('PLINTH.SWEEP(B6,B7,117,"log")', column("A")),
          ...["B", "C", "D"].map((letter) =>
            spilled(`PLINTH.ABSTRANS(${fixed("A")},fnCondenser,${letter}$9)`, column(letter)),
          ),
        ],
        ...Array.from({ length: last - first }, () => [1, 2, 3, 4].map(() => filled("result"))),
      ],
      chart: {
        title: "Transmissibility",
        horizontal: "Frequency, Hz",
        vertical: "T",
        along: fixed("A"),
        series: [
          { name: "$B$10", values: fixed("B") },
          { name: "$C$10", values: fixed("C") },
          { name: "$D$10", values: fixed("D") },
        ],
        from: { row: 3, column: 5 },
        to: { row: 22, column: 13 },
      },
    },
  ],
};

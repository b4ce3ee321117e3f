/** A seed scanner of the same invented seed bank, carried in its collecting van: random motion against a gap. */
import { type ExampleBook, calc, filled, head, input, label, line, note, spilled, title } from "./cells";

const first = 28;
const count = 61;
const last = first + count - 1;
const column = (letter: string): string => `${letter}${first}:${letter}${last}`;
const fixed = (letter: string): string => `$${letter}$${first}:$${letter}$${last}`;
const profile = "$A$6:$A$11,$B$6:$B$11";
const points = [
  [5, 0.002],
  [10, 0.015],
  [40, 0.015],
  [80, 0.004],
  [200, 0.001],
  [500, 0.0002],
];

export const vanRandom: ExampleBook = {
  names: { fnScanner: "'Van'!$B$14", zetaScanner: "'Van'!$B$15" },
  sheets: [
    {
      name: "Van",
      columns: [26, 17, 18, 20, 2, 14],
      rows: [
        [title("Collecting van: does the scanner stay clear of its case?")],
        [note("Invented example. The profile is one-sided, straight lines on log-log axes, zero outside.")],
        [],
        [head("Floor of the van"), head("")],
        [head("Frequency, Hz"), head("Density, gn²/Hz")],
        ...points.map(([frequency, density]) => [input(frequency), input(density)]),
        [],
        [head("Scanner on its mounts"), head("Value"), head("Unit"), head("Remark")],
        line("Natural frequency", input(14), "Hz", "dynamic, all mounts"),
        line("Damping ratio", input(0.12), "", "fraction of critical"),
        line("Time on the road", input(14400), "s"),
        line("Gap to the case", input(9), "mm", "at rest, sag included"),
        [],
        [head("What it does"), head("Value"), head("Unit"), head("Remark")],
        line("Floor, overall rms", calc(`PLINTH.PSDRMS(${profile})`), "gn"),
        line("Scanner, rms", calc(`PLINTH.RANDRMS(${profile},fnScanner,zetaScanner,,,"mm")`), "gn"),
        line(
          "Mount deflection, rms",
          calc(`PLINTH.RANDRMS(${profile},fnScanner,zetaScanner,"deflection",,"mm")`),
          "mm",
        ),
        line("Three times that", calc("3*B22"), "mm", "passed by 1 peak in 90"),
        line("Expected largest", calc("B22*PLINTH.PEAKFACTOR(fnScanner,B16)"), "mm", "over the time on the road"),
        line("Gap left at three sigma", calc("B17-B23"), "mm", "negative: it knocks"),
        [],
        [head("Frequency, Hz"), head("Floor, gn²/Hz"), head("Scanner, gn²/Hz")],
        [
          spilled(`PLINTH.SWEEP(A6,100,${count},"log")`, column("A")),
          spilled(`PLINTH.PSDAT(${profile},${fixed("A")})`, column("B"), "small"),
          spilled(`${fixed("B")}*PLINTH.ABSTRANS(${fixed("A")},fnScanner,zetaScanner)^2`, column("C"), "small"),
        ],
        ...Array.from({ length: count - 1 }, () => [filled("result"), filled("small"), filled("small")]),
      ],
      chart: {
        title: "Acceleration density",
        horizontal: "Frequency, Hz",
        vertical: "gn²/Hz",
        along: fixed("A"),
        series: [
          { name: "$B$27", values: fixed("B") },
          { name: "$C$27", values: fixed("C") },
        ],
        from: { row: 2, column: 5 },
        to: { row: 22, column: 13 },
      },
    },
    {
      name: "Notes",
      columns: [90],
      rows: [
        [label("A random motion has no fixed peak: three sigma is a customary figure, not a limit.")],
        [label("The mounts see shock on kerbs as well; size the gap for both.")],
      ],
    },
  ],
};

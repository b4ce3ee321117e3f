/** The seed trolley of the same invented seed bank rolls off a kerb: a made record, its shock response spectrum. */
import { type ExampleBook, calc, filled, head, input, line, note, spilled, title } from "./cells";

const first = 21;
const samples = 200;
const bands = 61;
const fixed = (letter: string, count: number): string => `$${letter}$${first}:$${letter}$${first + count - 1}`;
const own = (letter: string, count: number): string => `${letter}${first}:${letter}${first + count - 1}`;
const record = fixed("B", samples);

export const trolleyShock: ExampleBook = {
  names: { step: "'Kerb'!$B$6" },
  sheets: [
    {
      name: "Kerb",
      columns: [32, 15, 15, 17, 16, 2, 14],
      rows: [
        [title("Trolley off a kerb: what shock do the cabinet's mounts pass on?")],
        [note("Invented example. The record is made by a formula: a half-sine and the ring of the trolley after it.")],
        [],
        [head("Given"), head("Value"), head("Unit"), head("Remark")],
        line("Peak of the pulse", input(12), "gn"),
        line("Time between samples", input(0.001), "s"),
        line("Duration of the pulse", input(0.02), "s"),
        line("Natural frequency of cabinet", input(9), "Hz", "on its mounts, dynamic"),
        line("Damping ratio", input(0.05), "", "fraction of critical"),
        line("What the cabinet stands", input(8), "gn", "from its maker"),
        [],
        [head("What the mounts pass on"), head("Value"), head("Unit"), head("Remark")],
        line("Cabinet, from the record", calc(`PLINTH.SRS(${record},step,B8,B9,,"mm")`), "gn"),
        line("Cabinet, pulse alone", calc('PLINTH.PULSE("half-sine",B5,B7,B8,B9,,"mm")'), "gn"),
        line(
          "Mount deflection",
          calc(`PLINTH.SRS(${record},step,B8,B9,"deflection","mm")`),
          "mm",
          "room for it on both sides",
        ),
        line("Velocity change of the pulse", calc('PLINTH.PULSEVELOCITY("half-sine",B5,B7,"mm")'), "mm/s"),
        line("Share of what it stands", calc("B13/B10", "fraction"), "", "above 100 %: too much"),
        [],
        [],
        [head("Time, s"), head("Record, gn"), head("Cabinet, gn"), head("Frequency, Hz"), head("Response, gn")],
        ...Array.from({ length: samples }, (_, i) => {
          const row = first + i;
          const ring = `0.25*$B$5*EXP(-30*A${row})*SIN(2*PI()*90*A${row})`;
          return [
            calc(`${i}*step`, "small"),
            calc(`IF(A${row}<$B$7,$B$5*SIN(PI()*A${row}/$B$7),0)+${ring}`, "small"),
            i === 0
              ? spilled(`PLINTH.HISTORY(${record},step,B8,B9,,"mm")`, own("C", samples), "small")
              : filled("small"),
            i === 0
              ? spilled(`PLINTH.SWEEP(1,200,${bands},"log")`, own("D", bands))
              : i < bands
                ? filled("result")
                : undefined,
            i === 0
              ? spilled(`PLINTH.SRS(${record},step,${fixed("D", bands)},B9,,"mm")`, own("E", bands), "small")
              : i < bands
                ? filled("small")
                : undefined,
          ];
        }),
      ],
      chart: {
        title: "Shock response spectrum",
        horizontal: "Natural frequency, Hz",
        vertical: "Largest response, gn",
        along: fixed("D", bands),
        series: [{ name: "$E$20", values: fixed("E", bands) }],
        from: { row: 2, column: 6 },
        to: { row: 20, column: 13 },
      },
    },
  ],
};

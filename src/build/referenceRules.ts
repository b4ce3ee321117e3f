/** The part of the reference page that holds for every function. */
import { ERROR_CODES } from "../office/errorCodes";
import type { FailureKind } from "../functions/failure";
import { escape, table } from "./html";

/** What each kind of failure means to someone who reads a cell. */
const MEANINGS: Record<FailureKind, string> = {
  missing: "a required argument is blank",
  "wrong-type": "a text, TRUE or FALSE stands where a number belongs",
  "wrong-shape": "ranges of different size, or a range where one value belongs",
  "unknown-word": "a word that is none of the choices; the message lists them",
  "not-a-number": "an argument is not a finite number",
  "outside-domain": "a number outside its limits",
  overflow: "the result is too large for a spreadsheet number",
  "no-convergence": "the computation found no dependable result",
  pole: "undamped resonance: there is no finite steady response",
  "not-covered": "the data given do not cover the value, or a unit is unknown or of another kind",
};

const UNIT_SYSTEMS = [
  ["si", "m", "m/s", "m/s²", "kg", "N", "N/m", "N·s/m"],
  ["mm", "mm", "mm/s", "gn", "kg", "N", "N/mm", "N·s/mm"],
  ["inch", "in", "in/s", "gn", "lb", "lbf", "lbf/in", "lbf·s/in"],
];

export function rulesSection(): string {
  const codes = [...new Set(Object.values(ERROR_CODES))];
  const meaningsOf = (code: string) =>
    (Object.keys(ERROR_CODES) as FailureKind[])
      .filter((kind) => ERROR_CODES[kind] === code)
      .map((kind) => MEANINGS[kind]);
  return `<section id="rules" aria-labelledby="rules-name">
<h2 id="rules-name">Rules for every function</h2>
<h3 id="ranges">Numbers and ranges</h3>
<p>Where an argument takes a number or a range, the result spills in the common shape: a column with a number gives a column,
a column with a row gives a table. Every other difference in size is an error. A bad cell spoils its own place only. One call that
spills is much faster than a column of calls.</p>
<h3 id="units">Units</h3>
<p>Ratios take their frequencies in any one unit; everywhere else a frequency is in Hz. A damping ratio is the fraction of critical
damping, 0.05 for 5 %. Functions with the argument <code>units</code> read and give all dimensioned numbers in one of these systems,
<code>si</code> if it is left out:</p>
${table(
  "Unit systems",
  ["Word", "Length", "Velocity", "Acceleration", "Mass", "Force", "Stiffness", "Damping"],
  UNIT_SYSTEMS.map(([word, ...units]) => [`<code>${word}</code>`, ...units]),
)}
<p>gn is standard gravity, 9.80665 m/s²; lb is 0.45359237 kg; in is 25.4 mm. Densities of acceleration are in its square per Hz.</p>
<h3 id="words">Words and blanks</h3>
<p>Option words may be typed in any case. An optional argument that is left out or blank takes its default. A blank cell in a required
argument is an error, but some spreadsheets hand a blank inside a range over as 0: fill the cells.</p>
<h3 id="errors">Errors</h3>
<p>A function gives a number or an error, never a guess. An error in an argument passes through in its place.</p>
${table(
  "Cell errors",
  ["Error", "Why"],
  codes.map((code) => [`<code>${code}</code>`, `${meaningsOf(code).map(escape).join("; ")}`]),
)}
<p>Excel shows the message of <code>#VALUE!</code> and <code>#N/A</code> beside the cell; for the others, select the cell and read the
Plinth pane.</p>
</section>`;
}

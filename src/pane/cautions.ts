/** The usual cautions of the trade, each with who decides. `fits` says when a cell brings one to mind. */
import { type Explanation, numberOf, operatingPoint } from "./explain";

export interface Caution {
  readonly id: string;
  readonly title: string;
  readonly text: string;
  readonly defer: string;
  readonly fits: (explanation: Explanation) => boolean;
}

const oneOf =
  (...ids: string[]) =>
  ({ doc }: Explanation): boolean =>
    ids.includes(doc.id);

const ratio = (explanation: Explanation): number | undefined => {
  const point = operatingPoint(explanation);
  return point ? point.f / point.fn : undefined;
};

const softMount = (explanation: Explanation): boolean => {
  const { doc, result } = explanation;
  const fn = doc.id === "REQNATFREQ" && typeof result === "number" ? result : numberOf(explanation, "naturalFrequency");
  return fn !== undefined && fn < 3 && /Hz/.test(doc.parameters.map(({ unit }) => unit).join());
};

export const cautions: readonly Caution[] = [
  {
    id: "near-resonance",
    title: "Working close to resonance",
    text:
      "Near its natural frequency a mount makes the motion larger, and small errors in stiffness, mass or speed change " +
      "the answer several times over. Look at the worst case, not at the nominal value.",
    defer: "the mount maker's dynamic data; a measurement on the installed machine",
    fits: (explanation) => {
      const r = ratio(explanation);
      return r !== undefined && r > 0.7 && r < Math.SQRT2;
    },
  },
  {
    id: "run-up",
    title: "Passing resonance at start, stop and low speed",
    text:
      "A machine that isolates well at full speed still runs through resonance when it starts, coasts down, or is turned " +
      "down by a drive. The slower pass is the worse one.",
    defer: "the machine maker; a run-up and coast-down test at commissioning",
    fits: (explanation) => explanation.doc.id === "RUNUP" || (ratio(explanation) ?? 0) >= Math.SQRT2,
  },
  {
    id: "gap",
    title: "Travel beyond the gap, and everything that bridges it",
    text:
      "The mount needs room for sag, tilt, vibration and shock together. Pipes, ducts, cables and drains must follow the " +
      "whole travel; a stop that touches or a stiff pipe undoes the isolation and can break.",
    defer: "pressure, gas and electrical codes, and the authority that enforces them",
    fits: oneOf("RELTRANS", "RELBOUND", "MOUNTDEFL", "PULSE", "RANDRMS", "HISTORY", "SRS"),
  },
  {
    id: "stored-energy",
    title: "Loads taken on or off",
    text:
      "A loaded spring holds energy. When weight, water or a panel is removed the machine can jump or tip. Block or lock " +
      "it before service.",
    defer: "lifting and rigging rules, the site's lifting plan, the mount maker's instructions",
    fits: oneOf("STATICDEFL", "REQSTATICDEFL", "DEFLFREQ", "MOUNTLOADS"),
  },
  {
    id: "corner-load",
    title: "Uplift and the corner that carries most",
    text:
      "The average load is not the load of the worst corner. A negative load means that the mount would have to pull: the " +
      "frame lifts off. Heat, oil, creep and age change rubber.",
    defer: "the mount maker's load range and inspection interval",
    fits: (explanation) =>
      explanation.doc.id === "MOUNTLOADS" || /^(NATFREQ|REQSTIFFNESS|STIFFNESS)$/.test(explanation.doc.id),
  },
  {
    id: "tipping",
    title: "Tall springs and high centres of gravity",
    text:
      "What is soft upright is often softer sideways. A high centre of gravity on soft mounts can rock or fall over although " +
      "the vertical numbers look good.",
    defer: "the spring standard, the mount maker, a licensed engineer",
    fits: (explanation) => softMount(explanation) || explanation.doc.id === "RIGIDMODES",
  },
  {
    id: "restraint",
    title: "Earthquake, wind and ship motion",
    text:
      "A soft mount is no restraint. Anchorage and limits of travel are designed separately; a small transmissibility says " +
      "nothing about an earthquake.",
    defer:
      "the adopted building and seismic code and a licensed structural engineer; class rules; the airworthiness authority",
    fits: (explanation) => softMount(explanation) || oneOf("HISTORY", "SRS")(explanation),
  },
  {
    id: "overhead",
    title: "Equipment overhead",
    text: "What hangs on isolators needs a second path that holds it when an isolator fails.",
    defer: "the structural engineer and the code",
    fits: () => false,
  },
  {
    id: "people",
    title: "People in the vibration",
    text:
      "Limits for people concern frequency-weighted exposure over a day, at the seat or the floor, not one number from one " +
      "formula.",
    defer: "ISO 2631-1 and national workplace law",
    fits: () => false,
  },
  {
    id: "buildings",
    title: "Damage to buildings",
    text: "Comfort and damage are judged by different quantities, at different places, with different limits.",
    defer: "ISO 4866, DIN 4150-3 or the national guide; the structural engineer",
    fits: () => false,
  },
  {
    id: "critical",
    title: "Medical, flight, nuclear, defence and life-safety equipment",
    text: "A spreadsheet's result is not a qualification.",
    defer: "the programme's standard, the certifying authority, the test house",
    fits: () => false,
  },
  {
    id: "testing",
    title: "Tests on a shaker or a shock machine",
    text: "A sweep through resonance or a shock can throw parts. Keep clear, and set the limits before the first run.",
    defer: "the laboratory's safety rules",
    fits: oneOf("SWEEP", "SRS", "PULSE", "PULSEVELOCITY", "RUNUP", "PSDRMS", "RANDRMS", "CROSSOVER"),
  },
  {
    id: "random",
    title: "Random vibration has no largest value",
    text:
      "Three times the rms is not a maximum: in a long test higher peaks are certain. Short forms for flat spectra mislead " +
      "where the spectrum slopes or ends near the natural frequency.",
    defer: "the test standard of the programme",
    fits: oneOf("RANDRMS", "MILES", "PEAKFACTOR", "PSDRMS"),
  },
  {
    id: "model",
    title: "What the model leaves out",
    text:
      "One mass, one axis, a linear mount, a rigid base, steady vibration. Rocking, a flexible floor, standing waves in the " +
      "spring and stiffening rubber are not in it.",
    defer: "a competent engineer's judgement, and measurement",
    fits: (explanation) => (ratio(explanation) ?? 0) > 6,
  },
];

/** The cautions that fit the cell first, then the others, each list in its own order. */
export function cautionsFor(explanation: Explanation | null): { readonly now: Caution[]; readonly others: Caution[] } {
  const now = explanation ? cautions.filter(({ fits }) => fits(explanation)) : [];
  return { now, others: cautions.filter((caution) => !now.includes(caution)) };
}

/** Plain formulas of ratios, mounts and damping. Where the catalogue has the relation its text is taken from there. */
import {
  dampingModel,
  dampingRatio,
  frequency,
  hasRelation,
  naturalFrequency,
  number,
  type PlainEntry,
  relationText,
  relative,
  transmissibility,
  units,
  word,
} from "./plain-entry";
import type { Role } from "./roles";

const mount = [frequency, naturalFrequency, dampingRatio, dampingModel];
const stiffness = number("k", "stiffness");
const mass = number("m", "mass");
const stiffnessRatio = number("kappa", "stiffness ratio", "1");
const baseAmplitude = number("U", "base amplitude");

const dampingForms = ["ratio", "percent", "loss factor", "q", "log decrement"];
const dampingRoles: Record<string, Role> = {
  ratio: "zeta",
  percent: "zeta",
  "loss factor": "eta",
  q: "Q",
  "log decrement": "logdec",
};

const byModel = (model: string | undefined): Role[] => ["r", model === "viscous" ? "zeta" : "eta"];

export const response: Readonly<Record<string, PlainEntry>> = {
  ABSTRANS: { arguments: mount, text: ({ model }) => ({ formula: transmissibility(model!) }) },
  RELTRANS: { arguments: mount, text: ({ model }) => ({ formula: relative(model!) }) },
  ABSPHASE: {
    arguments: mount,
    text: ({ model }) => ({ formula: `DEGREES(${relationText("phiA", byModel(model))})` }),
  },
  RELPHASE: {
    arguments: mount,
    text: ({ model }) => ({ formula: `DEGREES(${relationText("phiR", byModel(model))})` }),
  },
  EFFICIENCY: {
    arguments: mount,
    text: ({ model }) => ({ formula: relationText("E", ["T"]), where: { T: transmissibility(model!) } }),
  },
  PEAKTRANS: {
    arguments: [dampingRatio, dampingModel],
    text: ({ model }) =>
      model === "viscous"
        ? { formula: relationText("Tpk", ["zeta"]) }
        : { formula: transmissibility(model!), where: { r: "1" } },
  },
  PEAKFREQ: {
    arguments: [naturalFrequency, dampingRatio, dampingModel],
    text: ({ model }) => ({ formula: model === "viscous" ? relationText("fp", ["fn", "zeta"]) : "fn" }),
  },
  NATFREQ: {
    arguments: [stiffness, mass, units],
    text: () => ({ formula: relationText("fn", ["k", "m"]), units: { k: "stiffness", m: "mass" } }),
  },
  STIFFNESS: {
    arguments: [naturalFrequency, mass, units],
    text: () => ({ formula: relationText("k", ["m", "fn"]), units: { m: "mass" }, result: "stiffness" }),
  },
  STATICDEFL: {
    arguments: [naturalFrequency, stiffnessRatio, units],
    text: (_, given) => ({
      formula: relationText("delta", given.has("kappa") ? ["kappa", "g", "fn"] : ["g", "fn"]),
      result: "displacement",
    }),
  },
  DEFLFREQ: {
    arguments: [number("delta", "static deflection"), stiffnessRatio, units],
    text: (_, given) => ({
      formula: relationText("fn", given.has("kappa") ? ["kappa", "g", "delta"] : ["g", "delta"]),
      units: { delta: "displacement" },
    }),
  },
  MOUNTDEFL: {
    arguments: [baseAmplitude, ...mount],
    text: ({ model }) => ({ formula: relationText("Z", ["R", "U"]), where: { R: relative(model!) } }),
  },
  MOUNTFORCE: {
    arguments: [baseAmplitude, frequency, mass, naturalFrequency, dampingRatio, dampingModel, units],
    text: ({ model }) => ({
      formula: relationText("F", ["m", "Xa"]),
      where: {
        Xa: relationText("Xa", ["f", "X"]),
        X: relationText("X", ["T", "U"]),
        T: transmissibility(model!),
      },
      units: { U: "displacement", m: "mass" },
      result: "force",
    }),
  },
  DAMPING: {
    arguments: [number("value", "value"), word("from", "from", dampingForms), word("to", "to", dampingForms)],
    text: ({ from, to }) => conversion(from!, to!),
  },
  DAMPCOEFF: {
    arguments: [dampingRatio, stiffness, mass, units],
    text: () => ({
      formula: relationText("c", ["zeta", "k", "m"]),
      units: { k: "stiffness", m: "mass" },
      result: "damping",
    }),
  },
  DAMPRATIO: {
    arguments: [number("c", "damping coefficient"), stiffness, mass, units],
    text: () => ({
      formula: relationText("zeta", ["c", "k", "m"]),
      units: { c: "damping", k: "stiffness", m: "mass" },
    }),
  },
};

/** Directly where the catalogue has the relation, else by way of the damping ratio. */
function conversion(from: string, to: string): { formula: string; where: Record<string, string> } {
  const given = dampingRoles[from]!;
  const wanted = dampingRoles[to]!;
  const where: Record<string, string> = { [given]: from === "percent" ? "value/100" : "value" };
  const times = (formula: string): string => (to === "percent" ? `100*${formula}` : formula);
  if (from === to) return { formula: "value", where };
  if (given === wanted) return { formula: times(given), where };
  if (hasRelation(wanted, given)) return { formula: times(relationText(wanted, [given])), where };
  where["zeta"] = relationText("zeta", [given]);
  return { formula: relationText(wanted, ["zeta"]), where };
}

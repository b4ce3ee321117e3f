/** Plain formulas of design: requirements and bounds. */
import {
  dampingModel,
  dampingRatio,
  frequency,
  naturalFrequency,
  number,
  type PlainEntry,
  type PlainText,
  relationText,
  relative,
  transmissibility,
  units,
  word,
} from "./plain-entry";
import { substitute } from "./plain-substitute";

const efficiency = number("E", "efficiency");
const stiffnessRatio = number("kappa", "stiffness ratio", "1");

/** The greatest natural frequency for a transmissibility, hysteretic: (1 - r^2)^2 = (1 + eta^2)/T^2 - eta^2, r > 1. */
const HYSTERETIC_LIMIT = "f/SQRT(1+SQRT((1+eta^2)/T^2-eta^2))";
const requiredFrequency = (model: string): string =>
  model === "viscous" ? relationText("fn", ["f", "zeta", "T"]) : HYSTERETIC_LIMIT;
const fromEfficiency = { T: relationText("T", ["E"]) };

export const design: Readonly<Record<string, PlainEntry>> = {
  REQNATFREQ: {
    arguments: [efficiency, frequency, dampingRatio, dampingModel],
    text: ({ model }) => ({ formula: requiredFrequency(model!), where: fromEfficiency }),
  },
  REQSTATICDEFL: {
    arguments: [efficiency, frequency, dampingRatio, stiffnessRatio, dampingModel, units],
    text: ({ model }, given) => ({
      formula: relationText("delta", given.has("kappa") ? ["kappa", "g", "fn"] : ["g", "fn"]),
      where: { ...fromEfficiency, fn: requiredFrequency(model!) },
      result: "displacement",
    }),
  },
  REQSTIFFNESS: {
    arguments: [efficiency, frequency, dampingRatio, number("m", "mass"), dampingModel, units],
    text: ({ model }) => ({
      formula: relationText("k", ["m", "fn"]),
      where: { ...fromEfficiency, fn: requiredFrequency(model!) },
      units: { m: "mass" },
      result: "stiffness",
    }),
  },
  // the peak transmissibility solved for the damping: zeta^2 = T/(2 w^2 (T + w)), w^2 = T^2 - 1
  REQDAMPING: {
    arguments: [number("T", "peak transmissibility"), dampingModel],
    text: ({ model }) => ({
      formula: model === "viscous" ? "SQRT(T/(2*(T+w)))/w" : "1/(2*w)",
      where: { w: "SQRT((T-1)*(T+1))" },
    }),
  },
  TRANSBOUND: box(({ model, bound }, given): PlainText => {
    const T = (r: string, zeta: string): string => renamed(transmissibility(model!), { r, zeta });
    const peak = model === "viscous" ? relationText("Tpk", ["zeta"]) : renamed(transmissibility(model!), { r: "1" });
    if (bound === "min") {
      return {
        formula: "MIN(atLow,atHigh)",
        where: { atLow: T("rLow", "easyLow"), atHigh: T("rHigh", "easyHigh"), ...easy(given.has("b")) },
      };
    }
    return {
      formula: `IF(rLow^2>rrPeak,atLow,IF(rHigh^2<rrPeak,atHigh,atPeak))`,
      where: {
        // beyond root 2 more damping lets more through
        atLow: T("rLow", "hardLow"),
        hardLow: given.has("b") ? "IF(rLow^2>=2,most,least)" : "zeta",
        atHigh: T("rHigh", "least"),
        atPeak: renamed(peak, { zeta: "least" }),
        rrPeak: model === "viscous" ? "2/(1+SQRT(1+8*least^2))" : "1",
      },
    };
  }),
  RELBOUND: box(({ model, bound }): PlainText => {
    const R = (r: string, zeta: string): string => renamed(relative(model!), { r, zeta });
    if (bound === "min") {
      return { formula: "MIN(atLow,atHigh)", where: { atLow: R("rLow", "most"), atHigh: R("rHigh", "most") } };
    }
    const where = { atLow: R("rLow", "least"), atHigh: R("rHigh", "least") };
    if (model !== "viscous") {
      // the peak lies at r^2 = 1 + eta^2
      const rrPeak = "1+(2*least)^2";
      return {
        formula: "IF(rHigh^2<rrPeak,atHigh,IF(rLow^2>rrPeak,atLow,SQRT(rrPeak)/(2*least)))",
        where: { ...where, rrPeak },
      };
    }
    // the peak lies at r^2 = 1/(1 - 2 zeta^2); none from zeta = 1/root 2 on
    return {
      formula: "IF(rHigh^2*room<1,atHigh,IF(rLow^2*room>1,atLow,1/(2*least*SQRT((1-least)*(1+least)))))",
      where: { ...where, room: "1-2*least^2" },
    };
  }),
};

/** The most and the least damping where it helps and where it hurts: the best case takes the easier one. */
const easy = (tolerance: boolean): Record<string, string> => ({
  easyLow: tolerance ? "IF(rLow^2>=2,least,most)" : "zeta",
  easyHigh: tolerance ? "IF(rHigh^2>=2,least,most)" : "zeta",
});

/** A relation over other names. */
function renamed(formula: string, names: Readonly<Record<string, string>>): string {
  return substitute(formula, (name) => names[name] ?? (name === "eta" ? `2*${names["zeta"] ?? "zeta"}` : name));
}

/** Ratios at the two ends of the box and the ends of the damping; tolerances that are left out leave no trace. */
function box(text: (words: Readonly<Record<string, string>>, given: ReadonlySet<string>) => PlainText): PlainEntry {
  return {
    arguments: [
      number("low", "lowest frequency"),
      number("high", "highest frequency"),
      naturalFrequency,
      dampingRatio,
      number("a", "natural frequency tolerance", "0"),
      number("b", "damping tolerance", "0"),
      word("bound", "bound", ["max", "min"], "max"),
      dampingModel,
    ],
    oneAtATime: true,
    text: (words, given) => {
      const { formula, where } = text(words, given);
      return {
        formula: `IF(low>high,NA(),${formula})`,
        where: {
          ...where,
          rLow: given.has("a") ? "low/(fn*(1+a))" : "low/fn",
          rHigh: given.has("a") ? "high/(fn*(1-a))" : "high/fn",
          least: given.has("b") ? "zeta*(1-b)" : "zeta",
          most: given.has("b") ? "zeta*(1+b)" : "zeta",
        },
      };
    },
  };
}

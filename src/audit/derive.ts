import { type Given, planFor, type Step } from "./plan";
import type { Role } from "./roles";
import { gravity } from "./units";

export type { Fault } from "./fault";
export type { Given, Step } from "./plan";

/** A value of a role at every sample point, computed when it is asked for. */
export interface Entry extends Step {
  readonly values: Float64Array;
}

export interface Derivation {
  entries(role: Role): readonly Entry[];
}

/** What is given for an input. */
export function entry(role: Role, mask: number, values: Float64Array): Given {
  return { role, mask, values, fault: null, scale: 1, cost: 0 };
}

/**
 * What follows from the given roles for the targets, by chaining the catalogue's relations. With `slips` each derivation
 * may contain one of a relation's slips or one faulty input, but never more than one fault in all.
 */
export function derive(start: readonly Given[], targets: readonly Role[], samples: number, slips: boolean): Derivation {
  const plan = planFor(start, targets, slips);
  const known = new Map<Step, Float64Array>();
  const inputs: number[] = [];

  function valuesOf(step: Step): Float64Array {
    if (step.given >= 0) return start[step.given]!.values;
    let values = known.get(step);
    if (values) return values;
    values = new Float64Array(samples);
    if (step.given === -2) values.fill(gravity);
    else {
      const parts = step.from.map(valuesOf);
      for (let s = 0; s < samples; s++) {
        for (let i = 0; i < parts.length; i++) inputs[i] = parts[i]![s]!;
        values[s] = step.compute!(inputs);
      }
    }
    known.set(step, values);
    return values;
  }

  return {
    entries: (role) =>
      (plan.get(role) ?? []).map((step) => {
        const { mask, fault, cost, relation, compute, from, undamped, coarse } = step;
        return {
          role,
          mask,
          fault,
          cost,
          relation,
          compute,
          from,
          undamped,
          coarse,
          given: step.given,
          get values() {
            return valuesOf(step);
          },
        };
      }),
  };
}

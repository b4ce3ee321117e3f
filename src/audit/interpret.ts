import type { Meaning } from "./meaning";
import { motionRoles, type Role, roles } from "./roles";
import { ofRandomMotion, sigmasIn } from "./stated";
import { type Dimension, gravity, type Unit } from "./units";
import { type AmplitudeKind, peakOf } from "./words";

/** One way to take a cell: its role, and the SI value of 1 in it. */
export interface Interpretation {
  readonly role: Role;
  readonly factor: number;
  /** 0 for what the labels plainly say; larger for less likely readings */
  readonly cost: number;
  /** the unit is written on the sheet */
  readonly unitKnown: boolean;
}

export const isMotion = (role: Role): boolean => motionRoles.has(role);

/** Units in which a sheet without units may state a dimension, the most usual first. */
const customary: Readonly<Record<Dimension, readonly number[]>> = {
  number: [1],
  frequency: [1, 1 / 60, 1 / (2 * Math.PI)],
  length: [1e-3, 1, 0.0254, 1e-6, 1e-2],
  velocity: [1, 1e-3, 0.0254],
  acceleration: [1, gravity, 1e-3, 0.0254],
  mass: [1, 1000, (0.45359237 / 0.0254) * gravity],
  force: [1, 1000, 0.45359237 * gravity, gravity, 10],
  stiffness: [1, 1e3, 1e6, (0.45359237 * gravity) / 0.0254],
  damping: [1, 1e3, (0.45359237 * gravity) / 0.0254],
  angle: [Math.PI / 180, 1],
  level: [1],
  density: [1, gravity * gravity],
  pressure: [1e6, 1],
  area: [1e-6, 1],
  time: [1],
  other: [1],
};

const inPercent = new Set<Role>(["zeta", "T", "R", "E", "eta"]);

/** The SI values that 1 may have in a cell of this role, given what its labels say. */
export function factorsOf(role: Role, unit: Unit | null): { factors: readonly number[]; known: boolean } {
  const { dimension } = roles[role];
  if (unit && unit.dimension === dimension) return { factors: [unit.factor], known: true };
  if (inPercent.has(role)) return { factors: [1, 0.01], known: false };
  return { factors: customary[dimension], known: false };
}

/** Role that a number in this unit really has: a mass stated in lb or N is a weight, a load stated in kg is a mass. */
function roleInUnit(role: Role, unit: Unit | null): Role {
  if (!unit) return role;
  if (unit.dimension === "force") return role === "m" ? "W" : role === "mEach" ? "WEach" : role;
  if (unit.dimension === "mass") return role === "W" ? "m" : role === "WEach" ? "mEach" : role;
  return role;
}

/** A symbol that customarily stands for rad/s. */
const angularSymbol = /^\s*(w|om|omega|ω|Ω)[_ ]?[n0₀ₙo]?\s*$/;

/** The likely interpretations of a cell from its labels, the most likely first. */
export function interpretationsOf(meaning: Meaning, kind: AmplitudeKind | null, most: number): Interpretation[] {
  const found: Interpretation[] = [];
  const best = meaning.candidates[0]?.weight ?? 0;
  const seen = new Set<Role>();
  const sigmas = sigmasIn(meaning) ?? 1;
  for (const { role: written, weight } of meaning.candidates) {
    const role = roleInUnit(written, meaning.unit);
    if (seen.has(role)) continue;
    // words that say something plain leave no room for roles that only the unit would allow
    if (weight < best - 3.6) continue;
    seen.add(role);
    const { factors: listed, known } = factorsOf(role, meaning.unit);
    const angular = !known && roles[role].dimension === "frequency" && angularSymbol.test(meaning.label);
    const factors = angular ? [...listed].reverse() : listed;
    factors.forEach((factor, i) => {
      const size = sigmas !== 1 && ofRandomMotion(role) ? factor / sigmas : factor;
      const scale = kind && motionRoles.has(role) ? size * peakOf[kind] : size;
      found.push({
        role,
        factor: scale,
        cost: (best - weight) * 0.5 + i * 0.3,
        unitKnown: known || factors.length === 1,
      });
    });
    if (seen.size >= most) break;
  }
  return found.sort((a, b) => a.cost - b.cost);
}

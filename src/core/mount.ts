import { finite, requireAbove, requireAtLeast, reject } from "./errors";
import { magnitude, quotient, quotientRoot } from "./exact";
import { absoluteFactors, type DampingModel, relativeFactors } from "./transmissibility";

/** Standard acceleration of free fall, m/s^2, exact by definition (3rd General Conference on Weights and Measures, 1901). */
export const STANDARD_GRAVITY = 9.80665;

const TWO_PI = 2 * Math.PI;

/** Undamped natural frequency sqrt(k/m)/(2 pi), Hz. k > 0 N/m, m > 0 kg. */
export function naturalFrequency(k: number, m: number): number {
  requireAbove("stiffness", k, 0);
  requireAbove("mass", m, 0);
  return finite("natural frequency", quotientRoot([k], [m]) / TWO_PI);
}

/** Stiffness m (2 pi fn)^2, N/m. fn > 0 Hz, m > 0 kg. */
export function stiffness(fn: number, m: number): number {
  requireAbove("natural frequency", fn, 0);
  requireAbove("mass", m, 0);
  return finite("stiffness", quotient([m, TWO_PI, fn, TWO_PI, fn]));
}

/**
 * Static deflection kappa g/(2 pi fn)^2, m, of a mount whose dynamic stiffness is kappa times its static one.
 * fn > 0 Hz, kappa > 0.
 */
export function staticDeflection(fn: number, kappa: number): number {
  requireAbove("natural frequency", fn, 0);
  requireAbove("stiffness ratio", kappa, 0);
  return finite("static deflection", quotient([kappa, STANDARD_GRAVITY], [TWO_PI, fn, TWO_PI, fn]));
}

/** Natural frequency of a mount that sags by `deflection` (m, > 0) under its load: sqrt(kappa g/deflection)/(2 pi), Hz. */
export function frequencyFromDeflection(deflection: number, kappa: number): number {
  requireAbove("static deflection", deflection, 0);
  requireAbove("stiffness ratio", kappa, 0);
  return finite("natural frequency", quotientRoot([kappa, STANDARD_GRAVITY], [deflection]) / TWO_PI);
}

/** Dynamic deflection amplitude of the mount, in the unit of the base amplitude (>= 0): R times U. */
export function mountDeflection(amplitude: number, f: number, fn: number, zeta: number, model: DampingModel): number {
  requireAtLeast("base amplitude", amplitude, 0);
  const { numerators, denominators } = relativeFactors(f, fn, zeta, model);
  return finite("mount deflection", quotient([amplitude, ...numerators], denominators));
}

/** Dynamic force amplitude through spring and damper together, N: m (2 pi f)^2 T U. amplitude >= 0 m, f Hz, m > 0 kg. */
export function mountForce(
  amplitude: number,
  f: number,
  m: number,
  fn: number,
  zeta: number,
  model: DampingModel,
): number {
  requireAtLeast("base amplitude", amplitude, 0);
  requireAbove("mass", m, 0);
  const { numerators, denominators } = absoluteFactors(f, fn, zeta, model);
  return finite("mount force", quotient([amplitude, m, TWO_PI, f, TWO_PI, f, ...numerators], denominators));
}

/** Damping coefficient c = 2 zeta sqrt(k m), N s/m. zeta >= 0, k > 0 N/m, m > 0 kg. */
export function dampingCoefficient(zeta: number, k: number, m: number): number {
  requireAtLeast("damping ratio", zeta, 0);
  requireAbove("stiffness", k, 0);
  requireAbove("mass", m, 0);
  return finite("damping coefficient", quotient([2, zeta, quotientRoot([k]), quotientRoot([m])]));
}

/** Damping ratio c/(2 sqrt(k m)). c >= 0 N s/m, k > 0 N/m, m > 0 kg. */
export function dampingRatio(c: number, k: number, m: number): number {
  requireAtLeast("damping coefficient", c, 0);
  requireAbove("stiffness", k, 0);
  requireAbove("mass", m, 0);
  return finite("damping ratio", quotient([c], [2, quotientRoot([k]), quotientRoot([m])]));
}

/** The ways in which damping is quoted. */
export const DAMPING_FORMS = ["ratio", "percent", "loss factor", "q", "log decrement"] as const;
export type DampingForm = (typeof DAMPING_FORMS)[number];

/**
 * Damping from one form to another, through the damping ratio zeta: percent = 100 zeta, eta = 2 zeta, Q = 1/(2 zeta),
 * logarithmic decrement = 2 pi zeta/sqrt(1 - zeta^2).
 * @throws outside-domain for a negative value, Q = 0 or a Q of undamped motion, a decrement for zeta >= 1
 */
export function convertDamping(value: number, from: DampingForm, to: DampingForm): number {
  const [a, b] = ratioOf(value, from);
  if (from === to) return value;
  switch (to) {
    case "ratio":
      return finite("damping ratio", quotient([a], [b]));
    case "percent":
      return finite("damping percent", quotient([100, a], [b]));
    case "loss factor":
      return finite("damping loss factor", quotient([2, a], [b]));
    case "q":
      if (a === 0) reject("damping ratio", 0, "above 0 to have a Q");
      return finite("Q", quotient([b], [2, a]));
    case "log decrement":
      if (a >= b) reject("damping ratio", quotient([a], [b]), "below 1 to have a logarithmic decrement");
      return quotient([TWO_PI, a], [Math.sqrt(b - a), Math.sqrt(b + a)]);
  }
}

/** zeta as a quotient of two doubles: 1 - zeta = (b - a)/b keeps its digits, 1 minus a rounded quotient does not. */
function ratioOf(value: number, form: DampingForm): [number, number] {
  if (form === "q") requireAbove("Q", value, 0);
  else requireAtLeast(form === "ratio" ? "damping ratio" : `damping ${form}`, value, 0);
  switch (form) {
    case "ratio":
      return [value, 1];
    case "percent":
      return [value, 100];
    case "loss factor":
      return [value, 2];
    case "q":
      return [0.5, value];
    case "log decrement":
      return [value, magnitude(TWO_PI, value)];
  }
}

import type { Role } from "./roles";

/** Number of probe points at which derivations are told apart. */
export const probes = 3;

/**
 * Fixed values at which two relations or slips that are not the same differ: below and above resonance, far from 0, 1 and
 * from each other's symmetries. SI units.
 */
const base: Partial<Record<Role, readonly [number, number, number]>> = {
  f: [23.7, 4.19, 31.3],
  fn: [6.13, 7.37, 5.59],
  r: [3.91, 0.617, 2.63],
  rr: [15.3, 0.38, 6.9],
  zeta: [0.131, 0.173, 0.287],
  eta: [0.217, 0.311, 0.139],
  Q: [4.31, 6.17, 9.1],
  T: [0.371, 2.23, 0.137],
  R: [1.27, 0.83, 1.61],
  E: [0.613, 0.287, 0.871],
  LT: [-9.31, 4.7, -17.3],
  kappa: [1.37, 1.53, 1.19],
  n: [3.7, 5.3, 7.9],
  delta: [0.0113, 0.0071, 0.0193],
  k: [81300, 47900, 121700],
  m: [117.3, 63.1, 211.7],
};

const hashes = new Map<Role, number>();

function hash(role: Role): number {
  let known = hashes.get(role);
  if (known === undefined) {
    known = 7;
    for (let i = 0; i < role.length; i++) known = (known * 31 + role.charCodeAt(i)) % 9973;
    hashes.set(role, known);
  }
  return known;
}

/** The probe values of an input: its role decides, and its bit where two inputs have one role. */
export function probeValues(role: Role, mask: number): Float64Array {
  const own = base[role] ?? [1 + hash(role) / 3331, 1.7 + hash(role) / 4177, 0.6 + hash(role) / 5557];
  return Float64Array.from(own, (value, s) => value * (1 + 0.0173 * ((mask * (s + 3)) % 17)));
}

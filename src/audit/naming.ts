import type { Step } from "./derive";
import type { Quantity } from "./quantities";
import type { Role } from "./roles";

/** Quantity of a number that is only passed on or converted. */
const ofRole: Partial<Record<Role, Quantity>> = {
  f: "frequency-conversion",
  fn: "natural-frequency",
  fd: "natural-frequency",
  fp: "peak-transmissibility",
  r: "frequency-ratio",
  zeta: "damping-ratio",
  eta: "damping-ratio",
  Q: "damping-ratio",
  logdec: "damping-ratio",
  c: "damping-coefficient",
  cEach: "damping-coefficient",
  cc: "critical-damping",
  m: "mount-load",
  mEach: "mount-load",
  W: "mount-load",
  WEach: "mount-load",
  k: "mount-stiffness",
  kEach: "mount-stiffness",
  delta: "static-deflection",
  T: "absolute-transmissibility",
  R: "relative-transmissibility",
  E: "isolation-efficiency",
  LT: "transmissibility-db",
  phiA: "absolute-phase",
  phiR: "relative-phase",
  Tpk: "peak-transmissibility",
  S: "helper",
  Sout: "helper",
  grms: "random-response-rms",
  zrms: "random-response-rms",
  F: "mount-force",
  Fs: "mount-force",
  Fd: "mount-force",
  FEach: "mount-force",
  FsEach: "mount-force",
  FdEach: "mount-force",
  aMax: "motion-conversion",
  U: "motion-conversion",
  Uv: "motion-conversion",
  Ua: "motion-conversion",
  X: "motion-conversion",
  Xv: "motion-conversion",
  Xa: "motion-conversion",
  Z: "motion-conversion",
  Zv: "motion-conversion",
  Za: "motion-conversion",
};

function* chain(entry: Step): Generator<Step> {
  yield entry;
  for (const from of entry.from) yield* chain(from);
}

/** The quantity that a derivation computes. */
export function quantityOf(entry: Step, saysRequired: boolean): Quantity {
  const { role, relation } = entry;
  const steps = [...chain(entry)];
  const used = (quantity: Quantity): boolean => steps.some((step) => step.relation?.quantity === quantity);
  const fromTarget = steps.some((step) => step.relation?.required === true);
  if (role === "delta")
    return fromTarget || (saysRequired && !used("mount-load")) ? "required-static-deflection" : "static-deflection";
  if (role === "fn")
    return fromTarget || (saysRequired && relation !== null && steps.some(({ role: r }) => r === "T" || r === "r"))
      ? "required-natural-frequency"
      : "natural-frequency";
  if (role === "k" || role === "kEach") {
    if (fromTarget || saysRequired || used("required-stiffness") || used("required-static-deflection"))
      return "required-stiffness";
    return "mount-stiffness";
  }
  if (/^Z/.test(role)) {
    const converted = steps.every((step) => step.relation === null || step.relation.quantity === "motion-conversion");
    return converted ? "motion-conversion" : "relative-displacement";
  }
  if (/^X/.test(role)) return used("payload-motion") ? "payload-motion" : "motion-conversion";
  if (/^U/.test(role)) return used("payload-motion") ? "payload-motion" : "motion-conversion";
  return ofRole[role] ?? relation?.quantity ?? "helper";
}

/** Quantity that a label alone stands for. */
export function quantityMeant(role: Role): Quantity | null {
  if (/^Z/.test(role)) return "relative-displacement";
  if (/^X/.test(role)) return "payload-motion";
  return ofRole[role] ?? null;
}

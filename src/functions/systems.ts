import { mountLoads } from "../core/mountLoads";
import { relaxationTransmissibility } from "../core/relaxation";
import { rigidBodyFrequencies, type Vector } from "../core/rigidModes";
import { surgeFrequency } from "../core/surge";
import { twoStageFrequencies, twoStageTransmissibility } from "../core/twoStage";
import { type Argument, lift, one, requireSameLength, spaced, spill, table, vector } from "./cell";
import { CellFailure } from "./failure";
import { toSI, unitSystem, type UnitSystem } from "./unitSystems";

/**
 * Transmissibility of a two-stage mount, from the base to the upper mass.
 * @customfunction TWOSTAGE
 * @param frequency Excitation frequency; Hz; 0 or more. Number or range.
 * @param lowerMass Mass between the two stages, or moving mass of a flexible floor; kg or lb; above 0. One number.
 * @param lowerStiffness Stiffness below the lower mass; N/m, N/mm or lbf/in; above 0. One number.
 * @param lowerDamping Damping coefficient below the lower mass; N.s/m, N.s/mm or lbf.s/in; 0 or more. One number.
 * @param upperMass Mass on the upper stage; kg or lb; above 0. One number.
 * @param upperStiffness Stiffness between the masses; N/m, N/mm or lbf/in; above 0. One number.
 * @param upperDamping Damping coefficient between the masses; N.s/m, N.s/mm or lbf.s/in; 0 or more. One number.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Absolute transmissibility, upper mass over base; no unit; shape of frequency.
 * @example =TWOSTAGE(0, 10, 100000, 50, 20, 50000, 30) gives 1
 * @example =TWOSTAGE({5;50}, 10, 100000, 50, 20, 50000, 30) gives {2.8699735820538;0.00320178664891966}
 * @failure pole when both dampings are 0 and frequency is a natural frequency
 * @source Equations of motion of two masses in a chain, viscous dampers
 * @leavesOut One axis, rigid masses, linear stages; a floor stands for one of its modes only.
 */
export function TWOSTAGE(
  frequency: any[][],
  lowerMass: any[][],
  lowerStiffness: any[][],
  lowerDamping: any[][],
  upperMass: any[][],
  upperStiffness: any[][],
  upperDamping: any[][],
  units?: string,
): any[][] {
  const system = unitSystem(units);
  const lower = {
    mass: toSI(one("lowerMass", lowerMass), system.mass),
    stiffness: toSI(one("lowerStiffness", lowerStiffness), system.stiffness),
    damping: toSI(one("lowerDamping", lowerDamping), system.damping),
  };
  const upper = {
    mass: toSI(one("upperMass", upperMass), system.mass),
    stiffness: toSI(one("upperStiffness", upperStiffness), system.stiffness),
    damping: toSI(one("upperDamping", upperDamping), system.damping),
  };
  return lift((f) => twoStageTransmissibility(f, lower, upper), { frequency });
}

/**
 * The two undamped natural frequencies of a two-stage mount.
 * @customfunction TWOSTAGEFREQ
 * @param lowerMass Mass between the two stages; kg or lb; above 0. One number.
 * @param lowerStiffness Stiffness below the lower mass; N/m, N/mm or lbf/in; above 0. One number.
 * @param upperMass Mass on the upper stage; kg or lb; above 0. One number.
 * @param upperStiffness Stiffness between the masses; N/m, N/mm or lbf/in; above 0. One number.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Two natural frequencies, rising; Hz; a column.
 * @example =TWOSTAGEFREQ(10, 100000, 20, 50000) gives {6.30481955138217;20.088041936927}
 * @failure outside-domain when a mass or stiffness is not above 0
 * @source Roots of the quadratic in angular frequency squared of two masses in a chain
 * @leavesOut Damping, which lowers them a little; one axis, rigid masses.
 */
export function TWOSTAGEFREQ(
  lowerMass: any[][],
  lowerStiffness: any[][],
  upperMass: any[][],
  upperStiffness: any[][],
  units?: string,
): any[][] {
  const system = unitSystem(units);
  const stage = (mass: number, stiffness: number) => ({
    mass: toSI(mass, system.mass),
    stiffness: toSI(stiffness, system.stiffness),
    damping: 0,
  });
  const lower = stage(one("lowerMass", lowerMass), one("lowerStiffness", lowerStiffness));
  const upper = stage(one("upperMass", upperMass), one("upperStiffness", upperStiffness));
  return spill(twoStageFrequencies(lower, upper));
}

/**
 * Transmissibility of a mount whose damper is held by a spring of its own (elastically supported damper).
 * @customfunction RELAXTRANS
 * @param frequency Excitation frequency; any unit; 0 or more. Number or range.
 * @param naturalFrequency Natural frequency of the main spring alone; same unit; above 0. Number or range.
 * @param dampingRatio Damping coefficient over 2 sqrt(k m) of the main spring; fraction; 0 or more. Number or range.
 * @param seriesRatio Stiffness of the damper's spring over that of the main spring; no unit; above 0. Number or range.
 * @returns Absolute transmissibility; no unit; shape of the arguments together.
 * @example =RELAXTRANS(3, 1, 0.2, 3) gives 0.228807651044432
 * @failure pole when dampingRatio is 0 and frequency equals naturalFrequency
 * @source Complex stiffness k (1 + N i d/(N + i d)), d = 2 zeta r; mount of this kind: J. E. Ruzicka
 * @leavesOut One mass, one axis, linear parts, steady vibration.
 */
export function RELAXTRANS(
  frequency: any[][],
  naturalFrequency: any[][],
  dampingRatio: any[][],
  seriesRatio: any[][],
): any[][] {
  return lift(relaxationTransmissibility, { frequency, naturalFrequency, dampingRatio, seriesRatio });
}

/**
 * Vertical static load on each mount under a rigid frame; negative where the frame would lift off.
 * @customfunction MOUNTLOADS
 * @param x Mount positions along one axis; m, mm or in; any numbers. Whole range.
 * @param y Mount positions along the other axis; same unit; any numbers, as many. Whole range.
 * @param stiffness Vertical stiffness of each mount; N/m, N/mm or lbf/in; above 0, as many. Whole range.
 * @param weight Weight on the mounts (a force, not a mass); N or lbf; above 0. One number.
 * @param cgX Centre of gravity along the first axis; m, mm or in; any number. One number.
 * @param cgY Centre of gravity along the other axis; m, mm or in; any number. One number.
 * @param [units] Unit system, which does not change the loads; word; si, mm or inch. Left out: si.
 * @returns Load on each mount, uplift negative; N or lbf; the tables' own orientation.
 * @example =MOUNTLOADS({0;2;0;2}, {0;0;1;1}, {1;1;1;1}, 1000, 1, 0.5) gives {250;250;250;250}
 * @example =MOUNTLOADS({0,2,0}, {0,0,2}, {1,1,1}, 900, 0.5, 0.5) gives {450,225,225}
 * @failure outside-domain when all mounts stand on one line and the centre of gravity is off it
 * @source Balance of forces and moments with the sags of the mounts in one plane
 * @leavesOut Rigid frame, level seats: with more than three mounts packing and floor flatness shift loads; no side loads.
 */
export function MOUNTLOADS(
  x: any[][],
  y: any[][],
  stiffness: any[][],
  weight: any[][],
  cgX: any[][],
  cgY: any[][],
  units?: string,
): any[][] {
  unitSystem(units); // only checked: the loads carry the unit of the weight
  const places = vector("x", x);
  const others = vector("y", y);
  const springs = vector("stiffness", stiffness);
  requireSameLength(places, others);
  requireSameLength(places, springs);
  const mounts = Array.from(places.values, (value, i) => ({
    x: value,
    y: others.values[i],
    stiffness: springs.values[i],
  }));
  return spill(mountLoads(mounts, one("weight", weight), one("cgX", cgX), one("cgY", cgY)), places);
}

/**
 * The six undamped natural frequencies of a rigid body on mounts.
 * @customfunction RIGIDMODES
 * @param mass Mass of the body; kg or lb; above 0. One number.
 * @param inertia Inertia about the centre of gravity, off-diagonals -integral of x y dm; kg.m2, kg.mm2 or lb.in2; 3 by 3. Whole range.
 * @param positions Mount positions x, y, z from the centre of gravity, a row each; m, mm or in; any numbers. Whole range.
 * @param stiffnesses Dynamic stiffnesses along x, y, z, a row each; N/m, N/mm or lbf/in; 0 or more. Whole range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns Six natural frequencies, rising, 0 where nothing resists; Hz; a column.
 * @example =RIGIDMODES(100, {5,0,0;0,8,0;0,0,10}, {0.4,0.25,0;0.4,-0.25,0;-0.4,0.25,0;-0.4,-0.25,0}, {8E4,8E4,12E4;8E4,8E4,12E4;8E4,8E4,12E4;8E4,8E4,12E4}) gives {9.00316316157106;9.00316316157106;11.0265779084358;12.32808888123;13.4295088102045;15.5939360246735}
 * @failure outside-domain when inertia is not symmetric or belongs to no body, or a stiffness is negative
 * @source Newton-Euler equations for small motions; singular values of the scaled mount stretches
 * @leavesOut Small motions, damping, gravity's own stiffness, rocking stiffness of a single mount.
 */
export function RIGIDMODES(
  mass: any[][],
  inertia: any[][],
  positions: any[][],
  stiffnesses: any[][],
  units?: string,
): any[][] {
  const system = unitSystem(units);
  const body = triples("inertia", inertia, system, "inertia");
  if (body.length !== 3) throw new CellFailure("wrong-shape", `inertia must be 3×3, got ${body.length}×3`);
  const places = triples("positions", positions, system, "displacement");
  const springs = triples("stiffnesses", stiffnesses, system, "stiffness");
  if (places.length !== springs.length) {
    const lengths = `${places.length} positions and ${springs.length} rows of stiffnesses`;
    throw new CellFailure("wrong-shape", `each mount needs both: there are ${lengths}`);
  }
  return spill(rigidBodyFrequencies(toSI(one("mass", mass), system.mass), body, places, springs));
}

/** A table of three columns as rows in SI units. */
function triples(name: string, argument: Argument, system: UnitSystem, quantity: keyof UnitSystem): Vector[] {
  const { values, height, width } = table(name, argument);
  if (width !== 3) throw new CellFailure("wrong-shape", `${spaced(name)} must have 3 columns, got ${width}`);
  const at = (k: number) => toSI(values[k], system[quantity]);
  return Array.from({ length: height }, (_, i): Vector => [at(3 * i), at(3 * i + 1), at(3 * i + 2)]);
}

/**
 * First surge (standing wave) frequency of a helical spring, above which a mass-spring formula no longer holds.
 * @customfunction SURGE
 * @param stiffness Stiffness of the spring; N/m, N/mm or lbf/in; above 0. Number or range.
 * @param springMass Mass of the spring itself (not what it carries); kg or lb; above 0. Number or range.
 * @param [units] Unit system; word; si, mm or inch. Left out: si.
 * @returns First surge frequency; Hz; shape of the arguments together.
 * @example =SURGE(50000, 2) gives 79.0569415042095
 * @failure outside-domain when stiffness or springMass is not above 0
 * @source Half a wave in a uniform rod with both ends held, 0.5 sqrt(k/ms)
 * @leavesOut Both ends held, as between two heavy masses; higher waves follow at its multiples.
 */
export function SURGE(stiffness: any[][], springMass: any[][], units?: string): any[][] {
  const system = unitSystem(units);
  return lift((k, m) => surgeFrequency(toSI(k, system.stiffness), toSI(m, system.mass)), { stiffness, springMass });
}

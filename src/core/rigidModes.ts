import { finite, NumericError, requireAbove, requireAtLeast, requireFinite } from "./errors";
import { magnitude } from "./exact";

export type Vector = readonly [number, number, number];

const SAME = 1e-9; // two off-diagonals of the inertia, or a sum of two moments and the third, closer than this are equal
const NO_STIFFNESS = 1e-13; // of the highest frequency: below it is the rounding of a zero
const MOST_SWEEPS = 60;

/**
 * The six undamped natural frequencies of a rigid body on linear mounts, for small motions, rising.
 *
 * The stiffness matrix is B^T B with three rows per mount, and the mass matrix L L^T, so the angular frequencies are the
 * singular values of B L^-T. Taking them by one-sided Jacobi rotations, rather than as roots of the eigenvalues of the
 * product, keeps twice the digits in soft modes beside stiff ones, gives equal frequencies for equal modes and a clean
 * zero for a direction that no mount resists; it is also far smaller than a general eigenvalue library.
 *
 * @param mass        kg, above 0
 * @param inertia     about the centre of gravity, kg m^2; off-diagonals are -integral of x y dm; symmetric
 * @param positions   of the mounts from the centre of gravity, m
 * @param stiffnesses of the mounts along x, y and z, N/m, 0 or more
 * @returns           Hz, six, rising; 0 where no mount resists
 * @throws            outside-domain, naming what is wrong
 * @source            Newton-Euler equations for small motions; one-sided Jacobi method of M. R. Hestenes (1958)
 */
export function rigidBodyFrequencies(
  mass: number,
  inertia: readonly Vector[],
  positions: readonly Vector[],
  stiffnesses: readonly Vector[],
): Float64Array {
  requireAbove("mass", mass, 0);
  requireMounts(positions, stiffnesses);
  const columns = motionColumns(mass, choleskyFactor(inertia), positions, stiffnesses);
  orthogonalise(columns);
  const omega = Float64Array.from(columns, norm).sort();
  const highest = finite("natural frequency", omega[5]);
  return omega.map((w) => (w > NO_STIFFNESS * highest ? w / (2 * Math.PI) : 0));
}

function requireMounts(positions: readonly Vector[], stiffnesses: readonly Vector[]): void {
  if (positions.length !== stiffnesses.length || positions.length === 0) {
    const counts = `there are ${positions.length} positions and ${stiffnesses.length} rows of stiffness`;
    throw new NumericError("outside-domain", `each mount needs a position and stiffnesses: ${counts}`);
  }
  const axes = ["x", "y", "z"];
  positions.forEach((position, i) => {
    for (let j = 0; j < 3; j++) {
      requireFinite(`position ${axes[j]} of mount ${i + 1}`, position[j]);
      requireAtLeast(`stiffness ${axes[j]} of mount ${i + 1}`, stiffnesses[i][j], 0);
    }
  });
}

/** Lower triangle of L L^T = inertia: [Lxx, Lyx, Lyy, Lzx, Lzy, Lzz]. Throws for an inertia that no body has. */
function choleskyFactor(inertia: readonly Vector[]): number[] {
  const axes = ["x", "y", "z"];
  for (let i = 0; i < 3; i++) {
    requireAbove(`moment of inertia ${axes[i]}${axes[i]}`, inertia[i][i], 0);
    for (let j = 0; j < i; j++) {
      const name = `${axes[j]}${axes[i]}`;
      requireFinite(`product of inertia ${name}`, inertia[i][j]);
      requireFinite(`product of inertia ${name}`, inertia[j][i]);
      const scale = Math.sqrt(inertia[i][i]) * Math.sqrt(inertia[j][j]);
      if (Math.abs(inertia[i][j] - inertia[j][i]) > SAME * scale) {
        const values = `row ${j + 1} column ${i + 1} is ${inertia[j][i]}, row ${i + 1} column ${j + 1} is ${inertia[i][j]}`;
        throw new NumericError("outside-domain", `the inertia must be symmetric: ${values}`);
      }
    }
  }
  const [xx, yy, zz] = [inertia[0][0], inertia[1][1], inertia[2][2]];
  if (xx > (yy + zz) * (1 + SAME) || yy > (zz + xx) * (1 + SAME) || zz > (xx + yy) * (1 + SAME)) {
    const reason = "a moment of inertia is larger than the other two together, which no body has";
    throw new NumericError("outside-domain", reason);
  }
  const a = Math.sqrt(xx);
  const b = inertia[1][0] / a;
  const c = pivot(yy, b * b);
  const d = inertia[2][0] / a;
  const e = (inertia[2][1] - d * b) / c;
  return [a, b, c, d, e, pivot(zz, d * d + e * e)];
}

function pivot(moment: number, taken: number): number {
  const rest = moment - taken;
  if (rest > 0) return Math.sqrt(rest);
  throw new NumericError("outside-domain", "the products of inertia are too large for the moments of inertia");
}

/** The six columns of B L^-T: root of stiffness times the stretch that a unit of each scaled motion makes. */
function motionColumns(
  mass: number,
  [a, b, c, d, e, g]: readonly number[],
  positions: readonly Vector[],
  stiffnesses: readonly Vector[],
): Float64Array[] {
  const columns = Array.from({ length: 6 }, () => new Float64Array(3 * positions.length));
  const rootMass = Math.sqrt(mass);
  positions.forEach(([x, y, z], i) => {
    // stretch along each axis by rotations about x, y, z
    const turns: Vector[] = [
      [0, z, -y],
      [-z, 0, x],
      [y, -x, 0],
    ];
    for (let axis = 0; axis < 3; axis++) {
      const row = 3 * i + axis;
      const root = Math.sqrt(stiffnesses[i][axis]);
      const [rx, ry, rz] = turns[axis];
      const first = rx / a;
      const second = (ry - b * first) / c;
      columns[axis][row] = root / rootMass;
      columns[3][row] = root * first;
      columns[4][row] = root * second;
      columns[5][row] = root * ((rz - d * first - e * second) / g);
    }
  });
  return columns;
}

function orthogonalise(columns: Float64Array[]): void {
  const nothing = (NO_STIFFNESS / 10) * columns.map(norm).reduce(magnitude, 0); // columns of pure rounding never settle
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let turned = false;
    for (let i = 0; i < columns.length; i++) {
      for (let j = i + 1; j < columns.length; j++) turned = rotate(columns[i], columns[j], nothing) || turned;
    }
    if (!turned) return;
  }
  throw new NumericError("no-convergence", "the natural frequencies did not converge");
}

/** Turns two columns in their plane until they are orthogonal; false if they were. */
function rotate(p: Float64Array, q: Float64Array, nothing: number): boolean {
  const a = norm(p);
  const b = norm(q);
  if (a <= nothing || b <= nothing) return false;
  let cosine = 0;
  for (let k = 0; k < p.length; k++) cosine += (p[k] / a) * (q[k] / b);
  if (Math.abs(cosine) < 1e-15 * Math.sqrt(p.length)) return false; // as near as the sum is known
  const tau = (b / a - a / b) / (2 * cosine);
  const t = (tau < 0 ? -1 : 1) / (Math.abs(tau) + magnitude(1, tau));
  const c = 1 / magnitude(1, t);
  const s = c * t;
  for (let k = 0; k < p.length; k++) {
    const before = p[k];
    p[k] = c * before - s * q[k];
    q[k] = s * before + c * q[k];
  }
  return true;
}

function norm(column: Float64Array): number {
  let length = 0;
  for (const value of column) length = magnitude(length, value);
  return length;
}

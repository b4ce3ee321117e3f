import { finite, NumericError, requireAbove, requireFinite } from "./errors";

/** A vertical mount under a rigid frame. */
export interface Mount {
  x: number;
  y: number;
  stiffness: number;
}

const ON_LINE = 1e-10; // of the layout's spread: nearer than this counts as on the line of the mounts

/**
 * Vertical static load on each mount of a rigid frame: the frame sinks and tilts as a plane, each mount carries its
 * stiffness times its sag, and the loads balance the weight and its moments. A negative load is uplift.
 *
 * Where all mounts stand on one line (or at one point) the frame cannot resist tipping across it: then the weight must
 * act on that line, and the loads follow from the balance along it.
 *
 * @param mounts  positions in any one unit, stiffnesses above 0 in any one unit
 * @param weight  force, above 0
 * @returns       loads in the unit of weight, in the order of the mounts; their sum is the weight
 * @throws        outside-domain, naming the bad row; or where the frame would tip
 * @source        balance of forces and moments with sag = z0 + a x + b y
 */
export function mountLoads(mounts: readonly Mount[], weight: number, cgX: number, cgY: number): Float64Array {
  requireAbove("weight", weight, 0);
  requireFinite("centre of gravity x", cgX);
  requireFinite("centre of gravity y", cgY);
  if (mounts.length === 0) throw new NumericError("outside-domain", "a frame needs one mount or more");
  const size = layoutSize(mounts);
  let total = 0;
  let centreX = 0;
  let centreY = 0;
  for (const { stiffness } of mounts) total += stiffness / size.stiffness;
  // from the first mount, so that a far origin costs no digits
  const { x: originX, y: originY } = mounts[0];
  for (const { x, y, stiffness } of mounts) {
    const share = stiffness / size.stiffness / total;
    centreX += share * (x - originX);
    centreY += share * (y - originY);
  }
  // axes along and across the layout, through its elastic centre, in units of its size
  const shares = mounts.map((mount) => mount.stiffness / size.stiffness / total);
  const X = mounts.map((mount) => (mount.x - originX - centreX) / size.length);
  const Y = mounts.map((mount) => (mount.y - originY - centreY) / size.length);
  const swap = sum(shares, X, X) < sum(shares, Y, Y);
  const along = swap ? Y : X;
  const other = swap ? X : Y;
  const offsetX = (cgX - originX - centreX) / size.length;
  const offsetY = (cgY - originY - centreY) / size.length;
  const spread = sum(shares, along, along);
  const skew = spread > 0 ? sum(shares, along, other) / spread : 0;
  const across = other.map((value, i) => value - skew * along[i]);
  const offsetAlong = swap ? offsetY : offsetX;
  const offsetAcross = (swap ? offsetX : offsetY) - skew * offsetAlong;
  const tiltAlong = tilt(offsetAlong, spread);
  const tiltAcross = tilt(offsetAcross, sum(shares, across, across));
  return Float64Array.from(shares, (share, i) =>
    finite("mount load", weight * (share * (1 + tiltAlong * along[i] + tiltAcross * across[i]))),
  );
}

/** Tilt that balances an offset of the weight; none can where the mounts have no spread that way. */
function tilt(offset: number, spread: number): number {
  if (spread > ON_LINE * ON_LINE) return offset / spread;
  if (Math.abs(offset) <= ON_LINE) return 0;
  throw new NumericError(
    "outside-domain",
    "the mounts stand on one line and the centre of gravity is off it: the frame would tip",
  );
}

function sum(shares: readonly number[], a: readonly number[], b: readonly number[]): number {
  let total = 0;
  for (let i = 0; i < shares.length; i++) total += shares[i] * a[i] * b[i];
  return total;
}

/** Largest stiffness and extent, which scale the layout; checks each row on the way. */
function layoutSize(mounts: readonly Mount[]): { stiffness: number; length: number } {
  let stiffness = 0;
  let length = 0;
  mounts.forEach((mount, i) => {
    requireFinite(`x of mount ${i + 1}`, mount.x);
    requireFinite(`y of mount ${i + 1}`, mount.y);
    requireAbove(`stiffness of mount ${i + 1}`, mount.stiffness, 0);
    stiffness = Math.max(stiffness, mount.stiffness);
    const reach = Math.max(Math.abs(mount.x - mounts[0].x), Math.abs(mount.y - mounts[0].y));
    length = Math.max(length, finite("distance between mounts", reach));
  });
  return { stiffness, length: length > 0 ? length : 1 };
}

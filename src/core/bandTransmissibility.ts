import { finite, NumericError, requireAbove, requireAtLeast } from "./errors";
import { logRatio } from "./psd";
import { gainOf, powerOver, requireRegular } from "./randomResponse";

/**
 * Root mean square transmissibility over a fractional-octave band: sqrt of the mean of T^2, linear in frequency.
 *
 * The band reaches from fc G^(-1/2b) to fc G^(1/2b) with G = 10^(3/10), about the centre frequency as given.
 *
 * @param fc    centre frequency, any unit, above 0
 * @param fn    natural frequency, same unit, above 0
 * @param zeta  viscous damping ratio, 0 or more
 * @param bandsPerOctave b, a whole number from 1: 3 for one-third octave
 * @returns     dimensionless
 * @throws      outside-domain; pole if zeta = 0 and fn lies in the band
 * @source      band edges: IEC 61260-1, base-ten system; quadrature as in {@link randomResponseRms}
 */
export function bandTransmissibility(fc: number, fn: number, zeta: number, bandsPerOctave: number): number {
  requireAbove("centre frequency", fc, 0);
  requireAbove("natural frequency", fn, 0);
  requireAtLeast("bands per octave", bandsPerOctave, 1);
  if (!Number.isInteger(bandsPerOctave)) {
    throw new NumericError("outside-domain", `bands per octave must be a whole number, got ${bandsPerOctave}`);
  }
  const halfWidth = (0.15 * Math.LN10) / bandsPerOctave;
  const middle = logRatio(fn, fc);
  const gain = gainOf(zeta, "acceleration", "viscous");
  requireRegular(gain, middle - halfWidth, middle + halfWidth);
  // df = fc exp(v - middle) dv, so the band is 2 sinh(halfWidth) wide in units of fc
  const power = powerOver(gain, middle - halfWidth, middle + halfWidth, 2 * halfWidth, 1, -halfWidth);
  return finite("band transmissibility", Math.sqrt(power / (2 * Math.sinh(halfWidth))));
}

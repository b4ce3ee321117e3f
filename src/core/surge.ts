import { finite, requireAbove } from "./errors";
import { quotientRoot } from "./exact";

/**
 * First surge (standing wave) frequency of a helical spring between two masses much heavier than itself.
 *
 *   f = 1/2 sqrt(k/ms)
 *
 * @param k   stiffness of the spring, N/m, above 0
 * @param ms  mass of the spring itself, kg, above 0
 * @returns   Hz
 * @source    half a wave of a uniform rod clamped at both ends, whose wave speed over length is sqrt(k/ms)
 */
export function surgeFrequency(k: number, ms: number): number {
  requireAbove("stiffness", k, 0);
  requireAbove("spring mass", ms, 0);
  return finite("surge frequency", quotientRoot([k], [4, ms]));
}

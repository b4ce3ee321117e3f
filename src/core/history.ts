import { finite, requireAbove, requireAtLeast } from "./errors";
import type { Response } from "./randomResponse";
import type { AccelerationRecord } from "./record";
import { intervalOf } from "./recordStep";

/**
 * Response of a single mass on its mount at every sample of a recorded base acceleration, from rest relative to the base
 * at the first sample, exact for straight lines between samples.
 *
 * @param fn    natural frequency, Hz, above 0
 * @param zeta  viscous damping ratio, 0 or more
 * @returns     acceleration: absolute, unit of the record; deflection: z = x - u, that unit times s^2
 * @throws      outside-domain; overflow
 * @source      z'' + 2 zeta wn z' + wn^2 z = -u'' solved exactly over each interval; see recordStep.ts
 */
export function responseHistory(
  { samples, scale, timeStep }: AccelerationRecord,
  fn: number,
  zeta: number,
  response: Response,
): Float64Array {
  requireAbove("natural frequency", fn, 0);
  requireAtLeast("damping ratio", zeta, 0);
  const omega = 2 * Math.PI * fn;
  const theta = finite("natural frequency x time step", omega * timeStep);
  const { sine, step, drop, ramp, rampSlope } = intervalOf(theta, zeta, false);
  const absolute = response === "acceleration";
  const result = new Float64Array(samples.length);
  let w = 0; // -z wn^2 and its slope in radians
  let u = 0;
  for (let i = 1; i < samples.length; i++) {
    const behind = w - samples[i - 1];
    const rise = samples[i] - samples[i - 1];
    const next = w + sine * u - step * behind + ramp * rise;
    u = u - drop * u - sine * behind + rampSlope * rise;
    w = next;
    const value = absolute ? scale * (w + 2 * zeta * u) : -((w / omega) * scale) / omega;
    result[i] = finite("response", value);
  }
  return result;
}

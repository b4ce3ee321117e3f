import { finite, requireAbove, requireFinite } from "./errors";

export const PULSE_SHAPES = [
  "half-sine",
  "initial-peak sawtooth",
  "terminal-peak sawtooth",
  "triangle",
  "rectangle",
  "haversine",
  "trapezoid",
] as const;
export type PulseShape = (typeof PULSE_SHAPES)[number];

/** One stretch of a pulse of unit peak and unit duration: level + slope t, or a sine or haversine over the whole pulse. */
export type PulsePiece =
  | { form: "line"; length: number; from: number; to: number }
  | { form: "sine"; length: 1 }
  | { form: "haversine"; length: 1 };

const RISE = 0.1; // of the duration, rise and fall of the trapezoid each: IEC 60068-2-27

const line = (length: number, from: number, to: number): PulsePiece => ({ form: "line", length, from, to });

const SHAPES: Record<PulseShape, { pieces: readonly PulsePiece[]; area: number }> = {
  "half-sine": { pieces: [{ form: "sine", length: 1 }], area: 2 / Math.PI },
  "initial-peak sawtooth": { pieces: [line(1, 1, 0)], area: 0.5 },
  "terminal-peak sawtooth": { pieces: [line(1, 0, 1)], area: 0.5 },
  triangle: { pieces: [line(0.5, 0, 1), line(0.5, 1, 0)], area: 0.5 },
  rectangle: { pieces: [line(1, 1, 1)], area: 1 },
  haversine: { pieces: [{ form: "haversine", length: 1 }], area: 0.5 },
  trapezoid: { pieces: [line(RISE, 0, 1), line(1 - 2 * RISE, 1, 1), line(RISE, 1, 0)], area: 1 - RISE },
};

export function piecesOf(shape: PulseShape): readonly PulsePiece[] {
  return SHAPES[shape].pieces;
}

/** Area of the pulse of unit peak and unit duration. */
export function areaOf(shape: PulseShape): number {
  return SHAPES[shape].area;
}

/**
 * Velocity change of a shock pulse, the area under its acceleration.
 *
 * @param peak      acceleration, m/s^2, any sign
 * @param duration  s, above 0
 * @returns         m/s, with the sign of the peak
 * @source          integral of the shape: 2/pi half-sine, 1/2 sawtooth, triangle, haversine, 1 rectangle, 0.9 trapezoid
 */
export function pulseVelocity(shape: PulseShape, peak: number, duration: number): number {
  requireFinite("peak acceleration", peak);
  requireAbove("duration", duration, 0);
  return finite("velocity change", areaOf(shape) * peak * duration);
}

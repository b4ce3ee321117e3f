/** The steady state against a general-purpose integrator of ordinary differential equations. */
import { Solver } from "../support/ode";
import { absolutePhase, relativePhase } from "../../src/core/phase";
import { absoluteTransmissibility, relativeTransmissibility } from "../../src/core/transmissibility";
import { mountForce } from "../../src/core/mount";

/**
 * Integrates m z'' + c z' + k z = -m u'', u = sin wt, m = 1, until the transient has died, and reads amplitude and lag
 * of x = u + z and of z from the Fourier sums over one period.
 */
function steadyState(f: number, fn: number, zeta: number) {
  const w = 2 * Math.PI * f;
  const wn = 2 * Math.PI * fn;
  const solver = new Solver(2);
  solver.absoluteTolerance = 1e-13;
  solver.relativeTolerance = 1e-13;
  solver.maxSteps = 1e6;
  const motion = (t: number, [z, v]: number[]) => [v, -2 * zeta * wn * v - wn * wn * z + w * w * Math.sin(w * t)];
  const decay = zeta <= 1 ? zeta : zeta - Math.sqrt(zeta * zeta - 1);
  const periods = Math.ceil((32 / (decay * wn)) * f); // exp(-32) of the transient is left
  let state = solver.solve(motion, 0, [0, 0], periods / f).y as number[];
  const samples = 64;
  let inPhase = 0;
  let quadrature = 0;
  for (let i = 0; i < samples; i++) {
    const from = (periods + i / samples) / f;
    inPhase += (2 / samples) * state[0] * Math.sin(w * from);
    quadrature -= (2 / samples) * state[0] * Math.cos(w * from);
    state = solver.solve(motion, from, state, (periods + (i + 1) / samples) / f).y as number[];
  }
  const polar = (sine: number, lagging: number) => ({
    amplitude: Math.hypot(sine, lagging),
    lag: (Math.atan2(lagging, sine) * 180) / Math.PI,
  });
  return { absolute: polar(1 + inPhase, quadrature), relative: polar(inPhase, quadrature) };
}

const cases = [
  [5, 10, 0.1],
  [9.5, 10, 0.05],
  [10, 10, 0.2],
  [14, 10, 0.1],
  [25, 10, 0.1],
  [25, 10, 0.7],
  [30, 8, 1.5],
] as const;

test.each(cases)(
  "f %p, fn %p, zeta %p: amplitudes and lags agree with the integrated motion to 1e-9",
  (f, fn, zeta) => {
    const { absolute, relative } = steadyState(f, fn, zeta);
    expect(Math.abs(absoluteTransmissibility(f, fn, zeta) / absolute.amplitude - 1)).toBeLessThan(1e-9);
    expect(Math.abs(relativeTransmissibility(f, fn, zeta) / relative.amplitude - 1)).toBeLessThan(1e-9);
    expect(Math.abs(absolutePhase(f, fn, zeta, "viscous") - absolute.lag)).toBeLessThan(1e-7);
    expect(Math.abs(relativePhase(f, fn, zeta, "viscous") - relative.lag)).toBeLessThan(1e-7);
    const force = absolute.amplitude * (2 * Math.PI * f) ** 2; // m = 1, U = 1
    expect(Math.abs(mountForce(1, f, 1, fn, zeta, "viscous") / force - 1)).toBeLessThan(1e-9);
  },
);

import { createRequire } from "node:module";
import { join } from "node:path";

type Derivative = (t: number, y: number[]) => number[];
type Watch = (t: number, y: number[]) => void;

interface Solver {
  absoluteTolerance: number;
  relativeTolerance: number;
  maxSteps: number;
  denseOutput: boolean;
  grid(step: number, watch: Watch): object;
  solve(f: Derivative, from: number, start: number[], to: number, output?: object): { y: number[] };
}

// required, not imported: the library ships TypeScript sources that do not compile under our settings
export const { Solver } = createRequire(join(process.cwd(), "package.json"))("odex") as {
  Solver: new (size: number) => Solver;
};

/** Solves y' = f(t, y) by an independent library (Gragg-Bulirsch-Stoer); `watch` sees the solution at `count` places. */
export function solveOde(
  f: Derivative,
  from: number,
  start: number[],
  to: number,
  count: number,
  watch: Watch,
): number[] {
  const solver = new Solver(start.length);
  solver.absoluteTolerance = 1e-12;
  solver.relativeTolerance = 1e-12;
  solver.maxSteps = 1e6;
  solver.denseOutput = true;
  return solver.solve(f, from, start, to, solver.grid((to - from) / count, watch)).y;
}

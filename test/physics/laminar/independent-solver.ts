import { createRequire } from "node:module";

/** The part of the npm package "odex" (E. Hairer & G. Wanner's extrapolation code) that the tests use. */
interface IndependentSolver {
  absoluteTolerance: number;
  relativeTolerance: number;
  maxSteps: number;
  solve(right: (x: number, y: number[]) => number[], x: number, y0: number[], xEnd: number): { y: number[] };
}

// Required, not imported: the package ships TypeScript source that our stricter compiler settings would refuse.
const { Solver } = createRequire(__filename)("odex") as { Solver: new (unknowns: number) => IndependentSolver };

/** State at `end`, by an integrator that shares nothing with ours. */
export function independently(right: (x: number, y: number[]) => number[], start: number[], end: number): number[] {
  const solver = new Solver(start.length);
  solver.absoluteTolerance = 1e-13;
  solver.relativeTolerance = 1e-13;
  solver.maxSteps = 100000;
  return solver.solve(right, 0, start, end).y;
}

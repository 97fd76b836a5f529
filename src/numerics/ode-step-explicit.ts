import type { OdeRight, OdeWork } from "./ode-step";

/** Coefficients of J. R. Dormand & P. J. Prince, J. Comput. Appl. Math. 6 (1980) 19–26, the pair of orders 5 and 4 (RK5(4)7M). */
const C = [0, 1 / 5, 3 / 10, 4 / 5, 8 / 9, 1];
const A = [
  [],
  [1 / 5],
  [3 / 40, 9 / 40],
  [44 / 45, -56 / 15, 32 / 9],
  [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729],
  [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656],
];
const B = [35 / 384, 0, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84];
/** Fifth-order less fourth-order weights; the seventh belongs to the slope at the end. */
const E = [71 / 57600, 0, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40];

/**
 * One explicit step of fifth order with an estimate of fourth, for equations that do not settle faster than the step is long. It costs six
 * evaluations where odeStep costs eight and two more an unknown; the slope at the end is left in `work.slope`.
 *
 * @param y state at x, not changed
 * @param h step
 * @param slope dy∕dx at x
 * @param next overwritten: state at x + h
 * @param error overwritten: estimated error of the embedded fourth order
 * @returns false where the equations do not hold somewhere in the step
 */
export function odeStepExplicit(right: OdeRight, x: number, y: Float64Array, h: number, slope: Float64Array, work: OdeWork, next: Float64Array, error: Float64Array): boolean {
  const { stage, trial } = work;
  const n = y.length;
  for (let i = 0; i < n; i += 1) stage[0][i] = slope[i];
  for (let s = 1; s < 6; s += 1) {
    const row = A[s];
    for (let i = 0; i < n; i += 1) {
      let sum = 0;
      for (let q = 0; q < s; q += 1) sum += row[q] * stage[q][i];
      trial[i] = y[i] + h * sum;
    }
    if (!right(x + C[s] * h, trial, stage[s])) return false;
  }
  for (let i = 0; i < n; i += 1) {
    let sum = 0;
    for (let q = 0; q < 6; q += 1) sum += B[q] * stage[q][i];
    next[i] = y[i] + h * sum;
  }
  if (!right(x + h, next, work.slope)) return false;
  for (let i = 0; i < n; i += 1) {
    let sum = E[6] * work.slope[i];
    for (let q = 0; q < 6; q += 1) sum += E[q] * stage[q][i];
    error[i] = h * sum;
  }
  return true;
}

/** dy∕dx at x, written into `slope`; false where the equations do not hold. */
export type OdeRight = (x: number, y: Float64Array, slope: Float64Array) => boolean;

/** Room for steps with n unknowns. */
export interface OdeWork {
  stage: Float64Array[];
  trial: Float64Array;
}

export function odeWork(n: number): OdeWork {
  return { stage: Array.from({ length: 7 }, () => new Float64Array(n)), trial: new Float64Array(n) };
}

const A = [
  [],
  [1 / 5],
  [3 / 40, 9 / 40],
  [44 / 45, -56 / 15, 32 / 9],
  [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729],
  [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656],
  [35 / 384, 0, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84],
];
const C = [0, 1 / 5, 3 / 10, 4 / 5, 8 / 9, 1, 1];
/** Fifth order less the embedded fourth. */
const E = [71 / 57600, 0, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40];

/**
 * One explicit Runge–Kutta step of fifth order with an error estimate of fourth.
 *
 * @param y state at x, not changed
 * @param h step
 * @param slope dy∕dx at x
 * @param next overwritten: state at x + h; its slope is left in `work.stage[6]`
 * @param error overwritten: estimated error of `next`
 * @returns false where the equations do not hold somewhere in the step
 *
 * Source: J. R. Dormand & P. J. Prince, J. Comp. Appl. Math. 6 (1980) 19–26, RK5(4)7M.
 */
export function odeStep(right: OdeRight, x: number, y: Float64Array, h: number, slope: Float64Array, work: OdeWork, next: Float64Array, error: Float64Array): boolean {
  const { stage, trial } = work;
  const n = y.length;
  stage[0].set(slope);
  for (let s = 1; s < 7; s += 1) {
    const to = s === 6 ? next : trial;
    for (let i = 0; i < n; i += 1) {
      let sum = 0;
      for (let k = 0; k < s; k += 1) sum += A[s][k] * stage[k][i];
      to[i] = y[i] + h * sum;
    }
    if (!right(x + C[s] * h, to, stage[s])) return false;
  }
  for (let i = 0; i < n; i += 1) {
    let sum = 0;
    for (let k = 0; k < 7; k += 1) sum += E[k] * stage[k][i];
    error[i] = h * sum;
  }
  return true;
}

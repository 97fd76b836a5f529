/** dy∕dx at x, written into `slope`; false where the equations do not hold. */
export type OdeRight = (x: number, y: Float64Array, slope: Float64Array) => boolean;

/** Room for steps with n unknowns. */
export interface OdeWork {
  stage: Float64Array[];
  trial: Float64Array;
  slope: Float64Array;
  /** ∂f∕∂x, then the matrix 1∕(γh) − ∂f∕∂y in factors, row by row, and its row order. */
  drift: Float64Array;
  matrix: Float64Array;
  order: Int32Array;
}

export function odeWork(n: number): OdeWork {
  const column = (): Float64Array => new Float64Array(n);
  return { stage: Array.from({ length: 6 }, column), trial: column(), slope: column(), drift: column(), matrix: new Float64Array(n * n), order: new Int32Array(n) };
}

const GAMMA = 0.25;
const C = [0, 0.386, 0.21, 0.63, 1, 1];
const D = [0.25, -0.1043, 0.1035, -0.0362, 0, 0];
const A = [
  [],
  [1.544],
  [0.9466785280815826, 0.2557011698983284],
  [3.314825187068521, 2.896124015972201, 0.9986419139977817],
  [1.221224509226641, 6.019134481288629, 12.53708332932087, -0.687886036105895],
];
const K = [
  [],
  [-5.6688],
  [-2.430093356833875, -0.2063599157091915],
  [-0.1073529058151375, -9.594562251023355, -20.47028614809616],
  [7.496443313967647, -10.24680431464352, -33.99990352819905, 11.7089089320616],
  [8.083246795921522, -7.981132988064893, -31.52159432874371, 16.31930543123136, -6.058818238834054],
];
/** Relative step of the differences that give the derivatives of the right-hand side: about the root of the rounding. */
const NUDGE = 1e-8;

/**
 * One step of Rosenbrock's kind, of fourth order with an estimate of third, which stays stable where an unknown settles much faster than the
 * step is long (L-stable).
 *
 * @param y state at x, not changed
 * @param h step
 * @param slope dy∕dx at x
 * @param next overwritten: state at x + h
 * @param error overwritten: estimated error of the embedded third order
 * @returns false where the equations do not hold somewhere in the step
 *
 * Source: E. Hairer & G. Wanner, Solving Ordinary Differential Equations II, 1996, section IV.7 and VI.4: RODAS (coefficients from memory;
 * order and stability are tested).
 */
export function odeStep(right: OdeRight, x: number, y: Float64Array, h: number, slope: Float64Array, work: OdeWork, next: Float64Array, error: Float64Array): boolean {
  const { stage, trial, drift } = work;
  const n = y.length;
  if (!prepare(right, x, y, h, slope, work)) return false;
  for (let s = 0; s < 6; s += 1) {
    const k = stage[s];
    if (s === 0) k.set(slope);
    else {
      if (s < 5) {
        for (let i = 0; i < n; i += 1) {
          let sum = y[i];
          for (let q = 0; q < s; q += 1) sum += A[s][q] * stage[q][i];
          trial[i] = sum;
        }
      } else for (let i = 0; i < n; i += 1) trial[i] += stage[4][i];
      if (!right(x + C[s] * h, trial, k)) return false;
    }
    for (let i = 0; i < n; i += 1) {
      let sum = k[i] + h * D[s] * drift[i];
      for (let q = 0; q < s; q += 1) sum += (K[s][q] / h) * stage[q][i];
      k[i] = sum;
    }
    solve(work, k, n);
  }
  for (let i = 0; i < n; i += 1) {
    next[i] = trial[i] + stage[5][i];
    error[i] = stage[5][i];
  }
  return true;
}

/** Derivatives by differences, and the matrix in factors. */
function prepare(right: OdeRight, x: number, y: Float64Array, h: number, slope: Float64Array, work: OdeWork): boolean {
  const { drift, matrix, order, trial } = work;
  const n = y.length;
  const ahead = h * NUDGE ** 0.5;
  if (!right(x + ahead, y, drift)) return false;
  for (let i = 0; i < n; i += 1) drift[i] = (drift[i] - slope[i]) / ahead;
  trial.set(y);
  for (let c = 0; c < n; c += 1) {
    const nudge = NUDGE * Math.max(Math.abs(y[c]), Math.abs(h * slope[c]), Number.MIN_VALUE / NUDGE);
    trial[c] = y[c] + nudge;
    if (!right(x, trial, work.slope)) return false;
    for (let r = 0; r < n; r += 1) matrix[r * n + c] = (r === c ? 1 / (GAMMA * h) : 0) - (work.slope[r] - slope[r]) / nudge;
    trial[c] = y[c];
  }
  for (let c = 0; c < n; c += 1) {
    let best = c;
    for (let r = c + 1; r < n; r += 1) if (Math.abs(matrix[r * n + c]) > Math.abs(matrix[best * n + c])) best = r;
    order[c] = best;
    if (best !== c) {
      for (let k = 0; k < n; k += 1) {
        const hold = matrix[c * n + k];
        matrix[c * n + k] = matrix[best * n + k];
        matrix[best * n + k] = hold;
      }
    }
    if (!(Math.abs(matrix[c * n + c]) > 0)) return false;
    for (let r = c + 1; r < n; r += 1) {
      const factor = (matrix[r * n + c] /= matrix[c * n + c]);
      for (let k = c + 1; k < n; k += 1) matrix[r * n + k] -= factor * matrix[c * n + k];
    }
  }
  return true;
}

function solve(work: OdeWork, b: Float64Array, n: number): void {
  const { matrix, order } = work;
  for (let c = 0; c < n; c += 1) {
    const hold = b[c];
    b[c] = b[order[c]];
    b[order[c]] = hold;
  }
  for (let r = 1; r < n; r += 1) for (let k = 0; k < r; k += 1) b[r] -= matrix[r * n + k] * b[k];
  for (let r = n - 1; r >= 0; r -= 1) {
    for (let k = r + 1; k < n; k += 1) b[r] -= matrix[r * n + k] * b[k];
    b[r] /= matrix[r * n + r];
  }
}

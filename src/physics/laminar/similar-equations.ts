import type { BlockElimination } from "../../numerics/block-elimination";
import { blockElimination } from "../../numerics/block-elimination";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";

/** A solution of the similar-layer equation on an even grid: per node f, u = f′, v = f″; and β. */
export interface SimilarNodes {
  /** Grid step in Hartree's η. */
  step: number;
  beta: number;
  /** f, u, v of node 0, then of node 1, … */
  y: Float64Array;
}

/** What is held besides f(0) and f′(0) = 0: the gradient β, or the defect thickness ∫(1 − u)dη (β then follows), or f″(0) = 0. */
export type SimilarHold = { beta: number } | { defect: number } | { incipient: true };

const UNKNOWNS = 4;
/** Newton converges quadratically: past this many turns it is not going to. */
const MOST_TURNS = 14;
/** Change of a turn below which the next one would only stir rounding. */
const SETTLED = 1e-11;
/** A change larger than this at any node means that the start is too far away to trust Newton's direction. */
const WILD = 1e3;

/**
 * Solves f‴ + f f″ + β(1 − f′²) = 0, f(0) = wall, f′(0) = 0, f′(∞) = 1 from a start nearby, by Newton's method on the two-point
 * formula of sixth order y₁ − y₀ = h(y₀′ + y₁′)/2 + h²(y₀″ − y₁″)/10 + h³(y₀‴ + y₁‴)/120.
 *
 * @param start nodes to begin with; not changed
 * @param wall f(0): above 0 suction, below 0 blowing
 * @param hold what is held
 * @returns the nodes; "no convergence" where Newton's method does not settle
 *
 * Source: V. M. Falkner & S. W. Skan (1930), D. R. Hartree (1937) for the equation; the two-point formula is Hermite's.
 */
export function solveSimilarNodes(start: SimilarNodes, wall: number, hold: SimilarHold): Outcome<{ nodes: SimilarNodes; turns: number }> {
  const count = start.y.length / 3;
  const left = "defect" in hold ? 2 : 3;
  const chain = blockElimination(UNKNOWNS, left, count);
  const y = start.y.slice();
  let beta = "beta" in hold ? hold.beta : start.beta;
  const near = new Float64Array(16);
  const far = new Float64Array(16);
  let sizeBefore = Infinity;
  for (let turn = 1; turn <= MOST_TURNS; turn += 1) {
    if (!sweep(chain, y, beta, start.step, wall, hold, near, far)) return refuse("no convergence", { values: { count: turn } });
    let size = 0;
    for (let j = 0; j < count; j += 1) for (let k = 0; k < 3; k += 1) size = Math.max(size, Math.abs(chain.solution[4 * j + k]));
    size = Math.max(size, Math.abs(chain.solution[3]));
    if (!(size < WILD)) return refuse("no convergence", { values: { count: turn } });
    for (let j = 0; j < count; j += 1) for (let k = 0; k < 3; k += 1) y[3 * j + k] += chain.solution[4 * j + k];
    beta += chain.solution[3];
    if (size < SETTLED || (size < 1e-8 && size > sizeBefore / 4)) return { ok: true, nodes: { step: start.step, beta, y }, turns: turn };
    sizeBefore = size;
  }
  return refuse("no convergence", { values: { count: MOST_TURNS } });
}

/** One Newton turn: rows of all intervals and of both ends, eliminated. */
function sweep(chain: BlockElimination, y: Float64Array, beta: number, h: number, wall: number, hold: SimilarHold, near: Float64Array, far: Float64Array): boolean {
  const { rows, width, left } = chain;
  const count = y.length / 3;
  rows.fill(0);
  rows[0] = 1;
  rows[8] = wall - y[0];
  rows[width + 1] = 1;
  rows[width + 8] = -y[1];
  if ("beta" in hold) {
    rows[2 * width + 3] = 1;
    rows[2 * width + 8] = hold.beta - beta;
  } else if ("incipient" in hold) {
    rows[2 * width + 2] = 1;
    rows[2 * width + 8] = -y[2];
  }
  chain.begin();
  derivatives(y, 0, beta, near);
  for (let j = 0; j + 1 < count; j += 1) {
    derivatives(y, 3 * (j + 1), beta, far);
    intervalRows(rows, left * width, width, y, 3 * j, h, near, far);
    if (!chain.push()) return false;
    near.set(far);
  }
  const last = y.length - 3;
  const at = left * width;
  for (let k = 0; k < (UNKNOWNS - left) * width; k += 1) rows[at + k] = 0;
  rows[at + 1] = 1;
  rows[at + 8] = 1 - y[last + 1];
  if ("defect" in hold) {
    rows[at + width] = 1;
    rows[at + width + 8] = (count - 1) * h + wall - hold.defect - y[last];
  }
  return chain.finish();
}

/** G = f‴ and its first two derivatives, each with its derivatives by f, u, v, β (5 numbers each: value first). */
function derivatives(y: Float64Array, at: number, beta: number, out: Float64Array): void {
  const f = y[at];
  const u = y[at + 1];
  const v = y[at + 2];
  const b1 = 2 * beta - 1;
  const b2 = 2 * beta - 2;
  const g = -f * v - beta * (1 - u * u);
  const gu = 2 * beta * u;
  const gb = u * u - 1;
  const p = b1 * u * v - f * g;
  const pf = -g + f * v;
  const pu = b1 * v - f * gu;
  const pv = b1 * u + f * f;
  const pb = 2 * u * v - f * gb;
  out[0] = g;
  out[1] = -v;
  out[2] = gu;
  out[3] = -f;
  out[4] = gb;
  out[5] = p;
  out[6] = pf;
  out[7] = pu;
  out[8] = pv;
  out[9] = pb;
  out[10] = b1 * v * v + b2 * u * g - f * p;
  out[11] = -b2 * u * v - p - f * pf;
  out[12] = b2 * (g + u * gu) - f * pu;
  out[13] = 2 * b1 * v - b2 * u * f - f * pv;
  out[14] = 2 * v * v + 2 * u * g + b2 * u * gb - f * pb;
}

/** The four rows of one interval: Hermite's formula for f, u, v; β the same at both ends. */
function intervalRows(rows: Float64Array, at: number, width: number, y: Float64Array, j: number, h: number, a: Float64Array, b: Float64Array): void {
  const h1 = h / 2;
  const h2 = (h * h) / 10;
  const h3 = (h * h * h) / 120;
  const f = at;
  const u = at + width;
  const v = at + 2 * width;
  const same = at + 3 * width;
  for (let k = 0; k < 4; k += 1) {
    const one = (c: number): number => (k === c ? 1 : 0);
    rows[f + k] = -one(0) - h1 * one(1) - h2 * one(2) - h3 * a[1 + k];
    rows[f + 4 + k] = one(0) - h1 * one(1) + h2 * one(2) - h3 * b[1 + k];
    rows[u + k] = -one(1) - h1 * one(2) - h2 * a[1 + k] - h3 * a[6 + k];
    rows[u + 4 + k] = one(1) - h1 * one(2) + h2 * b[1 + k] - h3 * b[6 + k];
    rows[v + k] = -one(2) - h1 * a[1 + k] - h2 * a[6 + k] - h3 * a[11 + k];
    rows[v + 4 + k] = one(2) - h1 * b[1 + k] + h2 * b[6 + k] - h3 * b[11 + k];
    rows[same + k] = -one(3);
    rows[same + 4 + k] = one(3);
  }
  rows[f + 8] = -(y[j + 3] - y[j] - h1 * (y[j + 1] + y[j + 4]) - h2 * (y[j + 2] - y[j + 5]) - h3 * (a[0] + b[0]));
  rows[u + 8] = -(y[j + 4] - y[j + 1] - h1 * (y[j + 2] + y[j + 5]) - h2 * (a[0] - b[0]) - h3 * (a[5] + b[5]));
  rows[v + 8] = -(y[j + 5] - y[j + 2] - h1 * (a[0] + b[0]) - h2 * (a[5] - b[5]) - h3 * (a[10] + b[10]));
  rows[same + 8] = 0;
}

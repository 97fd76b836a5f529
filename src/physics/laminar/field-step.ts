import type { BlockElimination } from "../../numerics/block-elimination";
import { blockElimination } from "../../numerics/block-elimination";

/** A velocity profile on the nodes of a grid across the layer: f, u = f′, v = f″ with ψ = r ue Δ f, η = y∕Δ. */
export interface FieldProfile {
  f: Float64Array;
  u: Float64Array;
  v: Float64Array;
}

/** The coefficients of one step at its middle: f‴ + a f f″ + b (1 − f′²) = c (f′ ∂f′∕∂x − f″ ∂f∕∂x). */
export interface StepCoefficients {
  /** Δ (r ue Δ)′ ∕ (r ν) and Δ² ue′∕ν. */
  a: number;
  b: number;
  /** (ue Δ²∕ν) over the distance from the last profile to the place where the equation is met. */
  rate: number;
  /** f(0) there. */
  wall: number;
}

/** Room for a march's repeated solutions; sized once. */
export interface StepWork {
  chain: BlockElimination;
  near: Float64Array;
  far: Float64Array;
}

/** Newton's method converges quadratically: a change below this leaves an error of its square. */
const SETTLED = 2e-5;
/** More turns mean that the step is too long, or that separation stands in the way. */
const MOST_TURNS = 8;
/** A change this large means that Newton's direction is not to be trusted. */
const WILD = 50;

export function stepWork(mostNodes: number): StepWork {
  return { chain: blockElimination(3, 2, mostNodes), near: new Float64Array(8), far: new Float64Array(8) };
}

/**
 * Solves the profile at the middle of a step by Newton's method on the two-point formula of fourth order
 * y₁ − y₀ = h(y₀′ + y₁′)∕2 + h²(y₀″ − y₁″)∕12, which needs no more nodes' neighbours than Keller's box.
 *
 * @param eta heights of the nodes
 * @param count nodes in use
 * @param before profile at the start of the step
 * @param middle first guess, overwritten by the solution
 * @returns turns used, 0 when the method does not settle
 */
export function solveStep(work: StepWork, eta: Float64Array, count: number, before: FieldProfile, middle: FieldProfile, at: StepCoefficients): number {
  const { chain } = work;
  const { f, u, v } = middle;
  let sizeBefore = Infinity;
  for (let turn = 1; turn <= MOST_TURNS; turn += 1) {
    if (!sweep(work, eta, count, before, middle, at)) return 0;
    const y = chain.solution;
    let size = 0;
    for (let j = 0; j < count; j += 1) {
      f[j] += y[3 * j];
      u[j] += y[3 * j + 1];
      v[j] += y[3 * j + 2];
      const change = Math.abs(y[3 * j + 2]) + Math.abs(y[3 * j + 1]);
      if (change > size) size = change;
    }
    if (!(size < WILD)) return 0;
    if (size < SETTLED) return turn;
    if (turn > 3 && size > sizeBefore) return 0;
    sizeBefore = size;
  }
  return 0;
}

function sweep(work: StepWork, eta: Float64Array, count: number, before: FieldProfile, middle: FieldProfile, at: StepCoefficients): boolean {
  const { chain } = work;
  const { rows } = chain;
  const { f, u, v } = middle;
  let a = work.near;
  let b = work.far;
  rows.fill(0, 0, 14);
  rows[0] = 1;
  rows[6] = at.wall - f[0];
  rows[8] = 1;
  rows[13] = -u[0];
  chain.begin();
  bend(before, middle, 0, at, a);
  for (let j = 0; j + 1 < count; j += 1) {
    const k = j + 1;
    bend(before, middle, k, at, b);
    const h = eta[k] - eta[j];
    const h1 = h / 2;
    const h2 = (h * h) / 12;
    rows[14] = -1;
    rows[15] = -h1;
    rows[16] = -h2;
    rows[17] = 1;
    rows[18] = -h1;
    rows[19] = h2;
    rows[20] = f[j] - f[k] + h1 * (u[j] + u[k]) + h2 * (v[j] - v[k]);
    rows[21] = -h2 * a[1];
    rows[22] = -1 - h2 * a[2];
    rows[23] = -h1 - h2 * a[3];
    rows[24] = h2 * b[1];
    rows[25] = 1 + h2 * b[2];
    rows[26] = -h1 + h2 * b[3];
    rows[27] = u[j] - u[k] + h1 * (v[j] + v[k]) + h2 * (a[0] - b[0]);
    rows[28] = -h1 * a[1] - h2 * a[5];
    rows[29] = -h1 * a[2] - h2 * a[6];
    rows[30] = -1 - h1 * a[3] - h2 * a[7];
    rows[31] = -h1 * b[1] + h2 * b[5];
    rows[32] = -h1 * b[2] + h2 * b[6];
    rows[33] = 1 - h1 * b[3] + h2 * b[7];
    rows[34] = v[j] - v[k] + h1 * (a[0] + b[0]) + h2 * (a[4] - b[4]);
    if (!chain.push()) return false;
    const hold = a;
    a = b;
    b = hold;
  }
  rows[14] = 0;
  rows[15] = 1;
  rows[16] = 0;
  rows[20] = 1 - u[count - 1];
  return chain.finish();
}

/** G = f‴ and P = G′ at a node, each with its derivatives by f, u, v. */
function bend(before: FieldProfile, middle: FieldProfile, j: number, at: StepCoefficients, out: Float64Array): void {
  const { a, b, rate } = at;
  const u = middle.u[j];
  const v = middle.v[j];
  const f = middle.f[j];
  const climb = v - before.v[j];
  const carry = -a * f - rate * (f - before.f[j]);
  const mix = 2 * b - a;
  const g = carry * v - b * (1 - u * u) + rate * u * (u - before.u[j]);
  const gf = -(a + rate) * v;
  const gu = 2 * b * u + rate * (2 * u - before.u[j]);
  out[0] = g;
  out[1] = gf;
  out[2] = gu;
  out[3] = carry;
  out[4] = mix * u * v + carry * g + rate * u * climb;
  out[5] = -(a + rate) * g + carry * gf;
  out[6] = mix * v + carry * gu + rate * climb;
  out[7] = (mix + rate) * u + carry * carry;
}

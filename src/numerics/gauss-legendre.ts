import type { Outcome } from "./outcome";
import { refuse } from "./outcome";

/** Newton steps allowed a node; from the cosine guess three to five are enough for any n. */
const MOST_STEPS = 20;

/**
 * Nodes and weights of Gauss–Legendre quadrature on −1 … 1, exact for polynomials up to degree 2n − 1.
 *
 * @param n number of nodes, a whole number ≥ 1
 * @returns nodes in rising order and their weights (which add up to 2)
 *
 * Source: M. Abramowitz & I. Stegun, Handbook of Mathematical Functions, 25.4.29–30; nodes by Newton's method on P_n.
 */
export function gaussLegendre(n: number): Outcome<{ node: Float64Array; weight: Float64Array }> {
  if (!Number.isInteger(n) || n < 1) return refuse("outside range", { argument: "n", values: { value: n, least: 1, most: Infinity } });
  const node = new Float64Array(n);
  const weight = new Float64Array(n);
  for (let i = 0; i < (n + 1) >> 1; i += 1) {
    let z = Math.cos((Math.PI * (i + 0.75)) / (n + 0.5));
    let slope = 0;
    let settled = false;
    for (let step = 0; step < MOST_STEPS && !settled; step += 1) {
      const [p, dp] = legendre(n, z);
      slope = dp;
      const change = p / dp;
      z -= change;
      settled = Math.abs(change) <= 2 * Number.EPSILON;
      if (settled) slope = legendre(n, z)[1];
    }
    if (!settled) return refuse("no convergence", { argument: "n", values: { value: n, count: MOST_STEPS } });
    if (2 * i + 1 === n) z = 0;
    node[i] = -z;
    node[n - 1 - i] = z;
    weight[i] = weight[n - 1 - i] = 2 / ((1 - z * z) * slope * slope);
  }
  return { ok: true, node, weight };
}

/** P_n and its derivative by the three-term recurrence. */
function legendre(n: number, z: number): [number, number] {
  let before = 1;
  let p = z;
  for (let k = 2; k <= n; k += 1) {
    const next = ((2 * k - 1) * z * p - (k - 1) * before) / k;
    before = p;
    p = next;
  }
  return [p, (n * (before - z * p)) / (1 - z * z)];
}

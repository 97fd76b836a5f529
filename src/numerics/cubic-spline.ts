import { checkColumns, checkFinite } from "./check-column";
import type { Outcome } from "./outcome";
import type { PiecewiseCubic } from "./piecewise-cubic";

/**
 * The smooth curve through all points: a cubic spline with continuous second derivative and no knot at the second and the last
 * but one point ("not-a-knot"), so that it reproduces any cubic and keeps its order of accuracy up to both ends.
 *
 * @param x stations, n ≥ 2, strictly rising
 * @param v values at the stations, same length
 * @returns the curve; two points give the straight line, three the parabola, four the cubic through them
 *
 * Source: C. de Boor, A Practical Guide to Splines, 1978, ch. IV (the system for the slopes; from memory).
 */
export function cubicSpline(x: Float64Array, v: Float64Array): Outcome<{ curve: PiecewiseCubic }> {
  const bad = checkColumns(x, v, 2);
  if (bad) return bad;
  const slope = x.length === 2 ? chordSlopes(x, v) : x.length === 3 ? parabolaSlopes(x, v) : notAKnotSlopes(x, v);
  // Finite columns so large or so steep that the slopes overflow.
  const overflow = checkFinite(slope, "v");
  if (overflow) return overflow;
  return { ok: true, curve: { x: x.slice(), value: v.slice(), slope } };
}

function chordSlopes(x: Float64Array, v: Float64Array): Float64Array {
  return new Float64Array(2).fill((v[1] - v[0]) / (x[1] - x[0]));
}

function parabolaSlopes(x: Float64Array, v: Float64Array): Float64Array {
  const d0 = (v[1] - v[0]) / (x[1] - x[0]);
  const d1 = (v[2] - v[1]) / (x[2] - x[1]);
  const second = (d1 - d0) / (x[2] - x[0]);
  return Float64Array.of(d0 - second * (x[1] - x[0]), d0 + second * (x[1] - x[0]), d1 + second * (x[2] - x[1]));
}

/** Continuity of the second derivative at inner knots and of the third at the second and last but one: a tridiagonal system. */
function notAKnotSlopes(x: Float64Array, v: Float64Array): Float64Array {
  const n = x.length;
  const m = n - 1;
  const h = (i: number): number => x[i + 1] - x[i];
  const d = (i: number): number => (v[i + 1] - v[i]) / h(i);
  const slope = new Float64Array(n);
  const upper = new Float64Array(n); // upper diagonal after elimination
  // First row: h1 s0 + (h0+h1) s1.
  let h0 = h(0);
  let h1 = h(1);
  upper[0] = (h0 + h1) / h1;
  slope[0] = ((h0 + 2 * (h0 + h1)) * h1 * d(0) + h0 * h0 * d(1)) / (h0 + h1) / h1;
  // Inner rows: h_i s_{i-1} + 2 (h_{i-1}+h_i) s_i + h_{i-1} s_{i+1} = 3 (h_i d_{i-1} + h_{i-1} d_i).
  for (let i = 1; i < m; i += 1) {
    h0 = h(i - 1);
    h1 = h(i);
    const pivot = 2 * (h0 + h1) - h1 * upper[i - 1];
    upper[i] = h0 / pivot;
    slope[i] = (3 * (h1 * d(i - 1) + h0 * d(i)) - h1 * slope[i - 1]) / pivot;
  }
  // Last row mirrors the first: (h0+h1) s_{m-1} + h0 s_m.
  h0 = h(m - 2);
  h1 = h(m - 1);
  const right = (h1 * h1 * d(m - 2) + (2 * (h0 + h1) + h1) * h0 * d(m - 1)) / (h0 + h1);
  slope[m] = (right - (h0 + h1) * slope[m - 1]) / (h0 - (h0 + h1) * upper[m - 1]);
  for (let i = m - 1; i >= 0; i -= 1) slope[i] -= upper[i] * slope[i + 1];
  return slope;
}

import type { Outcome } from "./outcome";
import { refuse } from "./outcome";

/** A curve made of one cubic a panel, held by its values and slopes at the knots (Hermite form). */
export interface PiecewiseCubic {
  /** Knots, strictly rising, n ≥ 2. */
  readonly x: Float64Array;
  /** Value at each knot. */
  readonly value: Float64Array;
  /** Slope at each knot. */
  readonly slope: Float64Array;
}

/**
 * Value, slope and second derivative of the curve at one place inside its column.
 *
 * @param curve the curve
 * @param at place, between the first and the last knot; anywhere else is refused ("outside column"), never extrapolated
 * @returns value, slope, second derivative and the panel (0 … n−2) that holds the place. At an inner knot the second
 *   derivative is that of the panel to the right.
 */
export function cubicAt(
  curve: PiecewiseCubic,
  at: number,
): Outcome<{ value: number; slope: number; second: number; panel: number }> {
  const { x } = curve;
  const last = x.length - 1;
  if (!(at >= x[0] && at <= x[last])) {
    return refuse("outside column", { argument: "x", at, values: { value: at, least: x[0], most: x[last] } });
  }
  const panel = panelOf(x, at);
  const t = (at - x[panel]) / (x[panel + 1] - x[panel]);
  return {
    ok: true,
    value: panelValue(curve, panel, t),
    slope: panelSlope(curve, panel, t),
    second: panelSecond(curve, panel, t),
    panel,
  };
}

/** The panel i (0 … n−2) with x[i] ≤ at < x[i+1]; the last panel also holds its right end. Bisection, O(log n). */
export function panelOf(x: Float64Array, at: number): number {
  let low = 0;
  let high = x.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (x[middle] <= at) low = middle;
    else high = middle;
  }
  return low;
}

/** Value in panel i at the fraction t (0 … 1) of its width; exact at both knots. */
export function panelValue(curve: PiecewiseCubic, i: number, t: number): number {
  if (t === 1) return curve.value[i + 1];
  const h = curve.x[i + 1] - curve.x[i];
  const s0 = curve.slope[i];
  const s1 = curve.slope[i + 1];
  const chord = (curve.value[i + 1] - curve.value[i]) / h;
  return curve.value[i] + h * t * (s0 + t * (3 * chord - 2 * s0 - s1 + t * (s0 + s1 - 2 * chord)));
}

/** Slope in panel i at the fraction t (0 … 1) of its width; exact at both knots. */
export function panelSlope(curve: PiecewiseCubic, i: number, t: number): number {
  if (t === 1) return curve.slope[i + 1];
  const h = curve.x[i + 1] - curve.x[i];
  const s0 = curve.slope[i];
  const s1 = curve.slope[i + 1];
  const chord = (curve.value[i + 1] - curve.value[i]) / h;
  return s0 + t * (2 * (3 * chord - 2 * s0 - s1) + t * 3 * (s0 + s1 - 2 * chord));
}

/** Second derivative in panel i at the fraction t (0 … 1) of its width. */
export function panelSecond(curve: PiecewiseCubic, i: number, t: number): number {
  const h = curve.x[i + 1] - curve.x[i];
  const s0 = curve.slope[i];
  const s1 = curve.slope[i + 1];
  const chord = (curve.value[i + 1] - curve.value[i]) / h;
  return (2 * (3 * chord - 2 * s0 - s1) + 6 * t * (s0 + s1 - 2 * chord)) / h;
}

/** Running integral of the curve from its first knot to each knot; exact for the curve. */
export function runningIntegral(curve: PiecewiseCubic): Float64Array {
  const { x, value, slope } = curve;
  const sum = new Float64Array(x.length);
  for (let i = 0; i + 1 < x.length; i += 1) {
    const h = x[i + 1] - x[i];
    sum[i + 1] = sum[i] + (h / 2) * (value[i] + value[i + 1]) + ((h * h) / 12) * (slope[i] - slope[i + 1]);
  }
  return sum;
}

/**
 * The least value of the cubic in panel i and the fraction of the width where it is reached, ends included.
 * Found from the roots of the slope's quadratic, not by sampling.
 */
export function panelLeast(curve: PiecewiseCubic, i: number): { value: number; t: number } {
  let best = { value: curve.value[i], t: 0 };
  if (curve.value[i + 1] < best.value) best = { value: curve.value[i + 1], t: 1 };
  const h = curve.x[i + 1] - curve.x[i];
  const s0 = curve.slope[i];
  const s1 = curve.slope[i + 1];
  const chord = (curve.value[i + 1] - curve.value[i]) / h;
  for (const t of quadraticRoots(3 * (s0 + s1 - 2 * chord), 2 * (3 * chord - 2 * s0 - s1), s0)) {
    if (t > 0 && t < 1) {
      const value = panelValue(curve, i, t);
      if (value < best.value) best = { value, t };
    }
  }
  return best;
}

/** Real roots of a t² + b t + c, computed without cancellation. */
function quadraticRoots(a: number, b: number, c: number): number[] {
  if (a === 0) return b === 0 ? [] : [-c / b];
  const discriminant = b * b - 4 * a * c;
  if (discriminant < 0) return [];
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(discriminant)) / 2;
  return q === 0 ? [0] : [q / a, c / q];
}

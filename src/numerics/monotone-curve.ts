import { checkColumns, checkFinite } from "./check-column";
import type { Outcome } from "./outcome";
import type { PiecewiseCubic } from "./piecewise-cubic";

/**
 * The curve through all points that rises and falls only where the points do: no overshoot between stations, at the price of a
 * second derivative that jumps at the stations.
 *
 * @param x stations, n ≥ 2, strictly rising
 * @param v values at the stations, same length
 * @returns the curve; between two stations it never leaves the interval of their two values
 *
 * Source: F. N. Fritsch & R. E. Carlson, SIAM J. Numer. Anal. 17 (1980) 238–246: slopes from the parabola through three
 * points, then limited to the circle α² + β² ≤ 9 (region M₂, section 4; from memory).
 */
export function monotoneCurve(x: Float64Array, v: Float64Array): Outcome<{ curve: PiecewiseCubic }> {
  const bad = checkColumns(x, v, 2);
  if (bad) return bad;
  const n = x.length;
  const slope = new Float64Array(n);
  if (n === 2) {
    slope.fill((v[1] - v[0]) / (x[1] - x[0]));
  } else {
    firstGuess(x, v, slope);
    limit(x, v, slope);
  }
  // Finite columns so large or so steep that the slopes overflow.
  const overflow = checkFinite(slope, "v");
  if (overflow) return overflow;
  return { ok: true, curve: { x: x.slice(), value: v.slice(), slope } };
}

/** Slope at each station of the parabola through it and its neighbours (one-sided at the ends). */
function firstGuess(x: Float64Array, v: Float64Array, slope: Float64Array): void {
  const n = x.length;
  for (let i = 0; i < n; i += 1) {
    const j = Math.min(Math.max(i, 1), n - 2);
    const h0 = x[j] - x[j - 1];
    const h1 = x[j + 1] - x[j];
    const d0 = (v[j] - v[j - 1]) / h0;
    const d1 = (v[j + 1] - v[j]) / h1;
    const second = (d1 - d0) / (h0 + h1);
    slope[i] = i < j ? d0 - second * h0 : i > j ? d1 + second * h1 : d0 + second * h0;
  }
}

function limit(x: Float64Array, v: Float64Array, slope: Float64Array): void {
  const n = x.length;
  for (let i = 0; i < n - 1; i += 1) {
    const d = (v[i + 1] - v[i]) / (x[i + 1] - x[i]);
    // A slope against the chord would leave the interval: set it to zero first.
    if (slope[i] * d <= 0) slope[i] = 0;
    if (slope[i + 1] * d <= 0) slope[i + 1] = 0;
    if (d === 0) continue;
    const size = Math.hypot(slope[i] / d, slope[i + 1] / d);
    if (size > 3) {
      slope[i] *= 3 / size;
      slope[i + 1] *= 3 / size;
    }
  }
}

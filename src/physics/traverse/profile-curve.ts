import { cubicSpline } from "../../numerics/cubic-spline";
import { refuse, type Outcome } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";

/** Radius of the circle of slope ratios inside which a cubic panel is monotone (Fritsch & Carlson 1980, region M₂). */
const MONOTONE_RADIUS = 3;

/**
 * The curve through a traverse: the C2 spline, its slopes limited panel by panel so that it never overshoots two neighbouring points.
 * Dense smooth profiles get the spline's fourth order; sparse or noisy ones get no swing.
 *
 * @param y heights [length], n ≥ 2, strictly rising
 * @param u speeds [speed], same length
 * @returns the curve, between neighbouring points never outside their interval
 *
 * Sources: C. de Boor, A Practical Guide to Splines (1978), ch. IV; F. N. Fritsch & R. E. Carlson, SIAM J. Numer. Anal. 17 (1980) 238–246.
 */
export function profileCurve(y: Float64Array, u: Float64Array): Outcome<{ curve: PiecewiseCubic }> {
  const spline = cubicSpline(y, u);
  if (!spline.ok) return spline;
  const slope = spline.curve.slope.slice();
  for (let i = 0; i + 1 < y.length; i++) {
    const chord = (u[i + 1]! - u[i]!) / (y[i + 1]! - y[i]!);
    if (chord === 0) {
      slope[i] = slope[i + 1] = 0;
      continue;
    }
    if (slope[i]! / chord < 0) slope[i] = 0;
    if (slope[i + 1]! / chord < 0) slope[i + 1] = 0;
    const ratio = Math.hypot(slope[i]! / chord, slope[i + 1]! / chord);
    if (ratio > MONOTONE_RADIUS) {
      slope[i]! *= MONOTONE_RADIUS / ratio;
      slope[i + 1]! *= MONOTONE_RADIUS / ratio;
    }
  }
  for (let i = 0; i < slope.length; i++) if (!Number.isFinite(slope[i]!)) return refuse("not finite", { argument: "u", row: i + 1 });
  return { ok: true, curve: { x: y.slice(), value: u.slice(), slope } };
}

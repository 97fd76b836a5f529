import { checkColumns } from "../../numerics/check-column";
import { cubicSpline } from "../../numerics/cubic-spline";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { firstNotPositive } from "./first-not-positive";

/**
 * Makes the curve of a round body's radius along its wall.
 *
 * @param x stations along the wall [length], n ≥ 2, strictly rising
 * @param radius distance of the wall from the axis [length], same length, above 0; the first may be 0 (a nose), then it must rise
 * @returns the C2 spline through the radii, above 0 everywhere beyond the nose, refused where it is not
 */
export function radiusCurve(x: Float64Array, radius: Float64Array): Outcome<{ curve: PiecewiseCubic }> {
  const bad = checkColumns(x, radius, 2, ["x", "radius"]);
  if (bad) return bad;
  for (let i = 0; i < radius.length; i += 1) {
    if (!(radius[i] > 0 || (i === 0 && radius[i] === 0))) {
      return refuse("not positive", { argument: "radius", row: i + 1, values: { value: radius[i] } });
    }
  }
  const spline = cubicSpline(x, radius);
  if (!spline.ok) return spline;
  const dip = firstNotPositive(spline.curve);
  if (dip) return refuse("not positive", { argument: "radius", row: dip.panel + 1, at: dip.at, values: { value: dip.value } });
  return { ok: true, curve: spline.curve };
}

import { checkFinite } from "../../numerics/check-column";
import { cubicSpline } from "../../numerics/cubic-spline";
import { monotoneCurve } from "../../numerics/monotone-curve";
import { refuse, type Outcome } from "../../numerics/outcome";
import { cubicAt } from "../../numerics/piecewise-cubic";

/**
 * Values of a column at other stations, by the C2 spline or the monotone curve through it.
 *
 * @param x stations [length], n ≥ 2, strictly rising
 * @param v values, same length
 * @param at new stations, any order, each between the first and the last of x; another is refused with its row ("outside column")
 * @param fit "spline" (C2, not-a-knot) or "monotone" (no overshoot)
 *
 * Sources: C. de Boor 1978; F. N. Fritsch & R. E. Carlson, SIAM J. Numer. Anal. 17 (1980) 238–246.
 */
export function restation(x: Float64Array, v: Float64Array, at: Float64Array, fit: "spline" | "monotone"): Outcome<{ values: Float64Array }> {
  const made = fit === "monotone" ? monotoneCurve(x, v) : cubicSpline(x, v);
  if (!made.ok) return made;
  const bad = checkFinite(at, "new_x");
  if (bad) return bad;
  const values = new Float64Array(at.length);
  for (let i = 0; i < at.length; i++) {
    const point = cubicAt(made.curve, at[i]!);
    if (!point.ok) return refuse("outside column", { argument: "new_x", row: i + 1, values: { value: at[i]!, least: x[0]!, most: x.at(-1)! } });
    values[i] = point.value;
  }
  return { ok: true, values };
}

import { panelLeast } from "../../numerics/piecewise-cubic";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";

/**
 * The first panel in which a curve that should be above 0 touches or crosses it, with place and value; null when there is none.
 * A first value of exactly 0 with a positive slope is allowed (stagnation point, pointed or round nose).
 */
export function firstNotPositive(curve: PiecewiseCubic): { panel: number; at: number; value: number } | null {
  const { x, value, slope } = curve;
  for (let i = 0; i + 1 < x.length; i += 1) {
    const h = x[i + 1] - x[i];
    if (i === 0 && value[0] === 0 && slope[0] > 0) {
      const t = rootBeyondStart(curve);
      if (t !== null) return { panel: 0, at: x[0] + t * h, value: 0 };
      continue;
    }
    // The control points of the cubic enclose it: all above 0 settles most panels.
    if (value[i] > 0 && value[i + 1] > 0 && value[i] + (h * slope[i]) / 3 > 0 && value[i + 1] - (h * slope[i + 1]) / 3 > 0) continue;
    const least = panelLeast(curve, i);
    if (!(least.value > 0)) return { panel: i, at: x[i] + least.t * h, value: least.value };
  }
  return null;
}

/** For a first panel that starts at 0: the least t in (0, 1] where s0 + c2 t + c3 t² = value ∕ (h t) is 0 or less, or null. */
function rootBeyondStart(curve: PiecewiseCubic): number | null {
  const h = curve.x[1] - curve.x[0];
  const chord = curve.value[1] / h;
  const s0 = curve.slope[0];
  const s1 = curve.slope[1];
  const c2 = 3 * chord - 2 * s0 - s1;
  const c3 = s0 + s1 - 2 * chord;
  const t = c3 > 0 ? -c2 / (2 * c3) : 1;
  const least = t > 0 && t < 1 ? t : 1;
  return s0 + least * (c2 + least * c3) > 0 ? null : least;
}

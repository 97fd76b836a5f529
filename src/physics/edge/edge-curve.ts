import { checkColumns } from "../../numerics/check-column";
import { cubicSpline } from "../../numerics/cubic-spline";
import { monotoneCurve } from "../../numerics/monotone-curve";
import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { smoothingSpline } from "../../numerics/smoothing-spline";
import type { NoiseOrigin } from "../../numerics/smoothing-spline";
import { firstNotPositive } from "./first-not-positive";

/** How an edge-speed column becomes a curve. */
export type EdgeFit = "spline" | "monotone" | "smooth";

/** An edge-speed column as a curve: every method reads speed and gradient from it. */
export interface EdgeCurve {
  /** The speed as one cubic a panel; `value` is the speed and `slope` its gradient at the stations. */
  curve: PiecewiseCubic;
  /** The speed is 0 at the first station (stagnation point). */
  fromStagnation: boolean;
  fit: EdgeFit;
  /** Standard deviation of the noise taken out; 0 unless fit is "smooth". */
  noise: number;
  noiseOrigin: NoiseOrigin;
}

/** Weight of a stagnation point in the smooth fit: its speed, 0, is known and not measured. */
const WEIGHT_OF_KNOWN_POINT = 1e8;

/**
 * Makes the edge curve of an edge-speed column.
 *
 * @param x stations [length], n ≥ 2, strictly rising
 * @param ue edge speed [speed], same length, above 0; the first may be 0 (stagnation point), then it must rise linearly from there
 * @param options.fit "spline" (default): through all points with continuous second derivative, no end condition imposed; "monotone":
 *   no overshoot between stations, gradient less accurate; "smooth": smoothing spline for noisy columns
 * @param options.noise standard deviation of the noise [speed], "smooth" only; omitted: found by cross-validation
 * @returns the curve, above 0 everywhere (also between stations); refused where it is not ("curve not positive": try "monotone")
 *
 * Sources: de Boor 1978 (spline); Fritsch & Carlson 1980 (monotone); Reinsch 1967, Craven & Wahba 1979 (smooth).
 */
export function edgeCurve(
  x: Float64Array,
  ue: Float64Array,
  options: { fit?: EdgeFit; noise?: number } = {},
): Outcome<{ edge: EdgeCurve }> {
  const { fit = "spline", noise } = options;
  const bad = checkColumns(x, ue, 2, ["x", "ue"]) ?? firstBadSpeed(ue);
  if (bad) return bad;
  const fromStagnation = ue[0] === 0;
  const fitted = fit === "smooth" ? smooth(x, ue, noise, fromStagnation) : plain(x, ue, fit);
  if (!fitted.ok) return { ...fitted, argument: fitted.argument === "v" ? "ue" : fitted.argument };
  const { curve, found, origin } = fitted;
  if (fromStagnation) {
    curve.value[0] = 0;
    if (!(curve.slope[0] > 0)) return refuse("stagnation not rising", { argument: "ue", row: 1, at: x[0], values: { value: curve.slope[0] } });
  }
  const dip = firstNotPositive(curve);
  if (dip) return refuse("curve not positive", { argument: "ue", row: dip.panel + 1, at: dip.at, values: { value: dip.value } });
  return { ok: true, edge: { curve, fromStagnation, fit, noise: found, noiseOrigin: origin } };
}

function firstBadSpeed(ue: Float64Array): Refusal | null {
  for (let i = 0; i < ue.length; i += 1) {
    if (!(ue[i] > 0 || (i === 0 && ue[i] === 0))) return refuse("not positive", { argument: "ue", row: i + 1, values: { value: ue[i] } });
  }
  return null;
}

type Fitted = Outcome<{ curve: PiecewiseCubic; found: number; origin: NoiseOrigin }>;

function plain(x: Float64Array, ue: Float64Array, fit: EdgeFit): Fitted {
  const made = fit === "monotone" ? monotoneCurve(x, ue) : cubicSpline(x, ue);
  return made.ok ? { ok: true, curve: made.curve, found: 0, origin: "none given" } : made;
}

function smooth(x: Float64Array, ue: Float64Array, noise: number | undefined, fromStagnation: boolean): Fitted {
  let weight: Float64Array | undefined;
  if (fromStagnation) {
    weight = new Float64Array(x.length).fill(1);
    weight[0] = WEIGHT_OF_KNOWN_POINT;
  }
  const made = smoothingSpline(x, ue, { noise, weight });
  return made.ok ? { ok: true, curve: made.curve, found: made.noise, origin: made.origin } : made;
}

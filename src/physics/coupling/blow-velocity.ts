import { checkColumns } from "../../numerics/check-column";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { Smoothed } from "../../numerics/smoothing-spline";
import { smoothingSpline } from "../../numerics/smoothing-spline";
import { radiusCurve } from "../edge/radius-curve";

/** Weight of the mass defect at a nose on the axis: it is 0 there and not measured. */
const WEIGHT_OF_KNOWN_POINT = 1e8;

/** Blow velocity along a wall with its uncertainty. */
export interface BlowVelocity {
  /** v = dm/dx, or (1/r) d(r m)/dx on a round body [speed]. */
  velocity: Float64Array;
  /** Standard error of v [speed]; 0 where no noise was given or found. */
  standardError: Float64Array;
  /** The smoothed mass defect and how it was smoothed; its curve integrates back: ∫ v dx = m₂ − m₁. */
  smoothed: Smoothed;
}

/**
 * The wall-normal speed that an inviscid calculation must be given at the wall to feel the layer: the growth of its mass defect.
 *
 * @param x stations along the wall [length], strictly rising, n ≥ 6 (n ≥ 3 with noise given, n ≥ 2 with noise 0)
 * @param massDefect m = ue δ* [speed·length], same length
 * @param options.noise standard deviation of m [speed·length]; 0: interpolate; omitted: found by generalised cross-validation
 * @param options.radius radius of a round body at the stations [length]; on the axis (first radius 0) m must be 0, and v there is 2 dm/dx
 * @returns v and its standard error at the stations
 *
 * Sources: M. J. Lighthill, J. Fluid Mech. 4 (1958) 383–392 (equivalent sources); smoothing: see smoothing-spline.ts.
 */
export function blowVelocity(
  x: Float64Array,
  massDefect: Float64Array,
  options: { noise?: number; radius?: Float64Array } = {},
): Outcome<BlowVelocity> {
  const bad = checkColumns(x, massDefect, 2, ["x", "mass_defect"]);
  if (bad) return bad;
  const radius = options.radius === undefined ? null : radiusCurve(x, options.radius);
  if (radius && !radius.ok) return radius;
  const r = radius === null ? null : radius.curve;
  const atNose = r !== null && r.value[0] === 0;
  if (atNose && massDefect[0] !== 0) return refuse("outside range", { argument: "mass_defect", row: 1, values: { value: massDefect[0], least: 0, most: 0 } });
  const weight = atNose ? new Float64Array(x.length).fill(1) : undefined;
  if (weight) weight[0] = WEIGHT_OF_KNOWN_POINT;
  const smoothed = smoothingSpline(x, massDefect, { noise: options.noise, weight });
  if (!smoothed.ok) return { ...smoothed, argument: smoothed.argument === "v" ? "mass_defect" : smoothed.argument };

  const { curve, valueError, slopeError, covariance } = smoothed;
  const velocity = curve.slope.slice();
  const standardError = slopeError.slice();
  if (r !== null) {
    for (let i = 0; i < x.length; i += 1) {
      if (i === 0 && atNose) {
        // m and r both rise linearly from the axis: m r′∕r → m′.
        velocity[0] *= 2;
        standardError[0] *= 2;
        continue;
      }
      const a = r.slope[i] / r.value[i];
      velocity[i] += a * curve.value[i];
      // Variance of m′ + a m; rounding must not make it negative.
      standardError[i] = Math.sqrt(Math.max(0, slopeError[i] ** 2 + 2 * a * covariance[i] + (a * valueError[i]) ** 2));
    }
  }
  for (let i = 0; i < x.length; i += 1) {
    if (!(Number.isFinite(velocity[i]) && Number.isFinite(standardError[i]))) return refuse("not finite", { argument: "mass_defect", row: i + 1 });
  }
  return { ok: true, velocity, standardError, smoothed };
}

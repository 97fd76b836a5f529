import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { EdgeGas, GasPlace } from "../edge/edge-gas";
import { gasPlace } from "../edge/edge-gas";

/** The speed ratio's range: beyond it the trailing edge is no trailing edge. */
const MOST_RATIO = 3;
/** H of a layer near or past separation: the formula's wake, whose H falls straight with ln ue, has no support from there on (common practice, no source). */
export const WAKE_SHAPE_LIMIT = 2.8;

/**
 * Momentum loss far downstream of one side's trailing-edge layer: θ∞ = θ (ρe∕ρ∞) (ue∕U)^((H + H∞)∕2 + 2), H∞ = 1 + (γ − 1) M∞².
 *
 * It is the wake's momentum equation integrated with Squire & Young's assumption, H falling straight with ln ue to that of a vanishing wake; the −M² of the
 * compressible equation integrates to the density ratio. With M = 0: the classic exponent (H + 5)∕2. The drag of this side is 2 θ∞ over the chord.
 *
 * @param theta θ at the trailing edge [length], ≥ 0
 * @param shape H there, with density where a Mach number is given; 1 … 2.8
 * @param speedRatio ue∕U there, > 0
 * @param gas the reference stream, its speed set to 1
 *
 * Source: H. B. Squire & A. D. Young, ARC R&M 1838 (1938).
 */
export function wakeMomentumLoss(theta: number, shape: number, speedRatio: number, gas: EdgeGas): Outcome<{ far: number }> {
  if (!(Number.isFinite(theta) && theta >= 0)) return refuse("negative", { argument: "theta", values: { value: theta } });
  if (!(shape >= 1 && shape <= WAKE_SHAPE_LIMIT + gas.mach * gas.mach)) return refuse("outside range", { argument: "shape", values: { value: shape, least: 1, most: WAKE_SHAPE_LIMIT + gas.mach * gas.mach } });
  if (!(speedRatio > 0 && speedRatio <= MOST_RATIO)) return refuse("outside range", { argument: "edge_speed_ratio", values: { value: speedRatio, least: 0, most: MOST_RATIO } });
  const place: GasPlace = { machSquare: 0, density: 1, viscosity: 1 };
  if (!gasPlace(gas, speedRatio * gas.speed, place)) return refuse("beyond vacuum", { argument: "edge_speed_ratio", values: { value: speedRatio } });
  const farShape = 1 + (gas.gamma - 1) * gas.mach * gas.mach;
  const far = theta * place.density * Math.pow(speedRatio, (shape + farShape) / 2 + 2);
  return Number.isFinite(far) ? { ok: true, far } : refuse("not finite", { argument: "theta" });
}

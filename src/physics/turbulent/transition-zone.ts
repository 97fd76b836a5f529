import { SEPARATION_GRADIENT, LARGEST_GRADIENT, thwaitesShape, thwaitesShear } from "../laminar/thwaites-relations";

/** A zone in which laminar and turbulent flow alternate: it begins at `from`, and `length` scales its intermittency. */
export interface TransitionZone {
  from: number;
  length: number;
}

/** Exponent of γ = 1 − exp(−0.412 ξ²), ξ = (x − from)∕length: Dhawan & Narasimha, J. Fluid Mech. 3 (1958) 418–436. */
const SHARPNESS = 0.412;
/** Re_λ = 5 Re_x^0.8 of the same paper. */
const LENGTH_FACTOR = 5;
const LENGTH_POWER = 0.8;
/** Beyond this intermittency the zone is over. */
export const TURBULENT_FROM = 0.99;

/**
 * The zone that begins at station x, a length `run` behind the layer's start.
 *
 * @param run distance from the start of the layer [length]
 * @param ue edge speed at x
 */
export function transitionZone(x: number, run: number, ue: number, nu: number): TransitionZone {
  const reynolds = (ue * run) / nu;
  return { from: x, length: (LENGTH_FACTOR * Math.pow(reynolds, LENGTH_POWER) * nu) / ue };
}

/** γ at station x: 0 at the onset, 0.99 at 3.34 lengths. */
export function intermittency(zone: TransitionZone, x: number): number {
  const along = (x - zone.from) / zone.length;
  return along > 0 ? -Math.expm1(-SHARPNESS * along * along) : 0;
}

/** Laminar share of shape factor and wall friction in the zone, by Thwaites' relations at the local gradient. */
export interface LaminarShare {
  shape: number;
  friction: number;
}

export function laminarShare(theta: number, speed: number, speedSlope: number, nu: number, out: LaminarShare): LaminarShare {
  const gradient = Math.min(Math.max((theta * theta * speedSlope) / nu, SEPARATION_GRADIENT), LARGEST_GRADIENT);
  out.shape = thwaitesShape(gradient);
  out.friction = (2 * nu * thwaitesShear(gradient)) / (speed * theta);
  return out;
}

import { openCall } from "../reading/call";
import { readTraverse } from "./read-traverse";

/**
 * Integrates a traverse to the momentum loss thickness θ: the momentum missing from the layer.
 * @customfunction MOMENTUM_LOSS
 * @requiresParameterAddresses
 * @param {any[][]} y Heights above the wall, rising; a wall point y = 0 with u = 0 may be left out.
 * @param {any[][]} u Speed at each height.
 * @param {any} [edge] Edge speed in one cell; or the inviscid speed at each y as a column, so that the result does not hang on where the traverse ends; omitted: found from the profile.
 * @param {any[][]} [density] Density at each height, for heated or compressible layers; omitted: constant.
 * @param {any} [wall] plane (default), or the radius of a round wall: above 0 flow outside, below 0 flow inside.
 * @param {any} [nu] Kinematic viscosity, for the law of the wall below the first point; omitted: fitted from the points too.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {number} The momentum loss thickness.
 * @family Traverse
 * @unit y length
 * @unit u speed
 * @unit edge speed
 * @unit density any
 * @unit wall length
 * @unit nu length²/time
 * @unit result length
 * @limits Profiles that reach at least 0.95 of the edge speed; a traverse that ends inside the layer gives #N/A.
 * @limits Below the first point: where the first two points lie on one ray from the wall, the no-slip point; else, where three or more points lie within a fifth of the layer height and follow the law of the wall within 3 % of the edge speed, that law fills the gap; else the no-slip point and the curve to it. TRAVERSE_TABLE tells which rule was used and what it changed.
 * @limits On Wieghardt's plate within 2.5 % of the tabulated θ from x = 0.64 m on; on DNS profiles (Balasubramanian et al. 2023) within 0.2 %; on the Blasius profile of 41 points within 1e-5.
 * @source θ = ∫ρu/ρe ue (1 − u/ue) dy: H. Schlichting & K. Gersten, Boundary-Layer Theory (from memory).
 * @source Law of the wall: D. B. Spalding, J. Appl. Mech. 28 (1961) 455–458, κ = 0.41, B = 5.0 (Coles & Hirst 1968).
 * @example =WALL.MOMENTUM_LOSS({0;0.25;0.5;0.75;1},{0;5;10;15;20},20) → 0.16666667
 * @words theta θ traverse profile integral
 */
export function momentumLoss(y: any[][], u: any[][], edge: any, density: any[][], wall: any, nu: any, invocation: CustomFunctions.Invocation): number {
  return readTraverse(openCall("MOMENTUM_LOSS", invocation), { y, u, edge, density, wall, nu }).momentumLoss;
}

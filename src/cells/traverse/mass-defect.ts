import { openCall } from "../reading/call";
import { readTraverse } from "./read-traverse";

/**
 * Integrates a traverse to the mass defect m: the volume flow (with density: mass flow) per width that the layer misses against the inviscid flow; its rise along the wall is the blow velocity.
 * @customfunction MASS_DEFECT
 * @requiresParameterAddresses
 * @param {any[][]} y Heights above the wall, rising; a wall point y = 0 with u = 0 may be left out.
 * @param {any[][]} u Speed at each height.
 * @param {any} [edge] Edge speed in one cell; or the inviscid speed at each y as a column, so that the result does not hang on where the traverse ends; omitted: found from the profile.
 * @param {any[][]} [density] Density at each height, for heated or compressible layers; omitted: constant.
 * @param {any} [wall] plane (default), or the radius of a round wall: above 0 flow outside, below 0 flow inside.
 * @param {any} [nu] Kinematic viscosity, for the law of the wall below the first point; omitted: fitted from the points too.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {number} The mass defect; speed times length, with a density column density times speed times length.
 * @family Traverse
 * @unit y length
 * @unit u speed
 * @unit edge speed
 * @unit density any
 * @unit wall length
 * @unit nu length²/time
 * @unit result speed·length
 * @limits Profiles that reach at least 0.95 of the edge speed; a traverse that ends inside the layer gives #N/A.
 * @limits Below the first point: where the first two points lie on one ray from the wall, the no-slip point; else, where three or more points lie within a fifth of the layer height and follow the law of the wall within 3 % of the edge speed, that law fills the gap; else the no-slip point and the curve to it. TRAVERSE_TABLE tells which rule was used and what it changed.
 * @limits With an inviscid-speed column as edge, moving the last point outward by half changes m by less than 0.1 %.
 * @source m = ∫(ρe ue − ρu) dy, conservation of mass; M. J. Lighthill, J. Fluid Mech. 4 (1958) 383–392 (from memory).
 * @source Law of the wall: D. B. Spalding, J. Appl. Mech. 28 (1961) 455–458, κ = 0.41, B = 5.0 (Coles & Hirst 1968).
 * @example =WALL.MASS_DEFECT({0;0.25;0.5;0.75;1},{0;5;10;15;20},20) → 10
 * @words displacement flow deficit traverse profile integral
 */
export function massDefect(y: any[][], u: any[][], edge: any, density: any[][], wall: any, nu: any, invocation: CustomFunctions.Invocation): number {
  return readTraverse(openCall("MASS_DEFECT", invocation), { y, u, edge, density, wall, nu }).massDefect;
}

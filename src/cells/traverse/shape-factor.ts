import { cellError } from "../errors/cell-error";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readTraverse } from "./read-traverse";

/**
 * Gives a shape factor of a traverse: how full the profile is and how near to separation.
 * @customfunction SHAPE_FACTOR
 * @requiresParameterAddresses
 * @param {any[][]} y Heights above the wall, rising; a wall point y = 0 with u = 0 may be left out.
 * @param {any[][]} u Speed at each height.
 * @param {any} [edge] Edge speed in one cell; or the inviscid speed at each y as a column, so that the result does not hang on where the traverse ends; omitted: found from the profile.
 * @param {any[][]} [density] Density at each height, for heated or compressible layers; omitted: constant.
 * @param {any} [wall] plane (default), or the radius of a round wall: above 0 flow outside, below 0 flow inside.
 * @param {any} [kind] H12 = δ*∕θ (default), H32 = δ3∕θ, or H1 = (δ − δ*)∕θ with δ at 0.99 of the edge speed.
 * @param {any} [nu] Kinematic viscosity, for the law of the wall below the first point; omitted: fitted from the points too.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {number} The shape factor.
 * @family Traverse
 * @unit y length
 * @unit u speed
 * @unit edge speed
 * @unit density any
 * @unit wall length
 * @unit nu length²/time
 * @unit kind text
 * @unit result 1
 * @limits Profiles that reach at least 0.95 of the edge speed; a traverse that ends inside the layer gives #N/A.
 * @limits Below the first point: where the first two points lie on one ray from the wall, the no-slip point; else, where three or more points lie within a fifth of the layer height and follow the law of the wall within 3 % of the edge speed, that law fills the gap; else the no-slip point and the curve to it. TRAVERSE_TABLE tells which rule was used and what it changed.
 * @limits H12 on DNS profiles (Balasubramanian et al. 2023) within 0.2 %. H1 hangs on the layer height, which a sparse outer traverse fixes badly.
 * @source H12, H32: H. Schlichting & K. Gersten, Boundary-Layer Theory (from memory); H1: M. R. Head, ARC R&M 3152 (1958).
 * @example =WALL.SHAPE_FACTOR({0;0.25;0.5;0.75;1},{0;5;10;15;20},20) → 3
 * @words H12 H32 H1 form parameter profile
 */
export function shapeFactor(y: any[][], u: any[][], edge: any, density: any[][], wall: any, kind: any, nu: any, invocation: CustomFunctions.Invocation): number {
  const call = openCall("SHAPE_FACTOR", invocation);
  const chosen = readOptionalChoice(call, "kind", kind, ["H12", "H32", "H1"]) ?? "H12";
  const traverse = readTraverse(call, { y, u, edge, density, wall, nu });
  if (chosen === "H12") return traverse.shape;
  if (chosen === "H32") return traverse.energyShape;
  if (traverse.entrainmentShape === undefined) throw cellError("#N/A", "SHAPE_FACTOR needs a profile that reaches 0.99 of the edge speed for H1; this one does not");
  return traverse.entrainmentShape;
}

import { layerHeight as heightOf } from "../../physics/traverse/layer-height";
import { findEdge } from "../../physics/traverse/find-edge";
import { profileCurve } from "../../physics/traverse/profile-curve";
import { refuse } from "../../numerics/outcome";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readOptionalNumber } from "../reading/read-value";
import { readEdge } from "./read-traverse";

const DEFAULT_FRACTION = 0.99;

/**
 * Finds the height at which a traverse first reaches a fraction of the edge speed.
 * @customfunction LAYER_HEIGHT
 * @requiresParameterAddresses
 * @param {any[][]} y Heights above the wall, rising.
 * @param {any[][]} u Speed at each height.
 * @param {any} [fraction] Fraction of the edge speed, above 0 and below 1; default 0.99.
 * @param {any} [edge] Edge speed in one cell, or the inviscid speed at each y as a column; omitted: found from the profile.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {number} The height, between two points by the curve through them.
 * @family Traverse
 * @unit y length
 * @unit u speed
 * @unit fraction 1
 * @unit edge speed
 * @unit result length
 * @limits The traverse must reach the fraction; below its first point nothing is guessed (#N/A).
 * @limits Near 0.99 the profile is flat: 0.1 % of error in the edge speed moves the height by some per cent. Thicknesses say more.
 * @source H. Schlichting & K. Gersten, Boundary-Layer Theory (δ99; from memory).
 * @example =WALL.LAYER_HEIGHT({0;0.25;0.5;0.75;1},{0;5;10;15;20},0.5,20) → 0.5
 * @words delta99 δ thickness edge
 */
export function layerHeight(y: any[][], u: any[][], fraction: any, edge: any, invocation: CustomFunctions.Invocation): number {
  const call = openCall("LAYER_HEIGHT", invocation);
  const heights = readColumn(call, "y", y, { least: 3, rising: true, notNegative: true });
  const speeds = readColumn(call, "u", u, { length: heights.length });
  const wanted = readOptionalNumber(call, "fraction", fraction) ?? DEFAULT_FRACTION;
  if (!(wanted > 0 && wanted < 1)) throw cellError("#VALUE!", `LAYER_HEIGHT needs fraction between 0 and 1; it has ${wanted}`);
  const given = readEdge(call, edge, heights.length) ?? findEdge(speeds)?.speed;
  if (given === undefined) throw refusalError(call, refuse("no edge found", { argument: "u", row: speeds.length }));
  const profile = profileCurve(heights, speeds);
  if (!profile.ok) throw refusalError(call, profile);
  const edges = profileCurve(heights, given instanceof Float64Array ? given : heights.map(() => given));
  if (!edges.ok) throw refusalError(call, edges);
  if (profile.curve.value[0]! >= wanted * edges.curve.value[0]!) {
    throw cellError("#N/A", `LAYER_HEIGHT needs points below the height sought; row 1 already has ${speeds[0]}`);
  }
  const found = heightOf(profile.curve, edges.curve, wanted);
  if (!found.ok) throw cellError("#N/A", `LAYER_HEIGHT needs a traverse that reaches ${wanted} of the edge speed; it does not`);
  return found.height;
}

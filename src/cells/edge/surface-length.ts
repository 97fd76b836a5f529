import { surfaceCurve } from "../../physics/edge/surface-curve";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { spillColumn } from "../writing/spill-table";

/**
 * Gives the arc length along a wall from its coordinates, 0 at the first point, one row each.
 * @customfunction SURFACE_LENGTH
 * @requiresParameterAddresses
 * @param {any[][]} x First coordinate of the wall points, in order along the wall.
 * @param {any[][]} y Second coordinate of each point.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Arc length from the first point, one entry a row.
 * @family Edge
 * @unit x length
 * @unit y length
 * @unit result length
 * @limits A smooth wall: the spline rounds a corner, so end one column at it and begin the next there. Neighbouring points must differ.
 * @limits A circle of 24 points has its circumference within 2e-5, one of 48 within 1e-6.
 * @source C. de Boor, A Practical Guide to Splines (1978), curves over chord length; Gauss quadrature of the arc.
 * @example =ROUND(INDEX(WALL.SURFACE_LENGTH({0;3;6},{0;4;8}),3),9) → 10
 * @words arc distance contour coordinates station
 */
export function surfaceLength(x: any[][], y: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SURFACE_LENGTH", invocation);
  const px = readColumn(call, "x", x, { least: 2 });
  const made = surfaceCurve(px, readColumn(call, "y", y, { length: px.length }));
  if (!made.ok) throw refusalError(call, made);
  return spillColumn(made.surface.length);
}

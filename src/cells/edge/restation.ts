import { restation as valuesAt } from "../../physics/edge/restation";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readColumn } from "../reading/read-column";
import { spillColumn } from "../writing/spill-table";

/**
 * Gives the values of a column at other stations, by the curve through its points, one row each; nothing is extrapolated.
 * @customfunction RESTATION
 * @requiresParameterAddresses
 * @param {any[][]} x Stations, rising.
 * @param {any[][]} v Value at each station.
 * @param {any[][]} new_x Stations wanted, in any order, each inside the column.
 * @param {any} [fit] spline (default; smooth second derivative) or monotone (no overshoot between points).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Value at each new station, one entry a row.
 * @family Edge
 * @unit x length
 * @unit v any
 * @unit new_x length
 * @unit fit text
 * @unit result as v
 * @limits New stations between the first and the last of x; one outside gives #N/A with its row.
 * @limits The spline follows a smooth column with an error of the fourth power of the spacing; across a kink it swings, where monotone does not.
 * @source C. de Boor, A Practical Guide to Splines (1978); F. N. Fritsch & R. E. Carlson, SIAM J. Numer. Anal. 17 (1980) 238–246.
 * @example =INDEX(WALL.RESTATION({0;1;2;3},{0;1;8;27},1.5),1) → 3.375
 * @words interpolate resample stations
 */
export function restation(x: any[][], v: any[][], new_x: any[][], fit: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("RESTATION", invocation);
  const stations = readColumn(call, "x", x, { least: 2, rising: true });
  const values = readColumn(call, "v", v, { length: stations.length });
  const wanted = readColumn(call, "new_x", new_x);
  const made = valuesAt(stations, values, wanted, readOptionalChoice(call, "fit", fit, ["spline", "monotone"]) ?? "spline");
  if (!made.ok) throw refusalError(call, made);
  return spillColumn(made.values);
}

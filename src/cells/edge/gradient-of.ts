import { smoothingSpline } from "../../numerics/smoothing-spline";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readOptionalFlag } from "../reading/read-value";
import { spillColumn, spillTable } from "../writing/spill-table";
import { errorKnown, noiseWords } from "./noise-words";
import { readNoise } from "./read-noise";

/**
 * Gives the gradient dv/dx of a column, smoothed as far as its noise asks for, one row each.
 * @customfunction GRADIENT_OF
 * @requiresParameterAddresses
 * @param {any[][]} x Stations, rising.
 * @param {any[][]} v Values at the stations.
 * @param {any} [noise] Standard deviation of the noise of one value; omitted or "found": found by cross-validation; 0: the spline through all points.
 * @param {any} [report] TRUE: a table with headings (station, value, ± standard error, note naming the noise found); omitted: the values alone.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Gradient dv/dx at the stations, one entry a row; or the table.
 * @family Edge
 * @unit x any
 * @unit v any
 * @unit noise unit of v
 * @unit report TRUE or FALSE
 * @unit result unit of v / unit of x
 * @limits At least 6 points where the noise is to be found, 3 where it is given, 2 for noise 0. Noise 0 reproduces the gradient of any cubic; its error falls with the third power of the spacing.
 * @limits A smoothed gradient is least certain at the two ends; finding the noise needs enough points (see SMOOTH_COLUMN).
 * @source C. de Boor, A Practical Guide to Splines (1978), ch. IV (noise 0); C. H. Reinsch, Numer. Math. 10 (1967) 177–183 (smoothing spline).
 * @source P. Craven & G. Wahba, Numer. Math. 31 (1979) 377–403 (how much is smoothed).
 * @example =ROUND(INDEX(WALL.GRADIENT_OF({0;1;2;3;4},{0;1;8;27;64},0),3,1),9) → 12
 * @words derivative slope differentiate spline
 */
export function gradientOf(x: any[][], v: any[][], noise: any, report: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("GRADIENT_OF", invocation);
  const stations = readColumn(call, "x", x, { least: 2, rising: true });
  const values = readColumn(call, "v", v, { length: stations.length });
  const made = smoothingSpline(stations, values, { noise: readNoise(call, noise) });
  if (!made.ok) throw refusalError(call, made);
  if (!(readOptionalFlag(call, "report", report) ?? false)) return spillColumn(made.curve.slope);
  return spillTable(call, stations.length, [
    { key: "station", values: stations },
    { key: "value", values: made.curve.slope },
    { key: "uncertainty", values: errorKnown(made) ? made.slopeError : [] },
    { key: "note", values: [noiseWords(made, "v")] },
  ]);
}

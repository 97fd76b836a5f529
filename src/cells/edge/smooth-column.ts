import { smoothingSpline } from "../../numerics/smoothing-spline";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readOptionalFlag } from "../reading/read-value";
import { spillColumn, spillTable } from "../writing/spill-table";
import { errorKnown, noiseWords } from "./noise-words";
import { readNoise } from "./read-noise";

/**
 * Smooths a noisy column by a cubic smoothing spline, one row each.
 * @customfunction SMOOTH_COLUMN
 * @requiresParameterAddresses
 * @param {any[][]} x Stations, rising.
 * @param {any[][]} v Values at the stations.
 * @param {any} [noise] Standard deviation of the noise of one value; omitted or "found": found by cross-validation; 0: nothing is smoothed.
 * @param {any} [report] TRUE: a table with headings (station, value, ± standard error, note naming the noise found); omitted: the values alone.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Smoothed values, one entry a row; or the table.
 * @family Edge
 * @unit x any
 * @unit v any
 * @unit noise unit of v
 * @unit report TRUE or FALSE
 * @unit result unit of v
 * @limits At least 6 points where the noise is to be found, 3 where it is given. The noise is taken as equal and independent at all points.
 * @limits Finding the noise needs enough points: with 15, about one noisy column in four is returned unsmoothed; with 50, none in a hundred (measured on smooth test columns). Give the noise where it is known.
 * @source C. H. Reinsch, Numer. Math. 10 (1967) 177–183 (spline).
 * @source P. Craven & G. Wahba, Numer. Math. 31 (1979) 377–403 (noise found: generalised cross-validation; noise given: least unbiased risk).
 * @example =ROUND(INDEX(WALL.SMOOTH_COLUMN({0;1;2;3},{0;1;2;3},0.1),2,1),6) → 1
 * @words spline noise scatter filter
 */
export function smoothColumn(x: any[][], v: any[][], noise: any, report: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SMOOTH_COLUMN", invocation);
  const stations = readColumn(call, "x", x, { least: 2, rising: true });
  const values = readColumn(call, "v", v, { length: stations.length });
  const made = smoothingSpline(stations, values, { noise: readNoise(call, noise) });
  if (!made.ok) throw refusalError(call, made);
  if (!(readOptionalFlag(call, "report", report) ?? false)) return spillColumn(made.curve.value);
  return spillTable(call, stations.length, [
    { key: "station", values: stations },
    { key: "value", values: made.curve.value },
    { key: "uncertainty", values: errorKnown(made) ? made.valueError : [] },
    { key: "note", values: [noiseWords(made, "v")] },
  ]);
}

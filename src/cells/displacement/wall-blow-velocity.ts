import { blowVelocity } from "../../physics/coupling/blow-velocity";
import { errorKnown, noiseWords } from "../edge/noise-words";
import { readNoise } from "../edge/read-noise";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn, readOptionalColumn } from "../reading/read-column";
import { readOptionalFlag } from "../reading/read-value";
import { spillColumn, spillTable } from "../writing/spill-table";

/**
 * Gives the blow velocity dm/dx: the wall-normal speed that an inviscid calculation must be given at the wall to feel the layer.
 * @customfunction WALL_BLOW_VELOCITY
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising.
 * @param {any[][]} mass_defect Mass defect m = ue δ* at the stations.
 * @param {any} [noise] Standard deviation of the noise of one m; omitted or "found": found by cross-validation; 0: the spline through all points.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at the stations; the first may be 0 (nose).
 * @param {any} [report] TRUE: a table with headings (station, smoothed m, blow velocity, ± standard error, note); omitted: the blow velocity alone.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Blow velocity, one entry a row, aligned with x; or the table.
 * @family Displacement
 * @unit x length
 * @unit mass_defect speed·length
 * @unit noise speed·length
 * @unit radius length
 * @unit report TRUE or FALSE
 * @unit result speed
 * @limits dm/dx on a plane wall, (1/r) d(r m)/dx on a round body; on its axis m must be 0. At least 6 points where the noise is to be found, 3 where it is given, 2 for noise 0.
 * @limits With 50 stations and 0.5 % noise on four laminar layers up to nine tenths of the way to separation, 95 % ranges (± 1.96 standard errors) covered the true dm/dx at over 90 % of the stations (measured). Clean columns integrate back to m within 0.04 %.
 * @limits At a leading edge, where m rises like √x, no cubic follows: leave out the first two or three rows. Close to separation dm/dx runs away and needs close stations.
 * @limits With some 15 noisy points cross-validation may find no noise and the points are then interpolated; the report says so. Give the noise where it is known.
 * @source M. J. Lighthill, J. Fluid Mech. 4 (1958) 383–392 (equivalent sources); mass conservation.
 * @source C. H. Reinsch, Numer. Math. 10 (1967) 177–183 (spline); P. Craven & G. Wahba, Numer. Math. 31 (1979) 377–403 (noise); G. Wahba, J. R. Statist. Soc. B 45 (1983) 133–150 (standard errors).
 * @example =ROUND(INDEX(WALL.WALL_BLOW_VELOCITY({0;1;2;3;4},{0;1;4;9;16},0),3,1),9) → 4
 * @example =ROUND(INDEX(WALL.WALL_BLOW_VELOCITY({0;1;2;3;4},{0;1;4;9;16},0,{0;1;2;3;4}),3,1),9) → 6
 * @words transpiration source displacement dm/dx equivalent blowing mass defect
 */
export function wallBlowVelocity(x: any[][], mass_defect: any[][], noise: any, radius: any[][], report: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("WALL_BLOW_VELOCITY", invocation);
  const stations = readColumn(call, "x", x, { least: 2, rising: true });
  const defects = readColumn(call, "mass_defect", mass_defect, { length: stations.length });
  const deviation = readNoise(call, noise);
  const radii = readOptionalColumn(call, "radius", radius, { length: stations.length, notNegative: true });
  const asTable = readOptionalFlag(call, "report", report) ?? false;
  const made = blowVelocity(stations, defects, { noise: deviation, radius: radii });
  if (!made.ok) throw refusalError(call, made);
  if (!asTable) return spillColumn(made.velocity);
  const { smoothed } = made;
  const wall = radii === undefined ? "plane wall: dm/dx" : "round body: (1/r) d(r m)/dx";
  return spillTable(call, stations.length, [
    { key: "station", values: stations },
    { key: "mass_defect", values: smoothed.curve.value },
    { key: "blow_velocity", values: made.velocity },
    { key: "uncertainty", values: errorKnown(smoothed) ? made.standardError : [] },
    { key: "note", values: [`${wall}; ${noiseWords(smoothed, "m")}`] },
  ]);
}

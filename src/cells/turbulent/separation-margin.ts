import { cubicSpline } from "../../numerics/cubic-spline";
import { smoothingSpline } from "../../numerics/smoothing-spline";
import { separationMargin as marginAlong, TURBULENT_RANGE } from "../../physics/turbulent/separation-margin";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readColumn } from "../reading/read-column";
import { readOptionalNumber } from "../reading/read-value";
import { formatNumber } from "../writing/format-number";
import { spillTable } from "../writing/spill-table";

/**
 * Tells how far a layer is from separation along a rising pressure, by Stratford's criteria, without marching it: 1 far from it, 0 at separation.
 * @customfunction SEPARATION_MARGIN
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall from where the layer begins, rising.
 * @param {any[][]} cp Pressure coefficient at each station, at most 1.
 * @param {any} [layer] turbulent (default) or laminar.
 * @param {any} [reference_speed] Speed of the reference flow; needed for a turbulent layer.
 * @param {any} [nu] Kinematic viscosity; needed for a turbulent layer.
 * @param {any} [onset] Station ahead of the lowest pressure where the layer turns turbulent; omitted: at the first station.
 * @param {any} [noise] Standard deviation of the noise in cp, which is then smoothed; omitted: the curve goes through all points.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station with the margin and what it is made of; ahead of the lowest pressure the margin is empty.
 * @family Turbulent
 * @unit x length
 * @unit cp 1
 * @unit layer word
 * @unit reference_speed speed
 * @unit nu length²/time
 * @unit onset length
 * @unit noise 1
 * @unit result x and x̄ length, others 1
 * @limits Constant density, plane wall, one pressure minimum that counts (the lowest); the layer at it is replaced by the plate layer of the same momentum loss. Close behind the minimum the turbulent formula is crude.
 * @limits Turbulent: C̄p up to 4/7, Re from 1e6 on; 0.39 where pressure curves upward, 0.35 where it does not. On the conservative side by design: the tests find separation called ahead of its place.
 * @limits Laminar: separation of ue = 1 − x at 0.1215 for 0.1198 by the full equations.
 * @source B. S. Stratford, ARC R&M 3002 (1954) (laminar, 0.0104); J. Fluid Mech. 5 (1959) 1–16 (turbulent, 0.39 and 0.35).
 * @source A. M. O. Smith, J. Aircraft 12 (1975) 501–526 (equivalent start; powers and 38.2 from memory).
 * @example =ROUND(INDEX(WALL.SEPARATION_MARGIN({0;0.05;0.1},{0;0.0975;0.19},"laminar"),3,6),2) → 0.92
 * @words Stratford separation criterion adverse pressure gradient stall
 */
export function separationMargin(x: any[][], cp: any[][], layer: any, reference_speed: any, nu: any, onset: any, noise: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SEPARATION_MARGIN", invocation);
  const stations = readColumn(call, "x", x, { least: 3, rising: true });
  const pressures = readColumn(call, "cp", cp, { length: stations.length });
  const kind = readOptionalChoice(call, "layer", layer, ["turbulent", "laminar"] as const) ?? "turbulent";
  const speed = readOptionalNumber(call, "reference_speed", reference_speed, { positive: true });
  const viscosity = readOptionalNumber(call, "nu", nu, { positive: true });
  if (kind === "turbulent" && (speed === undefined || viscosity === undefined)) {
    throw cellError("#VALUE!", `SEPARATION_MARGIN needs reference_speed and nu for a turbulent layer; ${speed === undefined ? "reference_speed" : "nu"} is missing`);
  }
  const from = readOptionalNumber(call, "onset", onset);
  if (kind === "laminar" && from !== undefined) throw cellError("#VALUE!", "SEPARATION_MARGIN needs layer = turbulent where an onset is given; it has laminar");
  const spread = readOptionalNumber(call, "noise", noise, { positive: true });
  const fitted = spread === undefined ? cubicSpline(stations, pressures) : smoothingSpline(stations, pressures, { noise: spread });
  if (!fitted.ok) throw refusalError(call, { ...fitted, argument: fitted.argument === "v" ? "cp" : fitted.argument });
  const made = marginAlong(fitted.curve, { layer: kind, unitReynolds: speed === undefined || viscosity === undefined ? undefined : speed / viscosity, onset: from });
  if (!made.ok) throw refusalError(call, made);
  const m = made.margin;
  const n = stations.length;
  const ahead = Uint8Array.from({ length: n }, (_, i) => (i < m.first ? 1 : 0));
  const end = Math.min(m.separation ?? Infinity, m.rangeEnd ?? Infinity);
  const state = Array.from(stations, (at, i) => (i < m.first ? "ahead of the rise" : at <= end ? "attached" : end === m.separation ? "separated" : "out of range"));
  const note = new Array<string>(n).fill("");
  note[0] = `Stratford, ${kind}; lowest pressure at x = ${formatNumber(m.peak)}, equivalent run ahead of it ${formatNumber(m.head)}`;
  if (end < Infinity) {
    const words = end === m.separation ? `${kind} separation at x = ${formatNumber(end)}` : `C̄p passes ${formatNumber(TURBULENT_RANGE)}, the end of the criterion's range, at x = ${formatNumber(end)}`;
    const row = stations.findIndex((at) => at >= end);
    note[row] = note[row] ? `${note[row]}; ${words}` : words;
  }
  return spillTable(call, n, [
    { key: "station", values: stations },
    { key: "canonical_pressure", values: m.canonical, blank: ahead },
    { key: "equivalent_distance", values: m.distance, blank: ahead },
    { key: "separation_number", values: m.number, blank: ahead },
    { key: "separation_limit", values: m.limit, blank: ahead },
    { key: "margin", values: m.margin, blank: ahead },
    { key: "state", values: state },
    { key: "note", values: note },
  ]);
}

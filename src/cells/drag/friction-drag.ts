import { frictionDrag as dragOfFriction } from "../../physics/drag/friction-drag";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn, readOptionalColumn } from "../reading/read-column";
import { readGaps } from "../reading/read-gaps";
import { readNumber, readOptionalNumber } from "../reading/read-value";

/**
 * Gives the friction drag coefficient of one side of a wall from its wall friction and edge speed: ∫ cf (ue/U)² dx over the chord.
 * @customfunction FRICTION_DRAG
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising, from where the layer begins.
 * @param {any[][]} cf Wall friction at each station, of the local edge speed; empty at the first where the layer begins there, and empty beyond separation, where it counts as 0.
 * @param {any[][]} ue Edge speed at each station.
 * @param {any} reference_speed Speed U of the reference flow.
 * @param {any} [chord] Length the coefficient is referred to; omitted: from the first station to the last.
 * @param {any[][]} [surface_x] Streamwise coordinate of each station: only the friction's component in that direction counts; omitted: the whole friction.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any} Friction drag coefficient of this side, per unit span.
 * @family Drag
 * @unit x length
 * @unit cf 1
 * @unit ue speed
 * @unit reference_speed speed
 * @unit chord length
 * @unit surface_x length
 * @unit result 1
 * @limits Constant density, plane walls (per unit span). At a leading edge the friction is carried to the edge by the power of the distance that the next two stations show, −1/2 to 0; from a stagnation point it grows in proportion.
 * @limits Flat plate from 20 even stations within 0.01 %. At an onset between two stations the jump is spread over that step: put a station close to it, or use LAYER_SUMMARY, which knows the place.
 * @limits Friction only: the pressure drag that the layer causes is in WAKE_DRAG.
 * @source Own definition: wall friction times dynamic pressure of the edge, integrated along the wall (common practice, no source).
 * @example =ROUND(WALL.FRICTION_DRAG({0;0.25;0.5;0.75;1},{"";0.001328;0.000939;0.000767;0.000664},{1;1;1;1;1},1),5) → 0.00133
 * @words skin friction drag coefficient viscous resistance
 */
export function frictionDrag(x: any[][], cf: any[][], ue: any[][], reference_speed: any, chord: any, surface_x: any[][], invocation: CustomFunctions.Invocation): any {
  const call = openCall("FRICTION_DRAG", invocation);
  const stations = readColumn(call, "x", x, { least: 3, rising: true });
  const friction = readGaps(call, "cf", cf, stations.length);
  const speeds = readColumn(call, "ue", ue, { length: stations.length, notNegative: true });
  const reference = readNumber(call, "reference_speed", reference_speed, { positive: true });
  const length = readOptionalNumber(call, "chord", chord, { positive: true }) ?? stations[stations.length - 1]! - stations[0]!;
  const along = readOptionalColumn(call, "surface_x", surface_x, { length: stations.length });
  const made = dragOfFriction(stations, friction, speeds, reference, { along });
  if (!made.ok) throw refusalError(call, made);
  const coefficient = made.drag.area / length;
  if (!Number.isFinite(coefficient)) throw refusalError(call, { ok: false, reason: "not finite", argument: "x over chord" });
  return coefficient;
}

import { fieldProfile as profileOfField } from "../../physics/laminar/field-profile";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { readNumber } from "../reading/read-value";
import { spillTable } from "../writing/spill-table";
import { laminarStartShape } from "./laminar-start-shape";
import { readWall } from "./read-wall";

const ACCEPTED = ["start momentum loss", "start shape", "edge fit", "noise", "grid refinement", "columns"] as const;

/**
 * Gives the speed profile across a laminar layer at one station of the wall, from the same full solution as FIELD_MARCH.
 * @customfunction FIELD_PROFILE
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising.
 * @param {any[][]} ue Edge speed at each station, above 0; the first may be 0 (stagnation point).
 * @param {any} nu Kinematic viscosity.
 * @param {any} station Where the profile is wanted: behind the first station, between stations too.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss, start shape, edge fit (spline, monotone, smooth), noise, grid refinement (1 to 8), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (nose).
 * @param {any[][]} [wall_velocity] Speed of the fluid through the wall at each station: above 0 blowing, below 0 suction.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then height, speed, speed ratio and speed gradient from the wall into the free stream.
 * @family Laminar
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit station length
 * @unit options as their labels say
 * @unit radius length
 * @unit wall_velocity speed
 * @unit result lengths, speeds, their ratio, 1/time
 * @limits As FIELD_MARCH; speeds on the flat plate within 0.00002 of ue. A station beyond separation is refused, naming where the layer ends.
 * @source As FIELD_MARCH: H. B. Keller & T. Cebeci, Lecture Notes in Physics 8 (1971) 92–100, at higher order.
 * @example =ROUND(INDEX(WALL.FIELD_PROFILE({0;0.5;1},{1;1;1},1,1),2,4),3) → 0.332
 * @words velocity profile boundary layer similarity Blasius
 */
export function fieldProfile(x: any[][], ue: any[][], nu: any, station: any, options: any[][], radius: any[][], wall_velocity: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("FIELD_PROFILE", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const { wall, nu: viscosity } = readWall(call, { x, ue, nu, radius, wall_velocity }, settings);
  const at = readNumber(call, "station", station);
  const made = profileOfField(wall, viscosity, at, {
    startMomentumLoss: settings.number("start momentum loss"),
    startShape: laminarStartShape(call, settings),
    refinement: settings.number("grid refinement"),
  });
  if (!made.ok) throw refusalError(call, made);
  const { height, speed, shear } = made.profile;
  const edge = speed[speed.length - 1]!;
  return spillTable(
    call,
    height.length,
    [
      { key: "height", values: height },
      { key: "speed", values: speed },
      { key: "speed_ratio", values: speed.map((u) => u / edge) },
      { key: "speed_slope", values: shear },
    ],
    settings.columns(),
  );
}

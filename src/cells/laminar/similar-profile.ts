import { similarLayer, similarSpeed } from "../../physics/laminar/similar-layer";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readOptionalColumn } from "../reading/read-column";
import { readNumber, readOptionalNumber } from "../reading/read-value";
import { spillTable } from "../writing/spill-table";

const BRANCHES = ["attached", "reversed"] as const;
/** Heights given when none are asked for. */
const HEIGHTS = 41;
/** Shear below which the free stream has been reached, for the topmost of them. */
const STILL = 1e-5;

/**
 * Gives the speed profile of the similar (Falkner–Skan) laminar layer of an edge speed ue ∝ x^m.
 * @customfunction SIMILAR_PROFILE
 * @requiresParameterAddresses
 * @param {any} m Exponent of the edge speed: 0 flat plate, 1 plane stagnation point, below 0 decelerating.
 * @param {any[][]} [eta] Heights η = y·√(ue/(ν x)) where the profile is wanted; omitted: 41 even ones from the wall into the free stream.
 * @param {any} [branch] attached (default) or reversed.
 * @param {any} [wall_velocity] Flow through the wall as (vw/ue)·√(ue x/ν): above 0 blowing, below 0 suction; omitted: a solid wall.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then height, speed over edge speed, and its gradient by η, a row a height.
 * @family Laminar
 * @unit m 1
 * @unit eta 1
 * @unit branch word
 * @unit wall_velocity 1
 * @unit result 1
 * @limits As SIMILAR_LAYER; values good to 1e-9 on a solid wall. Heights of 0 or more, in any order.
 * @source V. M. Falkner & S. W. Skan, ARC R&M 1314 (1930); D. R. Hartree, Proc. Camb. Phil. Soc. 33 (1937) 223–239.
 * @example =ROUND(INDEX(WALL.SIMILAR_PROFILE(0,2),2,2),6) → 0.629766
 * @words Blasius velocity profile Falkner Skan wedge
 */
export function similarProfile(m: any, eta: any[][], branch: any, wall_velocity: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SIMILAR_PROFILE", invocation);
  const exponent = readNumber(call, "m", m);
  const asked = readOptionalColumn(call, "eta", eta, { notNegative: true });
  const made = similarLayer(exponent, {
    branch: readOptionalChoice(call, "branch", branch, BRANCHES),
    transpiration: readOptionalNumber(call, "wall_velocity", wall_velocity),
  });
  if (!made.ok) throw refusalError(call, made);
  const { nodes } = made.layer;
  // Hartree's η over the sheet's.
  const factor = Math.sqrt((exponent + 1) / 2);
  let top = nodes.y.length / 3 - 1;
  while (top > 1 && Math.abs(nodes.y[3 * top + 2]!) < STILL) top -= 1;
  const heights = asked ?? Float64Array.from({ length: HEIGHTS }, (_, i) => (nodes.step * top * i) / (HEIGHTS - 1) / factor);
  const speeds = new Float64Array(heights.length);
  const shears = new Float64Array(heights.length);
  heights.forEach((height, i) => {
    const at = similarSpeed(nodes, height * factor);
    speeds[i] = at.speed;
    shears[i] = at.shear * factor;
  });
  return spillTable(call, heights.length, [
    { key: "similar_height", values: heights },
    { key: "speed_ratio", values: speeds },
    { key: "similar_shear", values: shears },
  ]);
}

import { edgeSpeed as edgeSpeedFromPressure } from "../../physics/edge/edge-speed";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readNumber, readOptionalNumber } from "../reading/read-value";
import { spillColumn } from "../writing/spill-table";

/**
 * Gives the edge speed along a wall from its pressure coefficients, one row each.
 * @customfunction EDGE_SPEED
 * @requiresParameterAddresses
 * @param {any[][]} cp Pressure coefficients, referred to the reference flow.
 * @param {any} reference_speed Speed of the reference flow.
 * @param {any} [mach] Mach number of the reference flow; omitted or 0: constant density (Bernoulli), otherwise isentropic with ratio of specific heats 1.4.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Edge speed ue, one entry a row.
 * @family Edge
 * @unit cp 1
 * @unit reference_speed speed
 * @unit mach 1
 * @unit result speed
 * @limits cp from vacuum, −2/(1.4 M²), to stagnation, 1 without a Mach number and 1 + M²/4 + … with it; a value outside is refused with its row.
 * @limits No shock between the reference flow and the wall, and the same total pressure: not behind a shock, in a wake or in a separated region.
 * @source Ames Research Staff, NACA Report 1135 (1953), relations of isentropic flow of a perfect gas; Bernoulli's equation as their limit at small Mach number.
 * @example =SUM(WALL.EDGE_SPEED({1;0.75;0;-3},10)) → 35
 * @example =INDEX(WALL.EDGE_SPEED({1;0;-1},100,0.5),3,1) → 143.8612
 * @words pressure velocity cp Bernoulli isentropic tap
 */
export function edgeSpeed(cp: any[][], reference_speed: any, mach: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("EDGE_SPEED", invocation);
  const pressures = readColumn(call, "cp", cp);
  const reference = readNumber(call, "reference_speed", reference_speed, { positive: true });
  const machNumber = readOptionalNumber(call, "mach", mach, { notNegative: true });
  const made = edgeSpeedFromPressure(pressures, reference, machNumber);
  if (!made.ok) throw refusalError(call, made);
  return spillColumn(made.speed);
}

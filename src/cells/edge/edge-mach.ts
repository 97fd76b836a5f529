import { edgeMach as edgeMachFromPressure } from "../../physics/edge/edge-mach";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readNumber, readOptionalNumber } from "../reading/read-value";
import { spillColumn } from "../writing/spill-table";

/**
 * Gives the local Mach number along a wall from its pressure coefficients, one row each.
 * @customfunction EDGE_MACH
 * @requiresParameterAddresses
 * @param {any[][]} cp Pressure coefficients, referred to the reference flow.
 * @param {any} mach Mach number of the reference flow, above 0 and not above 100.
 * @param {any} [gamma] Ratio of specific heats; default 1.4.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Local Mach number, one entry a row; 0 at the stagnation value of cp.
 * @family Edge
 * @unit cp 1
 * @unit mach 1
 * @unit gamma 1
 * @unit result 1
 * @limits cp above vacuum, −2/(γ M²), up to stagnation, 1 + M²/4 + …; a value outside is refused with its row.
 * @limits Isentropic from the reference flow: not behind a shock, in a wake or in a separated region.
 * @source Ames Research Staff, NACA Report 1135 (1953), isentropic relations of a perfect gas.
 * @example =ROUND(INDEX(WALL.EDGE_MACH({0;-1},0.5),2),6) → 0.739348
 * @words compressible sonic local pressure
 */
export function edgeMach(cp: any[][], mach: any, gamma: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("EDGE_MACH", invocation);
  const pressures = readColumn(call, "cp", cp);
  const made = edgeMachFromPressure(pressures, readNumber(call, "mach", mach, { positive: true }), readOptionalNumber(call, "gamma", gamma));
  if (!made.ok) throw refusalError(call, made);
  return spillColumn(made.mach);
}

import { edgeGas } from "../../physics/edge/edge-gas";
import { wakeMomentumLoss } from "../../physics/drag/wake-drag";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn } from "../reading/read-column";
import { readOptionalNumber } from "../reading/read-value";
import { spillColumn } from "../writing/spill-table";

/**
 * Gives the profile drag coefficient that a trailing-edge layer stands for, by Squire and Young's wake formula; one row for each side, to be added up.
 * @customfunction WAKE_DRAG
 * @requiresParameterAddresses
 * @param {any[][]} theta Momentum loss at the trailing edge, one row a side.
 * @param {any[][]} shape Shape factor H there.
 * @param {any[][]} edge_speed_ratio Edge speed there over the reference speed.
 * @param {any} [mach] Mach number of the reference flow; omitted or 0: constant density.
 * @param {any} [chord] Length the coefficient is referred to; omitted: 1.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Drag coefficient of each side, per unit span: 2 θ (ue/U)^((H + 5)/2) over the chord.
 * @family Drag
 * @unit theta length
 * @unit shape 1
 * @unit edge_speed_ratio 1
 * @unit mach 1
 * @unit chord length
 * @unit result 1
 * @limits Attached layers to the trailing edge, or nearly: H up to 2.8 (plus M²), edge speed ratio up to 3; refused beyond. Trailing-edge speeds of measured pressures or of an inviscid solution relieved at the edge: an inviscid stagnation point there gives nothing.
 * @limits With a Mach number the exponent takes H and the density of the edge: (H + 1 + 0.4 M²)/2 + 2 and the factor ρe/ρ∞; no shocks between layer and wake.
 * @limits Held against RAE 2822 at Mach 0.676, 85 counts measured in the wake: the measured trailing-edge layers (H 2.3 on the upper side) give 95, layers by LAYER_MARCH from the measured pressures 86.
 * @source H. B. Squire & A. D. Young, ARC R&M 1838 (1938); the compressible form is the same integration with −M² in the momentum equation (own, for γ = 1.4).
 * @example =ROUND(SUM(WALL.WAKE_DRAG({0.003;0.002},{1.8;1.5},{0.95;0.95})),5) → 0.00843
 * @words profile drag wake Squire Young trailing edge momentum thickness
 */
export function wakeDrag(theta: any[][], shape: any[][], edge_speed_ratio: any[][], mach: any, chord: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("WAKE_DRAG", invocation);
  const losses = readColumn(call, "theta", theta, { notNegative: true });
  const shapes = readColumn(call, "shape", shape, { length: losses.length });
  const ratios = readColumn(call, "edge_speed_ratio", edge_speed_ratio, { length: losses.length, positive: true });
  const gas = edgeGas(readOptionalNumber(call, "mach", mach, { notNegative: true }) ?? 0, 1);
  if (!gas.ok) throw refusalError(call, { ...gas, argument: "mach" });
  const length = readOptionalNumber(call, "chord", chord, { positive: true }) ?? 1;
  return spillColumn(
    losses.map((loss, i) => {
      const made = wakeMomentumLoss(loss, shapes[i]!, ratios[i]!, gas.gas);
      if (!made.ok) throw refusalError(call, { ...made, row: i + 1 });
      const coefficient = (2 * made.far) / length;
      if (!Number.isFinite(coefficient)) throw refusalError(call, { ok: false, reason: "not finite", argument: "theta over chord", row: i + 1 });
      return coefficient;
    }),
  );
}

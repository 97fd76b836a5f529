import { edgeCurve, type EdgeFit } from "../../physics/edge/edge-curve";
import { radiusCurve } from "../../physics/edge/radius-curve";
import { thwaitesMarch as marchByThwaites } from "../../physics/laminar/thwaites-march";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readColumn, readOptionalColumn } from "../reading/read-column";
import { readOptions } from "../reading/read-options";
import { readNumber } from "../reading/read-value";
import { laminarTable } from "./laminar-table";

const ACCEPTED = ["start momentum loss", "edge fit", "noise", "after separation", "columns"] as const;

/**
 * Marches a laminar layer along a wall by Thwaites' method: momentum loss, defect thickness, shape factor, wall friction and mass defect at each station, and the station where the layer separates.
 * @customfunction THWAITES_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising; 0 where the layer begins is not required.
 * @param {any[][]} ue Edge speed at each station, above 0; the first may be 0 (stagnation point).
 * @param {any} nu Kinematic viscosity.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss, edge fit (spline, monotone, smooth), noise, after separation (stop, continue), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (nose).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station; beyond separation the numbers are empty and state and note say where it lies.
 * @family Laminar
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit options as their labels say
 * @unit radius length
 * @unit result lengths, speeds and ratios in the units of x and ue
 * @limits Steady laminar layer of constant density on a smooth solid wall, thin beside the wall's radii; gradient λ from −0.09 (separation) to 0.25, located inside a step and reported in state and note.
 * @limits Error of the method itself against full solutions of four laminar layers (1 − x, 1 − x², sin x, Hiemenz's cylinder) up to nine tenths of the way to separation: behind a leading edge θ 1.3 %, H 2.2 %, δ* 1.7 %, δ3 1.5 %, cf 3.5 % half-way and up to 14 % at nine tenths, dm/dx 3 % half-way and up to 14 % at nine tenths; behind a stagnation point θ 6.4 % low and H 6.8 % high at the point itself, δ* 0.7 %, δ3 7.8 % low, cf 4.8 %, dm/dx 5 %. Separation station +2.8 % (1 − x), −1.3 % (the others). In the last tenth cf and H are poor.
 * @limits Flat plate: θ 1.0 %, δ* 1.1 %, cf 0.9 % high against 0.664, 1.721 and 0.664 over √Rex; H 2.594 for 2.591.
 * @limits 15 stations find the method's own separation within 0.03 % and θ within 0.003 % on the classic decelerating flows (edge fit = spline); edge fit = monotone is good to 0.7 % and 0.25 %.
 * @limits Beyond separation nothing is described; after separation = continue extends θ, Re θ and λ by the formula alone. δ3 comes from H by the relation of similar layers (own fit, 2 % near separation). No transition: the layer is taken as laminar throughout.
 * @source Thwaites, B., Aero. Quart. 1 (1949) 245–280 (method); N. Rott & L. F. Crabtree, J. Aero. Sci. 19 (1952) 553–565 (round bodies).
 * @source F. M. White, Viscous Fluid Flow (1991), section 4-6.6: S = (λ + 0.09)^0.62 and the polynomial H(λ), fits of Thwaites' table as revised by Curle & Skan (1957).
 * @source V. M. Falkner & S. W. Skan, Phil. Mag. 12 (1931) 865–896 (similar layers behind δ3).
 * @example =ROUND(INDEX(WALL.THWAITES_MARCH({0;0.5;1},{2;2;2},0.00002),4,3),6) → 0.002121
 * @example =ROUND(INDEX(WALL.THWAITES_MARCH({0;0.1;0.2},{0;1;2},0.00001,"columns = gradient"),2,1),6) → 0.075
 * @words boundary layer momentum thickness displacement thickness separation skin friction laminar
 */
export function thwaitesMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("THWAITES_MARCH", invocation);
  const stations = readColumn(call, "x", x, { least: 2, rising: true });
  const speeds = readColumn(call, "ue", ue, { length: stations.length });
  const viscosity = readNumber(call, "nu", nu, { positive: true });
  const settings = readOptions(call, options, ACCEPTED);
  const radii = readOptionalColumn(call, "radius", radius, { length: stations.length, notNegative: true });
  const fit = (settings.word("edge fit") ?? "spline") as EdgeFit;
  const noise = settings.number("noise");
  if (fit !== "smooth" && (noise !== undefined || settings.word("noise") !== undefined)) {
    throw cellError("#VALUE!", `${call.name} needs edge fit = smooth where the option noise is given; it has ${fit}`);
  }
  const edge = edgeCurve(stations, speeds, { fit, noise });
  if (!edge.ok) throw refusalError(call, edge);
  const round = radii === undefined ? undefined : radiusCurve(stations, radii);
  if (round && !round.ok) throw refusalError(call, round);
  const made = marchByThwaites(edge.edge, viscosity, {
    radius: round?.curve,
    startMomentumLoss: settings.number("start momentum loss"),
    afterSeparation: (settings.word("after separation") ?? "stop") as "stop" | "continue",
  });
  if (!made.ok) throw refusalError(call, made);
  const used = settings.settings({ "edge fit": "spline", "after separation": "stop" });
  return laminarTable(call, edge.edge, made.march, `Thwaites, ${round ? "round body" : "plane wall"}; ${used}`, settings.columns());
}

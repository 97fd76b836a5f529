import { energyMarch as marchByEnergy, type EnergyStop } from "../../physics/laminar/energy-march";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { formatNumber } from "../writing/format-number";
import { marchTable } from "./march-table";
import { laminarStartShape } from "./laminar-start-shape";
import { readWall } from "./read-wall";

const ACCEPTED = ["start momentum loss", "start shape", "edge fit", "noise", "after separation", "columns"] as const;

/**
 * Marches a laminar layer along a wall by its momentum and kinetic-energy equations, with suction or blowing through the wall: the same table as THWAITES_MARCH, nearer to the full equations.
 * @customfunction ENERGY_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising.
 * @param {any[][]} ue Edge speed at each station, above 0; the first may be 0 (stagnation point).
 * @param {any} nu Kinematic viscosity.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss, start shape, edge fit (spline, monotone, smooth), noise, after separation (stop, continue), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (nose).
 * @param {any[][]} [wall_velocity] Speed of the fluid through the wall at each station: above 0 blowing, below 0 suction.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station; beyond separation the numbers are empty and state and note say where it lies.
 * @family Laminar
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit options as their labels say
 * @unit radius length
 * @unit wall_velocity speed
 * @unit result lengths, speeds and ratios in the units of x and ue
 * @limits Steady laminar layer of constant density on a smooth wall, thin beside the wall's radii; wall flow vw θ/ν from −1 (suction) to 0.6 (blowing), acceleration short of sink flow (H above 2.08 on a solid wall): the station where a limit is met is reported.
 * @limits Error of the method itself against full solutions of four laminar layers (1 − x, 1 − x², sin x, Hiemenz's cylinder): θ within 0.5 % up to nine tenths of the way to separation and 1.2 % up to separation, δ* 2.5 %, cf 6 %; separation station −0.05 % to +1.2 %; sphere 105.7° for 104.8°.
 * @limits Exact for similar layers: flat plate within 0.0001 %, stagnation points with suction or blowing 0.001 %; asymptotic suction layer H = 2 within 0.02 %, on the way there θ within 1 %.
 * @limits 15 stations change the separation station of seven decelerating flows by less than 0.01 % and θ by less than 0.002 % (edge fit = spline).
 * @limits Beyond separation a given edge speed does not determine the layer; after separation = continue carries θ on by the momentum equation with the shape held and no wall shear. No transition: the layer is taken as laminar throughout.
 * @source K. Wieghardt, Ing.-Arch. 16 (1948) 231–242, and I. Tani, J. Aero. Sci. 21 (1954) 487–495 (momentum and kinetic-energy equations; from memory).
 * @source Closure: Chebyshev fit to the similar layers of SIMILAR_LAYER with flow through the wall (own; Falkner & Skan 1930).
 * @example =ROUND(INDEX(WALL.ENERGY_MARCH({0;0.5;1},{2;2;2},0.00002),4,3),6) → 0.0021
 * @example =ROUND(INDEX(WALL.ENERGY_MARCH({0;1;2;3;4;5;6;7;8},{1;1;1;1;1;1;1;1;1},0.0001,"columns = shape",,{-1;-1;-1;-1;-1;-1;-1;-1;-1}),10,1),2) → 2
 * @words boundary layer suction blowing transpiration momentum thickness displacement thickness separation skin friction
 */
export function energyMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], wall_velocity: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("ENERGY_MARCH", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const { wall, nu: viscosity, words } = readWall(call, { x, ue, nu, radius, wall_velocity }, settings);
  const made = marchByEnergy(wall, viscosity, {
    startMomentumLoss: settings.number("start momentum loss"),
    startShape: laminarStartShape(call, settings),
    afterSeparation: (settings.word("after separation") ?? "stop") as "stop" | "continue",
  });
  if (!made.ok) throw refusalError(call, made);
  const used = settings.settings({ "edge fit": "spline", "after separation": "stop" });
  const { stop } = made.march;
  return marchTable(
    call,
    wall.edge,
    made.march,
    { settings: `momentum and energy equations, ${words}; ${used}`, beyond: stop.kind === "limit" ? "out of range" : "separated", why: reason(stop) },
    settings.columns(),
  );
}

function reason(stop: EnergyStop): string {
  if (stop.kind === "end") return "";
  const place = `at x = ${formatNumber(stop.x)}, momentum loss ${formatNumber(stop.momentumLoss)}`;
  return stop.kind === "separation" ? `laminar separation ${place}` : `wall flow or acceleration reaches the end of the method's range ${place}`;
}

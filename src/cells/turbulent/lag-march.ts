import { lagMarch as marchByLag } from "../../physics/turbulent/turbulent-march";
import { refusalError } from "../errors/sentences";
import { readWall } from "../laminar/read-wall";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { readGas } from "../surface/read-gas";
import { readTurbulentStart } from "./read-turbulent-start";
import { turbulentTable } from "./turbulent-table";

const ACCEPTED = [
  "start momentum loss",
  "start Re theta",
  "start shape",
  "start entrainment",
  "reference speed",
  "reference Mach",
  "gamma",
  "edge fit",
  "noise",
  "after separation",
  "columns",
] as const;

/**
 * Marches a turbulent layer along a wall by the lag-entrainment method, which remembers the layer's history: the table of ENTRAINMENT_MARCH, better in changing gradients and at high speed.
 * @customfunction LAG_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising; the turbulent layer begins at the first.
 * @param {any[][]} ue Edge speed at each station, above 0.
 * @param {any} nu Kinematic viscosity; with a reference Mach number that of the reference stream.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss or start Re theta, start shape (a number or after onset), start entrainment (a number or equilibrium), reference Mach with reference speed, gamma, edge fit (spline, monotone, smooth), noise, after separation (stop, continue), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (tip).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station; beyond separation the numbers are empty and state and note say where it lies.
 * @family Turbulent
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit options as their labels say
 * @unit radius length
 * @unit result lengths, speeds and ratios in the units of x and ue; thicknesses with density where a Mach number is given, m and dm/dx per reference density
 * @limits Steady turbulent layer on a smooth, solid, adiabatic wall, thin beside the wall's radii, in a stream of low turbulence; no curvature, convergence or free-stream turbulence corrections. Re θ above 200; edge Mach number held against measurements to 0.75, published to 3.
 * @limits Separation where the method's wall friction reaches 0 (H̄ = 2.2 times its plate value). Without a start the layer is turbulent from a leading edge at the first station.
 * @limits Against measured and computed layers: plate of Wieghardt & Tillmann from x = 0.94 m: θ 2.4 %, cf 2.5 % (started with its own H), H 3.4 % low below Re θ = 5000 and 1.3 % at 15 000; rising adverse gradient of Samuel & Joubert to 3.04 m: θ 3.7 %, cf 11 % (Clauser plots, floating element); bubble of Coleman, Rumsey & Spalart: θ 3 %, cf 5 % to two bubble lengths before separation, separation later than computed.
 * @limits Total plate friction within 3 % of Prandtl–Schlichting from Re 1e6 to 1e9.
 * @limits δ3 is not part of the method: it follows from H as for power-law profiles, and stays empty where a Mach number is given. Edge viscosity by temperature to the power 0.76. After separation = continue carries on by the same equations, without support.
 * @source J. E. Green, D. J. Weeks & J. W. F. Brooman, ARC R&M 3791 (1973) (equations from memory).
 * @example =ROUND(INDEX(WALL.LAG_MARCH({0;1;2},{30;30;30},0.000015,"start momentum loss = 0.001; start shape = 1.45"),4,3),5) → 0.00406
 * @words boundary layer turbulent lag entrainment compressible momentum thickness displacement thickness separation skin friction
 */
export function lagMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("LAG_MARCH", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const { wall, nu: viscosity, words } = readWall(call, { x, ue, nu, radius, wall_velocity: undefined }, settings);
  const made = marchByLag(wall, viscosity, {
    ...readTurbulentStart(settings),
    gas: readGas(call, settings),
    startEntrainment: settings.number("start entrainment"),
    afterSeparation: (settings.word("after separation") ?? "stop") as "stop" | "continue",
  });
  if (!made.ok) throw refusalError(call, made);
  const used = settings.settings({ "edge fit": "spline", "after separation": "stop" });
  return turbulentTable(call, wall.edge, made.march, "lag", `lag-entrainment, ${words}; ${used}`, settings.columns());
}

import { entrainmentMarch as marchByEntrainment } from "../../physics/turbulent/turbulent-march";
import { refusalError } from "../errors/sentences";
import { readWall } from "../laminar/read-wall";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { readTurbulentStart } from "./read-turbulent-start";
import { turbulentTable } from "./turbulent-table";

const ACCEPTED = ["start momentum loss", "start Re theta", "start shape", "edge fit", "noise", "after separation", "columns"] as const;

/**
 * Marches a turbulent layer along a wall by Head's entrainment method: thicknesses, shape factor, wall friction and mass defect at each station, and the station where the layer separates.
 * @customfunction ENTRAINMENT_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising; the turbulent layer begins at the first.
 * @param {any[][]} ue Edge speed at each station, above 0.
 * @param {any} nu Kinematic viscosity.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss or start Re theta, start shape (a number or after onset), edge fit (spline, monotone, smooth), noise, after separation (stop, continue), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (tip).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station; beyond separation the numbers are empty and state and note say where it lies.
 * @family Turbulent
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit options as their labels say
 * @unit radius length
 * @unit result lengths, speeds and ratios in the units of x and ue
 * @limits Steady turbulent layer of constant density on a smooth solid wall, thin beside the wall's radii, in a stream of low turbulence; Re θ from 500 to 50 000, H from 1.2 to 2.4. Without a start the layer is turbulent from a leading edge at the first station.
 * @limits Separation is set at H = 2.4; Head gives 1.8 to 2.4, and the note says where 1.8 is passed. The friction law never falls to 0, so cf near separation is too high.
 * @limits Against measured and computed layers: plate of Wieghardt & Tillmann from x = 0.94 m: θ 2.5 %, H 2.2 %, cf 2 to 6 % low; rising adverse gradient of Samuel & Joubert to 3.04 m: θ 4.5 %, cf 12 %; bubble of Coleman, Rumsey & Spalart: cf 15 % low upstream and no separation where the computed layer separates.
 * @limits Total plate friction 6 % low at Re 1e7 and 12 to 22 % low at 1e8 to 1e9 (the power law of Ludwieg & Tillmann): use LAG_MARCH there.
 * @limits δ3 is not part of the method: it follows from H as for power-law profiles, 1 % on the plate. After separation = continue carries on by the same equations, without support.
 * @source M. R. Head, ARC R&M 3152 (1958) (entrainment); H. Ludwieg & W. Tillmann, Ing.-Arch. 17 (1949) 288–299 (wall friction).
 * @source T. Cebeci & P. Bradshaw, Momentum Transfer in Boundary Layers (1977): fits of Head's curves H1(H) and CE(H1), here joined smoothly where their branches cross, H = 1.585.
 * @example =ROUND(INDEX(WALL.ENTRAINMENT_MARCH({0;1;2},{30;30;30},0.000015,"start momentum loss = 0.001; start shape = 1.45"),4,3),5) → 0.00393
 * @words boundary layer turbulent entrainment momentum thickness displacement thickness separation skin friction
 */
export function entrainmentMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("ENTRAINMENT_MARCH", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const { wall, nu: viscosity, words } = readWall(call, { x, ue, nu, radius, wall_velocity: undefined }, settings);
  const made = marchByEntrainment(wall, viscosity, { ...readTurbulentStart(settings), afterSeparation: (settings.word("after separation") ?? "stop") as "stop" | "continue" });
  if (!made.ok) throw refusalError(call, made);
  const used = settings.settings({ "edge fit": "spline", "after separation": "stop" });
  return turbulentTable(call, wall.edge, made.march, "entrainment", `entrainment, ${words}; ${used}`, settings.columns());
}

import { fieldMarch as marchByField } from "../../physics/laminar/field-march";
import type { FieldStop } from "../../physics/laminar/field-record";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptions } from "../reading/read-options";
import { formatNumber } from "../writing/format-number";
import { readOnset } from "../surface/read-onset";
import { turbulentFieldTable } from "../surface/turbulent-field-table";
import { marchTable } from "./march-table";
import { laminarStartShape } from "./laminar-start-shape";
import { readWall } from "./read-wall";

const ACCEPTED = [
  "start momentum loss",
  "start shape",
  "onset",
  "onset criterion",
  "turbulence level",
  "edge fit",
  "noise",
  "after separation",
  "grid refinement",
  "Richardson",
  "columns",
] as const;

/**
 * Marches a layer along a wall by the full boundary-layer equations, laminar with suction or blowing through the wall, or turbulent from an onset on by an eddy viscosity: the judge of the integral methods.
 * @customfunction FIELD_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall, rising.
 * @param {any[][]} ue Edge speed at each station, above 0; the first may be 0 (stagnation point).
 * @param {any} nu Kinematic viscosity.
 * @param {any[][]} [options] Two columns (label, value) or text: start momentum loss, start shape, onset (none, free, a station, from start), onset criterion (Michel), turbulence level, edge fit (spline, monotone, smooth), noise, grid refinement (1 to 8), Richardson (no, yes), after separation (stop), columns.
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
 * @limits Steady laminar layer of constant density on a smooth wall, thin beside the wall's radii; flow through the wall until blowing lifts the layer off, which is reported with its station.
 * @limits Error of the numbers themselves at default settings on four laminar layers (1 − x, 1 − x², sin x, Hiemenz's cylinder; 50 to 200 stations): θ, δ*, δ3 and H within 0.04 % up to the last station before separation, cf 0.04 % up to 97 % of the way, separation station 0.01 %. Richardson = yes brings θ and δ* to 0.001 % and cf to 0.0005 %.
 * @limits Flat plate within 0.0005 %; sphere 104.8°; uniform blowing of a flat plate lifts off at (vw/ue)² Rex = 0.745.
 * @limits Few stations cost what the edge curve between them is wrong, not what the march is: steps are chosen by their own error. 15 stations change the separation station of seven decelerating flows by less than 0.001 % and θ by 0.002 % (edge fit = spline). Separation comes from the square-root law of the wall shear; at a given edge speed the equations end there, and after separation = continue adds nothing.
 * @limits A start with a given θ takes the profile of a similar layer on a solid wall; one that hardly holds to the wall (H near 4) and does not fit the gradient may have no solution. Laminar throughout unless an onset is given.
 * @limits Turbulent part (onset given): constant density, solid wall, the eddy viscosity in full at once from the onset on; about 0.2 s. Its numbers: θ 0.3 %, cf 0.1 %, H 0.1 % against a grid and steps twice as fine. The model: wall friction of the plate 0 to 4 % low against Wieghardt & Tillmann and DNS, H 2 % low; Samuel & Joubert and the bubbles of Coleman, Rumsey & Spalart: see the comparison table of the help.
 * @limits A laminar layer that separates first is made turbulent half-way between its last station and separation, without a bubble. From start: from Re θ = 100 behind a leading edge, 320 behind a stagnation point.
 * @source T. Cebeci & A. M. O. Smith, Analysis of Turbulent Boundary Layers (1974), and T. Cebeci & P. Bradshaw, Momentum Transfer in Boundary Layers (1977): eddy viscosity (constants from memory).
 * @source H. B. Keller & T. Cebeci, Lecture Notes in Physics 8 (1971) 92–100 (block elimination; ours is of fourth order across the layer and, with backward differences, of third along the wall).
 * @source S. Goldstein, Q. J. Mech. Appl. Math. 1 (1948) 43–69 (separation); W. Mangler, ZAMM 28 (1948) 97–103 (round bodies); L. F. Richardson, Phil. Trans. A 226 (1927) 299–361.
 * @example =ROUND(INDEX(WALL.FIELD_MARCH({0;0.5;1},{2;2;2},0.00002),4,3),6) → 0.0021
 * @example =ROUND(INDEX(WALL.FIELD_MARCH({0;0.1;0.2},{0;1;2},0.00001,"columns = shape"),4,1),4) → 2.2162
 * @words boundary layer Prandtl equations finite difference box scheme suction blowing transpiration separation skin friction
 */
export function fieldMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], wall_velocity: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("FIELD_MARCH", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const { wall, nu: viscosity, words } = readWall(call, { x, ue, nu, radius, wall_velocity }, settings);
  const onset = readOnset(call, settings, "none");
  const richardson = settings.word("Richardson") === "yes";
  if (onset.kind !== "none") return turbulentFieldTable(call, { wall, nu: viscosity, words }, settings, onset);
  const made = marchByField(wall, viscosity, {
    startMomentumLoss: settings.number("start momentum loss"),
    startShape: laminarStartShape(call, settings),
    refinement: settings.number("grid refinement"),
    richardson,
  });
  if (!made.ok) throw refusalError(call, made);
  const { march } = made;
  const used = settings.settings({ "edge fit": "spline", "after separation": "stop", "grid refinement": "1", Richardson: "no" });
  const changed = richardson ? `; Richardson changed θ and δ* by at most ${formatNumber(Number((100 * march.correction).toPrecision(2)))} %` : "";
  const beyond = { end: "", separation: "separated", "lift-off": "lifted off", limit: "no solution" }[march.stop.kind];
  return marchTable(call, wall.edge, march, { settings: `full boundary-layer equations, ${words}; ${used}${changed}`, beyond, why: reason(march.stop) }, settings.columns());
}

function reason(stop: FieldStop): string {
  switch (stop.kind) {
    case "end":
      return "";
    case "separation":
      return `laminar separation at x = ${formatNumber(stop.x)}, by the square-root law of wall shear`;
    case "lift-off":
      return `blowing lifts the layer off the wall at x = ${formatNumber(stop.x)}`;
    case "limit":
      return `no solution beyond x = ${formatNumber(stop.x)}: edge speed or wall velocity change too suddenly there; add stations`;
  }
}

import type { LaminarMethodName } from "../../physics/surface/laminar-methods";
import { layerMarch as marchOverSurface } from "../../physics/surface/layer-march";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { readWall } from "../laminar/read-wall";
import type { Call } from "../reading/call";
import { openCall } from "../reading/call";
import { readOptions, type Options } from "../reading/read-options";
import { nearSeparation } from "../turbulent/turbulent-table";
import { layerRemarks } from "./layer-remarks";
import { layerTable } from "./layer-table";
import { readGas } from "./read-gas";
import { readOnset } from "./read-onset";
import { turbulentFieldTable } from "./turbulent-field-table";

const ACCEPTED = [
  "start momentum loss",
  "start shape",
  "onset",
  "onset criterion",
  "turbulence level",
  "trip momentum loss",
  "transition zone",
  "laminar method",
  "turbulent method",
  "reference speed",
  "reference Mach",
  "gamma",
  "edge fit",
  "noise",
  "after separation",
  "columns",
] as const;

/**
 * Marches the layer along a whole wall in one call: laminar from the start, an onset found or given, turbulent to the end, in one table with a state for each row.
 * @customfunction LAYER_MARCH
 * @requiresParameterAddresses
 * @param {any[][]} x Stations along the wall from where the layer begins, rising.
 * @param {any[][]} ue Edge speed at each station, above 0; the first may be 0 (stagnation point).
 * @param {any} nu Kinematic viscosity; with a reference Mach number that of the reference stream.
 * @param {any[][]} [options] Two columns (label, value) or text: onset (free, a station, from start, none), onset criterion (Michel), turbulence level, trip momentum loss, transition zone (none, Dhawan-Narasimha), laminar method (Thwaites, energy, field), turbulent method (lag, entrainment, field), start momentum loss, start shape, reference Mach with reference speed, gamma, edge fit (spline, monotone, smooth), noise, after separation (stop, continue), columns.
 * @param {any[][]} [radius] Distance of the wall from the axis of a round body at each station; the first may be 0 (nose).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then a row a station: state is laminar, transition, bubble, turbulent or separated; beyond the end of the layer the numbers are empty and the note says why.
 * @family Surface
 * @unit x length
 * @unit ue speed
 * @unit nu length²/time
 * @unit options as their labels say
 * @unit radius length
 * @unit result lengths, speeds and ratios in the units of x and ue
 * @limits Steady layer on a smooth solid wall, thin beside the wall's radii. Each part holds where its method does: see THWAITES_MARCH, ENERGY_MARCH, FIELD_MARCH, LAG_MARCH, ENTRAINMENT_MARCH. The laminar part is of constant density also where a Mach number is given.
 * @limits Onset by a criterion is uncertain by tens of per cent of Re x: compare a free onset with fixed ones on both sides of it. Michel's data are of aerofoils and plates in quiet streams, Re x 3e5 to 7e6; roughness, noise, sweep and stream turbulence bring onset forward.
 * @limits At the onset θ goes through (plus trip momentum loss where given) and H takes at once the value of a plate layer with the same Re θ; transition zone = Dhawan-Narasimha spreads the change by intermittency instead, with laminar H and cf by Thwaites' relations at the local gradient.
 * @limits A laminar layer that separates turns turbulent over a short bubble by Horton's rules where the edge speed lets it reattach on the wall; wall friction in the bubble is set to 0. A long bubble or a stall changes the whole edge speed and is outside this call.
 * @limits From start on a stagnation point: laminar up to Re θ = 320, below which no lasting turbulent layer has been seen.
 * @limits All-turbulent plate: total friction within 3 % of Prandtl–Schlichting from Re 1e6 to 1e9 (turbulent method = lag).
 * @source B. Thwaites, Aero. Quart. 1 (1949); J. E. Green, D. J. Weeks & J. W. F. Brooman, ARC R&M 3791 (1973); M. R. Head, ARC R&M 3152 (1958) (the methods, as chosen).
 * @source R. Michel, ONERA Rapport 1/1578A (1951) (onset); S. Dhawan & R. Narasimha, J. Fluid Mech. 3 (1958) 418–436 (intermittency); H. P. Horton, ARC CP 1073 (1969) (bubble); J. H. Preston, J. Fluid Mech. 3 (1958) 373–384 (least Re θ). Page numbers and constants from memory.
 * @example =INDEX(WALL.LAYER_MARCH({0;0.5;1;1.5;2},{50;50;50;50;50},0.000015,"onset = free; columns = state"),3,1) → "laminar"
 * @example =ROUND(INDEX(WALL.LAYER_MARCH({0;0.5;1;1.5;2},{50;50;50;50;50},0.000015,"onset = from start; columns = θ"),6,1),5) → 0.00316
 * @words boundary layer transition laminar turbulent surface wing hull drag momentum thickness separation bubble trip
 */
export function layerMarch(x: any[][], ue: any[][], nu: any, options: any[][], radius: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("LAYER_MARCH", invocation);
  const settings = readOptions(call, options, ACCEPTED);
  const read = readWall(call, { x, ue, nu, radius, wall_velocity: undefined }, settings);
  const { wall, nu: viscosity, words } = read;
  const turbulentMethod = readTurbulentMethod(call, settings);
  if (turbulentMethod === "field") return turbulentFieldTable(call, read, settings, readOnset(call, settings));
  const made = marchOverSurface(wall, viscosity, {
    laminarMethod: (settings.word("laminar method") ?? "Thwaites") as LaminarMethodName,
    turbulentMethod,
    onset: readOnset(call, settings),
    zone: settings.word("transition zone") === "Dhawan-Narasimha",
    gas: readGas(call, settings),
    startMomentumLoss: settings.number("start momentum loss"),
    startShape: settings.number("start shape"),
    afterSeparation: (settings.word("after separation") ?? "stop") as "stop" | "continue",
  });
  if (!made.ok) throw refusalError(call, made);
  const { march } = made;
  const free = settings.word("onset") === undefined && settings.number("onset") === undefined ? true : settings.word("onset") === "free";
  const used = settings.settings({
    onset: "free",
    ...(free ? { "onset criterion": "Michel" } : {}),
    "transition zone": "none",
    "laminar method": "Thwaites",
    "turbulent method": "lag",
    "edge fit": "spline",
    "after separation": "stop",
  });
  const from = march.start === "given momentum loss" ? "from a given momentum loss" : `at a ${march.start}`;
  const remarks = [...layerRemarks(march, turbulentMethod), ...(turbulentMethod === "entrainment" ? nearSeparation(wall.edge, march.columns.shape, march.columns.given) : [])];
  const beyond = march.stop.kind.endsWith("limit") ? "out of range" : "separated";
  return layerTable(call, wall.edge, march.columns, { settings: `whole layer, ${words}; ${used}; starts ${from}`, remarks, beyond }, settings.columns());
}

/** What the full equations cannot take together with an onset. */
const NOT_BY_FIELD = ["trip momentum loss", "transition zone", "reference Mach"] as const;

function readTurbulentMethod(call: Call, options: Options): "lag" | "entrainment" | "field" {
  const method = (options.word("turbulent method") ?? "lag") as "lag" | "entrainment" | "field";
  if (method === "entrainment" && options.number("reference Mach")) throw cellError("#VALUE!", `${call.name} needs turbulent method = lag where reference Mach is given; entrainment is of constant density`);
  if (method !== "field") return method;
  const laminar = options.word("laminar method") ?? "field";
  if (laminar !== "field") throw cellError("#VALUE!", `${call.name} needs laminar method = field where the turbulent method is field; it has ${laminar}`);
  for (const label of NOT_BY_FIELD) {
    const word = options.word(label);
    if (options.number(label) || (word !== undefined && word !== "none")) throw cellError("#VALUE!", `${call.name} needs turbulent method = lag where ${label} is given; it has field`);
  }
  return method;
}

import type { OdeDrive } from "../../numerics/ode-drive";
import { odeDrive } from "../../numerics/ode-drive";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { LaminarColumns } from "./field-march";
import { energyEquations, layerAt, shapeRate } from "./energy-equations";
import type { EnergyLayer } from "./energy-equations";
import type { EnergyStart } from "./energy-start";
import { energyStart } from "./energy-start";
import { LAYER_STATE } from "./laminar-march";
import type { WallConditions, WallPlace } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

/** Why an energy march ended. */
export type EnergyStop =
  | { kind: "end" }
  /** The wall shear vanishes at station x. */
  | { kind: "separation"; x: number; momentumLoss: number }
  /** The layer leaves the range of the closure at station x: wall flow or acceleration too strong. */
  | { kind: "limit"; x: number; momentumLoss: number };

export interface EnergyMarch extends LaminarColumns {
  stop: EnergyStop;
  counts: { steps: number; rejected: number; largestError: number };
}

/** Error allowed a step: θ² relative, H32 about one in a million. */
const TOLERANCE = 2e-6;
/** The march begins this share of the first panel behind a start where θ or ue is 0, with the layer that belongs there. */
const BEGIN = 1e-4;
/** Shortest step over the wall length. */
const LEAST_STEP = 1e-12;

/**
 * The laminar layer along a wall by two integral equations, momentum and kinetic energy, closed by similar layers with flow through the wall.
 *
 * @param wall edge curve, radius and wall velocity (vw θ∕ν from −1 to 0.6)
 * @param nu kinematic viscosity [length²/time], > 0
 * @param options.startMomentumLoss θ at the first station [length]; `startShape` H there, omitted: that of the similar layer with the gradient there
 * @param options.afterSeparation "stop" (default); "continue": θ goes on by the momentum equation with the verge's shape and no wall shear
 * @returns the stations reached and why the march stopped; separation is where H32 falls to the least value a similar layer has, S = 0
 *
 * Sources: K. Wieghardt, Ing.-Arch. 16 (1948) 231–242 (the two equations); I. Tani, J. Aero. Sci. 21 (1954) 487–495; closure: own similar layers.
 */
export function energyMarch(
  wall: WallConditions,
  nu: number,
  options: { startMomentumLoss?: number; startShape?: number; afterSeparation?: "stop" | "continue" } = {},
): Outcome<{ march: EnergyMarch }> {
  if (!(Number.isFinite(nu) && nu > 0)) return refuse("not positive", { argument: "nu", values: { value: nu } });
  const started = energyStart(wall, nu, options);
  if (!started.ok) return started;
  const { start } = started;
  const { x } = wall.edge.curve;
  const n = x.length;
  const march = emptyMarch(wall, start);
  const place = emptyPlace();
  fill(march, 0, wallPlace(wall, 0, 0, place), start.layer, nu, start.blowVelocity);
  let panel = 0;
  const equations = energyEquations(wall, nu, () => panel);
  const begin = start.singular ? x[0] + BEGIN * (x[1] - x[0]) : x[0];
  const state = Float64Array.of(start.square + start.growth * (begin - x[0]), start.layer.energyShape);
  const drive = odeDrive(equations.right, begin, state, {
    relative: TOLERANCE,
    absolute: Float64Array.of(0, 0),
    firstStep: (begin === x[0] ? BEGIN * (x[1] - x[0]) : begin - x[0]) / 2,
    leastStep: LEAST_STEP * (x[n - 1] - x[0]),
    event: equations.margin,
  });
  march.reached = 1;
  for (; panel + 1 < n; panel += 1) {
    const end = drive.to(x[panel + 1]);
    if (end !== "there") {
      const { layer } = equations;
      const theta = Math.sqrt(drive.y[0]);
      const separated = end === "event" || layer.shear < NEARLY_SEPARATED;
      march.stop = separated ? { kind: "separation", x: drive.x, momentumLoss: theta } : { kind: "limit", x: drive.x, momentumLoss: theta };
      break;
    }
    const layer = layerAt(drive.y, wallPlace(wall, panel, 1, place), nu, equations.layer);
    if (layer === null || !fill(march, panel + 1, place, layer, nu, shapeRate(equations, drive.y, place, nu))) {
      return refuse("not finite", { argument: "ue", row: panel + 2 });
    }
    march.reached = panel + 2;
  }
  march.counts = { ...drive.counts };
  if (march.stop.kind === "separation" && options.afterSeparation === "continue") extend(march, wall, nu, drive, panel, equations.layer);
  return { ok: true, march };
}

/** Shear number below which a march that cannot go on has come to separation. */
const NEARLY_SEPARATED = 0.02;

/** θ beyond separation by the momentum equation alone, the shape held. */
function extend(march: EnergyMarch, wall: WallConditions, nu: number, drive: OdeDrive, from: number, layer: EnergyLayer): void {
  const { shape } = layer;
  const { x } = wall.edge.curve;
  let panel = from;
  const place = emptyPlace();
  const right = (at: number, y: Float64Array, slope: Float64Array): boolean => {
    wallPlace(wall, panel, (at - x[panel]) / (x[panel + 1] - x[panel]), place);
    if (!(y[0] > 0 && place.speed > 0)) return false;
    slope[0] = ((2 * nu) / place.speed) * ((-(2 + shape) * y[0] * place.speedSlope + place.wallVelocity * Math.sqrt(y[0])) / nu) - (2 * y[0] * place.radiusSlope) / place.radius;
    return true;
  };
  const length = x[x.length - 1] - x[0];
  const onward = odeDrive(right, drive.x, Float64Array.of(drive.y[0]), { relative: TOLERANCE, absolute: Float64Array.of(0), firstStep: length * 1e-3, leastStep: LEAST_STEP * length });
  for (; panel + 1 < x.length; panel += 1) {
    if (onward.to(x[panel + 1]) !== "there") return;
    const i = panel + 1;
    wallPlace(wall, panel, 1, place);
    march.state[i] = LAYER_STATE.separated;
    march.momentumLoss[i] = Math.sqrt(onward.y[0]);
    march.momentumReynolds[i] = (place.speed * march.momentumLoss[i]) / nu;
    march.gradient[i] = (onward.y[0] * place.speedSlope) / nu;
    march.frictionBlank[i] = 1;
    march.blowBlank[i] = 1;
  }
}

/** All results at a station; false when one is not finite. */
function fill(march: EnergyMarch, i: number, place: WallPlace, layer: EnergyLayer, nu: number, blowVelocity: number): boolean {
  const { theta } = layer;
  const ue = place.speed;
  march.state[i] = LAYER_STATE.attached;
  march.momentumLoss[i] = theta;
  march.shape[i] = layer.shape;
  march.defect[i] = layer.shape * theta;
  march.energyLoss[i] = layer.energyShape * theta;
  march.momentumReynolds[i] = (ue * theta) / nu;
  march.gradient[i] = (theta * theta * place.speedSlope) / nu;
  march.massDefect[i] = ue * march.defect[i];
  if (ue > 0 && theta > 0) march.friction[i] = (2 * nu * layer.shear) / (ue * theta);
  else march.frictionBlank[i] = 1;
  if (Number.isFinite(blowVelocity)) march.blowVelocity[i] = blowVelocity;
  else march.blowBlank[i] = 1;
  return Number.isFinite(theta) && Number.isFinite(layer.shape) && Number.isFinite(march.friction[i]) && Number.isFinite(march.massDefect[i]);
}

function emptyMarch(wall: WallConditions, start: EnergyStart): EnergyMarch {
  const n = wall.edge.curve.x.length;
  const column = (): Float64Array => new Float64Array(n);
  return {
    start: start.kind,
    stop: { kind: "end" },
    reached: 0,
    state: new Uint8Array(n),
    frictionBlank: new Uint8Array(n),
    blowBlank: new Uint8Array(n),
    edgeSpeed: wall.edge.curve.value.slice(),
    momentumLoss: column(),
    defect: column(),
    energyLoss: column(),
    shape: column(),
    friction: column(),
    momentumReynolds: column(),
    gradient: column(),
    massDefect: column(),
    blowVelocity: column(),
    counts: { steps: 0, rejected: 0, largestError: 0 },
  };
}

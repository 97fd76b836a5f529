import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import type { EdgeCurve } from "../edge/edge-curve";
import { energyShape } from "./energy-shape";
import type { LaminarMarch } from "./laminar-march";
import { LAYER_STATE } from "./laminar-march";
import type { EventCounts } from "./thwaites-events";
import { crossing, findEvent } from "./thwaites-events";
import { thwaitesBlow } from "./thwaites-blow";
import type { ThwaitesGrowth } from "./thwaites-growth";
import { gradientAt, growthAt, thwaitesGrowth } from "./thwaites-growth";
import { thwaitesShape, thwaitesShear } from "./thwaites-relations";

/**
 * The laminar layer along a wall by Thwaites' method, plane or on a round body.
 *
 * θ follows from the exact integral of ue⁵ (r² ue⁵) of the edge curve, H and wall shear from λ = θ² ue′∕ν. Separation, λ = −0.09, and
 * the upper limit of the relations, λ = 0.25, are located inside the panel. δ3 is not part of Thwaites' method: it is given by the
 * relation of similar layers between δ3∕θ and H.
 *
 * @param edge edge curve; first speed 0: stagnation start; above 0: leading edge (θ = 0) unless a momentum loss is given
 * @param nu kinematic viscosity [length²/time], > 0
 * @param options.radius radius curve on the same stations, for a round body whose layer is thin beside its radius
 * @param options.startMomentumLoss θ at the first station [length], ≥ 0; refused where the start is fixed (speed or radius 0)
 * @param options.afterSeparation "stop" (default): nothing beyond separation; "continue": θ, Reθ and λ of the formula go on beyond it
 *   (no more than an extension: the layer is not described)
 * @returns the stations reached and why the march stopped
 *
 * Sources: B. Thwaites, Aero. Quart. 1 (1949) 245–280; N. Rott & L. F. Crabtree, J. Aero. Sci. 19 (1952) 553–565; relations: see
 * thwaites-relations.ts, energy-shape.ts.
 */
export function thwaitesMarch(
  edge: EdgeCurve,
  nu: number,
  options: { radius?: PiecewiseCubic; startMomentumLoss?: number; afterSeparation?: "stop" | "continue" } = {},
): Outcome<{ march: LaminarMarch }> {
  const { radius = null, startMomentumLoss, afterSeparation = "stop" } = options;
  const bad = checkArguments(edge, nu, radius, startMomentumLoss);
  if (bad) return bad;
  const made = thwaitesGrowth(edge, nu, radius, startMomentumLoss);
  if (!made.ok) return made;
  const g = made.growth;
  const n = edge.curve.x.length;
  const march = emptyMarch(edge, g);
  const thickness = (i: number, t: number): number => Math.sqrt((nu / g.speedUnit) * growthAt(g, i, t));

  // The first station: separated from the start when the given θ is too large for the gradient there.
  let out = crossing(gradientAt(g, 0, 0));
  if (out) stopAt(march, out, edge.curve.x[0], thickness(0, 0), gradientAt(g, 0, 0));
  else if (!fillStation(march, g, nu, 0)) return refuse("not finite", { argument: "ue", row: 1 });

  const counts: EventCounts = march.counts;
  let last = 0;
  for (let i = 0; i + 1 < n && !out; i += 1) {
    march.counts.panels += 1;
    const found = findEvent(g, i, counts);
    if (!found.ok) return { ...found, argument: "ue", row: i + 1 };
    if (found.event) {
      const { kind, t } = found.event;
      out = kind;
      const x = edge.curve.x[i] + t * (edge.curve.x[i + 1] - edge.curve.x[i]);
      stopAt(march, kind, x, thickness(i, t), gradientAt(g, i, t));
    } else {
      if (!fillStation(march, g, nu, i + 1)) return refuse("not finite", { argument: "ue", row: i + 2 });
      last = i + 1;
    }
  }
  march.reached = out && march.state[0] === LAYER_STATE.notReached ? 0 : last + 1;
  if (out === "separation" && afterSeparation === "continue") {
    for (let i = march.reached; i < n; i += 1) {
      if (!extendStation(march, g, nu, i)) return refuse("not finite", { argument: "ue", row: i + 1 });
    }
  }
  return { ok: true, march };
}

function checkArguments(edge: EdgeCurve, nu: number, radius: PiecewiseCubic | null, theta: number | undefined): Refusal | null {
  if (!(Number.isFinite(nu) && nu > 0)) return refuse("not positive", { argument: "nu", values: { value: nu } });
  if (theta !== undefined && !Number.isFinite(theta)) return refuse("not finite", { argument: "start momentum loss" });
  if (theta !== undefined && theta < 0) return refuse("negative", { argument: "start momentum loss", values: { value: theta } });
  const { x } = edge.curve;
  if (radius !== null && (radius.x.length !== x.length || radius.x.some((at, i) => at !== x[i]))) {
    return refuse("lengths differ", { argument: "radius", values: { count: radius.x.length, expected: x.length } });
  }
  return null;
}

/** All results at a station where the layer is attached; false when a number overflows. */
function fillStation(march: LaminarMarch, g: ThwaitesGrowth, nu: number, i: number): boolean {
  const ue = march.edgeSpeed[i];
  const growth = stationGrowth(g, i);
  const theta = Math.sqrt((nu / g.speedUnit) * growth);
  const lambda = growth * g.curve.slope[i];
  const shape = thwaitesShape(lambda);
  march.state[i] = LAYER_STATE.attached;
  march.momentumLoss[i] = theta;
  march.gradient[i] = lambda;
  march.shape[i] = shape;
  march.defect[i] = shape * theta;
  march.energyLoss[i] = energyShape(shape) * theta;
  march.momentumReynolds[i] = (ue * theta) / nu;
  march.massDefect[i] = ue * shape * theta;
  if (ue > 0 && theta > 0) march.friction[i] = (2 * thwaitesShear(lambda)) / march.momentumReynolds[i];
  else march.frictionBlank[i] = 1;
  const blow = thwaitesBlow(g, i, growth, theta);
  if (Number.isFinite(blow)) march.blowVelocity[i] = blow;
  else march.blowBlank[i] = 1;
  return Number.isFinite(theta) && Number.isFinite(lambda) && Number.isFinite(march.massDefect[i]) && Number.isFinite(march.friction[i]) && Number.isFinite(march.momentumReynolds[i]);
}

/** The formula's θ beyond separation. */
function extendStation(march: LaminarMarch, g: ThwaitesGrowth, nu: number, i: number): boolean {
  const growth = stationGrowth(g, i);
  march.state[i] = LAYER_STATE.separated;
  march.momentumLoss[i] = Math.sqrt((nu / g.speedUnit) * growth);
  march.gradient[i] = growth * g.curve.slope[i];
  march.momentumReynolds[i] = (march.edgeSpeed[i] * march.momentumLoss[i]) / nu;
  march.frictionBlank[i] = 1;
  march.blowBlank[i] = 1;
  return Number.isFinite(march.momentumLoss[i]) && Number.isFinite(march.gradient[i]) && Number.isFinite(march.momentumReynolds[i]);
}

function stationGrowth(g: ThwaitesGrowth, i: number): number {
  return i === 0 ? g.first : growthAt(g, i - 1, 1);
}

function stopAt(march: LaminarMarch, kind: "separation" | "limit", x: number, momentumLoss: number, gradient: number): void {
  march.stop = kind === "separation" ? { kind, x, momentumLoss } : { kind, x, momentumLoss, gradient };
}

function emptyMarch(edge: EdgeCurve, g: ThwaitesGrowth): LaminarMarch {
  const n = edge.curve.x.length;
  const column = (): Float64Array => new Float64Array(n);
  return {
    start: g.start,
    stop: { kind: "end" },
    reached: 0,
    state: new Uint8Array(n),
    frictionBlank: new Uint8Array(n),
    edgeSpeed: edge.curve.value.slice(),
    momentumLoss: column(),
    defect: column(),
    energyLoss: column(),
    shape: column(),
    friction: column(),
    momentumReynolds: column(),
    gradient: column(),
    massDefect: column(),
    blowVelocity: column(),
    blowBlank: new Uint8Array(n),
    counts: { panels: 0, searchedPanels: 0, rootEvaluations: 0 },
  };
}

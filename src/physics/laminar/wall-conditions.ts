import { gaussLegendre } from "../../numerics/gauss-legendre";
import { monotoneCurve } from "../../numerics/monotone-curve";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { panelSlope, panelValue, runningIntegral } from "../../numerics/piecewise-cubic";
import type { EdgeCurve } from "../edge/edge-curve";

/** What a wall imposes on its layer, as curves on the same stations. */
export interface WallConditions {
  edge: EdgeCurve;
  radius: PiecewiseCubic | null;
  /** vw, above 0 blowing; null on a solid wall. */
  wallVelocity: PiecewiseCubic | null;
  /** ∫ vw dx, or ∫ r vw dx on a round body, from the first station to each. */
  flow: Float64Array;
  /** Quadrature on 0 … 1 that integrates the product of two cubics exactly. */
  node: Float64Array;
  weight: Float64Array;
}

/** The wall's conditions at one place. */
export interface WallPlace {
  x: number;
  speed: number;
  speedSlope: number;
  /** 1 on a plane wall. */
  radius: number;
  radiusSlope: number;
  wallVelocity: number;
  /** ∫ r vw dx from the first station. */
  flow: number;
}

/** Nodes that make a product of two cubics, degree 6, exact. */
const NODES = 4;

/**
 * @param edge edge curve
 * @param options.radius radius curve of a round body on the same stations
 * @param options.wallVelocity speed of the fluid through the wall at the stations [speed], above 0 blowing, below 0 suction; between
 *   stations the curve that does not overshoot
 */
export function wallConditions(edge: EdgeCurve, options: { radius?: PiecewiseCubic; wallVelocity?: Float64Array } = {}): Outcome<{ wall: WallConditions }> {
  const { x } = edge.curve;
  const radius = options.radius ?? null;
  if (radius !== null && (radius.x.length !== x.length || radius.x.some((at, i) => at !== x[i]))) {
    return refuse("lengths differ", { argument: "radius", values: { count: radius.x.length, expected: x.length } });
  }
  const gauss = gaussLegendre(NODES);
  if (!gauss.ok) return gauss;
  let wallVelocity: PiecewiseCubic | null = null;
  if (options.wallVelocity !== undefined && options.wallVelocity.some((v) => v !== 0)) {
    const made = monotoneCurve(x, options.wallVelocity);
    if (!made.ok) return { ...made, argument: "wall_velocity" };
    wallVelocity = made.curve;
  } else if (options.wallVelocity !== undefined && options.wallVelocity.length !== x.length) {
    return refuse("lengths differ", { argument: "wall_velocity", values: { count: options.wallVelocity.length, expected: x.length } });
  }
  const wall: WallConditions = {
    edge,
    radius,
    wallVelocity,
    flow: new Float64Array(x.length),
    node: gauss.node.map((z) => (1 + z) / 2),
    weight: gauss.weight.map((w) => w / 2),
  };
  if (wallVelocity !== null) {
    if (radius === null) wall.flow = runningIntegral(wallVelocity);
    else for (let i = 0; i + 1 < x.length; i += 1) wall.flow[i + 1] = wall.flow[i] + partialFlow(wall, i, 1);
  }
  return { ok: true, wall };
}

/** The conditions at the fraction t of panel i, written into `out`. */
export function wallPlace(wall: WallConditions, i: number, t: number, out: WallPlace): WallPlace {
  const { x, value, slope } = wall.edge.curve;
  const h = x[i + 1] - x[i];
  if (t === 1) {
    out.x = x[i + 1];
    out.speed = value[i + 1];
    out.speedSlope = slope[i + 1];
  } else {
    // panelValue and panelSlope in one: this is read some thousand times a march.
    const s0 = slope[i];
    const chord = (value[i + 1] - value[i]) / h;
    const c2 = 3 * chord - 2 * s0 - slope[i + 1];
    const c3 = s0 + slope[i + 1] - 2 * chord;
    out.x = x[i] + t * h;
    out.speed = value[i] + h * t * (s0 + t * (c2 + t * c3));
    out.speedSlope = s0 + t * (2 * c2 + t * 3 * c3);
  }
  if (wall.radius !== null) {
    out.radius = panelValue(wall.radius, i, t);
    out.radiusSlope = panelSlope(wall.radius, i, t);
  } else {
    out.radius = 1;
    out.radiusSlope = 0;
  }
  if (wall.wallVelocity !== null) {
    out.wallVelocity = panelValue(wall.wallVelocity, i, t);
    out.flow = t === 1 ? wall.flow[i + 1] : wall.flow[i] + partialFlow(wall, i, t);
  } else {
    out.wallVelocity = 0;
    out.flow = 0;
  }
  return out;
}

export function emptyPlace(): WallPlace {
  return { x: 0, speed: 0, speedSlope: 0, radius: 1, radiusSlope: 0, wallVelocity: 0, flow: 0 };
}

/** ∫ r vw dx from the start of panel i to its fraction t. */
function partialFlow(wall: WallConditions, i: number, t: number): number {
  const { node, weight, radius, wallVelocity, edge } = wall;
  if (wallVelocity === null || t === 0) return 0;
  let sum = 0;
  for (let k = 0; k < node.length; k += 1) {
    const s = t * node[k];
    sum += weight[k] * panelValue(wallVelocity, i, s) * (radius === null ? 1 : panelValue(radius, i, s));
  }
  return sum * t * (edge.curve.x[i + 1] - edge.curve.x[i]);
}

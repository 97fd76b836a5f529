import type { Closure } from "./similar-closure";
import { closureAt, CLOSURE_RANGE, vergeEnergyShape } from "./similar-closure";
import type { WallConditions, WallPlace } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

/** A layer as the two integral equations know it. */
export interface EnergyLayer extends Closure {
  theta: number;
  energyShape: number;
  /** vw θ∕ν. */
  wallFlow: number;
}

/** The two equations along a wall, for the state (θ², H32). */
export interface EnergyEquations {
  right: (x: number, y: Float64Array, slope: Float64Array) => boolean;
  /** How far H32 is above the least value a similar layer with this wall flow has; 0 at separation. */
  margin: (x: number, y: Float64Array) => number;
  /** The layer at the last evaluation. */
  layer: EnergyLayer;
}

/**
 * Momentum: ½ (ue∕ν) dθ²∕dx = S − (2 + H) λ + vw θ∕ν − λ·(ue r′∕(ue′ r)) and kinetic energy: (ue θ²∕ν) dH32∕dx =
 * 2D + vw θ∕ν − H32 (S + vw θ∕ν) + H32 (H − 1) λ.
 *
 * @param panel tells in which panel of the curves the march is
 */
export function energyEquations(wall: WallConditions, nu: number, panel: () => number): EnergyEquations {
  const { x } = wall.edge.curve;
  const place = emptyPlace();
  const layer: EnergyLayer = { theta: 0, energyShape: 0, wallFlow: 0, shear: 0, dissipation: 0, shape: 0 };
  const solid = wall.wallVelocity === null;
  const solidVerge = vergeEnergyShape(0);
  const go = (at: number): WallPlace => {
    const i = panel();
    return wallPlace(wall, i, (at - x[i]) / (x[i + 1] - x[i]), place);
  };
  return {
    layer,
    right(at, y, slope) {
      go(at);
      if (layerAt(y, place, nu, layer) === null) return false;
      slopes(layer, place, nu, slope);
      return true;
    },
    margin(at, y) {
      if (solid) return y[1] - solidVerge;
      return y[1] - vergeEnergyShape((go(at).wallVelocity * Math.sqrt(y[0])) / nu);
    },
  };
}

/** The layer of a state at a place; null outside the range of the closure. Below the least H32 the verge's layer stands in, so that a step may cross it. */
export function layerAt(y: Float64Array, place: WallPlace, nu: number, out: EnergyLayer): EnergyLayer | null {
  const theta = Math.sqrt(y[0]);
  const wallFlow = (place.wallVelocity * theta) / nu;
  if (!(theta > 0 && wallFlow > CLOSURE_RANGE.leastWallFlow && wallFlow < CLOSURE_RANGE.mostWallFlow)) return null;
  const above = y[1] - vergeEnergyShape(wallFlow);
  const w = above > 0 ? Math.sqrt(above) : 0;
  if (!(w < CLOSURE_RANGE.mostW)) return null;
  out.theta = theta;
  out.energyShape = y[1];
  out.wallFlow = wallFlow;
  closureAt(w, wallFlow, out);
  return out;
}

/** d(θ²)∕dx and dH32∕dx. */
export function slopes(layer: EnergyLayer, place: WallPlace, nu: number, out: Float64Array): void {
  const { shear, dissipation, shape, energyShape, wallFlow, theta } = layer;
  const square = theta * theta;
  const gradient = (square * place.speedSlope) / nu;
  out[0] = ((2 * nu) / place.speed) * (shear - (2 + shape) * gradient + wallFlow) - (2 * square * place.radiusSlope) / place.radius;
  out[1] = (nu / (place.speed * square)) * (2 * dissipation + wallFlow - energyShape * (shear + wallFlow) + energyShape * (shape - 1) * gradient);
}

/** Step of the difference that gives dH∕dx along the march, in H32. */
const NUDGE = 1e-6;
const rate = new Float64Array(2);
const nudged = new Float64Array(2);

/** Growth of the mass defect at a place behind the start: dm∕dx, (1∕r) d(r m)∕dx on a round body [speed], from the equations themselves. */
export function shapeRate(equations: EnergyEquations, y: Float64Array, place: WallPlace, nu: number): number {
  const layer = { ...equations.layer };
  slopes(layer, place, nu, rate);
  const { theta, shape } = layer;
  const growing = Math.max(Math.abs(rate[1]), Math.abs(rate[0]) / y[0], Number.MIN_VALUE);
  const h = NUDGE / growing;
  const shapeAt = (sign: number): number => {
    nudged[0] = y[0] + sign * h * rate[0];
    nudged[1] = y[1] + sign * h * rate[1];
    const found = layerAt(nudged, place, nu, { ...layer });
    return found === null ? NaN : found.shape;
  };
  const ahead = shapeAt(1);
  const behind = shapeAt(-1);
  const shapeSlope = (ahead - behind) / (2 * h);
  const speedSlope = place.speedSlope + (place.speed * place.radiusSlope) / place.radius;
  return speedSlope * shape * theta + place.speed * ((Number.isFinite(shapeSlope) ? shapeSlope : 0) * theta + (shape * rate[0]) / (2 * theta));
}

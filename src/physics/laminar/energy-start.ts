import { brentRoot } from "../../numerics/brent-root";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { EnergyLayer } from "./energy-equations";
import { closureAt, CLOSURE_RANGE, vergeEnergyShape } from "./similar-closure";
import type { LayerStart } from "./thwaites-growth";
import type { WallConditions } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

/** The layer at the first station. */
export interface EnergyStart {
  kind: LayerStart;
  layer: EnergyLayer;
  square: number;
  /** dθ²∕dx [length]. */
  growth: number;
  /** θ or ue is 0 there: the equations divide by it. */
  singular: boolean;
  /** dm∕dx there; Infinity at a leading edge. */
  blowVelocity: number;
}

/** Highest w tried for a start: short of the closure's end. */
const MOST_W = 0.999 * CLOSURE_RANGE.mostW;
/** Turns that settle vw θ∕ν at a stagnation point, where θ depends on it. */
const TURNS = 60;

/** The start by the closure's own similar layers: stagnation point, leading edge, or given θ (and H). */
export function energyStart(wall: WallConditions, nu: number, options: { startMomentumLoss?: number; startShape?: number }): Outcome<{ start: EnergyStart }> {
  const { edge, radius } = wall;
  const place = wallPlace(wall, 0, 0, emptyPlace());
  const nose = radius !== null && radius.value[0] === 0;
  const theta = options.startMomentumLoss ?? 0;
  if (theta > 0) {
    if (edge.fromStagnation || nose) return refuse("start fixed", { argument: edge.fromStagnation ? "ue" : "radius", row: 1 });
    const wallFlow = (place.wallVelocity * theta) / nu;
    if (!(wallFlow > CLOSURE_RANGE.leastWallFlow && wallFlow < CLOSURE_RANGE.mostWallFlow)) return wallFlowRefusal(wallFlow);
    const gradient = (theta * theta * place.speedSlope) / nu;
    const { startShape } = options;
    const found = similarWith(wallFlow, startShape === undefined ? (layer) => layer.similarGradient - gradient : (layer) => startShape - layer.shape);
    if (!found.ok) return { ...found, argument: startShape === undefined ? "start momentum loss (as λ)" : "start shape", values: startShape === undefined ? { value: gradient, ...GIVEN_GRADIENT } : { value: startShape, ...GIVEN_SHAPE } };
    const layer = { ...found.layer, theta };
    const growth = ((2 * nu) / place.speed) * (layer.shear - (2 + layer.shape) * gradient + wallFlow) - (2 * theta * theta * place.radiusSlope) / place.radius;
    const blowVelocity = (place.speedSlope + (place.speed * place.radiusSlope) / place.radius) * layer.shape * theta + (place.speed * layer.shape * growth) / (2 * theta);
    return { ok: true, start: { kind: "given momentum loss", layer, square: theta * theta, growth, singular: false, blowVelocity } };
  }
  if (options.startShape !== undefined) return refuse("start shape alone", { argument: "start shape" });
  if (edge.fromStagnation) {
    // θ is level: S − (2 + H) λ + vwθ∕ν = 0, on the axis of a round body one λ more; and H32 is level.
    const more = nose ? 3 : 2;
    const { speedSlope } = place;
    let wallFlow = 0;
    let settled = false;
    let share = 0.5;
    let before = 0;
    let found: ReturnType<typeof similarWith> = refuse("no convergence", { values: { count: TURNS } });
    for (let turn = 0; turn < TURNS; turn += 1) {
      if (!(wallFlow > CLOSURE_RANGE.leastWallFlow && wallFlow < CLOSURE_RANGE.mostWallFlow)) return wallFlowRefusal(wallFlow);
      found = similarWith(wallFlow, (layer) => layer.similarGradient - (layer.shear + wallFlow) / (more + layer.shape));
      if (!found.ok) return { ...found, argument: "wall_velocity", row: 1 };
      const { layer } = found;
      // Strong suction may overshoot to where no layer could stay: the next turn comes back from there.
      const next = place.wallVelocity * Math.sqrt(Math.max(layer.shear + wallFlow, 0) / (more + layer.shape) / (nu * speedSlope));
      const miss = next - wallFlow;
      settled = Math.abs(miss) < 1e-9;
      if (settled) break;
      // Half the way, and half of that again whenever it went too far.
      if (miss * before < 0) share /= 2;
      before = miss;
      wallFlow += share * miss;
    }
    if (!found.ok) return found;
    if (!settled) return refuse("no convergence", { argument: "wall_velocity", values: { count: TURNS } });
    const square = (((found.layer.shear + wallFlow) / (more + found.layer.shape)) * nu) / speedSlope;
    const layer = { ...found.layer, theta: Math.sqrt(square) };
    return { ok: true, start: { kind: "stagnation point", layer, square, growth: 0, singular: true, blowVelocity: speedSlope * layer.shape * layer.theta * (nose ? 2 : 1) } };
  }
  const found = similarWith(0, (layer) => layer.similarGradient);
  if (!found.ok) return found;
  const growth = ((2 * nu) / place.speed / (nose ? 3 : 1)) * found.layer.shear;
  return { ok: true, start: { kind: "leading edge", layer: { ...found.layer, theta: 0 }, square: 0, growth, singular: true, blowVelocity: Infinity } };
}

/** λ and H of the closure's layers on a solid wall, for the sentence. */
const GIVEN_GRADIENT = { least: -0.0681, most: 0.137 } as const;
const GIVEN_SHAPE = { least: 2.08, most: 4.029 } as const;

function wallFlowRefusal(wallFlow: number): Outcome<never> {
  if (!Number.isFinite(wallFlow)) return refuse("not finite", { argument: "ue", row: 1 });
  const { leastWallFlow: least, mostWallFlow: most } = CLOSURE_RANGE;
  return refuse("outside range", { argument: "wall_velocity (as vw θ∕ν)", row: 1, values: { value: wallFlow, least, most } });
}

/** The attached layer of the closure for which `excess` is 0; its λ is that which keeps H32 level. */
function similarWith(wallFlow: number, excess: (layer: EnergyLayer & { similarGradient: number }) => number): Outcome<{ layer: EnergyLayer }> {
  const layer = { theta: 0, energyShape: 0, wallFlow, shear: 0, dissipation: 0, shape: 0, similarGradient: 0 };
  const verge = vergeEnergyShape(wallFlow);
  const at = (w: number): number => {
    closureAt(w, wallFlow, layer);
    layer.energyShape = verge + w * w;
    layer.similarGradient = (layer.energyShape * (layer.shear + wallFlow) - 2 * layer.dissipation - wallFlow) / (layer.energyShape * (layer.shape - 1));
    return excess(layer);
  };
  const root = brentRoot(at, 0, MOST_W, 1e-13);
  if (!root.ok) return { ...root, reason: "outside range" };
  at(root.x);
  return { ok: true, layer };
}

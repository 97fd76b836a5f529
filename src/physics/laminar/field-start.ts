import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { FieldGrid } from "./field-grid";
import { STILL } from "./field-grid";
import type { FieldProfile } from "./field-step";
import { similarByDefect } from "./similar-by-defect";
import { similarBranch } from "./similar-branch";
import type { SimilarLayer } from "./similar-layer";
import { similarQuantities, similarSpeed } from "./similar-layer";
import type { LayerStart } from "./thwaites-growth";
import type { WallConditions } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

/** How a march begins: a similar layer, its θ² and the growth of θ² at the first station. */
export interface MarchStart {
  kind: LayerStart;
  layer: SimilarLayer;
  /** θ² and dθ²∕dx [length², length]. */
  square: number;
  growth: number;
}

/** What the caller may say of the layer at the first station. */
export interface StartOptions {
  startMomentumLoss?: number;
  startShape?: number;
}

/**
 * The layer at the first station: the similar layer of a stagnation point (plane, or round where the radius is 0), of a leading edge
 * (plane, or a pointed nose), or the similar layer that has the given θ and, where given, H.
 */
export function marchStart(wall: WallConditions, nu: number, options: StartOptions): Outcome<{ start: MarchStart }> {
  const { edge, radius } = wall;
  const place = wallPlace(wall, 0, 0, emptyPlace());
  const theta = options.startMomentumLoss ?? 0;
  const atNose = radius !== null && radius.value[0] === 0;
  if (theta > 0) {
    if (edge.fromStagnation || atNose) return refuse("start fixed", { argument: edge.fromStagnation ? "ue" : "radius", row: 1 });
    const square = theta * theta;
    const gradient = (square * place.speedSlope) / nu;
    const wanted = options.startShape === undefined ? { gradient } : { shape: options.startShape };
    const found = similarByDefect(wanted);
    if (!found.ok) return found;
    const { layer } = found;
    // von Kármán's equation, solid-wall shear: ½ ue dθ²∕dx ∕ ν = S − (2 + H) λ + vw θ∕ν.
    const growth = ((2 * nu) / place.speed) * (layer.shear - (2 + layer.shape) * gradient + (place.wallVelocity * theta) / nu) - (2 * square * place.radiusSlope) / place.radius;
    return { ok: true, start: { kind: "given momentum loss", layer, square, growth } };
  }
  if (options.startShape !== undefined) return refuse("start shape alone", { argument: "start shape" });
  if (edge.fromStagnation) {
    const { speedSlope } = place;
    const beta = atNose ? 0.5 : 1;
    const wallValue = -place.wallVelocity / Math.sqrt((speedSlope * nu) / beta);
    const found = similarBranch(beta, wallValue, "attached");
    if (!found.ok) return found.reason === "layer lifts off" ? { ...found, argument: "wall_velocity", row: 1 } : found;
    const layer = similarQuantities(atNose ? 1 / 3 : 1, wallValue, found.nodes);
    return { ok: true, start: { kind: "stagnation point", layer, square: (nu * beta * layer.momentumLoss ** 2) / speedSlope, growth: 0 } };
  }
  const found = similarBranch(0, 0, "attached");
  if (!found.ok) return found;
  const layer = similarQuantities(0, 0, found.nodes);
  // Flat plate: θ² = 2 θη² ν x∕ue; a third of it on a cone (Mangler).
  const growth = (2 * nu * layer.momentumLoss ** 2) / place.speed / (atNose ? 3 : 1);
  return { ok: true, start: { kind: "leading edge", layer, square: 0, growth } };
}

/** Puts the start layer on the grid, η in units of Δ, and sets the grid's height; `ratio` is Δ∕θ. */
export function startProfile(start: MarchStart, ratio: number, grid: FieldGrid, profile: FieldProfile): void {
  const { nodes, momentumLoss, wall } = start.layer;
  const scale = momentumLoss * ratio;
  const { eta } = grid;
  const { f, u, v } = profile;
  const top = (nodes.step * (nodes.y.length / 3 - 1)) / scale;
  f[0] = wall / scale;
  u[0] = 0;
  v[0] = nodes.y[2] * scale;
  let j = 1;
  for (; j < eta.length; j += 1) {
    const at = similarSpeed(nodes, eta[j] * scale);
    f[j] = similarStream(nodes, eta[j] * scale) / scale;
    u[j] = at.speed;
    v[j] = at.shear * scale;
    if (eta[j] >= top || (1 - u[j] < STILL && v[j] < STILL)) break;
  }
  grid.count = Math.min(j + 1, eta.length);
  u[grid.count - 1] = 1;
}

/** f at a height: the value at the node below and the quintic's integral, by the two-point rule of sixth order. */
function similarStream(nodes: SimilarLayer["nodes"], eta: number): number {
  const { y, step, beta } = nodes;
  const last = y.length / 3 - 1;
  const j = Math.min(Math.floor(eta / step), last);
  const at = 3 * j;
  const h = eta - j * step;
  if (j === last) return y[at] + h;
  const top = similarSpeed(nodes, eta);
  const low = -y[at] * y[at + 2] - beta * (1 - y[at + 1] ** 2);
  // f‴ at the upper end needs f there: the first guess by the rule of fourth order is good to h⁵.
  const guess = y[at] + (h / 2) * (y[at + 1] + top.speed) + ((h * h) / 12) * (y[at + 2] - top.shear);
  const high = -guess * top.shear - beta * (1 - top.speed ** 2);
  return y[at] + (h / 2) * (y[at + 1] + top.speed) + ((h * h) / 10) * (y[at + 2] - top.shear) + ((h * h * h) / 120) * (low + high);
}

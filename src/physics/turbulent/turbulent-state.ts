import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { gasPlace } from "../edge/edge-gas";
import { emptyPlace, wallPlace } from "../laminar/wall-conditions";
import type { TurbulentWall } from "./turbulent-equations";
import type { TurbulentPlace } from "./turbulent-method";
import { emptyLayer } from "./turbulent-method";

/** Least Reθ at which a layer is started as turbulent; measured turbulent layers begin near 320 (Preston, J. Fluid Mech. 3 (1958) 373–384). */
export const LEAST_START_REYNOLDS = 25;

/** Beyond this the power law of the entrainment method leaves no plate layer; a hundred times any ship's. */
const MOST_START_REYNOLDS = 1e9;

/** The wall and the gas at the fraction t of a panel. */
export function emptyTurbulentPlace(on: Pick<TurbulentWall, "wall" | "gas" | "nu">, panel: number, t: number): TurbulentPlace {
  const place: TurbulentPlace = { ...emptyPlace(), machSquare: 0, density: 1, viscosity: 1, nu: on.nu };
  wallPlace(on.wall, panel, t, place);
  gasPlace(on.gas, place.speed, place);
  place.nu = on.nu * place.viscosity;
  return place;
}

/**
 * The state of a turbulent layer with a given θ.
 *
 * @param shape H; omitted: that of a plate layer with the same Reθ
 * @param entrainment CE for a method with memory; omitted: in equilibrium with the layer
 */
export function turbulentState(
  on: Pick<TurbulentWall, "method">,
  place: TurbulentPlace,
  theta: number,
  shape?: number,
  entrainment?: number,
): Outcome<{ state: Float64Array; shape: number; entrainment: number }> {
  const { method } = on;
  const reynolds = (place.speed * theta) / place.nu;
  if (!Number.isFinite(reynolds)) return refuse("not finite", { argument: "nu" });
  if (!(reynolds >= LEAST_START_REYNOLDS && reynolds <= MOST_START_REYNOLDS)) return refuse("outside range", { argument: "start momentum loss (as Re θ)", values: { value: reynolds, least: LEAST_START_REYNOLDS, most: MOST_START_REYNOLDS } });
  const used = shape ?? method.plateShape(reynolds, place.machSquare);
  const layer = emptyLayer();
  const state = Float64Array.of(theta, method.marchedShape(used, place.machSquare), 0).subarray(0, method.unknowns);
  if (!method.layerAt(place, state, layer)) return refuse("outside range", { argument: "start shape", values: { value: used, least: LEAST_START_SHAPE, most: MOST_START_SHAPE } });
  if (method.unknowns === 3) state[2] = entrainment ?? method.equilibriumEntrainment(place, layer);
  if (!method.layerAt(place, state, layer)) return refuse("outside range", { argument: "start entrainment", values: { value: state[2], least: -0.009, most: Infinity } });
  return { ok: true, state, shape: used, entrainment: layer.entrainment };
}

/** Between these any method here can start at any Reθ it takes. */
const LEAST_START_SHAPE = 1.13;
const MOST_START_SHAPE = 2.4;

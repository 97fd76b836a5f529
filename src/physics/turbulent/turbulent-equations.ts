import type { OdeRight } from "../../numerics/ode-step";
import type { EdgeGas } from "../edge/edge-gas";
import { gasPlace } from "../edge/edge-gas";
import type { WallConditions } from "../laminar/wall-conditions";
import { emptyPlace, wallPlace } from "../laminar/wall-conditions";
import type { LaminarShare, TransitionZone } from "./transition-zone";
import { intermittency, laminarShare } from "./transition-zone";
import type { TurbulentLayer, TurbulentMethod, TurbulentPlace } from "./turbulent-method";
import { emptyLayer } from "./turbulent-method";

/** What lies along the wall for a march of one method. */
export interface TurbulentWall {
  method: TurbulentMethod;
  wall: WallConditions;
  gas: EdgeGas;
  /** ν∞ [length²/time]. */
  nu: number;
  /** Zone in which the layer is not turbulent all the time; null: turbulent throughout. */
  zone: TransitionZone | null;
}

/** The layer on the wall, all told: in a zone of intermittency the mean of its laminar and turbulent shares. */
export interface MeanLayer {
  theta: number;
  shape: number;
  friction: number;
  intermittency: number;
  turbulent: TurbulentLayer;
}

export interface TurbulentEquations {
  right: OdeRight;
  /** Above 0 while the layer is attached. */
  margin: (x: number, y: Float64Array) => number;
  /** Place and layer at the fraction t of a panel for a state; false outside the relations. */
  meanAt: (panel: number, t: number, y: Float64Array) => boolean;
  place: TurbulentPlace;
  mean: MeanLayer;
  /** The panel in which `right` reads its curves. */
  panel: number;
}

/**
 * dθ∕dx = cf∕2 − (H + 2 − M²) (θ∕ue) due∕dx − (θ∕r) dr∕dx; θ dH1∕dx = CE − H1 (dθ∕dx + (1 − M²) (θ∕ue) due∕dx + (θ∕r) dr∕dx), marched as
 * the shape factor through the slope of H1; and the method's own rate of CE. In a zone of intermittency cf and H of the momentum equation
 * are the means γ·turbulent + (1 − γ)·laminar, while the turbulent share's shape factor follows its own friction.
 */
export function turbulentEquations(on: TurbulentWall): TurbulentEquations {
  const { method, wall, gas, nu, zone } = on;
  const { x } = wall.edge.curve;
  const place: TurbulentPlace = { ...emptyPlace(), machSquare: 0, density: 1, viscosity: 1, nu };
  const layer = emptyLayer();
  const share: LaminarShare = { shape: 0, friction: 0 };
  const mean: MeanLayer = { theta: 0, shape: 0, friction: 0, intermittency: 1, turbulent: layer };
  const memory = method.unknowns === 3;

  const meanAt = (panel: number, t: number, y: Float64Array): boolean => {
    wallPlace(wall, panel, t, place);
    if (!gasPlace(gas, place.speed, place)) return false;
    place.nu = nu * place.viscosity;
    if (!method.layerAt(place, y, layer)) return false;
    mean.theta = layer.theta;
    mean.shape = layer.shape;
    mean.friction = layer.friction;
    mean.intermittency = 1;
    if (zone !== null) {
      const turbulent = intermittency(zone, place.x);
      laminarShare(layer.theta, place.speed, place.speedSlope, place.nu, share);
      mean.intermittency = turbulent;
      mean.shape = turbulent * layer.shape + (1 - turbulent) * share.shape;
      mean.friction = turbulent * layer.friction + (1 - turbulent) * share.friction;
    }
    return true;
  };

  const equations: TurbulentEquations = {
    panel: 0,
    place,
    mean,
    meanAt,
    right(at, y, slope) {
      const i = equations.panel;
      if (!meanAt(i, (at - x[i]) / (x[i + 1] - x[i]), y)) return false;
      const { theta } = layer;
      const gradient = (theta * place.speedSlope) / place.speed;
      const spread = (theta * place.radiusSlope) / place.radius;
      const m2 = place.machSquare;
      slope[0] = mean.friction / 2 - (mean.shape + 2 - m2) * gradient - spread;
      // The turbulent share's own growth, which is the layer's where there is no zone.
      const growth = zone === null ? slope[0] : layer.friction / 2 - (layer.shape + 2 - m2) * gradient - spread;
      const taken = layer.entrainment - layer.entrainShape * (growth + (1 - m2) * gradient + spread);
      slope[1] = taken / (theta * layer.entrainSlope);
      if (memory) slope[2] = method.entrainmentRate(place, layer);
      return true;
    },
    margin(at, y) {
      const i = equations.panel;
      return meanAt(i, (at - x[i]) / (x[i + 1] - x[i]), y) ? layer.margin : -1;
    },
  };
  return equations;
}

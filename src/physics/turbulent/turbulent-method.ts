import type { GasPlace } from "../edge/edge-gas";
import type { WallPlace } from "../laminar/wall-conditions";

/** The wall, the edge and the gas at one place. */
export type TurbulentPlace = WallPlace & GasPlace & { /** νe [length²/time]. */ nu: number };

/** A turbulent layer as an integral method knows it. */
export interface TurbulentLayer {
  theta: number;
  momentumReynolds: number;
  /** H = δ*∕θ, with density. */
  shape: number;
  /** The shape factor that the method marches: H itself, or H̄ of the speed profile alone. */
  marchedShape: number;
  /** H1 = (δ − δ*)∕θ and its derivative by the marched shape factor. */
  entrainShape: number;
  entrainSlope: number;
  friction: number;
  entrainment: number;
  /** cf of a plate layer with the same Reθ, lag method only. */
  plateFriction: number;
  /** Above 0 while the layer is attached by the method's own criterion. */
  margin: number;
}

export function emptyLayer(): TurbulentLayer {
  return { theta: 0, momentumReynolds: 0, shape: 0, marchedShape: 0, entrainShape: 0, entrainSlope: 0, friction: 0, entrainment: 0, plateFriction: 0, margin: 0 };
}

/** Closure of one integral method. The state is θ, the marched shape factor and, for a method with memory, CE. */
export interface TurbulentMethod {
  name: "entrainment" | "lag";
  unknowns: 2 | 3;
  /** The layer of a state; false outside the range of the relations. */
  layerAt(place: TurbulentPlace, y: Float64Array, out: TurbulentLayer): boolean;
  /** dCE∕dx for a method with memory; 0 without. */
  entrainmentRate(place: TurbulentPlace, layer: TurbulentLayer): number;
  /** dH∕dx from the rate of the marched shape factor. */
  shapeRate(place: TurbulentPlace, layer: TurbulentLayer, marchedRate: number): number;
  /** Marched shape factor from H. */
  marchedShape(shape: number, machSquare: number): number;
  /** H of a plate layer with this Reθ, where a layer begins after onset. */
  plateShape(momentumReynolds: number, machSquare: number): number;
  /** CE in equilibrium with the layer; for a method without memory its only value. */
  equilibriumEntrainment(place: TurbulentPlace, layer: TurbulentLayer): number;
}

import type { LayerStart } from "./thwaites-growth";

/** What is known of the layer at a station. */
export const LAYER_STATE = { notReached: 0, attached: 1, separated: 2 } as const;

/** Why a march ended. */
export type MarchStop =
  | { kind: "end" }
  /** The wall shear vanishes at station `x`, where the momentum loss is `momentumLoss`. */
  | { kind: "separation"; x: number; momentumLoss: number }
  /** λ leaves the range of the relations at station `x`. */
  | { kind: "limit"; x: number; momentumLoss: number; gradient: number };

/** A laminar layer along a wall: one entry a station; 0 where `state` says that nothing is known. */
export interface LaminarMarch {
  start: LayerStart;
  stop: MarchStop;
  /** Stations with complete results, from the first. */
  reached: number;
  /** Per station: one of LAYER_STATE. Beyond separation only momentumLoss, momentumReynolds and gradient are given. */
  state: Uint8Array;
  /** 1 where `friction` has no finite value: speed 0 (stagnation point), θ 0 (leading edge). */
  frictionBlank: Uint8Array;
  /** Edge speed ue [speed]. */
  edgeSpeed: Float64Array;
  /** θ [length]. */
  momentumLoss: Float64Array;
  /** δ* [length]. */
  defect: Float64Array;
  /** δ3 [length]. */
  energyLoss: Float64Array;
  /** H = δ*∕θ [1]. */
  shape: Float64Array;
  /** cf = 2 τw∕(ρ ue²) [1]. */
  friction: Float64Array;
  /** Reθ = ue θ∕ν [1]. */
  momentumReynolds: Float64Array;
  /** λ = θ² ue′∕ν [1]. */
  gradient: Float64Array;
  /** m = ue δ* [speed·length]. */
  massDefect: Float64Array;
  /** dm∕dx, or (1∕r) d(r m)∕dx on a round body [speed], from the method's own equations; 0 where `blowBlank`. */
  blowVelocity: Float64Array;
  /** 1 where `blowVelocity` has no finite value (leading edge). */
  blowBlank: Uint8Array;
  counts: { panels: number; searchedPanels: number; rootEvaluations: number };
}

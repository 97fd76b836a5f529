import type { MarchStart } from "./field-start";

/** One step of a march: from one fraction of a panel to another. */
export interface StepPlan {
  panel: number;
  from: number;
  to: number;
}

/** What the march knows of the layer at one place. */
export interface FieldRecord {
  x: number;
  /** The variable in which the steps are taken: x − x₁, or its root. */
  along: number;
  speed: number;
  speedSlope: number;
  momentumLoss: number;
  defect: number;
  energyLoss: number;
  /** ∂u∕∂y at the wall [1/time]: τw∕μ. */
  wallShear: number;
  /** dm∕dx, (1∕r) d(r m)∕dx on a round body [speed]; Infinity at a leading edge. */
  blowVelocity: number;
  /** S = θ τw∕(μ ue) and H, finite at a stagnation point and a leading edge too. */
  shear: number;
  shape: number;
}

/** Why a field march ended. */
export type FieldStop =
  | { kind: "end" }
  /** The wall shear vanishes at station x, extrapolated by the square-root law over `reach`. */
  | { kind: "separation"; x: number; reach: number }
  /** Blowing has brought the wall shear to nothing: the layer lifts off near station x. */
  | { kind: "lift-off"; x: number }
  /** No solution past station x although the wall shear is far from nothing. */
  | { kind: "limit"; x: number };

/** A march of the full equations: a record a station reached. */
export interface FieldRun {
  start: MarchStart;
  stop: FieldStop;
  records: FieldRecord[];
  /** The steps taken, for a march on the same steps halved. */
  plan: StepPlan[];
  counts: { steps: number; rejected: number; turns: number; nodes: number };
  profiles: StoredProfile[];
}

/** A profile kept at a station: heights [length] and speeds. */
export interface StoredProfile {
  x: number;
  height: Float64Array;
  speed: Float64Array;
  /** ∂u∕∂y. */
  shear: Float64Array;
}


/** A laminar layer at one place, as criteria of onset see it. */
export interface OnsetPlace {
  /** Rex: ue over ν times the distance from where the layer began. */
  distanceReynolds: number;
  /** Reθ. */
  momentumReynolds: number;
  /** λ = θ² ue′∕ν. */
  gradient: number;
  shape: number;
  /** Turbulence of the stream as a fraction of its speed. */
  turbulence: number;
}

/** A criterion of onset: where `excess` turns from below 0 to 0 the laminar layer gives way. */
export interface OnsetCriterion {
  name: string;
  excess(place: OnsetPlace): number;
  /** Words for a note where the criterion is used outside the range of its data; "" inside. */
  remark(place: OnsetPlace): string;
}

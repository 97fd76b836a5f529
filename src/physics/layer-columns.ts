/** What a layer is at a station. */
export const ROW_STATE = { notReached: 0, laminar: 1, transition: 2, bubble: 3, turbulent: 4, separated: 5 } as const;

export type RowState = (typeof ROW_STATE)[keyof typeof ROW_STATE];

/** The columns that may have nothing to say at a station, as bits of `given`. */
export const GIVEN = {
  momentumLoss: 1,
  defect: 2,
  energyLoss: 4,
  shape: 8,
  layerHeight: 16,
  friction: 32,
  momentumReynolds: 64,
  gradient: 128,
  massDefect: 256,
  blowVelocity: 512,
  entrainment: 1024,
  intermittency: 2048,
} as const;

export type LayerColumn = keyof typeof GIVEN;

/** A layer along a wall of any kind: one entry a station, 0 where its bit of `given` is not set. */
export type LayerColumns = {
  /** Per station: one of ROW_STATE. */
  state: Uint8Array;
  given: Uint16Array;
  /** ue [speed]. */
  edgeSpeed: Float64Array;
} & {
  /** θ, δ*, δ3, δ [length]; H, cf, Reθ, λ = θ² ue′∕ν, CE, γ [1]; m = (ρe∕ρ∞) ue δ* [speed·length]; dm∕dx [speed]. */
  [column in LayerColumn]: Float64Array;
};

export function layerColumns(edgeSpeed: Float64Array): LayerColumns {
  const n = edgeSpeed.length;
  const column = (): Float64Array => new Float64Array(n);
  return {
    state: new Uint8Array(n),
    given: new Uint16Array(n),
    edgeSpeed: edgeSpeed.slice(),
    momentumLoss: column(),
    defect: column(),
    energyLoss: column(),
    shape: column(),
    layerHeight: column(),
    friction: column(),
    momentumReynolds: column(),
    gradient: column(),
    massDefect: column(),
    blowVelocity: column(),
    entrainment: column(),
    intermittency: column(),
  };
}

/** Writes a value at a station if it is finite and says so in `given`; leaves the place empty otherwise. */
export function giveValue(columns: LayerColumns, column: LayerColumn, i: number, value: number): void {
  if (!Number.isFinite(value)) return;
  columns[column][i] = value;
  columns.given[i] |= GIVEN[column];
}

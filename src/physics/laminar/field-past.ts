import type { FieldGrid } from "./field-grid";
import type { FieldRecord, StoredProfile } from "./field-record";
import type { FieldProfile } from "./field-step";

/** A profile left behind, with what belongs to it. */
export interface PastProfile {
  x: number;
  along: number;
  square: number;
  /** δ*∕Δ. */
  defect: number;
  profile: FieldProfile;
}

export function emptyProfile(grid: FieldGrid): FieldProfile {
  const room = grid.eta.length;
  return { f: new Float64Array(room), u: new Float64Array(room), v: new Float64Array(room) };
}

/** out = factor · Σ weight[i + shift] · past[i], for nodes from … to. */
export function combine(past: readonly PastProfile[], count: number, weight: Float64Array, shift: number, factor: number, out: FieldProfile, from: number, to: number): void {
  out.f.fill(0, from, to);
  out.u.fill(0, from, to);
  out.v.fill(0, from, to);
  for (let i = 0; i < count; i += 1) {
    const w = factor * weight[i + shift];
    const { f, u, v } = past[i].profile;
    for (let j = from; j < to; j += 1) {
      out.f[j] += w * f[j];
      out.u[j] += w * u[j];
      out.v[j] += w * v[j];
    }
  }
}

/** A profile in the sheet's units. */
export function storedProfile(grid: FieldGrid, past: PastProfile, record: FieldRecord): StoredProfile {
  const scale = Math.sqrt(past.square);
  const { eta, count } = grid;
  const { u, v } = past.profile;
  return {
    x: record.x,
    height: eta.subarray(0, count).map((e) => scale * e),
    speed: u.subarray(0, count).map((ratio) => record.speed * ratio),
    shear: v.subarray(0, count).map((slope) => (record.speed * slope) / scale),
  };
}

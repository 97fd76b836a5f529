import { brentRoot } from "../../numerics/brent-root";
import { cubicSpline } from "../../numerics/cubic-spline";
import { refuse, type Outcome } from "../../numerics/outcome";
import { cubicAt, panelValue } from "../../numerics/piecewise-cubic";
import { contourCrossing } from "./contour-crossing";
import { edgeSpeed, GAMMA_OF_AIR, stagnationPressure } from "./edge-speed";
import { surfaceCurve } from "./surface-curve";

/** One side of a body, from the stagnation point to the tail. */
export interface SurfaceSide {
  /** Arc length from the stagnation point [length]; the first is 0. */
  station: Float64Array;
  x: Float64Array;
  y: Float64Array;
  /** Edge speed [speed]; 0 at the stagnation point. */
  speed: Float64Array;
  /** Row of the tap behind each station, counted from 1; 0 for the stagnation point. */
  row: Int32Array;
  /** Taps whose cp lay a little above the stagnation value and were read as stagnation. */
  clamped: number;
}

export interface TapSettings {
  side: "upper" | "lower";
  referenceSpeed: number;
  /** Reference Mach number; 0 or omitted: Bernoulli. */
  mach?: number;
  gamma?: number;
}

/** A tap's cp may lie this far above the stagnation value by scatter of its own (common practice, no source); it then counts as stagnation. */
const SCATTER_ABOVE = 0.02;
/** Fewer taps on a side than this fix no stagnation point. */
const LEAST_TAPS = 3;
/** A tap nearer to the stagnation point than this share of the contour would only repeat it. */
const AT_STAGNATION = 1e-6;

/**
 * One side of a section from its taps: stations counted along the wall from the stagnation point, which is located between the taps.
 *
 * The taps follow the contour from tail to tail round the nose, in either direction. The stagnation point lies by the tap with the highest inner
 * maximum of cp; speed with its sign changing there is a smooth curve over arc length, and its zero is the stagnation point. "upper" is the side
 * whose taps lie higher on average.
 *
 * @param x, @param y tap coordinates [length], n ≥ 6; a doubled first or last point is dropped
 * @param cp pressure coefficients [1]; NaN marks a missing tap, whose coordinates still shape the contour
 * @returns the side's stations, coordinates and edge speed; refused where the contour crosses itself, where cp has no inner maximum ("no
 *   stagnation point") or leaves its possible range (with the row)
 *
 * Source: own definition; speed from pressure by Bernoulli or NACA Report 1135 (1953), see edgeSpeed.
 */
export function surfaceFromTaps(x: Float64Array, y: Float64Array, cp: Float64Array, settings: TapSettings): Outcome<{ side: SurfaceSide }> {
  const kept = withoutDoubledEnds(x, y);
  const px = Float64Array.from(kept, (i) => x[i]!);
  const py = Float64Array.from(kept, (i) => y[i]!);
  const surface = surfaceCurve(px, py);
  if (!surface.ok) return { ...surface, row: surface.row === undefined ? undefined : kept[surface.row - 1]! + 1 };
  const crossing = contourCrossing(px, py);
  if (crossing) return refuse("contour crosses", { argument: "x", row: kept[crossing[0]]! + 1, values: { other: kept[crossing[1]]! + 1 } });
  const { length } = surface.surface;
  const taps = Array.from(kept.keys()).filter((k) => !Number.isNaN(cp[kept[k]!]!));
  if (taps.length < 2 * LEAST_TAPS) return refuse("too few points", { argument: "cp", values: { count: taps.length, least: 2 * LEAST_TAPS } });
  const pressure = Float64Array.from(taps, (k) => cp[kept[k]!]!);
  const speeds = tapSpeeds(pressure, settings);
  if (!speeds.ok) return { ...speeds, row: speeds.row === undefined ? undefined : kept[taps[speeds.row - 1]!]! + 1 };
  const along = Float64Array.from(taps, (k) => length[k]!);
  const peak = innerPeak(pressure);
  if (peak === undefined) return refuse("no stagnation point", { argument: "cp", row: kept[taps[highest(pressure)]!]! + 1, values: { value: pressure[highest(pressure)]! } });
  const signed = signedSpeeds(along, speeds.speed, peak);
  const zero = stagnation(along, signed, peak);
  if (!zero.ok) return zero;

  const before = sideOf(-1);
  const after = sideOf(1);
  const heights = [before, after].map((side) => mean(side.map((t) => py[taps[t]!]!)));
  if (heights[0] === heights[1]) return refuse("sides alike", { argument: "y" });
  const chosen = heights[0]! > heights[1]! === (settings.side === "upper") ? before : after;
  if (chosen.length < LEAST_TAPS) return refuse("too few points", { argument: "cp", values: { count: chosen.length, least: LEAST_TAPS } });
  const nose = [surface.surface.x, surface.surface.y].map((c) => cubicAt(c, Math.min(Math.max(zero.at, c.x[0]!), c.x.at(-1)!)));
  const [noseX, noseY] = nose;
  if (!noseX!.ok) return noseX!;
  if (!noseY!.ok) return noseY!;
  return {
    ok: true,
    side: {
      station: Float64Array.of(0, ...chosen.map((t) => Math.abs(along[t]! - zero.at))),
      x: Float64Array.of(noseX!.value, ...chosen.map((t) => px[taps[t]!]!)),
      y: Float64Array.of(noseY!.value, ...chosen.map((t) => py[taps[t]!]!)),
      speed: Float64Array.of(0, ...chosen.map((t) => Math.abs(signed[t]!))),
      row: Int32Array.of(0, ...chosen.map((t) => kept[taps[t]!]! + 1)),
      clamped: speeds.clamped,
    },
  };

  /** Taps on one side of the stagnation point, from it outward. */
  function sideOf(direction: 1 | -1): number[] {
    if (!zero.ok) return [];
    const near = AT_STAGNATION * length.at(-1)!;
    const list = taps.map((_, t) => t).filter((t) => direction * (along[t]! - zero.at) > near);
    return direction > 0 ? list : list.reverse();
  }
}

function withoutDoubledEnds(x: Float64Array, y: Float64Array): Int32Array {
  const same = (i: number, j: number) => x[i] === x[j] && y[i] === y[j];
  let first = 0;
  let last = x.length - 1;
  while (first < last && same(first, first + 1)) first++;
  while (last > first && same(last, last - 1)) last--;
  return Int32Array.from({ length: last - first + 1 }, (_, i) => first + i);
}

function tapSpeeds(pressure: Float64Array, settings: TapSettings): Outcome<{ speed: Float64Array; clamped: number }> {
  const { referenceSpeed, mach = 0, gamma = GAMMA_OF_AIR } = settings;
  const stagnation = stagnationPressure(mach, gamma);
  let clamped = 0;
  const read = pressure.map((value) => {
    if (!(value > stagnation && value <= stagnation * (1 + SCATTER_ABOVE))) return value;
    clamped++;
    return stagnation;
  });
  const made = edgeSpeed(read, referenceSpeed, mach, gamma);
  return made.ok ? { ok: true, speed: made.speed, clamped } : made;
}

/** The highest tap that is higher than its neighbours: a tail, where cp may be high too, is at an end and does not count. */
function innerPeak(pressure: Float64Array): number | undefined {
  let best: number | undefined;
  for (let i = 1; i + 1 < pressure.length; i++) {
    if (pressure[i]! < pressure[i - 1]! || pressure[i]! < pressure[i + 1]!) continue;
    if (best === undefined || pressure[i]! > pressure[best]!) best = i;
  }
  return best;
}

function highest(values: Float64Array): number {
  return values.reduce((best, v, i) => (v > values[best]! ? i : best), 0);
}

/** Speeds below 0 before the stagnation point; the tap at the peak itself gets the sign that continues its neighbours' curve. */
function signedSpeeds(s: Float64Array, speed: Float64Array, peak: number): Float64Array {
  const signed = speed.map((v, i) => (i < peak ? -v : v));
  const around = [peak - 2, peak - 1, peak + 1, peak + 2].filter((i) => i >= 0 && i < s.length);
  let expected = 0; // Lagrange through the neighbours
  for (const i of around) {
    let weight = 1;
    for (const j of around) if (j !== i) weight *= (s[peak]! - s[j]!) / (s[i]! - s[j]!);
    expected += weight * signed[i]!;
  }
  signed[peak] = expected < 0 ? -speed[peak]! : speed[peak]!;
  return signed;
}

/** Where the signed speed's spline is zero, between the tap before and the tap after the peak. */
function stagnation(s: Float64Array, signed: Float64Array, peak: number): Outcome<{ at: number }> {
  if (signed[peak] === 0) return { ok: true, at: s[peak]! };
  const spline = cubicSpline(s, signed);
  if (!spline.ok) return spline;
  const panel = signed[peak]! > 0 ? peak - 1 : peak;
  const root = brentRoot((t) => panelValue(spline.curve, panel, t), 0, 1);
  if (!root.ok) return refuse("no stagnation point", { argument: "cp", at: s[peak]!, values: { value: signed[peak]! } });
  return { ok: true, at: s[panel]! + root.x * (s[panel + 1]! - s[panel]!) };
}

function mean(values: readonly number[]): number {
  return values.reduce((a, b) => a + b, 0) / Math.max(1, values.length);
}

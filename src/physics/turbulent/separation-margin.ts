import { brentRoot } from "../../numerics/brent-root";
import { gaussLegendre } from "../../numerics/gauss-legendre";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { panelLeast, panelOf, panelSecond, panelSlope, panelValue } from "../../numerics/piecewise-cubic";

/** x̄² C̄p (dC̄p∕dx)² at laminar separation: B. S. Stratford, ARC R&M 3002 (1954; published 1957). */
export const LAMINAR_LIMIT = 0.0104;
/** C̄p (x̄ dC̄p∕dx)^½ (10⁻⁶ Re)^(−1∕10) at turbulent separation where pressure curves upward, and where not: B. S. Stratford, J. Fluid Mech. 5 (1959) 1–16. */
export const TURBULENT_LIMIT = { rising: 0.39, falling: 0.35 } as const;
/** C̄p up to which the turbulent formula holds (inner and outer layers apart; n = 6). */
export const TURBULENT_RANGE = 4 / 7;

export interface MarginSettings {
  /** "laminar" or "turbulent" behind the pressure minimum. */
  layer: "laminar" | "turbulent";
  /** Reference speed over viscosity [1/length], turbulent only: makes Re of lengths and speeds. */
  unitReynolds?: number;
  /** Station where the layer turns turbulent ahead of the pressure minimum; omitted: turbulent from the first station. */
  onset?: number;
}

/** Stratford's quantities at the stations; entries ahead of the pressure minimum are 0. */
export interface SeparationMargin {
  /** Station of the lowest pressure, from which the rise is counted. */
  peak: number;
  /** First station (index) behind the peak. */
  first: number;
  /** Distance of constant pressure that would make the layer at the peak the same [length]. */
  head: number;
  /** C̄p = (cp − cp min)∕(1 − cp min). */
  canonical: Float64Array;
  /** x̄: distance from the equivalent start [length]. */
  distance: Float64Array;
  /** The criterion's left-hand side, and its limit. */
  number: Float64Array;
  limit: Float64Array;
  /** 1 − number∕limit: 1 far from separation, 0 at it. */
  margin: Float64Array;
  /** Separation, located inside a step; null where it is not reached. */
  separation: number | null;
  /** Where C̄p leaves the turbulent formula's range; null where it does not. */
  rangeEnd: number | null;
}

/** Weights of the equivalent start: θ of a laminar layer keeps ∫ u⁵ dx, a turbulent one ∫ u⁴ dx (A. M. O. Smith, J. Aircraft 12 (1975) 501–526; powers from memory). */
const LAMINAR_POWER = 5;
const TURBULENT_POWER = 4;
/** Turbulent run equivalent to a laminar one ahead of onset: 38.2 (Re)^(−3∕8) … (Stratford 1959 as in Smith 1975). */
const LAMINAR_RUN = 38.2;
const NODES = 6;
/** Looks in a panel for the first crossing. */
const LOOKS = 8;

/**
 * Stratford's criteria of separation along a pressure column.
 *
 * @param curve cp as a curve over the stations, cp < 1; the first station is where the layer begins
 * @returns refused where the pressure never rises behind its lowest value ("pressure never rises")
 */
export function separationMargin(curve: PiecewiseCubic, settings: MarginSettings): Outcome<{ margin: SeparationMargin }> {
  const { x } = curve;
  const n = x.length;
  const turbulent = settings.layer === "turbulent";
  const unit = settings.unitReynolds ?? 0;
  if (turbulent && !(unit > 0 && Number.isFinite(unit))) return refuse("not positive", { argument: "nu", values: { value: unit } });
  for (let i = 0; i < n; i += 1) if (!(curve.value[i] <= 1)) return refuse("outside range", { argument: "cp", row: i + 1, values: { value: curve.value[i], least: -Infinity, most: 1 } });
  let least = { value: Infinity, t: 0 };
  let panel = 0;
  for (let i = 0; i + 1 < n; i += 1) {
    const here = panelLeast(curve, i);
    if (here.value < least.value) {
      least = here;
      panel = i;
    }
  }
  const peak = x[panel] + least.t * (x[panel + 1] - x[panel]);
  if (!(peak < x[n - 1])) return refuse("pressure never rises", { argument: "cp" });
  const span = 1 - least.value;
  const speedRatio = (at: number): number => Math.sqrt(Math.max(1 - valueAt(curve, at), 0) / span);
  const head = equivalentHead(x[0], peak, speedRatio, settings, unit * Math.sqrt(span));
  if (!head.ok) return head;

  const at = (place: number, i: number): { canonical: number; distance: number; number: number; limit: number } => {
    const t = (place - x[i]) / (x[i + 1] - x[i]);
    const canonical = (panelValue(curve, i, t) - least.value) / span;
    const slope = panelSlope(curve, i, t) / span;
    const distance = place - peak + head.head;
    if (!turbulent) return { canonical, distance, number: slope > 0 ? distance * distance * canonical * slope * slope : 0, limit: LAMINAR_LIMIT };
    const re = unit * Math.sqrt(span) * distance;
    const number = slope > 0 ? canonical * Math.sqrt(distance * slope) * Math.pow(1e-6 * re, -0.1) : 0;
    return { canonical, distance, number, limit: panelSecond(curve, i, t) >= 0 ? TURBULENT_LIMIT.rising : TURBULENT_LIMIT.falling };
  };

  const column = (): Float64Array => new Float64Array(n);
  const out: SeparationMargin = { peak, first: n, head: head.head, canonical: column(), distance: column(), number: column(), limit: column(), margin: column(), separation: null, rangeEnd: null };
  for (let i = panel; i + 1 < n; i += 1) {
    const from = i === panel ? peak : x[i];
    if (out.separation === null) out.separation = crossing((place) => { const q = at(place, i); return q.number - q.limit; }, from, x[i + 1]);
    if (turbulent && out.rangeEnd === null) out.rangeEnd = crossing((place) => at(place, i).canonical - TURBULENT_RANGE, from, x[i + 1]);
    out.first = Math.min(out.first, i + 1);
    const q = at(x[i + 1], i);
    out.canonical[i + 1] = q.canonical;
    out.distance[i + 1] = q.distance;
    out.number[i + 1] = q.number;
    out.limit[i + 1] = q.limit;
    out.margin[i + 1] = 1 - q.number / q.limit;
    if (!Number.isFinite(q.number)) return refuse("not finite", { argument: "cp", row: i + 2 });
  }
  // Beyond the range of the turbulent formula nothing is concluded.
  if (out.rangeEnd !== null && out.separation !== null && out.separation > out.rangeEnd) out.separation = null;
  return { ok: true, margin: out };
}

function valueAt(curve: PiecewiseCubic, at: number): number {
  const i = panelOf(curve.x, at);
  return panelValue(curve, i, (at - curve.x[i]) / (curve.x[i + 1] - curve.x[i]));
}

/** First place in a stretch where a function rises through 0. */
function crossing(f: (x: number) => number, from: number, to: number): number | null {
  let before = from;
  let low = f(from + 1e-12 * (to - from));
  for (let k = 1; k <= LOOKS; k += 1) {
    const place = from + ((to - from) * k) / LOOKS;
    const now = f(place);
    if (now >= 0 && low < 0) {
      const root = brentRoot(f, k === 1 ? from + 1e-12 * (to - from) : before, place, 1e-12 * (to - from));
      return root.ok ? root.x : place;
    }
    before = place;
    low = now;
  }
  return null;
}

/** The run at peak speed that gives the layer at the peak: laminar, turbulent, or laminar to the onset and turbulent from there. */
function equivalentHead(start: number, peak: number, ratio: (x: number) => number, settings: MarginSettings, peakUnit: number): Outcome<{ head: number }> {
  const gauss = gaussLegendre(NODES);
  if (!gauss.ok) return gauss;
  const integral = (power: number, a: number, b: number): number => {
    const parts = 16;
    let sum = 0;
    for (let p = 0; p < parts; p += 1) {
      const from = a + ((b - a) * p) / parts;
      const half = (b - a) / parts / 2;
      for (let k = 0; k < NODES; k += 1) sum += gauss.weight[k] * half * Math.pow(ratio(from + half * (1 + gauss.node[k])), power);
    }
    return sum;
  };
  if (settings.layer === "laminar") return { ok: true, head: integral(LAMINAR_POWER, start, peak) };
  const onset = settings.onset ?? start;
  if (!(onset >= start && onset <= peak)) return refuse("outside range", { argument: "onset", values: { value: onset, least: start, most: peak } });
  const turbulentRun = integral(TURBULENT_POWER, onset, peak);
  if (onset === start) return { ok: true, head: turbulentRun };
  const run = onset - start;
  const laminar = integral(LAMINAR_POWER, start, onset) / run;
  const head = LAMINAR_RUN * Math.pow(peakUnit * run, -3 / 8) * Math.pow(ratio(onset), 1 / 8) * Math.pow(laminar, 5 / 8) * run;
  return { ok: true, head: head + turbulentRun };
}

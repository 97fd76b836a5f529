import { checkColumns } from "../../numerics/check-column";
import { cubicSpline } from "../../numerics/cubic-spline";
import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { runningIntegral } from "../../numerics/piecewise-cubic";

/** What a wake rake gives. */
export interface RakeReadings {
  /** Places across the wake [length], n ≥ 4, strictly rising. */
  y: Float64Array;
  /** u∕U at each, or the total-pressure coefficient (p0 − p∞)∕q∞. */
  value: Float64Array;
  kind: "speed" | "total pressure";
  /**
   * cp at each place. Null: from the edges, where the total pressure is that of the stream; between them a straight line. Only speeds tell
   * the edges' pressure: total pressures need it given.
   */
  pressure: Float64Array | null;
}

/** Standard uncertainties of the readings: of each value and place by itself, and of the pressure level all along. */
export interface RakeUncertainty {
  value: number;
  y: number;
  pressure: number;
}

export interface RakeDrag {
  /** Drag area per span [length]: cd times the chord. */
  jones: number;
  betz: number;
  /** First-order standard uncertainties of both. */
  jonesError: number;
  betzError: number;
  /** What a spline through the points changes on straight lines between them: a measure of too few points. */
  curveError: number;
  /** Total-pressure coefficient at the two ends. */
  ends: [number, number];
  /** Pressure coefficient at the wake's middle. */
  middlePressure: number;
}

/** The ends' total pressure may miss the stream's by this much; more, and the rake does not reach the wake's edge. */
const EDGE_TOLERANCE = 0.03;
/** Step of the differences behind the uncertainty, of the values' own size 1. */
const NUDGE = 1e-6;

/**
 * Profile drag from a traverse of the wake by the formulas of Jones, 2 ∫ √(g − cp) (1 − √g) dy, and of Betz, ∫ (1 − g) dy + ∫ (u* − u)(u* + u − 2) dy, where g
 * is the total-pressure coefficient, u = √(g − cp) and u* = √(1 − cp), in constant density.
 *
 * @returns both drag areas and their uncertainties; refused where a reading is impossible (with its row) or where the rake's ends lie in the wake
 *
 * Sources: A. Betz, ZFM 16 (1925) 42–44; B. M. Jones, ARC R&M 1688 (1936).
 */
export function rakeDrag(readings: RakeReadings, uncertainty: RakeUncertainty = { value: 0, y: 0, pressure: 0 }): Outcome<{ drag: RakeDrag }> {
  const { y, value, kind } = readings;
  const bad = checkColumns(y, value, 4, ["y", "value"]);
  if (bad) return bad;
  const n = y.length;
  const pressure = readings.pressure ?? (kind === "speed" ? edgePressure(y, value) : null);
  if (pressure === null) return refuse("pressure missing", { argument: "static_pressure" });
  if (pressure.length !== n) return refuse("lengths differ", { argument: "static_pressure", values: { count: pressure.length, expected: n } });
  const refused = checkReadings(readings, pressure);
  if (refused) return refused;
  const total = (v: number, p: number): number => (kind === "speed" ? p + v * v : v);
  const ends: [number, number] = [total(value[0], pressure[0]), total(value[n - 1], pressure[n - 1])];
  for (const [k, end] of ends.entries()) {
    if (Math.abs(end - 1) > EDGE_TOLERANCE) return refuse("ends inside wake", { argument: "value", row: k === 0 ? 1 : n, values: { value: end, tolerance: EDGE_TOLERANCE } });
  }
  const laws = { jones: jonesDensity, betz: betzDensity };
  const out: RakeDrag = { jones: 0, betz: 0, jonesError: 0, betzError: 0, curveError: 0, ends, middlePressure: pressure[n >> 1] };
  for (const law of ["jones", "betz"] as const) {
    const at = (v: number, p: number): number => laws[law](total(v, p), p);
    const f = Float64Array.from(y, (_, i) => at(value[i], pressure[i]));
    let sum = 0;
    let variance = 0;
    let level = 0;
    for (let i = 0; i < n; i += 1) {
      const weight = (y[Math.min(i + 1, n - 1)] - y[Math.max(i - 1, 0)]) / 2;
      sum += weight * f[i];
      const byValue = (at(value[i] + NUDGE, pressure[i]) - at(value[i] - NUDGE, pressure[i])) / (2 * NUDGE);
      // A point moved along y stretches one panel and shortens the other.
      const byPlace = ((i > 0 ? f[i - 1] + f[i] : 0) - (i + 1 < n ? f[i + 1] + f[i] : 0)) / 2;
      variance += (weight * byValue * uncertainty.value) ** 2 + (byPlace * uncertainty.y) ** 2;
      level += (weight * (at(value[i], pressure[i] + NUDGE) - at(value[i], pressure[i] - NUDGE))) / (2 * NUDGE);
    }
    out[law] = sum;
    out[law === "jones" ? "jonesError" : "betzError"] = Math.sqrt(variance + (level * uncertainty.pressure) ** 2);
    if (law === "jones") {
      const spline = cubicSpline(y, f);
      if (spline.ok) out.curveError = runningIntegral(spline.curve)[n - 1] - sum;
    }
  }
  if (![out.jones, out.betz, out.jonesError, out.betzError, out.curveError].every(Number.isFinite)) return refuse("not finite", { argument: "y" });
  return { ok: true, drag: out };
}

function jonesDensity(total: number, pressure: number): number {
  return 2 * Math.sqrt(Math.max(total - pressure, 0)) * (1 - Math.sqrt(Math.max(total, 0)));
}

function betzDensity(total: number, pressure: number): number {
  const u = Math.sqrt(Math.max(total - pressure, 0));
  const ideal = Math.sqrt(1 - pressure);
  return 1 - total + (ideal - u) * (ideal + u - 2);
}

/** cp from the edges' speeds, where the total pressure is the stream's, and straight between. */
function edgePressure(y: Float64Array, speed: Float64Array): Float64Array {
  const n = y.length;
  const first = 1 - speed[0] ** 2;
  const last = 1 - speed[n - 1] ** 2;
  return y.map((at) => first + ((last - first) * (at - y[0])) / (y[n - 1] - y[0]));
}

/** Wake speeds may read a little below 0 in the innermost points of a near wake; more is backflow, which no formula here holds for. */
const LEAST_SPEED = 0;

function checkReadings(readings: RakeReadings, pressure: Float64Array): Refusal | null {
  const { value, kind } = readings;
  for (let i = 0; i < value.length; i += 1) {
    if (!Number.isFinite(pressure[i])) return refuse("not finite", { argument: "static_pressure", row: i + 1 });
    if (!(pressure[i] < 1)) return refuse("outside range", { argument: "static_pressure", row: i + 1, values: { value: pressure[i], least: -Infinity, most: 1 } });
    if (kind === "speed" && value[i] < LEAST_SPEED) return refuse("negative", { argument: "value", row: i + 1, values: { value: value[i] } });
    const total = kind === "speed" ? pressure[i] + value[i] ** 2 : value[i];
    if (total < Math.max(pressure[i], 0)) return refuse("outside range", { argument: "value", row: i + 1, values: { value: value[i], least: kind === "speed" ? Math.sqrt(Math.max(-pressure[i], 0)) : Math.max(pressure[i], 0), most: Infinity } });
  }
  return null;
}

import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { cubicAt, panelOf } from "../../numerics/piecewise-cubic";
import type { StoredProfile } from "./field-record";
import type { FieldOptions } from "./field-run";
import { fieldRun } from "./field-run";
import type { WallConditions } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

/**
 * The speed profile across the layer at one place of a field march.
 *
 * @param at place along the wall [length], behind the first station and not behind the last
 * @returns heights from the wall into the free stream [length], speeds and their gradient; "outside column" before the first station, after the last
 *   and beyond the place where the march ended
 */
export function fieldProfile(wall: WallConditions, nu: number, at: number, options: FieldOptions = {}): Outcome<{ profile: StoredProfile }> {
  const { x } = wall.edge.curve;
  const last = x[x.length - 1];
  if (!(at > x[0] && at <= last)) return refuse("outside column", { argument: "station", values: { value: at, least: x[0], most: last } });
  const short = endingAt(wall, at);
  const panel = short.edge.curve.x.length - 2;
  const made = fieldRun(short, nu, { ...options, keep: { panel, t: 1 } });
  if (!made.ok) return made;
  const { run } = made;
  const profile = run.profiles[0];
  if (profile === undefined) {
    const end = run.stop.kind === "end" ? run.records[run.records.length - 1].x : run.stop.x;
    return refuse("outside column", { argument: "station", values: { value: at, least: x[0], most: end } });
  }
  return { ok: true, profile };
}

/** The same wall, its curves cut off at a place: the last panel's cubics are the same, held by another knot. */
function endingAt(wall: WallConditions, at: number): WallConditions {
  const { x } = wall.edge.curve;
  if (at === x[x.length - 1]) return wall;
  const panel = panelOf(x, at);
  const place = wallPlace(wall, panel, (at - x[panel]) / (x[panel + 1] - x[panel]), emptyPlace());
  const keep = at === x[panel] ? panel : panel + 1;
  const cut = (curve: PiecewiseCubic): PiecewiseCubic => {
    const end = cubicAt(curve, at);
    const upTo = (column: Float64Array, value: number): Float64Array => Float64Array.of(...column.subarray(0, keep), value);
    return end.ok ? { x: upTo(curve.x, at), value: upTo(curve.value, end.value), slope: upTo(curve.slope, end.slope) } : curve;
  };
  return {
    ...wall,
    edge: { ...wall.edge, curve: cut(wall.edge.curve) },
    radius: wall.radius === null ? null : cut(wall.radius),
    wallVelocity: wall.wallVelocity === null ? null : cut(wall.wallVelocity),
    flow: Float64Array.of(...wall.flow.subarray(0, keep), place.flow),
  };
}

import { checkColumns, checkFinite } from "../../numerics/check-column";
import { monotoneCurve } from "../../numerics/monotone-curve";
import { refuse, type Outcome, type Refusal } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { findEdge, type EdgeOrigin } from "./find-edge";
import { layerHeight } from "./layer-height";
import { curveIntegrals, gapIntegrals, type LossIntegrals, type ProfileCurves } from "./loss-integrals";
import { nearWall, type NearWall, type NearWallChoice } from "./near-wall";
import { profileCurve } from "./profile-curve";

/** The thicknesses of a profile. */
export interface Thicknesses {
  /** δ* [length] */
  defect: number;
  /** θ [length] */
  momentumLoss: number;
  /** δ3 [length] */
  energyLoss: number;
}

/** What a traverse gives. */
export interface Traverse extends Thicknesses {
  /** Edge speed at the wall [speed]; with an edge column, the inviscid speed continued to the wall. */
  edgeSpeed: number;
  edgeOrigin: EdgeOrigin;
  /** m [speed·length], or [density·speed·length] with a density column. */
  massDefect: number;
  /** δ*∕θ */
  shape: number;
  /** δ3∕θ */
  energyShape: number;
  /** Height where u = 0.99 of the edge speed [length]; undefined where the profile does not reach it. */
  height: number | undefined;
  /** (δ − δ*)∕θ with that height; undefined with it. */
  entrainmentShape: number | undefined;
  nearWall: NearWall;
  /** Share of each thickness that comes from below the first measured point. */
  share: Thicknesses;
  /** The thicknesses without the rule: a straight line to the wall instead of a fitted law, or nothing instead of the no-slip point. */
  without: Thicknesses;
  /** Relative difference to the same integral over a second curve through the same points: what the choice of curve can change. */
  curveError: Thicknesses;
  /** Measured points used, a wall point not counted. */
  points: number;
}

export interface TraverseSettings {
  /** A speed, or the inviscid speed at each y; omitted: found from the profile. */
  edge?: number | Float64Array;
  /** Density at each y; omitted: constant. */
  density?: Float64Array;
  /** Radius of a round wall, > 0 flow outside, < 0 flow inside; omitted: plane. */
  radius?: number;
  /** Kinematic viscosity, for the fitted law of the wall; omitted: fitted too. */
  nu?: number;
  nearWall?: NearWallChoice;
}

/** Fraction of the edge speed that marks the layer height. */
export const LAYER_FRACTION = 0.99;
/** A traverse that ends below this share of the edge speed misses more of δ* than any rule should add. */
const REACHES_EDGE = 0.95;
/** Speeds above this share of a given edge speed mean that the edge speed is not of this profile. */
const ABOVE_EDGE = 1.1;
/** A wall point may carry this share of the edge speed (rounding of simulated data). */
const STILL_AT_WALL = 1e-6;

/**
 * Thicknesses of a measured or computed profile, closed at the wall by a stated rule.
 *
 * δ* = ∫(1 − ρu∕ρeU)dy, θ = ∫ρu∕ρeU (1 − u∕U)dy, δ3 = ∫ρu∕ρeU (1 − u²∕U²)dy, m = ∫(ρeU − ρu)dy. With an edge column U(y) the integrands are
 * ρeU(y) − ρu, ρu(U(y) − u), ρu(U(y)² − u²), divided by powers of the inviscid speed at the wall, so that they vanish outside the layer and
 * the result does not hang on where the traverse ends (Lighthill, J. Fluid Mech. 4 (1958) 383–392, treats displacement this way). On a round wall
 * each integrand is weighted with 1 + y∕r: per unit of the wall's circumference.
 *
 * @param y heights above the wall [length], n ≥ 3, ≥ 0, strictly rising; a point at y = 0 must have u = 0
 * @param u speeds [speed], same length
 * @returns thicknesses, edge, near-wall rule and its share; refused where the profile ends inside the layer or the edge speed is not its own
 *
 * Source: H. Schlichting & K. Gersten, Boundary-Layer Theory (definitions; from memory).
 */
export function traverseIntegrals(y: Float64Array, u: Float64Array, settings: TraverseSettings = {}): Outcome<{ traverse: Traverse }> {
  const bad = checkInput(y, u, settings);
  if (bad) return bad;
  const wallPoint = y[0] === 0;
  const yPoints = wallPoint ? y.slice(1) : y;
  const uPoints = wallPoint ? u.slice(1) : u;
  const given = settings.edge;
  const found = typeof given === "number" ? { speed: given, origin: "given" as const } : given ? undefined : findEdge(uPoints);
  if (found === undefined && given === undefined) return refuse("no edge found", { argument: "u", row: u.length });
  const knots = withWall(yPoints, 0);
  const edgeValues = given instanceof Float64Array ? (wallPoint ? given.slice() : withWall(given, continued(y, given))) : knots.map(() => found!.speed);
  const edgeSpeed = edgeValues[0]!;
  const mismatch = checkEdge(uPoints, edgeValues, wallPoint);
  if (mismatch) return mismatch;
  const density = settings.density && (wallPoint ? settings.density.slice() : withWall(settings.density, settings.density[0]!));
  const speeds = withWall(uPoints, 0);
  const made = curvesOf(knots, speeds, edgeValues, density, settings.radius);
  if (!made.ok) return made;
  const { curves } = made;
  const reached = layerHeight(curves.speed, curves.edge, LAYER_FRACTION);
  const height = reached.ok ? reached.height : undefined;
  const wall = nearWall(yPoints, uPoints, edgeSpeed, height, settings.nu, settings.nearWall ?? "fitted");

  // The points' own curve starts at the first of them where the rule is not the no-slip point.
  const apart = wall.rule === "fitted" || wall.rule === "none";
  const inner = apart ? profileCurve(yPoints, uPoints) : undefined;
  if (inner && !inner.ok) return inner;
  const speed = inner ? fromFirstPoint(inner.curve, curves.speed) : curves.speed;
  const second = monotoneCurve(apart ? yPoints : knots, apart ? uPoints : speeds);
  if (!second.ok) return second;
  const outer = curveIntegrals({ ...curves, speed }, 1);
  const line = (at: number) => (uPoints[0]! * at) / yPoints[0]!;
  const straight = gapIntegrals(curves, line);
  const gap = gapOf(wall, curves, speed);
  const total = sum(gap, outer);
  const without = wall.rule === "fitted" ? sum(straight, outer) : wall.rule === "no-slip" ? outer : total;
  const rival = sum(apart ? gap : curveIntegrals({ ...curves, speed: upTo(second.curve, 1) }, 0), curveIntegrals({ ...curves, speed: apart ? fromFirstPoint(second.curve, curves.speed) : second.curve }, 1));

  const scale = (l: LossIntegrals): Thicknesses => ({
    defect: l.mass / (curves.edgeDensity * edgeSpeed),
    momentumLoss: l.momentum / (curves.edgeDensity * edgeSpeed ** 2),
    energyLoss: l.energy / (curves.edgeDensity * edgeSpeed ** 3),
  });
  const thickness = scale(total);
  if (!(thickness.momentumLoss > 0) || !Number.isFinite(thickness.defect) || !Number.isFinite(thickness.energyLoss)) {
    return refuse("profile undetermined", { argument: "u", values: { momentumLoss: thickness.momentumLoss } });
  }
  return {
    ok: true,
    traverse: {
      ...thickness,
      edgeSpeed,
      edgeOrigin: found?.origin ?? "column",
      massDefect: total.mass,
      shape: thickness.defect / thickness.momentumLoss,
      energyShape: thickness.energyLoss / thickness.momentumLoss,
      height,
      entrainmentShape: height === undefined ? undefined : (height - thickness.defect) / thickness.momentumLoss,
      nearWall: wall,
      share: ratio(scale(gap), thickness),
      without: scale(without),
      curveError: ratio(difference(scale(rival), thickness), thickness),
      points: yPoints.length,
    },
  };
}

function checkInput(y: Float64Array, u: Float64Array, settings: TraverseSettings): Refusal | null {
  const bad = checkColumns(y, u, 3, ["y", "u"]);
  if (bad) return bad;
  if (y[0]! < 0) return refuse("negative", { argument: "y", row: 1, values: { value: y[0]! } });
  if (y[0] === 0 && y.length < 4) return refuse("too few points", { argument: "y", values: { count: y.length - 1, least: 3 } });
  const most = u.reduce((a, b) => Math.max(a, Math.abs(b)), 0);
  if (!(most > 0)) return refuse("not positive", { argument: "u", row: u.length, values: { value: 0 } });
  if (y[0] === 0 && Math.abs(u[0]!) > STILL_AT_WALL * most) return refuse("slips at wall", { argument: "u", row: 1, values: { value: u[0]! } });
  const { edge, density, radius, nu } = settings;
  if (edge instanceof Float64Array) {
    if (edge.length !== y.length) return refuse("lengths differ", { argument: "edge", values: { count: edge.length, expected: y.length } });
    const row = edge.findIndex((v) => !(v > 0 && Number.isFinite(v)));
    if (row >= 0) return refuse("not positive", { argument: "edge", row: row + 1, values: { value: edge[row]! } });
  } else if (edge !== undefined && !(edge > 0 && Number.isFinite(edge))) return refuse("not positive", { argument: "edge", values: { value: edge } });
  if (density) {
    if (density.length !== y.length) return refuse("lengths differ", { argument: "density", values: { count: density.length, expected: y.length } });
    const infinite = checkFinite(density, "density");
    if (infinite) return infinite;
    const row = density.findIndex((v) => !(v > 0));
    if (row >= 0) return refuse("not positive", { argument: "density", row: row + 1, values: { value: density[row]! } });
  }
  if (nu !== undefined && !(nu > 0 && Number.isFinite(nu))) return refuse("not positive", { argument: "nu", values: { value: nu } });
  const top = y[y.length - 1]!;
  if (radius !== undefined && !(Number.isFinite(radius) && radius !== 0 && (radius > 0 || top < -radius))) {
    return refuse("outside axis", { argument: "wall", values: { value: radius, height: top } });
  }
  return null;
}

function checkEdge(u: Float64Array, edge: Float64Array, wallPoint: boolean): Refusal | null {
  const last = u.length - 1;
  const own = edge[edge.length - 1]!;
  if (u[last]! < REACHES_EDGE * own) return refuse("ends inside layer", { argument: "u", row: last + (wallPoint ? 2 : 1), values: { reached: u[last]! / own } });
  for (let i = 0; i <= last; i++) {
    const limit = edge[i + 1]!;
    if (u[i]! > ABOVE_EDGE * limit) return refuse("edge below profile", { argument: "edge", row: i + (wallPoint ? 2 : 1), values: { value: limit, speed: u[i]! } });
  }
  return null;
}

function curvesOf(knots: Float64Array, u: Float64Array, edge: Float64Array, density: Float64Array | undefined, radius: number | undefined): Outcome<{ curves: ProfileCurves }> {
  const speed = profileCurve(knots, u);
  if (!speed.ok) return speed;
  const edgeCurve = profileCurve(knots, edge);
  if (!edgeCurve.ok) return edgeCurve;
  const densityCurve = density && profileCurve(knots, density);
  if (densityCurve && !densityCurve.ok) return densityCurve;
  const edgeDensity = density === undefined ? 1 : density[density.length - 1]!;
  return { ok: true, curves: { speed: speed.curve, edge: edgeCurve.curve, density: densityCurve?.curve, edgeDensity, radius } };
}

function gapOf(wall: NearWall, curves: ProfileCurves, speed: PiecewiseCubic): LossIntegrals {
  if (wall.speed) return gapIntegrals(curves, wall.speed);
  if (wall.rule === "none") return { mass: 0, momentum: 0, energy: 0 };
  return curveIntegrals({ ...curves, speed: upTo(speed, 1) }, 0);
}

/** The curve with its knots after `last` left out. */
function upTo(curve: PiecewiseCubic, last: number): PiecewiseCubic {
  return { x: curve.x.subarray(0, last + 1), value: curve.value.subarray(0, last + 1), slope: curve.slope.subarray(0, last + 1) };
}

/** A curve over the measured points alone, put on the knots that begin with the wall; its first panel is not to be used. */
function fromFirstPoint(points: PiecewiseCubic, onKnots: PiecewiseCubic): PiecewiseCubic {
  return { x: onKnots.x, value: withWall(points.value, 0), slope: withWall(points.slope, 0) };
}

/** Inviscid speed at the wall by the straight line through its two innermost values. */
function continued(y: Float64Array, edge: Float64Array): number {
  return edge[0]! - ((edge[1]! - edge[0]!) / (y[1]! - y[0]!)) * y[0]!;
}

function withWall(values: Float64Array, wall: number): Float64Array {
  const out = new Float64Array(values.length + 1);
  out[0] = wall;
  out.set(values, 1);
  return out;
}

function sum(a: LossIntegrals, b: LossIntegrals): LossIntegrals {
  return { mass: a.mass + b.mass, momentum: a.momentum + b.momentum, energy: a.energy + b.energy };
}

function difference(a: Thicknesses, b: Thicknesses): Thicknesses {
  return { defect: Math.abs(a.defect - b.defect), momentumLoss: Math.abs(a.momentumLoss - b.momentumLoss), energyLoss: Math.abs(a.energyLoss - b.energyLoss) };
}

function ratio(a: Thicknesses, b: Thicknesses): Thicknesses {
  return { defect: a.defect / b.defect, momentumLoss: a.momentumLoss / b.momentumLoss, energyLoss: a.energyLoss / b.energyLoss };
}

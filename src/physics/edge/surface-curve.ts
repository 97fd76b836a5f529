import { checkFinite } from "../../numerics/check-column";
import { cubicSpline } from "../../numerics/cubic-spline";
import { gaussLegendre } from "../../numerics/gauss-legendre";
import { refuse, type Outcome } from "../../numerics/outcome";
import { panelSlope, type PiecewiseCubic } from "../../numerics/piecewise-cubic";

/** A wall contour as a curve over its own arc length. */
export interface SurfaceCurve {
  /** Coordinates over arc length; their knots are the points. */
  x: PiecewiseCubic;
  y: PiecewiseCubic;
  /** Arc length at each point, 0 at the first [length]. */
  length: Float64Array;
}

/** The speed √(x′² + y′²) of a spline is smooth inside a panel; eight nodes leave less than rounding on any contour worth marching. */
const NODES = 8;
/** Each pass takes the last one's arc length as parameter; the change falls by more than ten times a pass. */
const MOST_PASSES = 30;
/** Relative change of the whole length at which a further pass changes rounding only. */
const SETTLED = 1e-13;

/**
 * The contour through wall points: a C2 spline in each coordinate over arc length, found by passes that start from the chord lengths.
 *
 * @param x, @param y coordinates [length], n ≥ 2, consecutive points distinct
 * @returns the curve and the arc length at each point, refused where two neighbouring points coincide ("repeats a point")
 *
 * Sources: C. de Boor, A Practical Guide to Splines (1978), ch. XVI (curves over chord length); Gauss quadrature of the arc.
 */
export function surfaceCurve(x: Float64Array, y: Float64Array): Outcome<{ surface: SurfaceCurve }> {
  if (y.length !== x.length) return refuse("lengths differ", { argument: "y", values: { count: y.length, expected: x.length } });
  if (x.length < 2) return refuse("too few points", { argument: "x", values: { count: x.length, least: 2 } });
  const bad = checkFinite(x, "x") ?? checkFinite(y, "y");
  if (bad) return bad;
  let length: Float64Array = new Float64Array(x.length);
  for (let i = 1; i < x.length; i++) {
    const chord = Math.hypot(x[i]! - x[i - 1]!, y[i]! - y[i - 1]!);
    if (!(chord > 0)) return refuse("repeats a point", { argument: "x", row: i + 1, values: { value: x[i]! } });
    length[i] = length[i - 1]! + chord;
  }
  const rule = gaussLegendre(NODES);
  if (!rule.ok) return rule;
  for (let pass = 1; pass <= MOST_PASSES; pass++) {
    const sx = cubicSpline(length, x);
    const sy = cubicSpline(length, y);
    if (!sx.ok) return { ...sx, argument: "x" };
    if (!sy.ok) return { ...sy, argument: "y" };
    const arc = arcLengths(sx.curve, sy.curve, rule.node, rule.weight);
    if (!arc.every(Number.isFinite)) return refuse("not finite", { argument: "x" });
    const change = Math.abs(arc.at(-1)! - length.at(-1)!);
    const settled = change <= SETTLED * arc.at(-1)!;
    if (settled || x.length === 2) return { ok: true, surface: { x: sx.curve, y: sy.curve, length: arc } };
    length = arc;
  }
  return refuse("no convergence", { argument: "x", values: { count: MOST_PASSES } });
}

function arcLengths(x: PiecewiseCubic, y: PiecewiseCubic, node: Float64Array, weight: Float64Array): Float64Array {
  const arc = new Float64Array(x.x.length);
  for (let i = 0; i + 1 < arc.length; i++) {
    const half = (x.x[i + 1]! - x.x[i]!) / 2;
    let sum = 0;
    for (let k = 0; k < node.length; k++) {
      const t = (1 + node[k]!) / 2;
      sum += weight[k]! * Math.hypot(panelSlope(x, i, t), panelSlope(y, i, t));
    }
    arc[i + 1] = arc[i]! + half * sum;
  }
  return arc;
}

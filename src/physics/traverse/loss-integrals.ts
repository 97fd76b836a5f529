import { gaussLegendre } from "../../numerics/gauss-legendre";
import { panelValue, type PiecewiseCubic } from "../../numerics/piecewise-cubic";

/** The three integrals of a profile before they are divided by edge quantities. */
export interface LossIntegrals {
  /** ∫(ρe U − ρ u) w dy */
  mass: number;
  /** ∫ρ u (U − u) w dy */
  momentum: number;
  /** ∫ρ u (U² − u²) w dy */
  energy: number;
}

/** The curves of one traverse on common knots, and the weight of a round wall. */
export interface ProfileCurves {
  speed: PiecewiseCubic;
  edge: PiecewiseCubic;
  density: PiecewiseCubic | undefined;
  edgeDensity: number;
  /** Wall radius; the area at height y is 1 + y/r times that at the wall. Undefined: plane wall. */
  radius: number | undefined;
}

/** Exact for the highest product: density, speed and squared edge speed cubic each, times the round wall's weight: degree 13. */
const NODES = 7;
const RULE = gaussLegendre(NODES);
/** The gap below the first point is halved this often towards the wall; the law is smooth on each part. */
const HALVINGS = 12;

/** Integrals over the panels of the curves, from knot `from` on; exact for the curves. */
export function curveIntegrals(curves: ProfileCurves, from: number): LossIntegrals {
  const total = { mass: 0, momentum: 0, energy: 0 };
  const { x } = curves.speed;
  for (let i = from; i + 1 < x.length; i++) addPanel(total, curves, x[i]!, x[i + 1]!, (y) => panelValue(curves.speed, i, fraction(x, i, y)), i);
  return total;
}

/** Integrals over the gap between the wall and the first measured point (knots 0 and 1) with the speed given there. */
export function gapIntegrals(curves: ProfileCurves, speed: (y: number) => number): LossIntegrals {
  const total = { mass: 0, momentum: 0, energy: 0 };
  const top = curves.speed.x[1]!;
  let upper = top;
  for (let k = 0; k < HALVINGS; k++) {
    addPanel(total, curves, upper / 2, upper, speed, 0);
    upper /= 2;
  }
  addPanel(total, curves, 0, upper, speed, 0);
  return total;
}

function addPanel(total: LossIntegrals, curves: ProfileCurves, a: number, b: number, speed: (y: number) => number, i: number): void {
  if (!RULE.ok) throw new Error("the Gauss rule of a fixed order is missing");
  const { x } = curves.speed;
  const half = (b - a) / 2;
  for (let k = 0; k < NODES; k++) {
    const y = a + half * (1 + RULE.node[k]!);
    const t = fraction(x, i, y);
    const u = speed(y);
    const edge = panelValue(curves.edge, i, t);
    const density = curves.density === undefined ? 1 : panelValue(curves.density, i, t);
    const w = half * RULE.weight[k]! * (curves.radius === undefined ? 1 : 1 + y / curves.radius);
    total.mass += w * (curves.edgeDensity * edge - density * u);
    total.momentum += w * density * u * (edge - u);
    total.energy += w * density * u * (edge * edge - u * u);
  }
}

function fraction(x: Float64Array, i: number, y: number): number {
  return (y - x[i]!) / (x[i + 1]! - x[i]!);
}

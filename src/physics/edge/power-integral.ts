import { gaussLegendre } from "../../numerics/gauss-legendre";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";

/** Quadrature that integrates a whole power of a cubic, times the square of another where there is one, without error. */
export interface PowerRule {
  power: number;
  /** Nodes and weights on 0 … 1. */
  node: Float64Array;
  weight: Float64Array;
}

/**
 * The rule for ∫ ue^p dx, or ∫ r² ue^p dx on round bodies: Gauss–Legendre with just enough nodes for the polynomial of degree 3p (3p + 6).
 *
 * @param power p, a whole number ≥ 0
 * @param round whether the square of a radius curve stands under the integral
 */
export function powerRule(power: number, round: boolean): Outcome<{ rule: PowerRule }> {
  if (!Number.isInteger(power) || power < 0) return refuse("outside range", { argument: "power", values: { value: power, least: 0, most: Infinity } });
  const degree = 3 * power + (round ? 6 : 0);
  const gauss = gaussLegendre((degree >> 1) + 1);
  if (!gauss.ok) return gauss;
  return { ok: true, rule: { power, node: gauss.node.map((z) => (1 + z) / 2), weight: gauss.weight.map((w) => w / 2) } };
}

/**
 * ∫ ue^p dx, or ∫ r² ue^p dx, over the part from fraction `from` to fraction `to` of panel i; exact for the curves.
 * The radius curve must have the same knots.
 */
export function panelPowerIntegral(rule: PowerRule, curve: PiecewiseCubic, radius: PiecewiseCubic | null, i: number, from: number, to: number): number {
  const { power, node, weight } = rule;
  const h = curve.x[i + 1] - curve.x[i];
  const v0 = curve.value[i];
  const chord = (curve.value[i + 1] - v0) / h;
  const s0 = curve.slope[i];
  const c2 = 3 * chord - 2 * s0 - curve.slope[i + 1];
  const c3 = s0 + curve.slope[i + 1] - 2 * chord;
  let r0 = 1;
  let q0 = 0;
  let q2 = 0;
  let q3 = 0;
  if (radius) {
    r0 = radius.value[i];
    const rise = (radius.value[i + 1] - r0) / h;
    q0 = radius.slope[i];
    q2 = 3 * rise - 2 * q0 - radius.slope[i + 1];
    q3 = q0 + radius.slope[i + 1] - 2 * rise;
  }
  let sum = 0;
  for (let k = 0; k < node.length; k += 1) {
    const t = from + (to - from) * node[k];
    const u = v0 + h * t * (s0 + t * (c2 + t * c3));
    let product = weight[k];
    for (let p = 0; p < power; p += 1) product *= u;
    if (radius) {
      const r = r0 + h * t * (q0 + t * (q2 + t * q3));
      product *= r * r;
    }
    sum += product;
  }
  return sum * h * (to - from);
}

/** Running integral from the first knot to each knot. */
export function runningPowerIntegral(rule: PowerRule, curve: PiecewiseCubic, radius: PiecewiseCubic | null): Float64Array {
  const sum = new Float64Array(curve.x.length);
  for (let i = 0; i + 1 < sum.length; i += 1) sum[i + 1] = sum[i] + panelPowerIntegral(rule, curve, radius, i, 0, 1);
  return sum;
}

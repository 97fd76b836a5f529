import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import { panelSecond, panelSlope, panelValue } from "../../numerics/piecewise-cubic";
import type { EdgeCurve } from "../edge/edge-curve";
import type { PowerRule } from "../edge/power-integral";
import { panelPowerIntegral, powerRule, runningPowerIntegral } from "../edge/power-integral";

/** Thwaites' constants: ue dθ²∕dx = ν (0.45 − 6λ). Thwaites, Aero. Quart. 1 (1949) 245–280. */
export const GROWTH = 0.45;
export const DAMPING = 6;
/** The power of ue under the integral, one less than DAMPING. */
const POWER = 5;
/** θ² ue′∕ν at a plane stagnation point, 0.45∕6, and at a round one, 0.45∕8 (Rott & Crabtree, J. Aero. Sci. 19 (1952) 553–565). */
const PLANE_STAGNATION = GROWTH / 6;
const ROUND_STAGNATION = GROWTH / 8;

/** How a layer begins. */
export type LayerStart = "stagnation point" | "leading edge" | "given momentum loss";

/**
 * The growth of θ² in Thwaites' method as an explicit function of the place:
 * θ² r² ue⁶ = constant + 0.45 ν ∫ r² ue⁵ dx, with speeds divided by the largest speed and radii by the largest radius.
 * "Growth" below is θ² U∕ν [length], where U is that largest speed.
 */
export interface ThwaitesGrowth {
  start: LayerStart;
  speedUnit: number;
  curve: PiecewiseCubic;
  radius: PiecewiseCubic | null;
  rule: PowerRule;
  running: Float64Array;
  constant: number;
  /** Growth at the first station, where the formula may read 0∕0. */
  first: number;
}

/** Prepares the growth; `startMomentumLoss` θ at the first station [length], omitted: from the stagnation point or leading edge. */
export function thwaitesGrowth(
  edge: EdgeCurve,
  nu: number,
  radius: PiecewiseCubic | null,
  startMomentumLoss: number | undefined,
): Outcome<{ growth: ThwaitesGrowth }> {
  const made = powerRule(POWER, radius !== null);
  if (!made.ok) return made;
  const speedUnit = largest(edge.curve.value);
  const curve = scaled(edge.curve, speedUnit);
  const round = radius === null ? null : scaled(radius, largest(radius.value));
  const atNose = round !== null && round.value[0] === 0;
  let start: LayerStart = "leading edge";
  let first = 0;
  let constant = 0;
  if (startMomentumLoss !== undefined && startMomentumLoss > 0) {
    if (edge.fromStagnation || atNose) return refuse("start fixed", { argument: edge.fromStagnation ? "ue" : "radius", row: 1 });
    start = "given momentum loss";
    first = (startMomentumLoss * startMomentumLoss * speedUnit) / nu;
    constant = first * (round === null ? 1 : round.value[0] ** 2) * curve.value[0] ** (POWER + 1);
  } else if (edge.fromStagnation) {
    start = "stagnation point";
    first = (atNose ? ROUND_STAGNATION : PLANE_STAGNATION) / curve.slope[0];
  }
  const running = runningPowerIntegral(made.rule, curve, round);
  if (!(Number.isFinite(first) && Number.isFinite(constant))) return refuse("not finite", { argument: "ue", row: 1 });
  return { ok: true, growth: { start, speedUnit, curve, radius: round, rule: made.rule, running, constant, first } };
}

/** θ² U∕ν at the fraction t of panel i. */
export function growthAt(g: ThwaitesGrowth, i: number, t: number): number {
  if (t === 0 && i === 0) return g.first;
  const part = t === 0 ? 0 : t === 1 ? g.running[i + 1] - g.running[i] : panelPowerIntegral(g.rule, g.curve, g.radius, i, 0, t);
  const u = panelValue(g.curve, i, t);
  const r = g.radius === null ? 1 : panelValue(g.radius, i, t);
  const u2 = u * u;
  return (g.constant + GROWTH * (g.running[i] + part)) / (r * r * u2 * u2 * u2);
}

/** λ = θ² ue′∕ν at the fraction t of panel i. */
export function gradientAt(g: ThwaitesGrowth, i: number, t: number): number {
  return growthAt(g, i, t) * panelSlope(g.curve, i, t);
}

/** dλ∕dx at the fraction t of panel i (t > 0 in the first panel), from the differential form of the method. */
export function gradientRate(g: ThwaitesGrowth, i: number, t: number): number {
  const growth = growthAt(g, i, t);
  return panelSecond(g.curve, i, t) * growth + panelSlope(g.curve, i, t) * growthRate(g, i, t, growth);
}

/** d(θ² U∕ν)∕dx at the fraction t of panel i, where the growth is `growth`. */
export function growthRate(g: ThwaitesGrowth, i: number, t: number, growth: number): number {
  const rate = (GROWTH - DAMPING * growth * panelSlope(g.curve, i, t)) / panelValue(g.curve, i, t);
  return g.radius === null ? rate : rate - (2 * growth * panelSlope(g.radius, i, t)) / panelValue(g.radius, i, t);
}

function largest(v: Float64Array): number {
  let most = 0;
  for (let i = 0; i < v.length; i += 1) if (v[i] > most) most = v[i];
  return most;
}

function scaled(curve: PiecewiseCubic, unit: number): PiecewiseCubic {
  return { x: curve.x, value: curve.value.map((v) => v / unit), slope: curve.slope.map((s) => s / unit) };
}

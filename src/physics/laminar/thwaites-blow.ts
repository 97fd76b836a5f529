import { panelSecond } from "../../numerics/piecewise-cubic";
import type { ThwaitesGrowth } from "./thwaites-growth";
import { growthRate } from "./thwaites-growth";
import { thwaitesShape, thwaitesShapeRate } from "./thwaites-relations";

/**
 * Growth of the mass defect at station i by Thwaites' own equations: m = ue H θ differentiated, with dθ²∕dx and dλ∕dx from the method
 * and not from differences of a column. On a round body (1∕r) d(r m)∕dx.
 *
 * @param growth θ² U∕ν at the station
 * @param theta θ there [length]
 * @returns dm∕dx [speed]; Infinity at a leading edge, where m rises like √x
 */
export function thwaitesBlow(g: ThwaitesGrowth, i: number, growth: number, theta: number): number {
  const slope = g.curve.slope[i] * g.speedUnit;
  const lambda = growth * g.curve.slope[i];
  const shape = thwaitesShape(lambda);
  if (g.curve.value[i] === 0) {
    // Stagnation point: θ and H are level there, m rises with ue alone; on the axis of a round body r m ∝ x².
    return slope * shape * theta * (g.radius !== null && g.radius.value[i] === 0 ? 2 : 1);
  }
  if (theta === 0) return Infinity;
  const ue = g.curve.value[i] * g.speedUnit;
  const panel = i === 0 ? 0 : i - 1;
  const t = i === 0 ? 0 : 1;
  const rate = growthRate(g, panel, t, growth);
  const lambdaRate = curvature(g, i) * growth + g.curve.slope[i] * rate;
  const thetaRate = (theta * rate) / (2 * growth);
  const plane = slope * shape * theta + ue * (thwaitesShapeRate(lambda) * lambdaRate * theta + shape * thetaRate);
  return g.radius === null ? plane : plane + (ue * shape * theta * g.radius.slope[i]) / g.radius.value[i];
}

/** Second derivative of the speed at a station; where a monotone curve has two, their mean. */
function curvature(g: ThwaitesGrowth, i: number): number {
  const last = g.curve.x.length - 1;
  if (i === 0) return panelSecond(g.curve, 0, 0);
  if (i === last) return panelSecond(g.curve, last - 1, 1);
  return (panelSecond(g.curve, i - 1, 1) + panelSecond(g.curve, i, 0)) / 2;
}

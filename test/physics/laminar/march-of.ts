import type { EdgeFit } from "../../../src/physics/edge/edge-curve";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { radiusCurve } from "../../../src/physics/edge/radius-curve";
import type { LaminarMarch } from "../../../src/physics/laminar/laminar-march";
import { thwaitesMarch } from "../../../src/physics/laminar/thwaites-march";

/** The march over columns, or an exception with the reason of the refusal. */
export function marchOf(
  x: Float64Array,
  ue: Float64Array,
  nu = 1,
  options: { fit?: EdgeFit; radius?: Float64Array; startMomentumLoss?: number; afterSeparation?: "stop" | "continue" } = {},
): LaminarMarch {
  const made = edgeCurve(x, ue, { fit: options.fit });
  if (!made.ok) throw new Error(`edge: ${made.reason}`);
  const round = options.radius ? radiusCurve(x, options.radius) : undefined;
  if (round && !round.ok) throw new Error(`radius: ${round.reason}`);
  const march = thwaitesMarch(made.edge, nu, {
    radius: round?.curve,
    startMomentumLoss: options.startMomentumLoss,
    afterSeparation: options.afterSeparation,
  });
  if (!march.ok) throw new Error(`march: ${march.reason}`);
  return march.march;
}

/** Separation station and θ of a march that must end by separating. */
export function separationOf(march: LaminarMarch): { x: number; momentumLoss: number } {
  if (march.stop.kind !== "separation") throw new Error(`stopped by ${march.stop.kind}`);
  return march.stop;
}

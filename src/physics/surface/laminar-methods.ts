import type { Outcome } from "../../numerics/outcome";
import { energyMarch } from "../laminar/energy-march";
import { fieldMarch } from "../laminar/field-march";
import { DAMPING, GROWTH } from "../laminar/thwaites-growth";
import { thwaitesMarch } from "../laminar/thwaites-march";
import type { WallConditions } from "../laminar/wall-conditions";
import type { LaminarPart } from "./laminar-part";
import { laminarPart } from "./laminar-part";

export type LaminarMethodName = "Thwaites" | "energy" | "field";

/** The laminar layer along the whole wall, or as far as it goes, by the method wanted. */
export function laminarByMethod(
  method: LaminarMethodName,
  wall: WallConditions,
  nu: number,
  start: { startMomentumLoss?: number; startShape?: number },
): Outcome<{ part: LaminarPart }> {
  if (method === "Thwaites") {
    const made = thwaitesMarch(wall.edge, nu, { radius: wall.radius ?? undefined, startMomentumLoss: start.startMomentumLoss });
    if (!made.ok) return made;
    const { stop } = made.march;
    return { ok: true, part: laminarPart(wall, nu, made.march, stop.kind === "end" ? NO_END : stop, (gradient) => (GROWTH - DAMPING * gradient) / 2) };
  }
  if (method === "energy") {
    const made = energyMarch(wall, nu, start);
    if (!made.ok) return made;
    const { stop } = made.march;
    return { ok: true, part: laminarPart(wall, nu, made.march, stop.kind === "end" ? NO_END : stop) };
  }
  const made = fieldMarch(wall, nu, start);
  if (!made.ok) return made;
  const { stop, reached } = made.march;
  // The field march names no θ where it separates; it grows little over the last part of a panel.
  const momentumLoss = reached > 0 ? made.march.momentumLoss[reached - 1] : 0;
  return { ok: true, part: laminarPart(wall, nu, made.march, stop.kind === "end" ? NO_END : { kind: stop.kind === "separation" ? "separation" : "limit", x: stop.x, momentumLoss }) };
}

const NO_END = { kind: "end", x: 0, momentumLoss: 0 } as const;

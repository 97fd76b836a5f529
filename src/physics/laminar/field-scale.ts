import type { Outcome } from "../../numerics/outcome";
import type { PowerRule } from "../edge/power-integral";
import { panelPowerIntegral, powerRule } from "../edge/power-integral";
import type { MarchStart } from "./field-start";
import type { WallConditions, WallPlace } from "./wall-conditions";

/** Thwaites' growth, ue dΔ²∕dx = ν (0.45 − 6λ + 0.9 vwΔ∕ν); the last term, our own, brings Δ to ν∕(2|vw|), the θ of the suction profile. */
const GROWTH = 0.45;
const WALL_GROWTH = 0.9;
const POWER = 5;

/**
 * The length Δ that makes heights across the layer dimensionless, close to θ so that one grid fits all along the wall. It need not be
 * θ: the equations hold for any Δ.
 */
export interface FieldScale {
  /** Δ² at the first station, and Δ∕θ there. */
  square: number;
  ratio: number;
  /** Δ² at a place, from Δ² at an earlier one of the same panel. */
  next(square: number, panel: number, from: number, before: WallPlace, to: number, after: WallPlace): number;
}

export function fieldScale(wall: WallConditions, nu: number, start: MarchStart): Outcome<{ scale: FieldScale }> {
  const made = powerRule(POWER, wall.radius !== null);
  if (!made.ok) return made;
  const rule: PowerRule = made.rule;
  const { curve } = wall.edge;
  const first = firstSquare(wall, nu, start);
  return {
    ok: true,
    scale: {
      ...first,
      next(square, panel, from, before, to, after) {
        // Speeds and radii are taken relative to the new place, so that no sixth power overflows.
        const whole = panelPowerIntegral(rule, curve, wall.radius, panel, from, to) / (after.radius ** 2 * after.speed ** 6);
        const carried = square * (before.radius / after.radius) ** 2 * (before.speed / after.speed) ** 6;
        const half = (WALL_GROWTH * whole * after.wallVelocity) / 2;
        const scale = half + Math.sqrt(half * half + carried + GROWTH * nu * whole);
        return scale * scale;
      },
    },
  };
}

/** The same formula at the first station: at a stagnation point ∫r²ue⁵dx∕(r²ue⁶) is 1∕(6 ue′), 1∕(8 ue′) where r = 0 too; behind a leading edge x∕ue, x∕(3 ue). */
function firstSquare(wall: WallConditions, nu: number, start: MarchStart): { square: number; ratio: number } {
  if (start.kind === "given momentum loss") return { square: start.square, ratio: 1 };
  const { curve } = wall.edge;
  const nose = wall.radius !== null && wall.radius.value[0] === 0;
  if (start.kind === "leading edge") return { square: 0, ratio: Math.sqrt((GROWTH * nu) / (curve.value[0] * (nose ? 3 : 1) * start.growth)) };
  const whole = 1 / ((nose ? 8 : 6) * curve.slope[0]);
  const half = wall.wallVelocity === null ? 0 : (WALL_GROWTH * whole * wall.wallVelocity.value[0]) / 2;
  const square = (half + Math.sqrt(half * half + GROWTH * nu * whole)) ** 2;
  return { square, ratio: Math.sqrt(square / start.square) };
}

import type { EdgeFit } from "../../../src/physics/edge/edge-curve";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { radiusCurve } from "../../../src/physics/edge/radius-curve";
import type { EnergyMarch } from "../../../src/physics/laminar/energy-march";
import { energyMarch } from "../../../src/physics/laminar/energy-march";
import type { FieldMarch } from "../../../src/physics/laminar/field-march";
import { fieldMarch } from "../../../src/physics/laminar/field-march";
import type { WallConditions } from "../../../src/physics/laminar/wall-conditions";
import { wallConditions } from "../../../src/physics/laminar/wall-conditions";

export interface WallOptions {
  fit?: EdgeFit;
  radius?: Float64Array;
  wallVelocity?: Float64Array;
}

/** Wall conditions from columns, or an exception with the reason of the refusal. */
export function wallOf(x: Float64Array, ue: Float64Array, options: WallOptions = {}): WallConditions {
  const edge = edgeCurve(x, ue, { fit: options.fit });
  if (!edge.ok) throw new Error(`edge: ${edge.reason}`);
  const round = options.radius ? radiusCurve(x, options.radius) : undefined;
  if (round && !round.ok) throw new Error(`radius: ${round.reason}`);
  const made = wallConditions(edge.edge, { radius: round?.curve, wallVelocity: options.wallVelocity });
  if (!made.ok) throw new Error(`wall: ${made.reason}`);
  return made.wall;
}

export function fieldOf(wall: WallConditions, nu = 1, options: Parameters<typeof fieldMarch>[2] = {}): FieldMarch {
  const made = fieldMarch(wall, nu, options);
  if (!made.ok) throw new Error(`field: ${made.reason}`);
  return made.march;
}

export function energyOf(wall: WallConditions, nu = 1, options: Parameters<typeof energyMarch>[2] = {}): EnergyMarch {
  const made = energyMarch(wall, nu, options);
  if (!made.ok) throw new Error(`energy: ${made.reason}`);
  return made.march;
}

/** Station of separation of a march that must end by it. */
export function separationStation(march: FieldMarch | EnergyMarch): number {
  if (march.stop.kind !== "separation") throw new Error(`stopped by ${march.stop.kind}`);
  return march.stop.x;
}

/** The four flows of test/references/laminar_*.csv as formulas; the last as the file's header and its columns ue, duedx give it. */
export const REFERENCE_FLOWS: Record<string, (x: number) => number> = {
  howarth_1mx: (x) => 1 - x,
  tani_1mx2: (x) => 1 - x * x,
  sin_x: Math.sin,
  hiemenz_poly: (x) => 1.814 * x - 0.271 * x ** 3 - 0.0471 * x ** 5,
};

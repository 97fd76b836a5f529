import type { FieldProfile } from "./field-step";

/** Heights across the layer in units of Δ, close together at the wall and wider outwards; the march uses the first `count` of them. */
export interface FieldGrid {
  eta: Float64Array;
  count: number;
}

/** First step, growth from step to step and widest step, in momentum-loss thicknesses (flat plate: the layer is 8 to 14 of them high). */
const FIRST_STEP = 0.2;
const STRETCH = 1.05;
const WIDEST_STEP = 0.7;
/** Height at which a blown layer has left the wall, in momentum-loss thicknesses. */
const MOST_HEIGHT = 120;
/** Shear at the last node, ∂(u∕ue)∕∂η, above which the grid is too low. */
export const STILL = 3e-7;
/** Steps added at a time. */
const ADDED = 3;

/** The grid; `refinement` cuts every step into so many. */
export function fieldGrid(refinement: number): FieldGrid {
  const heights = [0];
  let step = FIRST_STEP;
  for (let eta = 0; eta < MOST_HEIGHT; ) {
    for (let k = 1; k <= refinement; k += 1) heights.push(eta + (step * k) / refinement);
    eta += step;
    step = Math.min(step * STRETCH, WIDEST_STEP);
  }
  return { eta: Float64Array.from(heights), count: 0 };
}

/** Adds free stream to a profile; false when there is no more room. */
export function raiseGrid(grid: FieldGrid, profiles: readonly FieldProfile[], refinement: number): boolean {
  const { eta } = grid;
  const count = grid.count + ADDED * refinement;
  if (count > eta.length) return false;
  for (const { f, u, v } of profiles) {
    for (let j = grid.count; j < count; j += 1) {
      f[j] = f[j - 1] + eta[j] - eta[j - 1];
      u[j] = 1;
      v[j] = 0;
    }
  }
  grid.count = count;
  return true;
}

/** Integrals of a profile in units of Δ. */
export interface ProfileIntegrals {
  defect: number;
  momentumLoss: number;
  energyLoss: number;
}

/** δ*∕Δ, θ∕Δ and δ3∕Δ; the trapezium rule with the slopes' correction, of fourth order like the profile itself. */
export function profileIntegrals(grid: FieldGrid, profile: FieldProfile, out: ProfileIntegrals): ProfileIntegrals {
  const { eta, count } = grid;
  const { f, u, v } = profile;
  let momentum = 0;
  let energy = 0;
  for (let j = 1; j < count; j += 1) {
    const h = eta[j] - eta[j - 1];
    const u0 = u[j - 1];
    const u1 = u[j];
    momentum += (h / 2) * (u0 * (1 - u0) + u1 * (1 - u1)) + ((h * h) / 12) * (v[j - 1] * (1 - 2 * u0) - v[j] * (1 - 2 * u1));
    energy += (h / 2) * (u0 * (1 - u0 * u0) + u1 * (1 - u1 * u1)) + ((h * h) / 12) * (v[j - 1] * (1 - 3 * u0 * u0) - v[j] * (1 - 3 * u1 * u1));
  }
  out.defect = eta[count - 1] - (f[count - 1] - f[0]);
  out.momentumLoss = momentum;
  out.energyLoss = energy;
  return out;
}

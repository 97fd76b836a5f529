import type { InnerLayer } from "./inner-layer";
import { innerLayer } from "./inner-layer";
import { spaldingSpeed } from "./spalding-speed";

/** What is done between the wall and the first measured point. */
export type NearWallRule = "measured to the wall" | "fitted" | "no-slip" | "none";

/** What the user may ask for: fitted where it can be, the no-slip point alone, or nothing below the first point. */
export type NearWallChoice = "fitted" | "no-slip" | "none";

/** Two first points on one ray from the wall within this share: the wall layer is measured, straight down to the wall. */
const ON_ONE_RAY = 0.1;
/** Below this height in wall units the sublayer is straight and the no-slip point says all. */
const SUBLAYER = 3;

/** The rule in force, and the speed it gives in the gap where a law is fitted. */
export interface NearWall {
  rule: NearWallRule;
  inner?: InnerLayer;
  /** Speed at a height in the gap, meeting the first measured point; present where the rule is "fitted". */
  speed?: (y: number) => number;
}

/**
 * Decides what stands between the wall and the first measured point.
 *
 * - The first two points on one ray from the wall: "measured to the wall"; the no-slip point closes the profile.
 * - Otherwise, if asked for and the inner points follow the law of the wall, the law fills the gap ("fitted"), scaled to meet the first point.
 * - Otherwise the no-slip point alone ("no-slip"), or nothing ("none") where asked for.
 *
 * @param y heights of measured points, > 0; @param u speeds; @param edge edge speed; @param height layer height; @param nu viscosity or undefined
 */
export function nearWall(y: Float64Array, u: Float64Array, edge: number, height: number | undefined, nu: number | undefined, choice: NearWallChoice): NearWall {
  const first = u[0]! / y[0]!;
  const second = u[1]! / y[1]!;
  if (Math.abs(first - second) <= ON_ONE_RAY * Math.abs(first)) return { rule: "measured to the wall" };
  if (choice !== "fitted" || height === undefined) return { rule: choice === "none" ? "none" : "no-slip" };
  const inner = innerLayer(y, u, edge, height, nu);
  if (inner === undefined || y[0]! < SUBLAYER * inner.viscousLength) return { rule: "no-slip" };
  const scale = u[0]! / (inner.frictionSpeed * spaldingSpeed(y[0]! / inner.viscousLength));
  return { rule: "fitted", inner, speed: (at) => scale * inner.frictionSpeed * spaldingSpeed(at / inner.viscousLength) };
}

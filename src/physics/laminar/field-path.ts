import type { MarchStart } from "./field-start";
import type { WallConditions } from "./wall-conditions";

/** The variable along the wall in which a march takes its steps. */
export interface FieldPath {
  /** √(x − x₁) instead of x − x₁: the layer begins as a power series in that behind a leading edge with flow through the wall, or from a start
   * that need not fit what follows. */
  rooted: boolean;
  along(x: number): number;
  /** The fraction of a panel where the variable has a value. */
  fraction(panel: number, along: number): number;
}

export function fieldPath(wall: WallConditions, start: MarchStart): FieldPath {
  const { x } = wall.edge.curve;
  const rooted = start.kind === "given momentum loss" || (start.kind === "leading edge" && wall.wallVelocity !== null);
  return {
    rooted,
    along: (at) => (rooted ? Math.sqrt(at - x[0]) : at - x[0]),
    fraction: (panel, along) => (x[0] + (rooted ? along * along : along) - x[panel]) / (x[panel + 1] - x[panel]),
  };
}

import { brentRoot } from "../../numerics/brent-root";
import type { Outcome } from "../../numerics/outcome";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";
import type { ThwaitesGrowth } from "./thwaites-growth";
import { GROWTH, gradientAt, gradientRate } from "./thwaites-growth";
import { LARGEST_GRADIENT, SEPARATION_GRADIENT } from "./thwaites-relations";

/** Parts into which a panel that might hold an event is cut; within a part λ is taken to turn at most once. */
const PARTS = 8;

/** Shared answer of the panels without an event, so that a march allocates nothing per station. */
const NO_EVENT = { ok: true, event: null } as const;

/** What ends the attached laminar layer inside a panel. */
export interface GradientEvent {
  kind: "separation" | "limit";
  /** Fraction of the panel's width. */
  t: number;
}

/** Work done in looking for events. */
export interface EventCounts {
  searchedPanels: number;
  rootEvaluations: number;
}

/**
 * The first place in panel i where λ reaches the separation value or leaves the range of the relations; null when there is none.
 *
 * A bound on λ over the whole panel, from the control points of its cubic, settles most panels. The others are cut into parts; a part
 * whose ends are in range is still searched where dλ∕dx changes sign in it, so that a dip between stations is not stepped over.
 */
export function findEvent(g: ThwaitesGrowth, i: number, counts: EventCounts): Outcome<{ event: GradientEvent | null }> {
  if (staysInRange(g, i)) return NO_EVENT;
  counts.searchedPanels += 1;
  const fromZero = i === 0 && (g.curve.value[0] === 0 || (g.radius !== null && g.radius.value[0] === 0));
  let left = 0;
  for (let k = 1; k <= PARTS; k += 1) {
    const right = k / PARTS;
    let out = crossing(gradientAt(g, i, right));
    let end = right;
    if (out === null && !(fromZero && k === 1)) {
      const turn = turningPoint(g, i, left, right, counts);
      if (!turn.ok) return turn;
      if (turn.t !== null) {
        out = crossing(gradientAt(g, i, turn.t));
        end = turn.t;
      }
    }
    if (out !== null) {
      const limit = out === "separation" ? SEPARATION_GRADIENT : LARGEST_GRADIENT;
      const root = brentRoot((t) => gradientAt(g, i, t) - limit, left, end);
      if (!root.ok) return root;
      counts.rootEvaluations += root.evaluations;
      return { ok: true, event: { kind: out, t: root.x } };
    }
    left = right;
  }
  return NO_EVENT;
}

/** Which limit a value of λ has reached, if any. */
export function crossing(lambda: number): GradientEvent["kind"] | null {
  if (lambda <= SEPARATION_GRADIENT) return "separation";
  return lambda > LARGEST_GRADIENT ? "limit" : null;
}

/** The place in (left, right) where λ turns, when dλ∕dx changes sign there. */
function turningPoint(g: ThwaitesGrowth, i: number, left: number, right: number, counts: EventCounts): Outcome<{ t: number | null }> {
  const from = i === 0 && left === 0 && g.first === 0 ? right * 1e-6 : left;
  const a = gradientRate(g, i, from);
  const b = gradientRate(g, i, right);
  if (!(a * b < 0)) return { ok: true, t: null };
  const root = brentRoot((t) => gradientRate(g, i, t), from, right, 1e-9);
  if (!root.ok) return root;
  counts.rootEvaluations += root.evaluations;
  return { ok: true, t: root.x };
}

/** True when bounds show that λ stays within its limits all over the panel. */
function staysInRange(g: ThwaitesGrowth, i: number): boolean {
  const u = leastControl(g.curve, i);
  const r = g.radius === null ? 1 : leastControl(g.radius, i);
  if (!(u > 0 && r > 0)) return false;
  const { x, value, slope } = g.curve;
  const s0 = slope[i];
  const s1 = slope[i + 1];
  const middle = (3 * (value[i + 1] - value[i])) / (x[i + 1] - x[i]) - s0 - s1;
  const steepestDown = Math.min(s0, middle, s1);
  const steepestUp = Math.max(s0, middle, s1);
  const growth = (g.constant + GROWTH * g.running[i + 1]) / (r * r * u ** 6);
  return steepestDown * growth > SEPARATION_GRADIENT && steepestUp * growth < LARGEST_GRADIENT;
}

/** The least control point of the cubic in panel i: a lower bound of the cubic. */
function leastControl(curve: PiecewiseCubic, i: number): number {
  const third = (curve.x[i + 1] - curve.x[i]) / 3;
  const { value, slope } = curve;
  return Math.min(value[i], value[i] + third * slope[i], value[i + 1] - third * slope[i + 1], value[i + 1]);
}

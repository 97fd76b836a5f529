import { brentRoot } from "../../numerics/brent-root";
import { cubicAt } from "../../numerics/piecewise-cubic";
import type { PiecewiseCubic } from "../../numerics/piecewise-cubic";

/** Length of the laminar part: ue l∕ν = 4e4 in a stream of low turbulence. */
const LAMINAR_LENGTH = 4e4;
/** Mean dissipation coefficient of the turbulent part and mean energy shape factor H32 there. */
const DISSIPATION = 0.0182;
const ENERGY_SHAPE = 1.5;
/** (θ∕ue) due∕dx at reattachment. */
const REATTACHMENT = -0.0082;
/** Places looked at for reattachment, then refined. */
const LOOKS = 200;

/** A bubble between laminar separation and turbulent reattachment. */
export interface SeparationBubble {
  separation: number;
  /** Station where the separated layer becomes turbulent. */
  onset: number;
  reattachment: number;
  /** θ at separation and at the onset [length]. */
  momentumLoss: number;
  reattachmentLoss: number;
  /** ue at separation, held to the onset. */
  speed: number;
}

/**
 * The short bubble behind laminar separation: θ and speed stay as they are over a length 4e4 ν∕ue, then turbulent mixing
 * fills the layer, ue falls linearly to the edge speed of the column, and the layer reattaches where (θ∕ue) due∕dx rises to −0.0082.
 *
 * @param curve edge speed as given: the bubble's own pressure plateau need not be in it
 * @param separation station of laminar separation, θ there [length]
 * @returns the bubble, or where the attempt ended: no reattachment on the wall
 *
 * Source: H. P. Horton, ARC CP 1073 (1969), and thesis, Queen Mary College (1968) (constants from memory).
 */
export function separationBubble(curve: PiecewiseCubic, nu: number, separation: number, momentumLoss: number): SeparationBubble | null {
  const end = curve.x[curve.x.length - 1];
  const speedAt = (x: number): number => {
    const at = cubicAt(curve, x);
    return at.ok ? at.value : NaN;
  };
  const speed = speedAt(separation);
  const onset = separation + (LAMINAR_LENGTH * nu) / speed;
  if (!(onset < end)) return null;
  // ue³ θ H32 grows by the dissipation; H32 stays the same through the bubble.
  const lossAt = (x: number): number => bubbleLoss(speed, speedAt(x), x - onset, momentumLoss);
  const beyond = (x: number): number => {
    const ue = speedAt(x);
    return (lossAt(x) * (ue - speed)) / ((x - onset) * ue) - REATTACHMENT;
  };
  let before = onset;
  for (let k = 1; k <= LOOKS; k += 1) {
    const at = onset + (end - onset) * (k / LOOKS) ** 2;
    const excess = beyond(at);
    if (excess >= 0) {
      const root = k === 1 ? null : brentRoot(beyond, before, at, 1e-10 * (end - onset));
      const reattachment = root !== null && root.ok ? root.x : at;
      return { separation, onset, reattachment, momentumLoss, reattachmentLoss: lossAt(reattachment), speed };
    }
    before = at;
  }
  return null;
}

/** θ a distance behind the onset, where the speed has fallen linearly from `speed` to `now`. */
function bubbleLoss(speed: number, now: number, distance: number, momentumLoss: number): number {
  const mean = ((speed + now) * (speed * speed + now * now)) / 4;
  return (speed ** 3 * momentumLoss + (DISSIPATION / ENERGY_SHAPE) * mean * distance) / now ** 3;
}

/** θ at a station inside the bubble. */
export function bubbleTheta(bubble: SeparationBubble, curve: PiecewiseCubic, x: number): number {
  if (x <= bubble.onset) return bubble.momentumLoss;
  const end = cubicAt(curve, bubble.reattachment);
  const last = end.ok ? end.value : bubble.speed;
  const share = (x - bubble.onset) / (bubble.reattachment - bubble.onset);
  return bubbleLoss(bubble.speed, bubble.speed + share * (last - bubble.speed), x - bubble.onset, bubble.momentumLoss);
}


import { brentRoot } from "../../numerics/brent-root";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { SimilarHold, SimilarNodes } from "./similar-equations";
import { solveSimilarNodes } from "./similar-equations";

/** Which of the two layers that one pressure gradient allows: wall shear forward, or backward with reversed flow at the wall. */
export type SimilarBranch = "attached" | "reversed";

/** Grid step in Hartree's η: the sixth-order formula then leaves less than 2e-10 in any integral of layers on a solid wall. */
const STEP = 0.06;
/** Shear at the last node below which the free stream has been reached. */
const STILL = 1e-13;
/** Height of the first grid in η; shear of the flat plate is below 1e-14 there. */
const FIRST_HEIGHT = 9.5;
/** Wall value above which the asymptotic suction profile is the better start; its height in decay lengths 1∕f(0). */
const STRONG_SUCTION = 3;
const SUCTION_HEIGHT = 36;
/** Share of the height added at a time. */
const GROWTH = 0.17;
/** A layer that needs more height than this has left the wall (flat plate: 7; blown to within 0.2 % of lift-off: 25; reversed at m = −0.001: 28). */
const MOST_HEIGHT = 35;
/** f(0) that blows a flat plate's layer off; decelerating layers go before (Emmons & Leigh 1954: −0.8757). */
const LIFT_OFF = -0.8757;
/** Least part of the way to the wanted layer; below it the branch ends, or the layer has left the wall. */
const LEAST_STRIDE = 1e-4;
const LEAST_STRIDE_BLOWN = 3e-3;
/** Largest change of f″(0) from one layer to the next, so that Newton's method cannot jump to the other branch. */
const LARGEST_JUMP = 0.6;
/** Stride along the branch through reversed flow, as a share of the defect thickness, and its least share. */
const DEFECT_STRIDE = 0.15;
const LEAST_DEFECT_STRIDE = 1e-3;
/** A gradient this little below the least one is that one, rounded to the seven decimals in which it is printed. */
const ROUNDING = 2e-7;

/**
 * The nodes of the similar layer with gradient β and wall value f(0), on the branch wanted.
 *
 * @param beta Hartree's β [1]
 * @param wall f(0) [1]: above 0 suction, below 0 blowing
 * @returns nodes reaching into the free stream; "no similar layer" where the branch has none (`values.least`: the least β of all, when
 *   found), "layer lifts off" where blowing lifts it off the wall
 */
export function similarBranch(beta: number, wall: number, branch: SimilarBranch): Outcome<{ nodes: SimilarNodes }> {
  if (beta <= 0 && wall <= LIFT_OFF) return refuse("layer lifts off", { argument: "wall_velocity" });
  const start = attached(Math.max(beta, 0), wall);
  if (!start.ok || beta >= 0) return start;
  // The layer of least β, f″(0) = 0, parts the branches; along the defect thickness nothing special happens there.
  const verge = throughReversal(start.nodes, wall, (nodes) => nodes.y[2] < 0 || (branch === "attached" && nodes.beta <= beta));
  if (!verge.ok) return verge;
  if (verge.after.y[2] >= 0) return between(verge.before, verge.after, wall, beta);
  const incipient = grown(verge.after, wall, { incipient: true });
  if (!incipient.ok) return incipient;
  const least = incipient.nodes.beta;
  if (beta < least) return beta > least - ROUNDING ? incipient : refuse("no similar layer", { argument: "m", values: { least, beta } });
  if (branch === "attached") return between(verge.before, incipient.nodes, wall, beta);
  const turned = throughReversal(incipient.nodes, wall, (nodes) => nodes.beta >= beta);
  return turned.ok ? between(turned.before, turned.after, wall, beta) : turned;
}

/** The layer on the verge of separation, f″(0) = 0, for a wall value: the least β of all. */
export function incipientSimilar(wall: number): Outcome<{ nodes: SimilarNodes }> {
  const start = attached(0, wall);
  if (!start.ok) return start;
  const verge = throughReversal(start.nodes, wall, (nodes) => nodes.y[2] < 0);
  return verge.ok ? grown(verge.after, wall, { incipient: true }) : verge;
}

/** The layer of gradient β between two layers of one branch, found along the defect thickness. */
function between(a: SimilarNodes, b: SimilarNodes, wall: number, beta: number): Outcome<{ nodes: SimilarNodes }> {
  if (a.beta === beta) return { ok: true, nodes: a };
  if (b.beta === beta) return { ok: true, nodes: b };
  let last: Outcome<{ nodes: SimilarNodes }> = { ok: true, nodes: b };
  const from = defectOf(a, wall);
  const to = defectOf(b, wall);
  const root = brentRoot((defect) => {
    if (defect === from) return a.beta - beta;
    if (defect === to) return b.beta - beta;
    last = grown(last.ok ? last.nodes : b, wall, { defect });
    return last.ok ? last.nodes.beta - beta : NaN;
  }, from, to);
  if (!root.ok) return last.ok ? root : last;
  return grown(last.nodes, wall, { defect: root.x });
}

/** From the flat plate, or the suction profile, first up and towards suction, where every step is easy, then straight on. */
function attached(beta: number, wall: number): Outcome<{ nodes: SimilarNodes }> {
  const wall0 = wall > STRONG_SUCTION ? wall : 0;
  const plate = grown(wall0 > 0 ? suctionGuess(wall) : plateGuess(wall), wall0, { beta: 0 });
  if (!plate.ok) return plate;
  const easy = walk(plate.nodes, 0, wall0, beta, Math.max(wall, 0));
  return easy.ok ? walk(easy.nodes, beta, Math.max(wall, 0), beta, wall) : easy;
}

function walk(start: SimilarNodes, beta0: number, wall0: number, beta1: number, wall1: number): Outcome<{ nodes: SimilarNodes }> {
  if (beta0 === beta1 && wall0 === wall1) return { ok: true, nodes: start };
  let nodes = start;
  let before: { nodes: SimilarNodes; done: number } | null = null;
  let done = 0;
  let stride = Math.min(1, 1 / Math.hypot(beta1 - beta0, wall1 - wall0));
  while (done < 1) {
    const to = Math.min(1, done + stride);
    const guess = before ? extrapolated(before.nodes, nodes, (to - done) / (done - before.done)) : nodes;
    const next = grown(guess, wall0 + to * (wall1 - wall0), { beta: beta0 + to * (beta1 - beta0) });
    if (next.ok && next.nodes.y[2] > 0 && Math.abs(next.nodes.y[2] - nodes.y[2]) < LARGEST_JUMP * (1 + Math.abs(nodes.y[2]))) {
      before = { nodes, done };
      nodes = next.nodes;
      done = to;
      stride *= 1.6;
    } else {
      stride /= 2;
      if (stride < (wall1 < wall0 ? LEAST_STRIDE_BLOWN : LEAST_STRIDE)) return wall1 < wall0 ? refuse("layer lifts off", { argument: "wall_velocity" }) : refuse("no convergence", { values: { count: 0 } });
    }
  }
  return { ok: true, nodes };
}

/** Along the branch by growing defect thickness, which rises steadily through the least β and on into reversed flow. */
function throughReversal(start: SimilarNodes, wall: number, reached: (nodes: SimilarNodes) => boolean): Outcome<{ before: SimilarNodes; after: SimilarNodes }> {
  let nodes = start;
  let before: SimilarNodes | null = null;
  let longest = DEFECT_STRIDE;
  let stride = longest * defectOf(start, wall);
  let strideBefore = stride;
  while (before === null || !reached(nodes)) {
    const guess = before ? extrapolated(before, nodes, stride / strideBefore) : nodes;
    const next = grown(guess, wall, { defect: defectOf(nodes, wall) + stride });
    if (!next.ok) {
      stride /= 2;
      longest /= 2;
      if (next.reason === "layer lifts off" || longest < LEAST_DEFECT_STRIDE) return refuse("layer lifts off", { argument: "m" });
      continue;
    }
    before = nodes;
    nodes = next.nodes;
    strideBefore = stride;
    stride = longest * defectOf(nodes, wall);
  }
  return { ok: true, before, after: nodes };
}

/** Solves, and adds free stream above until the shear has died out at the last node. */
function grown(start: SimilarNodes, wall: number, hold: SimilarHold): Outcome<{ nodes: SimilarNodes }> {
  let guess = start;
  for (;;) {
    const solved = solveSimilarNodes(guess, wall, hold);
    if (!solved.ok) return solved;
    if (Math.abs(solved.nodes.y[solved.nodes.y.length - 1]) < STILL) return solved;
    guess = heightened(solved.nodes, Math.ceil((GROWTH * solved.nodes.y.length) / 3));
    if (guess.step * (guess.y.length / 3) > MOST_HEIGHT) return refuse("layer lifts off", { argument: "wall_velocity" });
  }
}

function heightened(nodes: SimilarNodes, more: number): SimilarNodes {
  const y = new Float64Array(nodes.y.length + 3 * more);
  y.set(nodes.y);
  for (let at = nodes.y.length; at < y.length; at += 3) {
    y[at] = y[at - 3] + nodes.step;
    y[at + 1] = 1;
  }
  return { step: nodes.step, beta: nodes.beta, y };
}

function extrapolated(a: SimilarNodes, b: SimilarNodes, factor: number): SimilarNodes {
  const short = a.y.length < b.y.length ? heightened(a, (b.y.length - a.y.length) / 3) : a;
  const y = b.y.map((value, i) => value + factor * (value - short.y[i]));
  return { step: b.step, beta: b.beta + factor * (b.beta - a.beta), y };
}

function defectOf(nodes: SimilarNodes, wall: number): number {
  const count = nodes.y.length / 3;
  return (count - 1) * nodes.step + wall - nodes.y[nodes.y.length - 3];
}

/** A hyperbolic-tangent profile with the flat plate's wall shear, on a grid fine enough for the suction to come. */
function plateGuess(wall: number): SimilarNodes {
  const k = 0.4696;
  return nodesFrom(STEP / Math.max(1, wall), FIRST_HEIGHT, (eta) => [Math.log(Math.cosh(k * eta)) / k, Math.tanh(k * eta), k / Math.cosh(k * eta) ** 2]);
}

/** The asymptotic suction profile u = 1 − exp(−f(0) η). */
function suctionGuess(wall: number): SimilarNodes {
  return nodesFrom(STEP / wall, SUCTION_HEIGHT / wall, (eta) => {
    const gone = Math.exp(-wall * eta);
    return [wall + eta - (1 - gone) / wall, 1 - gone, wall * gone];
  });
}

function nodesFrom(step: number, height: number, profile: (eta: number) => [number, number, number]): SimilarNodes {
  const count = Math.ceil(height / step) + 1;
  const y = new Float64Array(3 * count);
  for (let j = 0; j < count; j += 1) y.set(profile(j * step), 3 * j);
  return { step, beta: 0, y };
}

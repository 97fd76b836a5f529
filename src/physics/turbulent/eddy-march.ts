import { backwardDifference } from "../../numerics/backward-difference";
import { blockElimination } from "../../numerics/block-elimination";
import { cubicAt, panelOf } from "../../numerics/piecewise-cubic";
import type { StoredProfile } from "../laminar/field-record";
import type { WallConditions } from "../laminar/wall-conditions";
import { emptyPlace, wallPlace } from "../laminar/wall-conditions";
import type { EddyPlace, EddyProfile } from "./eddy-step";
import { solveEddyStep } from "./eddy-step";
import type { EddyScales } from "./eddy-viscosity";

/** A turbulent layer at a station by the full equations. */
export interface EddyRecord {
  /** Station as a row of the column; −1 between stations. */
  row: number;
  x: number;
  momentumLoss: number;
  defect: number;
  energyLoss: number;
  layerHeight: number;
  friction: number;
  blowVelocity: number;
}

export interface EddyMarch {
  records: EddyRecord[];
  stop: { kind: "end" } | { kind: "separation" | "limit"; x: number; momentumLoss: number };
  counts: { steps: number; turns: number; nodes: number };
}

/** First node at y⁺ of about this at the end of the wall, for plate friction cf = 0.003; growth from node to node. */
const FIRST_PLUS = 0.4;
const PLATE_SPEED = Math.sqrt(0.003 / 2);
const STRETCH = 1.07;
/** The grid reaches this many times the height of a plate layer, 0.37 Re^−0.2 x, and at least as high as a laminar one. */
const ROOM = 6;
const LEAST_HEIGHT = 14;
/** First step over θ behind the onset, growth of steps, longest step over the distance run. */
const FIRST_STEP = 2;
const STEP_GROWTH = 1.25;
const LONGEST = 0.04;
/** Shortest step over θ, and tries without a solution in the whole march: near separation more of them only creep towards it. */
const LEAST_STEP = 0.25;
const MOST_MISSES = 25;
/** Wall friction below which a march that cannot go on has come to separation. */
const NEARLY_SEPARATED = 4e-4;
/** 1 − u at the last but tenth node above which the grid is too low. */
const EDGE = 1e-4;

/**
 * The turbulent layer from a given profile on by the full boundary-layer equations with the eddy viscosity of Cebeci and Smith (eddy-viscosity.ts).
 *
 * Heights are counted in Δ = √(ν s∕ue), s being the distance from the layer's start; across the layer Keller's box, along it backward
 * differences of second order with steps that grow from the onset.
 *
 * @param wall edge curve and radius, solid wall
 * @param profile speeds over height at the onset, where the eddy viscosity begins at once in full
 * @param head added to x − x₁ to count from the layer's start [length]; the sum must be above 0 at the onset
 * @param refinement cuts growth of nodes and steps into so many
 *
 * Sources: T. Cebeci & A. M. O. Smith, Analysis of Turbulent Boundary Layers (1974); H. B. Keller & T. Cebeci, AIAA J. 10 (1972) 1193–1199 (box, turbulent).
 */
export function eddyMarch(wall: WallConditions, nu: number, profile: StoredProfile, head: number, refinement = 1): EddyMarch {
  const { x, value } = wall.edge.curve;
  const n = x.length;
  const origin = x[0] - head;
  const at = emptyPlace();
  const eta = gridOf(Math.max(...value) * (x[n - 1] - origin), nu, refinement);
  let count = eta.start;
  const room = eta.node.length;
  const chain = blockElimination(3, 2, room);
  const fresh = (): EddyProfile => ({ f: new Float64Array(room), u: new Float64Array(room), q: new Float64Array(room) });
  const past = { f: new Float64Array(room), u: new Float64Array(room) };
  const counts = { steps: 0, turns: 0, nodes: count };
  const records: EddyRecord[] = [];

  // Profiles of the last three stations, newest first, with the places and δ* that belong to them.
  const kept = [fresh(), fresh(), fresh()];
  const places = new Float64Array(3);
  const flows = new Float64Array(3);
  let known = 1;
  const goTo = (to: number): void => {
    const panel = Math.min(panelOf(x, to), n - 2);
    wallPlace(wall, panel, (to - x[panel]) / (x[panel + 1] - x[panel]), at);
  };
  goTo(profile.x);
  const delta0 = Math.sqrt((nu * (profile.x - origin)) / at.speed);
  startProfile(profile, at.speed, delta0, eta.node, count, kept[0]);
  places[0] = profile.x - origin;
  flows[0] = at.radius * at.speed * delta0 * integrals(eta.node, count, kept[0]).defect;
  let theta = delta0 * integrals(eta.node, count, kept[0]).momentum;
  const weights = new Float64Array(3);
  let row = x.findIndex((s) => s > profile.x);
  if (row < 0) row = n;
  let step = (FIRST_STEP * theta) / refinement;
  let misses = 0;
  let friction = [Infinity, Infinity];
  while (row < n) {
    const s = places[0];
    const left = x[row] - origin - s;
    const h = step >= left ? left : step > left / 2 ? left / 2 : step;
    const atRow = h === left;
    const next = atRow ? x[row] - origin : s + h;
    goTo(atRow ? x[row] : origin + next);
    const delta = Math.sqrt((nu * next) / at.speed);
    backwardDifference([next, ...places.subarray(0, Math.min(known, 2))], Math.min(known, 2) + 1, weights);
    for (let j = 0; j < count; j += 1) {
      past.f[j] = weights[1] * kept[0].f[j] + (known > 1 ? weights[2] * kept[1].f[j] : 0);
      past.u[j] = weights[1] * kept[0].u[j] + (known > 1 ? weights[2] * kept[1].u[j] : 0);
    }
    const trial = kept[2];
    trial.f.set(kept[0].f);
    trial.u.set(kept[0].u);
    trial.q.set(kept[0].q);
    const slope = (next * at.speedSlope) / at.speed;
    const place: EddyPlace = { p: (1 + slope) / 2 + (next * at.radiusSlope) / at.radius, q: slope, r: next, own: weights[0] };
    const reynolds = (at.speed * delta) / nu;
    const scalesOf = (p: EddyProfile, nodes: number): EddyScales => {
      const sums = integrals(eta.node, nodes, p);
      const shear = Math.max(p.q[0], 1e-6);
      // u_τ∕ue = √(q0∕ReΔ)
      const wallSpeed = Math.sqrt(shear / reynolds);
      return {
        reynolds,
        wallReynolds: wallSpeed * reynolds,
        pressure: (nu * at.speedSlope) / (at.speed * at.speed * wallSpeed ** 3),
        momentumReynolds: reynolds * sums.momentum,
        defect: sums.defect,
      };
    };
    const turns = solveEddyStep(chain, eta.node, count, trial, past, place, scalesOf);
    const cf = (2 * trial.q[0]) / reynolds;
    if (turns === 0 || !(cf > 0)) {
      misses += 1;
      step = h / 2;
      if (misses <= MOST_MISSES && step > (LEAST_STEP * theta) / refinement) continue;
      // τw² falls straight towards separation (Goldstein): the place from the last two steps.
      const [last, before] = friction;
      const reach = before > last && Number.isFinite(before) ? (last * last * (places[0] - places[1])) / (before * before - last * last) : 0;
      const kind = last < NEARLY_SEPARATED ? "separation" : "limit";
      return { records, stop: { kind, x: Math.min(origin + places[0] + reach, x[row]), momentumLoss: theta }, counts };
    }
    counts.steps += 1;
    counts.turns += turns;
    const sums = integrals(eta.node, count, trial);
    theta = sums.momentum * delta;
    const flow = at.radius * at.speed * delta * sums.defect;
    const rate = weights[0] * flow + weights[1] * flows[0] + (known > 1 ? weights[2] * flows[1] : 0);
    if (atRow) {
      records.push({
        row,
        x: x[row],
        momentumLoss: theta,
        defect: sums.defect * delta,
        energyLoss: sums.energy * delta,
        layerHeight: heightOf(eta.node, count, trial.u, 0.99) * delta,
        friction: cf,
        blowVelocity: rate / at.radius,
      });
      row += 1;
    }
    friction = [cf, friction[0]];
    kept.unshift(kept.pop()!);
    places.copyWithin(1, 0);
    flows.copyWithin(1, 0);
    places[0] = next;
    flows[0] = flow;
    known = Math.min(known + 1, 3);
    step = Math.min(Math.max(h, step) * STEP_GROWTH, (LONGEST * next) / refinement);
    if (1 - kept[0].u[count - 11] > EDGE && count < room) {
      const more = Math.min(count + 10, room);
      for (const p of kept) {
        for (let j = count; j < more; j += 1) {
          p.f[j] = p.f[count - 1] + eta.node[j] - eta.node[count - 1];
          p.u[j] = 1;
          p.q[j] = 0;
        }
      }
      count = more;
      counts.nodes = count;
    }
  }
  return { records, stop: { kind: "end" }, counts };
}

/** Nodes from the wall outwards; `start` of them reach over a plate layer, the rest is room to grow. */
function gridOf(flow: number, nu: number, refinement: number): { node: Float64Array; start: number } {
  const reynolds = flow / nu;
  const first = FIRST_PLUS / (PLATE_SPEED * Math.sqrt(reynolds)) / refinement;
  const stretch = Math.pow(STRETCH, 1 / refinement);
  const high = Math.max(LEAST_HEIGHT, ROOM * 0.37 * Math.pow(reynolds, 0.3));
  const nodes = [0];
  let step = first;
  let start = 0;
  while (nodes[nodes.length - 1] < 8 * high) {
    nodes.push(nodes[nodes.length - 1] + step);
    step *= stretch;
    if (start === 0 && nodes[nodes.length - 1] >= high) start = nodes.length;
  }
  return { node: Float64Array.from(nodes), start };
}

/** The profile at the onset on the nodes: speeds by its own slopes, laminar stress. */
function startProfile(profile: StoredProfile, speed: number, delta: number, eta: Float64Array, count: number, out: EddyProfile): void {
  const curve = { x: profile.height, value: profile.speed, slope: profile.shear };
  const top = profile.height[profile.height.length - 1];
  for (let j = 0; j < count; j += 1) {
    const y = eta[j] * delta;
    const here = y < top ? cubicAt(curve, y) : null;
    out.u[j] = here !== null && here.ok ? here.value / speed : 1;
    out.q[j] = here !== null && here.ok ? (here.slope * delta) / speed : 0;
    out.f[j] = j === 0 ? 0 : out.f[j - 1] + ((eta[j] - eta[j - 1]) * (out.u[j] + out.u[j - 1])) / 2;
  }
  out.u[count - 1] = 1;
}

/** δ*∕Δ, θ∕Δ and δ3∕Δ by the trapezium rule, of the order of the box. */
function integrals(eta: Float64Array, count: number, p: EddyProfile): { defect: number; momentum: number; energy: number } {
  let momentum = 0;
  let energy = 0;
  for (let j = 1; j < count; j += 1) {
    const h = (eta[j] - eta[j - 1]) / 2;
    const [a, b] = [p.u[j - 1], p.u[j]];
    momentum += h * (a * (1 - a) + b * (1 - b));
    energy += h * (a * (1 - a * a) + b * (1 - b * b));
  }
  return { defect: eta[count - 1] - p.f[count - 1], momentum, energy };
}

/** Lowest height where u reaches a fraction of ue. */
function heightOf(eta: Float64Array, count: number, u: Float64Array, fraction: number): number {
  let j = 1;
  while (j + 1 < count && u[j] < fraction) j += 1;
  const rise = u[j] - u[j - 1];
  return rise > 0 ? eta[j - 1] + ((eta[j] - eta[j - 1]) * (fraction - u[j - 1])) / rise : eta[j];
}

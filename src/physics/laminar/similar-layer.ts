import { brentRoot } from "../../numerics/brent-root";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { SimilarBranch } from "./similar-branch";
import { incipientSimilar, similarBranch } from "./similar-branch";
import type { SimilarNodes } from "./similar-equations";

/** A similar laminar layer, lengths in Hartree's η = y √((m+1) ue ∕ (2 ν x)). */
export interface SimilarLayer {
  /** Exponent of ue ∝ x^m. */
  m: number;
  /** Hartree's gradient β = 2m∕(m+1). */
  beta: number;
  /** f(0), above 0 suction. */
  wall: number;
  /** f″(0). */
  wallShear: number;
  /** δ*, θ, δ3 in η. */
  defect: number;
  momentumLoss: number;
  energyLoss: number;
  /** H = δ*∕θ and δ3∕θ. */
  shape: number;
  energyShape: number;
  /** Height in η where u = 0.99 ue. */
  height: number;
  /** λ = θ² ue′∕ν, S = θ τw∕(μ ue), D = θ ∫(∂u∕∂y)² dy ∕ ue², and vw θ∕ν. */
  gradient: number;
  shear: number;
  dissipation: number;
  wallFlow: number;
  nodes: SimilarNodes;
}

/** The exponent of ue ∝ x^m below which no layer stays attached on a solid wall (f″(0) = 0); own solution, Hartree 1937 gives −0.0904. */
export const INCIPIENT_M = -0.0904285622707;
/** Exponents at and below −1 have no layer of Hartree's form. */
const LEAST_M = -1;
/** Transpiration beyond this is outside what the grid was checked for. */
const MOST_TRANSPIRATION = 20;
/** An exponent this little below the least one is that one, rounded to the seven decimals in which it is printed (−0.0904286). */
const ROUNDING = 5e-8;
/** Nearer to the flat plate the reversed layer grows beyond all bounds. */
const MOST_REVERSED_M = -0.001;
/** Share of the edge speed that defines the layer's height. */
const HEIGHT_FRACTION = 0.99;

/**
 * The similar (Falkner–Skan) laminar layer on a wall with edge speed ue ∝ x^m.
 *
 * @param m exponent [1], > −1; −0.0904286 ≤ m on a solid wall: below no layer exists ("no similar layer"), suction lowers this limit. m = 0 flat plate,
 *   m = 1 plane stagnation point (m = 1∕3: round stagnation point through Mangler's transformation)
 * @param options.branch "attached" (default), or "reversed": the second solution with reversed flow at the wall, for m between incipient and 0
 * @param options.transpiration (vw∕ue) √(ue x∕ν) [1], constant along a similar layer; above 0 blowing, below 0 suction, −20 … lift-off
 * @returns wall shear, thicknesses and profile nodes, each to about 1e-10; "layer lifts off" where blowing is too strong
 *
 * Sources: V. M. Falkner & S. W. Skan, ARC R&M 1314 (1930); D. R. Hartree, Proc. Camb. Phil. Soc. 33 (1937) 223–239; the reversed
 * branch K. Stewartson, Proc. Camb. Phil. Soc. 50 (1954) 454–465; transpiration H. W. Emmons & D. C. Leigh, ARC CP 157 (1954).
 */
export function similarLayer(m: number, options: { branch?: SimilarBranch; transpiration?: number } = {}): Outcome<{ layer: SimilarLayer }> {
  const { branch = "attached", transpiration = 0 } = options;
  if (!Number.isFinite(m)) return refuse("not finite", { argument: "m" });
  if (!Number.isFinite(transpiration)) return refuse("not finite", { argument: "wall_velocity" });
  if (m <= LEAST_M) return refuse("no similar layer", { argument: "m", values: { value: m, least: INCIPIENT_M } });
  if (transpiration < -MOST_TRANSPIRATION) {
    return refuse("outside range", { argument: "wall_velocity", values: { value: transpiration, least: -MOST_TRANSPIRATION, most: MOST_TRANSPIRATION } });
  }
  const beta = (2 * m) / (m + 1);
  const wall = transpiration === 0 ? 0 : -transpiration / Math.sqrt((m + 1) / 2);
  if (branch === "reversed" && m > MOST_REVERSED_M) return refuse("no reversed layer", { argument: "m", values: { value: m, least: INCIPIENT_M, most: MOST_REVERSED_M } });
  if (transpiration === 0 && m < INCIPIENT_M - ROUNDING) return refuse("no similar layer", { argument: "m", values: { value: m, least: INCIPIENT_M } });
  const solved = similarBranch(beta, wall, branch);
  if (!solved.ok) return solved.reason === "no similar layer" ? refuse("no similar layer", { argument: "m", values: { value: m, least: leastM(wall) } }) : solved;
  const layer = similarQuantities(m, wall, solved.nodes);
  // Suction can leave so much reversed flow that the momentum loss turns negative; shape factors then mean nothing.
  if (!(layer.momentumLoss > 0)) return refuse("no reversed layer", { argument: "m", values: { value: m, least: INCIPIENT_M, most: MOST_REVERSED_M } });
  return { ok: true, layer };
}

/** The least m for a wall value, for the sentence; the solid wall's when it cannot be found. */
function leastM(wall: number): number {
  const verge = incipientSimilar(wall);
  return verge.ok ? verge.nodes.beta / (2 - verge.nodes.beta) : INCIPIENT_M;
}

/** Integrals and wall values of a solved layer. */
export function similarQuantities(m: number, wall: number, nodes: SimilarNodes): SimilarLayer {
  const { y, beta, step } = nodes;
  const last = y.length - 3;
  const wallShear = y[2];
  const defect = (y.length / 3 - 1) * step + wall - y[last];
  let momentumLoss = 0;
  let energyLoss = 0;
  let dissipation = 0;
  for (let at = 0; at <= last; at += 3) {
    const f = y[at];
    const u = y[at + 1];
    const v = y[at + 2];
    const g = -f * v - beta * (1 - u * u);
    const g1 = (2 * beta - 1) * u * v - f * g;
    // ∫q = h Σ(q₀+q₁)∕2 + h²Σ(q₀′−q₁′)∕10 + h³Σ(q₀″+q₁″)∕120: the slopes cancel between intervals and remain at the two ends.
    const half = at === 0 || at === last ? 0.5 : 1;
    const end = at === 0 ? 1 : at === last ? -1 : 0;
    const add = (q: number, q1: number, q2: number): number => step * half * q + ((step * step) / 10) * end * q1 + (step ** 3 / 60) * half * q2;
    momentumLoss += add(u * (1 - u), v * (1 - 2 * u), g * (1 - 2 * u) - 2 * v * v);
    energyLoss += add(u * (1 - u * u), v * (1 - 3 * u * u), g * (1 - 3 * u * u) - 6 * u * v * v);
    dissipation += add(v * v, 2 * v * g, 2 * g * g + 2 * v * g1);
  }
  return {
    m,
    beta,
    wall,
    wallShear,
    defect,
    momentumLoss,
    energyLoss,
    shape: defect / momentumLoss,
    energyShape: energyLoss / momentumLoss,
    height: similarHeight(nodes, HEIGHT_FRACTION),
    gradient: beta * momentumLoss * momentumLoss,
    shear: momentumLoss * wallShear,
    dissipation: momentumLoss * dissipation,
    wallFlow: -wall * momentumLoss,
    nodes,
  };
}

/** Speed ratio u and shear v at a height η: the quintic through u, u′, u″ of both neighbours (error below 1e-11); 1 and 0 above the grid. */
export function similarSpeed(nodes: SimilarNodes, eta: number): { speed: number; shear: number } {
  const { y, beta, step: h } = nodes;
  const j = Math.floor(eta / h);
  const at = 3 * j;
  if (at + 5 >= y.length) return { speed: 1, shear: 0 };
  const t = eta / h - j;
  const g0 = -y[at] * y[at + 2] - beta * (1 - y[at + 1] ** 2);
  const g1 = -y[at + 3] * y[at + 5] - beta * (1 - y[at + 4] ** 2);
  const rise = y[at + 4] - y[at + 1];
  const a1 = h * y[at + 2];
  const b1 = h * y[at + 5];
  const a2 = (h * h * g0) / 2;
  const b2 = (h * h * g1) / 2;
  const c3 = 10 * rise - 6 * a1 - 4 * b1 - 3 * a2 + b2;
  const c4 = -15 * rise + 8 * a1 + 7 * b1 + 3 * a2 - 2 * b2;
  const c5 = 6 * rise - 3 * (a1 + b1) - a2 + b2;
  return {
    speed: y[at + 1] + t * (a1 + t * (a2 + t * (c3 + t * (c4 + t * c5)))),
    shear: (a1 + t * (2 * a2 + t * (3 * c3 + t * (4 * c4 + t * 5 * c5)))) / h,
  };
}

/** The height in η where the speed first reaches a share of the edge speed. */
function similarHeight(nodes: SimilarNodes, fraction: number): number {
  const { y, step } = nodes;
  let j = 1;
  while (3 * j + 1 < y.length - 3 && y[3 * j + 1] < fraction) j += 1;
  const root = brentRoot((eta) => similarSpeed(nodes, eta).speed - fraction, (j - 1) * step, j * step);
  return root.ok ? root.x : j * step;
}

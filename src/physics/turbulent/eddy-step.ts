import type { BlockElimination } from "../../numerics/block-elimination";
import type { EddyScales } from "./eddy-viscosity";
import { innerFactor, innerGradient, outerFactor } from "./eddy-viscosity";

/** A turbulent profile on the nodes: f (ψ = ue Δ f), u = f′ and the stress q = (1 + νt∕ν) f″. */
export interface EddyProfile {
  f: Float64Array;
  u: Float64Array;
  q: Float64Array;
}

/** Coefficients of the momentum equation at a station: q′ + P f v + Q (1 − u²) = R (u ∂u∕∂s − v ∂f∕∂s). */
export interface EddyPlace {
  p: number;
  q: number;
  r: number;
  /** Weight of the station's own values in ∂∕∂s. */
  own: number;
}

/** What the profile's integrals need, for a given profile. */
export type ScalesOf = (profile: EddyProfile, count: number) => EddyScales;

/** A change of the stress below this, of its own size 1, is settled; the last turn leaves a tenth of it. */
const SETTLED = 1e-7;
const MOST_TURNS = 40;

/**
 * Solves the profile at a station by Newton's method on Keller's box, with the scales of the eddy viscosity taken from the turn before.
 *
 * @param past Σ weight·value of the profiles upstream, for u and f
 * @returns turns used; 0 when it does not settle
 */
export function solveEddyStep(chain: BlockElimination, eta: Float64Array, count: number, profile: EddyProfile, past: { f: Float64Array; u: Float64Array }, at: EddyPlace, scalesOf: ScalesOf): number {
  for (let turn = 1; turn <= MOST_TURNS; turn += 1) {
    if (!sweep(chain, eta, count, profile, past, at, scalesOf(profile, count))) return 0;
    const y = chain.solution;
    let size = 0;
    for (let j = 0; j < count; j += 1) {
      profile.f[j] += y[3 * j];
      profile.u[j] += y[3 * j + 1];
      profile.q[j] += y[3 * j + 2];
      size = Math.max(size, Math.abs(y[3 * j + 2]) / (Math.abs(profile.q[0]) + 1e-3), Math.abs(y[3 * j + 1]));
    }
    if (!Number.isFinite(size)) return 0;
    if (size < SETTLED) return turn;
  }
  return 0;
}

function sweep(chain: BlockElimination, eta: Float64Array, count: number, profile: EddyProfile, past: { f: Float64Array; u: Float64Array }, at: EddyPlace, scales: EddyScales): boolean {
  const { rows } = chain;
  const { f, u, q } = profile;
  rows.fill(0, 0, 14);
  rows[0] = 1;
  rows[6] = -f[0];
  rows[8] = 1;
  rows[13] = -u[0];
  chain.begin();
  let outer = false;
  const far = outerFactor(scales);
  for (let j = 0; j + 1 < count; j += 1) {
    const k = j + 1;
    const h = eta[k] - eta[j];
    const half = h / 2;
    const height = (eta[j] + eta[k]) / 2;
    const stress = (q[j] + q[k]) / 2;
    const factor = innerFactor(scales, height);
    const inner = innerGradient(factor, stress);
    // From the first height where the outer viscosity is the smaller one it stays in charge.
    if (!outer && 1 + factor * Math.abs(inner.gradient) > far) outer = true;
    const v = outer ? stress / far : inner.gradient;
    const rate = outer ? 1 / far : inner.rate;
    const uMid = (u[j] + u[k]) / 2;
    const fMid = (f[j] + f[k]) / 2;
    const uAlong = at.own * uMid + (past.u[j] + past.u[k]) / 2;
    const fAlong = at.own * fMid + (past.f[j] + past.f[k]) / 2;
    const carry = at.p * fMid + at.r * fAlong;
    const carryByF = at.p + at.r * at.own;
    const miss = (q[k] - q[j]) / h + carry * v + at.q * (1 - uMid * uMid) - at.r * uMid * uAlong;
    const byF = (carryByF * v) / 2;
    const byU = (-2 * at.q * uMid - at.r * (uAlong + at.own * uMid)) / 2;
    const byQ = (carry * rate) / 2;
    rows[14] = -1;
    rows[15] = -half;
    rows[16] = 0;
    rows[17] = 1;
    rows[18] = -half;
    rows[19] = 0;
    rows[20] = f[j] - f[k] + half * (u[j] + u[k]);
    rows[21] = 0;
    rows[22] = -1;
    rows[23] = -half * rate;
    rows[24] = 0;
    rows[25] = 1;
    rows[26] = -half * rate;
    rows[27] = u[j] - u[k] + h * v;
    rows[28] = byF;
    rows[29] = byU;
    rows[30] = -1 / h + byQ;
    rows[31] = byF;
    rows[32] = byU;
    rows[33] = 1 / h + byQ;
    rows[34] = -miss;
    if (!chain.push()) return false;
  }
  rows[14] = 0;
  rows[15] = 1;
  rows[16] = 0;
  rows[20] = 1 - u[count - 1];
  return chain.finish();
}

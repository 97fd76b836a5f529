import { CLOSURE_FIT } from "./similar-closure-fit";

/** What a layer of given energy shape and wall flow is like, if it is similar. */
export interface Closure {
  /** S = θ τw∕(μ ue), D = θ ∫(∂u∕∂y)² dy ∕ ue², H = δ*∕θ. */
  shear: number;
  dissipation: number;
  shape: number;
}

/** Range of the fit: w = √(H32 − its least value), 0 at separation; wall flow vw θ∕ν. */
export const CLOSURE_RANGE = { mostW: CLOSURE_FIT.mostW, leastWallFlow: CLOSURE_FIT.leastR, mostWallFlow: CLOSURE_FIT.mostR } as const;

const { leastW, mostW, leastR, mostR, degreeW, degreeR } = CLOSURE_FIT;
const alongR = new Float64Array(CLOSURE_FIT.verge.length);
const alongW = new Float64Array(degreeW + 1);

/**
 * Least energy shape H32 of the similar layers with a wall flow vw θ∕ν: that of the layer on the verge of separation. There H32 and D turn
 * and S passes through 0, since the neighbouring layers differ only by a shift along y.
 */
export function vergeEnergyShape(wallFlow: number): number {
  return along(CLOSURE_FIT.verge, chebyshevRow(CLOSURE_FIT.verge.length - 1, (2 * wallFlow - leastR - mostR) / (mostR - leastR), alongR));
}

/**
 * Shear, dissipation and shape of the similar layer with w = ±√(H32 − vergeEnergyShape), below 0 in reversed flow, and wall flow vw θ∕ν.
 *
 * Chebyshev polynomials in both, fitted to similar layers from strong acceleration (β = 20) through separation into reversed flow; largest
 * misses on a solid wall S 1e-5, D 3e-6, 1∕H 3e-5 and S 3e-4, D 2e-5, 1∕H 8e-4 (strong blowing) in all, tested. w −0.15 … 0.38, wall flow −1 … 0.6;
 * arguments outside are refused by the caller.
 *
 * Source: our own similar layers (similar-layer.ts).
 */
export function closureAt(w: number, wallFlow: number, out: Closure): Closure {
  chebyshevRow(degreeW, (2 * w - leastW - mostW) / (mostW - leastW), alongW);
  if (wallFlow === 0) {
    out.shear = along(SOLID.shear, alongW);
    out.dissipation = along(SOLID.dissipation, alongW);
    out.shape = 1 / along(SOLID.inverseShape, alongW);
    return out;
  }
  chebyshevRow(degreeR, (2 * wallFlow - leastR - mostR) / (mostR - leastR), alongR);
  out.shear = both(CLOSURE_FIT.shear);
  out.dissipation = both(CLOSURE_FIT.dissipation);
  out.shape = 1 / both(CLOSURE_FIT.inverseShape);
  return out;
}

/** Chebyshev polynomials of degree 0 … `degree` at a place in −1 … 1. */
export function chebyshevRow(degree: number, at: number, out: Float64Array): Float64Array {
  out[0] = 1;
  if (degree > 0) out[1] = at;
  for (let k = 2; k <= degree; k += 1) out[k] = 2 * at * out[k - 1] - out[k - 2];
  return out;
}

/** The fit on a solid wall, its sums over the wall flow carried out beforehand. */
const SOLID = { shear: solid(CLOSURE_FIT.shear), dissipation: solid(CLOSURE_FIT.dissipation), inverseShape: solid(CLOSURE_FIT.inverseShape) } as const;

function solid(coefficients: readonly number[]): number[] {
  const row = chebyshevRow(degreeR, (-leastR - mostR) / (mostR - leastR), new Float64Array(degreeR + 1));
  return Array.from({ length: degreeW + 1 }, (_, i) => along(coefficients.slice(i * (degreeR + 1), (i + 1) * (degreeR + 1)), row));
}

function along(coefficients: readonly number[], row: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < coefficients.length; k += 1) sum += coefficients[k] * row[k];
  return sum;
}

function both(coefficients: readonly number[]): number {
  let sum = 0;
  let k = 0;
  for (let i = 0; i <= degreeW; i += 1) {
    let inner = 0;
    for (let j = 0; j <= degreeR; j += 1, k += 1) inner += coefficients[k] * alongR[j];
    sum += inner * alongW[i];
  }
  return sum;
}

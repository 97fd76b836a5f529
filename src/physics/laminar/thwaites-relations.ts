/** λ at which the method's wall shear vanishes: separation (Curle & Skan 1957 for Thwaites' 0.082; from memory). */
export const SEPARATION_GRADIENT = -0.09;
/** Largest λ of Thwaites' table; beyond it the shape and shear relations have no support. */
export const LARGEST_GRADIENT = 0.25;

/**
 * Shear function S(λ) = θ τw ∕ (μ ue) of Thwaites' method.
 *
 * White's fit: within 0.006 of Thwaites' table (as revised by Curle & Skan) for −0.09 ≤ λ ≤ 0.2, 0.012 high at 0.25. Chosen over the
 * two-branch fits in use because it has no kink at λ = 0.
 *
 * Source: F. M. White, Viscous Fluid Flow, 2nd ed. 1991, eq. 4-138 (number from memory).
 */
export function thwaitesShear(lambda: number): number {
  return lambda > SEPARATION_GRADIENT ? Math.pow(lambda - SEPARATION_GRADIENT, 0.62) : 0;
}

/**
 * Shape factor H(λ) = δ*∕θ of Thwaites' method.
 *
 * White's polynomial: within 0.02 of Thwaites' table for −0.088 ≤ λ ≤ 0.25 and 0.03 low at separation (3.52 for 3.55). One polynomial
 * over the whole range, so that dm/dx = d(ue δ*)/dx has no kink of the relation's making.
 *
 * Source: F. M. White, Viscous Fluid Flow, 2nd ed. 1991, eq. 4-138 (number from memory).
 */
export function thwaitesShape(lambda: number): number {
  const z = 0.25 - lambda;
  return 2 + z * (4.14 + z * (-83.5 + z * (854 + z * (-3337 + z * 4576))));
}

/** dH∕dλ of the same polynomial. */
export function thwaitesShapeRate(lambda: number): number {
  const z = 0.25 - lambda;
  return -(4.14 + z * (-2 * 83.5 + z * (3 * 854 + z * (-4 * 3337 + z * 5 * 4576))));
}

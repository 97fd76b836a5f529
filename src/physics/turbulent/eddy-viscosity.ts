/** What the eddy viscosity of a whole profile depends on. */
export interface EddyScales {
  /** ue Δ∕ν, Δ being the length that makes heights η = y∕Δ. */
  reynolds: number;
  /** u_τ Δ∕ν. */
  wallReynolds: number;
  /** p⁺ = ν ue ue′∕u_τ³. */
  pressure: number;
  /** Reθ. */
  momentumReynolds: number;
  /** δ*∕Δ. */
  defect: number;
}

/** κ and A⁺ of the inner layer; α of the outer one at high Reynolds number (T. Cebeci & A. M. O. Smith, Analysis of Turbulent Boundary Layers, 1974, ch. 6). */
const KARMAN = 0.4;
const DAMPING_LENGTH = 26;
const OUTER = 0.0168;
/** Low Reynolds numbers: α = 0.0168·1.55∕(1 + Π), Π = 0.55 [1 − exp(−0.243 √z − 0.298 z)], z = Reθ∕425 − 1 (Coles 1962 as used there). */
const WAKE = 0.55;
const WAKE_REYNOLDS = 425;
/** Acceleration thickens the sublayer, N² = 1 − 11.8 p⁺; at this the damping length is ten times the plate's and the layer all but laminar again. */
const PRESSURE = 11.8;
const LEAST_SQUARE = 0.01;

/** (ℓ∕Δ)² ue Δ∕ν at a height: with it the stress q = v + k v² of the inner layer, v = ∂(u∕ue)∕∂η. */
export function innerFactor(scales: EddyScales, eta: number): number {
  const stretch = Math.sqrt(Math.max(1 - PRESSURE * scales.pressure, LEAST_SQUARE));
  const plus = eta * scales.wallReynolds;
  const length = KARMAN * eta * -Math.expm1((-plus * stretch) / DAMPING_LENGTH);
  return length * length * scales.reynolds;
}

/**
 * 1 + νt∕ν of the outer layer, the same at all heights: the form of T. Cebeci & P. Bradshaw (Momentum Transfer in Boundary Layers, 1977) without
 * intermittency at the edge. With Klebanoff's factor of the 1974 book the plate's wall friction is 4 to 7 % low against Wieghardt and DNS, without it 0 to 4 %.
 */
export function outerFactor(scales: EddyScales): number {
  const z = scales.momentumReynolds / WAKE_REYNOLDS - 1;
  const wake = z > 0 ? -WAKE * Math.expm1(-0.243 * Math.sqrt(z) - 0.298 * z) : 0;
  const alpha = (OUTER * (1 + WAKE)) / (1 + wake);
  return 1 + alpha * scales.reynolds * scales.defect;
}

/** The gradient v that carries the stress q in the inner layer, and dv∕dq. */
export function innerGradient(factor: number, stress: number): { gradient: number; rate: number } {
  const root = Math.sqrt(1 + 4 * factor * Math.abs(stress));
  return { gradient: (2 * stress) / (1 + root), rate: 1 / root };
}

import { checkFinite } from "../../numerics/check-column";
import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";

/** Ratio of specific heats of air at moderate temperature (NACA Rep. 1135, 1953, p. 1). */
export const GAMMA_OF_AIR = 1.4;
/** Perfect-gas relations mean nothing long before this Mach number, and overflow long after it. */
export const MOST_MACH = 100;
/** Below this Mach number the isentropic relation differs from Bernoulli's by less than rounding (M²/4). */
const INCOMPRESSIBLE = 1e-8;
/** A pressure coefficient this close above its stagnation value, relative, is rounding of the stagnation point itself. */
const ROUNDING = 1e-12;

/**
 * Speed along a wall from its pressure coefficients.
 *
 * Without a Mach number by Bernoulli's equation, ue = U √(1 − cp). With the Mach number of the reference flow by the isentropic
 * relation: p∕p∞ = 1 + γM²cp∕2 and (ue∕U)² = 1 + 2 (1 − (p∕p∞)^((γ−1)∕γ)) ∕ ((γ−1) M²).
 *
 * @param cp pressure coefficients [1], n ≥ 1, not above the stagnation value (1, or 1 + M²∕4 + … with a Mach number) and not below
 *   the vacuum value −2∕(γM²); outside: refused with the row
 * @param referenceSpeed U [speed], > 0
 * @param mach Mach number of the reference flow [1], 0 … 100; omitted or 0: Bernoulli. No shock may stand between reference and wall
 * @param gamma ratio of specific heats [1], > 1
 * @returns edge speed at each place [speed]
 *
 * Source: Ames Research Staff, NACA Report 1135 (1953), isentropic pressure (eq. 44) and speed (eq. 50, number from memory); Bernoulli as its limit M → 0.
 */
export function edgeSpeed(
  cp: Float64Array,
  referenceSpeed: number,
  mach = 0,
  gamma = GAMMA_OF_AIR,
): Outcome<{ speed: Float64Array }> {
  if (cp.length < 1) return refuse("too few points", { argument: "cp", values: { count: 0, least: 1 } });
  const bad = checkFinite(cp, "cp") ?? checkReference(referenceSpeed, mach, gamma);
  if (bad) return bad;
  const g1 = gamma - 1;
  const bernoulli = mach < INCOMPRESSIBLE;
  const q = (gamma * mach * mach) / 2;
  const stagnation = stagnationPressure(mach, gamma);
  const vacuum = bernoulli ? -Infinity : -1 / q;
  const speed = new Float64Array(cp.length);
  for (let i = 0; i < cp.length; i += 1) {
    if (cp[i] > stagnation * (1 + ROUNDING) || cp[i] < vacuum) {
      return refuse("outside range", { argument: "cp", row: i + 1, values: { value: cp[i], least: vacuum, most: stagnation } });
    }
    // 1 − (p∕p∞)^((γ−1)∕γ), written so that it keeps its digits at small Mach numbers.
    const square = bernoulli ? 1 - cp[i] : cp[i] === vacuum ? 1 + 2 / (g1 * mach * mach) : 1 - (2 / (g1 * mach * mach)) * Math.expm1((g1 / gamma) * Math.log1p(q * cp[i]));
    speed[i] = cp[i] >= stagnation ? 0 : referenceSpeed * Math.sqrt(Math.max(square, 0));
    if (!Number.isFinite(speed[i])) return refuse("not finite", { argument: "cp", row: i + 1, values: { value: cp[i] } });
  }
  return { ok: true, speed };
}

/** Pressure coefficient of the stagnation point [1]: 1, or 1 + M²∕4 + … with a Mach number (NACA Report 1135). */
export function stagnationPressure(mach: number, gamma: number): number {
  if (mach < INCOMPRESSIBLE) return 1;
  return Math.expm1((gamma / (gamma - 1)) * Math.log1p(((gamma - 1) / 2) * mach * mach)) / ((gamma * mach * mach) / 2);
}

function checkReference(referenceSpeed: number, mach: number, gamma: number): Refusal | null {
  if (!(Number.isFinite(referenceSpeed) && referenceSpeed > 0)) {
    return refuse("not positive", { argument: "reference_speed", values: { value: referenceSpeed } });
  }
  if (!Number.isFinite(mach)) return refuse("not finite", { argument: "mach" });
  if (mach < 0) return refuse("negative", { argument: "mach", values: { value: mach } });
  if (mach > MOST_MACH) return refuse("outside range", { argument: "mach", values: { value: mach, least: 0, most: MOST_MACH } });
  if (!(Number.isFinite(gamma) && gamma > 1)) return refuse("outside range", { argument: "gamma", values: { value: gamma, least: 1, most: Infinity } });
  return null;
}

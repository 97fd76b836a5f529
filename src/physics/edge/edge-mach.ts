import { checkFinite } from "../../numerics/check-column";
import { refuse, type Outcome } from "../../numerics/outcome";
import { GAMMA_OF_AIR, MOST_MACH } from "./edge-speed";

/** A pressure coefficient this close above its stagnation value, relative, is rounding of the stagnation point itself. */
const ROUNDING = 1e-12;

/**
 * Local Mach number along a wall from its pressure coefficients, isentropic from the reference flow:
 * M² = 2∕(γ−1) ((p0∕p)^((γ−1)∕γ) − 1), with p∕p∞ = 1 + γM∞²cp∕2 and p0∕p∞ from the reference Mach number.
 *
 * @param cp pressure coefficients [1], from above the vacuum value −2∕(γM∞²) to the stagnation value
 * @param mach reference Mach number, > 0, ≤ 100
 * @param gamma ratio of specific heats, > 1
 * @returns Mach number at each place; a value outside is refused with its row
 *
 * Source: Ames Research Staff, NACA Report 1135 (1953), isentropic relations of a perfect gas.
 */
export function edgeMach(cp: Float64Array, mach: number, gamma = GAMMA_OF_AIR): Outcome<{ mach: Float64Array }> {
  if (cp.length < 1) return refuse("too few points", { argument: "cp", values: { count: 0, least: 1 } });
  if (!(Number.isFinite(mach) && mach > 0)) return refuse("not positive", { argument: "mach", values: { value: mach } });
  if (mach > MOST_MACH) return refuse("outside range", { argument: "mach", values: { value: mach, least: 0, most: MOST_MACH } });
  if (!(Number.isFinite(gamma) && gamma > 1)) return refuse("outside range", { argument: "gamma", values: { value: gamma, least: 1, most: Infinity } });
  const bad = checkFinite(cp, "cp");
  if (bad) return bad;
  const g1 = gamma - 1;
  const q = (gamma * mach * mach) / 2;
  const total = (gamma / g1) * Math.log1p((g1 / 2) * mach * mach); // ln p0∕p∞
  const stagnation = Math.expm1(total) / q;
  const out = new Float64Array(cp.length);
  for (let i = 0; i < cp.length; i++) {
    if (cp[i]! > stagnation * (1 + ROUNDING) || !(cp[i]! > -1 / q)) {
      return refuse("outside range", { argument: "cp", row: i + 1, values: { value: cp[i]!, least: -1 / q, most: stagnation } });
    }
    const local = total - Math.log1p(q * cp[i]!); // ln p0∕p
    out[i] = Math.sqrt(Math.max(0, (2 / g1) * Math.expm1((g1 / gamma) * local)));
    if (!Number.isFinite(out[i]!)) return refuse("not finite", { argument: "cp", row: i + 1, values: { value: cp[i]! } });
  }
  return { ok: true, mach: out };
}

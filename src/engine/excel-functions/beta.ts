/** The regularised incomplete beta function by its continued fraction (Abramowitz & Stegun 1964, 26.5.8), to about 1e-13. */
import { logGamma } from "./gamma";

const MOST_TERMS = 100_000;
const TINY = 1e-300;

/** I(x; a, b) and 1 − I, the shares of ∫tᵃ⁻¹(1−t)ᵇ⁻¹dt below and above x; a, b > 0, 0 ≤ x ≤ 1. `rest` is 1 − x where it is known better than that. */
export function betaShares(a: number, b: number, x: number, rest = 1 - x): { below: number; above: number } {
  if (x <= 0) return { below: 0, above: 1 };
  if (rest <= 0) return { below: 1, above: 0 };
  const front = Math.exp(a * Math.log(x) + b * Math.log(rest) - logBeta(a, b));
  if (x < (a + 1) / (a + b + 2)) {
    const below = (front * fraction(a, b, x)) / a;
    return { below, above: 1 - below };
  }
  const above = (front * fraction(b, a, rest)) / b;
  return { below: 1 - above, above };
}

/** ln B(a, b). */
export function logBeta(a: number, b: number): number {
  return logGamma(a) + logGamma(b) - logGamma(a + b);
}

/** Lentz's way. */
function fraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1) || TINY);
  let h = d;
  for (let m = 1; m < MOST_TERMS; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || TINY);
    c = 1 + even / c || TINY;
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || TINY);
    c = 1 + odd / c || TINY;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return h;
}

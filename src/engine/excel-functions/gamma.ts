/**
 * The gamma function, its logarithm and its regularised incomplete forms, to about 1e-13: Stirling's series after upward recurrence
 * (Abramowitz & Stegun 1964, 6.1.41), series and continued fraction (6.5.29, 6.5.31).
 */
/** From here on Stirling's series is good to 1e-17. */
const STIRLING_FROM = 15;
/** Bernoulli numbers B₂ₖ∕(2k(2k−1)), k = 1 to 8. */
const STIRLING = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156, -3617 / 122400];
/** Longest factorial a double holds. */
const LARGEST_FACTORIAL = 170;
const MOST_TERMS = 100_000;
const TINY = 1e-300;

/** ln Γ(x) for x > 0. */
export function logGamma(x: number): number {
  let shift = 1;
  let z = x;
  for (; z < STIRLING_FROM; z++) shift *= z;
  return stirling(z) - Math.log(shift);
}

/** Γ(x); NaN at zero and the negative whole numbers. */
export function gamma(x: number): number {
  if (Number.isInteger(x)) {
    if (x <= 0) return NaN;
    if (x > LARGEST_FACTORIAL + 1) return Infinity;
    let product = 1;
    for (let k = 2; k < x; k++) product *= k;
    return product;
  }
  if (x < 0.5) return Math.PI / (Math.sin(Math.PI * x) * gamma(1 - x));
  let shift = 1;
  let z = x;
  for (; z < STIRLING_FROM; z++) shift *= z;
  return Math.exp(stirling(z)) / shift;
}

/** P(a, x) and Q(a, x) = 1 − P, the shares of ∫tᵃ⁻¹e⁻ᵗdt below and above x; a > 0, x ≥ 0. Neither loses digits where it is small. */
export function gammaShares(a: number, x: number): { below: number; above: number } {
  if (x <= 0) return { below: 0, above: 1 };
  const front = gammaFront(a, x);
  if (x < a + 1) {
    let term = 1 / a;
    let sum = term;
    for (let n = 1; n < MOST_TERMS && term > sum * 1e-17; n++) sum += term *= x / (a + n);
    return { below: front * sum, above: 1 - front * sum };
  }
  // Lentz's way through 1/(x+1−a− 1(1−a)/(x+3−a− …)).
  let b = x + 1 - a;
  let c = 1 / TINY;
  let d = 1 / b;
  let h = d;
  for (let n = 1; n < MOST_TERMS; n++) {
    const an = -n * (n - a);
    b += 2;
    d = 1 / (an * d + b || TINY);
    c = b + an / c || TINY;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-16) break;
  }
  return { below: 1 - front * h, above: front * h };
}

/** xᵃ e⁻ˣ ∕ Γ(a). For large a the parts cancel, so the deviation from x = a is taken first. */
export function gammaFront(a: number, x: number): number {
  if (a < STIRLING_FROM) return Math.exp(a * Math.log(x) - x - logGamma(a));
  const d = (x - a) / a;
  return Math.sqrt(a / (2 * Math.PI)) * Math.exp(-a * minusLog1p(d) - tail(a));
}

/** d − ln(1+d), without loss near 0. */
function minusLog1p(d: number): number {
  if (Math.abs(d) > 0.1) return d - Math.log1p(d);
  let sum = 0;
  let power = d;
  for (let k = 2; k < 40; k++) sum += (power *= -d) / -k;
  return sum;
}

function stirling(z: number): number {
  return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + tail(z);
}

/** ln Γ(z) less Stirling's leading terms. */
export function tail(z: number): number {
  return STIRLING.reduceRight((sum, c) => sum / (z * z) + c, 0) / z;
}

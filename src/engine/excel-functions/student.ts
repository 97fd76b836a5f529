/**
 * Student's t for whole degrees of freedom, by the finite sums of Abramowitz & Stegun 1964, 26.7.3 and 26.7.4, with
 * θ = atan(t/√ν). Good to about 1e-15 absolute; a tail smaller than that is not resolved.
 */

/** Probability that |T| exceeds t, t ≥ 0. */
export function studentTwoTails(t: number, degrees: number): number {
  return 1 - between(Math.atan(t / Math.sqrt(degrees)), degrees);
}

/** t that |T| exceeds with probability p, 0 < p < 1: bisection on θ, which is bounded. */
export function studentTwoTailsQuantile(p: number, degrees: number): number {
  let low = 0;
  let high = Math.PI / 2;
  // Halving stops by itself when no double lies between the two.
  for (;;) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) return Math.sqrt(degrees) * Math.tan(middle);
    if (1 - between(middle, degrees) > p) low = middle;
    else high = middle;
  }
}

/** Probability that |T| stays below √ν tan θ. */
function between(theta: number, degrees: number): number {
  const [sine, cosine] = [Math.sin(theta), Math.cos(theta)];
  const odd = degrees % 2 === 1;
  let term = odd ? cosine : 1;
  let sum = degrees === 1 ? 0 : term;
  for (let k = odd ? 3 : 2; k <= degrees - 2; k += 2) sum += term *= ((k - 1) / k) * cosine * cosine;
  return odd ? (2 / Math.PI) * (theta + sine * sum) : sine * sum;
}

/** Bessel functions of whole order to about 1e-14, by the trapezium rule on their integrals, which converges faster than any power (A&S 1964, 9.1.21, 9.6.24), and by series. */
const EULER = 0.5772156649015329;
const MOST_TERMS = 2_000;
/** Steps of the trapezium rule beyond what the oscillation itself needs. */
const SPARE_STEPS = 60;

/** Jₙ(x) = (1∕π)∫₀^π cos(nτ − x sin τ)dτ. Absolute accuracy; the integrand is periodic. */
export function besselJ(x: number, n: number): number {
  const steps = Math.ceil(Math.abs(x) + n) + SPARE_STEPS;
  let sum = 0.5 * (1 + Math.cos(n * Math.PI));
  for (let i = 1; i < steps; i++) {
    const t = (i * Math.PI) / steps;
    sum += Math.cos(n * t - x * Math.sin(t));
  }
  return sum / steps;
}

/** Iₙ(x) by its power series, whose terms have one sign (9.6.10). */
export function besselI(x: number, n: number): number {
  let term = 1;
  for (let k = 1; k <= n; k++) term *= x / 2 / k;
  let sum = term;
  for (let k = 1; k < MOST_TERMS && Math.abs(term) > Math.abs(sum) * 1e-17; k++) sum += term *= (x * x) / 4 / (k * (n + k));
  return sum;
}

/** Kₙ(x), x > 0: K₀ and K₁ by ∫₀^∞ e^(−x cosh t) cosh(nt)dt, then upward recurrence, which is stable. */
export function besselK(x: number, n: number): number {
  return recurrence(n, cosh(x, 0), cosh(x, 1), (k, before, here) => before + ((2 * k) / x) * here);
}

/** Yₙ(x), x > 0: Y₀ and Y₁ by Neumann's series in J (9.1.88), then upward recurrence. */
export function besselY(x: number, n: number): number {
  const log = Math.log(x / 2) + EULER;
  let even = 0;
  let odd = 0;
  const terms = Math.ceil(x / 2) + 20;
  for (let k = 1; k <= terms; k++) {
    const sign = k % 2 === 0 ? 1 : -1;
    even += (sign * besselJ(x, 2 * k)) / k;
    odd += (sign * (besselJ(x, 2 * k - 1) - besselJ(x, 2 * k + 1))) / k;
  }
  const first = (2 * log * besselJ(x, 0) - 4 * even) / Math.PI;
  const second = (2 * (log * besselJ(x, 1) - besselJ(x, 0) / x) + 2 * odd) / Math.PI; // Y₁ = −Y₀′
  return recurrence(n, first, second, (k, before, here) => ((2 * k) / x) * here - before);
}

function recurrence(n: number, zero: number, one: number, next: (k: number, before: number, here: number) => number): number {
  if (n === 0) return zero;
  let [before, here] = [zero, one];
  for (let k = 1; k < n; k++) [before, here] = [here, next(k, before, here)];
  return here;
}

function cosh(x: number, n: number): number {
  const step = 1 / 32;
  let sum = 0.5 * Math.exp(-x);
  for (let i = 1; ; i++) {
    const t = i * step;
    const term = Math.exp(-x * Math.cosh(t)) * Math.cosh(n * t);
    sum += term;
    if (!(term > sum * 1e-18)) return sum * step;
  }
}

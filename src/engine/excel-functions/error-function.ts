/**
 * The error function, its complement, and the normal distribution made from them, to the last digits of double precision:
 * Maclaurin series below 2, continued fraction above (Abramowitz & Stegun 1964, 7.1.6 and 7.1.14).
 */
const SERIES_LIMIT = 2;
/** Terms enough for 1e-17 at SERIES_LIMIT, and levels enough for 1e-16 above it. */
const SERIES_TERMS = 60;
const FRACTION_LEVELS = 200;

export function errorFunction(x: number): number {
  const a = Math.abs(x);
  if (a >= SERIES_LIMIT) return Math.sign(x) * (1 - complementAbove(a));
  // erf x = 2/√π e^(−x²) Σ 2ⁿ x^(2n+1) / (1·3···(2n+1)): every term is positive, so nothing cancels.
  let term = a;
  let sum = a;
  for (let n = 1; n < SERIES_TERMS; n++) sum += term *= (2 * a * a) / (2 * n + 1);
  return ((Math.sign(x) * 2) / Math.sqrt(Math.PI)) * Math.exp(-a * a) * sum;
}

export function complementaryErrorFunction(x: number): number {
  return x >= SERIES_LIMIT ? complementAbove(x) : x <= -SERIES_LIMIT ? 2 - complementAbove(-x) : 1 - errorFunction(x);
}

/** Probability that a standard normal variable lies below z. */
export function normalProbability(z: number): number {
  return complementaryErrorFunction(-z / Math.SQRT2) / 2;
}

export function normalDensity(z: number): number {
  return Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
}

/** z for which `normalProbability(z)` is p, 0 < p < 1: a rational start (A&S 26.2.23), then Halley's steps on the tail. */
export function normalQuantile(p: number): number {
  const tail = Math.min(p, 1 - p);
  if (tail === 0.5) return 0;
  const t = Math.sqrt(-2 * Math.log(tail));
  let z = t - (2.515517 + 0.802853 * t + 0.010328 * t * t) / (1 + 1.432788 * t + 0.189269 * t * t + 0.001308 * t ** 3);
  for (let i = 0; i < 3; i++) {
    const step = (normalProbability(-z) - tail) / normalDensity(z);
    z += step / (1 - (z * step) / 2);
  }
  return p < 0.5 ? -z : z;
}

function complementAbove(x: number): number {
  let fraction = x;
  for (let k = FRACTION_LEVELS; k >= 1; k--) fraction = x + k / 2 / fraction;
  return Math.exp(-x * x) / (fraction * Math.sqrt(Math.PI));
}

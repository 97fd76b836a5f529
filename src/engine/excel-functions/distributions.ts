/** Distributions and tests Excel has and the engine (19.3.7) lacks, made from the incomplete gamma and beta functions. */
import type { EngineArgument, EngineLibrary } from "../types";
import { betaShares, logBeta } from "./beta";
import { addMissing, numberOf, numbersOf, rowFirst } from "./define";
import { fail } from "./elementary";
import { normalDensity, normalProbability, normalQuantile } from "./error-function";
import { gamma, gammaFront, gammaShares, logGamma } from "./gamma";

interface Shares {
  below: number;
  above: number;
}

export function installDistributions(library: EngineLibrary): void {
  /** `args` as `x degrees lower?`; an upper limit left out is 1. */
  const numbers = (names: string, description: string, args: string, f: (...n: number[]) => number) => {
    const definitions = args.split(" ").map((arg) => (arg.endsWith("?") ? `${arg.slice(0, -1)} (number, optional)` : `${arg} (number)`));
    const missing = args.split(" ").map((arg) => (arg === "upper?" ? 1 : 0));
    for (const name of names.split(" ")) addMissing(library, name, description, definitions, (...given: EngineArgument[]) => f(...missing.map((m, i) => numberOf(given[i], m))));
  };
  const tailed = (shares: Shares, density: number, cumulative: number) => (cumulative ? shares.below : density);

  numbers("GAMMA", "Gamma function.", "number", (x) => (x <= 0 && Number.isInteger(x) ? fail("GAMMA has no value at zero and at negative whole numbers.") : gamma(x)));
  numbers("GAMMALN GAMMALN.PRECISE", "Natural logarithm of the gamma function.", "number", (x) => logGamma(above(0, x)));
  numbers("GAUSS", "Probability that a standard normal variable lies between the mean and z.", "z", (z) => normalProbability(z) - 0.5);
  numbers("PHI", "Density of the standard normal distribution.", "x", normalDensity);

  numbers("GAMMA.DIST GAMMADIST", "Gamma distribution.", "x alpha beta cumulative", (x, a, b, cumulative) =>
    tailed(gammaShares(above(0, a), atLeast(0, x) / above(0, b)), x === 0 ? (a < 1 ? Infinity : a === 1 ? 1 / b : 0) : gammaFront(a, x / b) / x, cumulative),
  );
  numbers("GAMMA.INV GAMMAINV", "Number below which a share of the gamma distribution lies.", "probability alpha beta", (p, a, b) => above(0, b) * gammaQuantile(p, 1 - p, above(0, a)));
  numbers("CHISQ.DIST", "Chi-squared distribution.", "x degrees cumulative", (x, n, cumulative) =>
    tailed(gammaShares(degrees(n) / 2, atLeast(0, x) / 2), x === 0 ? (degrees(n) < 2 ? Infinity : degrees(n) === 2 ? 0.5 : 0) : gammaFront(degrees(n) / 2, x / 2) / x, cumulative),
  );
  numbers("CHISQ.DIST.RT CHIDIST", "Right tail of the chi-squared distribution.", "x degrees", (x, n) => gammaShares(degrees(n) / 2, atLeast(0, x) / 2).above);
  numbers("CHISQ.INV", "Number below which a share of the chi-squared distribution lies.", "probability degrees", (p, n) => 2 * gammaQuantile(p, 1 - p, degrees(n) / 2));
  numbers("CHISQ.INV.RT CHIINV", "Number above which a share of the chi-squared distribution lies.", "probability degrees", (p, n) => 2 * gammaQuantile(1 - p, p, degrees(n) / 2));
  numbers("POISSON.DIST POISSON", "Poisson distribution.", "x mean cumulative", (x, mean, cumulative) => {
    const k = Math.trunc(atLeast(0, x));
    if (atLeast(0, mean) === 0) return cumulative || k === 0 ? 1 : 0;
    return cumulative ? gammaShares(k + 1, mean).above : gammaFront(k + 1, mean) / mean;
  });
  numbers("WEIBULL.DIST WEIBULL", "Weibull distribution.", "x alpha beta cumulative", (x, a, b, cumulative) => {
    const power = (atLeast(0, x) / above(0, b)) ** above(0, a);
    return cumulative ? -Math.expm1(-power) : (a / b) * (x / b) ** (a - 1) * Math.exp(-power);
  });
  numbers("LOGNORM.DIST", "Lognormal distribution.", "x mean standard_deviation cumulative", (x, m, s, cumulative) => {
    const z = (Math.log(above(0, x)) - m) / above(0, s);
    return cumulative ? normalProbability(z) : normalDensity(z) / (x * s);
  });
  numbers("LOGNORM.INV LOGINV", "Number below which a share of a lognormal distribution lies.", "probability mean standard_deviation", (p, m, s) => Math.exp(m + above(0, s) * normalQuantile(share(p))));

  numbers("T.DIST", "Student's t distribution.", "x degrees cumulative", (x, n, cumulative) => {
    const v = degrees(n);
    return cumulative ? student(x, v).below : Math.exp(-logBeta(v / 2, 0.5) - ((v + 1) / 2) * Math.log1p((x * x) / v)) / Math.sqrt(v);
  });
  numbers("TDIST", "One or both tails of Student's t distribution.", "x degrees tails", (x, n, tails) => (Math.trunc(tails) === 1 || Math.trunc(tails) === 2 ? Math.trunc(tails) * student(atLeast(0, x), degrees(n)).above : fail("TDIST needs 1 or 2 tails.")));
  numbers("F.DIST", "F distribution.", "x degrees1 degrees2 cumulative", (x, n1, n2, cumulative) => {
    const [a, b] = [degrees(n1), degrees(n2)];
    if (x === 0) return cumulative ? 0 : a < 2 ? Infinity : a === 2 ? 1 : 0;
    const density = Math.exp((a / 2) * Math.log(a / b) + (a / 2 - 1) * Math.log(above(0, x)) - ((a + b) / 2) * Math.log1p((a * x) / b) - logBeta(a / 2, b / 2));
    return tailed(ratio(x, a, b), density, cumulative);
  });
  numbers("F.DIST.RT FDIST", "Right tail of the F distribution.", "x degrees1 degrees2", (x, n1, n2) => ratio(atLeast(0, x), degrees(n1), degrees(n2)).above);
  numbers("F.INV", "Number below which a share of the F distribution lies.", "probability degrees1 degrees2", (p, n1, n2) => ratioQuantile(p, 1 - p, degrees(n1), degrees(n2)));
  numbers("F.INV.RT FINV", "Number above which a share of the F distribution lies.", "probability degrees1 degrees2", (p, n1, n2) => ratioQuantile(1 - p, p, degrees(n1), degrees(n2)));
  numbers("BETA.DIST", "Beta distribution.", "x alpha beta cumulative lower? upper?", (x, a, b, cumulative, low, high) => {
    const u = (x - low!) / above(0, high! - low!);
    if (!(u >= 0 && u <= 1)) fail("BETA.DIST needs x between its limits.");
    return tailed(betaShares(above(0, a), above(0, b), u), Math.exp((a - 1) * Math.log(u) + (b - 1) * Math.log1p(-u) - logBeta(a, b)) / (high! - low!), cumulative);
  });
  numbers("BETA.INV BETAINV", "Number below which a share of the beta distribution lies.", "probability alpha beta lower? upper?", (p, a, b, low, high) => {
    above(0, a);
    above(0, b);
    return low! + above(0, high! - low!) * root(share(p), 1 - p, 0, 1, (u) => betaShares(a, b, u));
  });
  numbers("BINOM.DIST BINOMDIST", "Binomial distribution.", "successes trials probability cumulative", (k0, n0, p, cumulative) => {
    const [k, n] = [Math.trunc(k0), Math.trunc(n0)];
    if (!(k >= 0 && k <= n && p >= 0 && p <= 1)) fail("BINOM.DIST needs 0 ≤ successes ≤ trials and a probability.");
    return cumulative ? binomialBelow(k, n, p) : binomialMass(k, n, p);
  });
  numbers("BINOM.INV CRITBINOM", "Least number of successes whose cumulative probability reaches a share.", "trials probability share", (n0, p, alpha) => {
    const n = Math.trunc(atLeast(0, n0));
    share(alpha);
    share(p);
    let [low, high] = [0, n];
    while (low < high) {
      const middle = Math.floor((low + high) / 2);
      if (binomialBelow(middle, n, p) >= alpha) high = middle;
      else low = middle + 1;
    }
    return low;
  });
  numbers("NEGBINOM.DIST", "Negative binomial distribution.", "failures successes probability cumulative", (f0, s0, p, cumulative) => {
    const [f, s] = [Math.trunc(atLeast(0, f0)), Math.trunc(atLeast(1, s0))];
    return cumulative ? betaShares(s, f + 1, share(p)).below : (s / (s + f)) * binomialMass(s, s + f, share(p));
  });
  numbers("HYPGEOM.DIST", "Hypergeometric distribution.", "sample_successes sample population_successes population cumulative", (k0, n0, s0, m0, cumulative) => {
    const [k, n, s, m] = [k0, n0, s0!, m0!].map(Math.trunc) as [number, number, number, number];
    if (!(n >= 0 && n <= m && s >= 0 && s <= m && k >= Math.max(0, n - (m - s)) && k <= Math.min(n, s))) fail("HYPGEOM.DIST needs counts that fit into one another.");
    const mass = (i: number) => Math.exp(logChoose(s, i) + logChoose(m - s, n - i) - logChoose(m, n));
    if (!cumulative) return mass(k);
    let sum = 0;
    for (let i = Math.max(0, n - (m - s)); i <= k; i++) sum += mass(i);
    return Math.min(sum, 1);
  });
  installTests(library);
}

function installTests(library: EngineLibrary): void {
  for (const name of ["T.TEST", "TTEST"]) {
    addMissing(library, name, "Probability of Student's t test.", ["array1 (any, range)", "array2 (any, range)", "tails (number)", "type (number)"], (first, second, tails, type) => {
      const [a, b, sides, kind] = [numbersOf([first]), numbersOf([second]), Math.trunc(numberOf(tails)), Math.trunc(numberOf(type))];
      if (sides !== 1 && sides !== 2) fail("T.TEST needs 1 or 2 tails.");
      const { t, n } = kind === 1 ? paired(a, b) : kind === 2 || kind === 3 ? unpaired(a, b, kind === 2) : fail("T.TEST needs the type 1, 2 or 3.");
      return sides * student(Math.abs(t), n).above;
    });
  }
  for (const name of ["F.TEST", "FTEST"]) {
    addMissing(library, name, "Probability that two variances do not differ.", ["array1 (any, range)", "array2 (any, range)"], (first, second) => {
      const [a, b] = [moments(numbersOf([first])), moments(numbersOf([second]))];
      if (a.variance === 0 || b.variance === 0) fail("F.TEST needs values that differ.", "#DIV/0!");
      const { below, above: over } = ratio(a.variance / b.variance, a.count - 1, b.count - 1);
      return 2 * Math.min(below, over);
    });
  }
  for (const name of ["CHISQ.TEST", "CHITEST"]) {
    addMissing(library, name, "Probability of the chi-squared test.", ["actual (any, range)", "expected (any, range)"], (actual, expected) => {
      const [a, e] = [actual, expected].map((x) => (Array.isArray(x) ? x : [[x ?? { value: null }]]));
      const [columns, rows] = [a!.length, a![0]!.length];
      if (e!.length !== columns || e![0]!.length !== rows || columns * rows < 2) fail("CHISQ.TEST needs two ranges of one size.", "#N/A");
      const [seen, due] = [rowFirst(a!).map((x) => numberOf(x)), rowFirst(e!).map((x) => numberOf(x))];
      if (due.includes(0)) fail("CHISQ.TEST divides by an expected value of 0.", "#DIV/0!");
      const sum = seen.reduce((total, x, i) => total + (x - due[i]!) ** 2 / due[i]!, 0);
      return gammaShares((columns > 1 && rows > 1 ? (columns - 1) * (rows - 1) : columns * rows - 1) / 2, sum / 2).above;
    });
  }
  for (const name of ["Z.TEST", "ZTEST"]) {
    addMissing(library, name, "One-tailed probability of a z test.", ["array (any, range)", "x (number)", "standard_deviation (number, optional)"], (array, x, sigma) => {
      const { mean, variance, count } = moments(numbersOf([array]));
      const deviation = sigma === undefined ? Math.sqrt(variance) : above(0, numberOf(sigma));
      return deviation === 0 ? fail("Z.TEST needs values that differ.", "#DIV/0!") : normalProbability((numberOf(x) - mean) / (deviation / Math.sqrt(count)));
    });
  }
}

/** Student's t; the tail is taken from 1 − x², which is known without loss. */
function student(t: number, n: number): Shares {
  const half = betaShares(n / 2, 0.5, n / (n + t * t), (t * t) / (n + t * t)).below / 2;
  return t > 0 ? { below: 1 - half, above: half } : { below: half, above: 1 - half };
}

function ratio(x: number, a: number, b: number): Shares {
  return betaShares(a / 2, b / 2, (a * x) / (a * x + b), b / (a * x + b));
}

function ratioQuantile(p: number, q: number, a: number, b: number): number {
  // The smaller share decides, so that a small tail keeps its digits.
  return p === 0 ? 0 : root(share(p), share(q), 0, Infinity, (x) => ratio(x, a, b));
}

function gammaQuantile(p: number, q: number, a: number): number {
  return p === 0 ? 0 : root(share(p), share(q), 0, Infinity, (x) => gammaShares(a, x));
}

/** Where a distribution has the share p below it (q above): halving, in the logarithm where there is no upper end; stops when no double lies between. */
function root(p: number, q: number, low: number, high: number, shares: (x: number) => Shares): number {
  const tooLow = (x: number) => (p <= q ? shares(x).below < p : shares(x).above > q);
  if (high === Infinity) {
    high = 1;
    while (tooLow(high)) high *= 2;
    low = high / 2;
    while (low > Number.MIN_VALUE && !tooLow(low)) [low, high] = [low / 2, low];
  }
  for (;;) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) return middle;
    if (tooLow(middle)) low = middle;
    else high = middle;
  }
}

function binomialBelow(k: number, n: number, p: number): number {
  return k >= n ? 1 : betaShares(k + 1, n - k, p, 1 - p).above;
}

function binomialMass(k: number, n: number, p: number): number {
  if (p === 0 || p === 1) return k === (p === 0 ? 0 : n) ? 1 : 0;
  return Math.exp(logChoose(n, k) + k * Math.log(p) + (n - k) * Math.log1p(-p));
}

function logChoose(n: number, k: number): number {
  return logGamma(n + 1) - logGamma(k + 1) - logGamma(n - k + 1);
}

function moments(x: readonly number[]): { count: number; mean: number; variance: number } {
  if (x.length < 2) fail("At least 2 numbers are needed.", "#DIV/0!");
  const mean = x.reduce((sum, v) => sum + v, 0) / x.length;
  return { count: x.length, mean, variance: x.reduce((sum, v) => sum + (v - mean) ** 2, 0) / (x.length - 1) };
}

function paired(a: readonly number[], b: readonly number[]): { t: number; n: number } {
  if (a.length !== b.length) fail("A paired T.TEST needs two lists of one length.", "#N/A");
  const { mean, variance, count } = moments(a.map((v, i) => v - b[i]!));
  return variance === 0 ? fail("T.TEST needs differences that differ.", "#DIV/0!") : { t: mean / Math.sqrt(variance / count), n: count - 1 };
}

function unpaired(a: readonly number[], b: readonly number[], equal: boolean): { t: number; n: number } {
  const [p, q] = [moments(a), moments(b)];
  const [u, v] = [p.variance / p.count, q.variance / q.count];
  if (u + v === 0) fail("T.TEST needs values that differ.", "#DIV/0!");
  if (!equal) return { t: (p.mean - q.mean) / Math.sqrt(u + v), n: (u + v) ** 2 / (u ** 2 / (p.count - 1) + v ** 2 / (q.count - 1)) };
  const n = p.count + q.count - 2;
  const pooled = (p.variance * (p.count - 1) + q.variance * (q.count - 1)) / n;
  return { t: (p.mean - q.mean) / Math.sqrt(pooled * (1 / p.count + 1 / q.count)), n };
}

function degrees(n: number): number {
  return Math.trunc(atLeast(1, n));
}

function above(limit: number, x: number): number {
  return x > limit ? x : fail(`A number above ${limit} is needed.`);
}

function atLeast(limit: number, x: number): number {
  return x >= limit ? x : fail(`A number of at least ${limit} is needed.`);
}

function share(p: number): number {
  return p > 0 && p < 1 ? p : fail("A probability between 0 and 1 is needed.");
}

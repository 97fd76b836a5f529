import type { Outcome } from "./outcome";
import { refuse } from "./outcome";

const MOST_EVALUATIONS = 200;

/**
 * The place between a and b where a continuous function is zero, by Brent's method (bisection kept as the safety net).
 *
 * @param f the function; it must change sign between a and b
 * @param tolerance half width of the interval accepted; 0 means as close as the numbers allow
 * @returns the place, the value left there and how many times f was called; refused when there is no change of sign
 *   ("outside range"), when f is not finite ("not finite"), or when the calls run out ("no convergence")
 *
 * Source: R. P. Brent, Algorithms for Minimization without Derivatives, 1973, ch. 4.
 */
export function brentRoot(
  f: (x: number) => number,
  a: number,
  b: number,
  tolerance = 0,
): Outcome<{ x: number; residual: number; evaluations: number }> {
  let best = b;
  let fBest = f(b);
  let other = a;
  let fOther = f(a);
  let evaluations = 2;
  if (!Number.isFinite(fBest) || !Number.isFinite(fOther)) return refuse("not finite", { at: Number.isFinite(fBest) ? a : b });
  if (fBest > 0 === fOther > 0 && fBest !== 0 && fOther !== 0) {
    return refuse("outside range", { values: { from: a, to: b, atFrom: fOther, atTo: fBest } });
  }
  let before = other;
  let fBefore = fOther;
  let step = best - other;
  let stepBefore = step;
  for (;;) {
    if (fBest > 0 === fOther > 0) {
      other = before;
      fOther = fBefore;
      step = stepBefore = best - before;
    }
    if (Math.abs(fOther) < Math.abs(fBest)) {
      before = best;
      fBefore = fBest;
      best = other;
      fBest = fOther;
      other = before;
      fOther = fBefore;
    }
    const near = 2 * Number.EPSILON * Math.abs(best) + tolerance / 2;
    const half = (other - best) / 2;
    if (Math.abs(half) <= near || fBest === 0) return { ok: true, x: best, residual: fBest, evaluations };
    if (evaluations >= MOST_EVALUATIONS) return refuse("no convergence", { at: best, values: { count: evaluations, residual: fBest } });
    const trial = Math.abs(stepBefore) >= near && Math.abs(fBefore) > Math.abs(fBest) ? interpolate(before, fBefore, best, fBest, other, fOther) : null;
    if (trial !== null && Math.abs(trial) < Math.min(1.5 * Math.abs(half) - near / 2, Math.abs(stepBefore) / 2) && trial * half > 0) {
      stepBefore = step;
      step = trial;
    } else {
      step = stepBefore = half;
    }
    before = best;
    fBefore = fBest;
    best += Math.abs(step) > near ? step : half > 0 ? near : -near;
    fBest = f(best);
    evaluations += 1;
    if (!Number.isFinite(fBest)) return refuse("not finite", { at: best });
  }
}

/** Step from `best` by the secant, or by inverse quadratic interpolation when three different points are known. */
function interpolate(before: number, fBefore: number, best: number, fBest: number, other: number, fOther: number): number {
  const s = fBest / fBefore;
  if (before === other) return ((other - best) * s) / (s - 1) ;
  const q = fBefore / fOther;
  const r = fBest / fOther;
  const p = s * ((other - best) * q * (q - r) - (best - before) * (r - 1));
  return -p / ((q - 1) * (r - 1) * (s - 1));
}

import type { Outcome } from "./outcome";
import { refuse } from "./outcome";

const MOST_EVALUATIONS = 200;
const GOLDEN = (3 - Math.sqrt(5)) / 2;

/**
 * A place between a and b where a function is least, by Brent's method (golden section kept as the safety net).
 *
 * @param f the function; a single valley between a and b is found surely, of several valleys one
 * @param tolerance width accepted, > 0
 * @returns the place, the value there and how many times f was called; "not finite" or "no convergence" otherwise
 *
 * Source: R. P. Brent, Algorithms for Minimization without Derivatives, 1973, ch. 5.
 */
export function brentMinimum(
  f: (x: number) => number,
  a: number,
  b: number,
  tolerance: number,
): Outcome<{ x: number; value: number; evaluations: number }> {
  let low = Math.min(a, b);
  let high = Math.max(a, b);
  let best = low + GOLDEN * (high - low);
  let fBest = f(best);
  if (!Number.isFinite(fBest)) return refuse("not finite", { at: best });
  let second = best;
  let fSecond = fBest;
  let third = best;
  let fThird = fBest;
  let step = 0;
  let stepBefore = 0;
  for (let evaluations = 1; ; evaluations += 1) {
    const middle = (low + high) / 2;
    const near = Number.EPSILON ** 0.5 * Math.abs(best) + tolerance / 3;
    if (Math.abs(best - middle) <= 2 * near - (high - low) / 2) return { ok: true, x: best, value: fBest, evaluations };
    if (evaluations >= MOST_EVALUATIONS) return refuse("no convergence", { at: best, values: { count: evaluations } });
    // Parabola through the three best points, taken when it falls inside and shrinks.
    const r = (best - second) * (fBest - fThird);
    const q = (best - third) * (fBest - fSecond);
    const denominator = 2 * (q - r);
    const parabola = denominator === 0 ? Infinity : -((best - third) * q - (best - second) * r) / denominator;
    if (Math.abs(stepBefore) > near && Math.abs(parabola) < Math.abs(stepBefore) / 2 && best + parabola > low && best + parabola < high) {
      stepBefore = step;
      step = parabola;
      if (best + step - low < 2 * near || high - best - step < 2 * near) step = best < middle ? near : -near;
    } else {
      stepBefore = best < middle ? high - best : low - best;
      step = GOLDEN * stepBefore;
    }
    const trial = best + (Math.abs(step) >= near ? step : step > 0 ? near : -near);
    const fTrial = f(trial);
    if (!Number.isFinite(fTrial)) return refuse("not finite", { at: trial });
    if (fTrial <= fBest) {
      if (trial < best) high = best;
      else low = best;
      third = second;
      fThird = fSecond;
      second = best;
      fSecond = fBest;
      best = trial;
      fBest = fTrial;
    } else {
      if (trial < best) low = trial;
      else high = trial;
      if (fTrial <= fSecond || second === best) {
        third = second;
        fThird = fSecond;
        second = trial;
        fSecond = fTrial;
      } else if (fTrial <= fThird || third === best || third === second) {
        third = trial;
        fThird = fTrial;
      }
    }
  }
}

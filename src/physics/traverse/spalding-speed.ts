/** Kármán's constant and the log law's additive constant: Coles' values (Stanford conference 1968, vol. II). */
export const KARMAN = 0.41;
export const LOG_CONSTANT = 5.0;

/** Newton's steps at the most; from the start below it settles in fewer than ten. */
const MOST_STEPS = 50;
/** Relative change at which Newton's steps are rounding. */
const SETTLED = 1e-14;

/**
 * Speed in wall units from Spalding's single formula, from the wall through the sublayer and the buffer into the logarithmic layer.
 *
 * @param yPlus height in wall units y·u_τ/ν, ≥ 0
 * @param karman Kármán's constant; @param constant additive constant of the log law; the fits here use Coles' 0.41 and 5.0, Spalding himself 0.4 and 5.5
 * @returns u/u_τ; 0 at the wall
 *
 * Source: D. B. Spalding, J. Appl. Mech. 28 (1961) 455–458: y⁺ = u⁺ + e^(−κB)(e^(κu⁺) − 1 − κu⁺ − (κu⁺)²/2 − (κu⁺)³/6).
 */
export function spaldingSpeed(yPlus: number, karman = KARMAN, constant = LOG_CONSTANT): number {
  if (!(yPlus > 0)) return 0;
  // From above: the smaller of sublayer and shifted log law; the formula's y⁺ is convex in u⁺, so Newton then falls to the root without overshoot.
  let u = Math.min(yPlus, Math.log(1 + yPlus) / karman + constant + 1 / karman);
  for (let step = 0; step < MOST_STEPS; step++) {
    const x = karman * u;
    const rest = exponentialRest(x);
    const f = u + Math.exp(-karman * constant) * rest - yPlus;
    const slope = 1 + Math.exp(-karman * constant) * karman * (rest + x ** 3 / 6);
    const next = u - f / slope;
    if (Math.abs(next - u) <= SETTLED * u) return next;
    u = next;
  }
  return u;
}

/** e^x − 1 − x − x²/2 − x³/6, by its series where the difference would lose digits. */
function exponentialRest(x: number): number {
  if (x > 1) return Math.exp(x) - 1 - x - (x * x) / 2 - x ** 3 / 6;
  let term = x ** 4 / 24;
  let sum = term;
  for (let k = 5; Math.abs(term) > Number.EPSILON * sum; k++) sum += term *= x / k;
  return sum;
}

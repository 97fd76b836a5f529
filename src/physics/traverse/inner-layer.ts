import { brentRoot } from "../../numerics/brent-root";
import { KARMAN, LOG_CONSTANT, spaldingSpeed } from "./spalding-speed";

/** The law of the wall as fitted to the inner points of one traverse. */
export interface InnerLayer {
  /** Friction speed u_τ [speed]. */
  frictionSpeed: number;
  /** Viscous length ν/u_τ [length]. */
  viscousLength: number;
  /** Root mean square misfit of the points used, as a share of the edge speed. */
  misfit: number;
  /** How many points it was fitted to. */
  points: number;
}

/** The law of the wall holds to about a fifth of the layer height (common practice; Coles 1956 has the wake take over there). */
const INNER_SHARE = 0.2;
/** Fewer points than this fix no law. */
const LEAST_POINTS = 3;
/** Ratio u_τ/ue of turbulent layers, from near separation to very low Reynolds number; outside it the law is not the right one. */
const RATIO = { least: 0.012, most: 0.075 };
/** Misfit above which the points do not follow the law: about three times the scatter of a good pitot traverse (common practice, no source). */
const MOST_MISFIT = 0.03;

/**
 * Fits the law of the wall to the points of a traverse that lie in the inner layer: the friction speed alone where ν is known, the friction
 * speed and the viscous length together from the logarithmic law where it is not.
 *
 * @param y heights of the measured points [length], > 0, strictly rising
 * @param u speeds [speed], same length
 * @param edge edge speed [speed], > 0
 * @param height layer height [length]
 * @param nu kinematic viscosity, or undefined
 * @returns the fit, or undefined where too few points lie there or where they do not follow the law (laminar, near separation)
 *
 * Sources: F. H. Clauser, J. Aero. Sci. 21 (1954) 91–108 (friction from the logarithmic layer); D. B. Spalding 1961 (the law down to the wall).
 */
export function innerLayer(y: Float64Array, u: Float64Array, edge: number, height: number, nu: number | undefined): InnerLayer | undefined {
  let points = 0;
  while (points < y.length && y[points]! <= INNER_SHARE * height) points++;
  if (points < LEAST_POINTS) return undefined;
  const found = nu === undefined ? fitBoth(y, u, points) : fitSpeed(y, u, points, edge, nu);
  if (found === undefined) return undefined;
  const { frictionSpeed, viscousLength } = found;
  const ratio = frictionSpeed / edge;
  if (!(ratio >= RATIO.least && ratio <= RATIO.most && viscousLength > 0)) return undefined;
  let sum = 0;
  for (let i = 0; i < points; i++) sum += (u[i]! - frictionSpeed * spaldingSpeed(y[i]! / viscousLength)) ** 2;
  const misfit = Math.sqrt(sum / points) / edge;
  return misfit <= MOST_MISFIT ? { frictionSpeed, viscousLength, misfit, points } : undefined;
}

/** The friction speed that leaves no mean misfit; the law's speed grows with it, so there is one. */
function fitSpeed(y: Float64Array, u: Float64Array, points: number, edge: number, nu: number) {
  const excess = (frictionSpeed: number) => {
    let sum = 0;
    for (let i = 0; i < points; i++) sum += frictionSpeed * spaldingSpeed((y[i]! * frictionSpeed) / nu) - u[i]!;
    return sum;
  };
  const root = brentRoot(excess, RATIO.least * edge, RATIO.most * edge);
  return root.ok ? { frictionSpeed: root.x, viscousLength: nu / root.x } : undefined;
}

/** Straight line in u over ln y: its slope is u_τ/κ and its height then gives the viscous length. */
function fitBoth(y: Float64Array, u: Float64Array, points: number) {
  let meanLog = 0;
  let meanSpeed = 0;
  for (let i = 0; i < points; i++) {
    meanLog += Math.log(y[i]!) / points;
    meanSpeed += u[i]! / points;
  }
  let cross = 0;
  let square = 0;
  for (let i = 0; i < points; i++) {
    const d = Math.log(y[i]!) - meanLog;
    cross += d * (u[i]! - meanSpeed);
    square += d * d;
  }
  const frictionSpeed = (KARMAN * cross) / square;
  if (!(frictionSpeed > 0)) return undefined;
  const viscousLength = Math.exp(meanLog - KARMAN * (meanSpeed / frictionSpeed - LOG_CONSTANT));
  return Number.isFinite(viscousLength) ? { frictionSpeed, viscousLength } : undefined;
}

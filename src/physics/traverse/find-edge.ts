/** How the edge speed was had. */
export type EdgeOrigin = "given" | "column" | "last point" | "mean of outer points";

/** Speeds this close to the outermost one count as the outer plateau. */
const PLATEAU = 0.002;
/** The outermost step must be smaller than this share of the speed, or the traverse ends inside the layer. */
const STILL_RISING = 0.01;
/** A plateau of fewer points cannot tell scatter from slope. */
const LEAST_PLATEAU = 3;
/** Where scatter rules, half of the steps along the plateau fall; where the speed still creeps up, few do. */
const SCATTERED = 1 / 3;

/**
 * The edge speed of a traverse that reaches the edge: the mean of the outer plateau (speeds within 0.2 % of the outermost) where its points
 * scatter, the outermost point where they still creep up. Own rule: a mean of a creeping plateau would lie below the edge speed.
 *
 * @param u speeds [speed], n ≥ 2
 * @returns speed and how it was had, or undefined where the speed still changes by 1 % over the outermost step
 */
export function findEdge(u: Float64Array): { speed: number; origin: EdgeOrigin } | undefined {
  const last = u[u.length - 1]!;
  if (!(last > 0) || Math.abs(last - u[u.length - 2]!) > STILL_RISING * last) return undefined;
  let first = u.length - 1;
  while (first > 0 && Math.abs(u[first - 1]! - last) <= PLATEAU * last) first--;
  let falls = 0;
  let sum = u[first]!;
  for (let i = first + 1; i < u.length; i++) {
    sum += u[i]!;
    if (u[i]! < u[i - 1]!) falls++;
  }
  const count = u.length - first;
  if (count >= LEAST_PLATEAU && falls >= SCATTERED * (count - 1)) return { speed: sum / count, origin: "mean of outer points" };
  return { speed: last, origin: "last point" };
}

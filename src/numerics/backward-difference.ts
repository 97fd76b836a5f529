/**
 * Weights of the slope at the newest of up to four places, from the values at all of them: the slope of the polynomial through them
 * (backward differences with variable steps; of first, second and third order for two, three and four places).
 *
 * @param place the places, newest first, all different; `count` of them are used, 2 … 4
 * @param weight overwritten: slope = Σ weight[i] · value[i]
 *
 * Source: C. F. Curtiss & J. O. Hirschfelder, Proc. Natl Acad. Sci. 38 (1952) 235–243, as Lagrange's interpolation gives it for unequal steps.
 */
export function backwardDifference(place: ArrayLike<number>, count: number, weight: Float64Array): void {
  let own = 0;
  for (let i = 1; i < count; i += 1) {
    own += 1 / (place[0] - place[i]);
    let product = 1 / (place[i] - place[0]);
    for (let k = 1; k < count; k += 1) if (k !== i) product *= (place[0] - place[k]) / (place[i] - place[k]);
    weight[i] = product;
  }
  weight[0] = own;
  for (let i = count; i < weight.length; i += 1) weight[i] = 0;
}

/**
 * Weights that carry values at up to four places, newest first, on to a further place by the polynomial through them.
 *
 * @param at the further place
 * @param weight overwritten: forecast = Σ weight[i] · value[i]
 */
export function forecastWeights(place: ArrayLike<number>, count: number, at: number, weight: Float64Array): void {
  for (let i = 0; i < weight.length; i += 1) {
    let product = i < count ? 1 : 0;
    for (let k = 0; k < count; k += 1) if (k !== i && i < count) product *= (at - place[k]) / (place[i] - place[k]);
    weight[i] = product;
  }
}

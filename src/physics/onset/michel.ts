import type { OnsetCriterion } from "./onset-criterion";

/** Rex of the flights and tunnel tests behind the curve. */
const LEAST_REYNOLDS = 3e5;
const MOST_REYNOLDS = 7e6;

/**
 * Reθ = 2.9 Rex^0.4 at onset: aerofoils and plates in streams of low turbulence.
 *
 * Source: R. Michel, ONERA Rapport 1/1578A (1951); in this form F. M. White, Viscous Fluid Flow, eq. 5-39 (number and range from memory).
 */
export const michel: OnsetCriterion = {
  name: "Michel",
  excess: (place) => place.momentumReynolds - 2.9 * Math.pow(place.distanceReynolds, 0.4),
  remark({ distanceReynolds }) {
    return distanceReynolds < LEAST_REYNOLDS || distanceReynolds > MOST_REYNOLDS ? `Re x outside the ${LEAST_REYNOLDS} to ${MOST_REYNOLDS} of Michel's data` : "";
  },
};

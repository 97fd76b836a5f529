import type { Smoothed } from "../../numerics/smoothing-spline";
import { formatNumber } from "../writing/format-number";

/** What a smoothed column's report says of its noise: found, given or none, how far the curve is free, and whether ± is known. */
export function noiseWords(smoothed: Smoothed, quantity: string): string {
  const noise = formatNumber(smoothed.noise);
  const freedom = `${smoothed.freedom.toFixed(1)} equivalent degrees of freedom`;
  switch (smoothed.origin) {
    case "found":
      return `noise of ${quantity} found by generalised cross-validation: ${noise}; ${freedom}; ± is one standard error`;
    case "given":
      return `noise of ${quantity} given: ${noise}; ${freedom}; ± is one standard error`;
    case "none given":
      return "noise = 0: points interpolated, ± unknown";
    case "none found":
      return "cross-validation tells no noise from the shape: points interpolated, ± unknown; give noise if the column is measured";
  }
}

/** A standard error means something only where there is noise. */
export function errorKnown(smoothed: Smoothed): boolean {
  return smoothed.origin === "given" || smoothed.origin === "found";
}

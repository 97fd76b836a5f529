/** Least and largest shape factor of the relations; Head's own curves end near 1.2 and 2.8. */
export const HEAD_SHAPE = { least: 1.12, most: 8 } as const;

/** Between these H the two printed branches, which cross at H = 1.585, are blended so that slope and curvature have no jump. */
const BLEND_FROM = 1.54;
const BLEND_TO = 1.63;

/** H1 and its derivative by H. */
export interface HeadShape {
  entrainShape: number;
  slope: number;
}

/**
 * H1 = (δ − δ*)∕θ of a turbulent layer from its shape factor H, Head's curve in the fit of Cebeci & Bradshaw (two branches). The print
 * changes branch at H = 1.6, where the branches differ by 0.022 in H1: we change where they cross, with a smooth blend 0.004 wide in H1.
 * H1 falls all the way, so the relation can be inverted.
 *
 * Sources: M. R. Head, ARC R&M 3152 (1958); T. Cebeci & P. Bradshaw, Momentum Transfer in Boundary Layers (1977), eq. 7.2.18 (fit; number
 * from memory).
 */
export function headShape(shape: number, out: HeadShape): HeadShape {
  if (shape <= BLEND_FROM) return lower(shape, out);
  if (shape >= BLEND_TO) return upper(shape, out);
  lower(shape, out);
  const { entrainShape, slope } = out;
  upper(shape, out);
  const t = (shape - BLEND_FROM) / (BLEND_TO - BLEND_FROM);
  const weight = t * t * t * (10 + t * (-15 + 6 * t));
  const weightSlope = (30 * t * t * (1 - t) * (1 - t)) / (BLEND_TO - BLEND_FROM);
  const difference = out.entrainShape - entrainShape;
  out.slope = slope + weight * (out.slope - slope) + weightSlope * difference;
  out.entrainShape = entrainShape + weight * difference;
  return out;
}

function lower(shape: number, out: HeadShape): HeadShape {
  const above = shape - 1.1;
  const part = 0.8234 * Math.pow(above, -1.287);
  out.entrainShape = 3.3 + part;
  out.slope = (-1.287 * part) / above;
  return out;
}

function upper(shape: number, out: HeadShape): HeadShape {
  const above = shape - 0.6778;
  const part = 1.5501 * Math.pow(above, -3.064);
  out.entrainShape = 3.3 + part;
  out.slope = (-3.064 * part) / above;
  return out;
}

/** Entrainment coefficient of a layer with H1: Head's curve in the same authors' fit, CE = 0.0306 (H1 − 3)^−0.6169. */
export function headEntrainment(entrainShape: number): number {
  return 0.0306 * Math.pow(entrainShape - 3, -0.6169);
}

/** cf = 0.246·10^(−0.678 H) Reθ^(−0.268): H. Ludwieg & W. Tillmann, Ing.-Arch. 17 (1949) 288–299 (NACA TM 1285), eq. 17 (number from memory). */
export function ludwiegTillmann(shape: number, momentumReynolds: number): number {
  return 0.246 * Math.exp(-0.678 * Math.LN10 * shape - 0.268 * Math.log(momentumReynolds));
}

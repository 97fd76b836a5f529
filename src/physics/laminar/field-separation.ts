import type { FieldRecord } from "./field-record";

/**
 * The station where the wall shear will vanish, from the last records before it: near separation the station is a parabola of the
 * shear, x = xs − A τ² − B τ³, whose leading term is Goldstein's square-root law. Null while the shear does not fall.
 *
 * Source: S. Goldstein, Q. J. Mech. Appl. Math. 1 (1948) 43–69.
 */
export function rootLawSeparation(history: readonly FieldRecord[]): { x: number } | null {
  const n = history.length;
  if (n < 3) return null;
  const [a, b, c] = history.slice(-3);
  if (!(a.wallShear > b.wallShear && b.wallShear > c.wallShear && c.wallShear > 0)) return null;
  const x1 = (b.x - a.x) / (a.wallShear ** 2 - b.wallShear ** 2);
  const x2 = (c.x - b.x) / (b.wallShear ** 2 - c.wallShear ** 2);
  // x = xs − A p − B p^(3∕2), p = τ²: first differences give A + B q, q the slope of p^(3∕2).
  const q = (s: number, t: number): number => (s ** 3 - t ** 3) / (s ** 2 - t ** 2);
  const q1 = q(a.wallShear, b.wallShear);
  const q2 = q(b.wallShear, c.wallShear);
  const bend = (x2 - x1) / (q2 - q1);
  const slope = x2 - bend * q2;
  const x = c.x + slope * c.wallShear ** 2 + bend * c.wallShear ** 3;
  return Number.isFinite(x) ? { x } : null;
}

/**
 * The first pair of segments of a contour that cross, as the row (from 0) where each begins; undefined where none do. Segments that share a point,
 * and the last with the first of a closed contour, do not count.
 */
export function contourCrossing(x: Float64Array, y: Float64Array): [number, number] | undefined {
  const last = x.length - 1;
  const closed = x[0] === x[last] && y[0] === y[last];
  for (let i = 0; i < last; i++) {
    const [left, right] = [Math.min(x[i]!, x[i + 1]!), Math.max(x[i]!, x[i + 1]!)];
    for (let j = i + 2; j < last; j++) {
      if (closed && i === 0 && j === last - 1) continue;
      if (Math.max(x[j]!, x[j + 1]!) < left || Math.min(x[j]!, x[j + 1]!) > right) continue;
      if (sides(i, j) && sides(j, i)) return [i, j];
    }
  }
  return undefined;

  /** The ends of segment b lie on both sides of the line through segment a. */
  function sides(a: number, b: number): boolean {
    const side = (k: number) => (x[a + 1]! - x[a]!) * (y[k]! - y[a]!) - (y[a + 1]! - y[a]!) * (x[k]! - x[a]!);
    return side(b) * side(b + 1) < 0;
  }
}

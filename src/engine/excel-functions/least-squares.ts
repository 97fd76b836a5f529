/** Columns of which less than this share is left beside the earlier ones say nothing new; Excel gives such a column the coefficient 0. */
const REDUNDANT = 1e-12;

/** A linear fit: a coefficient for each x and the constant, with their standard errors, and sums of squares. */
export interface LinearFit {
  coefficients: number[];
  constant: number;
  errors: number[];
  constantError: number;
  residual: number;
  explained: number;
  freedom: number;
}

/**
 * Least squares by orthogonal columns (Gram and Schmidt's way, each step twice, which keeps them orthogonal to the last digits: Giraud,
 * Langou & Rozložník 2005), about the means where there is a constant. Powers of x far from zero then keep their digits, which normal
 * equations lose.
 */
export function leastSquares(y: readonly number[], xs: readonly (readonly number[])[], withConstant: boolean): LinearFit {
  const n = y.length;
  const centre = (v: readonly number[]): number => (withConstant ? v.reduce((s, x) => s + x, 0) / n : 0);
  const means = xs.map(centre);
  const meanY = centre(y);
  const rest = y.map((v) => v - meanY);
  const total = dot(rest, rest);
  const basis: number[][] = [];
  const kept: number[] = [];
  const r: number[][] = [];
  const along: number[] = [];
  xs.forEach((x, j) => {
    const column = x.map((v) => v - means[j]!);
    const size = Math.sqrt(dot(column, column));
    const parts = basis.map(() => 0);
    for (let pass = 0; pass < 2; pass++) {
      basis.forEach((q, i) => {
        const part = dot(q, column);
        parts[i]! += part;
        q.forEach((v, row) => (column[row]! -= part * v));
      });
    }
    const left = Math.sqrt(dot(column, column));
    if (!(left > REDUNDANT * Math.max(size, Math.abs(means[j]!) * Math.sqrt(n) * Number.EPSILON))) return;
    const q = column.map((v) => v / left);
    basis.push(q);
    kept.push(j);
    r.push([...parts, left]);
    const part = dot(q, rest);
    along.push(part);
    q.forEach((v, row) => (rest[row]! -= part * v));
  });
  const rank = kept.length;
  const freedom = n - rank - Number(withConstant);
  const residual = freedom === 0 ? 0 : dot(rest, rest);
  const deviation = freedom > 0 ? Math.sqrt(residual / freedom) : 0;
  const coefficients = xs.map(() => 0);
  const errors = xs.map(() => 0);
  backward(r, along).forEach((b, i) => (coefficients[kept[i]!] = b));
  // Rows of R⁻¹ give the spread of the coefficients; the constant's is that of mean(y) − Σ b·mean(x).
  const inverse = kept.map((_, i) => backward(r, kept.map((__, k) => Number(i === k)))); // column i of R⁻¹
  kept.forEach((j, i) => (errors[j] = deviation * Math.hypot(...inverse.map((column) => column[i]!))));
  const shift = inverse.map((column) => column.reduce((s, v, i) => s + v * means[kept[i]!]!, 0));
  return {
    coefficients,
    constant: withConstant ? meanY - coefficients.reduce((s, b, j) => s + b * means[j]!, 0) : 0,
    errors,
    constantError: withConstant ? deviation * Math.hypot(Math.sqrt(1 / n), ...shift) : 0,
    residual,
    explained: Math.max(total - residual, 0),
    freedom,
  };
}

/** Solves R b = c; column k of R stands in `r[k]`. */
function backward(r: readonly (readonly number[])[], c: readonly number[]): number[] {
  const b = [...c];
  for (let i = r.length - 1; i >= 0; i--) {
    for (let k = i + 1; k < r.length; k++) b[i]! -= r[k]![i]! * b[k]!;
    b[i]! /= r[i]![i]!;
  }
  return b;
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((s, v, i) => s + v * b[i]!, 0);
}

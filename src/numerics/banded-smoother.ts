// Taken out of the global object once: the smoother calls it half a dozen times a point.
const { sqrt } = Math;

/**
 * Work space of the smoothing spline for one column: knots at mean spacing 1, the square root of each weight, and the triangular
 * factor. Allocated once, used for every trial of the smoothing strength.
 */
export interface Smoother {
  /** Panel widths divided by the mean width, n − 1 of them. */
  readonly width: Float64Array;
  /** Square root of each point's weight. */
  readonly rootWeight: Float64Array;
  /** Rows of the triangular factor, nine numbers a knot: r00 r01 r02 r03 z0 r11 r12 r13 z1. */
  readonly factor: Float64Array;
  /** Smoothed value and slope (a unit of mean width) at each knot. */
  readonly value: Float64Array;
  readonly slope: Float64Array;
  /** Variance of value, covariance of value and slope, variance of slope, for noise of standard deviation 1 at weight 1. */
  readonly valueVariance: Float64Array;
  readonly covariance: Float64Array;
  readonly slopeVariance: Float64Array;
}

/** Work space for n knots. */
export function makeSmoother(width: Float64Array, rootWeight: Float64Array): Smoother {
  const n = rootWeight.length;
  const column = (): Float64Array => new Float64Array(n);
  return {
    width,
    rootWeight,
    factor: new Float64Array(9 * n),
    value: column(),
    slope: column(),
    valueVariance: column(),
    covariance: column(),
    slopeVariance: column(),
  };
}

/**
 * The curve g that makes Σ w (v − g)² + strength·∫ g″² least, with the posterior variances of its value and slope at each knot.
 *
 * The unknowns are value and slope at the knots, for which ∫ g″² is a sum of squares panel by panel (a beam held by springs).
 * The whole is one banded least-squares problem, solved by plane rotations, so that only the square root of its condition number
 * matters: 200 000 points smoothed to a handful of degrees of freedom keep their digits, where the classic five-band equations
 * lose theirs. Variances follow the factor backwards as sums of squares. O(n) time, nothing allocated.
 *
 * Sources: C. H. Reinsch, Numer. Math. 10 (1967) 177–183 (the curve); G. Wahba, J. R. Statist. Soc. B 45 (1983) 133–150 (the
 * curve as posterior mean, its covariance); F. R. de Hoog & M. F. Hutchinson, Numer. Math. 50 (1987) 311–319 (orthogonal
 * transformations for this problem). From memory.
 *
 * @returns Σ w (v − g)² and the trace of the matrix that takes v to g ("equivalent degrees of freedom")
 */
export function smoothAt(s: Smoother, v: Float64Array, strength: number): { residual: number; freedom: number } {
  forward(s, v, sqrt(strength));
  return backward(s, v);
}

/** Rotates observation and panel rows into the triangular factor, left to right. */
function forward(s: Smoother, v: Float64Array, root: number): void {
  const { width, rootWeight, factor } = s;
  const n = rootWeight.length;
  // What is known of (value, slope) at this knot from the left: two rows, upper triangular, with right-hand sides.
  let a00 = 0;
  let a01 = 0;
  let za = 0;
  let a11 = 0;
  let zb = 0;
  for (let i = 0; i < n; i += 1) {
    // Row of the observation (w, 0 | w v) into the two known rows.
    const w = rootWeight[i];
    let r = sqrt(a00 * a00 + w * w);
    let c = a00 / r;
    let d = w / r;
    a00 = r;
    const o1 = -d * a01;
    a01 = c * a01;
    const zo = c * w * v[i] - d * za;
    za = c * za + d * w * v[i];
    r = sqrt(a11 * a11 + o1 * o1);
    if (r > 0) {
      c = a11 / r;
      d = o1 / r;
      a11 = r;
      zb = c * zb + d * zo;
    }
    const k = 9 * i;
    if (i === n - 1) {
      factor[k] = a00;
      factor[k + 1] = a01;
      factor[k + 4] = za;
      factor[k + 5] = a11;
      factor[k + 8] = zb;
      return;
    }
    // Rows of the panel: p (mean of g″) and q (its linear part), over (value, slope, next value, next slope).
    const h = width[i];
    const a = root / sqrt(h);
    const b = sqrt(3) * a;
    const p1 = -a;
    let p2 = 0;
    let p3 = a;
    let zp = 0;
    let q1 = b;
    let q2 = (-2 * b) / h;
    let q3 = b;
    let zq = 0;
    const q0 = -q2;
    // Column 0: row a with row q.
    r = sqrt(a00 * a00 + q0 * q0);
    c = a00 / r;
    d = q0 / r;
    factor[k] = r;
    factor[k + 1] = c * a01 + d * q1;
    q1 = c * q1 - d * a01;
    factor[k + 2] = d * q2;
    q2 = c * q2;
    factor[k + 3] = d * q3;
    q3 = c * q3;
    factor[k + 4] = c * za + d * zq;
    zq = c * zq - d * za;
    // Column 1: row b with row p, then with row q.
    r = sqrt(a11 * a11 + p1 * p1);
    c = a11 / r;
    d = p1 / r;
    let b1 = r;
    let b2 = d * p2;
    let b3 = d * p3;
    p2 = c * p2;
    p3 = c * p3;
    zp = -d * zb;
    let zbb = c * zb;
    r = sqrt(b1 * b1 + q1 * q1);
    c = b1 / r;
    d = q1 / r;
    b1 = r;
    const b2new = c * b2 + d * q2;
    q2 = c * q2 - d * b2;
    b2 = b2new;
    const b3new = c * b3 + d * q3;
    q3 = c * q3 - d * b3;
    b3 = b3new;
    const zbnew = c * zbb + d * zq;
    zq = c * zq - d * zbb;
    zbb = zbnew;
    factor[k + 5] = b1;
    factor[k + 6] = b2;
    factor[k + 7] = b3;
    factor[k + 8] = zbb;
    // What is left speaks of the next knot: rows p and q, made triangular.
    r = sqrt(p2 * p2 + q2 * q2);
    c = r > 0 ? p2 / r : 1;
    d = r > 0 ? q2 / r : 0;
    a00 = r;
    a01 = c * p3 + d * q3;
    za = c * zp + d * zq;
    a11 = c * q3 - d * p3;
    zb = c * zq - d * zp;
  }
}

/** Solves for the curve and its variances, right to left. */
function backward(s: Smoother, v: Float64Array): { residual: number; freedom: number } {
  const { rootWeight, factor, value, slope, valueVariance, covariance, slopeVariance } = s;
  let residual = 0;
  let freedom = 0;
  for (let i = rootWeight.length - 1; i >= 0; i -= 1) {
    const k = 9 * i;
    // T, the inverse of the 2 × 2 triangle.
    const t00 = 1 / factor[k];
    const t11 = 1 / factor[k + 5];
    const t01 = -t00 * factor[k + 1] * t11;
    let g = t00 * factor[k + 4] + t01 * factor[k + 8];
    let m = t11 * factor[k + 8];
    let p00 = t00 * t00 + t01 * t01;
    let p01 = t01 * t11;
    let p11 = t11 * t11;
    if (i < rootWeight.length - 1) {
      // K = T × (block that couples to the next knot).
      const k00 = t00 * factor[k + 2] + t01 * factor[k + 6];
      const k01 = t00 * factor[k + 3] + t01 * factor[k + 7];
      const k10 = t11 * factor[k + 6];
      const k11 = t11 * factor[k + 7];
      g -= k00 * value[i + 1] + k01 * slope[i + 1];
      m -= k10 * value[i + 1] + k11 * slope[i + 1];
      const n00 = valueVariance[i + 1];
      const n01 = covariance[i + 1];
      const n11 = slopeVariance[i + 1];
      const a0 = k00 * n00 + k01 * n01;
      const a1 = k00 * n01 + k01 * n11;
      const b0 = k10 * n00 + k11 * n01;
      const b1 = k10 * n01 + k11 * n11;
      p00 += a0 * k00 + a1 * k01;
      p01 += a0 * k10 + a1 * k11;
      p11 += b0 * k10 + b1 * k11;
    }
    value[i] = g;
    slope[i] = m;
    valueVariance[i] = p00;
    covariance[i] = p01;
    slopeVariance[i] = p11;
    const w = rootWeight[i] * rootWeight[i];
    residual += w * (v[i] - g) * (v[i] - g);
    freedom += w * p00;
  }
  return { residual, freedom };
}

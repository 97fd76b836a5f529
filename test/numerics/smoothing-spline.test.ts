import { cubicSpline } from "../../src/numerics/cubic-spline";
import { makeSmoother, smoothAt } from "../../src/numerics/banded-smoother";
import { smoothingSpline } from "../../src/numerics/smoothing-spline";
import type { Smoothed } from "../../src/numerics/smoothing-spline";
import { normalNoise } from "./normal-noise";

function smooth(x: Float64Array, v: Float64Array, options: { noise?: number; weight?: Float64Array } = {}): Smoothed {
  const made = smoothingSpline(x, v, options);
  if (!made.ok) throw new Error(`${made.reason} ${made.row ?? ""}`);
  return made;
}
const spaced = (n: number, from: number, to: number): Float64Array => Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));

/**
 * The same smoothing by Reinsch's own equations (Numer. Math. 10, 1967; in the notation of Green & Silverman, Nonparametric
 * Regression, 1994, §2.3): g = v − α W⁻¹ Q γ, (R + α QᵀW⁻¹Q) γ = Qᵀv, solved densely here; A column by column.
 */
function reinsch(x: Float64Array, w: Float64Array, strength: number, v: Float64Array): Float64Array {
  const n = x.length;
  const h = (i: number): number => x[i + 1] - x[i];
  const m = n - 2;
  const q = (i: number, j: number): number => (i === j ? 1 / h(j) : i === j + 1 ? -1 / h(j) - 1 / h(j + 1) : i === j + 2 ? 1 / h(j + 1) : 0);
  const a: number[][] = [];
  for (let j = 0; j < m; j += 1) {
    const row: number[] = [];
    for (let k = 0; k < m; k += 1) {
      let sum = j === k ? (h(j) + h(j + 1)) / 3 : Math.abs(j - k) === 1 ? h(Math.max(j, k)) / 6 : 0;
      for (let i = 0; i < n; i += 1) sum += (strength * q(i, j) * q(i, k)) / w[i];
      row.push(sum);
    }
    let right = 0;
    for (let i = 0; i < n; i += 1) right += q(i, j) * v[i];
    a.push([...row, right]);
  }
  for (let c = 0; c < m; c += 1) {
    for (let r = c + 1; r < m; r += 1) {
      const f = a[r][c] / a[c][c];
      for (let k = c; k <= m; k += 1) a[r][k] -= f * a[c][k];
    }
  }
  const gamma = new Float64Array(m);
  for (let c = m - 1; c >= 0; c -= 1) {
    let sum = a[c][m];
    for (let k = c + 1; k < m; k += 1) sum -= a[c][k] * gamma[k];
    gamma[c] = sum / a[c][c];
  }
  return v.map((value, i) => {
    let sum = 0;
    for (let j = 0; j < m; j += 1) sum += q(i, j) * gamma[j];
    return value - (strength / w[i]) * sum;
  });
}

describe("banded smoother", () => {
  const x = Float64Array.of(0, 0.4, 1.1, 1.5, 2.9, 3.2, 4.4, 5.1, 6.8, 7.2);
  const w = Float64Array.of(1, 2, 1, 0.5, 1, 3, 1, 1, 0.2, 1);
  const v = x.map((at, i) => Math.sin(at) + (i % 3 ? 0.2 : -0.3));
  const s = makeSmoother(x.slice(1).map((at, i) => at - x[i]), w.map(Math.sqrt));
  for (const strength of [1e-6, 0.03, 1, 50, 1e6]) {
    it(`gives the curve, residual and trace of Reinsch's equations at strength ${strength}`, () => {
      const { residual, freedom } = smoothAt(s, v, strength);
      const other = reinsch(x, w, strength, v);
      s.value.forEach((g, i) => expect(Math.abs(g - other[i])).toBeLessThan(1e-8));
      expect(residual).toBeCloseTo(other.reduce((sum, g, i) => sum + w[i] * (v[i] - g) ** 2, 0), 8);
      let trace = 0;
      for (let i = 0; i < x.length; i += 1) {
        const unit = new Float64Array(x.length);
        unit[i] = 1;
        const column = reinsch(x, w, strength, unit);
        trace += column[i];
        // Wahba (1983): the posterior variance of value i is A_ii ∕ w_i.
        expect(s.valueVariance[i] * w[i]).toBeCloseTo(column[i], 7);
      }
      expect(freedom).toBeCloseTo(trace, 6);
    });
  }
  it("gives the slopes of the natural spline through its smoothed values", () => {
    smoothAt(s, v, 0.3);
    // Continuity of the second derivative at inner knots, zero at the ends: 2 s0 + s1 = 3 d.
    const h = s.width;
    const d = (i: number): number => (s.value[i + 1] - s.value[i]) / h[i];
    expect(2 * s.slope[0] + s.slope[1]).toBeCloseTo(3 * d(0), 11);
    for (let i = 1; i < x.length - 1; i += 1) {
      const left = h[i] * s.slope[i - 1] + 2 * (h[i - 1] + h[i]) * s.slope[i] + h[i - 1] * s.slope[i + 1];
      // at a knot with data the second derivative is still continuous (only the third jumps)
      expect(left).toBeCloseTo(3 * (h[i] * d(i - 1) + h[i - 1] * d(i)), 10);
    }
  });
  it("gives the variance of the slope that repeated noise on a posterior draw shows: straight-line limit", () => {
    // Very strong smoothing is the straight-line fit, whose slope variance is 1 ∕ Σ w (x − x̄)² (any statistics text).
    smoothAt(s, v, 1e9);
    const total = w.reduce((a, b) => a + b);
    const mean = x.reduce((sum, at, i) => sum + w[i] * at, 0) / total;
    const xx = x.reduce((sum, at, i) => sum + w[i] * (at - mean) ** 2, 0);
    s.slopeVariance.forEach((p) => expect(p * xx).toBeCloseTo(1, 4));
    s.valueVariance.forEach((p, i) => expect(p).toBeCloseTo(1 / total + (x[i] - mean) ** 2 / xx, 4));
    s.covariance.forEach((p, i) => expect(p * xx).toBeCloseTo(x[i] - mean, 4));
  });
});

describe("smoothing spline", () => {
  const truth = (x: number): number => Math.sin(3 * x) + x * x;
  const slopeOfTruth = (x: number): number => 3 * Math.cos(3 * x) + 2 * x;
  it("is the interpolating spline when the noise given is 0", () => {
    const x = spaced(12, 0, 2);
    const v = x.map(truth);
    const spline = cubicSpline(x, v);
    expect(smooth(x, v, { noise: 0 })).toMatchObject({ curve: spline.ok && spline.curve, noise: 0, origin: "none given", freedom: 12 });
  });
  it("tends to the points when the noise given tends to 0 and to the least-squares line when it is large", () => {
    const x = spaced(30, 0, 2);
    const v = x.map(truth);
    smooth(x, v, { noise: 1e-9 }).curve.value.forEach((g, i) => expect(Math.abs(g - v[i])).toBeLessThan(1e-6));
    const line = smooth(x, v, { noise: 100 });
    expect(line.freedom).toBeCloseTo(2, 2);
    expect(line.curve.slope[0]).toBeCloseTo(line.curve.slope[29], 2);
  });
  it("finds the noise of a sine with 1 000 points within the sampling error of a standard deviation", () => {
    const x = spaced(1000, 0, 2);
    for (const [seed, sigma] of [[1, 0.1], [2, 0.01], [3, 0.5]]) {
      const noise = normalNoise(seed);
      const found = smooth(x, x.map((at) => truth(at) + sigma * noise()));
      expect(found.origin).toBe("found");
      expect(Math.abs(found.noise / sigma - 1)).toBeLessThan(3 / Math.sqrt(2 * 1000)); // three standard errors of σ̂
    }
  });
  it("states standard errors that cover value and slope as often as they should (50 columns of 60 points)", () => {
    const x = spaced(60, 0, 2);
    const noise = normalNoise(7);
    const sigma = 0.1;
    for (const given of [sigma, undefined]) {
      let values = 0;
      let slopes = 0;
      let count = 0;
      for (let run = 0; run < 50; run += 1) {
        const got = smooth(x, x.map((at) => truth(at) + sigma * noise()), { noise: given });
        for (let i = 0; i < 60; i += 1) {
          count += 1;
          if (Math.abs(got.curve.value[i] - truth(x[i])) <= 1.96 * got.valueError[i]) values += 1;
          if (Math.abs(got.curve.slope[i] - slopeOfTruth(x[i])) <= 1.96 * got.slopeError[i]) slopes += 1;
        }
      }
      // Wahba (1983): 95 % intervals cover about 95 % across the column; the noise of 50 runs and of σ̂ leaves a few per cent.
      expect(values / count).toBeGreaterThan(0.91);
      expect(values / count).toBeLessThan(0.99);
      expect(slopes / count).toBeGreaterThan(0.91);
      expect(slopes / count).toBeLessThanOrEqual(1);
    }
  });
  it("scales with the units of x and v and does not feel a shift", () => {
    const x = spaced(40, 0, 2);
    const noise = normalNoise(11);
    const v = x.map((at) => truth(at) + 0.05 * noise());
    const plain = smooth(x, v);
    const scaled = smooth(x.map((at) => 1000 * at + 7), v.map((value) => 1e-3 * value - 5e-3));
    expect(scaled.noise / plain.noise).toBeCloseTo(1e-3, 8);
    plain.curve.slope.forEach((m, i) => expect(Math.abs(scaled.curve.slope[i] * 1e6 - m)).toBeLessThan(1e-5));
    plain.slopeError.forEach((m, i) => expect((scaled.slopeError[i] * 1e6) / m).toBeCloseTo(1, 5));
  });
  it("keeps a straight column a straight line without noise", () => {
    const x = spaced(20, 0, 1);
    const got = smooth(x, x.map((at) => 3 * at + 1));
    expect(got.origin).toBe("none found");
    got.curve.slope.forEach((m) => expect(m).toBeCloseTo(3, 12));
  });
  it("follows a clean smooth column closely and says how little noise it found", () => {
    const x = spaced(25, 0, 2);
    const got = smooth(x, x.map(truth));
    expect(got.noise).toBeLessThan(1e-3);
    got.curve.value.forEach((g, i) => expect(Math.abs(g - truth(x[i]))).toBeLessThan(2e-3));
  });
  it("smooths 20 000 points to a handful of degrees of freedom without losing digits", () => {
    const n = 20_000;
    const x = spaced(n, 0, 2);
    const noise = normalNoise(5);
    const got = smooth(x, x.map((at) => truth(at) + 0.1 * noise()));
    expect(Math.abs(got.noise - 0.1)).toBeLessThan(3 * 0.1 / Math.sqrt(2 * n)); // three standard errors of a standard deviation
    expect(got.freedom).toBeLessThan(60);
    let inside = 0;
    for (let i = 0; i < n; i += 1) if (Math.abs(got.curve.value[i] - truth(x[i])) <= 3 * got.valueError[i]) inside += 1;
    expect(inside / n).toBeGreaterThan(0.95);
  });
  it("refuses what it cannot judge", () => {
    const x = spaced(5, 0, 1);
    expect(smoothingSpline(x, x)).toMatchObject({ reason: "too few points" });
    expect(smoothingSpline(x, x, { noise: -1 })).toMatchObject({ reason: "negative", argument: "noise" });
    expect(smoothingSpline(x, x, { noise: NaN })).toMatchObject({ reason: "not finite", argument: "noise" });
    expect(smoothingSpline(x, x, { noise: 1, weight: Float64Array.of(1, 1, 0, 1, 1) })).toMatchObject({ reason: "not positive", row: 3 });
  });
});

describe("banded smoother on long columns", () => {
  it("keeps the least-squares line's digits at 200 000 points, where the classic equations have lost theirs", () => {
    // v = x³ is smoothed so hard that only the straight line is left; its slope is known: least squares of x³ over −1 … 1 is 3x∕5.
    const n = 200_001;
    const unit = 2 / (n - 1);
    const x = spaced(n, -1, 1);
    const s = makeSmoother(new Float64Array(n - 1).fill(1), new Float64Array(n).fill(1));
    const { freedom } = smoothAt(s, x.map((at) => at ** 3), 1e26);
    expect(freedom).toBeCloseTo(2, 4);
    for (const i of [0, 50_000, 100_000, n - 1]) {
      expect(s.slope[i] / unit).toBeCloseTo(0.6, 4);
      expect(s.value[i]).toBeCloseTo(0.6 * x[i], 4);
    }
  });
});

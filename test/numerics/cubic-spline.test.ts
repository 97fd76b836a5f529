import fc from "fast-check";
import { cubicSpline } from "../../src/numerics/cubic-spline";
import { cubicAt, panelSecond } from "../../src/numerics/piecewise-cubic";
import type { PiecewiseCubic } from "../../src/numerics/piecewise-cubic";

function splineOf(x: Float64Array, f: (x: number) => number): PiecewiseCubic {
  const spline = cubicSpline(x, x.map(f));
  if (!spline.ok) throw new Error(spline.reason);
  return spline.curve;
}
const at = (curve: PiecewiseCubic, x: number): { value: number; slope: number } => {
  const found = cubicAt(curve, x);
  if (!found.ok) throw new Error(found.reason);
  return found;
};
const uneven = Float64Array.of(0, 0.1, 0.35, 0.4, 0.9, 1.3, 2);

describe("cubic spline", () => {
  it("reproduces a line from two points, a parabola from three, a cubic from four and from seven uneven ones", () => {
    const cubic = (x: number): number => 2 * x ** 3 - x * x + 0.5 * x - 3;
    const parabola = (x: number): number => x * x - x + 2;
    const line = (x: number): number => 3 * x - 1;
    for (const [n, f] of [[2, line], [3, parabola], [4, cubic], [7, cubic]] as const) {
      const curve = splineOf(uneven.slice(0, n), f);
      for (let k = 0; k <= 20; k += 1) {
        const x = (curve.x[n - 1] * k) / 20;
        expect(at(curve, x).value).toBeCloseTo(f(x), 12);
      }
    }
  });
  it("has a continuous second derivative at inner knots and no jump of the third at the second knot from each end", () => {
    const curve = splineOf(uneven, Math.sin);
    for (let i = 1; i < 6; i += 1) expect(panelSecond(curve, i - 1, 1)).toBeCloseTo(panelSecond(curve, i, 0), 11);
    const third = (i: number): number => (panelSecond(curve, i, 1) - panelSecond(curve, i, 0)) / (uneven[i + 1] - uneven[i]);
    expect(third(0)).toBeCloseTo(third(1), 10);
    expect(third(5)).toBeCloseTo(third(4), 10);
  });
  it("converges with the fourth power of the spacing in value, the third in slope, ends included", () => {
    const error = (n: number): [number, number] => {
      const curve = splineOf(Float64Array.from({ length: n + 1 }, (_, i) => (2 * i) / n), Math.exp);
      let worst = 0;
      let worstSlope = 0;
      for (let k = 0; k <= 1000; k += 1) {
        const got = at(curve, k / 500);
        worst = Math.max(worst, Math.abs(got.value - Math.exp(k / 500)));
        worstSlope = Math.max(worstSlope, Math.abs(got.slope - Math.exp(k / 500)));
      }
      return [worst, worstSlope];
    };
    const [coarse, coarseSlope] = error(40);
    const [fine, fineSlope] = error(80);
    expect(Math.log2(coarse / fine)).toBeGreaterThan(3.8);
    expect(Math.log2(coarseSlope / fineSlope)).toBeGreaterThan(2.8);
  });
  it("refuses what is no column and says where", () => {
    const of = (...v: number[]): Float64Array => Float64Array.of(...v);
    expect(cubicSpline(of(0), of(1))).toMatchObject({ reason: "too few points" });
    expect(cubicSpline(of(0, 1), of(1))).toMatchObject({ reason: "lengths differ" });
    expect(cubicSpline(of(0, 1, 1), of(1, 2, 3))).toMatchObject({ reason: "not rising", row: 3 });
    expect(cubicSpline(of(0, 1, 2), of(1, NaN, 3))).toMatchObject({ reason: "not finite", argument: "v", row: 2 });
  });
  it("leaves its input alone and never gives NaN for finite columns", () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.double({ min: 0.01, max: 5, noNaN: true }), fc.double({ min: -1e6, max: 1e6, noNaN: true })), { minLength: 2, maxLength: 40 }), (pairs) => {
        let sum = 0;
        const x = Float64Array.from(pairs, ([h]) => (sum += h));
        const v = Float64Array.from(pairs, ([, value]) => value);
        const [x0, v0] = [x.slice(), v.slice()];
        const spline = cubicSpline(x, v);
        expect(x).toEqual(x0);
        expect(v).toEqual(v0);
        expect(spline.ok && spline.curve.slope.every(Number.isFinite)).toBe(true);
      }),
    );
  });
});

import { cubicAt, panelLeast, runningIntegral } from "../../src/numerics/piecewise-cubic";
import type { PiecewiseCubic } from "../../src/numerics/piecewise-cubic";

// One cubic, p(x) = x³ − 2x² + 1, held on an uneven set of knots: every answer is exact by algebra.
const p = (x: number): number => x ** 3 - 2 * x * x + 1;
const dp = (x: number): number => 3 * x * x - 4 * x;
const knots = Float64Array.of(-1, -0.25, 0.5, 1.75, 2.5);
const curve: PiecewiseCubic = { x: knots, value: knots.map(p), slope: knots.map(dp) };

describe("piecewise cubic", () => {
  it("gives value, slope and second derivative of the cubic it is made from", () => {
    for (const x of [-1, -0.9, -0.25, 0, 0.3, 0.5, 1, 1.75, 2.2, 2.5]) {
      const at = cubicAt(curve, x);
      if (!at.ok) throw new Error(at.reason);
      expect(at.value).toBeCloseTo(p(x), 13);
      expect(at.slope).toBeCloseTo(dp(x), 13);
      expect(at.second).toBeCloseTo(6 * x - 4, 12);
    }
  });
  it("gives the very values of the column at its knots", () => {
    knots.forEach((x, i) => expect(cubicAt(curve, x)).toMatchObject({ ok: true, value: curve.value[i], slope: curve.slope[i] }));
  });
  it("refuses a place outside the column and a place that is no number", () => {
    for (const x of [-1.0000001, 2.5000001, NaN, Infinity]) {
      expect(cubicAt(curve, x)).toMatchObject({ ok: false, reason: "outside column", values: { value: x, least: -1, most: 2.5 } });
    }
  });
  it("integrates exactly from the first knot to each knot", () => {
    const primitive = (x: number): number => x ** 4 / 4 - (2 / 3) * x ** 3 + x;
    runningIntegral(curve).forEach((sum, i) => expect(sum).toBeCloseTo(primitive(knots[i]) - primitive(-1), 13));
  });
  it("finds the least value inside a panel: p has its minimum −5/27 at x = 4/3", () => {
    const least = panelLeast(curve, 2);
    expect(least.value).toBeCloseTo(-5 / 27, 14);
    expect(0.5 + 1.25 * least.t).toBeCloseTo(4 / 3, 7);
    expect(panelLeast(curve, 0)).toEqual({ value: -2, t: 0 });
  });
});

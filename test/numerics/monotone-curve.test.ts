import fc from "fast-check";
import { monotoneCurve } from "../../src/numerics/monotone-curve";
import { panelSlope, panelValue } from "../../src/numerics/piecewise-cubic";

// Data of Fritsch & Carlson (1980), table 1 ("RPN 14", from memory): a flat foot, a steep rise, a flat top.
const x = Float64Array.of(7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20);
const v = Float64Array.of(0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.94374, 0.998636, 0.999919, 0.999994);

describe("monotone curve", () => {
  it("rises everywhere through rising points, at 50 places a panel", () => {
    const made = monotoneCurve(x, v);
    if (!made.ok) throw new Error(made.reason);
    for (let i = 0; i < x.length - 1; i += 1) {
      for (let k = 0; k <= 50; k += 1) expect(panelSlope(made.curve, i, k / 50)).toBeGreaterThanOrEqual(-1e-15);
    }
  });
  it("reproduces a straight line and, where no limit acts, a parabola", () => {
    const line = monotoneCurve(x, x.map((at) => 2 * at - 5));
    expect(line.ok && line.curve.slope.every((s) => Math.abs(s - 2) < 1e-12)).toBe(true);
    const even = Float64Array.of(1, 2, 3, 4);
    const parabola = monotoneCurve(even, even.map((at) => at * at));
    expect(parabola.ok && [...parabola.curve.slope]).toEqual([2, 4, 6, 8]);
  });
  it("keeps each panel within the interval of its two values, whatever the column", () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.double({ min: 0.01, max: 5, noNaN: true }), fc.double({ min: -10, max: 10, noNaN: true })), { minLength: 2, maxLength: 30 }), (pairs) => {
        let sum = 0;
        const xs = Float64Array.from(pairs, ([h]) => (sum += h));
        const vs = Float64Array.from(pairs, ([, value]) => value);
        const made = monotoneCurve(xs, vs);
        if (!made.ok) throw new Error(made.reason);
        for (let i = 0; i < xs.length - 1; i += 1) {
          const low = Math.min(vs[i], vs[i + 1]);
          const high = Math.max(vs[i], vs[i + 1]);
          for (let k = 0; k <= 20; k += 1) {
            const value = panelValue(made.curve, i, k / 20);
            expect(value).toBeGreaterThanOrEqual(low - 1e-12);
            expect(value).toBeLessThanOrEqual(high + 1e-12);
          }
        }
      }),
    );
  });
});

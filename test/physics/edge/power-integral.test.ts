import { panelPowerIntegral, powerRule, runningPowerIntegral } from "../../../src/physics/edge/power-integral";
import type { PiecewiseCubic } from "../../../src/numerics/piecewise-cubic";

const knots = Float64Array.of(0, 0.7, 1.1, 2);
const curveOf = (f: (x: number) => number, slope: (x: number) => number): PiecewiseCubic => ({ x: knots, value: knots.map(f), slope: knots.map(slope) });
const cubic = curveOf((x) => x ** 3, (x) => 3 * x * x);
const line = curveOf((x) => 1 + x, () => 1);

describe("integral of a power of the edge speed", () => {
  it("is exact for every power up to 8 of x³: x^(3p+1)/(3p+1)", () => {
    for (let p = 0; p <= 8; p += 1) {
      const made = powerRule(p, false);
      if (!made.ok) throw new Error(made.reason);
      runningPowerIntegral(made.rule, cubic, null).forEach((sum, i) => {
        const exact = knots[i] ** (3 * p + 1) / (3 * p + 1);
        expect(Math.abs(sum - exact)).toBeLessThanOrEqual(1e-13 * Math.max(exact, 1));
      });
    }
  });
  it("is exact with the square of a cubic radius: x⁶ x¹⁵ gives x²²/22, and for (1 + x)² (1 + x)⁵", () => {
    const made = powerRule(5, true);
    if (!made.ok) throw new Error(made.reason);
    const sum = runningPowerIntegral(made.rule, cubic, cubic);
    expect(sum[3] / (2 ** 22 / 22)).toBeCloseTo(1, 13);
    expect(runningPowerIntegral(made.rule, line, line)[3]).toBeCloseTo((3 ** 8 - 1) / 8, 9);
    expect(made.rule.node.length).toBe(11);
  });
  it("is exact over a part of a panel", () => {
    const made = powerRule(5, false);
    if (!made.ok) throw new Error(made.reason);
    const [a, b] = [1.1 + 0.25 * 0.9, 1.1 + 0.6 * 0.9];
    expect(panelPowerIntegral(made.rule, line, null, 2, 0.25, 0.6)).toBeCloseTo(((1 + b) ** 6 - (1 + a) ** 6) / 6, 11);
  });
  it("refuses powers it is not exact for", () => {
    for (const p of [-1, 0.5, NaN]) expect(powerRule(p, false)).toMatchObject({ ok: false, reason: "outside range" });
  });
});

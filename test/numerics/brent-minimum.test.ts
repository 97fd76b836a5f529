import { brentMinimum } from "../../src/numerics/brent-minimum";

describe("Brent's minimum finder", () => {
  it("finds the minimum of x ln x, 1/e, of a parabola and of a kink", () => {
    for (const [f, exact] of [[(x: number) => x * Math.log(x), 1 / Math.E], [(x: number) => (x - 0.7) ** 2, 0.7], [(x: number) => Math.abs(x - 0.3), 0.3]] as const) {
      const found = brentMinimum(f, 0.01, 2, 1e-6);
      if (!found.ok) throw new Error(found.reason);
      expect(Math.abs(found.x - exact)).toBeLessThan(2e-6);
      expect(found.evaluations).toBeLessThan(50);
    }
  });
  it("needs few calls where the valley is smooth: superlinear, not golden section's 30 for six digits", () => {
    const found = brentMinimum((x) => Math.exp(x) - 3 * x, 0, 4, 1e-6);
    expect(found.ok && Math.abs(found.x - Math.log(3))).toBeLessThan(1e-6);
    expect(found.ok && found.evaluations).toBeLessThan(14);
  });
  it("says so when the function is not finite", () => {
    expect(brentMinimum(() => NaN, 0, 1, 1e-3)).toMatchObject({ ok: false, reason: "not finite" });
  });
});

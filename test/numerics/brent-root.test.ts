import { brentRoot } from "../../src/numerics/brent-root";

describe("Brent's root finder", () => {
  it("finds the root of Wallis's cubic x³ − 2x − 5, 2.0945514815423265 (classic value)", () => {
    const root = brentRoot((x) => x ** 3 - 2 * x - 5, 2, 3);
    expect(root).toMatchObject({ ok: true });
    if (!root.ok) return;
    expect(root.x).toBeCloseTo(2.0945514815423265, 14);
    expect(root.evaluations).toBeLessThan(15);
  });
  it("finds roots of flat, steep and jumping functions within a bounded number of calls", () => {
    const cases: Array<[(x: number) => number, number, number, number]> = [
      [(x) => (x - 1) ** 9, 0, 3, 1],
      [(x) => Math.exp(50 * x) - 2, -1, 1, Math.log(2) / 50],
      [(x) => (x < 0.3 ? -1 : 1e6), 0, 1, 0.3],
      [(x) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
    ];
    for (const [f, a, b, exact] of cases) {
      let calls = 0;
      const root = brentRoot((x) => ((calls += 1), f(x)), a, b);
      if (!root.ok) throw new Error(root.reason);
      expect(Math.abs(root.x - exact)).toBeLessThan(f === cases[0][0] ? 1e-2 : 1e-14); // (x−1)⁹ underflows near its root
      expect(root.evaluations).toBe(calls);
    }
  });
  it("takes a root at either end, and the ends in either order", () => {
    expect(brentRoot((x) => x, 0, 1)).toMatchObject({ ok: true, x: 0 });
    expect(brentRoot((x) => x - 1, 0, 1)).toMatchObject({ ok: true, x: 1 });
    const turned = brentRoot((x) => x * x - 2, 2, 0);
    expect(turned.ok && turned.x).toBeCloseTo(Math.SQRT2, 14);
  });
  it("refuses without a change of sign and when the function is not finite", () => {
    expect(brentRoot((x) => x * x + 1, -1, 1)).toMatchObject({ ok: false, reason: "outside range", values: { atFrom: 2, atTo: 2 } });
    expect(brentRoot((x) => (x < 0.4 ? -1 : x > 0.6 ? 1 : NaN), 0, 1)).toMatchObject({ ok: false, reason: "not finite" });
  });
});

import { gaussLegendre } from "../../src/numerics/gauss-legendre";

function rule(n: number): { node: Float64Array; weight: Float64Array } {
  const made = gaussLegendre(n);
  if (!made.ok) throw new Error(made.reason);
  return made;
}

describe("Gauss-Legendre nodes and weights", () => {
  it("are those of Abramowitz & Stegun, table 25.4, for n = 2, 3, 5 (15 printed decimals)", () => {
    expect(rule(2).node[1]).toBeCloseTo(0.577350269189626, 14);
    expect([...rule(3).node].map((z) => z.toFixed(15))).toEqual(["-0.774596669241483", "0.000000000000000", "0.774596669241483"]);
    expect(rule(3).weight[1]).toBeCloseTo(0.888888888888889, 14);
    expect(rule(5).node[4]).toBeCloseTo(0.906179845938664, 14);
    expect(rule(5).weight[4]).toBeCloseTo(0.236926885056189, 14);
    expect(rule(1)).toMatchObject({ node: Float64Array.of(0), weight: Float64Array.of(2) });
  });
  it("integrate every power up to 2n − 1 exactly and not the next", () => {
    for (const n of [1, 2, 5, 8, 11, 16, 40]) {
      const { node, weight } = rule(n);
      const integral = (k: number): number => node.reduce((sum, z, i) => sum + weight[i] * z ** k, 0);
      for (let k = 0; k <= 2 * n - 1; k += 1) expect(integral(k)).toBeCloseTo(k % 2 ? 0 : 2 / (k + 1), 13);
      if (n < 11) expect(Math.abs(integral(2 * n) - 2 / (2 * n + 1))).toBeGreaterThan(1e-9);
    }
  });
  it("still add up to 2 and rise for n = 500", () => {
    const { node, weight } = rule(500);
    expect(weight.reduce((a, b) => a + b)).toBeCloseTo(2, 12);
    expect(node.every((z, i) => i === 0 || z > node[i - 1])).toBe(true);
  });
  it("refuse n that is no whole number above zero", () => {
    for (const n of [0, -1, 2.5, NaN]) expect(gaussLegendre(n)).toMatchObject({ ok: false, reason: "outside range" });
  });
});

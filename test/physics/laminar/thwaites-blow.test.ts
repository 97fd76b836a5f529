import { blowVelocity } from "../../../src/physics/coupling/blow-velocity";
import { thwaitesShape, thwaitesShapeRate } from "../../../src/physics/laminar/thwaites-relations";
import { spaced } from "./classic-flows";
import { laminarSolution } from "./laminar-solution";
import { marchOf } from "./march-of";

/** The same growth from the column of m alone: C2 spline of a fine march. */
function fromColumn(x: Float64Array, m: Float64Array, radius?: Float64Array): Float64Array {
  const made = blowVelocity(x, m, { noise: 0, radius });
  if (!made.ok) throw new Error(made.reason);
  return made.velocity;
}

describe("growth of the mass defect by Thwaites' own equations", () => {
  it("is the derivative of the spline through a fine column of m: sin x from its stagnation point", () => {
    const x = spaced(1001, 0, 1.7);
    const march = marchOf(x, x.map(Math.sin));
    fromColumn(x, march.massDefect).forEach((v, i) => expect(Math.abs(march.blowVelocity[i] - v)).toBeLessThan(1e-5 * (1 + v)));
  });
  it("is the same on a sphere, the axis included", () => {
    const x = spaced(1001, 0, 1.7);
    const radius = x.map(Math.sin);
    const march = marchOf(x, x.map((s) => 1.5 * Math.sin(s)), 1, { radius });
    fromColumn(x, march.massDefect, radius).forEach((v, i) => expect(Math.abs(march.blowVelocity[i] - v)).toBeLessThan(1e-5 * (1 + v)));
  });
  it("is the same after a start with a given θ, from the first station on", () => {
    const x = spaced(801, 0, 0.08);
    const march = marchOf(x, x.map((s) => 1 - s), 1, { startMomentumLoss: 0.1 });
    fromColumn(x, march.massDefect).forEach((v, i) => expect(Math.abs(march.blowVelocity[i] / v - 1)).toBeLessThan(1e-5));
  });
  it("is empty at a leading edge, where m rises like √x, and Blasius-like behind it: m ∕ 2x", () => {
    const x = spaced(9, 0, 1);
    const march = marchOf(x, x.map(() => 3), 0.01);
    expect(march.blowBlank[0]).toBe(1);
    for (let i = 1; i < 9; i += 1) expect(march.blowVelocity[i]).toBeCloseTo(march.massDefect[i] / (2 * x[i]), 12);
  });
  it("runs without a kink: on 15 stations it is within 0.4 % of that on 400 (sin x up to 1.6)", () => {
    const coarse = spaced(15, 0, 1.6);
    const fine = spaced(15 + 14 * 29, 0, 1.6);
    const a = marchOf(coarse, coarse.map(Math.sin)).blowVelocity;
    const b = marchOf(fine, fine.map(Math.sin)).blowVelocity;
    a.forEach((v, i) => expect(Math.abs(v / b[30 * i] - 1)).toBeLessThan(4e-3));
  });
  it("is within 2 % of the full solution's dm/dx up to half the way to separation behind a stagnation point, and within 3 % behind a leading edge", () => {
    for (const [name, ue, most] of [["sin_x", Math.sin, 0.02], ["howarth_1mx", (s: number) => 1 - s, 0.03], ["tani_1mx2", (s: number) => 1 - s * s, 0.03]] as const) {
      const full = laminarSolution(name);
      const all = full.column("x");
      const m = full.column("dstar").map((d, i) => d * full.column("ue")[i]);
      const exact = fromColumn(all, m);
      const x = Float64Array.of(0, ...all);
      const march = marchOf(x, x.map(ue));
      for (let i = 3; i < all.length && all[i] < full.separation / 2; i += 1) expect(Math.abs(march.blowVelocity[i + 1] / exact[i] - 1)).toBeLessThan(most);
    }
  });
  it("uses the derivative of H(λ)", () => {
    for (const lambda of [-0.08, -0.02, 0, 0.07, 0.2]) {
      expect(thwaitesShapeRate(lambda)).toBeCloseTo((thwaitesShape(lambda + 1e-5) - thwaitesShape(lambda - 1e-5)) / 2e-5, 5);
    }
  });
});

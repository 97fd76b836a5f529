import fc from "fast-check";
import { edgeSpeed } from "../../../src/physics/edge/edge-speed";

function speedOf(cp: number, mach?: number, gamma?: number): number {
  const made = edgeSpeed(Float64Array.of(cp), 1, mach, gamma);
  if (!made.ok) throw new Error(made.reason);
  return made.speed[0];
}

describe("edge speed from pressure", () => {
  it("is Bernoulli's without a Mach number: stagnation 0, free stream U, cylinder crest 2U at cp = −3", () => {
    expect(speedOf(1)).toBe(0);
    expect(speedOf(0)).toBe(1);
    expect(speedOf(-3)).toBe(2);
    expect(speedOf(0.75)).toBe(0.5);
  });
  it("follows NACA Rep. 1135, table I: flow at M∞ = 0.5 (p/pt 0.8430) brought to M = 1 (p/pt 0.5283) and to M = 0.7 (0.7209)", () => {
    // cp = (p/p∞ − 1) 2/(γM²); V/V∞ from the same table's V/a* = 0.5345 at M 0.5, 1 at M 1, 0.7318 at M 0.7 (four printed digits; from memory).
    const cp = (ratio: number): number => (ratio / 0.843 - 1) * (2 / (1.4 * 0.25));
    expect(speedOf(cp(0.5283), 0.5)).toBeCloseTo(1 / 0.5345, 3);
    expect(speedOf(cp(0.7209), 0.5)).toBeCloseTo(0.7318 / 0.5345, 3);
  });
  it("agrees with the energy equation written the other way round, Mach by Mach", () => {
    // p/p∞ from the local Mach number (Rep. 1135 eq. 44), speed from a² = at² ∕ (1 + (γ−1)/2 M²): no power of a difference involved.
    for (const mach of [0.05, 0.3, 0.6, 0.85]) {
      for (const local of [0, 0.2, 0.5, 1, 1.4]) {
        const t = (m: number): number => 1 + 0.2 * m * m;
        const cp = ((t(mach) / t(local)) ** 3.5 - 1) * (2 / (1.4 * mach * mach));
        const expected = (local / mach) * Math.sqrt(t(mach) / t(local));
        if (local === 0) expect(speedOf(cp * (1 - 1e-15), mach)).toBeLessThan(1e-5);
        else expect(speedOf(cp, mach)).toBeCloseTo(expected, 9);
      }
    }
  });
  it("tends to Bernoulli's when the Mach number tends to 0, without losing digits", () => {
    for (const mach of [1e-3, 1e-6, 1e-9, 1e-200]) expect(speedOf(-1.2, mach)).toBeCloseTo(Math.sqrt(2.2), mach > 1e-4 ? 5 : 11);
  });
  it("refuses pressures above stagnation and below vacuum, with the row and the limits", () => {
    expect(edgeSpeed(Float64Array.of(0.2, 1.0001), 1)).toMatchObject({ ok: false, reason: "outside range", argument: "cp", row: 2, values: { most: 1 } });
    // M = 0.8: stagnation cp = ((1 + 0.2·0.64)^3.5 − 1)/0.448 = 1.17…, vacuum −2/(1.4·0.64) = −2.232
    const high = edgeSpeed(Float64Array.of(1.18), 1, 0.8);
    expect(high).toMatchObject({ ok: false, reason: "outside range", row: 1 });
    expect(!high.ok && high.values?.most).toBeCloseTo((1.128 ** 3.5 - 1) / 0.448, 12);
    expect(!high.ok && high.values?.least).toBeCloseTo(-2.232142857, 8);
    expect(edgeSpeed(Float64Array.of(-2.3), 1, 0.8)).toMatchObject({ ok: false, reason: "outside range" });
  });
  it("refuses a reference speed or Mach number that is none", () => {
    expect(edgeSpeed(Float64Array.of(0), 0)).toMatchObject({ reason: "not positive", argument: "reference_speed" });
    expect(edgeSpeed(Float64Array.of(0), 1, -0.1)).toMatchObject({ reason: "negative", argument: "mach" });
    expect(edgeSpeed(Float64Array.of(NaN), 1)).toMatchObject({ reason: "not finite", row: 1 });
    expect(edgeSpeed(new Float64Array(0), 1)).toMatchObject({ reason: "too few points" });
  });
  it("gives a refusal or finite speeds for any finite input, falls when the pressure rises, and scales with U", () => {
    fc.assert(
      fc.property(fc.double({ min: -1e3, max: 2, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (cp, mach, u) => {
        const made = edgeSpeed(Float64Array.of(cp), u, mach);
        if (!made.ok) return;
        expect(Number.isFinite(made.speed[0])).toBe(true);
        const lower = edgeSpeed(Float64Array.of(cp - 0.1), u, mach);
        if (lower.ok) expect(lower.speed[0]).toBeGreaterThanOrEqual(made.speed[0]);
        expect(made.speed[0] / u).toBeCloseTo(speedOf(cp, mach), 10);
      }),
    );
  });
});

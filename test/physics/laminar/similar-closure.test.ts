import { closureAt, vergeEnergyShape } from "../../../src/physics/laminar/similar-closure";
import { closureFamily } from "./similar-closure-samples";

/** Families that the fit was not made from (its walls are in make-similar-closure.ts), but for the solid wall. */
const WALLS = [-0.68, -0.25, 0, 0.25, 0.9, 2.5];

describe.each(WALLS)("closure of the energy march against similar layers with f(0) = %d", (wall) => {
  const family = closureFamily(wall, 10);
  if (family === null) throw new Error("no family");
  const solid = wall === 0;
  it("gives the layers' S, D and H within what its comment says, reversed ones included", () => {
    for (const { w, layer } of family.layers) {
      const { wallFlow } = layer;
      if (w < -0.15 || w > 0.38 || wallFlow < -1 || wallFlow > 0.6) continue;
      const fitted = Math.sign(w) * Math.sqrt(Math.max(layer.energyShape - vergeEnergyShape(wallFlow), 0));
      const got = closureAt(fitted, wallFlow, { shear: 0, dissipation: 0, shape: 0 });
      expect(Math.abs(got.shear - layer.shear)).toBeLessThan(solid ? 1e-5 : 4e-4);
      expect(Math.abs(got.dissipation - layer.dissipation)).toBeLessThan(solid ? 4e-6 : 3e-5);
      expect(Math.abs(1 / got.shape - 1 / layer.shape)).toBeLessThan(solid ? 4e-5 : 1e-3);
    }
  });
  it("turns at the verge: there H32 is least and S is 0", () => {
    expect(vergeEnergyShape(family.verge.wallFlow)).toBeCloseTo(family.verge.energyShape, 4);
    for (const { layer } of family.layers) if (Math.abs(layer.wallFlow - family.verge.wallFlow) < 0.02) expect(layer.energyShape).toBeGreaterThan(family.verge.energyShape - 1e-3);
    expect(Math.abs(family.verge.shear)).toBeLessThan(1e-9);
  });
});

describe("closure of the energy march at known layers", () => {
  it("gives the asymptotic suction layer: H = 2, S = ½, D = ¼ at H32 = 5∕3, vwθ∕ν = −½ (exact)", () => {
    const got = closureAt(Math.sqrt(5 / 3 - vergeEnergyShape(-0.5)), -0.5, { shear: 0, dissipation: 0, shape: 0 });
    expect(Math.abs(got.shape - 2)).toBeLessThan(2e-3);
    expect(Math.abs(got.shear - 0.5)).toBeLessThan(3e-4);
    expect(Math.abs(got.dissipation - 0.25)).toBeLessThan(2e-4);
  });
});

import { ENERGY_SHAPE_RANGE, energyShape } from "../../../src/physics/laminar/energy-shape";
import { laminarSolution } from "./laminar-solution";

describe("energy shape of similar layers", () => {
  it("gives the Blasius layer's 1.5726 (δ3 = 1.044, θ = 0.664; Schlichting) and the plane stagnation layer's 1.6257", () => {
    expect(energyShape(2.5911)).toBeCloseTo(1.5726, 3);
    expect(energyShape(2.2162)).toBeCloseTo(1.6257, 3);
  });
  it("falls all over its range", () => {
    for (let h = ENERGY_SHAPE_RANGE.least; h < ENERGY_SHAPE_RANGE.most; h += 0.01) expect(energyShape(h + 0.01)).toBeLessThan(energyShape(h));
  });
  it("meets full solutions within 0.3 % up to half the way to separation and within 2 % up to it", () => {
    for (const name of ["howarth_1mx", "tani_1mx2", "sin_x", "hiemenz_poly"]) {
      const full = laminarSolution(name);
      const [x, h, h32] = [full.column("x"), full.column("H"), full.column("H32")];
      h.forEach((shape, i) => {
        expect(Math.abs(energyShape(shape) / h32[i] - 1)).toBeLessThan(x[i] < full.separation / 2 ? 0.003 : 0.02);
      });
    }
  });
});

import fc from "fast-check";
import { backwardDifference, forecastWeights } from "../../src/numerics/backward-difference";

const place = fc.tuple(fc.double({ min: 0.1, max: 2, noNaN: true }), fc.double({ min: 0.1, max: 2, noNaN: true }), fc.double({ min: 0.1, max: 2, noNaN: true }));

describe("backward differences with unequal steps", () => {
  it.each([2, 3, 4])("through %d places are exact for every polynomial they have room for", (count) => {
    fc.assert(
      fc.property(place, ([a, b, c]) => {
        const x = [5, 5 - a, 5 - a - b, 5 - a - b - c];
        const weight = new Float64Array(4);
        backwardDifference(x, count, weight);
        for (let power = 0; power < count; power += 1) {
          const slope = x.reduce((sum, at, i) => sum + weight[i] * (at - 4) ** power, 0);
          expect(slope).toBeCloseTo(power, 7);
        }
      }),
    );
  });
  it("are the known 11∕6, −3, 3∕2, −1∕3 for equal steps (third-order backward difference, any textbook)", () => {
    const weight = new Float64Array(4);
    backwardDifference([3, 2, 1, 0], 4, weight);
    [11 / 6, -3, 3 / 2, -1 / 3].forEach((w, i) => expect(weight[i]).toBeCloseTo(w, 14));
  });
  it("forecast cubics without error", () => {
    const weight = new Float64Array(4);
    forecastWeights([3, 2.5, 1, 0], 4, 4.2, weight);
    for (let power = 0; power < 4; power += 1) expect([3, 2.5, 1, 0].reduce((sum, at, i) => sum + weight[i] * at ** power, 0)).toBeCloseTo(4.2 ** power, 10);
  });
});

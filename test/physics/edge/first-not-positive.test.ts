import { firstNotPositive } from "../../../src/physics/edge/first-not-positive";

const of = (...v: number[]): Float64Array => Float64Array.of(...v);

describe("first place where a curve is not above 0", () => {
  it("is found between stations with its least value", () => {
    // Hermite cubic with values 1, 1 and slopes −8.5, 8.5: at the middle 1 − 8.5/4 = −1.125.
    expect(firstNotPositive({ x: of(0, 1, 2), value: of(1, 1, 1), slope: of(0, -8.5, 8.5) })).toMatchObject({ panel: 1, at: 1.5, value: -1.125 });
  });
  it("is null where control points dip and the curve does not", () => {
    // Slopes ∓3.9: control points 1 − 1.3 < 0, but the middle is 1 − 3.9/4 > 0.
    expect(firstNotPositive({ x: of(0, 1), value: of(1, 1), slope: of(-3.9, 3.9) })).toBeNull();
  });
  it("is found in a first panel that starts at 0, rises, dips and rises again", () => {
    // value∕t = 1 − 5.7 t + 4.8 t², below 0 at t = 0.594.
    expect(firstNotPositive({ x: of(0, 1), value: of(0, 0.1), slope: of(1, 4) })).toMatchObject({ panel: 0, at: 5.7 / 9.6, value: 0 });
    expect(firstNotPositive({ x: of(0, 1), value: of(0, 1), slope: of(1, 1) })).toBeNull();
  });
});

import { radiusCurve } from "../../../src/physics/edge/radius-curve";

const of = (...v: number[]): Float64Array => Float64Array.of(...v);

describe("radius curve", () => {
  it("takes a nose on the axis and an open start", () => {
    expect(radiusCurve(of(0, 1, 2), of(0, 1, 1.8))).toMatchObject({ ok: true });
    expect(radiusCurve(of(0, 1, 2), of(1, 1, 1))).toMatchObject({ ok: true });
  });
  it("refuses a radius that is 0 or below anywhere else, at a station or between", () => {
    expect(radiusCurve(of(0, 1, 2), of(0, 1, 0))).toMatchObject({ ok: false, reason: "not positive", argument: "radius", row: 3 });
    expect(radiusCurve(of(0, 1, 2, 3, 4, 5), of(10, 9, 0.1, 0.1, 9, 10))).toMatchObject({ ok: false, reason: "not positive", argument: "radius", row: 3 });
  });
});

import { cubicAt } from "../../../src/numerics/piecewise-cubic";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { normalNoise } from "../../numerics/normal-noise";
import { spaced } from "../laminar/classic-flows";

const of = (...v: number[]): Float64Array => Float64Array.of(...v);

describe("edge curve", () => {
  it("reads speed and gradient of a cubic without error and leaves the columns alone", () => {
    const x = of(0, 0.2, 0.5, 0.9, 1.4);
    const ue = x.map((at) => 2 + at - at ** 3 / 4);
    const [x0, u0] = [x.slice(), ue.slice()];
    const made = edgeCurve(x, ue);
    if (!made.ok) throw new Error(made.reason);
    made.edge.curve.slope.forEach((s, i) => expect(s).toBeCloseTo(1 - 0.75 * x[i] ** 2, 12));
    expect(made.edge).toMatchObject({ fromStagnation: false, fit: "spline", noise: 0 });
    expect(x).toEqual(x0);
    expect(ue).toEqual(u0);
  });
  it("takes 0 at the first station as a stagnation point, and nowhere else", () => {
    expect(edgeCurve(of(0, 1, 2), of(0, 1, 2))).toMatchObject({ ok: true, edge: { fromStagnation: true } });
    expect(edgeCurve(of(0, 1, 2), of(1, 0, 2))).toMatchObject({ ok: false, reason: "not positive", argument: "ue", row: 2 });
    expect(edgeCurve(of(0, 1, 2), of(1, 2, -1))).toMatchObject({ ok: false, reason: "not positive", row: 3 });
  });
  it("refuses a start at 0 from which the speed does not rise", () => {
    // The parabola through these points starts downwards.
    expect(edgeCurve(of(0, 1, 2), of(0, 0.1, 2))).toMatchObject({ ok: false, reason: "stagnation not rising", row: 1 });
  });
  it("refuses a curve that dips below 0 between its stations, with row and place; the monotone fit takes the same column", () => {
    const x = of(0, 1, 2, 3, 4, 5);
    const ue = of(10, 9, 0.1, 0.1, 9, 10);
    const refused = edgeCurve(x, ue);
    expect(refused).toMatchObject({ ok: false, reason: "curve not positive", argument: "ue", row: 3 });
    expect(!refused.ok && refused.at).toBeCloseTo(2.5, 6);
    expect(edgeCurve(x, ue, { fit: "monotone" })).toMatchObject({ ok: true });
  });
  it("smooths a noisy column, keeps the stagnation point at 0 and says what noise it found", () => {
    const x = spaced(60, 0, 1.5);
    const noise = normalNoise(3);
    const ue = x.map((at, i) => (i === 0 ? 0 : Math.sin(at) + 0.01 * noise()));
    const made = edgeCurve(x, ue, { fit: "smooth" });
    if (!made.ok) throw new Error(made.reason);
    expect(made.edge.curve.value[0]).toBe(0);
    expect(made.edge.noiseOrigin).toBe("found");
    expect(Math.abs(made.edge.noise / 0.01 - 1)).toBeLessThan(0.3);
    for (const at of [0.3, 0.8, 1.2]) {
      const place = cubicAt(made.edge.curve, at);
      expect(place.ok && Math.abs(place.value - Math.sin(at))).toBeLessThan(0.01);
    }
  });
  it("names the argument its caller knows", () => {
    expect(edgeCurve(of(0, 1, 1), of(1, 1, 1))).toMatchObject({ reason: "not rising", argument: "x", row: 3 });
    expect(edgeCurve(of(0, 1), of(1, 1, 1))).toMatchObject({ reason: "lengths differ", argument: "ue" });
    expect(edgeCurve(of(0, 1, 2), of(1, 1, 1), { fit: "smooth" })).toMatchObject({ reason: "too few points" });
    expect(edgeCurve(of(0, 1e-300, 2e-300), of(1, 1e300, 1))).toMatchObject({ ok: false, reason: "not finite", argument: "ue" });
  });
});

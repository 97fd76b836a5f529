import fc from "fast-check";
import { frictionDrag } from "../../../src/cells/drag/friction-drag";
import { rakeDrag } from "../../../src/cells/drag/rake-drag";
import { wakeDrag } from "../../../src/cells/drag/wake-drag";

const none = {} as CustomFunctions.Invocation;
const column = (values: readonly unknown[]) => values.map((v) => [v]);
const call = (f: unknown, ...given: unknown[]) => (f as (...args: unknown[]) => unknown)(...given, none);

describe("FRICTION_DRAG", () => {
  const x = [0, 0.25, 0.5, 0.75, 1];
  const cf = ["", 0.004, 0.003, 0.0025, 0.0022];
  const ue = [10, 10, 10, 10, 10];
  it("refers to the chord given, or to the length of the wall", () => {
    const whole = call(frictionDrag, column(x), column(cf), column(ue), 10, null, null) as number;
    expect((call(frictionDrag, column(x), column(cf), column(ue), 10, 2, null) as number) * 2).toBeCloseTo(whole, 15);
    expect(call(frictionDrag, column(x), column(cf), column(ue), 20, null, null)).toBeCloseTo(whole / 4, 15);
  });
  it("counts the component along the stream", () => {
    expect(call(frictionDrag, column(x), column(cf), column(ue), 10, null, column(x.map((s) => 0.5 * s)))).toBeCloseTo((call(frictionDrag, column(x), column(cf), column(ue), 10, null, null) as number) / 2, 12);
  });
  it.each([
    ["a gap inside", x, ["", 0.004, "", 0.0025, 0.0022], ue, 10, "row 3"],
    ["no reference speed", x, cf, ue, null, "needs reference_speed"],
    ["falling stations", [0, 0.5, 0.25, 0.75, 1], cf, ue, 10, "rising x"],
    ["a column too short", x, cf, [10, 10], 10, "equal length"],
    ["text in cf", x, ["", "much", 0.003, 0.0025, 0.0022], ue, 10, "row 2"],
  ])("refuses %s", (_what, a, b, c, u, words) => {
    expect(() => call(frictionDrag, column(a), column(b), column(c), u, null, null)).toThrow(words);
  });
});

describe("WAKE_DRAG", () => {
  it("gives a row a side; thicker, fuller of wake or faster at the tail means more drag", () => {
    expect(call(wakeDrag, column([0.003, 0.002]), column([1.8, 1.5]), column([0.95, 0.95]), null, null)).toHaveLength(2);
    fc.assert(
      fc.property(fc.double({ min: 1e-5, max: 0.1, noNaN: true }), fc.double({ min: 1.2, max: 2.6, noNaN: true }), fc.double({ min: 0.7, max: 0.99, noNaN: true }), fc.double({ min: 0, max: 0.8, noNaN: true }), (theta, h, ratio, mach) => {
        const cd = (t: number, s: number, r: number) => (call(wakeDrag, [[t]], [[s]], [[r]], mach, 1) as number[][])[0]![0]!;
        expect(cd(2 * theta, h, ratio) / cd(theta, h, ratio)).toBeCloseTo(2, 10);
        expect(cd(theta, h, ratio)).toBeLessThan(2.3 * theta);
        // A slower tail has more loss ahead of it to give back: the same θ stands for less drag.
        expect(cd(theta, h, ratio * 0.98)).toBeLessThan(cd(theta, h, ratio));
        expect(cd(theta, h + 0.1, ratio)).toBeLessThan(cd(theta, h, ratio));
      }),
    );
  });
  it.each([
    [[0.003], [3.2], [0.95], "row 1 has 3.2"],
    [[-0.1], [1.5], [0.95], "theta of 0 or more"],
    [[0.003, 0.002], [1.5], [0.95, 0.95], "equal length"],
    [[0.003], [1.5], [0], "edge_speed_ratio above 0"],
  ])("refuses %p %p %p", (theta, shape, ratio, words) => {
    expect(() => call(wakeDrag, column(theta), column(shape), column(ratio), null, null)).toThrow(words);
  });
});

describe("RAKE_DRAG", () => {
  const y = [-3, -2, -1, 0, 1, 2, 3];
  const u = [1, 1, 0.9, 0.8, 0.9, 1, 1];
  it("spills both formulas with their uncertainty and says where the static pressure came from", () => {
    const table = call(rakeDrag, column(y), column(u), null, null, 10, 0.01, 0.05, 0.005) as unknown[][];
    expect(table[0]).toEqual(["quantity", "value", "±"]);
    // ∫ u(1 − u) dy by the trapezium rule: 2·0.09·1 + 0.16·1 = 0.34; cd = 2·0.34∕10.
    expect(table[1]![1]).toBeCloseTo(0.068, 12);
    expect(table[1]![2] as number).toBeGreaterThan(0);
    expect(table.at(-1)![1]).toContain("static pressure found from the two ends");
    const total = call(rakeDrag, column(y), column(u.map((v) => v * v)), "total pressure", 0, 10, null, null, null) as unknown[][];
    expect(total[1]![1]).toBeCloseTo(0.068, 12);
  });
  it.each([
    [y, [0.8, 1, 0.9, 0.8, 0.9, 1, 1], null, 0, "row 1 has 0.64"],
    [y, u, "total pressure", null, "static pressure coefficient at the rake beside total pressures; none is given"],
    [y, u, "pitot", null, "needs kind to be speed or total pressure"],
    [[-3, -2, -2, 0, 1, 2, 3], u, null, null, "rising y"],
    [y, u, null, 1.2, "static_pressure"],
    [y, [1, 1, "", 0.8, 0.9, 1, 1], null, null, "row 3"],
  ])("refuses %p %p %p %p", (places, values, kind, pressure, words) => {
    expect(() => call(rakeDrag, column(places), column(values), kind, pressure, null, null, null, null)).toThrow(words as string);
  });
});

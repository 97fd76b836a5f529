import fc from "fast-check";
import { thwaitesMarch } from "../../../src/cells/laminar/thwaites-march";
import { columnOf } from "../../../src/cells/sheet/column-of";
import { notesOf } from "../../../src/cells/sheet/notes-of";

const none = {} as CustomFunctions.Invocation;
const column = (...v: unknown[]): never[][] => v.map((cell) => [cell as never]);
const march = (x: never[][], ue: never[][], nu: unknown = 1, options: unknown = null, radius: unknown = null): (number | string)[][] =>
  thwaitesMarch(x, ue, nu, options as never, radius as never, none);
const howarth = Array.from({ length: 15 }, (_, i) => i / 100);

describe("THWAITES_MARCH", () => {
  test("spills the heading vocabulary in its order, a row a station", () => {
    const table = march(column(...howarth), column(...howarth.map((x) => 1 - x)));
    expect(table[0]).toEqual([
      "station x", "edge speed ue", "momentum loss θ", "defect thickness δ*", "energy loss δ3", "shape factor H", "wall friction cf", "Re θ", "gradient λ",
      "mass defect m", "blow velocity dm/dx", "state", "note",
    ]);
    expect(table).toHaveLength(16);
    expect(table.every((row) => row.length === 13)).toBe(true);
  });
  test("keeps what has no finite value at a leading edge empty: cf and dm/dx", () => {
    const table = march(column(...howarth), column(...howarth.map((x) => 1 - x)));
    expect(table[1]!.slice(0, 4)).toEqual([0, 1, 0, 0]);
    expect(table[1]![6]).toBe("");
    expect(table[1]![10]).toBe("");
    expect(table[2]!.slice(0, 11).every((cell) => typeof cell === "number")).toBe(true);
  });
  test("leaves numbers empty beyond separation and names its station, 1 − 2.2^(−1/6) for 1 − x, in state and note", () => {
    const table = march(column(...howarth), column(...howarth.map((x) => 1 - x)));
    // stations 0.13 and 0.14 lie beyond 0.123141
    for (const row of table.slice(14)) {
      expect(row.slice(2, 11).every((cell) => cell === "")).toBe(true);
      expect(typeof row[0] === "number" && typeof row[1] === "number").toBe(true);
      expect(row[11]).toBe("separated");
    }
    expect(table[13]![11]).toBe("laminar");
    expect(table[14]![12]).toBe("laminar separation at x = 0.123141, momentum loss 0.3");
    expect(table[15]![12]).toBe("");
  });
  test("reports the settings used, defaults included, in the first row's note", () => {
    const table = march(column(0, 1, 2), column(0, 1, 2));
    expect(table[1]![12]).toBe("Thwaites, plane wall; edge fit = spline; after separation = stop; starts at a stagnation point");
    const given = march(column(0, 1, 2), column(1, 1, 1), 1, "start momentum loss = 0.1; edge fit = monotone");
    expect(given[1]![12]).toContain("start momentum loss = 0.1; edge fit = monotone; after separation = stop; starts from a given momentum loss");
    expect(notesOf(given, none)[0]![0]).toContain("at 0: Thwaites");
  });
  test("takes options as a block and orders columns as wished", () => {
    const table = march(column(0, 1, 2), column(1, 1, 1), 1, [["Columns", "state, θ, station"], ["after separation", "continue"]]);
    expect(table[0]).toEqual(["state", "momentum loss θ", "station x"]);
    expect(table[2]![1]).toBeCloseTo(Math.sqrt(0.45), 14);
  });
  test("continues θ, Re θ and λ alone when asked", () => {
    const table = march(column(...howarth), column(...howarth.map((x) => 1 - x)), 1, "after separation = continue");
    expect(table[15]![2]).toBeCloseTo(Math.sqrt(0.075 * (0.86 ** -6 - 1)), 10);
    expect(table[15]!.map((cell) => cell === "")).toEqual([false, false, false, true, true, true, true, false, false, true, true, false, true]);
  });
  test("makes a cone's θ the plate's over √3 with a radius column (Mangler)", () => {
    const plate = columnOf(march(column(0, 1, 2), column(1, 1, 1)), "θ", none);
    const cone = columnOf(march(column(0, 1, 2), column(1, 1, 1), 1, null, column(0, 0.5, 1)), "θ", none);
    expect(cone[2]![0] / plate[2]![0]).toBeCloseTo(1 / Math.sqrt(3), 12);
  });
  test("says which λ ends a march at the upper end of the range, and separation in the first row", () => {
    const x = Array.from({ length: 20 }, (_, i) => i / 20);
    const steep = march(column(...x), column(...x.map((s) => 1 + 20 * s * s)), 1, "start momentum loss = 0.5");
    const row = steep.findIndex((r) => r[11] === "out of range");
    expect(steep[row]![12]).toMatch(/^gradient λ reaches 0\.25, the end of the method's range, at x = 0\.0/);
    const thick = march(column(...howarth), column(...howarth.map((s) => 1 - s)), 1, "start momentum loss = 1");
    expect(thick[1]![12]).toMatch(/momentum loss; laminar separation at x = 0, momentum loss 1$/);
  });
  test("smooths a noisy edge speed and names the noise it found", () => {
    const x = Array.from({ length: 40 }, (_, i) => i / 40);
    const table = march(column(...x), column(...x.map((s, i) => 1 + s / 2 + 0.01 * Math.sin(37 * i * i))), 1e-5, "edge fit = smooth");
    expect(table[1]![12]).toMatch(/edge fit = smooth; after separation = stop; noise found 0\.00[5-9]\d*; starts at a leading edge$/);
  });
  test.each<[never[][], never[][], unknown, unknown, unknown, string]>([
    [column(0, 1, 1), column(1, 1, 1), 1, null, null, "THWAITES_MARCH needs rising x; row 3 repeats 1"],
    [column(0, 1, 2), column(1, 0, 1), 1, null, null, "THWAITES_MARCH needs ue above 0; row 2 has 0"],
    [column(0, 1, 2), column(1, -1, 1), 1, null, null, "THWAITES_MARCH needs ue above 0; row 2 has -1"],
    [column(0, 1, 2), column(0, 0.1, 2), 1, null, null, "THWAITES_MARCH needs an edge speed that rises linearly from a start at 0; row 1"],
    [column(0, 1, 2, 3, 4, 5), column(10, 9, 0.1, 0.1, 9, 10), 1, null, null, "row 3 starts a step where the fitted curve dips to 0 or below; add a station there or set edge fit = monotone"],
    [column(0, 1, 2), column(1, 1, 1), 0, null, null, "THWAITES_MARCH needs nu above 0; it has 0"],
    [column(0, 1, 2), column(1, 1), 1, null, null, "THWAITES_MARCH needs columns of equal length; ue has 2 rows where 3 are expected"],
    [column(0, 1, 2), column(0, 1, 2), 1, "start momentum loss = 1", null, "THWAITES_MARCH needs no start momentum loss where the layer's start is fixed; row 1"],
    [column(0, 1, 2), column(1, 1, 1), 1, "onset = 1", null, 'THWAITES_MARCH needs options it knows; the text has "onset", nearest is "'],
    [column(0, 1, 2), column(1, 1, 1), 1, "edge fit = splin", null, "nearest is spline"],
    [column(0, 1, 2), column(1, 1, 1), 1, "noise = 1", null, "THWAITES_MARCH needs edge fit = smooth where the option noise is given; it has spline"],
    [column(0, 1, 2), column(1, 1, 1), 1, "columns = N", null, "THWAITES_MARCH needs columns it gives; it has no amplification"],
    [column(0, 1, 2), column(1, 1, 1), 1, null, column(1, 0, 1), "THWAITES_MARCH needs radius above 0; row 2"],
    [column(0, 1, 2), column(1, 1, "x"), 1, null, null, 'THWAITES_MARCH needs numbers in ue; row 3 holds the text "x"'],
  ])("refuses %j, %j, %j, %j, %j with a sentence", (x, ue, nu, options, radius, sentence) => {
    expect(() => march(x, ue, nu, options, radius)).toThrow(sentence);
  });
  test("spills only numbers and words, or one sentence, for any columns of numbers", () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.double({ min: 1e-3, max: 1, noNaN: true }), fc.double({ min: -0.1, max: 5, noNaN: true })), { minLength: 1, maxLength: 20 }),
        fc.double({ min: 1e-7, max: 1, noNaN: true }),
        fc.constantFrom("edge fit = spline", "edge fit = monotone", "edge fit = smooth", "after separation = continue"),
        (rows, nu, options) => {
          let sum = 0;
          try {
            const table = march(column(...rows.map(([h]) => (sum += h))), column(...rows.map(([, u]) => Math.max(u, 0))), nu, options);
            expect(table).toHaveLength(rows.length + 1);
            for (const cell of table.flat()) expect(typeof cell === "string" || Number.isFinite(cell)).toBe(true);
          } catch (error) {
            expect((error as Error).message).toMatch(/^THWAITES_MARCH needs /);
          }
        },
      ),
    );
  });
});

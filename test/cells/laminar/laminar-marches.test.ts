import fc from "fast-check";
import { columnOf } from "../../../src/cells/sheet/column-of";
import { energyMarch } from "../../../src/cells/laminar/energy-march";
import { fieldMarch } from "../../../src/cells/laminar/field-march";
import { fieldProfile } from "../../../src/cells/laminar/field-profile";
import { similarLayer } from "../../../src/cells/laminar/similar-layer";
import { similarProfile } from "../../../src/cells/laminar/similar-profile";
import { thwaitesMarch } from "../../../src/cells/laminar/thwaites-march";

const none = {} as CustomFunctions.Invocation;
const column = (values: readonly unknown[]) => values.map((v) => [v]);
const x = Array.from({ length: 15 }, (_, i) => i / 70);
const falling = x.map((s) => 1 - s);
const absent = null as never;

type March = typeof fieldMarch;
const march = (f: March, xs: readonly unknown[], ue: readonly unknown[], options: unknown = null, radius: unknown = null, blown: unknown = null, nu: unknown = 1) =>
  f(column(xs), column(ue), nu, options as never, radius as never, blown as never, none);
const noteOf = (table: unknown[][]) => columnOf(table as never, "note", none).flat().join(" | ");

describe("the three laminar marches", () => {
  const tables = {
    thwaites: thwaitesMarch(column(x), column(falling), 1, absent, absent, none),
    energy: march(energyMarch, x, falling),
    field: march(fieldMarch, x, falling),
  };
  it("share one heading row and one shape", () => {
    for (const table of Object.values(tables)) {
      expect(table[0]).toEqual(tables.thwaites[0]);
      expect(table).toHaveLength(16);
    }
  });
  it("take the same options block; what only a grid has is the field march's own", () => {
    const options = [["start momentum loss", 0.05], ["edge fit", "monotone"], ["after separation", "stop"], ["columns", "θ, H, state"]];
    for (const f of [energyMarch, fieldMarch]) expect(march(f, x, falling, options)[0]).toEqual(["momentum loss θ", "shape factor H", "state"]);
    expect(thwaitesMarch(column(x), column(falling), 1, options as never, absent, none)[0]).toEqual(["momentum loss θ", "shape factor H", "state"]);
    expect(noteOf(march(fieldMarch, x, falling, "Richardson = yes; grid refinement = 2"))).toMatch(/Richardson = yes; Richardson changed θ and δ\* by at most [\d.e-]+ %/);
    expect(() => march(energyMarch, x, falling, "Richardson = yes")).toThrow('ENERGY_MARCH needs options it knows; the text has "Richardson", nearest is');
  });
  it("stop at separation with words, blank numbers beyond and the station where it lies", () => {
    for (const [table, station] of [[tables.energy, /laminar separation at x = 0\.119\d+, momentum loss 0\.29/], [tables.field, /laminar separation at x = 0\.1197\d+, by the square-root law/]] as const) {
      expect(noteOf(table)).toMatch(station);
      expect(table[10]![2]).toBe("");
      expect(columnOf(table as never, "state", none).flat().slice(7, 11)).toEqual(["laminar", "laminar", "separated", "separated"]);
    }
    expect(march(energyMarch, x, falling, "after separation = continue")[12]![2]).toBeGreaterThan(0.3);
  });
  it("say how they started and that fluid passes the wall", () => {
    const note = noteOf(march(fieldMarch, x, falling, null, null, column(x.map(() => -0.5))));
    expect(note).toContain("full boundary-layer equations, plane wall with flow through it; ");
    expect(note).toContain("starts at a leading edge");
    expect(noteOf(march(energyMarch, x, x.map((s) => 1.5 * Math.sin(s)), null, column(x.map(Math.sin))))).toContain("round body; edge fit = spline; after separation = stop; starts at a stagnation point");
  });
  it("say where blowing lifts the layer off", () => {
    const xs = Array.from({ length: 41 }, (_, i) => i / 40);
    expect(noteOf(march(fieldMarch, xs, xs.map(() => 1), null, null, column(xs.map(() => 1))))).toMatch(/blowing lifts the layer off the wall at x = 0\.74/);
    expect(noteOf(march(energyMarch, xs, xs.map(() => 1), null, null, column(xs.map(() => 1))))).toContain("wall flow or acceleration reaches the end of the method's range at x = 0.3");
  });
});

describe.each<[string, March]>([["ENERGY_MARCH", energyMarch], ["FIELD_MARCH", fieldMarch]])("%s refuses with a sentence", (name, f) => {
  it.each<[string, readonly unknown[], readonly unknown[], unknown, unknown, unknown, unknown, string]>([
    ["stations that repeat", [0, 1, 1], [1, 1, 1], null, null, null, 1, "needs rising x; row 3 repeats 1"],
    ["text among the speeds", [0, 1, 2], [1, "fast", 1], null, null, null, 1, 'needs numbers in ue; row 2 holds the text "fast"'],
    ["a speed of 0 inside", [0, 1, 2], [1, 0, 1], null, null, null, 1, "needs ue above 0; row 2 has 0"],
    ["no viscosity", [0, 1, 2], [1, 1, 1], null, null, null, null, "needs nu; it is missing or blank"],
    ["a wall velocity column that is too short", [0, 1, 2], [1, 1, 1], null, null, [[0.1], [0.1]], 1, "needs columns of equal length; wall_velocity has 2 rows where 3 are expected"],
    ["text as a wall velocity", [0, 1, 2], [1, 1, 1], null, null, [[0], ["slot"], [0]], 1, 'needs numbers in wall_velocity; row 2 holds the text "slot"'],
    ["a start θ at a stagnation point", [0, 1, 2], [0, 1, 2], "start momentum loss = 0.1", null, null, 1, name],
    ["a start shape alone", [0, 1, 2], [1, 1, 1], "start shape = 2.6", null, null, 1, "needs a start momentum loss beside the start shape; none is given"],
    ["a start shape no similar layer has", [0, 1, 2], [1, 1, 1], "start momentum loss = 0.1; start shape = 5", null, null, 1, "needs start shape between 2."],
    ["a start that has separated", [0, 1, 2], [2, 1, 0.5], "start momentum loss = 1", null, null, 1, "needs start momentum loss (as λ) between -0.068"],
    ["noise without a smooth fit", [0, 1, 2], [1, 1, 1], "noise = 0.1", null, null, 1, "needs edge fit = smooth where the option noise is given; it has spline"],
  ])("%s", (_what, xs, ue, options, radius, blown, nu, sentence) => {
    expect(() => march(f, xs, ue, options, radius, blown, nu)).toThrow(sentence);
    expect(() => march(f, xs, ue, options, radius, blown, nu)).toThrow(new RegExp(`^${name} needs `));
  });
  it("whatever the cells hold, gives plain cells or a sentence", () => {
    const cell = fc.oneof(fc.double(), fc.double({ min: 0, max: 2, noNaN: true }), fc.string(), fc.constantFrom(null, "", 0, 1, { code: "#N/A" }));
    fc.assert(
      fc.property(fc.array(cell, { maxLength: 6 }), fc.array(cell, { maxLength: 6 }), fc.array(cell, { maxLength: 6 }), cell, (a, b, c, nu) => {
        try {
          for (const row of march(f, a, b, null, null, column(c), nu)) for (const v of row) expect(typeof v === "number" ? Number.isFinite(v) : typeof v).toBeTruthy();
        } catch (error) {
          expect((error as Error).message).toMatch(new RegExp(`^${name} needs `));
        }
      }),
      { numRuns: 60 },
    );
  });
});

describe("sentences of the field march alone", () => {
  it("blowing that lifts the layer off its stagnation point", () => {
    const run = () => march(fieldMarch, [0, 1, 2], [0, 1, 2], null, null, [[90], [90], [90]]);
    expect(run).toThrow("FIELD_MARCH needs wall_velocity that leaves the layer on the wall; row 1 blows strongly enough to lift it off");
    expect(run).toThrow(expect.objectContaining({ code: "#N/A" }));
    expect(() => march(energyMarch, [0, 1, 2], [0, 1, 2], null, null, [[90], [90], [90]])).toThrow("ENERGY_MARCH needs wall_velocity (as vw θ∕ν) between -1 and 0.6; row 1 has ");
  });
  it("a grid finer than offered, or not whole", () => {
    expect(() => march(fieldMarch, x, falling, "grid refinement = 9")).toThrow("FIELD_MARCH needs grid refinement between 1 and 8; it has 9");
    expect(() => march(fieldMarch, x, falling, "grid refinement = 1.5")).toThrow("FIELD_MARCH needs grid refinement between 1 and 8; it has 1.5");
  });
});

describe("FIELD_PROFILE", () => {
  it("spills height, speed, ratio and gradient from wall to free stream", () => {
    const table = fieldProfile(column(x), column(falling), 1, 0.05, absent, absent, absent, none);
    expect(table[0]).toEqual(["height y", "speed u", "speed ratio u/ue", "speed gradient ∂u/∂y"]);
    expect(table[1]!.slice(0, 3)).toEqual([0, 0, 0]);
    expect(table.at(-1)![2]).toBe(1);
    expect(table.at(-1)![1]).toBeCloseTo(0.95, 9);
  });
  it("refuses a station beyond separation, naming where the layer ends", () => {
    expect(() => fieldProfile(column(x), column(falling), 1, 0.15, absent, absent, absent, none)).toThrow(/^FIELD_PROFILE needs station inside the column, 0 to 0\.1197\d*; it asks for 0\.15, and nothing is extrapolated$/);
  });
});

describe("SIMILAR_LAYER and SIMILAR_PROFILE", () => {
  it("give a table, or one quantity by its word", () => {
    const table = similarLayer(0, null, null, null, none);
    expect(table[0]).toEqual(["quantity", "value"]);
    const value = (words: string) => table.find((row) => row[0] === words)![1];
    expect(value("wall friction cf·√Rex")).toBeCloseTo(0.664115, 6);
    expect(value("defect thickness δ*/x·√Rex")).toBeCloseTo(1.720788, 6);
    expect(similarLayer(0, "Momentum loss", null, null, none)[0]![0]).toBeCloseTo(0.664115, 6);
    expect(similarLayer(-0.05, "wall shear", "reversed", null, none)[0]![0]).toBeLessThan(0);
  });
  it("give the Blasius profile at the heights asked for (u∕ue = 0.62977 at η = 2, 0.95552 at 4; Howarth 1938)", () => {
    const table = similarProfile(0, column([2, 4, 40]), null, null, none);
    expect(table.slice(1).map((row) => row[1])).toEqual([expect.closeTo(0.62977, 5), expect.closeTo(0.95552, 5), 1]);
    expect(similarProfile(1, absent, null, null, none)).toHaveLength(42);
  });
  it.each<[string, () => unknown, string]>([
    ["an exponent below separation", () => similarLayer(-0.1, null, null, null, none), "SIMILAR_LAYER needs m of at least -0.0904286, below which no similar layer exists; it has -0.1"],
    ["a reversed layer of an accelerating flow", () => similarLayer(0.2, null, "reversed", null, none), "SIMILAR_LAYER needs m between -0.0904286 and -0.001 for the reversed branch; it has 0.2"],
    ["blowing that lifts the layer off", () => similarLayer(0, null, null, 0.7, none), "SIMILAR_LAYER needs wall_velocity that leaves the layer on the wall; it blows strongly enough to lift it off"],
    ["a quantity it does not know", () => similarLayer(0, "theta", null, null, none), 'SIMILAR_LAYER needs what to be wall shear, friction,'],
    ["a branch it does not know", () => similarProfile(0, absent, "lower", null, none), "SIMILAR_PROFILE needs branch to be attached or reversed"],
    ["heights below the wall", () => similarProfile(0, column([-1]), null, null, none), "SIMILAR_PROFILE needs eta of 0 or more; row 1 has -1"],
    ["no exponent", () => similarProfile(null, absent, null, null, none), "SIMILAR_PROFILE needs m; it is missing or blank"],
  ])("refuse %s", (_what, run, sentence) => {
    expect(run).toThrow(sentence);
  });
});

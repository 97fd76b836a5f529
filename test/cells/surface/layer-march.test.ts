import { columnOf } from "../../../src/cells/sheet/column-of";
import { fieldMarch } from "../../../src/cells/laminar/field-march";
import { layerMarch } from "../../../src/cells/surface/layer-march";
import { layerSummary } from "../../../src/cells/surface/layer-summary";

const none = {} as CustomFunctions.Invocation;
const column = (values: readonly unknown[]) => values.map((v) => [v]);
const x = Array.from({ length: 41 }, (_, i) => i / 40);
const flat = x.map(() => 30);
const absent = null as never;
const march = (ue: readonly unknown[], options: unknown = null, nu = 3e-6) => layerMarch(column(x), column(ue), nu, options as never, absent, none);
const noteOf = (table: unknown[][]) => columnOf(table as never, "note", none).flat().join(" | ");
const stateOf = (table: unknown[][]) => columnOf(table as never, "state", none).flat();
const summary = (table: unknown[][], ...more: unknown[]) => new Map((layerSummary as (...args: unknown[]) => [string, unknown][])(table, more[0] ?? null, more[1] ?? null, none));

describe("LAYER_MARCH", () => {
  it("tells state, settings with defaults, and the onset in its row", () => {
    const table = march(flat);
    const states = stateOf(table);
    expect(states[0]).toBe("laminar");
    expect(states.at(-1)).toBe("turbulent");
    const note = noteOf(table);
    expect(note).toContain("whole layer, plane wall; onset = free; onset criterion = Michel; transition zone = none; laminar method = Thwaites; turbulent method = lag; edge fit = spline; after separation = stop; starts at a leading edge");
    const at = Number(/onset \(free\) at x = ([\d.]+)/.exec(note)![1]);
    // 2.9 Rex^0.4 = √0.45 √Rex: Rex = (2.9∕√0.45)^10 = 2.28e6.
    expect((at * 30) / 3e-6 / (2.9 / Math.sqrt(0.45)) ** 10).toBeCloseTo(1, 2);
    expect(states[Math.floor(at * 40)]).toBe("laminar");
    expect(states[Math.ceil(at * 40)]).toBe("turbulent");
  });
  it("takes an onset as a station, from the start, or none; a trip's loss; a zone", () => {
    expect(noteOf(march(flat, "onset = 0.3"))).toContain("onset (fixed) at x = 0.3");
    expect(noteOf(march(flat, "onset = from start"))).toContain("onset (from start) at x = 0");
    expect(new Set(stateOf(march(flat, "onset = none")))).toEqual(new Set(["laminar"]));
    expect(march(flat, "onset = 0.3; trip momentum loss = 0.0005").at(-1)![2] as number).toBeGreaterThan(march(flat, "onset = 0.3").at(-1)![2] as number);
    expect(stateOf(march(flat, "onset = 0.3; transition zone = Dhawan-Narasimha"))).toContain("transition");
    expect(noteOf(march(flat, "onset = 0.01"))).toContain("below Re θ 320 a trip may not hold");
  });
  it("warns of a bubble, names its length, and of laminar separation that finds no reattachment", () => {
    const falling = x.map((s) => 30 - 20 * s);
    const note = noteOf(march(falling, null, 4e-5));
    expect(note).toMatch(/laminar separation at x = [\d.]+; WARNING bubble/);
    expect(note).toMatch(/WARNING bubble: turbulent from x = [\d.]+, reattaches at x = [\d.]+, θ [\d.e-]+ to [\d.e-]+ \(Horton\)/);
    expect(stateOf(march(falling, null, 4e-5))).toContain("bubble");
    expect(noteOf(march(falling, null, 1e-3))).toContain("WARNING no short bubble closes on this wall (Horton)");
    expect(noteOf(march(falling, "onset = 0.9", 4e-5))).toContain("ahead of the fixed onset at 0.9");
  });
  it.each([
    ["onset = 3", "needs an onset station inside the column, 0 to 1; it has 3"],
    ["onset = free; trip momentum loss = 1", "needs onset = a station where trip momentum loss is given; it has free"],
    ["onset = 0.5; onset criterion = Michel", "needs onset = free where an onset criterion is given; it has 0.5"],
    ["onset criterion = Nobody", "nearest is Michel"],
    ["turbulent method = field", "for the full equations use FIELD_MARCH with the same onset"],
    ["turbulent method = entrainment; reference Mach = 0.3; reference speed = 30", "needs turbulent method = lag where reference Mach is given"],
    ["onset = sideways", "from start"],
    ["transition zone = long", "Dhawan-Narasimha"],
    ["turbulence level = 3", "(write 3% for 0.03)"],
    ["start shape = 2.5; laminar method = energy", "a start momentum loss beside the start shape"],
  ])("refuses %s in words", (options, words) => {
    expect(() => march(flat, options)).toThrow(words);
  });
  it("gives only the columns asked for, in their order", () => {
    expect(march(flat, "columns = cf, θ, state")[0]).toEqual(["wall friction cf", "momentum loss θ", "state"]);
  });
});

describe("FIELD_MARCH with an onset", () => {
  it("agrees with LAYER_MARCH within 5 % on θ and cf of a plate and says how it did it", () => {
    const table = fieldMarch(column(x), column(flat), 3e-6, "onset = 0.2" as never, absent, absent, none);
    const other = march(flat, "onset = 0.2; laminar method = energy");
    for (const row of [15, 25, 41]) for (const key of ["momentum loss θ", "wall friction cf"]) {
      const at = (t: unknown[][]) => t[row]![t[0]!.indexOf(key)] as number;
      expect(Math.abs(at(table) / at(other) - 1)).toBeLessThan(0.05);
    }
    expect(noteOf(table)).toContain("eddy viscosity of Cebeci and Smith from the onset");
    expect(stateOf(table).slice(0, 9).every((s) => s === "laminar")).toBe(true);
    expect(stateOf(table).at(-1)).toBe("turbulent");
  });
  it("refuses flow through the wall and Richardson's extrapolation with it", () => {
    expect(() => fieldMarch(column(x), column(flat), 3e-6, "onset = 0.2" as never, absent, column(x.map(() => -0.01)) as never, none)).toThrow("needs a solid wall where an onset is given");
    expect(() => fieldMarch(column(x), column(flat), 3e-6, "onset = 0.2; Richardson = yes" as never, absent, absent, none)).toThrow("needs Richardson = no where an onset is given");
  });
});

describe("LAYER_SUMMARY", () => {
  it("of a plate: onset, end values, and a friction drag of 2 θ over the length within 0.7 %", () => {
    const table = march(flat);
    const of = summary(table, 30);
    expect(of.get("onset by")).toBe("free");
    expect(of.get("last station described")).toBe(1);
    expect(of.get("momentum loss θ there")).toBe(table.at(-1)![2]);
    expect(Math.abs((of.get("friction drag coefficient of the side") as number) / (2 * (table.at(-1)![2] as number)) - 1)).toBeLessThan(0.007);
    expect(of.get("its station") as number).toBeGreaterThan(of.get("onset station") as number);
    expect(of.get("method and settings")).toContain("whole layer");
  });
  it("of a layer that separates: both stations, and the last one described", () => {
    const of = summary(march(x.map((s) => 30 - 20 * s), null, 4e-5), 30);
    expect(of.get("laminar separation station") as number).toBeLessThan(of.get("reattachment station") as number);
    expect(of.get("turbulent separation station") as number).toBeGreaterThan(of.get("last station described") as number);
  });
  it("without a reference speed it gives the force over ½ρ", () => {
    const table = march(flat);
    expect((summary(table).get("friction force of the side over ½ρ") as number) / 900).toBeCloseTo(summary(table, 30).get("friction drag coefficient of the side") as number, 12);
  });
  it.each([
    [[["station x"], [1], [2]], "it has no edge speed column"],
    [[["a", "b"], [1, 2], [2, 3]], "it has no station column"],
    [[["station x", "edge speed ue"]], "at least two stations"],
  ])("refuses %p", (table, words) => {
    expect(() => summary(table as unknown[][])).toThrow(words as string);
  });
  it("refuses a table that holds an error, with its row", () => {
    const table = march(flat);
    table[4]![2] = { code: "#DIV/0!" } as never;
    expect(() => summary(table)).toThrow(/row 5 of momentum loss/);
  });
});

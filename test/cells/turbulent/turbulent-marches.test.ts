import { columnOf } from "../../../src/cells/sheet/column-of";
import { energyMarch } from "../../../src/cells/laminar/energy-march";
import { entrainmentMarch } from "../../../src/cells/turbulent/entrainment-march";
import { lagMarch } from "../../../src/cells/turbulent/lag-march";
import { separationMargin } from "../../../src/cells/turbulent/separation-margin";

const none = {} as CustomFunctions.Invocation;
const addresses = { parameterAddresses: ["Sheet1!A5:A20", "Sheet1!B5:B20", "Sheet1!D1"] } as CustomFunctions.Invocation;
const column = (values: readonly unknown[]) => values.map((v) => [v]);
const x = Array.from({ length: 16 }, (_, i) => i / 10);
const falling = x.map((s) => 30 - 9 * s);
const absent = null as never;
const START = "start momentum loss = 0.002; start shape = 1.4";

type March = typeof lagMarch;
const march = (f: March, ue: readonly unknown[], options: unknown = START, radius: unknown = null, nu: unknown = 1.5e-5) => f(column(x), column(ue), nu, options as never, radius as never, none);
const noteOf = (table: unknown[][]) => columnOf(table as never, "note", none).flat().join(" | ");
const stateOf = (table: unknown[][]) => columnOf(table as never, "state", none).flat();
const both: readonly (readonly [string, March])[] = [["ENTRAINMENT_MARCH", entrainmentMarch], ["LAG_MARCH", lagMarch]];

describe.each(both)("%s", (name, f) => {
  it("spills the heading set with layer height, entrainment and intermittency, a row a station", () => {
    const table = march(f, x.map(() => 30));
    expect(table[0]).toEqual([
      "station x", "edge speed ue", "momentum loss θ", "defect thickness δ*", "energy loss δ3", "shape factor H", "layer height δ", "wall friction cf", "Re θ", "gradient λ", "mass defect m", "blow velocity dm/dx", "entrainment CE",
      "intermittency γ", "state", "note",
    ]);
    expect(table).toHaveLength(17);
    expect(new Set(stateOf(table))).toEqual(new Set(["turbulent"]));
    expect(noteOf(table)).toContain("starts from a given momentum loss, start shape 1.4");
  });
  it("stops at separation with its station in the note, empty numbers beyond, and carries on when told", () => {
    const table = march(f, falling);
    expect(noteOf(table)).toMatch(/turbulent separation at x = \d\.\d+, momentum loss 0\.0\d+/);
    expect(stateOf(table).at(-1)).toBe("separated");
    expect(table.at(-1)![2]).toBe("");
    const last = stateOf(table).lastIndexOf("turbulent");
    expect(typeof march(f, falling, `${START}; after separation = continue`)[last + 2]![2]).toBe("number");
  });
  it("takes Re θ as a start, and H after an onset by name or left out", () => {
    const byLoss = march(f, x.map(() => 30), "start momentum loss = 0.002");
    expect(march(f, x.map(() => 30), "start Re theta = 4000")[1]![2]).toBeCloseTo(0.002, 12);
    expect(march(f, x.map(() => 30), "start momentum loss = 0.002; start shape = after onset")[5]).toEqual(byLoss[5]);
  });
  it("takes a round body", () => {
    expect(march(f, x.map(() => 30), START, column(x.map((s) => 1 + s))).at(-1)![2]).toBeLessThan(march(f, x.map(() => 30)).at(-1)![2]);
  });
  it.each([
    ["a stagnation point", [0, ...falling.slice(1)], START, "row 1 has 0 (stagnation point, where a layer is laminar); use LAYER_MARCH"],
    ["two starts", falling, "start momentum loss = 0.002; start Re theta = 500", "needs one start value; both start momentum loss and start Re theta are given"],
    ["a shape alone", falling, "start shape = 1.4", "a start momentum loss beside the start shape"],
    ["a shape below 0", falling, "start momentum loss = 0.002; start shape = -1", 'needs option "start shape" above 0; it has -1'],
    ["an unknown word", falling, "start shape = sideways", "nearest is after onset"],
    ["too little Re θ", falling, "start Re theta = 3", "start momentum loss (as Re θ) between 25 and 1000000000; it has 3"],
    ["a Re θ of no wall", falling, "start Re theta = 1e12", "start momentum loss (as Re θ) between 25 and 1000000000; it has 1000000000000"],
    ["an option of another march", falling, "onset = free", 'needs options it knows; the text has "onset"'],
    ["a gap", [30, "", ...falling.slice(2)], START, "row 2"],
    ["a negative speed", [30, -3, ...falling.slice(2)], START, "row 2"],
  ])("refuses %s in words", (_what, ue, options, words) => {
    expect(() => march(f, ue as readonly unknown[], options)).toThrow(words as string);
    expect(() => march(f, ue as readonly unknown[], options)).toThrow(name);
  });
  it("names the cell of a bad row where the host gives addresses", () => {
    expect(() => f(column(x), column([30, -3, ...falling.slice(2)]), 1.5e-5, START as never, absent, addresses)).toThrow("row 2 (B6)");
  });
});

describe("LAG_MARCH with a Mach number", () => {
  it("needs the reference speed with it, and refuses speeds beyond vacuum with their row", () => {
    expect(() => march(lagMarch, falling, `${START}; reference Mach = 0.5`)).toThrow("needs a reference speed beside the reference Mach number");
    expect(() => march(lagMarch, [30, 300, ...falling.slice(2)], `${START}; reference Mach = 0.5; reference speed = 30; edge fit = monotone`)).toThrow("row 2 has 300, beyond its expansion into vacuum");
  });
  it("leaves δ3 empty, which it does not know there, and raises H", () => {
    const plain = march(lagMarch, x.map(() => 30));
    const fast = march(lagMarch, x.map(() => 30), "start momentum loss = 0.002; reference Mach = 0.7; reference speed = 30");
    expect(fast[8]![4]).toBe("");
    expect(fast[8]![5] as number).toBeGreaterThan(plain[8]![5] as number);
  });
  it("says its start entrainment and takes one", () => {
    expect(noteOf(march(lagMarch, falling, `${START}; start entrainment = 0.03`))).toContain("start entrainment 0.03");
    expect(noteOf(march(lagMarch, falling, `${START}; start entrainment = equilibrium`))).toMatch(/start entrainment 0\.0\d+/);
  });
});

it("ENTRAINMENT_MARCH says where separation becomes possible, ahead of where it ends", () => {
  expect(noteOf(march(entrainmentMarch, falling))).toContain("H above 1.8 from here: separation is possible");
});

it("a laminar march refuses the turbulent word for its start shape", () => {
  expect(() => energyMarch(column(x), column(falling), 1e-5, "start momentum loss = 0.001; start shape = after onset" as never, absent, absent, none)).toThrow('needs a number for option "start shape"');
});

describe("SEPARATION_MARGIN", () => {
  const cp = x.map((s) => -0.2 * s + 0.2 * s * s);
  const of = (...given: unknown[]) => (separationMargin as (...args: unknown[]) => unknown[][])(column(x), column(cp), ...given);
  it("is empty ahead of the rise, 1 just behind it, and falls", () => {
    const table = of("turbulent", 30, 1.5e-5, null, null, none);
    const margin = columnOf(table as never, "margin", none).flat();
    expect(margin.slice(0, 5)).toEqual(["", "", "", "", ""]);
    expect(margin.at(-1) as number).toBeLessThan(margin[8] as number);
    expect(noteOf(table)).toContain("lowest pressure at x = 0.5");
  });
  it.each([
    [["turbulent", null, null, null, null], "needs reference_speed and nu for a turbulent layer"],
    [["turbulent", 30, null, null, null], "nu is missing"],
    [["laminar", 30, 1e-5, 0.2, null], "needs layer = turbulent where an onset is given"],
    [["sideways", 30, 1e-5, null, null], "needs layer to be turbulent or laminar"],
    [["turbulent", 30, 1e-5, 0.9, null], /onset between 0 and 0\.5/],
    [["turbulent", -30, 1e-5, null, null], "reference_speed above 0"],
  ])("refuses %p in words", (given, words) => {
    expect(() => of(...(given as unknown[]), none)).toThrow(words);
  });
  it("refuses a pressure that only falls", () => {
    expect(() => (separationMargin as (...args: unknown[]) => unknown)(column(x), column(x.map((s) => -s)), "laminar", null, null, null, null, none)).toThrow("a pressure that rises somewhere behind its lowest value");
  });
});

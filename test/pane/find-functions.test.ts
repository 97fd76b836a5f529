import type { CatalogueEntry } from "../../src/cells/catalogue-entry";
import { catalogue } from "../../src/cells/generated/catalogue";
import { findFunctions } from "../../src/pane/find-functions";

function entry(name: string, rest: Partial<CatalogueEntry> = {}): CatalogueEntry {
  return { name, family: "Laminar", purpose: "", parameters: [], gives: "", resultUnit: "", limits: [], sources: [], examples: [], words: [], ...rest };
}

const ENTRIES = [
  entry("SHAPE_FACTOR", { purpose: "Shape factor H of a measured profile.", sources: ["Schlichting & Gersten 2017"] }),
  entry("MOMENTUM_LOSS", { purpose: "Momentum loss thickness θ." }),
  entry("THWAITES_MARCH", { purpose: "Laminar layer along a wall.", parameters: [{ name: "nu", description: "Kinematic viscosity ν.", unit: "length²/time", optional: false }], sources: ["Thwaites 1949"], words: ["separation"] }),
  entry("WALL_SHEAR", { purpose: "Friction at the wall.", sources: ["Kármán 1921"], limits: ["Not near separation."] }),
];
const names = (query: string) => findFunctions(ENTRIES, query).map((e) => e.name);

describe("finding functions", () => {
  test("an empty query lists everything in the catalogue's order", () => {
    expect(names("")).toEqual(ENTRIES.map((e) => e.name));
    expect(names("   ")).toHaveLength(ENTRIES.length);
  });

  test.each([
    ["θ", ["MOMENTUM_LOSS"]],
    ["theta", ["MOMENTUM_LOSS"]],
    ["Theta Momentum", ["MOMENTUM_LOSS"]],
    ["ν", ["THWAITES_MARCH"]],
    ["thwaites march", ["THWAITES_MARCH"]],
    ["=WALL.THWAITES_MARCH(", ["THWAITES_MARCH"]],
    ["1949", ["THWAITES_MARCH"]],
    ["karman", ["WALL_SHEAR"]],
    ["gersten", ["SHAPE_FACTOR"]],
    ["nothing of the kind", []],
  ])("%s finds %j", (query, expected) => {
    expect(names(query)).toEqual(expected);
  });

  test("every word must occur", () => {
    expect(names("momentum separation")).toEqual([]);
  });

  test("a function meant for a word stands before one that only mentions it", () => {
    expect(names("separation")).toEqual(["THWAITES_MARCH", "WALL_SHEAR"]);
  });

  test("a name's beginning counts most", () => {
    expect(names("wall")[0]).toBe("WALL_SHEAR");
  });

  test("every function of the catalogue is found first by its own name, and among others by each of its words", () => {
    for (const e of catalogue) {
      expect(findFunctions(catalogue, e.name)[0]!.name).toBe(e.name);
      for (const word of e.words) expect(findFunctions(catalogue, word)).toContain(e);
    }
  });
});

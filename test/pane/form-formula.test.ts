import type { CatalogueEntry } from "../../src/cells/catalogue-entry";
import { catalogue } from "../../src/cells/generated/catalogue";
import { calledFunctions, callPattern, exampleArguments, formFormula } from "../../src/pane/form-formula";

const parameter = (name: string, optional = false) => ({ name, description: "", unit: "1", optional });
function entry(formulas: readonly string[]): CatalogueEntry {
  return {
    name: "SOME_MARCH",
    family: "Laminar",
    purpose: "",
    parameters: [parameter("x"), parameter("nu"), parameter("options", true), parameter("radius", true)],
    gives: "",
    resultUnit: "1",
    limits: [],
    sources: [],
    words: [],
    examples: formulas.map((formula) => ({ formula, value: 1 })),
  };
}

describe("forming a formula", () => {
  test("the pattern shows optional arguments in brackets", () => {
    expect(callPattern(entry([]))).toBe("WALL.SOME_MARCH(x, nu, [options], [radius])");
  });

  test.each([
    [["A2:A9", "1E-5"], "=WALL.SOME_MARCH(A2:A9,1E-5)"],
    [[" A2:A9 ", " B1", "", ""], "=WALL.SOME_MARCH(A2:A9,B1)"],
    [["A2:A9", "B1", "", "C2:C9"], "=WALL.SOME_MARCH(A2:A9,B1,,C2:C9)"],
  ])("%j gives %s", (written, formula) => {
    expect(formFormula(entry([]), written)).toEqual({ formula, missing: [] });
  });

  test("required arguments that are empty are named, and no formula is given", () => {
    expect(formFormula(entry([]), ["", " ", "x"])).toEqual({ missing: ["x", "nu"] });
  });
});

describe("the arguments of the worked example", () => {
  test.each([
    ["=WALL.SOME_MARCH(A1:A3,2)", ["A1:A3", "2", "", ""]],
    ["=INDEX(WALL.SOME_MARCH({0,1;2,3},1.5E-5, \"edge fit = spline\"),2,3)", ["{0,1;2,3}", "1.5E-5", '"edge fit = spline"', ""]],
    ["=WALL.OTHER(wall.some_march(SUM(1,2),(3+4)*5))", ["SUM(1,2)", "(3+4)*5", "", ""]],
    ['=WALL.OTHER("WALL.SOME_MARCH(1,2)",WALL.SOME_MARCH("a,(b",4))', ['"a,(b"', "4", "", ""]],
    ["=WALL.SOME_MARCH(1,2,,4)", ["1", "2", "", "4"]],
    ["=WALL.OTHER(1)", ["", "", "", ""]],
    ["=WALL.SOME_MARCH(1,2", ["", "", "", ""]],
    ["=WALL.SOME_MARCH(1,2,3,4,5)", ["", "", "", ""]],
  ])("of %s are %j", (formula, expected) => {
    expect(exampleArguments(entry([formula]))).toEqual(expected);
  });

  test("every function of the catalogue can be inserted with its example", () => {
    for (const e of catalogue) {
      const { formula } = formFormula(e, exampleArguments(e));
      // A function whose example calls it by name only as text has nothing to take over.
      if (e.examples.some((example) => calledFunctions(example.formula).includes(e.name))) expect([e.name, formula]).toEqual([e.name, expect.stringContaining(`=WALL.${e.name}(`)]);
    }
  });
});

describe("the functions a formula calls", () => {
  test.each([
    ["=WALL.COLUMN_OF(wall.thwaites_march(A1:A2,B1:B2,1),\"θ\")", ["COLUMN_OF", "THWAITES_MARCH"]],
    ['="WALL.COLUMN_OF(1)"', []],
    ["=SUM(A1)+FIREWALL.TEST(1)", []],
    ["=WALL.A1B(1)+WALL.A1B (2)", ["A1B"]],
  ])("%s: %j", (formula, expected) => {
    expect(calledFunctions(formula)).toEqual(expected);
  });
});

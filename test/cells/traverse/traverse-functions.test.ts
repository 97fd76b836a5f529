import fc from "fast-check";
import { wallFunctions } from "../../../src/cells/generated/functions";

const y = [0, 0.25, 0.5, 0.75, 1].map((v) => [v]);
const u = [0, 5, 10, 15, 20].map((v) => [v]);
const none = { parameterAddresses: ["Tunnel!A2:A6", "Tunnel!B2:B6"] };
const call = (name: string, ...args: unknown[]) => wallFunctions[name]!(...args, none);
// Arguments after y and u: edge, density, wall, [kind], nu.
const integrals = ["DEFECT_THICKNESS", "MOMENTUM_LOSS", "ENERGY_LOSS", "MASS_DEFECT", "SHAPE_FACTOR"];
const rest = (name: string, edge: unknown, density?: unknown, wall?: unknown) => (name === "SHAPE_FACTOR" ? [edge, density, wall, null, null] : [edge, density, wall, null]);

test("a straight profile u = y has δ* = 1/2, θ = 1/6, δ3 = 1/4, H = 3, H32 = 3/2 (integrated by hand)", () => {
  const exact = [1 / 2, 1 / 6, 1 / 4, 10, 3];
  integrals.forEach((name, i) => expect(call(name, y, u, ...rest(name, 20))).toBeCloseTo(exact[i]!, 12));
  expect(call("SHAPE_FACTOR", y, u, 20, null, null, "h32", null)).toBeCloseTo(1.5, 12);
  expect(call("SHAPE_FACTOR", y, u, 20, null, null, "H1", null)).toBeCloseTo((0.99 - 0.5) * 6, 10);
});

test("Schlichting's flat plate: δ* = 1.721 x/√Rex, θ = 0.664 x/√Rex, H = 2.59 from a traverse in metres", () => {
  // Blasius speeds u/ue at η = 0, 0.4 … 8 (L. Howarth, Proc. R. Soc. A 164 (1938) 547, as printed in Schlichting's table; from memory).
  const f = [0, 0.13277, 0.26471, 0.39378, 0.51676, 0.62977, 0.72899, 0.81152, 0.87609, 0.92333, 0.95552, 0.97587, 0.98779, 0.99425, 0.99748, 0.99898, 0.99961, 0.99986, 0.99995, 0.99998, 1];
  const [x, ue, nu] = [0.5, 12, 1.5e-5];
  const scale = Math.sqrt((nu * x) / ue);
  const heights = f.map((_, i) => [0.4 * i * scale]);
  const speeds = f.map((v) => [ue * v]);
  const root = Math.sqrt((ue * x) / nu);
  expect((call("DEFECT_THICKNESS", heights, speeds, ue, null, null, null) as number) * (root / x)).toBeCloseTo(1.721, 3);
  expect((call("MOMENTUM_LOSS", heights, speeds, ue, null, null, null) as number) * (root / x)).toBeCloseTo(0.664, 3);
  expect(call("SHAPE_FACTOR", heights, speeds, ue, null, null, null, null)).toBeCloseTo(2.59, 2);
});

test.each<[string, unknown[], string]>([
  ["y falls", [[[0], [0.5], [0.4], [1]], u.slice(0, 4)], "needs rising y; row 3 (A4) falls to 0.4 after 0.5"],
  ["y is below the wall", [[[-1], [0.5], [1]], u.slice(0, 3)], "needs y of 0 or more; row 1 (A2) has -1"],
  ["u is text somewhere", [y, [[0], ["n/a"], [10], [15], [20]]], 'needs numbers in u; row 2 (B3) holds the text "n/a"'],
  ["u is shorter than y", [y, u.slice(0, 4)], "needs columns of equal length; u has 4 rows where 5 are expected"],
  ["u slips at the wall", [y, [[3], [5], [10], [15], [20]]], "needs no speed at the wall, y = 0; row 1 (B2) has 3"],
  ["the profile ends inside the layer", [y, u], "needs a traverse that reaches the layer's edge; row 5 (B6) "],
  ["the edge is far above", [y, u, 30], "needs a traverse that reaches the layer's edge; row 5 (B6) ends at 0.666667 of the edge speed"],
  ["the edge is far below", [y, u, 10], "needs edge not far below the profile's own speeds; row 4 has 10 where the profile reaches 15"],
  ["the edge is negative", [y, u, -1], "needs edge above 0; it has -1"],
  ["the edge is a short column", [y, u, [[20], [20]]], "needs columns of equal length; edge has 2 rows where 5 are expected"],
  ["the density has a zero", [y, u, 20, [[1], [1], [0], [1], [1]]], "needs density above 0; row 3 has 0 or is blank"],
  ["the wall is a word", [y, u, 20, null, "curved"], 'needs wall as plane or as the radius of a round wall, not 0; it holds the text "curved"'],
  ["the duct is narrower than the traverse", [y, u, 20, null, -0.5], "with a traverse 1 high"],
])("when %s every integral says so", (_what, [ys, us, edge, density, wall], sentence) => {
  for (const name of integrals) expect(() => call(name, ys, us, ...rest(name, edge, density, wall))).toThrow(sentence);
});

test("columns given as rows, with blanks after them, give the same", () => {
  const row = (column: number[][]) => [[...column.map((r) => r[0]), null, ""]];
  for (const name of integrals) expect(call(name, row(y), row(u), ...rest(name, 20))).toBe(call(name, y, u, ...rest(name, 20)));
});

describe("LAYER_HEIGHT", () => {
  test("finds the height of any fraction", () => {
    expect(call("LAYER_HEIGHT", y, u, null, 20)).toBeCloseTo(0.99, 10);
    expect(call("LAYER_HEIGHT", y, u, 0.3, 20)).toBeCloseTo(0.3, 10);
    expect(call("LAYER_HEIGHT", y, u, 0.5, [[20], [20], [20], [20], [20]])).toBeCloseTo(0.5, 10);
  });
  test.each<[unknown[], string]>([
    [[y, u, 1.2, 20], "LAYER_HEIGHT needs fraction between 0 and 1; it has 1.2"],
    [[y, u, null, null], "LAYER_HEIGHT needs a traverse that reaches the layer's edge; row 5 (B6)"],
    [[y, u, 0.99, 25], "LAYER_HEIGHT needs a traverse that reaches 0.99 of the edge speed; it does not"],
    [[y.slice(1), u.slice(1), 0.1, 20], "LAYER_HEIGHT needs points below the height sought; row 1 already has 5"],
  ])("refuses %j", (args, sentence) => {
    expect(() => call("LAYER_HEIGHT", ...args)).toThrow(sentence);
  });
});

describe("TRAVERSE_TABLE", () => {
  // A turbulent traverse made of Spalding's law with the wake of a 1/7 profile's height left out: invented, first point at 50 wall units.
  const wall = [0.5, 1, 2, 3, 5, 8, 12, 16, 20, 24].map((v) => [v * 1e-3]);
  const speed = [14.9, 16.6, 18.3, 19.3, 20.5, 21.7, 22.6, 23, 23, 23].map((v) => [v]);
  const value = (rows: unknown[][], quantity: string) => rows.find((r) => String(r[0]).startsWith(quantity))![1];

  test("tells the edge, the rule near the wall and what it changed", () => {
    const rows = call("TRAVERSE_TABLE", wall, speed, 1e-5, null, null, null, null) as unknown[][];
    expect(rows[0]).toEqual(["quantity", "value"]);
    expect(value(rows, "near-wall rule")).toBe("fitted");
    expect(value(rows, "note")).toMatch(/^law of the wall fitted to 3 points: u_τ = /);
    expect(value(rows, "δ* with a straight line") as number).toBeGreaterThan(value(rows, "defect thickness") as number);
    expect(value(rows, "share of δ*") as number).toBeGreaterThan(0);
  });

  test("the option sets the rule, and a wrong word is refused with the nearest", () => {
    const rows = call("TRAVERSE_TABLE", wall, speed, 1e-5, "near wall = no-slip", null, null, null) as unknown[][];
    expect(value(rows, "near-wall rule")).toBe("no-slip");
    const bare = call("TRAVERSE_TABLE", wall, speed, 1e-5, [["near wall", "none"]], null, null, null) as unknown[][];
    expect(value(bare, "share of θ")).toBe(0);
    expect(() => call("TRAVERSE_TABLE", wall, speed, 1e-5, "near wall = noslip", null, null, null)).toThrow("nearest is no-slip");
    expect(() => call("TRAVERSE_TABLE", wall, speed, -1, null, null, null, null)).toThrow("TRAVERSE_TABLE needs nu above 0; it has -1");
  });

  test("whatever numbers come, every cell is a finite number or text, or a sentence is thrown", () => {
    const number = fc.double({ min: 0, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(number, number), { maxLength: 10 }), (pairs) => {
        const sorted = [...pairs].sort((a, b) => a[0] - b[0]);
        try {
          const rows = call("TRAVERSE_TABLE", sorted.map((p) => [p[0]]), sorted.map((p) => [p[1]]), null, null, null, null, null) as unknown[][];
          for (const cell of rows.flat()) expect(typeof cell === "string" || Number.isFinite(cell)).toBe(true);
        } catch (error) {
          expect((error as Error).message).toMatch(/^TRAVERSE_TABLE needs /);
        }
      }),
    );
  });
});

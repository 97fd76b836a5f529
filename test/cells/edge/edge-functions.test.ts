import fc from "fast-check";
import { edgeSpeed } from "../../../src/cells/edge/edge-speed";
import { gradientOf } from "../../../src/cells/edge/gradient-of";
import { smoothColumn } from "../../../src/cells/edge/smooth-column";

const none = {} as CustomFunctions.Invocation;
const column = (...v: unknown[]): unknown[][] => v.map((cell) => [cell]);
const range = (v: unknown[][]): never[][] => v as never[][];

describe("EDGE_SPEED", () => {
  test("gives a column aligned with the pressures, from a column or a row, with rows of blanks dropped at the end", () => {
    expect(edgeSpeed(range(column(1, 0.75, -3, null, "")), 10, null, none)).toEqual([[0], [5], [20]]);
    expect(edgeSpeed([[1, 0, -3]], 10, undefined, none)).toEqual([[0], [10], [20]]);
    expect(edgeSpeed(0 as never, 10, null, none)).toEqual([[10]]);
  });
  test.each<[unknown[][], unknown, unknown, string]>([
    [column(0.2, 1.01), 10, null, "EDGE_SPEED needs cp of at most 1; row 2 has 1.01"],
    [column(0.2, 1.01), 10, null, "row 2 has 1.01"],
    [column(-2.5), 10, 0.8, "EDGE_SPEED needs cp between -2.23214 and 1.17"],
    [column(0.2, "x"), 10, null, 'EDGE_SPEED needs numbers in cp; row 2 holds the text "x"'],
    [column(0.2), 0, null, "EDGE_SPEED needs reference_speed above 0; it has 0"],
    [column(0.2), null, null, "EDGE_SPEED needs reference_speed; it is missing or blank"],
    [column(0.2), 10, -0.1, "EDGE_SPEED needs mach of 0 or more; it has -0.1"],
  ])("refuses %j, %j, %j with a sentence", (cp, speed, mach, sentence) => {
    expect(() => edgeSpeed(range(cp), speed, mach, none)).toThrow(sentence);
  });
});

describe("SMOOTH_COLUMN and GRADIENT_OF", () => {
  test("with noise 0 give the values back and the gradient of a cubic exactly", () => {
    const x = column(0, 0.5, 1.5, 2, 3);
    const v = x.map(([at]) => [(at as number) ** 3]);
    expect(smoothColumn(range(x), v, 0, null, none)).toEqual(v);
    gradientOf(range(x), v, 0, null, none).forEach(([slope], i) => expect(slope).toBeCloseTo(3 * (x[i]![0] as number) ** 2, 12));
  });
  test('take "found" and a blank alike', () => {
    const x = column(...Array.from({ length: 30 }, (_, i) => i / 10));
    const v = x.map(([at], i) => [Math.sin(at as number) + (i % 3 === 0 ? 0.02 : -0.01)]);
    expect(smoothColumn(range(x), v, "Found", null, none)).toEqual(smoothColumn(range(x), v, null, null, none));
    expect(smoothColumn(range(x), v, null, null, none)).not.toEqual(v);
  });
  test.each<[unknown[][], unknown[][], unknown, string]>([
    [column(0, 1, 1), column(1, 2, 3), 0, "GRADIENT_OF needs rising x; row 3 repeats 1"],
    [column(0, 1, 2), column(1, 2), 0, "GRADIENT_OF needs columns of equal length; v has 2 rows where 3 are expected"],
    [column(0, 1, 2), column(1, 2, 3), null, "GRADIENT_OF needs at least 6 numbers in x; 3 given"],
    [column(0, 1, 2), column(1, 2, 3), -1, "GRADIENT_OF needs noise of 0 or more; it has -1"],
    [column(0, 1, 2), column(1, 2, 3), "fond", "nearest is found"],
    [column(0, 1, 2), column(1, 2, 3), true, 'GRADIENT_OF needs noise as a number or "found"; it has TRUE'],
    [column(0, 1, 2), column(1e308, -1e308, 1e308), 0, "GRADIENT_OF needs finite numbers in v; row 1"],
  ])("refuse %j, %j, %j with a sentence", (x, v, noise, sentence) => {
    expect(() => gradientOf(range(x), range(v), noise, null, none)).toThrow(sentence);
  });
  test("give finite numbers or a sentence for any finite columns", () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.double({ min: 1e-6, max: 10, noNaN: true }), fc.double({ noNaN: true, noDefaultInfinity: true })), { minLength: 2, maxLength: 12 }), fc.option(fc.double({ min: 0, max: 1e6, noNaN: true })), (rows, noise) => {
        let sum = 0;
        const x = rows.map(([h]) => [(sum += h)]);
        const v = rows.map(([, value]) => [value]);
        try {
          for (const cell of gradientOf(x, v, noise, null, none).flat()) expect(Number.isFinite(cell)).toBe(true);
        } catch (error) {
          expect((error as Error).message).toMatch(/^GRADIENT_OF needs /);
        }
      }),
    );
  });
});

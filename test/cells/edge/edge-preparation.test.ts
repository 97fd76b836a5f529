import fc from "fast-check";
import { wallFunctions } from "../../../src/cells/generated/functions";

const call = (name: string, ...args: unknown[]) => wallFunctions[name]!(...args, { parameterAddresses: ["Taps!A2:A8", "Taps!B2:B8", "Taps!C2:C8"] }) as unknown[][];
const column = (...values: unknown[]) => values.map((v) => [v]);
const x = column(1, 0.5, 0.1, 0, 0.1, 0.5, 1);
const y = column(0, 0.08, 0.05, 0, -0.05, -0.08, 0);
const cp = column(0.1, -0.5, -0.8, 0.95, -0.3, -0.2, 0.1);

test("SURFACE_FROM_TAPS spills a headed table that begins at the stagnation point with speed 0", () => {
  const rows = call("SURFACE_FROM_TAPS", x, y, cp, "Upper", 10, null);
  expect(rows[0]).toEqual(["station x", "surface x", "surface y", "edge speed ue", "note"]);
  expect([rows[1]![0], rows[1]![3]]).toEqual([0, 0]);
  expect(rows[1]![4]).toBe("upper side from the stagnation point; Bernoulli");
  expect(rows.at(-1)![3]).toBeCloseTo(10 * Math.sqrt(0.9), 12);
});

test("a side feeds a march directly", () => {
  const rows = call("SURFACE_FROM_TAPS", x, y, cp, "lower", 10, null).slice(1);
  const march = call("THWAITES_MARCH", rows.map((r) => [r[0]]), rows.map((r) => [r[3]]), 1.5e-5, "edge fit = monotone", null);
  expect(march.length).toBe(rows.length + 1);
  expect(march[1]!.at(-1)).toContain("stagnation point");
});

test("missing taps may be blank or marked", () => {
  const marked = cp.map((c, i) => (i === 5 ? ["n/a"] : c));
  const blank = cp.map((c, i) => (i === 5 ? [null] : c));
  expect(call("SURFACE_FROM_TAPS", x, y, marked, "upper", 10, null)).toEqual(call("SURFACE_FROM_TAPS", x, y, blank, "upper", 10, null));
});

test("supersonic flow is noted where it begins", () => {
  const rows = call("SURFACE_FROM_TAPS", x, y, column(0.1, -0.9, -1.4, 1.05, -0.3, -0.2, 0.1), "upper", 10, 0.7);
  expect(rows.map((r) => r[4]).join()).toContain("valid only as far as no shock stands before it");
});

test.each<[string, unknown[], string]>([
  ["SURFACE_FROM_TAPS", [x, y, column(0.9, 0.5, 0.2, 0, -0.1, -0.2, -0.3), "upper", 10, null], "needs taps on both sides of a stagnation point, an inner maximum of cp; row 1 (C2) has the highest cp, 0.9, with no lower one on both sides"],
  ["SURFACE_FROM_TAPS", [x, column(0, 0.08, -0.05, 0, 0.05, -0.08, 0), cp, "upper", 10, null], "needs points in order along a contour that does not cross itself; row 2 (A3) begins a segment that crosses the one from row 5"],
  ["SURFACE_FROM_TAPS", [x, y, column(0.1, -0.5, -0.8, 1.3, -0.3, -0.2, 0.1), "upper", 10, null], "needs cp of at most 1; row 4 (C5) has 1.3"],
  ["SURFACE_FROM_TAPS", [x, y, column(0.1, -0.5, -5, 0.95, -0.3, -0.2, 0.1), "upper", 10, 0.6], "needs cp between -3.96825 and 1.09327; row 3 (C4) has -5"],
  ["SURFACE_FROM_TAPS", [x, y, cp, "top", 10, null], 'needs side to be upper or lower; "top" is none of them'],
  ["SURFACE_FROM_TAPS", [x, y, cp, null, 10, null], "needs side to be upper or lower; it is missing or blank"],
  ["SURFACE_FROM_TAPS", [x, y, cp, "upper", -1, null], "needs reference_speed above 0; it has -1"],
  ["SURFACE_FROM_TAPS", [x, y, column(0.1, "wet", -0.8, 0.95, -0.3, -0.2, 0.1), "upper", 10, null], 'needs numbers, or blanks for missing taps, in cp; row 2 (C3) holds the text "wet"'],
  ["SURFACE_FROM_TAPS", [x.slice(0, 5), y.slice(0, 5), cp, "upper", 10, null], "needs at least 6 numbers in x; 5 given"],
  ["SURFACE_LENGTH", [column(0, 1, 1), column(0, 1, 1)], "needs wall points that differ from their neighbours; row 3 (A4) repeats the point before"],
  ["SURFACE_LENGTH", [column(0), column(0)], "needs at least 2 numbers in x; 1 given"],
  ["SURFACE_LENGTH", [column(0, 1), column(0, "b")], 'needs numbers in y; row 2 (B3) holds the text "b"'],
  ["EDGE_MACH", [column(0, 1.2), 0.5, null], "needs cp between -5.71429 and 1.06407; row 2 (A3) has 1.2"],
  ["EDGE_MACH", [column(0), 1e308, null], "needs mach between 0 and 100; it has 1e+308"], // found by 130 000 random calls: it said "cp between 0 and NaN"
  ["EDGE_SPEED", [column(0), 10, 1e200], "needs mach between 0 and 100; it has 1e+200"],
  ["EDGE_MACH", [column(0), 0, null], "needs mach above 0; it has 0"],
  ["EDGE_MACH", [column(0), 0.5, 0.9], "needs gamma of at least 1; it has 0.9"],
  ["RESTATION", [column(0, 1, 2), column(0, 1, 4), column(1, 2.5), null], "needs new_x inside the column, 0 to 2; row 2 (C3) asks for 2.5, and nothing is extrapolated"],
  ["RESTATION", [column(0, 1, 1), column(0, 1, 4), column(1), null], "needs rising x; row 3 (A4) repeats 1"],
  ["RESTATION", [column(0, 1, 2), column(0, 1, 4), column(1), "linear"], 'needs fit to be spline or monotone; "linear" is none of them'],
])("%s refuses in a sentence: %j", (name, args, sentence) => {
  expect(() => call(name, ...args)).toThrow(`${name} ${sentence}`);
});

test("whatever numbers come, every cell is a finite number or text, or a sentence is thrown", () => {
  const number = fc.oneof(fc.double({ min: -3, max: 3, noNaN: true }), fc.double());
  const seven = fc.array(number, { minLength: 7, maxLength: 7 });
  fc.assert(
    fc.property(fc.constantFrom("SURFACE_FROM_TAPS", "SURFACE_LENGTH", "EDGE_MACH", "RESTATION"), seven, seven, seven, fc.option(number), (name, a, b, c, m) => {
      const columns = [a, b, c].map((v) => column(...v));
      const args = { SURFACE_FROM_TAPS: [...columns, "upper", 10, m], SURFACE_LENGTH: columns.slice(0, 2), EDGE_MACH: [columns[0], 0.5, m], RESTATION: [column(...[...a].sort((p, q) => p - q)), columns[1], columns[2], null] }[name]!;
      try {
        for (const cell of call(name, ...args).flat()) expect(typeof cell === "string" || Number.isFinite(cell)).toBe(true);
      } catch (error) {
        expect((error as Error).message).toMatch(new RegExp(`^${name} needs `));
      }
    }),
    { numRuns: 500 },
  );
});

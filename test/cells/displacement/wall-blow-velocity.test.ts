import { wallBlowVelocity } from "../../../src/cells/displacement/wall-blow-velocity";
import { normalNoise } from "../../numerics/normal-noise";

const none = {} as CustomFunctions.Invocation;
const column = (...v: unknown[]): never[][] => v.map((cell) => [cell as never]);
const x = Array.from({ length: 40 }, (_, i) => i / 20);
const noise = normalNoise(2);
const m = x.map((at) => Math.sin(at) + 0.005 * noise());

test("WALL_BLOW_VELOCITY spills a bare column aligned with x", () => {
  expect(wallBlowVelocity(column(0, 1, 2, 3), column(0, 1, 4, 9), 0, null as never, null, none).map(([v]) => Math.round((v as number) * 1e9) / 1e9)).toEqual([0, 2, 4, 6]);
});

test("the report names the noise found and gives ± a row", () => {
  const table = wallBlowVelocity(column(...x), column(...m), null, null as never, true, none);
  expect(table[0]).toEqual(["station x", "mass defect m", "blow velocity dm/dx", "± standard error", "note"]);
  expect(table).toHaveLength(41);
  expect(table[1]![4]).toMatch(/^plane wall: dm\/dx; noise of m found by generalised cross-validation: 0\.00[456]\d*; \d+\.\d equivalent degrees of freedom; ± is one standard error$/);
  expect(table[2]![4]).toBe("");
  for (const row of table.slice(1)) {
    expect(row[3]).toBeGreaterThan(0);
    expect(Math.abs((row[2] as number) - Math.cos(row[0] as number))).toBeLessThan(4 * (row[3] as number));
  }
  expect(table.slice(1).map((row) => [row[2]])).toEqual(wallBlowVelocity(column(...x), column(...m), "found", null as never, false, none));
});

test("the report leaves ± empty where no noise was given or found, and says so", () => {
  const exact = wallBlowVelocity(column(...x), column(...m), 0, null as never, true, none);
  expect(exact[1]![4]).toContain("noise = 0: points interpolated, ± unknown");
  expect(exact.slice(1).every((row) => row[3] === "")).toBe(true);
  const line = wallBlowVelocity(column(...x), column(...x), null, null as never, true, none);
  expect(line[1]![4]).toContain("cross-validation tells no noise from the shape");
  const given = wallBlowVelocity(column(...x), column(...m), 0.005, null as never, true, none);
  expect(given[1]![4]).toContain("noise of m given: 0.005");
});

test("a radius column makes it (1/r) d(r m)/dx", () => {
  const table = wallBlowVelocity(column(0, 1, 2, 3), column(0, 1, 2, 3), 0, column(0, 1, 2, 3), true, none);
  expect(table[1]![4]).toContain("round body");
  for (const row of table.slice(1)) expect(row[2]).toBeCloseTo(2, 10);
});

test.each<[never[][], never[][], unknown, never[][] | null, unknown, string]>([
  [column(0, 1, 2), column(0, 1), 0, null, null, "WALL_BLOW_VELOCITY needs columns of equal length; mass_defect has 2 rows where 3 are expected"],
  [column(0, 1, 2), column(0, 1, 2), null, null, null, "WALL_BLOW_VELOCITY needs at least 6 numbers in x; 3 given"],
  [column(0, 1, 2), column(0, 1, 2), 0, column(1, 1), null, "WALL_BLOW_VELOCITY needs columns of equal length; radius has 2 rows where 3 are expected"],
  [column(0, 1, 2), column(0, 1, 2), 0, column(1, 0, 1), null, "WALL_BLOW_VELOCITY needs radius above 0; row 2"],
  [column(0, 1, 2), column(1, 1, 2), 0, column(0, 1, 2), null, "row 1 has 1"],
  [column(0, 1, 2), column(0, 1, 2), 0, null, "yes", "WALL_BLOW_VELOCITY needs TRUE or FALSE for report"],
  [column(0, 1, "a"), column(0, 1, 2), 0, null, null, 'WALL_BLOW_VELOCITY needs numbers in x; row 3 holds the text "a"'],
])("WALL_BLOW_VELOCITY refuses %j, %j, %j, %j, %j with a sentence", (at, defects, deviation, radius, report, sentence) => {
  expect(() => wallBlowVelocity(at, defects, deviation, radius as never, report, none)).toThrow(sentence);
});

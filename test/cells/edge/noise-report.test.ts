import { wallFunctions } from "../../../src/cells/generated/functions";

const column = (values: readonly number[]) => values.map((v) => [v]);
const x = Array.from({ length: 60 }, (_, i) => i / 59);
/** A repeating pattern of root mean square 0.0082 upon a smooth curve. */
const pattern = [0.01, -0.007, 0.004, -0.01, 0.009, -0.008, 0.007];
const v = x.map((s, i) => Math.sin(2 * s) + pattern[i % 7]!);
const call = (name: string, ...args: unknown[]) => wallFunctions[name]!(...args, {}) as unknown[][];

test.each([
  ["SMOOTH_COLUMN", (s: number) => Math.sin(2 * s), 0.01],
  ["GRADIENT_OF", (s: number) => 2 * Math.cos(2 * s), 0.25],
] as const)("%s with report names the noise found and gives ± that holds the truth", (name, truth, most) => {
  const rows = call(name, column(x), column(v), null, true);
  expect(rows[0]).toEqual(["station x", "value", "± standard error", "note"]);
  const noise = Number(/noise of v found by generalised cross-validation: ([\d.]+)/.exec(String(rows[1]![3]))?.[1]);
  expect(noise).toBeGreaterThan(0.006);
  expect(noise).toBeLessThan(0.011);
  rows.slice(1).forEach((row, i) => {
    expect(Math.abs((row[1] as number) - truth(x[i]!))).toBeLessThan(most);
    expect(row[2] as number).toBeGreaterThan(0);
  });
  expect(call(name, column(x), column(v), null, null)).toEqual(rows.slice(1).map((row) => [row[1]]));
});

test("with noise 0 the report says that ± is unknown", () => {
  const rows = call("SMOOTH_COLUMN", column(x), column(v), 0, true);
  expect(rows[1]!.slice(2)).toEqual(["", "noise = 0: points interpolated, ± unknown"]);
});

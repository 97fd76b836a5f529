import { inputCheck } from "../../../src/cells/sheet/input-check";

const none = {} as CustomFunctions.Invocation;
const column = (values: readonly unknown[]) => values.map((v) => [v]);
const x = Array.from({ length: 21 }, (_, i) => i / 20);
const findings = (xs: readonly unknown[], ue: readonly unknown[], nu: unknown) => inputCheck(column(xs), column(ue), nu, none);
const words = (rows: unknown[][]) => rows.map((r) => r.join(" · ")).join("\n");

test("a clean column is usable, and its start is named", () => {
  const rows = findings(x, x.map((s) => Math.sin(2 * s)), 1e-5);
  expect(rows[1]).toEqual(["verdict", "usable", ""]);
  expect(words(rows)).toContain("stagnation start");
});

test.each<[string, readonly unknown[], readonly unknown[], unknown, string, string]>([
  ["a repeated station", [0, 1, 1], [1, 1, 1], 1e-5, "not usable", "INPUT_CHECK needs rising x; row 3 repeats 1"],
  ["text", [0, "a", 2], [1, 1, 1], 1e-5, "not usable", 'row 2 holds the text "a"'],
  ["a zero inside", [0, 1, 2], [0, 1, 0], 1e-5, "not usable", "INPUT_CHECK needs ue above 0; row 3 has 0 or is blank"],
  ["no viscosity", x, x.map(() => 1), null, "not usable", "INPUT_CHECK needs nu; it is missing or blank"],
  ["viscosity in other units", x, x.map(() => 1), 15, "usable with care", "check the units of x, ue and nu"],
  ["few stations", [0, 1, 2], [1, 1.1, 1.2], 1e-5, "usable with care", "only 3"],
  ["a long step", [0, 0.01, 0.02, 0.5, 0.6, 0.7, 0.8, 1], x.slice(0, 8).map(() => 1), 1e-5, "usable with care", "neighbouring steps differ 48 times at row 4"],
])("%s is found", (_what, xs, ue, nu, verdict, sentence) => {
  const rows = findings(xs, ue, nu);
  expect(rows[1]![1]).toBe(verdict);
  expect(words(rows)).toContain(sentence);
});

test("scatter of the edge speed is found and sized", () => {
  // A repeating pattern of ±1 % about a smooth curve; its root mean square is 0.0082 of ue.
  const pattern = [0.01, -0.007, 0.004, -0.01, 0.009, -0.008, 0.007];
  const rows = findings(Array.from({ length: 60 }, (_, i) => i / 59), Array.from({ length: 60 }, (_, i) => 1 + 0.2 * Math.sin(i / 20) + pattern[i % 7]!), 1e-5);
  const scatter = /about ([\d.]+) %/.exec(words(rows))?.[1];
  expect(Number(scatter)).toBeGreaterThan(0.4);
  expect(Number(scatter)).toBeLessThan(1.2);
});

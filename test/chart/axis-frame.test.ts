import fc from "fast-check";
import { axisFrame, canBeShown } from "../../src/chart/axis-frame";

const words = (values: (number | null)[], scale: "linear" | "log", count = 4, tight = false) => axisFrame(values, scale, [0, 300], count, tight).ticks.map((t) => t.words);

test("a linear axis has round marks and begins at zero when the values come near it", () => {
  expect(words([0.0001, 0.0009], "linear")).toEqual(["0", "0.0002", "0.0004", "0.0006", "0.0008", "0.0010"]);
  expect(words([2.2, 3.5], "linear")).toEqual(["2.0", "2.5", "3.0", "3.5"]);
  expect(axisFrame([-10, -1], "linear", [0, 300], 4).to).toBe(0);
});

test("a tight axis ends at its values", () => {
  const frame = axisFrame([0.05, 0.385], "linear", [10, 310], 4, true);
  expect([frame.from, frame.to, frame.at(0.05), frame.at(0.385)]).toEqual([0.05, 0.385, 10, 310]);
  expect(frame.ticks.map((t) => t.words)).toEqual(["0.1", "0.2", "0.3"]);
});

test("a log axis over decades has plain numbers, over little it has linear marks", () => {
  expect(words([0.002, 40], "log")).toEqual(["0.01", "0.1", "1", "10"]);
  expect(words([3, 400], "log", 8)).toEqual(["2", "5", "10", "20", "50", "100", "200", "500"]);
  expect(words([100, 300], "log")).toEqual(["100", "150", "200", "250", "300"]);
});

test("blanks, and on a log axis values of 0 or less, are left out of the range", () => {
  const frame = axisFrame([null, 0, -5, 1, 1000, NaN], "log", [0, 300], 4);
  expect([frame.from, frame.to]).toEqual([1, 1000]);
  expect(axisFrame([null, 3, 9], "linear", [0, 1], 4).to).toBe(10);
});

test.each([
  ["nothing", [], "linear"],
  ["nothing", [null], "log"],
  ["one value", [2], "linear"],
  ["one value", [2], "log"],
  ["zeros", [0, 0], "linear"],
  ["negative values only", [-1, -2], "log"],
] as const)("an axis of %s (%p, %s) still has a range", (_what, values, scale) => {
  const frame = axisFrame([...values], scale, [0, 300], 4);
  expect(frame.to).toBeGreaterThan(frame.from);
  expect(frame.ticks.length).toBeGreaterThan(0);
});

test("whatever the values, the axis holds them all, and its marks rise, lie inside, say different things and are not too many", () => {
  fc.assert(
    fc.property(fc.array(fc.double(), { minLength: 1, maxLength: 20 }), fc.constantFrom("linear" as const, "log" as const), fc.integer({ min: 2, max: 8 }), (values, scale, count) => {
      const shown = values.filter((v) => canBeShown(v, scale));
      const frame = axisFrame(values, scale, [0, 300], count);
      const dust = 1e-9 * Math.max(Math.abs(frame.from), Math.abs(frame.to));
      for (const v of shown) expect(v >= frame.from - dust && v <= frame.to + dust).toBe(true);
      const ticks = frame.ticks.map((t) => t.value);
      for (let i = 1; i < ticks.length; i++) expect(ticks[i]!).toBeGreaterThan(ticks[i - 1]!);
      for (const t of ticks) expect(t >= frame.from - dust && t <= frame.to + dust).toBe(true);
      expect(new Set(frame.ticks.map((t) => t.words)).size).toBe(ticks.length);
      expect(ticks.length).toBeLessThanOrEqual(2 * count + 2);
    }),
  );
});

import fc from "fast-check";
import { surfaceCurve } from "../../../src/physics/edge/surface-curve";

function length(x: Float64Array, y: Float64Array): Float64Array {
  const made = surfaceCurve(x, y);
  if (!made.ok) throw new Error(JSON.stringify(made));
  return made.surface.length;
}
const angles = (n: number, to = 2 * Math.PI) => Float64Array.from({ length: n + 1 }, (_, i) => (to * i) / n);

/** Complete elliptic integral E(k) by the arithmetic-geometric mean (NIST DLMF 19.8.6). */
function completeE(k: number): number {
  let [a, g, sum, power] = [1, Math.sqrt(1 - k * k), 1 - (k * k) / 2, 1];
  for (let i = 0; i < 40; i++) {
    const c = (a - g) / 2;
    [a, g] = [(a + g) / 2, Math.sqrt(a * g)];
    sum -= power * c * c;
    power *= 2;
  }
  return (Math.PI / (2 * a)) * sum;
}

test("the routine for E(k) gives the tabulated E(0.5) = 1.46746 22093 (Abramowitz & Stegun table 17.1, m = 0.25; from memory)", () => {
  expect(completeE(0.5)).toBeCloseTo(1.4674622093, 9);
});

test("a circle's arc is radius times angle: 2e-5 with 24 points, 1e-6 with 48, and of fourth order", () => {
  const error = (n: number) => Math.abs(length(angles(n).map(Math.cos), angles(n).map(Math.sin)).at(-1)! / (2 * Math.PI) - 1);
  expect(error(24)).toBeLessThan(2e-5);
  expect(error(48)).toBeLessThan(1e-6);
  expect(Math.log2(error(48) / error(96))).toBeGreaterThan(3.5);
});

test("an ellipse's circumference is 4aE(k)", () => {
  const t = angles(200);
  const whole = length(t.map((v) => 3 * Math.cos(v)), t.map((v) => Math.sin(v))).at(-1)!;
  expect(Math.abs(whole / (12 * completeE(Math.sqrt(8 / 9))) - 1)).toBeLessThan(1e-6);
});

test("a straight wall is measured exactly, however its points are spaced", () => {
  expect(length(Float64Array.of(0, 3, 3.3, 9), Float64Array.of(0, 4, 4.4, 12)).at(-1)).toBeCloseTo(15, 12);
  expect([...length(Float64Array.of(1, 4), Float64Array.of(1, 5))]).toEqual([0, 5]);
});

test("length scales with the contour and does not change when it is turned or read backwards", () => {
  const t = angles(20, 3);
  const [x, y] = [t.map(Math.cos), t.map((v) => 0.3 * Math.sin(2 * v))];
  const base = length(x, y).at(-1)!;
  fc.assert(
    fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), fc.double({ min: -3, max: 3, noNaN: true }), (scale, turn) => {
      const [c, s] = [scale * Math.cos(turn), scale * Math.sin(turn)];
      const rotated = length(x.map((v, i) => c * v - s * y[i]!), x.map((v, i) => s * v + c * y[i]!)).at(-1)!;
      expect(Math.abs(rotated / (scale * base) - 1)).toBeLessThan(1e-9);
    }),
  );
  expect(Math.abs(length(x.slice().reverse(), y.slice().reverse()).at(-1)! / base - 1)).toBeLessThan(1e-10);
});

test("a repeated neighbour is refused with its row", () => {
  expect(surfaceCurve(Float64Array.of(0, 1, 1), Float64Array.of(0, 1, 1))).toMatchObject({ ok: false, reason: "repeats a point", row: 3 });
});

test("points so unlike that the arc overflows are refused, not given an endless length", () => {
  const x = Float64Array.of(0, 0, 1.210184973390412e-122, 0, 1.2101849733904122e-122, 0, 0);
  const y = Float64Array.of(0, 5e-324, 0, 0, 0, 0, -2.042413489619006e93);
  expect(surfaceCurve(x, y)).toMatchObject({ ok: false });
});

import { frictionDrag } from "../../../src/physics/drag/friction-drag";
import { marchOf } from "../laminar/march-of";

const line = (n: number, from = 0, to = 1) => Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));
const areaOf = (...given: Parameters<typeof frictionDrag>): number => {
  const made = frictionDrag(...given);
  if (!made.ok) throw new Error(made.reason);
  return made.drag.area;
};

test("a laminar plate from 20 even stations: 1.328∕√Re (Blasius 1908) within 0.01 %, its infinite cf at the edge left empty", () => {
  const x = line(20);
  const cf = x.map((s, i) => (i === 0 ? NaN : 0.664115 / Math.sqrt(1e6 * s)));
  expect(Math.abs(areaOf(x, cf, x.map(() => 1), 1) / (1.32823 / 1000) - 1)).toBeLessThan(1e-4);
});

test("a turbulent plate with cf ∝ x^(−1∕5) (Prandtl's power law): its own integral within 0.1 % from 20 stations", () => {
  const x = line(20);
  const cf = x.map((s, i) => (i === 0 ? NaN : 0.0592 * (1e7 * s) ** -0.2));
  expect(Math.abs(areaOf(x, cf, x.map(() => 2), 2) / ((0.0592 / 0.8) * 1e7 ** -0.2) - 1)).toBeLessThan(1e-3);
});

test("the momentum equation agrees on a plane stagnation flow with no pressure force left out: ∫ cf ue² dx∕2 = ue² θ + ∫ ue ue′ δ* dx + ∫ ue ue' θ... of the march itself", () => {
  // ue² θ(x) = ∫ (cf∕2) ue² dx − ∫ δ* ue ue′ dx (von Kármán 1921), for the march by Thwaites on ue = x.
  const x = line(41, 0, 1);
  const march = marchOf(x, x.slice(), 1e-4);
  const friction = areaOf(x, march.friction.map((v, i) => (march.frictionBlank[i] ? NaN : v)), x, 1);
  const defect = areaOf(x, march.defect.map((d, i) => (i === 0 ? NaN : (d * x[i]!) / x[i]! ** 2)), x, 1);
  const momentum = march.momentumLoss[40]! * 1;
  // Thwaites' relations themselves satisfy the equation to 3 % at a stagnation point (S and H are read apart).
  expect(Math.abs((friction / 2 - defect) / momentum - 1)).toBeLessThan(0.06);
});

test("a jump of cf at an onset between stations is carried to there from both sides when the place is given", () => {
  const x = line(11);
  const cf = x.map((s) => (s < 0.33 ? 0.001 : 0.004));
  expect(areaOf(x, cf, x.map(() => 1), 1, { breaks: [0.33] })).toBeCloseTo(0.33 * 0.001 + 0.67 * 0.004, 12);
  expect(Math.abs(areaOf(x, cf, x.map(() => 1), 1) - 0.00301)).toBeLessThan(0.5 * 0.1 * 0.003 + 1e-12);
});

test("only the component along the given direction counts: a wall at 60° has half the drag", () => {
  const x = line(15);
  const cf = x.map(() => 0.003);
  expect(areaOf(x, cf, x.map(() => 1), 1, { along: x.map((s) => s * 0.5) })).toBeCloseTo(0.0015, 12);
});

test("beyond separation cf is empty and friction counts as 0; a gap inside, or too little, is refused with its row", () => {
  const x = line(6);
  const one = x.map(() => 1);
  expect(areaOf(x, Float64Array.of(0.002, 0.002, 0.002, 0.002, NaN, NaN), one, 1)).toBeCloseTo(0.0012, 12);
  expect(frictionDrag(x, Float64Array.of(0.002, 0.002, NaN, 0.002, NaN, NaN), one, 1)).toMatchObject({ ok: false, reason: "gap inside", row: 3 });
  expect(frictionDrag(x, Float64Array.of(NaN, 0.002, NaN, NaN, NaN, NaN), one, 1)).toMatchObject({ ok: false, reason: "too few points" });
  expect(frictionDrag(x, x.slice(1), one, 1)).toMatchObject({ ok: false, reason: "lengths differ" });
  expect(frictionDrag(x, one, one, 0)).toMatchObject({ ok: false, reason: "not positive" });
});

test("units of length and speed do not matter beyond themselves", () => {
  const x = line(20);
  const cf = x.map((s, i) => (i === 0 ? NaN : 0.003 * s ** -0.3));
  const ue = x.map((s) => 1 + 0.2 * s);
  expect(areaOf(x.map((s) => 1000 * s), cf, ue.map((u) => 7 * u), 7) / areaOf(x, cf, ue, 1)).toBeCloseTo(1000, 9);
});

import { fieldProfile } from "../../../src/physics/laminar/field-profile";
import { GIVEN, ROW_STATE } from "../../../src/physics/layer-columns";
import { michel } from "../../../src/physics/onset/michel";
import { fieldLayer } from "../../../src/physics/surface/field-layer";
import { layerMarch, type LayerMarch, type OnsetChoice } from "../../../src/physics/surface/layer-march";
import { eddyMarch } from "../../../src/physics/turbulent/eddy-march";
import { innerFactor, innerGradient, outerFactor, type EddyScales } from "../../../src/physics/turbulent/eddy-viscosity";
import { numbers, readReference } from "../../references/read-reference";
import { wallOf } from "../laminar/wall-of";
import { between } from "./measured-flows";

const line = (n: number, from = 0, to = 1) => Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));
const layerOf = (x: Float64Array, ue: Float64Array, nu: number, onset: OnsetChoice, refinement = 1): LayerMarch => {
  const made = fieldLayer(wallOf(x, ue), nu, onset, { refinement });
  if (!made.ok) throw new Error(made.reason);
  return made.march;
};
const FROM_START: OnsetChoice = { kind: "from start" };

describe("the eddy viscosity of Cebeci and Smith", () => {
  const scales: EddyScales = { reynolds: 3000, wallReynolds: 110, pressure: 0, momentumReynolds: 1e5, defect: 5 };
  test("its inner layer alone integrates to the law of the wall: u⁺ = ln y⁺∕0.40 + 5.24 within 0.1 from y⁺ = 60 to 300 (van Driest 1956 with κ = 0.40, A⁺ = 26), u⁺ = y⁺ at the wall", () => {
    // Constant stress: q = q0 with u_τ∕ue = √(q0∕Re): in wall units v⁺ = 2∕(1 + √(1 + 4 ℓ⁺²)).
    const q = (scales.wallReynolds / scales.reynolds) ** 2 * scales.reynolds;
    let u = 0;
    let before = 0;
    const wall = scales.wallReynolds / scales.reynolds;
    for (let yPlus = 0.01; yPlus < 301; yPlus += 0.01) {
      const eta = yPlus / scales.wallReynolds;
      u += innerGradient(innerFactor(scales, (eta + before) / 2), q).gradient * (eta - before);
      before = eta;
      if (Math.abs(yPlus - 2) < 0.005) expect(u / wall).toBeCloseTo(2, 1);
      for (const at of [60, 100, 300]) if (Math.abs(yPlus - at) < 0.005) expect(Math.abs(u / wall - (Math.log(at) / 0.4 + 5.24))).toBeLessThan(0.12);
    }
  });
  test("its outer layer is α ue δ* with α = 0.0168 at high Re θ and 0.026 at Re θ 425 and below (Cebeci & Smith 1974)", () => {
    expect((outerFactor(scales) - 1) / (3000 * 5)).toBeCloseTo(0.0168, 5);
    expect((outerFactor({ ...scales, momentumReynolds: 300 }) - 1) / (3000 * 5)).toBeCloseTo(0.0168 * 1.55, 5);
  });
  test("acceleration thickens the sublayer, deceleration thins it", () => {
    const at = (pressure: number) => innerFactor({ ...scales, pressure }, 0.2);
    expect(at(0.02)).toBeLessThan(at(0));
    expect(at(-0.02)).toBeGreaterThan(at(0));
  });
  test("the gradient is the stress's own inverse, with the right rate", () => {
    for (const [k, q] of [[0, 0.3], [40, 0.3], [4000, 0.002], [40, -0.3]] as const) {
      const { gradient, rate } = innerGradient(k, q);
      expect(gradient + k * gradient * Math.abs(gradient)).toBeCloseTo(q, 12);
      const h = 1e-6 * Math.abs(q);
      expect((innerGradient(k, q + h).gradient - innerGradient(k, q - h).gradient) / (2 * h) / rate).toBeCloseTo(1, 5);
    }
  });
});

describe("a plate, turbulent from near its edge", () => {
  const x = line(31);
  const march = layerOf(x, x.map(() => 1), 1e-7, FROM_START);
  const { columns } = march;

  test("a grid and steps twice as fine change θ by less than 0.3 %, cf and H by less than 0.15 %", () => {
    const fine = layerOf(x, x.map(() => 1), 1e-7, FROM_START, 2).columns;
    for (const i of [5, 15, 30]) {
      expect(Math.abs(columns.momentumLoss[i]! / fine.momentumLoss[i]! - 1)).toBeLessThan(3e-3);
      expect(Math.abs(columns.friction[i]! / fine.friction[i]! - 1)).toBeLessThan(1.5e-3);
      expect(Math.abs(columns.shape[i]! / fine.shape[i]! - 1)).toBeLessThan(1.5e-3);
    }
  });
  test("momentum balances: cf∕2 = dθ∕dx within 1 % (differences over three stations)", () => {
    for (const i of [10, 20, 29]) expect((columns.momentumLoss[i + 1]! - columns.momentumLoss[i - 1]!) / (x[i + 1]! - x[i - 1]!) / (columns.friction[i]! / 2)).toBeCloseTo(1, 2);
  });
  test("the growth of the mass defect is its derivative", () => {
    for (const i of [10, 20, 29]) expect((columns.massDefect[i + 1]! - columns.massDefect[i - 1]!) / (x[i + 1]! - x[i - 1]!) / columns.blowVelocity[i]!).toBeCloseTo(1, 2);
  });
  test("wall friction at the same Re θ: Wieghardt's plate (NACA TM 1314) from Re θ 5000 to 15 500 within 5 %, H within 3.5 %", () => {
    const rows = readReference("wieghardt_1400_stations.csv").filter((r) => Number(r["Re_theta"]) > 5000);
    const [re, cf, shape] = [numbers(rows, "Re_theta"), numbers(rows, "cf"), numbers(rows, "H")];
    const ours = columns.momentumReynolds.slice(1);
    re.forEach((at, i) => {
      if (at > ours.at(-1)!) return;
      expect(Math.abs(between(ours, columns.friction.slice(1), at) / cf[i]! - 1)).toBeLessThan(0.05);
      expect(Math.abs(between(ours, columns.shape.slice(1), at) / shape[i]! - 1)).toBeLessThan(0.035);
    });
  });
  test("and a plate computed without a model (Balasubramanian et al., J. Fluid Mech. 974 (2023) A49) at Re θ 700 to 1050 within 5 %", () => {
    const slow = layerOf(x, x.map(() => 1), 1.5e-6, FROM_START).columns;
    const rows = readReference("kth_scalar_dns_development.csv").filter((r) => Number(r["Re_theta"]) > 700);
    expect(rows.length).toBeGreaterThan(20);
    for (const r of rows) expect(Math.abs(between(slow.momentumReynolds.slice(1), slow.friction.slice(1), Number(r["Re_theta"])) / Number(r["cf"]) - 1)).toBeLessThan(0.05);
  });
});

describe("the whole wall by the full equations", () => {
  const x = line(61);
  test("free onset by Michel is LAYER_MARCH's with the laminar field method; laminar rows before it, turbulent behind", () => {
    const ue = x.map((s) => 1 + 0.3 * Math.sin(2.5 * s) - 0.35 * s);
    const free: OnsetChoice = { kind: "free", criterion: michel, turbulence: 0 };
    const field = layerOf(x, ue, 3e-7, free);
    const other = layerMarch(wallOf(x, ue), 3e-7, { onset: free, laminarMethod: "field" });
    if (!other.ok) throw new Error(other.reason);
    expect(field.onset!.x).toBe(other.march.onset!.x);
    const last = field.columns.state.lastIndexOf(ROW_STATE.laminar);
    expect(x[last]!).toBeLessThanOrEqual(field.onset!.x);
    expect(x[last + 1]!).toBeGreaterThan(field.onset!.x);
    for (let i = last + 4; i < 61; i += 8) expect(Math.abs(other.march.columns.momentumLoss[i]! / field.columns.momentumLoss[i]! - 1)).toBeLessThan(0.08); // just behind the onset, where lag takes the turbulent H at once
  });
  test("separates turbulent where the wall friction vanishes, within 3 % of the lag method's station, and quickly", () => {
    const ue = x.map((s) => 1 + 0.35 * Math.sin(2.6 * s + 0.4) - 0.3 * s);
    const onset: OnsetChoice = { kind: "fixed", x: 0.1, addedMomentumLoss: 0 };
    const field = layerOf(x, ue, 3e-7, onset);
    const lag = layerMarch(wallOf(x, ue), 3e-7, { onset });
    if (!lag.ok || lag.march.stop.kind !== "turbulent separation" || field.stop.kind !== "turbulent separation") throw new Error(`${field.stop.kind}`);
    expect(Math.abs(field.stop.x / lag.march.stop.x - 1)).toBeLessThan(0.03);
    expect(field.columns.given[60]! & GIVEN.momentumLoss).toBe(0);
  });
  test("a laminar layer that separates first turns turbulent just ahead of it", () => {
    const march = layerOf(x, x.map((s) => 1.3 - 0.6 * s), 1e-6, { kind: "fixed", x: 0.6, addedMomentumLoss: 0 });
    expect(march.onset!.kind).toBe("separation");
    expect(march.onset!.x).toBeLessThan(0.271);
    expect(march.missedTrip).toBe(0.6);
    expect(march.stop.kind).toBe("end");
  });
  test("a cone's layer takes its radius: half the plate's θ", () => {
    const plate = layerOf(x, x.map(() => 1), 1e-7, FROM_START).columns;
    const made = fieldLayer(wallOf(x, x.map(() => 1), { radius: x.map((s) => 0.3 * s) }), 1e-7, FROM_START);
    if (!made.ok) throw new Error(made.reason);
    const ratio = made.march.columns.momentumLoss[60]! / plate.momentumLoss[60]!;
    expect(ratio).toBeGreaterThan(0.45);
    expect(ratio).toBeLessThan(0.56);
  });
  test("an onset outside the column is refused", () => {
    expect(fieldLayer(wallOf(x, x.map(() => 1)), 1e-6, { kind: "fixed", x: 2, addedMomentumLoss: 0 })).toMatchObject({ ok: false, reason: "onset outside" });
  });
  test("stations do not change the answer: the same steps' accuracy with 4 stations as with 61", () => {
    const wall = wallOf(line(4), line(4).fill(1));
    const profile = fieldProfile(wall, 1e-7, 0.05);
    if (!profile.ok) throw new Error(profile.reason);
    const few = eddyMarch(wall, 1e-7, profile.profile, 0).records.at(-1)!;
    const many = eddyMarch(wallOf(x, x.map(() => 1)), 1e-7, profile.profile, 0).records.at(-1)!;
    expect(few.momentumLoss / many.momentumLoss).toBeCloseTo(1, 3);
    expect(few.friction / many.friction).toBeCloseTo(1, 3);
  });
});

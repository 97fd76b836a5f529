import fc from "fast-check";
import { frictionDrag } from "../../../src/physics/drag/friction-drag";
import { wakeMomentumLoss } from "../../../src/physics/drag/wake-drag";
import { GIVEN, ROW_STATE } from "../../../src/physics/layer-columns";
import { thwaitesMarch } from "../../../src/physics/laminar/thwaites-march";
import { michel } from "../../../src/physics/onset/michel";
import { layerMarch, LEAST_TURBULENT_REYNOLDS, type LayerMarch, type LayerOptions } from "../../../src/physics/surface/layer-march";
import { readReference } from "../../references/read-reference";
import { wallOf } from "../laminar/wall-of";
import { raeCase, raeSide } from "./rae2822";

const line = (n: number, from = 0, to = 1) => Float64Array.from({ length: n }, (_, i) => from + ((to - from) * i) / (n - 1));
const FREE: LayerOptions["onset"] = { kind: "free", criterion: michel, turbulence: 0 };
const marchOf = (x: Float64Array, ue: Float64Array, nu: number, options: Partial<LayerOptions> = {}): LayerMarch => {
  const made = layerMarch(wallOf(x, ue), nu, { onset: FREE, ...options });
  if (!made.ok) throw new Error(made.reason);
  return made.march;
};

describe("free onset by Michel", () => {
  test("a plate turns turbulent at Rex = 2.5e6, where 0.664 √Rex meets 2.9 Rex^0.4 (F. M. White, Viscous Fluid Flow, sec. 5-5: about 2.5e6 … 2.9e6; from memory)", () => {
    const exact = (2.9 / 0.664) ** 10;
    for (const laminarMethod of ["energy", "field"] as const) {
      const { onset } = marchOf(line(31), line(31).fill(1), 2e-7, { laminarMethod });
      expect(onset!.x / 2e-7 / exact).toBeCloseTo(1, 2);
    }
    // Thwaites' θ on a plate is 1 % high, and the onset goes with its tenth power.
    expect(marchOf(line(31), line(31).fill(1), 2e-7).onset!.x / 2e-7 / exact).toBeCloseTo(0.905, 2);
  });
  test("is located inside a step: 15 stations and 400 agree within 0.1 % on an aerofoil-like speed, by each laminar method within 3 % of the full equations", () => {
    const ue = (s: number) => 1 + 0.35 * Math.sin(2.6 * s + 0.4) - 0.3 * s;
    const at = (n: number, laminarMethod: "Thwaites" | "energy" | "field") => marchOf(line(n), line(n).map(ue), 1e-6 / 3, { laminarMethod }).onset!;
    for (const method of ["Thwaites", "energy"] as const) {
      expect(at(15, method).kind).toBe("free");
      expect(Math.abs(at(15, method).x / at(400, method).x - 1)).toBeLessThan(1e-3);
      expect(Math.abs(at(60, method).x / at(60, "field").x - 1)).toBeLessThan(0.03);
    }
  });
  test("θ goes through at the onset, and the laminar rows are those of the laminar march", () => {
    const x = line(60);
    const ue = x.map((s) => 1 + 0.2 * s);
    const march = marchOf(x, ue, 5e-8);
    const laminar = thwaitesMarch(wallOf(x, ue).edge, 5e-8);
    if (!laminar.ok) throw new Error(laminar.reason);
    const last = march.columns.state.lastIndexOf(ROW_STATE.laminar);
    expect(last).toBeGreaterThan(5);
    for (let i = 0; i <= last; i += 1) expect(march.columns.momentumLoss[i]).toBe(laminar.march.momentumLoss[i]);
    expect(march.onset!.momentumLoss).toBeGreaterThan(laminar.march.momentumLoss[last]!);
    expect(march.onset!.momentumLoss).toBeLessThan(laminar.march.momentumLoss[last + 1]!);
    expect(march.columns.state.slice(last + 1).every((s) => s === ROW_STATE.turbulent)).toBe(true);
  });
});

describe("onset as told", () => {
  const x = line(41);
  const one = x.map(() => 1);
  test("none: laminar throughout, or to separation", () => {
    const plate = marchOf(x, one, 1e-7, { onset: { kind: "none" } });
    expect(plate.onset).toBeNull();
    expect(plate.columns.state.every((s) => s === ROW_STATE.laminar)).toBe(true);
    const falling = marchOf(x, x.map((s) => 1 - 0.5 * s), 1e-5, { onset: { kind: "none" } });
    expect(falling.stop).toMatchObject({ kind: "laminar separation" });
  });
  test("fixed: at the station given, also between two; the trip's own momentum loss is added", () => {
    const march = marchOf(x, one, 1e-6, { onset: { kind: "fixed", x: 0.31, addedMomentumLoss: 0 } });
    expect(march.onset).toMatchObject({ kind: "fixed", x: 0.31 });
    expect(march.columns.state[12]).toBe(ROW_STATE.laminar);
    expect(march.columns.state[13]).toBe(ROW_STATE.turbulent);
    // θ of the laminar plate there by Thwaites, 0.6708 √(ν x∕ue).
    expect(march.onset!.momentumLoss / Math.sqrt((0.45 * 1e-6 * 0.31) / 1)).toBeCloseTo(1, 9);
    const tripped = marchOf(x, one, 1e-6, { onset: { kind: "fixed", x: 0.31, addedMomentumLoss: 2e-4 } });
    expect(tripped.onset!.momentumLoss - march.onset!.momentumLoss).toBeCloseTo(2e-4, 12);
    expect(tripped.columns.momentumLoss[40]!).toBeGreaterThan(march.columns.momentumLoss[40]!);
  });
  test("from start: turbulent from a leading edge; from a stagnation point laminar until Re θ = 320 (Preston 1958)", () => {
    expect(marchOf(x, one, 1e-6, { onset: { kind: "from start" } }).columns.state.every((s) => s === ROW_STATE.turbulent)).toBe(true);
    const nose = marchOf(x, x.map((s) => Math.sin(1.5 * s)), 1e-7, { onset: { kind: "from start" } });
    expect(nose.onset!.kind).toBe("least Reynolds");
    expect(nose.onset!.momentumReynolds).toBeCloseTo(LEAST_TURBULENT_REYNOLDS, 6);
  });
  test("an onset outside the column, one with too little Re θ, and a negative trip are refused", () => {
    const wall = wallOf(x, one);
    expect(layerMarch(wall, 1e-6, { onset: { kind: "fixed", x: 1.5, addedMomentumLoss: 0 } })).toMatchObject({ ok: false, reason: "onset outside" });
    expect(layerMarch(wall, 1e-2, { onset: { kind: "fixed", x: 0.5, addedMomentumLoss: 0 } })).toMatchObject({ ok: false, reason: "onset too early" });
    expect(layerMarch(wall, 1e-6, { onset: { kind: "fixed", x: 0.5, addedMomentumLoss: -1 } })).toMatchObject({ ok: false, reason: "negative" });
    expect(layerMarch(wall, 0, { onset: FREE })).toMatchObject({ ok: false, reason: "not positive" });
  });
});

describe("the zone of intermittency (Dhawan & Narasimha, J. Fluid Mech. 3 (1958) 418–436)", () => {
  const x = line(201);
  const sudden = marchOf(x, x.map(() => 1), 2e-7, { onset: { kind: "fixed", x: 0.2, addedMomentumLoss: 0 } });
  const spread = marchOf(x, x.map(() => 1), 2e-7, { onset: { kind: "fixed", x: 0.2, addedMomentumLoss: 0 }, zone: true });
  test("γ = 1 − exp(−0.412 ξ²) with Re_λ = 5 Re_x^0.8, in a column of its own", () => {
    const length = (5 * (0.2 / 2e-7) ** 0.8 * 2e-7) / 1;
    for (const i of [50, 60, 80]) expect(spread.columns.intermittency[i]).toBeCloseTo(1 - Math.exp(-0.412 * ((x[i]! - 0.2) / length) ** 2), 12);
    expect(spread.columns.state[60]).toBe(ROW_STATE.transition);
  });
  test("H falls and cf rises without a jump to the turbulent values; θ ends lower than with a sudden onset", () => {
    const rows = Array.from(x, (_, i) => i).filter((i) => spread.columns.state[i] === ROW_STATE.transition);
    expect(rows.length).toBeGreaterThan(20);
    for (let k = 1; k < rows.length; k += 1) {
      const i = rows[k]!;
      expect(spread.columns.shape[i]!).toBeLessThan(spread.columns.shape[i - 1]! + 1e-4);
      expect(Math.abs(spread.columns.friction[i]! - spread.columns.friction[i - 1]!)).toBeLessThan(3e-4);
    }
    expect(spread.columns.shape[200]! / sudden.columns.shape[200]!).toBeCloseTo(1, 1);
    expect(spread.columns.momentumLoss[200]!).toBeLessThan(sudden.columns.momentumLoss[200]!);
  });
  test("the growth of the mass defect is its derivative in the zone too", () => {
    for (const i of [60, 80, 100]) expect(spread.columns.blowVelocity[i]! / ((spread.columns.massDefect[i + 1]! - spread.columns.massDefect[i - 1]!) / 0.01)).toBeCloseTo(1, 2);
  });
});

describe("the bubble behind laminar separation (Horton 1968/69)", () => {
  const x = line(201);
  const ue = x.map((s) => 1.3 - 0.6 * s);
  const march = marchOf(x, ue, 1e-6);
  test("begins at the laminar method's separation, turns turbulent after 4e4 ν∕ue, reattaches where (θ∕ue) due∕dx is −0.0082", () => {
    const b = march.bubble!;
    const laminar = thwaitesMarch(wallOf(x, ue).edge, 1e-6);
    expect(laminar.ok && laminar.march.stop.kind === "separation" && laminar.march.stop.x).toBe(b.separation);
    expect(b.onset - b.separation).toBeCloseTo(4e4 * (1e-6 / b.speed), 10);
    const end = 1.3 - 0.6 * b.reattachment;
    expect((b.reattachmentLoss / end) * ((end - b.speed) / (b.reattachment - b.onset))).toBeCloseTo(-0.0082, 6);
    expect(march.onset).toMatchObject({ kind: "separation", x: b.reattachment });
  });
  test("θ grows by the mean dissipation 0.0182 of the turbulent part: the energy balance closes", () => {
    const b = march.bubble!;
    const end = 1.3 - 0.6 * b.reattachment;
    const n = 2000;
    let gain = 0;
    for (let k = 0; k < n; k += 1) gain += ((b.speed + ((k + 0.5) / n) * (end - b.speed)) ** 3 * (b.reattachment - b.onset)) / n;
    expect((end ** 3 * b.reattachmentLoss - b.speed ** 3 * b.momentumLoss) / ((0.0182 / 1.5) * gain)).toBeCloseTo(1, 6);
  });
  test("its rows say so, carry θ and no friction; a steeper fall or a lower Reynolds number leaves it open", () => {
    const rows = Array.from(march.columns.state).filter((s) => s === ROW_STATE.bubble).length;
    expect(rows).toBeGreaterThan(2);
    const i = march.columns.state.indexOf(ROW_STATE.bubble);
    expect(march.columns.friction[i]).toBe(0);
    expect(march.columns.given[i]! & GIVEN.shape).toBe(0);
    expect(marchOf(x, x.map((s) => 1.3 - 0.6 * s), 3e-5).stop.kind).toBe("no reattachment");
  });
  test("a trip behind laminar separation comes too late and is said to", () => {
    expect(marchOf(x, ue, 1e-6, { onset: { kind: "fixed", x: 0.5, addedMomentumLoss: 0 } }).missedTrip).toBe(0.5);
  });
});

describe("RAE 2822, measured pressures, transition fixed by a strip (Cook, McDonald & Firmin, AGARD AR-138 (1979), paper A6)", () => {
  const integrals = readReference("rae2822_integrals.csv");
  const run = (which: string) =>
    (["upper", "lower"] as const).map((name) => {
      const s = raeSide(which, name);
      const made = layerMarch(s.wall, s.nu, { onset: { kind: "fixed", x: s.strip, addedMomentumLoss: 0 }, gas: s.gas, afterSeparation: "continue" });
      if (!made.ok) throw new Error(made.reason);
      const { columns } = made.march;
      const end = columns.momentumLoss.length - 1;
      const wake = wakeMomentumLoss(columns.momentumLoss[end]!, columns.shape[end]!, s.side.speed[end]!, s.gas);
      if (!wake.ok) throw new Error(wake.reason);
      const rows = integrals.filter((r) => r["case"] === which && r["surface"]!.startsWith(name));
      return {
        counts: 2e4 * wake.far,
        rows: rows.map((r) => ({
          x: Number(r["x_c"]),
          theta: s.at(columns.momentumLoss, Number(r["x_c"])) / Number(r["theta_c"]) - 1,
          defect: s.at(columns.defect, Number(r["x_c"])) / Number(r["dstar_c"]) - 1,
          shape: s.at(columns.shape, Number(r["x_c"])) / Number(r["H"]) - 1,
        })),
      };
    });

  test("case 1 (M 0.676, no shock): θ within 8.5 % on the upper side to 0.9 chord, 13 % at the trailing edge; δ* 10 % and H 8 % to 0.9 chord", () => {
    const [upper] = run("1");
    const ahead = upper!.rows.filter((r) => r.x <= 0.9);
    expect(ahead).toHaveLength(6);
    for (const r of ahead) {
      expect(Math.abs(r.theta)).toBeLessThan(0.085);
      expect(Math.abs(r.defect)).toBeLessThan(0.1);
      expect(Math.abs(r.shape)).toBeLessThan(0.08);
    }
    for (const r of upper!.rows) expect(Math.abs(r.theta)).toBeLessThan(0.13);
  });
  test("case 1, lower side: θ within 8 % at the trailing edge; at 0.152 chord the two measured values differ by 16 % and ours lies between them", () => {
    const [, lower] = run("1");
    const [first, second, tail] = lower!.rows;
    expect(first!.theta).toBeGreaterThan(0);
    expect(second!.theta).toBeLessThan(0);
    expect(Math.abs(tail!.theta)).toBeLessThan(0.08);
  });
  test("case 1: drag from both sides by Squire & Young's formula is the measured wake's, 85 counts, within 6", () => {
    const total = run("1").reduce((sum, s) => sum + s.counts, 0);
    expect(Math.abs(total - 1e4 * Number(raeCase("1")["CD_wake"]))).toBeLessThan(6);
  });
  test("case 9 (M 0.73): ahead of the shock θ is low by up to 17 %; behind it 24 % low, and drag 60 counts short: the shock's own loss and what it does to the layer are outside the method", () => {
    const [upper, lower] = run("9");
    for (const r of upper!.rows.filter((q) => q.x < 0.5)) expect(Math.abs(r.theta)).toBeLessThan(0.18);
    for (const r of upper!.rows) expect(r.theta).toBeGreaterThan(-0.26);
    const missing = 1e4 * Number(raeCase("9")["CD_wake"]) - upper!.counts - lower!.counts;
    expect(missing).toBeGreaterThan(40);
    expect(missing).toBeLessThan(75);
  });
});

describe("the whole march", () => {
  test("friction and momentum agree on a plate: ∫ cf dx = 2 θ at the end, over the onset, within 0.5 %", () => {
    const x = line(101);
    for (const zone of [false, true]) {
      const march = marchOf(x, x.map(() => 1), 2e-7, { zone });
      const made = frictionDrag(x, march.columns.friction.map((v, i) => (i === 0 ? NaN : v)), x.map(() => 1), 1, { breaks: zone ? [] : [march.onset!.x] });
      if (!made.ok) throw new Error(made.reason);
      expect(Math.abs(made.drag.area / (2 * march.columns.momentumLoss[100]!) - 1)).toBeLessThan(0.006);
    }
  });
  test("units do not matter, nor where x is counted from", () => {
    const x = line(40);
    const ue = x.map((s) => 1.2 + 0.3 * Math.sin(3 * s));
    const plain = marchOf(x, ue, 2e-7);
    const scaled = marchOf(x.map((s) => 25 * s), ue.map((u) => 3 * u), 2e-7 * 75);
    const shifted = marchOf(x.map((s) => s - 4), ue, 2e-7);
    expect(scaled.onset!.x / plain.onset!.x).toBeCloseTo(25, 6);
    expect(shifted.onset!.x + 4).toBeCloseTo(plain.onset!.x, 9);
    for (let i = 1; i < 40; i += 1) {
      expect(scaled.columns.momentumLoss[i]! / plain.columns.momentumLoss[i]!).toBeCloseTo(25, 5);
      expect(shifted.columns.friction[i]! / plain.columns.friction[i]!).toBeCloseTo(1, 6);
    }
  });
  test("any sensible edge speed ends in a march without a number that is not finite, or in a reason", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.2, max: 3, noNaN: true }), { minLength: 3, maxLength: 40 }),
        fc.boolean(),
        fc.double({ min: -8, max: -2, noNaN: true }),
        fc.constantFrom<LayerOptions["onset"]>(FREE, { kind: "none" }, { kind: "from start" }, { kind: "fixed", x: 0.4, addedMomentumLoss: 0 }),
        fc.constantFrom("lag" as const, "entrainment" as const),
        fc.constantFrom("Thwaites" as const, "energy" as const),
        fc.boolean(),
        (speeds, stagnation, log, onset, turbulentMethod, laminarMethod, zone) => {
          const x = line(speeds.length);
          const ue = Float64Array.from(speeds);
          if (stagnation) ue[0] = 0;
          let wall;
          try {
            wall = wallOf(x, ue, { fit: "monotone" });
          } catch {
            return;
          }
          const made = layerMarch(wall, 10 ** log, { onset, turbulentMethod, laminarMethod, zone, afterSeparation: "continue" });
          if (!made.ok) return;
          const { columns, stop } = made.march;
          for (const key of Object.keys(GIVEN) as (keyof typeof GIVEN)[]) expect(columns[key].every(Number.isFinite)).toBe(true);
          if (stop.kind !== "end") expect(stop.x).toBeGreaterThanOrEqual(0);
          // Every station is told, or the march says why not.
          if (stop.kind === "end") expect(columns.state.every((s) => s !== ROW_STATE.notReached)).toBe(true);
        },
      ),
      { numRuns: 400, seed: 11 },
    );
  });
});

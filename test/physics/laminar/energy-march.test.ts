import fc from "fast-check";
import { energyMarch } from "../../../src/physics/laminar/energy-march";
import { LAYER_STATE } from "../../../src/physics/laminar/laminar-march";
import { similarLayer } from "../../../src/physics/laminar/similar-layer";
import { spaced } from "./classic-flows";
import { laminarSolution } from "./laminar-solution";
import { energyOf, fieldOf, REFERENCE_FLOWS, separationStation, wallOf } from "./wall-of";

describe.each(Object.keys(REFERENCE_FLOWS))("energy march against the full solution %s (test/references)", (name) => {
  const full = laminarSolution(name);
  const stations = full.column("x");
  const x = Float64Array.of(0, ...stations, 1.02 * full.separation, 1.05 * full.separation);
  const march = energyOf(wallOf(x, x.map(REFERENCE_FLOWS[name])));
  const worst = (of: Float64Array, column: string, share: number): number =>
    full.column(column).reduce((most, v, i) => (stations[i] <= share * full.separation && i + 1 < march.reached ? Math.max(most, Math.abs(of[i + 1] / v - 1)) : most), 0);
  it("θ within 0.5 % up to nine tenths of the way to separation, within 1 % up to 95 % and 1.2 % up to it", () => {
    expect(worst(march.momentumLoss, "theta", 0.9)).toBeLessThan(5e-3);
    expect(worst(march.momentumLoss, "theta", 0.95)).toBeLessThan(1e-2);
    expect(worst(march.momentumLoss, "theta", 1)).toBeLessThan(1.2e-2);
  });
  it("δ3 within 0.6 %, δ* within 2.5 %, cf within 6.5 % up to nine tenths", () => {
    expect(worst(march.energyLoss, "delta3", 0.9)).toBeLessThan(6e-3);
    expect(worst(march.defect, "dstar", 0.9)).toBeLessThan(2.6e-2);
    expect(worst(march.friction, "cf", 0.9)).toBeLessThan(6.5e-2);
  });
  it("separation within 2 %, and on 15 coarse stations within another 0.1 %", () => {
    const miss = separationStation(march) / full.separation - 1;
    expect(Math.abs(miss)).toBeLessThan(2e-2);
    const coarse = spaced(15, 0, 1.1 * full.separation);
    expect(Math.abs(separationStation(energyOf(wallOf(coarse, coarse.map(REFERENCE_FLOWS[name])))) / full.separation - 1 - miss)).toBeLessThan(1e-3);
  });
});

describe("energy march along walls with known layers", () => {
  it("keeps the flat plate's layer (Blasius: 0.664115, 1.720788, dm∕dx = m∕2x) to 1e-5", () => {
    const x = spaced(21, 0, 1);
    const march = energyOf(wallOf(x, x.map(() => 1)));
    for (let i = 1; i < 21; i += 1) {
      expect(march.momentumLoss[i] / Math.sqrt(x[i])).toBeCloseTo(0.664115, 5);
      expect(march.defect[i] / Math.sqrt(x[i])).toBeCloseTo(1.720788, 4);
      expect(march.blowVelocity[i] * 2 * x[i]).toBeCloseTo(march.massDefect[i], 5);
    }
  });
  it.each([-3, -0.5, 0, 0.5])("keeps the transpired stagnation layer, vw∕√(ν ue′) = %d, within 0.002 %", (blown) => {
    const x = spaced(11, 0, 1);
    const march = energyOf(wallOf(x, x.map((s) => s), { wallVelocity: x.map(() => blown) }));
    const similar = similarLayer(1, { transpiration: blown });
    if (!similar.ok) throw new Error("no similar layer");
    for (const i of [0, 3, 10]) {
      expect(Math.abs(march.momentumLoss[i] / similar.layer.momentumLoss - 1)).toBeLessThan(2e-5);
      expect(Math.abs(march.shape[i] / similar.layer.shape - 1)).toBeLessThan(2e-5);
    }
  });
  it("ends in the asymptotic suction layer (H = 2 within 0.03 %) and follows the field march there (θ within 1 %)", () => {
    const x = spaced(81, 0, 40);
    const wall = wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => -1) });
    const march = energyOf(wall);
    const field = fieldOf(wall);
    expect(Math.abs(march.shape[80] / 2 - 1)).toBeLessThan(3e-4);
    expect(march.momentumLoss[80]).toBeCloseTo(0.5, 3);
    for (let i = 1; i < 81; i += 1) expect(Math.abs(march.momentumLoss[i] / field.momentumLoss[i] - 1)).toBeLessThan(1.1e-2);
  });
  it("a plate a hundred thousand suction lengths long takes no more steps than stations need", () => {
    const x = spaced(9, 0, 8);
    const march = energyOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => -1) }), 1e-4);
    expect(march.shape[8]).toBeCloseTo(2, 2);
    expect(march.counts.steps).toBeLessThan(1000);
  });
  it("sphere: separates within 1 % of 104.8° and starts with Homann's layer (H = 2.2969)", () => {
    const x = spaced(101, 0, 2);
    const march = energyOf(wallOf(x, x.map((s) => 1.5 * Math.sin(s)), { radius: x.map(Math.sin) }));
    expect(Math.abs((separationStation(march) * 180) / Math.PI / 104.8 - 1)).toBeLessThan(1e-2);
    expect(march.shape[0]).toBeCloseTo(2.2969, 3);
  });
  it("stops before it blows the closure's range, naming the place, and not with a wrong number", () => {
    const x = spaced(81, 0, 0.8);
    const march = energyOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => 1) }));
    expect(march.stop.kind).toBe("limit");
    expect(march.momentumLoss[march.reached - 1]).toBeLessThan(0.6);
    const field = fieldOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => 1) }));
    for (let i = 1; i < march.reached; i += 1) expect(Math.abs(march.momentumLoss[i] / field.momentumLoss[i] - 1)).toBeLessThan(1e-2);
  });
});

describe("energy march past separation and at its limits", () => {
  it("continues θ by the momentum equation with no wall shear: ue^(2+H) θ is kept", () => {
    const x = spaced(61, 0, 0.3);
    const march = energyOf(wallOf(x, x.map((s) => 1 - s)), 1, { afterSeparation: "continue" });
    const from = march.reached;
    expect(march.state[from]).toBe(LAYER_STATE.separated);
    const kept = (i: number): number => march.edgeSpeed[i] ** (2 + 4.0292) * march.momentumLoss[i];
    for (let i = from; i < 61; i += 1) expect(Math.abs(kept(i) / kept(from) - 1)).toBeLessThan(1e-3);
  });
  it("starts from a given θ and H and forgets H: the plate's θ grows back", () => {
    const x = spaced(201, 1, 40);
    const march = energyOf(wallOf(x, x.map(() => 1)), 1, { startMomentumLoss: 0.664115, startShape: 2.4 });
    expect(march.shape[0]).toBeCloseTo(2.4, 9);
    expect(march.shape[200]).toBeCloseTo(2.5911, 3);
  });
  it("refuses what it cannot use", () => {
    const x = spaced(5, 0, 1);
    const stagnation = wallOf(x, Float64Array.of(0, 1, 2, 3, 4));
    expect(energyMarch(stagnation, 1, { startMomentumLoss: 0.1 })).toMatchObject({ ok: false, reason: "start fixed" });
    expect(energyMarch(stagnation, -1)).toMatchObject({ ok: false, reason: "not positive", argument: "nu" });
    expect(energyMarch(wallOf(x, x.map((s) => 1 - s / 2)), 1, { startMomentumLoss: 3 })).toMatchObject({ ok: false, reason: "outside range" });
    expect(energyMarch(wallOf(x, Float64Array.of(0, 1, 2, 3, 4), { wallVelocity: new Float64Array(5).fill(9) }), 1)).toMatchObject({ ok: false, reason: "outside range" });
  });
  it("starts at a stagnation point with strong suction, vw∕√(ν due∕dx) = −3.4, as the full equations do: θ within 1 %", () => {
    const x = spaced(16, 0, 1);
    const wall = wallOf(x, x.slice(), { wallVelocity: x.map(() => -0.342) });
    const [energy, field] = [energyOf(wall, 0.01), fieldOf(wall, 0.01)];
    expect(Math.abs(energy.momentumLoss[0] / field.momentumLoss[0] - 1)).toBeLessThan(0.01);
    expect(Math.abs(energy.shape[8] / field.shape[8] - 1)).toBeLessThan(0.01);
  });
  it("never gives a number that is not finite, whatever smooth column it is given", () => {
    const number = fc.double({ min: -1.5, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(fc.array(number, { minLength: 3, maxLength: 3 }), fc.boolean(), number, (a, stagnation, blown) => {
        const x = spaced(16, 0, 1);
        const ue = x.map((s) => Math.exp(a[0] * s + a[1] * Math.sin(3 * s) + a[2] * s * s) * (stagnation ? s : 1));
        const made = energyMarch(wallOf(x, ue, { wallVelocity: x.map((s) => 2 * blown * Math.cos(2 * s)) }), 0.01, { afterSeparation: "continue" });
        if (!made.ok) return made.reason === "outside range";
        const { march } = made;
        return [march.momentumLoss, march.defect, march.energyLoss, march.shape, march.friction, march.massDefect, march.blowVelocity].every((c) => c.every(Number.isFinite));
      }),
      { numRuns: 60 },
    );
  });
  it("agrees with the field march on random smooth flows before separation: θ within 3 %", () => {
    const number = fc.double({ min: -0.6, max: 0.6, noNaN: true });
    fc.assert(
      fc.property(number, number, (a, b) => {
        const x = spaced(31, 0, 1);
        const wall = wallOf(x, x.map((s) => Math.exp(a * s + b * Math.sin(2 * s))));
        const [energy, field] = [energyOf(wall), fieldOf(wall)];
        const end = field.stop.kind === "separation" ? 0.95 * field.stop.x : Infinity;
        return x.every((s, i) => i === 0 || s > end || i >= energy.reached || Math.abs(energy.momentumLoss[i] / field.momentumLoss[i] - 1) < 0.03);
      }),
      { numRuns: 15 },
    );
  });
});

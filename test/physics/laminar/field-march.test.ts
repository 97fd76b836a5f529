import fc from "fast-check";
import { fieldMarch } from "../../../src/physics/laminar/field-march";
import type { FieldRecord } from "../../../src/physics/laminar/field-record";
import type { FieldOptions } from "../../../src/physics/laminar/field-run";
import { fieldRun } from "../../../src/physics/laminar/field-run";
import { fieldProfile } from "../../../src/physics/laminar/field-profile";
import { similarLayer } from "../../../src/physics/laminar/similar-layer";
import { numbers, readReference } from "../../references/read-reference";
import { spaced } from "./classic-flows";
import { laminarSolution } from "./laminar-solution";
import { fieldOf, REFERENCE_FLOWS, separationStation, wallOf } from "./wall-of";

/** Largest relative misses of a march against a reference file, cf up to 97 % of the way to separation: behind that a shift of the file's
 * separation station by half a unit of its last digit moves cf by more than what is tested. */
function misses(name: string, options: Parameters<typeof fieldMarch>[2] = {}): Record<string, number> & { separation: number } {
  const full = laminarSolution(name);
  const stations = full.column("x");
  const x = Float64Array.of(0, ...stations, 1.02 * full.separation, 1.05 * full.separation);
  const march = fieldOf(wallOf(x, x.map(REFERENCE_FLOWS[name])), 1, options);
  expect(march.reached).toBe(stations.length + 1);
  const worst = (of: Float64Array, wanted: Float64Array, share = 1): number =>
    wanted.reduce((most, v, i) => (stations[i] <= share * full.separation ? Math.max(most, Math.abs(of[i + 1] / v - 1)) : most), 0);
  return {
    theta: worst(march.momentumLoss, full.column("theta")),
    defect: worst(march.defect, full.column("dstar")),
    energy: worst(march.energyLoss, full.column("delta3")),
    shape: worst(march.shape, full.column("H")),
    gradient: worst(march.gradient, full.column("lambda")),
    friction: worst(march.friction, full.column("cf"), 0.97),
    separation: Math.abs(separationStation(march) / full.separation - 1),
  };
}

describe.each(Object.keys(REFERENCE_FLOWS))("field march against the full solution %s (test/references)", (name) => {
  it("at default settings: θ, δ*, δ3, H within 0.05 % at every station, cf within 0.05 % up to 97 %, separation within 0.1 %", () => {
    const m = misses(name);
    for (const key of ["theta", "defect", "energy", "shape", "friction"]) expect(m[key]).toBeLessThan(5e-4);
    expect(m.gradient).toBeLessThan(5e-4);
    expect(m.separation).toBeLessThan(1e-3);
  });
  it("with Richardson's extrapolation: θ and δ3 within 0.001 %, cf within 0.001 %, separation within 0.006 % (the files print five digits of it)", () => {
    const m = misses(name, { richardson: true });
    for (const key of ["theta", "energy", "friction"]) expect(m[key]).toBeLessThan(1e-5);
    expect(m.defect).toBeLessThan(1.2e-4);
    expect(m.separation).toBeLessThan(6e-5);
  });
});

describe("field march along walls with known layers", () => {
  it("flat plate: 0.664115, 1.720788, 0.664115 and dm∕dx = m∕2x (Blasius; digits from blasius_profile_computed.csv) within 0.001 %", () => {
    const rows = readReference("blasius_profile_computed.csv");
    const wallShear = numbers(rows, "fpp")[0];
    const displacement = 2 * numbers(rows, "v_sqrtRex_over_ue").at(-1)!; // v∞ √Rex∕ue = δ*√Rex∕2x; 3e-6 short of its limit at η = 8
    const x = spaced(21, 0, 1);
    const march = fieldOf(wallOf(x, x.map(() => 1)));
    for (let i = 1; i < 21; i += 1) {
      const root = Math.sqrt(x[i]);
      expect(Math.abs(march.momentumLoss[i] / root / (2 * wallShear) - 1)).toBeLessThan(1e-5);
      expect(Math.abs((march.friction[i] * root) / (2 * wallShear) - 1)).toBeLessThan(1e-5);
      expect(Math.abs(march.defect[i] / root / displacement - 1)).toBeLessThan(2e-5);
      expect(Math.abs((march.blowVelocity[i] * 2 * x[i]) / march.massDefect[i] - 1)).toBeLessThan(1e-5);
    }
    expect(march.frictionBlank[0]).toBe(1);
    expect(march.blowBlank[0]).toBe(1);
  });
  it("cone in a uniform stream: Mangler's √3 thinner than the plate", () => {
    const x = spaced(11, 0, 1);
    const march = fieldOf(wallOf(x, x.map(() => 1), { radius: x.map((s) => 0.3 * s) }));
    expect(march.momentumLoss[10]).toBeCloseTo(0.6641147 / Math.sqrt(3), 5);
  });
  it("sphere, ue = 1.5 sin x: separates at 104.8° (Cebeci & Smith 1974 and others; from memory) and starts with Homann's layer", () => {
    const x = spaced(101, 0, 2);
    const march = fieldOf(wallOf(x, x.map((s) => 1.5 * Math.sin(s)), { radius: x.map(Math.sin) }));
    expect(Math.abs((separationStation(march) * 180) / Math.PI - 104.8)).toBeLessThan(0.1);
    const homann = similarLayer(1 / 3);
    if (!homann.ok) throw new Error("no similar layer");
    expect(march.shape[0]).toBeCloseTo(homann.layer.shape, 5);
    expect(march.shape[1]).toBeCloseTo(homann.layer.shape, 3);
  });
  it("uniform suction of a plate ends in the asymptotic layer H = 2, θ = ν∕2|vw|, cf = 2|vw|∕ue (Griffith & Meredith 1936) within 0.001 %", () => {
    const x = spaced(81, 0, 40);
    const march = fieldOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => -1) }));
    expect(Math.abs(march.shape[80] / 2 - 1)).toBeLessThan(1e-5);
    expect(Math.abs(march.momentumLoss[80] / 0.5 - 1)).toBeLessThan(1e-5);
    expect(Math.abs(march.friction[80] / 2 - 1)).toBeLessThan(1e-5);
  });
  it("uniform blowing of a plate lifts the layer off at (vw∕ue)² Rex = 0.7456 (Catherall, Stewartson & Williams 1965, from memory) within 0.5 %", () => {
    const x = spaced(81, 0, 0.8);
    const march = fieldOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map(() => 1) }));
    expect(march.stop.kind).toBe("lift-off");
    if (march.stop.kind === "lift-off") expect(Math.abs(march.stop.x / 0.7456 - 1)).toBeLessThan(5e-3);
  });
  it.each([0.5, -0.5, -3])("a stagnation point with vw∕√(ν ue′) = %d keeps the transpired similar layer", (blown) => {
    const x = spaced(11, 0, 1);
    const march = fieldOf(wallOf(x, x.map((s) => s), { wallVelocity: x.map(() => blown) }));
    const similar = similarLayer(1, { transpiration: blown });
    if (!similar.ok) throw new Error("no similar layer");
    for (const i of [0, 1, 5, 10]) {
      expect(Math.abs(march.momentumLoss[i] / similar.layer.momentumLoss - 1)).toBeLessThan(1e-5);
      expect(Math.abs(march.shape[i] / similar.layer.shape - 1)).toBeLessThan(1e-5);
    }
  });
  it.each([-0.4, 0.3])("a plate with vw ∝ 1∕√x, (vw∕ue)√Rex = %d, started with its similar layer's θ and H, keeps it", (strength) => {
    // The start takes a solid-wall profile of that H; the layer forgets it within a few of its own lengths.
    const similar = similarLayer(0, { transpiration: strength });
    if (!similar.ok) throw new Error("no similar layer");
    const x = spaced(161, 1, 60);
    const march = fieldOf(wallOf(x, x.map(() => 1), { wallVelocity: x.map((s) => strength / Math.sqrt(s)) }), 1, { startMomentumLoss: similar.layer.momentumLoss * Math.SQRT2, startShape: similar.layer.shape });
    expect(Math.abs(march.shape[160] / similar.layer.shape - 1)).toBeLessThan(2e-3);
    expect(Math.abs(march.momentumLoss[160] / (similar.layer.momentumLoss * Math.SQRT2 * Math.sqrt(60)) - 1)).toBeLessThan(1e-2);
  });
  it("started with the plate's θ at x = 1 goes on as the plate", () => {
    const x = spaced(21, 1, 2);
    const march = fieldOf(wallOf(x, x.map(() => 1)), 1, { startMomentumLoss: 0.664114672 });
    expect(march.momentumLoss[20]).toBeCloseTo(0.664114672 * Math.SQRT2, 4);
    expect(march.start).toBe("given momentum loss");
  });
});

describe("field march as a numerical method", () => {
  it("converges at third order along the wall and at fourth across the layer: the same steps cut in 2, 4, 8, the same grid cut in 2, 4", () => {
    const x = spaced(31, 0, 1.7);
    const wall = wallOf(x, x.map(Math.sin));
    const first = fieldRun(wall, 1);
    if (!first.ok) throw new Error(first.reason);
    const { plan } = first.run;
    const last = (options: FieldOptions): FieldRecord => {
      const made = fieldRun(wall, 1, { ...options, plan });
      if (!made.ok) throw new Error(made.reason);
      return made.run.records[30];
    };
    const along = [1, 2, 4, 8].map((split) => last({ split }));
    const across = [1, 2, 4].map((refinement) => last({ refinement }));
    for (const key of ["momentumLoss", "defect", "wallShear"] as const) {
      const ratio = (r: FieldRecord[], i: number): number => (r[i][key] - r[i + 1][key]) / (r[i + 1][key] - r[i + 2][key]);
      // 8 and 16 in the limit; the first steps, of lower order, still show in the former.
      expect(ratio(along, 0)).toBeGreaterThan(6.5);
      expect(ratio(along, 1)).toBeGreaterThan(7.2);
      expect(ratio(along, 1)).toBeLessThan(9);
      expect(ratio(across, 0)).toBeGreaterThan(13);
      expect(ratio(across, 0)).toBeLessThan(20);
    }
  });
  it("changes by less than 0.001 % when the grid across the layer and the steps are cut in three", () => {
    const x = spaced(41, 0, 1.6);
    const wall = wallOf(x, x.map(Math.sin));
    const coarse = fieldOf(wall, 1, { richardson: true });
    const fine = fieldOf(wall, 1, { refinement: 3, richardson: true });
    for (let i = 0; i <= 40; i += 1) expect(Math.abs(coarse.momentumLoss[i] / fine.momentumLoss[i] - 1)).toBeLessThan(1e-5);
  });
  it("satisfies von Kármán's momentum equation, suction included, between its stations", () => {
    const x = spaced(301, 0, 1.2);
    const wallVelocity = x.map((s) => -0.4 + 0.3 * s);
    const radius = x.map((s) => 0.5 + 0.2 * s);
    const march = fieldOf(wallOf(x, x.map((s) => 1 + 0.5 * s - 0.4 * s * s), { wallVelocity, radius }));
    // d(r ue² θ)∕dx + r ue ue′ δ* = r (ue² cf∕2 + ue vw), integrated by Simpson's rule over pairs of panels.
    const ue = march.edgeSpeed;
    const balance = (i: number): number => radius[i] * ((ue[i] ** 2 * march.friction[i]) / 2 + ue[i] * wallVelocity[i] - ue[i] * (0.5 - 0.8 * x[i]) * march.defect[i]);
    const flux = (i: number): number => radius[i] * ue[i] ** 2 * march.momentumLoss[i];
    expect(march.reached).toBeGreaterThan(200);
    for (let i = 40; i + 2 < march.reached; i += 2) {
      const gained = ((x[i + 2] - x[i]) * (balance(i) + 4 * balance(i + 1) + balance(i + 2))) / 6;
      expect(Math.abs(flux(i + 2) - flux(i) - gained)).toBeLessThan(2e-5 * flux(i));
    }
  });
  it("gives the same layer in any units, and suction thins it", () => {
    const x = spaced(31, 0, 0.11);
    const plain = fieldOf(wallOf(x, x.map((s) => 1 - s)));
    const scaled = fieldOf(wallOf(x.map((s) => 250 * s), x.map((s) => 40 * (1 - s))), 1.5e-5);
    const unit = Math.sqrt((1.5e-5 * 250) / 40);
    const sucked = fieldOf(wallOf(x, x.map((s) => 1 - s), { wallVelocity: x.map(() => -0.2) }));
    for (let i = 1; i < 31; i += 1) {
      expect(Math.abs(scaled.momentumLoss[i] / (unit * plain.momentumLoss[i]) - 1)).toBeLessThan(1e-9);
      expect(sucked.momentumLoss[i]).toBeLessThan(plain.momentumLoss[i]);
      expect(sucked.shape[i]).toBeLessThan(plain.shape[i]);
    }
  });
  it("never gives a number that is not finite, whatever smooth column it is given", () => {
    const number = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(number, { minLength: 3, maxLength: 3 }), fc.boolean(), number, (a, stagnation, blown) => {
        const x = spaced(16, 0, 1);
        const ue = x.map((s) => Math.exp(a[0] * s + a[1] * Math.sin(3 * s) + a[2] * s * s) * (stagnation ? s : 1));
        const made = fieldMarch(wallOf(x, ue, { wallVelocity: x.map((s) => 2 * blown * Math.cos(2 * s)) }), 0.01);
        if (!made.ok) return made.reason === "layer lifts off";
        const { march } = made;
        return [march.momentumLoss, march.defect, march.energyLoss, march.shape, march.friction, march.massDefect, march.blowVelocity].every((c) => c.every(Number.isFinite));
      }),
      { numRuns: 25 },
    );
  });
  it("refuses what it cannot use", () => {
    const wall = wallOf(spaced(5, 0, 1), Float64Array.of(0, 1, 2, 3, 4));
    expect(fieldMarch(wall, 1, { startMomentumLoss: 0.1 })).toMatchObject({ ok: false, reason: "start fixed" });
    expect(fieldMarch(wall, 0)).toMatchObject({ ok: false, reason: "not positive", argument: "nu" });
    expect(fieldMarch(wall, 1, { refinement: 20 })).toMatchObject({ ok: false, reason: "outside range", argument: "grid refinement" });
    expect(fieldMarch(wall, 1, { startShape: 2.5 })).toMatchObject({ ok: false, reason: "start shape alone" });
    const blown = wallOf(spaced(5, 0, 1), Float64Array.of(0, 1, 2, 3, 4), { wallVelocity: new Float64Array(5).fill(100) });
    expect(fieldMarch(blown, 1)).toMatchObject({ ok: false, reason: "layer lifts off", argument: "wall_velocity" });
  });
});

describe("profiles of the field march", () => {
  it("on a plate are Blasius' (18 digits, test/references), at a station or between stations", () => {
    const rows = readReference("blasius_profile_computed.csv");
    const [eta, u] = [numbers(rows, "eta"), numbers(rows, "fp")];
    const x = spaced(5, 0, 4);
    for (const at of [2, 2.7, 4]) {
      const made = fieldProfile(wallOf(x, x.map(() => 3)), 0.3, at);
      if (!made.ok) throw new Error(made.reason);
      const { height, speed, shear } = made.profile;
      const unit = Math.sqrt((0.3 * at) / 3);
      expect(Math.abs((shear[0] * unit) / 3 / 0.332057336 - 1)).toBeLessThan(1e-5);
      eta.forEach((e, k) => {
        // The cubic through both neighbours' values and slopes, as good as the march's own formula.
        const j = height.findIndex((y, i) => i + 1 < height.length && y <= e * unit && e * unit <= height[i + 1]);
        const h = height[j + 1] - height[j];
        const t = (e * unit - height[j]) / h;
        const between = speed[j] * (1 - t) ** 2 * (1 + 2 * t) + speed[j + 1] * t * t * (3 - 2 * t) + h * (shear[j] * t * (1 - t) ** 2 - shear[j + 1] * t * t * (1 - t));
        // The cubic itself errs by h⁴u⁗∕384, up to 1e-4 where steps are wide.
        expect(Math.abs(between / 3 - u[k])).toBeLessThan(2e-4);
      });
    }
  });
  it("integrate to the march's own θ and δ*, and beyond separation are refused", () => {
    const x = spaced(31, 0, 0.2);
    const wall = wallOf(x, x.map((s) => 1 - s));
    const made = fieldProfile(wall, 1, x[12]);
    if (!made.ok) throw new Error(made.reason);
    const { height, speed, shear } = made.profile;
    const march = fieldOf(wall);
    let theta = 0;
    const ue = march.edgeSpeed[12];
    for (let j = 0; j + 1 < height.length; j += 1) {
      const h = height[j + 1] - height[j];
      const q = (k: number): number => (speed[k] / ue) * (1 - speed[k] / ue);
      const r = (k: number): number => (shear[k] / ue) * (1 - (2 * speed[k]) / ue);
      theta += (h / 2) * (q(j) + q(j + 1)) + ((h * h) / 12) * (r(j) - r(j + 1));
    }
    expect(Math.abs(theta / march.momentumLoss[12] - 1)).toBeLessThan(1e-4);
    expect(fieldProfile(wall, 1, 0.15)).toMatchObject({ ok: false, reason: "outside column", argument: "station" });
    expect(fieldProfile(wall, 1, 0)).toMatchObject({ ok: false, reason: "outside column" });
  });
});

import fc from "fast-check";
import { cubicSpline } from "../../../src/numerics/cubic-spline";
import { cubicAt } from "../../../src/numerics/piecewise-cubic";
import type { BlowVelocity } from "../../../src/physics/coupling/blow-velocity";
import { blowVelocity } from "../../../src/physics/coupling/blow-velocity";
import { normalNoise } from "../../numerics/normal-noise";
import { spaced } from "../laminar/classic-flows";
import { laminarSolution } from "../laminar/laminar-solution";
import { marchOf } from "../laminar/march-of";

function blow(x: Float64Array, m: Float64Array, options: { noise?: number; radius?: Float64Array } = {}): BlowVelocity {
  const made = blowVelocity(x, m, options);
  if (!made.ok) throw new Error(`${made.reason} ${made.argument} ${made.row}`);
  return made;
}

/** The full solutions up to nine tenths of the way to separation, where dm/dx runs away. */
function solution(name: string): { x: Float64Array; m: Float64Array; full: ReturnType<typeof laminarSolution>; n: number } {
  const full = laminarSolution(name);
  const all = full.column("x");
  const n = all.findIndex((at) => at > 0.9 * full.separation);
  const ue = full.column("ue");
  return { x: all.slice(0, n), m: full.column("dstar").map((d, i) => d * ue[i]).slice(0, n), full, n };
}
const NAMES = ["howarth_1mx", "tani_1mx2", "sin_x", "hiemenz_poly"];

/** ∫ v dx by Simpson's rule on the spline through v: a quadrature that knows nothing of the curve of m. */
function integrated(x: Float64Array, v: Float64Array): number {
  const made = cubicSpline(x, v);
  if (!made.ok) throw new Error(made.reason);
  const n = 2000;
  const h = (x[x.length - 1] - x[0]) / n;
  let sum = 0;
  for (let k = 0; k <= n; k += 1) {
    const at = cubicAt(made.curve, k === n ? x[x.length - 1] : x[0] + k * h);
    if (!at.ok) throw new Error(at.reason);
    sum += (k === 0 || k === n ? 1 : k % 2 ? 4 : 2) * at.value;
  }
  return (sum * h) / 3;
}

describe("blow velocity of clean mass defects", () => {
  for (const name of NAMES) {
    it(`${name}: integrates back to the mass defect within 0.1 %, up to separation`, () => {
      const full = laminarSolution(name);
      const x = full.column("x");
      const m = full.column("dstar").map((d, i) => d * full.column("ue")[i]);
      for (const noise of [undefined, 0]) {
        const { velocity } = blow(x, m, { noise });
        const gain = m[m.length - 1] - m[0];
        expect(Math.abs(integrated(x, velocity) / gain - 1)).toBeLessThan(1e-3);
      }
    });
    it(`${name}: equals the dm/dx that follows from the tabulated wall shear by the momentum integral within 0.2 %`, () => {
      // m = (ue H) θ, so dm/dx = (ue H)′ θ + ue H θ′ with θ′ = τw∕ue² − (2 + H) θ ue′∕ue (von Kármán 1921): θ′ comes from the wall shear
      // column, not from any difference of m; only the mild ue H is differentiated.
      const { x, m, full, n } = solution(name);
      const [ue, slope, h, theta, tau] = ["ue", "duedx", "H", "theta", "tau_w"].map((c) => full.column(c).slice(0, n));
      const mild = cubicSpline(x, h.map((shape, i) => shape * ue[i]));
      if (!mild.ok) throw new Error(mild.reason);
      const { velocity } = blow(x, m, { noise: 0 });
      for (let i = 1; i < n - 1; i += 1) {
        const growth = tau[i] / ue[i] ** 2 - ((2 + h[i]) * theta[i] * slope[i]) / ue[i];
        const expected = mild.curve.slope[i] * theta[i] + ue[i] * h[i] * growth;
        // the first two stations of the leading-edge flows differentiate √x, which a cubic does not know
        if (i > 2) expect(Math.abs(velocity[i] / expected - 1)).toBeLessThan(2e-3);
      }
    });
  }
  it("is Blasius's 0.8604 ue∕√Rex on a plate (Schlichting: v∞ of the flat plate) away from the leading edge", () => {
    const x = spaced(200, 0.2, 2);
    const [ue, nu] = [10, 1e-5];
    const { velocity } = blow(x, x.map((at) => 1.7208 * Math.sqrt(nu * ue * at)), { noise: 0 });
    velocity.forEach((v, i) => expect(Math.abs((v / ue) * Math.sqrt((ue * x[i]) / nu) - 0.8604)).toBeLessThan(2e-4));
  });
  it("of a Thwaites march on 15 stations equals that on 400 within 0.5 % away from the ends", () => {
    const at = (n: number): [Float64Array, Float64Array] => {
      const x = spaced(n, 0, 1.6);
      const march = marchOf(x, x.map(Math.sin));
      return [x, blow(x, march.massDefect, { noise: 0 }).velocity];
    };
    const [, coarse] = at(15);
    const [, fine] = at(15 + 14 * 29);
    for (let i = 2; i < 12; i += 1) expect(Math.abs(coarse[i] / fine[i * 30] - 1)).toBeLessThan(5e-3);
  });
});

describe("blow velocity of a mass defect with 0.5 % noise", () => {
  for (const name of NAMES) {
    it(`${name}: noise is found, ± covers the truth as often as it should, and the error stays bounded`, () => {
      const { x, m } = solution(name);
      // 50 stations of the same curve, so that the truth is known everywhere
      const clean = cubicSpline(x, m);
      if (!clean.ok) throw new Error(clean.reason);
      const stations = spaced(50, x[0], x[x.length - 1]);
      const truth = stations.map((at, i) => {
        const place = cubicAt(clean.curve, i === 49 ? x[x.length - 1] : at);
        if (!place.ok) throw new Error(place.reason);
        return place.value;
      });
      const truthSlope = stations.map((at, i) => {
        const place = cubicAt(clean.curve, i === 49 ? x[x.length - 1] : at);
        return place.ok ? place.slope : NaN;
      });
      stations[49] = x[x.length - 1];
      const sigma = 0.005 * Math.max(...m);
      const typical = (m[m.length - 1] - m[0]) / (x[x.length - 1] - x[0]);
      for (const given of [sigma, undefined]) {
        let inside = 0;
        let noiseRatio = 0;
        let square = 0;
        let stated = 0;
        const runs = 40;
        for (let run = 1; run <= runs; run += 1) {
          const noise = normalNoise(run);
          const got = blow(stations, truth.map((value) => value + sigma * noise()), { noise: given });
          noiseRatio += got.smoothed.noise / sigma / runs;
          got.velocity.forEach((v, i) => {
            if (Math.abs(v - truthSlope[i]) <= 1.96 * got.standardError[i]) inside += 1;
            square += (v - truthSlope[i]) ** 2;
            stated += got.standardError[i] ** 2;
          });
        }
        const coverage = inside / (50 * runs);
        expect(coverage).toBeGreaterThan(0.9); // 95 % intervals; 40 columns, curvature at the ends costs a few per cent
        expect(noiseRatio).toBeGreaterThan(0.9);
        expect(noiseRatio).toBeLessThan(1.1);
        // root mean square error against the stated one, and against the mean blow velocity
        expect(Math.sqrt(square / stated)).toBeGreaterThan(0.6);
        expect(Math.sqrt(square / stated)).toBeLessThan(1.4);
        expect(Math.sqrt(square / (50 * runs)) / typical).toBeLessThan(0.1);
      }
    });
  }
  it("still integrates back to the mass defect within the noise", () => {
    const { x, m } = solution("sin_x");
    const sigma = 0.005 * Math.max(...m);
    const noise = normalNoise(4);
    const { velocity } = blow(x, m.map((value) => value + sigma * noise()));
    expect(Math.abs(integrated(x, velocity) - (m[m.length - 1] - m[0]))).toBeLessThan(4 * sigma);
  });
});

describe("blow velocity on round bodies", () => {
  it("is (1/r) d(r m)/dx: m = x², r = x gives 3x, and 2 dm/dx on the axis", () => {
    const x = spaced(21, 0, 2);
    const { velocity } = blow(x, x.map((at) => at * at + at), { noise: 0, radius: x });
    velocity.forEach((v, i) => expect(v).toBeCloseTo(3 * x[i] + 2, 10));
  });
  it("is that of the plane wall on a constant radius", () => {
    const x = spaced(30, 1, 2);
    const noise = normalNoise(9);
    const m = x.map((at) => Math.sqrt(at) + 0.01 * noise());
    const plane = blow(x, m);
    const round = blow(x, m, { radius: x.map(() => 0.7) });
    round.velocity.forEach((v, i) => expect(v).toBeCloseTo(plane.velocity[i], 12));
    round.standardError.forEach((e, i) => expect(e).toBeCloseTo(plane.standardError[i], 12));
  });
  it("conserves mass: ∫ r v dx = r m at the end, from the nose of a sphere", () => {
    const x = spaced(60, 0, 1.7);
    const r = x.map(Math.sin);
    const march = marchOf(x, x.map((s) => 1.5 * Math.sin(s)), 1, { radius: r });
    const { velocity } = blow(x, march.massDefect, { noise: 0, radius: r });
    expect(integrated(x, velocity.map((v, i) => v * r[i])) / (r[59] * march.massDefect[59])).toBeCloseTo(1, 4);
  });
  it("states the error of m′ + m r′∕r, by repeated noise", () => {
    const x = spaced(60, 0.5, 2);
    const r = x.map((at) => at * at);
    const truth = (at: number): number => Math.sin(at);
    let inside = 0;
    const noise = normalNoise(21);
    for (let run = 0; run < 30; run += 1) {
      const got = blow(x, x.map((at) => truth(at) + 0.01 * noise()), { noise: 0.01, radius: r });
      got.velocity.forEach((v, i) => {
        if (Math.abs(v - Math.cos(x[i]) - (2 * truth(x[i])) / x[i]) <= 1.96 * got.standardError[i]) inside += 1;
      });
    }
    expect(inside / 1800).toBeGreaterThan(0.9);
  });
  it("states the error of a straight line's m′ + a m as any statistics text does", () => {
    const x = spaced(12, 1, 2);
    const radius = x.map((at) => at ** 3);
    const got = blow(x, x.map((at) => 3 - at), { noise: 1, radius });
    const xx = x.reduce((sum, at) => sum + (at - 1.5) ** 2, 0);
    got.standardError.forEach((e, i) => {
      const [a, d] = [3 / x[i], x[i] - 1.5];
      // the strongest smoothing leaves a trace of curvature
      expect(Math.abs(e ** 2 / ((1 + 2 * a * d + a * a * d * d) / xx + (a * a) / 12) - 1)).toBeLessThan(1e-4);
    });
  });
  it("refuses a mass defect on the axis and a radius that is none", () => {
    const x = spaced(8, 0, 1);
    expect(blowVelocity(x, x.map((at) => at + 1), { radius: x })).toMatchObject({ ok: false, reason: "outside range", argument: "mass_defect", row: 1 });
    expect(blowVelocity(x, x, { radius: x.map((at) => 1 - at) })).toMatchObject({ ok: false, reason: "not positive", argument: "radius", row: 8 });
    expect(blowVelocity(x.slice(0, 5), x.slice(0, 5))).toMatchObject({ ok: false, reason: "too few points" });
    expect(blowVelocity(x, x, { noise: -1 })).toMatchObject({ ok: false, reason: "negative", argument: "noise" });
  });
});

describe("properties of the blow velocity", () => {
  it("gives a refusal or finite numbers for any finite columns, and leaves them alone", () => {
    const columns = fc.array(fc.tuple(fc.double({ min: 1e-9, max: 1e9, noNaN: true }), fc.double({ min: -1e100, max: 1e100, noNaN: true }), fc.double({ min: 1e-9, max: 1e9, noNaN: true })), {
      minLength: 2,
      maxLength: 15,
    });
    fc.assert(
      fc.property(columns, fc.option(fc.double({ min: 0, max: 1e50, noNaN: true })), fc.boolean(), (rows, noise, round) => {
        let sum = 0;
        const x = Float64Array.from(rows, ([h]) => (sum += h));
        const m = Float64Array.from(rows, ([, value]) => value);
        const radius = round ? Float64Array.from(rows, ([, , value]) => value) : undefined;
        const copies = [x.slice(), m.slice(), radius?.slice()];
        const made = blowVelocity(x, m, { noise: noise ?? undefined, radius });
        expect([x, m, radius]).toEqual(copies);
        if (!made.ok) return;
        for (const column of [made.velocity, made.standardError, made.smoothed.curve.value]) expect(column.every(Number.isFinite)).toBe(true);
        expect(made.standardError.every((e) => e >= 0)).toBe(true);
        expect(Number.isFinite(made.smoothed.noise) && Number.isFinite(made.smoothed.freedom)).toBe(true);
      }),
      { numRuns: 400 },
    );
  });
});

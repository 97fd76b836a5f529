import fc from "fast-check";
import type { SimilarBranch } from "../../../src/physics/laminar/similar-branch";
import { incipientSimilar, similarBranch } from "../../../src/physics/laminar/similar-branch";
import { similarByDefect } from "../../../src/physics/laminar/similar-by-defect";
import type { SimilarLayer } from "../../../src/physics/laminar/similar-layer";
import { INCIPIENT_M, similarLayer, similarSpeed } from "../../../src/physics/laminar/similar-layer";
import { numbers, readReference } from "../../references/read-reference";
import { independently } from "./independent-solver";

function layer(m: number, options: { branch?: SimilarBranch; transpiration?: number } = {}): SimilarLayer {
  const made = similarLayer(m, options);
  if (!made.ok) throw new Error(made.reason);
  return made.layer;
}

/** f″(0) for Hartree's β. */
function wallShear(beta: number, branch: SimilarBranch = "attached"): number {
  const made = similarBranch(beta, 0, branch);
  if (!made.ok) throw new Error(made.reason);
  return made.nodes.y[2];
}

describe("similar layers against published values", () => {
  // A. M. O. Smith, J. Aero. Sci. 21 (1954) 154 (five decimals; from memory), as reprinted in White, Viscous Fluid Flow, table 4-2.
  it.each([
    [2, 1.68722], [1.6, 1.52151], [1.2, 1.33572], [1, 1.23259], [0.8, 1.12027], [0.6, 0.99584], [0.5, 0.92768], [0.4, 0.85442], [0.3, 0.77476],
    [0.2, 0.68671], [0.1, 0.58704], [0, 0.4696], [-0.05, 0.40032], [-0.1, 0.31927], [-0.14, 0.23974], [-0.16, 0.19078], [-0.18, 0.12864], [-0.19, 0.0857], [-0.195, 0.05517],
  ])("β = %d: f″(0) = %d (Smith 1954, five decimals)", (beta, printed) => {
    expect(Math.abs(wallShear(beta) - printed)).toBeLessThan(6e-6);
  });
  // D. R. Hartree, Proc. Camb. Phil. Soc. 33 (1937) 223 (three decimals; from memory).
  it.each([[1.6, 1.521], [1, 1.233], [0.5, 0.927], [0.2, 0.687], [0, 0.47], [-0.1, 0.319], [-0.16, 0.191], [-0.18, 0.128]])("β = %d: f″(0) = %d (Hartree 1937, three decimals)", (beta, printed) => {
    expect(Math.abs(wallShear(beta) - printed)).toBeLessThan(1.01e-3);
  });
  // T. Cebeci & H. B. Keller, J. Comput. Phys. 7 (1971) 289–300, reversed branch (six decimals; from memory).
  it.each([[-0.025, -0.074366], [-0.05, -0.108271], [-0.1, -0.140546], [-0.15, -0.133421], [-0.18, -0.097692]])("β = %d reversed: f″(0) = %d (Cebeci & Keller 1971)", (beta, printed) => {
    expect(Math.abs(wallShear(beta, "reversed") - printed)).toBeLessThan(1e-6);
  });
  // White, Viscous Fluid Flow, table 4-2 (from memory): δ* and θ in Hartree's η, five decimals.
  it.each([[0, 1.21678, 0.4696], [1 / 3, 0.80455, 0.35027], [1, 0.6479, 0.29234]])("m = %d: δ* = %d, θ = %d (White)", (m, defect, momentumLoss) => {
    expect(Math.abs(layer(m).defect - defect)).toBeLessThan(6e-6);
    expect(Math.abs(layer(m).momentumLoss - momentumLoss)).toBeLessThan(6e-6);
  });
  it("separates at β = −0.198838, m = −0.0904286 with H = 4.029 (Hartree 1937: −0.1988; more digits: Cebeci & Keller 1971, from memory)", () => {
    const verge = incipientSimilar(0);
    if (!verge.ok) throw new Error(verge.reason);
    expect(Math.abs(verge.nodes.beta + 0.198838)).toBeLessThan(1e-6);
    expect(verge.nodes.beta / (2 - verge.nodes.beta)).toBeCloseTo(INCIPIENT_M, 11);
    expect(layer(-0.0904286).wallShear).toBeLessThan(1e-9);
    expect(layer(-0.0904286).shape).toBeCloseTo(4.029, 3);
  });
  it("reaches the limit β = 2 of m → ∞", () => {
    expect(layer(1e9).wallShear).toBeCloseTo(1.687218, 6);
  });
});

describe("similar layers against other solutions", () => {
  it("meets the Blasius profile of 18 digits (test/references/blasius_profile_computed.csv) to 1e-9 at every height", () => {
    const rows = readReference("blasius_profile_computed.csv");
    const [eta, u, shear] = ["eta", "fp", "fpp"].map((c) => numbers(rows, c));
    const { nodes } = layer(0);
    eta.forEach((height, i) => {
      const at = similarSpeed(nodes, height / Math.SQRT2);
      expect(Math.abs(at.speed - u[i])).toBeLessThan(1e-9);
      expect(Math.abs(at.shear / Math.SQRT2 - shear[i])).toBeLessThan(2e-9);
    });
  });
  it("meets flat plates with suction and blowing (test/references/blasius_transpiration_computed.csv, ten digits) to 1e-8", () => {
    for (const row of readReference("blasius_transpiration_computed.csv")) {
      const got = layer(0, { transpiration: -Number(row.f_w) / Math.SQRT2 });
      expect(Math.abs(got.wallShear - Number(row.fpp0))).toBeLessThan(1e-8);
      expect(Math.abs(got.defect * Math.SQRT2 / Number(row.dstar_x_sqrtRex) - 1)).toBeLessThan(1e-8);
      expect(Math.abs(got.momentumLoss * Math.SQRT2 / Number(row.theta_x_sqrtRex) - 1)).toBeLessThan(1e-8);
    }
  });
  // An independent library, extrapolated midpoint integration (E. Hairer & G. Wanner's ODEX), started with our f″(0): a wrong one would leave u = 1
  // like exp(η²∕2) or end in reversed flow; the integrals are carried along.
  it.each([[5, 0, "attached", 5], [1, 0, "attached", 5.5], [1 / 3, 0, "attached", 6], [0, 0, "attached", 6], [-0.05, 0, "attached", 6.5], [-0.09, 0, "attached", 7], [-0.05, 0, "reversed", 9], [1, 0.5, "attached", 6], [-0.2, -2, "attached", 3.5]] as const)(
    "m = %d, transpiration %d, %s: the solver of an independent library ends in the free stream with the same δ*, θ, δ3 to 1e-8",
    (m, transpiration, branch, height) => {
      const ours = layer(m, { transpiration, branch });
      const { beta, wall } = ours;
      const right = (_x: number, y: number[]): number[] => [y[1], y[2], -y[0] * y[2] - beta * (1 - y[1] * y[1]), 1 - y[1], y[1] * (1 - y[1]), y[1] * (1 - y[1] * y[1])];
      // Newton on f″(0) by the library alone, from our value disturbed, to a height where u = 1 within the growth of rounding.
      const shot = (s: number): number[] => independently(right, [wall, 0, s, 0, 0, 0], height);
      let s = ours.wallShear + 1e-6;
      let before = ours.wallShear - 1e-6;
      const target = similarSpeed(ours.nodes, height).speed;
      let missBefore = shot(before)[1] - target;
      for (let k = 0; k < 12 && Math.abs(s - before) > 1e-15; k += 1) {
        const miss = shot(s)[1] - target;
        if (miss === missBefore) break;
        const next = s - (miss * (s - before)) / (miss - missBefore);
        before = s;
        missBefore = miss;
        s = next;
      }
      expect(Math.abs(s - ours.wallShear)).toBeLessThan(1e-8);
      const end = shot(s);
      const rest = 1 - target;
      expect(rest).toBeLessThan(1e-4);
      // What lies above the height is taken from our profile; below it the library's integrals stand.
      const above = tail(ours, height);
      expect(Math.abs(end[3] + above.defect - ours.defect)).toBeLessThan(1e-8);
      expect(Math.abs(end[4] + above.momentumLoss - ours.momentumLoss)).toBeLessThan(1e-8);
      expect(Math.abs(end[5] + above.energyLoss - ours.energyLoss)).toBeLessThan(1e-8);
    },
  );
  it("satisfies the momentum integral f″(0) = f(0) + (1 + β) θ + β δ* and the energy integral 2∫f″² = f(0) + (1 + 2β) δ3", () => {
    for (const m of [-0.09, -0.05, 0, 0.2, 1, 5]) {
      const { wallShear: s, wall, beta, defect, momentumLoss, energyLoss, dissipation } = layer(m);
      expect(Math.abs(s - wall - (1 + beta) * momentumLoss - beta * defect)).toBeLessThan(1e-9);
      // f‴ + f f″ + β(1 − f′²) = 0 times 2f′, integrated from the wall to the free stream.
      // The error of δ3 enters 1 + 2β times, up to 4.3: hence 3e-9.
      expect(Math.abs((2 * dissipation) / momentumLoss - wall - (1 + 2 * beta) * energyLoss)).toBeLessThan(3e-9);
    }
  });
});

/** Integrals of our profile above a height, by Simpson's rule on a fine grid. */
function tail(ours: SimilarLayer, from: number): { defect: number; momentumLoss: number; energyLoss: number } {
  const top = ours.nodes.step * (ours.nodes.y.length / 3 - 1);
  const n = 2000;
  const sums = { defect: 0, momentumLoss: 0, energyLoss: 0 };
  for (let i = 0; i <= n; i += 1) {
    const u = similarSpeed(ours.nodes, from + ((top - from) * i) / n).speed;
    const w = (((top - from) / n) * (i === 0 || i === n ? 1 : i % 2 ? 4 : 2)) / 3;
    sums.defect += w * (1 - u);
    sums.momentumLoss += w * u * (1 - u);
    sums.energyLoss += w * u * (1 - u * u);
  }
  return sums;
}

describe("similar layers as a family", () => {
  it("tends to the asymptotic suction profile: H → 2 and f″(0) → f(0)", () => {
    const strong = layer(0, { transpiration: -20 });
    expect(strong.shape).toBeCloseTo(2, 2);
    expect(strong.wallShear / strong.wall).toBeCloseTo(1, 2);
  });
  it("thickens with blowing and thins with suction, for any exponent", () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 3, noNaN: true }), fc.double({ min: 0.02, max: 0.4, noNaN: true }), (m, blown) => {
        const [less, none, more] = [-blown, 0, blown].map((transpiration) => layer(m, { transpiration }));
        expect(less.momentumLoss).toBeLessThan(none.momentumLoss);
        expect(more.momentumLoss).toBeGreaterThan(none.momentumLoss);
        expect(less.shape).toBeLessThan(none.shape);
        expect(more.shape).toBeGreaterThan(none.shape);
      }),
      { numRuns: 10 },
    );
  });
  it("finds the layer of a given λ or H again", () => {
    for (const m of [-0.08, -0.03, 0.1, 1]) {
      const known = layer(m);
      const byGradient = similarByDefect({ gradient: known.gradient });
      const byShape = similarByDefect({ shape: known.shape });
      if (!byGradient.ok || !byShape.ok) throw new Error("refused");
      expect(byGradient.layer.m).toBeCloseTo(m, 7);
      expect(byShape.layer.m).toBeCloseTo(m, 7);
    }
    expect(similarByDefect({ shape: 4.2 })).toMatchObject({ ok: false, reason: "outside range", argument: "start shape" });
  });
  it("refuses what has no layer, naming the limit", () => {
    expect(similarLayer(-0.0905)).toMatchObject({ ok: false, reason: "no similar layer", values: { least: INCIPIENT_M } });
    expect(similarLayer(0.1, { branch: "reversed" })).toMatchObject({ ok: false, reason: "no reversed layer" });
    expect(similarLayer(NaN)).toMatchObject({ ok: false, reason: "not finite" });
    expect(similarLayer(0, { transpiration: -50 })).toMatchObject({ ok: false, reason: "outside range" });
  });
  it("is blown off the flat plate between 0.618 and 0.620 (Emmons & Leigh 1954: 0.619)", () => {
    expect(layer(0, { transpiration: 0.618 }).wallShear).toBeGreaterThan(0);
    expect(similarLayer(0, { transpiration: 0.62 })).toMatchObject({ ok: false, reason: "layer lifts off" });
  });
});

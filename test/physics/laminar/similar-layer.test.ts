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
  // Shooting by an independent integrator (npm "odex"): f″(0) is found by secant from the free stream u = 1 at a height where our profile lacks less
  // than 1e-10 of it, nothing of our solution entering but the first guess; δ*, θ, δ3 are integrated along.
  it.each([[5, 0, "attached", 7], [1, 0, "attached", 7.5], [1 / 3, 0, "attached", 8], [0, 0, "attached", 8.5], [-0.05, 0, "attached", 9], [-0.09, 0, "attached", 10], [-0.05, 0, "reversed", 13], [1, 0.5, "attached", 8.5], [-0.2, -2, "attached", 5.5]] as const)(
    "m = %d, transpiration %d, %s: an independent integrator shoots to the same f″(0), δ*, θ, δ3 to 1e-8",
    (m, transpiration, branch, height) => {
      const ours = layer(m, { transpiration, branch });
      const { beta, wall } = ours;
      expect(1 - similarSpeed(ours.nodes, height).speed).toBeLessThan(1e-10);
      const right = (_x: number, y: number[]): number[] => [y[1], y[2], -y[0] * y[2] - beta * (1 - y[1] * y[1]), 1 - y[1], y[1] * (1 - y[1]), y[1] * (1 - y[1] * y[1])];
      const shot = (s: number): number[] => independently(right, [wall, 0, s, 0, 0, 0], height);
      let before = ours.wallShear - 1e-5;
      let s = ours.wallShear + 1e-5;
      let missBefore = shot(before)[1] - 1;
      for (let k = 0; k < 12 && Math.abs(s - before) > 1e-14; k += 1) {
        const miss = shot(s)[1] - 1;
        if (miss === missBefore) break;
        const next = s - (miss * (s - before)) / (miss - missBefore);
        before = s;
        missBefore = miss;
        s = next;
      }
      const end = shot(s);
      expect(Math.abs(end[1] - 1)).toBeLessThan(1e-10);
      expect(Math.abs(s - ours.wallShear)).toBeLessThan(1e-8);
      expect(Math.abs(end[3] - ours.defect)).toBeLessThan(1e-8);
      expect(Math.abs(end[4] - ours.momentumLoss)).toBeLessThan(1e-8);
      expect(Math.abs(end[5] - ours.energyLoss)).toBeLessThan(1e-8);
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

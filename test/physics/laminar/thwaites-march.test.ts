import { thwaitesShape, thwaitesShear } from "../../../src/physics/laminar/thwaites-relations";
import { CLASSIC_FLOWS, exactGrowth, exactSeparation, spaced } from "./classic-flows";
import { laminarSolution } from "./laminar-solution";
import { marchOf, separationOf } from "./march-of";

const DEGREES = 180 / Math.PI;

describe("Thwaites' method against its closed forms (Thwaites 1949: θ² = 0.45 ν ue⁻⁶ ∫ ue⁵ dx)", () => {
  const fine = spaced(2001, 0, 1);
  const check = (x: Float64Array, ue: Float64Array, theta2: (x: number) => number, lambda: (x: number) => number, radius?: Float64Array): void => {
    const march = marchOf(x, ue, 1, { radius });
    expect(march.reached).toBeGreaterThan(100);
    for (let i = 0; i < march.reached; i += 1) {
      expect(Math.abs(march.momentumLoss[i] - Math.sqrt(theta2(x[i])))).toBeLessThan(1e-9);
      expect(Math.abs(march.gradient[i] - lambda(x[i]))).toBeLessThan(1e-9);
    }
  };
  it("flat plate: θ² = 0.45 ν x ∕ U", () => check(fine, fine.map(() => 2), (x) => (0.45 * x) / 2, () => 0));
  it("1 − x: θ² = 0.075 ((1 − x)⁻⁶ − 1), separating where (1 − x)⁻⁶ = 2.2", () => {
    const theta2 = (x: number): number => 0.075 * ((1 - x) ** -6 - 1);
    const x = spaced(501, 0, 0.2);
    check(x, x.map((at) => 1 - at), theta2, (at) => -theta2(at));
    const at = separationOf(marchOf(x, x.map((s) => 1 - s)));
    expect(at.x).toBeCloseTo(1 - 2.2 ** (-1 / 6), 9);
    expect(at.momentumLoss).toBeCloseTo(0.3, 9);
  });
  it("1 − x²: by the polynomial ∫ (1 − x²)⁵", () => {
    const x = spaced(501, 0, 0.4);
    const i5 = (s: number): number => s - (5 / 3) * s ** 3 + 2 * s ** 5 - (10 / 7) * s ** 7 + (5 / 9) * s ** 9 - s ** 11 / 11;
    const theta2 = (s: number): number => (0.45 * i5(s)) / (1 - s * s) ** 6;
    check(x, x.map((s) => 1 - s * s), theta2, (s) => -2 * s * theta2(s));
  });
  it("eˣ: θ² = 0.09 (e⁻ˣ − e⁻⁶ˣ)", () => {
    const theta2 = (s: number): number => 0.09 * (Math.exp(-s) - Math.exp(-6 * s));
    check(fine, fine.map(Math.exp), theta2, (s) => theta2(s) * Math.exp(s));
  });
  it("sin x: by ∫ sin⁵ = 8∕15 − cos + ⅔ cos³ − ⅕ cos⁵", () => {
    const x = spaced(4001, 0, 1.9);
    const i5 = (s: number): number => {
      const c = Math.cos(s);
      return s < 0.05 ? s ** 6 / 6 - (5 / 48) * s ** 8 : 8 / 15 - c + (2 / 3) * c ** 3 - c ** 5 / 5;
    };
    const march = marchOf(x, x.map(Math.sin));
    for (let i = 1; i < march.reached; i += 1) {
      // close to 0 the closed form cancels: its series (two terms) stands in, good to 2e-7 there
      const tolerance = x[i] < 0.05 ? 1e-6 : x[i] < 0.2 ? 1e-7 : 1e-9;
      expect(Math.abs(march.momentumLoss[i] - Math.sqrt((0.45 * i5(x[i])) / Math.sin(x[i]) ** 6))).toBeLessThan(tolerance);
    }
  });
  it("plane stagnation flow ue = a x: θ² = 0.075 ν ∕ a, λ = 0.075, from the first station on", () => {
    check(fine, fine.map((x) => 3 * x), () => 0.025, () => 0.075);
  });
  it("round stagnation flow ue = a x, r = x: θ² = 0.05625 ν ∕ a (Rott & Crabtree 1952)", () => {
    check(fine, fine.map((x) => 3 * x), () => 0.05625 / 3, () => 0.05625, fine);
  });
  it("cone: r = x with constant speed makes θ² a third of the plate's (Mangler)", () => {
    check(fine, fine.map(() => 1), (x) => 0.15 * x, () => 0, fine);
  });
  it("wedge flow x^m away from its tip, started with its own θ: θ² = 0.45 ν x^(1−m) ∕ (5m + 1)", () => {
    for (const m of [1 / 3, 0.1, -0.05]) {
      const x = spaced(2001, 1, 2);
      const theta2 = (s: number): number => (0.45 * s ** (1 - m)) / (5 * m + 1);
      const march = marchOf(x, x.map((s) => s ** m), 1, { startMomentumLoss: Math.sqrt(theta2(1)) });
      expect(march.start).toBe("given momentum loss");
      march.momentumLoss.forEach((theta, i) => expect(Math.abs(theta - Math.sqrt(theta2(x[i])))).toBeLessThan(1e-9));
      march.gradient.forEach((lambda) => expect(Math.abs(lambda - (0.45 * m) / (5 * m + 1))).toBeLessThan(1e-8));
    }
  });
  it("builds every other column from θ and λ by their definitions", () => {
    const x = spaced(21, 0, 0.1);
    const march = marchOf(x, x.map((s) => 5 * (1 - s)), 0.01);
    for (let i = 1; i < march.reached; i += 1) {
      const [theta, lambda, ue] = [march.momentumLoss[i], march.gradient[i], march.edgeSpeed[i]];
      expect(march.shape[i]).toBe(thwaitesShape(lambda));
      expect(march.defect[i] / theta).toBeCloseTo(thwaitesShape(lambda), 12);
      expect(march.momentumReynolds[i]).toBeCloseTo((ue * theta) / 0.01, 10);
      expect(march.massDefect[i]).toBeCloseTo(ue * march.defect[i], 12);
      // S = θ τw ∕ (μ ue), cf = 2 τw ∕ (ρ ue²)
      expect((march.friction[i] * march.momentumReynolds[i]) / 2).toBeCloseTo(thwaitesShear(lambda), 12);
    }
    expect(march.frictionBlank[0]).toBe(1);
    expect(march.friction[0]).toBe(0);
  });
});

describe("Thwaites' method on 15 coarse stations", () => {
  for (const flow of CLASSIC_FLOWS) {
    it(`finds the separation of ${flow.name} within 0.1 % of the method's exact station and θ within 0.02 %, on even, bunched and uneven columns`, () => {
      const exact = exactSeparation(flow);
      for (const over of [1.02, 1.1, 1.25]) {
        const length = over * exact;
        const even = spaced(15, 0, length);
        const columns = [even, even.map((x) => (length * (1 - Math.cos((Math.PI * x) / length))) / 2), even.map((x, i) => (i % 14 === 0 ? x : x + (0.3 * length * Math.sin(17 * i)) / 14))];
        for (const x of columns) {
          const march = marchOf(x, x.map(flow.ue));
          const found = separationOf(march);
          expect(Math.abs(found.x / exact - 1)).toBeLessThan(1e-3);
          expect(found.momentumLoss ** 2).toBeCloseTo(exactGrowth(flow, found.x), 2);
          for (let i = 1; i < march.reached; i += 1) expect(Math.abs(march.momentumLoss[i] / Math.sqrt(exactGrowth(flow, x[i])) - 1)).toBeLessThan(2e-4);
        }
      }
    });
  }
  it("converges in θ with at least the third power of the spacing", () => {
    const flow = CLASSIC_FLOWS[5];
    const errorOf = (n: number): number => {
      const x = spaced(n + 1, 0, 1.9);
      const march = marchOf(x, x.map(flow.ue));
      return Math.max(...[0.25, 0.5, 0.75].map((share) => Math.abs(march.momentumLoss[Math.round(n * share)] / Math.sqrt(exactGrowth(flow, x[Math.round(n * share)])) - 1)));
    };
    expect(Math.log2(errorOf(20) / errorOf(40))).toBeGreaterThan(3);
    expect(Math.log2(errorOf(40) / errorOf(80))).toBeGreaterThan(3);
  });
});

describe("separation on cylinder and sphere", () => {
  it("cylinder, ue = 2 sin: 103.1° (White, Viscous Fluid Flow, §4-6.6; from memory), and the quadrature's value to 1e-6", () => {
    const cylinder = { name: "", ue: (x: number) => 2 * Math.sin(x), slope: (x: number) => 2 * Math.cos(x), before: 2 };
    const x = spaced(400, 0, 2.2);
    const found = separationOf(marchOf(x, x.map(cylinder.ue))).x;
    expect(found).toBeCloseTo(exactSeparation(cylinder), 6);
    expect(Math.abs(found * DEGREES - 103.1)).toBeLessThan(0.05);
  });
  it("sphere, ue = 1.5 sin, r = sin: 103.6° (White, same place; from memory), by ∫ sin⁷ in closed form", () => {
    const i7 = (s: number): number => 16 / 35 - Math.cos(s) + Math.cos(s) ** 3 - 0.6 * Math.cos(s) ** 5 + Math.cos(s) ** 7 / 7;
    const x = spaced(400, 0, 2.2);
    const march = marchOf(x, x.map((s) => 1.5 * Math.sin(s)), 1, { radius: x.map(Math.sin) });
    const found = separationOf(march);
    expect((0.45 * i7(found.x) * Math.cos(found.x)) / Math.sin(found.x) ** 8).toBeCloseTo(-0.09, 6);
    expect(Math.abs(found.x * DEGREES - 103.6)).toBeLessThan(0.3);
    expect(march.momentumLoss[200]).toBeCloseTo(Math.sqrt((0.45 * i7(x[200])) / (1.5 * Math.sin(x[200]) ** 8)), 8);
  });
});

describe("the method's own error against full solutions of the boundary-layer equations (laminar_*.csv)", () => {
  // Bounds are what was measured, rounded up; they are the figures of the function's limits. Share: up to that part of the way to separation.
  const rows: Array<[string, number, { xs: number; theta: number; shape: number; defect: number; friction: number; energy: number }]> = [
    ["howarth_1mx", 0, { xs: 0.029, theta: 0.013, shape: 0.022, defect: 0.012, friction: 0.15, energy: 0.015 }],
    ["tani_1mx2", 1, { xs: 0.013, theta: 0.0105, shape: 0.011, defect: 0.017, friction: 0.035, energy: 0.0105 }],
    ["sin_x", 5, { xs: 0.013, theta: 0.064, shape: 0.068, defect: 0.007, friction: 0.048, energy: 0.078 }],
    ["hiemenz_poly", 6, { xs: 0.013, theta: 0.064, shape: 0.068, defect: 0.007, friction: 0.044, energy: 0.078 }],
  ];
  for (const [name, index, bound] of rows) {
    it(`${name}: separation within ${(100 * bound.xs).toFixed(1)} %; up to nine tenths of the way θ, H, δ*, cf, δ3 within the stated bounds`, () => {
      const full = laminarSolution(name);
      const flow = CLASSIC_FLOWS[index];
      const x = Float64Array.of(0, ...full.column("x"));
      const march = marchOf(x, x.map(flow.ue));
      expect(Math.abs(exactSeparation(flow) / full.separation - 1)).toBeLessThan(bound.xs);
      const worst = (mine: Float64Array, theirs: Float64Array): number => {
        let most = 0;
        for (let i = 0; i < theirs.length && x[i + 1] <= 0.9 * full.separation; i += 1) most = Math.max(most, Math.abs(mine[i + 1] / theirs[i] - 1));
        return most;
      };
      const pairs = [
        [march.momentumLoss, "theta", bound.theta],
        [march.shape, "H", bound.shape],
        [march.defect, "dstar", bound.defect],
        [march.friction, "cf", bound.friction],
        [march.energyLoss, "delta3", bound.energy],
      ] as const;
      for (const [mine, theirs, most] of pairs) {
        const error = worst(mine, full.column(theirs));
        expect(error).toBeLessThan(most);
        expect(error).toBeGreaterThan(0.5 * most); // the stated figure is the error, not a wide margin
      }
    });
  }
  it("flat plate (Schlichting: θ 0.664, cf 0.664, δ* 1.721, H 2.59): θ 1.0 % high, cf 0.9 % high, δ* 1.1 % high, H 0.1 % high", () => {
    const x = spaced(11, 0, 1);
    const march = marchOf(x, x.map(() => 1));
    expect(march.momentumLoss[10] / 0.66411).toBeCloseTo(1.0101, 3);
    expect(march.friction[10] / 0.66411).toBeCloseTo(1.0089, 3);
    expect(march.defect[10] / 1.72079).toBeCloseTo(1.0111, 3);
    expect(march.shape[10] / 2.5911).toBeCloseTo(1.001, 3);
  });
});

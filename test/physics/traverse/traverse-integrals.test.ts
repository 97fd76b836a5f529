import fc from "fast-check";
import { traverseIntegrals, type Traverse, type TraverseSettings } from "../../../src/physics/traverse/traverse-integrals";
import { numbers, readReference } from "../../references/read-reference";

function traverse(y: Float64Array, u: Float64Array, settings?: TraverseSettings): Traverse {
  const made = traverseIntegrals(y, u, settings);
  if (!made.ok) throw new Error(JSON.stringify(made));
  return made.traverse;
}
const grid = (n: number, top: number) => Float64Array.from({ length: n }, (_, i) => (top * i) / (n - 1));
const off = (got: number, true_: number) => Math.abs(got / true_ - 1);

describe("exact profiles", () => {
  // Blasius constants in η = y√(ue/νx): δ* 1.7207876573, θ 0.6641146724 (Schlichting & Gersten, ch. 6, to more digits: Boyd, SIAM Rev. 50 (2008) 791;
  // from memory), and δ3 = 1.0444 by the energy integral below. The reference file carries its own independent check.
  const rows = readReference("blasius_profile_computed.csv");
  const y = numbers(rows, "eta");
  const u = numbers(rows, "fp");
  // Independent route to the same integrals from the stream function of the file: δ* = η − f, θ = 2 f''(0) at the outer end.
  const defect = y.at(-1)! - numbers(rows, "f").at(-1)!;
  const momentum = 2 * numbers(rows, "fpp")[0]!;

  test("Blasius thicknesses to 1e-5 from 41 points, against the stream function and Schlichting's constants", () => {
    const t = traverse(y, u, { edge: 1 });
    expect(off(defect, 1.7207876573)).toBeLessThan(1e-5); // the profile ends at η = 8, where 1 − u/ue is 4e-6
    expect(off(momentum, 0.6641146724)).toBeLessThan(1e-9);
    expect(off(t.defect, 1.7207876573)).toBeLessThan(1e-5);
    expect(off(t.momentumLoss, 0.6641146724)).toBeLessThan(1e-5);
    expect(t.shape).toBeCloseTo(2.59, 2); // Schlichting
    expect(t.energyLoss / momentum).toBeCloseTo(1.5726, 3); // H32 of the flat plate (laminar_*.csv near the leading edge: 1.5726)
    expect(t.nearWall.rule).toBe("measured to the wall");
    expect(t.height!).toBeCloseTo(4.91, 1); // Schlichting: δ99 = 4.9 √(νx/ue)
  });

  test("without its wall point the profile gives the same within 1e-4", () => {
    const t = traverse(y.slice(1), u.slice(1), { edge: 1 });
    expect(off(t.momentumLoss, momentum)).toBeLessThan(1e-4);
  });

  test("the asymptotic suction profile has H = 2, δ* = 1, θ = 1/2 (Schlichting & Gersten, asymptotic suction)", () => {
    const eta = Float64Array.from({ length: 401 }, (_, i) => 40 * (i / 400) ** 2);
    const t = traverse(eta, eta.map((v) => -Math.expm1(-v)), { edge: 1 });
    expect(t.defect).toBeCloseTo(1, 6);
    expect(t.momentumLoss).toBeCloseTo(0.5, 6);
    expect(t.shape).toBeCloseTo(2, 6);
  });

  test("the 1/7-power profile has δ* = δ/8, θ = 7δ/72 (Schlichting)", () => {
    const eta = Float64Array.from({ length: 2001 }, (_, i) => (i / 2000) ** 7);
    const t = traverse(eta, eta.map((v) => v ** (1 / 7)), { edge: 1, nearWall: "no-slip" });
    expect(off(t.defect, 1 / 8)).toBeLessThan(1e-5);
    expect(off(t.momentumLoss, 7 / 72)).toBeLessThan(1e-5);
  });

  test("a density column weighs as the closed form says", () => {
    // u = y, ρ = 1 + (1 − y)/2 on 0…1, ρe = ue = 1: ∫(1 − ρu) = 5/12, ∫ρu(1 − u) = ∫(1.5y − 0.5y²)(1 − y) = 5/24, ∫ρu(1 − u²) = 37/120 (integrated by hand).
    const h = grid(41, 1);
    const t = traverse(h, h.slice(), { edge: 1, density: h.map((v) => 1.5 - 0.5 * v), nearWall: "no-slip" });
    expect(t.defect).toBeCloseTo(5 / 12, 12);
    expect(t.momentumLoss).toBeCloseTo(5 / 24, 12);
    expect(t.energyLoss).toBeCloseTo(37 / 120, 12);
  });

  test("a round wall weighs with 1 + y/r, outside and inside", () => {
    // u = y on 0…1: ∫(1 − y)(1 + y/r) = 1/2 + 1/(6r); ∫y(1 − y)(1 + y/r) = 1/6 + 1/(12r).
    const h = grid(21, 1);
    for (const radius of [2, -3]) {
      const t = traverse(h, h.slice(), { edge: 1, radius });
      expect(t.defect).toBeCloseTo(1 / 2 + 1 / (6 * radius), 12);
      expect(t.momentumLoss).toBeCloseTo(1 / 6 + 1 / (12 * radius), 12);
    }
    expect(off(traverse(h, h.slice(), { edge: 1, radius: 1e9 }).defect, 0.5)).toBeLessThan(1e-9);
  });
});

describe("an inviscid-speed column as edge", () => {
  // Flow over a convex wall: the inviscid speed falls outward, U = 1/(1 + 0.3y); the layer is an asymptotic-suction profile of height 0.05 inside it.
  const inviscid = (v: number) => 1 / (1 + 0.3 * v);
  const make = (top: number) => {
    const y = Float64Array.from({ length: 61 }, (_, i) => (i === 60 ? top : (i / 59) ** 2));
    return traverse(y, y.map((v) => inviscid(v) * -Math.expm1(-v / 0.05)), { edge: y.map(inviscid) });
  };

  test("moving the last point outward by half changes δ*, θ and m by less than 0.1 %", () => {
    const near = make(1.2);
    const far = make(1.8);
    for (const key of ["defect", "momentumLoss", "massDefect"] as const) expect(off(far[key], near[key])).toBeLessThan(1e-3);
  });

  test("the mass defect is the closed form ∫U e^(−y/0.05) dy", () => {
    let sum = 0; // Simpson on 20 000 panels, an independent quadrature
    const n = 40_000;
    for (let i = 0; i <= n; i++) sum += (i === 0 || i === n ? 1 : i % 2 ? 4 : 2) * inviscid((1.5 * i) / n) * Math.exp(-(1.5 * i) / n / 0.05);
    expect(off(make(1.5).massDefect, (sum * 1.5) / n / 3)).toBeLessThan(1e-3);
  });

  test("the plain edge speed would hang on where the traverse ends", () => {
    const y = Float64Array.from({ length: 61 }, (_, i) => (i / 60) ** 2 * 0.3);
    const u = y.map((v) => inviscid(v) * -Math.expm1(-v / 0.05));
    const ends = [50, 61].map((n) => traverse(y.slice(0, n), u.slice(0, n), { edge: Math.max(...u) }).defect);
    expect(off(ends[0]!, ends[1]!)).toBeGreaterThan(0.005); // five times the bound above, for a smaller move
  });
});

describe("measured and simulated layers", () => {
  const stations = readReference("wieghardt_1400_stations.csv").filter((s) => Number(s["x_m"]) >= 0.64);
  const profiles = readReference("wieghardt_1400_profiles.csv");
  const ofStation = (x: string, wall: boolean) => {
    const rows = profiles.filter((p) => p["x_m"] === x && (wall || Number(p["y_m"]) > 0));
    return { y: numbers(rows, "y_m"), u: numbers(rows, "u_over_ue") };
  };

  test.each(stations.map((s) => [s["x_m"]!, s] as const))("Wieghardt's plate (Coles & Hirst 1968, ident 1400) at x = %s m: δ*, θ, δ3 within 3 %%", (x, s) => {
    for (const wall of [true, false]) {
      const { y, u } = ofStation(x, wall);
      for (const nu of [1.51e-5 / Number(s["ue_mps"]), undefined]) {
        const t = traverse(y, u, { edge: 1, nu });
        expect(t.nearWall.rule).toBe("fitted");
        expect(off(t.defect, Number(s["dstar_m"]))).toBeLessThan(0.03);
        expect(off(t.momentumLoss, Number(s["theta_m"]))).toBeLessThan(0.03);
        expect(off(t.energyLoss, Number(s["delta3_m"]))).toBeLessThan(0.03);
      }
    }
  });

  test("what the near-wall rule changes on Wieghardt's plate is reported: up to a quarter of δ* lies below the first point", () => {
    const first = ofStation(stations[0]!["x_m"]!, false);
    const last = ofStation(stations.at(-1)!["x_m"]!, false);
    for (const [{ y, u }, share, change] of [[first, [0.08, 0.15], [0.02, 0.12]], [last, [0.015, 0.04], [0.003, 0.03]]] as const) {
      const t = traverse(y, u, { edge: 1, nu: 1.51e-5 / 33 });
      const line = traverse(y, u, { edge: 1, nearWall: "no-slip" });
      expect(t.share.defect).toBeGreaterThan(share[0]);
      expect(t.share.defect).toBeLessThan(share[1]);
      // "without" is the straight line to the wall: it overstates δ*.
      expect(t.without.defect / t.defect - 1).toBeGreaterThan(change[0]);
      expect(t.without.defect / t.defect - 1).toBeLessThan(change[1]);
      expect(off(line.defect, t.without.defect)).toBeLessThan(0.05);
    }
  });

  test.each(readReference("kth_scalar_dns_stations.csv").map((s) => [s["nominal_Re_theta"]!, s] as const))(
    "DNS at Reθ = %s (Balasubramanian et al. 2023): Reθ and H within 0.2 %%",
    (nominal, s) => {
      const rows = readReference("kth_scalar_dns_profiles.csv").filter((p) => p["nominal_Re_theta"] === nominal && Number(p["Pr"]) === 0);
      const distinct = rows.filter((row, i) => i === 0 || Number(row["yplus"]) > Number(rows[i - 1]!["yplus"]));
      const u = numbers(distinct, "value_plus");
      u[0] = Math.abs(u[0]!) < 1e-9 ? 0 : u[0]!;
      const t = traverse(numbers(distinct, "yplus"), u);
      expect(t.nearWall.rule).toBe("measured to the wall");
      expect(off(t.momentumLoss * t.edgeSpeed, Number(s["Re_theta"]))).toBeLessThan(0.002); // wall units: θ⁺ue⁺ = Reθ
      expect(off(t.shape, Number(s["H12"]))).toBeLessThan(0.002);
    },
  );

  test("on dense data the curve agrees with the trapezoid; on a tenth of the points it stays nearer to the dense value", () => {
    const rows = readReference("kth_scalar_dns_profiles.csv").filter((p) => p["nominal_Re_theta"] === "1070" && Number(p["Pr"]) === 0);
    const distinct = rows.filter((row, i) => i === 0 || Number(row["yplus"]) > Number(rows[i - 1]!["yplus"]));
    const y = numbers(distinct, "yplus");
    const u = numbers(distinct, "value_plus");
    u[0] = 0;
    const dense = traverse(y, u);
    expect(off(dense.momentumLoss, trapezoid(y, u, dense.edgeSpeed))).toBeLessThan(1e-3);
    const few = y.map((_, i) => i).filter((i) => i % 10 === 0 || i === y.length - 1);
    const sparse = { y: Float64Array.from(few, (i) => y[i]!), u: Float64Array.from(few, (i) => u[i]!) };
    const t = traverse(sparse.y, sparse.u, { edge: dense.edgeSpeed });
    expect(off(t.momentumLoss, dense.momentumLoss)).toBeLessThan(off(trapezoid(sparse.y, sparse.u, dense.edgeSpeed), dense.momentumLoss));
  });
});

function trapezoid(y: Float64Array, u: Float64Array, edge: number): number {
  let sum = 0;
  const f = (v: number) => (v / edge) * (1 - v / edge);
  for (let i = 1; i < y.length; i++) sum += 0.5 * (f(u[i]!) + f(u[i - 1]!)) * (y[i]! - y[i - 1]!);
  return sum;
}

describe("properties", () => {
  const y = Float64Array.from({ length: 25 }, (_, i) => (i / 24) ** 2 * 0.04);
  const u = y.map((v) => 20 * -Math.expm1(-v / 0.005));

  test("units scale: thicknesses with y, mass defect with y·u, shapes not at all", () => {
    const base = traverse(y, u);
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 1e3, noNaN: true }), fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (a, b) => {
        const t = traverse(y.map((v) => a * v), u.map((v) => b * v));
        expect(off(t.defect, a * base.defect)).toBeLessThan(1e-9);
        expect(off(t.massDefect, a * b * base.massDefect)).toBeLessThan(1e-9);
        expect(off(t.shape, base.shape)).toBeLessThan(1e-9);
      }),
    );
  });

  test("finite input gives finite results or a refusal, and is not changed", () => {
    const value = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(fc.array(value, { minLength: 0, maxLength: 12 }), fc.array(value, { minLength: 0, maxLength: 12 }), fc.option(value), (ys, us, edge) => {
        const yy = Float64Array.from(new Set(ys.map(Math.abs))).sort();
        const uu = Float64Array.from(us);
        const before = [yy.slice(), uu.slice()];
        const made = traverseIntegrals(yy, uu, { edge: edge ?? undefined });
        if (made.ok) for (const v of [made.traverse.defect, made.traverse.momentumLoss, made.traverse.energyLoss, made.traverse.massDefect, made.traverse.shape]) expect(Number.isFinite(v)).toBe(true);
        expect([yy, uu]).toEqual(before);
      }),
      { numRuns: 500 },
    );
  });

  test("an outer plateau that scatters is averaged, one that creeps up ends in its last point", () => {
    const noisy = u.slice();
    noisy.set([20.01, 19.99, 20.02, 19.98, 20.0], 20);
    expect(traverse(y, noisy).edgeOrigin).toBe("mean of outer points");
    expect(traverse(y, u).edgeOrigin).toBe("last point");
  });

  test.each<[string, number[], number[], TraverseSettings, string]>([
    ["ends inside the layer", [0, 1, 2, 3], [0, 1, 2, 3], {}, "no edge found"],
    ["ends below the given edge", [0, 1, 2, 3], [0, 1, 2, 2], { edge: 3 }, "ends inside layer"],
    ["runs above the given edge", [0, 1, 2, 3], [0, 1, 2, 2], { edge: 1 }, "edge below profile"],
    ["slips at the wall", [0, 1, 2, 3], [1, 1, 2, 2], {}, "slips at wall"],
    ["falls in y", [0, 2, 1, 3], [0, 1, 2, 2], {}, "not rising"],
    ["is too short", [1, 2], [1, 1], {}, "too few points"],
    ["has y below the wall", [-1, 1, 2], [0, 1, 1], {}, "negative"],
    ["stands still", [0, 1, 2, 3], [0, 0, 0, 0], {}, "not positive"],
    ["passes the axis of a duct", [0, 1, 2, 3], [0, 1, 2, 2], { radius: -2 }, "outside axis"],
    ["has no density at a row", [0, 1, 2, 3], [0, 1, 2, 2], { density: Float64Array.of(1, 0, 1, 1) }, "not positive"],
  ])("a profile that %s is refused", (_what, ys, us, settings, reason) => {
    expect(traverseIntegrals(Float64Array.from(ys), Float64Array.from(us), settings)).toMatchObject({ ok: false, reason });
  });
});

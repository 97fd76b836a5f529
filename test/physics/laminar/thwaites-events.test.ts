import fc from "fast-check";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { LAYER_STATE } from "../../../src/physics/laminar/laminar-march";
import { thwaitesMarch } from "../../../src/physics/laminar/thwaites-march";
import { gradientAt, gradientRate, thwaitesGrowth } from "../../../src/physics/laminar/thwaites-growth";
import { spaced } from "./classic-flows";
import { marchOf, separationOf } from "./march-of";

const of = (...v: number[]): Float64Array => Float64Array.of(...v);

describe("how a march begins and ends", () => {
  it("finds a separation that hides between two stations at both of which λ is well in range", () => {
    // One cubic, whose gradient dips to −0.2 half way between the stations 0 and 1 and is 0 at both: any column describes the same curve.
    const ue = (s: number): number => 1 - 0.2 * (2 * s * s - (4 / 3) * s ** 3);
    const coarse = of(0, 1, 1.3, 1.6);
    const fine = spaced(2001, 0, 1);
    const leastGradient = (start: number): number => Math.min(...marchOf(fine, fine.map(ue), 1, { startMomentumLoss: start, afterSeparation: "continue" }).gradient);
    let start = 0.1;
    while (leastGradient(start) > -0.0901) start += 0.001;
    expect(leastGradient(start)).toBeGreaterThan(-0.093); // only just
    const many = marchOf(fine, fine.map(ue), 1, { startMomentumLoss: start });
    const one = marchOf(coarse, coarse.map(ue), 1, { startMomentumLoss: start, afterSeparation: "continue" });
    expect(separationOf(one).x).toBeCloseTo(separationOf(many).x, 8);
    expect(one.reached).toBe(1);
    expect(Math.abs(one.gradient[0])).toBeLessThan(1e-9);
    expect(Math.abs(one.gradient[1])).toBeLessThan(1e-9);
    // A slightly thinner layer passes the dip.
    expect(marchOf(coarse, coarse.map(ue), 1, { startMomentumLoss: start - 0.005 }).reached).toBeGreaterThan(1);
  });
  it("has dλ∕dx equal to the difference quotient of λ, plane and round", () => {
    const x = spaced(12, 0.3, 1.5);
    const made = edgeCurve(x, x.map(Math.sin));
    if (!made.ok) throw new Error(made.reason);
    for (const radius of [null, made.edge.curve]) {
      const g = thwaitesGrowth(made.edge, 1, radius, 0.1);
      if (!g.ok) throw new Error(g.reason);
      for (const [i, t] of [[0, 0.4], [3, 0.7], [9, 0.2]]) {
        const d = 1e-5;
        const quotient = (gradientAt(g.growth, i, t + d) - gradientAt(g.growth, i, t - d)) / (2 * d * (x[1] - x[0]));
        expect(gradientRate(g.growth, i, t)).toBeCloseTo(quotient, 6);
      }
    }
  });
  it("reports separation at the first station when the given θ is already too large there", () => {
    const x = spaced(5, 0, 0.1);
    const march = marchOf(x, x.map((s) => 1 - s), 1, { startMomentumLoss: 0.31 });
    expect(march).toMatchObject({ reached: 0, stop: { kind: "separation", x: 0 } });
    expect([...march.state]).toEqual([0, 0, 0, 0, 0]);
  });
  it("stops where λ leaves the relations' range and says with which λ", () => {
    const x = spaced(30, 0, 1);
    const march = marchOf(x, x.map((s) => 1 + 3 * s), 1, { startMomentumLoss: 0.25 });
    expect(march.stop.kind).toBe("end");
    const steep = marchOf(x, x.map((s) => 1 + 20 * s * s), 1, { startMomentumLoss: 0.5 });
    expect(steep.stop.kind).toBe("limit");
    if (steep.stop.kind === "limit") expect(steep.stop.gradient).toBeCloseTo(0.25, 9);
    expect(steep.reached).toBeGreaterThan(0);
    expect(steep.reached).toBeLessThan(30);
  });
  it("leaves everything beyond separation empty, or gives the formula's θ and λ alone when asked to continue", () => {
    const x = spaced(11, 0, 0.2);
    const ue = x.map((s) => 1 - s);
    const stopped = marchOf(x, ue);
    expect(stopped.reached).toBe(7);
    expect([...stopped.state]).toEqual([1, 1, 1, 1, 1, 1, 1, 0, 0, 0, 0]);
    expect(stopped.momentumLoss[7]).toBe(0);
    const on = marchOf(x, ue, 1, { afterSeparation: "continue" });
    expect(on.reached).toBe(7);
    for (let i = 7; i < 11; i += 1) {
      expect(on.state[i]).toBe(LAYER_STATE.separated);
      expect(on.momentumLoss[i]).toBeCloseTo(Math.sqrt(0.075 * ((1 - x[i]) ** -6 - 1)), 9);
      expect(on.shape[i]).toBe(0);
      expect(on.frictionBlank[i]).toBe(1);
    }
    expect([...on.momentumLoss.slice(0, 7)]).toEqual([...stopped.momentumLoss.slice(0, 7)]);
  });
  it("continues a march from the θ of another without a seam", () => {
    const x = spaced(41, 0, 1.6);
    const whole = marchOf(x, x.map(Math.sin));
    const rest = x.slice(20);
    const half = marchOf(rest, rest.map(Math.sin), 1, { startMomentumLoss: whole.momentumLoss[20] });
    expect(half.momentumLoss[0]).toBeCloseTo(whole.momentumLoss[20], 14);
    expect(half.momentumLoss[10]).toBeCloseTo(whole.momentumLoss[30], 6);
  });
  it("refuses a given θ where the start is fixed, and viscosity that is none", () => {
    const x = spaced(5, 0, 1);
    const made = edgeCurve(x, x);
    if (!made.ok) throw new Error(made.reason);
    expect(thwaitesMarch(made.edge, 1, { startMomentumLoss: 0.1 })).toMatchObject({ ok: false, reason: "start fixed", argument: "ue" });
    expect(thwaitesMarch(made.edge, 0)).toMatchObject({ ok: false, reason: "not positive", argument: "nu" });
    expect(thwaitesMarch(made.edge, NaN)).toMatchObject({ ok: false, argument: "nu" });
    expect(thwaitesMarch(made.edge, 1, { startMomentumLoss: -1 })).toMatchObject({ ok: false, reason: "negative" });
  });
});

describe("properties of the march", () => {
  const columns = fc
    .array(fc.tuple(fc.double({ min: 0.02, max: 1, noNaN: true }), fc.double({ min: 0.2, max: 3, noNaN: true })), { minLength: 2, maxLength: 25 })
    .map((pairs) => {
      let sum = 0;
      return { x: Float64Array.from(pairs, ([h]) => (sum += h)), ue: Float64Array.from(pairs, ([, u]) => u) };
    });
  const size = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
  const close = (a: number, b: number): void => expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(a), Math.abs(b), 1e-300));

  it("scales with the units of length and speed: θ as length, cf, H, λ, Reθ not at all", () => {
    fc.assert(
      fc.property(columns, size, size, ({ x, ue }, length, speed) => {
        const plain = marchOf(x, ue, 0.01, { fit: "monotone" });
        const scaled = marchOf(x.map((s) => s * length), ue.map((u) => u * speed), 0.01 * length * speed, { fit: "monotone" });
        expect(scaled.stop.kind).toBe(plain.stop.kind);
        expect(scaled.reached).toBe(plain.reached);
        for (let i = 0; i < plain.reached; i += 1) {
          close(scaled.momentumLoss[i], plain.momentumLoss[i] * length);
          expect(scaled.gradient[i]).toBeCloseTo(plain.gradient[i], 8);
          expect(scaled.shape[i]).toBeCloseTo(plain.shape[i], 6);
          close(scaled.momentumReynolds[i], plain.momentumReynolds[i]);
        }
      }),
    );
  });
  it("is similar: θ√(1∕ν), H, λ and the separation station do not depend on ν", () => {
    fc.assert(
      fc.property(columns, size, ({ x, ue }, nu) => {
        const one = marchOf(x, ue, 1, { fit: "monotone" });
        const other = marchOf(x, ue, nu, { fit: "monotone" });
        expect(other.reached).toBe(one.reached);
        for (let i = 0; i < one.reached; i += 1) close(other.momentumLoss[i], one.momentumLoss[i] * Math.sqrt(nu));
        if (one.stop.kind === "separation") close(separationOf(other).x, one.stop.x);
      }),
    );
  });
  it("does not feel a shift of x and leaves its columns alone", () => {
    fc.assert(
      fc.property(columns, fc.integer({ min: -8, max: 8 }), ({ x, ue }, shift) => {
        const [x0, u0] = [x.slice(), ue.slice()];
        const plain = marchOf(x, ue, 1, { fit: "monotone" });
        const moved = marchOf(x.map((s) => s + shift), ue, 1, { fit: "monotone" });
        expect(x).toEqual(x0);
        expect(ue).toEqual(u0);
        expect(moved.reached).toBe(plain.reached);
        for (let i = 0; i < plain.reached; i += 1) expect(Math.abs(moved.momentumLoss[i] - plain.momentumLoss[i])).toBeLessThan(1e-9 * (1 + plain.momentumLoss[i]) * 1e3);
      }),
    );
  });
  it("gives a refusal or finite numbers for any finite column, and inside the range wherever it says attached", () => {
    const wild = fc
      .array(fc.tuple(fc.double({ min: 1e-12, max: 1e12, noNaN: true }), fc.double({ min: 0, max: 1e150, noNaN: true })), { minLength: 2, maxLength: 12 })
      .map((pairs) => {
        let sum = 0;
        return { x: Float64Array.from(pairs, ([h]) => (sum += h)), ue: Float64Array.from(pairs, ([, u]) => u) };
      });
    fc.assert(
      fc.property(wild, fc.double({ min: 1e-300, max: 1e300, noNaN: true }), fc.boolean(), fc.option(fc.double({ min: 0, max: 1e10, noNaN: true })), ({ x, ue }, nu, monotone, theta) => {
        const made = edgeCurve(x, ue, { fit: monotone ? "monotone" : "spline" });
        if (!made.ok) return;
        const march = thwaitesMarch(made.edge, nu, { startMomentumLoss: theta ?? undefined, afterSeparation: "continue" });
        if (!march.ok) return;
        const m = march.march;
        for (const column of [m.momentumLoss, m.defect, m.energyLoss, m.shape, m.friction, m.momentumReynolds, m.gradient, m.massDefect]) {
          expect(column.every(Number.isFinite)).toBe(true);
        }
        for (let i = 0; i < m.reached; i += 1) expect(m.gradient[i] > -0.09 && m.gradient[i] <= 0.25).toBe(true);
      }),
      { numRuns: 500 },
    );
  });
  it("never separates in a flow that nowhere slows down", () => {
    fc.assert(
      fc.property(columns, ({ x, ue }) => {
        const rising = ue.slice().sort().map((u, i) => u + 0.01 * i);
        expect(marchOf(x, rising, 1, { fit: "monotone" }).stop.kind).not.toBe("separation");
      }),
    );
  });
  it("searches few panels, however many stations", () => {
    for (const n of [200, 20_000]) {
      const x = spaced(n, 0, 1.9);
      const march = marchOf(x, x.map(Math.sin));
      expect(march.counts.searchedPanels).toBeLessThan(0.1 * n + 5);
      expect(march.counts.rootEvaluations).toBeLessThan(60);
    }
  });
});

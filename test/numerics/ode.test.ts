import { odeDrive } from "../../src/numerics/ode-drive";
import type { OdeRight } from "../../src/numerics/ode-step";
import { odeStep, odeWork } from "../../src/numerics/ode-step";

function marched(right: OdeRight, y0: number[], end: number, steps: number): Float64Array {
  const y = Float64Array.from(y0);
  const slope = new Float64Array(y.length);
  const next = new Float64Array(y.length);
  const error = new Float64Array(y.length);
  const work = odeWork(y.length);
  const h = end / steps;
  for (let i = 0; i < steps; i += 1) {
    right(i * h, y, slope);
    expect(odeStep(right, i * h, y, h, slope, work, next, error)).toBe(true);
    y.set(next);
  }
  return y;
}

/** Exact: y = (e^(sin x), sin 2x). */
const known: OdeRight = (x, y, slope) => {
  slope[0] = y[0] * Math.cos(x);
  slope[1] = 2 * Math.cos(2 * x) + y[0] * (y[1] - Math.sin(2 * x));
  return true;
};

describe("the step for differential equations", () => {
  it("is of fourth order: half the step, a sixteenth of the error", () => {
    const error = [10, 20, 40].map((n) => {
      const y = marched(known, [1, 0], 2, n);
      return Math.hypot(y[0] - Math.exp(Math.sin(2)), y[1] - Math.sin(4));
    });
    expect(error[0] / error[1]).toBeGreaterThan(13);
    expect(error[1] / error[2]).toBeGreaterThan(14);
    expect(error[2]).toBeLessThan(2e-6);
  });
  it("stays stable and accurate with steps a hundred thousand times longer than the time in which the unknown settles (Prothero & Robinson 1974)", () => {
    const stiff: OdeRight = (x, y, slope) => {
      slope[0] = -1e6 * (y[0] - Math.cos(x)) - Math.sin(x);
      return true;
    };
    expect(Math.abs(marched(stiff, [1], 2, 20)[0] - Math.cos(2))).toBeLessThan(1e-8);
  });
});

describe("the driver", () => {
  const settings = (relative: number) => ({ relative, absolute: Float64Array.of(relative, relative), firstStep: 0.01, leastStep: 1e-12 });
  it("keeps the error near what it was asked for, and asks for fewer steps when more is allowed", () => {
    const runs = [1e-4, 1e-8].map((tolerance) => {
      const drive = odeDrive(known, 0, Float64Array.of(1, 0), settings(tolerance));
      expect(drive.to(2)).toBe("there");
      return { miss: Math.hypot(drive.y[0] - Math.exp(Math.sin(2)), drive.y[1] - Math.sin(4)), steps: drive.counts.steps, tolerance };
    });
    for (const { miss, tolerance } of runs) expect(miss).toBeLessThan(30 * tolerance);
    expect(runs[0].steps).toBeLessThan(runs[1].steps);
  });
  it("finds an event inside a step: a fall from 1 with unit acceleration lands at √2", () => {
    const fall: OdeRight = (_x, y, slope) => {
      slope[0] = y[1];
      slope[1] = -1;
      return true;
    };
    const drive = odeDrive(fall, 0, Float64Array.of(1, 0), { ...settings(1e-9), event: (_x, y) => y[0] });
    expect(drive.to(5)).toBe("event");
    expect(drive.x).toBeCloseTo(Math.SQRT2, 9);
    expect(drive.y[1]).toBeCloseTo(-Math.SQRT2, 9);
  });
  it("is stuck, and says so, where the solution ends: y′ = −1∕y from 1 has nothing beyond x = ½", () => {
    const ending: OdeRight = (_x, y, slope) => {
      if (!(y[0] > 0)) return false;
      slope[0] = -1 / y[0];
      return true;
    };
    const drive = odeDrive(ending, 0, Float64Array.of(1), { relative: 1e-8, absolute: Float64Array.of(1e-8), firstStep: 0.01, leastStep: 1e-10 });
    expect(drive.to(1)).toBe("stuck");
    expect(drive.x).toBeCloseTo(0.5, 6);
  });
});

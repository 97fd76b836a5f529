import { odeDrive } from "../../src/numerics/ode-drive";
import { odeWork } from "../../src/numerics/ode-step";
import { odeStepExplicit } from "../../src/numerics/ode-step-explicit";

/** y0′ = y0 cos x (y0 = e^sin x), y1′ = −y1² (y1 = 1∕(1 + x)): exact solutions. */
const right = (x: number, y: Float64Array, slope: Float64Array): boolean => {
  slope[0] = y[0]! * Math.cos(x);
  slope[1] = -y[1]! * y[1]!;
  return true;
};

function errorWith(steps: number): number {
  const work = odeWork(2);
  let y = Float64Array.of(1, 1);
  const [slope, next, error] = [new Float64Array(2), new Float64Array(2), new Float64Array(2)];
  const h = 2 / steps;
  for (let k = 0; k < steps; k += 1) {
    right(k * h, y, slope);
    expect(odeStepExplicit(right, k * h, y, h, slope, work, next, error)).toBe(true);
    y = next.slice();
  }
  return Math.abs(y[0]! - Math.exp(Math.sin(2))) + Math.abs(y[1]! - 1 / 3);
}

test("the explicit step is of fifth order: halving it divides the error by about 32", () => {
  const [coarse, fine] = [errorWith(64), errorWith(128)];
  expect(coarse / fine).toBeGreaterThan(25);
  expect(coarse / fine).toBeLessThan(42);
});

test("the weights of the pair fulfil the order conditions: a constant and a linear slope are integrated exactly and leave no error estimate", () => {
  const work = odeWork(1);
  const [slope, next, error] = [Float64Array.of(3), new Float64Array(1), new Float64Array(1)];
  odeStepExplicit((x, _y, s) => { s[0] = 3 + 2 * x; return true; }, 0, Float64Array.of(1), 0.5, slope, work, next, error);
  expect(next[0]).toBeCloseTo(1 + 1.5 + 0.25, 14);
  expect(Math.abs(error[0]!)).toBeLessThan(1e-15);
});

test("the driver with plain steps keeps its tolerance, hits the end exactly and finds an event inside a step", () => {
  const settings = { kind: "plain" as const, relative: 1e-9, absolute: Float64Array.of(0, 0), firstStep: 0.01, leastStep: 1e-12 };
  const drive = odeDrive(right, 0, Float64Array.of(1, 1), settings);
  expect(drive.to(2)).toBe("there");
  expect(drive.x).toBe(2);
  expect(drive.y[0]).toBeCloseTo(Math.exp(Math.sin(2)), 7);
  const watched = odeDrive(right, 0, Float64Array.of(1, 1), { ...settings, event: (_x, y) => y[1]! - 0.5 });
  expect(watched.to(2)).toBe("event");
  expect(watched.x).toBeCloseTo(1, 8);
});

test("a right-hand side that does not hold anywhere ahead leaves the driver stuck, not wrong", () => {
  const drive = odeDrive((x, _y, s) => { s[0] = 1; return x < 0.5; }, 0, Float64Array.of(0), { kind: "plain", relative: 1e-9, absolute: Float64Array.of(1e-9), firstStep: 0.1, leastStep: 1e-6 });
  expect(drive.to(1)).toBe("stuck");
  expect(drive.x).toBeLessThan(0.5);
});

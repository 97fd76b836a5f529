import { blowVelocity } from "../../../src/physics/coupling/blow-velocity";
import { fieldGrid, profileIntegrals, raiseGrid } from "../../../src/physics/laminar/field-grid";
import type { FieldRecord } from "../../../src/physics/laminar/field-record";
import { fieldScale } from "../../../src/physics/laminar/field-scale";
import { rootLawSeparation } from "../../../src/physics/laminar/field-separation";
import { marchStart } from "../../../src/physics/laminar/field-start";
import { emptyPlace, wallPlace } from "../../../src/physics/laminar/wall-conditions";
import { spaced } from "./classic-flows";
import { energyOf, fieldOf, wallOf } from "./wall-of";

describe("the grid across the layer", () => {
  it("integrates the suction profile u = 1 − exp(−η∕2): δ* = 2, θ = 1, δ3 = 5∕3 (exact) within 0.001 %, sixteen times closer on half the steps", () => {
    const error = [1, 2].map((refinement) => {
      const grid = fieldGrid(refinement);
      grid.count = grid.eta.findIndex((e) => e > 60);
      const { eta } = grid;
      const profile = { f: eta.map((e) => e - 2 * (1 - Math.exp(-e / 2))), u: eta.map((e) => 1 - Math.exp(-e / 2)), v: eta.map((e) => Math.exp(-e / 2) / 2) };
      const got = profileIntegrals(grid, profile, { defect: 0, momentumLoss: 0, energyLoss: 0 });
      expect(got.defect).toBeCloseTo(2, 11);
      return Math.abs(got.momentumLoss - 1) + Math.abs(got.energyLoss - 5 / 3);
    });
    expect(error[0]).toBeLessThan(1e-5);
    expect(error[0] / error[1]).toBeGreaterThan(12);
  });
  it("grows by free stream: f goes on with u = 1", () => {
    const grid = fieldGrid(1);
    grid.count = 20;
    const room = grid.eta.length;
    const profile = { f: new Float64Array(room).fill(3), u: new Float64Array(room).fill(1), v: new Float64Array(room) };
    expect(raiseGrid(grid, [profile], 1)).toBe(true);
    expect(grid.count).toBeGreaterThan(20);
    expect(profile.f[grid.count - 1] - 3).toBeCloseTo(grid.eta[grid.count - 1] - grid.eta[19], 12);
    grid.count = room;
    expect(raiseGrid(grid, [profile], 1)).toBe(false);
  });
});

describe("the square-root law of separation", () => {
  const record = (x: number, wallShear: number): FieldRecord => ({ x, wallShear }) as FieldRecord;
  it("finds the station exactly where x = xs − A τ² − B τ³", () => {
    const history = [0.5, 0.3, 0.2].map((tau) => record(1.7 - 0.4 * tau ** 2 - 0.1 * tau ** 3, tau));
    expect(rootLawSeparation(history)!.x).toBeCloseTo(1.7, 12);
  });
  it("finds none while the shear rises or too little is known", () => {
    expect(rootLawSeparation([record(0, 1), record(1, 2), record(2, 3)])).toBeNull();
    expect(rootLawSeparation([record(0, 2), record(1, 1)])).toBeNull();
  });
});

describe("the length Δ", () => {
  it("stays within a tenth of θ on a wall without flow through it, and follows θ under suction and blowing", () => {
    for (const blown of [0, -3, 0.5]) {
      const x = spaced(41, 0, 1);
      const wall = wallOf(x, x.map((s) => 1 + 0.3 * s - 0.4 * s * s), { wallVelocity: x.map(() => blown) });
      const start = marchStart(wall, 1, {});
      if (!start.ok) throw new Error(start.reason);
      const made = fieldScale(wall, 1, start.start);
      if (!made.ok) throw new Error(made.reason);
      const march = fieldOf(wall);
      let { square } = made.scale;
      const [before, after] = [emptyPlace(), emptyPlace()];
      for (let i = 0; i + 1 < march.reached; i += 1) {
        square = made.scale.next(square, i, 0, wallPlace(wall, i, 0, before), 1, wallPlace(wall, i, 1, after));
        const ratio = Math.sqrt(square) / march.momentumLoss[i + 1];
        expect(ratio).toBeGreaterThan(blown === 0 ? 0.9 : 0.7);
        expect(ratio).toBeLessThan(blown === 0 ? 1.1 : 1.4);
      }
    }
  });
});

describe("growth of the mass defect from the marches' own equations", () => {
  const x = spaced(401, 0, 1.6);
  const radius = x.map((s) => (s === 0 ? 0 : Math.sin(s)));
  it.each([
    ["plane, from a stagnation point", Math.sin, undefined],
    ["round, from its nose", (s: number) => 1.5 * Math.sin(s), radius],
  ] as const)("is the derivative of the spline through the column of m: %s", (_what, ue, r) => {
    const wall = wallOf(x, x.map(ue), { radius: r });
    for (const [march, tolerance] of [[fieldOf(wall), 5e-4], [energyOf(wall), 1e-4]] as const) {
      const made = blowVelocity(x, march.massDefect, { noise: 0, radius: r });
      if (!made.ok) throw new Error(made.reason);
      for (let i = 0; i < 400; i += 1) expect(Math.abs(march.blowVelocity[i] - made.velocity[i])).toBeLessThan(tolerance * (1 + made.velocity[i]));
    }
  });
});

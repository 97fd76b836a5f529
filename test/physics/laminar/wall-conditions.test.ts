import { wallConditions, wallPlace, emptyPlace } from "../../../src/physics/laminar/wall-conditions";
import { spaced } from "./classic-flows";
import { wallOf } from "./wall-of";

describe("wall conditions", () => {
  const x = spaced(6, 1, 3);
  it("integrate r vw exactly where both are straight: r = 1 + x, vw = 2 − x gives 2x + x²∕2 − x³∕3 from 1", () => {
    const wall = wallOf(x, x.map(() => 1), { radius: x.map((s) => 1 + s), wallVelocity: x.map((s) => 2 - s) });
    const exact = (s: number): number => 2 * s + s ** 2 / 2 - s ** 3 / 3 - (2 + 1 / 2 - 1 / 3);
    const place = emptyPlace();
    for (const [panel, t] of [[0, 0], [0, 0.3], [2, 1], [4, 0.77], [4, 1]] as const) {
      wallPlace(wall, panel, t, place);
      expect(place.flow).toBeCloseTo(exact(place.x), 12);
      expect(place.wallVelocity).toBeCloseTo(2 - place.x, 12);
      expect(place.radiusSlope).toBeCloseTo(1, 12);
    }
  });
  it("do not let a suction slot overshoot between stations", () => {
    const wall = wallOf(x, x.map(() => 1), { wallVelocity: Float64Array.of(0, 0, -1, -1, 0, 0) });
    const place = emptyPlace();
    for (let panel = 0; panel < 5; panel += 1) {
      for (let t = 0; t <= 1; t += 0.05) {
        const { wallVelocity } = wallPlace(wall, panel, t, place);
        expect(wallVelocity).toBeLessThanOrEqual(1e-15);
        expect(wallVelocity).toBeGreaterThanOrEqual(-1 - 1e-15);
      }
    }
  });
  it("take a column of zeros for a solid wall, and refuse one of another length", () => {
    const wall = wallOf(x, x.map(() => 1), { wallVelocity: new Float64Array(6) });
    expect(wall.wallVelocity).toBeNull();
    expect(wallConditions(wall.edge, { wallVelocity: new Float64Array(5) })).toMatchObject({ ok: false, reason: "lengths differ", argument: "wall_velocity" });
    expect(wallConditions(wall.edge, { wallVelocity: new Float64Array(5).fill(1) })).toMatchObject({ ok: false, reason: "lengths differ", argument: "wall_velocity" });
  });
});

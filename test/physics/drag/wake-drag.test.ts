import { edgeGas } from "../../../src/physics/edge/edge-gas";
import { edgeSpeed } from "../../../src/physics/edge/edge-speed";
import { wakeMomentumLoss } from "../../../src/physics/drag/wake-drag";
import { independently } from "../laminar/independent-solver";
import { readReference } from "../../references/read-reference";

const gas = (mach: number) => {
  const made = edgeGas(mach, 1);
  if (!made.ok) throw new Error(made.reason);
  return made.gas;
};
const far = (theta: number, h: number, ratio: number, mach = 0): number => {
  const made = wakeMomentumLoss(theta, h, ratio, gas(mach));
  if (!made.ok) throw new Error(made.reason);
  return made.far;
};

test("constant density: the classic θ (ue∕U)^((H + 5)∕2) (Squire & Young, R&M 1838)", () => {
  expect(far(0.002, 1.6, 0.93)).toBeCloseTo(0.002 * 0.93 ** 3.3, 15);
  expect(far(0.002, 1.6, 1)).toBe(0.002);
});

test("compressible: the wake's momentum equation integrated step by step with H falling straight with ln ue (npm odex) gives the same to 1e-9", () => {
  for (const [mach, h, ratio] of [[0.5, 1.9, 0.9], [0.75, 2.3, 0.93], [0.3, 1.5, 1.05]] as const) {
    const end = Math.log(ratio);
    const farShape = 1 + 0.4 * mach * mach;
    const direct = independently(
      (s, [theta]) => {
        // s runs from the trailing edge (0) to the far wake (1): ln u = end (1 − s).
        const log = end * (1 - s);
        const u = Math.exp(log);
        const m2 = (u * u * mach * mach) / (1 + 0.2 * mach * mach * (1 - u * u));
        const shape = farShape + ((h - farShape) * log) / end;
        return [(shape + 2 - m2) * theta! * end];
      },
      [0.002],
      1,
    )[0]!;
    expect(far(0.002, h, ratio, mach) / direct).toBeCloseTo(1, 9);
  }
});

// Cook, McDonald & Firmin, AGARD AR-138 (1979), paper A6: trailing-edge layers of both sides, static pressure there and drag from the wake traverse.
const rows = readReference("rae2822_integrals.csv");
const traverses = readReference("rae2822_traverses.csv");
const cases = readReference("rae2822_cases.csv");
const counts = (which: string): { wake: number; measured: number } => {
  const info = cases.find((r) => r["case"] === which)!;
  const mach = Number(info["Mach"]);
  let wake = 0;
  for (const [layer, side] of [["upper_wake", "upper"], ["lower_wake", "lower"]] as const) {
    const edge = rows.find((r) => r["case"] === which && r["surface"] === layer)!;
    const cp = Number(traverses.find((r) => r["case"] === which && r["surface"] === side && r["x_c"] === "1")!["Cp_static"]);
    const speed = edgeSpeed(Float64Array.of(cp), 1, mach);
    if (!speed.ok) throw new Error(speed.reason);
    wake += 2e4 * far(Number(edge["theta_c"]), Number(edge["H"]), speed.speed[0]!, mach);
  }
  return { wake, measured: 1e4 * Number(info["CD_wake"]) };
};

test("RAE 2822 case 1 (M 0.676): the measured trailing-edge layers give 95 counts where the wake far behind has 85 (its own 2θ∕c at two chords: 85)", () => {
  const { wake, measured } = counts("1");
  expect(measured).toBeCloseTo(85, 1);
  expect(2e4 * Number(rows.find((r) => r["case"] === "1" && r["surface"] === "wake" && r["x_c"] === "2")!["theta_c"])).toBeCloseTo(85, 0);
  // The upper layer is near separation (H 2.34): Squire & Young's straight fall of H is crude there.
  expect(wake - measured).toBeGreaterThan(0);
  expect(wake - measured).toBeLessThan(11);
});

test("RAE 2822 case 9 (M 0.73, shock on the upper side): 168 counts measured; the trailing edge misses the shock's own loss and scatter, and is reported, not fitted", () => {
  const { wake, measured } = counts("9");
  expect(measured).toBeCloseTo(168, 0);
  expect(wake).toBeGreaterThan(100);
  expect(wake).toBeLessThan(measured);
});

test.each([
  [[-1, 1.5, 0.9], "negative"],
  [[0.001, 0.9, 0.9], "outside range"],
  [[0.001, 3.2, 0.9], "outside range"],
  [[0.001, 1.5, 0], "outside range"],
  [[0.001, 1.5, NaN], "outside range"],
  [[NaN, 1.5, 0.9], "negative"],
])("%p is refused: %s", (given, reason) => {
  const [theta, h, ratio] = given as [number, number, number];
  expect(wakeMomentumLoss(theta, h, ratio, gas(0))).toMatchObject({ ok: false, reason });
});

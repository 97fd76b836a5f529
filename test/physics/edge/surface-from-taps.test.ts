import { contourCrossing } from "../../../src/physics/edge/contour-crossing";
import { edgeMach } from "../../../src/physics/edge/edge-mach";
import { restation } from "../../../src/physics/edge/restation";
import { surfaceFromTaps, type SurfaceSide, type TapSettings } from "../../../src/physics/edge/surface-from-taps";
import { numbers, readReference } from "../../references/read-reference";

function side(x: Float64Array, y: Float64Array, cp: Float64Array, settings: TapSettings): SurfaceSide {
  const made = surfaceFromTaps(x, y, cp, settings);
  if (!made.ok) throw new Error(JSON.stringify(made));
  return made.side;
}

describe("a circular cylinder (potential flow: ue = 2V sin φ, cp = 1 − 4 sin² φ)", () => {
  // 24 taps from rear to rear; the flow comes from the left, turned so that no tap stands at the stagnation point (φ = 0 there).
  const turn = 0.07;
  const phi = Float64Array.from({ length: 24 }, (_, i) => -Math.PI + 0.05 + ((2 * Math.PI - 0.1) * i) / 23 + turn);
  const x = phi.map((p) => -Math.cos(p - turn));
  const y = phi.map((p) => Math.sin(p - turn));
  const cp = phi.map((p) => 1 - 4 * Math.sin(p) ** 2);
  const settings: TapSettings = { side: "upper", referenceSpeed: 15 };

  test("the stagnation point is found between taps within 1e-4 of the radius, and the stations are arcs from it", () => {
    const s = side(x, y, cp, settings);
    expect(Math.hypot(s.x[0]! + Math.cos(-turn), s.y[0]! - Math.sin(-turn))).toBeLessThan(1e-4);
    s.station.forEach((v, i) => {
      expect(Math.abs(s.speed[i]! - 30 * Math.abs(Math.sin(v)))).toBeLessThan(30 * 2e-4);
    });
  });

  test("upper and lower together hold every tap once", () => {
    const rows = ["upper", "lower"].flatMap((which) => [...side(x, y, cp, { ...settings, side: which as "upper" }).row].slice(1));
    expect(rows.sort((a, b) => a - b)).toEqual(Array.from({ length: 24 }, (_, i) => i + 1));
  });

  test("taps in the other order, turned over, scaled, or with a doubled tail give the same side", () => {
    const s = side(x, y, cp, settings);
    const back = side(x.slice().reverse(), y.slice().reverse(), cp.slice().reverse(), settings);
    const over = side(x, y.map((v) => -v), cp, { ...settings, side: "lower" });
    const large = side(x.map((v) => 7 * v), y.map((v) => 7 * v), cp, settings);
    const twice = (v: Float64Array) => Float64Array.of(v[0]!, ...v, v.at(-1)!);
    const doubled = side(twice(x), twice(y), twice(cp), settings);
    s.station.forEach((v, i) => {
      expect(back.station[i]!).toBeCloseTo(v, 8);
      expect(over.station[i]!).toBeCloseTo(v, 8);
      expect(large.station[i]! / 7).toBeCloseTo(v, 8);
      expect(doubled.station[i]!).toBeCloseTo(v, 8);
      expect(back.speed[i]!).toBeCloseTo(s.speed[i]!, 8);
    });
  });

  test("a missing tap is left out, its coordinates still shape the contour", () => {
    const gap = cp.slice();
    gap[18] = NaN;
    const s = side(x, y, gap, settings);
    expect(s.station.length).toBe(side(x, y, cp, settings).station.length - 1);
    expect(Math.hypot(s.x[0]! + Math.cos(-turn), s.y[0]! - Math.sin(-turn))).toBeLessThan(1e-4);
  });

  test("a tap at the stagnation point itself, and one that reads 1 % too high there, are taken as it", () => {
    const p = phi.map((v) => v - turn + 1e-15);
    p[12] = 0;
    for (const excess of [0, 0.01]) {
      const pressure = p.map((v, i) => 1 - 4 * Math.sin(v) ** 2 + (i === 12 ? excess : 0));
      const s = side(p.map((v) => -Math.cos(v)), p.map(Math.sin), pressure, settings);
      expect(s.clamped).toBe(excess > 0 ? 1 : 0);
      expect(Math.hypot(s.x[0]! + 1, s.y[0]!)).toBeLessThan(2e-3);
    }
  });
});

describe("a Joukowski aerofoil (exact potential flow by the circle's map ζ + 1/ζ)", () => {
  // Circle through ζ = 1 with centre (−0.08, 0.06); angle of attack 4°; Kutta condition at the tail. N. Joukowski 1910; any textbook of aerodynamics.
  const [cx, cy, alpha] = [-0.08, 0.06, (4 * Math.PI) / 180];
  const radius = Math.hypot(1 - cx, cy);
  const beta = Math.asin(cy / radius);
  const at = (theta: number) => {
    const [zx, zy] = [cx + radius * Math.cos(theta), cy + radius * Math.sin(theta)];
    const r2 = zx * zx + zy * zy;
    // |dz/dζ| = |1 − 1/ζ²|
    const [re, im] = [1 - (zx * zx - zy * zy) / r2 ** 2, (2 * zx * zy) / r2 ** 2];
    const onCircle = Math.abs(2 * Math.sin(theta - alpha) + 2 * Math.sin(alpha + beta));
    return { x: zx + zx / r2, y: zy - zy / r2, speed: onCircle / Math.hypot(re, im) };
  };
  const theta = Float64Array.from({ length: 60 }, (_, i) => -beta + 0.06 + ((2 * Math.PI - 0.12) * i) / 59);
  const taps = [...theta].map(at);
  const x = Float64Array.from(taps, (t) => t.x);
  const y = Float64Array.from(taps, (t) => t.y);
  const cp = Float64Array.from(taps, (t) => 1 - t.speed ** 2);
  // Forward stagnation: sin(θ − α) = −sin(α + β) on the nose side.
  const nose = at(Math.PI + 2 * alpha + beta);

  test("the stagnation point lies under the nose where the exact flow has it, within 2e-3 of the chord, and speeds are exact", () => {
    const s = side(x, y, cp, { side: "upper", referenceSpeed: 1 });
    expect(Math.hypot(s.x[0]! - nose.x, s.y[0]! - nose.y) / 4).toBeLessThan(2e-3);
    s.row.forEach((row, i) => {
      if (row > 0) expect(s.speed[i]!).toBeCloseTo(taps[row - 1]!.speed, 10);
    });
    expect(Math.max(...s.y)).toBeGreaterThan(Math.max(...side(x, y, cp, { side: "lower", referenceSpeed: 1 }).y));
    expect(s.station.every((v, i) => i === 0 || v > s.station[i - 1]!)).toBe(true);
  });

  test("stagnation found by halving the tap spacing comes nearer", () => {
    const fine = Float64Array.from({ length: 119 }, (_, i) => (i % 2 === 0 ? theta[i / 2]! : (theta[(i - 1) / 2]! + theta[(i + 1) / 2]!) / 2));
    const off = (list: Float64Array) => {
      const t = [...list].map(at);
      const s = side(Float64Array.from(t, (p) => p.x), Float64Array.from(t, (p) => p.y), Float64Array.from(t, (p) => 1 - p.speed ** 2), { side: "upper", referenceSpeed: 1 });
      return Math.hypot(s.x[0]! - nose.x, s.y[0]! - nose.y);
    };
    expect(off(fine)).toBeLessThan(off(theta));
  });
});

describe("RAE 2822 measured pressures (Cook, McDonald & Firmin, AGARD AR-138, 1979), case 1", () => {
  const rows = readReference("rae2822_cp.csv").filter((r) => r["case"] === "1");
  const of = (surface: string) => rows.filter((r) => r["surface"] === surface).sort((a, b) => Number(b["x_c"]) - Number(a["x_c"]));
  const contour = readReference("rae2822_coords.csv");

  test("there are taps on both surfaces, and the coordinates go with them", () => {
    expect(of("upper").length).toBeGreaterThan(20);
    expect(of("lower").length).toBeGreaterThan(10);
    expect(contour.length).toBeGreaterThan(20);
  });

  test("the upper side starts near the nose, is supersonic nowhere at Mach 0.676, and its speeds follow from the measured cp", () => {
    const height = (surface: string) => ({ x: numbers(contour, "x_c"), z: numbers(contour, `y${surface}_c`).map((z) => (surface === "lower" ? -z : z)) }); // the file counts the lower side downward
    const taps = [...of("upper"), ...of("lower").reverse()];
    const xs = Float64Array.from(taps, (r) => Number(r["x_c"]));
    const zs = Float64Array.from(taps, (r) => {
      const { x, z } = height(r["surface"]!);
      const made = restation(x, z, Float64Array.of(Math.min(Math.max(Number(r["x_c"]), x[0]!), x.at(-1)!)), "monotone");
      return made.ok ? made.values[0]! : NaN;
    });
    const s = side(xs, zs, Float64Array.from(taps, (r) => (r["Cp"] === "" ? NaN : Number(r["Cp"]))), { side: "upper", referenceSpeed: 1, mach: 0.676 });
    expect(s.x[0]!).toBeLessThan(0.02);
    expect(Math.max(...s.speed)).toBeGreaterThan(1.2);
    expect(Math.max(...s.speed)).toBeLessThan(1.5);
    expect(s.station.at(-1)!).toBeGreaterThan(0.9);
  });
});

describe("refusals", () => {
  const x = Float64Array.of(1, 0.5, 0.1, 0, 0.1, 0.5, 1);
  const y = Float64Array.of(0, 0.08, 0.05, 0, -0.05, -0.08, 0);
  const cp = Float64Array.of(0.1, -0.5, -0.8, 0.95, -0.3, -0.2, 0.1);
  const base: TapSettings = { side: "upper", referenceSpeed: 10 };
  const spoilt = (v: Float64Array, i: number, value: number) => Object.assign(v.slice(), { [i]: value });
  test.each<[string, Float64Array, Float64Array, Float64Array, TapSettings, string, number | undefined]>([
    ["no inner maximum", x, y, Float64Array.of(1, 0.5, 0, -0.5, -0.6, -0.7, -0.8), base, "no stagnation point", 1],
    ["cp above stagnation", x, y, spoilt(cp, 3, 1.2), base, "outside range", 4],
    ["cp below vacuum", x, y, spoilt(cp, 2, -6), { ...base, mach: 0.6 }, "outside range", 3],
    ["crossing taps", x, Float64Array.of(0, 0.08, -0.05, 0, 0.05, -0.08, 0), cp, base, "contour crosses", 2],
    ["a repeated inner tap", spoilt(x, 2, 0.5), spoilt(y, 2, 0.08), cp, base, "repeats a point", 3],
    ["too few taps", x, y, Float64Array.of(NaN, NaN, -0.8, 0.95, -0.3, -0.2, 0.1), base, "too few points", undefined],
    ["no reference speed", x, y, cp, { ...base, referenceSpeed: 0 }, "not positive", undefined],
  ])("%s is refused with its row", (_what, px, py, pressure, settings, reason, row) => {
    expect(surfaceFromTaps(px, py, pressure, settings)).toMatchObject({ ok: false, reason, ...(row === undefined ? {} : { row }) });
  });

  test("a figure of eight crosses, a square does not", () => {
    expect(contourCrossing(Float64Array.of(0, 1, 1, 0), Float64Array.of(0, 1, 0, 1))).toEqual([0, 2]);
    expect(contourCrossing(Float64Array.of(0, 1, 1, 0, 0), Float64Array.of(0, 0, 1, 1, 0))).toBeUndefined();
  });
});

describe("EDGE_MACH and RESTATION physics", () => {
  test("pressure ratios of NACA Rep. 1135 give their Mach numbers: p/p0 = 0.52828 at M = 1, 0.7209 at 0.7, 0.2724 at 1.5 (table I; from memory)", () => {
    const mach = 0.5;
    const q = 0.7 * mach * mach;
    const p0 = 1.05 ** 3.5; // (1 + 0.2 · 0.25)^3.5
    const cp = Float64Array.from([0.52828, 0.7209, 0.2724], (ratio) => (ratio * p0 - 1) / q);
    const made = edgeMach(cp, mach);
    if (!made.ok) throw new Error(made.reason);
    expect(made.mach[0]!).toBeCloseTo(1, 4);
    expect(made.mach[1]!).toBeCloseTo(0.7, 3);
    expect(made.mach[2]!).toBeCloseTo(1.5, 3);
  });
  test("cp = 0 is the reference flow itself, stagnation is Mach 0, vacuum and more than stagnation are refused", () => {
    const made = edgeMach(Float64Array.of(0, (1.05 ** 3.5 - 1) / 0.175), 0.5);
    expect(made.ok && [...made.mach].map((m) => Number(m.toFixed(12)))).toEqual([0.5, 0]);
    expect(edgeMach(Float64Array.of(-1 / 0.175), 0.5)).toMatchObject({ ok: false, reason: "outside range", row: 1 });
    expect(edgeMach(Float64Array.of(0, 1.2), 0.5)).toMatchObject({ ok: false, reason: "outside range", row: 2 });
    expect(edgeMach(Float64Array.of(0), 0)).toMatchObject({ ok: false, reason: "not positive" });
  });
  test("a cubic is reproduced at new stations, nothing is extrapolated, monotone never overshoots", () => {
    const x = Float64Array.of(0, 0.4, 1, 1.5, 2.5);
    const cubic = (v: number) => 1 - v + 0.5 * v ** 3;
    const made = restation(x, x.map(cubic), Float64Array.of(2.2, 0.1, 1), "spline");
    if (!made.ok) throw new Error(made.reason);
    [2.2, 0.1, 1].forEach((v, i) => expect(made.values[i]!).toBeCloseTo(cubic(v), 12));
    expect(restation(x, x.map(cubic), Float64Array.of(1, 2.6), "spline")).toMatchObject({ ok: false, reason: "outside column", row: 2 });
    const step = restation(x, Float64Array.of(0, 0, 0, 1, 1), Float64Array.from({ length: 51 }, (_, i) => i / 20), "monotone");
    expect(step.ok && [Math.min(...step.values), Math.max(...step.values)]).toEqual([0, 1]);
  });
});

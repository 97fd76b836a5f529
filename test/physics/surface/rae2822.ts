import { cubicAt } from "../../../src/numerics/piecewise-cubic";
import { cubicSpline } from "../../../src/numerics/cubic-spline";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { edgeGas, type EdgeGas } from "../../../src/physics/edge/edge-gas";
import { restation } from "../../../src/physics/edge/restation";
import { surfaceFromTaps, type SurfaceSide } from "../../../src/physics/edge/surface-from-taps";
import { wallConditions, type WallConditions } from "../../../src/physics/laminar/wall-conditions";
import { numbers, readReference } from "../../references/read-reference";

/** One side of RAE 2822 with its measured pressures (Cook, McDonald & Firmin, AGARD AR-138 (1979), paper A6), lengths over the chord, speeds over the stream's. */
export interface RaeSide {
  wall: WallConditions;
  gas: EdgeGas;
  nu: number;
  /** Station of the roughness strip that fixed transition. */
  strip: number;
  side: SurfaceSide;
  /** A column read at a chordwise place. */
  at(column: Float64Array, chordwise: number): number;
}

const contour = readReference("rae2822_coords.csv");
const taps = readReference("rae2822_cp.csv").filter((r) => r["Cp"] !== "");
const cases = readReference("rae2822_cases.csv");

export const raeCase = (which: string): Record<string, string> => cases.find((r) => r["case"] === which)!;

export function raeSide(which: string, side: "upper" | "lower"): RaeSide {
  const info = raeCase(which);
  const mach = Number(info["Mach"]);
  const of = (surface: string) => taps.filter((r) => r["case"] === which && r["surface"] === surface).sort((a, b) => Number(b["x_c"]) - Number(a["x_c"]));
  const all = [...of("upper"), ...of("lower").reverse()];
  const x = Float64Array.from(all, (r) => Number(r["x_c"]));
  const y = Float64Array.from(all, (r) => {
    // The file counts the lower side downward.
    const heights = numbers(contour, `y${r["surface"]}_c`).map((z) => (r["surface"] === "lower" ? -z : z));
    const made = restation(numbers(contour, "x_c"), heights, Float64Array.of(Math.min(Math.max(Number(r["x_c"]), 0), 1)), "monotone");
    if (!made.ok) throw new Error(made.reason);
    return made.values[0]!;
  });
  const made = surfaceFromTaps(x, y, numbers(all, "Cp"), { side, referenceSpeed: 1, mach });
  if (!made.ok) throw new Error(made.reason);
  const { station, speed } = made.side;
  const edge = edgeCurve(station, speed, { fit: "monotone" });
  if (!edge.ok) throw new Error(edge.reason);
  const wall = wallConditions(edge.edge);
  const gas = edgeGas(mach, 1);
  if (!wall.ok || !gas.ok) throw new Error("wall or gas");
  // Behind the nose the chordwise place rises with the station.
  const from = made.side.x.indexOf(Math.min(...made.side.x));
  const back = cubicSpline(made.side.x.slice(from), station.slice(from));
  if (!back.ok) throw new Error(back.reason);
  const stationAt = (chordwise: number): number => {
    const found = cubicAt(back.curve, Math.min(chordwise, made.side.x.at(-1)!));
    if (!found.ok) throw new Error(found.reason);
    return found.value;
  };
  return {
    wall: wall.wall,
    gas: gas.gas,
    nu: 1 / Number(info["Re"]),
    strip: stationAt(Number(info["strip_x_c"])),
    side: made.side,
    at(column, chordwise) {
      const s = stationAt(chordwise);
      let i = 1;
      while (i + 1 < station.length && station[i]! < s) i += 1;
      const t = (s - station[i - 1]!) / (station[i]! - station[i - 1]!);
      return column[i - 1]! + t * (column[i]! - column[i - 1]!);
    },
  };
}

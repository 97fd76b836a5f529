import { cubicAt } from "../../../src/numerics/piecewise-cubic";
import { edgeCurve } from "../../../src/physics/edge/edge-curve";
import { traverseIntegrals } from "../../../src/physics/traverse/traverse-integrals";
import { numbers, readReference } from "../../references/read-reference";

/** A layer measured or computed by others along a wall. */
export interface MeasuredFlow {
  name: string;
  nu: number;
  /** Stations and edge speeds that the march gets. */
  x: Float64Array;
  ue: Float64Array;
  /** Start values at the first station. */
  momentumLoss: number;
  shape: number;
  /** Where quantities are compared; cf refers to the local edge speed. */
  points: readonly { x: number; momentumLoss?: number; shape?: number; friction?: number; by?: string }[];
}

/** Wieghardt's plate, ue = 33 m/s, from the station with index `from` on (Wieghardt & Tillmann, NACA TM 1314; Coles & Hirst 1968, ident 1400). */
export function wieghardtPlate(from: number): MeasuredFlow {
  const rows = readReference("wieghardt_1400_stations.csv").slice(from);
  const x = numbers(rows, "x_m");
  const [theta, shape, cf] = [numbers(rows, "theta_m"), numbers(rows, "H"), numbers(rows, "cf")];
  return {
    name: "plate (Wieghardt & Tillmann)",
    nu: 1.51e-5,
    x,
    ue: x.map(() => 33),
    momentumLoss: theta[0]!,
    shape: shape[0]!,
    points: Array.from(x, (at, i) => ({ x: at, momentumLoss: theta[i], shape: shape[i], friction: cf[i] })),
  };
}

/** Speed at which Samuel & Joubert's cf and Cp are referenced, and viscosity of air in the tunnel (1.7e6 a metre). */
const SAMUEL_SPEED = 26.2;
const AIR = 1.5e-5;
/** Last station of the comparison. */
const SAMUEL_END = 3.05;

/**
 * Samuel & Joubert's rising adverse gradient (J. Fluid Mech. 66 (1974) 481–505; 1980-81 case 0141): edge speed from the measured Cp column
 * (smooth fit), thicknesses from the measured profiles, cf turned from the reference speed to the local edge speed.
 */
export function samuelJoubert(): MeasuredFlow {
  const pressure = readReference("samueljoubert_0141_cp.csv").filter((r) => r["Cp"] !== "");
  const measured = edgeCurve(numbers(pressure, "x_m"), numbers(pressure, "Cp").map((cp) => SAMUEL_SPEED * Math.sqrt(1 - cp)), { fit: "smooth" });
  if (!measured.ok) throw new Error(measured.reason);
  const speed = (at: number): number => {
    const found = cubicAt(measured.edge.curve, at);
    if (!found.ok) throw new Error(found.reason);
    return found.value;
  };
  const profiles = readReference("samueljoubert_0141_profiles.csv");
  const stations = [...new Set(profiles.map((r) => r["station"]!))].map((station) => {
    const rows = profiles.filter((r) => r["station"] === station);
    const at = Number(rows[0]!["x_m"]);
    const made = traverseIntegrals(numbers(rows, "y_m"), numbers(rows, "u_over_ue").map((u) => u * speed(at)), { nu: AIR });
    if (!made.ok) throw new Error(made.reason);
    return { x: at, momentumLoss: made.traverse.momentumLoss, shape: made.traverse.shape };
  });
  const friction = readReference("samueljoubert_0141_cf.csv").map((r) => {
    const at = Number(r["x_m"]);
    return { x: at, friction: Number(r["cf"]) * (SAMUEL_SPEED / speed(at)) ** 2, by: r["method"] };
  });
  const first = stations[0]!;
  const x = Float64Array.from({ length: 60 }, (_, i) => first.x + ((3.4 - first.x) * i) / 59);
  return {
    name: "rising adverse gradient (Samuel & Joubert)",
    nu: AIR,
    x,
    ue: x.map(speed),
    momentumLoss: first.momentumLoss,
    shape: first.shape,
    points: [...stations, ...friction].filter((p) => p.x >= first.x && p.x <= SAMUEL_END),
  };
}

/**
 * The plate layer before a separation bubble, computed without a model (Coleman, Rumsey & Spalart, J. Fluid Mech. 847 (2018) 28–70), from x = `from` to just
 * behind its separation.
 */
export function separationBubbleDns(which: "A" | "C", from = -8.4): MeasuredFlow & { separation: number } {
  const rows = readReference(`crs_bubble_case${which}.csv`).filter((r) => Number(r["x"]) > from);
  // The two files write the same columns with and without their definitions.
  const heading = (begins: string) => Object.keys(rows[0]!).find((key) => key.startsWith(begins))!;
  const cf = numbers(rows, heading("C_f"));
  const zero = cf.findIndex((v) => v < 0);
  const upto = rows.slice(0, zero + 4);
  const x = numbers(upto, "x");
  const ue = numbers(upto, "Ue_tilde");
  const [theta, defect] = [numbers(upto, "theta"), numbers(upto, "deltastar")];
  return {
    name: `bubble case ${which} (Coleman, Rumsey & Spalart)`,
    // Reθ of the file is θ∕ν with the far upstream speed 1.
    nu: theta[0]! / Number(upto[0]![heading("Rtheta")]),
    x,
    ue,
    momentumLoss: theta[0]!,
    shape: defect[0]! / theta[0]!,
    points: Array.from(x, (at, i) => ({ x: at, momentumLoss: theta[i], shape: defect[i]! / theta[i]!, friction: cf[i]! / ue[i]! ** 2 })),
    separation: x[zero - 1]! + ((x[zero]! - x[zero - 1]!) * cf[zero - 1]!) / (cf[zero - 1]! - cf[zero]!),
  };
}

/** A column read between its stations by a straight line. */
export function between(x: Float64Array, column: Float64Array, at: number): number {
  let i = 0;
  while (i + 2 < x.length && x[i + 1]! < at) i += 1;
  const t = (at - x[i]!) / (x[i + 1]! - x[i]!);
  return column[i]! + t * (column[i + 1]! - column[i]!);
}

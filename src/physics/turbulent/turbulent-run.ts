import type { OdeDrive } from "../../numerics/ode-drive";
import { odeDrive } from "../../numerics/ode-drive";
import type { LayerColumns } from "../layer-columns";
import { giveValue, ROW_STATE } from "../layer-columns";
import { TURBULENT_FROM } from "./transition-zone";
import type { TurbulentEquations, TurbulentWall } from "./turbulent-equations";
import { turbulentEquations } from "./turbulent-equations";

/** Why a turbulent march ended. */
export type TurbulentStop =
  | { kind: "end" }
  /** The method's criterion of separation is met at station x. */
  | { kind: "separation"; x: number; momentumLoss: number }
  /** The layer leaves the range of the relations at station x. */
  | { kind: "limit"; x: number; momentumLoss: number };

export interface RunCounts {
  steps: number;
  rejected: number;
  largestError: number;
}

/** Where and with what a turbulent layer begins. */
export interface TurbulentBegin {
  panel: number;
  x: number;
  /** θ, marched shape factor and, for a method with memory, CE. */
  state: Float64Array;
}

/**
 * Error allowed a step, relative. The marches are held to 1e-6 of an independent integration over some hundred steps, and the relations
 * themselves are good to a few per cent.
 */
const TOLERANCE = 1e-8;
/** Added for CE, which may pass 0; it is of the order of 0.01. */
const ENTRAINMENT_TOLERANCE = 1e-10;
/** First step over θ at the start: the shape factor moves over tens of θ. */
const FIRST_STEP = 1;
/** Shortest step over the wall length. */
const LEAST_STEP = 1e-13;

/**
 * Marches a turbulent layer from a place on the wall to its end and writes the stations it passes into the columns.
 *
 * @param on method, wall and gas
 * @param begin place and state; a begin on a station fills that station too
 * @param afterSeparation "continue" carries on by the same equations, the rows marked as separated
 * @returns why it stopped, how many steps it took and the first station where the layer came near separation (entrainment method)
 */
export function turbulentRun(on: TurbulentWall, begin: TurbulentBegin, columns: LayerColumns, afterSeparation: "stop" | "continue" = "stop"): { stop: TurbulentStop; counts: RunCounts } {
  const { x } = on.wall.edge.curve;
  const n = x.length;
  const length = x[n - 1] - x[0];
  const equations = turbulentEquations(on);
  const counts: RunCounts = { steps: 0, rejected: 0, largestError: 0 };
  let stop: TurbulentStop = { kind: "end" };
  let panel = begin.panel;
  equations.panel = panel;
  const start = (from: number, y: Float64Array, watch: boolean): OdeDrive =>
    odeDrive(equations.right, from, y, {
      kind: "plain",
      relative: TOLERANCE,
      absolute: Float64Array.of(0, 0, ENTRAINMENT_TOLERANCE),
      firstStep: FIRST_STEP * y[0],
      leastStep: LEAST_STEP * length,
      event: watch ? equations.margin : undefined,
    });
  const place = (at: number): number => (at - x[panel]) / (x[panel + 1] - x[panel]);
  const { state } = begin;
  if (!equations.meanAt(panel, place(begin.x), state)) return { stop: { kind: "limit", x: begin.x, momentumLoss: state[0] }, counts };
  if (!(equations.mean.turbulent.margin > 0)) return { stop: { kind: "separation", x: begin.x, momentumLoss: state[0] }, counts };
  if (begin.x === x[panel]) writeStation(on, equations, columns, panel, panel, 0, state, false);
  let drive = start(begin.x, state, true);
  let separated = false;
  while (panel + 1 < n) {
    equations.panel = panel;
    const end = drive.to(x[panel + 1]);
    if (end === "event") {
      stop = { kind: "separation", x: drive.x, momentumLoss: drive.y[0] };
      add(counts, drive);
      if (afterSeparation === "stop") return { stop, counts };
      separated = true;
      drive = start(drive.x, drive.y, false);
      continue;
    }
    if (end === "stuck") {
      if (!separated) stop = { kind: "limit", x: drive.x, momentumLoss: drive.y[0] };
      break;
    }
    writeStation(on, equations, columns, panel + 1, panel, 1, drive.y, separated);
    panel += 1;
  }
  add(counts, drive);
  return { stop, counts };
}

function add(counts: RunCounts, drive: OdeDrive): void {
  counts.steps += drive.counts.steps;
  counts.rejected += drive.counts.rejected;
  counts.largestError = Math.max(counts.largestError, drive.counts.largestError);
}

/** Share of a panel over which the growth of the mass defect is taken in a zone: short beside any change, long beside rounding. */
const SHORT = 1e-5;
const slope = new Float64Array(3);
const ahead = new Float64Array(3);

/** All results at a station, read at the fraction t (0 or 1) of a panel that touches it. */
function writeStation(on: TurbulentWall, equations: TurbulentEquations, columns: LayerColumns, i: number, panel: number, t: number, y: Float64Array, separated: boolean): void {
  const { x } = on.wall.edge.curve;
  const { place, mean } = equations;
  equations.panel = panel;
  if (!equations.right(x[i], y, slope)) return;
  const growth = on.zone === null ? massDefectRate(on, equations) : zoneRate(equations, panel, t, y, x[panel + 1] - x[panel]);
  const { theta, shape } = mean;
  const layer = mean.turbulent;
  const massDefect = place.density * place.speed * shape * theta;
  columns.state[i] = separated ? ROW_STATE.separated : mean.intermittency < TURBULENT_FROM ? ROW_STATE.transition : ROW_STATE.turbulent;
  giveValue(columns, "momentumLoss", i, theta);
  giveValue(columns, "shape", i, shape);
  giveValue(columns, "defect", i, shape * theta);
  if (on.gas.mach === 0) giveValue(columns, "energyLoss", i, powerLawEnergyShape(shape) * theta);
  giveValue(columns, "layerHeight", i, (shape + layer.entrainShape) * theta);
  giveValue(columns, "friction", i, mean.friction);
  giveValue(columns, "momentumReynolds", i, (place.speed * theta) / place.nu);
  giveValue(columns, "gradient", i, (theta * theta * place.speedSlope) / place.nu);
  giveValue(columns, "massDefect", i, massDefect);
  giveValue(columns, "blowVelocity", i, growth);
  giveValue(columns, "entrainment", i, layer.entrainment);
  giveValue(columns, "intermittency", i, mean.intermittency);
}

/** dm∕dx, (1∕r) d(r m)∕dx on a round body, from the equations: dρe∕dx = −M² ρe (due∕dx)∕ue. `slope` holds the state's rates. */
function massDefectRate(on: TurbulentWall, equations: TurbulentEquations): number {
  const { place, mean } = equations;
  const { theta, shape } = mean;
  const shapeSlope = on.method.shapeRate(place, mean.turbulent, slope[1]);
  const stretch = ((1 - place.machSquare) * place.speedSlope) / place.speed + place.radiusSlope / place.radius;
  return place.density * place.speed * (shape * slope[0] + theta * shapeSlope + shape * theta * stretch);
}

/** The same in a zone of intermittency, whose mean H moves with the gradient too: by differences along the march, to second order. */
function zoneRate(equations: TurbulentEquations, panel: number, t: number, y: Float64Array, width: number): number {
  const { place, mean } = equations;
  const inward = t === 0 ? SHORT : -SHORT;
  const nearby = (k: number): number => {
    for (let u = 0; u < y.length; u += 1) ahead[u] = y[u] + k * inward * width * slope[u];
    return equations.meanAt(panel, t + k * inward, ahead) ? place.radius * place.density * place.speed * mean.shape * mean.theta : NaN;
  };
  const first = nearby(1);
  const second = nearby(2);
  const here = nearby(0);
  return (4 * first - second - 3 * here) / (2 * inward * width) / place.radius;
}

/**
 * δ3∕θ = 4H∕(3H − 1), exact for profiles u ∝ y^n and within 1 % of the plate of Wieghardt & Tillmann (NACA TM 1314); not part of either method.
 */
export function powerLawEnergyShape(shape: number): number {
  return (4 * shape) / (3 * shape - 1);
}

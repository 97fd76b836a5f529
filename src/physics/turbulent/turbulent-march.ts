import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { EdgeGas } from "../edge/edge-gas";
import { CONSTANT_DENSITY, firstBeyondVacuum } from "../edge/edge-gas";
import type { WallConditions } from "../laminar/wall-conditions";
import type { LayerColumns } from "../layer-columns";
import { giveValue, layerColumns, ROW_STATE } from "../layer-columns";
import { entrainmentMethod } from "./entrainment-method";
import { lagMethod } from "./lag-method";
import { leadingEdgeStart } from "./leading-edge-start";
import type { TurbulentMethod } from "./turbulent-method";
import { emptyTurbulentPlace, turbulentState } from "./turbulent-state";
import type { RunCounts, TurbulentStop } from "./turbulent-run";
import { turbulentRun } from "./turbulent-run";

/** A turbulent layer along a wall. */
export interface TurbulentMarch {
  start: "leading edge" | "given momentum loss";
  stop: TurbulentStop;
  /** Start values used. */
  startShape: number;
  startEntrainment: number;
  columns: LayerColumns;
  counts: RunCounts;
}

export interface TurbulentOptions {
  gas?: EdgeGas;
  /** θ at the first station [length], or Reθ there; neither: turbulent from a leading edge at the first station. */
  startMomentumLoss?: number;
  startReynolds?: number;
  /** H at the first station; omitted: that of a plate layer with the same Reθ ("after onset"). */
  startShape?: number;
  /** CE at the first station, lag method only; omitted: in equilibrium with the layer. */
  startEntrainment?: number;
  afterSeparation?: "stop" | "continue";
}

/** Head's entrainment method; see entrainment-method.ts. Constant density; separation where H reaches 2.4. */
export function entrainmentMarch(wall: WallConditions, nu: number, options: TurbulentOptions = {}): Outcome<{ march: TurbulentMarch }> {
  return turbulentMarch(entrainmentMethod, wall, nu, options);
}

/** The lag-entrainment method; see lag-method.ts. Separation where its wall friction reaches 0. */
export function lagMarch(wall: WallConditions, nu: number, options: TurbulentOptions = {}): Outcome<{ march: TurbulentMarch }> {
  return turbulentMarch(lagMethod, wall, nu, options);
}

/**
 * A turbulent layer along a solid wall, plane or round.
 *
 * @param wall edge curve above 0 everywhere, radius curve above 0 except at a nose
 * @param nu kinematic viscosity of the reference stream [length²/time], > 0
 */
function turbulentMarch(method: TurbulentMethod, wall: WallConditions, nu: number, options: TurbulentOptions): Outcome<{ march: TurbulentMarch }> {
  const { gas = CONSTANT_DENSITY } = options;
  const { x, value } = wall.edge.curve;
  const bad = checkArguments(wall, nu, gas, options);
  if (bad) return bad;
  const columns = layerColumns(value);
  const on = { method, wall, gas, nu, zone: null };
  const place = emptyTurbulentPlace(on, 0, 0);
  const given = options.startMomentumLoss ?? (options.startReynolds === undefined ? undefined : (options.startReynolds * place.nu) / place.speed);
  if (given === undefined || given === 0) {
    if (options.startShape !== undefined || options.startEntrainment !== undefined) return refuse("start shape alone", { argument: options.startShape === undefined ? "start entrainment" : "start shape" });
    const made = leadingEdgeStart(on);
    if (!made.ok) return made;
    const { begin, run, startShape } = made;
    columns.state[0] = ROW_STATE.turbulent;
    giveValue(columns, "momentumLoss", 0, 0);
    giveValue(columns, "defect", 0, 0);
    giveValue(columns, "massDefect", 0, 0);
    giveValue(columns, "momentumReynolds", 0, 0);
    giveValue(columns, "intermittency", 0, 1);
    run.fill(columns);
    const { stop, counts } = turbulentRun(on, begin, columns, options.afterSeparation);
    return { ok: true, march: { start: "leading edge", stop, startShape, startEntrainment: made.startEntrainment, columns, counts } };
  }
  const made = turbulentState(on, place, given, options.startShape, options.startEntrainment);
  if (!made.ok) return made;
  const { stop, counts } = turbulentRun(on, { panel: 0, x: x[0], state: made.state }, columns, options.afterSeparation);
  return { ok: true, march: { start: "given momentum loss", stop, startShape: made.shape, startEntrainment: made.entrainment, columns, counts } };
}

function checkArguments(wall: WallConditions, nu: number, gas: EdgeGas, options: TurbulentOptions): Refusal | null {
  if (!(Number.isFinite(nu) && nu > 0)) return refuse("not positive", { argument: "nu", values: { value: nu } });
  if (wall.edge.fromStagnation) return refuse("turbulent from stagnation", { argument: "ue", row: 1 });
  const vacuum = firstBeyondVacuum(gas, wall.edge.curve.value);
  if (vacuum > 0) return refuse("beyond vacuum", { argument: "ue", row: vacuum, values: { value: wall.edge.curve.value[vacuum - 1] } });
  if (options.startMomentumLoss !== undefined && options.startReynolds !== undefined) return refuse("start given twice", { argument: "start Re theta" });
  for (const [argument, value] of [
    ["start momentum loss", options.startMomentumLoss],
    ["start Re theta", options.startReynolds],
  ] as const) {
    if (value !== undefined && !Number.isFinite(value)) return refuse("not finite", { argument });
    if (value !== undefined && value < 0) return refuse("negative", { argument, values: { value } });
  }
  return null;
}

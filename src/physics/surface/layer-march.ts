import type { Outcome, Refusal } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { panelOf } from "../../numerics/piecewise-cubic";
import type { EdgeGas } from "../edge/edge-gas";
import { CONSTANT_DENSITY, firstBeyondVacuum } from "../edge/edge-gas";
import type { LayerStart } from "../laminar/thwaites-growth";
import type { WallConditions } from "../laminar/wall-conditions";
import type { LayerColumns } from "../layer-columns";
import { giveValue, layerColumns, ROW_STATE } from "../layer-columns";
import type { OnsetCriterion } from "../onset/onset-criterion";
import { entrainmentMethod } from "../turbulent/entrainment-method";
import { lagMethod } from "../turbulent/lag-method";
import { entrainmentMarch, lagMarch } from "../turbulent/turbulent-march";
import type { RunCounts, TurbulentStop } from "../turbulent/turbulent-run";
import { turbulentRun } from "../turbulent/turbulent-run";
import { emptyTurbulentPlace, LEAST_START_REYNOLDS, turbulentState } from "../turbulent/turbulent-state";
import { transitionZone } from "../turbulent/transition-zone";
import { laminarByMethod, type LaminarMethodName } from "./laminar-methods";
import type { LaminarEnd, LaminarPart } from "./laminar-part";
import { findOnset, onsetPlace, writeLaminar } from "./laminar-part";
import type { SeparationBubble } from "./separation-bubble";
import { bubbleTheta, separationBubble } from "./separation-bubble";

/** Where the layer is told to turn turbulent. */
export type OnsetChoice = { kind: "free"; criterion: OnsetCriterion; turbulence: number } | { kind: "fixed"; x: number; addedMomentumLoss: number } | { kind: "from start" } | { kind: "none" };

/** How the layer turned turbulent. */
export interface Onset {
  kind: "free" | "fixed" | "from start" | "separation" | "least Reynolds";
  x: number;
  momentumLoss: number;
  momentumReynolds: number;
  /** H of the turbulent layer at its begin. */
  startShape: number;
  /** What the criterion says of its own range. */
  remark: string;
}

/** Why the march ended. */
export type LayerStop =
  | { kind: "end" }
  | { kind: "laminar separation"; x: number; momentumLoss: number }
  | { kind: "no reattachment"; x: number; momentumLoss: number }
  | { kind: "laminar limit"; x: number; momentumLoss: number }
  | { kind: "turbulent separation"; x: number; momentumLoss: number }
  | { kind: "turbulent limit"; x: number; momentumLoss: number };

export interface LayerMarch {
  start: LayerStart;
  onset: Onset | null;
  bubble: SeparationBubble | null;
  /** A fixed onset lay behind laminar separation: its station; null otherwise. */
  missedTrip: number | null;
  stop: LayerStop;
  columns: LayerColumns;
  counts: RunCounts;
}

export interface LayerOptions {
  laminarMethod?: LaminarMethodName;
  turbulentMethod?: "entrainment" | "lag";
  onset: OnsetChoice;
  /** Intermittent zone behind the onset by Dhawan & Narasimha instead of a sudden change. */
  zone?: boolean;
  gas?: EdgeGas;
  startMomentumLoss?: number;
  startShape?: number;
  afterSeparation?: "stop" | "continue";
}

/** Below this Reθ no turbulent layer has been seen to last: J. H. Preston, J. Fluid Mech. 3 (1958) 373–384. Used where "from start" meets a stagnation point. */
export const LEAST_TURBULENT_REYNOLDS = 320;

/**
 * The layer along a whole wall: laminar from its start, an onset found or given, turbulent to the end.
 *
 * At the onset θ goes through (with the trip's own loss added where it is given) and H takes the value of a plate layer with the same Reθ;
 * from there the turbulent method's own equations carry it to what the edge speed asks. With `zone` the change is spread by
 * intermittency instead. A laminar layer that separates first becomes turbulent over a short bubble.
 *
 * @param wall edge curve and radius, solid wall
 * @param nu kinematic viscosity of the reference stream [length²/time], > 0
 */
export function layerMarch(wall: WallConditions, nu: number, options: LayerOptions): Outcome<{ march: LayerMarch }> {
  const { onset, gas = CONSTANT_DENSITY } = options;
  const { x, value } = wall.edge.curve;
  const bad = checkArguments(wall, nu, gas, onset);
  if (bad) return bad;
  if (onset.kind === "from start" && !wall.edge.fromStagnation) return turbulentThroughout(wall, nu, gas, options);

  const made = laminarByMethod(options.laminarMethod ?? "Thwaites", wall, nu, options);
  if (!made.ok) return made;
  const { part } = made;
  const march: LayerMarch = { start: part.march.start, onset: null, bubble: null, missedTrip: null, stop: { kind: "end" }, columns: layerColumns(value), counts: { steps: 0, rejected: 0, largestError: 0 } };
  const found = onsetOf(part, onset);
  if (found === null) {
    writeLaminar(part, x.length - 1, march.columns);
    if (part.end.kind === "end") return { ok: true, march };
    if (part.end.kind === "limit") {
      march.stop = { kind: "laminar limit", x: part.end.x, momentumLoss: part.end.momentumLoss };
      return { ok: true, march };
    }
    if (onset.kind === "none") {
      march.stop = { kind: "laminar separation", x: part.end.x, momentumLoss: part.end.momentumLoss };
      return { ok: true, march };
    }
    if (onset.kind === "fixed") march.missedTrip = onset.x;
    return overBubble(part, part.end, gas, options, march);
  }

  const { panel, kind, added } = found;
  const place = onsetPlace(part, panel, found.x, 0);
  writeLaminar(part, panel, march.columns);
  const remark = onset.kind === "free" ? onset.criterion.remark(place) : "";
  const theta = place.theta + added;
  const run = found.x - x[0] + part.head;
  return onward(wall, nu, gas, options, march, { kind, panel, x: found.x, theta, remark }, options.zone === true ? run : 0);
}

/** Where the laminar layer gives way before it ends by itself; null where it does not. */
function onsetOf(part: LaminarPart, onset: OnsetChoice): { kind: Onset["kind"]; panel: number; x: number; added: number } | null {
  const { x } = part.wall.edge.curve;
  if (onset.kind === "free") {
    const at = findOnset(part, onset.criterion, onset.turbulence);
    return at === null ? null : { kind: "free", ...at, added: 0 };
  }
  if (onset.kind === "fixed") {
    const reach = part.end.kind === "end" ? x[x.length - 1] : part.end.x;
    if (onset.x > reach) return null;
    return { kind: "fixed", panel: panelOf(x, onset.x), x: onset.x, added: onset.addedMomentumLoss };
  }
  if (onset.kind === "from start") {
    const at = findOnset(part, { excess: (place) => place.momentumReynolds - LEAST_TURBULENT_REYNOLDS }, 0);
    return at === null ? null : { kind: "least Reynolds", ...at, added: 0 };
  }
  return null;
}

interface Begin {
  kind: Onset["kind"];
  panel: number;
  x: number;
  theta: number;
  remark: string;
}

/** The turbulent layer from its begin to the end of the wall. */
function onward(wall: WallConditions, nu: number, gas: EdgeGas, options: LayerOptions, march: LayerMarch, begin: Begin, run: number): Outcome<{ march: LayerMarch }> {
  const { x } = wall.edge.curve;
  const method = options.turbulentMethod === "entrainment" ? entrainmentMethod : lagMethod;
  const { panel } = begin;
  const t = (begin.x - x[panel]) / (x[panel + 1] - x[panel]);
  const place = emptyTurbulentPlace({ wall, gas, nu }, panel, t);
  const zone = run > 0 ? transitionZone(begin.x, run, place.speed, place.nu) : null;
  const on = { method, wall, gas, nu, zone };
  const made = turbulentState(on, place, begin.theta);
  if (!made.ok) {
    const early = made.reason === "outside range" && (made.values?.value ?? Infinity) < LEAST_START_REYNOLDS;
    return early ? refuse("onset too early", { argument: "onset", at: begin.x, values: made.values }) : { ...made, argument: made.argument === "nu" ? "nu" : "Re θ at the onset" };
  }
  march.onset = { kind: begin.kind, x: begin.x, momentumLoss: begin.theta, momentumReynolds: (place.speed * begin.theta) / place.nu, startShape: made.shape, remark: begin.remark };
  const { stop, counts } = turbulentRun(on, { panel, x: begin.x, state: made.state }, march.columns, options.afterSeparation);
  march.stop = turbulentStop(stop);
  march.counts = counts;
  return { ok: true, march };
}

function turbulentStop(stop: TurbulentStop): LayerStop {
  return stop.kind === "end" ? stop : { ...stop, kind: stop.kind === "separation" ? "turbulent separation" : "turbulent limit" };
}

/** Laminar separation turns the layer turbulent over a short bubble, if it reattaches on this wall. */
function overBubble(part: LaminarPart, end: LaminarEnd, gas: EdgeGas, options: LayerOptions, march: LayerMarch): Outcome<{ march: LayerMarch }> {
  const { wall, nu } = part;
  const { curve } = wall.edge;
  const { x } = curve;
  const bubble = separationBubble(curve, nu, end.x, end.momentumLoss);
  const first = part.march.reached;
  if (bubble === null) {
    march.stop = { kind: "no reattachment", x: end.x, momentumLoss: end.momentumLoss };
    return { ok: true, march };
  }
  march.bubble = bubble;
  for (let i = first; i < x.length && x[i] < bubble.reattachment; i += 1) {
    const theta = bubbleTheta(bubble, curve, x[i]);
    march.columns.state[i] = ROW_STATE.bubble;
    giveValue(march.columns, "momentumLoss", i, theta);
    giveValue(march.columns, "momentumReynolds", i, (curve.value[i] * theta) / nu);
    giveValue(march.columns, "gradient", i, (theta * theta * curve.slope[i]) / nu);
    giveValue(march.columns, "friction", i, 0);
    giveValue(march.columns, "intermittency", i, x[i] < bubble.onset ? 0 : 1);
  }
  const panel = panelOf(x, bubble.reattachment);
  return onward(wall, nu, gas, options, march, { kind: "separation", panel, x: bubble.reattachment, theta: bubble.reattachmentLoss, remark: "" }, 0);
}

/** Turbulent from the first station on. */
function turbulentThroughout(wall: WallConditions, nu: number, gas: EdgeGas, options: LayerOptions): Outcome<{ march: LayerMarch }> {
  const marchBy = options.turbulentMethod === "entrainment" ? entrainmentMarch : lagMarch;
  const { startMomentumLoss, startShape, afterSeparation } = options;
  const made = marchBy(wall, nu, { gas, startMomentumLoss, startShape, afterSeparation });
  if (!made.ok) return made;
  const { start, stop, columns, counts } = made.march;
  const { x, value } = wall.edge.curve;
  const momentumLoss = startMomentumLoss ?? 0;
  const onset: Onset = { kind: "from start", x: x[0], momentumLoss, momentumReynolds: (value[0] * momentumLoss) / nu, startShape: made.march.startShape, remark: "" };
  return { ok: true, march: { start, onset, bubble: null, missedTrip: null, stop: turbulentStop(stop), columns, counts } };
}

function checkArguments(wall: WallConditions, nu: number, gas: EdgeGas, onset: OnsetChoice): Refusal | null {
  const { x, value } = wall.edge.curve;
  if (!(Number.isFinite(nu) && nu > 0)) return refuse("not positive", { argument: "nu", values: { value: nu } });
  const vacuum = firstBeyondVacuum(gas, value);
  if (vacuum > 0) return refuse("beyond vacuum", { argument: "ue", row: vacuum, values: { value: value[vacuum - 1] } });
  if (onset.kind !== "fixed") return null;
  const [least, most] = [x[0], x[x.length - 1]];
  if (!(onset.x > least && onset.x < most)) return refuse("onset outside", { argument: "onset", values: { value: onset.x, least, most } });
  if (!(onset.addedMomentumLoss >= 0)) return refuse("negative", { argument: "trip momentum loss", values: { value: onset.addedMomentumLoss } });
  return null;
}

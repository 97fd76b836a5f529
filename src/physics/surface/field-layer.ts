import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import { panelOf } from "../../numerics/piecewise-cubic";
import { fieldMarch } from "../laminar/field-march";
import { fieldProfile } from "../laminar/field-profile";
import type { WallConditions } from "../laminar/wall-conditions";
import { emptyPlace, wallPlace } from "../laminar/wall-conditions";
import { giveValue, layerColumns, ROW_STATE } from "../layer-columns";
import { eddyMarch } from "../turbulent/eddy-march";
import type { LaminarPart } from "./laminar-part";
import { findOnset, laminarPart, writeLaminar } from "./laminar-part";
import type { LayerMarch, OnsetChoice } from "./layer-march";
import { LEAST_TURBULENT_REYNOLDS } from "./layer-march";

/** Reθ at which a layer told to be turbulent from a leading edge becomes so; a profile is needed to begin with. */
const FROM_START_REYNOLDS = 100;
/** Share of the way from the last station to laminar separation at which turbulence sets in: the equations cannot be carried through separation itself. */
const BEFORE_SEPARATION = 0.5;

/**
 * The whole layer by the full equations: laminar as fieldMarch, turbulent from the onset on by eddyMarch.
 *
 * @param wall edge curve and radius, solid wall
 * @param onset where it turns turbulent; at laminar separation in any case
 * @param options.refinement finer steps across and along the turbulent part, 1 … 8
 */
export function fieldLayer(
  wall: WallConditions,
  nu: number,
  onset: OnsetChoice,
  options: { startMomentumLoss?: number; startShape?: number; refinement?: number } = {},
): Outcome<{ march: LayerMarch }> {
  const { x, value } = wall.edge.curve;
  if (onset.kind === "fixed" && !(onset.x > x[0] && onset.x < x[x.length - 1])) return refuse("onset outside", { argument: "onset", values: { value: onset.x, least: x[0], most: x[x.length - 1] } });
  const laminar = fieldMarch(wall, nu, options);
  if (!laminar.ok) return laminar;
  const { stop } = laminar.march;
  const reached = laminar.march.reached;
  const lastLoss = reached > 0 ? laminar.march.momentumLoss[reached - 1] : 0;
  const end = stop.kind === "end" ? ({ kind: "end", x: 0, momentumLoss: 0 } as const) : { kind: stop.kind === "separation" ? ("separation" as const) : ("limit" as const), x: stop.x, momentumLoss: lastLoss };
  const part = laminarPart(wall, nu, laminar.march, end);
  const march: LayerMarch = { start: laminar.march.start, onset: null, bubble: null, missedTrip: null, stop: { kind: "end" }, columns: layerColumns(value), counts: { steps: laminar.march.counts.steps, rejected: 0, largestError: 0 } };
  const found = onsetOf(part, onset, x);
  if (found === null) {
    writeLaminar(part, x.length - 1, march.columns);
    if (part.end.kind !== "end") march.stop = { kind: part.end.kind === "limit" ? "laminar limit" : "laminar separation", x: part.end.x, momentumLoss: part.end.momentumLoss };
    return { ok: true, march };
  }
  if (onset.kind === "fixed" && onset.x > found.x) march.missedTrip = onset.x;
  const kept = fieldProfile(wall, nu, found.x, { startMomentumLoss: options.startMomentumLoss, startShape: options.startShape });
  if (!kept.ok) return kept;
  writeLaminar(part, panelOf(x, found.x), march.columns);
  const turbulent = eddyMarch(wall, nu, kept.profile, part.head, options.refinement);
  const place = emptyPlace();
  const loss = profileLoss(kept.profile.height, kept.profile.speed);
  march.onset = {
    kind: found.kind,
    x: found.x,
    momentumLoss: loss.momentumLoss,
    momentumReynolds: (kept.profile.speed[kept.profile.speed.length - 1] * loss.momentumLoss) / nu,
    startShape: loss.shape,
    remark: "",
  };
  for (const r of turbulent.records) {
    const i = r.row;
    wallPlace(wall, Math.min(i, x.length - 2), i === x.length - 1 ? 1 : 0, place);
    march.columns.state[i] = ROW_STATE.turbulent;
    giveValue(march.columns, "momentumLoss", i, r.momentumLoss);
    giveValue(march.columns, "defect", i, r.defect);
    giveValue(march.columns, "energyLoss", i, r.energyLoss);
    giveValue(march.columns, "shape", i, r.defect / r.momentumLoss);
    giveValue(march.columns, "layerHeight", i, r.layerHeight);
    giveValue(march.columns, "friction", i, r.friction);
    giveValue(march.columns, "momentumReynolds", i, (value[i] * r.momentumLoss) / nu);
    giveValue(march.columns, "gradient", i, (r.momentumLoss ** 2 * place.speedSlope) / nu);
    giveValue(march.columns, "massDefect", i, value[i] * r.defect);
    giveValue(march.columns, "blowVelocity", i, r.blowVelocity);
    giveValue(march.columns, "intermittency", i, 1);
  }
  march.counts.steps += turbulent.counts.steps;
  if (turbulent.stop.kind !== "end") march.stop = { ...turbulent.stop, kind: turbulent.stop.kind === "separation" ? "turbulent separation" : "turbulent limit" };
  return { ok: true, march };
}

function onsetOf(part: LaminarPart, onset: OnsetChoice, x: Float64Array): { kind: "free" | "fixed" | "from start" | "separation" | "least Reynolds"; x: number } | null {
  const before = ((): { kind: "free" | "fixed" | "from start" | "least Reynolds"; x: number } | null => {
    const reach = part.end.kind === "end" ? x[x.length - 1] : part.end.x;
    if (onset.kind === "fixed") return onset.x < reach ? { kind: "fixed", x: onset.x } : null;
    if (onset.kind === "free") {
      const at = findOnset(part, onset.criterion, onset.turbulence);
      return at === null ? null : { kind: "free", x: at.x };
    }
    if (onset.kind === "from start") {
      const stagnation = part.wall.edge.fromStagnation;
      const least = stagnation ? LEAST_TURBULENT_REYNOLDS : FROM_START_REYNOLDS;
      const at = findOnset(part, { excess: (place) => place.momentumReynolds - least }, 0);
      return at === null ? null : { kind: stagnation ? "least Reynolds" : "from start", x: at.x };
    }
    return null;
  })();
  if (before !== null || onset.kind === "none" || part.end.kind !== "separation") return before;
  const last = x[Math.max(part.march.reached - 1, 0)];
  const at = last + BEFORE_SEPARATION * (part.end.x - last);
  return at > x[0] ? { kind: "separation", x: at } : null;
}

/** θ and H of a profile by the trapezium rule, for the note. */
function profileLoss(height: Float64Array, speed: Float64Array): { momentumLoss: number; shape: number } {
  const edge = speed[speed.length - 1];
  let momentum = 0;
  let defect = 0;
  for (let j = 1; j < height.length; j += 1) {
    const h = (height[j] - height[j - 1]) / 2;
    const [a, b] = [speed[j - 1] / edge, speed[j] / edge];
    momentum += h * (a * (1 - a) + b * (1 - b));
    defect += h * (2 - a - b);
  }
  return { momentumLoss: momentum, shape: defect / momentum };
}

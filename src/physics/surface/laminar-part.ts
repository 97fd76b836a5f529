import { brentRoot } from "../../numerics/brent-root";
import type { LaminarColumns } from "../laminar/field-march";
import { LAYER_STATE } from "../laminar/laminar-march";
import type { WallConditions } from "../laminar/wall-conditions";
import { panelSlope, panelValue } from "../../numerics/piecewise-cubic";
import type { LayerColumns } from "../layer-columns";
import { giveValue, ROW_STATE } from "../layer-columns";
import type { OnsetCriterion, OnsetPlace } from "../onset/onset-criterion";

/** The end of the laminar layer, if the march found one. */
export interface LaminarEnd {
  kind: "end" | "separation" | "limit";
  x: number;
  momentumLoss: number;
}

/** A laminar march with what lies between its stations: θ² as a cubic a panel from the momentum equation's own slopes. */
export interface LaminarPart {
  wall: WallConditions;
  nu: number;
  march: LaminarColumns;
  end: LaminarEnd;
  /** dθ²∕dx at the stations reached [length]. */
  growth: Float64Array;
  /** Added to the distance from the first station so that it counts from the layer's start [length]. */
  head: number;
}

/** θ∕√(ν x∕ue) of a flat plate, Blasius 1908: turns a given θ into the run of plate behind it. */
const PLATE = 0.664;

/**
 * @param balance S − (2 + H) λ of a station, half the growth of θ² ue∕ν; omitted: from the march's own columns. Thwaites' S and H satisfy it only nearly,
 *   his growth of θ² is 0.45 − 6 λ by itself.
 */
export function laminarPart(wall: WallConditions, nu: number, march: LaminarColumns, end: LaminarEnd, balance?: (gradient: number) => number): LaminarPart {
  const { curve } = wall.edge;
  const n = march.reached;
  const growth = new Float64Array(n);
  for (let i = 0; i < n; i += 1) {
    if (march.frictionBlank[i] === 1) continue;
    const theta = march.momentumLoss[i];
    const ue = curve.value[i];
    const shear = (march.friction[i] * march.momentumReynolds[i]) / 2;
    const half = balance === undefined ? shear - (2 + march.shape[i]) * march.gradient[i] : balance(march.gradient[i]);
    const spread = wall.radius === null || wall.radius.value[i] === 0 ? 0 : (2 * theta * theta * wall.radius.slope[i]) / wall.radius.value[i];
    growth[i] = ((2 * nu) / ue) * half - spread;
  }
  // At a stagnation point or leading edge the equation reads 0∕0: the parabola through both stations with the second one's slope.
  if (n > 1 && march.frictionBlank[0] === 1) growth[0] = (2 * (march.momentumLoss[1] ** 2 - march.momentumLoss[0] ** 2)) / (curve.x[1] - curve.x[0]) - growth[1];
  const head = march.start === "given momentum loss" ? ((march.momentumLoss[0] / PLATE) ** 2 * curve.value[0]) / nu : 0;
  return { wall, nu, march, end, growth, head };
}

/** θ at a place in a panel whose first station the march has reached. */
export function laminarTheta(part: LaminarPart, panel: number, x: number): number {
  const { curve } = part.wall.edge;
  const { march, growth, end } = part;
  const x0 = curve.x[panel];
  const inside = panel + 1 < march.reached;
  const x1 = inside ? curve.x[panel + 1] : end.x;
  const s0 = march.momentumLoss[panel] ** 2;
  const s1 = inside ? march.momentumLoss[panel + 1] ** 2 : end.momentumLoss ** 2;
  const h = x1 - x0;
  if (!(h > 0)) return Math.sqrt(s0);
  const t = (x - x0) / h;
  const chord = (s1 - s0) / h;
  const g0 = growth[panel];
  const g1 = inside ? growth[panel + 1] : 2 * chord - g0;
  return Math.sqrt(Math.max(s0 + h * t * (g0 + t * (3 * chord - 2 * g0 - g1 + t * (g0 + g1 - 2 * chord))), 0));
}

/** What a criterion of onset is told at a place. */
export function onsetPlace(part: LaminarPart, panel: number, x: number, turbulence: number): OnsetPlace & { theta: number; speed: number } {
  const { curve } = part.wall.edge;
  const t = (x - curve.x[panel]) / (curve.x[panel + 1] - curve.x[panel]);
  const speed = panelValue(curve, panel, t);
  const theta = laminarTheta(part, panel, x);
  const { shape, reached } = part.march;
  const next = panel + 1 < reached ? shape[panel + 1] : shape[panel];
  return {
    theta,
    speed,
    distanceReynolds: (speed * (x - curve.x[0] + part.head)) / part.nu,
    momentumReynolds: (speed * theta) / part.nu,
    gradient: (theta * theta * panelSlope(curve, panel, t)) / part.nu,
    shape: shape[panel] + t * (next - shape[panel]),
    turbulence,
  };
}

/** Places looked at in a panel before the crossing is refined. */
const LOOKS = 2;

/** Where a criterion is first met, located inside the panel. */
export function findOnset(part: LaminarPart, criterion: Pick<OnsetCriterion, "excess">, turbulence: number): { panel: number; x: number } | null {
  const { x } = part.wall.edge.curve;
  const last = part.march.reached - 1;
  const beyond = part.end.kind === "end" ? last - 1 : last;
  const excess = (panel: number, at: number): number => criterion.excess(onsetPlace(part, panel, at, turbulence));
  for (let panel = 0; panel <= beyond && panel + 1 < x.length; panel += 1) {
    const to = panel + 1 <= last ? x[panel + 1] : part.end.x;
    let from = x[panel];
    let before = panel === 0 ? -1 : excess(panel, from);
    for (let k = 1; k <= LOOKS; k += 1) {
      const at = k === LOOKS ? to : x[panel] + ((to - x[panel]) * k) / LOOKS;
      const now = excess(panel, at);
      if (now >= 0 && before < 0) {
        if (panel === 0 && k === 1) from = x[0] + (at - x[0]) * 1e-6;
        const root = excess(panel, from) < 0 ? brentRoot((p) => excess(panel, p), from, at, 1e-12 * (x[x.length - 1] - x[0])) : null;
        return { panel, x: root !== null && root.ok ? root.x : from };
      }
      before = now;
      from = at;
    }
  }
  return null;
}

/** Copies the laminar stations up to and with row `last` into the table. */
export function writeLaminar(part: LaminarPart, last: number, columns: LayerColumns): void {
  const { march } = part;
  for (let i = 0; i <= last && i < march.reached; i += 1) {
    if (march.state[i] !== LAYER_STATE.attached) continue;
    columns.state[i] = ROW_STATE.laminar;
    giveValue(columns, "momentumLoss", i, march.momentumLoss[i]);
    giveValue(columns, "defect", i, march.defect[i]);
    giveValue(columns, "energyLoss", i, march.energyLoss[i]);
    giveValue(columns, "shape", i, march.shape[i]);
    if (march.frictionBlank[i] === 0) giveValue(columns, "friction", i, march.friction[i]);
    giveValue(columns, "momentumReynolds", i, march.momentumReynolds[i]);
    giveValue(columns, "gradient", i, march.gradient[i]);
    giveValue(columns, "massDefect", i, march.massDefect[i]);
    if (march.blowBlank[i] === 0) giveValue(columns, "blowVelocity", i, march.blowVelocity[i]);
    giveValue(columns, "intermittency", i, 0);
  }
}

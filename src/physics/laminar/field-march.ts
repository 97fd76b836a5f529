import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { FieldRecord, FieldStop } from "./field-record";
import type { FieldOptions } from "./field-run";
import { fieldRun } from "./field-run";
import type { LaminarMarch } from "./laminar-march";
import { LAYER_STATE } from "./laminar-march";
import type { WallConditions } from "./wall-conditions";

/** The columns of a laminar march, whatever its method and its reasons to stop. */
export type LaminarColumns = Omit<LaminarMarch, "stop" | "counts">;

/** A laminar layer by the full equations. */
export interface FieldMarch extends LaminarColumns {
  stop: FieldStop;
  /** Largest relative change of θ, δ* and δ3 that Richardson's extrapolation made; 0 without it. */
  correction: number;
  counts: { steps: number; rejected: number; turns: number; nodes: number };
}

/** A step halved leaves an eighth of an error of third order; the seventh part of the difference is what is left. */
const LEFT_OVER = 7;

/**
 * The laminar layer along a wall by the full boundary-layer equations (see field-run.ts), plane or on a round body, with flow through the wall.
 *
 * @param wall edge curve, radius and wall velocity
 * @param nu kinematic viscosity [length²/time], > 0
 * @param options.startMomentumLoss θ at the first station [length], ≥ 0: a similar layer of that θ and of H as `startShape` says (2.1554 … 4.0292)
 *   or as the gradient there asks
 * @param options.refinement cuts steps along and across the layer into so many, 1 (default) … 8
 * @param options.richardson marches a second time on halved steps along the wall and extrapolates
 * @returns the stations reached and why the march stopped: separation comes from the square-root law, not from a failure to converge
 *
 * Sources: see field-run.ts; L. F. Richardson, Phil. Trans. R. Soc. A 226 (1927) 299–361.
 */
export function fieldMarch(wall: WallConditions, nu: number, options: FieldOptions & { richardson?: boolean } = {}): Outcome<{ march: FieldMarch }> {
  const { refinement = 1 } = options;
  if (!(Number.isInteger(refinement) && refinement >= 1 && refinement <= MOST_REFINEMENT)) {
    return refuse("outside range", { argument: "grid refinement", values: { value: refinement, least: 1, most: MOST_REFINEMENT } });
  }
  const coarse = fieldRun(wall, nu, options);
  if (!coarse.ok) return coarse;
  const { run } = coarse;
  let { records, stop } = run;
  const { counts } = run;
  let correction = 0;
  if (options.richardson) {
    const fine = fieldRun(wall, nu, { ...options, plan: run.plan, split: 2 });
    if (!fine.ok) return fine;
    counts.steps += fine.run.counts.steps;
    counts.turns += fine.run.counts.turns;
    records = fine.run.records.map((record, i) => {
      const better = extrapolated(record, run.records[i]);
      if (record.momentumLoss > 0) correction = Math.max(correction, Math.abs(better.momentumLoss / record.momentumLoss - 1), Math.abs(better.defect / record.defect - 1));
      return better;
    });
    if (stop.kind === "separation" && fine.run.stop.kind === "separation") stop = { ...fine.run.stop, x: fine.run.stop.x + (fine.run.stop.x - stop.x) / LEFT_OVER };
  }
  const march = columns(wall, nu, records);
  for (let i = 0; i < march.reached; i += 1) {
    if (!(Number.isFinite(march.momentumLoss[i]) && Number.isFinite(march.massDefect[i]) && Number.isFinite(march.friction[i]) && Number.isFinite(march.blowVelocity[i]))) {
      return refuse("not finite", { argument: "ue", row: i + 1 });
    }
  }
  return { ok: true, march: { ...march, start: run.start.kind, stop, correction, counts } };
}

/** Finest grid offered: 8 × 8 times the work. */
const MOST_REFINEMENT = 8;

function extrapolated(fine: FieldRecord, coarse: FieldRecord): FieldRecord {
  const better = (key: "momentumLoss" | "defect" | "energyLoss" | "wallShear" | "blowVelocity"): number =>
    Number.isFinite(fine[key]) ? fine[key] + (fine[key] - coarse[key]) / LEFT_OVER : fine[key];
  const momentumLoss = better("momentumLoss");
  const defect = better("defect");
  const shape = momentumLoss > 0 ? defect / momentumLoss : fine.shape;
  return { ...fine, momentumLoss, defect, energyLoss: better("energyLoss"), wallShear: better("wallShear"), blowVelocity: better("blowVelocity"), shape };
}

/** The records as columns over all stations; those not reached stay 0. */
function columns(wall: WallConditions, nu: number, records: readonly FieldRecord[]): Omit<LaminarColumns, "start"> {
  const n = wall.edge.curve.x.length;
  const column = (of: (r: FieldRecord) => number): Float64Array => {
    const out = new Float64Array(n);
    for (let i = 0; i < records.length; i += 1) out[i] = of(records[i]);
    return out;
  };
  const flag = (of: (r: FieldRecord) => boolean): Uint8Array => Uint8Array.from({ length: n }, (_, i) => (i < records.length && of(records[i]) ? 1 : 0));
  const noFriction = (r: FieldRecord): boolean => !(r.speed > 0 && r.momentumLoss > 0);
  const noBlow = (r: FieldRecord): boolean => r.blowVelocity === Infinity;
  return {
    reached: records.length,
    state: Uint8Array.from({ length: n }, (_, i) => (i < records.length ? LAYER_STATE.attached : LAYER_STATE.notReached)),
    frictionBlank: flag(noFriction),
    blowBlank: flag(noBlow),
    edgeSpeed: wall.edge.curve.value.slice(),
    momentumLoss: column((r) => r.momentumLoss),
    defect: column((r) => r.defect),
    energyLoss: column((r) => r.energyLoss),
    shape: column((r) => r.shape),
    friction: column((r) => (noFriction(r) ? 0 : (2 * nu * r.wallShear) / (r.speed * r.speed))),
    momentumReynolds: column((r) => (r.speed * r.momentumLoss) / nu),
    gradient: column((r) => (r.momentumLoss * r.momentumLoss * r.speedSlope) / nu),
    massDefect: column((r) => r.speed * r.defect),
    blowVelocity: column((r) => (noBlow(r) ? 0 : r.blowVelocity)),
  };
}

import { backwardDifference, forecastWeights } from "../../numerics/backward-difference";
import type { Outcome } from "../../numerics/outcome";
import { refuse } from "../../numerics/outcome";
import type { FieldGrid, ProfileIntegrals } from "./field-grid";
import { fieldGrid, profileIntegrals, raiseGrid, STILL } from "./field-grid";
import type { FieldScale } from "./field-scale";
import { fieldScale } from "./field-scale";
import type { PastProfile } from "./field-past";
import { combine, emptyProfile, storedProfile } from "./field-past";
import type { FieldPath } from "./field-path";
import { fieldPath } from "./field-path";
import type { FieldRecord, FieldRun, StepPlan } from "./field-record";
import { rootLawSeparation } from "./field-separation";
import type { MarchStart, StartOptions } from "./field-start";
import { marchStart, startProfile } from "./field-start";
import type { FieldProfile, StepCoefficients, StepWork } from "./field-step";
import { solveStep, stepWork } from "./field-step";
import { FIRST_STRIDE, nextStride, strideError } from "./field-stride";
import type { WallConditions, WallPlace } from "./wall-conditions";
import { emptyPlace, wallPlace } from "./wall-conditions";

export interface FieldOptions extends StartOptions {
  /** Cuts steps along and across the layer into so many; whole, ≥ 1. */
  refinement?: number;
  /** Panel and fraction at which to keep the profile. */
  keep?: { panel: number; t: number };
  /** Steps of an earlier run, each cut into `split`; omitted: steps are chosen by their error. */
  plan?: readonly StepPlan[];
  split?: number;
}

/** Distance to separation, over the wall length marched, at which the square-root law takes over. */
const ROOT_LAW_REACH = 2e-5;
/** Wall shear number S below which a march that cannot go on is taken to separate. */
const NEARLY_SEPARATED = 0.03;
/** Length in which a given start settles, over θ² ue∕ν: a thousandth of the way in which the layer itself changes. */
const SETTLING = 1e-3;
/** Shortest step, over the wall length: separation is closer than that. */
const SHORTEST = 1e-9;
/** Share of the way to the next station from which a step covers it all. */
const NEARLY = 0.7;
/** Places that the differences along the wall span: third order. */
const PLACES = 4;

/**
 * Marches the laminar boundary-layer equations along a wall: two-point formula of fourth order across the layer with Newton's method and
 * block elimination as in Keller's box scheme, backward differences of third order along the wall. (Keller's own midpoint rule along the
 * wall leaves a ripple from a stagnation start undamped, which feigns errors to any step control.)
 *
 * @param wall edge curve, radius and wall velocity
 * @param nu kinematic viscosity [length²/time], > 0
 * @returns a record a station up to separation, lift-off or the end, and the steps taken
 *
 * Source: H. B. Keller & T. Cebeci, "Accurate numerical methods for boundary-layer flows. I. Two-dimensional laminar flows", Lecture Notes
 * in Physics 8 (1971) 92–100; S. Goldstein, Q. J. Mech. Appl. Math. 1 (1948) 43–69 (square-root law); W. Mangler, ZAMM 28 (1948) 97–103.
 */
export function fieldRun(wall: WallConditions, nu: number, options: FieldOptions = {}): Outcome<{ run: FieldRun }> {
  if (!(Number.isFinite(nu) && nu > 0)) return refuse("not positive", { argument: "nu", values: { value: nu } });
  const started = marchStart(wall, nu, options);
  if (!started.ok) return started;
  const scaled = fieldScale(wall, nu, started.start);
  if (!scaled.ok) return scaled;
  return new FieldMarcher(wall, nu, started.start, scaled.scale, options).run();
}

class FieldMarcher {
  private readonly grid: FieldGrid;
  private readonly work: StepWork;
  private readonly refinement: number;
  /** Variable along the wall up to which a given start is left to settle: its profile bends in no time where it does not fit the gradient. */
  private readonly settling: number;
  private readonly path: FieldPath;
  /** Profiles at the last places, newest first, with x and Δ²; and the step's combination, first guess and solution. */
  private past: PastProfile[] = [];
  private readonly carried: FieldProfile;
  private next: FieldProfile;
  private nextSquare = 0;
  private readonly coefficients: StepCoefficients = { a: 0, b: 0, rate: 0, wall: 0 };
  private readonly before: WallPlace = emptyPlace();
  private readonly place: WallPlace = emptyPlace();
  private readonly integrals: ProfileIntegrals = { defect: 0, momentumLoss: 0, energyLoss: 0 };
  private readonly slope = new Float64Array(PLACES);
  private readonly forecast = new Float64Array(PLACES);
  private readonly places = new Float64Array(PLACES);
  /** Places that the last differences used beyond the newest, and the slope of Δ² they gave. */
  private known = 0;
  private growth = 0;
  private history: FieldRecord[] = [];
  private readonly result: FieldRun;

  constructor(
    private readonly wall: WallConditions,
    private readonly nu: number,
    private readonly start: MarchStart,
    private readonly scale: FieldScale,
    private readonly options: FieldOptions,
  ) {
    this.refinement = options.refinement ?? 1;
    this.path = fieldPath(wall, start);
    const { value } = wall.edge.curve;
    this.settling = start.kind === "given momentum loss" ? Math.sqrt((SETTLING * start.square * value[0]) / nu) : 0;
    this.grid = fieldGrid(this.refinement);
    this.work = stepWork(this.grid.eta.length);
    this.carried = emptyProfile(this.grid);
    this.next = emptyProfile(this.grid);
    this.result = { start, stop: { kind: "end" }, records: [], plan: [], counts: { steps: 0, rejected: 0, turns: 0, nodes: 0 }, profiles: [] };
  }

  run(): Outcome<{ run: FieldRun }> {
    const { wall, result, start } = this;
    startProfile(start, this.scale.ratio, this.grid, this.next);
    wallPlace(wall, 0, 0, this.place);
    this.nextSquare = this.scale.square;
    const first = this.record();
    this.past = [{ x: first.x, along: 0, square: this.scale.square, defect: this.integrals.defect, profile: this.next }];
    this.next = emptyProfile(this.grid);
    this.history = [first];
    result.records.push(first);
    if (this.options.plan) this.followPlan(this.options.plan, this.options.split ?? 1);
    else this.chooseSteps();
    result.counts.nodes = this.grid.count;
    return { ok: true, run: result };
  }

  /** Steps chosen by their error, each ending at a station at the latest. */
  private chooseSteps(): void {
    const { wall, result } = this;
    const { x } = wall.edge.curve;
    const length = this.path.along(x[x.length - 1]);
    let stride = (FIRST_STRIDE * length) / this.refinement;
    for (let panel = 0; panel + 1 < x.length; panel += 1) {
      const end = this.path.along(x[panel + 1]);
      let t = 0;
      let at = this.path.along(x[panel]);
      while (t < 1) {
        const left = end - at;
        // A step a little longer than asked rather than a stub before the station; else two equal ones.
        const step = stride >= NEARLY * left ? left : stride > left / 2 ? left / 2 : stride;
        const to = step === left ? 1 : this.path.fraction(panel, at + step);
        const record = this.step(panel, t, to) ? this.record() : null;
        const error = record === null ? Infinity : at < this.settling ? 0 : strideError(this.history, record);
        const decision = nextStride(step, error, this.refinement);
        if (record === null || !decision.accept || !(record.shear > 0)) {
          result.counts.rejected += 1;
          stride = record !== null && !decision.accept ? decision.stride : step / 2;
          if (stride < SHORTEST * length) return this.halt();
          continue;
        }
        this.accept(record, { panel, from: t, to });
        stride = decision.stride;
        t = to;
        at = record.along;
        if (t === 1) result.records.push(record);
        if (this.separates(panel, t, record)) return;
      }
    }
  }

  /** True when separation is so close that no station lies before it, or it cannot be told from the place reached. */
  private separates(panel: number, t: number, record: FieldRecord): boolean {
    const { x } = this.wall.edge.curve;
    const ahead = rootLawSeparation(this.history);
    if (ahead === null || !(ahead.x > record.x) || ahead.x - record.x > ROOT_LAW_REACH * (ahead.x - x[0])) return false;
    const station = t === 1 ? x[panel + 2] : x[panel + 1];
    if (station === undefined || station < ahead.x) return false;
    this.result.stop = this.liftsOff() ? { kind: "lift-off", x: ahead.x } : { kind: "separation", x: ahead.x, reach: ahead.x - record.x };
    return true;
  }

  /** The steps of an earlier run, each cut into `split`. */
  private followPlan(plan: readonly StepPlan[], split: number): void {
    const { x } = this.wall.edge.curve;
    for (const { panel, from, to } of plan) {
      const begin = this.path.along(x[panel] + from * (x[panel + 1] - x[panel]));
      const end = this.path.along(x[panel] + to * (x[panel + 1] - x[panel]));
      for (let k = 0; k < split; k += 1) {
        const t0 = k === 0 ? from : this.path.fraction(panel, begin + ((end - begin) * k) / split);
        const t1 = k + 1 === split ? to : this.path.fraction(panel, begin + ((end - begin) * (k + 1)) / split);
        const record = this.step(panel, t0, t1) ? this.record() : null;
        if (record === null || !(record.shear > 0)) return this.halt();
        this.accept(record, { panel, from: t0, to: t1 });
        if (t1 === 1) this.result.records.push(record);
      }
    }
    // The plan ends short of the last station where the earlier run stopped.
    const last = plan[plan.length - 1];
    if (last && (last.to < 1 || last.panel + 2 < x.length)) this.halt();
  }

  /** Solves the profile at fraction `to` of a panel; false when Newton's method does not settle. */
  private step(panel: number, from: number, to: number): boolean {
    const { nu, place, before, coefficients, carried, next, grid, wall, past, slope, forecast, places } = this;
    wallPlace(wall, panel, from, before);
    wallPlace(wall, panel, to, place);
    const square = this.scale.next(past[0].square, panel, from, before, to, place);
    if (!(square > 0 && square < Infinity)) return false;
    this.nextSquare = square;
    const here = this.path.along(place.x);
    places[0] = place.x;
    const known = Math.min(past.length, PLACES - 1);
    for (let i = 0; i < known; i += 1) places[i + 1] = past[i].x;
    // Δ² is level or linear in x at the start, the profile a power series in the variable along the wall.
    backwardDifference(places, known + 1, slope);
    let growth = slope[0] * square;
    for (let i = 0; i < known; i += 1) growth += slope[i + 1] * past[i].square;
    if (this.path.rooted) {
      places[0] = here;
      for (let i = 0; i < known; i += 1) places[i + 1] = past[i].along;
      backwardDifference(places, known + 1, slope);
      for (let i = 0; i <= known; i += 1) slope[i] /= 2 * here;
    }
    this.known = known;
    this.growth = growth;
    const c = (place.speed * square) / nu;
    coefficients.b = (square * place.speedSlope) / nu;
    coefficients.a = coefficients.b + (c * place.radiusSlope) / place.radius + (place.speed * growth) / (2 * nu);
    coefficients.rate = c * slope[0];
    coefficients.wall = place.flow === 0 ? 0 : -place.flow / (place.radius * place.speed * Math.sqrt(square));
    const seen = Math.min(past.length, PLACES);
    for (let i = 0; i < seen; i += 1) places[i] = past[i].along;
    forecastWeights(places, seen, here, forecast);
    let { count } = grid;
    combine(past, known, slope, 1, -1 / slope[0], carried, 0, count);
    combine(past, seen, forecast, 0, 1, next, 0, count);
    for (;;) {
      const turns = solveStep(this.work, grid.eta, grid.count, carried, next, coefficients);
      this.result.counts.turns += Math.max(turns, 1);
      if (turns === 0) return false;
      if (Math.abs(next.v[grid.count - 1]) < STILL) return true;
      if (!raiseGrid(grid, [...past.map((p) => p.profile), next], this.refinement)) return false;
      combine(past, known, slope, 1, -1 / slope[0], carried, count, grid.count);
      count = grid.count;
    }
  }

  private accept(record: FieldRecord, plan: StepPlan): void {
    const { past } = this;
    const free = past.length === PLACES ? past.pop()!.profile : emptyProfile(this.grid);
    past.unshift({ x: record.x, along: record.along, square: this.nextSquare, defect: this.integrals.defect, profile: this.next });
    this.next = free;
    this.history = [...this.history.slice(1 - PLACES), record];
    this.result.plan.push(plan);
    this.result.counts.steps += 1;
    const { keep } = this.options;
    if (keep && keep.panel === plan.panel && keep.t === plan.to) this.result.profiles.push(storedProfile(this.grid, past[0], record));
  }

  /** The record at `place` of the profile in `next`. */
  private record(): FieldRecord {
    const scale = Math.sqrt(this.nextSquare);
    const { place, integrals, next } = this;
    profileIntegrals(this.grid, next, integrals);
    return {
      x: place.x,
      along: this.path.along(place.x),
      speed: place.speed,
      speedSlope: place.speedSlope,
      momentumLoss: scale * integrals.momentumLoss,
      defect: scale * integrals.defect,
      energyLoss: scale * integrals.energyLoss,
      wallShear: scale > 0 ? (place.speed * next.v[0]) / scale : 0,
      blowVelocity: this.blowVelocity(scale),
      shear: next.v[0] * integrals.momentumLoss,
      shape: integrals.defect / integrals.momentumLoss,
    };
  }

  /** Growth of m = ue Δ (δ*∕Δ): both factors behind ue are smooth along the wall where m itself is not (√x behind a leading edge). */
  private blowVelocity(scale: number): number {
    const { place, integrals, past, slope, wall } = this;
    const { defect } = integrals;
    if (past.length === 0) {
      if (place.speed > 0) return scale > 0 ? place.speedSlope * scale * defect + place.speed * this.startGrowth(scale) : Infinity;
      return place.speedSlope * scale * defect * (wall.radius !== null && place.radius === 0 ? 2 : 1);
    }
    let rate = slope[0] * defect;
    for (let i = 0; i < this.known; i += 1) rate += slope[i + 1] * past[i].defect;
    const spread = place.speedSlope + (place.speed * place.radiusSlope) / place.radius;
    return spread * scale * defect + place.speed * (scale * rate + (defect * this.growth) / (2 * scale));
  }

  /** dδ*∕dx at a given start, the similar layer's: H dθ∕dx (on a round body with the radius' share). */
  private startGrowth(scale: number): number {
    const { start, place } = this;
    return (start.layer.shape * start.growth) / (2 * scale) + (start.layer.shape * scale * place.radiusSlope) / place.radius;
  }

  /** No step can be made from here: separation, lift-off, or a limit. */
  private halt(): void {
    const { result } = this;
    const last = this.history[this.history.length - 1];
    const ahead = rootLawSeparation(this.history);
    if (last.shear < NEARLY_SEPARATED && ahead !== null) {
      result.stop = this.liftsOff() ? { kind: "lift-off", x: last.x } : { kind: "separation", x: ahead.x, reach: ahead.x - last.x };
    } else result.stop = { kind: "limit", x: last.x };
  }

  /** Blowing into an edge speed that does not fall. */
  private liftsOff(): boolean {
    return this.place.wallVelocity > 0 && this.place.speedSlope >= 0;
  }
}

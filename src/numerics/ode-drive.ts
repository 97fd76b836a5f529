import { brentRoot } from "./brent-root";
import type { OdeRight } from "./ode-step";
import { odeStep, odeWork } from "./ode-step";
import { odeStepExplicit } from "./ode-step-explicit";

/** A driver that carries a state along x with error control; it remembers the step from one call to the next. */
export interface OdeDrive {
  x: number;
  readonly y: Float64Array;
  readonly counts: { steps: number; rejected: number; largestError: number };
  /** Marches to a place: "there"; "event" where the event function falls to 0 on the way; "stuck" where no step can be made. */
  to(end: number): "there" | "event" | "stuck";
}

export interface OdeSettings {
  /** Error allowed a step, relative to the unknown's size; and added to it, in the unknown's own unit. */
  relative: number;
  absolute: Float64Array;
  firstStep: number;
  /** Shortest step; below it the driver is stuck. */
  leastStep: number;
  /** "settling" (default): the stable step for unknowns that settle much faster than x changes; "plain": the explicit one. */
  kind?: "settling" | "plain";
  /** Above 0 while the march may go on; its first zero is located inside the step. */
  event?: (x: number, y: Float64Array) => number;
}

const SAFETY = 0.9;
const SHRINK_MOST = 0.2;
const GROW_MOST = 4;
/** Steps tried on the way to one place: far more than a smooth march takes, so that a hostile column ends too. */
const MOST_TRIES = 20_000;
/** Share of a step to which an event is located. */
const EVENT_TOLERANCE = 1e-12;

export function odeDrive(right: OdeRight, x: number, y: Float64Array, settings: OdeSettings): OdeDrive {
  const n = y.length;
  const work = odeWork(n);
  const state = y.slice();
  const slope = new Float64Array(n);
  const next = new Float64Array(n);
  const error = new Float64Array(n);
  const counts = { steps: 0, rejected: 0, largestError: 0 };
  const fresh = right(x, state, slope);
  let wanted = settings.firstStep;
  const { event } = settings;
  const plain = settings.kind === "plain";
  const step = plain ? odeStepExplicit : odeStep;
  // The estimate is of the order below the step's: its error grows with the power 5 (4) of the step.
  const power = plain ? -0.2 : -0.25;

  const drive: OdeDrive = { x, y: state, counts, to };
  return drive;

  function to(end: number): "there" | "event" | "stuck" {
    if (!fresh) return "stuck";
    for (let tries = 0; drive.x < end; tries += 1) {
      if (tries > MOST_TRIES) return "stuck";
      const left = end - drive.x;
      const h = wanted >= left ? left : wanted > left / 2 ? left / 2 : wanted;
      const solved = step(right, drive.x, state, h, slope, work, next, error);
      const size = solved ? errorSize() : Infinity;
      if (!(size <= 1)) {
        counts.rejected += 1;
        wanted = h * (size < Infinity ? Math.max(SHRINK_MOST, SAFETY * size ** power) : 0.25);
        if (wanted < settings.leastStep) return "stuck";
        continue;
      }
      if (event && !(event(drive.x + h, next) > 0)) {
        locate(event, h);
        return "event";
      }
      counts.steps += 1;
      counts.largestError = Math.max(counts.largestError, size * settings.relative);
      copy(next, state);
      drive.x = h === left ? end : drive.x + h;
      if (plain) copy(work.slope, slope);
      else if (!right(drive.x, state, slope)) return "stuck";
      const grown = h * Math.min(GROW_MOST, size > 0 ? SAFETY * size ** power : GROW_MOST);
      // A step cut short by its end says nothing against the longer one wanted.
      wanted = h < wanted ? Math.max(grown, wanted) : grown;
    }
    return "there";
  }

  function errorSize(): number {
    let size = 0;
    for (let i = 0; i < n; i += 1) {
      const allowed = settings.relative * Math.max(Math.abs(state[i]), Math.abs(next[i])) + settings.absolute[i];
      size = Math.max(size, Math.abs(error[i]) / allowed);
    }
    return Number.isFinite(size) ? size : Infinity;
  }

  /** Shortens the step until the event function is 0 at its end. */
  function locate(watch: (x: number, y: Float64Array) => number, h: number): void {
    const from = drive.x;
    const start = state.slice();
    const root = brentRoot(
      (share) => {
        if (share === 0) return watch(from, start);
        if (!step(right, from, start, share * h, slope, work, next, error)) return -1;
        return watch(from + share * h, next);
      },
      0,
      1,
      EVENT_TOLERANCE,
    );
    const share = root.ok ? root.x : 0;
    if (share > 0 && step(right, from, start, share * h, slope, work, next, error)) state.set(next);
    drive.x = from + share * h;
  }
}

/** For a handful of numbers a loop is several times as fast as TypedArray.set. */
function copy(from: Float64Array, to: Float64Array): void {
  for (let i = 0; i < to.length; i += 1) to[i] = from[i];
}

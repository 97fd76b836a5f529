import { forecastWeights } from "../../numerics/backward-difference";
import type { FieldRecord } from "./field-record";

/** Largest miss of the cubic forecast of S and of H, relative; the step's own error is about a quarter of it. */
const FORECAST_MISS = 4e-6;
/** Added to S so that its miss stays finite at separation: a tenth of the flat plate's. */
const LEAST_SHEAR = 0.02;
/** Records that a forecast needs. */
const KNOWN = 4;
/** A step is repeated when its miss is this many times too large. */
const REPEAT = 4;
const SHRINK_MOST = 0.3;
/** Backward differences of third order stay stable while steps grow by less than 1.53 (Calvo, Grande & Grigorieff 1990; from memory). */
const GROW_MOST = 1.5;
const SAFETY = 0.9;
/** First step over the wall length, taken with differences of first order. */
export const FIRST_STRIDE = 1e-3;

const places = new Float64Array(KNOWN);
const weights = new Float64Array(KNOWN);

/** Miss of the forecast from the last four records, 0 while there are fewer. */
export function strideError(history: readonly FieldRecord[], record: FieldRecord): number {
  const n = history.length;
  if (n < KNOWN) return 0;
  for (let i = 0; i < KNOWN; i += 1) places[i] = history[n - 1 - i].along;
  forecastWeights(places, KNOWN, record.along, weights);
  let shear = 0;
  let shape = 0;
  for (let i = 0; i < KNOWN; i += 1) {
    shear += weights[i] * history[n - 1 - i].shear;
    shape += weights[i] * history[n - 1 - i].shape;
  }
  const miss = Math.max(Math.abs(record.shear - shear) / (record.shear + LEAST_SHEAR), Math.abs(record.shape / shape - 1));
  return Number.isFinite(miss) ? miss : Infinity;
}

/** Whether to keep a step, and how long the next may be. */
export function nextStride(step: number, miss: number, refinement: number): { accept: boolean; stride: number } {
  const allowed = FORECAST_MISS / refinement ** 4;
  const factor = miss > 0 ? SAFETY * Math.sqrt(Math.sqrt(allowed / miss)) : GROW_MOST;
  return { accept: miss <= REPEAT * allowed, stride: step * Math.min(GROW_MOST, Math.max(SHRINK_MOST, factor)) };
}

import { scaleLinear, scaleLog } from "d3-scale";
import type { AxisScale } from "./chart";
import { logTickWords, tickWords } from "./number-words";

/** A divided axis: where a value lies in pixels, and the marks with their words. */
export interface AxisFrame {
  readonly from: number;
  readonly to: number;
  readonly scale: AxisScale;
  /** Pixel of a value. */
  readonly at: (value: number) => number;
  readonly ticks: readonly { readonly value: number; readonly words: string }[];
}

/** A range that reaches nearer to zero than this share of its greatest value is drawn from zero. */
const FROM_ZERO_BELOW = 0.35;
/** Room left around values that are all the same. */
const FLAT_ROOM = 0.1;
/** Values that differ by less than this share of their size are the same to the eye, and to the arithmetic of the marks. */
const FLAT_BELOW = 1e-9;
/** Beyond this size, and below its inverse, the arithmetic of an axis overflows; no quantity of a wall layer comes near. */
const GREATEST = 1e200;
/** A log axis over less than this factor has linear marks. */
const SHORT_FACTOR = 6;

/**
 * Divides an axis for the values it must show (blanks and, on a log axis, values that are not above zero are left out). `pixels` are
 * the places of its ends, `count` about how many marks there is room for; `tight` keeps the ends at the values instead of round numbers.
 */
export function axisFrame(values: readonly (number | null)[], scale: AxisScale, pixels: readonly [number, number], count: number, tight = false): AxisFrame {
  const shown = values.filter((v): v is number => canBeShown(v, scale));
  const least = shown.reduce((a, b) => Math.min(a, b), Infinity);
  const greatest = shown.reduce((a, b) => Math.max(a, b), -Infinity);
  return scale === "log" ? logFrame(least, greatest, pixels, count, tight) : linearFrame(least, greatest, pixels, count, tight);
}

/** True for a number that the axis has a place for: finite, not beyond 1e200 in size, and on a log axis above zero (1e-200). */
export function canBeShown(value: number | null | undefined, scale: AxisScale): value is number {
  return value !== null && value !== undefined && Math.abs(value) <= GREATEST && (scale === "linear" || value >= 1 / GREATEST);
}

function linearFrame(least: number, greatest: number, pixels: readonly [number, number], count: number, tight: boolean): AxisFrame {
  let [from, to] = least <= greatest ? [least, greatest] : [0, 1];
  const size = Math.max(Math.abs(from), Math.abs(to));
  if (size < 1 / GREATEST) [from, to] = [-1, 1];
  else if (to - from <= FLAT_BELOW * size) {
    const room = size * FLAT_ROOM;
    [from, to] = [from - room, to + room];
  } else if (!tight && from > 0 && from < FROM_ZERO_BELOW * to) from = 0;
  else if (!tight && to < 0 && to > FROM_ZERO_BELOW * from) to = 0;
  const frame = scaleLinear().domain([from, to]).range(pixels);
  if (!tight) frame.nice(count);
  const ticks = frame.ticks(count);
  const words = tickWords(ticks, ticks.length > 1 ? (ticks.at(-1)! - ticks[0]!) / (ticks.length - 1) : Math.abs(ticks[0] ?? 1));
  const [first, last] = frame.domain() as [number, number];
  return { from: first, to: last, scale: "linear", at: frame, ticks: ticks.map((value, i) => ({ value, words: words[i]! })) };
}

function logFrame(least: number, greatest: number, pixels: readonly [number, number], count: number, tight: boolean): AxisFrame {
  let [from, to] = least <= greatest ? [least, greatest] : [1, 10];
  if (to - from <= FLAT_BELOW * to) [from, to] = [from / 2, to * 2];
  if (!tight) {
    // To the next 1, 2 or 5 times a power of ten; within one short factor to round numbers.
    if (to / from < SHORT_FACTOR) {
      const round = scaleLinear().domain([from, to]).nice(count).domain() as [number, number];
      [from, to] = [round[0] > 0 ? round[0] : from, round[1]];
    } else [from, to] = [steps125(from / 10, from).at(-1)!, steps125(to, to * 10)[0]!];
  }
  const frame = scaleLog().domain([from, to]).range(pixels);
  const ticks = logTicks(from, to, count);
  const words = logTickWords(ticks);
  return { from, to, scale: "log", at: frame, ticks: ticks.map((value, i) => ({ value, words: words[i]! })) };
}

function logTicks(from: number, to: number, count: number): number[] {
  if (to / from < SHORT_FACTOR) {
    return scaleLinear().domain([from, to]).ticks(count).filter((v) => v > 0).map(clean);
  }
  const fine = steps125(from, to);
  if (fine.length <= count + 1) return fine;
  const decades = fine.filter((v) => isDecade(v));
  const every = Math.ceil(decades.length / Math.max(2, count));
  return decades.filter((v) => Math.round(Math.log10(v)) % every === 0);
}

/** 1, 2 and 5 times powers of ten inside [from, to]. */
function steps125(from: number, to: number): number[] {
  const out: number[] = [];
  for (let e = Math.floor(Math.log10(from)) - 1; e <= Math.ceil(Math.log10(to)); e++) {
    for (const m of [1, 2, 5]) {
      const v = Number(`${m}e${e}`);
      if (v >= from * (1 - 1e-12) && v <= to * (1 + 1e-12)) out.push(v);
    }
  }
  return out;
}

function isDecade(value: number): boolean {
  return value.toExponential(6).startsWith("1.000000e");
}

/** Takes off the last-digit dust of repeated addition. */
function clean(value: number): number {
  return Number(value.toPrecision(12));
}

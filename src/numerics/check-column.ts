import type { Refusal } from "./outcome";
import { refuse } from "./outcome";

/**
 * Looks for the first thing that makes a pair of columns unfit for a curve: lengths that differ, too few points, a value that is
 * not finite, or stations that do not rise strictly. Gives null when all is well.
 *
 * @param names what the caller calls the two columns, for the refusal
 */
export function checkColumns(
  x: Float64Array,
  v: Float64Array,
  least: number,
  names: readonly [string, string] = ["x", "v"],
): Refusal | null {
  if (v.length !== x.length) {
    return refuse("lengths differ", { argument: names[1], values: { count: v.length, expected: x.length } });
  }
  if (x.length < least) return refuse("too few points", { argument: names[0], values: { count: x.length, least } });
  return checkRising(x, names[0]) ?? checkFinite(v, names[1]);
}

/** The first entry that is not finite, as a refusal; null when there is none. */
export function checkFinite(v: Float64Array, argument: string): Refusal | null {
  for (let i = 0; i < v.length; i += 1) {
    if (!Number.isFinite(v[i])) return refuse("not finite", { argument, row: i + 1 });
  }
  return null;
}

/** The first entry that is not finite or not above the one before it, as a refusal; null when the column rises strictly. */
export function checkRising(x: Float64Array, argument: string): Refusal | null {
  for (let i = 0; i < x.length; i += 1) {
    if (!Number.isFinite(x[i])) return refuse("not finite", { argument, row: i + 1 });
    if (i > 0 && !(x[i] > x[i - 1])) return refuse("not rising", { argument, row: i + 1, at: x[i], values: { before: x[i - 1], value: x[i] } });
  }
  return null;
}

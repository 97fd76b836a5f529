/** Hidden function around an array formula of the old kind, which fills the block it was given and no other cell. */
import type { EngineLibrary, EngineMatrix, EngineValue } from "../types";
import { define, numberOf } from "./define";

export const FIXED_BLOCK = "FIXED.BLOCK";
const BEYOND: EngineValue = { value: "#N/A", message: "The result of the array formula does not reach as far as its block." };

/** A single row or column is repeated, a larger result cut, and what it does not reach is #N/A (ECMA-376 Part 1, 18.17.2.7, array formulas; from memory). */
export function installFixedBlock(library: EngineLibrary): void {
  define(library, FIXED_BLOCK, "", ["value (any, range)", "rows (number)", "columns (number)"], (value, rows, columns) => {
    const result: EngineMatrix = Array.isArray(value) ? value : [[value ?? { value: null }]];
    const [width, height] = [result.length, result[0]?.length ?? 0];
    const at = (column: number, row: number): EngineValue => result[width === 1 ? 0 : column]?.[height === 1 ? 0 : row] ?? BEYOND;
    const [right, bottom] = [numberOf(columns), numberOf(rows)];
    if (right === 1 && bottom === 1) return at(0, 0);
    return Array.from({ length: right }, (_, c) => Array.from({ length: bottom }, (__, r) => at(c, r)));
  }, true);
}

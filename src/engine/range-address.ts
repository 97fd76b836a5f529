/**
 * Seam: where an argument came from. Relies on the engine (19.3.7) attaching `position` to every cell it hands to a formula
 * (`CompilationParametersBuilder.refFn` and `.range`). How it would break: positions vanish and addresses become undefined.
 */
import type { EngineArgument, EngineGetters } from "./types";

const PLAIN_SHEET_NAME = /^[\p{L}_][\p{L}\p{N}_.]*$/u;
const LOOKS_LIKE_A_CELL = /^(?:[A-Z]{1,3}[0-9]{1,7}|R[0-9]*C[0-9]*|R|C)$/i;

/** `'My sheet'!A2:A9` when every value of the argument still stands in one block of cells, in order; otherwise undefined. */
export function rangeAddress(argument: EngineArgument, getters: EngineGetters): string | undefined {
  if (argument === undefined) return undefined;
  const matrix = Array.isArray(argument) ? argument : [[argument]];
  const first = matrix[0]?.[0]?.position;
  if (!first) return undefined;
  const { sheetId, col, row } = first;
  const rows = matrix[0]!.length;
  for (let c = 0; c < matrix.length; c++) {
    const column = matrix[c]!;
    for (let r = 0; r < rows; r++) {
      const position = column[r]?.position;
      if (position?.col !== col + c || position.row !== row + r || position.sheetId !== sheetId) return undefined;
    }
  }
  const start = columnLetters(col) + (row + 1);
  const end = columnLetters(col + matrix.length - 1) + (row + rows);
  return `${quotedSheetName(getters.getSheetName(sheetId))}!${start === end ? start : `${start}:${end}`}`;
}

/** A sheet's name as it stands before `!` in a formula. */
export function quotedSheetName(name: string): string {
  return PLAIN_SHEET_NAME.test(name) && !LOOKS_LIKE_A_CELL.test(name) ? name : `'${name.replace(/'/g, "''")}'`;
}

/** 0 → A, 25 → Z, 26 → AA. */
export function columnLetters(column: number): string {
  let letters = "";
  for (let n = column + 1; n > 0; n = Math.floor((n - 1) / 26)) letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  return letters;
}

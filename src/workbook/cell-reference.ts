import { WorkbookError } from "./workbook-error";

/** Rows and columns of a sheet (ECMA-376 names none; every program of the trade keeps to these). */
const MOST_ROWS = 1_048_576;
const MOST_COLUMNS = 16_384;

/** A cell, column and row counted from 1. */
export interface CellPlace {
  column: number;
  row: number;
}

/** A block of cells, bounds inside, counted from 1. */
export interface CellBox {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** `$B$12` → column 2, row 12. */
export function cellPlace(reference: string): CellPlace {
  const m = /^\$?([A-Z]{1,3})\$?([0-9]{1,7})$/i.exec(reference);
  const place = m && { column: columnNumber(m[1]!), row: Number(m[2]) };
  if (!place || place.column > MOST_COLUMNS || place.row < 1 || place.row > MOST_ROWS) throw new WorkbookError(`The file is damaged: "${reference.slice(0, 30)}" stands in it as the address of a cell.`);
  return place;
}

/** `A1:C4` or `B2` → its block. */
export function cellBox(reference: string): CellBox {
  const [first, last = first] = reference.split(":").map(cellPlace);
  return {
    left: Math.min(first!.column, last!.column),
    top: Math.min(first!.row, last!.row),
    right: Math.max(first!.column, last!.column),
    bottom: Math.max(first!.row, last!.row),
  };
}

/** Column 2, row 12 → `B12`. */
export function cellName(column: number, row: number): string {
  return columnLetters(column) + row;
}

/** The block's reference: one cell as `B2`, more as `B2:C4`. */
export function boxName(box: CellBox): string {
  const first = cellName(box.left, box.top);
  return box.left === box.right && box.top === box.bottom ? first : `${first}:${cellName(box.right, box.bottom)}`;
}

/** Number of cells in a block. */
export function boxSize(box: CellBox): number {
  return (box.right - box.left + 1) * (box.bottom - box.top + 1);
}

/** 1 → A, 27 → AA. */
export function columnLetters(column: number): string {
  let letters = "";
  for (let n = column; n > 0; n = Math.floor((n - 1) / 26)) letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  return letters;
}

function columnNumber(letters: string): number {
  let number = 0;
  for (const letter of letters.toUpperCase()) number = number * 26 + letter.charCodeAt(0) - 64;
  return number;
}

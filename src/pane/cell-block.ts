/** A rectangle of cells on one sheet; columns and rows count from 0, all bounds are inside. */
export interface CellBlock {
  readonly sheet: string;
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

const PLAIN_SHEET_NAME = /^[\p{L}_][\p{L}\p{N}_.]*$/u;
const LOOKS_LIKE_A_CELL = /^(?:[A-Z]{1,3}[0-9]{1,7}|R[0-9]*C[0-9]*|R|C)$/i;
const A1_BLOCK = /^\$?([A-Z]{1,3})\$?([1-9][0-9]{0,6})(?::\$?([A-Z]{1,3})\$?([1-9][0-9]{0,6}))?$/i;

/** The block as a formula on `onSheet` names it: `A2:B9`, or `'My sheet'!A2` from another sheet. */
export function blockAddress(block: CellBlock, onSheet?: string): string {
  const first = columnLetters(block.left) + (block.top + 1);
  const last = columnLetters(block.right) + (block.bottom + 1);
  const cells = first === last ? first : `${first}:${last}`;
  if (block.sheet === onSheet) return cells;
  const name = PLAIN_SHEET_NAME.test(block.sheet) && !LOOKS_LIKE_A_CELL.test(block.sheet) ? block.sheet : `'${block.sheet.replace(/'/g, "''")}'`;
  return `${name}!${cells}`;
}

/** Reads `A2`, `$A$2:$B$9`, `Sheet1!A2`, `'My sheet'!A2:B9`; without a sheet the block stands on `onSheet`. Undefined if it is none of these. */
export function readAddress(written: string, onSheet: string): CellBlock | undefined {
  const text = written.trim();
  const mark = text.lastIndexOf("!");
  const match = A1_BLOCK.exec(text.slice(mark + 1));
  if (!match) return undefined;
  const named = text.slice(0, Math.max(mark, 0));
  const sheet = mark < 0 ? onSheet : /^'.*'$/s.test(named) ? named.slice(1, -1).replace(/''/g, "'") : named;
  if (sheet === "") return undefined;
  const columns = [columnNumber(match[1]!), columnNumber(match[3] ?? match[1]!)];
  const rows = [Number(match[2]) - 1, Number(match[4] ?? match[2]) - 1];
  return { sheet, left: Math.min(...columns), right: Math.max(...columns), top: Math.min(...rows), bottom: Math.max(...rows) };
}

/** 0 → A, 25 → Z, 26 → AA. */
export function columnLetters(column: number): string {
  let letters = "";
  for (let n = column + 1; n > 0; n = Math.floor((n - 1) / 26)) letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  return letters;
}

function columnNumber(letters: string): number {
  let number = 0;
  for (const letter of letters.toUpperCase()) number = number * 26 + letter.charCodeAt(0) - 64;
  return number - 1;
}

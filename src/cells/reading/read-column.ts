import { cellError } from "../errors/cell-error";
import { addressOf, type Call } from "./call";
import { cellRows, cellValue, describeCell } from "./cell-value";

/** What a column must be. */
export interface ColumnRules {
  /** Exactly this many entries; further cells must be blank (or the 0 that some hosts send for a blank). */
  length?: number;
  /** At least this many entries. Default 1. */
  least?: number;
  /** Each entry above the one before. */
  rising?: boolean;
  /** Every entry above 0. */
  positive?: boolean;
  /** Every entry 0 or more. */
  notNegative?: boolean;
}

/**
 * Reads a column or a row of numbers. Trailing blanks are dropped; a blank, text, TRUE/FALSE, error or non-finite
 * number inside is refused with its row, counted from the first cell of the range, and its address where known.
 */
export function readColumn(call: Call, argument: string, raw: unknown, rules: ColumnRules = {}): Float64Array {
  const line = lineOf(call, argument, raw);
  const count = rules.length === undefined ? filledCount(line, rules.rising === true) : lengthChecked(call, argument, line, rules.length);
  const least = rules.least ?? 1;
  if (count < least) {
    throw cellError("#VALUE!", `${call.name} needs at least ${least} ${least === 1 ? "number" : "numbers"} in ${argument}; ${count} given`);
  }
  const values = new Float64Array(count);
  for (let i = 0; i < count; i++) {
    const raw = line[i];
    values[i] = typeof raw === "number" && Number.isFinite(raw) ? raw : numberOrRefuse(call, argument, raw, i);
  }
  checkRules(call, argument, values, rules);
  return values;
}

/** The same for an argument that may be omitted: undefined when it is missing or all blank. */
export function readOptionalColumn(call: Call, argument: string, raw: unknown, rules: ColumnRules = {}): Float64Array | undefined {
  const rows = cellRows(raw);
  if (rows === undefined || rows.every((row) => row.every((cell) => cellValue(cell).kind === "blank"))) return undefined;
  return readColumn(call, argument, raw, rules);
}

function lineOf(call: Call, argument: string, raw: unknown): readonly unknown[] {
  const rows = cellRows(raw);
  if (rows === undefined) throw cellError("#VALUE!", `${call.name} needs ${argument}; it is missing`);
  if (rows.length === 1) return rows[0]!;
  const width = rows[0]!.length;
  if (width !== 1 || rows.some((row) => row.length !== 1)) {
    throw cellError("#VALUE!", `${call.name} needs ${argument} as one column or one row; the range is ${rows.length} rows by ${width} columns`);
  }
  const line = new Array<unknown>(rows.length);
  for (let i = 0; i < rows.length; i++) line[i] = rows[i]![0];
  return line;
}

/** Entries before the trailing blanks. In a rising column a trailing 0 that does not rise is a blank cell too. */
function filledCount(line: readonly unknown[], rising: boolean): number {
  let count = line.length;
  while (count > 0) {
    const last = line[count - 1];
    const blank = cellValue(last).kind === "blank";
    const before = count > 1 ? line[count - 2] : undefined;
    const unrisen = rising && last === 0 && (before === null || before === "" || (typeof before === "number" && before >= 0));
    if (!blank && !unrisen) break;
    count--;
  }
  return count;
}

function lengthChecked(call: Call, argument: string, line: readonly unknown[], length: number): number {
  for (let i = length; i < line.length; i++) {
    if (line[i] === 0 || cellValue(line[i]).kind === "blank") continue;
    const more = filledCount(line, false);
    throw cellError("#VALUE!", `${call.name} needs columns of equal length; ${argument} has ${more} rows where ${length} are expected`);
  }
  const given = Math.min(line.length, filledCount(line, false));
  if (given < length && given === line.length) {
    throw cellError("#VALUE!", `${call.name} needs columns of equal length; ${argument} has ${given} rows where ${length} are expected`);
  }
  return length;
}

function numberOrRefuse(call: Call, argument: string, raw: unknown, entry: number): number {
  const cell = cellValue(raw);
  if (cell.kind === "number" && Number.isFinite(cell.value)) return cell.value;
  const advice = entry === 0 && cell.kind === "text" ? "; begin the range below its heading" : "";
  throw cellError("#VALUE!", `${call.name} needs numbers in ${argument}; ${rowWords(call, argument, entry)} ${describeCell(cell)}${advice}`);
}

function checkRules(call: Call, argument: string, values: Float64Array, rules: ColumnRules): void {
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    if (rules.positive && !(value > 0)) fail(`${argument} above 0`, i, `has ${value}${value === 0 ? " or is blank" : ""}`);
    if (rules.notNegative && value < 0) fail(`${argument} of 0 or more`, i, `has ${value}`);
    if (rules.rising && i > 0 && !(value > values[i - 1]!)) {
      fail(`rising ${argument}`, i, value === values[i - 1] ? `repeats ${value}` : `falls to ${value} after ${values[i - 1]}`);
    }
  }

  function fail(need: string, entry: number, found: string): never {
    throw cellError("#VALUE!", `${call.name} needs ${need}; ${rowWords(call, argument, entry)} ${found}`);
  }
}

function rowWords(call: Call, argument: string, entry: number): string {
  const address = addressOf(call, argument, entry);
  return `row ${entry + 1}${address === undefined ? "" : ` (${address})`}`;
}

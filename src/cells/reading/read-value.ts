import { cellError } from "../errors/cell-error";
import type { Call } from "./call";
import { cellRows, cellValue, describeCell, type CellValue } from "./cell-value";

/** What a single number must be. */
export interface NumberRules {
  positive?: boolean;
  notNegative?: boolean;
  least?: number;
  most?: number;
}

/** Reads one number. */
export function readNumber(call: Call, argument: string, raw: unknown, rules: NumberRules = {}): number {
  const value = readOptionalNumber(call, argument, raw, rules);
  if (value === undefined) throw cellError("#VALUE!", `${call.name} needs ${argument}; it is missing or blank`);
  return value;
}

/** Reads one number that may be omitted or blank. */
export function readOptionalNumber(call: Call, argument: string, raw: unknown, rules: NumberRules = {}): number | undefined {
  const cell = single(call, argument, raw);
  if (cell.kind === "blank") return undefined;
  if (cell.kind !== "number" || !Number.isFinite(cell.value)) {
    throw cellError("#VALUE!", `${call.name} needs a number for ${argument}; it ${describeCell(cell)}`);
  }
  const { value } = cell;
  if (rules.positive && !(value > 0)) fail(`${argument} above 0`);
  if (rules.notNegative && value < 0) fail(`${argument} of 0 or more`);
  if (rules.least !== undefined && value < rules.least) fail(`${argument} of at least ${rules.least}`);
  if (rules.most !== undefined && value > rules.most) fail(`${argument} of at most ${rules.most}`);
  return value;

  function fail(need: string): never {
    throw cellError("#VALUE!", `${call.name} needs ${need}; it has ${value}`);
  }
}

/** Reads a word or sentence that may be omitted or blank. */
export function readOptionalText(call: Call, argument: string, raw: unknown): string | undefined {
  const cell = single(call, argument, raw);
  if (cell.kind === "blank") return undefined;
  if (cell.kind !== "text") throw cellError("#VALUE!", `${call.name} needs text for ${argument}; it ${describeCell(cell)}`);
  return cell.value.trim();
}

/** Reads TRUE or FALSE (also 1 or 0) that may be omitted or blank. */
export function readOptionalFlag(call: Call, argument: string, raw: unknown): boolean | undefined {
  const cell = single(call, argument, raw);
  if (cell.kind === "blank") return undefined;
  if (cell.kind === "flag") return cell.value;
  if (cell.kind === "number" && (cell.value === 0 || cell.value === 1)) return cell.value === 1;
  throw cellError("#VALUE!", `${call.name} needs TRUE or FALSE for ${argument}; it ${describeCell(cell)}`);
}

/** The kind of a single cell, for arguments that take a number or a word. */
export function single(call: Call, argument: string, raw: unknown): CellValue {
  const rows = cellRows(raw);
  if (rows === undefined) return { kind: "blank" };
  if (rows.length !== 1 || rows[0]!.length !== 1) {
    throw cellError("#VALUE!", `${call.name} needs one cell for ${argument}; the range is ${rows.length} rows by ${rows[0]!.length} columns`);
  }
  return cellValue(rows[0]![0]);
}

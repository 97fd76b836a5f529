import { cellError } from "../errors/cell-error";
import { addressOf, type Call } from "./call";
import { cellRows, cellValue, describeCell } from "./cell-value";

/** Words that mark a missing measurement, any case. */
const MISSING = new Set(["-", "–", "missing", "n/a"]);

/** Reads a column in which a blank cell, or one of the words -, n/a, missing, stands for a missing measurement: NaN in the result. */
export function readGaps(call: Call, argument: string, raw: unknown, length: number): Float64Array {
  const rows = cellRows(raw);
  if (rows === undefined) throw cellError("#VALUE!", `${call.name} needs ${argument}; it is missing`);
  const line = rows.length === 1 ? rows[0]! : rows.map((row) => row[0]);
  if (rows.length > 1 && rows[0]!.length !== 1) {
    throw cellError("#VALUE!", `${call.name} needs ${argument} as one column or one row; the range is ${rows.length} rows by ${rows[0]!.length} columns`);
  }
  if (line.length < length) {
    throw cellError("#VALUE!", `${call.name} needs columns of equal length; ${argument} has ${line.length} rows where ${length} are expected`);
  }
  return Float64Array.from({ length }, (_, i) => {
    const cell = cellValue(line[i]);
    if (cell.kind === "blank" || (cell.kind === "text" && MISSING.has(cell.value.trim().toLowerCase()))) return NaN;
    if (cell.kind === "number" && Number.isFinite(cell.value)) return cell.value;
    const address = addressOf(call, argument, i);
    throw cellError("#VALUE!", `${call.name} needs numbers, or blanks for missing taps, in ${argument}; row ${i + 1}${address === undefined ? "" : ` (${address})`} ${describeCell(cell)}`);
  });
}

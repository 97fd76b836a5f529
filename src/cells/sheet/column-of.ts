import { cellError } from "../errors/cell-error";
import { openCall } from "../reading/call";
import { cellRows, cellValue } from "../reading/cell-value";
import { nearestWord } from "../reading/nearest-word";
import { readOptionalText } from "../reading/read-value";
import { findHeading } from "../writing/headings";
import type { Cell } from "../writing/spill-table";

/**
 * Picks one column out of a spilled table by its heading, so that a formula need not count columns.
 * @customfunction COLUMN_OF
 * @requiresParameterAddresses
 * @param {any[][]} table A table spilled by a WALL function, heading row included, such as D5#.
 * @param {any} heading Key, heading or symbol of the column: momentum_loss, "momentum loss θ" or θ.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} The column below its heading, one entry a row.
 * @family Sheet
 * @unit table as spilled
 * @unit heading text
 * @unit result as in the table
 * @limits Any table whose first row holds headings; an entry without a number stays empty text.
 * @source Own definition; headings as in the nomenclature list of DEVELOPERS.md.
 * @example =SUM(WALL.COLUMN_OF({"station x","value";0,2;1,3},"value")) → 5
 * @words pick select field spill
 */
export function columnOf(table: any[][], heading: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("COLUMN_OF", invocation);
  const rows = cellRows(table);
  if (rows === undefined || rows.length < 2) throw cellError("#VALUE!", `${call.name} needs a table with a heading row and at least one row below it; ${rows?.length ?? 0} rows given`);
  const wanted = readOptionalText(call, "heading", heading);
  if (wanted === undefined) throw cellError("#VALUE!", `${call.name} needs heading; it is missing or blank`);
  const heads = rows[0]!.map((cell) => {
    const value = cellValue(cell);
    return value.kind === "text" ? value.value : "";
  });
  const column = findColumn(heads, wanted);
  if (column < 0) {
    const known = heads.filter((h) => h !== "");
    if (known.length === 0) throw cellError("#VALUE!", `${call.name} needs headings in the table's first row; it holds none`);
    throw cellError("#N/A", `${call.name} needs a heading of the table; "${wanted}" is none of them, nearest is "${nearestWord(wanted, known)}"`);
  }
  return rows.slice(1).map((row) => [plainCell(row[column])]);
}

function findColumn(heads: readonly string[], wanted: string): number {
  const exact = heads.findIndex((h) => h.trim().toLowerCase() === wanted.toLowerCase());
  if (exact >= 0) return exact;
  const meant = findHeading(wanted);
  return meant === undefined ? -1 : heads.findIndex((h) => findHeading(h)?.key === meant.key);
}

function plainCell(raw: unknown): Cell {
  const cell = cellValue(raw);
  switch (cell.kind) {
    case "blank":
      return "";
    case "error":
      throw cellError("#VALUE!", `COLUMN_OF needs a table without errors; the column holds ${cell.code}`);
    case "number":
      if (!Number.isFinite(cell.value)) throw cellError("#VALUE!", "COLUMN_OF needs finite numbers; the column holds one that is not");
      return cell.value;
    default:
      return cell.value;
  }
}

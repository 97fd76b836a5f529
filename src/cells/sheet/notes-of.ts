import { cellError } from "../errors/cell-error";
import { openCall } from "../reading/call";
import { cellRows, cellValue } from "../reading/cell-value";
import { findHeading } from "../writing/headings";

/**
 * Collects what a spilled table's note column says, one note a row, each with its station.
 * @customfunction NOTES_OF
 * @requiresParameterAddresses
 * @param {any[][]} table A table spilled by a WALL function, heading row included, such as D5#.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} One note a row, after the station it stands at; "no notes" where there is none.
 * @family Sheet
 * @unit table as spilled
 * @unit result text
 * @limits Any table with a note column; a table without one gives #N/A.
 * @source Own definition; headings as in the nomenclature list of DEVELOPERS.md.
 * @example =INDEX(WALL.NOTES_OF({"station x","note";0.5,"starts here"}),1,1) → "at 0.5: starts here"
 * @words warning remark message
 */
export function notesOf(table: any[][], invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("NOTES_OF", invocation);
  const rows = cellRows(table) ?? [];
  const keys = (rows[0] ?? []).map((cell) => {
    const value = cellValue(cell);
    return value.kind === "text" ? findHeading(value.value)?.key : undefined;
  });
  const note = keys.indexOf("note");
  if (note < 0) throw cellError("#N/A", "NOTES_OF needs a table with a note column; this one has none");
  const station = keys.indexOf("station");
  const notes: string[][] = [];
  for (const row of rows.slice(1)) {
    const text = cellValue(row[note]);
    if (text.kind === "error") throw cellError("#VALUE!", `${call.name} needs a table without errors; the note column holds ${text.code}`);
    if (text.kind !== "text") continue;
    const at = station < 0 ? undefined : cellValue(row[station]);
    notes.push([at?.kind === "number" ? `at ${Number(at.value.toPrecision(6))}: ${text.value}` : text.value]);
  }
  return notes.length > 0 ? notes : [["no notes"]];
}

import { edgeMach } from "../../physics/edge/edge-mach";
import { surfaceFromTaps as sideFromTaps } from "../../physics/edge/surface-from-taps";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readGaps } from "../reading/read-gaps";
import { readOptionalChoice } from "../reading/read-choice";
import { readColumn } from "../reading/read-column";
import { readNumber, readOptionalNumber } from "../reading/read-value";
import { formatNumber } from "../writing/format-number";
import { spillTable } from "../writing/spill-table";

/**
 * Turns pressure taps round a section into one side's edge-speed column, from the stagnation point (located between the taps) to the tail, ready for a march.
 * @customfunction SURFACE_FROM_TAPS
 * @requiresParameterAddresses
 * @param {any[][]} x First coordinate of the taps, in order along the contour from tail to tail round the nose, in either direction.
 * @param {any[][]} y Second coordinate of each tap.
 * @param {any[][]} cp Pressure coefficient of each tap; a blank, - or n/a marks a missing tap, whose coordinates still shape the contour.
 * @param {any} side upper or lower: the side whose taps lie higher or lower on average.
 * @param {any} reference_speed Speed of the reference flow.
 * @param {any} [mach] Mach number of the reference flow; omitted or 0: constant density (Bernoulli).
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} A heading row, then station from the stagnation point, surface x and y, edge speed and note in a row each; the first row is the stagnation point with speed 0.
 * @family Edge
 * @unit x length
 * @unit y length
 * @unit cp 1
 * @unit side text
 * @unit reference_speed speed
 * @unit mach 1
 * @unit result length, speed
 * @limits Six taps at least, three on a side; cp from vacuum to 2 % above the stagnation value (what lies above counts as stagnation and is noted). A doubled tail point is dropped, a contour that crosses itself or cp without an inner maximum is refused.
 * @limits With 24 taps round a cylinder the stagnation point is found within 1e-4 of its radius. On desktop Excel a blank cell may arrive as 0, which is a possible cp: mark missing taps with - there.
 * @limits Same total pressure all along: no shock, no separated region. Where the flow passes the speed of sound a note says so.
 * @source Own definition of stagnation point and side; speed by Bernoulli or NACA Report 1135 (1953).
 * @example =INDEX(WALL.SURFACE_FROM_TAPS({1;0.5;0.1;0;0.1;0.5;1},{0;0.1;0.08;0;-0.08;-0.1;0},{0;-0.44;-0.69;1;-0.69;-0.44;0},"upper",10),3,4) → 13
 * @words pressure taps aerofoil airfoil section stagnation contour upper lower
 */
export function surfaceFromTaps(x: any[][], y: any[][], cp: any[][], side: any, reference_speed: any, mach: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("SURFACE_FROM_TAPS", invocation);
  const px = readColumn(call, "x", x, { least: 6 });
  const py = readColumn(call, "y", y, { length: px.length });
  const pressure = readGaps(call, "cp", cp, px.length);
  const chosen = readOptionalChoice(call, "side", side, ["upper", "lower"]);
  if (chosen === undefined) throw cellError("#VALUE!", `${call.name} needs side to be upper or lower; it is missing or blank`);
  const referenceSpeed = readNumber(call, "reference_speed", reference_speed, { positive: true });
  const machNumber = readOptionalNumber(call, "mach", mach, { notNegative: true }) ?? 0;
  const made = sideFromTaps(px, py, pressure, { side: chosen, referenceSpeed, mach: machNumber });
  if (!made.ok) throw refusalError(call, made);
  const { station, speed, row, clamped } = made.side;
  const notes = new Array<string>(station.length).fill("");
  notes[0] = [`${chosen} side from the stagnation point`, machNumber > 0 ? `isentropic from Mach ${formatNumber(machNumber)}` : "Bernoulli", ...(clamped > 0 ? [`${clamped} taps above the stagnation pressure read as stagnation`] : [])].join("; ");
  if (machNumber > 0) noteSonic(notes, row, pressure, machNumber);
  const columns = [
    { key: "station", values: station },
    { key: "surface_x", values: made.side.x },
    { key: "surface_y", values: made.side.y },
    { key: "edge_speed", values: speed },
    { key: "note", values: notes },
  ] as const;
  return spillTable(call, station.length, columns, ["station", "surface_x", "surface_y", "edge_speed", "note"]);
}

/** Notes the first tap at which the flow has passed the speed of sound. */
function noteSonic(notes: string[], row: Int32Array, pressure: Float64Array, mach: number): void {
  for (let i = 1; i < row.length; i++) {
    const local = edgeMach(Float64Array.of(pressure[row[i]! - 1]!), mach);
    if (local.ok && local.mach[0]! > 1) {
      notes[i] = `local Mach number ${formatNumber(local.mach[0]!)}: valid only as far as no shock stands before it`;
      return;
    }
  }
}

import { frictionDrag } from "../../physics/drag/friction-drag";
import { cellError } from "../errors/cell-error";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { cellRows, cellValue } from "../reading/cell-value";
import { readOptionalNumber } from "../reading/read-value";
import { findHeading } from "../writing/headings";
import type { Cell } from "../writing/spill-table";
import { readOnsetWords } from "./onset-words";

/**
 * Sums up a layer's table: onset, separation, values at the end, largest wall friction, friction drag of the side, and what its notes say.
 * @customfunction LAYER_SUMMARY
 * @requiresParameterAddresses
 * @param {any[][]} table A table spilled by a march, heading row included, such as D5#; it needs station, edge speed, θ, δ*, H, cf, state and note.
 * @param {any} [reference_speed] Speed of the reference flow; omitted: the friction is given as a force over ½ρ, without coefficient.
 * @param {any} [chord] Length the drag coefficient is referred to; omitted: from the first station to the last.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Quantity and value, one a row; empty where there is nothing to tell.
 * @family Surface
 * @unit table as spilled
 * @unit reference_speed speed
 * @unit chord length
 * @unit result in the units of the table
 * @limits One side of a body; a table spilled by a march of this add-in with its columns whole (columns option: at least station, edge speed, θ, δ*, H, cf, state, note).
 * @limits Friction drag is that of the wall without pressure drag, per unit span, constant density; wall friction beyond separation counts as 0, and the onset's jump is taken where the note says it is.
 * @source Own definition; friction drag as in FRICTION_DRAG.
 * @example =ROUND(INDEX(WALL.LAYER_SUMMARY(WALL.LAYER_MARCH({0;0.5;1;1.5;2},{50;50;50;50;50},0.000015,"onset = from start"),50),14,2),5) → 0.00313
 * @words summary result onset separation drag end values
 */
export function layerSummary(table: any[][], reference_speed: any, chord: any, invocation: CustomFunctions.Invocation): any[][] {
  const call = openCall("LAYER_SUMMARY", invocation);
  const rows = cellRows(table) ?? [];
  const keys = (rows[0] ?? []).map((cell) => {
    const value = cellValue(cell);
    return value.kind === "text" ? findHeading(value.value)?.key : undefined;
  });
  const place = (key: string): number => {
    const at = keys.indexOf(key);
    if (at < 0) throw cellError("#N/A", `LAYER_SUMMARY needs a march's table with its heading row; it has no ${key.replace("_", " ")} column`);
    return at;
  };
  const body = rows.slice(1);
  const number = (key: string): Float64Array => {
    const at = place(key);
    return Float64Array.from(body, (row, i) => {
      const value = cellValue(row[at]);
      if (value.kind === "error") throw cellError("#VALUE!", `LAYER_SUMMARY needs a table without errors; row ${i + 2} of ${key.replace("_", " ")} holds ${value.code}`);
      return value.kind === "number" ? value.value : NaN;
    });
  };
  const text = (key: string): string[] => {
    const at = place(key);
    return body.map((row) => {
      const value = cellValue(row[at]);
      return value.kind === "text" ? value.value : "";
    });
  };
  if (body.length < 2) throw cellError("#N/A", "LAYER_SUMMARY needs a table of at least two stations; this one has fewer");
  const x = number("station");
  const ue = number("edge_speed");
  const badRow = x.findIndex((v, i) => !Number.isFinite(v) || !Number.isFinite(ue[i]!));
  if (badRow >= 0) throw cellError("#VALUE!", `LAYER_SUMMARY needs a station and an edge speed in every row; row ${badRow + 2} has none`);
  const [theta, defect, shape, cf] = [number("momentum_loss"), number("defect"), number("shape"), number("friction")];
  const states = text("state");
  const notes = text("note");
  const said = readOnsetWords(notes.join("; "));
  const end = lastFinite(shape);
  const most = cf.reduce((best, v, i) => (Number.isFinite(v) && (best < 0 || v > cf[best]!) && states[i] !== "laminar" ? i : best), -1);
  const speed = readOptionalNumber(call, "reference_speed", reference_speed, { positive: true });
  const length = readOptionalNumber(call, "chord", chord, { positive: true }) ?? x[x.length - 1]! - x[0]!;
  const friction = frictionDrag(x, cf, ue, speed ?? 1, { breaks: said.onset === undefined ? [] : [said.onset.x] });
  if (!friction.ok) throw refusalError(call, friction);
  const at = (column: Float64Array): Cell => (end < 0 || !Number.isFinite(column[end]!) ? "" : column[end]!);
  const out: Cell[][] = [
    ["quantity", "value"],
    ["onset station", said.onset?.x ?? ""],
    ["onset by", said.onset?.how ?? (states.includes("laminar") ? "none: laminar throughout" : "turbulent table")],
    ["laminar separation station", said.separation.find((s) => s.kind === "laminar")?.x ?? ""],
    ["reattachment station", said.reattachment ?? ""],
    ["turbulent separation station", said.separation.find((s) => s.kind === "turbulent")?.x ?? ""],
    ["last station described", end < 0 ? "" : x[end]!],
    ["edge speed ue there", at(ue)],
    ["momentum loss θ there", at(theta)],
    ["defect thickness δ* there", at(defect)],
    ["shape factor H there", at(shape)],
    ["largest wall friction cf behind onset", most < 0 ? "" : cf[most]!],
    ["its station", most < 0 ? "" : x[most]!],
    speed === undefined ? ["friction force of the side over ½ρ", friction.drag.area] : ["friction drag coefficient of the side", friction.drag.area / length],
  ];
  notes.forEach((note, i) => {
    if (note !== "") out.push([i === 0 ? "method and settings" : `note at x = ${Number(x[i]!.toPrecision(6))}`, note]);
  });
  return out;
}

function lastFinite(column: Float64Array): number {
  let i = column.length - 1;
  while (i >= 0 && !Number.isFinite(column[i]!)) i -= 1;
  return i;
}

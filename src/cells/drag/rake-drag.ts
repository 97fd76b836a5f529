import { rakeDrag as dragOfRake } from "../../physics/drag/rake-drag";
import { refusalError } from "../errors/sentences";
import { openCall } from "../reading/call";
import { readOptionalChoice } from "../reading/read-choice";
import { readColumn } from "../reading/read-column";
import { cellRows } from "../reading/cell-value";
import { readOptionalNumber } from "../reading/read-value";
import { formatNumber } from "../writing/format-number";

/**
 * Gives the profile drag coefficient from a traverse of the wake, by Jones's and Betz's formulas, with its standard uncertainty.
 * @customfunction RAKE_DRAG
 * @requiresParameterAddresses
 * @param {any[][]} y Places across the wake, rising.
 * @param {any[][]} value Reading at each place: speed over the stream's speed, or total-pressure coefficient (p0 − p∞)/q∞, 1 outside the wake.
 * @param {any} [kind] speed (default) or total pressure.
 * @param {any[][]} [static_pressure] Static pressure coefficient at the rake: one number, or one for each place; omitted with speeds: found from the two ends, where the total pressure is the stream's.
 * @param {any} [chord] Length the coefficient is referred to; omitted: 1.
 * @param {any} [value_error] Standard uncertainty of each reading.
 * @param {any} [y_error] Standard uncertainty of each place.
 * @param {any} [pressure_error] Standard uncertainty of the static pressure coefficient, the same all along.
 * @param {CustomFunctions.Invocation} invocation Filled in by the host.
 * @returns {any[][]} Quantity, value and ± standard uncertainty, one a row.
 * @family Drag
 * @unit y length
 * @unit value 1
 * @unit kind word
 * @unit static_pressure 1
 * @unit chord length
 * @unit value_error 1
 * @unit y_error length
 * @unit pressure_error 1
 * @unit result 1, the momentum loss in the unit of y
 * @limits Constant density; wake of a body in an unbounded stream, mean flow along it. Both ends must lie in the undisturbed stream: total-pressure coefficient 1 within 0.03.
 * @limits Too near the trailing edge (less than about 0.05 chord) the static pressure varies across the wake and the formulas stray: 12 % high at 0.01 chord behind Nakayama's aerofoil against 0.4 chord and farther. The two formulas should agree; where they do not, move the rake back.
 * @limits The uncertainty is first order, readings independent of each other, the static pressure common to all; the number of points shows in the curve error.
 * @source A. Betz, ZFM 16 (1925) 42–44; B. M. Jones, ARC R&M 1688 (1936) (formulas as in Schlichting, Boundary-Layer Theory, ch. 25; from memory).
 * @example =ROUND(INDEX(WALL.RAKE_DRAG({-3;-2;-1;0;1;2;3},{1;1;0.9;0.8;0.9;1;1},,,10),2,2),3) → 0.068
 * @words wake survey rake pitot profile drag Betz Jones momentum
 */
export function rakeDrag(
  y: any[][],
  value: any[][],
  kind: any,
  static_pressure: any[][],
  chord: any,
  value_error: any,
  y_error: any,
  pressure_error: any,
  invocation: CustomFunctions.Invocation,
): any[][] {
  const call = openCall("RAKE_DRAG", invocation);
  const places = readColumn(call, "y", y, { least: 4, rising: true });
  const readings = readColumn(call, "value", value, { length: places.length });
  const chosen = readOptionalChoice(call, "kind", kind, ["speed", "total pressure"] as const) ?? "speed";
  const rows = cellRows(static_pressure);
  const single = rows === undefined || (rows.length === 1 && rows[0]!.length === 1);
  const level = single ? readOptionalNumber(call, "static_pressure", static_pressure) : undefined;
  const pressure = single ? (level === undefined ? null : places.map(() => level)) : readColumn(call, "static_pressure", static_pressure, { length: places.length });
  const length = readOptionalNumber(call, "chord", chord, { positive: true }) ?? 1;
  const error = (name: string, raw: unknown): number => (raw === undefined || raw === null ? 0 : (readOptionalNumber(call, name, raw, { notNegative: true }) ?? 0));
  const made = dragOfRake(
    { y: places, value: readings, kind: chosen, pressure },
    { value: error("value_error", value_error), y: error("y_error", y_error), pressure: error("pressure_error", pressure_error) },
  );
  if (!made.ok) throw refusalError(call, made);
  const d = made.drag;
  if (!Number.isFinite((Math.abs(d.jones) + Math.abs(d.betz) + d.jonesError + d.betzError + Math.abs(d.curveError)) / length)) throw refusalError(call, { ok: false, reason: "not finite", argument: "y over chord" });
  const from = pressure === null ? "static pressure found from the two ends" : "static pressure given";
  return [
    ["quantity", "value", "±"],
    ["drag coefficient cd (Jones)", d.jones / length, d.jonesError / length],
    ["drag coefficient cd (Betz)", d.betz / length, d.betzError / length],
    ["momentum loss θ far behind", d.jones / 2, d.jonesError / 2],
    ["curve error of cd", Math.abs(d.curveError) / length, ""],
    ["total pressure at the first end", d.ends[0], ""],
    ["total pressure at the last end", d.ends[1], ""],
    ["static pressure at mid-wake", d.middlePressure, ""],
    ["note", `${from}; Jones and Betz differ by ${d.betz === 0 ? "nothing" : `${formatNumber(Number((100 * Math.abs(d.jones / d.betz - 1)).toPrecision(2)))} %`}`, ""],
  ];
}

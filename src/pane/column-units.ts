import type { HeadingKey } from "../cells/writing/headings";

/** What a column is measured in when the sheet does not say: any consistent set of units will do. */
const KIND: Partial<Record<HeadingKey, string>> = {
  station: "length",
  edge_speed: "speed",
  momentum_loss: "length",
  defect: "length",
  energy_loss: "length",
  layer_height: "length",
  mass_defect: "speed·length",
  blow_velocity: "speed",
  surface_x: "length",
  surface_y: "length",
  height: "length",
  speed: "speed",
  speed_slope: "speed/length",
};
/** A unit as written in a cell: `m`, `m/s`, `m²/s`, `kg/(m s)`, `–` for a pure number. */
const UNIT = /^(?=.{1,12}$)[\p{L}µ°%·*/^⁻⁰¹²³⁴\-–()[\] 0-9.]+$/u;
/** Ways to write that a column has no unit. */
const PURE = ["–", "-", "1", "[-]", "[–]"];
/** Of the columns of numbers at least this share must have a unit above it, or the row above is something else. */
const LEAST_SHARE = 0.5;

/**
 * The unit of each column: from the row of cells above the headings where most columns of numbers have a unit there, otherwise no
 * unit but the kind of quantity (`length`) where the heading tells it. The unit of a pure number is "1".
 */
export function columnUnits(columns: readonly { readonly key: string | undefined; readonly isNumeric: boolean }[], above: readonly string[]): { unit: string; kind: string }[] {
  const written = columns.map((column, i) => (column.isNumeric && UNIT.test((above[i] ?? "").trim()) ? above[i]!.trim().replace(/^\[(.+)\]$/, "$1") : ""));
  const numeric = columns.filter((column) => column.isNumeric).length;
  const isUnitRow = numeric > 0 && written.filter((unit) => unit !== "").length >= LEAST_SHARE * numeric && written.some((unit) => !PURE.includes(unit));
  return columns.map((column, i) => {
    const kind = (column.isNumeric && KIND[column.key as HeadingKey]) || "";
    const unit = isUnitRow ? written[i]! : "";
    return { unit: PURE.includes(unit) ? "1" : unit, kind };
  });
}

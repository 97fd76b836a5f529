import { canBeShown } from "../chart/axis-frame";
import type { AxisScale, Chart } from "../chart/chart";
import type { LookColumn, LookTable } from "./look-table";

/** Columns drawn together, because they are lengths of one size. */
const TOGETHER = ["momentum_loss", "defect", "energy_loss"];

/** One chart of the page; `name` is what its choice is called. */
export interface LookPanel {
  readonly name: string;
  readonly chart: Chart;
}

/**
 * A table's charts: the thicknesses together, every other column by itself, in the table's order. A log axis is used only where
 * there is a value above zero.
 */
export function lookPanels(table: LookTable, scales: { readonly x: AxisScale; readonly y: AxisScale }): LookPanel[] {
  const together = table.columns.filter((c) => TOGETHER.includes(c.key ?? ""));
  const groups: LookColumn[][] = [];
  for (const column of table.columns) {
    if (together.length > 1 && together.includes(column)) {
      if (column === together[0]) groups.push(together);
    } else groups.push([column]);
  }
  const usable = (wanted: AxisScale, values: readonly (number | null)[]): AxisScale => (wanted === "log" && values.some((v) => canBeShown(v, "log")) ? "log" : "linear");
  return groups.map((columns) => {
    const [first, ...rest] = columns as [LookColumn, ...LookColumn[]];
    const same = rest.every((c) => c.unit === first.unit);
    const label = rest.length === 0 ? first.heading : "thickness";
    return {
      name: columns.map((c) => c.heading).join(", "),
      chart: {
        title: `${columns.map((c) => c.heading).join(" and ")} over ${table.x.heading}`,
        x: { label: table.x.heading, unit: table.x.unit, kind: table.x.kind, scale: usable(scales.x, table.x.values), values: table.x.values },
        y: { label, unit: same ? first.unit : "", kind: first.kind, scale: usable(scales.y, columns.flatMap((c) => c.values)) },
        series: columns.map((c) => ({ label: c.heading, values: c.values })),
        markers: table.markers,
      },
    };
  });
}

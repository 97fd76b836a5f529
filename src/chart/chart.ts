/** How an axis is divided. */
export type AxisScale = "linear" | "log";

export interface ChartAxis {
  /** Heading and symbol, e.g. `momentum loss θ`. */
  readonly label: string;
  /** `m`, `m/s`, `1`; empty when there is nothing to say. */
  readonly unit: string;
  /** Kind of quantity (`length`), for the label alone where the unit is not known. */
  readonly kind?: string;
  readonly scale: AxisScale;
}

/** One line of a chart; a place with nothing to show is null and leaves a gap. */
export interface ChartSeries {
  readonly label: string;
  readonly values: readonly (number | null)[];
}

/** A station worth a line across the chart, such as onset or separation. */
export interface ChartMarker {
  readonly x: number;
  readonly words: string;
}

/** All that a chart says, as plain data: lines over one column of stations. */
export interface Chart {
  readonly title: string;
  readonly x: ChartAxis & { readonly values: readonly (number | null)[] };
  readonly y: ChartAxis;
  readonly series: readonly ChartSeries[];
  readonly markers: readonly ChartMarker[];
}

/** `momentum loss θ [m]`, or `[length]` where the unit is not known; a pure number has no bracket. */
export function axisWords(axis: { readonly label: string; readonly unit: string; readonly kind?: string }): string {
  const bracket = axis.unit === "" ? (axis.kind ?? "") : axis.unit === "1" ? "" : axis.unit;
  return bracket === "" ? axis.label : `${axis.label} [${bracket}]`;
}

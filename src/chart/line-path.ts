import { line } from "d3-shape";
import { canBeShown, type AxisFrame } from "./axis-frame";

/** A place of a line that is drawn, in pixels, with the row it comes from. */
export interface LinePoint {
  readonly row: number;
  readonly px: number;
  readonly py: number;
}

/** The drawn places of a line in runs: a blank, or a value the axis has no place for, ends a run. */
export function lineRuns(x: readonly (number | null)[], y: readonly (number | null)[], xAxis: AxisFrame, yAxis: AxisFrame): LinePoint[][] {
  const runs: LinePoint[][] = [];
  let open = false;
  for (let row = 0; row < x.length; row++) {
    const [a, b] = [x[row], y[row]];
    if (!canBeShown(a, xAxis.scale) || !canBeShown(b, yAxis.scale)) {
      open = false;
      continue;
    }
    if (!open) runs.push([]);
    open = true;
    runs.at(-1)!.push({ row, px: xAxis.at(a), py: yAxis.at(b) });
  }
  return runs;
}

/** SVG path of the runs: straight from place to place, nothing across a gap. */
export function linePath(runs: readonly (readonly LinePoint[])[]): string {
  const path = line<LinePoint>((p) => p.px, (p) => p.py).digits(2);
  return runs.map((run) => (run.length > 1 ? path(run) : "")).join("");
}

/** The places that carry a mark: not nearer to each other than `apart` pixels, and always a place that stands alone. */
export function markedPoints(runs: readonly (readonly LinePoint[])[], apart: number): LinePoint[] {
  const marked: LinePoint[] = [];
  for (const run of runs) {
    for (const point of run) {
      const last = marked.at(-1);
      if (run.length === 1 || last === undefined || Math.hypot(point.px - last.px, point.py - last.py) >= apart) marked.push(point);
    }
  }
  return marked;
}

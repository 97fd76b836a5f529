import type { EdgeCurve } from "../../physics/edge/edge-curve";
import { GIVEN } from "../../physics/layer-columns";
import { HEAD_NEAR_SEPARATION } from "../../physics/turbulent/entrainment-method";
import type { TurbulentMarch } from "../../physics/turbulent/turbulent-march";
import type { Call } from "../reading/call";
import { formatNumber } from "../writing/format-number";
import type { Cell } from "../writing/spill-table";
import { layerTable, type TableRemark } from "../surface/layer-table";

/** The table of a turbulent march. */
export function turbulentTable(call: Call, edge: EdgeCurve, march: TurbulentMarch, method: "entrainment" | "lag", settings: string, wanted?: readonly string[]): Cell[][] {
  const { columns, stop } = march;
  const remarks: TableRemark[] = [];
  if (stop.kind !== "end") remarks.push({ x: stop.x, words: stopWords(stop.kind, method, stop.x, stop.momentumLoss) });
  if (method === "entrainment") remarks.push(...nearSeparation(edge, columns.shape, columns.given));
  const from = march.start === "leading edge" ? "starts turbulent at a leading edge" : "starts from a given momentum loss";
  const memory = method === "lag" ? `, start entrainment ${formatNumber(march.startEntrainment)}` : "";
  return layerTable(
    call,
    edge,
    columns,
    { settings: `${settings}; ${from}, start shape ${formatNumber(march.startShape)}${memory}`, remarks, beyond: stop.kind === "limit" ? "out of range" : "separated" },
    wanted,
  );
}

/** Words for the end of a turbulent march. */
export function stopWords(kind: "separation" | "limit", method: "entrainment" | "lag" | "field", x: number, momentumLoss: number): string {
  const place = `at x = ${formatNumber(x)}, momentum loss ${formatNumber(momentumLoss)}`;
  if (kind === "limit") return `the layer leaves the range of the method's relations ${place}`;
  return `turbulent separation ${place} (${method === "entrainment" ? "H = 2.4" : "wall friction 0"})`;
}

/** Where H of the entrainment method first passes 1.8: Head's range of separation begins there. */
export function nearSeparation(edge: EdgeCurve, shape: Float64Array, given: Uint16Array): TableRemark[] {
  const at = shape.findIndex((h, i) => h > HEAD_NEAR_SEPARATION && (given[i]! & GIVEN.entrainment) !== 0);
  return at < 0 ? [] : [{ x: edge.curve.x[at]!, words: "H above 1.8 from here: separation is possible (Head: H from 1.8 to 2.4)" }];
}

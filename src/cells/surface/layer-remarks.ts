import { LEAST_TURBULENT_REYNOLDS, type LayerMarch } from "../../physics/surface/layer-march";
import { stopWords } from "../turbulent/turbulent-table";
import { formatNumber } from "../writing/format-number";
import type { TableRemark } from "./layer-table";
import { onsetWords } from "./onset-words";

const HOW: Record<NonNullable<LayerMarch["onset"]>["kind"], string> = {
  free: "free",
  fixed: "fixed",
  "from start": "from start",
  separation: "reattachment",
  "least Reynolds": `Re θ ${LEAST_TURBULENT_REYNOLDS} behind the stagnation point`,
};

/** What a whole-layer march has to say, each at its station: bubble, onset, end. */
export function layerRemarks(march: LayerMarch, method: "lag" | "entrainment" | "field"): TableRemark[] {
  const out: TableRemark[] = [];
  const { onset, bubble, stop } = march;
  if (bubble !== null) {
    const missed = march.missedTrip === null ? "" : `, ahead of the fixed onset at ${formatNumber(march.missedTrip)}`;
    out.push({ x: bubble.separation, words: `laminar separation at x = ${formatNumber(bubble.separation)}${missed}` });
    out.push({
      x: bubble.separation,
      words: `WARNING bubble: turbulent from x = ${formatNumber(bubble.onset)}, reattaches at x = ${formatNumber(bubble.reattachment)}, θ ${formatNumber(bubble.momentumLoss)} to ${formatNumber(bubble.reattachmentLoss)} (Horton)`,
    });
  }
  if (onset !== null) {
    const shape = onset.momentumReynolds > 0 ? `, H from ${formatNumber(onset.startShape)}` : "";
    const low = onset.kind === "fixed" && onset.momentumReynolds < LEAST_TURBULENT_REYNOLDS ? `; below Re θ ${LEAST_TURBULENT_REYNOLDS} a trip may not hold` : "";
    const range = onset.remark === "" ? "" : `; ${onset.remark}`;
    out.push({ x: onset.x, words: `${onsetWords(HOW[onset.kind], onset.x, onset.momentumReynolds)}${shape}${low}${range}` });
  }
  const place = stop.kind === "end" ? "" : `at x = ${formatNumber(stop.x)}, momentum loss ${formatNumber(stop.momentumLoss)}`;
  switch (stop.kind) {
    case "end":
      break;
    case "laminar separation":
      out.push({ x: stop.x, words: `laminar separation ${place}` });
      break;
    case "no reattachment":
      out.push({ x: stop.x, words: `laminar separation ${place}; WARNING no short bubble closes on this wall (Horton)` });
      break;
    case "laminar limit":
      out.push({ x: stop.x, words: `the laminar method leaves its range ${place}` });
      break;
    case "turbulent separation":
      out.push({ x: stop.x, words: stopWords("separation", method, stop.x, stop.momentumLoss) });
      break;
    case "turbulent limit":
      out.push({ x: stop.x, words: stopWords("limit", method, stop.x, stop.momentumLoss) });
  }
  return out;
}

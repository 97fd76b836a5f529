import type { EdgeCurve } from "../../physics/edge/edge-curve";
import { LAYER_STATE, type LaminarMarch } from "../../physics/laminar/laminar-march";
import type { Call } from "../reading/call";
import { formatNumber } from "../writing/format-number";
import { spillTable, type Cell, type TableColumn } from "../writing/spill-table";

/**
 * The table of a laminar march: the heading vocabulary's columns, `state` a word a row, `note` the settings in the first row and the
 * reason of an early end in the first row beyond it.
 */
export function laminarTable(call: Call, edge: EdgeCurve, march: LaminarMarch, settings: string, wanted?: readonly string[]): Cell[][] {
  const n = march.state.length;
  const { attached, notReached } = LAYER_STATE;
  const incomplete = march.state.map((state) => (state === attached ? 0 : 1));
  const unknown = march.state.map((state) => (state === notReached ? 1 : 0));
  const columns: TableColumn[] = [
    { key: "station", values: edge.curve.x },
    { key: "edge_speed", values: march.edgeSpeed },
    { key: "momentum_loss", values: march.momentumLoss, blank: unknown },
    { key: "defect", values: march.defect, blank: incomplete },
    { key: "energy_loss", values: march.energyLoss, blank: incomplete },
    { key: "shape", values: march.shape, blank: incomplete },
    { key: "friction", values: march.friction, blank: either(incomplete, march.frictionBlank) },
    { key: "momentum_reynolds", values: march.momentumReynolds, blank: unknown },
    { key: "gradient", values: march.gradient, blank: unknown },
    { key: "mass_defect", values: march.massDefect, blank: incomplete },
    { key: "blow_velocity", values: march.blowVelocity, blank: either(incomplete, march.blowBlank) },
    { key: "state", values: stateWords(march) },
    { key: "note", values: notes(edge, march, settings) },
  ];
  return spillTable(call, n, columns, wanted);
}

function either(a: Uint8Array, b: Uint8Array): Uint8Array {
  return a.map((flag, i) => flag | b[i]!);
}

function stateWords(march: LaminarMarch): string[] {
  const beyond = march.stop.kind === "limit" ? "out of range" : "separated";
  return Array.from(march.state, (state) => (state === LAYER_STATE.attached ? "laminar" : beyond));
}

function notes(edge: EdgeCurve, march: LaminarMarch, settings: string): string[] {
  const out = new Array<string>(march.state.length).fill("");
  const noise = edge.fit === "smooth" && edge.noiseOrigin === "found" ? `; noise found ${formatNumber(edge.noise)}` : "";
  const unseen = edge.noiseOrigin === "none found" ? "; no noise could be told from the shape" : "";
  out[0] = `${settings}${noise}${unseen}; starts at a ${march.start}`.replace("at a given", "from a given");
  const { stop } = march;
  if (stop.kind === "end") return out;
  const place = `at x = ${formatNumber(stop.x)}, momentum loss ${formatNumber(stop.momentumLoss)}`;
  const why = stop.kind === "separation" ? `laminar separation ${place}` : `gradient λ reaches ${formatNumber(stop.gradient)}, the end of the method's range, ${place}`;
  out[march.reached] = out[march.reached] ? `${out[march.reached]}; ${why}` : why;
  return out;
}

import type { EdgeCurve } from "../../physics/edge/edge-curve";
import { GIVEN, ROW_STATE, type LayerColumn, type LayerColumns } from "../../physics/layer-columns";
import type { Call } from "../reading/call";
import { formatNumber } from "../writing/format-number";
import type { HeadingKey } from "../writing/headings";
import { spillTable, type Cell, type TableColumn } from "../writing/spill-table";

/** A remark at a station: it stands in the first row at or behind it. */
export interface TableRemark {
  x: number;
  words: string;
}

/** The words of a march for its table. */
export interface LayerWords {
  /** Method, settings and start, for the first row's note. */
  settings: string;
  remarks: readonly TableRemark[];
  /** State of the rows not reached. */
  beyond: string;
}

const KEYS: readonly (readonly [HeadingKey, LayerColumn])[] = [
  ["momentum_loss", "momentumLoss"],
  ["defect", "defect"],
  ["energy_loss", "energyLoss"],
  ["shape", "shape"],
  ["layer_height", "layerHeight"],
  ["friction", "friction"],
  ["momentum_reynolds", "momentumReynolds"],
  ["gradient", "gradient"],
  ["mass_defect", "massDefect"],
  ["blow_velocity", "blowVelocity"],
  ["entrainment", "entrainment"],
  ["intermittency", "intermittency"],
];

const STATE_WORDS: Record<number, string> = {
  [ROW_STATE.laminar]: "laminar",
  [ROW_STATE.transition]: "transition",
  [ROW_STATE.bubble]: "bubble",
  [ROW_STATE.turbulent]: "turbulent",
  [ROW_STATE.separated]: "separated",
};

/** The table of a march that holds turbulent rows. */
export function layerTable(call: Call, edge: EdgeCurve, layer: LayerColumns, words: LayerWords, wanted?: readonly string[]): Cell[][] {
  const n = layer.state.length;
  const columns: TableColumn[] = [
    { key: "station", values: edge.curve.x },
    { key: "edge_speed", values: layer.edgeSpeed },
    ...KEYS.map(([key, column]) => ({ key, values: layer[column], blank: layer.given.map((bits) => ((bits & GIVEN[column]) === 0 ? 1 : 0)) })),
    { key: "state", values: Array.from(layer.state, (state) => STATE_WORDS[state] ?? words.beyond) },
    { key: "note", values: notes(edge, n, words) },
  ];
  return spillTable(call, n, columns, wanted);
}

function notes(edge: EdgeCurve, n: number, words: LayerWords): string[] {
  const { x } = edge.curve;
  const out: string[][] = Array.from({ length: n }, () => []);
  const noise = edge.fit === "smooth" && edge.noiseOrigin === "found" ? `; noise found ${formatNumber(edge.noise)}` : "";
  const unseen = edge.noiseOrigin === "none found" ? "; no noise could be told from the shape" : "";
  out[0]!.push(`${words.settings}${noise}${unseen}`);
  for (const remark of words.remarks) {
    const at = x.findIndex((station) => station >= remark.x);
    out[at < 0 ? n - 1 : at]!.push(remark.words);
  }
  return out.map((parts) => parts.join("; "));
}

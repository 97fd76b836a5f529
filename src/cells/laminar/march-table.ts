import type { EdgeCurve } from "../../physics/edge/edge-curve";
import type { LaminarColumns } from "../../physics/laminar/field-march";
import { LAYER_STATE } from "../../physics/laminar/laminar-march";
import type { Call } from "../reading/call";
import { formatNumber } from "../writing/format-number";
import { spillTable, type Cell, type TableColumn } from "../writing/spill-table";

/** The words of one march for its table. */
export interface MarchWords {
  /** Method and settings, for the first row's note. */
  settings: string;
  /** State of the rows that are not attached. */
  beyond: string;
  /** Why the march stopped, for the note of the first row not reached; "" at the end of the column. */
  why: string;
}

/** The table of a march: the same columns in the same order as THWAITES_MARCH, whatever the method. */
export function marchTable(call: Call, edge: EdgeCurve, march: LaminarColumns, words: MarchWords, wanted?: readonly string[]): Cell[][] {
  const n = march.state.length;
  const { attached, notReached } = LAYER_STATE;
  const incomplete = march.state.map((state) => (state === attached ? 0 : 1));
  const unknown = march.state.map((state) => (state === notReached ? 1 : 0));
  const either = (a: Uint8Array, b: Uint8Array): Uint8Array => a.map((flag, i) => flag | b[i]!);
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
    { key: "state", values: Array.from(march.state, (state) => (state === attached ? "laminar" : words.beyond)) },
    { key: "note", values: notes(edge, march, words) },
  ];
  return spillTable(call, n, columns, wanted);
}

function notes(edge: EdgeCurve, march: LaminarColumns, words: MarchWords): string[] {
  const out = new Array<string>(march.state.length).fill("");
  const noise = edge.fit === "smooth" && edge.noiseOrigin === "found" ? `; noise found ${formatNumber(edge.noise)}` : "";
  const unseen = edge.noiseOrigin === "none found" ? "; no noise could be told from the shape" : "";
  const from = march.start === "given momentum loss" ? "from a given momentum loss" : `at a ${march.start}`;
  out[0] = `${words.settings}${noise}${unseen}; starts ${from}`;
  if (words.why !== "" && march.reached < out.length) out[march.reached] = words.why;
  else if (words.why !== "") out[out.length - 1] += out.length > 1 ? words.why : `; ${words.why}`;
  return out;
}

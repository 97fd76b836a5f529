import { cellError } from "../errors/cell-error";
import type { Call } from "../reading/call";
import { nearestWord } from "../reading/nearest-word";

/** A column of a spilled table: the key used in options, the heading a user reads, the symbol inside it. */
export interface Heading {
  key: string;
  heading: string;
  symbol: string;
}

/** The heading vocabulary in its fixed order (design.md §3); new columns go last, before state and note. */
export const HEADINGS = [
  { key: "station", heading: "station x", symbol: "x" },
  { key: "edge_speed", heading: "edge speed ue", symbol: "ue" },
  { key: "momentum_loss", heading: "momentum loss θ", symbol: "θ" },
  { key: "defect", heading: "defect thickness δ*", symbol: "δ*" },
  { key: "energy_loss", heading: "energy loss δ3", symbol: "δ3" },
  { key: "shape", heading: "shape factor H", symbol: "H" },
  { key: "layer_height", heading: "layer height δ", symbol: "δ" },
  { key: "friction", heading: "wall friction cf", symbol: "cf" },
  { key: "momentum_reynolds", heading: "Re θ", symbol: "Reθ" },
  { key: "gradient", heading: "gradient λ", symbol: "λ" },
  { key: "mass_defect", heading: "mass defect m", symbol: "m" },
  { key: "blow_velocity", heading: "blow velocity dm/dx", symbol: "dm/dx" },
  { key: "amplification", heading: "amplification N", symbol: "N" },
  { key: "entrainment", heading: "entrainment CE", symbol: "CE" },
  { key: "intermittency", heading: "intermittency γ", symbol: "γ" },
  { key: "heat", heading: "Stanton number St", symbol: "St" },
  { key: "value", heading: "value", symbol: "v" },
  { key: "uncertainty", heading: "± standard error", symbol: "±" },
  { key: "surface_x", heading: "surface x", symbol: "xs" },
  { key: "surface_y", heading: "surface y", symbol: "ys" },
  { key: "height", heading: "height y", symbol: "y" },
  { key: "similar_height", heading: "similar height η", symbol: "η" },
  { key: "speed", heading: "speed u", symbol: "u" },
  { key: "speed_ratio", heading: "speed ratio u/ue", symbol: "u/ue" },
  { key: "speed_slope", heading: "speed gradient ∂u/∂y", symbol: "∂u/∂y" },
  { key: "similar_shear", heading: "similar shear", symbol: "∂(u/ue)/∂η" },
  { key: "canonical_pressure", heading: "canonical pressure C̄p", symbol: "C̄p" },
  { key: "equivalent_distance", heading: "equivalent distance x̄", symbol: "x̄" },
  { key: "separation_number", heading: "separation number", symbol: "F" },
  { key: "separation_limit", heading: "separation limit", symbol: "Fs" },
  { key: "margin", heading: "margin to separation", symbol: "1 − F/Fs" },
  { key: "state", heading: "state", symbol: "state" },
  { key: "note", heading: "note", symbol: "note" },
] as const satisfies readonly Heading[];

export type HeadingKey = (typeof HEADINGS)[number]["key"];

/** The heading meant by a key, a heading or a symbol, any case. */
export function findHeading(written: string): Heading | undefined {
  const word = plain(written);
  return HEADINGS.find((h) => plain(h.key) === word || plain(h.heading) === word) ?? HEADINGS.find((h) => plain(h.symbol) === word);
}

/** Reads the `columns` option: keys, headings or symbols separated by commas. */
export function columnKeys(call: Call, written: string): readonly string[] {
  return written
    .split(",")
    .map((word) => word.trim())
    .filter((word) => word !== "")
    .map((word) => {
      const found = findHeading(word);
      if (found) return found.key;
      const nearest = nearestWord(word, HEADINGS.map((h) => h.key));
      throw cellError("#VALUE!", `${call.name} needs columns it knows; "${word}" is none of them, nearest is ${nearest}`);
    });
}

function plain(word: string): string {
  return word.trim().toLowerCase().replace(/[\s_]+/g, " ");
}

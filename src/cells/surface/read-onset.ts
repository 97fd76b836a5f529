import { michel } from "../../physics/onset/michel";
import type { OnsetCriterion } from "../../physics/onset/onset-criterion";
import type { OnsetChoice } from "../../physics/surface/layer-march";
import { cellError } from "../errors/cell-error";
import type { Call } from "../reading/call";
import type { Options } from "../reading/read-options";

const CRITERIA: readonly OnsetCriterion[] = [michel];

/** The options onset, onset criterion, turbulence level and trip momentum loss; omitted: `usual`. */
export function readOnset(call: Call, options: Options, usual: "free" | "none" = "free"): OnsetChoice {
  const station = options.number("onset");
  const word = station === undefined ? (options.word("onset") ?? usual) : "fixed";
  const added = options.number("trip momentum loss");
  if (added !== undefined && word !== "fixed") throw cellError("#VALUE!", `${call.name} needs onset = a station where trip momentum loss is given; it has ${word}`);
  const criterion = options.word("onset criterion");
  if (criterion !== undefined && word !== "free") throw cellError("#VALUE!", `${call.name} needs onset = free where an onset criterion is given; it has ${station ?? word}`);
  if (station !== undefined) return { kind: "fixed", x: station, addedMomentumLoss: added ?? 0 };
  if (word === "free") return { kind: "free", criterion: CRITERIA.find((c) => c.name === criterion) ?? michel, turbulence: options.number("turbulence level") ?? 0 };
  return word === "from start" ? { kind: "from start" } : { kind: "none" };
}

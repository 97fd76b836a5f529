import { cellError } from "../errors/cell-error";
import type { Call } from "../reading/call";
import { chosen } from "../reading/read-choice";
import { readOptionalNumber, single } from "../reading/read-value";

/** Reads the noise of a column: a standard deviation of 0 or more; undefined where it is omitted, blank or the word "found". */
export function readNoise(call: Call, raw: unknown): number | undefined {
  const cell = single(call, "noise", raw);
  if (cell.kind === "text") {
    chosen(call, "noise", cell.value, ["found"]);
    return undefined;
  }
  if (cell.kind === "flag") throw cellError("#VALUE!", `${call.name} needs noise as a number or "found"; it has ${cell.value ? "TRUE" : "FALSE"}`);
  return readOptionalNumber(call, "noise", raw, { notNegative: true });
}

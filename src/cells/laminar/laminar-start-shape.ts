import { cellError } from "../errors/cell-error";
import type { Call } from "../reading/call";
import type { Options } from "../reading/read-options";

/** The option start shape of a laminar march: a number only. */
export function laminarStartShape(call: Call, options: Options): number | undefined {
  const word = options.word("start shape");
  if (word !== undefined) throw cellError("#VALUE!", `${call.name} needs a number for option "start shape"; "${word}" is for turbulent layers`);
  return options.number("start shape");
}

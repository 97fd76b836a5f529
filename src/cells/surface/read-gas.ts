import { edgeGas, type EdgeGas } from "../../physics/edge/edge-gas";
import { refusalError } from "../errors/sentences";
import type { Call } from "../reading/call";
import type { Options } from "../reading/read-options";

/** The reference stream of the options reference Mach, reference speed and gamma; constant density where no Mach number is given. */
export function readGas(call: Call, options: Options): EdgeGas {
  const made = edgeGas(options.number("reference Mach") ?? 0, options.number("reference speed"), options.number("gamma"));
  if (!made.ok) throw refusalError(call, made);
  return made.gas;
}

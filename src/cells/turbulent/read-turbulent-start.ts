import type { Options } from "../reading/read-options";

/** Start values of a turbulent march from its options; a word (after onset, equilibrium) leaves the value to the method. */
export function readTurbulentStart(options: Options): { startMomentumLoss?: number; startReynolds?: number; startShape?: number } {
  return {
    startMomentumLoss: options.number("start momentum loss"),
    startReynolds: options.number("start Re theta"),
    startShape: options.number("start shape"),
  };
}

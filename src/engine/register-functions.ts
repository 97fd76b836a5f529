/**
 * Seam: our functions in the engine's registry. Pinned: @odoo/o-spreadsheet 19.3.7, exported `addFunction`, `helpers.arg`,
 * `EvaluationError`.
 *
 * Relies on: an argument declared `any, range` arriving as a value object or a [column][row] matrix, blank as null, omitted as
 * undefined, an error as its code in `value`; dotted names being accepted; an `EvaluationError` returned from `compute` showing
 * its message in the grid. A plain exception would be replaced by the library's own support text, and null, NaN or a promise
 * would be mishandled: nothing of the kind leaves `compute` below.
 * How it would break: the start-up self-test calls a registered function with a range, a scalar and nothing.
 */
import { engineErrorCode, engineMatrix, engineValue, sheetRows, sheetValue } from "./engine-values";
import { rangeAddress } from "./range-address";
import { SheetError, type SheetFunction, type SheetValue } from "./sheet-function";
import type { EngineArgument, EngineContext, EngineError, EngineLibrary } from "./types";

/** Puts the functions into the engine with their argument help; the grid and the headless book then know them. */
export function registerFunctions(library: EngineLibrary, functions: readonly SheetFunction[]): void {
  for (const sheetFunction of functions) {
    library.addFunction(sheetFunction.name, {
      description: sheetFunction.description,
      category: sheetFunction.category,
      isExported: true,
      args: sheetFunction.parameters.map((p) => library.helpers.arg(`${p.name} (any, range${p.optional ? ", optional" : ""})`, p.description)),
      compute(...args) {
        return compute(library, sheetFunction, this, args);
      },
    });
  }
}

function compute(library: EngineLibrary, sheetFunction: SheetFunction, context: EngineContext, args: EngineArgument[]): EngineArgument | EngineError {
  try {
    const values = sheetFunction.parameters.map((_, i) => argumentRows(args[i]));
    const addresses = sheetFunction.parameters.map((_, i) => rangeAddress(args[i], context.getters));
    return engineResult(sheetFunction.call(values, addresses));
  } catch (error) {
    return errorFrom(library, sheetFunction.name, error);
  }
}

function argumentRows(argument: EngineArgument): SheetValue[][] | undefined {
  if (argument === undefined) return undefined;
  return Array.isArray(argument) ? sheetRows(argument) : [[sheetValue(argument)]];
}

function engineResult(result: unknown): EngineArgument {
  if (result instanceof SheetError) throw result;
  if (!Array.isArray(result)) {
    if (result !== null && typeof result === "object") throw new Error("it returned neither a value nor a table");
    return engineValue(result);
  }
  if (result.length === 0 || !result.every((row) => Array.isArray(row))) throw new Error("it returned an empty or ragged table");
  const matrix = engineMatrix(result as unknown[][]);
  if (matrix.length === 0) throw new Error("it returned a table without columns");
  return matrix;
}

/** An error with one of Excel's codes keeps its sentence; anything else is a fault of ours and says so. */
function errorFrom(library: EngineLibrary, name: string, error: unknown): EngineError {
  const { code, message } = (typeof error === "object" && error !== null ? error : {}) as { code?: unknown; message?: unknown };
  if (typeof code === "string" && code.startsWith("#")) return new library.EvaluationError(message ? String(message) : `${name} gives ${code}`, engineErrorCode(code));
  return new library.EvaluationError(`${name} failed: ${message ? String(message) : String(error)}`, "#ERROR");
}

/**
 * Seam: our formula compiler in place of the engine's. Pinned: @odoo/o-spreadsheet 19.3.7, exported `functionCache`,
 * `registries.functionRegistry`, `parse`, `EvaluationError`.
 *
 * Relies on: `compileTokensOrThrow` looking a formula's shape up in `functionCache`, an ordinary object, before it writes and
 * evaluates code for it. The object's prototype is replaced by one that compiles whatever shape is asked for, so the engine's
 * own compiler (which needs `new Function` and has not Excel's precedence) is never reached for text that is a formula. An
 * error thrown there is caught by the engine and marks the formula as bad, with the error's message.
 * How it would break: with another cache the engine compiles by itself; the self-test `=-2^2` then gives -4 and stops the start.
 */
import { COMPILED_NAMES, compileShape } from "./compile-shape";
import { FormulaError } from "./formula-shape";
import type { EngineExecutable, EngineLibrary } from "./types";

/** A word alone is no formula: it may be any property somebody asks an object for. */
const COULD_BE_A_SHAPE = /[^A-Za-z0-9_$]/;

const HELP: Readonly<Record<string, string>> = {
  LET: "Gives names to values and uses them in one expression: name, value, …, expression.",
  LAMBDA: "A function of the named parameters: parameter, …, expression.",
  MAP: "Applies a LAMBDA to each element of one or more arrays.",
  REDUCE: "Runs a LAMBDA of (total, element) over an array and gives the last total.",
  SCAN: "Runs a LAMBDA of (total, element) over an array and gives every total.",
  MAKEARRAY: "An array of the given rows and columns, each element from a LAMBDA of (row, column).",
  BYROW: "Applies a LAMBDA to each row of an array.",
  BYCOL: "Applies a LAMBDA to each column of an array.",
};

/** Puts the compiler behind the engine's cache and its own names into the registry. */
export function installCompiler(library: EngineLibrary): void {
  const registry = library.registries.functionRegistry.content;
  for (const name of COMPILED_NAMES) {
    if (Object.hasOwn(registry, name)) continue;
    library.addFunction(name, {
      description: HELP[name] ?? "",
      category: "Logical",
      isExported: true,
      hidden: !(name in HELP),
      args: [library.helpers.arg("argument1 (any, range, repeating)", "As in Excel.")],
      // The compiler never calls it; only a formula compiled by the engine itself would.
      compute: () => new library.EvaluationError(`${name} was not compiled by Wallsheet's compiler.`, "#ERROR"),
    });
  }
  const cache = library.functionCache;
  Object.setPrototypeOf(
    cache,
    new Proxy(Object.create(null) as object, {
      get(_, key) {
        if (typeof key !== "string" || !COULD_BE_A_SHAPE.test(key)) return undefined;
        const compiled = compileOrThrow(library, key);
        Object.defineProperty(cache, key, { value: compiled, enumerable: true, configurable: true, writable: true });
        return compiled;
      },
    }),
  );
}

function compileOrThrow(library: EngineLibrary, shape: string): EngineExecutable {
  try {
    const compiled = compileShape(shape, library.registries.functionRegistry.content);
    // The engine's own reader must know the text too: its menus and its export go through it.
    library.parse(shape.replace(/\|C\|/g, "A1").replace(/\|R\|/g, "A1:A2").replace(/\|N\|/g, "1").replace(/\|S\|/g, '""'));
    return compiled;
  } catch (error) {
    if (error instanceof FormulaError) throw new library.EvaluationError(error.message, "#BAD_EXPR");
    throw error;
  }
}

/** Short ways to add an Excel function to the engine's registry, and to read its arguments. */
import { excelErrorCode, engineErrorCode, isEngineError } from "../engine-values";
import type { EngineArgument, EngineCompute, EngineError, EngineLibrary, EngineMatrix, EngineValue } from "../types";

/** Thrown inside a function: the cell's error, with Excel's code and a sentence. */
export class ExcelError {
  constructor(
    readonly code: string,
    readonly message: string,
  ) {}
}

export type Result = number | string | boolean | EngineValue | EngineMatrix;

/** Adds a function the engine lacks; one it has already is left alone. `args` as in `x (number, optional)`. */
export function addMissing(library: EngineLibrary, name: string, description: string, args: readonly string[], compute: (...args: EngineArgument[]) => Result): void {
  if (!Object.hasOwn(library.registries.functionRegistry.content, name)) define(library, name, description, args, compute);
}

/** Adds a function, or puts it in place of the engine's function of that name. */
export function define(library: EngineLibrary, name: string, description: string, args: readonly string[], compute: (...args: EngineArgument[]) => Result, hidden = false): void {
  library.registries.functionRegistry.replace(name, {
    description,
    category: "Excel",
    isExported: true,
    hidden,
    args: args.map((definition) => library.helpers.arg(definition, "")),
    compute: (...given) => settle(library, name, () => compute(...given)),
  });
}

/** Wraps the engine's own function: `fix` sees what it gave (or threw) and may answer with something else. */
export function correct(library: EngineLibrary, name: string, fix: (given: EngineArgument | EngineError, args: EngineArgument[]) => Result | undefined): void {
  const registry = library.registries.functionRegistry;
  if (!Object.hasOwn(registry.content, name)) throw new Error(`The engine has no ${name} to correct.`);
  const entry = registry.content[name]!;
  const original: EngineCompute = entry.compute;
  registry.replace(name, {
    ...entry,
    compute(...args) {
      let given: EngineArgument | EngineError;
      try {
        given = original.apply(this, args);
      } catch (error) {
        if (!isEngineError(error as EngineArgument)) throw error;
        given = error as EngineError;
      }
      return settle(library, name, () => {
        const fixed = fix(given, args);
        return fixed === undefined ? (given as Result) : fixed;
      });
    },
  });
}

/** Runs a body; its ExcelError becomes the cell's error, a number that is not finite becomes #NUM!. */
function settle(library: EngineLibrary, name: string, body: () => Result): EngineArgument | EngineError {
  try {
    const result = body();
    if (Array.isArray(result)) return result;
    const value = typeof result === "object" ? result : { value: result };
    if (typeof value.value === "number" && !Number.isFinite(value.value)) return new library.EvaluationError(`${name} has no finite value here.`, "#NUM!");
    return value;
  } catch (error) {
    if (error instanceof ExcelError) return new library.EvaluationError(error.message, engineErrorCode(error.code));
    if (isEngineError(error as EngineArgument)) return error as EngineError;
    return new library.EvaluationError(`${name} failed: ${error instanceof Error ? error.message : String(error)}`, "#ERROR");
  }
}

/** A number as Excel reads an argument: blank is 0, TRUE is 1, text of a number is that number. */
export function numberOf(argument: EngineArgument, missing = 0): number {
  if (argument === undefined) return missing;
  const { value, message } = Array.isArray(argument) ? (argument[0]?.[0] ?? { value: null }) : argument;
  if (value === null) return 0;
  if (typeof value === "number") return value;
  if (typeof value === "boolean") return Number(value);
  if (isEngineError({ value })) throw new ExcelError(excelErrorCode(value), message ?? value);
  const number = value.trim() === "" ? NaN : Number(value);
  if (Number.isNaN(number)) throw new ExcelError("#VALUE!", `A number is needed, not "${value}".`);
  return number;
}

/** Every number among the arguments: ranges give their numbers only, single values are read as numbers. */
export function numbersOf(args: readonly EngineArgument[]): number[] {
  return args.flatMap((argument) => {
    if (argument === undefined) return [];
    if (!Array.isArray(argument)) return [numberOf(argument)];
    return rowFirst(argument).flatMap((cell) => (typeof cell.value === "number" || isEngineError(cell) ? [numberOf(cell)] : []));
  });
}

export function rowFirst(matrix: EngineMatrix): EngineValue[] {
  const values: EngineValue[] = [];
  for (let r = 0; r < (matrix[0]?.length ?? 0); r++) for (const column of matrix) values.push(column[r]!);
  return values;
}

/** Functions the engine (19.3.7) has, but with other values or error codes than Excel. */
import { isEngineError } from "../engine-values";
import type { EngineArgument, EngineError, EngineLibrary, EngineValue } from "../types";
import { correct, numberOf } from "./define";
import { fail } from "./elementary";

/** Outside their range Excel gives #NUM!, the engine its general error. */
const OUT_OF_RANGE_IS_NUM = ["SQRT", "LN", "LOG", "ASIN", "ACOS", "ACOSH", "ATANH", "LARGE", "SMALL", "PERCENTILE", "PERCENTILE.INC", "PERCENTILE.EXC", "QUARTILE", "QUARTILE.INC", "QUARTILE.EXC"];
/** Without a match Excel gives #N/A. */
const NO_MATCH_IS_NA = ["IFS", "SWITCH"];
/** How the sentence begins of a TEXT whose format is beyond the engine. */
export const UNKNOWN_FORMAT = "TEXT's format";
const SCIENTIFIC_FORMAT = /^([0#]+)(?:\.([0#]+))?E([+-])(0+)$/i;

export function installCorrections(library: EngineLibrary): void {
  for (const name of OUT_OF_RANGE_IS_NUM) {
    correct(library, name, (given, args) => (isGeneralError(given) && args.every(canBeNumber) ? fail((given as EngineValue).message ?? "The number is out of range.") : undefined));
  }
  for (const name of NO_MATCH_IS_NA) correct(library, name, (given, args) => (isGeneralError(given) && !args.some(holdsError) ? fail((given as EngineValue).message ?? "No match.", "#N/A") : undefined));
  indexAlongARow(library);
  correct(library, "INDEX", (given, args) => (isGeneralError(given) && !args.some(holdsError) ? fail((given as EngineValue).message ?? "Out of range.", "#REF!") : undefined));
  correct(library, "POWER", (given, args) => {
    if (isGeneralError(given) && args.every(canBeNumber)) fail((given as EngineValue).message ?? "The power has no real value.");
    if (isEngineError(given as EngineArgument)) return undefined;
    const [base, exponent] = args.map((arg) => numberOf(arg));
    if (base === 0 && exponent === 0) fail("0 to the power 0 has no value.");
    if (base === 0 && exponent! < 0) fail("0 to a negative power has no value.", "#DIV/0!");
    return undefined;
  });
  // Excel rounds the decimal number that is shown: 1.005 to two places is 1.01, although the double lies below it.
  correct(library, "ROUND", (given, args) => {
    if (isEngineError(given as EngineArgument) || Array.isArray(given)) return undefined;
    return { ...(given as EngineValue), value: roundDecimal(numberOf(args[0]), Math.trunc(numberOf(args[1]))) };
  });
  correctText(library);
}

/** INDEX of a single row with one number counts along the row; the engine counts rows. */
function indexAlongARow(library: EngineLibrary): void {
  const registry = library.registries.functionRegistry;
  const entry = registry.content.INDEX!;
  const original = entry.compute;
  registry.replace("INDEX", {
    ...entry,
    compute(...args) {
      const [reference, place] = args;
      const isRow = args.length === 2 && Array.isArray(reference) && reference.length > 1 && reference[0]!.length === 1;
      return isRow ? original.call(this, reference, { value: 1 }, place) : original.apply(this, args);
    },
  });
}

/** TEXT with a format such as 0.00E+00, which the engine's format reader does not know; it throws on others it does not know, and on texts. */
function correctText(library: EngineLibrary): void {
  const registry = library.registries.functionRegistry;
  const entry = registry.content.TEXT!;
  const original = entry.compute;
  registry.replace("TEXT", {
    ...entry,
    compute(...args) {
      const [value, format] = args.map((arg) => (Array.isArray(arg) ? arg[0]?.[0] : arg));
      const match = typeof format?.value === "string" ? SCIENTIFIC_FORMAT.exec(format.value) : null;
      if (typeof value?.value === "string" && !isEngineError(value) && typeof format?.value === "string" && Number.isNaN(Number(value.value || NaN))) {
        // A text is shown as it is, except in a format with a section for texts, and except where it spells a number.
        return format.value.includes("@") && format.value !== "@" ? notHere(library, format.value) : { value: value.value };
      }
      if (!match || typeof value?.value !== "number") return readFormat(library, () => original.apply(this, args), String(format?.value));
      const [, , decimals = "", sign, digits] = match;
      const [mantissa, power] = value.value.toExponential(decimals.length).split("e") as [string, string];
      const optional = decimals.length - decimals.replace(/#+$/, "").length;
      const shown = optional > 0 ? mantissa.replace(new RegExp(`\\.?0{1,${optional}}$`), "") : mantissa;
      const exponent = Number(power);
      return { value: `${shown}E${exponent < 0 ? "-" : sign === "+" ? "+" : ""}${String(Math.abs(exponent)).padStart(digits!.length, "0")}` };
    },
  });
}

/** What the engine's format reader gives; where it stumbles, a sentence that the runner knows (why-left.ts). */
function readFormat(library: EngineLibrary, read: () => EngineArgument | EngineError, format: string): EngineArgument | EngineError {
  const stumbled = (given: EngineArgument | EngineError) => /^An unexpected error/.test(String((given as EngineValue | undefined)?.message ?? ""));
  try {
    const given = read();
    return stumbled(given) ? notHere(library, format) : given;
  } catch (error) {
    if (isEngineError(error as EngineArgument) && !stumbled(error as EngineError)) throw error;
    return notHere(library, format);
  }
}

function notHere(library: EngineLibrary, format: string): EngineError {
  return new library.EvaluationError(`${UNKNOWN_FORMAT} "${format}" is not known here.`, "#ERROR");
}

/** Half away from zero on the 15 digits Excel sees. */
export function roundDecimal(x: number, places: number): number {
  if (!Number.isFinite(x)) return x;
  const [mantissa, exponent] = Math.abs(x).toExponential(14).split("e") as [string, string];
  const shifted = Math.round(Number(`${mantissa}e${Number(exponent) + places}`));
  return Math.sign(x) * Number(`${shifted}e${-places}`) || 0;
}

function isGeneralError(given: unknown): boolean {
  return typeof given === "object" && given !== null && "value" in given && given.value === "#ERROR";
}

/** True where the argument is no reason for #VALUE!. */
function canBeNumber(argument: EngineArgument): boolean {
  return argument === undefined || (Array.isArray(argument) ? !holdsError(argument) : typeof argument.value !== "string" || (argument.value.trim() !== "" && !Number.isNaN(Number(argument.value))));
}

function holdsError(argument: EngineArgument): boolean {
  return Array.isArray(argument) ? argument.some((column) => column.some(isEngineError)) : isEngineError(argument);
}

/** Text, kinds of value, and the engine's own spellings (`SINGLE`, `ERROR.CONSTANT`, the `&` operator). */
import { engineErrorCode, excelErrorCode, isEngineError } from "../engine-values";
import { ERROR_CONSTANT, SINGLE } from "../normalise-formula";
import type { EngineArgument, EngineContext, EngineLibrary, EngineValue } from "../types";
import { ExcelError, addMissing, define, numberOf, rowFirst } from "./define";
import { fail } from "./elementary";
import { roundDecimal } from "./corrections";
import { excelNumberText } from "./number-text";

/** Hidden function behind `&`: the engine's CONCATENATE would join a whole array into one text. */
export const JOIN_PAIR = "JOIN.PAIR";

/** Longest text a cell may hold. */
const LONGEST_TEXT = 32767;
const ERROR_NUMBERS = ["#NULL!", "#DIV/0!", "#VALUE!", "#REF!", "#NAME?", "#NUM!", "#N/A"];

export function installTextAndKind(library: EngineLibrary): void {
  define(library, JOIN_PAIR, "", ["text1 (any)", "text2 (any)"], (a, b) => textOf(a) + textOf(b), true);
  define(library, "CONCATENATE", "Joins texts.", ["text (any, range, repeating)"], (...args) => joined(args));
  define(library, "CONCAT", "Joins texts and ranges of texts.", ["text (any, range, repeating)"], (...args) => joined(args));
  define(library, ERROR_CONSTANT, "", ["code (string)"], (code) => fail("An error written into the formula.", textOf(code)), true);
  library.registries.functionRegistry.replace(SINGLE, {
    description: "The value of a range in the row or column of the formula (@).",
    category: "Excel",
    isExported: true,
    args: [library.helpers.arg("value (any, range)", "Range or array.")],
    compute(value) {
      return intersection(library, this, value);
    },
  });

  addMissing(library, "REPT", "Repeats a text.", ["text (any)", "times (number)"], (text, times) => {
    const count = Math.trunc(numberOf(times));
    const piece = textOf(text);
    return count < 0 || piece.length * count > LONGEST_TEXT ? fail("REPT cannot repeat a text so often.", "#VALUE!") : piece.repeat(count);
  });
  addMissing(library, "FIXED", "A number as text with a fixed number of decimals.", ["number (number)", "decimals (number, optional)", "no_commas (boolean, optional)"], (number, decimals, plain) => {
    const places = Math.trunc(numberOf(decimals, 2));
    if (places > 100) fail("FIXED shows at most 100 decimals.", "#VALUE!");
    const [whole, part] = Math.abs(roundDecimal(numberOf(number), places)).toFixed(Math.max(places, 0)).split(".");
    const shown = numberOf(plain) !== 0 ? whole! : whole!.replace(/\B(?=(\d{3})+$)/g, ",");
    return `${numberOf(number) < 0 && /[1-9]/.test(whole! + (part ?? "")) ? "-" : ""}${shown}${part === undefined ? "" : `.${part}`}`;
  });
  addMissing(library, "NUMBERVALUE", "The number a text spells, with given separators.", ["text (any)", "decimal_mark (string, optional)", "group_mark (string, optional)"], (text, decimal, group) => {
    const [point, comma] = [decimal === undefined ? "." : textOf(decimal)[0], group === undefined ? "," : textOf(group)[0]];
    const [, body, percents] = /^(.*?)(%*)$/s.exec(textOf(text).replace(/\s/g, ""))!;
    const [whole, ...rest] = body!.split(point ?? ".");
    const spelt = [whole!.split(comma ?? ",").join(""), ...rest].join(".");
    if (spelt === "") return 0;
    return /^[+-]?(?:\d+\.?\d*|\.\d+)(?:E[+-]?\d+)?$/i.test(spelt) ? Number(spelt) / 100 ** percents!.length : fail(`"${textOf(text)}" spells no number.`, "#VALUE!");
  });
  addMissing(library, "UNICODE", "Number of the first character.", ["text (any)"], (text) => textOf(text).codePointAt(0) ?? fail("UNICODE needs a text.", "#VALUE!"));
  addMissing(library, "CODE", "Number of the first character.", ["text (any)"], (text) => {
    const code = textOf(text).codePointAt(0) ?? fail("CODE needs a text.", "#VALUE!");
    return code < 256 ? code : 63;
  });
  addMissing(library, "UNICHAR", "Character of a number.", ["number (number)"], (number) => {
    const code = Math.trunc(numberOf(number));
    return code < 1 || code > 0x10ffff ? fail("UNICHAR needs a character's number.", "#VALUE!") : String.fromCodePoint(code);
  });
  addMissing(library, "N", "A number for a number, truth value or anything else (0).", ["value (any)"], (value) => {
    const v = single(value);
    if (isEngineError(v)) return v;
    return typeof v.value === "number" || typeof v.value === "boolean" ? Number(v.value) : 0;
  });
  addMissing(library, "T", "A text, or nothing for anything else.", ["value (any)"], (value) => (isEngineError(value) || typeof single(value).value === "string" ? single(value) : ""));
  addMissing(library, "TYPE", "Kind of a value: 1 number, 2 text, 4 truth value, 16 error, 64 array.", ["value (any, range)"], (value) => {
    if (Array.isArray(value) && (value.length > 1 || value[0]!.length > 1)) return 64;
    const v = single(value);
    return isEngineError(v) ? 16 : typeof v.value === "string" ? 2 : typeof v.value === "boolean" ? 4 : 1;
  });
  addMissing(library, "ERROR.TYPE", "Number of an error.", ["value (any)"], (value) => {
    const v = single(value);
    const index = isEngineError(v) ? ERROR_NUMBERS.indexOf(excelErrorCode(v.value)) : -1;
    return index < 0 ? fail("The value is no error.", "#N/A") : index + 1;
  });
}

/** A value as Excel joins it to text; an error goes on as that error. */
export function textOf(argument: EngineArgument): string {
  const { value, message } = single(argument);
  if (value === null) return "";
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  if (typeof value === "number") return excelNumberText(value);
  if (isEngineError({ value })) throw new ExcelError(excelErrorCode(value), message ?? value);
  return value;
}

function joined(args: EngineArgument[]): string {
  const text = args.map((argument) => (Array.isArray(argument) ? rowFirst(argument).map(textOf).join("") : textOf(argument))).join("");
  return text.length > LONGEST_TEXT ? fail(`The text would be longer than ${LONGEST_TEXT} characters.`, "#VALUE!") : text;
}

function single(argument: EngineArgument): EngineValue {
  return (Array.isArray(argument) ? argument[0]?.[0] : argument) ?? { value: null };
}

/** Excel's implicit intersection: a column is read in the formula's row, a row in its column, an array at its first cell. */
function intersection(library: EngineLibrary, context: EngineContext, argument: EngineArgument) {
  const matrix = Array.isArray(argument) ? argument : [[argument ?? { value: null }]];
  const first = matrix[0]?.[0] ?? { value: null };
  const [columns, rows] = [matrix.length, matrix[0]?.length ?? 0];
  const origin = context.__originCellPosition;
  const start = first.position;
  if ((columns === 1 && rows === 1) || !start || !origin || matrix.at(-1)?.at(-1)?.position?.col !== start.col + columns - 1) return first;
  const column = columns === 1 ? 0 : origin.col - start.col;
  const row = rows === 1 ? 0 : origin.row - start.row;
  return matrix[column]?.[row] ?? new library.EvaluationError("The range has no cell in the formula's row and column.", engineErrorCode("#VALUE!"));
}

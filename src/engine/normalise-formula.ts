/**
 * Formula text as Excel users type it, or as a workbook file stores it → text the engine (19.3.7) can tokenise, keep and show.
 *
 * The engine's tokeniser reads `LOG10` as a cell, does not know `""` inside a string, takes a backslash before a quote for an
 * escape, and has no `@`, no error constants and no call of a call. Each of these gets a spelling of its own below, which
 * `excelText` (excel-text.ts) turns back; text inside strings and quoted sheet names is never looked at.
 */
import { closingWord, formulaWords, isMark, nextSolid, previousSolid, type FormulaWord } from "./formula-words";

/** The engine's spelling of LOG10: no cell has a dot in its name. */
export const ENGINE_LOG10 = "LOG.10";
/** Error constants other than #REF! and #N/A. */
export const ERROR_CONSTANT = "ERROR.CONSTANT";
/** `f(a)(b)` → `CALL.LAMBDA(f(a),b)`. */
export const CALL_LAMBDA = "CALL.LAMBDA";
/** `@x`, in files `_xlfn.SINGLE(x)`. */
export const SINGLE = "SINGLE";

const STORED_PREFIX = /^(?:_xlfn\.|_xlws\.|_xlpm\.|_xleta\.)+/i;
const ADD_IN_PREFIX = /^_xldudf_/i;
const REFERENCE = /^(?:[^!]*!)?\$?[A-Z]{1,3}\$?[0-9]{1,7}$/i;

/** Makes the normaliser for a set of functions of our own, e.g. `WALL.THWAITES_MARCH`. */
export function makeNormaliser(functionNames: readonly string[]): (formula: string) => string {
  const stored = new Map(functionNames.map((name) => [storedAddInName(name).toUpperCase(), name]));
  return (formula) => {
    let words = formulaWords(formula);
    words = words.map((word, i) => (word.kind === "name" ? plainName(word, words[nextSolid(words, i)], stored) : word));
    words = constants(words);
    words = anchorArrays(words);
    words = atSigns(words);
    words = callsOfCalls(words);
    return words.map((word) => word.text).join("");
  };
}

/** `WALL.THWAITES_MARCH` → `_xldudf_WALL_THWAITES_MARCH`, the spelling of an add-in call in a workbook file. */
export function storedAddInName(name: string): string {
  return `_xldudf_${name.replace(/\./g, "_")}`;
}

function plainName(word: FormulaWord, next: FormulaWord | undefined, stored: ReadonlyMap<string, string>): FormulaWord {
  let text = word.text.replace(STORED_PREFIX, "");
  if (ADD_IN_PREFIX.test(text)) text = stored.get(text.toUpperCase()) ?? text;
  if (isMark(next, "(") && /^LOG10$/i.test(text)) text = ENGINE_LOG10;
  return text === word.text ? word : { kind: "name", text };
}

/** Strings with a quote or an ending backslash, and error constants. */
function constants(words: readonly FormulaWord[]): FormulaWord[] {
  const result: FormulaWord[] = [];
  words.forEach((word) => {
    if (word.kind === "string") result.push(...stringWords(word));
    else if (word.kind === "error") {
      const code = word.text.toUpperCase();
      const sheet = previousSolid(result, result.length);
      if (/^#REF/.test(code)) {
        // `Sheet1!#REF!`: the engine's invalid reference takes no sheet.
        if (result[sheet]?.kind === "name" && result[sheet].text.endsWith("!")) {
          result.length = sheet;
          if (result.at(-1)?.kind === "quoted") result.pop();
        }
        result.push({ kind: "error", text: "#REF" });
      } else result.push(name(ERROR_CONSTANT), mark("("), { kind: "string", text: `"${code}"` }, mark(")"));
    } else result.push(word);
  });
  return result;
}

function stringWords(word: FormulaWord): FormulaWord[] {
  const closed = word.text.length > 1 && word.text.endsWith('"');
  if (!closed) return [word];
  const inside = word.text.slice(1, -1);
  if (!inside.includes('""') && !inside.endsWith("\\")) return [word];
  // Cut at every doubled quote, and at each backslash of a run that ends at a quote.
  const result: FormulaWord[] = [mark("(")];
  let chunk = "";
  const cut = (code: number) => {
    result.push({ kind: "string", text: `"${chunk}"` }, mark("&"), name("CHAR"), mark("("), { kind: "number", text: String(code) }, mark(")"), mark("&"));
    chunk = "";
  };
  for (let i = 0; i < inside.length; i++) {
    if (inside.startsWith('""', i)) {
      cut(34);
      i++;
    } else if (/^\\+(?:"|$)/.test(inside.slice(i))) cut(92);
    else chunk += inside[i];
  }
  result.push({ kind: "string", text: `"${chunk}"` }, mark(")"));
  return result;
}

/** `ANCHORARRAY(D5)` → `D5#`. */
function anchorArrays(words: readonly FormulaWord[]): FormulaWord[] {
  const result: FormulaWord[] = [];
  for (let i = 0; i < words.length; i++) {
    const open = nextSolid(words, i);
    const close = words[i]!.kind === "name" && /^ANCHORARRAY$/i.test(words[i]!.text) && isMark(words[open], "(") ? closingWord(words, open) : -1;
    const inner = close < 0 ? [] : words.slice(open + 1, close).filter((word) => word.kind !== "space");
    if (close >= 0 && REFERENCE.test(inner.map((word) => word.text).join("")) && inner.every((word) => word.kind === "name" || word.kind === "quoted")) {
      result.push(...inner, mark("#"));
      i = close;
    } else result.push(words[i]!);
  }
  return result;
}

/** `@A1` → `A1`; `@A1:A9`, `@name`, `@f(x)` → `SINGLE(…)`. */
function atSigns(words: readonly FormulaWord[]): FormulaWord[] {
  const result = [...words];
  for (let i = result.length - 1; i >= 0; i--) {
    if (!isMark(result[i], "@")) continue;
    const start = nextSolid(result, i);
    const end = operandEnd(result, start);
    if (end <= start) continue;
    const operand = result.slice(start, end);
    const single = REFERENCE.test(operand.map((word) => word.text).join(""));
    result.splice(i, end - i, ...(single ? operand : [name(SINGLE), mark("("), ...operand, mark(")")]));
  }
  return result;
}

/** Where the operand that starts at `start` ends: a reference, range, name, spill, call or bracketed expression. */
export function operandEnd(words: readonly FormulaWord[], start: number): number {
  let end = start;
  if (words[end]?.kind === "quoted") end++;
  if (words[end]?.kind === "name") end++;
  if (isMark(words[end], "(")) {
    const close = closingWord(words, end);
    if (close < 0) return start;
    end = close + 1;
  }
  if (isMark(words[end], "#")) end++;
  else if (isMark(words[end], ":") && words[end + 1]?.kind === "name") end += 2;
  return end;
}

/** `LAMBDA(x,x+1)(2)` → `CALL.LAMBDA(LAMBDA(x,x+1),2)`. */
function callsOfCalls(words: readonly FormulaWord[]): FormulaWord[] {
  let result = [...words];
  for (let close = 0; close < result.length; close++) {
    const open = nextSolid(result, close);
    if (!isMark(result[close], ")") || !isMark(result[open], "(")) continue;
    const end = closingWord(result, open);
    const start = operandStart(result, close);
    if (end < 0 || start < 0) return result;
    const rest = result.slice(open + 1, end);
    const args = rest.some((word) => word.kind !== "space") ? [mark(","), ...rest] : [];
    result = [...result.slice(0, start), name(CALL_LAMBDA), mark("("), ...result.slice(start, close + 1), ...args, ...result.slice(end)];
    close = start;
  }
  return result;
}

/** Where the call or bracketed expression that ends at `close` starts, or -1. */
function operandStart(words: readonly FormulaWord[], close: number): number {
  let depth = 0;
  for (let i = close; i >= 0; i--) {
    if (isMark(words[i], ")")) depth++;
    else if (isMark(words[i], "(") && --depth === 0) {
      const before = previousSolid(words, i);
      return words[before]?.kind === "name" ? before : i;
    }
  }
  return -1;
}

function mark(text: string): FormulaWord {
  return { kind: "mark", text };
}

function name(text: string): FormulaWord {
  return { kind: "name", text };
}

/** The engine's formula text → what Excel shows for it: the reverse of `normalise-formula.ts`. */
import { closingWord, formulaWords, isMark, type FormulaWord } from "./formula-words";
import { CALL_LAMBDA, ENGINE_LOG10, ERROR_CONSTANT, SINGLE, operandEnd } from "./normalise-formula";

const NOTHING_TO_DO = new RegExp([ENGINE_LOG10, ERROR_CONSTANT, CALL_LAMBDA, SINGLE, "CHAR(", "#REF"].map((text) => text.replace(/[.(]/g, "\\$&")).join("|"), "i");

/** `=LOG.10(("a"&CHAR(34)&"b"))` → `=LOG10("a""b")`; text without such spellings comes back as it is. */
export function excelText(formula: string): string {
  if (!NOTHING_TO_DO.test(formula)) return formula;
  return textOf(formulaWords(formula));
}

function textOf(words: readonly FormulaWord[]): string {
  let text = "";
  for (let i = 0; i < words.length; i++) {
    const word = words[i]!;
    const open = i + 1;
    const close = word.kind === "name" && isMark(words[open], "(") ? closingWord(words, open) : -1;
    const call = close < 0 ? "" : word.text.toUpperCase();
    const inside = close < 0 ? [] : words.slice(open + 1, close);
    if (call === ENGINE_LOG10) text += "LOG10";
    else if (call === ERROR_CONSTANT && inside.length === 1 && inside[0]!.kind === "string") {
      text += inside[0]!.text.slice(1, -1);
      i = close;
    } else if (call === SINGLE) {
      text += operandEnd(inside, 0) === inside.length ? `@${textOf(inside)}` : `@(${textOf(inside)})`;
      i = close;
    } else if (call === CALL_LAMBDA) {
      const cut = firstSeparator(inside);
      text += `${textOf(inside.slice(0, cut))}(${textOf(inside.slice(cut + 1))})`;
      i = close;
    } else if (isMark(word, "(") && words[i - 1]?.kind !== "name" && !isMark(words[i - 1], ")") && joinedString(words, i)) {
      const joined = joinedString(words, i)!;
      text += joined.text;
      i = joined.end;
    } else text += word.kind === "error" && word.text.toUpperCase() === "#REF" ? "#REF!" : word.text;
  }
  return text;
}

/** `("a"&CHAR(34)&"b")` from its opening bracket → the string it spells. */
function joinedString(words: readonly FormulaWord[], open: number): { text: string; end: number } | undefined {
  let text = "";
  let cuts = 0;
  for (let i = open + 1; words[i]?.kind === "string"; ) {
    text += words[i]!.text.slice(1, -1);
    if (isMark(words[i + 1], ")")) return cuts > 0 ? { text: `"${text}"`, end: i + 1 } : undefined;
    const [and, char, bracket, code, closing, again] = words.slice(i + 1, i + 7);
    const isCut = isMark(and, "&") && /^CHAR$/i.test(char?.text ?? "") && isMark(bracket, "(") && isMark(closing, ")") && isMark(again, "&");
    if (!isCut || (code?.text !== "34" && code?.text !== "92")) return undefined;
    text += code.text === "34" ? '""' : "\\";
    cuts++;
    i += 7;
  }
  return undefined;
}

function firstSeparator(words: readonly FormulaWord[]): number {
  let depth = 0;
  for (let i = 0; i < words.length; i++) {
    if (isMark(words[i], "(") || isMark(words[i], "{")) depth++;
    else if (isMark(words[i], ")") || isMark(words[i], "}")) depth--;
    else if (depth === 0 && isMark(words[i], ",")) return i;
  }
  return words.length;
}

/** Splits Excel formula text into words without losing a character: joining the texts gives the formula back. */

export type FormulaWordKind = "string" | "quoted" | "bracket" | "name" | "number" | "error" | "space" | "mark";

export interface FormulaWord {
  kind: FormulaWordKind;
  text: string;
}

const KINDS: readonly [FormulaWordKind, RegExp][] = [
  ["string", /"(?:[^"]|"")*"?/y],
  ["quoted", /'(?:[^']|'')*'?/y],
  ["bracket", /\[(?:[^[\]']|'.|\[(?:[^[\]']|'.)*\])*\]/y],
  ["error", /#(?:N\/A|DIV\/0!|NAME\?|NULL!|NUM!|VALUE!|REF!?|SPILL!|CALC!|GETTING_DATA|BLOCKED!|FIELD!|CONNECT!|BUSY!|UNKNOWN!)/iy],
  ["number", /(?:[0-9]+\.?[0-9]*|\.[0-9]+)(?:E[+-]?[0-9]+)?(?![\p{L}\p{N}_.])/iuy],
  ["name", /[\p{L}\p{N}_$\\.!][\p{L}\p{N}_$\\.?!]*/uy],
  ["space", /\s+/uy],
  ["mark", /<>|<=|>=|[\s\S]/uy],
];

/** The words of a formula, with or without its leading `=`. */
export function formulaWords(formula: string): FormulaWord[] {
  const words: FormulaWord[] = [];
  for (let at = 0; at < formula.length; ) {
    const word = wordAt(formula, at);
    words.push(word);
    at += word.text.length;
  }
  return words;
}

function wordAt(formula: string, at: number): FormulaWord {
  for (const [kind, pattern] of KINDS) {
    pattern.lastIndex = at;
    const match = pattern.exec(formula);
    if (match) return { kind, text: match[0] };
  }
  throw new Error(`No word at ${at} of ${formula}`);
}

/** Index of the word that closes the bracket opened at `open`, or -1. */
export function closingWord(words: readonly FormulaWord[], open: number): number {
  let depth = 0;
  for (let i = open; i < words.length; i++) {
    if (isMark(words[i], "(") || isMark(words[i], "{")) depth++;
    else if ((isMark(words[i], ")") || isMark(words[i], "}")) && --depth === 0) return i;
  }
  return -1;
}

export function isMark(word: FormulaWord | undefined, text: string): boolean {
  return word?.kind === "mark" && word.text === text;
}

/** Index of the nearest word after `at` that is not a space. */
export function nextSolid(words: readonly FormulaWord[], at: number): number {
  let i = at + 1;
  while (words[i]?.kind === "space") i++;
  return i;
}

/** Index of the nearest word before `at` that is not a space, or -1. */
export function previousSolid(words: readonly FormulaWord[], at: number): number {
  let i = at - 1;
  while (i >= 0 && words[i]!.kind === "space") i--;
  return i;
}

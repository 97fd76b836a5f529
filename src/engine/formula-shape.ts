/**
 * Reads the engine's formula shapes with Excel's rules of precedence.
 *
 * A shape is the text of a formula with `|C|` for a cell, `|R|` for a range, `|N|` for a number and `|S|` for a string, without
 * spaces (`compilationCacheKey` in 19.3.7): `=-A1^2+"x"` has the shape `=-|C|^|N|+|S|`. Every formula of one shape shares one
 * compiled function; its own references, literals and symbols are numbered in the order in which they stand.
 *
 * Excel's order, strongest first: `#` (spill), unary minus and plus, `%`, `^`, `*` `/`, `+` `-`, `&`, comparison; all binary
 * operators group to the left, so `-2^2` is 4 and `2^3^2` is 64 (Microsoft, "Calculation operators and precedence in Excel").
 */

export type BinaryOperator = "=" | "<>" | "<" | ">" | "<=" | ">=" | "&" | "+" | "-" | "*" | "/" | "^";

export type Expression =
  | { kind: "reference"; index: number; isRange: boolean }
  | { kind: "number" | "string"; index: number }
  | { kind: "boolean"; value: boolean }
  | { kind: "omitted" }
  | { kind: "name"; name: string; symbol: number }
  | { kind: "unary"; operator: "+" | "-" | "%" | "#"; operand: Expression }
  | { kind: "binary"; operator: BinaryOperator; left: Expression; right: Expression }
  | { kind: "array"; rows: Expression[][] }
  | { kind: "call"; name: string; args: Expression[] };

const PRECEDENCE: Readonly<Record<string, number>> = { "=": 1, "<>": 1, "<": 1, ">": 1, "<=": 1, ">=": 1, "&": 2, "+": 3, "-": 3, "*": 4, "/": 4, "^": 5 };
const WORD = /(\|[CRNS]\||'(?:[^']|'')*'[^\s(),;{}]*|[\p{L}\p{N}_.!$\\]+|<>|<=|>=|[-+*/^&=<>%#(){},;:])/uy;
const SYMBOL = /^['\p{L}\p{N}_.!$\\]/u;

/** Why a shape cannot be read; the engine shows the message in the cell. */
export class FormulaError extends Error {}

/** The expression behind a shape; throws a FormulaError with a sentence. */
export function parseShape(shape: string): Expression {
  const words = splitShape(shape);
  const count = { reference: 0, number: 0, string: 0, symbol: 0 };
  let at = 0;

  const expression = parseBinary(0);
  if (at < words.length) throw new FormulaError(words[at] === ":" ? "A range between two results (a:b) is not supported." : `Unexpected ${words[at]}.`);
  return expression;

  function parseBinary(weakest: number): Expression {
    let left = parsePercent();
    for (;;) {
      const operator = words[at] as BinaryOperator | undefined;
      const precedence = operator === undefined ? undefined : PRECEDENCE[operator];
      if (precedence === undefined || precedence <= weakest) return left;
      at++;
      left = { kind: "binary", operator: operator!, left, right: parseBinary(precedence) };
    }
  }

  function parsePercent(): Expression {
    let operand = parseSign();
    for (; words[at] === "%"; at++) operand = { kind: "unary", operator: "%", operand };
    return operand;
  }

  function parseSign(): Expression {
    const word = words[at];
    if (word !== "-" && word !== "+") return parseSpill();
    at++;
    return { kind: "unary", operator: word, operand: parseSign() };
  }

  function parseSpill(): Expression {
    let operand = parseOperand();
    for (; words[at] === "#"; at++) operand = { kind: "unary", operator: "#", operand };
    return operand;
  }

  function parseOperand(): Expression {
    const word = words[at++];
    if (word === undefined) throw new FormulaError("The formula ends early.");
    if (word === "|C|" || word === "|R|") return { kind: "reference", index: count.reference++, isRange: word === "|R|" };
    if (word === "|N|") return { kind: "number", index: count.number++ };
    if (word === "|S|") return { kind: "string", index: count.string++ };
    if (word === "{") return parseArray();
    if (word === "(") {
      const inner = parseBinary(0);
      expect(")");
      return inner;
    }
    if (!SYMBOL.test(word)) throw new FormulaError(`Unexpected ${word}.`);
    const symbol = count.symbol++;
    if (words[at] === "(") {
      at++;
      return { kind: "call", name: word.toUpperCase(), args: parseArguments() };
    }
    if (/^(?:true|false)$/i.test(word)) return { kind: "boolean", value: /^true$/i.test(word) };
    return { kind: "name", name: word.replace(/^'|'$/g, ""), symbol };
  }

  function parseArguments(): Expression[] {
    const args: Expression[] = [];
    if (words[at] === ")") {
      at++;
      return args;
    }
    for (;;) {
      args.push(words[at] === "," || words[at] === ")" ? { kind: "omitted" } : parseBinary(0));
      if (words[at] === ",") at++;
      else {
        expect(")");
        return args;
      }
    }
  }

  function parseArray(): Expression {
    const rows: Expression[][] = [[]];
    for (;;) {
      rows.at(-1)!.push(parseBinary(0));
      const word = words[at++];
      if (word === ";") rows.push([]);
      else if (word === "}") return { kind: "array", rows };
      else if (word !== ",") throw new FormulaError(`Unexpected ${word ?? "end"} inside { }.`);
    }
  }

  function expect(word: string): void {
    if (words[at] !== word) throw new FormulaError(words[at] === undefined ? `A ${word} is missing.` : `Unexpected ${words[at]}, where ${word} is needed.`);
    at++;
  }
}

function splitShape(shape: string): string[] {
  const words: string[] = [];
  WORD.lastIndex = shape.startsWith("=") ? 1 : 0;
  while (WORD.lastIndex < shape.length) {
    const start = WORD.lastIndex;
    const match = WORD.exec(shape);
    if (!match) throw new FormulaError(`Unexpected ${shape[start]}.`);
    words.push(match[1]!);
  }
  return words;
}

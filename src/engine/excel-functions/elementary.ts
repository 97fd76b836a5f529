/** Numbers: functions Excel has and the engine (19.3.7) lacks. Source of definitions: Excel documentation, from memory. */
import * as formulajs from "@formulajs/formulajs";
import { ENGINE_LOG10 } from "../normalise-formula";
import type { EngineLibrary } from "../types";
import { ExcelError, addMissing, numberOf, numbersOf } from "./define";
import { complementaryErrorFunction, errorFunction } from "./error-function";

/** Largest n whose factorial a double holds. */
const LARGEST_FACTORIAL = 170;
const LARGEST_BIT_NUMBER = 2 ** 48;

export function installElementary(library: EngineLibrary): void {
  const one = (name: string, description: string, f: (x: number) => number) => addMissing(library, name, description, ["number (number)"], (x) => f(numberOf(x)));
  const two = (name: string, description: string, first: string, second: string, f: (a: number, b: number) => number) =>
    addMissing(library, name, description, [`${first} (number)`, `${second} (number)`], (a, b) => f(numberOf(a), numberOf(b)));
  const pooled = (name: string, description: string, f: (numbers: number[]) => number) => addMissing(library, name, description, ["number (any, range, repeating)"], (...args) => f(numbersOf(args)));

  for (const name of ["LOG10", ENGINE_LOG10]) {
    one(name, "Logarithm to the base 10.", (x) => (x > 0 ? Math.log10(x) : fail("LOG10 needs a number above 0.")));
  }
  library.registries.functionRegistry.content[ENGINE_LOG10]!.hidden = true;
  one("SIGN", "1, 0 or -1 for a positive number, zero or a negative number.", Math.sign);
  one("RADIANS", "An angle in degrees, in radians.", (x) => (x * Math.PI) / 180);
  one("SQRTPI", "Square root of the number times pi.", (x) => Math.sqrt(notNegative("SQRTPI", x) * Math.PI));
  one("EVEN", "The number rounded away from zero to an even one.", (x) => Math.sign(x) * Math.ceil(Math.abs(x) / 2) * 2 || 0);
  one("FACT", "Factorial.", (x) => (Math.trunc(notNegative("FACT", x)) > LARGEST_FACTORIAL ? fail("FACT is too large a number here.") : asNumber(formulajs.FACT(Math.trunc(x)))));
  one("FACTDOUBLE", "Double factorial.", (x) => (Math.trunc(x) < 1 ? (Math.trunc(x) >= -1 ? 1 : fail("FACTDOUBLE needs -1 or more.")) : asNumber(formulajs.FACTDOUBLE(Math.trunc(x)))));
  one("ERF.PRECISE", "Error function from 0 to the limit.", errorFunction);
  one("ERFC", "Complementary error function.", complementaryErrorFunction);
  one("ERFC.PRECISE", "Complementary error function.", complementaryErrorFunction);
  addMissing(library, "ERF", "Error function between two limits, or from 0.", ["lower_limit (number)", "upper_limit (number, optional)"], (a, b) =>
    b === undefined ? errorFunction(numberOf(a)) : errorFunction(numberOf(b)) - errorFunction(numberOf(a)),
  );

  two("QUOTIENT", "Whole part of a division.", "numerator", "denominator", (a, b) => (b === 0 ? fail("QUOTIENT divides by zero.", "#DIV/0!") : Math.trunc(a / b)));
  two("COMBIN", "Number of combinations of k out of n.", "number", "number_chosen", (n, k) => asNumber(formulajs.COMBIN(...counts("COMBIN", n, k))));
  two("PERMUT", "Number of permutations of k out of n.", "number", "number_chosen", (n, k) => permutations(...counts("PERMUT", n, k)));
  two("MROUND", "The number rounded to a multiple.", "number", "multiple", (x, step) => {
    if (x * step < 0) fail("MROUND needs a number and a multiple of the same sign.");
    // Divided first and cleaned to 15 digits, so that 1.3 to 0.2 is 1.4 and not a neighbour of it.
    return step === 0 ? 0 : Number((Math.round(Number((x / step).toPrecision(15))) * step).toPrecision(15));
  });
  two("BITAND", "Bitwise and.", "number1", "number2", (a, b) => bits(a, b, (p, q) => p & q));
  two("BITOR", "Bitwise or.", "number1", "number2", (a, b) => bits(a, b, (p, q) => p | q));
  two("BITXOR", "Bitwise exclusive or.", "number1", "number2", (a, b) => bits(a, b, (p, q) => p ^ q));

  pooled("SUMSQ", "Sum of squares.", (numbers) => numbers.reduce((sum, x) => sum + x * x, 0));
  pooled("GCD", "Greatest common divisor.", (numbers) => numbers.map((x) => Math.trunc(notNegative("GCD", x))).reduce(divisor, 0));
  pooled("LCM", "Least common multiple.", (numbers) =>
    numbers.map((x) => Math.trunc(notNegative("LCM", x))).reduce((a, b) => (a === 0 || b === 0 ? 0 : (a / divisor(a, b)) * b), 1),
  );
  pooled("MULTINOMIAL", "Factorial of a sum over the product of factorials.", (numbers) => {
    let ways = 1;
    let total = 0;
    for (const x of numbers) for (let k = 1; k <= Math.trunc(notNegative("MULTINOMIAL", x)); k++) ways = (ways * ++total) / k;
    return Math.round(ways);
  });
}

/** What formulajs gives: a number, or an Error whose message is Excel's code. */
export function asNumber(value: unknown): number {
  if (value instanceof Error) throw new ExcelError(value.message, `The numbers are outside the function's range.`);
  if (typeof value !== "number" || Number.isNaN(value)) throw new ExcelError("#NUM!", "The numbers are outside the function's range.");
  return value;
}

export function fail(message: string, code = "#NUM!"): never {
  throw new ExcelError(code, message);
}

function notNegative(name: string, x: number): number {
  return x < 0 ? fail(`${name} needs a number of at least 0.`) : x;
}

function counts(name: string, n: number, k: number): [number, number] {
  const [whole, part] = [Math.trunc(n), Math.trunc(k)];
  return part < 0 || whole < part ? fail(`${name} needs 0 ≤ number_chosen ≤ number.`) : [whole, part];
}

function permutations(n: number, k: number): number {
  let ways = 1;
  for (let i = 0; i < k; i++) ways *= n - i;
  return ways;
}

function divisor(a: number, b: number): number {
  return b === 0 ? a : divisor(b, a % b);
}

function bits(a: number, b: number, combine: (p: bigint, q: bigint) => bigint): number {
  if (![a, b].every((x) => Number.isInteger(x) && x >= 0 && x < LARGEST_BIT_NUMBER)) fail("Bit functions need whole numbers from 0 to 2^48-1.");
  return Number(combine(BigInt(a), BigInt(b)));
}

/** Bessel functions, number bases, shifts and the rest of Excel's engineering group that the engine (19.3.7) lacks. */
import * as formulajs from "@formulajs/formulajs";
import type { EngineArgument, EngineLibrary } from "../types";
import { besselI, besselJ, besselK, besselY } from "./bessel";
import { addMissing, numberOf, numbersOf } from "./define";
import { asNumber, fail } from "./elementary";
import { textOf } from "./text-and-kind";

const LARGEST_BIT_NUMBER = 2 ** 48;
const LARGEST_SHIFT = 53;
/** Digits a number in base 2, 8 or 16 may have; its first digit tells the sign. */
const BASE_DIGITS = 10;
const BASES = { BIN: 2, OCT: 8, HEX: 16 } as const;

export function installEngineering(library: EngineLibrary): void {
  const bessel = (name: string, f: (x: number, n: number) => number, onlyAbove0: boolean) =>
    addMissing(library, name, "Bessel function of whole order.", ["x (number)", "order (number)"], (x, n) => {
      const order = Math.trunc(numberOf(n));
      if (order < 0) fail(`${name} needs an order of at least 0.`);
      return onlyAbove0 && numberOf(x) <= 0 ? fail(`${name} needs x above 0.`) : f(numberOf(x), order);
    });
  bessel("BESSELJ", besselJ, false);
  bessel("BESSELI", besselI, false);
  bessel("BESSELK", besselK, true);
  bessel("BESSELY", besselY, true);

  for (const [from, base] of Object.entries(BASES)) {
    addMissing(library, `${from}2DEC`, `A number in base ${base}, in base 10.`, ["number (any)"], (x) => fromBase(x, base));
    addMissing(library, `DEC2${from}`, `A number in base ${base}.`, ["number (number)", "places (number, optional)"], (x, places) => toBase(Math.trunc(numberOf(x)), base, places));
    for (const [to, other] of Object.entries(BASES)) {
      if (to !== from) addMissing(library, `${from}2${to}`, `A number in base ${base}, in base ${other}.`, ["number (any)", "places (number, optional)"], (x, places) => toBase(fromBase(x, base), other, places));
    }
  }
  addMissing(library, "BASE", "A number in any base.", ["number (number)", "base (number)", "least_length (number, optional)"], (x, base, length) => {
    const [n, radix] = [Math.trunc(numberOf(x)), Math.trunc(numberOf(base))];
    return n >= 0 && n < 2 ** 53 && radix >= 2 && radix <= 36 ? n.toString(radix).toUpperCase().padStart(numberOf(length), "0") : fail("BASE needs a number of at least 0 and a base from 2 to 36.");
  });
  const shift = (name: string, sign: number) =>
    addMissing(library, name, "Bits shifted.", ["number (number)", "shift (number)"], (x, by) => {
      const [n, s] = [numberOf(x), sign * Math.trunc(numberOf(by))];
      if (!(Number.isInteger(n) && n >= 0 && n < LARGEST_BIT_NUMBER && Math.abs(s) <= LARGEST_SHIFT)) fail("Bit functions need whole numbers from 0 to 2^48-1 and a shift of at most 53.");
      const shifted = Math.floor(n * 2 ** s);
      return shifted < LARGEST_BIT_NUMBER ? shifted : fail(`${name}'s result has more than 48 bits.`);
    });
  shift("BITLSHIFT", 1);
  shift("BITRSHIFT", -1);
  addMissing(library, "GESTEP", "1 where a number reaches a step.", ["number (number)", "step (number, optional)"], (x, step) => Number(numberOf(x) >= numberOf(step)));
  addMissing(library, "COMBINA", "Number of combinations with repetition.", ["number (number)", "number_chosen (number)"], (n, k) => asNumber(formulajs.COMBINA(Math.trunc(numberOf(n)), Math.trunc(numberOf(k)))));
  addMissing(library, "SERIESSUM", "Sum of a power series.", ["x (number)", "first_power (number)", "step (number)", "coefficients (any, range)"], (x, first, step, coefficients) =>
    numbersOf([coefficients]).reduce((sum, c, i) => sum + c * numberOf(x) ** (numberOf(first) + i * numberOf(step)), 0),
  );
  addMissing(library, "ROMAN", "A whole number in Roman digits.", ["number (number)"], (x) => {
    const n = Math.trunc(numberOf(x));
    return n === 0 ? "" : n > 0 && n < 4000 ? String(formulajs.ROMAN(n)) : fail("ROMAN needs a number from 0 to 3999.", "#VALUE!");
  });
}

function fromBase(argument: EngineArgument, base: number): number {
  const text = textOf(argument) || "0";
  const value = new RegExp(`^[${"0123456789ABCDEF".slice(0, base)}]{1,${BASE_DIGITS}}$`, "i").test(text) ? parseInt(text, base) : fail(`"${text}" is no number in base ${base} of at most ${BASE_DIGITS} digits.`);
  return value >= base ** BASE_DIGITS / 2 ? value - base ** BASE_DIGITS : value;
}

function toBase(n: number, base: number, places: EngineArgument): string {
  const half = base ** BASE_DIGITS / 2;
  if (!(n >= -half && n < half)) fail(`The number has more than ${BASE_DIGITS} digits in base ${base}.`);
  const text = (n < 0 ? n + 2 * half : n).toString(base).toUpperCase();
  if (places === undefined || n < 0) return text;
  const length = Math.trunc(numberOf(places));
  return length >= text.length && length <= BASE_DIGITS ? text.padStart(length, "0") : fail("The number has more digits than places.");
}

import { cellError } from "../errors/cell-error";
import type { Call } from "./call";
import { nearestWord } from "./nearest-word";
import { readOptionalText } from "./read-value";

/** Reads one of several words, any case; undefined when omitted; an unknown word is refused with the nearest valid one. */
export function readOptionalChoice<T extends string>(call: Call, argument: string, raw: unknown, choices: readonly T[]): T | undefined {
  const text = readOptionalText(call, argument, raw);
  return text === undefined ? undefined : chosen(call, argument, text, choices);
}

/** Finds a written word among the choices or refuses it. */
export function chosen<T extends string>(call: Call, argument: string, written: string, choices: readonly T[]): T {
  const found = choices.find((choice) => choice.toLowerCase() === written.trim().toLowerCase());
  if (found !== undefined) return found;
  throw cellError(
    "#VALUE!",
    `${call.name} needs ${argument} to be ${listed(choices)}; "${written}" is none of them, nearest is ${nearestWord(written, choices)}`,
  );
}

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} or ${words.at(-1)}`;
}

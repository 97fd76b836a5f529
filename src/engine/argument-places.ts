import type { EngineFunctionEntry } from "./types";

/**
 * Which definition each of `supplied` arguments belongs to, when optional and repeating definitions may stand anywhere
 * (SUMIFS, SWITCH): the engine's own rule (19.3.7, `argTargeting`, not exported). Optional definitions are filled from the left
 * with what is left over after the required ones and whole groups of repeating ones.
 */
export function argumentPlaces(entry: EngineFunctionEntry, supplied: number): number[] {
  const size = entry.nbrArgRepeating;
  const extraGroups = size > 0 ? Math.floor((supplied - entry.minArgRequired) / size) : 0;
  let optionalsLeft = supplied - entry.minArgRequired - extraGroups * size;
  const places: number[] = [];
  for (let i = 0; i < entry.args.length; i++) {
    const definition = entry.args[i]!;
    if (definition.repeating) {
      const groups = extraGroups + (definition.optional ? 0 : 1);
      for (let group = 0; group < groups; group++) for (let k = 0; k < size; k++) places.push(i + k);
      i += size - 1;
    } else if (!definition.optional && !definition.default) places.push(i);
    else if (optionalsLeft > 0) {
      places.push(i);
      optionalsLeft--;
    }
  }
  return places;
}

/** A sentence when a function is called with a number of arguments it does not take, otherwise undefined. */
export function argumentCountFault(entry: EngineFunctionEntry, supplied: number): string | undefined {
  const { name, minArgRequired: least, maxArgPossible: most, nbrArgRepeating: size } = entry;
  if (supplied < least) return `${name} needs at least ${least} argument${least === 1 ? "" : "s"}; it has ${supplied}.`;
  if (supplied > most) return `${name} takes at most ${most} argument${most === 1 ? "" : "s"}; it has ${supplied}.`;
  const left = size > 1 ? (supplied - least) % size : 0;
  if (size > 1 && left > entry.nbrOptionalNonRepeatingArgs) return `${name} takes its last arguments in groups of ${size}.`;
  return undefined;
}

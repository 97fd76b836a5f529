import { distance } from "fastest-levenshtein";

/** A hit on one word of a name counts a little less than one on the whole. */
const WORD_PENALTY = 0.5;

/** The name nearest in spelling: as a whole, in its beginning or in one of its words (`THWAITS` → THWAITES_MARCH). */
export function nearestFunction(wanted: string, names: readonly string[]): string {
  const upper = wanted.toUpperCase();
  const score = (name: string) => {
    const pieces = [name.slice(0, upper.length), ...name.split("_")];
    return Math.min(distance(upper, name), WORD_PENALTY + Math.min(...pieces.map((piece) => distance(upper, piece))));
  };
  return names.reduce((best, name) => (score(name) < score(best) ? name : best), names[0] ?? "");
}

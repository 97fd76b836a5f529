import { closest } from "fastest-levenshtein";

/** The known word nearest in spelling to what was written, for "did you mean". */
export function nearestWord(written: string, known: readonly string[]): string {
  const lower = new Map(known.map((word) => [word.toLowerCase(), word]));
  return lower.get(closest(written.toLowerCase(), [...lower.keys()])) ?? known[0]!;
}

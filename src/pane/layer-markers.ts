import type { ChartMarker } from "../chart/chart";
import { numberWords } from "../chart/number-words";
import { readOnsetWords } from "../cells/surface/onset-words";

const ATTACHED = ["laminar", "transition", "bubble", "turbulent"];
/** A march that leaves the range of its method says so in its note. */
const RANGE = /range.*? at x = (-?[\d.eE+-]+\d)/;

/**
 * The stations to mark on a layer's charts: onset, separation, reattachment and the end of a method's range as its notes tell
 * them; from the state column, at the station where the word changes, where the table has no notes.
 */
export function layerMarkers(x: { readonly values: readonly (number | null)[] }, states: readonly string[], notes: readonly { readonly words: string }[]): ChartMarker[] {
  const markers = new Map<string, ChartMarker>();
  const add = (words: string, at: number) => markers.set(`${words} ${at}`, { x: at, words: `${words} ${numberWords(at)}` });
  for (const { words } of notes) {
    const told = readOnsetWords(words);
    if (told.onset) add("onset", told.onset.x);
    for (const { kind, x: at } of told.separation) add(`${kind} separation`, at);
    if (told.reattachment !== undefined) add("reattachment", told.reattachment);
    const range = told.separation.length === 0 ? RANGE.exec(words) : null;
    if (range) add("end of the method's range", Number(range[1]));
  }
  if (notes.length === 0) {
    for (let i = 1; i < states.length; i++) {
      const [before, now, at] = [states[i - 1]!, states[i]!, x.values[i]];
      if (before === now || now === "" || at === null || at === undefined) continue;
      if (before === "laminar" && ATTACHED.includes(now)) add("onset by", at);
      else if (ATTACHED.includes(before) && !ATTACHED.includes(now)) add(`${now} by`, at);
    }
  }
  return [...markers.values()].sort((a, b) => a.x - b.x);
}

import { withUnit } from "../chart/chart-summary";
import { numberWords } from "../chart/number-words";
import { element } from "./element";
import type { LookTable } from "./look-table";

const WARNING = /\bWARNING\b/;

/** A whole table in a few words: its stations, its states and where onset and separation lie. */
export function tableHeadline(table: LookTable): string {
  const xs = table.x.values.filter((v) => v !== null);
  const span = xs.length > 0 ? `, ${table.x.heading} from ${numberWords(xs[0]!)} to ${withUnit(numberWords(xs.at(-1)!), table.x.unit)}` : "";
  const counts = new Map<string, number>();
  for (const state of table.states) if (state !== "") counts.set(state, (counts.get(state) ?? 0) + 1);
  const states = counts.size > 0 ? ` (${[...counts].map(([state, n]) => `${state} ${n}`).join(", ")})` : "";
  const markers = table.markers.length > 0 ? ` Marked: ${table.markers.map((m) => m.words).join("; ")}.` : "";
  return `${table.rows} rows${states}${span}.${markers}`;
}

/** Notes that ask for attention. */
export function warnings(table: LookTable): LookTable["notes"] {
  return table.notes.filter(({ words }) => WARNING.test(words));
}

/** Notes as a list, each with its row and station; warnings stand out. */
export function findings(notes: LookTable["notes"], table: LookTable): HTMLElement | undefined {
  if (notes.length === 0) return undefined;
  const lines = notes.map(({ row, words }) => {
    const x = table.x.values[row - 1];
    const where = row === 1 || x === null || x === undefined ? "" : `Row ${row} (${table.x.heading} ${withUnit(numberWords(x), table.x.unit)}): `;
    return element("li", WARNING.test(words) ? { class: "wl-warning" } : {}, where + words.replace(WARNING, "Warning:"));
  });
  return element("ul", { class: "wl-notes" }, ...lines);
}

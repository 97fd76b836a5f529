import { withUnit } from "../chart/chart-summary";
import { numberWords } from "../chart/number-words";
import { element } from "./element";
import type { LookTable } from "./look-table";

const WARNING = /\bWARNING\b/;

/** One sentence for a whole table: its stations, its states and where onset and separation lie. */
export function tableHeadline(name: string, address: string, table: LookTable): string {
  const xs = table.x.values.filter((v) => v !== null);
  const span = xs.length > 0 ? `, ${table.x.heading} from ${numberWords(xs[0]!)} to ${withUnit(numberWords(xs.at(-1)!), table.x.unit)}` : "";
  const counts = new Map<string, number>();
  for (const state of table.states) if (state !== "") counts.set(state, (counts.get(state) ?? 0) + 1);
  const states = counts.size > 0 ? ` ${[...counts].map(([state, n]) => `${state} at ${n}`).join(", ")}.` : "";
  const markers = table.markers.length > 0 ? ` Marked: ${table.markers.map((m) => m.words).join("; ")}.` : "";
  const capital = states === "" ? "" : states.replace(/^ ([a-z])/, (_, letter: string) => ` ${letter.toUpperCase()}`);
  return `${name} in ${address}: ${table.rows} rows${span}.${capital}${markers}`;
}

/** What the table's own notes say, row by row, warnings first to the eye. */
export function findings(table: LookTable): HTMLElement[] {
  if (table.notes.length === 0) return [];
  const lines = table.notes.map(({ row, words }) => {
    const x = table.x.values[row - 1];
    const where = row === 1 || x === null || x === undefined ? "" : `Row ${row} (${table.x.heading} ${withUnit(numberWords(x), table.x.unit)}): `;
    return element("li", WARNING.test(words) ? { class: "wl-warning" } : {}, where + words.replace(WARNING, "Warning:"));
  });
  return [element("section", { "aria-label": "Notes of the table" }, element("h3", {}, "Notes"), element("ul", { class: "wl-notes" }, ...lines))];
}

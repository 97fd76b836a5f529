import { axisWords } from "../chart/chart";
import { numberWords } from "../chart/number-words";
import { element } from "./element";
import type { LookTable } from "./look-table";

/** The drawn columns as a table to four digits, in a box that scrolls by itself. */
export function valueTable(table: LookTable): HTMLElement {
  const columns = [table.x, ...table.columns];
  const head = element("tr", {}, ...columns.map((c) => element("th", { scope: "col" }, axisWords({ label: c.heading, unit: c.unit, kind: c.kind }))), ...(table.states.length > 0 ? [element("th", { scope: "col" }, "state")] : []));
  const rows = Array.from({ length: table.rows }, (_, i) =>
    element("tr", {}, ...columns.map((c) => element("td", {}, c.values[i] === null || c.values[i] === undefined ? "" : numberWords(c.values[i]))), ...(table.states.length > 0 ? [element("td", {}, table.states[i]!)] : [])),
  );
  return element("div", { class: "wl-values", tabindex: "0", role: "region", "aria-label": "Values of the table" }, element("table", {}, element("thead", {}, head), element("tbody", {}, ...rows)));
}

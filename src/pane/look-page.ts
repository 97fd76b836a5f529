import type { AxisScale } from "../chart/chart";
import { chartSummary } from "../chart/chart-summary";
import { blockAddress, type CellBlock } from "./cell-block";
import { element } from "./element";
import { errorWords } from "./error-words";
import { calledFunctions } from "./form-formula";
import { lookCharts } from "./look-charts";
import { lookFiles, type Shown } from "./look-files";
import { findings, tableHeadline, warnings } from "./look-findings";
import { lookPanels } from "./look-panels";
import { readLookTable } from "./look-source";
import type { LookTable } from "./look-table";
import type { SheetHost, WallCell } from "./sheet-host";
import { valueTable } from "./value-table";

export interface LookPage {
  readonly root: HTMLElement;
  /** Follows the selection and the cells; call when either changed and when the page is shown. */
  update(): Promise<void>;
}

const ALL = "all, one below the other";

/**
 * The table of the selected WALL cell as charts, with readings, notes, files and words. While the selection stands on anything else
 * the last table stays and follows its inputs, so that a change to an input is seen at once.
 */
export function lookPage(host: SheetHost, about: (name: string) => void, say: (sentence: string, isFault?: boolean) => void): LookPage {
  const title = element("h2", {});
  const headline = element("p", { class: "wl-headline" });
  const formula = element("p", { class: "wl-formula" });
  const alerts = element("div", {});
  const notes = element("div", {});
  const choice = element("select", { id: "wl-panels" });
  const logX = element("input", { id: "wl-log-x", type: "checkbox" });
  const logY = element("input", { id: "wl-log-y", type: "checkbox" });
  const charts = lookCharts();
  const words = element("ul", { class: "wl-notes", "aria-live": "polite" });
  const wordsBox = element("details", {}, element("summary", {}, "The charts in words"), words);
  const values = element("div", {});
  const files = lookFiles(host, () => shown, say);
  const drawing = element(
    "div",
    { class: "wl-drawing" },
    element("div", { class: "wl-field wl-choice" }, element("label", { for: "wl-panels" }, "Show"), choice),
    element("div", { class: "wl-field wl-scales" }, element("label", {}, logX, " log stations"), element("label", {}, logY, " log values")),
    charts.root,
    element("section", { "aria-label": "Notes of the table" }, element("h3", {}, "Notes of the table"), notes),
    wordsBox,
    element("details", {}, element("summary", {}, "The table"), values),
    files,
  );
  const abouts = element("div", { class: "wl-files" });
  const source = element("section", { "aria-label": "Formula" }, element("h3", {}, "Formula"), formula, abouts);
  const others = element("div", {});
  const root = element("div", { class: "wl-look" }, element("div", { "aria-live": "polite" }, title, headline, alerts), others, drawing, source);

  let looked: CellBlock | undefined;
  let table: LookTable | undefined;
  let shown: Shown | undefined;
  let key = "";
  let turn = 0;
  /** As the user chose it; a table that has no such chart shows all. */
  let wanted = ALL;

  async function update(): Promise<void> {
    const mine = ++turn;
    const selected = await host.tableAt(await host.selection());
    const cell = selected ?? (looked ? await host.tableAt(looked) : undefined);
    const read = cell && !cell.error ? await readLookTable(host, cell) : undefined;
    const tables = cell ? [] : (await host.wallCells()).filter((c) => c.spill.bottom > c.spill.top);
    if (mine !== turn) return; // a later change is being read already
    const next = JSON.stringify([cell, read, tables]);
    if (next === key) return;
    key = next;
    if (JSON.stringify(looked) !== JSON.stringify(cell?.at)) say("");
    looked = cell?.at;
    table = read;
    if (cell) showCell(cell);
    else showTables(tables);
  }

  function showCell(cell: WallCell): void {
    const names = calledFunctions(cell.formula);
    const name = names.join(" and ");
    const address = blockAddress(cell.at, cell.at.sheet);
    formula.textContent = cell.formula;
    source.hidden = false;
    abouts.replaceChildren(...names.map((n) => element("button", { type: "button", class: "wl-minor", click: () => about(n) }, `About ${n}`)));
    others.replaceChildren();
    drawing.hidden = table === undefined;
    headline.classList.toggle("wl-fault", cell.error !== undefined);
    setText(title, `${name} in ${address}`);
    if (cell.error) setText(headline, errorWords(cell.error));
    else if (table) setText(headline, tableHeadline(table));
    else setText(headline, "A value or a list of results: there are no columns to draw.");
    if (table) {
      alerts.replaceChildren(findings(warnings(table), table) ?? "");
      notes.replaceChildren(findings(table.notes, table) ?? element("p", { class: "wl-quiet" }, "none"));
    } else alerts.replaceChildren();
    if (table) draw(table, `${names.join("-").toLowerCase().replaceAll("_", "-")}-${address}`);
    else shown = undefined;
  }

  function draw(of: LookTable, name: string): void {
    const scale = (box: HTMLInputElement): AxisScale => (box.checked ? "log" : "linear");
    const panels = lookPanels(of, { x: scale(logX), y: scale(logY) });
    const names = panels.length > 1 ? [ALL, ...panels.map((p) => p.name)] : panels.map((p) => p.name);
    choice.replaceChildren(...names.map((n) => element("option", { value: n }, n)));
    choice.value = names.includes(wanted) ? wanted : names[0]!;
    const chosen = choice.value === ALL ? panels : panels.filter((p) => p.name === choice.value);
    shown = { name, table: of, panels: chosen };
    charts.show(of, chosen);
    words.replaceChildren(...chosen.map((p) => element("li", {}, chartSummary(p.chart))));
    values.replaceChildren(valueTable(of));
  }

  function showTables(tables: readonly WallCell[]): void {
    shown = undefined;
    drawing.hidden = true;
    source.hidden = true;
    headline.classList.remove("wl-fault");
    alerts.replaceChildren();
    setText(title, "Look at a table");
    setText(headline, tables.length > 0 ? "Select a cell of a WALL table, or choose one of this book:" : "There is no WALL table in this book yet. Insert a function under Find; its table is drawn here.");
    others.replaceChildren(
      ...tables.map((cell) =>
        element("button", { type: "button", class: "wl-entry", click: () => void host.goTo(cell.at).catch((error: unknown) => say(String(error), true)) }, element("span", { class: "wl-name" }, calledFunctions(cell.formula).join(" and ")), element("span", { class: "wl-purpose" }, blockAddress(cell.at))),
      ),
    );
  }

  for (const control of [choice, logX, logY]) {
    control.addEventListener("change", () => {
      if (!table || !shown) return;
      wanted = choice.value;
      // One chart chosen: its words are opened, and so spoken.
      if (control === choice) wordsBox.open = choice.value !== ALL;
      draw(table, shown.name);
    });
  }
  return { root, update };
}

/** A live region speaks again only when its words change. */
function setText(region: HTMLElement, words: string): void {
  if (region.textContent !== words) region.textContent = words;
}

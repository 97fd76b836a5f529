import { CAUTIONS } from "../cells/cautions";
import type { CatalogueEntry } from "../cells/catalogue-entry";
import { blockAddress } from "./cell-block";
import { element } from "./element";
import { calledFunctions } from "./form-formula";
import type { HostValue, SheetHost } from "./sheet-host";

/** What a host can do with the book as a whole, beyond its cells. */
export interface ShareActions {
  /** Gives the user a copy of the book with values in place of WALL cells and a sheet of method notes. */
  plainCopy?(): Promise<void>;
}

/** Plain copy, method notes and re-link: how a book goes to someone who may not have the functions, and comes back. */
export function sharePage(host: SheetHost, catalogue: readonly CatalogueEntry[], actions: ShareActions, say: (sentence: string, isFault?: boolean) => void): HTMLElement {
  const attempt = (action: () => Promise<void>) => () => void action().catch((e: unknown) => say(e instanceof Error ? e.message : String(e), true));

  async function notes(): Promise<void> {
    const rows = methodNotes(await host.wallCells(), catalogue);
    if (rows === undefined) return say("This book has no WALL cells: there is nothing to note.");
    const at = await host.selection();
    const room = await host.read({ ...at, right: at.left + 2, bottom: at.top + rows.length - 1 });
    if (room.some((row) => row.some((cell) => cell.value !== null && cell.value !== ""))) return say("The notes need empty cells: select a cell on an empty sheet, then press again.", true);
    await host.writeValues({ ...at, right: at.left, bottom: at.top }, rows);
    say(`${rows.length} lines of method notes stand from ${blockAddress({ ...at, right: at.left, bottom: at.top }, at.sheet)} on.`);
  }
  async function values(): Promise<void> {
    const cells = await host.wallCells();
    if (cells.length === 0) return say("This book has no WALL cells.");
    const left: string[] = [];
    for (const cell of cells) {
      if (cell.error) {
        left.push(blockAddress(cell.at));
        continue;
      }
      await host.writeValues(cell.at, (await host.read(cell.spill)).map((row) => row.map((c) => (c.error ? c.error.code : c.value))));
    }
    say(`${cells.length - left.length} WALL cells are values now; undo brings them back.${left.length > 0 ? ` Left as they were, for they show errors: ${left.join(", ")}.` : ""}`);
  }
  async function relink(): Promise<void> {
    const lost = (await host.wallCells()).filter((cell) => cell.error?.code === "#NAME?");
    for (const cell of lost) await host.writeFormula(cell.at, cell.formula.replace(/(?:_xlfn\.|_xldudf_|\[\d+\]!)*WALL[._]/gi, "WALL."));
    say(lost.length === 0 ? "No WALL cell shows #NAME?." : `${lost.length} ${lost.length === 1 ? "formula was" : "formulas were"} entered again.`);
  }
  const part = (heading: string, words: string, label: string, action: () => Promise<void>) =>
    element("section", {}, element("h3", {}, heading), element("p", {}, words), element("button", { type: "button", class: "wl-minor", click: attempt(action) }, label));

  return element(
    "div",
    { class: "wl-share" },
    element("h2", {}, "Share the book"),
    actions.plainCopy
      ? part("Plain copy", "A copy of the book for readers without Wallsheet: values in place of WALL cells, and a sheet that tells how they were calculated.", "Save a plain copy", actions.plainCopy)
      : part("Plain copy", "Save a copy of the book under another name first; then turn its WALL cells into values here, and write the method notes.", "Turn WALL cells into values", values),
    part("Method notes", "Each WALL cell with its formula, method, valid range and sources, from the selected cell on. Select a cell of an empty sheet.", "Write method notes", notes),
    part("Re-link", "WALL cells that show #NAME? because the book was opened without Wallsheet are entered again.", "Enter lost formulas again", relink),
  );
}

/** The notes as rows of three columns: cell, item, text; undefined where there is no WALL cell. */
export function methodNotes(cells: readonly { at: Parameters<typeof blockAddress>[0]; formula: string }[], catalogue: readonly CatalogueEntry[]): HostValue[][] | undefined {
  if (cells.length === 0) return undefined;
  const rows: HostValue[][] = [["cell", "item", "text"]];
  for (const cell of cells) {
    const address = blockAddress(cell.at);
    rows.push([address, "formula", cell.formula.replace(/^=/, "")]);
    for (const name of calledFunctions(cell.formula)) {
      const entry = catalogue.find((e) => e.name === name);
      if (!entry) continue;
      rows.push([address, name, entry.purpose]);
      for (const limit of entry.limits) rows.push([address, "valid range and error", limit]);
      for (const source of entry.sources) rows.push([address, "source", source]);
    }
  }
  for (const caution of CAUTIONS) rows.push(["", "caution", caution]);
  return rows;
}

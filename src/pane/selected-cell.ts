import type { CatalogueEntry } from "../cells/catalogue-entry";
import { blockAddress } from "./cell-block";
import { element } from "./element";
import { errorWords } from "./error-words";
import { calledFunctions } from "./form-formula";
import type { HostCell, SheetHost } from "./sheet-host";

export interface SelectedCell {
  readonly root: HTMLElement;
  update(): Promise<void>;
}

/** The strip that says what stands in the selected cell: its formula, its error in words, and the way to the function's card. */
export function selectedCell(catalogue: readonly CatalogueEntry[], host: SheetHost, open: (entry: CatalogueEntry) => void): SelectedCell {
  const root = element("section", { class: "wl-selected", "aria-label": "Selected cell" });
  let shown = "";
  return {
    root,
    async update() {
      const selection = await host.selection();
      const at = { ...selection, right: selection.left, bottom: selection.top };
      const cell = (await host.read(at))[0]?.[0];
      const source = cell?.spilledFrom;
      const origin = source ? ((await host.read({ ...source, right: source.left, bottom: source.top }))[0]?.[0] ?? cell) : cell;
      const key = JSON.stringify([at, cell, origin?.formula]);
      if (key === shown) return;
      shown = key;
      const address = blockAddress(at, at.sheet);
      const names = calledFunctions(origin?.formula ?? "");
      const entries = names.flatMap((name) => catalogue.filter((entry) => entry.name === name));
      root.replaceChildren(
        element("p", { class: "wl-at" }, element("span", { class: "wl-name" }, address), ...stateOf(cell, source && origin?.formula ? blockAddress(source, at.sheet) : undefined)),
        ...(cell?.error ? [element("p", { class: "wl-fault" }, errorWords(cell.error))] : []),
        ...entries.map((entry) => element("button", { type: "button", class: "wl-minor", click: () => open(entry) }, `About ${entry.name}`)),
      );
    },
  };
}

function stateOf(cell: HostCell | undefined, source: string | undefined): (Node | string)[] {
  if (cell?.error) return [];
  if (source !== undefined) return [element("span", {}, cell?.text === "" ? "blank" : (cell?.text ?? "")), element("span", { class: "wl-quiet" }, `spilled from ${source}`)];
  if (!cell || (cell.value === null && cell.formula === undefined)) return [element("span", { class: "wl-quiet" }, "empty")];
  return [element("span", {}, cell.text)];
}

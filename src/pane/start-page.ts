import { blockAddress, type CellBlock } from "./cell-block";
import { element } from "./element";
import type { SheetHost } from "./sheet-host";
import { TEMPLATES, type Template } from "./templates";

/** Books a host can open to begin with. */
export interface StarterBook {
  readonly name: string;
  readonly words: string;
  open(): void;
}

/** Where to begin: starter books where the host can open them, and small templates written from the selected cell on. */
export function startPage(host: SheetHost, books: readonly StarterBook[], say: (sentence: string, isFault?: boolean) => void): HTMLElement {
  const entry = (name: string, words: string, click: () => void) => element("li", {}, element("button", { type: "button", class: "wl-entry", click }, element("span", { class: "wl-name" }, name), element("span", { class: "wl-purpose" }, words)));
  const write = (template: Template) => () => void writeTemplate(host, template).then(say, (e: unknown) => say(e instanceof Error ? e.message : String(e), true));
  return element(
    "div",
    { class: "wl-start" },
    element("h2", {}, "Begin"),
    ...(books.length > 0 ? [element("h3", {}, "Books"), element("ul", { class: "wl-checks" }, ...books.map((b) => entry(b.name, b.words, b.open)))] : []),
    element("h3", {}, "Templates, from the selected cell on"),
    element("ul", { class: "wl-checks" }, ...TEMPLATES.map((t) => entry(t.name, t.words, write(t)))),
  );
}

/** Writes a template where the selection begins; filled cells are never overwritten. */
export async function writeTemplate(host: SheetHost, template: Template): Promise<string> {
  const selected = await host.selection();
  const at: CellBlock = { ...selected, right: selected.left, bottom: selected.top };
  const width = Math.max(...template.rows.map((row) => row.length), ...template.formulas.map((f) => f.column + 1));
  const block = { ...at, right: at.left + width - 1, bottom: at.top + template.rows.length - 1 };
  if ((await host.read(block)).some((row) => row.some((cell) => cell.value !== null && cell.value !== ""))) throw new Error(`${blockAddress(block, at.sheet)} is not empty: select a cell with room below and to its right.`);
  await host.writeValues(at, template.rows.map((row) => (row.length === 0 ? [""] : row)));
  for (const { row, column, formula } of template.formulas) await host.writeFormula({ ...at, left: at.left + column, right: at.left + column, top: at.top + row, bottom: at.top + row }, placed(formula, at));
  return `${template.name} stands in ${blockAddress(block, at.sheet)}.`;
}

/** References of a template, {row,column} from its first cell, as they are called where it stands. */
function placed(formula: string, at: CellBlock): string {
  return formula.replace(/\{(\d+),(\d+)\}/g, (_, row: string, column: string) => {
    const cell = { sheet: at.sheet, left: at.left + Number(column), right: at.left + Number(column), top: at.top + Number(row), bottom: at.top + Number(row) };
    return blockAddress(cell, at.sheet);
  });
}

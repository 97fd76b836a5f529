import type { CatalogueEntry } from "../cells/catalogue-entry";
import { blockAddress, readAddress, type CellBlock } from "./cell-block";
import { element } from "./element";
import { errorWords } from "./error-words";
import { exampleArguments, formFormula } from "./form-formula";
import { isBlank, placeBeside, selectedColumns } from "./selected-columns";
import type { HostCell, SheetHost } from "./sheet-host";

/** How far to the right of a selection a free place is looked for. */
const COLUMNS_SEARCHED = 60;

export interface InsertForm {
  readonly root: HTMLElement;
  /** Fills arguments and place from what is selected now; called once when the card opens. */
  fill(): Promise<void>;
  /** The selection moved: the place follows it until the user has written one. */
  follow(): Promise<void>;
}

/**
 * The form that inserts one function. It opens with the selected columns in the first arguments, or, when no columns are selected,
 * with the worked example's arguments, so that the inserted formula computes at once. Filled cells are never overwritten.
 */
export function insertForm(entry: CatalogueEntry, host: SheetHost, say: (sentence: string, isFault?: boolean) => void): InsertForm {
  const inputs = entry.parameters.map((p, i) => element("input", { id: `wl-argument-${i}`, type: "text", autocomplete: "off", spellcheck: "false", "aria-describedby": `wl-about-${i}`, "aria-required": String(!p.optional), placeholder: p.optional ? "optional" : "" }));
  const place = element("input", { id: "wl-place", type: "text", autocomplete: "off", spellcheck: "false", class: "wl-place" });
  const formed = element("output", { class: "wl-formula", for: inputs.map((input) => input.id).join(" ") });
  const origin = element("p", { class: "wl-quiet" });
  let placeIsWritten = false;

  const showFormed = () => {
    const { formula, missing } = formFormula(entry, inputs.map((input) => input.value));
    formed.textContent = formula ?? `still needed: ${missing.join(", ")}`;
    formed.classList.toggle("wl-unfinished", formula === undefined);
  };
  const clearFault = (input: HTMLInputElement) => input.removeAttribute("aria-invalid");
  const fault = (input: HTMLInputElement, sentence: string) => {
    input.setAttribute("aria-invalid", "true");
    input.focus();
    say(sentence, true);
  };

  async function takeSelection(i: number): Promise<void> {
    const selection = await host.selection();
    const columns = selectedColumns(selection, await host.read(selection));
    const taken = selection.left === selection.right && columns.length === 1 ? columns[0]! : selection;
    inputs[i]!.value = blockAddress(taken, selection.sheet);
    clearFault(inputs[i]!);
    showFormed();
    say(`${entry.parameters[i]!.name} is now ${inputs[i]!.value}`);
  }

  async function insert(): Promise<void> {
    const { formula } = formFormula(entry, inputs.map((input) => input.value));
    if (formula === undefined) {
      const empty = entry.parameters.findIndex((p, i) => !p.optional && inputs[i]!.value.trim() === "");
      return fault(inputs[empty]!, `${entry.parameters[empty]!.name} is still empty: write a number or a range such as A2:A20.`);
    }
    const at = readAddress(place.value, (await host.selection()).sheet);
    if (!at) return fault(place, `"${place.value}" is not a cell: write one such as F4.`);
    const target = { ...at, right: at.left, bottom: at.top };
    const address = blockAddress(target, target.sheet);
    if (!isBlank((await host.read(target))[0]?.[0])) return fault(place, `${address} is not empty: choose an empty cell.`);
    await host.writeFormula(target, formula);
    await host.goTo(target);
    const cell = (await host.read(target))[0]?.[0];
    if (cell?.error) say(`${address} shows ${errorWords(cell.error)}`, true);
    else say(`${entry.name} stands in ${address}.`);
  }

  const attempt = (action: () => Promise<void>) => () => void action().catch((error: unknown) => say(error instanceof Error ? error.message : String(error), true));

  const rows = entry.parameters.map((p, i) => {
    inputs[i]!.addEventListener("input", () => {
      clearFault(inputs[i]!);
      showFormed();
    });
    return element(
      "div",
      { class: "wl-argument" },
      element("label", { for: inputs[i]!.id }, element("span", { class: "wl-name" }, p.name), " ", element("span", { class: "wl-unit" }, `[${p.unit}]`)),
      element("div", { class: "wl-field" }, inputs[i]!, element("button", { type: "button", class: "wl-minor", "aria-label": `Use the selection for ${p.name}`, title: "Use the selected cells", click: attempt(() => takeSelection(i)) }, "Selection")),
      element("p", { id: `wl-about-${i}`, class: "wl-quiet" }, p.description),
    );
  });
  place.addEventListener("input", () => {
    placeIsWritten = place.value.trim() !== "";
    clearFault(place);
  });

  const root = element(
    "form",
    { class: "wl-insert", "aria-label": `Insert ${entry.name}`, novalidate: true },
    element("h3", {}, "Arguments"),
    origin,
    ...rows,
    element("h3", {}, "Formula"),
    formed,
    element("div", { class: "wl-field wl-go" }, element("label", { for: "wl-place" }, "into cell"), place, element("button", { type: "submit", class: "wl-major" }, "Insert")),
  );
  root.addEventListener("submit", (event) => {
    event.preventDefault();
    attempt(insert)();
  });

  async function fill(): Promise<void> {
    const selection = await host.selection();
    const cells = await host.read(selection);
    const columns = selectedColumns(selection, cells).slice(0, entry.parameters.filter((p) => !p.optional).length);
    const values = columns.length > 0 ? columns.map((column) => blockAddress(column, selection.sheet)) : exampleArguments(entry);
    inputs.forEach((input, i) => (input.value = values[i] ?? ""));
    origin.textContent =
      columns.length > 0
        ? "Filled from the selected columns; complete the rest."
        : values.some((value) => value !== "")
          ? "Filled with a worked example; put your own cells in its place."
          : "Write numbers, or ranges such as A2:A20.";
    showFormed();
    await follow();
  }

  async function follow(): Promise<void> {
    if (placeIsWritten) return;
    const selection = await host.selection();
    place.value = blockAddress(await freePlace(host, selection), selection.sheet);
    clearFault(place);
  }

  return { root, fill, follow };
}

/** The selection's own cell when it is one blank cell; otherwise the nearest free place to its right. */
async function freePlace(host: SheetHost, selection: CellBlock): Promise<CellBlock> {
  const cells: readonly (readonly HostCell[])[] = await host.read(selection);
  const single = selection.left === selection.right && selection.top === selection.bottom;
  if (single && isBlank(cells[0]?.[0])) return selection;
  const beside = { ...selection, left: selection.right + 1, right: selection.right + COLUMNS_SEARCHED, bottom: selection.top };
  return placeBeside(selection, (await host.read(beside))[0] ?? []);
}
